/** Parameters of a study changed by their paths, without a hand on the file. */
import { UserError, showValue } from '../errors.js';
import type { Place } from '../errors.js';
import type { KeyPath } from './document.js';
import { setAtPath, valueFromText } from './edit.js';
import { studyFromText, withFiles } from './load.js';
import type { GridReading } from './hazard-grids.js';
import type { LoadedStudy } from './load.js';
import { dotted } from './problems.js';

/** One parameter of a study and its value. */
export interface Parameter {
  /** Dotted, list positions from 1: `hazard.levels.1.title`. */
  readonly path: string;
  readonly value: unknown;
  /** How it was given, for messages; its path when left out. */
  readonly given?: string;
}

/** The range of one parameter. */
export interface ParameterRange {
  readonly path: string;
  readonly values: readonly number[];
  /** How it was given, for messages; its path when left out. */
  readonly given?: string;
}

/** A sweep of more is a slip of the step [judgement]. */
const MOST_VALUES = 200;

/** The parameter that `path=value` names; `given` stands in messages. @throws UserError when it is not of that form. */
export function parameterFromText(text: string, given = text): Parameter {
  const { path, rest } = parted(text, given, 'path=value, for instance hazard.spectra.design.sds_g=1.2');
  return { path, value: at(given, () => valueFromText(rest)), given };
}

/**
 * The range that `path=from:to:step` names, both ends included; values are rounded to 12 digits, so that 0.3 and two steps of 0.1 are 0.5.
 * @throws UserError when it is not of that form or holds more than 200 values.
 */
export function rangeFromText(text: string, given = text): ParameterRange {
  const form = 'path=from:to:step, for instance hazard.spectra.design.sd1_g=0.3:0.9:0.1';
  const { path, rest } = parted(text, given, form);
  const parts = rest.split(':').map((part) => (part.trim() === '' ? NaN : Number(part)));
  const [from = NaN, to = NaN, step = NaN] = parts;
  if (parts.length !== 3 || !parts.every(Number.isFinite))
    throw new UserError(`expected ${form}; got ${showValue(rest)}`, { key: given });
  if (!(step > 0) || to < from)
    throw new UserError('expected a step over 0 and an end that is not below the beginning', { key: given });
  const count = Math.floor((to - from) / step + 1e-9) + 1;
  if (count > MOST_VALUES)
    throw new UserError(`${String(count)} values; at most ${String(MOST_VALUES)}: take a larger step`, { key: given });
  return { path, values: Array.from({ length: count }, (_, i) => Number((from + i * step).toPrecision(12))), given };
}

function parted(text: string, given: string, form: string): { readonly path: string; readonly rest: string } {
  const equals = text.indexOf('=');
  if (equals < 1) throw new UserError(`expected ${form}; got ${showValue(text)}`, { key: given });
  return { path: text.slice(0, equals).trim(), rest: text.slice(equals + 1) };
}

/**
 * `loaded` with `parameters` put in one after the other and checked as a study file is; the tables of spectra it names are read again,
 * and grids of another file. The study file stays as it is. `leaveMissing`: as for `withHazardGrids`.
 * @throws UserError with the texts of `loadStudy`, placed at the parameter as it was given.
 */
export async function withParameters(
  loaded: LoadedStudy,
  parameters: readonly Parameter[],
  { leaveMissing = false }: Pick<GridReading, 'leaveMissing'> = {},
): Promise<LoadedStudy> {
  if (parameters.length === 0) return loaded;
  refuseUnknownSpectra(loaded, parameters);
  let text = loaded.text;
  for (const { path, value, given = path } of parameters) text = at(given, () => setAtPath(text, path, value));
  const replace = (place: Place): Place => placeAmong(parameters, place);
  let changed: LoadedStudy;
  try {
    changed = studyFromText(text, loaded.file);
  } catch (error) {
    throw moved(error, replace);
  }
  const { study, grids } = await withFiles({ ...changed, folder: loaded.folder }, { known: loaded, leaveMissing });
  const placeOf = (path: KeyPath): Place => {
    const key = dotted(path);
    // what is no parameter's stands where the file has it, if the file has it
    return parameters.some((one) => concerns(one.path, key)) ? replace({ key }) : loaded.placeOf(path);
  };
  return { ...changed, study, grids, folder: loaded.folder, placeOf };
}

const OF_SPECTRUM = /^hazard\.spectra\.([^.]+)\.(.+)$/;

/** A parameter of a spectrum that the study has not got is a slip of its name, unless its code is given too. */
function refuseUnknownSpectra({ study }: LoadedStudy, parameters: readonly Parameter[]): void {
  const known = Object.keys(study.hazard.spectra);
  const begun = new Set(parameters.map(({ path }) => path));
  const problems = parameters.flatMap(({ path, given = path }) => {
    const [, name = '', rest] = OF_SPECTRUM.exec(path) ?? [];
    if (name === '' || rest === 'code' || known.includes(name)) return [];
    const whole = `hazard.spectra.${name}`;
    if (begun.has(whole) || begun.has(`${whole}.code`)) return [];
    return [
      {
        place: { key: given },
        message: `the study has no spectrum ${showValue(name)}; it has ${known.join(', ')}. A new one needs its code as well: ${whole}.code=…`,
      },
    ];
  });
  if (problems.length > 0) throw UserError.of(problems);
}

function concerns(path: string, key: string): boolean {
  return key === path || key.startsWith(`${path}.`) || path.startsWith(`${key}.`);
}

/** A place in the changed text, which no one has seen, as that of the parameters it comes from. */
function placeAmong(parameters: readonly Parameter[], { key = '' }: Place): Place {
  const meant = parameters.filter(({ path }) => concerns(path, key));
  const shown = (meant.length > 0 ? meant : parameters).map(({ path, given = path }) => given).join(' ');
  return { key: key === '' || meant.some(({ path }) => path === key) ? shown : `${shown} (${key})` };
}

/** Runs `work`; what it finds wrong stands at `given`. */
function at<T>(given: string, work: () => T): T {
  try {
    return work();
  } catch (error) {
    throw moved(error, () => ({ key: given }));
  }
}

function moved(error: unknown, place: (place: Place) => Place): unknown {
  if (!(error instanceof UserError)) return error;
  return UserError.of(error.problems.map((problem) => ({ ...problem, place: place(problem.place) })));
}

/** Spectra as files: a table for a spreadsheet, a picture. */
import type { Calculation } from '../engineering/calc.js';
import type { Inputs } from '../engineering/formula.js';
import { cite } from '../engineering/source.js';
import { ordinate } from '../engineering/spectrum/compiled.js';
import type { SpectrumFamily } from '../engineering/spectrum/family.js';
import { UserError } from '../errors.js';
import { MOST_DRAWN, spectraSvg } from '../reports/spectrum-chart.js';
import type { DrawnSpectrum } from '../reports/spectrum-chart.js';
import type { LoadedStudy } from '../study/load.js';
import { csvText } from './csv-text.js';
import { readSpectrum } from './spectrum-reading.js';
import type { SpectrumPlace } from './spectrum-reading.js';
import { NamedFile } from './write-named.js';

export interface SpectrumFiles {
  readonly csv?: string | undefined;
  readonly svg?: string | undefined;
}

const STEP_S = 0.02;
const SHORTEST_S = 4;
const LONGEST_S = 10;

/** Periods that draw a curve: every 0.02 s to 4 s, further where a plateau or a period asked for lies further, and the corners between. */
export function drawnPeriods(
  spectra: readonly { readonly corners_s: readonly number[]; readonly plateau: { readonly to_s: number } }[],
  at: readonly number[] = [],
): readonly number[] {
  const reach = Math.max(SHORTEST_S, ...spectra.map(({ plateau }) => Math.min(LONGEST_S, 2 * plateau.to_s)), ...at);
  const step = Math.max(STEP_S, Math.ceil(reach / STEP_S / 600) * STEP_S);
  const even = Array.from({ length: Math.round(reach / step) + 1 }, (_, i) => Number((i * step).toFixed(2)));
  const corners = spectra.flatMap(({ corners_s }) => corners_s.filter((corner) => corner <= reach));
  return [...new Set([...even, ...corners, ...at])].sort((a, b) => a - b);
}

/**
 * Writes the spectra `names` of a study: the table at `at`, or where no periods are asked for at those that draw the curve; the picture with a
 * dot at every period asked for. Grids are read at `place`. One spectrum alone is written as a table that a study can read back (table-file).
 * @returns the paths written. @throws UserError when a file cannot be written or there are too many spectra for a picture.
 */
export async function writeSpectra(
  loaded: LoadedStudy,
  names: readonly string[],
  at: readonly number[],
  { csv, svg }: SpectrumFiles,
  place?: SpectrumPlace,
): Promise<readonly string[]> {
  const table = await NamedFile.claimAny(csv, '--csv', { study: loaded });
  const picture = await NamedFile.claimAny(svg, '--svg', { study: loaded });
  const plain = names.map((name) => readSpectrum(loaded, name, [], place));
  const drawn = drawnPeriods(plain, at);
  const written: string[] = [];
  if (table !== null) {
    const periods = at.length > 0 ? [...at].sort((a, b) => a - b) : drawn;
    const columns = names.map((name) => readSpectrum(loaded, name, periods, place).ordinates.map(({ sa_g }) => sa_g));
    const head = names.length === 1 ? ['sa_g'] : names.map((name) => `${name} sa_g`);
    const rows = periods.map((period_s, i) => [period_s, ...columns.map((column) => column[i] ?? null)]);
    written.push(await table.write(csvText(['period_s', ...head], rows)));
  }
  if (picture !== null) {
    if (names.length > MOST_DRAWN)
      throw new UserError(
        `one picture holds at most ${String(MOST_DRAWN)} spectra that can be told apart, got ${String(names.length)}; name those to be drawn`,
      );
    const spectra = plain.map((sheet): DrawnSpectrum => {
      const { name, title, corners_s, plateau } = sheet;
      const points = readSpectrum(loaded, name, drawn, place).ordinates;
      return { name, about: title, points, plateau, corners_s, read: readSpectrum(loaded, name, at, place).ordinates };
    });
    written.push(await picture.write(await spectraSvg(spectra)));
  }
  return written;
}

/** Draws the spectrum of a finished calculation, with a dot at its period. @returns the path. @throws UserError for a method that is no spectrum. */
export async function drawCalculation({ method, inputs, value }: Calculation, path: string): Promise<string> {
  const { compile } = method.family as Partial<Pick<SpectrumFamily<Inputs>, 'compile'>>;
  if (compile === undefined)
    throw new UserError(`${method.id} is no spectrum; --svg draws spectra, \`swaymark methods spectrum\` lists them`);
  const file = await NamedFile.claim(path, '--svg', { study: null });
  const { period_s, ...parameters } = inputs;
  const compiled = compile(parameters);
  const at = typeof period_s === 'number' ? [period_s] : [];
  const corners_s = compiled.segments.slice(1).map(({ from_s }) => from_s);
  const { plateau_from_s: from_s, plateau_to_s: to_s } = compiled;
  const plateau = { from_s, to_s, sa_g: ordinate(compiled, from_s) };
  const point = (t: number, sa_g: number): DrawnSpectrum['points'][number] => ({
    period_s: t,
    sa_g,
    beyond: t > compiled.valid_to_s,
  });
  const svg = await spectraSvg([
    {
      name: method.title,
      about: cite(method.source),
      points: drawnPeriods([{ corners_s, plateau }], at).map((t) => point(t, ordinate(compiled, t))),
      plateau,
      corners_s,
      read: at.map((t) => point(t, value)),
    },
  ]);
  return file.write(svg);
}

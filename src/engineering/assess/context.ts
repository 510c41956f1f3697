/** The study's settings made ready for a pass over the buildings. */
import { ln } from '../numeric/elementary.js';
import type { AnyRecord, Inputs } from '../formula.js';
import { candidates, periodFormula } from '../period/choose.js';
import { priorClasses } from '../prior/system-prior.js';
import type { PriorClasses } from '../prior/system-prior.js';
import type { System } from '../building.js';
import { SYSTEMS } from '../building.js';
import type { CompiledSpectrum } from '../spectrum/compiled.js';
import { ordinate } from '../spectrum/compiled.js';
import { compileSpectrum } from '../spectrum/definition.js';
import { eras } from './code-history.js';
import type { Era } from './code-history.js';
import { newCaseMemory } from './case-memory.js';
import type { CaseMemory } from './case-memory.js';
import { newCurveMemory } from './curve-memory.js';
import type { CurveMemory } from './curve-memory.js';
import type { AssessSettings } from './settings.js';

export interface ContextSpectrum {
  readonly name: string;
  readonly record: AnyRecord;
  readonly inputs: Inputs;
  readonly compiled: CompiledSpectrum;
  readonly return_period_years: number | null;
  /** Periods below this are read at it (0 when the ramp is used). */
  readonly hold_from_s: number;
}

/** A formula that the study may read. */
export interface Candidate {
  readonly record: AnyRecord;
  /** It needs the height alone and no limit forbids it: the usual case, taken without looking further. */
  readonly plain: boolean;
}

export interface AssessContext {
  readonly settings: AssessSettings;
  readonly spectra: Readonly<Record<string, ContextSpectrum>>;
  /** Formulas of the period by system, best first: the study's own choice, then the standard's. */
  readonly formulas: Readonly<Record<System, readonly Candidate[]>>;
  readonly eras: readonly Era[];
  /** ln λ0 + k² 0.4²/2 by spectrum of the ranking level, relative; 0 for all where k and the rate are the same everywhere. */
  readonly zoneTerms: Readonly<Record<string, number>>;
  /** Factor on every capacity: 1, but for a draw of the overstrength in a simulation. */
  readonly capacityFactor: number;
  readonly priorClasses: PriorClasses;
  /** Cases and demands found so far; they speed up and change nothing. */
  readonly caseMemory: CaseMemory;
  readonly curveMemory: CurveMemory;
}

/** Median record-to-record dispersion in the closed form of the mean annual rate [from memory]. */
const RECORD_TO_RECORD = 0.4;

function slopeOf(settings: AssessSettings, spectrum: string): number {
  return typeof settings.slope === 'number' ? settings.slope : (settings.slope[spectrum] ?? 2.5);
}

/** Compiles spectra, picks formulas and lays out eras. @throws RangeError for spectrum parameters out of range. */
export function compileContext(settings: AssessSettings): AssessContext {
  const spectra: Record<string, ContextSpectrum> = {};
  for (const [name, { return_period_years, ...definition }] of Object.entries(settings.spectra)) {
    const reading = compileSpectrum(definition);
    spectra[name] = {
      name,
      ...reading,
      return_period_years: return_period_years ?? null,
      hold_from_s: settings.holdPlateau ? reading.compiled.plateau_from_s : 0,
    };
  }
  const formulas = Object.fromEntries(SYSTEMS.map((system) => [system, candidatesOf(system, settings)])) as Record<
    System,
    readonly Candidate[]
  >;
  return {
    settings,
    spectra,
    formulas,
    eras: settings.codeHistory === null ? [] : eras(settings.codeHistory),
    zoneTerms: zoneTerms(settings, spectra),
    capacityFactor: 1,
    priorClasses: priorClasses(settings.systemPrior),
    caseMemory: newCaseMemory(),
    curveMemory: newCurveMemory(),
  };
}

function candidatesOf(system: System, { period }: AssessSettings): readonly Candidate[] {
  const { standard, basis, formulaFor } = period;
  const own = formulaFor[system];
  const records = [
    ...(own === undefined ? [] : [periodFormula(own)]),
    ...candidates(system, standard, basis).filter(({ id }) => id !== own),
  ];
  return records.map((record) => {
    const { inputs } = record.family;
    const heightAlone = inputs.length === 1 && inputs[0]?.name === 'height_m';
    return { record, plain: heightAlone && record.limits.every(({ outside }) => outside !== 'reject') };
  });
}

function zoneTerms(
  settings: AssessSettings,
  spectra: Readonly<Record<string, ContextSpectrum>>,
): Readonly<Record<string, number>> {
  const level = settings.levels[0];
  if (level === undefined) return {};
  const names = [...new Set([...Object.values(level.spectra), ...(level.otherwise === null ? [] : [level.otherwise])])];
  const raw = names.map((name) => {
    const k = slopeOf(settings, name);
    const years = spectra[name]?.return_period_years ?? null;
    return {
      name,
      k,
      years,
      term: (years === null ? 0 : -ln(years)) + 0.5 * k * k * RECORD_TO_RECORD * RECORD_TO_RECORD,
    };
  });
  const same = raw.every(({ k, years }) => k === raw[0]!.k && years === raw[0]!.years);
  const first = raw[0]?.term ?? 0;
  return Object.fromEntries(raw.map(({ name, term }) => [name, same ? 0 : term - first]));
}

/** Slope of the hazard curve where the ranking spectrum is `name`. */
export function slopeFor(context: AssessContext, name: string): number {
  return context.settings.rankBy === 'demand' ? 1 : slopeOf(context.settings, name);
}

/** S_a at a period, the plateau held below its start. */
export function readAt(spectrum: ContextSpectrum, period_s: number): number {
  return ordinate(spectrum.compiled, Math.max(period_s, spectrum.hold_from_s));
}

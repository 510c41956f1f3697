/** The study's settings made ready for a pass over the buildings. */
import { ln } from '../numeric/elementary.js';
import { STRENGTH } from '../capacity/records.js';
import type { AnyRecord, Inputs } from '../formula.js';
import { candidates, periodFormula } from '../period/choose.js';
import { priorClasses } from '../prior/system-prior.js';
import type { PriorClasses } from '../prior/system-prior.js';
import type { Building, System } from '../building.js';
import { SYSTEMS } from '../building.js';
import type { CompiledSpectrum } from '../spectrum/compiled.js';
import { ordinate, scaled } from '../spectrum/compiled.js';
import { compileSpectrum } from '../spectrum/definition.js';
import { assumedWith } from './assumed.js';
import type { Assumed } from './assumed.js';
import { HAZARD_GRID } from '../spectrum/grid.js';
import type { HazardGrid, HazardGrids } from '../spectrum/grid.js';
import type { SiteTable, TableInterpolation } from '../spectrum/grid-table.js';
import { eras } from './code-history.js';
import type { Era } from './code-history.js';
import { newCaseMemory } from './case-memory.js';
import type { CaseMemory } from './case-memory.js';
import { newCurveMemory } from './curve-memory.js';
import type { CurveMemory } from './curve-memory.js';
import type { PeriodModel } from './period-model.js';
import type { AssessSettings } from './settings.js';

export interface ContextSpectrum {
  readonly name: string;
  readonly record: AnyRecord;
  readonly inputs: Inputs;
  readonly compiled: CompiledSpectrum;
  readonly return_period_years: number | null;
  /** Periods below this are read at it (0 when the ramp is used). */
  readonly hold_from_s: number;
  /** End of the plateau (corner period T_c), and the longest period the publication covers. */
  readonly corner_s: number;
  readonly valid_to_s: number;
  /** Where the spectrum is one building's alone, read from a grid at its place: its table. */
  readonly site: SiteTable | null;
}

/** A spectrum of the study that is a grid. */
export interface GridSource {
  readonly name: string;
  readonly grid: HazardGrid;
  readonly interpolation: TableInterpolation;
  readonly return_period_years: number | null;
  readonly holdPlateau: boolean;
  /** On every ordinate: 1, but for a switch of the sensitivity. */
  readonly factor: number;
}

/** A formula that the study may read. */
export interface Candidate {
  readonly record: AnyRecord;
  /** It needs the height alone and no limit forbids it: the usual case, taken without looking further. */
  readonly plain: boolean;
}

export interface AssessContext {
  readonly settings: AssessSettings;
  readonly assumed: Assumed;
  /** Strength coefficient with the least one of these settings. */
  readonly strength: typeof STRENGTH;
  /** Spectra that are the same wherever a building stands, by name. */
  readonly spectra: Readonly<Record<string, ContextSpectrum>>;
  /** Those that are a grid, by name: `siteSpectrum` makes one of them a building's. */
  readonly grids: ReadonlyMap<string, GridSource>;
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
  /** Evidence found for buildings that are assessed again and again with the same settings of periods and spreads; null: none is kept. */
  readonly periodMemory: PeriodMemory | null;
}

/** By building, then direction and system. */
export type PeriodMemory = WeakMap<Building, Map<string, PeriodModel | null>>;

/** Median record-to-record dispersion in the closed form of the mean annual rate [from memory]. */
const RECORD_TO_RECORD = 0.4;

function slopeOf(settings: AssessSettings, spectrum: string): number {
  return typeof settings.slope === 'number' ? settings.slope : (settings.slope[spectrum] ?? 2.5);
}

const NO_GRIDS: HazardGrids = new Map();

/**
 * Compiles spectra, picks formulas and lays out eras; `grids` are those the settings name by their fingerprints. A `periodMemory` is
 * for contexts that agree in the settings of periods and in spreads.
 * @throws RangeError for spectrum parameters out of range.
 */
export function compileContext(
  settings: AssessSettings,
  grids: HazardGrids = NO_GRIDS,
  periodMemory: PeriodMemory | null = null,
): AssessContext {
  const assumed = assumedWith(settings.assumed);
  const spectra: Record<string, ContextSpectrum> = {};
  for (const [name, { return_period_years, ...definition }] of Object.entries(settings.spectra)) {
    if (definition.code === HAZARD_GRID) continue;
    const reading = compileSpectrum(definition);
    spectra[name] = {
      name,
      ...reading,
      compiled: scaled(reading.compiled, assumed.spectrumFactor[name] ?? 1),
      return_period_years: return_period_years ?? null,
      hold_from_s: settings.holdPlateau ? reading.compiled.plateau_from_s : 0,
      corner_s: reading.compiled.plateau_to_s,
      valid_to_s: reading.compiled.valid_to_s,
      site: null,
    };
  }
  const formulas = Object.fromEntries(SYSTEMS.map((system) => [system, candidatesOf(system, settings)])) as Record<
    System,
    readonly Candidate[]
  >;
  return {
    settings,
    assumed,
    strength:
      assumed.leastCoefficient === STRENGTH.constants.floor_g
        ? STRENGTH
        : { ...STRENGTH, constants: { floor_g: assumed.leastCoefficient } },
    spectra,
    grids: gridSources(settings, grids),
    formulas,
    eras: settings.codeHistory === null ? [] : eras(settings.codeHistory),
    zoneTerms: zoneTerms(settings),
    capacityFactor: 1,
    priorClasses: priorClasses(settings.systemPrior),
    caseMemory: newCaseMemory(),
    curveMemory: newCurveMemory(),
    periodMemory,
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

function gridSources(settings: AssessSettings, grids: HazardGrids): ReadonlyMap<string, GridSource> {
  const { spectrumFactor } = assumedWith(settings.assumed);
  const sources = new Map<string, GridSource>();
  for (const [name, entry] of Object.entries(settings.spectra)) {
    const grid = entry.code === HAZARD_GRID ? grids.get(String(entry['grid'])) : undefined;
    if (grid === undefined) continue;
    sources.set(name, {
      name,
      grid,
      interpolation: entry['interpolation'] === 'log-log' ? 'log-log' : 'linear',
      return_period_years: entry.return_period_years ?? null,
      holdPlateau: settings.holdPlateau,
      factor: spectrumFactor[name] ?? 1,
    });
  }
  return sources;
}

function zoneTerms(settings: AssessSettings): Readonly<Record<string, number>> {
  const level = settings.levels[0];
  if (level === undefined) return {};
  const names = [...new Set([...Object.values(level.spectra), ...(level.otherwise === null ? [] : [level.otherwise])])];
  const raw = names.map((name) => {
    const k = slopeOf(settings, name);
    const years = settings.spectra[name]?.return_period_years ?? null;
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
  const read_s = Math.max(period_s, spectrum.hold_from_s);
  return spectrum.site === null ? ordinate(spectrum.compiled, read_s) : spectrum.site.read(read_s);
}

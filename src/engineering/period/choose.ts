/** Which formulas speak for a system under the study's standard and basis. */
import { SYSTEMS } from '../building.js';
import type { System } from '../building.js';
import type { AnyRecord } from '../formula.js';
import { MEASURED_SMALL, MEASURED_SMALL_BRITTLE } from './measured-records.js';
import { OTHER_CODE_RECORDS } from './other-codes.js';
import { PERIOD_RECORDS } from './periods.js';
import { REGRESSIONS } from './regressions.js';
import { JAPAN_PERIODS } from './japan.js';
import { PERIOD_STANDARDS, STANDARD_FORMS } from './standards.js';
import type { PeriodStandard, StandardForms } from './standards.js';

export { PERIOD_STANDARDS } from './standards.js';
export type { PeriodStandard } from './standards.js';
export const BASES = ['best-fit', 'design'] as const;
export type Basis = (typeof BASES)[number];

const BY_ID: ReadonlyMap<string, AnyRecord> = new Map(PERIOD_RECORDS.map((method) => [method.id, method]));

function byId(id: string): AnyRecord {
  const found = BY_ID.get(id);
  if (found === undefined) throw new Error(`no record ${id}`);
  return found;
}

/** The period formula called `id`. @throws Error when there is none. */
export function periodFormula(id: string): AnyRecord {
  return byId(id);
}

type BySystem = ReadonlyMap<System, readonly AnyRecord[]>;

function resolve(
  standard: PeriodStandard,
  namesOf: (forms: StandardForms, system: System) => readonly string[],
): BySystem {
  const forms = STANDARD_FORMS[standard];
  return new Map(
    SYSTEMS.map((system) => [system, namesOf(forms, system).map((name) => byId(`${standard}/period/${name}`))]),
  );
}

const NONE: BySystem = new Map();
const CANDIDATES: ReadonlyMap<PeriodStandard, BySystem> = new Map(
  PERIOD_STANDARDS.map((standard) => [
    standard,
    resolve(standard, ({ systems, otherwise }, system) => systems[system] ?? otherwise),
  ]),
);
const BESIDE: ReadonlyMap<PeriodStandard, BySystem> = new Map(
  PERIOD_STANDARDS.map((standard) => [standard, resolve(standard, ({ beside }, system) => beside?.[system] ?? [])]),
);

/**
 * The standard whose formulas are read. ASCE 7 has no best-fit set, ASCE 41-17 stands in; ASCE 41-17 has no design set, ASCE 7-22
 * stands in; every other standard has one set, which is read whatever the basis.
 */
export function standardRead(standard: PeriodStandard, basis: Basis): PeriodStandard {
  if (standard.startsWith('asce7-') && basis === 'best-fit') return 'asce41-17';
  if (standard === 'asce41-17' && basis === 'design') return 'asce7-22';
  return standard;
}

/**
 * The formulas of `system`, best first: by wall area where the standard has such a form and the system is walls, then those that
 * need the plan or the storeys, the plain one last. The last needs height and storeys alone, but for IS 1893 "all other", which
 * has no plain form.
 */
export function candidates(system: System, standard: PeriodStandard, basis: Basis): readonly AnyRecord[] {
  return (CANDIDATES.get(standardRead(standard, basis)) ?? NONE).get(system) ?? [];
}

/** Forms that the standard allows beside its candidates, for showing side by side only. */
export function formsBeside(system: System, standard: PeriodStandard, basis: Basis): readonly AnyRecord[] {
  return (BESIDE.get(standardRead(standard, basis)) ?? NONE).get(system) ?? [];
}

/** What should be known before demand is read by the standard; empty when there is nothing to say. */
export function standardNote(standard: PeriodStandard): string {
  return STANDARD_FORMS[standard].note ?? '';
}

/** The names of the inputs of a record. */
export function inputNames(method: AnyRecord): readonly string[] {
  return method.family.inputs.map(({ name }) => name);
}

const byHeightAlone = (method: AnyRecord): boolean =>
  method.family.inputs.length === 1 && method.family.inputs[0]?.name === 'height_m';

/** The formula of `system` by height alone; the last candidate where the standard has none (GB 50009, IS 1893 "all other"). */
export function heightFormula(system: System, standard: PeriodStandard, basis: Basis): AnyRecord {
  const list = candidates(system, standard, basis);
  const found = list.find(byHeightAlone) ?? list.at(-1);
  if (found === undefined) throw new Error(`no formula of ${standard} for ${system}`);
  return found;
}

/** Frames first, so that the rows of a standard keep the order of its table. */
const TABLE_ORDER: readonly System[] = [
  'steel-moment-frame',
  'concrete-moment-frame',
  'steel-eccentric-braced-frame',
  'steel-buckling-restrained-braced-frame',
  ...SYSTEMS,
];

/** The formulas by height alone of the standard read, one per class of system, for charts. */
export function formulasOf(standard: PeriodStandard, basis: Basis): readonly AnyRecord[] {
  return [...new Set(TABLE_ORDER.flatMap((system) => candidates(system, standard, basis)))].filter(byHeightAlone);
}

const named = (records: readonly AnyRecord[], ...ids: readonly string[]): readonly AnyRecord[] =>
  records.filter(({ id }) => ids.includes(id));

const R = REGRESSIONS;
const CONCRETE_FRAME = [...R.concreteFrames, ...R.concrete];
const CONCRETE_WALL = [...R.wallsByArea, ...R.concreteWalls, ...R.walls, ...R.wallsAndOther, ...R.concrete];
const MASONRY = [...R.walls, ...R.wallsAndOther];
const STEEL_AMPLITUDE = named(
  JAPAN_PERIODS,
  'satake-2003/period/steel-habitability',
  'satake-2003/period/steel-safety',
);
const CONCRETE_AMPLITUDE = named(
  JAPAN_PERIODS,
  'satake-2003/period/concrete-habitability',
  'satake-2003/period/concrete-safety',
);
const ANY = named(
  OTHER_CODE_RECORDS,
  'practice-taiwan/period/by-storeys',
  'ellis-1980/period/tall-buildings',
  'wind-practice/period/by-height-and-width',
);
const CHILE = named(OTHER_CODE_RECORDS, 'practice-chile/period/walls-by-storeys');

const SPEAK_OF: Readonly<Record<System, readonly AnyRecord[]>> = {
  'steel-moment-frame': [...R.steelFrames, ...STEEL_AMPLITUDE],
  'steel-concentric-braced-frame': [...R.wallsAndOther, ...STEEL_AMPLITUDE],
  'steel-eccentric-braced-frame': STEEL_AMPLITUDE,
  'steel-buckling-restrained-braced-frame': STEEL_AMPLITUDE,
  'steel-light-frame': R.wallsAndOther,
  'concrete-moment-frame': [...CONCRETE_FRAME, ...CONCRETE_AMPLITUDE],
  'concrete-infilled-frame': [...R.infilled, ...R.concrete, ...CONCRETE_AMPLITUDE],
  'concrete-shear-wall': [...CONCRETE_WALL, ...CONCRETE_AMPLITUDE, ...CHILE],
  'concrete-wall-frame': [...R.wallsAndOther, ...R.concrete, ...CONCRETE_AMPLITUDE],
  'precast-concrete-frame': R.concrete,
  'precast-tilt-up-wall': [...R.walls, ...R.wallsAndOther],
  'reinforced-masonry-wall': MASONRY,
  'confined-masonry-wall': MASONRY,
  'unreinforced-masonry-wall': MASONRY,
  'timber-light-frame': [...R.wood, ...R.wallsAndOther],
  'timber-post-and-beam': R.wallsAndOther,
};

/** Published regressions and rules that speak of `system`, for showing side by side only; none of them enters the assessment. */
export function regressionsFor(system: System): readonly AnyRecord[] {
  return [...SPEAK_OF[system], ...ANY];
}

/** The record that brings a period of basis `ambient` to strong shaking: longer for infill and unreinforced masonry, which crack early. */
export function toStrongShaking(system: System): typeof MEASURED_SMALL {
  return system === 'concrete-infilled-frame' || system === 'unreinforced-masonry-wall'
    ? MEASURED_SMALL_BRITTLE
    : MEASURED_SMALL;
}

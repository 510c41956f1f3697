/** What the row says of its irregularities, or shows by its numbers: one answer for each of the six, with what it rests on. */
import type { Building, System, YesNo } from '../building.js';
import { DIRECTIONS } from '../direction.js';
import { formatNumber, formatShare } from '../format.js';
import { apply } from '../formula.js';
import { ONE_SIDED_SHARE, USABLE_SHARE } from '../irregularity/editions.js';
import type { IrregularityRules } from '../irregularity/editions.js';
import { FIRST_STOREY_COLUMNS, FIRST_STOREY_WALLS } from '../irregularity/records.js';

/** Systems in which a frame carries sideways load. */
export const FRAMES: ReadonlySet<System> = new Set<System>([
  'steel-moment-frame',
  'concrete-moment-frame',
  'concrete-infilled-frame',
  'precast-concrete-frame',
  'timber-post-and-beam',
]);

/** The six flags, in the order of the columns. */
export const NAMES = [
  'soft_storey',
  'weak_storey',
  'torsion',
  'reentrant_corner',
  'setback',
  'mass_irregularity',
] as const;
export type Name = (typeof NAMES)[number];
export const WORDS: Readonly<Record<Name, string>> = {
  soft_storey: 'soft storey',
  weak_storey: 'weak storey',
  torsion: 'torsion',
  reentrant_corner: 're-entrant corner',
  setback: 'setback',
  mass_irregularity: 'mass irregularity',
};

export const NO = 0;
export const YES = 1;
export const UNKNOWN = 2;
export type State = typeof NO | typeof YES | typeof UNKNOWN;

/** State of a flag and what it rests on; of the soft storey one state for frames, one for walls. */
export interface Found {
  readonly state: State;
  readonly ofWalls: State;
  readonly origin: 'given' | 'inferred' | 'prior';
  readonly why: string;
}

const said = (flag: YesNo): Found =>
  flag === 'yes'
    ? { state: YES, ofWalls: YES, origin: 'given', why: 'from the inventory' }
    : { state: NO, ofWalls: NO, origin: 'given', why: 'from the inventory' };
const SAID = { yes: said('yes'), no: said('no') };
const ONE_STOREY: Found = { state: NO, ofWalls: NO, origin: 'inferred', why: 'one storey: none to compare it with' };
const NOT_KNOWN: Found = { state: UNKNOWN, ofWalls: UNKNOWN, origin: 'prior', why: 'not known: by its chance' };
const read = (state: State, why: string): Found => ({ state, ofWalls: state, origin: 'inferred', why });

/** What is known of one irregularity; without rules nothing is read from numbers. */
export function find(name: Name, building: Building, rules: IrregularityRules | null): Found {
  const flag = building[name];
  if (flag !== null) return SAID[flag];
  if (rules === null) return NOT_KNOWN;
  const isOneStorey = building.storeys.value < 2;
  switch (name) {
    case 'soft_storey':
      return isOneStorey ? ONE_STOREY : softStorey(building, rules);
    case 'weak_storey':
    case 'mass_irregularity':
      return isOneStorey ? ONE_STOREY : NOT_KNOWN;
    case 'setback':
      return isOneStorey ? ONE_STOREY : setback(building, rules);
    case 'torsion':
      return oneSided(building);
    case 'reentrant_corner':
      return reentrant(building, rules);
  }
}

/** By storey stiffness where every storey has one, else by the height of the first: then it can be found, not ruled out. */
function softStorey(building: Building, { soft, title }: IrregularityRules): Found {
  if (soft === null) return NOT_KNOWN;
  let told = 0;
  for (const direction of DIRECTIONS) {
    const list = building.storey_stiffness_kN_per_m[direction];
    // one entry for all storeys says nothing of their differences
    if (list === null || list.length < 2) continue;
    told += 1;
    const ratio = apply(soft, { storey_stiffness_kN_per_m: list });
    if (ratio < 1)
      return read(
        YES,
        `storey stiffness ${direction}: the softest storey has ${formatNumber(ratio, 3)} of the least that ${title} lets pass (${limitWords(soft)})`,
      );
  }
  if (told === 2) return read(NO, `storey stiffness within the limit of ${title}`);
  const first_storey_height_m = building.first_storey_height_m;
  if (!(first_storey_height_m > 0)) return NOT_KNOWN;
  const usual_storey_height_m = (building.height_m.value - first_storey_height_m) / (building.storeys.value - 1);
  if (!(usual_storey_height_m > 0)) return NOT_KNOWN;
  const heights = { usual_storey_height_m, first_storey_height_m };
  const limit = soft.constants.share_of_above;
  const ofFrame = apply(FIRST_STOREY_COLUMNS, heights);
  const ofWalls = apply(FIRST_STOREY_WALLS, heights);
  if (ofFrame >= limit) return NOT_KNOWN;
  const why = `first storey ${formatNumber(first_storey_height_m, 3)} m, the others ${formatNumber(usual_storey_height_m, 3)} m: k₁/k₂ = ${formatNumber(ofFrame, 3)} of columns, ${formatNumber(ofWalls, 3)} of walls; limit ${String(limit)} (${title})`;
  return { state: YES, ofWalls: ofWalls < limit ? YES : UNKNOWN, origin: 'inferred', why };
}

/** A share to three digits: cut to whole per cent it would read like its limit. */
function threeDigits(share: number): string {
  return `${formatNumber(100 * share, 3)} %`;
}

function limitWords({ constants: { share_of_above, share_of_three } }: NonNullable<IrregularityRules['soft']>): string {
  const above = `${formatShare(share_of_above)} of the storey above`;
  return share_of_three > 0 ? `${above}, ${formatShare(share_of_three)} of the mean of the three above` : above;
}

/** Upper floors smaller than the ground floor, told from areas: found only where the difference is more than usable over built area. */
function setback(
  { storeys, floor_area_m2, footprint_area_m2 }: Building,
  { setback: limit, title }: IrregularityRules,
): Found {
  const measured = storeys.origin === 'given' && floor_area_m2.origin === 'given' && footprint_area_m2 > 0;
  if (limit === null || !measured) return NOT_KNOWN;
  const share = floor_area_m2.value / (footprint_area_m2 * storeys.value);
  const least = USABLE_SHARE / limit;
  return share < least
    ? read(
        YES,
        `the floors cover ${threeDigits(share)} of footprint × storeys; under ${formatShare(least)} (${title}, usable area ${String(USABLE_SHARE)} of built [judgement])`,
      )
    : NOT_KNOWN;
}

function reentrant({ reentrant_projection, reentrant_area_share }: Building, rules: IrregularityRules): Found {
  const { projection, hullShare, title } = rules;
  if (projection !== null && reentrant_projection >= 0) {
    const why = `projections beyond the corners of the footprint ${threeDigits(reentrant_projection)} of the plan; limit ${formatShare(projection)} (${title})`;
    return read(reentrant_projection > projection ? YES : NO, why);
  }
  if (hullShare !== null && reentrant_area_share >= 0) {
    const why = `${threeDigits(reentrant_area_share)} of the floor lies between footprint and hull; limit ${formatShare(hullShare)} (${title})`;
    return read(reentrant_area_share > hullShare ? YES : NO, why);
  }
  return NOT_KNOWN;
}

/** One wall with most of a direction's wall area; frames twist for other reasons. */
function oneSided({ structure, system }: Building): Found {
  if (structure === null || (system !== null && FRAMES.has(system))) return NOT_KNOWN;
  for (const direction of DIRECTIONS) {
    const walls = structure.wall_areas_m2[direction];
    // a single entry may be the area of all walls together
    if (walls === null || walls.length < 2) continue;
    let all = 0;
    for (const area of walls) all += area;
    const share = Math.max(...walls) / all;
    if (share > ONE_SIDED_SHARE)
      return read(
        YES,
        `one wall ${direction} has ${threeDigits(share)} of the wall area; limit ${formatShare(ONE_SIDED_SHARE)}`,
      );
  }
  return NOT_KNOWN;
}

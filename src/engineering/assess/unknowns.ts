/** What is not known of a building and could be found out, as it stands in the distribution of its ln S. */
import type { Building } from '../building.js';
import { MixtureBuilder, MixturePool, labelOf } from '../priority/mixture.js';
import type { Mixture } from '../priority/mixture.js';
import type { Learnable, Unknowns } from '../priority/learnable.js';
import { casesOf } from './cases.js';
import { isDesigned } from './edition-rows.js';
import type { Case, Cases, Irregularity } from './case-memory.js';
import { chooseSpectrum } from './choose-spectrum.js';
import { slopeFor } from './context.js';
import type { AssessContext } from './context.js';
import { integrate } from './integrate.js';
import { REGULAR, irregularityOf } from './irregularity.js';
import { peopleOf } from './people.js';
import { newScratch } from './scratch.js';
import { isChecked } from './strength-check.js';
import { isUndesigned } from './terms.js';
import type { Scratch } from './scratch.js';

const shared = newScratch();

/** The unknowns of `building`; null where it cannot be ranked. What is on record is not among them. */
export function unknownsOf(building: Building, context: AssessContext, scratch: Scratch = shared): Unknowns | null {
  const choice = chooseSpectrum(context, building, 0);
  const cases = casesOf(building, context);
  if (typeof choice === 'string' || typeof cases === 'string') return null;
  const { settings } = context;
  const people = settings.rankBy === 'people' ? peopleOf(building, context) : { people_exposed: 1, sigma: 0 };
  if (typeof people === 'string') return null;
  const slope_k = slopeFor(context, choice.spectrum.name);
  const told: Cell[] = [];
  scratch.score.clear();
  const pass = integrate(
    building,
    cases,
    people,
    choice.spectrum,
    slope_k,
    context,
    scratch,
    (which, heightNode, storey) => {
      told.push({ which, heightNode, storey, to: scratch.score.size });
    },
  );
  if (typeof pass === 'string') return null;
  const open = settings.rankBy !== 'demand' && !(building.capacity_sa_g > 0);
  const irregularity = open ? irregularityOf(building, context) : REGULAR;
  const { parts, cellOf, stateOf } = withStates(gathered(scratch.score.raw(), told), irregularity, slope_k);
  const numbered = (valueOf: (cell: Cell, state: number) => string | number): Int32Array | null => {
    const numbers = new Map<string | number, number>();
    // the parts of a cell are many: each of its states is asked once
    const states = Math.max(1, irregularity.statesRest.length);
    const asked = new Int32Array(states * told.length).fill(-1);
    const values = new Int32Array(cellOf.length);
    for (let i = 0; i < cellOf.length; i += 1) {
      const at = states * cellOf[i]! + stateOf[i]!;
      if (asked[at]! < 0) {
        const value = valueOf(told[cellOf[i]!]!, stateOf[i]!);
        asked[at] = numbers.get(value) ?? numbers.size;
        numbers.set(value, asked[at]);
      }
      values[i] = asked[at]!;
    }
    return numbers.size > 1 ? values : null;
  };
  const learnable: Learnable[] = [];
  const add = (unknown: Learnable['unknown'], values: Int32Array | null, tau: Learnable['tau']): void => {
    const takes = typeof tau === 'number' ? tau > 0 : tau.some((one) => one > 0);
    if (values !== null || takes) learnable.push({ unknown, values, tau });
  };
  // the year of construction tells of a strengthened building what it was before
  const edition = ({ which: { edition: now, builtTo } }: Cell): string => `${now ?? ''}|${builtTo?.edition ?? ''}`;
  if (building.system === null)
    add(
      'system',
      numbered(({ which }) => which.system),
      0,
    );
  if (building.years.length !== 1) add('year', numbered(edition), 0);
  if (building.height_m.sigma > 0)
    add(
      'height',
      numbered(({ heightNode }) => heightNode),
      0,
    );
  if (open)
    add(
      'irregularity',
      numbered(({ storey }, state) => `${String(storey)} ${String(state)}`),
      0,
    );
  if (settings.rankBy === 'people') addPeople(building, context, people.sigma, learnable);
  // drawings settle what era tables and the years around a change of edition leave open
  const drawn = building.design_base_shear_coefficient > 0 || isUndesigned(building);
  if (open && !drawn) {
    const tau = slope_k * settings.spreads.eraTable;
    const takes = told.map(({ which }) =>
      isDesigned(which, context) && !isChecked(building, which, context) ? tau : 0,
    );
    add(
      'drawings',
      numbered(edition),
      Float64Array.from(cellOf, (cell) => takes[cell]!),
    );
  }
  return { parts, learnable };
}

/** Chance that the building was designed for earthquakes: the drawings of others state no coefficient, and their table's doubt stays. */
export function designedShare({ list }: Cases, context: AssessContext): number {
  let share = 0;
  for (const which of list) if (isDesigned(which, context)) share += which.chance;
  return Math.min(share, 1);
}

/** The nodes of one case at one height, without a soft or weak storey (0) or with one (1). */
interface Cell {
  readonly which: Case;
  readonly heightNode: number;
  readonly storey: 0 | 1;
  /** Where its nodes end. */
  readonly to: number;
}

const builder = new MixtureBuilder();
const pool = new MixturePool();

/** Parts of the distribution, and of each the cell it is of. */
interface Parted {
  readonly parts: Mixture & { readonly label: Uint8Array };
  readonly cellOf: Int32Array;
}

/** The nodes gathered within each cell, cells apart: the error of the period is no unknown that a survey finds out. */
function gathered(nodes: Mixture, cells: readonly Cell[]): Parted {
  const weight: number[] = [];
  const mean: number[] = [];
  const sd: number[] = [];
  const label: number[] = [];
  const cellOf: number[] = [];
  let from = 0;
  cells.forEach(({ to }, cell) => {
    builder.clear();
    let total = 0;
    for (; from < to; from += 1) {
      builder.add(nodes.weight[from]!, nodes.mean[from]!, nodes.sd[from]!, labelOf(nodes, from));
      total += nodes.weight[from]!;
    }
    if (builder.size === 0) return;
    pool.restart();
    const own = builder.gather(pool);
    for (let i = own.from; i < own.to; i += 1) {
      weight.push(own.weight[i]! * total);
      mean.push(own.mean[i]!);
      sd.push(own.sd[i]!);
      label.push(labelOf(own, i));
      cellOf.push(cell);
    }
  });
  const parts = {
    weight: Float64Array.from(weight),
    mean: Float64Array.from(mean),
    sd: Float64Array.from(sd),
    label: Uint8Array.from(label),
    from: 0,
    to: weight.length,
  };
  return { parts, cellOf: Int32Array.from(cellOf) };
}

/** A soft or weak storey parts the cells; the other irregularities, gathered in the spread until here, part them once more by their states. */
function withStates(
  { parts, cellOf }: Parted,
  { statesRest, varianceRest }: Irregularity,
  slope_k: number,
): Parted & { readonly stateOf: Int32Array } {
  if (statesRest.length === 0) return { parts, cellOf, stateOf: new Int32Array(cellOf.length) };
  const n = cellOf.length;
  const room = (): Float64Array => new Float64Array(statesRest.length * n);
  const all = { weight: room(), mean: room(), sd: room(), label: new Uint8Array(statesRest.length * n) };
  const cells = new Int32Array(statesRest.length * n);
  const stateOf = new Int32Array(statesRest.length * n);
  statesRest.forEach(({ chance, ln: lnState, variance }, state) => {
    const taken = slope_k * slope_k * (varianceRest - variance);
    const from = state * n;
    all.label.set(parts.label, from);
    cells.set(cellOf, from);
    stateOf.fill(state, from, from + n);
    for (let i = 0; i < n; i += 1) {
      all.weight[from + i] = parts.weight[i]! * chance;
      // a capacity times a factor divides S by its k-th power
      all.mean[from + i] = parts.mean[i]! - slope_k * lnState;
      all.sd[from + i] = Math.sqrt(Math.max(parts.sd[i]! * parts.sd[i]! - taken, 0));
    }
  });
  return { parts: { ...all, from: 0, to: all.label.length }, cellOf: cells, stateOf };
}

/**
 * People: their count, and the use where it is not known, which tells how many there are and for how long. Where neither is known each
 * tells part of the same: a count leaves the hours open, the use the count.
 */
function addPeople(
  { use, occupants_peak, occupied_hours_per_week: hours, floor_area_m2: area }: Building,
  { settings: { spreads }, assumed: { peopleWeight } }: AssessContext,
  sigma: number,
  learnable: Learnable[],
): void {
  const counted = occupants_peak >= 0;
  const square = (x: number): number => x * x;
  // in ln S people count by their weight
  const rooted = (variance: number): number => peopleWeight * Math.sqrt(Math.max(variance, 0));
  // with everything known; with the use alone; with a count alone
  const least = square(spreads.peopleCounted);
  const withUse = counted ? least : square(spreads.peopleKnownUse) + square(area.sigma);
  const withCount = use === 'unknown' && !(hours >= 0) ? square(spreads.peopleKnownUse) : least;
  const known = use !== 'unknown';
  const tauOfUse = rooted(sigma * sigma - withUse);
  if (!known && tauOfUse > 0) learnable.push({ unknown: 'use', values: null, tau: tauOfUse });
  const tau = rooted(sigma * sigma - withCount);
  if (counted || !(tau > 0)) return;
  const count = { unknown: 'occupants', values: null, tau } as const;
  learnable.push(known ? count : { ...count, beside: { unknown: 'use', tau: rooted(withUse - least) } });
}

/** What is not known of a building and could be found out, as it stands in the distribution of its ln S. */
import type { Building } from '../building.js';
import { MixtureBuilder, MixturePool, labelOf } from '../priority/mixture.js';
import type { Mixture } from '../priority/mixture.js';
import type { Learnable, Unknowns } from '../priority/survey-value.js';
import { casesOf } from './cases.js';
import { isDesigned } from './capacity.js';
import type { Case, Cases } from './case-memory.js';
import { chooseSpectrum } from './choose-spectrum.js';
import { slopeFor } from './context.js';
import type { AssessContext } from './context.js';
import { integrate } from './integrate.js';
import { irregularityOf } from './irregularity.js';
import { peopleOf } from './people.js';
import { newScratch } from './scratch.js';
import { isChecked } from './strength-check.js';
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
  const { parts, cells, cellOf } = gathered(scratch.score.raw(), told);
  const numbered = (valueOf: (cell: Cell) => string | number): Int32Array | null => {
    const numbers = new Map<string | number, number>();
    const ofCell = cells.map((cell) => {
      const value = valueOf(cell);
      const number = numbers.get(value) ?? numbers.size;
      numbers.set(value, number);
      return number;
    });
    return numbers.size > 1 ? cellOf.map((cell) => ofCell[cell]!) : null;
  };
  const learnable: Learnable[] = [];
  const add = (unknown: Learnable['unknown'], values: Int32Array | null, tau: number): void => {
    if (values !== null || tau > 0) learnable.push({ unknown, values, tau });
  };
  const edition = ({ which }: Cell): string => which.edition ?? '';
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
  // a soft or weak storey parts the cells; the other irregularities are gathered in their spread
  if (settings.rankBy !== 'demand' && !(building.capacity_sa_g > 0))
    add(
      'irregularity',
      numbered(({ storey }) => storey),
      slope_k * Math.sqrt(irregularityOf(building, context).varianceRest),
    );
  if (settings.rankBy === 'people') addPeople(building, context, people.sigma, add);
  // drawings settle what era tables and the years around a change of edition leave open
  const byDrawings = !(building.capacity_sa_g > 0) && !(building.design_base_shear_coefficient > 0);
  if (settings.rankBy !== 'demand' && byDrawings) {
    const { eraTable } = settings.spreads;
    const learnt = isChecked(building, cases.list[0]!, context)
      ? 0
      : eraTable * eraTable * designedShare(cases, context);
    add('drawings', numbered(edition), slope_k * Math.sqrt(learnt));
  }
  return { parts, learnable };
}

/** Chance that the building was designed for earthquakes: the drawings of others state no coefficient, and nothing takes their table's doubt away. */
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

/** The nodes gathered within each cell, cells apart: the error of the period is no unknown that a survey finds out. */
function gathered(
  nodes: Mixture,
  cells: readonly Cell[],
): { readonly parts: Mixture; readonly cells: readonly Cell[]; readonly cellOf: Int32Array } {
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
  return { parts, cells, cellOf: Int32Array.from(cellOf) };
}

/** People: the use where it is not known, then a count where there is none. */
function addPeople(
  { use, occupants_peak, floor_area_m2: area }: Building,
  { settings: { spreads } }: AssessContext,
  sigma: number,
  add: (unknown: Learnable['unknown'], values: null, tau: number) => void,
): void {
  const counted = occupants_peak >= 0;
  const rooted = (variance: number): number => Math.sqrt(Math.max(variance, 0));
  const ofArea = counted ? 0 : area.sigma * area.sigma;
  // people that are counted leave the hours open, which the use tells
  const own = counted ? spreads.peopleCounted : spreads.peopleKnownUse;
  const knownUse = Math.min(sigma, rooted(own * own + ofArea));
  if (use === 'unknown') add('use', null, rooted(sigma * sigma - knownUse * knownUse));
  if (!counted) add('occupants', null, rooted(knownUse * knownUse - spreads.peopleCounted * spreads.peopleCounted));
}

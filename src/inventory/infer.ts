/**
 * Storeys, height and floor area of every building: what is given stands, what is blank is inferred with its spread.
 * Fractions of a storey (2.5: an attic) are kept: the attic adds its share of a storey height.
 */
import { USES } from '../engineering/building.js';
import type { Origin, Use } from '../engineering/building.js';
import { storeyHeight, storeysFromHeight } from '../engineering/prior/storey-height.js';
import { SIZE_DEFAULTS, SPREAD } from './defaults.js';
import type { Sizes } from './sizes.js';

/** One attribute of every building, filled; `fill` numbers the entry of the fills that says how. */
export interface FilledColumn {
  readonly value: Float64Array;
  readonly fill: Int32Array;
}

/** How a value was filled: few ways serve many buildings, so that each is kept once. */
export interface Fill {
  readonly origin: Origin;
  /** Spread of the natural logarithm, 0 when given. */
  readonly sigma: number;
  readonly rule: string;
}

export interface Inferred {
  readonly storeys_above: FilledColumn;
  readonly height_m: FilledColumn;
  readonly floor_area_m2: FilledColumn;
  /** 1 where nothing says how large the building is nor what it is for. */
  readonly sizeless: Uint8Array;
  readonly fills: readonly Fill[];
}

/** What the checks found that inference must know; arrays over the buildings, 1 where it holds. */
export interface Doubts {
  readonly storeysDoubted: Uint8Array;
  /** The storeys given may be those of a unit. */
  readonly storeysOfUnits: Uint8Array;
  readonly heightContradicted: Uint8Array;
}

const GIVEN: Fill = { origin: 'given', sigma: 0, rule: '' };

class Fills {
  readonly list: Fill[] = [];
  readonly #ofRule = new Map<string, number[]>();

  // By the rule, which has one origin and a few spreads: a key of all three would have the spread printed for every building.
  number({ origin, sigma, rule }: Fill): number {
    let numbers = this.#ofRule.get(rule);
    if (numbers === undefined) this.#ofRule.set(rule, (numbers = []));
    for (const number of numbers) {
      const fill = this.list[number]!;
      if (fill.sigma === sigma && fill.origin === origin) return number;
    }
    numbers.push(this.list.length);
    this.list.push({ origin, sigma, rule });
    return this.list.length - 1;
  }
}

// The rules of one use, in words.
function rulesOf(use: Use) {
  const many = storeyHeight(use, 2);
  const single = storeyHeight(use, 1);
  const { storeys, plate_m2 } = SIZE_DEFAULTS[use];
  const height = (h: number): string => `storeys × ${h} m per storey (${use}) [judgement]`;
  return {
    many: height(many.height_m),
    single: height(single.height_m),
    firstStorey: `first storey as given, the others × ${many.height_m} m (${use}) [judgement]`,
    fromHeight: `height ÷ ${many.height_m} m per storey (${use}), rounded [judgement]`,
    fromHall: `one storey: a hall (${use}) up to ${1.5 * single.height_m} m high [judgement]`,
    defaultStoreys: `${storeys} ${storeys === 1 ? 'storey' : 'storeys'} by use (${use}) [judgement]`,
    defaultArea: `${plate_m2} m² per storey by use (${use}) × storeys [judgement]`,
  };
}

const RULES = USES.map(rulesOf);
const RULE = {
  totalLessBelow: 'storeys in all less storeys below ground',
  total: 'storeys in all, basements not known',
  fromPlan: 'floor area ÷ plan area, rounded',
  area: 'plan area × storeys',
  contradicted: `given; the storeys contradict it, so its spread is widened to ${SPREAD.contradicted}`,
  ofUnits: 'storeys of units, perhaps not of the building [judgement]',
  countedTwice: 'sum of the parts; one of them may be the whole building',
  someParts: 'sum of the parts that give an area; some give none',
};

const OF_UNITS: Fill = { origin: 'given', sigma: SPREAD.ofUnits, rule: RULE.ofUnits };

interface Known {
  readonly use: number;
  readonly above: number;
  readonly ofUnits: boolean;
  readonly below: number;
  readonly total: number;
  readonly height_m: number;
  readonly firstStorey_m: number;
  readonly area_m2: number;
  readonly plan_m2: number;
}

interface Value extends Fill {
  readonly value: number;
}

function inferStoreys(known: Known): Value {
  const use = USES[known.use] ?? 'unknown';
  const rules = RULES[known.use];
  const { above, below, total, height_m, area_m2, plan_m2 } = known;
  if (above > 0) return { value: above, ...(known.ofUnits ? OF_UNITS : GIVEN) };
  if (total - below >= 1) return { value: total - below, sigma: 0, origin: 'inferred', rule: RULE.totalLessBelow };
  if (height_m > 0) {
    const { storeys, sigma } = storeysFromHeight(use, height_m);
    const hall = storeys === 1 && storeyHeight(use, 1) !== storeyHeight(use, 2);
    return { value: storeys, sigma, origin: 'inferred', rule: (hall ? rules?.fromHall : rules?.fromHeight) ?? '' };
  }
  if (total >= 1) return { value: total, sigma: SPREAD.fromTotal, origin: 'inferred', rule: RULE.total };
  if (area_m2 > 0 && plan_m2 > 0) {
    const value = Math.max(1, Math.round(area_m2 / plan_m2));
    return { value, sigma: SPREAD.fromPlan, origin: 'inferred', rule: RULE.fromPlan };
  }
  return {
    value: SIZE_DEFAULTS[use].storeys,
    sigma: SPREAD.defaultStoreys,
    origin: 'default',
    rule: rules?.defaultStoreys ?? '',
  };
}

function inferHeight(known: Known, storeys: Value): Value {
  const use = USES[known.use] ?? 'unknown';
  const rules = RULES[known.use];
  const n = storeys.value;
  const each = storeyHeight(use, n);
  const sigma = both(each.sigma, storeys.sigma);
  const origin = storeys.origin === 'default' ? 'default' : 'inferred';
  if (known.firstStorey_m > 0) {
    const value = known.firstStorey_m + Math.max(0, n - 1) * storeyHeight(use, 2).height_m;
    return { value, sigma, origin, rule: rules?.firstStorey ?? '' };
  }
  return { value: n * each.height_m, sigma, origin, rule: (n <= 1 ? rules?.single : rules?.many) ?? '' };
}

function inferArea(known: Known, storeys: Value): Value {
  const use = USES[known.use] ?? 'unknown';
  if (known.plan_m2 > 0) {
    const origin = storeys.origin === 'default' ? 'default' : 'inferred';
    return {
      value: known.plan_m2 * storeys.value,
      sigma: both(SPREAD.fromPlan, storeys.sigma),
      origin,
      rule: RULE.area,
    };
  }
  const value = SIZE_DEFAULTS[use].plate_m2 * storeys.value;
  return {
    value,
    sigma: both(SPREAD.defaultArea, storeys.sigma),
    origin: 'default',
    rule: RULES[known.use]?.defaultArea ?? '',
  };
}

function both(a: number, b: number): number {
  return b === 0 ? a : Math.sqrt(a * a + b * b);
}

/** Fills the sizes of all buildings; the plan areas are those of `plans`. */
export function inferSizes(sizes: Sizes, plans: { readonly area_m2: Float64Array }, doubts: Doubts): Inferred {
  const rows = sizes.rowCount;
  const fills = new Fills();
  const given = fills.number(GIVEN);
  const ofUnits = fills.number(OF_UNITS);
  const contradicted = fills.number({ origin: 'given', sigma: SPREAD.contradicted, rule: RULE.contradicted });
  const someParts = fills.number({ origin: 'inferred', sigma: SPREAD.partialArea, rule: RULE.someParts });
  const countedTwice = fills.number({ origin: 'inferred', sigma: SPREAD.countedTwice, rule: RULE.countedTwice });
  const column = (): FilledColumn => ({ value: new Float64Array(rows), fill: new Int32Array(rows).fill(given) });
  const storeys = column();
  const height = column();
  const floor = column();
  const sizeless = new Uint8Array(rows);
  const none = new Float64Array(rows).fill(NaN);
  const aboveAt = sizes.storeys_above ?? none;
  const heightAt = sizes.height_m ?? none;
  const areaAt = sizes.floor_area_m2 ?? none;
  const belowAt = sizes.storeys_below ?? none;
  const totalAt = sizes.storeys_total ?? none;
  const firstStoreyAt = sizes.first_storey_height_m ?? none;
  const put = ({ value, fill }: FilledColumn, at: number, found: Value): void => {
    value[at] = found.value;
    fill[at] = found.sigma === 0 && found.origin === 'given' ? given : fills.number(found);
  };

  for (let at = 0; at < rows; at += 1) {
    const above = doubts.storeysDoubted[at] === 1 ? NaN : aboveAt[at]!;
    const height_m = heightAt[at]!;
    const area_m2 = areaAt[at]!;
    const isOfUnits = above > 0 && doubts.storeysOfUnits[at] === 1;
    if (above > 0) storeys.value[at] = above;
    if (isOfUnits) storeys.fill[at] = ofUnits;
    if (height_m > 0) {
      height.value[at] = height_m;
      if (doubts.heightContradicted[at] === 1) height.fill[at] = contradicted;
    }
    if (area_m2 > 0) {
      floor.value[at] = area_m2;
      if (sizes.partial[at] === 1) floor.fill[at] = someParts;
      else if (sizes.partial[at] === 2) floor.fill[at] = countedTwice;
    }
    // Most buildings have all three; the rest is for the others.
    if (above > 0 && height_m > 0 && area_m2 > 0) continue;
    const known: Known = {
      use: sizes.use[at] as number,
      above,
      ofUnits: isOfUnits,
      below: belowAt[at]!,
      total: totalAt[at]!,
      height_m,
      firstStorey_m: firstStoreyAt[at]!,
      area_m2,
      plan_m2: plans.area_m2[at] as number,
    };
    const found = inferStoreys(known);
    put(storeys, at, found);
    if (!(height_m > 0)) put(height, at, inferHeight(known, found));
    if (!(area_m2 > 0)) put(floor, at, inferArea(known, found));
    const nothing = found.origin === 'default' && !(area_m2 > 0) && !(known.plan_m2 > 0);
    if (nothing && USES[known.use] === 'unknown') sizeless[at] = 1;
  }
  return { storeys_above: storeys, height_m: height, floor_area_m2: floor, sizeless, fills: fills.list };
}

/**
 * The edges of lists of some lengths, the rungs, from the longest list to the shortest: what is known of any place in the order is read
 * between two of them. Errors in common move the edge of a short list otherwise than that of a long one, and the fewer buildings stand
 * near an edge the less sure it is.
 */
import { exp, ln } from '../numeric/elementary.js';
import { HEIGHT_NODES as EDGE_NODES } from '../numeric/nodes.js';
import { normalCdf } from '../numeric/normal.js';
import type { Exceedance } from './exceedance.js';
import { labelOf } from './mixture.js';
import type { Mixture } from './mixture.js';
import { changedSpread, toOwn } from './shared.js';
import type { Common } from './shared.js';
import { SIMULATED_UNDER } from './simulate.js';

/** Mean, variance and third central moment of a number of buildings. */
interface Above {
  readonly count: number;
  readonly variance: number;
  readonly third: number;
}

/** What chance does to an edge, by rung: the buildings near it stand above or below. */
interface Chance {
  /** Mean, variance and third central moment of what it adds to x. */
  readonly apart: Float64Array;
  readonly unsure: Float64Array;
  readonly lean: Float64Array;
  /** What takes the number of others expected above to the place: a half, more among the last and less among the first. */
  readonly toPlaces: Float64Array;
}

/** What is known of the edges of lists of some lengths; from the longest list to the shortest, x rising. */
export interface Rungs extends Chance {
  /** ln S at which the list ends, on average of the draws of the common errors. */
  readonly x: Float64Array;
  /** What takes x to where the expected number of buildings, as all are seen from the edge of the list itself, is that many. */
  readonly toCurve: Float64Array;
  /** The number of buildings above x, for one draw of the common errors. */
  readonly above: readonly Above[];
  /** Variance that a part gains over that seen from the edge of the list: by zone, label and rung; null where no error is common. */
  readonly change: Float64Array | null;
  /** Third central moment of the edge as a part sees it, likewise. */
  readonly third: Float64Array | null;
}

/**
 * Up to so many places from an end of the order every building counts by itself, farther in one for so many more: there chance moves an
 * edge by little [judgement; twice as many moved the ends of 200,000 bands by 0.2 of a place on average].
 */
const EACH = 128;

/** Near enough to be read straight between: a factor of 1.3 to 1.9 in the odds from one to the next, for 200 to a million buildings [judgement]. */
const RUNGS = 48;

/** Lengths of lists whose edges are looked at, rising, evenly in log-odds; none where bands are simulated. */
export function rungPlaces(n: number): Float64Array {
  if (n < SIMULATED_UNDER) return new Float64Array(0);
  const reach = ln(2 * n - 1);
  return Float64Array.from({ length: RUNGS }, (_, rung) => n / (1 + exp(reach * (1 - (2 * rung) / (RUNGS - 1)))));
}

/**
 * The rungs of an `order` by median of buildings with these `mixtures`, seen from the edge of the list; errors in `common`, if any.
 */
export function rungsOf(
  places: Float64Array,
  curve: Exceedance,
  order: Int32Array,
  mixtures: readonly Mixture[],
  common: Common | undefined,
): Rungs | null {
  if (places.length === 0 || curve.places !== null) return null;
  const seen = Float64Array.from(places, (r) => curveAt(curve, r)).reverse();
  const x = common === undefined ? seen : common.draws.rungs.x;
  const spoken = spokesmen(order.length);
  const above = Array.from(x, (at) => {
    const sum = { count: 0, variance: 0, third: 0 };
    for (const { place, weight } of spoken) addAbove(sum, mixtures[order[place]!]!, order[place]!, at, common, weight);
    return sum;
  });
  return {
    x,
    toCurve: seen.map((y, rung) => y - x[rung]!),
    above,
    ...chanceOf(x, above, curve.n),
    change: common?.draws.rungs.change ?? null,
    third: common?.draws.rungs.third ?? null,
  };
}

/** The rungs as the others make them, for building i of `n`: at the ends of the order it is a good part of what stands there. */
export function withoutBuilding(
  rungs: Rungs,
  mixture: Mixture,
  i: number,
  n: number,
  common: Common | undefined,
): Rungs {
  const above = rungs.above.map((all, rung) => {
    const others = { ...all };
    addAbove(others, mixture, i, rungs.x[rung]!, common, -1);
    return { ...others, variance: Math.max(0, others.variance) };
  });
  return { ...rungs, above, ...chanceOf(rungs.x, above, n) };
}

function chanceOf(x: Float64Array, above: readonly Above[], n: number): Chance {
  const odds = above.map(({ count }) => logOdds(count, n));
  const at = above.map(({ count, variance, third }, rung) => {
    const moved = EDGE_NODES.z.map(
      (z) => xAtOdds(logOdds(count + countOff(variance, third, z), n), odds, x) - x[rung]!,
    );
    const moment = (of: (one: number) => number): number =>
      moved.reduce((sum, one, node) => sum + EDGE_NODES.weight[node]! * of(one), 0);
    const apart = moment((one) => one);
    return {
      apart,
      unsure: moment((one) => (one - apart) * (one - apart)),
      lean: moment((one) => (one - apart) * (one - apart) * (one - apart)),
      toPlaces: 0.5 - (variance > 0 ? third / (2 * variance) : 0),
    };
  });
  return {
    apart: Float64Array.from(at, ({ apart }) => apart),
    unsure: Float64Array.from(at, ({ unsure }) => unsure),
    lean: Float64Array.from(at, ({ lean }) => lean),
    toPlaces: Float64Array.from(at, ({ toPlaces }) => toPlaces),
  };
}

/**
 * By how much the expected number above differs at the edge where the true number is right, `z` standard errors off: a gamma variable
 * with the variance and the skewness of the number above, by the cube of Wilson and Hilferty (1931). Of a Poisson number above it is a gamma variable.
 */
function countOff(variance: number, third: number, z: number): number {
  const scale = variance > 0 ? third / variance : 0;
  const shape = variance / (scale * scale);
  // as good as normal
  if (!(shape < 1e6)) return z * Math.sqrt(variance);
  const root = Math.max(0, 1 - 1 / (9 * shape) + (Math.sign(scale) * z) / (3 * Math.sqrt(shape)));
  return scale * shape * (root * root * root - 1);
}

/** Log-odds of a count of n, kept off 0 and n. */
function logOdds(count: number, n: number): number {
  const least = 1e-3;
  const kept = Math.min(n - least, Math.max(least, count));
  return ln(kept / (n - kept));
}

/** x at which the log-odds are so, straight between the rungs and on beyond them; `odds` fall as x rises. */
function xAtOdds(wanted: number, odds: readonly number[], x: Float64Array): number {
  let j = 0;
  while (j < odds.length - 2 && odds[j + 1]! > wanted) j += 1;
  const fall = odds[j]! - odds[j + 1]!;
  return fall > 0 ? x[j]! + ((odds[j]! - wanted) / fall) * (x[j + 1]! - x[j]!) : x[j]!;
}

/** Places in the order that stand for `weight` of them: every one near the ends. */
function spokesmen(n: number): readonly { readonly place: number; readonly weight: number }[] {
  const all: { place: number; weight: number }[] = [];
  for (let place = 0; place < n;) {
    const weight = Math.min(n - place, Math.max(1, Math.floor(Math.min(place, n - place) / EACH)));
    all.push({ place: place + (weight >> 1), weight });
    place += weight;
  }
  return all;
}

/** Adds to `sum` whether building i stands above x, `times` over, for one draw of the common errors. */
function addAbove(
  sum: { -readonly [K in keyof Above]: Above[K] },
  mixture: Mixture,
  i: number,
  x: number,
  common: Common | undefined,
  times: number,
): void {
  const { weight, mean, sd, from, to } = mixture;
  let above = 0;
  for (let k = from; k < to; k += 1) {
    const own = common === undefined ? sd[k]! : changedSpread(sd[k]!, toOwn(common, i, labelOf(mixture, k)));
    const gap = mean[k]! - x;
    above += weight[k]! * (own > 0 ? normalCdf(gap / own) : gap > 0 ? 1 : 0);
  }
  const variance = times * above * (1 - above);
  sum.count += times * above;
  sum.variance += variance;
  sum.third += variance * (1 - 2 * above);
}

/** x with F(x) = r, from the table. */
function curveAt({ value, low, step }: Exceedance, r: number): number {
  let [left, right] = [0, value.length - 1];
  while (right - left > 1) {
    const middle = (left + right) >> 1;
    if (value[middle]! > r) left = middle;
    else right = middle;
  }
  const fall = value[left]! - value[right]!;
  return low + step * (left + (fall > 0 ? Math.min(1, Math.max(0, (value[left]! - r) / fall)) : 0));
}

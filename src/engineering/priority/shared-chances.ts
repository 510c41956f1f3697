/** Chances of buildings given the draws of their common errors: averages over the draws, and what they do to a count. */
import { exp } from '../numeric/elementary.js';
import { INVERSE_ROOT_TWO_PI, cdfFrom, normalCdf } from '../numeric/normal.js';
import { NO_LABEL, labelOf } from './mixture.js';
import type { Mixture } from './mixture.js';
import { changedSpread, toOwn } from './shared.js';
import type { Common } from './shared.js';

/** Draws gathered into one position of the edge; fewer towards the ends, down to one: small chances hang on the ends. */
const EACH = 64;
/** Parts of mixtures looked at at every position. */
const MOST_PARTS = 200_000;
/** Below this chance, or above 1 less it, a building is left as it is. */
const CONTESTED = 1e-5;

/** Edge of draw d as the parts of a label in a zone see it: less the errors they have in common. */
function edgeSeen({ shared, draws }: Common, zone: number, label: number, d: number): number {
  const { eraLoad, siteLoad } = shared.zones[zone]!;
  const ofEra = label === NO_LABEL ? 0 : eraLoad * draws.ofLabel[label]![d]!;
  return draws.edge[d]! - siteLoad * draws.ofZone[zone]![d]! - ofEra;
}

/** Positions of the edge, with the share of the draws that stand there. */
interface Nodes {
  readonly at: Float64Array;
  readonly share: Float64Array;
}

/** How many draws each position stands for, from the lowest to the highest. */
function sizesOf(draws: number): readonly number[] {
  const sizes: number[] = [];
  for (let left = draws / 2, size = 1; left > 0; left -= sizes.at(-1)!, size = Math.min(EACH, 2 * size))
    sizes.push(Math.min(size, left));
  return [...sizes, ...[...sizes].reverse()];
}

/** The positions of the edge for one class: means of its sorted draws. */
function nodesOf(common: Common, zone: number, label: number): Nodes {
  const seen = common.draws.edge.map((_, d) => edgeSeen(common, zone, label, d)).sort();
  const sizes = sizesOf(seen.length);
  let from = 0;
  const at = Float64Array.from(sizes, (size) => {
    const some = seen.subarray(from, (from += size));
    return some.reduce((sum, x) => sum + x, 0) / size;
  });
  return { at, share: Float64Array.from(sizes, (size) => size / seen.length) };
}

/**
 * The `chance` of each building to be among the first `places`, from its variance seen from the edge, worked out anew as the average
 * over the draws where the buildings in doubt are few enough to afford it: edge less common errors is not quite normal.
 */
export function averagedChances(
  chance: Float64Array,
  mixtures: readonly Mixture[],
  common: Common,
  places: number,
): Float64Array {
  const contested = Array.from(chance.keys()).filter((i) => chance[i]! > CONTESTED && chance[i]! < 1 - CONTESTED);
  const parts = contested.reduce((sum, i) => sum + mixtures[i]!.to - mixtures[i]!.from, 0);
  if (contested.length === 0 || parts > MOST_PARTS) return chance;
  const nodes = new Map<number, Nodes>();
  const nodesFor = (zone: number, label: number): Nodes => {
    const key = zone * (NO_LABEL + 1) + label;
    let found = nodes.get(key);
    if (found === undefined) nodes.set(key, (found = nodesOf(common, zone, label)));
    return found;
  };
  const average = new Float64Array(contested.length);
  /** How fast the chance grows where the edge falls. */
  const slope = new Float64Array(contested.length);
  contested.forEach((i, at) => {
    const mixture = mixtures[i]!;
    const { weight, mean, sd, from, to } = mixture;
    for (let k = from; k < to; k += 1) {
      const label = labelOf(mixture, k);
      const own = changedSpread(sd[k]!, toOwn(common, i, label));
      const { at: positions, share } = nodesFor(common.shared.zone[i]!, label);
      for (let n = 0; n < positions.length; n += 1) {
        const w = weight[k]! * share[n]!;
        const x = positions[n]!;
        if (own > 0) {
          const u = (mean[k]! - x) / own;
          const e = exp(-0.5 * u * u);
          average[at]! += w * cdfFrom(u, e);
          slope[at]! += (w * INVERSE_ROOT_TWO_PI * e) / own;
        } else if (mean[k]! > x) average[at]! += w;
      }
    }
  });
  // the edges, read from tables, moved together by what makes the chances sum to the places left
  let missing = places;
  let growth = 0;
  for (const p of chance) missing -= p;
  contested.forEach((i, at) => {
    missing += chance[i]! - average[at]!;
    growth += slope[at]!;
  });
  const move = growth > 0 ? missing / growth : 0;
  const out = chance.slice();
  contested.forEach((i, at) => {
    out[i] = Math.min(1, Math.max(0, average[at]! + move * slope[at]!));
  });
  return out;
}

/** Chances in the variance of a count: enough for its first digits. */
const MOST_CHANCES = 40_000;

/**
 * Variance of the number of wrong places among the buildings `listed`, whose `mixtures` are seen from the edge. Given a draw of the
 * common errors the buildings are independent, but for the number of places, which is given: `all` is Σ p (1 - p) over all buildings.
 */
export function wrongVariance(
  listed: ArrayLike<number>,
  mixtures: readonly Mixture[],
  common: Common,
  all: number,
): number {
  const { length } = common.draws.edge;
  // whole pairs of a draw and its negative
  const every = 2 * Math.max(1, Math.ceil((length * listed.length) / MOST_CHANCES / 2));
  const draws = Array.from({ length: length / 2 }, (_, pair) => pair)
    .filter((pair) => (2 * pair) % every === 0)
    .flatMap((pair) => [2 * pair, 2 * pair + 1]);
  let within = 0;
  let sum = 0;
  let squares = 0;
  for (const d of draws) {
    let wrong = 0;
    let variance = 0;
    for (let place = 0; place < listed.length; place += 1) {
      const chance = chanceGiven(mixtures, common, listed[place]!, d);
      variance += chance * (1 - chance);
      wrong += 1 - chance;
    }
    within += variance * keptOf(variance, all);
    sum += wrong;
    squares += wrong * wrong;
  }
  const count = draws.length;
  return within / count + Math.max(0, squares / count - (sum / count) * (sum / count));
}

/** What the given number of places leaves of the variance of the number of those on the list: one in is one out. */
export function keptOf(variance: number, all: number): number {
  return all > 0 ? Math.max(0, 1 - variance / all) : 0;
}

/** Chance that building i stands above the edge of draw d. */
function chanceGiven(mixtures: readonly Mixture[], common: Common, i: number, d: number): number {
  const mixture = mixtures[i]!;
  const { weight, mean, sd, from, to } = mixture;
  let chance = 0;
  for (let k = from; k < to; k += 1) {
    const label = labelOf(mixture, k);
    const own = changedSpread(sd[k]!, toOwn(common, i, label));
    const gap = mean[k]! - edgeSeen(common, common.shared.zone[i]!, label, d);
    chance += weight[k]! * (own > 0 ? normalCdf(gap / own) : gap > 0 ? 1 : 0);
  }
  return chance;
}

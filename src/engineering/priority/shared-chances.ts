/** Chances of buildings given the draws of their common errors: averages over the draws, and what they do to a count. */
import { exp } from '../numeric/elementary.js';
import { INVERSE_ROOT_TWO_PI, cdfFrom } from '../numeric/normal.js';
import { NO_LABEL, labelOf } from './mixture.js';
import type { Mixture } from './mixture.js';
import { changedSpread, toOwn } from './shared.js';
import type { Common, SharedDraws } from './shared.js';

/** Chance that building i stands above the edge of draw d, and how fast it grows where the edge falls. */
function chanceGiven(
  mixtures: readonly Mixture[],
  common: Common,
  i: number,
  d: number,
): { readonly chance: number; readonly slope: number } {
  const { shared, draws } = common;
  const zone = shared.zone[i]!;
  const { eraLoad, siteLoad } = shared.zones[zone]!;
  const mixture = mixtures[i]!;
  const { weight, mean, sd, from, to } = mixture;
  const edge = draws.edge[d]! - siteLoad * draws.ofZone[zone]![d]!;
  let chance = 0;
  let slope = 0;
  for (let k = from; k < to; k += 1) {
    const label = labelOf(mixture, k);
    const x = label === NO_LABEL ? edge : edge - eraLoad * draws.ofLabel[label]![d]!;
    const own = changedSpread(sd[k]!, toOwn(common, i, label));
    const w = weight[k]!;
    if (own > 0) {
      const u = (mean[k]! - x) / own;
      const e = exp(-0.5 * u * u);
      chance += w * cdfFrom(u, e);
      slope += (w * INVERSE_ROOT_TWO_PI * e) / own;
    } else if (mean[k]! > x) chance += w;
  }
  return { chance, slope };
}

/** Some of the draws, in whole pairs of one and its negative. */
function someDraws({ edge }: SharedDraws, count: number): readonly number[] {
  const every = Math.max(1, Math.ceil(edge.length / count));
  return Array.from({ length: Math.ceil(edge.length / 2 / every) }, (_, i) => [
    2 * i * every,
    2 * i * every + 1,
  ]).flat();
}

/** Parts of mixtures looked at in all draws together. */
const MOST_PARTS = 12_000_000;
const LEAST_DRAWS = 64;
/** Below this chance, or above 1 less it, a building is left as it is. */
const CONTESTED = 1e-5;

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
  if (contested.length === 0 || MOST_PARTS / parts < LEAST_DRAWS) return chance;
  const draws = someDraws(common.draws, MOST_PARTS / parts);
  const average = new Float64Array(contested.length);
  const slope = new Float64Array(contested.length);
  contested.forEach((i, at) => {
    for (const d of draws) {
      const given = chanceGiven(mixtures, common, i, d);
      average[at]! += given.chance / draws.length;
      slope[at]! += given.slope / draws.length;
    }
  });
  // the edges, read from tables, moved together by what makes the chances sum to the places left
  let left = places;
  chance.forEach((p) => (left -= p));
  for (const i of contested) left += chance[i]!;
  let missing = left;
  let growth = 0;
  for (let at = 0; at < average.length; at += 1) {
    missing -= average[at]!;
    growth += slope[at]!;
  }
  const move = growth > 0 ? missing / growth : 0;
  const out = chance.slice();
  contested.forEach((i, at) => {
    out[i] = Math.min(1, Math.max(0, average[at]! + move * slope[at]!));
  });
  return out;
}

/** Draws in the variance of a count: enough for its first digits. */
const MOST_CHANCES = 200_000;

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
  const draws = someDraws(common.draws, MOST_CHANCES / listed.length);
  let within = 0;
  let sum = 0;
  let squares = 0;
  for (const d of draws) {
    let wrong = 0;
    let variance = 0;
    for (let place = 0; place < listed.length; place += 1) {
      const { chance } = chanceGiven(mixtures, common, listed[place]!, d);
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

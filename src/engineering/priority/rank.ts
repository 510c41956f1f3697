/**
 * Ranks with their certainty, in closed form, from the mixtures of ln S of all buildings.
 * Order by median; chance of belonging to the first n; rank band; tie groups; expected wrong places.
 */
import { exp } from '../numeric/elementary.js';
import { mixtureCdf, mixtureMoments, mixtureQuantile } from './mixture.js';
import type { Mixture } from './mixture.js';
import { exceedance } from './exceedance.js';
import type { Exceedance } from './exceedance.js';
import { beats } from './pairwise.js';
import { SIMULATED_UNDER, simulate } from './simulate.js';
import type { Simulated } from './simulate.js';

export interface RankInput {
  readonly id: readonly string[];
  readonly mixtures: readonly Mixture[];
  /** Median ln S of each building. */
  readonly median: ArrayLike<number>;
  /** Orders buildings of equal median: the larger first. */
  readonly people: ArrayLike<number>;
}

export interface Ranking {
  /** Building indices, first rank first. */
  readonly order: Int32Array;
  /** Per building: rank from 1. */
  readonly rank: Int32Array;
  readonly chance: Float64Array;
  readonly rankBest: Int32Array;
  readonly rankWorst: Int32Array;
  readonly tieGroup: Int32Array;
  /** ln S at which the list ends; -Infinity when the list holds every building. */
  readonly threshold: number;
  readonly expectedWrong: number;
  /** Buildings in the largest block of equal medians. */
  readonly largestEqualBlock: number;
}

/** The leader of a tie group is told from the first building it beats with this chance [judgement]. */
const TOLD_APART = 0.8;
const Z95 = 1.6448536269514722;

/** Medians equal to this many decimals are equal. */
export function roundedMedian(value: number): number {
  return Math.round(value * 1e9) / 1e9;
}

/** Priority as it is shown: S over that of the portfolio's median building, from the two natural logarithms. */
export function relativePriority(lnPriority: number, lnOfMedian: number): number {
  return exp(lnPriority - lnOfMedian);
}

/**
 * Order by median, the largest first; equal after rounding: larger people first, then id in code units. Keys and indices are packed
 * into 64-bit words, because a native sort of words is ten times as fast as a comparing one.
 */
export function orderOf({ id, median, people }: RankInput): Int32Array {
  const n = id.length;
  let largest = -Infinity;
  for (let i = 0; i < n; i += 1) if (median[i]! > largest) largest = median[i]!;
  const words = new BigUint64Array(n);
  const halves = new Uint32Array(words.buffer);
  const key = new Float64Array(n);
  for (let i = 0; i < n; i += 1) {
    // 40 bits of steps of 1e-9 below the largest reach 1,099 units of ln S; farther down all are equal, and sorted below
    const steps = Math.min(Math.round((largest - median[i]!) * 1e9), 0xffffffffff);
    key[i] = steps;
    halves[2 * i + 1] = Math.floor(steps / 256);
    halves[2 * i] = ((steps % 256) * 0x1000000 + i) >>> 0;
  }
  words.sort();
  const order = new Int32Array(n);
  for (let place = 0; place < n; place += 1) order[place] = halves[2 * place]! & 0xffffff;
  for (let place = 0; place < n;) {
    let end = place + 1;
    while (end < n && key[order[end]!] === key[order[place]!]) end += 1;
    if (end - place > 1) {
      order
        .subarray(place, end)
        .sort((a, b) => people[b]! - people[a]! || (id[a]! < id[b]! ? -1 : id[a]! > id[b]! ? 1 : 0));
    }
    place = end;
  }
  return order;
}

/** Ranks `input` with a list of `listSize` places (at least 1); under 200 buildings chances and bands are simulated from `seed`. */
export function rankAll(input: RankInput, listSize: number, seed: number): Ranking {
  const n = input.id.length;
  const order = orderOf(input);
  const rank = new Int32Array(n);
  order.forEach((building, place) => (rank[building] = place + 1));
  const all = listSize >= n;
  const curve = exceedance(input.mixtures);
  const threshold = all ? -Infinity : curve.threshold(listSize);
  const { chance, rankBest, rankWorst } =
    n < SIMULATED_UNDER
      ? simulate(input.id, input.mixtures, listSize, seed)
      : closed(input.mixtures, curve, all ? null : threshold, listSize);
  // the rank itself lies in its band, also where equal medians or few buildings would put it a place outside
  for (let i = 0; i < n; i += 1) {
    rankBest[i] = Math.min(rankBest[i]!, rank[i]!);
    rankWorst[i] = Math.max(rankWorst[i]!, rank[i]!);
  }
  let expectedWrong = 0;
  for (let place = 0; place < Math.min(listSize, n); place += 1) expectedWrong += 1 - chance[order[place]!]!;
  return {
    order,
    rank,
    chance,
    rankBest,
    rankWorst,
    tieGroup: tieGroups(order, input.mixtures),
    threshold,
    expectedWrong,
    largestEqualBlock: largestBlock(order, input.median),
  };
}

function closed(
  mixtures: readonly Mixture[],
  curve: Exceedance,
  threshold: number | null,
  listSize: number,
): Simulated {
  const n = mixtures.length;
  const rankBest = new Int32Array(n);
  const rankWorst = new Int32Array(n);
  mixtures.forEach((m, i) => {
    rankBest[i] = bandEnd(curve.count, m, mixtureQuantile(m, 0.95, Z95, 1e-2), n, AT);
    rankWorst[i] = bandEnd(curve.countAt, m, mixtureQuantile(m, 0.05, -Z95, 1e-2), n, -AT);
  });
  return {
    chance: threshold === null ? new Float64Array(n).fill(1) : curve.chances(threshold, listSize),
    rankBest,
    rankWorst,
  };
}

/** Where parts have no spread the best rank counts only those above, the worst those at the same place too. */
const AT = 1e-9;

/** Expected rank of a building whose ln S is x: one more than the others expected above it. */
function bandEnd(count: (x: number) => number, own: Mixture, x: number, n: number, at: number): number {
  const others = count(x) - (1 - mixtureCdf(own, x + at));
  return Math.min(n, Math.max(1, Math.round(1 + others)));
}

/** From its leader down to the first building that the leader beats with a chance of at least 0.80; contiguous. */
function tieGroups(order: Int32Array, mixtures: readonly Mixture[]): Int32Array {
  const group = new Int32Array(order.length);
  let leader = 0;
  let label = 1;
  for (let place = 0; place < order.length; place += 1) {
    if (place > leader && toldApart(mixtures[order[leader]!]!, mixtures[order[place]!]!)) {
      leader = place;
      label += 1;
    }
    group[order[place]!] = label;
  }
  return group;
}

/** Settled from means and spreads where that is clear, by the whole mixtures otherwise. */
function toldApart(a: Mixture, b: Mixture): boolean {
  const p = mixtureMoments(a);
  const q = mixtureMoments(b);
  const spread = Math.sqrt(p.sd * p.sd + q.sd * q.sd);
  if (spread > 0) {
    const z = (p.mean - q.mean) / spread;
    if (z < 0.3) return false;
    if (z > 2) return true;
  }
  return beats(a, b) >= TOLD_APART;
}

function largestBlock(order: Int32Array, median: ArrayLike<number>): number {
  let largest = order.length === 0 ? 0 : 1;
  let run = 1;
  for (let place = 1; place < order.length; place += 1) {
    run = roundedMedian(median[order[place]!]!) === roundedMedian(median[order[place - 1]!]!) ? run + 1 : 1;
    if (run > largest) largest = run;
  }
  return largest;
}

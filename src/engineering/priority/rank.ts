/**
 * Ranks with their certainty, in closed form, from the mixtures of ln S of all buildings.
 * Order by median; chance of belonging to the first n; rank band; tie groups; expected wrong places.
 */
import { exp } from '../numeric/elementary.js';
import type { Mixture } from './mixture.js';
import { answerOf, exceedance, sharedChances, threshold } from './exceedance.js';
import type { SetAnswer, SetTask } from './exceedance.js';
import { bandsOf } from './rank-bands.js';
import type { Bands, Edge } from './rank-bands.js';
import { changedMixture, changesOf, drawShared, hasShared } from './shared.js';
import type { Common, SharedDraws } from './shared.js';
import { averagedChances, keptOf, wrongVariance } from './shared-chances.js';
import { rungPlaces, rungsOf, withoutBuilding } from './rungs.js';
import type { SharedErrors } from './shared-errors.js';
import { SIMULATED_UNDER, simulate } from './simulate.js';
import type { Simulated } from './simulate.js';
import { tieGroups } from './tie-groups.js';

export interface RankInput<Ids extends readonly string[] | Int32Array = readonly string[]> {
  /** Ids; where there are too many to simulate, numbers in their order do. */
  readonly id: Ids;
  readonly mixtures: readonly Mixture[];
  /** Median ln S of each building. */
  readonly median: ArrayLike<number>;
  /** Orders buildings of equal median: the larger first. */
  readonly people: ArrayLike<number>;
  /** Errors that buildings have in common; left out: none. */
  readonly shared?: SharedErrors | undefined;
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
  /** Ends of the range that holds the number of wrong places with a chance of 90 %, whole. */
  readonly wrongLow: number;
  readonly wrongHigh: number;
  /** Buildings in the largest block of equal medians. */
  readonly largestEqualBlock: number;
}

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
 * Order of values, the largest first, and of equal ones by index; each with the steps of 1e-9 it lies below the largest: values of
 * equal steps are equal. Keys and indices are packed into 64-bit words, because a native sort of words is ten times as fast as a
 * comparing one; 2^24 values at most.
 */
export function fallingOrder(values: ArrayLike<number>): { readonly order: Int32Array; readonly steps: Float64Array } {
  const n = values.length;
  let largest = -Infinity;
  for (let i = 0; i < n; i += 1) if (values[i]! > largest) largest = values[i]!;
  const words = new BigUint64Array(n);
  const halves = new Uint32Array(words.buffer);
  const steps = new Float64Array(n);
  for (let i = 0; i < n; i += 1) {
    // 40 bits of steps reach 1,099 units; farther down all are equal, and sorted below
    const step = Math.min(Math.round((largest - values[i]!) * 1e9), 0xffffffffff);
    steps[i] = step;
    halves[2 * i + 1] = Math.floor(step / 256);
    halves[2 * i] = ((step % 256) * 0x1000000 + i) >>> 0;
  }
  words.sort();
  const order = new Int32Array(n);
  for (let place = 0; place < n; place += 1) order[place] = halves[2 * place]! & 0xffffff;
  return { order, steps };
}

/** Order by median, the largest first; equal after rounding: larger people first, then id in code units. */
export function orderOf({ id, median, people }: RankInput<readonly string[] | Int32Array>): Int32Array {
  const n = id.length;
  const { order, steps } = fallingOrder(median);
  for (let place = 0; place < n;) {
    let end = place + 1;
    while (end < n && steps[order[end]!] === steps[order[place]!]) end += 1;
    if (end - place > 1) {
      order
        .subarray(place, end)
        .sort((a, b) => people[b]! - people[a]! || (id[a]! < id[b]! ? -1 : id[a]! > id[b]! ? 1 : 0));
    }
    place = end;
  }
  return order;
}

/** What the chances and bands of every building are read from. */
export interface RankBasis extends Edge {
  readonly order: Int32Array;
  /** Distributions of ln S as seen from the edge of the list: what is common to all has no part in them. */
  readonly mixtures: readonly Mixture[];
  /** Draws of the common errors; null where there are none. */
  readonly draws: SharedDraws | null;
}

/** Expected numbers above and threshold of a list of `listSize` places: yields tasks, takes the answers of all sets of mixtures to each. */
export function* basisOf(
  mixtures: readonly Mixture[],
  count: number,
  listSize: number,
): Generator<SetTask, Pick<Edge, 'curve' | 'threshold'>, readonly SetAnswer[]> {
  const curve = yield* exceedance(mixtures, count);
  return { curve, threshold: listSize >= count ? -Infinity : yield* threshold(listSize, curve) };
}

/** The same with the order, of all mixtures as one set; common errors are drawn with `seed`. */
export function rankBasis(input: RankInput<readonly string[] | Int32Array>, listSize: number, seed: number): RankBasis {
  const { id, shared } = input;
  const rungs = rungPlaces(id.length);
  const draws = hasShared(shared) ? drawShared(input.mixtures, shared, listSize, seed, rungs) : null;
  const common = commonTo(input, { draws });
  const mixtures =
    common === undefined ? input.mixtures : input.mixtures.map((m, i) => changedMixture(m, changesOf(common, i)));
  const steps = basisOf(mixtures, id.length, listSize);
  let next = steps.next();
  while (next.done !== true) next = steps.next([answerOf(mixtures, next.value)]);
  const order = orderOf(input);
  return { order, mixtures, draws, ...next.value, rungs: rungsOf(rungs, next.value.curve, order, mixtures, common) };
}

/** Ranks `input` with a list of `listSize` places (at least 1); under 200 buildings chances and bands are simulated from `seed`. */
export function rankAll(
  input: RankInput<readonly string[] | Int32Array>,
  listSize: number,
  seed: number,
  basis: RankBasis = rankBasis(input, listSize, seed),
  tieGroup: Int32Array = tieGroups(basis.order, basis.mixtures, commonTo(input, basis)),
  bands?: Bands,
): Ranking {
  const n = input.id.length;
  const { order, mixtures } = basis;
  const rank = new Int32Array(n);
  order.forEach((building, place) => (rank[building] = place + 1));
  const listed = order.subarray(0, Math.min(listSize, n));
  const common = commonTo(input, basis);
  const simulated =
    n < SIMULATED_UNDER
      ? simulate(Array.from<string | number>(input.id).map(String), mixtures, listed, listSize, seed, common)
      : null;
  const { chance, rankBest, rankWorst } =
    simulated ?? closed(bands ?? bandsOf(mixtures, basis, common?.shared.zone), basis, listSize, common);
  // the rank itself lies in its band, also where equal medians or few buildings would put it a place outside
  for (let i = 0; i < n; i += 1) {
    rankBest[i] = Math.min(rankBest[i]!, rank[i]!);
    rankWorst[i] = Math.max(rankWorst[i]!, rank[i]!);
  }
  let expectedWrong = 0;
  let doubt = 0;
  for (const building of listed) {
    const p = chance[building]!;
    expectedWrong += 1 - p;
    doubt += p * (1 - p);
  }
  const all = chance.reduce((sum, p) => sum + p * (1 - p), 0);
  const variance =
    simulated === null && common !== undefined
      ? wrongVariance(listed, mixtures, common, all)
      : doubt * keptOf(doubt, all);
  const reach = Z95 * Math.sqrt(variance);
  const within = (wrong: number): number => Math.min(listed.length, Math.max(0, Math.round(wrong)));
  return {
    order,
    rank,
    chance,
    rankBest,
    rankWorst,
    tieGroup,
    threshold: basis.threshold,
    expectedWrong,
    wrongLow: simulated?.wrongLow ?? within(expectedWrong - reach),
    wrongHigh: simulated?.wrongHigh ?? within(expectedWrong + reach),
    largestEqualBlock: largestBlock(order, input.median),
  };
}

/** The common errors with their draws, where there are any. */
export function commonTo(
  { shared }: Pick<RankInput, 'shared'>,
  { draws }: Pick<RankBasis, 'draws'>,
): Common | undefined {
  return shared === undefined || draws === null ? undefined : { shared, draws };
}

/** At this many places from an end of the order a building's own chance is no matter any more. */
const NEAR_END = 16;

/** The bands with those of the first and the last buildings read from the others alone. */
function atEnds(
  bands: Bands,
  { order, mixtures, curve, threshold: x, rungs }: RankBasis,
  common: Common | undefined,
): Bands {
  if (rungs === null) return bands;
  for (const i of [...order.subarray(0, NEAR_END), ...order.subarray(-NEAR_END)]) {
    const others = withoutBuilding(rungs, mixtures[i]!, i, order.length, common);
    const own = bandsOf([mixtures[i]!], { curve, threshold: x, rungs: others }, common?.shared.zone.subarray(i));
    bands.rankBest[i] = own.rankBest[0]!;
    bands.rankWorst[i] = own.rankWorst[0]!;
  }
  return bands;
}

function closed(
  bands: Bands,
  basis: RankBasis,
  listSize: number,
  common: Common | undefined,
): Pick<Simulated, 'chance' | 'rankBest' | 'rankWorst'> {
  const { rankBest, rankWorst } = atEnds(bands, basis, common);
  const n = rankBest.length;
  if (listSize >= n) return { chance: new Float64Array(n).fill(1), rankBest, rankWorst };
  const chance = sharedChances(bands, listSize);
  return {
    chance: common === undefined ? chance : averagedChances(chance, basis.mixtures, common, listSize),
    rankBest,
    rankWorst,
  };
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

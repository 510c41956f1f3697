/**
 * What it is worth to learn of a building before the list is drawn up.
 *
 * Two actions: the building is on the list or not. On it, it is worth its S, and takes the place of one worth the cut T. What is
 * learnt changes the expectation of S; learning is worth E[max(E[S | learnt], T)] less max(E[S], T): the expected value of partial
 * perfect information. The list is drawn up by medians: S counts as the median that is left once everything a survey can find out is
 * known, so that the spread nobody can find out weighs in no class of buildings more than in another. For a lognormal S of which τ can
 * be learnt this is m Φ(d1) - T Φ(d2) - max(m - T, 0) with m the median times exp(τ²/2) (Raiffa and Schlaifer 1961, from memory; the
 * closed form of an option on a lognormal).
 */
import { exp, ln } from '../numeric/elementary.js';
import { LEARNT_NODES } from '../numeric/nodes.js';
import { normalCdf, tabledCdf } from '../numeric/normal.js';
import { learnt, learntRoom } from './learnable.js';
import type { Learnt, Unknown, Unknowns } from './learnable.js';
import { mixtureCdf } from './mixture.js';
import type { Mixture } from './mixture.js';

/** The edge of the list in ln S. */
export interface Edge {
  /** Where the true list ends: above it a building belongs. */
  readonly threshold: number;
  /** What a building must exceed to take another's place. */
  readonly cut: number;
  /** Chance of belonging of the building whose place it takes. */
  readonly chance: number;
  /** What counts as 1. */
  readonly unit: number;
}

/**
 * The edge of a list of `listSize` that does not hold all, from the `order` by `median` and the threshold. Today the list ends at the median
 * of its last building, which lies below the threshold: each median has lost its spread. The more is learnt the farther the medians
 * spread, and with everything known the list ends at the threshold. Cut and chance are taken halfway [judgement: in simulated worlds such
 * a plan mends as much as with either end or more, and keeps its promises].
 */
export function edgeOf(
  { order, threshold }: { readonly order: ArrayLike<number>; readonly threshold: number },
  { median, mixtures }: { readonly median: ArrayLike<number>; readonly mixtures: readonly Mixture[] },
  listSize: number,
): Edge {
  const at = (place: number): number => median[order[place]!]!;
  const today = 0.5 * (at(listSize - 1) + at(listSize));
  const reach = Math.max(1, Math.round(NEAR * listSize));
  const [from, to] = [Math.max(0, listSize - reach), Math.min(order.length, listSize + reach)];
  let chance = 0;
  for (let place = from; place < to; place += 1)
    chance += (1 - mixtureCdf(mixtures[order[place]!]!, threshold)) / (to - from);
  return {
    threshold,
    cut: 0.5 * (today + threshold),
    chance: 0.5 * (chance + KNOWN_CHANCE),
    unit: at(Math.floor((order.length - 1) / 2)),
  };
}

/** Chance of belonging at the threshold itself, where the list ends when everything is known. */
export const KNOWN_CHANCE = 0.5;
/** Places either side of the end of the list, as a share of it, over which the chance of belonging there is averaged. */
const NEAR = 0.1;

/** What every set of unknowns is worth; set s holds unknown i where bit i of s is 1. */
export interface Worth {
  readonly unknowns: readonly Unknown[];
  /** Value of learning the set, in units of S; 0 for the empty one. */
  readonly value: Float64Array;
  /**
   * Twice the places that are wrong through the building once the set is learnt, as a building wrongly in and one wrongly out are one wrong
   * place; of the empty set: today. Where who takes its place belongs with the chance ½: its chance of standing on the wrong side.
   */
  readonly wrongOf: (set: number, chance?: number) => number;
}

/** E[max(X - T, 0)] of a lognormal X of expectation m and standard deviation tau of its logarithm; tau 0: X is m. */
export function expectedExcess(m: number, tau: number, t: number): number {
  if (!(m > 0)) return 0;
  if (!(tau > 0)) return Math.max(m - t, 0);
  if (!(t > 0)) return m - t;
  const d1 = (ln(m / t) + 0.5 * tau * tau) / tau;
  return m * normalCdf(d1) - t * normalCdf(d1 - tau);
}

/**
 * No survey of the building is worth more. S itself is learnt, and on which side of what a survey leaves open it counts is not known here:
 * at most as its expectation where it might come onto the list, at least as its median where it might leave it.
 */
export function mostWorth({ weight, mean, sd, from, to }: Mixture, { cut, unit }: Edge): number {
  const t = exp(cut - unit);
  let enters = 0;
  let leaves = t;
  for (let i = from; i < to; i += 1) {
    const m = exp(mean[i]! - unit);
    enters += weight[i]! * expectedExcess(m * exp(0.5 * sd[i]! * sd[i]!), sd[i]!, t);
    // what it lacks is what it exceeds by, less the difference
    leaves += weight[i]! * (expectedExcess(m, sd[i]!, t) - m);
  }
  return Math.max(Math.min(enters, leaves), 0);
}

// A set takes microseconds, and a plan weighs a million of them: arrays of their own would cost as much again.
let room = learntRoom(256);
let sums = new Float64Array(3 * 256);

/** The worth of every set of what may be learnt of a building. */
export function worthOf({ parts, learnable }: Unknowns, { threshold, cut, chance, unit }: Edge): Worth {
  const n = parts.to - parts.from;
  const t = exp(cut - unit);
  const weights = parts.weight.slice(parts.from, parts.to);
  const total = weights.reduce((sum, value) => sum + value, 0);
  for (let i = 0; i < n; i += 1) weights[i]! /= total;
  const sets = 1 << learnable.length;
  const worths = worthsOf(parts, weights, learnt(n, learnable, sets - 1), unit);
  const m = worths.reduce((sum, value) => sum + value, 0);
  const value = new Float64Array(sets);
  if (room.of.length < n) room = learntRoom(2 * n);
  for (let set = 1; set < sets; set += 1) {
    const { classes, of, variance } = learnt(n, learnable, set, room);
    if (sums.length < 3 * classes) sums = new Float64Array(6 * classes);
    const weight = sums.subarray(0, classes).fill(0);
    const worth = sums.subarray(classes, 2 * classes).fill(0);
    const spread = sums.subarray(2 * classes, 3 * classes).fill(0);
    for (let i = 0; i < n; i += 1) {
      weight[of[i]!]! += weights[i]!;
      worth[of[i]!]! += worths[i]!;
      spread[of[i]!]! += weights[i]! * variance[i]!;
    }
    let excess = 0;
    for (let c = 0; c < classes; c += 1)
      if (weight[c]! > 0)
        excess += weight[c]! * expectedExcess(worth[c]! / weight[c]!, Math.sqrt(spread[c]! / weight[c]!), t);
    // rounding alone may take it below
    value[set] = Math.max(excess - Math.max(m - t, 0), 0);
  }
  const wrong = new Float64Array(sets).fill(NaN);
  return {
    unknowns: learnable.map(({ unknown }) => unknown),
    value,
    wrongOf: (set, other = chance) => {
      const found = (): number => wrongWith(parts, weights, learnt(n, learnable, set), threshold, other);
      if (other !== chance) return found();
      if (Number.isNaN(wrong[set]!)) wrong[set] = found();
      return wrong[set]!;
    },
  };
}

/** Weight times S of each part, as it counts: the median left in its class once everything is learnt, its expectation over what is learnt besides. */
function worthsOf(
  { mean, from }: Mixture,
  weights: Float64Array,
  { classes, of, variance }: Learnt,
  unit: number,
): Float64Array {
  const weight = new Float64Array(classes);
  const sum = new Float64Array(classes);
  weights.forEach((w, i) => {
    weight[of[i]!]! += w;
    sum[of[i]!]! += w * mean[from + i]!;
  });
  return weights.map((w, i) => w * exp(sum[of[i]!]! / weight[of[i]!]! - unit + 0.5 * variance[i]!));
}

/**
 * Weight of the wrong side of the edge: in every class, and at every value of what is learnt besides, the lesser loss is taken. On the list
 * a building that does not belong costs the `chance` of the one it keeps out, off it one that belongs the chance that the other does not.
 */
function wrongWith(
  parts: Mixture,
  weights: Float64Array,
  { classes, of, variance }: Learnt,
  threshold: number,
  chance: number,
): number {
  const all = new Float64Array(classes);
  // parts of which nothing is learnt besides their class are the same at every node
  const still = new Float64Array(classes);
  const { z, weight: nodeWeight } = LEARNT_NODES;
  // of each node and class the weight above the edge
  let above: Float64Array | null = null;
  for (let i = 0; i < weights.length; i += 1) {
    const at = parts.from + i;
    const [w, c] = [weights[i]!, of[i]!];
    const d = parts.mean[at]! - threshold;
    const left = Math.sqrt(Math.max(parts.sd[at]! * parts.sd[at]! - variance[i]!, 0));
    all[c]! += w;
    if (!(variance[i]! > 0)) {
      still[c]! += w * sideOf(d, left);
      continue;
    }
    above ??= new Float64Array(classes * z.length);
    const tau = Math.sqrt(variance[i]!);
    for (let j = 0, to = c; j < z.length; j += 1, to += classes) above[to]! += w * sideOf(d + tau * z[j]!, left);
  }
  let wrong = 0;
  for (let j = 0; j < (above === null ? 1 : z.length); j += 1)
    for (let c = 0; c < classes; c += 1) {
      const over = still[c]! + (above === null ? 0 : above[j * classes + c]!);
      wrong += 2 * (above === null ? 1 : nodeWeight[j]!) * Math.min((1 - chance) * over, chance * (all[c]! - over));
    }
  return wrong;
}

/** Chance of a normal whose mean lies `d` above the edge to lie above it. */
function sideOf(d: number, sd: number): number {
  if (!(sd > 0)) return d > 0 ? 1 : 0;
  return tabledCdf(d / sd);
}

/**
 * Value and chance of error where each unknown is found out with a chance of its own, or else nothing of it is: the share of the
 * variance learnt is that chance.
 */
export function worthAt(
  worth: Worth,
  chanceOf: (unknown: Unknown) => number,
): { readonly value: number; readonly wrong: number } {
  let value = 0;
  let wrong = 0;
  eachSet(worth, chanceOf, (set, p) => {
    value += p * worth.value[set]!;
    wrong += p * worth.wrongOf(set);
  });
  return { value, wrong };
}

/** The value alone, which costs far less. */
export function valueAt(worth: Worth, chanceOf: (unknown: Unknown) => number): number {
  let value = 0;
  eachSet(worth, chanceOf, (set, p) => (value += p * worth.value[set]!));
  return value;
}

function eachSet(
  { unknowns, value }: Worth,
  chanceOf: (unknown: Unknown) => number,
  take: (set: number, chance: number) => void,
): void {
  const chances = unknowns.map(chanceOf);
  for (let set = 0; set < value.length; set += 1) {
    let p = 1;
    for (let i = 0; i < chances.length; i += 1) p *= ((set >> i) & 1) === 1 ? chances[i]! : 1 - chances[i]!;
    if (p > 0) take(set, p);
  }
}

/**
 * What it is worth to learn of a building before the list is drawn up.
 *
 * Two actions: the building is on the list or not. On it, it is worth its S, and takes the place of one worth the threshold T. What is
 * learnt changes the expectation of S; learning is worth E[max(E[S | learnt], T)] less max(E[S], T): the expected value of partial
 * perfect information. S is scaled for each building so that its expectation is its median, by which the list is drawn up. For a
 * lognormal S of which a share of the variance is learnt this is m Φ(d1) - T Φ(d2) - max(m - T, 0) with m the median
 * (Raiffa and Schlaifer 1961, from memory; the closed form of an option on a lognormal).
 */
import { exp, ln } from '../numeric/elementary.js';
import { LEARNT_NODES, ONE_NODE } from '../numeric/nodes.js';
import { normalCdf } from '../numeric/normal.js';
import type { Mixture } from './mixture.js';
import { NO_LABEL, labelOf, mixtureQuantile } from './mixture.js';
import { changedMixture, changesOf } from './shared.js';
import type { Common } from './shared.js';

/** What a survey can find out. */
export const UNKNOWNS = ['system', 'year', 'height', 'irregularity', 'use', 'occupants', 'drawings'] as const;
export type Unknown = (typeof UNKNOWNS)[number];

/** How one unknown is in the distribution of a building. */
export interface Learnable {
  readonly unknown: Unknown;
  /** Per part of the distribution the value it holds, as a number; null where the unknown moves all parts alike. */
  readonly values: Int32Array | null;
  /** Standard deviation of ln S that learning it takes off every part. */
  readonly tau: number;
}

/** A building before the survey: its parts, those of different unknowns apart, and what may be learnt. */
export interface Unknowns {
  readonly parts: Mixture;
  readonly learnable: readonly Learnable[];
}

/** The edge of the list: ln S at which it ends, and the ln S that counts as 1. */
export interface Edge {
  readonly threshold: number;
  readonly unit: number;
}

/** What every set of unknowns is worth; set s holds unknown i where bit i of s is 1. */
export interface Worth {
  readonly unknowns: readonly Unknown[];
  /** Value of learning the set, in units of S; 0 for the empty one. */
  readonly value: Float64Array;
  /** Chance of standing on the wrong side of the edge once the set is learnt; of the empty set: today. */
  readonly wrongOf: (set: number) => number;
}

/**
 * `unknowns` of building i as seen from the edge of the list. What drawings tell of the table of an edition keeps no more than the
 * share of the common errors that moves the building against the edge.
 */
export function seenFromEdge({ parts, learnable }: Unknowns, common: Common, i: number): Unknowns {
  const change = changesOf(common, i);
  const { eraLoad, siteLoad } = common.shared.zones[common.shared.zone[i]!]!;
  const era = eraLoad * eraLoad;
  let heaviest = parts.from;
  for (let k = parts.from; k < parts.to; k += 1) if (parts.weight[k]! > parts.weight[heaviest]!) heaviest = k;
  const label = labelOf(parts, heaviest);
  const all = era + siteLoad * siteLoad;
  const kept = label === NO_LABEL || !(all > 0) ? 1 : Math.min(1, Math.max(0, change[label]! + era) / all);
  return {
    parts: changedMixture(parts, change),
    learnable: learnable.map((one) =>
      one.unknown === 'drawings' ? { ...one, tau: Math.sqrt(Math.max(0, one.tau * one.tau - (1 - kept) * era)) } : one,
    ),
  };
}

/** E[max(X - T, 0)] of a lognormal X of expectation m and standard deviation tau of its logarithm; tau 0: X is m. */
export function expectedExcess(m: number, tau: number, t: number): number {
  if (!(m > 0)) return 0;
  if (!(tau > 0)) return Math.max(m - t, 0);
  if (!(t > 0)) return m - t;
  const d1 = (ln(m / t) + 0.5 * tau * tau) / tau;
  return m * normalCdf(d1) - t * normalCdf(d1 - tau);
}

/** What learning everything there is to learn of S itself would be worth: no survey is worth more. */
export function mostWorth(mixture: Mixture, median: number, { threshold, unit }: Edge): number {
  const t = exp(threshold - unit);
  const m = exp(median - unit);
  let mean = 0;
  for (let i = mixture.from; i < mixture.to; i += 1) mean += meanOf(mixture, i, unit);
  let excess = 0;
  for (let i = mixture.from; i < mixture.to; i += 1) {
    const weight = mixture.weight[i]!;
    excess += weight * expectedExcess((meanOf(mixture, i, unit) / weight / mean) * m, mixture.sd[i]!, t);
  }
  return Math.max(excess - Math.max(m - t, 0), 0);
}

/** Weight times E[S] of one part. */
function meanOf({ weight, mean, sd }: Mixture, i: number, unit: number): number {
  return weight[i]! * exp(mean[i]! - unit + 0.5 * sd[i]! * sd[i]!);
}

/** The worth of every set of what may be learnt of a building. */
export function worthOf({ parts, learnable }: Unknowns, { threshold, unit }: Edge): Worth {
  const n = parts.to - parts.from;
  const t = exp(threshold - unit);
  const m = exp(mixtureQuantile(parts, 0.5, 0) - unit);
  const worths = Float64Array.from({ length: n }, (_, i) => meanOf(parts, parts.from + i, unit));
  const scale = m / worths.reduce((sum, value) => sum + value, 0);
  const weights = parts.weight.slice(parts.from, parts.to);
  const total = weights.reduce((sum, value) => sum + value, 0);
  for (let i = 0; i < n; i += 1) {
    worths[i]! *= scale;
    weights[i]! /= total;
  }
  const sets = 1 << learnable.length;
  const value = new Float64Array(sets);
  for (let set = 1; set < sets; set += 1) {
    const { classes, of, tau } = learnt(n, learnable, set);
    const weight = new Float64Array(classes);
    const worth = new Float64Array(classes);
    for (let i = 0; i < n; i += 1) {
      weight[of[i]!]! += weights[i]!;
      worth[of[i]!]! += worths[i]!;
    }
    let excess = 0;
    for (let c = 0; c < classes; c += 1)
      if (weight[c]! > 0) excess += weight[c]! * expectedExcess(worth[c]! / weight[c]!, tau, t);
    // rounding alone may take it below
    value[set] = Math.max(excess - Math.max(m - t, 0), 0);
  }
  const wrong = new Float64Array(sets).fill(NaN);
  return {
    unknowns: learnable.map(({ unknown }) => unknown),
    value,
    wrongOf: (set) => {
      if (Number.isNaN(wrong[set]!)) wrong[set] = wrongWith(parts, weights, learnt(n, learnable, set), threshold);
      return wrong[set]!;
    },
  };
}

interface Learnt {
  /** Number of classes that what is learnt tells apart; some may be empty. */
  readonly classes: number;
  /** Class of each part. */
  readonly of: Int32Array;
  /** What is learnt of every part alike. */
  readonly tau: number;
}

function learnt(n: number, learnable: readonly Learnable[], set: number): Learnt {
  const of = new Int32Array(n);
  let classes = 1;
  let variance = 0;
  learnable.forEach(({ values, tau }, bit) => {
    if (((set >> bit) & 1) === 0) return;
    variance += tau * tau;
    if (values === null) return;
    let most = 0;
    for (let i = 0; i < n; i += 1) {
      of[i]! += classes * values[i]!;
      if (values[i]! > most) most = values[i]!;
    }
    classes *= most + 1;
  });
  return { classes, of, tau: Math.sqrt(variance) };
}

/** Weight of the wrong side of the edge: in every class, and at every value of what is learnt besides, the lesser side is wrong. */
function wrongWith(parts: Mixture, weights: Float64Array, { classes, of, tau }: Learnt, threshold: number): number {
  const { z, weight: nodeWeight } = tau > 0 ? LEARNT_NODES : ONE_NODE;
  let wrong = 0;
  for (let j = 0; j < z.length; j += 1) {
    const above = new Float64Array(classes);
    const all = new Float64Array(classes);
    for (let i = 0; i < weights.length; i += 1) {
      const at = parts.from + i;
      const left = Math.sqrt(Math.max(parts.sd[at]! * parts.sd[at]! - tau * tau, 0));
      const d = parts.mean[at]! + tau * z[j]! - threshold;
      all[of[i]!]! += weights[i]!;
      above[of[i]!]! += weights[i]! * (left > 0 ? normalCdf(d / left) : d > 0 ? 1 : 0);
    }
    for (let c = 0; c < classes; c += 1) wrong += nodeWeight[j]! * Math.min(above[c]!, all[c]! - above[c]!);
  }
  return wrong;
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

/** Share of the variance of ln S that learning one unknown would take away on average. */
export function shareOf({ parts }: Unknowns, learnable: Learnable): number {
  const n = parts.to - parts.from;
  const { classes, of, tau } = learnt(n, [learnable], 1);
  const weight = new Float64Array(classes);
  const mean = new Float64Array(classes);
  let all = 0;
  let middle = 0;
  for (let i = 0; i < n; i += 1) {
    const w = parts.weight[parts.from + i]!;
    const x = parts.mean[parts.from + i]!;
    weight[of[i]!]! += w;
    mean[of[i]!]! += w * x;
    all += w;
    middle += w * x;
  }
  middle /= all;
  let variance = 0;
  for (let i = parts.from; i < parts.to; i += 1)
    variance += (parts.weight[i]! / all) * (square(parts.mean[i]! - middle) + square(parts.sd[i]!));
  let between = tau * tau;
  for (let c = 0; c < classes; c += 1)
    if (weight[c]! > 0) between += (weight[c]! / all) * square(mean[c]! / weight[c]! - middle);
  return variance > 0 ? between / variance : 0;
}

function square(x: number): number {
  return x * x;
}

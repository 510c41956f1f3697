/** What a survey may find out of a building, and what of its distribution that takes away. */
import type { Mixture } from './mixture.js';

/** What a survey can find out. */
export const UNKNOWNS = ['system', 'year', 'height', 'irregularity', 'use', 'occupants', 'drawings'] as const;
export type Unknown = (typeof UNKNOWNS)[number];

/** How one unknown is in the distribution of a building. */
export interface Learnable {
  readonly unknown: Unknown;
  /** Per part of the distribution the value it holds, as a number; null where the unknown moves all parts alike. */
  readonly values: Int32Array | null;
  /** Standard deviation of ln S that learning it takes off every part, or each part. */
  readonly tau: number | Float64Array;
  /** What it takes off besides where `unknown` is learnt too, which tells part of the same. */
  readonly beside?: { readonly unknown: Unknown; readonly tau: number };
}

/** A building before the survey: its parts, those of different unknowns apart, and what may be learnt. */
export interface Unknowns {
  readonly parts: Mixture;
  readonly learnable: readonly Learnable[];
}

/** What learning a set tells of each part. */
export interface Learnt {
  /** Number of classes that what is learnt tells apart; some may be empty. */
  readonly classes: number;
  /** Class of each part. */
  readonly of: Int32Array;
  /** Of each part the variance that is learnt besides its class. */
  readonly variance: Float64Array;
}

/** Room for what is learnt of at least as many parts; what stood in it is lost. */
export type LearntRoom = Pick<Learnt, 'of' | 'variance'>;

export function learntRoom(n: number): LearntRoom {
  return { of: new Int32Array(n), variance: new Float64Array(n) };
}

/** What learning `set` tells of `n` parts; set s holds unknown i where bit i of s is 1. The arrays are those of `room`. */
export function learnt(n: number, learnable: readonly Learnable[], set: number, room = learntRoom(n)): Learnt {
  const of = room.of.fill(0, 0, n);
  const variance = room.variance.fill(0, 0, n);
  let classes = 1;
  const isLearnt = (bit: number): boolean => ((set >> bit) & 1) === 1;
  learnable.forEach(({ values, tau, beside }, bit) => {
    if (!isLearnt(bit)) return;
    const both = beside !== undefined && learnable.some((one, at) => one.unknown === beside.unknown && isLearnt(at));
    const takes = both ? beside.tau : tau;
    if (typeof takes !== 'number') for (let i = 0; i < n; i += 1) variance[i]! += takes[i]! * takes[i]!;
    else if (takes > 0) for (let i = 0; i < n; i += 1) variance[i]! += takes * takes;
    if (values === null) return;
    let most = 0;
    for (let i = 0; i < n; i += 1) {
      of[i]! += classes * values[i]!;
      if (values[i]! > most) most = values[i]!;
    }
    classes *= most + 1;
  });
  return { classes, of, variance };
}

/** Share of the variance of ln S that learning one unknown would take away on average. */
export function shareOf({ parts }: Unknowns, learnable: Learnable): number {
  const n = parts.to - parts.from;
  const { classes, of, variance: learntOf } = learnt(n, [learnable], 1);
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
  let between = 0;
  for (let i = 0; i < n; i += 1) between += (parts.weight[parts.from + i]! / all) * learntOf[i]!;
  for (let c = 0; c < classes; c += 1)
    if (weight[c]! > 0) between += (weight[c]! / all) * square(mean[c]! / weight[c]! - middle);
  return variance > 0 ? between / variance : 0;
}

function square(x: number): number {
  return x * x;
}

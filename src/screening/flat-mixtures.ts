/** The mixtures of many buildings in three arrays, in memory that threads may share. */
import { NO_LABEL } from '../engineering/priority/mixture.js';
import type { Mixture } from '../engineering/priority/mixture.js';
import { changedSpread, changesOf } from '../engineering/priority/shared.js';
import type { Common } from '../engineering/priority/shared.js';

/** What one thread hands to another. */
export interface FlatArrays {
  readonly weight: Float64Array;
  readonly mean: Float64Array;
  readonly sd: Float64Array;
  readonly label: Uint8Array;
  /** Where each mixture begins, and behind the last where it ends. */
  readonly start: Int32Array;
}

/** More than most buildings have: the arrays need not grow. */
const USUAL_PARTS = 8;

/** Gathers mixtures one by one. */
export class FlatMixtures implements FlatArrays {
  weight: Float64Array;
  mean: Float64Array;
  sd: Float64Array;
  label: Uint8Array;
  start: Int32Array;
  #count = 0;
  #used = 0;

  /** Room for `most` mixtures. */
  constructor(most: number) {
    this.start = new Int32Array(most + 1);
    const parts = USUAL_PARTS * most + 64;
    this.weight = new Float64Array(parts);
    this.mean = new Float64Array(parts);
    this.sd = new Float64Array(parts);
    this.label = new Uint8Array(parts);
  }

  add(m: Mixture): void {
    const parts = m.to - m.from;
    while (this.#used + parts > this.weight.length) this.#grow();
    const { weight, mean, sd, label } = this;
    let at = this.#used;
    for (let i = m.from; i < m.to; i += 1) {
      weight[at] = m.weight[i]!;
      mean[at] = m.mean[i]!;
      sd[at] = m.sd[i]!;
      label[at] = m.label?.[i] ?? NO_LABEL;
      at += 1;
    }
    this.#used = at;
    this.#count += 1;
    this.start[this.#count] = at;
  }

  /** Shrinks the arrays to what is in them. */
  finish(): FlatArrays {
    const shared = (from: Float64Array): Float64Array => {
      const to = new Float64Array(new SharedArrayBuffer(8 * this.#used));
      to.set(from.subarray(0, this.#used));
      return to;
    };
    return {
      weight: shared(this.weight),
      mean: shared(this.mean),
      sd: shared(this.sd),
      label: this.label.slice(0, this.#used),
      start: this.start.slice(0, this.#count + 1),
    };
  }

  #grow(): void {
    const bigger = (old: Float64Array): Float64Array => {
      const next = new Float64Array(old.length * 2);
      next.set(old);
      return next;
    };
    this.weight = bigger(this.weight);
    this.mean = bigger(this.mean);
    this.sd = bigger(this.sd);
    const label = new Uint8Array(this.label.length * 2);
    label.set(this.label);
    this.label = label;
  }
}

/** The mixtures of one set of arrays. */
export function mixturesOf({ weight, mean, sd, label, start }: FlatArrays): Mixture[] {
  return Array.from({ length: start.length - 1 }, (_, i) => ({
    weight,
    mean,
    sd,
    label,
    from: start[i]!,
    to: start[i + 1]!,
  }));
}

/** Changes the variances of all parts to those seen from the edge of the list; in place, for at a million buildings a copy is 64 MB. */
export function seeFromEdge(sets: readonly FlatArrays[], common: Common): void {
  let building = 0;
  for (const { sd, label, start } of sets) {
    for (let i = 0; i < start.length - 1; i += 1) {
      const change = changesOf(common, building);
      for (let k = start[i]!; k < start[i + 1]!; k += 1) sd[k] = changedSpread(sd[k]!, change[label[k]!]!);
      building += 1;
    }
  }
}

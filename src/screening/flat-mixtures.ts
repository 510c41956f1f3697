/** The mixtures of many buildings in three arrays, in memory that threads may share. */
import type { Mixture } from '../engineering/priority/mixture.js';

/** What one thread hands to another. */
export interface FlatArrays {
  readonly weight: Float64Array;
  readonly mean: Float64Array;
  readonly sd: Float64Array;
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
  }

  add(m: Mixture): void {
    const parts = m.to - m.from;
    while (this.#used + parts > this.weight.length) this.#grow();
    const { weight, mean, sd } = this;
    let at = this.#used;
    for (let i = m.from; i < m.to; i += 1) {
      weight[at] = m.weight[i]!;
      mean[at] = m.mean[i]!;
      sd[at] = m.sd[i]!;
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
  }
}

/** The mixtures of one set of arrays. */
export function mixturesOf({ weight, mean, sd, start }: FlatArrays): Mixture[] {
  return Array.from({ length: start.length - 1 }, (_, i) => ({ weight, mean, sd, from: start[i]!, to: start[i + 1]! }));
}

/**
 * Expected numbers of buildings above x, class by class, each class movable as a whole: the edge of a list is found again and again
 * at the cost of reading tables.
 */
import { normalCdf } from '../numeric/normal.js';
import { NO_LABEL, labelOf } from './mixture.js';
import type { Mixture } from './mixture.js';
import type { SharedErrors } from './shared-errors.js';

const POINTS = 512;
/** Spreads of a class are told apart into so many, evenly in variance. */
const SPREADS = 12;

/** Parts of one label in one zone: what a draw of the common errors moves together. */
export interface PartClass {
  readonly zone: number;
  readonly label: number;
}

export class ClassTable {
  readonly classes: readonly PartClass[];
  readonly #low: number;
  readonly #high: number;
  /** The edge with no class moved, for the one number of places that is asked for. */
  #unmoved: number | null = null;
  readonly #step: number;
  /** Room for the sum of moved classes. */
  #sum = new Float64Array(0);
  /** By class: the expected number of its buildings above each point. */
  readonly #above: readonly Float64Array[];

  /** The spreads of the classes are those without common errors. */
  constructor(mixtures: readonly Mixture[], { zones, zone }: SharedErrors) {
    let [low, high, most] = [Infinity, -Infinity, 0];
    for (const { mean, sd, from, to } of mixtures) {
      for (let k = from; k < to; k += 1) {
        if (mean[k]! < low) low = mean[k]!;
        if (mean[k]! > high) high = mean[k]!;
        if (sd[k]! > most) most = sd[k]!;
      }
    }
    low -= 5 * most + 1e-6;
    high += 5 * most + 1e-6;
    this.#low = low;
    this.#high = high;
    this.#step = (high - low) / (POINTS - 1);
    const top = most * most;
    // by label: looked up for every part
    const ofZones = zones.map(() => new Array<Float64Array | undefined>(NO_LABEL + 1).fill(undefined));
    mixtures.forEach((mixture, i) => {
      const { weight, mean, sd, from, to } = mixture;
      const byLabel = ofZones[zone[i]!]!;
      const { eraLoad } = zones[zone[i]!]!;
      for (let k = from; k < to; k += 1) {
        const label = labelOf(mixture, k);
        const count = (byLabel[label] ??= new Float64Array(SPREADS * (POINTS + 1)));
        const less = label === NO_LABEL ? 0 : eraLoad * eraLoad;
        const place = (mean[k]! - low) / this.#step;
        const g = Math.floor(place);
        const f = place - g;
        const v = top > 0 ? (Math.max(0, sd[k]! * sd[k]! - less) / top) * (SPREADS - 1) : 0;
        const s = Math.min(SPREADS - 2, Math.floor(v));
        const r = v - s;
        const here = s * (POINTS + 1) + g;
        const w = weight[k]!;
        count[here]! += w * (1 - r) * (1 - f);
        count[here + 1]! += w * (1 - r) * f;
        count[here + POINTS + 1]! += w * r * (1 - f);
        count[here + POINTS + 2]! += w * r * f;
      }
    });
    const all = ofZones.flatMap((byLabel, of) =>
      byLabel.flatMap((count, label) => (count === undefined ? [] : [{ zone: of, label, count }])),
    );
    this.classes = all.map(({ zone: of, label }) => ({ zone: of, label }));
    const kernels = Array.from({ length: SPREADS }, (_, s) =>
      kernelOf(Math.sqrt((top * s) / (SPREADS - 1)) / this.#step),
    );
    this.#above = all.map(({ count }) => {
      const above = new Float64Array(POINTS);
      kernels.forEach((kernel, s) => {
        spread(count.subarray(s * (POINTS + 1), s * (POINTS + 1) + POINTS), kernel, above);
      });
      return above;
    });
  }

  /** x above which `places` buildings are expected when the buildings of class c are moved up by `shift[c]`; to 1e-7. */
  edge(places: number, shift: Float64Array): number {
    this.#unmoved ??= this.#between(places, new Float64Array(shift.length), this.#low, this.#high);
    let [least, most] = [Infinity, -Infinity];
    for (const one of shift) {
      if (one < least) least = one;
      if (one > most) most = one;
    }
    // it moves no farther than the classes do
    return this.#between(places, shift, this.#unmoved + least, this.#unmoved + most);
  }

  /**
   * The same for each of `places`, rising, into `out`, to the distance of the points of a table: the classes, moved, are summed first.
   */
  edges(places: Float64Array, shift: Float64Array, out: Float64Array): void {
    if (places.length === 0) return;
    let [least, most] = [Infinity, -Infinity];
    for (const one of shift) {
      if (one < least) least = one;
      if (one > most) most = one;
    }
    const points = POINTS + Math.ceil((most - least) / this.#step) + 1;
    if (this.#sum.length < points) this.#sum = new Float64Array(points);
    const sum = this.#sum.fill(0, 0, points);
    this.#above.forEach((above, c) => {
      const moved = (shift[c]! - least) / this.#step;
      const whole = Math.floor(moved);
      const f = moved - whole;
      for (let j = 0; j <= whole; j += 1) sum[j]! += above[0]!;
      // above[i - 1] and above[i] stand on both sides of the point
      for (let i = 1; i < POINTS; i += 1) sum[whole + i]! += above[i]! + f * (above[i - 1]! - above[i]!);
      sum[whole + POINTS]! += f * above[POINTS - 1]!;
    });
    let j = points - 1;
    places.forEach((r, rung) => {
      while (j > 0 && sum[j]! < r) j -= 1;
      const fall = j < points - 1 ? sum[j]! - sum[j + 1]! : 0;
      const over = fall > 0 ? Math.min(1, Math.max(0, (sum[j]! - r) / fall)) : 0;
      out[rung] = this.#low + least + this.#step * (j + over);
    });
  }

  #between(places: number, shift: Float64Array, from: number, to: number): number {
    let [low, high] = [from, to];
    while (high - low > 1e-7) {
      const x = 0.5 * (low + high);
      let sum = 0;
      for (let c = 0; c < this.#above.length; c += 1) sum += this.#read(c, x - shift[c]!);
      if (sum > places) low = x;
      else high = x;
    }
    return 0.5 * (low + high);
  }

  #read(c: number, x: number): number {
    const above = this.#above[c]!;
    const place = (x - this.#low) / this.#step;
    if (place <= 0) return above[0]!;
    const g = Math.floor(place);
    if (g >= POINTS - 1) return 0;
    return above[g]! + (place - g) * (above[g + 1]! - above[g]!);
  }
}

/** Weight at a distance of some grid points that counts as above, for a spread of `sd` points. */
function kernelOf(sd: number): Float64Array {
  const reach = Math.ceil(6 * sd);
  return Float64Array.from({ length: 2 * reach + 1 }, (_, i) => {
    const k = i - reach;
    return sd > 0 ? normalCdf(k / sd) : k > 0 ? 1 : k < 0 ? 0 : 0.5;
  });
}

/** Adds to `above` how many of `counts`, spread by `kernel`, stand above each point. */
function spread(counts: Float64Array, kernel: Float64Array, above: Float64Array): void {
  const reach = (kernel.length - 1) / 2;
  for (let j = 0; j < counts.length; j += 1) {
    const count = counts[j]!;
    if (count === 0) continue;
    for (let i = 0; i <= j - reach - 1; i += 1) above[i]! += count;
    const to = Math.min(counts.length - 1, j + reach);
    for (let i = Math.max(0, j - reach); i <= to; i += 1) above[i]! += count * kernel[j - i + reach]!;
  }
}

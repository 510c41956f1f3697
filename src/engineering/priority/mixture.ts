/**
 * The distribution of a building's ln S: a short mixture of normals. Quadrature nodes (period, height) and discrete unknowns
 * (system, era) are added one by one and gathered into bins narrow against the spread, which keeps mean and variance exactly.
 */
import { exp } from '../numeric/elementary.js';
import type { Nodes } from '../numeric/nodes.js';
import { INVERSE_ROOT_TWO_PI, cdfFrom, normalCdf } from '../numeric/normal.js';
import { foldThinCells, foldThinEnds, sortParts } from './mixture-bins.js';

/** Parts `from` (inclusive) to `to` (exclusive) of arrays that many mixtures share: a million buildings are three arrays a pool block. */
export interface Mixture {
  readonly weight: Float64Array;
  readonly mean: Float64Array;
  readonly sd: Float64Array;
  /** The error each part has in common with others, by number, or NO_LABEL; left out: none has any. */
  readonly label?: Uint8Array | undefined;
  readonly from: number;
  readonly to: number;
}

export const NO_LABEL = 255;

export function labelOf({ label }: Mixture, part: number): number {
  return label === undefined ? NO_LABEL : label[part]!;
}

const BLOCK = 65_536;

/** Room for the parts of many mixtures. */
export class MixturePool {
  private weight = new Float64Array(0);
  private mean = new Float64Array(0);
  private sd = new Float64Array(0);
  private label = new Uint8Array(0);
  private used = 0;

  /** Gives the room of all mixtures taken so far again: for a caller that has copied them. */
  restart(): void {
    this.used = 0;
  }

  /** Room for `parts` parts, to be filled by the caller. */
  take(parts: number): Mixture & { readonly label: Uint8Array } {
    if (this.used + parts > this.weight.length) {
      const size = Math.max(parts, BLOCK);
      this.weight = new Float64Array(size);
      this.mean = new Float64Array(size);
      this.sd = new Float64Array(size);
      this.label = new Uint8Array(size);
      this.used = 0;
    }
    const from = this.used;
    this.used += parts;
    return { weight: this.weight, mean: this.mean, sd: this.sd, label: this.label, from, to: this.used };
  }
}

/** Distance of bins over the smallest spread: what one bin gathers has a tenth of a spread's variance at most, an error under 0.001 in Φ. */
const BIN_OVER_SD = 0.8;
const MOST_BINS = 4_000;
/** Bin width where a part has no spread of its own, in ln S; the largest value (the plateau) keeps a bin to itself. */
const BIN_WITHOUT_SD = 0.02;
const SAME = 1e-12;

/** Collects (weight, mean, sd, label) parts and gathers those of a label; reused from building to building. */
export class MixtureBuilder {
  private weight = new Float64Array(256);
  private mean = new Float64Array(256);
  private sd = new Float64Array(256);
  private label = new Uint8Array(256);
  private count = 0;
  private bins = new Float64Array(64);
  /** Labels added so far, in order of their first part. */
  private readonly labels: number[] = [];

  clear(): void {
    this.count = 0;
    this.labels.length = 0;
  }

  add(weight: number, mean: number, sd: number, label = NO_LABEL): void {
    if (!(weight > 0)) return;
    if (this.count === this.weight.length) this.grow();
    this.weight[this.count] = weight;
    this.mean[this.count] = mean;
    this.sd[this.count] = sd;
    this.label[this.count] = this.slotOf(label);
    this.count += 1;
  }

  /**
   * Adds the parts of all `nodes` at once: their means are slope (value - less) + offset, with the values of the nodes from `first`
   * on, their spread is `sd`.
   */
  addNodes(
    weight: number,
    nodes: Nodes,
    values: Float64Array,
    first: number,
    less: number,
    slope: number,
    offset: number,
    sd: number,
    label: number,
  ): void {
    if (!(weight > 0)) return;
    const n = nodes.z.length;
    while (this.count + n > this.weight.length) this.grow();
    const { weight: weights, mean, sd: spreads, label: slots, count } = this;
    const slot = this.slotOf(label);
    for (let j = 0; j < n; j += 1) {
      weights[count + j] = weight * nodes.weight[j]!;
      mean[count + j] = slope * (values[first + j]! - less) + offset;
      spreads[count + j] = sd;
      slots[count + j] = slot;
    }
    this.count = count + n;
  }

  /** Parts added so far. */
  get size(): number {
    return this.count;
  }

  /** The parts as they were added, in arrays of their own. */
  raw(): Mixture {
    const part = (values: Float64Array): Float64Array => values.slice(0, this.count);
    const label = this.label.slice(0, this.count).map((slot) => this.labels[slot]!);
    return { weight: part(this.weight), mean: part(this.mean), sd: part(this.sd), label, from: 0, to: this.count };
  }

  /** The gathered mixture, weights summing to 1, means increasing. @throws Error when nothing was added. */
  gather(pool: MixturePool): Mixture {
    const { weight, mean, sd, label, labels, count } = this;
    if (count === 0) throw new Error('an empty mixture');
    let low = Infinity;
    let high = -Infinity;
    let least = Infinity;
    let total = 0;
    for (let i = 0; i < count; i += 1) {
      const m = mean[i]!;
      if (m < low) low = m;
      if (m > high) high = m;
      if (sd[i]! < least) least = sd[i]!;
      total += weight[i]!;
    }
    const reach = high - low;
    const width = Math.max(least > 0 ? BIN_OVER_SD * least : BIN_WITHOUT_SD, reach / MOST_BINS);
    const n = Math.floor(reach / width) + 3;
    // a bin is a row of `slots` cells, one for each label, of weight, first and second moment
    const slots = labels.length;
    const row = 3 * slots;
    if (this.bins.length < row * n) this.bins = new Float64Array(row * n);
    const bins = this.bins.fill(0, 0, row * n);
    for (let i = 0; i < count; i += 1) {
      // shared between the two nearest bins, so that a last bit can never move a whole node from one bin to the next
      const d = mean[i]! - low;
      const slot = 3 * label[i]!;
      if (least === 0 && high - mean[i]! <= SAME) {
        const last = row * (n - 1) + slot;
        bins[last]! += weight[i]!;
        bins[last + 1]! += weight[i]! * d;
        bins[last + 2]! += weight[i]! * d * d;
        continue;
      }
      const at = d / width;
      const bin = Math.floor(at);
      const right = weight[i]! * (at - bin);
      const left = weight[i]! - right;
      const second = d * d + sd[i]! * sd[i]!;
      const here = row * bin + slot;
      bins[here]! += left;
      bins[here + 1]! += left * d;
      bins[here + 2]! += left * second;
      bins[here + row]! += right;
      bins[here + row + 1]! += right * d;
      bins[here + row + 2]! += right * second;
    }
    if (least > 0) foldThinEnds(bins, n, slots, total);
    if (slots > 1) foldThinCells(bins, n, slots, total);
    let filled = 0;
    for (let cell = 0; cell < n * slots; cell += 1) if (bins[3 * cell]! > 0) filled += 1;
    const out = pool.take(filled);
    let o = out.from;
    for (let cell = 0; cell < n * slots; cell += 1) {
      const w = bins[3 * cell]!;
      if (!(w > 0)) continue;
      const d = bins[3 * cell + 1]! / w;
      const variance = bins[3 * cell + 2]! / w - d * d;
      out.weight[o] = w / total;
      out.mean[o] = low + d;
      out.sd[o] = variance > 1e-18 ? Math.sqrt(variance) : 0;
      out.label[o] = labels[cell % slots]!;
      o += 1;
    }
    if (slots > 1) sortParts(out);
    return out;
  }

  private slotOf(label: number): number {
    const { labels } = this;
    // the one before, nearly always
    if (labels.length > 0 && labels[labels.length - 1] === label) return labels.length - 1;
    const old = labels.indexOf(label);
    return old >= 0 ? old : labels.push(label) - 1;
  }

  private grow(): void {
    const bigger = (old: Float64Array): Float64Array<ArrayBuffer> => {
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

/** P(X <= x). A part without spread steps at its mean. */
export function mixtureCdf(m: Mixture, x: number): number {
  let sum = 0;
  for (let i = m.from; i < m.to; i += 1) {
    const s = m.sd[i]!;
    const d = x - m.mean[i]!;
    sum += m.weight[i]! * (s > 0 ? normalCdf(d / s) : d >= 0 ? 1 : 0);
  }
  return sum;
}

/** Mean and standard deviation. */
export function mixtureMoments(m: Mixture): { readonly mean: number; readonly sd: number } {
  let mean = 0;
  for (let i = m.from; i < m.to; i += 1) mean += m.weight[i]! * m.mean[i]!;
  let variance = 0;
  for (let i = m.from; i < m.to; i += 1) {
    const d = m.mean[i]! - mean;
    variance += m.weight[i]! * (d * d + m.sd[i]! * m.sd[i]!);
  }
  return { mean, sd: Math.sqrt(variance) };
}

/**
 * The q-quantile (0 < q < 1), to about 1e-12: Newton steps kept inside a bracket that halves when they leave it. `z` is the
 * standard normal quantile of q, where the search starts. A step under `enough` is the last: its error is of the square of it.
 */
export function mixtureQuantile(m: Mixture, q: number, z: number, enough = 1e-6): number {
  if (m.to - m.from === 1) return m.mean[m.from]! + (m.sd[m.from]! > 0 ? z * m.sd[m.from]! : 0);
  let low = m.mean[m.from]!;
  let high = m.mean[m.to - 1]!;
  let widest = 0;
  let mean = 0;
  let second = 0;
  for (let i = m.from; i < m.to; i += 1) {
    if (m.sd[i]! > widest) widest = m.sd[i]!;
    mean += m.weight[i]! * m.mean[i]!;
    second += m.weight[i]! * (m.mean[i]! * m.mean[i]! + m.sd[i]! * m.sd[i]!);
  }
  low -= 9 * widest + 1e-9;
  high += 9 * widest + 1e-9;
  let x = mean + z * Math.sqrt(Math.max(second - mean * mean, 0));
  for (let step = 0; step < 80; step += 1) {
    let f = -q;
    let density = 0;
    for (let i = m.from; i < m.to; i += 1) {
      const s = m.sd[i]!;
      const d = x - m.mean[i]!;
      if (s > 0) {
        const u = d / s;
        const e = exp(-0.5 * u * u);
        f += m.weight[i]! * cdfFrom(u, e);
        density += (m.weight[i]! * e) / s;
      } else if (d >= 0) f += m.weight[i]!;
    }
    density *= INVERSE_ROOT_TWO_PI;
    if (f > 0) high = x;
    else low = x;
    let next = density > 1e-12 ? x - f / density : 0.5 * (low + high);
    const inside = next > low && next < high;
    if (!inside) next = 0.5 * (low + high);
    // halving has no such gain: between point masses the bracket decides
    if ((inside && density > 1e-12 && Math.abs(next - x) < enough) || high - low <= 1e-12 * (1 + Math.abs(x)))
      return next;
    x = next;
  }
  return x;
}

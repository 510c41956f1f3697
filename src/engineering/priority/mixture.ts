/**
 * The distribution of a building's ln S: a short mixture of normals. Quadrature nodes (period, height) and discrete unknowns
 * (system, era) are added one by one and gathered into bins narrow against the spread, which keeps mean and variance exactly.
 */
import { exp } from '../numeric/elementary.js';
import type { Nodes } from '../numeric/nodes.js';
import { INVERSE_ROOT_TWO_PI, cdfFrom, normalCdf } from '../numeric/normal.js';

/** Parts `from` (inclusive) to `to` (exclusive) of arrays that many mixtures share: a million buildings are three arrays a pool block. */
export interface Mixture {
  readonly weight: Float64Array;
  readonly mean: Float64Array;
  readonly sd: Float64Array;
  readonly from: number;
  readonly to: number;
}

const BLOCK = 65_536;

/** Room for the parts of many mixtures. */
export class MixturePool {
  private weight = new Float64Array(0);
  private mean = new Float64Array(0);
  private sd = new Float64Array(0);
  private used = 0;

  /** Gives the room of all mixtures taken so far again: for a caller that has copied them. */
  restart(): void {
    this.used = 0;
  }

  /** Room for `parts` parts, to be filled by the caller. */
  take(parts: number): Mixture {
    if (this.used + parts > this.weight.length) {
      const size = Math.max(parts, BLOCK);
      this.weight = new Float64Array(size);
      this.mean = new Float64Array(size);
      this.sd = new Float64Array(size);
      this.used = 0;
    }
    const from = this.used;
    this.used += parts;
    return { weight: this.weight, mean: this.mean, sd: this.sd, from, to: this.used };
  }
}

/** Distance of bins over the smallest spread: what one bin gathers has a tenth of a spread's variance at most, an error under 0.001 in Φ. */
const BIN_OVER_SD = 0.8;
const MOST_BINS = 4_000;
/** Bin width where a part has no spread of its own, in ln S; the largest value (the plateau) keeps a bin to itself. */
const BIN_WITHOUT_SD = 0.02;
const SAME = 1e-12;

/** End bins of less weight are folded into their neighbour. */
const THIN = 1e-3;

/** Collects (weight, mean, sd) parts and gathers them; reused from building to building. */
export class MixtureBuilder {
  private weight = new Float64Array(256);
  private mean = new Float64Array(256);
  private sd = new Float64Array(256);
  private count = 0;
  private bins = new Float64Array(64);

  clear(): void {
    this.count = 0;
  }

  add(weight: number, mean: number, sd: number): void {
    if (!(weight > 0)) return;
    if (this.count === this.weight.length) this.grow();
    this.weight[this.count] = weight;
    this.mean[this.count] = mean;
    this.sd[this.count] = sd;
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
  ): void {
    if (!(weight > 0)) return;
    const n = nodes.z.length;
    while (this.count + n > this.weight.length) this.grow();
    const { weight: weights, mean, sd: spreads, count } = this;
    for (let j = 0; j < n; j += 1) {
      weights[count + j] = weight * nodes.weight[j]!;
      mean[count + j] = slope * (values[first + j]! - less) + offset;
      spreads[count + j] = sd;
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
    return { weight: part(this.weight), mean: part(this.mean), sd: part(this.sd), from: 0, to: this.count };
  }

  /** The gathered mixture, weights summing to 1, means increasing. @throws Error when nothing was added. */
  gather(pool: MixturePool): Mixture {
    const { weight, mean, sd, count } = this;
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
    if (this.bins.length < 3 * n) this.bins = new Float64Array(3 * n);
    const bins = this.bins.fill(0, 0, 3 * n);
    for (let i = 0; i < count; i += 1) {
      // shared between the two nearest bins, so that a last bit can never move a whole node from one bin to the next
      const d = mean[i]! - low;
      if (least === 0 && high - mean[i]! <= SAME) {
        bins[3 * n - 3]! += weight[i]!;
        bins[3 * n - 2]! += weight[i]! * d;
        bins[3 * n - 1]! += weight[i]! * d * d;
        continue;
      }
      const at = d / width;
      const bin = Math.floor(at);
      const right = weight[i]! * (at - bin);
      const left = weight[i]! - right;
      const second = d * d + sd[i]! * sd[i]!;
      bins[3 * bin]! += left;
      bins[3 * bin + 1]! += left * d;
      bins[3 * bin + 2]! += left * second;
      bins[3 * bin + 3]! += right;
      bins[3 * bin + 4]! += right * d;
      bins[3 * bin + 5]! += right * second;
    }
    if (least > 0) foldThinEnds(bins, n, total);
    let filled = 0;
    for (let b = 0; b < n; b += 1) if (bins[3 * b]! > 0) filled += 1;
    const out = pool.take(filled);
    let o = out.from;
    for (let b = 0; b < n; b += 1) {
      const w = bins[3 * b]!;
      if (!(w > 0)) continue;
      const d = bins[3 * b + 1]! / w;
      const variance = bins[3 * b + 2]! / w - d * d;
      out.weight[o] = w / total;
      out.mean[o] = low + d;
      out.sd[o] = variance > 1e-18 ? Math.sqrt(variance) : 0;
      o += 1;
    }
    return out;
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
  }
}

/**
 * Adds end bins of less weight than THIN to their inner neighbour; mean and variance of the whole stay. Not over an empty bin: a
 * far part folded into the middle would widen it.
 */
function foldThinEnds(bins: Float64Array, n: number, total: number): void {
  const thin = THIN * total;
  let first = 0;
  let last = n - 1;
  while (first < last && bins[3 * first]! < thin && bins[3 * first + 3]! > 0) {
    fold(bins, first, first + 1);
    first += 1;
  }
  while (last > first && bins[3 * last]! < thin && bins[3 * last - 3]! > 0) {
    fold(bins, last, last - 1);
    last -= 1;
  }
}

function fold(bins: Float64Array, from: number, to: number): void {
  for (let part = 0; part < 3; part += 1) {
    bins[3 * to + part]! += bins[3 * from + part]!;
    bins[3 * from + part] = 0;
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

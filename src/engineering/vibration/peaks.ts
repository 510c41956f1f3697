/** Peaks of an averaged spectrum: which stand out, where exactly, how wide. */
import { exp, ln } from '../numeric/elementary.js';

export interface Peak {
  readonly bin: number;
  readonly frequency_hz: number;
  readonly density: number;
  /** Height over the background, as a ratio of powers. */
  readonly over_background: number;
}

export interface Search {
  readonly step_hz: number;
  /** Bins of one resolution, 1 / window. */
  readonly cell: number;
  readonly band_hz: readonly [number, number];
  /** Least height over the background and over the valleys beside it, as ratios of powers. */
  readonly height: number;
  readonly depth: number;
}

/**
 * Ratios that noise alone does not reach (five and three and a half standard deviations; chi-square by Wilson and Hilferty 1931, from
 * memory) in an average of `windows` overlapping windows. Never under 6 dB over the background and a factor 1.5 over a valley: judgement.
 */
export function noiseRatios(windows: number): { readonly height: number; readonly depth: number } {
  const independent = Math.max(1, 0.7 * windows);
  const third = 1 / (9 * independent);
  const [top, middle] = [1 - third + 5 * Math.sqrt(third), 1 - third];
  const height = (top * top * top) / (middle * middle * middle);
  return { height: Math.max(4, height), depth: Math.max(1.5, exp(3.5 * Math.sqrt(2 / independent))) };
}

const NODES_PER_OCTAVE = 4;

/** The background: the median of the octave on either side, at quarter octaves, straight between them in logarithms. */
export function backgroundOf(
  density: Float64Array,
  step_hz: number,
  [low, high]: readonly [number, number],
): (f: number) => number {
  const count = Math.max(2, Math.ceil((ln(high / low) / ln(2)) * NODES_PER_OCTAVE) + 1);
  const nodes = Array.from({ length: count }, (_, i) => {
    const f = low * exp((ln(high / low) * i) / (count - 1));
    const first = Math.max(1, Math.floor(f / 2 / step_hz));
    const part = density
      .slice(first, Math.max(first + 1, Math.min(density.length, Math.ceil((2 * f) / step_hz))))
      .sort();
    return ln(part[part.length >> 1]! + Number.MIN_VALUE);
  });
  return (f) => {
    const place = Math.min(count - 1, Math.max(0, (ln(f / low) / ln(high / low)) * (count - 1)));
    const left = Math.min(count - 2, Math.floor(place));
    return exp(nodes[left]! + (place - left) * (nodes[left + 1]! - nodes[left]!));
  };
}

/** Moving average over about one resolution, which noise within a peak does not survive as peaks of its own. */
function smoothed(density: Float64Array, cell: number): Float64Array {
  const reach = Math.max(1, Math.round(cell / 2));
  const sums = new Float64Array(density.length + 1);
  for (let i = 0; i < density.length; i += 1) sums[i + 1] = sums[i]! + density[i]!;
  return density.map((_, i) => {
    const [from, to] = [Math.max(0, i - reach), Math.min(density.length, i + reach + 1)];
    return Math.max(0, sums[to]! - sums[from]!) / (to - from);
  });
}

/** The peaks within the band that stand out of the background and of the valleys beside them, by frequency. */
export function findPeaks(density: Float64Array, { step_hz, cell, band_hz, height, depth }: Search): readonly Peak[] {
  const smooth = smoothed(density, cell);
  const background = backgroundOf(density, step_hz, band_hz);
  const peaks: Peak[] = [];
  const last = Math.min(density.length - 2, Math.floor(band_hz[1] / step_hz));
  for (let i = Math.max(1, Math.ceil(band_hz[0] / step_hz)); i <= last; i += 1) {
    const top = smooth[i]!;
    if (!(top > smooth[i - 1]! && top >= smooth[i + 1]!)) continue;
    const over_background = top / background(i * step_hz);
    if (over_background < height || top < depth * Math.max(valley(smooth, i, -1), valley(smooth, i, 1))) continue;
    peaks.push({ bin: i, frequency_hz: i * step_hz, density: top, over_background });
  }
  return peaks;
}

// The lowest value on one side before the curve rises above the peak; 0 at the end of the spectrum asks nothing.
function valley(curve: Float64Array, peak: number, direction: 1 | -1): number {
  let lowest = curve[peak]!;
  for (let i = peak + direction; i >= 0 && i < curve.length; i += direction) {
    if (curve[i]! > curve[peak]!) return lowest;
    if (curve[i]! < lowest) lowest = curve[i]!;
  }
  return direction === -1 ? lowest : 0;
}

export interface Resonance {
  readonly frequency_hz: number;
  /** Half the distance of the half-power points. */
  readonly half_width_hz: number;
}

/**
 * Where a peak is and how wide: the resonance 1 / (a + b d + c d²), d the distance from the highest bin, that fits best within twice its own
 * half width, each point weighted by its power. Between the bins of a steady tone it is the parabola through the three highest.
 */
export function refinePeak(density: Float64Array, step_hz: number, cell: number, bin: number): Resonance {
  const counted = halfPowerReach(smoothed(density, cell), cell, bin);
  // A spike of noise on a wide peak counts too narrow: the fit then runs out of it, and is tried from a wider start.
  for (const wider of [1, 2, 4]) {
    const fit = fitAround(density, bin, wider * counted);
    if (fit !== undefined) return { frequency_hz: fit.centre * step_hz, half_width_hz: fit.half * step_hz };
  }
  return { frequency_hz: bin * step_hz, half_width_hz: counted * step_hz };
}

function fitAround(density: Float64Array, bin: number, counted: number): BestFit | undefined {
  let fit: BestFit = { centre: bin, half: counted };
  for (let round = 0; round < ROUNDS; round += 1) {
    const next = fitResonance(density, fit.centre, Math.max(2, REACH * fit.half));
    if (next === undefined || Math.abs(next.centre - bin) > 2 * counted || next.half > 3 * counted) return undefined;
    fit = next;
  }
  return fit;
}

interface BestFit {
  readonly centre: number;
  readonly half: number;
}

const ROUNDS = 6;
const REACH = 2;

// Half the bins between the half-power points, a dip narrower than the resolution passed over.
function halfPowerReach(curve: Float64Array, cell: number, bin: number): number {
  const least = curve[bin]! / 2;
  const reach = (direction: 1 | -1): number => {
    let edge = bin;
    for (let i = bin; i > 0 && i < curve.length - 1 && Math.abs(i - edge) <= cell; i += direction) {
      if (curve[i]! >= least) edge = i;
    }
    return Math.abs(edge - bin);
  };
  return Math.max(1, (reach(-1) + reach(1)) / 2);
}

// Least squares of 1 = S (a + b d + c d²): the points' errors are in proportion to S, and cancel out of the ratios of a, b and c.
function fitResonance(density: Float64Array, centre: number, reach: number): BestFit | undefined {
  const middle = Math.round(centre);
  const sums = new Float64Array(5);
  const right = new Float64Array(3);
  const last = Math.min(density.length - 1, Math.floor(centre + reach));
  for (let i = Math.max(1, Math.ceil(centre - reach)); i <= last; i += 1) {
    const d = (i - middle) / reach;
    const s = density[i]! / density[middle]!;
    for (let k = 0, power = s; k < 3; k += 1, power *= d) right[k]! += power;
    for (let k = 0, power = s * s; k < 5; k += 1, power *= d) sums[k]! += power;
  }
  const [s0, s1, s2, s3, s4] = sums as unknown as [number, number, number, number, number];
  const [r0, r1, r2] = right as unknown as [number, number, number];
  const a = r0 * (s2 * s4 - s3 * s3) - s1 * (r1 * s4 - s3 * r2) + s2 * (r1 * s3 - s2 * r2);
  const b = s0 * (r1 * s4 - s3 * r2) - r0 * (s1 * s4 - s2 * s3) + s2 * (s1 * r2 - r1 * s2);
  const c = s0 * (s2 * r2 - r1 * s3) - s1 * (s1 * r2 - r1 * s2) + r0 * (s1 * s3 - s2 * s2);
  const shift = -b / (2 * c);
  const square = a / c - shift * shift;
  if (!(square > 0)) return undefined;
  return { centre: middle + shift * reach, half: Math.sqrt(square) * reach };
}

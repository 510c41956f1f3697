/** The averaged spectrum of windows that overlap by half (Welch 1967, from memory). */
import { ln, exp, sinOfAcute } from '../numeric/elementary.js';
import { powerOfTwo, squaredMagnitudes } from './fourier.js';
import type { Stretch } from './signal.js';

export interface AveragedSpectrum {
  /** Distance of the frequencies: finer than the resolution, the windows being lengthened by zeros. */
  readonly step_hz: number;
  readonly window_s: number;
  readonly windows: number;
  /** Time under at least one window. */
  readonly covered_s: number;
  /** One-sided power spectral density at 0, step, 2 step …, unit² per hertz. */
  readonly density: Float64Array;
  /** The same of up to ten groups of windows in the order of time: their spread is the uncertainty. */
  readonly groups: readonly { readonly windows: number; readonly density: Float64Array }[];
  /** Greatest factor of one standard deviation among windows, half to twice the frequency asked for; NaN when not asked for. */
  readonly scatter: number;
}

const GROUPS = 10;

/** cos² taper from 0 to 1 to 0 (Hann). */
export function hann(samples: number): Float64Array {
  return Float64Array.from({ length: samples }, (_, i) => {
    const share = i / samples;
    const sine = sinOfAcute(Math.PI * Math.min(share, 1 - share));
    return sine * sine;
  });
}

/** Subtracts the straight line that fits best, in place. */
export function detrend(data: Float64Array, samples = data.length): void {
  const middle = (samples - 1) / 2;
  let [sum, moment, square] = [0, 0, 0];
  for (let i = 0; i < samples; i += 1) {
    sum += data[i]!;
    moment += data[i]! * (i - middle);
    square += (i - middle) * (i - middle);
  }
  const mean = sum / samples;
  const slope = square === 0 ? 0 : moment / square;
  for (let i = 0; i < samples; i += 1) data[i]! -= mean + slope * (i - middle);
}

/** First samples of the windows of `samples` that fit into the stretches, half a window apart. */
export function windowStarts(stretches: readonly Stretch[], samples: number): number[] {
  const hop = Math.max(1, Math.floor(samples / 2));
  return stretches.flatMap(({ from, to }) =>
    Array.from({ length: Math.max(0, Math.floor((to - from - samples) / hop) + 1) }, (_, i) => from + i * hop),
  );
}

/**
 * Spectrum of `values` over the stretches, up to `highest_hz`, in windows of `samples`: each without its mean and trend, tapered.
 * No window fits: zero windows, an empty spectrum. Memory: eleven spectra of one window, whatever the length of the record.
 */
export function averagedSpectrum(
  values: Float64Array,
  rate_hz: number,
  stretches: readonly Stretch[],
  samples: number,
  highest_hz: number,
  scatterAround_hz = NaN,
): AveragedSpectrum {
  const size = powerOfTwo(2 * samples);
  const step_hz = rate_hz / size;
  const bins = Math.min(size / 2, Math.ceil(highest_hz / step_hz)) + 1;
  const starts = windowStarts(stretches, samples);
  const count = Math.min(GROUPS, starts.length);
  const groups = Array.from({ length: count }, () => ({ windows: 0, density: new Float64Array(bins) }));
  const taper = hann(samples);
  const scale = 2 / (rate_hz * taper.reduce((sum, w) => sum + w * w, 0));
  const transform = squaredMagnitudes(size);
  const data = new Float64Array(size);
  const power = new Float64Array(size / 2 + 1);
  const scatter = new Scatter(scatterAround_hz, step_hz, bins);
  starts.forEach((start, k) => {
    data.fill(0);
    data.set(values.subarray(start, start + samples));
    detrend(data, samples);
    for (let i = 0; i < samples; i += 1) data[i]! *= taper[i]!;
    transform(data, power);
    const group = groups[Math.floor((k * count) / starts.length)]!;
    group.windows += 1;
    for (let i = 0; i < bins; i += 1) group.density[i]! += scale * power[i]!;
    scatter.take(power);
  });
  const density = new Float64Array(bins);
  for (const group of groups) {
    for (let i = 0; i < bins; i += 1) {
      density[i]! += group.density[i]! / starts.length;
      group.density[i]! /= group.windows;
    }
  }
  const covered_s = coveredSamples(starts, samples) / rate_hz;
  const window_s = samples / rate_hz;
  return { step_hz, window_s, windows: starts.length, covered_s, density, groups, scatter: scatter.greatest() };
}

/** The average of the groups without one of them. */
export function without({ density, groups, windows }: AveragedSpectrum, left: number): Float64Array {
  const group = groups[left]!;
  return density.map((value, i) => (value * windows - group.density[i]! * group.windows) / (windows - group.windows));
}

function coveredSamples(starts: readonly number[], samples: number): number {
  return starts.reduce((sum, start, i) => sum + Math.min(samples, (starts[i + 1] ?? Infinity) - start), 0);
}

const PLACES = 41;
/** Amplitudes are averaged over ±10 % of the frequency before they are compared. Judgement. */
const SMOOTHING = 0.1;

/** Standard deviation of ln amplitude among windows, at frequencies from half to twice the one given. */
class Scatter {
  readonly #bands: readonly (readonly [number, number])[];
  readonly #sums = new Float64Array(PLACES);
  readonly #squares = new Float64Array(PLACES);
  #count = 0;

  constructor(around_hz: number, step_hz: number, bins: number) {
    const places = Number.isNaN(around_hz) ? 0 : PLACES;
    this.#bands = Array.from({ length: places }, (_, i) => {
      const f = 0.5 * around_hz * exp((ln(4) * i) / (PLACES - 1));
      const low = Math.max(1, Math.round((f * (1 - SMOOTHING)) / step_hz));
      return [low, Math.max(low + 1, Math.round((f * (1 + SMOOTHING)) / step_hz))] as const;
    }).filter(([, high]) => high <= bins);
  }

  take(power: Float64Array): void {
    this.#count += 1;
    this.#bands.forEach(([low, high], i) => {
      let sum = 0;
      for (let k = low; k < high; k += 1) sum += power[k]!;
      const amplitude = 0.5 * ln(sum / (high - low) + Number.MIN_VALUE);
      this.#sums[i]! += amplitude;
      this.#squares[i]! += amplitude * amplitude;
    });
  }

  greatest(): number {
    if (this.#count < 2 || this.#bands.length === 0) return NaN;
    const variances = this.#bands.map(
      (_, i) => (this.#squares[i]! - (this.#sums[i]! * this.#sums[i]!) / this.#count) / (this.#count - 1),
    );
    return exp(Math.sqrt(Math.max(0, ...variances)));
  }
}

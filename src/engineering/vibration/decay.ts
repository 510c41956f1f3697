/** A free decay: peaks of the filtered record, logarithmic decrement by regression over them. */
import { apply } from '../formula.js';
import { ln, exp, sinOfAcute } from '../numeric/elementary.js';
import { detrend } from './averaged-spectrum.js';
import { filtered } from './fourier.js';
import { DAMPING_OF_DECREMENT, LOG_DECREMENT } from './records.js';
import { weightedLine } from './weighted-line.js';

export interface DecayPeak {
  /** From the onset. */
  readonly time_s: number;
  readonly amplitude: number;
}

export interface DecayFit {
  readonly period_s: number;
  readonly period_se_s: number;
  readonly log_decrement: number;
  readonly damping_ratio: number;
  readonly damping_se: number;
  /** Amplitudes of the fitted envelope at its first and last peak, in the unit of the channel. */
  readonly first_amplitude: number;
  readonly last_amplitude: number;
  readonly cycles: number;
}

export interface Decay {
  readonly whole: DecayFit;
  /** The larger and the smaller half of the amplitudes by themselves; null with fewer than 12 peaks. */
  readonly halves: readonly [DecayFit, DecayFit] | null;
  readonly peaks: readonly DecayPeak[];
  /** The amplitude grows again by a sixth or more on the way down. */
  readonly beats: boolean;
  /** First sample of the decay, from the first handed in. */
  readonly onset: number;
  /** The record around the peak, from the onset on. */
  readonly filtered: Float64Array;
}

/** Pass band as shares of the frequency: nothing below the first, all from the second to the third, nothing above the fourth. Judgement. */
const PASS = [0.3, 0.6, 1.5, 2] as const;
/** Peaks below this share of the first, or below three times the noise, are left out. Judgement. */
const LEAST_SHARE = 0.02;
const LEAST_PEAKS = 5;

/** Without trend, around `frequency_hz`, no phase moved; the ends are lengthened by their mirror image. */
export function bandPassed(values: Float64Array, rate_hz: number, frequency_hz: number): Float64Array {
  const n = values.length;
  const line = Float64Array.from(values);
  detrend(line);
  const pad = Math.min(n - 1, Math.ceil((4 * rate_hz) / frequency_hz));
  const longer = new Float64Array(n + 2 * pad);
  longer.set(line, pad);
  for (let i = 0; i < pad; i += 1) {
    longer[pad - 1 - i] = line[i + 1]!;
    longer[pad + n + i] = line[n - 2 - i]!;
  }
  const [a, b, c, d] = PASS;
  const gain = (share: number): number => {
    const x = (share * rate_hz) / frequency_hz;
    return x < b ? step((x - a) / (b - a)) : step((d - x) / (d - c));
  };
  return filtered(longer, gain).slice(pad, pad + n);
}

function step(x: number): number {
  const sine = sinOfAcute((Math.PI / 2) * Math.min(1, Math.max(0, x)));
  return sine * sine;
}

/** Fits a free decay of about `frequency_hz`; null when fewer than five peaks stand out. */
export function fitDecay(values: Float64Array, rate_hz: number, frequency_hz: number): Decay | null {
  // Filtered once more from the greatest value on: the step of a release would ring through the filter into the decay.
  const onset = greatest(bandPassed(values, rate_hz, frequency_hz));
  const after = values.subarray(onset);
  const band = bandPassed(after, rate_hz, frequency_hz);
  const all = extremes(band, rate_hz);
  const floor = noiseFloor(after, band, rate_hz, frequency_hz);
  // The first cycle still leans on its mirror image before the onset.
  const skip = all.length >= 8 ? 2 : 0;
  const free = all.slice(skip, all.length - (all.length >= 12 ? 2 : 0));
  const first = free[0]?.amplitude ?? NaN;
  const end = free.findIndex(({ amplitude }) => !(amplitude > Math.max(LEAST_SHARE * first, floor, settled(free))));
  const peaks = end < 0 ? free : free.slice(0, end);
  if (peaks.length < LEAST_PEAKS) return null;
  const half = peaks.length >> 1;
  const halves = peaks.length < 12 ? null : ([fit(peaks.slice(0, half)), fit(peaks.slice(half))] as const);
  return { whole: fit(peaks), halves, peaks, beats: risesAgain(peaks), onset, filtered: band };
}

function greatest(band: Float64Array): number {
  let at = 0;
  for (let i = 0; i < band.length; i += 1) if (Math.abs(band[i]!) > Math.abs(band[at]!)) at = i;
  return at;
}

// Largest of each half-wave, by the parabola through three samples.
function extremes(band: Float64Array, rate_hz: number): DecayPeak[] {
  const found: DecayPeak[] = [];
  for (let i = 1; i < band.length - 1; i += 1) {
    const [left, here, right] = [Math.abs(band[i - 1]!), Math.abs(band[i]!), Math.abs(band[i + 1]!)];
    if (!(here >= left && here > right)) continue;
    const bend = left - 2 * here + right;
    const shift = bend === 0 ? 0 : (left - right) / (2 * bend);
    found.push({ time_s: (i + shift) / rate_hz, amplitude: here - ((left - right) * shift) / 4 });
  }
  return found;
}

// Three times what is left outside the pass band in the last quarter, taken as equally strong at all frequencies.
function noiseFloor(values: Float64Array, band: Float64Array, rate_hz: number, frequency_hz: number): number {
  const rest = Float64Array.from(values);
  detrend(rest);
  const from = Math.floor(0.75 * rest.length);
  let square = 0;
  for (let i = from; i < rest.length; i += 1) square += (rest[i]! - band[i]!) * (rest[i]! - band[i]!);
  const pass_hz = (PASS[3] - PASS[0]) * frequency_hz;
  const outside_hz = Math.max(pass_hz, rate_hz / 2 - pass_hz);
  // A slow drift is no noise within the band; what it adds here only leaves out a few peaks more.
  return 3 * Math.sqrt((square / Math.max(1, rest.length - from)) * (pass_hz / outside_hz));
}

// Twice the level at the end where the record no longer decays: ambient vibration of the building itself.
function settled(peaks: readonly DecayPeak[]): number {
  const last = peaks.slice(Math.floor(0.8 * peaks.length)).map(({ amplitude }) => amplitude);
  if (last.length < 6) return 0;
  const [a, b] = [median(last.slice(0, last.length >> 1)), median(last.slice(last.length >> 1))];
  return a <= 1.15 * b ? 2 * Math.max(a, b) : 0;
}

function median(values: readonly number[]): number {
  return [...values].sort((a, b) => a - b)[values.length >> 1] ?? NaN;
}

function risesAgain(peaks: readonly DecayPeak[]): boolean {
  let lowest = Infinity;
  for (let i = 1; i < peaks.length; i += 1) {
    // Of two neighbours: a small offset makes every other one larger.
    const level = (peaks[i]!.amplitude + peaks[i - 1]!.amplitude) / 2;
    if (level > 1.17 * lowest) return true;
    lowest = Math.min(lowest, level);
  }
  return false;
}

// Noise adds the same to every peak, so that its logarithm and its place are known in proportion to the amplitude.
function fit(peaks: readonly DecayPeak[]): DecayFit {
  const halfCycles = peaks.map((_, i) => i);
  const weights = peaks.map(({ amplitude }) => amplitude * amplitude);
  const times = weightedLine(
    halfCycles,
    peaks.map(({ time_s }) => time_s),
    weights,
  );
  const levels = weightedLine(
    halfCycles,
    peaks.map(({ amplitude }) => ln(amplitude)),
    weights,
  );
  const cycles = (peaks.length - 1) / 2;
  const first_amplitude = exp(levels.at(0));
  const last_amplitude = exp(levels.at(peaks.length - 1));
  const log_decrement = apply(LOG_DECREMENT, { first_peak: first_amplitude, later_peak: last_amplitude, cycles });
  const damping_ratio = apply(DAMPING_OF_DECREMENT, { log_decrement });
  return {
    period_s: 2 * times.slope,
    period_se_s: 2 * times.slope_se,
    log_decrement,
    damping_ratio,
    damping_se: (2 * levels.slope_se) / (2 * Math.PI),
    first_amplitude,
    last_amplitude,
    cycles,
  };
}

/** An ambient record: where the averaged spectrum has its peak, how wide it is, and how sure both are. */
import { apply } from '../formula.js';
import { averagedSpectrum, without } from './averaged-spectrum.js';
import type { AveragedSpectrum } from './averaged-spectrum.js';
import { refinePeak } from './peaks.js';
import type { Resonance } from './peaks.js';
import { HALF_POWER_DAMPING } from './records.js';
import type { Signal, Stretch } from './signal.js';
import type { Damping } from './measurement.js';

/** A tenth of the record for a first reading; then what makes the peak this many times as wide as a steady tone would be. Judgement. */
const FIRST_SHARE = 0.1;
const WIDTHS = 4;
/** Windows hold at least so many cycles, and are at most this share of the record. Judgement. */
const LEAST_CYCLES = 12;
const MOST_SHARE = 1 / 6;
/** Width of a steady tone in windows of one second, between its half-power points: a property of the cos² taper. */
const OWN_WIDTH = 1.44;

/** Width of a steady tone between its half-power points. */
export const ownWidth_hz = (window_s: number): number => OWN_WIDTH / window_s;

/**
 * Reads the peak near `frequency_hz` in windows that suit it: long enough to resolve its width, short enough to be many.
 * Longer ones than `WIDTHS` ask for would only scatter more.
 */
export function readSuitably(
  signal: Signal,
  stretches: readonly Stretch[],
  highest_hz: number,
  frequency_hz: number,
): AmbientReading {
  const longest = Math.max(...stretches.map(({ from, to }) => to - from));
  const total = stretches.reduce((sum, { from, to }) => sum + to - from, 0);
  const least = (LEAST_CYCLES * signal.rate_hz) / frequency_hz;
  const within = (samples: number): number =>
    Math.floor(Math.min(longest, Math.max(least, Math.min(MOST_SHARE * total, samples))));
  const first = within(FIRST_SHARE * total);
  const reading = readAmbient(signal, stretches, first, highest_hz, frequency_hz);
  const [low, high] = reading.damping.half_power_hz ?? [NaN, NaN];
  const second = within((WIDTHS * OWN_WIDTH * signal.rate_hz) / (high - low));
  if (Math.abs(second - first) <= 0.1 * first) return reading;
  return readAmbient(signal, stretches, second, highest_hz, reading.frequency_hz);
}

export interface AmbientReading {
  readonly spectrum: AveragedSpectrum;
  readonly frequency_hz: number;
  readonly frequency_se_hz: number;
  readonly damping: Damping;
}

/** Reads the peak near `frequency_hz` in windows of `samples`. */
export function readAmbient(
  { values, rate_hz }: Signal,
  stretches: readonly Stretch[],
  samples: number,
  highest_hz: number,
  frequency_hz: number,
): AmbientReading {
  const spectrum = averagedSpectrum(values, rate_hz, stretches, samples, highest_hz, frequency_hz);
  const { step_hz, window_s, density, groups } = spectrum;
  const cell = 1 / window_s / step_hz;
  const bin = highestNear(density, step_hz, frequency_hz);
  const peak = refinePeak(density, step_hz, cell, bin);
  const others = groups.length < 3 ? [] : groups.map((_, i) => refinePeak(without(spectrum, i), step_hz, cell, bin));
  return {
    spectrum,
    frequency_hz: peak.frequency_hz,
    frequency_se_hz: Math.max(
      jackknife(others.map((one) => one.frequency_hz)),
      leastError_hz(peak, spectrum.covered_s),
    ),
    damping: {
      ratio: dampingOf(peak),
      ratio_se: jackknife(others.map(dampingOf)),
      method: 'half-power',
      half_power_hz: [peak.frequency_hz - peak.half_width_hz, peak.frequency_hz + peak.half_width_hz],
      upperBound: 3 * ownWidth_hz(window_s) > 2 * peak.half_width_hz,
    },
  };
}

// The first look knew the peak to a few per cent; the greatest value there, of finer bins, is it.
function highestNear(density: Float64Array, step_hz: number, frequency_hz: number): number {
  let best = Math.min(density.length - 2, Math.max(1, Math.round(frequency_hz / step_hz)));
  const reach = Math.ceil((0.06 * frequency_hz) / step_hz);
  const last = Math.min(density.length - 2, best + reach);
  for (let i = Math.max(1, best - reach); i <= last; i += 1) if (density[i]! > density[best]!) best = i;
  return best;
}

function dampingOf({ frequency_hz, half_width_hz }: Resonance): number {
  const [lower_hz, upper_hz] = [frequency_hz - half_width_hz, frequency_hz + half_width_hz];
  return apply(HALF_POWER_DAMPING, { lower_hz, upper_hz, peak_hz: frequency_hz });
}

/**
 * No reading of a noise-driven resonance is surer than √(half width / 2π duration): the Fisher information of its spectrum about f0,
 * T ∫ (∂ ln S / ∂f0)² df with S ~ 1 / ((f - f0)² + w²), is 2πT / w. Ten groups may agree better by chance.
 */
function leastError_hz({ half_width_hz }: Resonance, covered_s: number): number {
  return Math.sqrt(half_width_hz / (2 * Math.PI * covered_s));
}

/** Standard error from the estimates that leave one group out each (Quenouille 1956, Tukey 1958, from memory); NaN for none. */
function jackknife(estimates: readonly number[]): number {
  const n = estimates.length;
  const mean = estimates.reduce((sum, one) => sum + one, 0) / n;
  return Math.sqrt(((n - 1) / n) * estimates.reduce((sum, one) => sum + (one - mean) * (one - mean), 0));
}

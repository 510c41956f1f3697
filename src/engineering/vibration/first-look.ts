/** Where the peaks of a record are, before the windows are chosen to suit. */
import { UserError } from '../../errors.js';
import { formatNumber } from '../format.js';
import { averagedSpectrum } from './averaged-spectrum.js';
import type { AveragedSpectrum } from './averaged-spectrum.js';
import { findPeaks, noiseRatios } from './peaks.js';
import type { Peak, Search } from './peaks.js';
import type { Signal, Stretch } from './signal.js';

/** Buildings are looked for here; judgement. */
const BAND_HZ = [0.1, 25] as const;
/** Of the sampling rate: above it an instrument's own filter and folding rule. */
const HIGHEST_SHARE = 0.4;
const LEAST_SAMPLES = 128;
/** A peak with so few cycles in a window is not told from drift. */
const LEAST_CYCLES = 3;
/** A lower peak counts as the fundamental from this share of the highest on. Judgement. */
const LEAST_SHARE = 0.05;
const FIRST_WINDOW_S = [20, 60] as const;

export interface FirstLook {
  readonly band_hz: readonly [number, number];
  readonly chosen: Peak;
  readonly peaks: readonly Peak[];
  /** Frequency of the greatest value of the whole spectrum above the lowest frequency searched. */
  readonly strongest_hz: number;
}

/** How a spectrum of `windows` windows is searched. */
export function searchOf(spectrum: AveragedSpectrum, band_hz: readonly [number, number], windows: number): Search {
  return {
    step_hz: spectrum.step_hz,
    cell: 1 / spectrum.window_s / spectrum.step_hz,
    band_hz,
    ...noiseRatios(windows),
  };
}

/** @throws UserError when the record is too short, sampled too slowly, or nothing stands out. */
export function firstLook(
  { rate_hz, values }: Signal,
  stretches: readonly Stretch[],
  wanted: readonly [number, number] | undefined,
): FirstLook {
  const longest = Math.max(0, ...stretches.map(({ from, to }) => to - from));
  const total = stretches.reduce((sum, { from, to }) => sum + to - from, 0);
  if (longest < LEAST_SAMPLES) {
    throw new UserError(
      `the record is too short: its longest stretch without a gap has ${String(longest)} samples; ${String(LEAST_SAMPLES)} are the least, and some 200 cycles of the building are wanted`,
    );
  }
  const [least_s, most_s] = FIRST_WINDOW_S;
  const window_s = Math.min(longest / rate_hz / 1.5, Math.max(least_s, Math.min(most_s, total / rate_hz / 10)));
  const band_hz = searchBand(rate_hz, window_s, wanted);
  const spectrum = averagedSpectrum(values, rate_hz, stretches, Math.floor(window_s * rate_hz), rate_hz / 2);
  const peaks = findPeaks(spectrum.density, searchOf(spectrum, band_hz, spectrum.windows));
  const highest = Math.max(0, ...peaks.map(({ density }) => density));
  const chosen = peaks.find(({ density }) => density >= LEAST_SHARE * highest);
  if (chosen === undefined) {
    throw new UserError(
      `no peak stands out of the noise between ${formatNumber(band_hz[0])} and ${formatNumber(band_hz[1])} Hz; record for longer, on a higher floor or in the other direction, or search elsewhere with --band-hz`,
    );
  }
  let strongest = Math.ceil(band_hz[0] / spectrum.step_hz);
  for (let i = strongest; i < spectrum.density.length; i += 1) {
    if (spectrum.density[i]! > spectrum.density[strongest]!) strongest = i;
  }
  return { band_hz, chosen, peaks, strongest_hz: strongest * spectrum.step_hz };
}

function searchBand(
  rate_hz: number,
  window_s: number,
  wanted: readonly [number, number] | undefined,
): [number, number] {
  const [low, high] = wanted ?? BAND_HZ;
  const band: [number, number] = [Math.max(low, LEAST_CYCLES / window_s), Math.min(high, HIGHEST_SHARE * rate_hz)];
  if (band[1] > band[0] * 1.05) return band;
  if (high > HIGHEST_SHARE * rate_hz) {
    throw new UserError(
      `the sampling rate of ${formatNumber(rate_hz)} Hz is too low: it shows frequencies up to ${formatNumber(HIGHEST_SHARE * rate_hz)} Hz, and the search begins at ${formatNumber(band[0])} Hz; if the time column is not in seconds (milliseconds: call it time_ms), or only counts, give --rate-hz`,
    );
  }
  throw new UserError(
    `the record is too short for frequencies of ${formatNumber(low)} to ${formatNumber(high)} Hz: its windows of ${formatNumber(window_s)} s show them from ${formatNumber(LEAST_CYCLES / window_s)} Hz on; record for longer, or search higher with --band-hz`,
  );
}

/** A vibration record to its fundamental period. */
import { UserError } from '../../errors.js';
import { formatNumber } from '../format.js';
import { apply } from '../formula.js';
import { ln } from '../numeric/elementary.js';
import { FREQUENCY_TO_PERIOD } from '../period/measured-records.js';
import { readAmbient, readSuitably } from './ambient.js';
import { averagedSpectrum } from './averaged-spectrum.js';
import type { AveragedSpectrum } from './averaged-spectrum.js';
import { bandPassed, fitDecay } from './decay.js';
import { firstLook, searchOf } from './first-look.js';
import type { FirstLook } from './first-look.js';
import { MOST_DECAY_CYCLES, judgeKind } from './kind.js';
import type { RecordKind } from './kind.js';
import type { MeasureOptions, MeasuredPeak, Measurement } from './measurement.js';
import { backgroundOf, findPeaks, refinePeak } from './peaks.js';
import type { Peak } from './peaks.js';
import { recordConditions } from './quality.js';
import { usableStretches } from './signal.js';
import type { Cuts, Signal, Stretch } from './signal.js';
import { warningsOf } from './warnings.js';

/** A second mode within this share of the frequency, and at least this high beside it, is close. Judgement. */
const CLOSE = 0.25;
const CLOSE_HEIGHT = 0.1;
const LEAST_WINDOW = 32;
/** Lower peaks are not listed. */
const LEAST_LISTED = 0.001;

/**
 * The fundamental frequency, period and damping of a record, with what is known of their certainty.
 * @throws UserError, without a place, when the record is too short, sampled too slowly, or nothing stands out.
 */
export function measureRecord(signal: Signal, options: MeasureOptions = {}): Measurement {
  const cuts = usableStretches(signal);
  const look = firstLook(signal, cuts.stretches, options.band_hz);
  const longest = cuts.stretches.reduce((a, b) => (b.to - b.from > a.to - a.from ? b : a));
  const { kind, reason } = kindOf(signal, longest, look, options.kind);
  if (kind === 'decay') return ofDecay(signal, cuts, longest, look, reason, options);
  return ofAmbient(signal, cuts, look, reason, options);
}

function kindOf(
  { values, rate_hz }: Signal,
  { from, to }: Stretch,
  { chosen }: FirstLook,
  given: RecordKind | undefined,
): { readonly kind: RecordKind; readonly reason: string } {
  const cycles = ((to - from) / rate_hz) * chosen.frequency_hz;
  if (given !== undefined) {
    if (given === 'decay' && cycles > MOST_DECAY_CYCLES) {
      throw new UserError(
        `${formatNumber(cycles)} cycles are too many for a free decay (at most ${String(MOST_DECAY_CYCLES)}); name the part that decays with --from-s and --to-s`,
      );
    }
    return { kind: given, reason: 'as stated' };
  }
  if (cycles > MOST_DECAY_CYCLES) return { kind: 'ambient', reason: 'the record is longer than any free decay' };
  return judgeKind(bandPassed(values.subarray(from, to), rate_hz, chosen.frequency_hz), rate_hz, chosen.frequency_hz);
}

// A window the user asked for, in samples.
function windowOf({ rate_hz }: Signal, stretches: readonly Stretch[], wanted_s: number): number {
  const samples = Math.round(wanted_s * rate_hz);
  const longest = Math.max(...stretches.map(({ from, to }) => to - from));
  if (samples > longest || samples < LEAST_WINDOW) {
    throw new UserError(
      `--window-s ${formatNumber(wanted_s)}: a window needs ${String(LEAST_WINDOW)} samples (${formatNumber(LEAST_WINDOW / rate_hz)} s) and must fit into the longest stretch, ${formatNumber(longest / rate_hz)} s`,
    );
  }
  return samples;
}

function ofAmbient(
  signal: Signal,
  cuts: Cuts,
  look: FirstLook,
  kindReason: string,
  options: MeasureOptions,
): Measurement {
  const highest_hz = Math.min(signal.rate_hz / 2, look.band_hz[1] * 2);
  const near_hz = look.chosen.frequency_hz;
  const reading =
    options.window_s === undefined
      ? readSuitably(signal, cuts.stretches, highest_hz, near_hz)
      : readAmbient(signal, cuts.stretches, windowOf(signal, cuts.stretches, options.window_s), highest_hz, near_hz);
  const { spectrum, frequency_hz, frequency_se_hz, damping } = reading;
  const period_s = apply(FREQUENCY_TO_PERIOD, { frequency_hz });
  const common = commonOf(look, spectrum, spectrum.windows, frequency_hz);
  const measured = {
    ...common,
    kind: 'ambient' as const,
    kindReason,
    frequency_hz,
    frequency_se_hz,
    period_s,
    period_se_s: (period_s * frequency_se_hz) / frequency_hz,
    damping,
    conditions: recordConditions(frequency_hz, spectrum),
    cuts,
    decay: null,
  };
  return { ...measured, warnings: warningsOf(measured, look, signal.rate_hz) };
}

function ofDecay(
  signal: Signal,
  cuts: Cuts,
  stretch: Stretch,
  look: FirstLook,
  kindReason: string,
  options: MeasureOptions,
): Measurement {
  const { rate_hz, values } = signal;
  const decay = fitDecay(values.subarray(stretch.from, stretch.to), rate_hz, look.chosen.frequency_hz);
  if (decay === null) {
    throw new UserError(
      'fewer than five peaks of the decay stand out of the noise; name the part that decays with --from-s and --to-s, or treat the record as ambient with --kind ambient',
    );
  }
  const { whole } = decay;
  const frequency_hz = 1 / whole.period_s;
  // One window over the part that decays: the spectrum is there to be looked at and to tell two modes apart.
  const begin = stretch.from + decay.onset;
  const from = begin + Math.floor((decay.peaks[0]?.time_s ?? 0) * rate_hz);
  const last = begin + Math.ceil(((decay.peaks.at(-1)?.time_s ?? 0) + 2 * whole.period_s) * rate_hz);
  const part = { from, to: Math.min(stretch.to, last) };
  const samples = options.window_s === undefined ? part.to - part.from : windowOf(signal, [part], options.window_s);
  const highest_hz = Math.min(rate_hz / 2, look.band_hz[1] * 2);
  const spectrum = averagedSpectrum(values, rate_hz, [part], samples, highest_hz);
  const measured = {
    ...commonOf(look, spectrum, 1000, frequency_hz),
    kind: 'decay' as const,
    kindReason,
    frequency_hz,
    frequency_se_hz: (whole.period_se_s / whole.period_s) * frequency_hz,
    period_s: whole.period_s,
    period_se_s: whole.period_se_s,
    damping: {
      ratio: whole.damping_ratio,
      ratio_se: whole.damping_se,
      method: 'logarithmic-decrement' as const,
      half_power_hz: null,
      upperBound: false,
    },
    conditions: [],
    cuts,
    decay: { ...decay, rate_hz, start_s: begin / rate_hz },
  };
  return { ...measured, warnings: warningsOf(measured, look, rate_hz) };
}

// A decay is no noise: its spectrum is searched as if averaged over `windows` many.
function commonOf(look: FirstLook, spectrum: AveragedSpectrum, windows: number, frequency_hz: number) {
  const { step_hz, density, window_s, covered_s } = spectrum;
  const found = findPeaks(density, searchOf(spectrum, look.band_hz, windows));
  const bin = Math.round(frequency_hz / step_hz);
  const background = backgroundOf(density, step_hz, look.band_hz);
  const apart = (other: Peak): number => Math.abs(other.bin - bin);
  const nearest = found.reduce<Peak | undefined>((a, b) => (a === undefined || apart(b) < apart(a) ? b : a), undefined);
  // Where the finer spectrum does not set the peak off by itself, the first look's stands.
  const chosen = nearest !== undefined && apart(nearest) * step_hz < 0.05 * frequency_hz ? nearest : look.chosen;
  const near = found.filter(
    (one) =>
      one !== chosen &&
      one.density >= CLOSE_HEIGHT * chosen.density &&
      Math.abs(one.frequency_hz - frequency_hz) <= CLOSE * frequency_hz,
  );
  const exact = (one: Peak): number => refinePeak(density, step_hz, 1 / window_s / step_hz, one.bin).frequency_hz;
  const listed = found.includes(chosen) ? found : [...found, chosen].sort((a, b) => a.frequency_hz - b.frequency_hz);
  const highest = Math.max(...listed.map((one) => one.density));
  const peaks: MeasuredPeak[] = listed
    .filter((one) => one === chosen || one.density >= LEAST_LISTED * highest)
    .map((one) => {
      const f = one === chosen ? frequency_hz : exact(one);
      const over_background_db = decibels(one.over_background);
      return {
        frequency_hz: f,
        period_s: 1 / f,
        over_background_db,
        share: one.density / highest,
        chosen: one === chosen,
      };
    });
  return {
    resolution_hz: 1 / window_s,
    window_s,
    windows: spectrum.windows,
    covered_s,
    over_background_db: decibels(chosen.over_background),
    band_hz: look.band_hz,
    peaks,
    close_hz: near.map(exact),
    spectrum: { step_hz, density, background },
  };
}

function decibels(ratio: number): number {
  return (10 * ln(ratio)) / ln(10);
}

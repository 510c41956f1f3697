/** What a reader of a measurement must be told. */
import { formatNumber } from '../format.js';
import { ownWidth_hz } from './ambient.js';
import type { FirstLook } from './first-look.js';
import type { Measurement } from './measurement.js';

type Measured = Omit<Measurement, 'warnings'>;

const MAINS_HZ = [50, 60] as const;
const MAINS_REACH_HZ = 0.5;
/** Less damping than any building has. Judgement. */
const LEAST_DAMPING = 0.002;
const FEW_WINDOWS = 5;
const SAMPLES_OF_CYCLE = 5;
/** Below this a stiff, low building may lie above what is seen. Judgement. */
const LEAST_HIGHEST_HZ = 10;
const MUCH_CUT = 0.2;

const hz = (value: number): string => `${formatNumber(value)} Hz`;
const percent = (value: number): string => `${formatNumber(100 * value, 2)} %`;
const mainsNear = (value: number): number | undefined => MAINS_HZ.find((f) => Math.abs(value - f) <= MAINS_REACH_HZ);

/** In the order of their weight. */
export function warningsOf(measured: Measured, look: FirstLook, rate_hz: number): readonly string[] {
  return [
    ...toneWarnings(measured, look),
    ...modeWarnings(measured),
    ...decayWarnings(measured),
    ...extentWarnings(measured, rate_hz),
  ];
}

function toneWarnings({ kind, frequency_hz, damping, window_s }: Measured, { strongest_hz }: FirstLook): string[] {
  const mains = mainsNear(frequency_hz);
  if (mains !== undefined) {
    return [`the peak lies at the mains of ${String(mains)} Hz: that is no building; search below it with --band-hz`];
  }
  const found: string[] = [];
  if (mainsNear(strongest_hz) !== undefined) {
    found.push(
      `the strongest line of the record is the mains, at ${hz(strongest_hz)}; check the instrument's supply and cables`,
    );
  }
  if (kind === 'decay' || damping.half_power_hz === null) return found;
  const width = damping.half_power_hz[1] - damping.half_power_hz[0];
  if (damping.ratio < LEAST_DAMPING) {
    found.push(
      `a peak as narrow as ${percent(damping.ratio)} of critical damping is a machine running at ${hz(frequency_hz)} rather than a building; record with it switched off, or search elsewhere with --band-hz`,
    );
  } else if (width <= 1.2 * ownWidth_hz(window_s)) {
    found.push(
      'the peak is no wider than these windows make a steady tone, so that a machine is not ruled out; record for longer',
    );
  }
  return found;
}

function modeWarnings({ frequency_hz, close_hz, peaks, resolution_hz, kind }: Measured): string[] {
  const found: string[] = [];
  const [close] = close_hz;
  if (close !== undefined) {
    found.push(
      `two close modes, ${hz(frequency_hz)} and ${hz(close)}: translation along the other direction, or torsion; which is which shows in a second channel, and ${kind === 'decay' ? 'the decrement holds for neither alone' : 'the width of either may hold some of the other'}`,
    );
  }
  if (close !== undefined && Math.abs(close - frequency_hz) < 3 * resolution_hz) {
    found.push(`they lie ${hz(Math.abs(close - frequency_hz))} apart at a resolution of ${hz(resolution_hz)}`);
  }
  const lower = peaks.find(
    (peak) => peak.frequency_hz < frequency_hz && !peak.chosen && !close_hz.includes(peak.frequency_hz),
  );
  if (lower !== undefined) {
    found.push(
      `a weaker peak lies lower, at ${hz(lower.frequency_hz)}; if it is the building, give --band-hz around it`,
    );
  }
  const stronger = peaks.find((peak) => peak.share === 1 && !peak.chosen && !close_hz.includes(peak.frequency_hz));
  if (stronger !== undefined && stronger.frequency_hz > frequency_hz) {
    found.push(
      `the highest peak is at ${hz(stronger.frequency_hz)}; the lowest one that stands out is taken as the fundamental, the higher as a higher mode`,
    );
  }
  return found;
}

function decayWarnings({ decay, period_s }: Measured): string[] {
  if (decay === null) return [];
  const found: string[] = [];
  if (decay.beats) {
    found.push(
      'the amplitude grows again on its way down: two close modes beat, and neither period nor damping is of one alone',
    );
  }
  if (decay.halves !== null && !decay.beats) {
    const [large, small] = decay.halves;
    const change = large.period_s - small.period_s;
    const error = Math.sqrt(large.period_se_s * large.period_se_s + small.period_se_s * small.period_se_s);
    if (Math.abs(change) > 3 * error && Math.abs(change) > 0.002 * period_s) {
      found.push(
        `the period depends on the amplitude: ${formatNumber(large.period_s, 4)} s in the larger half, ${formatNumber(small.period_s, 4)} s in the smaller`,
      );
    }
  }
  return found;
}

function extentWarnings(measured: Measured, rate_hz: number): string[] {
  const { kind, windows, damping, band_hz, cuts, frequency_hz } = measured;
  const found: string[] = [];
  if (kind === 'ambient' && damping.upperBound) {
    found.push('the damping is an upper bound: the windows are too short for the width of the peak');
  }
  if (kind === 'ambient' && windows < FEW_WINDOWS) {
    found.push(
      `only ${String(windows)} ${windows === 1 ? 'window' : 'windows'}: the spectrum is hardly averaged, and its errors are rough`,
    );
  }
  if (frequency_hz * SAMPLES_OF_CYCLE > rate_hz) {
    found.push(
      `only ${formatNumber(rate_hz / frequency_hz, 2)} samples a cycle: vibration above ${hz(rate_hz / 2)} may be folded down to this peak; record at ${hz(10 * frequency_hz)} or more`,
    );
  }
  if (band_hz[1] < LEAST_HIGHEST_HZ && rate_hz * 0.4 <= band_hz[1]) {
    found.push(`at ${hz(rate_hz)} nothing above ${hz(band_hz[1])} is seen, where a low, stiff building may lie`);
  }
  const cut = (cuts.unreadable + cuts.flat) / cuts.samples;
  if (cut > MUCH_CUT) found.push(`${percent(cut)} of the samples were cut out`);
  return found;
}

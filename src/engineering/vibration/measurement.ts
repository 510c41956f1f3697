/** What a vibration record yields. Widths and errors are one standard error; NaN where not known. */
import type { Decay } from './decay.js';
import type { RecordKind } from './kind.js';
import type { Condition } from './quality.js';
import type { Cuts } from './signal.js';

export interface MeasureOptions {
  /** Judged from the data when left out. */
  readonly kind?: RecordKind;
  readonly window_s?: number;
  /** Where the peak is looked for; 0.1 to 25 Hz within what the record allows when left out. */
  readonly band_hz?: readonly [number, number];
}

export interface MeasuredPeak {
  readonly frequency_hz: number;
  readonly period_s: number;
  readonly over_background_db: number;
  /** Height as a share of the highest peak of the band. */
  readonly share: number;
  readonly chosen: boolean;
}

export interface Damping {
  readonly ratio: number;
  readonly ratio_se: number;
  readonly method: 'half-power' | 'logarithmic-decrement';
  /** Half-power points; null for a decay. */
  readonly half_power_hz: readonly [number, number] | null;
  /** The window is too short to resolve the width. */
  readonly upperBound: boolean;
}

export interface SpectrumLine {
  readonly step_hz: number;
  readonly density: Float64Array;
  readonly background: (frequency_hz: number) => number;
}

export interface Measurement {
  readonly kind: RecordKind;
  readonly kindReason: string;
  readonly frequency_hz: number;
  readonly frequency_se_hz: number;
  readonly period_s: number;
  readonly period_se_s: number;
  readonly damping: Damping;
  /** 1 / window. */
  readonly resolution_hz: number;
  readonly window_s: number;
  readonly windows: number;
  readonly covered_s: number;
  readonly over_background_db: number;
  readonly band_hz: readonly [number, number];
  readonly peaks: readonly MeasuredPeak[];
  /** Frequencies of a second mode beside the chosen one; empty when none is seen. */
  readonly close_hz: readonly number[];
  readonly conditions: readonly Condition[];
  readonly cuts: Cuts;
  readonly decay: (Decay & { readonly rate_hz: number; readonly start_s: number }) | null;
  readonly spectrum: SpectrumLine;
  readonly warnings: readonly string[];
}

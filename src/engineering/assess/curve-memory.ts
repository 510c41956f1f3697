/** What a period gives with a spectrum at the nodes of the period's error, as data, and a memory of it. */
import type { AnyRecord } from '../formula.js';

export interface PeriodBand {
  readonly p16_s: number;
  readonly p50_s: number;
  readonly p84_s: number;
}

/** Demand over the reduction by one ductility. */
export interface Reduced {
  readonly ductility: number;
  /** ln(S_a / R_μ) at every node, S_a in g. */
  readonly ln_g: Float64Array;
}

/** A period with its spread (a PeriodEstimate), and what has been read at its nodes so far. */
export interface Curve {
  readonly period_s: number;
  readonly sigma: number;
  readonly disagreement: number;
  readonly reduced: Reduced[];
  /** It is one building's own and gone with it: its arrays are lent. */
  readonly own: boolean;
}

/** Percentiles of the period where the height is inferred and the system is one. */
export interface KeptBand {
  readonly chance: number;
  readonly sigma: number;
  readonly band: PeriodBand;
}

/** By spectrum and height formula, then by height: periods from a formula of the height alone. */
export interface CurveMemory {
  readonly curves: Map<object, Map<AnyRecord, Map<number, Curve>>>;
  readonly bands: Map<AnyRecord, Map<number, KeptBand>>;
}

export function newCurveMemory(): CurveMemory {
  return { curves: new Map(), bands: new Map() };
}

/** Heights kept of one spectrum and formula: some hundred in a table in tenths of a metre, and the nodes of those inferred. */
export const MOST_HEIGHTS = 2048;

/** What is known of a building's period in one direction. */
import type { AnyRecord, Inputs } from '../formula.js';

export type Evidence = 'measured' | 'formula' | 'stiffness' | 'formula and stiffness';
/** What the counted formula was fitted to, or the kind of evidence where none counts. */
export type PeriodBasis = 'design' | 'best-fit' | 'ambient' | 'measured' | 'mechanics';

/** What is known of the period before the height is fixed. */
export interface PeriodModel {
  readonly evidence: Evidence;
  readonly basis: PeriodBasis;
  readonly formula: AnyRecord | null;
  /** Inputs of the formula at a height; null: the height alone. */
  readonly inputsAt: ((height_m: number) => Inputs) | null;
  /** The record that lengthens a formula of small amplitude; null where it speaks of strong shaking. */
  readonly strengthened: AnyRecord | null;
  /** Measured or stiffness period at the height of record, NaN when there is none. */
  readonly period_s: number;
  /** The stiffness period at another height, where it depends on it and the height is uncertain; else null. */
  readonly stiffnessAt: ((height_m: number) => number) | null;
  /** Spread of ln T of that period. */
  readonly sigma: number;
  /** Spread of ln T of the shared input (mass), added once after combining. */
  readonly sharedSigma: number;
  /** Ids of the measured record and the stiffness route that count, else null. */
  readonly measuredId: string | null;
  readonly routeId: string | null;
  /** The route that counts rests on assumed values. */
  readonly assumed: boolean;
  /** Other estimates (s) that the counted ones are checked against. */
  readonly checks: readonly number[];
}

/** One estimate of a period as it stands beside the others. */

export type EstimateKind = 'used' | 'measured' | 'stiffness' | 'standard' | 'other standard' | 'regression';

export interface AppliedEstimate {
  readonly applies: true;
  /** As it would read a spectrum: periods of small amplitude are lengthened. */
  readonly period_s: number;
  /** 16th and 84th percentile of its method error, or the band of the values it assumes where that is wider. */
  readonly low_s: number;
  readonly high_s: number;
  readonly counts: boolean;
  /** Why it counts, or why it does not. */
  readonly why: string;
  readonly notes: readonly string[];
}

export interface UnusableEstimate {
  readonly applies: false;
  readonly reason: string;
}

export interface Estimate {
  readonly kind: EstimateKind;
  /** Record or route id; `used` for the combination. */
  readonly id: string;
  readonly title: string;
  readonly source: string;
  readonly mark: string;
  readonly basis: string;
  readonly outcome: AppliedEstimate | UnusableEstimate;
}

/**
 * Which buildings stay on the list whatever weights are thought right: slope, exponent of the people and exponent of the importance drawn
 * evenly from their ranges, the order taken by medians (Lahdelma and Salminen 2001, from memory: rank acceptability over unknown weights).
 */
import { ln } from '../numeric/elementary.js';
import { philox } from '../numeric/philox.js';

/** Evenly drawn between the two. */
export type Range = readonly [number, number];

export interface WeightRanges {
  /** Slope of the hazard curve over that of the run. */
  readonly slope: Range;
  readonly people: Range;
  readonly importance: Range;
}

/** The ranked buildings, one entry each. */
export interface WeighedTerms {
  /** Median of ln S by the weights of the run. */
  readonly lnPriority: Float64Array;
  /** People inside on average, above 0. */
  readonly people: Float64Array;
  /** Importance factor; what is not above 0 counts as 1. */
  readonly importance: Float64Array;
}

/**
 * Of each building the share of `draws` weightings in which it is among the first `places`; equal buildings at the edge count all. `people` and
 * `importance` are the exponents in `lnPriority`.
 */
export function acceptability(
  terms: WeighedTerms,
  { people, importance }: { readonly people: number; readonly importance: number },
  ranges: WeightRanges,
  places: number,
  draws: number,
  seed: number,
): Float64Array {
  const { lnPriority } = terms;
  const n = lnPriority.length;
  const lnPeople = terms.people.map((value) => ln(value));
  const lnImportance = terms.importance.map((value) => (value > 0 ? ln(value) : 0));
  const share = new Float64Array(n);
  const most = Math.min(places, n);
  if (most === 0) return share;
  // what the slope multiplies: ln of demand over capacity, and what zones differ by
  const load = lnPriority.map((value, i) => value - people * lnPeople[i]! - importance * lnImportance[i]!);
  const score = new Float64Array(n);
  const sorted = new Float64Array(n);
  const words = new Uint32Array(4);
  for (let draw = 0; draw < draws; draw += 1) {
    philox(draw, 0, 0, 0, seed, 0x3e19a7, words);
    const [k, p, q] = [ranges.slope, ranges.people, ranges.importance].map(
      ([low, high], i) => low + ((high - low) * (words[i]! + 0.5)) / 4294967296,
    );
    for (let i = 0; i < n; i += 1) score[i] = k! * load[i]! + p! * lnPeople[i]! + q! * lnImportance[i]!;
    sorted.set(score);
    const edge = sorted.sort()[n - most]!;
    for (let i = 0; i < n; i += 1) if (score[i]! >= edge) share[i]! += 1 / draws;
  }
  return share;
}

/** The estimates of many buildings, gathered estimate by estimate: what a class of buildings looks like by each formula. */
import { quantileOfSorted } from '../numeric/quantile.js';
import type { Estimate } from './estimate.js';

/** One estimate over the buildings of a class, both directions together. */
export interface ClassEstimate extends Omit<Estimate, 'outcome'> {
  /** Directions of buildings that it applies to, and in how many of them it counts. */
  readonly applies: number;
  readonly counts: number;
  /** Median, 10th and 90th percentile of its period; NaN where it never applies. */
  readonly median_s: number;
  readonly p10_s: number;
  readonly p90_s: number;
  /** Median of its period over the period used. */
  readonly over_used: number;
  /** The commonest reason why it counts or does not, of the directions it applies to; else why it does not apply. */
  readonly why: string;
}

interface Gathered {
  readonly what: Omit<Estimate, 'outcome'>;
  readonly period_s: number[];
  readonly over_used: number[];
  /** Reasons where it applies, and where it does not, with how often. */
  readonly applied: Map<string, number>;
  readonly reasons: Map<string, number>;
  counts: number;
}

/** Collects the estimates of one direction of one building after another. */
export class ClassEstimates {
  readonly #byId = new Map<string, Gathered>();

  /** Takes the list of `periodEstimates`, whose first is the period used. */
  add(estimates: readonly Estimate[]): void {
    const used = estimates.find(({ kind }) => kind === 'used')?.outcome;
    const used_s = used?.applies === true ? used.period_s : NaN;
    for (const { outcome, ...what } of estimates) {
      let gathered = this.#byId.get(what.id);
      if (gathered === undefined) {
        gathered = { what, period_s: [], over_used: [], applied: new Map(), reasons: new Map(), counts: 0 };
        this.#byId.set(what.id, gathered);
      }
      const why = outcome.applies ? outcome.why : outcome.reason;
      const reasons = outcome.applies ? gathered.applied : gathered.reasons;
      reasons.set(why, (reasons.get(why) ?? 0) + 1);
      if (!outcome.applies) continue;
      gathered.period_s.push(outcome.period_s);
      gathered.over_used.push(outcome.period_s / used_s);
      if (outcome.counts) gathered.counts += 1;
    }
  }

  /** One entry an estimate, in the order met. */
  summary(): readonly ClassEstimate[] {
    return [...this.#byId.values()].map(({ what, period_s, over_used, applied, reasons, counts }) => {
      const sorted = Float64Array.from(period_s).sort();
      const ratios = Float64Array.from(over_used.filter((ratio) => !Number.isNaN(ratio))).sort();
      const [commonest] = [...(applied.size > 0 ? applied : reasons)].sort(
        ([ka, a], [kb, b]) => b - a || (ka < kb ? -1 : 1),
      );
      return {
        ...what,
        applies: sorted.length,
        counts,
        median_s: quantileOfSorted(sorted, 0.5),
        p10_s: quantileOfSorted(sorted, 0.1),
        p90_s: quantileOfSorted(sorted, 0.9),
        over_used: quantileOfSorted(ratios, 0.5),
        why: commonest?.[0] ?? '',
      };
    });
  }
}

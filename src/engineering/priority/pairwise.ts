/**
 * P(A > B) for two mixtures, half where both are point masses at one place; what two parts have
 * in common changes the variance of their difference by `change` of their labels.
 */
import { normalCdf } from '../numeric/normal.js';
import { labelOf } from './mixture.js';
import type { Mixture } from './mixture.js';

export function beats(a: Mixture, b: Mixture, change?: (labelA: number, labelB: number) => number): number {
  let sum = 0;
  for (let i = a.from; i < a.to; i += 1) {
    for (let j = b.from; j < b.to; j += 1) {
      const gap = a.mean[i]! - b.mean[j]!;
      const spread = a.sd[i]! * a.sd[i]! + b.sd[j]! * b.sd[j]! + (change?.(labelOf(a, i), labelOf(b, j)) ?? 0);
      const p = spread > 0 ? normalCdf(gap / Math.sqrt(spread)) : Math.abs(gap) < 1e-9 ? 0.5 : gap > 0 ? 1 : 0;
      sum += a.weight[i]! * b.weight[j]! * p;
    }
  }
  return sum;
}

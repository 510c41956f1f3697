/**
 * Power for x >= 0: x^p = exp(p ln x). The language's own `**` and `Math.pow` differ in the last bit between engines; see elementary.ts.
 */
import { exp, ln } from './elementary.js';

export function power(base: number, exponent: number): number {
  if (exponent === 0) return 1;
  if (exponent === 1) return base;
  if (base === 0) return 0;
  return exp(exponent * ln(base));
}

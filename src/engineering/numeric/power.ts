/**
 * Reproducible power: x^p = exp(p ln x) for x >= 0.
 *
 * `**` and `Math.pow` differ in the last bit between Node versions (and from the database), so a value traced on one machine
 * would not equal the one stored on another; `Math.exp` and `Math.log` were found bit-equal on Node 20, 22 and 24.
 */
export function power(base: number, exponent: number): number {
  if (exponent === 0) return 1;
  if (exponent === 1) return base;
  if (base === 0) return 0;
  return Math.exp(exponent * Math.log(base));
}

/**
 * A table of ordinates read without compiling it, for passes that have one table a building: the same operations in the same order
 * as the compiled table, hence the same bits. `sa_g` holds P ordinates from `at` on.
 */
import { ln } from '../numeric/elementary.js';
import { power } from '../numeric/power.js';
import { termAt } from './compiled.js';
import type { SpectrumDefinition } from './definition.js';

export type TableInterpolation = 'linear' | 'log-log';

/** S_a (g) at `period_s` of the table that begins at `at`; flat outside its periods. */
export function readTable(
  periods_s: Float64Array,
  sa_g: Float64Array,
  at: number,
  interpolation: TableInterpolation,
  period_s: number,
): number {
  const last = periods_s.length - 1;
  if (period_s < periods_s[0]!) return sa_g[at]!;
  if (period_s >= periods_s[last]!) return sa_g[at + last]!;
  let low = 0;
  let high = last - 1;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if (periods_s[middle]! <= period_s) low = middle;
    else high = middle - 1;
  }
  const t1 = periods_s[low]!;
  const t2 = periods_s[low + 1]!;
  const s1 = sa_g[at + low]!;
  const s2 = sa_g[at + low + 1]!;
  if (interpolation === 'linear') {
    const slope = (s2 - s1) / (t2 - t1);
    return s1 - slope * t1 + slope * period_s;
  }
  const exponent = ln(s2 / s1) / ln(t2 / t1);
  return termAt(s1 / power(t1, exponent), exponent, period_s);
}

/** Where the plateau of the table starts and its corner period, s, as in the compiled table: `[from_s, to_s]`. */
export function plateauOfTable(periods_s: Float64Array, sa_g: Float64Array, at: number): readonly [number, number] {
  let top = 0;
  let velocity = 0;
  for (let i = 0; i < periods_s.length; i += 1) {
    if (sa_g[at + i]! > sa_g[at + top]!) top = i;
    velocity = Math.max(velocity, sa_g[at + i]! * periods_s[i]!);
  }
  const from = periods_s[top]!;
  return [from, Math.max(velocity / sa_g[at + top]!, from)];
}

/** The table as a definition that a trace or a picture can compile. */
export function definitionOfTable(
  periods_s: Float64Array,
  sa_g: Float64Array,
  at: number,
  interpolation: TableInterpolation,
): SpectrumDefinition {
  return {
    code: 'table',
    periods_s: [...periods_s],
    ordinates_g: [...sa_g.subarray(at, at + periods_s.length)],
    interpolation,
  };
}

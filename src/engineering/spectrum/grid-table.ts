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
  const low = intervalAt(periods_s, period_s);
  const s1 = sa_g[at + low]!;
  if (interpolation === 'linear') {
    const t1 = periods_s[low]!;
    const slope = (sa_g[at + low + 1]! - s1) / (periods_s[low + 1]! - t1);
    return s1 - slope * t1 + slope * period_s;
  }
  const exponent = exponentOf(periods_s, sa_g, low, at);
  return termAt(s1 / power(periods_s[low]!, exponent), exponent, period_s);
}

/** The interval that holds a period within the table. */
function intervalAt(periods_s: Float64Array, period_s: number): number {
  let low = 0;
  let high = periods_s.length - 2;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if (periods_s[middle]! <= period_s) low = middle;
    else high = middle - 1;
  }
  return low;
}

/** Exponent of a log-log interval. */
function exponentOf(periods_s: Float64Array, sa_g: Float64Array, low: number, at = 0): number {
  return ln(sa_g[at + low + 1]! / sa_g[at + low]!) / ln(periods_s[low + 1]! / periods_s[low]!);
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

/** The table of one site, read many times: what an interval of a log-log table needs is worked out when it is first read. */
export class SiteTable {
  readonly periods_s: Float64Array;
  /** g; P of them. */
  readonly sa_g: Float64Array;
  readonly interpolation: TableInterpolation;
  /** Coefficient and exponent of each interval, NaN until it is read. */
  readonly #powers: Float64Array | null;

  constructor(periods_s: Float64Array, sa_g: Float64Array, interpolation: TableInterpolation) {
    this.periods_s = periods_s;
    this.sa_g = sa_g;
    this.interpolation = interpolation;
    this.#powers = interpolation === 'log-log' ? new Float64Array(2 * periods_s.length).fill(NaN) : null;
  }

  /** S_a (g) at `period_s`, as `readTable` gives it. */
  read(period_s: number): number {
    const powers = this.#powers;
    const { periods_s, sa_g } = this;
    if (powers === null || period_s < periods_s[0]! || period_s >= periods_s[periods_s.length - 1]!)
      return readTable(periods_s, sa_g, 0, this.interpolation, period_s);
    const low = intervalAt(periods_s, period_s);
    let exponent = powers[2 * low + 1]!;
    if (Number.isNaN(exponent)) {
      exponent = exponentOf(periods_s, sa_g, low);
      powers[2 * low] = sa_g[low]! / power(periods_s[low]!, exponent);
      powers[2 * low + 1] = exponent;
    }
    return termAt(powers[2 * low]!, exponent, period_s);
  }
}

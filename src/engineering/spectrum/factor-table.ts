/** A printed table of factors: one row a class, one column a value of the argument; linear in between, flat outside the end columns. */
import type { Family, ShownFormula } from '../formula.js';

export interface FactorTable {
  /** Values of the argument, increasing. */
  readonly columns: readonly number[];
  /** Factors by class; null where the publication gives none. */
  readonly rows: Readonly<Record<string, readonly (number | null)[]>>;
  /** What the publication asks for where it gives none: ends the message of the refusal. */
  readonly where?: string;
}

interface Span {
  readonly low: number;
  readonly high: number;
  /** Columns of the two. */
  readonly from: number;
  readonly to: number;
}

/** The two cells around `value`; the same cell twice outside the columns. @throws RangeError for an unknown row or a cell without a value. */
function spanOf(table: FactorTable, row: string, argument: string, value: number): Span {
  const { columns, rows, where } = table;
  const cells = Object.hasOwn(rows, row) ? rows[row] : undefined;
  if (cells === undefined) throw new RangeError(`unknown class "${row}"; known: ${Object.keys(rows).join(', ')}`);
  let i = 0;
  while (i < columns.length && columns[i]! <= value) i += 1;
  const [a, b] = [Math.max(i - 1, 0), Math.min(i, columns.length - 1)];
  const [low, high] = [cells[a], value === columns[a] ? cells[a] : cells[b]];
  if (low == null || high == null) {
    throw new RangeError(
      `class ${row} with ${argument} = ${String(value)} has no factor: ${where ?? 'not in the table'}`,
    );
  }
  return { low, high, from: columns[a]!, to: value === columns[a] ? columns[a] : columns[b]! };
}

/** The factor of `row` at `value`. @throws RangeError where the publication has none. */
export function factorAt(table: FactorTable, row: string, argument: string, value: number): number {
  const { low, high, from, to } = spanOf(table, row, argument, value);
  return low === high ? low : low + ((high - low) * (value - from)) / (to - from);
}

export type FactorInput<A extends string> = Readonly<Record<A, number>> & { readonly site_class: string };

/** The family of one factor table: its value by class and argument, the interpolation shown. */
export function factorFamily<A extends string>(
  id: string,
  yields: string,
  symbol: string,
  table: FactorTable,
  argument: {
    readonly name: A;
    readonly unit: string;
    readonly meaning: string;
    readonly from: number;
    readonly to: number;
  },
): Family<FactorInput<A>, Record<never, number>> {
  const shownAt = (input: FactorInput<A>): ShownFormula => {
    const { low, high, from, to } = spanOf(table, input.site_class, argument.name, input[argument.name]);
    return {
      expression:
        low === high
          ? String(low)
          : `${String(low)} + (${String(high)} - ${String(low)}) * (${argument.name} - ${String(from)}) / (${String(to)} - ${String(from)})`,
      clause: `class ${input.site_class}`,
    };
  };
  return {
    id,
    yields,
    unit: null,
    symbol,
    inputs: [
      { name: 'site_class', kind: 'word', words: Object.keys(table.rows), meaning: 'site class' },
      { ...argument, kind: 'number' },
    ],
    expression: null,
    procedure: 'the table by class, linear between its columns, flat outside',
    shownAt,
    evaluate: (input) => factorAt(table, input.site_class, argument.name, input[argument.name]),
  };
}

/** What every chart of the page consists of: a picture and the same in words and numbers. */
import type { TopLevelSpec } from 'vega-lite';
import { packColumn } from '../pack.js';
import type { Packed } from '../pack.js';

export interface DataTable {
  readonly caption: string;
  readonly head: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

export interface Chart {
  readonly id: string;
  /** What is shown, as a heading. */
  readonly title: string;
  /** The text equivalent: what the picture says, computed from the data. */
  readonly sentence: string;
  readonly table: DataTable;
  readonly spec: TopLevelSpec;
  /** Data sets named in the specification, by column. Column `i`, where present, is the place of the building. */
  readonly data: Readonly<Record<string, Readonly<Record<string, Packed>>>>;
  readonly renderer: 'svg' | 'canvas';
}

/** Above this many marks a canvas is drawn; below it the colours of vector graphics follow the page by themselves. */
const MOST_VECTOR_MARKS = 3000;

/** The renderer for so many marks. */
export function rendererFor(marks: number): Chart['renderer'] {
  return marks > MOST_VECTOR_MARKS ? 'canvas' : 'svg';
}

/** Rows as packed columns; numbers to `digits` significant digits. */
export function columnsOf<T extends object>(rows: readonly T[], digits = 5): Readonly<Record<string, Packed>> {
  const names = Object.keys(rows[0] ?? {});
  return Object.fromEntries(names.map((name) => [name, packColumn(rows.map((row) => (row as Record<string, number | string | null>)[name] ?? null), digits)]));
}

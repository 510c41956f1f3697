/** Tables that fit the terminal. */
import { styled } from './style.js';
import { clean, fit, pad, width } from './text.js';

export interface TableColumn {
  readonly title: string;
  readonly right?: boolean;
  /** Least width; a column with it may be cut down to it when the table is too wide. */
  readonly shrinkTo?: number;
  /** Left out first (highest number first) when cutting down is not enough. */
  readonly spare?: number;
}

const GAP = '  ';

/** The lines of a table at most `columns` wide: header, then one line per row. Cells are cleaned here. */
export function table(
  columns: readonly TableColumn[],
  rows: readonly (readonly string[])[],
  available: number,
  indent = '',
): string[] {
  const texts = rows.map((row) => row.map(clean));
  const natural = columns.map((column, i) => Math.max(width(column.title), ...texts.map((row) => width(row[i] ?? ''))));
  const room = available - indent.length;
  const kept = keptColumns(columns, natural, room);
  const widths = fitWidths(kept, columns, natural, room);
  const line = (cells: readonly string[]): string =>
    indent +
    kept
      .map((at, i) => pad(fit(cells[at] ?? '', widths[i] ?? 0), widths[i] ?? 0, columns[at]?.right))
      .join(GAP)
      .trimEnd();
  const head = line(columns.map(({ title }) => title));
  return [styled('bold', head), ...texts.map(line)];
}

function total(widths: readonly number[]): number {
  return widths.reduce((sum, one) => sum + one, 0) + GAP.length * Math.max(0, widths.length - 1);
}

function least(column: TableColumn | undefined, natural: number): number {
  return column?.shrinkTo === undefined ? natural : Math.min(natural, column.shrinkTo);
}

function keptColumns(columns: readonly TableColumn[], natural: readonly number[], room: number): readonly number[] {
  let kept = columns.map((_, i) => i);
  while (total(kept.map((i) => least(columns[i], natural[i] ?? 0))) > room) {
    const first = kept
      .filter((i) => columns[i]?.spare !== undefined)
      .sort((a, b) => (columns[b]?.spare ?? 0) - (columns[a]?.spare ?? 0))[0];
    if (first === undefined) break;
    kept = kept.filter((i) => i !== first);
  }
  return kept;
}

function fitWidths(
  kept: readonly number[],
  columns: readonly TableColumn[],
  natural: readonly number[],
  room: number,
): readonly number[] {
  const widths = kept.map((i) => natural[i] ?? 0);
  while (total(widths) > room) {
    // The widest that may still give way gives one column.
    let widest = -1;
    kept.forEach((at, i) => {
      const mine = widths[i] ?? 0;
      if (mine > least(columns[at], natural[at] ?? 0) && (widest < 0 || mine > (widths[widest] ?? 0))) widest = i;
    });
    if (widest < 0) break;
    widths[widest] = (widths[widest] ?? 0) - 1;
  }
  return widths;
}

/** The rewritten table as a temporary table: plain numbers are cast by the query, every other cell is kept for `cells.ts`. */
import { Bug } from '../errors.js';
import type { Database } from '../store/database.js';
import { quoteList, quoteName, quoteText } from '../store/sql.js';
import type { MappedColumn, Mapping } from './header.js';
import { LINE_BREAK } from './records.js';
import type { PlainTable } from './normalise.js';

/** Longest text kept of a cell; a footprint may be longer. */
export const LONGEST_TEXT = 500;
const LONGEST_FOOTPRINT = 100_000;

/** How the database reads a rewritten table; its columns are `row`, `c0`, `c1`, … */
export function readTableSql(table: PlainTable): string {
  const columns = table.header.map((_, at) => `'c${at}': 'VARCHAR'`).join(', ');
  const line = Math.max(2_097_152, 2 * table.longest + 4096);
  return `read_csv(${quoteText(table.path)}, auto_detect = false, header = false, delim = ${quoteText(table.delimiter)},
    quote = '"', escape = '"', new_line = '\\n', columns = {'row': 'INTEGER', ${columns}}, max_line_size = ${line},
    buffer_size = ${Math.max(8_388_608, 2 * line)})`;
}

/** The name of the column that holds what a numeric cell says where it is not a plain number within limits. */
export function oddName({ column }: MappedColumn): string {
  return quoteName(`${column.name} as written`);
}

export function isNumeric({ column }: MappedColumn): boolean {
  return column.kind === 'number' || column.kind === 'whole' || column.kind === 'year';
}

/**
 * Makes the temporary table `intake_cell`: row, one column per mapped column (numbers in SI, words and texts trimmed),
 * what is odd as written, `merge key` and `site only` where the study asks for them.
 */
export async function readCells(db: Database, table: PlainTable, mapping: Mapping, study: ReadChoices): Promise<void> {
  const inner: string[] = ['row'];
  const outer: string[] = ['row'];
  for (const mapped of mapping.columns) {
    const name = quoteName(mapped.column.name);
    const cell = `nullif(trim(c${mapped.position}), '')`;
    if (isNumeric(mapped)) {
      inner.push(`c${mapped.position} AS ${oddName(mapped)}`, `${plainNumberSql(mapped, study.decimal)} AS ${name}`);
      outer.push(
        name,
        `CASE WHEN ${name} IS NULL THEN nullif(trim(left(${oddName(mapped)}, 1000)), '') END AS ${oddName(mapped)}`,
      );
    } else {
      inner.push(`${textSql(mapped, cell, table, study)} AS ${name}`);
      outer.push(name);
    }
  }
  if (mapping.mergeBy !== undefined) {
    inner.push(`${blankSql(`nullif(trim(c${mapping.mergeBy}), '')`, study)} AS "merge key"`);
    outer.push('"merge key"');
  }
  if (mapping.noBuilding !== undefined) {
    const { position, values } = mapping.noBuilding;
    const folded = `regexp_replace(lower(trim(coalesce(c${position}, ''))), '\\s+', ' ', 'g')`;
    inner.push(`list_contains(${quoteList(values)}, ${folded}) AS "site only"`);
    outer.push('"site only"');
  }
  await db.run(`CREATE OR REPLACE TEMP TABLE intake_cell AS
    SELECT ${outer.join(', ')} FROM (SELECT ${inner.join(', ')} FROM ${readTableSql(table)})`);
  const read = await db.value('SELECT count(*) FROM intake_cell');
  if (read !== table.written) throw new Bug(`the database read ${String(read)} of ${table.written} rows`);
}

export interface ReadChoices {
  readonly decimal: string;
  readonly blank: readonly string[];
}

// A cast alone would take 0x10, 1_000, inf and nan: the pattern comes first. The cast drops outer blanks by itself.
function plainNumberSql({ column, position, unit, stored }: MappedColumn, decimal: string): string {
  const cell = `c${position}`;
  const fraction = column.kind === 'number' ? `([${decimal === ',' ? ',' : '.'}][0-9]+)?` : '([.]0+)?';
  const text = decimal === ',' && column.kind === 'number' ? `replace(${cell}, ',', '.')` : cell;
  const cast = `CAST(${text} AS DOUBLE)`;
  const si =
    unit === undefined || stored === undefined || unit.id === stored.id
      ? cast
      : `${cast} * ${doubleSql(unit.factor)} / ${doubleSql(stored.factor)}`;
  const [low, high] = column.limits ?? [-Infinity, Infinity];
  return `CASE WHEN regexp_full_match(${cell}, ' *-?[0-9]+${fraction} *')
    THEN CASE WHEN ${si} BETWEEN ${doubleSql(low)} AND ${doubleSql(high)} THEN ${si} END END`;
}

// Read from text, a double is the nearest one; a decimal literal would be computed with other precision.
export function doubleSql(value: number): string {
  return `CAST('${value}' AS DOUBLE)`;
}

function textSql(mapped: MappedColumn, cell: string, table: PlainTable, study: ReadChoices): string {
  const text = table.hasLineBreaks ? `replace(${cell}, ${quoteText(LINE_BREAK)}, chr(10))` : cell;
  const longest = mapped.column.name === 'footprint' ? LONGEST_FOOTPRINT : LONGEST_TEXT;
  // One more than is kept: that it is too long must still show. `strlen` counts bytes and costs nothing.
  const cut = `CASE WHEN strlen(${text}) > ${longest} THEN left(${text}, ${longest + 1}) ELSE ${text} END`;
  return isPlainText(mapped) ? blankSql(cut, study) : cut;
}

/** A column whose cells are kept as they are written. */
export function isPlainText({ column }: MappedColumn): boolean {
  return column.kind === 'text' && column.vocabulary === undefined;
}

function blankSql(text: string, { blank }: ReadChoices): string {
  const words = blank.map((word) => word.trim().toLowerCase()).filter((word) => word !== '');
  if (words.length === 0) return text;
  const longest = Math.max(...words.map((word) => Buffer.byteLength(word)));
  // The length first: nearly every cell is longer, and folding its case would cost most of the reading.
  return `CASE WHEN strlen(${text}) <= ${longest} AND list_contains(${quoteList(words)}, lower(${text})) THEN NULL ELSE ${text} END`;
}

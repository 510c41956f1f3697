/** The rewritten table as a temporary table: plain numbers are cast by the query, every other cell is kept for `cells.ts`. */
import { Bug } from '../errors.js';
import type { Database } from '../store/database.js';
import { quoteList, quoteName, quoteText } from '../store/sql.js';
import type { MappedColumn, Mapping } from './header.js';
import type { PlainTable } from './normalise.js';
import { LINE_BREAK } from './records.js';
import type { RecordTotals } from './records.js';
import { FORM } from './standing.js';
import type { Standing } from './standing.js';
import type { Table } from './table.js';

/** Longest text kept of a cell; a footprint may be longer. */
export const LONGEST_TEXT = 500;
const LONGEST_FOOTPRINT = 100_000;

/** How the database reads a rewritten table; its columns are `row`, `c0`, `c1`, … */
export function readTableSql(table: PlainTable): string {
  return readCsvSql(table, "'row': 'INTEGER', ", '\n', 0, () => 'VARCHAR');
}

function readCsvSql(
  { path, delimiter, longest, header }: PlainTable | Standing,
  first: string,
  lineEnd: '\n' | '\r\n',
  skip: number,
  typeOf: (position: number) => string,
): string {
  const columns = header.map((_, at) => `'c${at}': '${typeOf(at)}'`).join(', ');
  const line = Math.max(2_097_152, 2 * longest + 4096);
  return `read_csv(${quoteText(path)}, auto_detect = false, header = false, skip = ${skip}, delim = ${quoteText(delimiter)},
    compression = 'none', quote = '"', escape = '"', new_line = ${quoteText(lineEnd === '\n' ? '\\n' : '\\r\\n')}, columns = {${first}${columns}}, max_line_size = ${line},
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
 * Makes `intake_cell`, a temporary table or a view of one: row, one column per mapped column (numbers in SI, words and texts
 * trimmed), what is odd as written, `merge key` and `site only` where the study asks for them.
 */
export async function readCells(db: Database, table: Table, mapping: Mapping, study: ReadChoices): Promise<void> {
  const { standing } = table;
  if (standing === undefined) {
    const plain = table.rewritten();
    await db.run(`CREATE OR REPLACE TEMP TABLE intake_cell AS
      ${cellsSql(readTableSql(plain), 'row', plain, mapping, study, new Set())}`);
  } else await readStanding(db, standing, mapping, study);
  const read = await db.value('SELECT count(*) FROM intake_cell');
  if (read !== table.written) throw new Bug(`the database read ${String(read)} of ${table.written} rows`);
}

/**
 * Reads a table where it stands. Columns of nothing but plain numbers are read as numbers; where some prove to be outside their
 * limits, all is read once more, with those columns as text, for the findings to show the cells as written.
 */
async function readStanding(db: Database, standing: Standing, mapping: Mapping, study: ReadChoices): Promise<void> {
  let typed: readonly MappedColumn[] = mapping.columns.filter(
    (mapped) => isNumeric(mapped) && (standing.forms[mapped.position]! & ~plainForms(mapped, study.decimal)) === 0,
  );
  for (;;) {
    const positions = new Set(typed.map(({ position }) => position));
    const source = readCsvSql(standing, '', standing.lineEnd, 1, (at) => (positions.has(at) ? 'DOUBLE' : 'VARCHAR'));
    await db.run(
      `CREATE OR REPLACE TEMP TABLE intake_read AS ${cellsSql(source, undefined, standing, mapping, study, new Set(typed))}`,
    );
    const within = await withinLimits(db, typed);
    if (within.length === typed.length) break;
    typed = within;
  }
  // Inserted in the order of the file, of which the header is row 1. The database numbers the rows from 0, or from a huge number
  // on where a transaction has not ended.
  const first = String((await db.value('SELECT CAST(min(rowid) AS VARCHAR) FROM intake_read')) ?? 0);
  await db.run(`CREATE OR REPLACE TEMP VIEW intake_cell AS SELECT CAST(rowid - ${first} + 2 AS INTEGER) AS "row", *
    ${typed.map((mapped) => `, CAST(NULL AS VARCHAR) AS ${oddName(mapped)}`).join('')} FROM intake_read`);
}

/** The forms that `plainNumberSql` would take. */
function plainForms({ column }: MappedColumn, decimal: string): number {
  const whole = FORM.empty | FORM.whole;
  if (column.kind !== 'number') return whole | FORM.zeros;
  return decimal === ',' ? whole : whole | FORM.zeros | FORM.fraction;
}

/** Those of the columns of which every number is within its limits. */
async function withinLimits(db: Database, typed: readonly MappedColumn[]): Promise<readonly MappedColumn[]> {
  if (typed.length === 0) return typed;
  const within = typed.map(({ column }, at) => {
    const [low, high] = column.limits ?? [-Infinity, Infinity];
    return `coalesce(bool_and(${quoteName(column.name)} BETWEEN ${doubleSql(low)} AND ${doubleSql(high)}), true) AS c${at}`;
  });
  const [row = {}] = await db.rows<Record<string, boolean>>(`SELECT ${within.join(', ')} FROM intake_read`);
  return typed.filter((_, at) => row[`c${at}`] === true);
}

/**
 * The query that reads the cells of a table, step by step: an expression that stands in another is worked out again for each of
 * its places, one of an inner query once.
 */
function cellsSql(
  source: string,
  row: string | undefined,
  table: RecordTotals,
  mapping: Mapping,
  study: ReadChoices,
  typed: ReadonlySet<MappedColumn>,
): string {
  const first = row === undefined ? [] : [row];
  const [read, cut, done] = [[...first], [...first], [...first]];
  for (const mapped of mapping.columns) {
    const name = quoteName(mapped.column.name);
    if (typed.has(mapped)) {
      read.push(`${inSi(mapped, `c${mapped.position}`)} AS ${name}`);
      cut.push(name);
      done.push(name);
    } else if (isNumeric(mapped)) {
      const odd = oddName(mapped);
      const [low, high] = mapped.column.limits ?? [-Infinity, Infinity];
      read.push(`c${mapped.position} AS ${odd}`, `${plainNumberSql(mapped, study.decimal)} AS ${name}`);
      cut.push(odd, `CASE WHEN ${name} BETWEEN ${doubleSql(low)} AND ${doubleSql(high)} THEN ${name} END AS ${name}`);
      done.push(
        name,
        `CASE WHEN ${name} IS NULL AND ${odd} <> '' THEN nullif(trim(left(${odd}, 1000)), '') END AS ${odd}`,
      );
    } else {
      const text = `nullif(trim(c${mapped.position}), '')`;
      const longest = mapped.column.name === 'footprint' ? LONGEST_FOOTPRINT : LONGEST_TEXT;
      read.push(`${table.hasLineBreaks ? `replace(${text}, ${quoteText(LINE_BREAK)}, chr(10))` : text} AS ${name}`);
      // One more than is kept: that it is too long must still show. `strlen` counts bytes and costs nothing.
      cut.push(`CASE WHEN strlen(${name}) > ${longest} THEN left(${name}, ${longest + 1}) ELSE ${name} END AS ${name}`);
      done.push(isPlainText(mapped) ? `${blankSql(name, study)} AS ${name}` : name);
    }
  }
  if (mapping.mergeBy !== undefined) {
    read.push(`nullif(trim(c${mapping.mergeBy}), '') AS "merge key"`);
    cut.push('"merge key"');
    done.push(`${blankSql('"merge key"', study)} AS "merge key"`);
  }
  if (mapping.noBuilding !== undefined) {
    const { position, values } = mapping.noBuilding;
    const folded = `regexp_replace(lower(trim(coalesce(c${position}, ''))), '\\s+', ' ', 'g')`;
    read.push(`list_contains(${quoteList(values)}, ${folded}) AS "site only"`);
    cut.push('"site only"');
    done.push('"site only"');
  }
  return `SELECT ${done.join(', ')} FROM (SELECT ${cut.join(', ')} FROM (SELECT ${read.join(', ')} FROM ${source}))`;
}

export interface ReadChoices {
  readonly decimal: string;
  readonly blank: readonly string[];
}

// A cast alone would take 0x10, 1_000, inf and nan: the pattern comes first. The cast drops outer blanks by itself.
function plainNumberSql(mapped: MappedColumn, decimal: string): string {
  const { column, position } = mapped;
  const cell = `c${position}`;
  const fraction = column.kind === 'number' ? `([${decimal === ',' ? ',' : '.'}][0-9]+)?` : '([.]0+)?';
  const text = decimal === ',' && column.kind === 'number' ? `replace(${cell}, ',', '.')` : cell;
  return `CASE WHEN regexp_full_match(${cell}, ' *-?[0-9]+${fraction} *') THEN ${inSi(mapped, `CAST(${text} AS DOUBLE)`)} END`;
}

function inSi({ unit, stored }: MappedColumn, number: string): string {
  if (unit === undefined || stored === undefined || unit.id === stored.id) return number;
  return `${number} * ${doubleSql(unit.factor)} / ${doubleSql(stored.factor)}`;
}

// Read from text, a double is the nearest one; a decimal literal would be computed with other precision.
export function doubleSql(value: number): string {
  return `CAST('${value}' AS DOUBLE)`;
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

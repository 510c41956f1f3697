/** Cells the query could not read by itself: each distinct text is read once, here, and joined back. */
import type { Database } from '../store/database.js';
import { columnType } from '../store/schema.js';
import { quoteName, quoteText } from '../store/sql.js';
import { foldWord, readListCell, readNumberCell, readWordCell } from './cell.js';
import type { CellNote } from './cell.js';
import type { MappedColumn, Mapping } from './header.js';
import type { IntakeStudy } from './intake-study.js';
import { LONGEST_TEXT, isNumeric, isPlainText, oddName } from './read.js';

/** Column of the rows query that holds the first year of the decade where only that is known. */
export const DECADE = '"year decade"';

/** How to read `intake_cell c` with the odd cells joined back. */
export interface Readings {
  /** The number of the use in USES, if uses are mapped; -1 or NULL when unknown. */
  readonly useNumber: string | undefined;
  /** The expression of every mapped column, by its name. */
  readonly cells: Readonly<Record<string, string>>;
  readonly decade: string;
  readonly joins: string;
  /** A query with row, key, every mapped column as read, and the decade. */
  readonly rowsSql: string;
}

/**
 * Reads the odd cells of `intake_cell`, writes their findings, and gives the query that joins them back.
 */
export async function readOddCells(db: Database, mapping: Mapping, study: IntakeStudy): Promise<Readings> {
  await db.run(`CREATE OR REPLACE TEMP TABLE intake_reading (column_name VARCHAR, cell VARCHAR, value DOUBLE, decade DOUBLE,
    word VARCHAR, word_number INTEGER, code VARCHAR, message VARCHAR, action VARCHAR, kind VARCHAR)`);
  const cells: Record<string, string> = {};
  const joins: string[] = [];
  let decade = 'CAST(NULL AS DOUBLE)';
  let useNumber: string | undefined;
  for (const mapped of mapping.columns) {
    const name = quoteName(mapped.column.name);
    if (isPlainText(mapped)) {
      cells[mapped.column.name] =
        (await noteCutTexts(db, mapped, mapping)) && mapped.column.name !== 'id'
          ? `left(c.${name}, ${LONGEST_TEXT})`
          : `c.${name}`;
      continue;
    }
    const source = isNumeric(mapped) ? oddName(mapped) : name;
    const { found, codes } = await readDistinct(db, mapped, source, study);
    await noteReadings(db, mapped, source, mapping, codes);
    const alias = `r${joins.length}`;
    if (found) {
      const word = isNumeric(mapped) ? '' : `, CAST(word AS ${columnType(mapped.column)}) AS word`;
      const filter = `(SELECT cell, value, decade, word_number${word} FROM intake_reading WHERE column_name = ${quoteText(mapped.column.name)})`;
      joins.push(`LEFT JOIN ${filter} ${alias} ON ${alias}.cell = c.${source}`);
    }
    if (!isNumeric(mapped))
      cells[mapped.column.name] = found ? `${alias}.word` : `CAST(NULL AS ${columnType(mapped.column)})`;
    else cells[mapped.column.name] = found ? `coalesce(c.${name}, ${alias}.value)` : `c.${name}`;
    if (found && mapped.column.name === 'use') useNumber = `${alias}.word_number`;
    if (found && mapped.column.name === 'year_built') decade = `${alias}.decade`;
  }
  const selected = [
    'c."row"',
    `${keySql(mapping)} AS key`,
    ...Object.entries(cells).map(([name, cell]) => `${cell} AS ${quoteName(name)}`),
    `${decade} AS ${DECADE}`,
    `${useNumber ?? 'CAST(NULL AS INTEGER)'} AS "use number"`,
    ...(mapping.noBuilding === undefined ? [] : ['c."site only"']),
  ];
  const joined = joins.join(' ');
  return {
    useNumber,
    cells,
    decade,
    joins: joined,
    rowsSql: `SELECT ${selected.join(', ')} FROM intake_cell c ${joined}`,
  };
}

/** What names the building of a row of `intake_cell c`. */
export function keySql(mapping: Mapping): string {
  return mapping.mergeBy === undefined ? 'c.id' : 'c."merge key"';
}

interface Distinct {
  readonly found: boolean;
  /** The codes of the notes that arose. */
  readonly codes: ReadonlySet<string>;
}

async function readDistinct(db: Database, mapped: MappedColumn, source: string, study: IntakeStudy): Promise<Distinct> {
  const { cell } = await db.columns(
    `SELECT DISTINCT ${source} AS cell FROM intake_cell WHERE ${source} IS NOT NULL ORDER BY cell`,
    { cell: 'text' },
  );
  if (cell.length === 0) return { found: false, codes: new Set() };
  const { column, unit, stored } = mapped;
  const blank = new Set(study.inventory.blank.map(foldWord));
  const format = { decimal: study.inventory.decimal, unit, stored };
  const words = vocabularyOf(study, column.vocabulary);
  const value = new Float64Array(cell.length).fill(NaN);
  const decade = new Float64Array(cell.length).fill(NaN);
  const word: (string | null)[] = cell.map(() => null);
  const notes: (CellNote | undefined)[] = cell.map((text, at) => {
    if (text === null || blank.has(foldWord(text))) return undefined;
    if (column.kind === 'word' || column.kind === 'text') {
      const read = readWordCell(text, column, words);
      word[at] = read.word;
      return read.note;
    }
    if (column.kind === 'list') {
      const read = readListCell(text, column, format);
      word[at] = read.list;
      return read.note;
    }
    const read = readNumberCell(text, column, format);
    decade[at] = read.decade;
    // A decade is ten years, not its first one.
    if (Number.isNaN(read.decade)) value[at] = read.value;
    return read.note;
  });
  await db.append('intake_reading', [
    cell.map(() => column.name),
    cell,
    value,
    decade,
    word,
    Int32Array.from(word, (text) => (text === null ? -1 : (column.words?.indexOf(text) ?? -1))),
    notes.map((note) => note?.code ?? null),
    notes.map((note) => note?.message ?? null),
    notes.map((note) => note?.action ?? null),
    notes.map((note) => note?.kind ?? null),
  ]);
  return { found: true, codes: new Set(notes.flatMap((note) => note?.code ?? [])) };
}

/** The study's own words of a vocabulary, folded, and ours. */
export function vocabularyOf(study: IntakeStudy, vocabulary: string | undefined): ReadonlyMap<string, string> {
  const words = vocabulary === undefined ? undefined : study.words[vocabulary];
  return new Map(Object.entries(words ?? {}).map(([theirs, ours]) => [foldWord(theirs), ours]));
}

async function noteReadings(
  db: Database,
  mapped: MappedColumn,
  source: string,
  mapping: Mapping,
  codes: ReadonlySet<string>,
): Promise<void> {
  const name = quoteText(mapped.column.name);
  const others = codes.size - (codes.has('zero') ? 1 : 0);
  if (others > 0)
    await db.run(`INSERT INTO intake_finding
    SELECT c."row", ${keySql(mapping)}, ${name}, left(c.${source}, 200), r.code, r.message, r.action, r.kind
    FROM intake_cell c JOIN intake_reading r ON r.column_name = ${name} AND r.cell = c.${source}
    WHERE r.code IS NOT NULL AND r.code <> 'zero' ${notASite(mapping)}`);
  if (!codes.has('zero')) return;
  // Zero for unknown is a habit of the whole column: one note, not one per row.
  await db.run(`INSERT INTO intake_finding
    SELECT NULL, NULL, ${name}, '0', 'zero', count(*) || ' cells hold 0; ' || any_value(r.message), any_value(r.action), 'note'
    FROM intake_cell c JOIN intake_reading r ON r.column_name = ${name} AND r.cell = c.${source}
    WHERE r.code = 'zero' ${notASite(mapping)} HAVING count(*) > 0`);
}

// What a site without a building says about its building is of no concern.
function notASite(mapping: Mapping): string {
  return mapping.noBuilding === undefined ? '' : 'AND NOT c."site only"';
}

async function noteCutTexts(db: Database, mapped: MappedColumn, mapping: Mapping): Promise<boolean> {
  const { name } = mapped.column;
  if (name === 'footprint') return false;
  const message = `the text is longer than ${LONGEST_TEXT} characters`;
  const cut = await db.run(
    `INSERT INTO intake_finding
     SELECT c."row", ${keySql(mapping)}, ${quoteText(name)}, left(c.${quoteName(name)}, 200), 'text-cut', ?, ?, 'note'
     FROM intake_cell c WHERE strlen(c.${quoteName(name)}) > ${LONGEST_TEXT} AND length(c.${quoteName(name)}) > ${LONGEST_TEXT}`,
    [message, `cut after ${LONGEST_TEXT} characters`],
  );
  return cut > 0;
}

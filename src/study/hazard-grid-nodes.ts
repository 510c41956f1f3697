/** The rows of a hazard grid as numbers, from CSV (streamed) or Parquet, before anything is judged but that they are numbers. */
import { createReadStream } from 'node:fs';
import { open } from 'node:fs/promises';
import { CsvError, parse } from 'csv-parse';
import { UserError, showValue } from '../errors.js';
import type { Problem } from '../errors.js';
import type { Database } from '../store/database.js';
import { quoteName, quoteText } from '../store/sql.js';
import { NumberReader, delimiterOf, periodNamedIn } from './number-cells.js';
import { unreadable } from './read-text.js';

export interface NodeTable {
  readonly periods: readonly { readonly heading: string; readonly period_s: number }[];
  /** Headings of the columns that are neither coordinates nor ordinates. */
  readonly ignored: readonly string[];
  readonly lon: Float64Array;
  readonly lat: Float64Array;
  /** In the file's unit, node after node, columns in the order of `periods`; NaN where blank. */
  readonly values: Float64Array;
  /** Line of each node in a CSV file, row in a Parquet file. */
  readonly at: Int32Array;
}

interface Columns {
  readonly lon: number;
  readonly lat: number;
  readonly ordinates: readonly number[];
  readonly table: Pick<NodeTable, 'periods' | 'ignored'>;
}

const WHAT = 'the hazard grid';
const MOST_PROBLEMS = 20;
const BLANK = /^(?:|nan|null|na|n\/a|-)$/i;

function columnsOf(headings: readonly string[], file: string, line?: number): Columns {
  const find = (pattern: RegExp, name: string): number => {
    const found = headings.flatMap((heading, i) => (pattern.test(heading.trim()) ? [i] : []));
    const [first, second] = found;
    if (first !== undefined && second === undefined) return first;
    const problem = first === undefined ? `no column ${name}` : `two columns ${name}`;
    throw new UserError(
      `${problem} among ${headings.slice(0, 30).map(showValue).join(', ')}; the grid has lon, lat and a column for each period`,
      { file, line },
    );
  };
  const lon = find(/^(?:lon(?:g(?:itude)?)?|lng|x)(?![a-z0-9])/i, 'lon');
  const lat = find(/^(?:lat(?:itude)?|y)(?![a-z0-9])/i, 'lat');
  const named = headings.map((heading, i) => ({
    column: i,
    heading: heading.trim(),
    period_s: i === lon || i === lat ? undefined : periodNamedIn(heading),
  }));
  const ordinates = named.flatMap((one) => (one.period_s === undefined ? [] : [{ ...one, period_s: one.period_s }]));
  return {
    lon,
    lat,
    ordinates: ordinates.map(({ column }) => column),
    table: {
      periods: ordinates.map(({ heading, period_s }) => ({ heading, period_s })),
      ignored: named
        .filter(({ column, period_s }) => period_s === undefined && column !== lon && column !== lat)
        .map(({ heading }) => heading),
    },
  };
}

/** Numbers of a count not known beforehand. */
class Growing {
  #array = new Float64Array(1024);
  #length = 0;

  push(value: number): void {
    if (this.#length === this.#array.length) {
      const larger = new Float64Array(2 * this.#length);
      larger.set(this.#array);
      this.#array = larger;
    }
    this.#array[this.#length] = value;
    this.#length += 1;
  }

  taken(): Float64Array {
    return this.#array.slice(0, this.#length);
  }
}

/** Reads a CSV grid row by row. @throws UserError with line and column of cells that are no numbers. */
export async function readCsvNodes(file: string): Promise<NodeTable> {
  const delimiter = delimiterOf(await headOf(file));
  const input = createReadStream(file);
  const parser = parse({
    delimiter,
    bom: true,
    trim: true,
    info: true,
    skip_empty_lines: true,
    relax_column_count: true,
    comment: '#',
    comment_no_infix: true,
  });
  // A pipe hands on data and not errors.
  input.on('error', (error) => parser.destroy(error));
  input.pipe(parser);
  const reader = new NumberReader();
  const [lon, lat, values, at] = [new Growing(), new Growing(), new Growing(), new Growing()];
  const problems: Problem[] = [];
  let columns: Columns | undefined;
  let width = 0;
  try {
    for await (const row of parser) {
      const { record, info } = row as { readonly record: readonly string[]; readonly info: { readonly lines: number } };
      if (columns === undefined) {
        columns = columnsOf(record, file, info.lines);
        width = record.length;
        continue;
      }
      if (record.length !== width) {
        problems.push({ place: { file, line: info.lines }, message: `expected ${width} cells, got ${record.length}` });
      } else {
        const number = (column: number): number => {
          const cell = record[column] ?? '';
          const value = reader.read(cell);
          if (value !== null) return value;
          if (!BLANK.test(cell))
            problems.push({
              place: { file, line: info.lines },
              message: `${showValue(cell)}: ${reader.complaint(cell)}`,
            });
          return NaN;
        };
        lon.push(number(columns.lon));
        lat.push(number(columns.lat));
        for (const column of columns.ordinates) values.push(number(column));
        at.push(info.lines);
      }
      if (problems.length >= MOST_PROBLEMS) break;
    }
  } catch (cause) {
    if (cause instanceof CsvError) throw new UserError(`not a table: ${cause.message}`, { file }, { cause });
    throw cause;
  } finally {
    input.destroy();
  }
  if (problems.length > 0) throw UserError.of(problems);
  const lines = at.taken();
  if (columns === undefined || lines.length === 0) throw new UserError('no rows below the headings', { file });
  return { ...columns.table, lon: lon.taken(), lat: lat.taken(), values: values.taken(), at: Int32Array.from(lines) };
}

async function headOf(file: string): Promise<string> {
  try {
    const handle = await open(file);
    try {
      const { bytesRead, buffer } = await handle.read(Buffer.alloc(10_000), 0, 10_000, 0);
      return buffer.toString('utf8', 0, bytesRead);
    } finally {
      await handle.close();
    }
  } catch (cause) {
    throw unreadable(file, WHAT, cause) ?? cause;
  }
}

/** Reads a Parquet grid through `db`. @throws UserError for a file that is not there or columns that hold no numbers. */
export async function readParquetNodes(file: string, db: Database): Promise<NodeTable> {
  await headOf(file);
  const source = `read_parquet(${quoteText(file)})`;
  const described = await db.rows<{ column_name: string; column_type: string }>(`DESCRIBE SELECT * FROM ${source}`);
  const columns = columnsOf(
    described.map(({ column_name }) => column_name),
    file,
  );
  const wanted = [columns.lon, columns.lat, ...columns.ordinates];
  const problems = wanted.flatMap((column) => {
    const { column_name = '', column_type = '' } = described[column] ?? {};
    return /^(?:DOUBLE|FLOAT|DECIMAL|U?(?:TINY|SMALL|BIG|HUGE)?INT)/.test(column_type)
      ? []
      : [{ place: { file, columnName: column_name }, message: `expected numbers, got ${column_type}` }];
  });
  if (problems.length > 0) throw UserError.of(problems);
  const sql = wanted.map((column, i) => `CAST(${quoteName(described[column]?.column_name ?? '')} AS DOUBLE) AS c${i}`);
  const kinds = Object.fromEntries(wanted.map((_, i) => [`c${i}`, 'f64' as const]));
  const read = await db.columns(`SELECT ${sql.join(', ')} FROM ${source}`, kinds);
  const count = read.rowCount;
  if (count === 0) throw new UserError('no rows in it', { file });
  const column = (i: number): Float64Array => read[`c${i}`] ?? new Float64Array(count);
  const width = columns.ordinates.length;
  const values = new Float64Array(count * width);
  for (let p = 0; p < width; p += 1) column(p + 2).forEach((value, node) => (values[node * width + p] = value));
  return {
    ...columns.table,
    lon: column(0),
    lat: column(1),
    values,
    at: Int32Array.from({ length: count }, (_, i) => i + 1),
  };
}

import { realpathSync } from 'node:fs';
import { isAbsolute, relative, resolve } from 'node:path';
import { DOUBLE, DuckDBDataChunk, DuckDBEnumType, DuckDBTypeId, ENUM, INTEGER, VARCHAR } from '@duckdb/node-api';
import type { DuckDBConnection, DuckDBInstance, DuckDBMaterializedResult } from '@duckdb/node-api';
import { Bug } from '../errors.js';
import { startInstance } from './instance.js';
import { translateError } from './messages.js';
import { enumCodeType, readNumbers, readTexts, readWords, writeColumn } from './vectors.js';
import type { ColumnKind, ColumnsOf, WritableColumn } from './vectors.js';

export type Param = string | number | bigint | boolean | null;
export type Cell = string | number | boolean | null;

export interface OpenOptions {
  /** A file, or `:memory:`. */
  readonly path: string;
  readonly readOnly?: boolean;
  /** Folders besides the scratch folder that statements may read from and write to. */
  readonly folders?: readonly string[];
}

interface Shared {
  readonly instance: DuckDBInstance;
  readonly readOnly: boolean;
  readonly folders: readonly string[];
  users: number;
}

// Two instances on one file in one process both open, and one of them loses its writes: one instance per file.
const OPEN = new Map<string, Shared>();

/**
 * Opens the database at `path` (made when missing, unless read-only); statements reach no file outside `folders` and
 * the scratch folder, and nothing on the network.
 * @throws UserError when the file is locked, missing or not a database.
 */
export async function openDatabase(options: OpenOptions): Promise<Database> {
  const readOnly = options.readOnly ?? false;
  if (options.path === ':memory:') {
    const instance = await startInstance(options.path, readOnly, options.folders ?? []);
    return new Database(
      await instance.connect(),
      undefined,
      options.folders ?? [],
      () => instance.connect(),
      () => {
        instance.closeSync();
      },
    );
  }
  const path = resolve(options.path);
  let shared = OPEN.get(path);
  if (shared === undefined) {
    const folders = options.folders ?? [];
    shared = { instance: await startInstance(path, readOnly, folders), readOnly, folders, users: 0 };
    OPEN.set(path, shared);
  } else if (shared.readOnly && !readOnly) {
    throw new Bug(`${path} is already open for reading in this process; close it before writing`);
  }
  const held = shared;
  held.users += 1;
  return new Database(
    await held.instance.connect(),
    path,
    held.folders,
    () => held.instance.connect(),
    () => {
      held.users -= 1;
      if (held.users > 0) return;
      OPEN.delete(path);
      held.instance.closeSync();
    },
  );
}

/** One connection. Statements run one at a time and their results are materialised: a stream on it could be cut short silently. */
export class Database {
  readonly file: string | undefined;
  readonly #folders: readonly string[];
  readonly #connection: DuckDBConnection;
  readonly #connect: () => Promise<DuckDBConnection>;
  readonly #release: () => void;
  readonly #beside = new Set<Database>();
  #closed = false;
  #inTransaction = false;

  constructor(
    connection: DuckDBConnection,
    file: string | undefined,
    folders: readonly string[],
    connect: () => Promise<DuckDBConnection>,
    release: () => void,
  ) {
    this.#connection = connection;
    this.#connect = connect;
    this.#folders = folders;
    this.file = file;
    this.#release = release;
  }

  /** Whether statements may name the file: it lies in a folder that the database was opened with, and its name is no pattern. */
  reads(path: string): boolean {
    if (/[*?[\]{}]/.test(path)) return false;
    const real = realpathSync(path);
    return this.#folders.some((folder) => {
      const within = relative(realpathSync(folder), real);
      return within !== '' && !within.startsWith('..') && !isAbsolute(within);
    });
  }

  /** Runs statements; returns how many rows the last one changed. */
  async run(sql: string, params: readonly Param[] = []): Promise<number> {
    return (await this.#result(sql, params)).rowsChanged;
  }

  /** A small result as plain objects; whole numbers of any width come as numbers. */
  async rows<T extends object = Record<string, Cell>>(sql: string, params: readonly Param[] = []): Promise<T[]> {
    const result = await this.#result(sql, params);
    const objects = await result.getRowObjectsJS();
    for (const row of objects) {
      for (const [name, value] of Object.entries(row)) if (typeof value === 'bigint') row[name] = Number(value);
    }
    return objects as T[];
  }

  /** The first cell of the first row, null when there is none. */
  async value(sql: string, params: readonly Param[] = []): Promise<Cell> {
    const result = await this.#result(sql, params);
    if (result.rowCount === 0) return null;
    const value = (await result.getRowsJS())[0]?.[0] ?? null;
    return typeof value === 'bigint' ? Number(value) : (value as Cell);
  }

  /**
   * The columns of a query as arrays, in the order of its rows; `spec` names each column of the query, in any order.
   * NULL is NaN in f64, -1 in i32, null in text. Enumerated words read as text, or in i32 as their number in the list of words.
   * @throws Bug when the query yields other columns or a type that does not fit.
   */
  async columns<S extends Readonly<Record<string, ColumnKind>>>(
    sql: string,
    spec: S,
    params: readonly Param[] = [],
  ): Promise<ColumnsOf<S> & { readonly rowCount: number }> {
    const result = await this.#result(sql, params);
    const rowCount = result.rowCount;
    const names = result.columnNames();
    const arrays: Record<string, Float64Array | Int32Array | (string | null)[]> = {};
    const plan = Object.entries(spec).map(([name, kind]) => {
      const position = names.indexOf(name);
      if (position < 0) throw new Bug(`the query yields no column ${name}: ${names.join(', ')}`);
      const array = makeArray(kind, rowCount);
      arrays[name] = array;
      const type = result.columnType(position);
      const words = type instanceof DuckDBEnumType ? type.values : undefined;
      return { position, type: words === undefined ? type.typeId : enumCodeType(words.length), words, array };
    });
    let done = 0;
    for (let i = 0; i < result.chunkCount; i += 1) {
      const chunk = result.getChunk(i);
      for (const { position, type, words, array } of plan) {
        if (array instanceof Float64Array) readNumbers(chunk, position, type, array, done, NaN);
        else if (array instanceof Int32Array) readNumbers(chunk, position, type, array, done, -1);
        else if (words !== undefined) readWords(chunk, position, words, array, done);
        else if (type === DuckDBTypeId.VARCHAR) readTexts(chunk, position, array, done);
        else throw new Bug(`column ${position + 1} is not text: cast it to VARCHAR in the query`);
      }
      done += chunk.rowCount;
    }
    if (done !== rowCount) throw new Bug(`read ${done} of ${rowCount} rows`);
    return { ...arrays, rowCount } as unknown as ColumnsOf<S> & { readonly rowCount: number };
  }

  /** Appends rows to `table`; one array per column of the table, in the table's order, all of one length. */
  async append(table: string, columns: readonly WritableColumn[]): Promise<void> {
    await this.#append(table, null, columns);
  }

  /** The same to a temporary table; in a database open for reading the other way is refused even there. */
  async appendTemporary(table: string, columns: readonly WritableColumn[]): Promise<void> {
    await this.#append(table, 'temp', columns);
  }

  async #append(table: string, catalog: 'temp' | null, columns: readonly WritableColumn[]): Promise<void> {
    const rows = columns[0]?.length ?? 0;
    if (columns.some((column) => column.length !== rows)) throw new Bug(`append to ${table}: columns differ in length`);
    const types = columns.map((column) => {
      if (column instanceof Float64Array) return DOUBLE;
      if (column instanceof Int32Array) return INTEGER;
      return 'codes' in column ? ENUM(column.words) : VARCHAR;
    });
    try {
      const appender = await this.#connection.createAppender(table, null, catalog);
      for (let from = 0; from < rows; from += 2048) {
        const chunk = DuckDBDataChunk.create(types, Math.min(2048, rows - from));
        columns.forEach((column, index) => {
          writeColumn(chunk, index, column, from);
        });
        appender.appendDataChunk(chunk);
      }
      appender.closeSync();
    } catch (error) {
      throw translateError(error, this.file);
    }
  }

  /** Runs `work` in one transaction: committed when it returns, rolled back when it throws. Calls do not nest. */
  async transaction<T>(work: () => Promise<T>): Promise<T> {
    return this.lateTransaction(async (begin) => {
      await begin();
      return work();
    });
  }

  /**
   * The same, but the transaction begins when `work` calls `begin` (once or more often), before the first statement that writes
   * anything but temporary tables. What a transaction has written itself is read by one thread alone: work tables that stand
   * before it are read by all.
   */
  async lateTransaction<T>(work: (begin: () => Promise<void>) => Promise<T>): Promise<T> {
    if (this.#inTransaction) throw new Bug('a transaction inside a transaction');
    this.#inTransaction = true;
    let begun = false;
    try {
      const result = await work(async () => {
        if (begun) return;
        begun = true;
        await this.run('BEGIN TRANSACTION');
      });
      if (begun) await this.run('COMMIT');
      return result;
    } catch (error) {
      // After an error COMMIT would succeed and keep nothing; the rollback's own failure must not hide the cause.
      if (begun) await this.#connection.run('ROLLBACK').catch(() => undefined);
      throw error;
    } finally {
      this.#inTransaction = false;
    }
  }

  /**
   * Runs `work` on a connection of its own to the same database, so that its statements run beside those of this one. It sees what
   * is committed, and no temporary tables.
   */
  async beside<T>(work: (db: Database) => Promise<T>): Promise<T> {
    const other = new Database(await this.#connect(), this.file, this.#folders, this.#connect, () => undefined);
    this.#beside.add(other);
    try {
      return await work(other);
    } finally {
      this.#beside.delete(other);
      other.close();
    }
  }

  /** Stops the running statement, which then throws Interrupted; the connection stays usable. */
  interrupt(): void {
    this.#connection.interrupt();
    for (const other of this.#beside) other.interrupt();
  }

  close(): void {
    if (this.#closed) return;
    this.#closed = true;
    this.#connection.closeSync();
    this.#release();
  }

  async #result(sql: string, params: readonly Param[]): Promise<DuckDBMaterializedResult> {
    if (this.#closed) throw new Bug('the database is closed');
    try {
      return await (params.length === 0 ? this.#connection.run(sql) : this.#connection.run(sql, [...params]));
    } catch (error) {
      throw translateError(error, this.file);
    }
  }
}

function makeArray(kind: ColumnKind, rows: number): Float64Array | Int32Array | (string | null)[] {
  if (kind === 'f64') return new Float64Array(rows);
  return kind === 'i32' ? new Int32Array(rows) : new Array<string | null>(rows);
}

/** A database file as version 1 wrote it, with the runs of one of today: made from the frozen statements, no file in the repository. */
import { WEAK_TYPES } from '../../src/engineering/assess/weak.js';
import { openDatabase } from '../../src/store/database.js';
import { SCHEMA_V1 } from '../../src/store/schema-v1.js';
import { MIGRATIONS } from '../../src/store/schema.js';
import type { Migration } from '../../src/store/schema.js';
import type { Database, Param } from '../../src/store/database.js';
import { quoteName, quoteText } from '../../src/store/sql.js';

const LATEST = Math.max(...MIGRATIONS.map(({ version }) => version));
const WEAK = WEAK_TYPES.map(({ name }) => name);

/** A step as a later version may bring it: a further column of buildings and of results, a further word in the middle of a list. */
export const NEXT: Migration = {
  version: LATEST + 1,
  statements: [
    'ALTER TABLE building_extra ADD COLUMN "roof" VARCHAR',
    'ALTER TABLE result_assessed ADD COLUMN "drift_ratio" DOUBLE',
    `ALTER TABLE result_assessed ALTER COLUMN "weak_type" SET DATA TYPE ENUM (${[WEAK[0]!, 'a further type', ...WEAK.slice(1)].map(quoteText).join(', ')})`,
  ],
};
/** The steps with that one. */
export const AFTER: readonly Migration[] = [...MIGRATIONS, NEXT];

/** Base tables of `db` with their columns in order. */
export async function tablesOf(db: Database): Promise<ReadonlyMap<string, readonly string[]>> {
  const rows = await db.rows<{ table_name: string; column_name: string }>(
    'SELECT c.table_name, c.column_name FROM duckdb_columns() c JOIN duckdb_tables() t USING (table_oid) ORDER BY c.table_oid, c.column_index',
  );
  const tables = new Map<string, string[]>();
  for (const { table_name, column_name } of rows) {
    const columns = tables.get(table_name) ?? [];
    columns.push(column_name);
    tables.set(table_name, columns);
  }
  return tables;
}

/** Writes the runs of `from` to a new file of version 1 at `path`: every row of its tables, with the columns there were. */
export async function writeV1(path: string, from: Database): Promise<void> {
  const old = await openDatabase({ path });
  for (const statement of SCHEMA_V1) await old.run(statement);
  for (const [table, columns] of await tablesOf(old)) {
    const names = columns.map(quoteName).join(', ');
    const casts = columns.map((name) => `CAST(${quoteName(name)} AS VARCHAR) AS ${quoteName(name)}`).join(', ');
    const numbers = columns.map(quoteName).join(', ');
    const texts = await from.rows<Record<string, Param>>(`SELECT ${casts} FROM ${quoteName(table)} ORDER BY rowid`);
    const values = await from.rows<Record<string, Param>>(`SELECT ${numbers} FROM ${quoteName(table)} ORDER BY rowid`);
    const marks = columns.map(() => '?').join(', ');
    for (const [at, row] of values.entries()) {
      // Numbers as they are: text of a double may lose its last bit.
      const params = columns.map((name) => (typeof row[name] === 'number' ? row[name] : (texts[at]?.[name] ?? null)));
      await old.run(`INSERT INTO ${quoteName(table)} (${names}) VALUES (${marks})`, params);
    }
  }
  await old.run('CREATE TABLE schema_version (version INTEGER NOT NULL)');
  await old.run('INSERT INTO schema_version VALUES (1)');
  old.close();
}

import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { cpSync } from 'node:fs';
import { join } from 'node:path';
import { COLUMNS } from '../../src/engineering/columns.js';
import { RESULT_COLUMNS } from '../../src/engineering/results.js';
import { UserError } from '../../src/errors.js';
import { checkStudy } from '../../src/exports/check-study.js';
import { explainBuilding } from '../../src/screening/explain.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import { openDatabase } from '../../src/store/database.js';
import type { Database } from '../../src/store/database.js';
import {
  ASSESSED_COLUMNS,
  CORE_COLUMNS,
  EXTRA_COLUMNS,
  FILLED_ATTRIBUTES,
  MIGRATIONS,
  ORIGIN_TYPE,
  RANKED_COLUMNS,
  columnType,
  prepareSchema,
  resultType,
  schemaState,
  schemaVersion,
} from '../../src/store/schema.js';
import { SCHEMA_V1 } from '../../src/store/schema-v1.js';
import { quoteName } from '../../src/store/sql.js';
import { loadStudy } from '../../src/study/load.js';
import { scratch, writeSmallStudy } from '../support/cli.js';
import { AFTER, NEXT, tablesOf, writeV1 } from '../support/v1-database.js';

const LATEST = Math.max(...MIGRATIONS.map(({ version }) => version));

interface Column {
  readonly name: string;
  readonly type: string;
}

/** Columns of a table or view as the database has them, in its order. */
async function columnsOf(db: Database, table: string): Promise<readonly Column[]> {
  return db.rows<{ name: string; type: string }>(
    'SELECT column_name AS name, data_type AS type FROM duckdb_columns() WHERE table_name = ? ORDER BY column_index',
    [table],
  );
}

/** The same of what the registers say, types spelt by the database. */
async function registered(db: Database, columns: readonly Column[]): Promise<readonly Column[]> {
  await db.run(
    `CREATE OR REPLACE TEMP TABLE registered (${columns.map(({ name, type }) => `${quoteName(name)} ${type}`).join(', ')})`,
  );
  return columnsOf(db, 'registered');
}

const byName = (columns: readonly Column[]): readonly Column[] =>
  columns.toSorted((a, b) => (a.name < b.name ? -1 : a.name > b.name ? 1 : 0));
const whole = (...names: readonly string[]): readonly Column[] => names.map((name) => ({ name, type: 'INTEGER' }));
const place = scratch();
const study = `${place.folder}/study.yaml`;
const IDS = ['A1', 'A2', 'A3', 'A4'];
let stored: readonly unknown[];

/** A file of version 1 with a run, in a folder with its study. */
function v1(): { readonly file: string; readonly study: string; readonly remove: () => void } {
  const { folder, remove } = scratch();
  writeSmallStudy(folder);
  const path = join(folder, 'study.duckdb');
  cpSync(`${place.folder}/v1.duckdb`, path);
  return { file: path, study: join(folder, 'study.yaml'), remove };
}

beforeAll(async () => {
  writeSmallStudy(place.folder);
  const loaded = await loadStudy(study);
  const db = await openStudyDatabase(loaded);
  await screen(db, loaded, { made: new Date('2026-01-02T03:04:05Z'), note: 'of version 1' });
  stored = await Promise.all(IDS.map(async (id) => (await explainBuilding(db, 1, id, 'si')).stored));
  await writeV1(`${place.folder}/v1.duckdb`, db);
  db.close();
});
afterAll(() => {
  place.remove();
});

describe('MIGRATIONS', () => {
  it('counts up from 1', () => {
    expect(MIGRATIONS.map(({ version }) => version)).toEqual(MIGRATIONS.map((_, at) => at + 1));
    expect(MIGRATIONS[0]?.statements).toBe(SCHEMA_V1);
  });

  it('yields what the registers of columns and words say: a change of a register needs a migration', async () => {
    const db = await openDatabase({ path: ':memory:' });
    await prepareSchema(db);
    const inventory = (columns: typeof COLUMNS): readonly Column[] =>
      columns.map((column) => ({ name: column.name, type: columnType(column) }));
    const results = (columns: typeof RESULT_COLUMNS): readonly Column[] =>
      columns.map((column) => ({ name: column.name, type: resultType(column) }));
    // Buildings are written by name, results in the order of the register.
    expect(byName(await columnsOf(db, 'building_extra'))).toEqual(
      byName(await registered(db, [...whole('inventory_number', 'building_index'), ...inventory(EXTRA_COLUMNS)])),
    );
    const origins = ['year_built_origin', 'use_origin', 'system_origin'].map((name) => ({ name, type: ORIGIN_TYPE }));
    expect(byName(await columnsOf(db, 'building_core'))).toEqual(
      byName(
        await registered(db, [
          ...whole('inventory_number', 'building_index', 'year_pool', 'rows', 'first_row', 'findings'),
          ...whole(...FILLED_ATTRIBUTES.map((name) => `${name}_fill`)),
          ...inventory(CORE_COLUMNS),
          ...origins,
          { name: 'not_ranked', type: 'VARCHAR' },
        ]),
      ),
    );
    const keys = whole('run_id', 'building_index');
    for (const [table, columns] of Object.entries({
      result_assessed: ASSESSED_COLUMNS,
      result_ranked: RANKED_COLUMNS,
      result: RESULT_COLUMNS,
    }))
      expect(await columnsOf(db, table), table).toEqual(await registered(db, [...keys, ...results(columns)]));
    const origin = (await columnsOf(db, 'fill')).find(({ name }) => name === 'origin');
    expect([origin]).toEqual(await registered(db, [{ name: 'origin', type: ORIGIN_TYPE }]));
    const seen = new Set((await columnsOf(db, 'building')).map(({ name }) => name));
    expect(COLUMNS.filter(({ name }) => !seen.has(name))).toEqual([]);
    db.close();
  });
});

describe('prepareSchema', () => {
  it('brings a file of version 1 to today on opening, for reading too, with its run as it was', async () => {
    const old = v1();
    // check looks into it for answers of surveys and leaves it as it is
    expect((await checkStudy(old.study)).buildings).toBe(IDS.length);
    const untouched = await openDatabase({ path: old.file, readOnly: true });
    expect(await schemaVersion(untouched)).toBe(1);
    untouched.close();
    for (const readOnly of [true, false]) {
      const db = await openStudyDatabase(await loadStudy(old.study), readOnly);
      expect(await schemaVersion(db)).toBe(LATEST);
      for (const [at, id] of IDS.entries()) expect((await explainBuilding(db, 1, id, 'si')).stored).toEqual(stored[at]);
      db.close();
    }
    const db = await openStudyDatabase(await loadStudy(old.study));
    const next = await screen(db, await loadStudy(old.study), { made: new Date('2026-02-02T00:00:00Z') });
    expect([next.runId, next.taken.known]).toEqual([2, true]);
    db.close();
    old.remove();
  });

  it('brings it through a later step that adds columns and a word, with its run as it was', async () => {
    const old = v1();
    const db = await openDatabase({ path: old.file });
    await prepareSchema(db, AFTER);
    expect(await schemaState(db, AFTER)).toBe('current');
    for (const [at, id] of IDS.entries()) {
      const { stored: now, result } = await explainBuilding(db, 1, id, 'si');
      expect(now).toEqual(stored[at]);
      expect(now['ln_priority']).toBe('lnPriority' in result ? result.lnPriority : null);
    }
    expect(await db.rows('SELECT DISTINCT drift_ratio FROM result_assessed')).toEqual([{ drift_ratio: null }]);
    await db.run(
      "UPDATE result_assessed SET weak_type = 'a further type', drift_ratio = 0.01 WHERE building_index = 0",
    );
    expect(await db.value('SELECT weak_type FROM result WHERE building_index = 0')).toBe('a further type');
    db.close();
    old.remove();
  });

  it('leaves version 1 whole when a statement of a later step fails', async () => {
    const old = v1();
    const db = await openDatabase({ path: old.file });
    const before = await tablesOf(db);
    const failing = { version: NEXT.version, statements: [...NEXT.statements, 'SELECT nonsense'] };
    await expect(prepareSchema(db, [...MIGRATIONS, failing])).rejects.toThrow(/nonsense/);
    expect(await tablesOf(db)).toEqual(before);
    expect(await schemaVersion(db)).toBe(1);
    expect(await db.value('SELECT count(*) FROM result')).toBe(IDS.length);
    db.close();
    old.remove();
  });

  it('makes the same tables from nothing as from version 1', async () => {
    const old = v1();
    const db = await openDatabase({ path: old.file });
    await prepareSchema(db, AFTER);
    const from1 = await tablesOf(db);
    db.close();
    const empty = await openDatabase({ path: ':memory:' });
    expect(await schemaState(empty)).toBe('empty');
    await prepareSchema(empty, AFTER);
    const sorted = (tables: ReadonlyMap<string, readonly string[]>): unknown => Object.fromEntries(tables);
    expect(sorted(await tablesOf(empty))).toEqual(sorted(from1));
    empty.close();
    old.remove();
  });
});

describe('schemaState', () => {
  it('refuses the database of a newer program, for reading too, and says what to do', async () => {
    const old = v1();
    const db = await openDatabase({ path: old.file });
    await prepareSchema(db, AFTER);
    db.close();
    const loaded = await loadStudy(old.study);
    for (const readOnly of [true, false]) {
      const refused = openStudyDatabase(loaded, readOnly);
      await expect(refused).rejects.toBeInstanceOf(UserError);
      await expect(refused).rejects.toThrow(/update swaymark, or move the file away and screen again/);
    }
    old.remove();
  });
});

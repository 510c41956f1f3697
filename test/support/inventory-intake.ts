/** An intake of a small table written to a folder of its own, in a database in memory. */
import { mkdtempSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import type { IntakeStudy } from '../../src/inventory/intake-study.js';
import { takeIn } from '../../src/inventory/take-in.js';
import type { TakenIn } from '../../src/inventory/take-in.js';
import { openDatabase } from '../../src/store/database.js';
import type { Database } from '../../src/store/database.js';
import { prepareSchema } from '../../src/store/schema.js';
import { testRoot } from './test-root.js';

export function tempFolder(): string {
  return mkdtempSync(join(testRoot(), 'intake-'));
}

export function writeTable(content: string | Buffer, name = 'inventory.csv'): string {
  const path = join(tempFolder(), name);
  writeFileSync(path, content);
  return path;
}

export function studyOf(
  file: string,
  inventory: Partial<IntakeStudy['inventory']>,
  words: IntakeStudy['words'] = {},
): IntakeStudy {
  const blank = ['', '-', 'n/a', 'NULL', '?'];
  return {
    inventory: { file, encoding: 'auto', delimiter: 'auto', decimal: '.', blank, columns: { id: 'id' }, ...inventory },
    words,
  };
}

export interface Finding {
  readonly row: number | null;
  readonly line: number | null;
  readonly id: string | null;
  readonly column_name: string | null;
  readonly value: string | null;
  readonly code: string;
  readonly message: string;
  readonly action: string;
  readonly kind: string;
}

export interface Intake {
  readonly db: Database;
  readonly taken: TakenIn;
  readonly buildings: readonly Readonly<Record<string, string | number | null>>[];
  readonly findings: readonly Finding[];
}

/** Open to the end of the tests. */
export async function memoryDatabase(): Promise<Database> {
  const db = await openDatabase({ path: ':memory:' });
  await prepareSchema(db);
  return db;
}

export async function intakeOf(study: IntakeStudy): Promise<Intake> {
  const db = await memoryDatabase();
  const taken = await db.transaction(() => takeIn(db, study, '.'));
  return {
    db,
    taken,
    buildings: await db.rows('SELECT * EXCLUDE (inventory_id) FROM building ORDER BY building_index'),
    findings: await db.rows<Finding>('SELECT * EXCLUDE (inventory_id) FROM finding'),
  };
}

/** The intake of a table given as text. */
export function intakeOfText(
  content: string | Buffer,
  inventory: Partial<IntakeStudy['inventory']>,
  words: IntakeStudy['words'] = {},
): Promise<Intake> {
  return intakeOf(studyOf(writeTable(content), inventory, words));
}

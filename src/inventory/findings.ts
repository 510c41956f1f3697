/** Findings on their way: gathered in a temporary table and written once, in a fixed order. */
import type { Database } from '../store/database.js';
import type { Check } from './checks.js';

/** Makes the empty temporary table `intake_finding`. */
export async function startFindings(db: Database): Promise<void> {
  await db.run(`CREATE OR REPLACE TEMP TABLE intake_finding ("row" INTEGER, id VARCHAR, column_name VARCHAR, value VARCHAR,
    code VARCHAR, message VARCHAR, action VARCHAR, kind VARCHAR)`);
}

/** Notes of checks about buildings, to be tied to their ids when they are written. */
export class BuildingNotes {
  readonly #row: number[] = [];
  readonly #check: Check[] = [];
  readonly #value: string[] = [];
  readonly #message: string[] = [];

  add(check: Check, firstRow: number, value: number | string, message: string): void {
    this.#row.push(firstRow);
    this.#check.push(check);
    this.#value.push(String(value));
    this.#message.push(message);
  }

  /** Writes them to `intake_finding`; `intake_building` gives the ids. */
  async write(db: Database): Promise<void> {
    if (this.#row.length === 0) return;
    await db.run(`CREATE OR REPLACE TEMP TABLE intake_note ("row" INTEGER, column_name VARCHAR, value VARCHAR,
      code VARCHAR, message VARCHAR, action VARCHAR)`);
    await db.append('intake_note', [
      Int32Array.from(this.#row),
      this.#check.map(({ column }) => column),
      this.#value,
      this.#check.map(({ code }) => code),
      this.#message,
      this.#check.map(({ action }) => action),
    ]);
    await db.run(`INSERT INTO intake_finding SELECT n."row", b.id, column_name, value, code, message, action, 'note'
      FROM intake_note n JOIN intake_building b ON b.first_row = n."row"`);
    await db.run('DROP TABLE intake_note');
  }
}

/** One finding about a column as a whole. */
export async function noteColumn(db: Database, check: Check, value: string, message: string): Promise<void> {
  await db.run("INSERT INTO intake_finding VALUES (NULL, NULL, ?, ?, ?, ?, ?, 'note')", [
    check.column,
    value,
    check.code,
    message,
    check.action,
  ]);
}

/** Moves every finding to the table `finding`, ordered by row, column and code, with the physical line of its row. */
export async function storeFindings(
  db: Database,
  inventoryId: string,
  lineOf: ((row: number) => number) | undefined,
): Promise<void> {
  let line = 'f."row"';
  let join = '';
  if (lineOf !== undefined) {
    // Line breaks inside cells: rows and lines have come apart.
    const rows = await db.columns('SELECT DISTINCT "row" AS r FROM intake_finding WHERE "row" IS NOT NULL', {
      r: 'i32',
    });
    await db.run('CREATE OR REPLACE TEMP TABLE intake_line ("row" INTEGER, line INTEGER)');
    await db.append('intake_line', [rows.r, Int32Array.from(rows.r, lineOf)]);
    line = 'l.line';
    join = 'LEFT JOIN intake_line l ON l."row" = f."row"';
  }
  await db.run(
    `INSERT INTO finding SELECT ?, f."row", ${line}, f.id, f.column_name, left(f.value, 200), f.code, f.message, f.action, f.kind
     FROM intake_finding f ${join}
     ORDER BY f."row" NULLS FIRST, f.column_name NULLS FIRST, f.code, f.id NULLS FIRST, f.message`,
    [inventoryId],
  );
}

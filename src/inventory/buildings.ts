/** `intake_building`: one row per building: a table where rows are merged or few, else a view of the rows that are buildings. */
import { UserError } from '../errors.js';
import type { Database } from '../store/database.js';
import { quoteName } from '../store/sql.js';
import { DECADE } from './cells.js';
import type { Readings } from './cells.js';
import type { Mapping } from './header.js';
import { mergeRows } from './merge.js';

/** Rows up to which the buildings are a table, not a view. */
const WORTH_WRITING = 50_000;

/**
 * Makes `intake_building`: first_row (its key), id, rows, every mapped column, the decade, `partial area` and `merged storeys`.
 * @throws UserError when no row is a building.
 */
export async function makeBuildings(db: Database, mapping: Mapping, readings: Readings, file: string): Promise<void> {
  if (mapping.mergeBy !== undefined) await mergeRows(db, mapping, readings.rowsSql);
  else {
    const columns = mapping.columns
      .filter(({ column }) => column.name !== 'id')
      .map(({ column }) => `r.${quoteName(column.name)}`);
    const hasFates = (await db.value('SELECT count(*) FROM intake_fate')) !== 0;
    // Written down where that is cheap: a dozen statements ask it, and for a small table working out how costs more than the answer.
    const rows = Number(await db.value('SELECT count(*) FROM intake_cell'));
    const kind = rows <= WORTH_WRITING ? 'TABLE' : 'VIEW';
    await db.run(`CREATE OR REPLACE TEMP ${kind} intake_building AS
      SELECT r."row" AS first_row, r.key AS id, 1 AS rows, ${[...columns, ''].join(', ')} r.${DECADE}, r."use number", 0 AS "partial area", 0 AS "merged storeys"
      FROM (${readings.rowsSql}) r ${hasFates ? 'ANTI JOIN intake_fate f ON f."row" = r."row"' : ''} ${kind === 'TABLE' ? 'ORDER BY r."row"' : ''}`);
  }
  if ((await db.value('SELECT count(*) FROM (SELECT 1 FROM intake_building LIMIT 1)')) === 0) {
    const message = 'no row is a building: every row was rejected or is a site without a building';
    throw new UserError(await withReason(db, message), { file });
  }
}

async function withReason(db: Database, message: string): Promise<string> {
  const first = await db.rows<{ row: number | null; message: string }>(
    `SELECT "row", message FROM intake_finding WHERE kind = 'rejected-row' ORDER BY "row" LIMIT 1`,
  );
  const reject = first[0];
  return reject === undefined ? message : `${message}; the first: row ${String(reject.row)}: ${reject.message}`;
}

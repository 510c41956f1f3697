/** What the intake turned away, as a table. */
import type { Database } from '../store/database.js';
import { quoteText } from '../store/sql.js';
import { CSV_OPTIONS, firstColumn, guardedText } from './spreadsheet.js';

/**
 * Writes every rejected row and cell of an inventory to `path`, and of a run the buildings that a hazard grid does not reach (`more`: a query in
 * the columns of `finding`); guarded for spreadsheets. The folder must be open to `db`.
 */
export async function writeRejectsCsv(
  db: Database,
  inventoryId: string,
  path: string,
  more: string | null = null,
): Promise<void> {
  const columns = '"row", line, id, column_name, value, code, message, action, kind';
  const rejected = `SELECT ${columns} FROM finding WHERE inventory_id = ${quoteText(inventoryId)} AND kind IN ('rejected-row', 'rejected-cell')`;
  const from = more === null ? rejected : `${rejected} UNION ALL SELECT ${columns} FROM (${more})`;
  const text = (column: string, name = column): string => `${guardedText(column)} AS "${name}"`;
  await db.run(
    `COPY (SELECT "row" AS ${firstColumn('row')}, line, ${text('id')}, ${text('column_name', 'column')}, ${text('value')}, code, ${text('message')},
       ${text('action')}, kind FROM (${from})
     ORDER BY "row" NULLS FIRST, column_name NULLS FIRST, code, message) TO ${quoteText(path)} ${CSV_OPTIONS}`,
  );
}

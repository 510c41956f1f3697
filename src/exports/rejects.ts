/** What the intake turned away, as a table. */
import type { Database } from '../store/database.js';
import { quoteText } from '../store/sql.js';
import { CSV_OPTIONS, firstColumn, guardedText } from './spreadsheet.js';

/** Writes every rejected row and cell of an inventory to `path`, guarded for spreadsheets. The folder must be open to `db`. */
export async function writeRejectsCsv(db: Database, inventoryId: string, path: string): Promise<void> {
  const text = (column: string, name = column): string => `${guardedText(column)} AS "${name}"`;
  await db.run(
    `COPY (SELECT "row" AS ${firstColumn('row')}, line, ${text('id')}, ${text('column_name', 'column')}, ${text('value')}, code, ${text('message')},
       ${text('action')}, kind FROM finding WHERE inventory_id = ${quoteText(inventoryId)} AND kind IN ('rejected-row', 'rejected-cell')
     ORDER BY "row" NULLS FIRST, column_name NULLS FIRST, code, message) TO ${quoteText(path)} ${CSV_OPTIONS}`,
  );
}

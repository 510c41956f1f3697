/** Which values of a run's inventory surveys found, and who: from the notes that intake keeps of every answer it laid over the owner's cells. */
import type { FoundBy } from '../engineering/trace.js';
import type { Database } from '../store/database.js';

/** Words by column of every building of `ids` with answers. */
export async function foundBy(
  db: Database,
  inventoryId: string,
  ids: readonly string[],
): Promise<Readonly<Record<string, FoundBy>>> {
  const rows = await db.rows<{ id: string; name: string; words: string }>(
    `SELECT id, column_name AS name, left(message, length(message) - length(value) - 2) AS words
     FROM finding WHERE inventory_id = ? AND code = 'survey-answer'`,
    [inventoryId],
  );
  const asked = new Set(ids);
  const found = new Map<string, Record<string, string>>();
  for (const { id, name, words } of rows) {
    if (!asked.has(id)) continue;
    const columns = found.get(id) ?? {};
    columns[name] = words;
    found.set(id, columns);
  }
  return Object.fromEntries(found);
}

/** Deleting runs, with the inventories that only they used. */
import type { Database } from '../store/database.js';
import { listRuns, runsByIds } from './history.js';
import type { RunEntry } from './history.js';

/** An inventory as deleting names it. */
export interface InventoryEntry {
  /** Its fingerprint. */
  readonly inventory: string;
  /** The file it was read from. */
  readonly file: string;
  readonly rows_in: number;
  readonly buildings: number;
  /** Runs that use it and stay. */
  readonly used_by: readonly number[];
}

/** What deleting runs takes away. */
export interface Deletion {
  /** The runs, oldest first; their results go with them. */
  readonly runs: readonly RunEntry[];
  /** Inventories that no other run uses: they go, with all their rows. */
  readonly inventories: readonly InventoryEntry[];
  /** Inventories of these runs that others use: they stay. */
  readonly inventories_kept: readonly InventoryEntry[];
  /** The runs that stay. */
  readonly left: readonly number[];
}

const OF_RUN = ['result_assessed', 'result_ranked', 'run_grid', 'run'] as const;
const OF_NUMBER = ['building_core', 'building_extra', 'fill'] as const;
const OF_INVENTORY = ['year_pool', 'neighbour', 'row_account', 'finding', 'inventory'] as const;

/** What deleting the runs `ids` would take away; changes nothing. @throws UserError when one of them is not there. */
export async function planDeletion(db: Database, ids: readonly number[]): Promise<Deletion> {
  const runs = await runsByIds(db, ids);
  const others = (await listRuns(db)).filter(({ run }) => !ids.includes(run));
  const used = new Set(runs.map(({ fingerprints }) => fingerprints.inventory));
  const rows = await db.rows<{ inventory: string; file: string; rows_in: number; buildings: number }>(
    'SELECT inventory_id AS inventory, file, rows_in, buildings FROM inventory ORDER BY inventory_number',
  );
  const entries = rows
    .filter(({ inventory }) => used.has(inventory))
    .map((row) => ({
      ...row,
      used_by: others.filter(({ fingerprints }) => fingerprints.inventory === row.inventory).map(({ run }) => run),
    }));
  return {
    runs,
    inventories: entries.filter(({ used_by }) => used_by.length === 0),
    inventories_kept: entries.filter(({ used_by }) => used_by.length > 0),
    left: others.map(({ run }) => run),
  };
}

/**
 * Deletes the runs `ids` with their results, and every inventory that no other run uses with all its rows, in one transaction; their
 * numbers are not given again. `when` is the time; the caller owns the clock.
 * @throws UserError when one of them is not there; then nothing is deleted.
 */
export async function deleteRuns(db: Database, ids: readonly number[], when: Date): Promise<Deletion> {
  return db.transaction(async () => {
    const deletion = await planDeletion(db, ids);
    for (const { run } of deletion.runs) {
      for (const table of OF_RUN) await db.run(`DELETE FROM ${table} WHERE run_id = ?`, [run]);
      await db.run('INSERT INTO run_deleted VALUES (?, ?)', [run, when.toISOString()]);
    }
    // grids that no run reads any more
    for (const table of ['hazard_ordinate', 'hazard_grid'])
      await db.run(`DELETE FROM ${table} WHERE grid_number NOT IN (SELECT grid_number FROM run_grid)`);
    for (const { inventory } of deletion.inventories) {
      const number = await db.value('SELECT inventory_number FROM inventory WHERE inventory_id = ?', [inventory]);
      for (const table of OF_NUMBER) await db.run(`DELETE FROM ${table} WHERE inventory_number = ?`, [number]);
      for (const table of OF_INVENTORY) await db.run(`DELETE FROM ${table} WHERE inventory_id = ?`, [inventory]);
    }
    return deletion;
  });
}

/** One building of a run again, with its hand calculation: the stored inputs through the same code. */
import { assess, isRanked } from '../engineering/assess/assess.js';
import type { Assessment, NotRanked } from '../engineering/assess/assess.js';
import { closenessOf, swayOf } from '../engineering/assess/neighbours.js';
import { compileContext } from '../engineering/assess/context.js';
import type { Building } from '../engineering/building.js';
import { buildingAt } from '../engineering/building-columns.js';
import type { Display } from '../engineering/format.js';
import { handSteps } from '../engineering/hand.js';
import type { HandStep } from '../engineering/hand.js';
import type { Site } from '../engineering/page-contract.js';
import { RESULT_COLUMNS } from '../engineering/results.js';
import { Trace } from '../engineering/trace.js';
import { Bug, UserError, showValue } from '../errors.js';
import type { Database } from '../store/database.js';
import { quoteName } from '../store/sql.js';
import { foundBy } from './found-by.js';
import { readGrids } from './kept-grids.js';
import { neighboursOf } from './neighbours.js';
import { readRun } from './page-data.js';
import type { StoredRun } from './page-data.js';
import { readBuildings, readPools } from './read-buildings.js';
import { siteOfBuilding } from './sites.js';
import { PROGRAM } from './version.js';

export interface Explanation {
  readonly runId: number;
  readonly building: Building;
  readonly name: string | null;
  readonly group: string | null;
  /** The main building and wings it belongs to, with all members; null where it stands by itself. */
  readonly site: Site | null;
  readonly result: Assessment | NotRanked;
  readonly steps: readonly HandStep[];
  /** Every column of results.ts as stored. */
  readonly stored: Readonly<Record<string, number | string | null>>;
}

/**
 * The hand calculation of building `id` in run `runId`. The result must equal the stored one to the last bit.
 * @throws UserError for a building that is not in the run; Bug when the recomputed value differs from the stored one.
 */
export async function explainBuilding(db: Database, runId: number, id: string, display: Display): Promise<Explanation> {
  const run = await readRun(db, runId);
  const found = await findBuilding(db, run, id);
  const at = found.index;
  const { columns } = await readBuildings(db, run.inventory_id, { from: at, to: at + 1 }, { places: true });
  const building = buildingAt(columns, 0, await readPools(db, run.inventory_id));
  const trace = new Trace((await foundBy(db, run.inventory_id, [id]))[id]);
  const context = compileContext(run.settings, await readGrids(db, run.settings));
  const result = found.not_ranked === null ? assess(building, context, trace) : { id, reason: found.not_ranked };
  if (isRanked(result)) {
    const own = swayOf(building, context);
    for (const { building: other, ...gap } of await neighboursOf(db, run.inventory_id, at, id)) {
      const sway = swayOf(other, context);
      if (own !== null && sway !== null) closenessOf(own, sway, gap, trace);
    }
  }
  const names = RESULT_COLUMNS.map(({ name }) => quoteName(name)).join(', ');
  const [stored] = await db.rows(`SELECT ${names} FROM result WHERE run_id = ? AND building_index = ?`, [runId, at]);
  if (stored === undefined) throw new Bug(`run ${String(runId)} has no result for building ${String(at)}`);
  const values = stored as Readonly<Record<string, number | string | null>>;
  if (isRanked(result) && values['ln_priority'] !== result.lnPriority && run.program === PROGRAM) {
    throw new Bug(
      `recomputed ln S ${String(result.lnPriority)} differs from the stored ${String(values['ln_priority'])}`,
    );
  }
  return {
    runId,
    building,
    name: found.name,
    group: found.group,
    site: await siteOfBuilding(db, run, at),
    result,
    steps: handSteps(trace, display),
    stored: values,
  };
}

/** Where building `id` of a run stands in its inventory. @throws UserError naming the nearest ids when there is none. */
export async function findBuilding(
  db: Database,
  { run_id, inventory_id }: StoredRun,
  id: string,
): Promise<{
  readonly index: number;
  readonly name: string | null;
  readonly group: string | null;
  readonly not_ranked: string | null;
}> {
  const [found] = await db.rows<{
    building_index: number;
    name: string | null;
    group: string | null;
    not_ranked: string | null;
  }>('SELECT building_index, name, "group", not_ranked FROM building WHERE inventory_id = ? AND id = ?', [
    inventory_id,
    id,
  ]);
  if (found === undefined)
    throw new UserError(
      `there is no building ${showValue(id)} in run ${String(run_id)}${await nearestId(db, inventory_id, id)}`,
    );
  const { building_index: index, ...rest } = found;
  return { index, ...rest };
}

async function nearestId(db: Database, inventoryId: string, id: string): Promise<string> {
  const rows = await db.rows<{ id: string }>(
    'SELECT id FROM building WHERE inventory_id = ? ORDER BY levenshtein(lower(id), lower(?)), id LIMIT 3',
    [inventoryId, id.slice(0, 100)],
  );
  return rows.length === 0 ? '' : `; nearest: ${rows.map((row) => showValue(row.id)).join(', ')}`;
}

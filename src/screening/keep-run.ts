/** The last part of a screening or a refreshing: assess and rank the buildings of an inventory, keep results and run. */
import { basename } from 'node:path';
import type { AssessSettings } from '../engineering/assess/settings.js';
import type { TakenIn } from '../inventory/take-in.js';
import type { Database } from '../store/database.js';
import { studyFingerprint } from '../study/fingerprint.js';
import type { LoadedStudy } from '../study/load.js';
import type { Assessed } from './assess-all.js';
import { assessInventory, withAssessor } from './assess-inventory.js';
import type { Report } from './assess-inventory.js';
import { assumptionsOf } from './assumptions.js';
import { methodsFingerprint } from './fingerprints.js';
import { budgetOutlook } from './budget-outlook.js';
import { doubtsOutlook } from './doubts-outlook.js';
import { gridSpreads } from './grid-spreads.js';
import { keepRanked } from './keep-results.js';
import { readPools } from './read-buildings.js';
import { keepGrids } from './kept-grids.js';
import { accountLines, attributeCounts, rankingFigures } from './summarise.js';
import type { StoredSummary } from './summarise.js';
import { sensitivityOutlook } from './sensitivity-outlook.js';
import { surveyOutlook } from './survey-outlook.js';
import { PROGRAM } from './version.js';

export interface KeepOptions {
  /** When the run is made; the caller owns the clock. */
  readonly made: Date;
  readonly note?: string;
  /** Tell with the run what a week of visits would do, what the study's money buys and what the list hangs on. */
  readonly outlook?: boolean;
}

export interface ScreenOutcome {
  readonly runId: number;
  readonly taken: TakenIn;
  readonly summary: StoredSummary;
}

/** Assesses and ranks the inventory `taken` and keeps the run, inside the caller's transaction. @throws UserError when none can be ranked. */
export async function keepRun(
  db: Database,
  loaded: LoadedStudy,
  first: AssessSettings,
  taken: TakenIn,
  options: KeepOptions,
  report: Report,
): Promise<ScreenOutcome> {
  const { study } = loaded;
  const count = taken.buildings;
  const runId = await nextRunId(db);
  const listSize = study.ranking.list_size;
  const { settings, slopes, assessed, ranked } = await withAssessor(count, (assessor) =>
    assessInventory(db, loaded, first, taken, runId, assessor, report),
  );
  report('planning');
  const figures = rankingFigures(assessed, ranked, listSize);
  const { inventoryId } = taken;
  const pools = await readPools(db, inventoryId);
  const basis = {
    runId,
    inventoryId,
    settings,
    grids: loaded.grids,
    pools,
    count,
    listSize,
    expectedWrong: figures.expected_wrong_places,
    assessed,
    ranked: { ...ranked.ranking, mixtures: assessed.mixtures, draws: ranked.draws },
  };
  const survey = options.outlook === true ? await surveyOutlook(db, basis, study) : null;
  const doubts = options.outlook === true ? await doubtsOutlook(db, basis) : null;
  assessed.mixtures.length = 0;
  assessed.flat.length = 0;
  report('keeping');
  const account = { ...taken.account, ...(await rankedRows(db, taken.inventoryId, count, assessed)) };
  const register = assumptionsOf(settings, slopes);
  const early: StoredSummary = {
    rows_in: taken.rowsIn,
    buildings: count,
    ...figures,
    account: accountLines(account),
    attributes: attributeCounts(taken.attributes),
    assumptions: register,
    slopes,
    survey,
    ...(doubts === null ? {} : { doubts }),
    ...(loaded.grids.size === 0 ? {} : { grids: await gridSpreads(settings, loaded.grids, db, taken, assessed.index) }),
  };
  await db.run('INSERT INTO run VALUES (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)', [
    runId,
    options.made.toISOString(),
    PROGRAM,
    options.note ?? '',
    study.title,
    taken.inventoryId,
    studyFingerprint(study),
    methodsFingerprint(),
    JSON.stringify(settings),
    loaded.text,
    keptSummary(loaded, early),
    count,
    assessed.id.length,
    listSize,
    study.ranking.rank_by,
    study.seed,
  ]);
  await keepGrids(db, runId, settings, loaded.grids);
  await keepRanked(db, runId, count, ranked.columns);
  if (options.outlook !== true) return { runId, taken, summary: early };
  report('outlook');
  const { grids } = loaded;
  const summary: StoredSummary = {
    ...early,
    budget: await budgetOutlook(db, loaded, runId, count),
    sensitivity: await sensitivityOutlook(
      db,
      { run: runId, inventoryId, settings, grids, pools, buildings: count, listSize, register, seed: study.seed },
      figures.ranked,
    ),
  };
  await db.run('UPDATE run SET summary = ? WHERE run_id = ?', [keptSummary(loaded, summary), runId]);
  return { runId, taken, summary };
}

/** The summary as text, with the name of the study file: what tells the runs of one study from those of others in its folder. */
function keptSummary({ file }: LoadedStudy, summary: StoredSummary): string {
  return JSON.stringify({ study_file: basename(file), ...summary });
}

/** One more than every run there is or was: a deleted run's number stands on its reports, and would be taken for the new one. */
async function nextRunId(db: Database): Promise<number> {
  const last = await db.value(
    'SELECT max(run_id) FROM (SELECT run_id FROM run UNION ALL SELECT run_id FROM run_deleted)',
  );
  return Number(last ?? 0) + 1;
}

/** Rows of ranked and of not ranked buildings, counted from the results: status and missing values are known only now. */
async function rankedRows(
  db: Database,
  inventoryId: string,
  count: number,
  assessed: Assessed,
): Promise<Readonly<Record<string, number>>> {
  // Nearly every building is one row: only the others are read.
  const merged = await db.columns(
    `SELECT building_index AS at, rows FROM building_core
     WHERE rows <> 1 AND inventory_number = (SELECT inventory_number FROM inventory WHERE inventory_id = ?)`,
    { at: 'i32', rows: 'i32' },
    [inventoryId],
  );
  const isRanked = new Uint8Array(count);
  for (const at of assessed.index) isRanked[at] = 1;
  let ranked = assessed.index.length;
  let not = count - ranked;
  merged.at.forEach((at, i) => {
    if (isRanked[at] === 1) ranked += merged.rows[i]! - 1;
    else not += merged.rows[i]! - 1;
  });
  return { 'merged-into-ranked': ranked, 'merged-into-not-ranked': not };
}

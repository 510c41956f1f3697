/** The main job: intake, assess, rank, keep; one transaction. */
import { join } from 'node:path';
import type { AssessSettings } from '../engineering/assess/settings.js';
import { UserError } from '../errors.js';
import { takeIn } from '../inventory/take-in.js';
import type { TakenIn } from '../inventory/take-in.js';
import { openDatabase } from '../store/database.js';
import type { Database } from '../store/database.js';
import { prepareSchema } from '../store/schema.js';
import { studyFingerprint } from '../study/fingerprint.js';
import type { LoadedStudy } from '../study/load.js';
import { assessAll } from './assess-all.js';
import type { Assessed } from './assess-all.js';
import { startAssessor, threadsFor } from './assess-threads.js';
import { assumptionsOf } from './assumptions.js';
import { methodsFingerprint } from './fingerprints.js';
import { keepRanked } from './keep-results.js';
import { rankInventory } from './rank-all.js';
import type { Ranked } from './rank-all.js';
import { readPools } from './read-buildings.js';
import { settingsOf } from './settings.js';
import { withSlopes } from './slopes.js';
import { accountLines, attributeCounts, rankingFigures } from './summarise.js';
import type { StoredSummary } from './summarise.js';
import { PROGRAM } from './version.js';

export interface ScreenProgress {
  readonly step: string;
  /** Share done of a step that can tell, else NaN. */
  readonly share: number;
}

export interface ScreenOptions {
  /** When the run is made; the caller owns the clock. */
  readonly made: Date;
  readonly note?: string;
  readonly onProgress?: (progress: ScreenProgress) => void;
}

export interface ScreenOutcome {
  readonly runId: number;
  readonly taken: TakenIn;
  readonly summary: StoredSummary;
}

/** Path of a study's database. */
export function databasePath(loaded: LoadedStudy): string {
  return join(loaded.folder, 'study.duckdb');
}

/** Opens a study's database with its tables up to date; `folders` are those that reports go to. @throws UserError when it is locked or not ours. */
export async function openStudyDatabase(
  loaded: LoadedStudy,
  readOnly = false,
  folders: readonly string[] = [],
): Promise<Database> {
  const db = await openDatabase({ path: databasePath(loaded), readOnly, folders: [loaded.folder, ...folders] });
  try {
    if (!readOnly) await prepareSchema(db);
    return db;
  } catch (error) {
    db.close();
    throw error;
  }
}

/** Screens a study into `db`: everything or, when it throws, nothing is kept. @throws UserError for a fault in study or inventory. */
export async function screen(db: Database, loaded: LoadedStudy, options: ScreenOptions): Promise<ScreenOutcome> {
  const report = (step: string, share = NaN): void => options.onProgress?.({ step, share });
  const { study } = loaded;
  const first = await settingsOf(loaded);
  return db.lateTransaction(async (begin) => {
    const taken = await takeIn(
      db,
      study,
      loaded.folder,
      (step) => {
        report(step);
      },
      begin,
    );
    await begin();
    const count = taken.buildings;
    const runId = Number((await db.value('SELECT coalesce(max(run_id), 0) + 1 FROM run')) ?? 1);
    const listSize = study.ranking.list_size;
    const { settings, slopes, assessed, ranked } = await assessInventory(db, loaded, first, taken, runId, report);
    assessed.mixtures.length = 0;
    assessed.flat.length = 0;
    report('keeping');
    const account = { ...taken.account, ...(await rankedRows(db, taken.inventoryId, count, assessed)) };
    const summary: StoredSummary = {
      rows_in: taken.rowsIn,
      buildings: count,
      ...rankingFigures(assessed, ranked, listSize),
      account: accountLines(account),
      attributes: attributeCounts(taken.attributes),
      assumptions: assumptionsOf(settings, slopes),
      slopes,
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
      JSON.stringify(summary),
      count,
      assessed.id.length,
      listSize,
      study.ranking.rank_by,
      study.seed,
    ]);
    await keepRanked(db, runId, count, ranked.columns);
    return { runId, taken, summary };
  });
}

/** Slopes, results and ranks of all buildings, in as many threads as pay. @throws UserError when none can be ranked. */
async function assessInventory(
  db: Database,
  { study }: LoadedStudy,
  first: AssessSettings,
  { inventoryId, buildings: count }: TakenIn,
  runId: number,
  report: (step: string, share?: number) => void,
): Promise<Awaited<ReturnType<typeof withSlopes>> & { readonly assessed: Assessed; readonly ranked: Ranked }> {
  // the threads start while the slopes are found
  const assessor = startAssessor(threadsFor(count));
  try {
    const pools = await readPools(db, inventoryId);
    report('hazard slope');
    const found = await withSlopes(first, study.ranking.k === 'from-levels', db, inventoryId, pools, count);
    assessor.begin(found.settings, pools);
    report('assessing', 0);
    const assessed = await assessAll(db, inventoryId, runId, count, assessor, (done) => {
      report('assessing', done / count);
    });
    if (assessed.id.length === 0) throw nothingRanked(assessed, count);
    report('ranking');
    return {
      ...found,
      assessed,
      ranked: await rankInventory(assessed, count, study.ranking.list_size, study.seed, assessor),
    };
  } finally {
    await assessor.close();
  }
}

/** What to do about a reason that keeps buildings out of the ranking. */
const REMEDIES: readonly (readonly [RegExp, string])[] = [
  [/^system not known/, 'give their systems, or name in system_prior a table of chances that covers them'],
  [/height/, 'map a column of heights or of storeys'],
  [/people/, 'map a column of people or of floor areas, or rank by ratio or by demand'],
  [/spectrum/, 'name a spectrum for them in the study'],
  [
    /^no method gives a period/,
    'leave a formula switched on that needs the height alone, or give what the formulas need',
  ],
  [/already assessed|demolished/, 'check the column of the status and the words it is read by'],
];

function nothingRanked({ reasons: counts }: Assessed, count: number): UserError {
  const [reason, times] = [...counts].sort((a, b) => b[1] - a[1])[0] ?? ['the inventory holds none', 0];
  const remedy = REMEDIES.find(([pattern]) => pattern.test(reason))?.[1] ?? '`swaymark check` says what is missing';
  const of = count === 1 ? 'the only building cannot' : `none of ${String(count)} buildings can`;
  return new UserError(`${of} be ranked: ${reason}${count > 1 ? ` (${String(times)})` : ''}; ${remedy}`);
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

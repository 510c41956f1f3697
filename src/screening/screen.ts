/** The main job: intake, assess, rank, keep; one transaction. */
import { join } from 'node:path';
import { compileContext } from '../engineering/assess/context.js';
import { RESULT_COLUMNS } from '../engineering/results.js';
import { takeIn } from '../inventory/take-in.js';
import type { TakenIn } from '../inventory/take-in.js';
import { openDatabase } from '../store/database.js';
import type { Database } from '../store/database.js';
import { prepareSchema } from '../store/schema.js';
import { studyFingerprint } from '../study/fingerprint.js';
import type { LoadedStudy } from '../study/load.js';
import { assessAll } from './assess-all.js';
import type { Assessed } from './assess-all.js';
import { assumptionsOf } from './assumptions.js';
import { methodsFingerprint } from './fingerprints.js';
import { rankInto } from './rank-all.js';
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
  return db.transaction(async () => {
    const taken = await takeIn(db, study, loaded.folder, (step) => {
      report(step);
    });
    const count = taken.buildings;
    const pools = await readPools(db, taken.inventoryId);
    report('hazard slope');
    const { settings, slopes } = await withSlopes(
      first,
      study.ranking.k === 'from-levels',
      db,
      taken.inventoryId,
      pools,
      count,
    );
    const assessed = await assessAll(db, taken.inventoryId, pools, count, compileContext(settings), (done) => {
      report('assessing', done / count);
    });
    report('ranking');
    const listSize = study.ranking.list_size;
    const ranked = rankInto(assessed, listSize, study.seed);
    report('keeping');
    const account = { ...taken.account, ...(await rankedRows(db, taken.inventoryId, assessed)) };
    const summary: StoredSummary = {
      rows_in: taken.rowsIn,
      buildings: count,
      ...rankingFigures(assessed, ranked, listSize),
      account: accountLines(account),
      attributes: attributeCounts(taken.attributes),
      assumptions: assumptionsOf(settings, slopes),
      slopes,
    };
    const runId = Number((await db.value('SELECT coalesce(max(run_id), 0) + 1 FROM run')) ?? 1);
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
    await appendResults(db, runId, count, assessed);
    return { runId, taken, summary };
  });
}

/** Rows of ranked and of not ranked buildings, counted from the results: status and missing values are known only now. */
async function rankedRows(
  db: Database,
  inventoryId: string,
  assessed: Assessed,
): Promise<Readonly<Record<string, number>>> {
  const read = await db.columns(
    'SELECT rows FROM building WHERE inventory_id = ? ORDER BY building_index',
    { rows: 'i32' },
    [inventoryId],
  );
  let ranked = 0;
  let all = 0;
  for (const rows of read.rows) all += rows;
  for (const at of assessed.index) ranked += read.rows[at]!;
  return { 'merged-into-ranked': ranked, 'merged-into-not-ranked': all - ranked };
}

async function appendResults(db: Database, runId: number, count: number, { results }: Assessed): Promise<void> {
  const index = Int32Array.from({ length: count }, (_, i) => i);
  await db.append('result', [
    new Int32Array(count).fill(runId),
    index,
    ...RESULT_COLUMNS.map(({ name, kind }) =>
      kind === 'number' ? results.numbers[name]! : kind === 'whole' ? results.wholes[name]! : results.texts[name]!,
    ),
  ]);
}

/** The main job: intake, assess, rank, keep; one transaction. */
import { join } from 'node:path';
import { compileContext } from '../engineering/assess/context.js';
import { RESULT_COLUMNS } from '../engineering/results.js';
import { UserError } from '../errors.js';
import { takeIn } from '../inventory/take-in.js';
import type { TakenIn } from '../inventory/take-in.js';
import { openDatabase } from '../store/database.js';
import type { Database } from '../store/database.js';
import { RESULT_WORDS, prepareSchema } from '../store/schema.js';
import { enumerate } from '../store/vectors.js';
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
    if (assessed.id.length === 0) throw nothingRanked(assessed, count);
    assessed.mixtures.length = 0;
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

/** What to do about a reason that keeps buildings out of the ranking. */
const REMEDIES: readonly (readonly [RegExp, string])[] = [
  [/^system not known/, 'give their systems, or name in system_prior a table of chances that covers them'],
  [/height/, 'map a column of heights or of storeys'],
  [/people/, 'map a column of people or of floor areas, or rank by ratio or by demand'],
  [/spectrum/, 'name a spectrum for them in the study'],
  [/^every method/, 'leave a method for the period switched on'],
  [/already assessed|demolished/, 'check the column of the status and the words it is read by'],
];

function nothingRanked({ results }: Assessed, count: number): UserError {
  const counts = new Map<string, number>();
  for (const reason of results.texts['not_ranked']!) {
    if (reason !== null) counts.set(reason, (counts.get(reason) ?? 0) + 1);
  }
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

async function appendResults(db: Database, runId: number, count: number, { results }: Assessed): Promise<void> {
  await db.append('result', [
    new Int32Array(count).fill(runId),
    Int32Array.from({ length: count }, (_, i) => i),
    ...RESULT_COLUMNS.map(({ name, kind }) => {
      if (kind === 'number') return results.numbers[name]!;
      if (kind === 'whole') return results.wholes[name]!;
      const words = RESULT_WORDS[name];
      return words === undefined ? results.texts[name]! : enumerate(words, results.texts[name]!);
    }),
  ]);
}

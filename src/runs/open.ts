/** A study's kept runs, opened for reading. */
import { existsSync } from 'node:fs';
import type { System } from '../engineering/building.js';
import type { Display } from '../engineering/format.js';
import type { PageData } from '../engineering/page-contract.js';
import { UserError } from '../errors.js';
import { explainBuilding } from '../screening/explain.js';
import type { Explanation } from '../screening/explain.js';
import { periodClass, periodSheet } from '../screening/period-sheet.js';
import type { PeriodClass, PeriodSheet } from '../screening/period-sheet.js';
import { pageDataOf } from '../screening/page-data.js';
import { databasePath, openStudyDatabase } from '../screening/screen.js';
import type { Database } from '../store/database.js';
import { loadStudyAlone } from '../study/load.js';
import type { LoadedStudy } from '../study/load.js';
import { isOwnRun, latestOwnRun, listRuns, runById, writeNote } from './history.js';
import type { RunEntry } from './history.js';
import { runSheet } from './sheet.js';
import type { RunSheet } from './sheet.js';

/** Which run is meant; the newest of the study when left out. Units of what is shown; SI when left out. */
export interface RunChoice {
  readonly run?: number | undefined;
  readonly units?: Display;
}

/**
 * Opens the database of the study at `path` for reading while `work` runs.
 * @throws UserError when there is none yet.
 * @example
 * const count = await withStudyDatabase('study.yaml', async (db) => (await listRuns(db)).length);
 */
export async function withStudyDatabase<T>(
  path: string,
  work: (db: Database, loaded: LoadedStudy) => Promise<T>,
  folders: readonly string[] = [],
): Promise<T> {
  const loaded = await loadStudyAlone(path);
  const file = databasePath(loaded);
  if (!existsSync(file)) throw new UserError('this study has no run yet; run `swaymark screen` first', { file });
  const db = await openStudyDatabase(loaded, true, folders);
  try {
    return await work(db, loaded);
  } finally {
    db.close();
  }
}

/** The same for writing. @throws UserError when there is none yet. */
export async function changeStudyDatabase<T>(
  path: string,
  work: (db: Database, loaded: LoadedStudy) => Promise<T>,
): Promise<T> {
  const loaded = await loadStudyAlone(path);
  const file = databasePath(loaded);
  if (!existsSync(file)) throw new UserError('this study has no run yet; run `swaymark screen` first', { file });
  const db = await openStudyDatabase(loaded);
  try {
    return await work(db, loaded);
  } finally {
    db.close();
  }
}

/** The chosen run of the open database of `loaded`; by number it may be of another study of the folder. @throws UserError when there is none. */
export async function chosenRun(db: Database, loaded: LoadedStudy, { run }: RunChoice): Promise<RunEntry> {
  return run === undefined ? latestOwnRun(db, loaded) : runById(db, run);
}

/** A run in the list of a study's folder. */
export interface FolderRun extends RunEntry {
  /** Made with this study; another study file of the folder otherwise. */
  readonly own: boolean;
}

/**
 * The runs kept in the folder of the study at `path`, oldest first, those of its other study files too.
 * @throws UserError when the study cannot be read or has no database yet.
 * @example
 * for (const { run, made, note } of await listStudyRuns('study.yaml')) report(run, made, note);
 */
export async function listStudyRuns(path: string): Promise<readonly FolderRun[]> {
  return withStudyDatabase(path, async (db, loaded) =>
    (await listRuns(db)).map((run) => ({ ...run, own: isOwnRun(run, loaded) })),
  );
}

/**
 * Everything kept about run `run` of the study at `path`: provenance, counts, the account of rows, the list, and what differs from the run before.
 * @throws UserError for a study without runs or an unknown run.
 * @example
 * const { list, before } = await showRun('study.yaml', 2);
 */
export async function showRun(path: string, run: number): Promise<RunSheet> {
  return withStudyDatabase(path, (db) => runSheet(db, run));
}

/**
 * Puts `note` in the place of the note of run `run` of the study at `path`; empty text leaves it without one.
 * @returns the run as it was before. @throws UserError for a study without runs or an unknown run.
 * @example
 * await noteRun('study.yaml', 1, 'before the survey of block 4');
 */
export async function noteRun(path: string, run: number, note: string): Promise<RunEntry> {
  return changeStudyDatabase(path, (db) => writeNote(db, run, note));
}

/**
 * The hand calculation of building `id` in a run of the study at `path`: stored inputs through the same code, equal to the stored result to the last bit.
 * @throws UserError for a study without runs, an unknown run or building.
 * @example
 * const { steps, stored } = await explain('study.yaml', 'BH-012', { units: 'us' });
 */
export async function explain(path: string, id: string, options: RunChoice = {}): Promise<Explanation> {
  return withStudyDatabase(path, async (db, loaded) => {
    const { run } = await chosenRun(db, loaded, options);
    return explainBuilding(db, run, id, options.units ?? 'si');
  });
}

/**
 * What the reports of a run of the study at `path` show: summary, settings, and the buildings in rank order by column.
 * @throws UserError for a study without runs or an unknown run.
 * @example
 * const html = renderDashboard(await pageDataOfStudy('study.yaml'), readPageScript());
 */
export async function pageDataOfStudy(path: string, options: RunChoice = {}): Promise<PageData> {
  return withStudyDatabase(path, async (db, loaded) => {
    const { run } = await chosenRun(db, loaded, options);
    return pageDataOf(db, run, options.units ?? 'si');
  });
}

/**
 * Every estimate of the period of building `id` in a run of the study at `path`: which counts, and why the others do not.
 * @throws UserError for a study without runs, an unknown run or building.
 * @example
 * const { directions } = await periods('study.yaml', 'BH-012');
 */
export async function periods(
  path: string,
  id: string,
  options: RunChoice & { readonly system?: System } = {},
): Promise<PeriodSheet> {
  return withStudyDatabase(path, async (db, loaded) => {
    const { run } = await chosenRun(db, loaded, options);
    return periodSheet(db, run, id, options.system);
  });
}

/**
 * Every estimate over the buildings of one lateral system, in one block (`group`) or all.
 * @throws UserError for a study without runs, an unknown run, or no such building.
 * @example
 * const { estimates } = await periodsOfClass('study.yaml', 'concrete-moment-frame');
 */
export async function periodsOfClass(
  path: string,
  system: System,
  options: RunChoice & { readonly group?: string } = {},
): Promise<PeriodClass> {
  return withStudyDatabase(path, async (db, loaded) => {
    const { run } = await chosenRun(db, loaded, options);
    return periodClass(db, run, system, options.group);
  });
}

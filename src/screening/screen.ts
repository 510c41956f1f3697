/** The main job: intake, assess, rank, keep; one transaction. */
import { join } from 'node:path';
import { takeIn } from '../inventory/take-in.js';
import { openDatabase } from '../store/database.js';
import type { Database } from '../store/database.js';
import { prepareSchema, schemaState } from '../store/schema.js';
import type { LoadedStudy } from '../study/load.js';
import type { ScreenProgress } from './progress.js';
import { keepRun } from './keep-run.js';
import type { KeepOptions, ScreenOutcome } from './keep-run.js';
import { settingsOf } from './settings.js';

export type { ScreenOutcome } from './keep-run.js';

export interface ScreenOptions extends KeepOptions {
  readonly onProgress?: (progress: ScreenProgress) => void;
}

/** Path of a study's database. */
export function databasePath(loaded: Pick<LoadedStudy, 'folder'>): string {
  return join(loaded.folder, 'study.duckdb');
}

/**
 * Opens a study's database with its tables up to date, also for reading only; `folders` are those that reports go to.
 * @throws UserError when it is locked, not ours, or of a newer program.
 */
export async function openStudyDatabase(
  loaded: LoadedStudy,
  readOnly = false,
  folders: readonly string[] = [],
): Promise<Database> {
  const options = { path: databasePath(loaded), folders: [loaded.folder, ...folders] };
  const db = await openDatabase({ ...options, readOnly });
  try {
    if (!readOnly) await prepareSchema(db);
    else if ((await schemaState(db)) === 'earlier') {
      db.close();
      (await openStudyDatabase(loaded)).close();
      return await openDatabase({ ...options, readOnly });
    }
    return db;
  } catch (error) {
    db.close();
    throw error;
  }
}

/** Screens a study into `db`: everything or, when it throws, nothing is kept. @throws UserError for a fault in study or inventory. */
export async function screen(db: Database, loaded: LoadedStudy, options: ScreenOptions): Promise<ScreenOutcome> {
  const report = (step: string, share = NaN): void => options.onProgress?.({ step, share });
  const first = await settingsOf(loaded);
  return db.lateTransaction(async (begin) => {
    const taken = await takeIn(
      db,
      loaded.study,
      loaded.folder,
      (step) => {
        report(step);
      },
      begin,
      { made: options.made },
    );
    await begin();
    return keepRun(db, loaded, first, taken, options, report);
  });
}

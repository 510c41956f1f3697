/** The whole job on a study file: screen, keep the run, write the reports. */
import { resolve } from 'node:path';
import type { Display } from '../engineering/format.js';
import type { PageData } from '../engineering/page-contract.js';
import { openStudyDatabase, screen } from '../screening/screen.js';
import type { ScreenOptions, ScreenOutcome } from '../screening/screen.js';
import type { Database } from '../store/database.js';
import { loadStudy } from '../study/load.js';
import { REPORT_FILES, writeReports } from './reports.js';
import { rejectedShare } from './check-study.js';
import { spareInputs } from './spare-inputs.js';
import { prepareFolder } from './write-set.js';

export interface ScreenStudyOptions extends Omit<ScreenOptions, 'made'> {
  /** When the run is made; now when left out. */
  readonly made?: Date;
  /** false: nothing is told with the run of visits, money and assumptions, which takes as long as the rest of a small inventory. */
  readonly outlook?: boolean;
  /** Units of the reports; SI when left out. */
  readonly units?: Display;
  /** Folder of the reports; the study's own, beside the study file, when left out. */
  readonly output?: string | undefined;
  /** Hears of the open database, for one who wants to interrupt it. */
  readonly onOpen?: (db: Database) => void;
}

export interface ScreenedStudy extends ScreenOutcome {
  /** What the reports show: summary, settings, buildings in rank order. */
  readonly data: PageData;
  /** Paths of the files written, the dashboard first. */
  readonly files: readonly string[];
  /** Share of the inventory's rows that were rejected, and the share the study allows. */
  readonly rejected: { readonly share: number; readonly limit: number; readonly over: boolean };
}

/**
 * Screens the study at `path`, keeps the run in study.duckdb beside it and writes the reports once the run is kept.
 * @throws UserError for a fault in study or inventory; then nothing is kept and no report is touched.
 * @example
 * const { runId, data, files } = await screenStudy('study.yaml');
 */
export async function screenStudy(path: string, options: ScreenStudyOptions = {}): Promise<ScreenedStudy> {
  const loaded = await loadStudy(path);
  const folder = prepareFolder(options.output ?? resolve(loaded.folder, loaded.study.output));
  await spareInputs(loaded, folder, REPORT_FILES);
  const db = await openStudyDatabase(loaded, false, [folder]);
  try {
    options.onOpen?.(db);
    const outcome = await screen(db, loaded, {
      ...options,
      outlook: options.outlook ?? true,
      made: options.made ?? new Date(),
    });
    options.onProgress?.({ step: 'writing reports', share: NaN });
    const { files, data } = await writeReports(db, outcome.runId, folder, options.units ?? 'si');
    return { ...outcome, data, files, rejected: rejectedShare(loaded, outcome.taken) };
  } finally {
    db.close();
  }
}

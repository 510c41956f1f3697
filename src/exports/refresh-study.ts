/** Refreshing on a study file: a new run with changed parameters from the inventory of an earlier run, with its reports; and sweeps. */
import { existsSync } from 'node:fs';
import { dirname, resolve } from 'node:path';
import type { Display } from '../engineering/format.js';
import { UserError } from '../errors.js';
import { chosenRun, withStudyDatabase } from '../runs/open.js';
import { listChange, ranksOfRun } from '../screening/list-changes.js';
import type { ListChange } from '../screening/list-changes.js';
import { baseRun, parameterChanges, refresh } from '../screening/refresh.js';
import { databasePath, openStudyDatabase } from '../screening/screen.js';
import type { ScreenOptions, ScreenOutcome } from '../screening/screen.js';
import { sweep } from '../screening/sweep.js';
import type { SweptValue } from '../screening/sweep.js';
import type { Database } from '../store/database.js';
import type { StudyChange } from '../study/changes.js';
import { loadStudyAlone, withFiles } from '../study/load.js';
import type { LoadedStudy } from '../study/load.js';
import { withParameters } from '../study/parameters.js';
import type { Parameter, ParameterRange } from '../study/parameters.js';
import { rejectedShare } from './check-study.js';
import { REPORT_FILES, writeReports } from './reports.js';
import type { ScreenedStudy } from './screen-study.js';
import { replaceFile } from './replace-file.js';
import { spareInputs } from './spare-inputs.js';
import { prepareFolder } from './write-set.js';

/** A grid of hazard whose file is gone is the one kept with the run. */
const GONE = { leaveMissing: true } as const;

/** Which run to stand on, and what to change. */
export interface RefreshChoice {
  /** The run whose inventory is ranked; the newest when left out. */
  readonly run?: number | undefined;
  /** Parameters put in place of those of the study file, one after the other. */
  readonly set?: readonly Parameter[];
  /** Another study file of the same folder, whose parameters are used in place of the study's. */
  readonly with?: string | undefined;
  /** Hears of the open database, for one who wants to interrupt it. */
  readonly onOpen?: (db: Database) => void;
}

export interface RefreshStudyOptions extends RefreshChoice, Omit<ScreenOptions, 'made'> {
  /** When the run is made; now when left out. */
  readonly made?: Date;
  /** Write the parameters of `set` into the study file too, once the run is kept. */
  readonly write?: boolean;
  /** Write the reports; true when left out. */
  readonly reports?: boolean;
  /** Units of the reports; SI when left out. */
  readonly units?: Display;
  /** Folder of the reports; the study's own when left out. */
  readonly output?: string | undefined;
}

export interface RefreshedStudy extends ScreenOutcome {
  /** The run it stands on. */
  readonly base: number;
  /** What the study says otherwise than that of the base. */
  readonly changes: readonly StudyChange[];
  /** The list against that of the base. */
  readonly list: ListChange;
  /** Paths of the reports written, the dashboard first; none when they were not wanted. */
  readonly files: readonly string[];
  /** Path of the study file when it was written. */
  readonly written: string | null;
  readonly rejected: ScreenedStudy['rejected'];
}

/**
 * Ranks the inventory of an earlier run of the study at `path` with changed parameters and keeps the run; equal to the last bit to a whole
 * screening with the same parameters. The inventory's file is not opened, and a table of system chances that the run already used is not either.
 * @throws UserError for a parameter that is wrong or changes intake; then nothing is kept, and no file is touched.
 * @example
 * const { runId, list } = await refreshStudy('study.yaml', { set: [{ path: 'hazard.spectra.design.sds_g', value: 1.2 }] });
 */
export async function refreshStudy(path: string, options: RefreshStudyOptions = {}): Promise<RefreshedStudy> {
  const { set = [], write = false } = options;
  const own = await loadStudyAlone(path);
  if (write && options.with !== undefined)
    throw new UserError('with another study file there is nothing to write: it holds the parameters already', {
      file: options.with,
    });
  if (write && set.length === 0) throw new UserError('nothing to write: no parameter is set', { file: path });
  const loaded = await withParameters(await parametersOf(own, options.with), set, GONE);
  requireDatabase(own);
  const folder =
    options.reports === false ? null : prepareFolder(options.output ?? resolve(own.folder, loaded.study.output));
  if (folder !== null) await spareInputs(own, folder, REPORT_FILES);
  const db = await openStudyDatabase(own, false, folder === null ? [] : [folder]);
  try {
    options.onOpen?.(db);
    const { run } = await chosenRun(db, own, options);
    const base = await baseRun(db, own, run);
    const outcome = await refresh(db, base, loaded, {
      ...options,
      outlook: options.reports !== false,
      made: options.made ?? new Date(),
    });
    const written = write ? replaceFile(own.file, own.text, loaded.text) : null;
    const { buildings } = outcome.taken;
    const list = await listChange(
      db,
      base.inventoryId,
      await ranksOfRun(db, run, buildings, base.listSize),
      await ranksOfRun(db, outcome.runId, buildings, outcome.summary.list_size),
    );
    if (folder !== null) options.onProgress?.({ step: 'writing reports', share: NaN });
    const files = folder === null ? [] : (await writeReports(db, outcome.runId, folder, options.units ?? 'si')).files;
    return {
      ...outcome,
      base: run,
      changes: parameterChanges(base, loaded),
      list,
      files,
      written,
      rejected: rejectedShare(loaded, outcome.taken),
    };
  } finally {
    db.close();
  }
}

export interface SweepStudyOptions extends RefreshChoice {
  readonly onProgress?: ScreenOptions['onProgress'];
}

export interface SweptStudy {
  readonly base: number;
  readonly path: string;
  readonly values: readonly SweptValue[];
}

/**
 * Ranks the inventory of an earlier run of the study at `path` for every value of one parameter and says how the list differs from that
 * run's; `set` holds throughout. Keeps and writes nothing.
 * @throws UserError for a value that is wrong or changes intake, before any is ranked.
 * @example
 * const { values } = await sweepStudy('study.yaml', { path: 'hazard.spectra.design.sd1_g', values: [0.3, 0.4, 0.5] });
 */
export async function sweepStudy(
  path: string,
  range: ParameterRange,
  options: SweepStudyOptions = {},
): Promise<SweptStudy> {
  const own = await loadStudyAlone(path);
  const start = await parametersOf(own, options.with);
  const studies: { readonly value: number; readonly loaded: LoadedStudy }[] = [];
  for (const value of range.values) {
    const swept = { path: range.path, value, given: `${range.given ?? range.path} at ${String(value)}` };
    studies.push({ value, loaded: await withParameters(start, [...(options.set ?? []), swept], GONE) });
  }
  return withStudyDatabase(path, async (db) => {
    options.onOpen?.(db);
    const { run } = await chosenRun(db, own, options);
    const base = await baseRun(db, own, run);
    return { base: run, path: range.path, values: await sweep(db, base, studies, options.onProgress) };
  });
}

/** The study whose parameters are meant: the other file's, with the paths in it as they are in the study's folder. */
async function parametersOf(own: LoadedStudy, other: string | undefined): Promise<LoadedStudy> {
  if (other === undefined) return withFiles(own, GONE);
  if (resolve(dirname(other)) !== resolve(own.folder))
    throw new UserError(
      `lies in another folder than the study ${own.file}: the paths in it would mean other files; put it beside the study`,
      { file: other },
    );
  return withFiles(await loadStudyAlone(other), GONE);
}

function requireDatabase(loaded: LoadedStudy): void {
  const file = databasePath(loaded);
  if (!existsSync(file)) throw new UserError('this study has no run yet; run `swaymark screen` first', { file });
}

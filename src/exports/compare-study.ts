/** Two runs of a study, or of two studies, compared, and the page of it written. */
import { basename, resolve } from 'node:path';
import { UserError } from '../errors.js';
import { renderComparison } from '../reports/compare.js';
import { readPageScript } from '../reports/page-script.js';
import { latestOwnRun, ownRuns, runById } from '../runs/history.js';
import { withStudyDatabase } from '../runs/open.js';
import { compareRuns } from '../screening/compare-runs.js';
import type { Comparison, CompareOptions } from '../screening/compare-runs.js';
import type { RunOf } from '../screening/read-compared.js';
import { databasePath } from '../screening/screen.js';
import type { Database } from '../store/database.js';
import { loadStudyAlone } from '../study/load.js';
import type { LoadedStudy } from '../study/load.js';
import { spareInputs } from './spare-inputs.js';
import { prepareFolder, writeSet } from './write-set.js';

export interface CompareStudyOptions extends CompareOptions {
  /** The earlier run; the one before the newest when left out, the newest with another study. */
  readonly before?: number | undefined;
  /** The later run; the newest when left out. */
  readonly after?: number | undefined;
  /** Study file of the later run, where it is not the same study. */
  readonly otherStudy?: string | undefined;
  /** Write no page. */
  readonly page?: boolean;
  /** Folder of the page; the study's own when left out. */
  readonly output?: string | undefined;
}

export interface ComparedStudies {
  readonly comparison: Comparison;
  /** Path of the page, or null. */
  readonly page: string | null;
}

/**
 * Compares two runs of the study at `path`, or one of it with one of `otherStudy`: lists, moves and why, data, settings.
 * Writes compare-<run>-<run>.html into the study's folder of reports, unless told not to.
 * @throws UserError for an unknown run, or a study without two runs.
 * @example
 * const { comparison } = await compareStudy('study.yaml', { before: 1, after: 2, page: false });
 */
export async function compareStudy(path: string, options: CompareStudyOptions = {}): Promise<ComparedStudies> {
  const loaded = await loadStudyAlone(path);
  const other = options.otherStudy === undefined ? null : await loadStudyAlone(options.otherStudy);
  // one database cannot be opened twice
  const apart = other !== null && databasePath(other) !== databasePath(loaded) ? other : null;
  const compared = await withStudyDatabase(path, (db) =>
    apart === null
      ? compareIn({ db, loaded }, { db, loaded: other ?? loaded }, options)
      : withStudyDatabase(apart.file, (otherDb) => compareIn({ db, loaded }, { db: otherDb, loaded: apart }, options)),
  );
  if (options.page === false) return { comparison: compared, page: null };
  const folder = prepareFolder(options.output ?? resolve(loaded.folder, loaded.study.output));
  const name = pageName(compared, apart);
  await spareInputs(loaded, folder, [name]);
  await writeSet(folder, { [name]: renderComparison(compared, readPageScript()) });
  return { comparison: compared, page: resolve(folder, name) };
}

interface Side {
  readonly db: Database;
  readonly loaded: LoadedStudy;
}

async function compareIn(from: Side, to: Side, { before, after, most }: CompareStudyOptions): Promise<Comparison> {
  const later: RunOf = { db: to.db, runId: await chosen(to, after) };
  const isOneStudy = from.loaded === to.loaded;
  const earlier: RunOf = {
    db: from.db,
    runId: before === undefined && isOneStudy ? await runBefore(from, later.runId) : await chosen(from, before),
  };
  return compareRuns(earlier, later, most === undefined ? {} : { most });
}

async function chosen({ db, loaded }: Side, run: number | undefined): Promise<number> {
  return (run === undefined ? await latestOwnRun(db, loaded) : await runById(db, run)).run;
}

/** The newest run of the study before `run`. */
async function runBefore({ db, loaded }: Side, run: number): Promise<number> {
  const earlier = (await ownRuns(db, loaded)).findLast((entry) => entry.run < run);
  if (earlier === undefined)
    throw new UserError(
      `this study has no run before run ${String(run)}: a comparison takes two; \`swaymark runs\` lists those that can be named by their numbers`,
      { file: db.file },
    );
  return earlier.run;
}

/** compare-1-2.html; with the folder of the other study where there is one: compare-1-town-2013-1.html. */
function pageName({ before, after }: Comparison, apart: LoadedStudy | null): string {
  const other =
    apart === null
      ? ''
      : `${basename(resolve(apart.folder))
          .replaceAll(/[^\w.-]+/g, '-')
          .slice(0, 40)}-`;
  return `compare-${String(before.run)}-${other}${String(after.run)}.html`;
}

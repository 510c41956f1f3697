/** Everything a run writes into the study's output folder. */
import { writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { Display } from '../engineering/format.js';
import type { PageData } from '../engineering/page-contract.js';
import { renderDashboard } from '../reports/dashboard.js';
import { readPageScript } from '../reports/page-script.js';
import { renderSummary } from '../reports/summary.js';
import { gridRejectsSql } from '../screening/grid-rejects.js';
import { pageDataOf, readRun } from '../screening/page-data.js';
import type { Database } from '../store/database.js';
import { GAPS_BEGIN, gapsCsv } from './gaps.js';
import { writeRankingCsv, writeRankingParquet } from './ranking.js';
import { writeRejectsCsv } from './rejects.js';
import { SITES_BEGIN, writeSitesCsv } from './sites.js';
import { removeOwn } from './remove-own.js';
import { writeSet } from './write-set.js';
import type { FileSource } from './write-set.js';

/** The files a run writes; the last two only where there is something to tell. */
export const REPORT_FILES = [
  'dashboard.html',
  'summary.md',
  'ranking.csv',
  'ranking.parquet',
  'rejects.csv',
  'sites.csv',
  'gaps.csv',
] as const;

/** How a file begins that an earlier run left and this one has nothing for: it would be taken for this run's. */
const LEFT_BEHIND: Readonly<Partial<Record<(typeof REPORT_FILES)[number], string>>> = {
  'sites.csv': SITES_BEGIN,
  'gaps.csv': GAPS_BEGIN,
};

export interface Written {
  /** Paths of the files, the dashboard first. */
  readonly files: readonly string[];
  /** What the dashboard shows. */
  readonly data: PageData;
}

/**
 * Writes dashboard.html, summary.md and the tables of a kept run into `folder`, all or none.
 * @param folder as `prepareFolder` returned it, and open to `db`.
 */
export async function writeReports(
  db: Database,
  runId: number,
  folder: string,
  display: Display = 'si',
): Promise<Written> {
  const data = pageDataOf(db, runId, display);
  data.catch(() => undefined);
  let lay!: (path: Promise<string>) => void;
  const ranking = new Promise<string>((resolve) => {
    lay = resolve;
  });
  const sources: Readonly<Record<(typeof REPORT_FILES)[number], FileSource>> = {
    // drawn while the ranking is joined and sorted, which needs nothing of this thread
    'dashboard.html': async (path) => writeFile(path, renderDashboard(await data, readPageScript())),
    'summary.md': async (path) => writeFile(path, renderSummary(await data)),
    'ranking.csv': async (path) => {
      const from = await ranking;
      await db.beside((other) => writeRankingCsv(other, from, path, display));
    },
    'ranking.parquet': async (path) => {
      const written = db.beside((other) => writeRankingParquet(other, runId, path));
      lay(written.then(() => path));
      await written;
    },
    'rejects.csv': async (path) => {
      const { inventory } = (await data).summary.fingerprints;
      const rejects = gridRejectsSql(await readRun(db, runId));
      await db.beside((other) => writeRejectsCsv(other, inventory, path, rejects));
    },
    'sites.csv': (path) => db.beside(async (other) => writeSitesCsv(other, await readRun(other, runId), path)),
    'gaps.csv': async (path) => {
      const text = gapsCsv(await data);
      return text === null ? false : writeFile(path, text);
    },
  };
  const files = await writeSet(folder, sources);
  for (const [name, begin] of Object.entries(LEFT_BEHIND))
    if (!files.includes(join(folder, name))) removeOwn(join(folder, name), begin);
  return { files, data: await data };
}

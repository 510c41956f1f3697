/** Everything a run writes into the study's output folder. */
import { writeFile } from 'node:fs/promises';
import type { Display } from '../engineering/format.js';
import type { PageData } from '../engineering/page-contract.js';
import { renderDashboard } from '../reports/dashboard.js';
import { readPageScript } from '../reports/page-script.js';
import { renderSummary } from '../reports/summary.js';
import { gridRejectsSql } from '../screening/grid-rejects.js';
import { pageDataOf, readRun } from '../screening/page-data.js';
import type { Database } from '../store/database.js';
import { endRanking, prepareRanking, writeRankingCsv, writeRankingParquet } from './ranking.js';
import { writeRejectsCsv } from './rejects.js';
import { writeSet } from './write-set.js';
import type { FileSource } from './write-set.js';

/** The files a run writes. */
export const REPORT_FILES = ['dashboard.html', 'summary.md', 'ranking.csv', 'ranking.parquet', 'rejects.csv'] as const;

export interface Written {
  /** Paths of the files, the dashboard first. */
  readonly files: readonly string[];
  /** What the dashboard shows. */
  readonly data: PageData;
}

/**
 * Writes dashboard.html, ranking.csv, ranking.parquet, rejects.csv and summary.md of a kept run into `folder`, all or none.
 * @param folder as `prepareFolder` returned it, and open to `db`.
 */
export async function writeReports(
  db: Database,
  runId: number,
  folder: string,
  display: Display = 'si',
): Promise<Written> {
  try {
    // the table of the ranking is laid out while the page is drawn
    const ranking = db.beside((other) => prepareRanking(other, runId));
    ranking.catch(() => undefined);
    const data = await pageDataOf(db, runId, display);
    const { inventory } = data.summary.fingerprints;
    const rejects = gridRejectsSql(await readRun(db, runId));
    const sources: Readonly<Record<(typeof REPORT_FILES)[number], FileSource>> = {
      'dashboard.html': async (path) => {
        await ranking;
        await writersUnderWay();
        await writeFile(path, renderDashboard(data, readPageScript()));
      },
      'summary.md': renderSummary(data),
      'ranking.csv': async (path) => {
        await ranking;
        await db.beside((other) => writeRankingCsv(other, runId, path, display));
      },
      'ranking.parquet': async (path) => {
        await ranking;
        await db.beside((other) => writeRankingParquet(other, runId, path));
      },
      'rejects.csv': (path) => db.beside((other) => writeRejectsCsv(other, inventory, path, rejects)),
    };
    return { files: await writeSet(folder, sources), data };
  } finally {
    await endRanking(db, runId);
  }
}

/** Gives the writers of the ranking time to hand their statements over, before drawing the page keeps this thread busy. */
function writersUnderWay(): Promise<void> {
  return new Promise((resolve) => {
    setTimeout(resolve, 50);
  });
}

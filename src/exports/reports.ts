/** Everything a run writes into the study's output folder. */
import type { Display } from '../engineering/format.js';
import type { PageData } from '../engineering/page-contract.js';
import { renderDashboard } from '../reports/dashboard.js';
import { readPageScript } from '../reports/page-script.js';
import { renderSummary } from '../reports/summary.js';
import { pageDataOf } from '../screening/page-data.js';
import type { Database } from '../store/database.js';
import { endRanking, writeRankingCsv, writeRankingParquet } from './ranking.js';
import { writeRejectsCsv } from './rejects.js';
import { writeSet } from './write-set.js';

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
  const data = await pageDataOf(db, runId, display);
  try {
    const files = await writeSet(folder, {
      'dashboard.html': renderDashboard(data, readPageScript()),
      'summary.md': renderSummary(data),
      'ranking.csv': (path) => writeRankingCsv(db, runId, path, display),
      'ranking.parquet': (path) => writeRankingParquet(db, runId, path),
      'rejects.csv': (path) => writeRejectsCsv(db, data.summary.fingerprints.inventory, path),
    });
    return { files, data };
  } finally {
    await endRanking(db, runId);
  }
}

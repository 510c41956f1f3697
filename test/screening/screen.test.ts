import { readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { RESULT_COLUMNS } from '../../src/engineering/results.js';
import { explainBuilding } from '../../src/screening/explain.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import type { ScreenOutcome } from '../../src/screening/screen.js';
import type { Database } from '../../src/store/database.js';
import { loadStudy } from '../../src/study/load.js';
import { MADE, demoCopy } from '../support/study-folder.js';

async function screened<T>(path: string, look: (db: Database, outcome: ScreenOutcome) => Promise<T>): Promise<T> {
  const loaded = await loadStudy(path);
  const db = await openStudyDatabase(loaded);
  try {
    return await look(db, await screen(db, loaded, { made: MADE }));
  } finally {
    db.close();
  }
}

const RESULTS = `SELECT b.id, ${RESULT_COLUMNS.map(({ name }) => `r."${name}"`).join(', ')}
  FROM result r JOIN run USING (run_id) JOIN building b ON b.inventory_id = run.inventory_id AND b.building_index = r.building_index
  WHERE r.run_id = ? ORDER BY b.id`;

describe('screen', () => {
  it('recomputes every demo building with a trace to the same bits as stored', { timeout: 120_000 }, async () => {
    await screened(demoCopy(), async (db, { runId }) => {
      const rows = await db.rows<{
        id: string;
        ln_priority: number | null;
        sa_g: number | null;
        capacity_g: number | null;
      }>(RESULTS, [runId]);
      expect(rows.length).toBeGreaterThan(230);
      for (const { id, ln_priority, sa_g, capacity_g } of rows) {
        const { result, steps, stored } = await explainBuilding(db, runId, id, 'si');
        if ('reason' in result) {
          expect(stored['not_ranked']).toBe(result.reason);
          continue;
        }
        expect(result.lnPriority).toBe(ln_priority);
        expect(result.leading.sa_g).toBe(sa_g);
        expect(result.leading.capacity_g).toBe(capacity_g);
        // the demand and capacity that are stored stand among the steps of the hand calculation
        const values = steps.map(({ value }) => value);
        expect(values).toContain(sa_g);
        expect(values).toContain(capacity_g);
      }
    });
  });

  it('accounts for every row, chances sum to the list size and the tie groups are contiguous', async () => {
    await screened(demoCopy(), async (db, { runId, summary }) => {
      expect(summary.account.reduce((sum, { rows }) => sum + rows, 0)).toBe(summary.rows_in);
      const rows = await db.rows<{
        rank: number;
        chance: number;
        tie_group: number;
        rank_best: number;
        rank_worst: number;
      }>(
        'SELECT rank, chance, tie_group, rank_best, rank_worst FROM result WHERE run_id = ? AND rank IS NOT NULL ORDER BY rank',
        [runId],
      );
      expect(rows.map(({ rank }) => rank)).toEqual(rows.map((_, i) => i + 1));
      expect(rows.reduce((sum, { chance }) => sum + chance, 0)).toBeCloseTo(20, 6);
      rows.reduce((last, { tie_group }) => {
        expect(tie_group - last === 0 || tie_group - last === 1).toBe(true);
        return tie_group;
      }, 1);
      for (const { rank_best, rank_worst } of rows) expect(rank_best).toBeLessThanOrEqual(rank_worst);
    });
  });

  it('gives the same results whatever the order of the rows', async () => {
    const straight = await screened(demoCopy(), (db, { runId }) => db.rows(RESULTS, [runId]));
    // turned round from the third row on; the two rows that share an id keep their order, because the first of them is taken
    const turned = demoCopy({
      inventory: (text) => {
        const records = text.split(/\r?\n(?=(?:[^"]*"[^"]*")*[^"]*$)/).filter((record) => record !== '');
        const [header = '', ...rest] = records;
        const repeated = rest.filter((record) => record.startsWith('BH-199,'));
        return [header, ...rest.filter((record) => !record.startsWith('BH-199,')).reverse(), ...repeated].join('\r\n');
      },
    });
    const other = await screened(turned, (db, { runId }) => db.rows(RESULTS, [runId]));
    expect(other).toEqual(straight);
  });

  it('keeps earlier runs and numbers the next one', async () => {
    const path = demoCopy();
    const first = await screened(path, (_db, outcome) => Promise.resolve(outcome.runId));
    const second = await screened(path, async (db, outcome) => {
      expect(await db.value('SELECT count(*) FROM result WHERE run_id = 1')).toBe(outcome.summary.buildings);
      expect(outcome.taken.known).toBe(true);
      return outcome.runId;
    });
    expect([first, second]).toEqual([1, 2]);
  });

  it('keeps nothing of a run that fails', async () => {
    const path = demoCopy();
    await screened(path, () => Promise.resolve());
    const inventory = join(dirname(path), 'inventory.csv');
    writeFileSync(inventory, readFileSync(inventory, 'utf8').replace('Asset no.', 'Something else'));
    const loaded = await loadStudy(path);
    const db = await openStudyDatabase(loaded);
    await expect(screen(db, loaded, { made: MADE })).rejects.toThrow(/Asset no\./);
    expect(await db.value('SELECT count(*) FROM run')).toBe(1);
    expect(await db.value('SELECT count(*) FROM inventory')).toBe(1);
    db.close();
  });

  it('ranks by demand alone when asked, and then rank and demand rank are one', async () => {
    const path = demoCopy({ study: (text) => text.replace('rank_by: people', 'rank_by: demand') });
    await screened(path, async (db, { runId, summary }) => {
      const rows = await db.rows<{ rank: number; demand_rank: number; chance: number; sa_g: number }>(
        'SELECT rank, demand_rank, chance, sa_g FROM result WHERE run_id = ? AND rank IS NOT NULL ORDER BY rank',
        [runId],
      );
      expect(rows.reduce((sum, { chance }) => sum + chance, 0)).toBeCloseTo(20, 6);
      expect(summary.largest_equal_block).toBeGreaterThan(10);
      for (let i = 1; i < rows.length; i += 1) expect(rows[i]!.chance).toBeLessThanOrEqual(1);
    });
  });
});

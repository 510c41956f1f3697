import { readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../src/engineering/assess/assess.js';
import { compileContext } from '../../src/engineering/assess/context.js';
import { buildingReader } from '../../src/engineering/building-columns.js';
import { handSteps } from '../../src/engineering/hand.js';
import { Trace } from '../../src/engineering/trace.js';
import { RESULT_COLUMNS } from '../../src/engineering/results.js';
import { explainBuilding } from '../../src/screening/explain.js';
import { readRun } from '../../src/screening/page-data.js';
import { readBuildings, readPools } from '../../src/screening/read-buildings.js';
import { findingCounts } from '../../src/screening/summarise.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import type { ScreenOutcome } from '../../src/screening/screen.js';
import type { Database } from '../../src/store/database.js';
import { loadStudy } from '../../src/study/load.js';
import { screenedDemo } from '../support/screened-demo.js';
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

/** As above of the demo as it is, which is screened once for all tests. */
async function onDemo<T>(look: (db: Database, run: Awaited<ReturnType<typeof readRun>>) => Promise<T>): Promise<T> {
  const db = await openStudyDatabase(await loadStudy(await screenedDemo()));
  try {
    return await look(db, await readRun(db, 1));
  } finally {
    db.close();
  }
}

const RESULTS = `SELECT b.id, ${RESULT_COLUMNS.map(({ name }) => `r."${name}"`).join(', ')}
  FROM result r JOIN run USING (run_id) JOIN building b ON b.inventory_id = run.inventory_id AND b.building_index = r.building_index
  WHERE r.run_id = ? ORDER BY b.id`;

describe('screen', () => {
  it('recomputes every demo building with a trace to the same bits as stored', { timeout: 120_000 }, async () => {
    await onDemo(async (db, { run_id: runId, settings, inventory_id, summary }) => {
      const rows = await db.rows<{
        id: string;
        ln_priority: number | null;
        sa_g: number | null;
        capacity_g: number | null;
      }>(RESULTS, [runId]);
      expect(rows.length).toBeGreaterThan(230);
      const { columns } = await readBuildings(db, inventory_id, { from: 0, to: summary.buildings });
      const read = buildingReader(columns, await readPools(db, inventory_id));
      const buildings = new Map(columns.id.map((id, i) => [id, read(i)]));
      const context = compileContext(settings);
      for (const { id, ln_priority, sa_g, capacity_g } of rows) {
        const trace = new Trace();
        const result = assess(buildings.get(id)!, context, trace);
        if (!isRanked(result)) {
          expect(ln_priority).toBeNull();
          continue;
        }
        expect(result.lnPriority).toBe(ln_priority);
        expect(result.leading.sa_g).toBe(sa_g);
        expect(result.leading.capacity_g).toBe(capacity_g);
        // the demand and capacity that are stored stand among the steps of the hand calculation
        const values = handSteps(trace, 'si').map(({ value }) => value);
        expect(values).toContain(sa_g);
        expect(values).toContain(capacity_g);
      }
      // what the command explains is the same, with the neighbours besides
      for (const { id, ln_priority } of rows.filter((_, i) => i % 20 === 0)) {
        const { result, steps, stored } = await explainBuilding(db, runId, id, 'si');
        if ('reason' in result) expect(stored['not_ranked']).toBe(result.reason);
        else {
          expect(result.lnPriority).toBe(ln_priority);
          expect(steps.map(({ value }) => value)).toContain(stored['sa_g']);
        }
      }
    });
  });

  it('accounts for every row, chances sum to the list size and the tie groups are contiguous', async () => {
    await onDemo(async (db, { run_id: runId, summary, inventory_id }) => {
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
      // cells that were not read are counted column by column
      const cells = await db.rows<{ code: string; name: string }>(
        "SELECT code, column_name AS name FROM finding WHERE inventory_id = ? AND kind = 'rejected-cell'",
        [inventory_id],
      );
      const counted = (await findingCounts(db, inventory_id)).filter(({ kind }) => kind === 'rejected-cell');
      const keys = cells.map(({ code, name }) => `${code} ${name}`);
      expect(new Set(keys).size).toBeGreaterThan(2);
      expect(counted.map(({ code, column, count }) => [`${code} ${String(column)}`, count]).sort()).toEqual(
        [...new Set(keys)].map((key) => [key, keys.filter((one) => one === key).length]).sort(),
      );
      expect(rows.reduce((sum, { chance }) => sum + chance, 0)).toBeCloseTo(20, 6);
      rows.reduce((last, { tie_group }) => {
        expect(tie_group - last === 0 || tie_group - last === 1).toBe(true);
        return tie_group;
      }, 1);
      for (const { rank_best, rank_worst } of rows) expect(rank_best).toBeLessThanOrEqual(rank_worst);
    });
  });

  it('gives the same results whatever the order of the rows', async () => {
    const straight = await onDemo((db, { run_id }) => db.rows(RESULTS, [run_id]));
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

  it('keeps nothing when no building can be ranked, and says why and what to do', async () => {
    const path = demoCopy();
    const inventory = join(dirname(path), 'inventory.csv');
    const [head = '', ...rows] = readFileSync(inventory, 'utf8').split('\n');
    // Two buildings without a system (column 7 of the header) in a study without a table of chances.
    const kept = rows.filter((row) => row.split(',')[6] === '').slice(0, 2);
    writeFileSync(inventory, [head, ...kept, ''].join('\n'));
    writeFileSync(path, readFileSync(path, 'utf8').replace(/^system_prior:.*$/m, ''));
    const loaded = await loadStudy(path);
    const db = await openStudyDatabase(loaded);
    await expect(screen(db, loaded, { made: MADE })).rejects.toThrow(
      'none of 2 buildings can be ranked: system not known and the study names no table of system chances (2); give their systems',
    );
    expect(await db.value('SELECT count(*) FROM run')).toBe(0);
    db.close();
  });

  it('gives buildings of equal demand one demand rank, from the first of their places to the last', async () => {
    await onDemo(async (db, { run_id: runId, summary }) => {
      const blocks = await db.rows<{
        demand_rank: number;
        demand_rank_last: number;
        n: number;
        least: number;
        most: number;
      }>(
        `SELECT demand_rank, demand_rank_last, count(*) AS n, min(sa_g) AS least, max(sa_g) AS most FROM result
         WHERE run_id = ? AND rank IS NOT NULL GROUP BY demand_rank, demand_rank_last ORDER BY demand_rank`,
        [runId],
      );
      let next = 1;
      for (const { demand_rank, demand_rank_last, n } of blocks) {
        expect(demand_rank).toBe(next);
        expect(demand_rank_last).toBe(demand_rank + n - 1);
        next = demand_rank_last + 1;
      }
      expect(next).toBe(summary.ranked + 1);
      expect(blocks[0]!.n).toBeGreaterThan(50);
    });
  });

  it('ranks by demand alone when asked, and then a rank lies among the places of its demand', async () => {
    const path = demoCopy({ study: (text) => text.replace('rank_by: people', 'rank_by: demand') });
    await screened(path, async (db, { runId, summary }) => {
      const rows = await db.rows<{
        rank: number;
        demand_rank: number;
        demand_rank_last: number;
        chance: number;
        rank_best: number;
        rank_worst: number;
      }>(
        `SELECT rank, demand_rank, demand_rank_last, chance, rank_best, rank_worst FROM result
         WHERE run_id = ? AND rank IS NOT NULL ORDER BY rank`,
        [runId],
      );
      expect(rows.reduce((sum, { chance }) => sum + chance, 0)).toBeCloseTo(20, 6);
      expect(summary.largest_equal_block).toBeGreaterThan(50);
      for (const { rank, demand_rank, demand_rank_last, rank_best, rank_worst } of rows) {
        expect(rank).toBeGreaterThanOrEqual(demand_rank);
        expect(rank).toBeLessThanOrEqual(demand_rank_last);
        expect(rank_best).toBeLessThanOrEqual(rank);
        expect(rank_worst).toBeGreaterThanOrEqual(rank);
      }
    });
  });
});

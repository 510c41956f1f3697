import { readFileSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openDatabase } from '../../src/store/database.js';
import { PRIOR, STUDY, writeInventory } from '../bench/inventory.mjs';
import { buildCommand, scratch, startSwaymark, swaymark } from '../support/cli.js';

const ROWS = 500;
const REPORTS = ['dashboard.html', 'ranking.csv', 'ranking.parquet', 'rejects.csv', 'summary.md'];
const { folder, remove } = scratch();

beforeAll(async () => {
  buildCommand();
  await writeInventory(join(folder, 'inventory.csv'), ROWS);
  writeFileSync(join(folder, 'study.yaml'), STUDY);
  writeFileSync(join(folder, 'system-prior.csv'), PRIOR);
}, 120_000);
afterAll(remove);

const read = (name: string): Buffer => readFileSync(join(folder, 'reports', name));
const pause = (ms: number): Promise<void> => new Promise((done) => setTimeout(done, ms));

async function runs(): Promise<readonly { run_id: number; results: number }[]> {
  const db = await openDatabase({ path: join(folder, 'study.duckdb') });
  try {
    return await db.rows(
      'SELECT run_id, (SELECT count(*) FROM result WHERE result.run_id = run.run_id) AS results FROM run ORDER BY run_id',
    );
  } finally {
    db.close();
  }
}

describe('a killed run', () => {
  it(
    'leaves the earlier runs and reports whole, whenever it dies, and what it left behind goes',
    { timeout: 400_000 },
    async () => {
      const started = Date.now();
      expect(swaymark(['screen', 'study.yaml'], { cwd: folder }).code).toBe(0);
      const whole_ms = Date.now() - started;
      // another inventory each time, so that the whole intake is done again
      const before = new Map(REPORTS.map((name) => [name, read(name)]));
      for (const share of [0.3, 0.6, 0.9]) {
        writeFileSync(
          join(folder, 'inventory.csv'),
          `${readFileSync(join(folder, 'inventory.csv'), 'utf8')}X${String(share)},late house,block 1,,,2,6,10,8,160,1950,,residential,C,\n`,
        );
        const child = startSwaymark(['screen', 'study.yaml'], folder);
        await pause(whole_ms * share);
        child.kill('SIGKILL');
        const { signal } = await child.ended;
        const kept = await runs();
        // either it died in time and only complete runs stand, or it had finished
        for (const { results } of kept) expect(results).toBeGreaterThanOrEqual(ROWS);
        if (signal === 'SIGKILL' && kept.length === 1)
          for (const name of REPORTS) expect(read(name).equals(before.get(name)!)).toBe(true);
        // every report is whole: the page is closed, the table has its last row
        expect(read('dashboard.html').toString('utf8').trimEnd().endsWith('</html>')).toBe(true);
        expect(read('ranking.csv').toString('utf8').trimEnd().split('\n').length).toBeGreaterThan(ROWS);
      }
      // what a run that died left half written goes with the next
      writeFileSync(join(folder, 'reports', '.swaymark-99999999-ranking.csv.part'), 'half');
      expect(swaymark(['screen', 'study.yaml'], { cwd: folder }).code).toBe(0);
      expect(readdirSync(join(folder, 'reports')).sort()).toEqual([...REPORTS].sort());
      expect((await runs()).at(-1)?.results).toBeGreaterThanOrEqual(ROWS);
    },
  );
});

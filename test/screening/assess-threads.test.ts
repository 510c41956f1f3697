import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import type { SetTask } from '../../src/engineering/priority/exceedance.js';
import * as source from '../../src/screening/assess-threads.js';
import type { BlockResult } from '../../src/screening/assess-block.js';
import { readRun } from '../../src/screening/page-data.js';
import { readBuildings, readPools } from '../../src/screening/read-buildings.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import { packBlock, partsOf } from '../../src/screening/thread-messages.js';
import { loadStudy } from '../../src/study/load.js';
import { buildCommand } from '../support/cli.js';
import { TWO_GRIDS, gridCopy, gridCsv, rising } from '../support/hazard-grid.js';
import { MADE, demoCopy } from '../support/study-folder.js';

type Built = typeof source;

// the threads need the built body; from the source everything runs in this thread
let built: Built;

beforeAll(async () => {
  buildCommand();
  built = (await import(join(process.cwd(), 'dist/screening/assess-threads.js'))) as Built;
}, 120_000);

describe('startAssessor', () => {
  it.each([
    ['spectra for all', () => demoCopy()],
    ['grids', () => gridCopy(TWO_GRIDS, { 'h475.csv': gridCsv(rising(1)), 'h2475.csv': gridCsv(rising(1.7)) })],
  ])('gives the same bits in three threads as in this one: %s', { timeout: 60_000 }, async (_, study) => {
    const loaded = await loadStudy(study());
    const db = await openStudyDatabase(loaded);
    const here = source.startAssessor(1);
    const there = built.startAssessor(3);
    try {
      const { runId, taken } = await screen(db, loaded, { made: MADE });
      const { settings } = await readRun(db, runId);
      const pools = await readPools(db, taken.inventoryId);
      const all = await readBuildings(db, taken.inventoryId, { from: 0, to: taken.buildings }, { places: true });
      const results = async (assessor: typeof here): Promise<readonly BlockResult[]> => {
        assessor.begin(settings, pools, loaded.grids);
        return Promise.all([...partsOf(packBlock(all), 0, 50)].map(({ part }) => assessor.assess(part)));
      };
      const [one, many] = [await results(here), await results(there)];
      expect(one.reduce((sum, { ranked }) => sum + ranked.length, 0)).toBeGreaterThan(200);
      one.forEach((result, i) => {
        const other = many[i]!;
        expect(Object.keys(other.numbers)).toEqual(Object.keys(result.numbers));
        for (const [name, values] of Object.entries(result.numbers))
          expect(Array.from(other.numbers[name]!), name).toEqual(Array.from(values));
        expect(other.words).toEqual(result.words);
        for (const [name, { words, codes }] of Object.entries(result.texts)) {
          expect(other.texts[name]!.words, name).toEqual(words);
          expect(other.texts[name]!.codes, name).toEqual(codes);
        }
        expect(other.ranked).toEqual(result.ranked);
        expect(other.demand_g).toEqual(result.demand_g);
        for (const name of ['weight', 'mean', 'sd', 'start'] as const)
          expect(Array.from(other.mixtures[name]), name).toEqual(Array.from(result.mixtures[name]));
      });
      const answers = async (assessor: typeof here): Promise<unknown> => {
        const sets = one.map(({ mixtures }) => ({ ...mixtures, from: 0, to: mixtures.start.at(-1)! }));
        const all = (of: SetTask) => Promise.all(sets.map(({ start: _, ...set }) => assessor.answer(set, of)));
        const grid = { kind: 'grid', low: -20, high: 20, least: 0.01, most: 3 } as const;
        return [await all({ kind: 'range' }), await all(grid), await all({ kind: 'count', x: 0 })];
      };
      expect(await answers(there)).toEqual(await answers(here));
    } finally {
      await there.close();
      await here.close();
      db.close();
    }
  });

  it('passes on what goes wrong in a thread', async () => {
    const assessor = built.startAssessor(2);
    try {
      const block = packBlock({ columns: { id: [], numbers: {}, words: {} }, notRanked: [], rows: 0 } as never);
      await expect(assessor.assess(block)).rejects.toThrow('a block before the settings');
    } finally {
      await assessor.close();
    }
  });
});

describe('threadsFor', () => {
  it('takes one thread for a small inventory and wherever the built body is missing', () => {
    expect(built.threadsFor(49_999)).toBe(1);
    expect(built.threadsFor(1_000_000)).toBeGreaterThanOrEqual(1);
    expect(built.threadsFor(1_000_000)).toBeLessThanOrEqual(4);
    expect(source.threadsFor(1_000_000)).toBe(1);
  });
});

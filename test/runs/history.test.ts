import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { latestRun, listRuns, runById } from '../../src/runs/history.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import { openDatabase } from '../../src/store/database.js';
import type { Database } from '../../src/store/database.js';
import { loadStudy } from '../../src/study/load.js';
import { scratch, writeSmallStudy } from '../support/cli.js';

const place = scratch();
let db: Database;

beforeAll(async () => {
  writeSmallStudy(place.folder);
  const loaded = await loadStudy(`${place.folder}/study.yaml`);
  db = await openStudyDatabase(loaded);
  await screen(db, loaded, { made: new Date('2026-01-02T03:04:05Z'), note: 'first' });
  await screen(db, loaded, { made: new Date('2026-02-02T03:04:05Z') });
});
afterAll(() => {
  db.close();
  place.remove();
});

describe('listRuns', () => {
  it('lists the runs oldest first with their fingerprints', async () => {
    const runs = await listRuns(db);
    expect(runs.map(({ run, note, made }) => [run, note, made])).toEqual([
      [1, 'first', '2026-01-02T03:04:05.000Z'],
      [2, '', '2026-02-02T03:04:05.000Z'],
    ]);
    expect(runs[0]).toMatchObject({
      title: 'Four houses (invented)',
      buildings: 4,
      ranked: 4,
      list_size: 2,
      rank_by: 'people',
    });
    for (const print of Object.values(runs[0]!.fingerprints)) expect(print).toMatch(/^[0-9a-f]{16}$/);
    expect(runs[1]!.fingerprints).toEqual(runs[0]!.fingerprints);
  });

  it('lists nothing in a database without tables', async () => {
    const empty = await openDatabase({ path: ':memory:' });
    expect(await listRuns(empty)).toEqual([]);
    await expect(latestRun(empty)).rejects.toThrow('this study has no run yet');
    empty.close();
  });
});

describe('latestRun', () => {
  it('is the newest', async () => {
    expect((await latestRun(db)).run).toBe(2);
  });
});

describe('runById', () => {
  it('finds a run and names those there are for an unknown one', async () => {
    expect((await runById(db, 1)).note).toBe('first');
    await expect(runById(db, 9)).rejects.toThrow('there is no run 9; kept: 1 to 2');
  });
});

import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readFileSync, writeFileSync } from 'node:fs';
import { deleteRuns, planDeletion } from '../../src/runs/delete.js';
import { listRuns, runById, runsByIds, writeNote } from '../../src/runs/history.js';
import { runSheet } from '../../src/runs/sheet.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import type { Database } from '../../src/store/database.js';
import { quoteName } from '../../src/store/sql.js';
import { loadStudy } from '../../src/study/load.js';
import { scratch, writeSmallStudy } from '../support/cli.js';
import { tablesOf } from '../support/v1-database.js';

const place = scratch();
const study = `${place.folder}/study.yaml`;
const when = new Date('2026-04-05T06:07:08Z');
let db: Database;
let inventories: readonly string[];

const make = async (): Promise<number> =>
  (await screen(db, await loadStudy(study), { made: new Date('2026-01-02T03:04:05Z') })).runId;
const rewrite = (file: string, from: string, to: string): void => {
  const text = readFileSync(file, 'utf8');
  expect(text).toContain(from);
  writeFileSync(file, text.replace(from, to));
};

/** Rows by table. */
async function contents(): Promise<Readonly<Record<string, readonly unknown[]>>> {
  const found: Record<string, readonly unknown[]> = {};
  for (const table of (await tablesOf(db)).keys())
    found[table] = await db.rows(`FROM ${quoteName(table)} ORDER BY ALL`);
  return found;
}

// Runs 1 and 2 stand on one inventory, run 3 on another.
beforeAll(async () => {
  writeSmallStudy(place.folder, ['A5,no use,99,8,1950,timber-light-frame,residential,90']);
  db = await openStudyDatabase(await loadStudy(study));
  await make();
  rewrite(study, 'list_size: 2, k: 2.5', 'list_size: 3, k: 3');
  await make();
  rewrite(`${place.folder}/houses.csv`, '1990', '1991');
  await make();
  inventories = (await listRuns(db)).map(({ fingerprints }) => fingerprints.inventory);
});
afterAll(() => {
  db.close();
  place.remove();
});

describe('runSheet', () => {
  it('holds what was kept: provenance, counts, account, list', async () => {
    const sheet = await runSheet(db, 2);
    expect(sheet).toMatchObject({
      run: 2,
      title: 'Four houses (invented)',
      list_size: 3,
      seed: 7,
      rank_by: 'people',
      buildings: 5,
      inventory: { file: 'houses.csv', rows_in: 5, buildings: 5 },
    });
    expect(sheet.ranked + sheet.not_ranked).toBe(5);
    expect(sheet.account.reduce((sum, { rows }) => sum + rows, 0)).toBe(5);
    const first = await db.rows('SELECT "rank", id FROM result r JOIN building b USING (building_index) WHERE run_id = 2 AND inventory_id = ? AND "rank" <= 3 ORDER BY "rank"', [inventories[1]!]); // prettier-ignore
    expect(sheet.list.map(({ rank, id }) => ({ rank, id }))).toEqual(first);
  });

  it('says by path what differs from the run before, and whether inventory or methods do', async () => {
    expect((await runSheet(db, 1)).before).toBeNull();
    expect((await runSheet(db, 2)).before).toMatchObject({
      run: 1,
      study: [
        { path: 'ranking.list_size', from: 2, to: 3 },
        { path: 'ranking.k', from: 2.5, to: 3 },
      ],
      others: [],
    });
    expect((await runSheet(db, 3)).before).toEqual({ run: 2, study: [], settings: [], others: ['inventory'] });
  });

  it('leaves the study out where this version does not read it, and still compares the settings', async () => {
    const text = await db.value('SELECT study_text FROM run WHERE run_id = 1');
    await db.run("UPDATE run SET study_text = 'of: another version' WHERE run_id = 1");
    const before = (await runSheet(db, 2)).before!;
    expect(before.study).toBeNull();
    expect(before.settings.map(({ from, to }) => [from, to])).toContainEqual([2.5, 3]);
    await db.run('UPDATE run SET study_text = ? WHERE run_id = 1', [text]);
  });
});

describe('writeNote', () => {
  it('puts a note in the place of another and says what was there', async () => {
    expect((await writeNote(db, 1, 'it’s the first')).note).toBe('');
    expect((await runById(db, 1)).note).toBe('it’s the first');
    await expect(writeNote(db, 9, 'x')).rejects.toThrow('there is no run 9; kept: 1 to 3');
  });
});

describe('runsByIds', () => {
  it('names every run that is not there', async () => {
    const refused = runsByIds(db, [1, 8, 9]);
    await expect(refused).rejects.toMatchObject({ problems: [{ message: /no run 8/ }, { message: /no run 9/ }] });
    expect((await runsByIds(db, [3, 1, 3])).map(({ run }) => run)).toEqual([1, 3]);
  });
});

describe('deleteRuns', () => {
  it('changes nothing when planned, when one run is not there, or when it fails on the way', async () => {
    const before = await contents();
    const plan = await planDeletion(db, [3]);
    expect(plan.inventories.map(({ inventory, file }) => [inventory, file])).toEqual([[inventories[2], 'houses.csv']]);
    await expect(deleteRuns(db, [1, 9], when)).rejects.toThrow('there is no run 9');
    await db.run('ALTER TABLE finding RENAME TO elsewhere');
    await expect(deleteRuns(db, [1, 2, 3], when)).rejects.toThrow(/finding/);
    await db.run('ALTER TABLE elsewhere RENAME TO finding');
    expect(await contents()).toEqual(before);
  });

  it('keeps an inventory that another run uses', async () => {
    const before = await contents();
    const done = await deleteRuns(db, [1], when);
    expect([done.left, done.inventories, done.inventories_kept.map(({ used_by }) => used_by)]).toEqual([
      [2, 3],
      [],
      [[2]],
    ]);
    const after = await contents();
    for (const table of ['inventory', 'building_core', 'building_extra', 'fill', 'finding', 'row_account', 'year_pool'])
      expect(after[table], table).toEqual(before[table]);
    for (const table of ['run', 'result_assessed', 'result_ranked'])
      expect(after[table], table).toEqual(before[table]!.filter((row) => (row as { run_id: number }).run_id !== 1));
  });

  it('takes the inventory along with the last run that uses it, with every row in any table', async () => {
    const number = await db.value('SELECT inventory_number FROM inventory WHERE inventory_id = ?', [inventories[2]!]);
    await deleteRuns(db, [3], when);
    for (const [table, columns] of await tablesOf(db)) {
      const keys = { run_id: 3, inventory_id: inventories[2]!, inventory_number: number };
      for (const [column, value] of Object.entries(keys))
        if (columns.includes(column) && table !== 'run_deleted')
          expect(await db.value(`SELECT count(*) FROM ${quoteName(table)} WHERE ${column} = ?`, [value]), table).toBe(
            0,
          );
    }
    expect((await listRuns(db)).map(({ run }) => run)).toEqual([2]);
    expect((await runSheet(db, 2)).before).toBeNull();
  });

  it('never gives a number again, and says of a deleted run when it went', async () => {
    await expect(runById(db, 3)).rejects.toThrow('run 3 was deleted on 2026-04-05; kept: 2');
    await deleteRuns(db, [2], when);
    await expect(runById(db, 2)).rejects.toThrow('run 2 was deleted on 2026-04-05; kept: none');
    expect(await make()).toBe(4);
    expect((await listRuns(db)).map(({ run, fingerprints }) => [run, fingerprints.inventory])).toEqual([
      [4, inventories[2]],
    ]);
  });
});

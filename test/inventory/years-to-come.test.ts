import { describe, expect, it } from 'vitest';
import { takeIn } from '../../src/inventory/take-in.js';
import type { Database } from '../../src/store/database.js';
import { memoryDatabase, studyOf, writeTable } from '../support/inventory-intake.js';

const TABLE = 'id,n,y,r,u\nA,3,2026,,office\nB,3,2027,,office\nC,3,1950,2050,office\nD,3,1950,2001,office\n';
const COLUMNS = { id: 'id', storeys_above: 'n', year_built: 'y', year_retrofitted: 'r', use: 'u' };

const yearsOf = (db: Database, id: string) =>
  db.rows('SELECT year_built, year_retrofitted FROM building WHERE inventory_id = ? ORDER BY id', [id]);

describe('years to come', () => {
  it('are cells that cannot be read, kept with place and value, and count as unknown', async () => {
    const db = await memoryDatabase();
    const study = studyOf(writeTable(TABLE), { columns: COLUMNS });
    const taken = await db.transaction(() =>
      takeIn(db, study, '.', undefined, undefined, { made: new Date('2026-06-11T00:00:00Z') }),
    );
    const years = await yearsOf(db, taken.inventoryId);
    expect(years.map(({ year_built }) => year_built)[0]).toBe(2026);
    expect(years.map(({ year_retrofitted }) => year_retrofitted)).toEqual([null, null, null, 2001]);
    expect(
      await db.rows(
        'SELECT "row", id, column_name, value, message, kind FROM finding WHERE code = \'outside-limits\' ORDER BY "row"',
      ),
    ).toEqual([
      {
        row: 3,
        id: 'B',
        column_name: 'year_built',
        value: '2027',
        message: '"2027" is outside 1100 to 2026',
        kind: 'rejected-cell',
      },
      {
        row: 4,
        id: 'C',
        column_name: 'year_retrofitted',
        value: '2050',
        message: '"2050" is outside 1900 to 2026',
        kind: 'rejected-cell',
      },
    ]);
  });

  it('are read anew when they have come; inventories without any stay what they are over New Year', async () => {
    const db = await memoryDatabase();
    const take = (text: string, made: string) =>
      db.transaction(() =>
        takeIn(db, studyOf(writeTable(text), { columns: COLUMNS }), '.', undefined, undefined, {
          made: new Date(made),
        }),
      );
    const [first, again, later] = [
      await take(TABLE, '2026-06-11T00:00:00Z'),
      await take(TABLE, '2026-12-01T00:00:00Z'),
      await take(TABLE, '2027-01-02T00:00:00Z'),
    ];
    expect([first.known, again.known, later.known]).toEqual([false, true, false]);
    expect(again.inventoryId).toBe(first.inventoryId);
    expect((await yearsOf(db, later.inventoryId))[1]).toMatchObject({ year_built: 2027 });
    const plain = TABLE.replace('2027', '1990').replace('2050', '');
    const [before, after] = [await take(plain, '2026-06-11T00:00:00Z'), await take(plain, '2027-06-11T00:00:00Z')];
    expect([before.known, after.known, after.inventoryId]).toEqual([false, true, before.inventoryId]);
  });

  it('begin where it is latest on earth', async () => {
    const db = await memoryDatabase();
    const study = studyOf(writeTable(TABLE), { columns: COLUMNS });
    const taken = await db.transaction(() =>
      takeIn(db, study, '.', undefined, undefined, { made: new Date('2026-12-31T10:00:01Z') }),
    );
    expect((await yearsOf(db, taken.inventoryId))[1]).toMatchObject({ year_built: 2027 });
  });
});

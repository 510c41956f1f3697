import { describe, expect, it } from 'vitest';
import { neighboursOf } from '../../src/screening/neighbours.js';
import { intakeOf, studyOf, writeTable } from '../support/inventory-intake.js';

// At the equator a degree is 111,320 m to the east and 110,574 m to the north (WGS 84; from memory of a printed table).
const box = (x: number, dx: number): string => {
  const [a, b] = [x / 111_320, (x + dx) / 111_320];
  const n = 12 / 110_574;
  return `"POLYGON ((${String(a)} 0, ${String(b)} 0, ${String(b)} ${String(n)}, ${String(a)} ${String(n)}, ${String(a)} 0))"`;
};

describe('neighboursOf', () => {
  it('takes the pairs of the table, and measures between footprints what it does not give', async () => {
    const file = writeTable(
      `id,n,f\nA,3,${box(0, 20)}\nB,4,${box(20.3, 15)}\nC,2,${box(-10.8, 10)}\nD,2,${box(60, 10)}\nE,5,\n`,
    );
    const pairs = writeTable('id_a,id_b,gap_m,floors_aligned\nB,A,,no\nE,A,0.1,yes\nA,D,,\n', 'pairs.csv');
    const { db } = await intakeOf({
      ...studyOf(file, { columns: { id: 'id', storeys_above: 'n', footprint: 'f' } }),
      neighbours: { file: pairs },
    });
    const inventoryId = String(await db.value('SELECT inventory_id FROM inventory'));
    const found = await neighboursOf(db, inventoryId, 0, 'A');
    expect(found.map(({ building, floors_aligned }) => [building.id, floors_aligned])).toEqual([
      ['E', 'yes'],
      ['B', 'no'],
      ['C', null],
    ]);
    expect(found.map(({ gap_m }) => gap_m)).toEqual([0.1, expect.closeTo(0.3, 3), expect.closeTo(0.8, 3)]);
    expect(found.map(({ how }) => how.slice(0, 8))).toEqual(['given in', 'measured', 'measured']);
    // they know where they stand, as a spectrum on a grid asks
    expect(found[1]!.building.lon).toBeCloseTo(27.8 / 111_320, 9);
    expect(await neighboursOf(db, inventoryId, 3, 'D')).toEqual([]);
  });

  it('takes the smaller gap and floors that are not at one level where rows of a pair disagree', async () => {
    const file = writeTable('id,n\nA,3\nB,4\nC,2\n');
    const pairs = writeTable(
      'id_a,id_b,gap_m,floors_aligned\nA,B,0.2,yes\nB,A,0.4,no\nC,A,0.3,\nA,C,,yes\n',
      'pairs.csv',
    );
    const { db } = await intakeOf({
      ...studyOf(file, { columns: { id: 'id', storeys_above: 'n' } }),
      neighbours: { file: pairs },
    });
    const inventoryId = String(await db.value('SELECT inventory_id FROM inventory'));
    for (const [index, id] of [
      [0, 'A'],
      [1, 'B'],
    ] as const)
      expect((await neighboursOf(db, inventoryId, index, id))[0]).toMatchObject({ gap_m: 0.2, floors_aligned: 'no' });
    // what one row leaves blank another may tell
    expect(await neighboursOf(db, inventoryId, 2, 'C')).toMatchObject([{ gap_m: 0.3, floors_aligned: 'yes' }]);
  });
});

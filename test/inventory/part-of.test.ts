import { describe, expect, it } from 'vitest';
import { rootsOf } from '../../src/inventory/part-of.js';
import { random } from '../support/engineering-random.js';
import { intakeOfText } from '../support/inventory-intake.js';

const of = (links: readonly (readonly [number, number])[]) =>
  rootsOf(
    Int32Array.from(links, ([part]) => part),
    Int32Array.from(links, ([, main]) => main),
  );

describe('rootsOf', () => {
  it('follows chains and trees to their end', () => {
    const { root, circles } = of([
      [3, 2],
      [2, 1],
      [5, 2],
      [9, 8],
    ]);
    expect([...root]).toEqual([1, 1, 1, 8]);
    expect(circles).toEqual([]);
  });

  it('takes a circle together, with what hangs on it', () => {
    const { root, circles } = of([
      [4, 7],
      [7, 6],
      [6, 4],
      [1, 7],
      [12, 1],
    ]);
    expect([...root]).toEqual([4, 4, 4, 4, 4]);
    expect(circles).toEqual([[4, 7, 6]]);
  });

  it('finds what walking each link to its end finds, in any order', () => {
    const { uniform } = random(3);
    for (let round = 0; round < 50; round += 1) {
      const n = 40;
      const main = Array.from({ length: n }, (_, i) => (i + 1 + Math.floor(uniform() * (n - 1))) % n);
      const links = main
        .map((to, from) => [from, to] as const)
        .filter(() => uniform() < 0.7)
        .sort(() => uniform() - 0.5);
      const next = new Map(links);
      const walked = links.map(([part]) => {
        const path: number[] = [];
        let at: number | undefined = part;
        while (at !== undefined && !path.includes(at)) {
          path.push(at);
          at = next.get(at);
        }
        return at === undefined ? path.at(-1)! : Math.min(...path.slice(path.indexOf(at)));
      });
      expect([...of(links).root]).toEqual(walked);
    }
  });

  it('follows a chain of 100,000 in the time of its length', () => {
    const n = 100_000;
    const part = Int32Array.from({ length: n }, (_, i) => i);
    const began = performance.now();
    expect(
      rootsOf(
        part,
        part.map((i) => i + 1),
      ).root.every((end) => end === n),
    ).toBe(true);
    // quadratic work would take minutes
    expect(performance.now() - began).toBeLessThan(5000);
  });
});

describe('notePartOf', () => {
  const table = [
    'id,part,n',
    'A,,3',
    'B,A,3',
    'C,B,2',
    'D,D,2',
    'E,F,2',
    'F,G,2',
    'G,E,2',
    'H,E,2',
    'I,Nowhere,2',
    'J,Nowhere,2',
  ].join('\n');

  it('tells of every cell that names no main building, with row, value and what to do', async () => {
    const { findings, buildings } = await intakeOfText(`${table}\n`, {
      columns: { id: 'id', part_of: 'part', storeys_above: 'n' },
    });
    const told = findings.filter(({ column_name }) => column_name === 'part_of');
    expect(told.map(({ row, id, value, code, kind }) => [row, id, value, code, kind])).toEqual([
      [4, 'C', 'B', 'part-of-a-part', 'note'],
      [5, 'D', 'D', 'part-of-itself', 'note'],
      [6, 'E', 'F', 'part-of-in-a-circle', 'note'],
      [7, 'F', 'G', 'part-of-in-a-circle', 'note'],
      [8, 'G', 'E', 'part-of-in-a-circle', 'note'],
      [9, 'H', 'E', 'part-of-a-part', 'note'],
      [10, 'I', 'Nowhere', 'unknown-main-building', 'note'],
      [11, 'J', 'Nowhere', 'unknown-main-building', 'note'],
    ]);
    expect(told.map(({ message }) => message)).toContain('B is itself part of A');
    expect(told[2]!.message).toContain('E, F, G');
    expect(told.every(({ action }) => action.includes(';'))).toBe(true);
    // nothing is corrected: the cells are kept as they are
    expect(buildings.map((building) => building['part_of'])).toContain('Nowhere');
    expect(buildings.find(({ id }) => id === 'C')).toMatchObject({ part_of: 'B', findings: 1 });
  });

  it('says nothing where every wing names its main building, also where rows are merged', async () => {
    const merged = await intakeOfText('id,part,n\nA,,3\nA,,4\nB,A,2\nB,A,2.5\n', {
      columns: { id: 'id', part_of: 'part', storeys_above: 'n' },
      merge_rows_by: 'id',
    });
    expect(merged.findings.filter(({ column_name }) => column_name === 'part_of')).toEqual([]);
    expect(merged.buildings).toHaveLength(2);
  });
});

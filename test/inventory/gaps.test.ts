import { describe, expect, it } from 'vitest';
import { gapsWithin, measureGaps } from '../../src/inventory/gaps.js';
import { random } from '../support/engineering-random.js';

// WGS 84 at 35° (from memory of a printed table): a degree is 91,288 m to the east and 110,941 m to the north.
const EAST = 91_288;
const NORTH = 110_941;
const box = (x: number, y: number, dx: number, dy: number, turn = 0): string => {
  const corners = [
    [0, 0],
    [dx, 0],
    [dx, dy],
    [0, dy],
    [0, 0],
  ].map(([a, b]) => {
    const [u, v] = [a! * Math.cos(turn) - b! * Math.sin(turn), a! * Math.sin(turn) + b! * Math.cos(turn)];
    return `${String(-40 + (x + u) / EAST)} ${String(35 + (y + v) / NORTH)}`;
  });
  return `POLYGON ((${corners.join(', ')}))`;
};

describe('gapsWithin', () => {
  it('measures the gap between walls, and from a corner to a wall', () => {
    expect(gapsWithin([box(0, 0, 20, 10), box(20.05, 2, 15, 10)], 1)[0]!.gap_m).toBeCloseTo(0.05, 4);
    // a square turned by 45° with its lowest corner 0.3 m above the other's upper wall
    expect(gapsWithin([box(0, 0, 20, 10), box(10, 10.3, 8, 8, Math.PI / 4)], 1)[0]!.gap_m).toBeCloseTo(0.3, 4);
  });

  it('gives 0 where they touch, overlap, or one lies within the other', () => {
    for (const other of [box(20, 0, 5, 5), box(15, 5, 20, 20), box(5, 3, 2, 2), box(-5, 3, 40, 2)])
      expect(gapsWithin([box(0, 0, 20, 10), other], 1)[0]?.gap_m).toBeCloseTo(0, 3);
  });

  it('leaves out those further apart, blanks and what is no polygon on earth', () => {
    const wild = 'POLYGON ((1e300 1e300, 1e300 1, 1e299 1, 1e300 1e300))';
    expect(gapsWithin([box(0, 0, 20, 10), null, 'nonsense', wild, box(22, 0, 5, 5)], 1.9)).toEqual([]);
    expect(gapsWithin([box(0, 0, 20, 10), null, box(22, 0, 5, 5)], 2.1)).toMatchObject([{ a: 0, b: 2 }]);
    expect(gapsWithin([], 5)).toEqual([]);
  });

  it('finds through the grid what comparing each with each finds', () => {
    const { uniform } = random(5);
    const plots = Array.from({ length: 250 }, () =>
      box(600 * uniform(), 600 * uniform(), 5 + 60 * uniform(), 5 + 20 * uniform(), 3 * uniform()),
    );
    const grid = gapsWithin(plots, 4);
    const each = plots.flatMap((one, a) =>
      plots
        .slice(a + 1)
        .flatMap((other, i) => gapsWithin([one, other], 4).map(({ gap_m }) => ({ a, b: a + 1 + i, gap_m }))),
    );
    expect(grid.length).toBeGreaterThan(100);
    expect(grid).toEqual(each);
  });

  it('finds the nearest corners of outlines with many, as comparing all with all does', () => {
    const { uniform } = random(8);
    const ring = (x: number, y: number): (readonly [number, number])[] =>
      Array.from({ length: 40 }, (_, i) => {
        const r = 8 + 2 * uniform();
        return [x + r * Math.cos((i * Math.PI) / 20), y + r * Math.sin((i * Math.PI) / 20)] as const;
      });
    const wkt = (points: readonly (readonly [number, number])[]): string =>
      `POLYGON ((${[...points, points[0]!].map(([x, y]) => `${String(-40 + x / EAST)} ${String(35 + y / NORTH)}`).join(', ')}))`;
    // each corner of the one against each wall of the other, both ways
    const toWalls = ([x, y]: readonly [number, number], of: readonly (readonly [number, number])[]): number =>
      Math.min(
        ...of.map(([ax, ay], i) => {
          const [bx, by] = of[(i + 1) % of.length]!;
          const [dx, dy] = [bx - ax, by - ay];
          const t = Math.min(1, Math.max(0, ((x - ax) * dx + (y - ay) * dy) / (dx * dx + dy * dy)));
          return Math.hypot(ax + t * dx - x, ay + t * dy - y);
        }),
      );
    for (let round = 0; round < 40; round += 1) {
      const [one, other] = [ring(0, 0), ring(21 + 2 * uniform(), 4 * uniform())];
      const least = Math.min(...one.map((at) => toWalls(at, other)), ...other.map((at) => toWalls(at, one)));
      expect(gapsWithin([wkt(one), wkt(other)], 6)[0]!.gap_m).toBeCloseTo(least, 3);
    }
  });
});

describe('courtyards', () => {
  /** `outer` with courtyards, each drawn as a box of its own. */
  const around = (outer: string, ...courtyards: readonly string[]): string =>
    `POLYGON (${[outer, ...courtyards].map((text) => text.slice('POLYGON ('.length, -1)).join(', ')})`;
  const block = around(box(0, 0, 60, 60), box(15, 15, 30, 30));
  /** By plane geometry; metres. */
  const gap = (one: string, other: string, reach_m = 12): number | undefined => {
    const [there] = gapsWithin([one, other], reach_m);
    const [back] = gapsWithin([other, one], reach_m);
    expect(back?.gap_m).toEqual(there === undefined ? undefined : expect.closeTo(there.gap_m, 4));
    return there?.gap_m;
  };

  it('stand open: a building in one is as far off as its walls', () => {
    expect(gap(block, box(25, 25, 10, 10))).toBeCloseTo(10, 3);
    expect(gap(block, box(18, 27, 10, 10))).toBeCloseTo(3, 3);
    expect(gap(block, box(16, 16, 28, 28))).toBeCloseTo(1, 3);
    // of two courtyards the one it stands in
    const two = around(box(0, 0, 60, 60), box(5, 5, 20, 50), box(32, 5, 20, 50));
    expect(gap(two, box(36, 20, 10, 10))).toBeCloseTo(4, 3);
    // beyond reach it is no neighbour
    expect(gapsWithin([block, box(25, 25, 10, 10)], 2)).toEqual([]);
  });

  it('give 0 where a building touches their wall, crosses it, lies upon it or stands in what is built', () => {
    expect(gap(block, box(15, 25, 10, 10))).toBeCloseTo(0, 3);
    expect(gap(block, box(12, 25, 10, 10))).toBe(0);
    expect(gap(block, box(10, 10, 40, 40))).toBe(0);
    expect(gap(block, box(3, 3, 5, 5))).toBe(0);
    expect(gap(block, box(15, 15, 30, 30))).toBeCloseTo(0, 3);
    expect(gap(block, box(-5, -5, 70, 70))).toBe(0);
  });

  it('hold from outside, and of rings within rings, what plain outlines do', () => {
    expect(gap(block, box(60.4, 10, 10, 10))).toBeCloseTo(0.4, 3);
    const inner = around(box(18, 18, 24, 24), box(22, 22, 16, 16));
    expect(gap(block, inner)).toBeCloseTo(3, 3);
    expect(gap(inner, box(25, 25, 10, 10))).toBeCloseTo(3, 3);
    expect(gap(block, box(25, 25, 10, 10))).toBeCloseTo(10, 3);
  });

  it('cost as much as their walls: twice the blocks, twice the work', () => {
    const blocks = (count: number): readonly string[] =>
      Array.from({ length: count }, (_, i) => {
        const [x, y] = [62 * (i % 50), 62 * Math.floor(i / 50)];
        return [around(box(x, y, 60, 60), box(x + 15, y + 15, 30, 30)), box(x + 16, y + 16, 28, 28)];
      }).flat();
    // steps count walls compared and cells looked up: the least that a run of so many blocks needs
    const isEnough = (count: number, steps: number): boolean => measureGaps(blocks(count), 1.5, { steps }).complete;
    for (const count of [250, 1000]) {
      expect(isEnough(count, 600 * count)).toBe(true);
      expect(isEnough(count, 60 * count)).toBe(false);
      expect(gapsWithin(blocks(count), 1.5)).toHaveLength(count);
    }
  });
});

describe('buildings of several outlines', () => {
  const several = (...outlines: readonly string[]): string =>
    `MULTIPOLYGON (${outlines.map((text) => text.slice('POLYGON '.length)).join(', ')})`;

  it('are as near as the nearest of them, from either side', () => {
    const one = several(box(0, 0, 10, 10), box(100, 0, 10, 10), box(30, 0, 10, 10));
    const other = several(box(60, 0, 10, 10), box(41.2, 0, 10, 10));
    expect(gapsWithin([one, other], 2)).toEqual([{ a: 0, b: 1, gap_m: expect.closeTo(1.2, 3) as number }]);
    expect(gapsWithin([other, one], 2)).toEqual([{ a: 0, b: 1, gap_m: expect.closeTo(1.2, 3) as number }]);
    expect(gapsWithin([one, box(102, 2, 2, 2)], 2)).toMatchObject([{ gap_m: 0 }]);
    // near two of them: one pair
    expect(gapsWithin([one, box(10.5, 0, 19, 5)], 2)).toEqual([
      { a: 0, b: 1, gap_m: expect.closeTo(0.5, 3) as number },
    ]);
    for (const [near, far] of [
      [0.5, 1.1],
      [1.1, 0.5],
    ] as const)
      expect(gapsWithin([one, box(10 + near, 0, 20 - near - far, 5)], 2)).toEqual([
        { a: 0, b: 1, gap_m: expect.closeTo(0.5, 3) as number },
      ]);
    // what lies between them is no overlap, and their own outlines are no neighbours of each other
    expect(gapsWithin([one, box(65, 0, 10, 10)], 2)).toEqual([]);
    expect(gapsWithin([several(box(0, 0, 10, 10), box(10.5, 0, 10, 10)), null], 2)).toEqual([]);
    expect(measureGaps([one, one], 2)).toEqual({ gaps: [], complete: true, alike: 1 });
  });

  it('are found far from each other, and one part off the earth does not hide the rest', () => {
    const apart = several(box(0, 0, 10, 10), box(5000, 0, 10, 10));
    expect(gapsWithin([apart, box(5010.7, 0, 10, 10), box(-10.3, 0, 10, 10)], 2)).toEqual([
      { a: 0, b: 1, gap_m: expect.closeTo(0.7, 3) as number },
      { a: 0, b: 2, gap_m: expect.closeTo(0.3, 3) as number },
    ]);
    const off = several(box(0, 0, 10, 10), 'POLYGON ((1e300 1e300, 1e300 1, 1e299 1, 1e300 1e300))');
    expect(gapsWithin([off, box(10.7, 0, 10, 10)], 2)).toMatchObject([{ a: 0, b: 1 }]);
  });

  it('give no gap where the work was broken off before all of them were compared', () => {
    // the later an outline comes, the nearer it stands to the row before
    const spread = (row: number): string =>
      several(...Array.from({ length: 12 }, (_, i) => box(12 * i, row * (10.9 - 0.05 * i), 10, 10)));
    const rows = [spread(0), spread(1), spread(2)];
    const full = measureGaps(rows, 1);
    expect(full.gaps).toHaveLength(2);
    expect(full.gaps[0]!.gap_m).toBeCloseTo(0.35, 3);
    for (let steps = 50; steps < 4000; steps += 50) {
      const { gaps, complete } = measureGaps(rows, 1, { steps });
      for (const gap of gaps) expect(full.gaps).toContainEqual(gap);
      if (complete) expect(gaps).toEqual(full.gaps);
    }
  });
});

describe('measureGaps', () => {
  const row = Array.from({ length: 30 }, (_, i) => box(10.5 * i, 0, 10, 8));

  it('counts only pairs with a wanted one', () => {
    const { gaps, complete } = measureGaps(row, 1, { wanted: (place) => place === 7 });
    expect(gaps.map(({ a, b }) => [a, b])).toEqual([
      [6, 7],
      [7, 8],
    ]);
    expect(complete).toBe(true);
  });

  it('passes over buildings of one and the same outline', () => {
    const found = measureGaps([row[0]!, row[1]!, row[0]!, row[0]!], 1);
    expect(found.alike).toBe(3);
    expect(found.gaps.map(({ a, b }) => [a, b])).toEqual([
      [0, 1],
      [1, 2],
      [1, 3],
    ]);
  });

  it('breaks off where outlines lie upon one another in masses, and says so', () => {
    const heap = Array.from({ length: 3000 }, (_, i) => box(0.001 * i, 0, 20, 10));
    const began = performance.now();
    const found = measureGaps(heap, 1, { steps: 200_000 });
    expect(found.complete).toBe(false);
    expect(found.gaps.length).toBeGreaterThan(0);
    // all 4.5 million pairs would be found 0 m apart
    expect(found.gaps.length).toBeLessThan(50_000);
    expect(performance.now() - began).toBeLessThan(3000);
  });
});

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

import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ordinate } from '../../../src/engineering/spectrum/compiled.js';
import { compileSpectrum } from '../../../src/engineering/spectrum/definition.js';
import { GridError, layGrid } from '../../../src/engineering/spectrum/grid.js';
import { ordinatesAt, ordinatesOfSites } from '../../../src/engineering/spectrum/grid-read.js';
import type { GridNodes } from '../../../src/engineering/spectrum/grid.js';
import {
  SiteTable,
  definitionOfTable,
  plateauOfTable,
  readTable,
} from '../../../src/engineering/spectrum/grid-table.js';

const PERIODS = [0.2, 0.5, 1, 2];

/** Nodes from `first` on, `step` apart, in a shuffled order, with ordinates by `field`; places that `hole` names are left out. */
function nodesOf(
  field: (lon: number, lat: number, period_s: number) => number,
  hole: (i: number, j: number) => boolean = () => false,
  [columns, rows]: readonly [number, number] = [6, 5],
  decimals = 12,
): GridNodes {
  const places = Array.from({ length: columns * rows }, (_, k) => [k % columns, Math.floor(k / columns)] as const)
    .filter(([i, j]) => !hole(i, j))
    // 7 shares no factor with the counts used here: every place once
    .map((_, k, all) => all[(k * 7) % all.length]!);
  const round = (value: number): number => Number(value.toFixed(decimals));
  const lon = places.map(([i]) => round(10 + i * 0.1));
  const lat = places.map(([, j]) => round(45 + j * 0.05));
  return {
    periods_s: PERIODS,
    lon: Float64Array.from(lon),
    lat: Float64Array.from(lat),
    sa_g: Float64Array.from(places.flatMap((_, k) => PERIODS.map((period) => field(lon[k]!, lat[k]!, period)))),
  };
}

/** ln S_a bilinear in place: what the interpolation must reproduce. */
const bilinear = (lon: number, lat: number, period_s: number): number => {
  const [x, y] = [lon - 10, lat - 45];
  return Math.exp(-0.4 - period_s + 0.9 * x - 2.1 * y + 1.7 * x * y * period_s);
};
/** Bends between nodes, never below 0. */
const bumpy = (lon: number, lat: number, period_s: number): number =>
  0.3 + 0.2 * Math.sin(40 * lon + 70 * lat + period_s);
const between = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true });
const LON = between(10, 10.5);
const LAT = between(45, 45.2);

describe('layGrid', () => {
  it('finds the lines whatever the order of the nodes, lines without nodes included', () => {
    const grid = layGrid(nodesOf(bilinear, (i) => i === 2));
    expect([...grid.lon].map((value) => value.toFixed(6))).toEqual(
      [10, 10.1, 10.2, 10.3, 10.4, 10.5].map((value) => value.toFixed(6)),
    );
    expect(grid.lat).toHaveLength(5);
    expect([...grid.nodeAt].filter((node) => node < 0)).toHaveLength(5);
  });

  it('takes coordinates printed rounded', () => {
    // steps of a third of a tenth, to three decimals: gaps of 0.033 and 0.034
    const lon = [0, 1, 2, 3, 4, 5, 6].map((i) => Number((i / 30).toFixed(3)));
    const lat = [50, 50.1];
    const places = lat.flatMap((y) => lon.map((x) => [x, y] as const));
    const nodes = {
      periods_s: PERIODS,
      lon: Float64Array.from(places, ([x]) => x),
      lat: Float64Array.from(places, ([, y]) => y),
      sa_g: new Float64Array(places.length * PERIODS.length).fill(0.4),
    };
    expect([...layGrid(nodes).lon]).toEqual(lon);
  });

  it('says which node is on no regular grid', () => {
    const where = (nodes: GridNodes): unknown => {
      try {
        layGrid(nodes);
      } catch (error) {
        if (error instanceof GridError) return [error.node, error.message];
        throw error;
      }
      return null;
    };
    const moved = nodesOf(bilinear);
    moved.lat[13] = 45.07;
    expect(where(moved)).toEqual([
      13,
      expect.stringContaining('latitude 45.07 lies 0.02° from the line before it, where most lie 0.05° apart'),
    ]);
    const twice = nodesOf(bilinear);
    twice.lon[9] = twice.lon[4]!;
    twice.lat[9] = twice.lat[4]!;
    expect(where(twice)).toEqual([9, expect.stringContaining('a second node at')]);
    const scattered = nodesOf(bilinear);
    fc.sample(between(10, 11), { numRuns: 30, seed: 3 }).forEach((value, i) => (scattered.lon[i] = value));
    expect(where(scattered)).toEqual([
      expect.any(Number),
      expect.stringMatching(/longitude .*lies .* from the line before it/),
    ]);
    const line = nodesOf(bilinear, () => false, [6, 1]);
    expect(where(line)).toEqual([null, 'all nodes have the same latitude; a grid has two and more']);
    expect(where(nodesOf(bilinear, (i, j) => (i + j) % 2 === 0))).toEqual([
      null,
      'no four nodes enclose a cell of 0.1° by 0.05°',
    ]);
  });
});

describe('ordinatesAt', () => {
  it('is exact for fields whose logarithm is bilinear', () => {
    const grid = layGrid(nodesOf(bilinear));
    fc.assert(
      fc.property(LON, LAT, (lon, lat) => {
        ordinatesAt(grid, lon, lat)!.forEach((value, p) => {
          const there = bilinear(lon, lat, PERIODS[p]!);
          expect(Math.abs(value - there)).toBeLessThanOrEqual(1e-12 * there);
        });
      }),
      { numRuns: 500, seed: 31 },
    );
  });

  it('gives the ordinates of a node at the node, to the bit', () => {
    const nodes = nodesOf(bumpy);
    const grid = layGrid(nodes);
    nodes.lon.forEach((lon, node) => {
      expect([...ordinatesAt(grid, lon, nodes.lat[node]!)!]).toEqual([
        ...nodes.sa_g.subarray(node * PERIODS.length, (node + 1) * PERIODS.length),
      ]);
    });
  });

  it('is the mean of the logarithms in the middle of a cell, and stays between its corners', () => {
    const grid = layGrid(nodesOf(bumpy));
    const corners = [10.1, 10.2].flatMap((x) => [45.05, 45.1].map((y) => bumpy(x, y, 1)));
    expect(ordinatesAt(grid, 10.15, 45.075)![2]).toBeCloseTo(
      corners.reduce((product, value) => product * value, 1) ** 0.25,
      10,
    );
    fc.assert(
      fc.property(between(10.1, 10.2), between(45.05, 45.1), (lon, lat) => {
        const value = ordinatesAt(grid, lon, lat)![2]!;
        expect(value).toBeGreaterThanOrEqual(Math.min(...corners) * (1 - 1e-12));
        expect(value).toBeLessThanOrEqual(Math.max(...corners) * (1 + 1e-12));
      }),
      { numRuns: 200, seed: 32 },
    );
  });

  it('is continuous across the lines of the grid', () => {
    const grid = layGrid(nodesOf(bumpy));
    fc.assert(
      fc.property(fc.constantFrom(1, 2, 3, 4), fc.constantFrom(1, 2, 3), LON, LAT, (i, j, lon, lat) => {
        for (const [x, y, dx, dy] of [
          [grid.lon[i]!, lat, 1e-10, 0],
          [lon, grid.lat[j]!, 0, 1e-10],
        ] as const) {
          const below = ordinatesAt(grid, x - dx, y - dy)!;
          const above = ordinatesAt(grid, x + dx, y + dy)!;
          below.forEach((value, p) => {
            expect(Math.abs(value - above[p]!)).toBeLessThanOrEqual(1e-7 * value);
          });
        }
      }),
      { numRuns: 200, seed: 33 },
    );
  });

  it('refuses sites outside, in holes and without coordinates', () => {
    // the node at the third line each way is missing: its four cells are a hole, their far edges are not
    const grid = layGrid(nodesOf(bilinear, (i, j) => i === 2 && j === 2));
    for (const [lon, lat] of [
      [9.999, 45.1],
      [10.501, 45.1],
      [10.2, 44.999],
      [10.2, 45.201],
      [10.15, 45.08],
      [10.25, 45.12],
      [10.2, 45.1],
      [NaN, 45.1],
      [10.2, NaN],
    ] as const)
      expect(ordinatesAt(grid, lon, lat), `${String(lon)} ${String(lat)}`).toBeNull();
    for (const [lon, lat] of [
      [10, 45],
      [10.5, 45.2],
      [10.05, 45.1],
      [10.1, 45.08],
      [10.35, 45.1],
    ] as const)
      expect(ordinatesAt(grid, lon, lat), `${String(lon)} ${String(lat)}`).not.toBeNull();
  });

  it('takes a node without ordinates as missing', () => {
    const nodes = nodesOf(bilinear);
    const node = nodes.lon.findIndex((lon, i) => Math.abs(lon - 10.2) < 1e-9 && Math.abs(nodes.lat[i]! - 45.1) < 1e-9);
    nodes.sa_g.fill(NaN, node * PERIODS.length, (node + 1) * PERIODS.length);
    const grid = layGrid(nodes);
    expect(ordinatesAt(grid, 10.15, 45.08)).toBeNull();
    expect(ordinatesAt(grid, 10.05, 45.08)).not.toBeNull();
  });

  it('meets grids that count longitudes from 0 to 360', () => {
    const nodes = nodesOf(bilinear);
    const turned = { ...nodes, lon: nodes.lon.map((lon) => lon + 280) };
    const grid = layGrid(turned);
    expect(ordinatesAt(grid, 10.23 + 280 - 360, 45.11)![0]).toBeCloseTo(bilinear(10.23, 45.11, 0.2), 10);
    expect(ordinatesAt(grid, 10.23, 45.11)).toBeNull();
  });
});

describe('ordinatesOfSites', () => {
  it('reads 100,000 sites as it reads each', () => {
    const grid = layGrid(nodesOf(bumpy));
    const count = 100_000;
    const lon = Float64Array.from({ length: count }, (_, i) => 9.9 + ((i * 0.618034) % 0.7));
    const lat = Float64Array.from({ length: count }, (_, i) => 45 + ((i * 0.414214) % 0.2));
    const { sa_g, inside } = ordinatesOfSites(grid, lon, lat);
    let outside = 0;
    for (let site = 0; site < count; site += 97) {
      const one = ordinatesAt(grid, lon[site]!, lat[site]!);
      expect(inside[site]).toBe(one === null ? 0 : 1);
      if (one === null) outside += 1;
      expect([...sa_g.subarray(site * 4, site * 4 + 4)]).toEqual(one === null ? [NaN, NaN, NaN, NaN] : [...one]);
    }
    expect(outside).toBeGreaterThan(100);
  });
});

describe('readTable', () => {
  const periods_s = Float64Array.from([0.05, 0.2, 0.5, 1, 2, 5]);
  const rows = fc.array(between(0.02, 2), { minLength: 12, maxLength: 12 });

  it('equals the compiled table to the bit, plateau too', () => {
    fc.assert(
      fc.property(
        rows,
        fc.constantFrom('linear' as const, 'log-log' as const),
        between(0, 8),
        (values, which, period) => {
          const sa_g = Float64Array.from(values);
          const { compiled } = compileSpectrum(definitionOfTable(periods_s, sa_g, 6, which));
          for (const t of [period, 0.05, 0.5, 5])
            expect(readTable(periods_s, sa_g, 6, which, t)).toBe(ordinate(compiled, t));
          const site = new SiteTable(periods_s, sa_g.subarray(6), which);
          // the second time from what the first has worked out
          for (const t of [period, period, 0.05, 0.5, 5, 8, 0.01]) expect(site.read(t)).toBe(ordinate(compiled, t));
          expect(plateauOfTable(periods_s, sa_g, 6)).toEqual([compiled.plateau_from_s, compiled.plateau_to_s]);
        },
      ),
      { numRuns: 1000, seed: 34 },
    );
  });
});

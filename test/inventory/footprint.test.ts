import { describe, expect, it } from 'vitest';
import { readFootprint } from '../../src/inventory/footprint.js';

// One degree of latitude is 110 574 m at the equator, one of longitude 111 320 m (WGS 84; from memory of a printed table).
const box = (lon: number, lat: number, east: number, north: number): string => {
  const [x, y] = [east / 111_320, north / 110_574];
  return `POLYGON ((${lon} ${lat}, ${lon + x} ${lat}, ${lon + x} ${lat + y}, ${lon} ${lat + y}, ${lon} ${lat}))`;
};

describe('readFootprint', () => {
  it('gives sides and area of a rectangle', () => {
    const found = readFootprint(box(10, 0, 40, 15))!;
    expect(found.shape!.length_m).toBeCloseTo(40, 2);
    expect(found.shape!.width_m).toBeCloseTo(15, 2);
    expect(found.area_m2).toBeCloseTo(600, 0);
    expect(found.lon).toBeCloseTo(10 + 20 / 111_320, 9);
  });

  it('gives the same for a rectangle turned round', () => {
    const turned = Array.from({ length: 4 }, (_, i) => {
      const [a, b] = [
        [20, 7.5],
        [-20, 7.5],
        [-20, -7.5],
        [20, -7.5],
      ][i] as [number, number];
      const [c, s] = [Math.cos(0.6), Math.sin(0.6)];
      return `${(a * c - b * s) / 111_320} ${(a * s + b * c) / 110_574}`;
    });
    const found = readFootprint(`POLYGON((${turned.join(',')},${turned[0]}))`)!;
    expect(found.shape!.length_m).toBeCloseTo(40, 2);
    expect(found.shape!.width_m).toBeCloseTo(15, 2);
  });

  it('takes holes out of the area', () => {
    const outer = box(0, 0, 40, 40).slice(9, -1);
    const hole = box(0.0001, 0.0001, 10, 10).slice(9, -1);
    expect(readFootprint(`POLYGON (${outer}, ${hole})`)!.area_m2).toBeCloseTo(1500, 0);
  });

  it('reads a multipolygon of one part as that polygon', () => {
    const courtyard = box(0.0001, 0.0001, 10, 10).slice(9, -1);
    const rings = `${box(0, 0, 40, 15).slice(9, -1)}, ${courtyard}`;
    expect(readFootprint(`MULTIPOLYGON ((${rings}))`)).toEqual(readFootprint(`POLYGON (${rings})`));
    expect(readFootprint(` srid=4326; multipolygon((${rings.replaceAll(', ', ' ,\n')}) ) `)).toEqual(
      readFootprint(`POLYGON (${rings})`),
    );
  });

  it('sums the areas of several parts, less their courtyards, and knows no shape of them', () => {
    const part = (text: string): string => text.slice('POLYGON '.length);
    const one = `(${part(box(0, 0, 40, 40)).slice(1, -1)}, ${part(box(0.0001, 0.0001, 10, 10)).slice(1, -1)})`;
    const found = readFootprint(
      `MULTIPOLYGON (${one}, ${part(box(0.001, 0, 30, 10))}, ${part(box(0.002, 0, 20, 10))})`,
    )!;
    // 1600 - 100, 300 and 200 m²; the centre is that of their areas
    expect(found.area_m2).toBeCloseTo(2000, 0);
    expect(found).toMatchObject({ shape: null, outlines: 3 });
    const east = 0.75 * 20 + 0.15 * (111.32 + 15) + 0.1 * (222.64 + 10);
    expect(found.lon).toBeCloseTo(east / 111_320, 7);
    expect(found.lat).toBeCloseTo((0.75 * 20 + 0.25 * 5) / 110_574, 7);
  });

  it('reads over heights and measures', () => {
    const corners = (more: string): string =>
      `((0 0${more}, 0.0004 0${more}, 0.0004 0.0001${more}, 0 0.0001${more}, 0 0${more}))`;
    const plain = readFootprint(`POLYGON ${corners('')}`);
    expect(plain).toBeDefined();
    for (const text of [
      `POLYGON Z ${corners(' 12.5')}`,
      `POLYGONZ${corners(' 12.5')}`,
      `POLYGON ZM ${corners(' 12.5 3')}`,
      `MULTIPOLYGON Z (${corners(' 12.5')})`,
      `SRID=4326;MULTIPOLYGON M(${corners(' 3')})`,
    ])
      expect(readFootprint(text), text).toEqual(plain);
  });

  it('refuses multipolygons that are none, broken ones whole, in one pass', () => {
    const ring = '(0 0, 0.0004 0, 0.0004 0.0001, 0 0.0001, 0 0)';
    for (const text of [
      'MULTIPOLYGON EMPTY',
      'MULTIPOLYGON ()',
      `MULTIPOLYGON (${ring})`,
      `MULTIPOLYGON ((${ring}), ())`,
      `MULTIPOLYGON ((${ring}), (${ring})`,
      `MULTIPOLYGON ((${ring}),)`,
      `MULTIPOLYGON ((${ring})) and more`,
      `MULTIPOLYGON ((${ring}), ((1 2, 3 4)))`,
      // a part without area, one whose courtyard is all of it, one off the earth
      `MULTIPOLYGON ((${ring}), ((1 1, 1 1, 1 1)))`,
      `MULTIPOLYGON ((${ring}), (${ring}, ${ring}))`,
      `MULTIPOLYGON ((${ring}), ((500000 4100000, 500010 4100000, 500010 4100010)))`,
      `POLYGON ((${ring}))`,
      `POLYGON ((0 0, 1 0, (1 1))`,
      `POLYGON ((0 0 1 2 3, 1 0 1 2 3, 1 1 1 2 3))`,
      `SRID=3857;MULTIPOLYGON ((${ring}))`,
      `MULTIPOLYGON${' '.repeat(100_000)}`,
      `MULTIPOLYGON (${'('.repeat(100_000)}`,
      `MULTIPOLYGON (${'((), '.repeat(20_000)}`,
      `${' '.repeat(100_000)}x`,
    ]) {
      const began = performance.now();
      expect(readFootprint(text), text.slice(0, 100)).toBeUndefined();
      expect(performance.now() - began, text.slice(0, 40)).toBeLessThan(500);
    }
  });

  it('refuses what is no polygon in degrees', () => {
    for (const text of [
      '',
      'POINT (1 2)',
      'POLYGON ((0 0, 1 1))',
      'POLYGON ((0 0, 1 a, 2 2))',
      'POLYGON ((500000 4100000, 500010 4100000, 500010 4100010))',
    ]) {
      expect(readFootprint(text), text).toBeUndefined();
    }
  });
});

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
    expect(found.length_m).toBeCloseTo(40, 2);
    expect(found.width_m).toBeCloseTo(15, 2);
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
    expect(found.length_m).toBeCloseTo(40, 2);
    expect(found.width_m).toBeCloseTo(15, 2);
  });

  it('takes holes out of the area', () => {
    const outer = box(0, 0, 40, 40).slice(9, -1);
    const hole = box(0.0001, 0.0001, 10, 10).slice(9, -1);
    expect(readFootprint(`POLYGON (${outer}, ${hole})`)!.area_m2).toBeCloseTo(1500, 0);
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

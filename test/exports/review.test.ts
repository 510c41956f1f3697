import fc from 'fast-check';
import { parse } from 'csv-parse/sync';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { drawSample, reviewSheet } from '../../src/exports/review.js';
import type { ReviewSheet } from '../../src/exports/review.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import type { Database } from '../../src/store/database.js';
import { loadStudy } from '../../src/study/load.js';
import { scratch, writeSmallStudy } from '../support/cli.js';

const place = scratch();
let db: Database;
let sheet: ReviewSheet;
let rows: Record<string, string>[];

beforeAll(async () => {
  writeSmallStudy(place.folder);
  const loaded = await loadStudy(`${place.folder}/study.yaml`);
  db = await openStudyDatabase(loaded);
  await screen(db, loaded, { made: new Date(0) });
  sheet = await reviewSheet(db, 1, 3);
  rows = parse(sheet.csv, { bom: true, columns: true, record_delimiter: '\r\n' });
});
afterAll(() => {
  db.close();
  place.remove();
});

describe('reviewSheet', () => {
  it('leaves the cells of the checker blank and keeps the own value to the last column', () => {
    expect(Object.keys(rows[0]!).at(-1)).toBe('value of the program');
    for (const row of rows) {
      for (const blank of ['independent value', 'difference', 'checked by', 'date']) expect(row[blank]).toBe('');
      expect(Number.isFinite(Number(row['value of the program']))).toBe(true);
      expect(row['clause']).not.toBe('');
    }
    expect(rows).toHaveLength(sheet.steps);
  });

  it('gives inputs and constants in full, so that the value can be had again from the row alone', () => {
    const heights = rows.filter(
      ({ method, formula }) => (method ?? '').startsWith('asce41-17/period/') && formula === 'T = C_t × (h / unit)^x',
    );
    expect(heights.length).toBeGreaterThan(0);
    for (const row of heights) {
      const [, h, c, x] =
        /height_m = (\S+) m; coefficient = (\S+); exponent = (\S+); unit_m/.exec(row['inputs'] ?? '') ?? [];
      // The printed form T = C h^x in feet, reckoned here with Math.pow.
      expect(Number(row['value of the program'])).toBeCloseTo(Number(c) * (Number(h) / 0.3048) ** Number(x), 12);
    }
  });

  it('says how the sample was drawn and draws the same again', async () => {
    expect(sheet.drawn).toBe(
      '3 of the 4 ranked buildings of run 1, drawn without replacement with seed 7; each had the same chance',
    );
    expect(new Set(rows.map(({ building }) => building))).toEqual(new Set(sheet.buildings));
    expect((await reviewSheet(db, 1, 3)).csv).toBe(sheet.csv);
  });

  it('takes all when more are asked for than there are', async () => {
    expect((await reviewSheet(db, 1, 50)).buildings).toHaveLength(4);
  });
});

describe('drawSample', () => {
  const list = Array.from({ length: 40 }, (_, i) => ({ id: `B${String(i)}` }));

  it('draws without replacement and keeps the order of the list', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 2 ** 32 - 1 }), fc.integer({ min: 1, max: 45 }), (seed, size) => {
        const drawn = drawSample(list, size, seed).map(({ id }) => list.findIndex((entry) => entry.id === id));
        return drawn.length === Math.min(size, 40) && drawn.every((at, i) => i === 0 || at > drawn[i - 1]!);
      }),
    );
  });

  it('gives every building the same chance over many seeds', () => {
    const counts = new Map<string, number>();
    for (let seed = 0; seed < 4000; seed += 1)
      for (const { id } of drawSample(list, 10, seed)) counts.set(id, (counts.get(id) ?? 0) + 1);
    // 4000 draws of 10 of 40: mean 1000, standard deviation √(4000 · 0.25 · 0.75) = 27.4; five of them are 137 (binomial, textbook).
    for (const count of counts.values()) expect(Math.abs(count - 1000)).toBeLessThan(137);
    expect(counts.size).toBe(40);
  });
});

import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ordinatesAt } from '../../src/engineering/spectrum/grid-read.js';
import { UserError, formatError } from '../../src/errors.js';
import { openDatabase } from '../../src/store/database.js';
import { quoteText } from '../../src/store/sql.js';
import { loadHazardGrid } from '../../src/study/hazard-grid-file.js';
import type { HazardGridFile, HazardGridOptions } from '../../src/study/hazard-grid-file.js';

let folder = '';
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'swaymark-'));
});
afterAll(async () => {
  await rm(folder, { recursive: true });
});

async function load(text: string, options?: HazardGridOptions): Promise<HazardGridFile> {
  await writeFile(join(folder, 'grid.csv'), text);
  return loadHazardGrid(join(folder, 'grid.csv'), options);
}

async function complaints(text: string, options?: HazardGridOptions): Promise<string[]> {
  try {
    await load(text, options);
  } catch (error) {
    if (error instanceof UserError) return formatError(error).replaceAll(`${folder}/`, '').split('\n');
    throw error;
  }
  return [];
}

/** Invented: 3 by 3 nodes. */
const ROWS = [30, 30.5, 31].flatMap((lat, j) =>
  [-5, -4.5, -4].map((lon, i) => [lon, lat, 0.8 + 0.1 * i, 0.2 + 0.1 * j]),
);
const CSV = `lon,lat,sa_0.2_g,sa_1.0_g\n${ROWS.map((row) => row.join()).join('\n')}\n`;

describe('loadHazardGrid', () => {
  it('reads coordinates and ordinates by the headings', async () => {
    const { grid, unit, nodes, blank, statements } = await load(CSV);
    expect([unit, nodes, blank]).toEqual(['g', 9, 0]);
    expect([...grid.periods_s]).toEqual([0.2, 1]);
    expect(statements).toEqual(['grid of 3 by 3 lines', '2 periods 0.2 to 1 s', 'unit g as the heading says']);
    expect([...ordinatesAt(grid, -4.5, 31)!]).toEqual([0.9, 0.4]);
    expect(ordinatesAt(grid, -4.75, 30)![0]).toBeCloseTo(Math.sqrt(0.8 * 0.9), 12);
    expect(ordinatesAt(grid, -3.9, 30)).toBeNull();
  });

  it('reads other headings, orders, delimiters, decimals and units alike', async () => {
    const { fingerprint } = await load(CSV);
    const comma = (value: number): string => String(value).replace('.', ',');
    const rows = ROWS.map(([lon = 0, lat = 0, a = 0, b = 0], i) =>
      [i, lat, 100 * b, lon, 100 * a].map((value) => comma(Number(value.toPrecision(12)))).join(';'),
    );
    const other = await load(`# made today\nno;Latitude;SA(1,0) (%g);Longitude;SA(0,2) (%g)\n${rows.join('\r\n')}`);
    expect(other.statements.at(-1)).toBe('columns left out: no');
    expect(ordinatesAt(other.grid, -4, 30.5)![1]).toBeCloseTo(0.3, 12);
    expect((await load(`# the same\n${CSV.replaceAll(',', '\t')}`)).fingerprint).toBe(fingerprint);
    expect((await load(CSV.replace('0.9', '0.91'))).fingerprint).not.toBe(fingerprint);
    const plain = await load(CSV.replace('sa_0.2_g,sa_1.0_g', 'PGA,1'), { unit: 'g' });
    expect([...plain.grid.periods_s]).toEqual([0, 1]);
  });

  it('takes a row without ordinates as a hole', async () => {
    const { grid, nodes, blank, statements } = await load(CSV.replace('-5,30,0.8,0.2', '-5,30,,NaN'));
    expect([nodes, blank]).toEqual([8, 1]);
    expect(statements).toContain('1 rows without ordinates');
    expect(ordinatesAt(grid, -4.9, 30.1)).toBeNull();
    expect(ordinatesAt(grid, -4.4, 30.1)).not.toBeNull();
  });

  it('reads Parquet through a database, with the same result', async () => {
    const database = await openDatabase({ path: ':memory:', folders: [folder] });
    try {
      await writeFile(join(folder, 'grid.csv'), CSV);
      const path = join(folder, 'grid.parquet');
      const copy = (select: string): Promise<number> =>
        database.run(`COPY (${select}) TO ${quoteText(path)} (FORMAT parquet)`);
      const source = `read_csv(${quoteText(join(folder, 'grid.csv'))})`;
      await copy(`SELECT * FROM ${source}`);
      const read = await loadHazardGrid(path, { database });
      expect(read.fingerprint).toBe((await load(CSV)).fingerprint);
      await copy(`SELECT * REPLACE (-1 AS "sa_1.0_g") FROM ${source} LIMIT 4`);
      await expect(loadHazardGrid(path, { database })).rejects.toMatchObject({
        place: { file: path, row: 1 },
        message: expect.stringContaining('expected an ordinate > 0, got -1') as string,
      });
      await copy(`SELECT * REPLACE ('a' AS lon) FROM ${source}`);
      await expect(loadHazardGrid(path, { database })).rejects.toThrow('expected numbers, got VARCHAR');
      await expect(loadHazardGrid(join(folder, 'none.parquet'), { database })).rejects.toThrow('no such file');
    } finally {
      database.close();
    }
    await expect(loadHazardGrid('grid.parquet')).rejects.toThrow('needs a database');
  });

  it('names line and value of what is wrong', async () => {
    expect(await complaints(CSV.replace('-4.5,30,0.9,0.2', '-4.5,30,x,0.2').replace('-4,30,1,0.2', '-4,30,1'))).toEqual(
      ['grid.csv:3: "x": a number is expected', 'grid.csv:4: expected 4 cells, got 3'],
    );
    expect(await complaints(CSV.replace('-4.5,30,0.9,0.2', '-4.5,130,0,90').replace('-5,30,0.8', '-5,30,'))).toEqual([
      'grid.csv:2: 1 of 2 ordinates are blank; give all, or none for a hole',
      'grid.csv:3: expected a latitude of -90 to 90 degrees, got 130',
      'grid.csv:3: "sa_0.2_g": expected an ordinate > 0, got 0',
      'grid.csv:3: "sa_1.0_g": expected an ordinate of at most 10 g, got 90 g; is the unit another?',
    ]);
    expect(await complaints(CSV.replace('-4.5,30.5', '-4.5,30.6'))).toEqual([
      expect.stringMatching(
        /^grid\.csv:\d+: latitude 30\.[56] lies .* from the line before it.*evenly spaced lines of longitude and latitude$/,
      ),
    ]);
    expect(await complaints(CSV.replace('-4.5,30.5', '-4.5,30'))).toEqual([
      expect.stringMatching(/^grid\.csv:6: a second node at longitude -4\.5, latitude 30; /),
    ]);
    expect((await complaints(CSV.replace('lat', 'north')))[0]).toContain(
      'grid.csv:1: no column lat among "lon", "north"',
    );
    expect((await complaints(CSV.replace('sa_1.0_g', 'mean')))[0]).toContain('at least two columns of ordinates');
    expect((await complaints(CSV.replace('sa_1.0_g', 'SA 0.2 s, g')))[0]).toContain('expected 5 cells');
    expect(await complaints(CSV.replace('sa_0.2_g', 'pga_g'), { interpolation: 'log-log' })).toEqual([
      'grid.csv column pga_g: log-log needs periods > 0, got 0; use linear or remove the column',
    ]);
    expect((await complaints(CSV.replaceAll('_g', '')))[0]).toContain('the unit of the ordinates is not known');
    expect((await complaints('lon,lat,sa_0.2_g,sa_1_g\n'))[0]).toContain('no rows below the headings');
    await expect(loadHazardGrid(join(folder, 'none.csv'))).rejects.toThrow(
      'no such file; give the path of the hazard grid',
    );
  });
});

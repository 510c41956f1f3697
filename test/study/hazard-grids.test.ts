import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ordinatesAt } from '../../src/engineering/spectrum/grid-read.js';
import { formatError } from '../../src/errors.js';
import { openDatabase } from '../../src/store/database.js';
import { quoteText } from '../../src/store/sql.js';
import { studyFingerprint } from '../../src/study/fingerprint.js';
import { loadStudy, studyFromText } from '../../src/study/load.js';
import type { LoadedStudy } from '../../src/study/load.js';
import { SAMPLE } from './sample.js';

let folder = '';
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'swaymark-'));
});
afterAll(async () => {
  await rm(folder, { recursive: true });
});

const ENTRY = '{code: hazard-grid, file: map.csv, unit: g, interpolation: log-log, return_period_years: 475}';
const STUDY = SAMPLE.replace(/drawn: .*/, `drawn: ${ENTRY}`);
/** Invented. */
const MAP = 'lon,lat,SA(0.2),SA(1)\n13,43,0.8,0.2\n13.5,43,0.9,0.3\n13,43.5,0.7,0.2\n13.5,43.5,0.6,0.1\n';

async function load(map: string, study = STUDY): Promise<LoadedStudy> {
  await writeFile(join(folder, 'map.csv'), map);
  await writeFile(join(folder, 'study.yaml'), study);
  return loadStudy(join(folder, 'study.yaml'));
}
const told = (work: () => unknown): string => {
  try {
    work();
  } catch (error) {
    return formatError(error);
  }
  return '';
};

describe('withHazardGrids', () => {
  it('reads the grid, and says beside what the study states what it holds', async () => {
    const { study, grids } = await load(MAP);
    const { drawn } = study.hazard.spectra;
    const [[fingerprint, grid] = []] = [...grids];
    expect(drawn).toEqual({
      code: 'hazard-grid',
      file: 'map.csv',
      unit: 'g',
      interpolation: 'log-log',
      return_period_years: 475,
      grid: fingerprint,
      read: 'grid of 2 by 2 lines, 2 periods 0.2 to 1 s, unit g as the study says',
    });
    // the middle: the geometric mean of the four nodes [own arithmetic]
    expect(ordinatesAt(grid!, 13.25, 43.25)![0]).toBeCloseTo((0.8 * 0.9 * 0.7 * 0.6) ** 0.25, 12);
  });

  it('lets the fingerprint of the study follow what the file says', async () => {
    const first = studyFingerprint((await load(MAP)).study);
    expect(studyFingerprint((await load(`# the same\n${MAP}`)).study)).toBe(first);
    expect(studyFingerprint((await load(MAP.replace('0.9', '0.91'))).study)).not.toBe(first);
  });

  it('reads Parquet to the same grid', async () => {
    const csv = [...(await load(MAP)).grids.keys()];
    const db = await openDatabase({ path: ':memory:', folders: [folder] });
    const [from, to] = ['map.csv', 'map.parquet'].map((name) => quoteText(join(folder, name)));
    await db.run(`COPY (SELECT * FROM read_csv(${String(from)})) TO ${String(to)} (FORMAT parquet)`);
    db.close();
    expect([...(await load(MAP, STUDY.replace('map.csv', 'map.parquet'))).grids.keys()]).toEqual(csv);
    await expect(load(MAP, STUDY.replace('map.csv', 'none.parquet'))).rejects.toThrow('no such file');
  });

  it('names file and line of what is wrong, and the key of what is missing', async () => {
    await expect(load(MAP.replace('0.9', 'x'))).rejects.toMatchObject({
      place: { file: join(folder, 'map.csv'), line: 3 },
    });
    await expect(load(MAP, STUDY.replace('map.csv', 'none.csv'))).rejects.toThrow('no such file');
    expect(told(() => studyFromText(STUDY.replace(', interpolation: log-log', '')))).toMatch(
      /^study\.yaml:\d+:\d+ hazard\.spectra\.drawn\.interpolation: missing; expected one of linear, log-log$/,
    );
    expect(told(() => studyFromText(STUDY.replace('unit: g', 'unit: mg')))).toContain(
      'unknown word "mg"; known: g, m/s2',
    );
    expect(told(() => studyFromText(STUDY.replace('file: map.csv', 'fil: map.csv')))).toContain('did you mean "file"');
  });

  it('asks for the coordinates where a level reads grids alone', () => {
    const level = (columns: string): string =>
      STUDY.replace(
        /\n {2}levels:\n[^]*?\n(?=\S|\n| {2}\S)/,
        '\n  levels:\n    - {title: one, spectrum: drawn}\n',
      ).replace('  columns:\n', `  columns:\n${columns}`);
    expect(told(() => studyFromText(level('')))).toMatch(
      /^study\.yaml:\d+:\d+ hazard\.levels\.1\.spectrum: inventory\.columns names no lon and lat, so no building would have a place on the grid/m,
    );
    expect(told(() => studyFromText(level('    lon: X\n    lat: Y\n')))).not.toContain('hazard.levels');
  });
});

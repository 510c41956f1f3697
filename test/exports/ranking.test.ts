import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { parse } from 'csv-parse/sync';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { writeRankingCsv, writeRankingParquet } from '../../src/exports/ranking.js';
import { writeRejectsCsv } from '../../src/exports/rejects.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import type { Database } from '../../src/store/database.js';
import { loadStudy } from '../../src/study/load.js';
import { HOSTILE, scratch, writeSmallStudy } from '../support/cli.js';
import { MADE } from '../support/study-folder.js';

const place = scratch();
const at = (name: string): string => join(place.folder, name);
const read = (name: string): Record<string, string>[] =>
  parse(readFileSync(at(name), 'utf8'), { bom: true, columns: true, record_delimiter: '\r\n' });
let db: Database;
let inventoryId = '';

beforeAll(async () => {
  writeSmallStudy(place.folder, [
    'A5,"-cmd|calc",99,8,=2+3,what,residential,-40',
    ',nobody,2,6,1950,,office,90',
    'A6,+1 555 0100,2,6.1,1950,timber-light-frame,office,-5e-1',
  ]);
  const loaded = await loadStudy(at('study.yaml'));
  db = await openStudyDatabase(loaded);
  inventoryId = (await screen(db, loaded, { made: MADE })).taken.inventoryId;
  await writeRankingParquet(db, 1, at('ranking.parquet'));
  await writeRankingCsv(db, at('ranking.parquet'), at('si.csv'));
  await writeRankingCsv(db, at('ranking.parquet'), at('us.csv'), 'us');
  await writeRankingCsv(db, at('ranking.parquet'), at('parts.csv'), 'si', 1);
  await writeRejectsCsv(db, inventoryId, at('rejects.csv'));
});
afterAll(() => {
  db.close();
  place.remove();
});

describe('writeRankingCsv', () => {
  it('writes UTF-8 with byte order mark and CRLF, every building in rank order', () => {
    const bytes = readFileSync(at('si.csv'));
    expect([...bytes.subarray(0, 3)]).toEqual([0xef, 0xbb, 0xbf]);
    expect(bytes.toString('utf8').replaceAll('\r\n', '')).not.toMatch(/[\r\n]/);
    // Five can be ranked; the house of which nothing but its name is legible comes last.
    expect(read('si.csv').map((row) => row['rank'])).toEqual(['1', '2', '3', '4', '5', '']);
  });

  it('writes the same bytes in two parts', () => {
    expect(readFileSync(at('parts.csv')).equals(readFileSync(at('si.csv')))).toBe(true);
  });

  it('makes cells that begin like a formula harmless and leaves the rest alone', () => {
    const names: Record<string, string | undefined> = Object.fromEntries(
      read('si.csv').map((row) => [row['id'] ?? '', row['name']]),
    );
    expect(names['A1']).toBe(`'${HOSTILE.formula}`);
    expect(names['A2']).toBe(HOSTILE.markup);
    expect(names['A4']).toBe('Söderhus, "old"');
    expect(names['A5']).toBe("'-cmd|calc");
    expect(names['A6']).toBe("'+1 555 0100");
  });

  it('holds the stored results to seven digits, and heights in feet for US units', async () => {
    const [stored] = await db.rows<{ sa: number; id: string }>(
      'SELECT r.sa_g AS sa, b.id FROM result r JOIN building b USING (building_index) WHERE r."rank" = 1',
    );
    const first = read('si.csv')[0]!;
    expect(first['id']).toBe(stored!.id);
    expect(Math.abs(Number(first['sa_g']) / stored!.sa - 1)).toBeLessThan(1e-6);
    const si = read('si.csv').find(({ id }) => id === 'A2')!;
    const us = read('us.csv').find(({ id }) => id === 'A2')!;
    expect(si['height_m']).toBe('16.0');
    // 16 / 0.3048 = 52.4934 (own arithmetic; the foot is 0.3048 m exactly, ISO 80000).
    expect(Number(us['height_ft'])).toBeCloseTo(52.4934, 4);
    expect(us['height_ft_origin']).toBe('given');
    expect(Object.keys(us)).not.toContain('height_m');
  });
});

describe('writeRankingParquet', () => {
  it('holds the stored doubles to the last bit', async () => {
    const differing = await db.value(
      `SELECT count(*) FROM read_parquet('${at('ranking.parquet')}') p JOIN building b USING (id) JOIN result r USING (building_index)
       WHERE p.ln_priority IS DISTINCT FROM r.ln_priority OR p.sa_g IS DISTINCT FROM r.sa_g OR p.name IS DISTINCT FROM b.name`,
    );
    expect(differing).toBe(0);
    expect(await db.value(`SELECT count(*) FROM read_parquet('${at('ranking.parquet')}')`)).toBe(6);
  });

  it('holds one run of several, and each building once', async () => {
    const loaded = await loadStudy(at('study.yaml'));
    const { runId } = await screen(db, loaded, { made: new Date(1) });
    expect(runId).toBe(2);
    for (const run of [1, 2]) {
      await writeRankingParquet(db, run, at('again.parquet'));
      await writeRankingCsv(db, at('again.parquet'), at('again.csv'));
      expect(readFileSync(at('again.csv')).equals(readFileSync(at('si.csv')))).toBe(true);
    }
    await expect(writeRankingParquet(db, 3, at('none.parquet'))).rejects.toThrow('there is no run 3');
  });
});

describe('writeRejectsCsv', () => {
  it('lists every rejected row and cell as the person sees it, guarded', () => {
    const rows = read('rejects.csv');
    expect(Object.keys(rows[0]!)).toEqual([
      'row',
      'line',
      'id',
      'column',
      'value',
      'code',
      'message',
      'action',
      'kind',
    ]);
    expect(rows.find(({ column }) => column === 'year_built')).toMatchObject({
      row: '6',
      id: 'A5',
      value: "'=2+3",
      kind: 'rejected-cell',
    });
    expect(rows.find(({ column, row }) => column === 'floor_area_m2' && row === '6')).toMatchObject({ value: '-40' });
    expect(rows.find(({ kind }) => kind === 'rejected-row')).toMatchObject({ row: '7' });
  });
});

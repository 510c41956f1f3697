/** Neighbours of a whole run, from outlines and the table of neighbours to the reports, on a row of invented houses. */
import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { parse } from 'csv-parse/sync';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { compileContext } from '../../src/engineering/assess/context.js';
import type { GapPair } from '../../src/engineering/page-contract.js';
import { gapsCsv } from '../../src/exports/gaps.js';
import { refreshStudy } from '../../src/exports/refresh-study.js';
import { screenStudy } from '../../src/exports/screen-study.js';
import type { ScreenedStudy } from '../../src/exports/screen-study.js';
import { gapsSentences } from '../../src/reports/gaps/words.js';
import { explain, withStudyDatabase } from '../../src/runs/open.js';
import { gapsOf } from '../../src/screening/gaps.js';
import type { GapLimits } from '../../src/screening/gaps.js';
import { readRun } from '../../src/screening/page-data.js';
import { SMALL_STUDY, buildCommand, scratch } from '../support/cli.js';
import { MADE } from '../support/study-folder.js';
import { pageData } from '../support/page-data.js';

const place = scratch();
const study = join(place.folder, 'study.yaml');
const out = (name: string): string => join(place.folder, 'out', name);
// WGS 84 at 35° (from memory of a printed table): a degree is 91,288 m to the east and 110,941 m to the north.
const box = (y: number, dy: number): string => {
  const at = (u: number, v: number): string => `${String(-40 + u / 91_288)} ${String(35 + v / 110_941)}`;
  return `"POLYGON ((${[at(0, y), at(9, y), at(9, y + dy), at(0, y + dy), at(0, y)].join(', ')}))"`;
};
// H0 to H7 in a row to the north, gaps of 0.05 m, across 35.001°, where strips of 0.003° meet; then one street further, and one without a size
const HOUSES = Array.from({ length: 8 }, (_, i) => {
  const system = ['unreinforced-masonry-wall', 'concrete-moment-frame', 'timber-light-frame'][i % 3]!;
  return `H${String(i)},"=Row ${String(i)}",${String(2 + (i % 4))},${String(6.5 + 3.2 * (i % 4))},19${String(30 + 9 * i)},${system},residential,${String(300 + 90 * i)},${box(50.6 + 10.05 * i, 10)}`;
});
const TABLE = [
  'id,name,storeys,height,built,system,use,area,outline',
  ...HOUSES,
  `FAR,Far house,3,9.6,1950,unreinforced-masonry-wall,residential,400,${box(220, 12)}`,
  `NONE,Shed,,,1960,,,,${box(232.5, 4)}`,
].join('\n');
// the second gap as surveyed, the third with its floors alone, one to a house across the street
// the first is wide enough by less than the fifth, short by the height rule alone, is beyond what both sway
const PAIRS =
  'id_a,id_b,gap_m,floors_aligned\nH0,H1,0.2,\nH2,H1,0.4,yes\nH2,H3,,no\nH4,H3,0.07,yes\nH3,H4,0.09,no\nFAR,H0,0.02,\n';
const text = SMALL_STUDY.replace('floor_area_m2: area}', 'floor_area_m2: area, footprint: outline}').replace(
  'hazard:',
  'neighbours: {file: pairs.csv}\nhazard:',
);

let screened: ScreenedStudy;
let pairs: readonly GapPair[] = [];
beforeAll(async () => {
  buildCommand();
  writeFileSync(join(place.folder, 'houses.csv'), `${TABLE}\n`);
  writeFileSync(join(place.folder, 'pairs.csv'), PAIRS);
  writeFileSync(study, text);
  screened = await screenStudy(study, { made: MADE, outlook: false });
  pairs = screened.data.gaps?.pairs ?? [];
}, 120_000);
afterAll(() => {
  place.remove();
});

const again = (limits: GapLimits, listSize = screened.data.summary.list_size) =>
  withStudyDatabase(study, async (db) => {
    const run = await readRun(db, 1);
    return gapsOf(db, run, listSize, () => compileContext(run.settings), limits);
  });

describe('the gaps of a run', () => {
  it('are those of the table, and of outlines where the table does not give them', () => {
    const told = new Map(pairs.map((pair) => [`${pair.id_a} ${pair.id_b}`, pair]));
    expect([...told.keys()].sort()).toEqual([
      'FAR H0',
      ...Array.from({ length: 7 }, (_, i) => `H${String(i)} H${String(i + 1)}`),
    ]);
    expect(told.get('H1 H2')).toMatchObject({ gap_m: 0.4, gap_from: 'given', floors_aligned: 'yes' });
    expect(told.get('FAR H0')).toMatchObject({ gap_m: 0.02, gap_from: 'given', floors_aligned: null });
    expect(told.get('H2 H3')).toMatchObject({ gap_from: 'measured', floors_aligned: 'no' });
    // of two rows that disagree the smaller gap, and floors not at one level
    expect(told.get('H3 H4')).toMatchObject({ gap_m: 0.07, gap_from: 'given', floors_aligned: 'no' });
    expect(told.get('H4 H5')!.gap_m).toBeCloseTo(0.05, 3);
    // FAR stands within reach of the shed, of which nothing tells how it sways
    expect(screened.data.gaps).toMatchObject({ of: 'all', first: null, complete: true, alike: 0, unknown: 1 });
  });

  it('are what the explanation of each building works out', async () => {
    for (const id of ['H1', 'H2', 'FAR']) {
      const { steps } = await explain(study, id);
      const own = pairs.filter(({ id_a, id_b }) => id_a === id || id_b === id);
      for (const { id_a, id_b, needed_m, by_height_m } of own) {
        const other = id_a === id ? id_b : id_a;
        const from = steps.findIndex(({ kind, title }) => kind === 'heading' && title.startsWith(`Gap to ${other} `));
        const shown = steps.slice(from, from + 12).filter(({ kind }) => kind === 'formula');
        expect(shown[0]!.result).toContain(` ${needed_m.toPrecision(4)} m`);
        expect(shown[3]!.result).toContain(` ${by_height_m.toPrecision(4)} m`);
      }
      expect(steps.filter(({ kind, title }) => kind === 'heading' && title.startsWith('Gap to '))).toHaveLength(
        own.length,
      );
    }
  });

  it('are told worst first, the short ones before the others', () => {
    const { short } = screened.data.gaps!;
    expect(short).toBeGreaterThan(3);
    expect(short).toBeLessThan(pairs.length);
    pairs.forEach(({ gap_m, needed_m, by_height_m }, i) => {
      expect(gap_m < needed_m || gap_m < by_height_m).toBe(i < short);
    });
    const lacking = pairs.slice(0, short).map(({ gap_m, needed_m }) => needed_m - gap_m);
    expect(lacking).toEqual([...lacking].sort((a, b) => b - a));
    expect(pairs[short]!.needed_m - pairs[short]!.gap_m).toBeGreaterThan(lacking.at(-1)!);
  });

  it('are worked for the list alone where there are too many, and are the same then', async () => {
    const listed = new Set(screened.data.buildings.inputs.id.slice(0, screened.data.summary.list_size));
    const some = await again({ allUpTo: 5 });
    expect(some).toMatchObject({ of: 'list', first: null, complete: true });
    expect(some!.pairs).toEqual(pairs.filter(({ id_a, id_b }) => listed.has(id_a) || listed.has(id_b)));
    expect(some!.pairs.length).toBeLessThan(pairs.length);
    expect(gapsSentences(some!, 'si').join(' ')).toContain('only gaps of buildings of the list were worked out');
    const first = await again({ allUpTo: 5, listedAtMost: 1 });
    expect(first).toMatchObject({ of: 'list', first: 1 });
    expect(first!.pairs.length).toBeLessThan(some!.pairs.length);
    expect((await again({}))!.pairs).toEqual(pairs);
    // wherever the list ends; its first house, H6, has a neighbour in the next strip
    const order = screened.data.buildings.inputs.id;
    for (let length = 1; length < screened.data.summary.ranked; length += 1) {
      const among = new Set(order.slice(0, length));
      const { pairs: told } = (await again({ allUpTo: 5 }, length))!;
      expect(told).toEqual(pairs.filter(({ id_a, id_b }) => among.has(id_a) || among.has(id_b)));
    }
  });

  it('say when measuring was broken off', async () => {
    const cut = await again({ steps: 60 });
    expect(cut!.complete).toBe(false);
    expect(gapsSentences(cut!, 'si').join(' ')).toContain('pairs are missing');
  });

  it('leave the ranking as it is, stand in the reports, and come again from a refresh without the tables', async () => {
    expect(readFileSync(out('summary.md'), 'utf8')).toContain('## Gaps to neighbours');
    expect(readFileSync(out('dashboard.html'), 'utf8')).toContain('id="gaps-table"');
    const before = readFileSync(out('gaps.csv'), 'utf8');
    const ranking = readFileSync(out('ranking.csv'), 'utf8');
    const rows: Record<string, string>[] = parse(before, { bom: true, columns: true, record_delimiter: '\r\n' });
    expect(rows).toHaveLength(screened.data.gaps!.short);
    expect(rows[0]).toMatchObject({ id_a: pairs[0]!.id_a, id_b: pairs[0]!.id_b, gap_from: pairs[0]!.gap_from });
    expect(rows.every((row) => Object.values(row).every((cell) => !/^[=+@-]/.test(cell)))).toBe(true);
    expect(rows.some(({ name_a }) => name_a?.startsWith("'=Row"))).toBe(true);
    for (const name of ['houses.csv', 'pairs.csv']) rmSync(join(place.folder, name));
    await refreshStudy(study, { made: MADE });
    expect(readFileSync(out('gaps.csv'), 'utf8')).toBe(before);
    // the same buildings without outlines and pairs: the same ranks, and no gap
    writeFileSync(join(place.folder, 'houses.csv'), `${TABLE.replaceAll(/"POLYGON[^"]*"/g, '')}\n`);
    writeFileSync(study, text.replace('neighbours: {file: pairs.csv}\n', ''));
    const { data } = await screenStudy(study, { made: MADE, outlook: false });
    expect(data.gaps).toBeNull();
    expect(existsSync(out('gaps.csv'))).toBe(false);
    expect(readFileSync(out('summary.md'), 'utf8')).not.toContain('Gaps to neighbours');
    const order = (csv: string): string[] =>
      parse<Record<string, string>>(csv, { bom: true, columns: true }).map(({ id, rank }) => `${rank!} ${id!}`);
    expect(order(readFileSync(out('ranking.csv'), 'utf8'))).toEqual(order(ranking));
  });
});

describe('gapsCsv', () => {
  it('writes lengths in the units of display', () => {
    const [si, us] = (['si', 'us'] as const).map((display) => {
      const csv = gapsCsv(pageData({ display }))!;
      return parse<Record<string, string>>(csv, { bom: true, columns: true });
    });
    // a foot is 0.3048 m (ISO 80000)
    expect(Number(us![0]!['needed_ft']) * 0.3048).toBeCloseTo(Number(si![0]!['needed_m']), 5);
    expect(Object.keys(us![0]!)).not.toContain('needed_m');
  });
});

/** Main buildings and wings from the table to the reports, on a few invented rows. */
import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { parse } from 'csv-parse/sync';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { UserError } from '../../src/errors.js';
import { refreshStudy } from '../../src/exports/refresh-study.js';
import { removeOwn } from '../../src/exports/remove-own.js';
import { screenStudy } from '../../src/exports/screen-study.js';
import type { ScreenedStudy } from '../../src/exports/screen-study.js';
import { SITES_BEGIN } from '../../src/exports/sites.js';
import { explain } from '../../src/runs/open.js';
import { SMALL_STUDY, buildCommand, scratch } from '../support/cli.js';
import { MADE } from '../support/study-folder.js';

const place = scratch();
const study = join(place.folder, 'study.yaml');
const out = (name: string): string => join(place.folder, 'out', name);
const HEAD = 'id,name,part,state,storeys,height,built,system,use,area';
const ROWS = [
  'M1,Old Hall,,,3,9.5,1930,unreinforced-masonry-wall,school,1600',
  'M2,=2+2,,,5,16,1965,concrete-moment-frame,office,2500',
  'S,Alone,,,8,27,1972,concrete-shear-wall,hospital,9000',
  'W1,North wing,M1,,2,6.4,1948,unreinforced-masonry-wall,school,500',
  // part of a part, and of a building that names itself
  'W2,Stair tower,W1,,4,13,1958,concrete-moment-frame,school,240',
  'W3,West wing,M2,assessed,3,9,1990,timber-light-frame,office,700',
  'X,Lost wing,M9,,2,6,1960,timber-light-frame,residential,200',
];
const withPart = SMALL_STUDY.replace('name: name,', 'name: name, part_of: part, status: state,');
const read = (name: string): Record<string, string>[] =>
  parse(readFileSync(out(name), 'utf8'), { bom: true, columns: true, record_delimiter: '\r\n' });

let screened: ScreenedStudy;
beforeAll(async () => {
  buildCommand();
  writeFileSync(join(place.folder, 'houses.csv'), `${[HEAD, ...ROWS].join('\n')}\n`);
  writeFileSync(study, withPart);
  screened = await screenStudy(study, { made: MADE, outlook: false });
}, 120_000);
afterAll(() => {
  place.remove();
});

describe('the sites of a run', () => {
  it('are main buildings with all that leads to them, the likeliest to hold a place first', () => {
    const ranking = new Map(read('ranking.csv').map((row) => [row['id'], row]));
    const of = (id: string, column: string): number => Number(ranking.get(id)?.[column] || NaN);
    const { all, buildings, sites } = screened.data.sites;
    expect([all, buildings]).toEqual([2, 5]);
    expect(sites.map(({ id }) => id)).toEqual(['M1', 'M2']);
    const [first, second] = sites;
    const chances = ['M1', 'W1', 'W2'].map((id) => of(id, 'chance'));
    // independent of the code under test: the file of the ranking, and the product itself
    expect(first!.chance).toBeCloseTo(1 - chances.reduce((product, p) => product * (1 - p), 1), 6);
    expect(first!.expected_in_list).toBeCloseTo(
      chances.reduce((sum, p) => sum + p),
      6,
    );
    expect(first!.best_rank).toBe(Math.min(...['M1', 'W1', 'W2'].map((id) => of(id, 'rank'))));
    expect(first!.people_exposed).toBeCloseTo(
      ['M1', 'W1', 'W2'].reduce((sum, id) => sum + of(id, 'people_exposed'), 0),
      3,
    );
    expect(first!.members.map(({ id }) => id).sort()).toEqual(['M1', 'W1', 'W2']);
    expect(second).toMatchObject({ buildings: 2, ranked: 1 });
    expect(second!.chance).toBeCloseTo(of('M2', 'chance'), 6);
    expect(second!.members.at(-1)).toMatchObject({
      id: 'W3',
      rank: null,
      chance: null,
      not_ranked: 'already assessed',
    });
  });

  it('are known to every building of them, and to no other', () => {
    const { data } = screened;
    const siteOf = Object.fromEntries(data.buildings.inputs.id.map((id, i) => [id, data.buildings.site[i]]));
    expect(siteOf).toEqual({ M1: 0, W1: 0, W2: 0, M2: 1, W3: 1, S: null, X: null });
  });

  it('stand in sites.csv, a row a building, safe to open', () => {
    const rows = read('sites.csv');
    expect(rows.map(({ site, id, main_building }) => `${site} ${id} ${main_building}`).sort()).toEqual([
      'M1 M1 yes',
      'M1 W1 no',
      'M1 W2 no',
      'M2 M2 yes',
      'M2 W3 no',
    ]);
    expect(rows.find(({ id }) => id === 'M2')).toMatchObject({ name: "'=2+2", site_buildings: '2', site_ranked: '1' });
    expect(rows.find(({ id }) => id === 'W3')).toMatchObject({ rank: '', chance: '', not_ranked: 'already assessed' });
    expect(Number(rows[0]!['site_chance'])).toBeCloseTo(screened.data.sites.sites[0]!.chance!, 6);
  });

  it('stand in summary, dashboard and explanation', async () => {
    const summary = readFileSync(out('summary.md'), 'utf8');
    expect(summary).toContain('## Sites');
    expect(summary).toContain('2 sites have two buildings or more, 5 in all');
    expect(summary).toMatch(/\| M1 Old Hall \| 3 \|/);
    expect(readFileSync(out('dashboard.html'), 'utf8')).toContain('id="sites-table"');
    const { site } = await explain(study, 'W2');
    expect(site).toEqual(screened.data.sites.sites[0]);
    expect((await explain(study, 'S')).site).toBeNull();
  });

  it('are told again by a refresh without the table, and are gone with their file once no row names a main building', async () => {
    rmSync(join(place.folder, 'houses.csv'));
    const before = readFileSync(out('sites.csv'), 'utf8');
    rmSync(out('sites.csv'));
    await refreshStudy(study, { made: MADE });
    expect(readFileSync(out('sites.csv'), 'utf8')).toBe(before);
    writeFileSync(
      join(place.folder, 'houses.csv'),
      `${[HEAD, ...ROWS].join('\n').replaceAll(/,(?:M1|M2|M9|W1),/g, ',,')}\n`,
    );
    const { data, files } = await screenStudy(study, { made: MADE, outlook: false });
    expect(data.sites).toEqual({ all: 0, buildings: 0, sites: [] });
    expect(files.map((file) => file.endsWith('sites.csv'))).not.toContain(true);
    expect(existsSync(out('sites.csv'))).toBe(false);
    expect(readFileSync(out('summary.md'), 'utf8')).not.toContain('## Sites');
  });
});

describe('removeOwn', () => {
  it('takes away what begins as ours does, and nothing else', () => {
    const [ours, theirs] = [join(place.folder, 'ours.csv'), join(place.folder, 'theirs.csv')];
    writeFileSync(ours, `${SITES_BEGIN}site_ranked\r\n`);
    writeFileSync(theirs, 'site,buildings\n');
    for (const file of [ours, theirs, join(place.folder, 'nowhere.csv'), place.folder]) removeOwn(file, SITES_BEGIN);
    expect([existsSync(ours), existsSync(theirs), existsSync(place.folder)]).toEqual([false, true, true]);
  });
});

describe('spareInputs', () => {
  it('refuses to write a report over a table that the study reads', async () => {
    const own = scratch();
    writeFileSync(join(own.folder, 'sites.csv'), `${[HEAD, ...ROWS].join('\n')}\n`);
    writeFileSync(
      join(own.folder, 'study.yaml'),
      withPart.replace('houses.csv', 'sites.csv').replace('output: out', 'output: .'),
    );
    const refused = screenStudy(join(own.folder, 'study.yaml'), { made: MADE });
    await expect(refused).rejects.toThrow('the reports would be written over sites.csv');
    await expect(refused).rejects.toBeInstanceOf(UserError);
    expect(existsSync(join(own.folder, 'study.duckdb'))).toBe(false);
    own.remove();
  });
});

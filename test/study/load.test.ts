import { mkdtemp, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { UserError, formatError } from '../../src/errors.js';
import { loadStudy, studyFromText } from '../../src/study/load.js';
import { SPECTRUM_CODES } from '../../src/study/spectrum-codes.js';
import { SAMPLE } from './sample.js';

// No outside source for these checks: the messages are our own contract.
function complaints(text: string): string[] {
  try {
    studyFromText(text);
  } catch (error) {
    if (error instanceof UserError) return formatError(error).split('\n');
    throw error;
  }
  return [];
}

const changed = (from: string, to: string): string[] => {
  expect(SAMPLE).toContain(from);
  return complaints(SAMPLE.replace(from, to));
};

describe('studyFromText', () => {
  it('fills in the defaults', () => {
    const { study } = studyFromText(SAMPLE);
    expect(study.inventory).toMatchObject({ encoding: 'auto', delimiter: 'auto', decimal: '.', rejects_limit: 0.05 });
    expect(study.inventory.blank).toEqual(['', '-', 'n/a', 'NULL', '?']);
    expect(study.inventory.columns.id).toEqual({ column: 'Asset no.' });
    expect(study.inventory.columns['height_m']).toEqual({ column: 'Height', unit: 'ft' });
    expect(study.period).toEqual({ standard: 'asce41-17', basis: 'best-fit', formula_for: {}, switched_off: [] });
    expect(study.ranking).toEqual({ rank_by: 'people', list_size: 20, k: 'from-levels' });
    expect(study.code_history.adoption_lag_years).toBe(2);
    expect(study.words.yes_no).toEqual({});
    expect([study.seed, study.output, study.hazard.hold_plateau]).toEqual([1, 'reports', true]);
  });

  it('says where a key stands, and for a key that is not there where its parent stands', () => {
    const { placeOf } = studyFromText(SAMPLE, 'a/study.yaml');
    expect(placeOf(['hazard', 'levels', 1, 'spectrum'])).toEqual({
      file: 'a/study.yaml',
      line: 18,
      column: 37,
      key: 'hazard.levels.2.spectrum',
    });
    expect(placeOf(['inventory', 'merge_rows_by'])).toMatchObject({ line: 3, column: 1 });
  });

  it('refuses a code history without editions: every building would count as not designed', () => {
    const wanted =
      'the editions the place used, at least one of ubc-1927, ubc-1935, ubc-1949, ubc-1961, ubc-1976, ubc-1988, ubc-1997, asce7-2002, ' +
      'each with its hazard inputs; where seismic design was never required, one of them and seismic_design_enforced_from after the last building';
    const editions = / {2}editions:\n(?: {4}.*\n)+/.exec(SAMPLE)?.[0] ?? '';
    expect(changed(editions, '  editions: {}\n')).toEqual([
      `study.yaml:23:13 code_history.editions: expected ${wanted}; got none`,
    ]);
    expect(changed(editions, '  editions:\n')).toEqual([
      `study.yaml:23:3 code_history.editions: expected ${wanted}, got nothing`,
    ]);
    expect(changed(editions, '')).toEqual([`study.yaml:19:1 code_history.editions: missing; expected ${wanted}`]);
  });

  it('says which keys are wanted where a mapping is missing', () => {
    const history = SAMPLE.slice(SAMPLE.indexOf('code_history:'));
    expect(changed(history, '')).toEqual([
      'study.yaml:1:1 code_history: missing; expected place, family, seismic_design_enforced_from and editions below it (docs/code-histories.md)',
    ]);
    expect(changed('ubc-1949: {zone: 3}', 'ubc-1949:')).toEqual([
      'study.yaml:24:5 code_history.editions.ubc-1949: expected zone below it, got nothing',
    ]);
    expect(complaints('title: A\n').filter((line) => line.includes(' hazard'))).toEqual([
      'study.yaml:1:1 hazard: missing; expected spectra and levels below it',
    ]);
    expect(complaints(`${SAMPLE}ranking:\n`)).toEqual([
      expect.stringContaining('ranking: expected keys and values below it (rank_by, list_size, k), or {}, got nothing'),
    ]);
  });

  it('refuses a visit that costs nothing, and one that finds nothing out', () => {
    const visits = (visit: string): string[] => complaints(`${SAMPLE}survey:\n  visits:\n    drone: ${visit}\n`);
    const line = SAMPLE.split('\n').length + 2;
    expect(visits('{hours: 0, finds: {system: 0.5}}')).toEqual([
      `study.yaml:${String(line)}:20 survey.visits.drone.hours: expected hours over 0, or money over 0 beside them, got 0: a visit costs something`,
    ]);
    expect(visits('{hours: 0, money: 0, finds: {}}')).toEqual([
      expect.stringContaining('survey.visits.drone.hours: '),
      `study.yaml:${String(line)}:40 survey.visits.drone.finds: expected a chance over 0 of finding something out, got none`,
    ]);
    expect(visits('{hours: 0, money: 90, finds: {system: 0.5}}')).toEqual([]);
    expect(visits('{hours: 0.1, finds: {system: 0.5, year: 0}}')).toEqual([]);
  });

  it('takes no edition for one of another year, and says which was in force', () => {
    expect(
      changed(
        / {2}family: us-ubc-asce7[^]*zone_factor: 0.4, nv: 1.0}\n/.exec(SAMPLE)?.[0] ?? '?',
        '  family: new-zealand\n  seismic_design_enforced_from: 1936\n  editions: {nz-1992: {}, nz_1976: {zone: A}}\n',
      ),
    ).toEqual([
      'study.yaml:23:14 code_history.editions.nz-1992: unknown key; known: nz-1935, nz-1955, nz-1965, nz-1976, nz-2004; the last before 1992 is nz-1976',
      'study.yaml:23:27 code_history.editions.nz_1976: unknown key (did you mean "nz-1976"?)',
    ]);
  });

  it('reports everything at once, in the order of the file', () => {
    const bad = `title: 7
inventory:
  fiel: inventory.csv
  encoding: latin1
  delimeter: ";"
  columns:
    id: Asset no.
    hight_m: Height
    floor_area_m2: {column: Area, unit: ft}
    year_built: {column: Built, unit: s}
    plan_width_m: {column: Width, unit: cubit}
  rejects_limit: 5
words:
  use: {flats: home}
  yes_no: {Y: yes, y: no}
  status: {in service: true}
hazard:
  spectra:
    design: {code: asce7-21, sds_g: 1}
    eu: {code: en1998-1-2004-elastic-type-1, ag_g: "0,9", ground: F}
    tab: {code: table, periods_s: [0, 0.5, 0.4], ordinates_g: [1, -1], interpolation: log-log}
    two: {code: asce7-22-two-period, sds_g: 0.5, sd1_g: 0.5, tl_s: 0.8}
    a b: {code: table}
  levels:
    - {title: one, spectrum: dseign}
    - {title: one, by: hazard_zone, spectra: {1: eu}}
    - {title: three, by: zone, spectra: {}}
code_history:
  place:
  family: us-ubc-asce7
  editions:
    ubc-1949: {zone: 4}
    ubc-1976: {zone_factor: 1}
    ubc-1999: {}
  detailing_from: {concrete-frame: 1973}
ranking: {list_size: 2.5, k: 9}
seed: -1
`;
    expect(complaints(bad)).toEqual([
      'study.yaml:1:8 title: expected text, got 7; put it in quotes',
      'study.yaml:2:1 inventory.file: missing; expected the path of a file',
      'study.yaml:3:3 inventory.fiel: unknown key (did you mean "file"?)',
      'study.yaml:4:13 inventory.encoding: unknown word "latin1"; known: auto, utf-8, windows-1252, latin-1, utf-16le, utf-16be',
      'study.yaml:5:3 inventory.delimeter: unknown key (did you mean "delimiter"?)',
      'study.yaml:8:5 inventory.columns.hight_m: unknown key (did you mean "height_m"?)',
      'study.yaml:9:41 inventory.columns.floor_area_m2.unit: ft is a unit of length, floor_area_m2 takes one of area: m2, ft2, ha',
      'study.yaml:10:39 inventory.columns.year_built.unit: year_built has no unit; write only the column',
      'study.yaml:11:41 inventory.columns.plan_width_m.unit: unknown unit "cubit"; known for length: m, mm, cm, km, ft, in',
      'study.yaml:12:18 inventory.rejects_limit: expected a number 0 to 1, got 5',
      'study.yaml:14:16 words.use.flats: unknown word "home"; known: residential, hotel, office, school, hospital, retail, assembly, laboratory, industrial, warehouse, parking, emergency, other, unknown',
      'study.yaml:15:20 words.yes_no.y: the same word as "Y" but for case and blanks, with another meaning; keep one',
      'study.yaml:16:24 words.status.in service: expected one of in-use, assessed, to-be-demolished, got true',
      `study.yaml:19:20 hazard.spectra.design.code: unknown code "asce7-21"; known: ${SPECTRUM_CODES.join(', ')}`,
      'study.yaml:20:52 hazard.spectra.eu.ag_g: expected a number in g > 0 and <= 10, got "0,9"',
      'study.yaml:20:67 hazard.spectra.eu.ground: unknown word "F"; known: A, B, C, D, E',
      'study.yaml:21:36 hazard.spectra.tab.periods_s.1: log-log needs periods > 0, got 0; use linear or leave it out',
      'study.yaml:21:44 hazard.spectra.tab.periods_s.3: expected a period > 0.5, got 0.4; periods increase',
      'study.yaml:21:63 hazard.spectra.tab.ordinates_g: expected one ordinate for each of the 3 periods, got 2',
      'study.yaml:21:67 hazard.spectra.tab.ordinates_g.2: expected a number in g > 0 and <= 10, got -1',
      "study.yaml:22:68 hazard.spectra.two.tl_s: expected a period beyond the plateau's end sd1_g/sds_g = 1.00 s, got 0.8",
      'study.yaml:23:5 hazard.spectra.a b: the name "a b" of a spectrum may not be empty or hold blanks, dots or slashes',
      'study.yaml:25:30 hazard.levels.1.spectrum: no spectrum "dseign" (did you mean "design"?)',
      'study.yaml:26:15 hazard.levels.2.title: level 1 has the title "one" already; name them apart',
      'study.yaml:26:24 hazard.levels.2.by: inventory.columns names no hazard_zone, so no building would have a spectrum; name it, or say otherwise:',
      'study.yaml:27:26 hazard.levels.3.by: unknown word "zone"; known: site_class, hazard_zone, vs30, spectrum',
      'study.yaml:28:1 code_history.seismic_design_enforced_from: missing; expected a year 1800 to 2100',
      'study.yaml:29:3 code_history.place: expected text, got nothing',
      'study.yaml:32:22 code_history.editions.ubc-1949.zone: expected a zone: 1, 2 or 3, got 4',
      'study.yaml:33:5 code_history.editions.ubc-1976.site_factor: missing; expected a number 1 to 2',
      'study.yaml:34:5 code_history.editions.ubc-1999: unknown key; known: ubc-1927, ubc-1935, ubc-1949, ubc-1961, ubc-1976, ubc-1988, ubc-1997, asce7-2002; the last before 1999 is ubc-1997',
      'study.yaml:35:20 code_history.detailing_from.concrete-frame: unknown key (did you mean "concrete-wall-frame"?)',
      'study.yaml:36:22 ranking.list_size: expected a whole number >= 1, got 2.5',
      'study.yaml:36:30 ranking.k: expected from-levels or a number 1 to 5, got 9',
      'study.yaml:37:7 seed: expected a whole number 0 to 4294967295, got -1',
    ]);
  });

  it('asks for two dated levels when k comes from them', () => {
    expect(changed(', return_period_years: 2475', '')).toEqual([]);
    const asked = `${SAMPLE.replace(', return_period_years: 2475', '')}ranking: {k: from-levels}\n`;
    expect(complaints(asked)).toEqual([
      expect.stringContaining(
        'ranking.k: from-levels needs two levels whose spectra all state return_period_years, not the same; this study has 1; give k as a number 1 to 5, or a second level',
      ),
    ]);
    const numbered = `${SAMPLE.replace(', return_period_years: 2475', '')}ranking: {k: 2.5}\n`;
    expect(complaints(numbered)).toEqual([]);
    expect(changed('otherwise: design}', 'otherwise: rare}')).toEqual([
      'study.yaml:17:7 hazard.levels.1: the spectra of a level share one return_period_years, these have 475 and 2475; make them alike, or give ranking.k as a number',
    ]);
  });

  it('lets a level do without otherwise', () => {
    expect(changed(', otherwise: design', '')).toEqual([]);
  });

  it('points from site classes that are not there to the velocities that are', () => {
    const [from, without] = ['site_class: Ground', 'spectra: {C: design}, otherwise: design'];
    const vs30 = SAMPLE.replace(from, 'vs30_mps: Vs30').replace(without, 'spectra: {C: design}');
    expect(complaints(vs30)).toEqual([
      expect.stringContaining(
        'hazard.levels.1.by: inventory.columns names no site_class, so no building would have a spectrum; read its vs30_mps with by: vs30 and classes:',
      ) as string,
    ]);
    expect(complaints(vs30.replace('by: site_class', 'by: vs30, classes: asce7-22'))).toEqual([]);
  });

  it('tells one kind of level from the other', () => {
    expect(
      changed('{title: rare level, spectrum: rare}', '{title: rare level, spectrum: rare, by: site_class}'),
    ).toEqual(['study.yaml:18:43 hazard.levels.2.by: unknown key; known: title, spectrum']);
    expect(changed('{title: rare level, spectrum: rare}', 'rare')).toEqual([
      'study.yaml:18:7 hazard.levels.2: expected {title, spectrum} or {title, by, spectra, otherwise}, got "rare"',
    ]);
  });

  it.each([
    ['an empty file', '', 'study.yaml:1:1: the file is empty; a study begins with title:'],
    ['a list', '- a', 'study.yaml:1:1: a study is keys and values (title: …), got a list'],
    ['a bare word', 'hello', 'study.yaml:1:1: a study is keys and values (title: …), got "hello"'],
    ['a tab', 'inventory:\n\tfile: a', 'study.yaml:2:1: a tab cannot indent; use spaces'],
    ['an open quote', 'title: "a', 'study.yaml:1:10: not valid YAML: Missing closing "quote'],
    ['depth without end', '['.repeat(20_000), 'study.yaml:1:1: nested too deeply to be read'],
  ])('refuses %s', (_what, text, message) => {
    expect(complaints(text)).toEqual([message]);
  });

  it('refuses a second document, a key that stands twice, a foreign tag and YAML 1.1', () => {
    expect(complaints(`${SAMPLE}---\n${SAMPLE}`)).toEqual([
      'study.yaml:27:1: a second document begins here; a study is one document: remove the line ---',
    ]);
    expect(complaints(`${SAMPLE}title: again\n`)).toEqual(['study.yaml:27:1: the key "title" stands twice; keep one']);
    // The rest of the file is checked all the same.
    expect(complaints(`${SAMPLE}title: again\nranking: {k: 9, "k": 8}\nseed: -1\n`)).toEqual([
      'study.yaml:27:1: the key "title" stands twice; keep one',
      'study.yaml:28:17: the key "k" stands twice; keep one',
      'study.yaml:28:22 ranking.k: expected from-levels or a number 1 to 5, got 8',
      'study.yaml:29:7 seed: expected a whole number 0 to 4294967295, got -1',
    ]);
    expect(changed('title: Two', 'title: !code Two')).toEqual([
      'study.yaml:2:8: not valid YAML: Unresolved tag: !code',
    ]);
    expect(complaints(`%YAML 1.1\n---\n${SAMPLE}`)).toEqual([
      'study.yaml:1:1: YAML 1.1 is not read; remove the %YAML line',
    ]);
  });

  it('refuses aliases that multiply out, and takes those that repeat a spectrum', () => {
    const row = (name: string, of: string): string => `${name}: &${name} [${Array(9).fill(of).join(', ')}]\n`;
    const bomb = row('a', 'x') + row('b', '*a') + row('c', '*b') + row('d', '*c');
    expect(complaints(bomb)[0]).toMatch(/^study\.yaml:1:1: aliases \(\*name\) cannot be followed/);
    expect(changed('drawn: {code', 'more: &m {code').concat(changed('    rare: {code', '    rare: &r {code'))).toEqual(
      [],
    );
    expect(
      complaints(SAMPLE.replace('    rare: {', '    rare: &r {').replace('  levels:', '    same: *r\n  levels:')),
    ).toEqual([]);
  });

  it('reads the history of a family, and says at its place what an edition of it lacks', () => {
    const us = SAMPLE.slice(SAMPLE.indexOf('  family: us'));
    const greek = [
      '  family: greece',
      '  seismic_design_enforced_from: 1959',
      '  editions:',
      '    greece-1959: {zone: II, ground: medium}',
      '    greece-1995: {zone_g: 0.24, ground: B}',
      '',
    ].join('\n');
    const { study } = studyFromText(SAMPLE.replace(us, greek));
    expect(study.code_history).toHaveProperty('editions', {
      'greece-1959': { zone: 'II', ground: 'medium' },
      'greece-1995': { zone_g: 0.24, ground: 'B' },
    });
    const line = SAMPLE.slice(0, SAMPLE.indexOf(us)).split('\n').length;
    expect(complaints(SAMPLE.replace(us, greek.replace('zone: II, ', '').replace('greece-1995', 'ubc-1997')))).toEqual([
      `study.yaml:${String(line + 3)}:5 code_history.editions.greece-1959.zone: missing; expected one of I, II, III`,
      `study.yaml:${String(line + 4)}:5 code_history.editions.ubc-1997: unknown key; known: greece-1959, greece-1985, greece-1995`,
    ]);
    expect(complaints(SAMPLE.replace(us, greek.replace('family: greece', 'family: atlantis')))).toEqual([
      `study.yaml:${String(line)}:11 code_history.family: unknown word "atlantis"; known: us-ubc-asce7, japan, new-zealand, italy, greece, turkey, india, canada, own-table`,
    ]);
    expect(complaints(SAMPLE.replace(us, greek.replace('  family: greece\n', '')))[0]).toMatch(
      /code_history\.family: missing; expected one of us-ubc-asce7, japan/,
    );
  });

  it('counts columns alike with and without a byte order mark, and lines alike with CRLF', () => {
    const bad = SAMPLE.replace('family: us-ubc-asce7', 'family: other').replace('title: Two', 'titel: Two');
    const plain = complaints(bad);
    expect(plain).toHaveLength(3);
    expect(complaints(`\ufeff${bad}`)).toEqual(plain);
    expect(complaints(bad.replaceAll('\n', '\r\n'))).toEqual(plain);
  });

  it('keeps words such as NO as they are written, and refuses keys that would reach a prototype', () => {
    const { study } = studyFromText(SAMPLE.replace('{flats: residential}', '{NO: office, 1:30: hotel, 012: other}'));
    expect(study.words.use).toEqual({ NO: 'office', '1:30': 'hotel', '012': 'other' });
    expect(complaints(`${SAMPLE}__proto__: {seed: 3}\n`)[0]).toMatch(/^study\.yaml:27:1 __proto__: unknown key/);
  });
});

describe('loadStudy', () => {
  it('reads a file and says which folder its paths start from', async () => {
    const folder = await mkdtemp(join(tmpdir(), 'study-'));
    const file = join(folder, 'study.yaml');
    await writeFile(file, `\ufeff${SAMPLE}`);
    const loaded = await loadStudy(file);
    expect(loaded).toMatchObject({ file, folder, text: SAMPLE });
  });

  it('says what is wrong with the file itself', async () => {
    const folder = await mkdtemp(join(tmpdir(), 'study-'));
    const latin = join(folder, 'latin.yaml');
    await writeFile(latin, Buffer.from('title: caf\xe9', 'latin1'));
    const failure = async (path: string): Promise<string> =>
      formatError(await loadStudy(path).catch((error: unknown) => error));
    expect(await failure(latin)).toBe(`${latin}: not UTF-8 text; save it as UTF-8`);
    expect(await failure(folder)).toBe(
      `${folder}: this is a folder; give the path of a study file, for instance study.yaml`,
    );
    const absent = join(folder, 'none.yaml');
    expect(await failure(absent)).toBe(
      `${absent}: no such file; give the path of a study file, for instance study.yaml`,
    );
  });

  it('takes the demo study', async () => {
    const { study } = await loadStudy('data-demo/study.yaml');
    expect(study.hazard.levels).toHaveLength(2);
  });
});

import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { parse } from 'yaml';
import { COLUMNS } from '../../src/engineering/columns.js';
import { proposeMapping } from '../../src/inventory/propose-mapping.js';
import { proposeStudy } from '../../src/inventory/propose-study.js';
import type { UserError } from '../../src/errors.js';
import { studyFromText } from '../../src/study/load.js';
import { writeTable } from '../support/inventory-intake.js';

const mapped = (header: readonly string[], rows: readonly (readonly string[])[] = []): Record<string, string> =>
  Object.fromEntries(
    proposeMapping(header, rows).columns.map(({ ours, theirs, unit }) => [
      ours,
      unit === undefined ? theirs : `${theirs} in ${unit}`,
    ]),
  );

describe('proposeMapping', () => {
  it('recognises columns by their names and units by brackets and endings', () => {
    expect(
      mapped(['Asset no.', 'Height (ft)', 'floor_area_sqft', 'YearBuilt', 'NumFloors', 'Lon', 'Lat', 'Structure']),
    ).toMatchObject({
      id: 'Asset no.',
      height_m: 'Height (ft) in ft',
      floor_area_m2: 'floor_area_sqft in ft2',
      year_built: 'YearBuilt',
      storeys_above: 'NumFloors',
      lon: 'Lon',
      lat: 'Lat',
      system: 'Structure',
    });
  });

  it('recognises what drawings tell of the structure', () => {
    expect(
      mapped([
        'id',
        'Floor area (m2)',
        'Wall areas x (m2)',
        'Wall lengths y (m)',
        'Number of columns',
        'Column size (m)',
        'Beam depth (m)',
        'Bay (m)',
        'Column base',
        'Top displacement x (m)',
        'concrete_strength_MPa',
      ]),
    ).toMatchObject({
      floor_area_m2: 'Floor area (m2) in m2',
      wall_areas_longitudinal_m2: 'Wall areas x (m2) in m2',
      wall_lengths_transverse_m: 'Wall lengths y (m) in m',
      column_count: 'Number of columns',
      column_depth_m: 'Column size (m) in m',
      beam_depth_m: 'Beam depth (m) in m',
      bay_length_m: 'Bay (m) in m',
      base_fixity: 'Column base',
      top_displacement_longitudinal_m: 'Top displacement x (m) in m',
      concrete_strength_MPa: 'concrete_strength_MPa in MPa',
    });
  });

  it('takes its own names as they are, with the unit they name, whatever the order', () => {
    const own = COLUMNS.map(({ name }) => name);
    const expected = Object.fromEntries(
      COLUMNS.map(({ name, unit }) => [name, unit === undefined ? name : `${name} in ${unit}`]),
    );
    for (const header of [own, own.toReversed(), own.map((name) => name.toUpperCase())]) {
      const asked = proposeMapping(header, []);
      expect(Object.keys(mapped(header)), header[0]).toEqual(own);
      expect(asked.unused).toEqual([]);
      expect(asked.columns.filter(({ question }) => question !== undefined)).toEqual([]);
    }
    expect(mapped(own.toReversed())).toEqual(expected);
    // Each alone: nothing else may claim it.
    for (const [name, value] of Object.entries(expected)) expect(mapped([name])).toEqual({ [name]: value });
  });

  it('takes its own names without a unit, and with another', () => {
    expect(mapped(['wall_areas_transverse', 'brace_area_transverse_ft2', 'Concrete strength (psi)'])).toEqual({
      wall_areas_transverse_m2: 'wall_areas_transverse in m2',
      brace_area_transverse_m2: 'brace_area_transverse_ft2 in ft2',
      concrete_strength_MPa: 'Concrete strength (psi) in psi',
    });
    const { columns } = proposeMapping(['id', 'wall_areas_longitudinal'], []);
    expect(columns[1]?.question).toBe('the header names no unit; m2 or ft2?');
  });

  it.each(['transverse first', 'longitudinal first'])('never takes one direction for the other, %s', (order) => {
    const pairs = [
      ['wall_areas_longitudinal_m2', 'wall_areas_transverse_m2', 'wall_areas'],
      ['Brace areas along (m2)', 'Brace areas across (m2)', 'brace_area'],
      ['WallLengthX', 'WallLengthY', 'wall_lengths'],
      ['measured period long.', 'measured period trans.', 'measured_period'],
      ['infilllengthlongitudinal', 'infilllengthtransverse', 'infill_length'],
      ['Storey stiffness (x)', 'Storey stiffness (y)', 'storey_stiffness'],
    ] as const;
    const header = pairs.flatMap(([x, y]) => (order === 'transverse first' ? [y, x] : [x, y]));
    const found = proposeMapping(header, []);
    for (const [x, y, name] of pairs) {
      const of = (direction: string): string | undefined =>
        found.columns.find(({ ours }) => ours.startsWith(`${name}_${direction}`))?.theirs;
      expect([of('longitudinal'), of('transverse')], name).toEqual([x, y]);
    }
    expect(found.unused).toEqual([]);
    // One direction alone leaves the other empty.
    for (const [, y, name] of pairs)
      expect(mapped([y])[`${name}_longitudinal_m2`] ?? mapped([y])[`${name}_longitudinal_m`], y).toBeUndefined();
    expect(mapped(['system_transverse'])).toEqual({ system_transverse: 'system_transverse' });
    expect(mapped(['Structure across', 'Structure'])).toEqual({
      system: 'Structure',
      system_transverse: 'Structure across',
    });
    expect(mapped(['Column depth across', 'Length across', 'Wall area x and y'])).toEqual({});
  });

  it('asks where a name tells no direction', () => {
    const { columns } = proposeMapping(['Wall area (m2)'], []);
    expect(columns).toEqual([
      {
        ours: 'wall_areas_longitudinal_m2',
        theirs: 'Wall area (m2)',
        unit: 'm2',
        question: 'the header names no direction; longitudinal?',
      },
    ]);
  });

  it('finds feet by the data, as a question', () => {
    const rows = Array.from({ length: 9 }, (_, i) => [`A${i}`, String(1 + i), String((1 + i) * 11)]);
    const proposal = proposeMapping(['id', 'Storeys', 'Height'], rows);
    const height = proposal.columns.find(({ ours }) => ours === 'height_m');
    expect(height?.unit).toBe('ft');
    expect(height?.question).toMatch(/feet, by the data.*11/);
  });

  it('asks whether repeated ids are parts of one building, and does not take words for numbers', () => {
    const proposal = proposeMapping(
      ['id', 'Height'],
      [
        ['A', 'tall'],
        ['A', 'low'],
        ['B', 'tall'],
      ],
    );
    expect(proposal.questions[0]).toMatch(/^"Height" looks like height_m .*cannot be read as such: "tall", "low"; how/);
    expect(proposal.questions[1]).toMatch(/parts of one building/);
    expect(proposal.unused).toEqual([]);
  });
});

describe('proposeStudy', () => {
  it('reads a decimal comma, uses it to tell feet, and offers no blank word as a word', () => {
    const path = writeTable(
      'Ref;Storeys;Height;Area;Lat;Lon;Use\n' +
        'A;4;45,0;3.937,5;48,00123;7,85123;office\nB;2;23,5;812,25;48,00241;7,85;Wohnhaus\nC;3;n/a;1.250;48,003;7,8;?\n',
    );
    const { text, proposal } = proposeStudy(path);
    expect(text).toMatch(/^ {2}decimal: ","$/m);
    expect(proposal.unused).toEqual([]);
    expect(text).toMatch(/^ {4}height_m: \{column: "Height", unit: ft\} {2}# QUESTION: feet, by the data: .* 11\.3/m);
    expect(text).toMatch(/^ {4}lat: "Lat"$/m);
    expect(text).toMatch(/^ {4}floor_area_m2: \{column: "Area"/m);
    expect(text).toMatch(/"Wohnhaus": /);
    expect(text).not.toMatch(/"\?": /);
  });

  it('writes a study that cannot run before its questions are answered', () => {
    const path = fileURLToPath(new URL('../fixtures/assessor-excerpt.csv', import.meta.url));
    const { text, questions } = proposeStudy(path);
    expect(text).toMatch(/^ {4}id: "ML"$/m);
    expect(text).toMatch(/^ {4}year_built: "AYBYrBuilt"$/m);
    expect(text).toMatch(/# merge_rows_by: "ML"/);
    expect(text).toMatch(/# no_building: \{column: "UseDescription", values: \[.*"PARKING-LOT"/);
    expect(text).toMatch(/^# {5}"CONDOMINIUM": residential {2}# QUESTION: /m);
    expect(questions.length).toBe(text.split('# QUESTION:').length - 1);
    let problems: readonly string[] = [];
    try {
      studyFromText(text);
    } catch (error) {
      problems = (error as UserError).problems.map(({ place }) => place.key ?? '');
    }
    expect(problems).toContain('code_history.editions');
    // All that is wrong with it is what the owner has to say.
    expect(problems.length).toBeGreaterThan(0);
    expect(problems.filter((key) => !/^(hazard|code_history)/.test(key))).toEqual([]);
  });

  it('maps the demo as its own study does, and guesses its words as questions', () => {
    const path = fileURLToPath(new URL('../../data-demo/inventory.csv', import.meta.url));
    const own = parse(readFileSync(new URL('../../data-demo/study.yaml', import.meta.url), 'utf8')) as {
      inventory: { columns: Record<string, string | { column: string }> };
      words: { system: Record<string, string>; use: Record<string, string> };
    };
    const { text, proposal } = proposeStudy(path);
    const theirs = Object.entries(own.inventory.columns).map(([ours, one]) => [
      ours,
      typeof one === 'string' ? one : one.column,
    ]);
    const found = Object.fromEntries(proposal.columns.map((one) => [one.ours, one.theirs]));
    // "Column feet" reads as a length
    expect(theirs.filter(([ours, name]) => found[ours!] !== name)).toEqual([['base_fixity', 'Column feet']]);
    const lines = text.split('\n');
    const at = lines.indexOf('# words:');
    const block = lines.slice(at, lines.indexOf('', at)).map((line) => line.slice(2));
    const { words } = parse(block.join('\n')) as Pick<typeof own, 'words'>;
    const fold = (all: Record<string, string>): Record<string, string> =>
      Object.fromEntries(Object.entries(all).map(([word, ours]) => [word.toLowerCase(), ours]));
    expect(fold(words.system)).toEqual(fold({ ...own.words.system, 'lift slab': 'unknown' }));
    expect(fold(words.use)).toEqual({ ...fold(own.words.use), 'open yard': 'unknown', mixed: 'unknown' });
  });
});

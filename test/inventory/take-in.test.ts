import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { Bug, UserError } from '../../src/errors.js';
import { ACCOUNT_KINDS, checkAccount } from '../../src/inventory/account.js';
import type { IntakeStudy } from '../../src/inventory/intake-study.js';
import { takeIn } from '../../src/inventory/take-in.js';
import type { Study } from '../../src/study/schema.js';
import { intakeOf, intakeOfText, memoryDatabase, studyOf, writeTable } from '../support/inventory-intake.js';
import type { Intake } from '../support/inventory-intake.js';

const COLUMNS = { id: 'id', storeys_above: 'n', height_m: 'h', floor_area_m2: 'a', year_built: 'y', use: 'u' };
const HEADER = 'id,n,h,a,y,u\n';

const codes = ({ findings }: Intake): string[] => findings.map(({ code }) => code).sort();
const building = ({ buildings }: Intake, id: string): Readonly<Record<string, string | number | null>> =>
  buildings.find((one) => one['id'] === id) ?? {};

describe('takeIn', () => {
  it('accepts a study as it is loaded', () => {
    const check = (study: Study): IntakeStudy => study;
    expect(check).toBeTypeOf('function');
  });

  it('keeps what is given, infers the rest and says how', async () => {
    const intake = await intakeOfText(
      `${HEADER}A,3,10,600,1960,office\nB,4,,,,residential\nC,,14,500,1950,office\nD,,,,,residential\n`,
      {
        columns: COLUMNS,
      },
    );
    expect(building(intake, 'A')).toMatchObject({
      storeys_above: 3,
      height_m: 10,
      height_m_origin: 'given',
      height_m_sigma: 0,
      height_m_rule: '',
    });
    // Storey heights and spreads: judgement, engineering/prior/storey-height.ts.
    expect(building(intake, 'B')).toMatchObject({
      height_m_origin: 'inferred',
      height_m_sigma: 0.1,
      floor_area_m2_origin: 'default',
    });
    expect(building(intake, 'B')['height_m']).toBeCloseTo(12.4, 12);
    expect(building(intake, 'B')['height_m_rule']).toMatch(/3\.1 m per storey \(residential\) \[judgement\]/);
    expect(building(intake, 'C')).toMatchObject({
      storeys_above: 4,
      storeys_above_origin: 'inferred',
      storeys_above_sigma: 0.12,
    });
    expect(building(intake, 'D')).toMatchObject({
      storeys_above: 2,
      storeys_above_origin: 'default',
      storeys_above_sigma: 0.35,
    });
    expect(building(intake, 'D')).toMatchObject({ height_m_origin: 'default', not_ranked: null, status: 'in-use' });
    expect(intake.taken.attributes['storeys_above']).toEqual({ given: 2, inferred: 1, default: 1, unknown: 0 });
  });

  it('lists a building of which nothing is known as not ranked', async () => {
    const intake = await intakeOfText(`${HEADER}A,,,,,\nB,,,,,hotel\nC,,,900,,\n`, { columns: COLUMNS });
    expect(building(intake, 'A')['not_ranked']).toMatch(/^no-size: /);
    expect(building(intake, 'B')['not_ranked']).toBeNull();
    expect(building(intake, 'C')['not_ranked']).toBeNull();
    expect(intake.taken.account).toMatchObject({ 'merged-into-ranked': 2, 'merged-into-not-ranked': 1 });
  });

  it('numbers buildings by id whatever the order of rows', async () => {
    const rows = [
      'b2,3,10,600,1960,office',
      'a1,4,,,,residential',
      'B1,,14,500,,office',
      'ä,,,,1900,',
      'a10,2,40,30,1960,office',
    ];
    const shown = async (order: readonly string[]): Promise<unknown[]> => {
      const { buildings } = await intakeOfText(HEADER + order.join('\n'), { columns: COLUMNS });
      return buildings.map(({ first_row: _row, ...rest }) => rest);
    };
    const straight = await shown(rows);
    expect(straight.map((one) => (one as { id: string }).id)).toEqual(['B1', 'a1', 'a10', 'b2', 'ä']);
    expect(await shown([...rows].reverse())).toEqual(straight);
    expect(await shown([rows[3]!, rows[1]!, rows[4]!, rows[0]!, rows[2]!])).toEqual(straight);
  });

  it('gives the same building in feet and in metres', async () => {
    const metres = [
      [12.4, 615.5],
      [7.02, 99.25],
      [31.1, 4000],
    ];
    const feet = metres.map(([h, a]) => [h! / 0.3048, a! / (0.3048 * 0.3048)]);
    const table = (sizes: readonly (readonly (number | undefined)[])[]): string =>
      `id,h,a\n${sizes.map(([h, a], at) => `B${at},${h},${a}`).join('\n')}\n`;
    const si = await intakeOfText(table(metres), {
      columns: { id: 'id', height_m: { column: 'h', unit: 'm' }, floor_area_m2: 'a' },
    });
    const us = await intakeOfText(table(feet), {
      columns: { id: 'id', height_m: { column: 'h', unit: 'ft' }, floor_area_m2: { column: 'a', unit: 'ft2' } },
    });
    si.buildings.forEach((one, at) => {
      for (const [name, value] of Object.entries(one)) {
        const other = us.buildings[at]![name];
        if (typeof value === 'number') expect(Math.abs(Number(other) / value - 1) || 0, name).toBeLessThan(1e-12);
        else expect(other, name).toEqual(value);
      }
    });
  });

  it('counts every row once', async () => {
    const intake = await intakeOfText(
      `${HEADER}A,3,10,600,1960,office\nA,3,10,600,1960,office\nA,4,10,600,1960,office\n,2,,,,\nB,1,,,,hotel\nC,1\nP,,,,,Parking Lot\n,,,,,\nD,"2\n`,
      { columns: COLUMNS, no_building: { column: 'u', values: ['parking  lot'] } },
    );
    expect(intake.taken.account).toEqual({
      'merged-into-ranked': 2,
      'merged-into-not-ranked': 0,
      'site-without-building': 1,
      rejected: 4,
      'exact-duplicate': 1,
    });
    expect(intake.taken.rowsIn).toBe(8);
    expect(intake.findings.filter(({ kind }) => kind === 'rejected-row').map(({ row, code }) => [row, code])).toEqual([
      [4, 'repeated-id'],
      [5, 'no-id'],
      [7, 'ragged-row'],
      [10, 'unterminated-quote'],
    ]);
    expect(intake.findings.find(({ code }) => code === 'exact-duplicate')).toMatchObject({
      row: 3,
      id: 'A',
      message: 'every cell equals row 2',
    });
    expect(await intake.db.value('SELECT sum(rows) FROM row_account')).toBe(8);
  });

  it('keeps every cell it cannot read, with row, line, column, value and reason', async () => {
    const intake = await intakeOfText(
      `${HEADER}"A\nx",abc,0x10,-5,old,castle\nB,99,5,100,c. 1925,shop\nC,0,0,0,0,\n`,
      { columns: COLUMNS },
      { use: { shop: 'retail' } },
    );
    expect(
      intake.findings
        .filter(({ kind }) => kind === 'rejected-cell')
        .map(({ row, line, column_name, value, code }) => [row, line, column_name, value, code]),
    ).toEqual([
      [2, 2, 'floor_area_m2', '-5', 'negative-area'],
      [2, 2, 'height_m', '0x10', 'not-a-number'],
      [2, 2, 'storeys_above', 'abc', 'not-a-number'],
      [2, 2, 'use', 'castle', 'unknown-word'],
      [2, 2, 'year_built', 'old', 'not-a-number'],
      [3, 4, 'storeys_above', '99', 'outside-limits'],
    ]);
    expect(building(intake, 'A\nx')).toMatchObject({ storeys_above_origin: 'default', findings: 5 });
    expect(building(intake, 'B')).toMatchObject({ year_built: 1925, use: 'retail' });
    expect(intake.findings.filter(({ code }) => code === 'zero').map(({ column_name }) => column_name)).toEqual([
      'floor_area_m2',
      'height_m',
      'storeys_above',
      'year_built',
    ]);
  });

  it('takes hostile cells as text and nothing else', async () => {
    const long = 'x'.repeat(5_000_000);
    const cells = [
      '=1+1',
      '</script><img onerror=alert(1)>',
      '\u0001\u001b[31m',
      '"; DROP TABLE building; --',
      long,
      '\0',
    ];
    const rows = cells.map((cell, at) => `H${at},"${cell.replaceAll('"', '""')}"`);
    const intake = await intakeOfText(`id,name\n${rows.join('\n')}\n`, { columns: { id: 'id', name: 'name' } });
    expect(intake.buildings.map(({ name }) => name)).toEqual([...cells.slice(0, 4), long.slice(0, 500), null]);
    expect(codes(intake)).toEqual(['text-cut', 'zero-bytes']);
  });

  it('reads Windows-1252, UTF-16, semicolons and decimal commas', async () => {
    const text = 'id;h;name\r\nA;12,5;Café\r\nB;1.012,5;x\r\n';
    const study = { columns: { id: 'id', height_m: 'h', name: 'name' }, decimal: ',' };
    for (const bytes of [Buffer.from(text, 'latin1'), Buffer.from(text), Buffer.from(`\ufeff${text}`, 'utf16le')]) {
      const intake = await intakeOfText(bytes, study);
      expect(intake.buildings.map(({ id, height_m, name }) => [id, height_m, name])[0]).toEqual(['A', 12.5, 'Café']);
      expect(intake.findings[0]).toMatchObject({ row: 3, code: 'outside-limits', value: '1.012,5' });
    }
  });

  it('notes what contradicts itself and corrects nothing', async () => {
    const usual = Array.from({ length: 9 }, (_, i) => `U${i},3,${9 + i / 10},600,1950,office`).join('\n');
    const intake = await intakeOfText(
      `${HEADER}${usual}\nF,3,33,900,1960,office\nT,2,30,900,1960,office\nP,40,130,221,1960,office\n`,
      { columns: COLUMNS },
    );
    expect(codes(intake)).toEqual(['floor-plate-small', 'height-storeys-contradict', 'looks-like-feet']);
    expect(building(intake, 'F')).toMatchObject({ height_m: 33, height_m_origin: 'given', height_m_sigma: 0.35 });
    expect(building(intake, 'P')).toMatchObject({ storeys_above_origin: 'inferred', height_m: 130 });
  });

  it('proposes feet for a column whose median says so, and does not convert it', async () => {
    const rows = Array.from({ length: 7 }, (_, i) => `U${i},3,${33 + i},600,1950,office`).join('\n');
    const intake = await intakeOfText(HEADER + rows, { columns: COLUMNS });
    expect(intake.findings.find(({ code }) => code === 'column-looks-like-feet')).toMatchObject({
      message: 'the median height per storey is 12 m',
      action:
        'not converted; if "h" is in feet, write under inventory.columns of the study: height_m: {column: "h", unit: ft}',
    });
    expect(building(intake, 'U0')['height_m']).toBe(33);
  });

  it('notes years, places, sums and campus rows that cannot be', async () => {
    const columns = {
      id: 'id',
      lon: 'x',
      lat: 'y',
      storeys_above: 'n',
      storeys_below: 'b',
      storeys_total: 't',
      year_built: 'built',
      year_retrofitted: 'retro',
      count: 'c',
      floor_area_m2: 'a',
    };
    const usual = Array.from({ length: 6 }, (_, i) => `U${i},-122.${i},37.${i},2,0,2,1900,,1,${500 + i}`).join('\n');
    const intake = await intakeOfText(
      `id,x,y,n,b,t,built,retro,c,a\n${usual}\nS,37.1,-122.1,2,,,1950,,,700\nZ,0,0,2,1,4,1950,1940,,700\nK,-122.1,37.1,2,,,1950,1990,12,501\n`,
      { columns },
    );
    expect(codes(intake).filter((code) => code !== 'year-heaping')).toEqual([
      'coordinates-swapped',
      'coordinates-zero',
      'near-duplicate',
      'near-duplicate',
      'outside-limits',
      'retrofit-before-construction',
      'several-buildings-in-row',
      'storeys-do-not-add-up',
    ]);
    expect(codes(intake).filter((code) => code === 'year-heaping')).toHaveLength(6);
    expect(building(intake, 'S')).toMatchObject({ lon: null, lat: null });
    expect(building(intake, 'Z')).toMatchObject({ lon: null, year_retrofitted: null });
    expect(building(intake, 'K')).toMatchObject({ lon: -122.1, year_retrofitted: 1990, count: 12 });
  });

  it.each([undefined, 'id'])(
    'takes a design coefficient over a level that says there is none, merged by %s',
    async (merge_rows_by) => {
      const columns = { id: 'id', design_base_shear_coefficient: 'c', design_level: 'l' };
      const intake = await intakeOfText('id,c,l\nA,0.08,none\nB,,none\nC,0.1,working\nD,0.2,\n', {
        columns,
        ...(merge_rows_by === undefined ? {} : { merge_rows_by }),
      });
      expect(intake.findings.filter(({ code }) => code === 'coefficient-without-design')).toMatchObject([
        {
          row: 2,
          id: 'A',
          column_name: 'design_level',
          value: 'none',
          kind: 'note',
          message: 'no design for earthquakes, but a design base shear coefficient of 0.08',
          action:
            'the coefficient is taken and its level counts as not stated; leave the coefficient blank, or give its level',
        },
      ]);
      const kept = intake.buildings.map((one) => [one['design_base_shear_coefficient'], one['design_level']]);
      expect(kept).toEqual([
        [0.08, null],
        [null, 'none'],
        [0.1, 'working'],
        [0.2, null],
      ]);
    },
  );

  it('doubts storeys that only units give, or that are too few for the area', async () => {
    const columns = { id: 'id', name: 'name', storeys_above: 'n', floor_area_m2: 'a', use: 'u' };
    const units = (id: string, count: number, area: number, storeys: number): string =>
      Array.from({ length: count }, (_, i) => `${id},5 Elm St #${i},${storeys},${area},residential\n`).join('');
    const intake = await intakeOfText(
      `id,name,n,a,u\n${units('A', 8, 90, 2)}A,5 Elm St,,,residential\n${units('B', 7, 90, 2)}${units('C', 8, 90, 3)}` +
        `${units('D', 8, 90, 2)}D,5 Elm St,2,,residential\n${units('E', 2, 5100, 1)}F,Hall,1,10200,residential\n`,
      { columns, merge_rows_by: 'id' },
    );
    const doubted = intake.findings.filter(({ code }) => code === 'storeys-of-units');
    expect(doubted.map(({ id, message }) => [id, message])).toEqual([
      ['A', 'only units give storeys, 2 at most'],
      ['E', '10200 m² over 1 storey is 10200 m² per storey'],
    ]);
    expect(building(intake, 'A')).toMatchObject({
      name: '5 Elm St',
      storeys_above: 2,
      storeys_above_origin: 'given',
      storeys_above_sigma: 0.4,
      storeys_above_rule: 'storeys of units, perhaps not of the building [judgement]',
    });
    // Root of 0.4 and 0.1 squared: the spread of a residential storey height is 0.1 [judgement].
    expect(building(intake, 'A')['height_m_sigma']).toBeCloseTo(Math.sqrt(0.17), 12);
    expect(building(intake, 'F')).toMatchObject({ storeys_above_sigma: 0 });
  });

  it('lends ten years of like buildings where the year is not known', async () => {
    const known = Array.from({ length: 20 }, (_, i) => `K${i},2,,,${1900 + i},${i < 10 ? 'office' : 'hotel'}`).join(
      '\n',
    );
    const intake = await intakeOfText(`${HEADER}${known}\nA,2,,,,hotel\nB,2,,,,school\nC,2,,,1920s,school\n`, {
      columns: COLUMNS,
    });
    const years = async (id: string): Promise<unknown[]> =>
      (
        await intake.db.rows<{ year: number }>(
          'SELECT year FROM year_pool JOIN building ON pool = year_pool WHERE id = ? ORDER BY position',
          [id],
        )
      ).map(({ year }) => year);
    expect(await years('A')).toEqual([1910, 1911, 1912, 1913, 1914, 1915, 1916, 1917, 1918, 1919]);
    expect(await years('B')).toHaveLength(10);
    expect(await years('C')).toEqual([1920, 1921, 1922, 1923, 1924, 1925, 1926, 1927, 1928, 1929]);
    expect(building(intake, 'A')).toMatchObject({ year_built: null, year_built_origin: 'inferred' });
    expect(building(intake, 'K0')).toMatchObject({ year_built: 1900, year_pool: null });
  });

  it('takes plan, area and place from a footprint', async () => {
    const intake = await intakeOfText(
      'id;f;n\nA;POLYGON ((0 0, 0.0004 0, 0.0004 0.0001, 0 0.0001, 0 0));3\nB;nonsense;2\n',
      {
        columns: { id: 'id', footprint: 'f', storeys_above: 'n' },
      },
    );
    const { plan_length_m, floor_area_m2, floor_area_m2_origin, lon } = building(intake, 'A');
    expect(plan_length_m).toBeCloseTo(44.5, 1);
    expect(floor_area_m2).toBeCloseTo(3 * 44.53 * 11.06, -1);
    expect([floor_area_m2_origin, lon]).toEqual(['inferred', 0.0002]);
    expect(codes(intake)).toEqual(['not-a-polygon']);
    // what is no footprint counts as none
    expect(building(intake, 'B')).toMatchObject({ footprint: null, storeys_above: 2 });
    expect(building(intake, 'A')).toMatchObject({ footprint: expect.stringContaining('POLYGON') as string });
    expect(intake.taken.attributes['footprint']).toEqual({ given: 1, inferred: 0, default: 0, unknown: 1 });
  });

  it('takes area and place from a footprint of several outlines, and says that it tells no sides', async () => {
    const a = '((0 0, 0.0004 0, 0.0004 0.0001, 0 0.0001, 0 0))';
    const b = '((0.001 0, 0.0012 0, 0.0012 0.0001, 0.001 0.0001, 0.001 0))';
    const intake = await intakeOfText(
      `id;f;n;l\nA;MULTIPOLYGON (${a}, ${b});3;\nB;MULTIPOLYGON (${a});2;\nC;MULTIPOLYGON (${a}, ((7)));2;\nD;MULTIPOLYGON (${a}, ${b});3;50\n`,
      { columns: { id: 'id', footprint: 'f', storeys_above: 'n', plan_length_m: 'l' } },
    );
    expect(building(intake, 'A')).toMatchObject({
      plan_length_m: null,
      plan_width_m: null,
      reentrant_projection: null,
      reentrant_area_share: null,
      footprint_area_m2: expect.closeTo(1.5 * 44.53 * 11.06, 0) as number,
      floor_area_m2: expect.closeTo(3 * 1.5 * 44.53 * 11.06, -1) as number,
      lon: expect.closeTo((2 * 0.0002 + 0.0011) / 3, 6) as number,
    });
    expect(building(intake, 'B')).toMatchObject({
      plan_length_m: expect.closeTo(44.53, 1) as number,
      reentrant_projection: 0,
    });
    expect(building(intake, 'C')).toMatchObject({ footprint: null, footprint_area_m2: null });
    expect(building(intake, 'D')).toMatchObject({ plan_length_m: 50 });
    expect(intake.findings.map(({ code, row, id, value }) => [code, row, id, value?.slice(0, 14)])).toEqual([
      ['several-outlines', 2, 'A', 'MULTIPOLYGON ('],
      ['not-a-polygon', 4, 'C', 'MULTIPOLYGON ('],
      ['several-outlines', 5, 'D', 'MULTIPOLYGON ('],
    ]);
    expect(intake.findings[0]!.message).toBe(
      '2 outlines: give the sides of the plan, or each building a row of its own',
    );
  });

  it('measures re-entrant corners of footprints, and keeps what the row says of them', async () => {
    const l = 'POLYGON ((0 0, 0.0004 0, 0.0004 0.0002, 0.0002 0.0002, 0.0002 0.0004, 0 0.0004, 0 0))';
    const intake = await intakeOfText(`id;f;r\nA;${l};\nB;${l};0.07\nC;;\n`, {
      columns: { id: 'id', footprint: 'f', reentrant_projection: 'r' },
    });
    // half of each side beyond the corner; the triangle of the hull is an eighth of the square, the floor three quarters
    expect(building(intake, 'A')).toMatchObject({
      reentrant_projection: expect.closeTo(0.5, 6) as number,
      reentrant_area_share: expect.closeTo(1 / 6, 6) as number,
    });
    expect(Number(building(intake, 'A')['footprint_area_m2'])).toBeCloseTo(0.75 * 44.53 * 44.23, -1);
    expect(building(intake, 'B')).toMatchObject({ reentrant_projection: 0.07 });
    expect(building(intake, 'C')).toMatchObject({ reentrant_projection: null, footprint_area_m2: null });
  });

  it('reads neighbours and notes pairs that name no building', async () => {
    const file = writeTable(`${HEADER}A,3,,,,\nB,2,,,,\n`);
    const pairs = writeTable(
      'id_a,id_b,gap_m,floors_aligned\nA,B,0.05,yes\nA,C,1,\nB,A,wide,maybe\nB,A,-0.3,\nB,A,1e9,no\n',
      'pairs.csv',
    );
    const intake = await intakeOf({ ...studyOf(file, { columns: COLUMNS }), neighbours: { file: pairs } });
    expect(await intake.db.rows('SELECT id_a, id_b, gap_m, floors_aligned FROM neighbour')).toEqual([
      { id_a: 'A', id_b: 'B', gap_m: 0.05, floors_aligned: 'yes' },
      { id_a: 'B', id_b: 'A', gap_m: null, floors_aligned: null },
      { id_a: 'B', id_b: 'A', gap_m: null, floors_aligned: null },
      { id_a: 'B', id_b: 'A', gap_m: null, floors_aligned: 'no' },
    ]);
    expect(codes(intake)).toEqual([
      'floors-disagree',
      'not-a-number',
      'outside-limits',
      'outside-limits',
      'unknown-neighbour',
      'unknown-word',
    ]);
  });

  it('notes rows of one pair that disagree, in either order of the ids, and none that repeat or leave blank', async () => {
    const file = writeTable(`${HEADER}A,3,,,,\nB,2,,,,\nC,2,,,,\nD,2,,,,\n`);
    const pairs = writeTable(
      [
        'id_a,id_b,gap_m,floors_aligned',
        'A,B,0.2,yes',
        'B,A,0.4,no',
        'A,C,0.1,no',
        'A,C,0.10,No',
        'C,A,,',
        'B,C,0.5,',
        'B,C,,yes',
        'D,A,3,yes',
        'A,D,1,',
        'A,D,2,yes',
        'A,NONE,1,yes',
        'NONE,A,2,no',
        '',
      ].join('\n'),
      'pairs.csv',
    );
    const { findings } = await intakeOf({ ...studyOf(file, { columns: COLUMNS }), neighbours: { file: pairs } });
    expect(
      findings
        .filter(({ code }) => code !== 'unknown-neighbour')
        .map(({ row, column_name, value, code, message, action, kind }) => [
          row,
          column_name,
          value,
          code,
          message,
          action,
          kind,
        ]),
    ).toEqual([
      [
        3,
        'neighbours floors_aligned',
        'no and yes',
        'floors-disagree',
        'A and B: row 3 says no, row 2 says yes; keep the one that holds',
        'the floors are taken not to be at one level',
        'note',
      ],
      [
        3,
        'neighbours gap_m',
        '0.2 m and 0.4 m',
        'gaps-disagree',
        'A and B: row 2 says 0.2 m, row 3 says 0.4 m; keep the one that holds',
        'the smaller gap is taken',
        'note',
      ],
      [
        10,
        'neighbours gap_m',
        '1.0 m and 3.0 m',
        'gaps-disagree',
        'A and D: row 10 says 1.0 m, row 9 says 3.0 m, of 3 rows of this pair; keep the one that holds',
        'the smaller gap is taken',
        'note',
      ],
    ]);
  });

  it('does nothing for an inventory it already holds, and takes a changed one as another', async () => {
    const db = await memoryDatabase();
    const file = writeTable(`${HEADER}A,3,,,,office\n`);
    const study = studyOf(file, { columns: COLUMNS });
    const first = await db.transaction(() => takeIn(db, study, '.'));
    const second = await db.transaction(() => takeIn(db, study, '.'));
    expect([first.known, second.known]).toEqual([false, true]);
    expect({ ...second, known: false }).toEqual(first);
    const other = await db.transaction(() => takeIn(db, { ...study, words: { use: { office: 'hotel' } } }, '.'));
    expect(other.inventoryId).not.toBe(first.inventoryId);
    expect(await db.rows('SELECT use FROM building ORDER BY use')).toEqual([{ use: 'hotel' }, { use: 'office' }]);
  });

  it('names every problem of the mapping at once', async () => {
    const file = writeTable('id,Storeys,Height,x,x\nA,1,2,3,4\n');
    const study = studyOf(file, {
      columns: { id: 'id', storeys_above: 'Storey', height_m: { column: 'height', unit: 'kg' }, lon: 'x' },
    });
    const failure = await intakeOf(study).then(
      () => undefined,
      (error: unknown) => error,
    );
    expect(failure).toBeInstanceOf(UserError);
    const messages = (failure as UserError).problems.map(({ message }) => message);
    expect(messages[0]).toMatch(/no "Storey"; did you mean "Storeys"\?; it has: id, Storeys, Height, x, x/);
    expect(messages[1]).toMatch(/"kg" is not a unit of height_m; known: m, mm/);
    expect(messages[2]).toMatch(/"x" 2 times \(columns 4, 5\)/);
  });

  it('refuses a table without a building', async () => {
    await expect(intakeOfText(`${HEADER},1,,,,\n`, { columns: COLUMNS })).rejects.toThrow(
      /no row is a building.*row 2: the row has no id/,
    );
    await expect(intakeOfText(HEADER, { columns: COLUMNS })).rejects.toThrow(/has a header \(6 columns\) and no rows/);
    await expect(intakeOfText('\n\n', { columns: COLUMNS })).rejects.toThrow(/no header/);
  });
});

describe('checkAccount', () => {
  it('is a bug when rows are lost', () => {
    const account = Object.fromEntries(ACCOUNT_KINDS.map((kind) => [kind, 1])) as Parameters<typeof checkAccount>[0];
    checkAccount(account, 5);
    expect(() => checkAccount(account, 6)).toThrow(Bug);
  });
});

describe('the assessor excerpt', () => {
  // 50 rows of a real table; test/fixtures/SOURCES.md names its licence. The expected values are read off the rows by hand.
  const file = fileURLToPath(new URL('../fixtures/assessor-excerpt.csv', import.meta.url));
  const excerpt = (content?: string): Promise<Intake> =>
    intakeOf(
      studyOf(
        content === undefined ? file : writeTable(content),
        {
          columns: {
            id: 'ML',
            name: 'Location',
            use: 'UseDescription',
            floor_area_m2: { column: 'GrossArea', unit: 'ft2' },
            year_built: 'AYBYrBuilt',
            storeys_above: 'BldgStories',
          },
          merge_rows_by: 'ML',
          no_building: {
            column: 'UseDescription',
            values: ['PARKING-LOT', 'RES-DEV-LAND', 'COM-UDV-LAND', 'COM-DEV-LAND'],
          },
        },
        {
          use: {
            CONDOMINIUM: 'residential',
            'CONDO-BLDG': 'residential',
            'MULTI UNIT CNDO': 'residential',
            'INV-OFFICE': 'office',
          },
        },
      ),
    );

  it('merges condominiums and accounts for every row', async () => {
    const intake = await excerpt();
    expect(intake.taken.account).toEqual({
      'merged-into-ranked': 43,
      'merged-into-not-ranked': 0,
      'site-without-building': 6,
      rejected: 1,
      'exact-duplicate': 0,
    });
    // 3142 + 1184 + 586 + 611 square feet; rows of 3, 2, 1 and 1 storeys, built 1860 and 1900.
    const condominium = building(intake, '24-80');
    expect(condominium['floor_area_m2']).toBeCloseTo(5523 * 0.09290304, 9);
    expect(condominium).toMatchObject({
      storeys_above: 3,
      year_built: 1860,
      rows: 4,
      use: 'residential',
      floor_area_m2_sigma: 0.35,
    });
    expect(
      intake.findings
        .filter(({ id }) => id === '24-80')
        .map(({ code }) => code)
        .sort(),
    ).toEqual(['part-looks-like-whole', 'storeys-disagree', 'years-disagree']);
    // The name is that of the row without a unit mark, not the first by alphabet.
    expect([building(intake, '25-99'), building(intake, '17-3'), condominium].map(({ name }) => name)).toEqual([
      '121 SPRING ST',
      '226 HURLEY ST',
      '83 THIRD ST',
    ]);
    expect(building(intake, '25-99')).toMatchObject({ storeys_above: 3, year_built: 1865, rows: 5 });
    expect(building(intake, '14-1038')).toMatchObject({ storeys_above: 22, rows: 4 });
    expect(building(intake, '17-8')).toMatchObject({ storeys_above: 2.5, storeys_above_origin: 'given' });
    expect(building(intake, '44-100')).toMatchObject({
      storeys_above: 12,
      floor_area_m2_origin: 'default',
      use: 'office',
    });
    expect(intake.findings.find(({ code }) => code === 'negative-area')).toMatchObject({
      row: 20,
      value: '-35616',
      id: '44-100',
    });
    expect(intake.findings.find(({ kind }) => kind === 'rejected-row')).toMatchObject({ row: 39, code: 'no-id' });
  });

  it('gives the same buildings whatever the order of rows', async () => {
    const [header = '', ...rows] = readFileSync(file, 'utf8').trimEnd().split('\n');
    const turned = await excerpt([header, ...rows.reverse()].join('\r\n'));
    const straight = await excerpt();
    const plain = ({ buildings }: Intake): unknown[] => buildings.map(({ first_row: _row, ...rest }) => rest);
    expect(plain(turned)).toEqual(plain(straight));
  });
});

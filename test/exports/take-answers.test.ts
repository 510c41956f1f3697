import { readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { checkStudy } from '../../src/exports/check-study.js';
import type { CheckedStudy } from '../../src/exports/check-study.js';
import { listAnswers, withdrawAnswers } from '../../src/exports/held-answers.js';
import { takeAnswers } from '../../src/exports/take-answers.js';
import { fieldSheet } from '../../src/exports/survey-study.js';
import { withStudyDatabase } from '../../src/runs/open.js';
import { explainBuilding } from '../../src/screening/explain.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import type { ScreenOutcome } from '../../src/screening/screen.js';
import { findingCounts } from '../../src/screening/summarise.js';
import { planSurvey } from '../../src/screening/survey.js';
import { visitsOf } from '../../src/screening/survey-outlook.js';
import { loadStudy } from '../../src/study/load.js';
import { MADE, demoCopy } from '../support/study-folder.js';

type Summary = ScreenOutcome['summary'];
type Row = Record<string, string | number | null>;

/** Screens the study at `path` and gives the buildings asked for as they are kept. */
async function screened(
  path: string,
  ids: readonly string[],
  outlook = true,
): Promise<{
  readonly rows: Row[];
  readonly inventory: string;
  readonly told: Pick<CheckedStudy, 'attributes' | 'findings'>;
  readonly survey: Summary['survey'];
}> {
  const loaded = await loadStudy(path);
  const db = await openStudyDatabase(loaded);
  try {
    const { taken, summary } = await screen(db, loaded, { made: MADE, outlook });
    const rows = await db.rows<Row>(
      `SELECT id, CAST(system AS VARCHAR) AS system, system_origin, storeys_above, storeys_above_origin, height_m, height_m_origin,
         occupants_peak, year_built, findings FROM building WHERE inventory_id = ? AND id IN (${ids.map((id) => `'${id}'`).join(', ')}) ORDER BY id`,
      [taken.inventoryId],
    );
    const findings = await findingCounts(db, taken.inventoryId);
    return {
      rows,
      inventory: taken.inventoryId,
      told: { attributes: summary.attributes, findings },
      survey: summary.survey,
    };
  } finally {
    db.close();
  }
}

/** The study of the demo over three rows of two lots, merged, with neither systems nor uses. */
function small(): string {
  return demoCopy({
    inventory: () => 'lot,area,year\nL1,400,1950\nL1,600,1950\nL2,500,1960\n',
    study: (text) =>
      text
        .replace(
          /columns:\n(?: {4}.*\n)+/,
          'columns:\n    id: lot\n    floor_area_m2: area\n    year_built: year\n  merge_rows_by: lot\n',
        )
        .replace(/^ {2}no_building:.*\n(?: {4}.*\n)*/m, '')
        .replace(/^neighbours:.*\n(?: .*\n)*/m, '')
        .replace(/list_size: \d+/, 'list_size: 1')
        .replace(/^budget:\n(?: .*\n)*/m, ''),
  });
}

function sheet(path: string, text: string): string {
  const file = join(dirname(path), 'back.csv');
  writeFileSync(file, text);
  return file;
}

describe('takeAnswers', () => {
  it(
    'lays answers over the inventory from the next screening on, and leaves the file of the owner alone',
    { timeout: 120_000 },
    async () => {
      const path = demoCopy();
      const inventory = readFileSync(join(dirname(path), 'inventory.csv'), 'utf8');
      const before = await screened(path, ['BH-006', 'BH-024'], false);
      const file = sheet(
        path,
        '\ufeffid,system,height_m,storeys_above,occupants_peak,visit,surveyor,surveyed_on\r\nBH-006,concrete shear wall,–,?,,street,N. N.,2026-06-03\r\nBH-024,–,41 ft,3,12,street,N. N.,2026-06-03\r\n',
      );
      expect(await takeAnswers(path, file, MADE)).toEqual({
        answers: 4,
        buildings: 2,
        columns: { system: 1, height_m: 1, storeys_above: 1, occupants_peak: 1 },
        not_found: { storeys_above: 1 },
        on_record: 0,
        answered_later: 0,
        not_read: [],
      });
      const after = await screened(path, ['BH-006', 'BH-024'], false);
      expect(after.inventory).not.toBe(before.inventory);
      expect(readFileSync(join(dirname(path), 'inventory.csv'), 'utf8')).toBe(inventory);
      expect(before.rows[0]).toMatchObject({ id: 'BH-006', system_origin: 'unknown' });
      expect(after.rows[0]).toMatchObject({ id: 'BH-006', system: 'concrete-shear-wall', system_origin: 'given' });
      // 41 ft × 0.3048, by hand
      expect(after.rows[1]).toMatchObject({
        id: 'BH-024',
        storeys_above: 3,
        storeys_above_origin: 'given',
        occupants_peak: 12,
      });
      expect(after.rows[1]?.['height_m']).toBeCloseTo(12.4968, 9);
      expect(after.rows[1]?.['height_m_origin']).toBe('given');
      // the hand calculation names who found a value, in place of the owner's table
      const { steps } = await withStudyDatabase(path, (db) => explainBuilding(db, 2, 'BH-024', 'si'));
      const sourceOf = (title: string) => steps.find((step) => step.title === title)?.source;
      expect(sourceOf('storeys')).toBe('street visit of 2026-06-03 by N. N.');
      expect(sourceOf('height')).toBe('street visit of 2026-06-03 by N. N.');
      const others = steps.filter(({ source }) => source === 'from the inventory').map(({ title }) => title);
      expect(others).not.toContain('occupants peak');
      // what was not asked stays as it was
      expect(after.rows[0]?.['year_built']).toBe(before.rows[0]?.['year_built']);
      expect(Number(after.rows[0]?.['findings'])).toBe(Number(before.rows[0]?.['findings']) + 1);
      // what was not found leaves no trace in the inventory
      expect(after.rows[0]?.['storeys_above']).toBe(before.rows[0]?.['storeys_above']);
      expect(after.rows[0]?.['storeys_above_origin']).toBe(before.rows[0]?.['storeys_above_origin']);
    },
  );

  it(
    'answers columns that the inventory does not have, and buildings of several rows once',
    { timeout: 120_000 },
    async () => {
      const path = small();
      const before = await screened(path, ['L1']);
      expect(before.rows[0]).toMatchObject({ system_origin: 'unknown', occupants_peak: null });
      await takeAnswers(
        path,
        sheet(path, 'id,system,occupants_peak,storeys_above\nL1,timber-light-frame,25,4\n'),
        MADE,
      );
      const after = await screened(path, ['L1', 'L2']);
      // 25, not 25 for each of its two rows
      expect(after.rows[0]).toMatchObject({
        id: 'L1',
        system: 'timber-light-frame',
        occupants_peak: 25,
        storeys_above: 4,
      });
      expect(after.rows[1]).toMatchObject({ id: 'L2', system_origin: 'unknown', occupants_peak: null });
    },
  );

  it(
    'withdraws answers for a building or a question and keeps them on record; check reads what screen will',
    { timeout: 120_000 },
    async () => {
      const path = small();
      const before = await screened(path, ['L1', 'L2']);
      const given =
        'id,visit,surveyor,surveyed_on,system,storeys_above,height_m,occupants_peak\nL1,street,N. N.,2026-06-03,timber-light-frame,4,?,25\nL2,street,,,concrete-shear-wall,,,\n';
      await takeAnswers(path, sheet(path, given), MADE);
      await takeAnswers(path, sheet(path, 'id,visit,system\nL1,desk,concrete-shear-wall\n'), MADE);
      const stated = async (): Promise<unknown> =>
        (await listAnswers(path)).map((one) => [
          one.id,
          one.column,
          one.cell,
          one.visit,
          one.withdrawn !== null,
          one.counts,
        ]);
      expect(await stated()).toEqual([
        ['L1', 'system', 'timber-light-frame', 'street', false, false],
        ['L1', 'storeys_above', '4', 'street', false, true],
        ['L1', 'height_m', null, 'street', false, true],
        ['L1', 'occupants_peak', '25', 'street', false, true],
        ['L1', 'system', 'concrete-shear-wall', 'desk', false, true],
        ['L2', 'system', 'concrete-shear-wall', 'street', false, true],
      ]);

      // check tells of the inventory that the next screening sees, out of a database that it only reads
      const database = join(dirname(path), 'study.duckdb');
      const bytes = readFileSync(database);
      const checked = await checkStudy(path);
      expect(readFileSync(database).equals(bytes)).toBe(true);
      expect(checked.account[0]?.title).toMatch(/not yet ranked$/);
      const answered = await screened(path, ['L1', 'L2']);
      expect(answered.inventory).not.toBe(before.inventory);
      expect({ attributes: checked.attributes, findings: checked.findings }).toEqual(answered.told);
      expect(checked.findings.find(({ code }) => code === 'survey-answer')).toMatchObject({ count: 4 });
      expect(checked.attributes.find(({ attribute }) => attribute === 'system')).toMatchObject({
        given: 2,
        unknown: 0,
      });
      expect(answered.rows[0]).toMatchObject({ system: 'concrete-shear-wall', storeys_above: 4, occupants_peak: 25 });

      // one question: both answers to it go, and nothing else
      const gone = await withdrawAnswers(path, { id: 'L1', question: 'system' }, MADE);
      expect(gone.map(({ cell, withdrawn }) => [cell, withdrawn])).toEqual([
        ['timber-light-frame', MADE.toISOString()],
        ['concrete-shear-wall', MADE.toISOString()],
      ]);
      const less = await checkStudy(path);
      expect(less.attributes.find(({ attribute }) => attribute === 'system')).toMatchObject({ given: 1, unknown: 1 });
      expect(less.findings.find(({ code }) => code === 'survey-answer')).toMatchObject({ count: 3 });
      const withdraw = (id: string, question?: string): Promise<unknown> =>
        withdrawAnswers(path, { id, question }, new Date('2027-01-01T00:00:00Z'));
      for (const [id, question, key, message] of [
        [
          'L3',
          undefined,
          '--withdraw',
          'no answers are held for "L3" (did you mean "L1"?); `swaymark survey --answers`',
        ],
        ['L1', 'colour', '--question', '"colour" is nothing that surveys answer; known: system, year'],
        ['L2', 'occupants', '--question', 'nothing is held on "occupants" for "L2"; there is something on: system'],
        ['L1', 'system', '--withdraw', 'what is held on "system" for "L1" was withdrawn before, on 2026-06-11'],
      ] as const)
        await expect(withdraw(id, question)).rejects.toMatchObject({
          place: { key },
          message: expect.stringContaining(message) as string,
        });
      // all answers: the owner's cells are read again, and it is the inventory of before; of two columns of a question one may be named
      expect(((await withdraw('L1', 'storeys_above')) as unknown[]).length).toBe(1);
      await withdraw('L1', 'occupants');
      await withdraw('L2');
      const spellings =
        'id,visit,system,use,soft_storey,year_built\nL2,desk,?,Not  Found,,\nL2,street,unknown,–,,Unknown\n';
      expect(await takeAnswers(path, sheet(path, spellings), MADE)).toEqual({
        answers: 0,
        buildings: 1,
        columns: {},
        not_found: { system: 2, use: 1, year_built: 1 },
        on_record: 0,
        answered_later: 0,
        not_read: [],
      });
      const after = await screened(path, ['L1', 'L2']);
      expect({ ...after, survey: null }).toEqual({ ...before, survey: null });
      // but the week of visits told with the run no longer counts on those that failed
      const asks = ({ survey }: typeof after, id: string, visit: string): readonly string[] =>
        survey?.steps.find((step) => step.id === id && step.visit === visit)?.asks ?? [];
      expect(asks(before, 'L1', 'street')).toEqual(['system', 'height', 'irregularity', 'use']);
      expect(asks(after, 'L1', 'street')).toEqual(['system', 'irregularity', 'use']);
      expect(asks(after, 'L1', 'drawings')).toContain('height');
      expect(asks(before, 'L2', 'desk')).toEqual(expect.arrayContaining(['system', 'use']));
      expect(asks(after, 'L2', 'desk')).not.toEqual(expect.arrayContaining(['system']));
      expect(asks(after, 'L2', 'desk')).not.toEqual(expect.arrayContaining(['use']));
      // the rest of L1 is what could not be found out
      expect(((await withdraw('L1')) as unknown[]).length).toBe(1);
      await expect(withdraw('L1')).rejects.toThrow('all that is held for "L1" was withdrawn before, on 2027-01-01');
      expect(await stated()).toHaveLength(10);
    },
  );

  it('says of every cell what is wrong, and takes nothing', { timeout: 60_000 }, async () => {
    const path = small();
    await screened(path, ['L1']);
    const of = (text: string): Promise<unknown> => takeAnswers(path, sheet(path, text), MADE);
    await expect(of('id,system,height_m\nL1,brickish,tall\n')).rejects.toMatchObject({
      problems: [
        {
          place: { row: 2, columnName: 'system' },
          message: expect.stringContaining('"brickish" is not a word of system') as string,
        },
        { place: { row: 2, columnName: 'height_m' }, message: expect.stringContaining('"tall"') as string },
      ],
    });
    await expect(of('id,system\n,concrete-shear-wall\n')).rejects.toThrow('without the id');
    await expect(of('id,system\nNOWHERE,concrete-shear-wall\n')).rejects.toThrow(
      '"NOWHERE" is no building of the newest run',
    );
    await expect(of('id,colour\nL1,red\n')).rejects.toThrow('none of the columns that answer something');
    await expect(of('name,system\nL1,x\n')).rejects.toThrow('no column id');
    await expect(of('id,system\nL1,–\n')).rejects.toThrow('answers nothing');
    await expect(of('id,system,use,visit\nL1,?,?,\nL1,?,,aerial\n')).rejects.toMatchObject({
      problems: [
        {
          place: { row: 2, columnName: 'visit' },
          message:
            'system is "?", looked for and not found, and no kind of visit is named: name the one that looked (desk, street, drawings), or leave cells blank where nobody looked',
        },
        {
          place: { row: 3, columnName: 'visit' },
          message: expect.stringContaining('"aerial" is no kind of visit of the study') as string,
        },
      ],
    });
    // all faults at once: MADE lies in 2026
    const faults =
      'id;year_built;system;visit;surveyed_on\nX9;2050;;;\nL1;;timber-light-frame;moon;\nL1;;concrete-shear-wall;;\nL2;2025;;;2024-05-01\n';
    for (const mark of [';', '\t', ','])
      await expect(of(faults.replaceAll(';', mark))).rejects.toMatchObject({
        problems: [
          { place: { row: 2, columnName: 'id' }, message: '"X9" is no building of the newest run' },
          { place: { row: 2, columnName: 'year_built' }, message: expect.stringContaining('after 2026') as string },
          {
            place: { row: 3, columnName: 'visit' },
            message:
              '"moon" is no kind of visit of the study; write one of desk, street, drawings, or leave the cell blank',
          },
          { place: { row: 5, columnName: 'year_built' }, message: expect.stringContaining('after 2024') as string },
          {
            place: { row: 4, columnName: 'system' },
            message: expect.stringContaining('of which row 3 says "timber-light-frame"') as string,
          },
        ],
      });
    const loaded = await loadStudy(path);
    const db = await openStudyDatabase(loaded);
    expect(await db.value('SELECT count(*) FROM survey_answer')).toBe(0);
    db.close();
  });

  it(
    'refuses headings close to ours and columns that stand twice, and tells which others it does not read',
    { timeout: 60_000 },
    async () => {
      const path = small();
      await screened(path, ['L1']);
      const of = (text: string): Promise<unknown> => takeAnswers(path, sheet(path, text), MADE);
      const meant = (heading: string, at: number, ours: string): object => ({
        place: { row: 1 },
        message: `"${heading}", column ${String(at)}, is no column of a sheet of answers (did you mean "${ours}"?); write it so, or name it otherwise where something else is meant`,
      });
      await expect(
        of('id,visit,system,hight_m,storeys,Remarks\nL1,street,steel-moment-frame,12,3,x\n'),
      ).rejects.toMatchObject({
        problems: [
          meant('hight_m', 4, 'height_m'),
          meant('storeys', 5, 'storeys_above'),
          meant('Remarks', 6, 'remark'),
        ],
      });
      await expect(of('ID,system\nL1,steel-moment-frame\n')).rejects.toMatchObject({
        problems: [meant('ID', 1, 'id')],
      });
      await expect(of('id,system,id,use,system\nL1,x,L1,,\n')).rejects.toMatchObject({
        problems: [
          { message: expect.stringMatching(/^"id" stands at the head of columns 1 and 3; keep/) as string },
          { message: expect.stringMatching(/^"system" stands at the head of columns 2 and 5; keep/) as string },
        ],
      });
      expect(await listAnswers(path)).toEqual([]);
      // columns of the sheets that a plan writes are passed over; an owner's own, and those of an inventory that surveys do not answer, are told
      const taken = await of(
        'place,id,fid,name,group,lon,lat,rank,visit,find out,because, system ,storeys_below,Owner,,\n1,L1,7,A,B,1,1,1,street,x,y,steel-moment-frame,1,Town,z,\n',
      );
      expect(taken).toMatchObject({ columns: { system: 1 }, not_read: ['fid', 'storeys_below', 'Owner', 'column 15'] });
    },
  );

  it(
    'refuses a design coefficient beside drawings that show no design, and days and years to come',
    { timeout: 60_000 },
    async () => {
      const path = small();
      await screened(path, ['L1']);
      const of = (text: string): Promise<unknown> => takeAnswers(path, sheet(path, text), MADE);
      const head = 'id,design_base_shear_coefficient,design_level,surveyed_on,year_built\n';
      await expect(of(`${head}L1,0.08,none,,\nL2,0.1,,,\nL2,,None,,\n`)).rejects.toMatchObject({
        problems: [
          {
            place: { row: 2, columnName: 'design_level' },
            message:
              '"none" says that the drawings show no design for earthquakes, but row 2 gives design_base_shear_coefficient "0.08" for "L1"; keep the one that holds: leave the coefficient blank, or write working or strength',
          },
          {
            place: { row: 4, columnName: 'design_level' },
            message: expect.stringContaining('but row 3 gives') as string,
          },
        ],
      });
      // MADE is 9 o'clock UTC of 11 June 2026, when it is 12 June in no place yet but 23 o'clock of the 11th in the farthest
      for (const day of ['2031-01-05', '2026-06-13', '13.6.2026', '2026-06-12'])
        await expect(of(`${head}L1,0.08,working,${day},\n`), day).rejects.toMatchObject({
          problems: [
            {
              place: { row: 2, columnName: 'surveyed_on' },
              message: `"${day}" is a day to come; the sheet is taken on 2026-06-11: write the day of the visit, or leave the cell blank`,
            },
          ],
        });
      await expect(of(`${head}L1,,,2031-01-05,2030\n`)).rejects.toMatchObject({
        problems: [
          { place: { columnName: 'surveyed_on' } },
          { message: expect.stringContaining('after 2026') as string },
        ],
      });
      await expect(of(`${head}L1,,,3.5.2020,2022\n`)).rejects.toThrow('lies after 2020');
      expect(await listAnswers(path)).toEqual([]);
      expect(await of(`${head}L1,0.08,working,11/6/2026,2026\nL2,,none,2026-06-11,\n`)).toMatchObject({ answers: 4 });
    },
  );

  it('takes no sheet twice, but again what was withdrawn', { timeout: 60_000 }, async () => {
    const path = small();
    await screened(path, ['L1']);
    const take = (text: string): ReturnType<typeof takeAnswers> => takeAnswers(path, sheet(path, text), MADE);
    const head = 'id,system,year_built,use,visit,surveyor,surveyed_on\n';
    const first = `${head}L1,concrete-shear-wall,1961,?,street,N. N.,2026-06-03\nL2,–,1970,,street,N. N.,2026-06-03\n`;
    expect(await take(first)).toMatchObject({ answers: 3, not_found: { use: 1 }, on_record: 0 });
    expect(await take(first)).toEqual({
      answers: 0,
      buildings: 0,
      columns: {},
      not_found: {},
      on_record: 4,
      answered_later: 0,
      not_read: [],
    });
    expect(await listAnswers(path)).toHaveLength(4);
    // another day is another answer, the sheet before it is old news, and a row that stands twice counts once
    const later = `${head}L1,–,1962,,street,N. N.,2026-06-04\nL1,–,1962,,street,N. N.,2026-06-04\n`;
    expect(await take(later)).toMatchObject({ answers: 1, on_record: 1 });
    expect(await take(first)).toMatchObject({ answers: 0, on_record: 4, answered_later: 1 });
    const counting = async (): Promise<unknown> =>
      (await listAnswers(path))
        .filter(({ counts, column }) => counts && column === 'year_built')
        .map(({ cell }) => cell);
    expect(await counting()).toEqual(['1962', '1970']);
    await withdrawAnswers(path, { id: 'L1' }, MADE);
    expect(await take(first)).toMatchObject({ answers: 2, not_found: { use: 1 }, on_record: 1 });
    expect(await counting()).toEqual(['1961', '1970']);
  });

  it('refuses a day that no calendar has', { timeout: 60_000 }, async () => {
    const path = small();
    await screened(path, ['L1']);
    await expect(
      takeAnswers(path, sheet(path, 'id,system,surveyed_on\nL1,timber-light-frame,31/31/2020\n'), MADE),
    ).rejects.toMatchObject({
      place: { row: 2, columnName: 'surveyed_on' },
      message: '"31/31/2020" is no day of the calendar; write it like 2026-12-03, or leave the cell blank',
    });
    expect(await listAnswers(path)).toEqual([]);
  });

  it('takes the sheet that a plan wrote, filled in', { timeout: 60_000 }, async () => {
    const path = demoCopy();
    const loaded = await loadStudy(path);
    const db = await openStudyDatabase(loaded);
    const { runId } = await screen(db, loaded, { made: MADE });
    const plan = await planSurvey(db, runId, {
      visits: visitsOf(loaded.study),
      limits: { hours: 10, money: Infinity },
    });
    db.close();
    const [head = '', ...lines] = fieldSheet(plan).replace('\ufeff', '').trimEnd().split('\r\n');
    const at = head.split(',').indexOf('system');
    const asked = plan.steps.filter(({ asks }) => asks.includes('system')).length;
    const filled = lines.map((line) => {
      const cells = line.match(/(?:"(?:[^"]|"")*"|[^,]*)(?:,|$)/g)!.map((cell) => cell.replace(/,$/, ''));
      if (cells[at] === '') cells[at] = 'steel-moment-frame';
      return cells.slice(0, head.split(',').length).join(',');
    });
    const taken = await takeAnswers(path, sheet(path, `\ufeff${[head, ...filled].join('\r\n')}\r\n`), MADE);
    expect(taken.columns).toEqual({ system: asked });
  });
});

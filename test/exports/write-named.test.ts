import { existsSync, linkSync, mkdirSync, readFileSync, symlinkSync, writeFileSync } from 'node:fs';
import { dirname, join, relative } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { review } from '../../src/cli/commands/review.js';
import { calculate, methodCalled } from '../../src/engineering/calc.js';
import { UserError } from '../../src/errors.js';
import { budgetStudy } from '../../src/exports/budget-study.js';
import { checkStudy } from '../../src/exports/check-study.js';
import { withdrawAnswers } from '../../src/exports/held-answers.js';
import { measureFile } from '../../src/exports/measure-record.js';
import { restsOf } from '../../src/exports/rests.js';
import { reviewSheet } from '../../src/exports/review.js';
import { sensitivityStudy } from '../../src/exports/sensitivity-study.js';
import { drawCalculation, writeSpectra } from '../../src/exports/spectrum-files.js';
import { surveyStudy } from '../../src/exports/survey-study.js';
import { takeAnswers } from '../../src/exports/take-answers.js';
import { NamedFile } from '../../src/exports/write-named.js';
import { withStudyDatabase } from '../../src/runs/open.js';
import { loadStudy, studyFromText } from '../../src/study/load.js';
import { SMALL_STUDY, scratch, writeSmallStudy } from '../support/cli.js';
import { screenedDemo } from '../support/screened-demo.js';
import { MADE } from '../support/study-folder.js';

// No outside source for these checks: which files are the owner's is our own contract. Every file is a real one.

const INPUTS = ['inventory.csv', 'neighbours.csv', 'system-prior.csv', 'study.yaml', 'study.duckdb'] as const;

async function refused(work: () => Promise<unknown>, file: string, words: RegExp): Promise<void> {
  const bytes = (): string => (existsSync(file) ? readFileSync(file).toString('latin1') : 'no file');
  const before = bytes();
  const error = await work().then(
    () => null,
    (cause: unknown) => cause,
  );
  expect(error, file).toBeInstanceOf(UserError);
  expect((error as UserError).message).toMatch(words);
  expect(bytes() === before, file).toBe(true);
}

describe('restsOf', () => {
  it('names every file that a study stands on', () => {
    const text = `${SMALL_STUDY}
neighbours: {file: near.csv}
system_prior: ../prior.csv
`
      .replace(
        '    design:',
        '    own: {code: table-file, file: own.csv, interpolation: linear}\n    grid: {code: hazard-grid, file: grid.parquet, interpolation: linear}\n    design:',
      )
      .replace(
        /code_history:\n(?: .*\n)*/,
        'code_history:\n  place: Here\n  family: own-table\n  seismic_design_enforced_from: 1952\n  adoption_lag_years: 2\n  table_file: eras.csv\n',
      );
    const loaded = studyFromText(text, join('town', 'study.yaml'));
    expect(restsOf(loaded).map(({ name }) => name)).toEqual([
      'study.yaml',
      'study.duckdb',
      'study.duckdb.wal',
      'houses.csv',
      'near.csv',
      '../prior.csv',
      'eras.csv',
      'own.csv',
      'grid.parquet',
    ]);
  });

  it('names them of a study whose tables have been read', async () => {
    const place = scratch();
    writeSmallStudy(place.folder);
    writeFileSync(join(place.folder, 'own.csv'), 'period_s,sa_g\n0,0.4\n1,0.2\n');
    const path = join(place.folder, 'study.yaml');
    writeFileSync(
      path,
      SMALL_STUDY.replace(
        '    design:',
        '    own: {code: table-file, file: own.csv, interpolation: linear}\n    design:',
      ),
    );
    const loaded = await loadStudy(path);
    expect(restsOf(loaded).map(({ name }) => name)).toContain('own.csv');
    await refused(
      () => writeSpectra(loaded, ['design'], [], { csv: join(place.folder, 'own.csv') }),
      join(place.folder, 'own.csv'),
      /^--csv would be written over the table of spectrum own of study\.yaml \(hazard\.spectra\.own\.file\); name another file$/,
    );
    place.remove();
  });
});

describe('NamedFile', () => {
  const place = scratch();
  const at = (...names: string[]): string => join(place.folder, ...names);
  const claim = (path: string): Promise<NamedFile> => NamedFile.claim(path, '--csv', { study: null });
  beforeAll(() => {
    writeSmallStudy(place.folder);
    mkdirSync(at('sub'));
    symlinkSync(at('houses.csv'), at('link.csv'));
    symlinkSync(place.folder, at('sub', 'up'));
    linkSync(at('houses.csv'), at('twin.csv'));
  });
  afterAll(() => {
    place.remove();
  });

  it('spares the files of a study in the folder, however they are spelt, and those that are not there yet', async () => {
    for (const path of [
      at('houses.csv'),
      `${place.folder}/./sub/../houses.csv`,
      relative(process.cwd(), at('houses.csv')),
      at('link.csv'),
      at('twin.csv'),
      at('sub', 'up', 'houses.csv'),
    ])
      await refused(() => claim(path), at('houses.csv'), /^--csv would be written over the inventory of study\.yaml/);
    await refused(() => claim(at('study.duckdb')), at('study.duckdb'), /the database of the runs and answers/);
    await refused(
      () => claim(at('sub', 'up', 'study.yaml')),
      at('study.yaml'),
      /over the study file; name another file/,
    );
  });

  it('spares a study that has a fault for now, and writes over what is none of a study', async () => {
    writeFileSync(at('other.yaml'), `${SMALL_STUDY}\nfault: 1\n`);
    writeFileSync(at('notes.yaml'), 'a: 1\n');
    await refused(() => claim(at('other.yaml')), at('other.yaml'), /over the study file/);
    await (await claim(at('notes.yaml'))).write('x');
    expect(readFileSync(at('notes.yaml'), 'utf8')).toBe('x');
    await (await claim(at('new', 'list.csv'))).write('y');
    expect(readFileSync(at('new', 'list.csv'), 'utf8')).toBe('y');
  });

  it('spares the record that is measured, and what lies around a calculation', async () => {
    writeFileSync(at('record.csv'), 'time,acc\n0,1\n');
    const record = at('record.csv');
    await refused(
      () => measureFile(record, { svg: record }),
      record,
      /^--svg would be written over the record that is measured/,
    );
    const method = methodCalled('asce7-22/spectrum/two-period');
    const inputs = ['sds_g=0.8', 'sd1_g=0.4', 'tl_s=8', 'period_s=1'];
    await refused(() => drawCalculation(calculate(method, inputs), at('houses.csv')), at('houses.csv'), /^--svg would/);
  });
});

describe('options that name a file', () => {
  let path = '';
  const at = (name: string): string => join(dirname(path), name);
  beforeAll(async () => {
    path = await screenedDemo();
  }, 60_000);

  it('spare what the study stands on in every command', { timeout: 60_000 }, async () => {
    const loaded = await loadStudy(path);
    const [spectrum = ''] = Object.keys(loaded.study.hazard.spectra);
    for (const name of INPUTS) {
      const csv = at(name);
      for (const work of [
        () => surveyStudy(path, { hours: 1, csv, page: false }),
        () => budgetStudy(path, 200_000, { csv }),
        () => sensitivityStudy(path, { only: ['slope'], csv }),
        () => writeSpectra(loaded, [spectrum], [], { csv }),
      ])
        await refused(work, csv, /^--csv would be written over the /);
      await refused(() => writeSpectra(loaded, [spectrum], [], { svg: csv }), csv, /^--svg would be written over the /);
    }
  });

  it('spare what the study stands on where reports have fixed names', { timeout: 60_000 }, async () => {
    const text = readFileSync(path, 'utf8');
    for (const [name, work] of [
      ['rejects.csv', () => checkStudy(path, { output: dirname(path) })],
      ['review.csv', () => review({ sample: 1, units: 'si', output: dirname(path), study: path })],
      ['survey-1.html', () => surveyStudy(path, { hours: 1, output: dirname(path) })],
    ] as const) {
      writeFileSync(at(name), readFileSync(at('system-prior.csv')));
      writeFileSync(path, text.replace(/^system_prior: .*$/m, `system_prior: ${name}`));
      await refused(
        work,
        at(name),
        /^the reports would be written over .*, the table of system chances of study\.yaml;/,
      );
    }
    writeFileSync(path, text);
  });

  it('spare a sheet with answers that have not come in, until they have', { timeout: 120_000 }, async () => {
    const csv = at('field.csv');
    const again = (): Promise<unknown> => surveyStudy(path, { hours: 1, csv, page: false });
    await again();
    // an untouched sheet may be replaced
    await again();
    const untouched = readFileSync(csv, 'utf8');
    const [head = '', first = '', ...rest] = untouched.split('\r\n');
    const columns = head.replace('\ufeff', '').split(',');
    const filled = (cells: Readonly<Record<string, string>>): string => {
      const row = first.match(/("[^"]*"|[^,]*)(,|$)/g)!.map((cell) => cell.replace(/,$/, ''));
      for (const [name, cell] of Object.entries(cells)) row[columns.indexOf(name)] = cell;
      return [head, row.slice(0, columns.length).join(','), ...rest].join('\r\n');
    };
    const answer = { use: 'school', surveyor: 'N. N.' };
    const row2 =
      /^--csv would be written over a sheet that a survey has filled in, with answers that the study does not have; bring them in first with `swaymark survey --take`, or name another file$/;
    writeFileSync(csv, filled(answer));
    await refused(again, csv, row2);
    await refused(() => budgetStudy(path, 200_000, { csv }), csv, row2);
    // saved again by a spreadsheet: semicolons, UTF-16
    writeFileSync(csv, Buffer.from(filled(answer).replaceAll(',', ';'), 'utf16le'));
    await refused(again, csv, row2);
    // an answer that cannot be read has not come in either
    writeFileSync(csv, filled({ use: 'shoool' }));
    await refused(again, csv, row2);
    writeFileSync(csv, filled({ remark: 'locked' }));
    await refused(again, csv, /with a remark that is kept nowhere else; name another file$/);
    writeFileSync(csv, filled(answer));
    await takeAnswers(path, csv, MADE);
    await again();
    const [taken] = /^[^,]*,([^,]*)/.exec(first)!.slice(1);
    await withdrawAnswers(path, { id: taken! }, MADE);
    writeFileSync(csv, filled(answer));
    // withdrawn, and on record all the same
    await again();
    expect(readFileSync(csv, 'utf8')).toContain(head);
  });

  it('spare a review sheet in which somebody has checked', { timeout: 60_000 }, async () => {
    const { csv } = await withStudyDatabase(path, (db) => reviewSheet(db, 1, 1));
    const file = at('review.csv');
    const again = (): Promise<number> => review({ sample: 1, units: 'si', output: dirname(path), study: path });
    writeFileSync(file, csv);
    expect(await again()).toBe(0);
    // by whatever hand: the last line gains a column of our heading
    const lines = csv.trimEnd().split('\r\n');
    const at12 = lines[1]!.match(/("(?:[^"]|"")*"|[^,]*)(,|$)/g)!;
    at12[11] = '0.75,';
    writeFileSync(file, [lines[0], at12.join(''), ...lines.slice(2), ''].join('\r\n'));
    await refused(again, file, /in which somebody has checked steps; give that file another name/);
  });
});

import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { SYSTEMS } from '../../src/engineering/building.js';
import { UserError, formatError } from '../../src/errors.js';
import { settingsOf } from '../../src/screening/settings.js';
import { loadStudy, studyFromText } from '../../src/study/load.js';
import { loadOwnTable, ownTableFromText } from '../../src/study/own-table-file.js';
import { SAMPLE } from './sample.js';

const complaintsOf = (work: () => unknown): readonly string[] => {
  try {
    work();
  } catch (error) {
    if (error instanceof UserError) return formatError(error).split('\n');
    throw error;
  }
  return [];
};

const US = SAMPLE.slice(SAMPLE.indexOf('  family: us'));
const withTable = (...lines: readonly string[]): string =>
  SAMPLE.replace(
    US,
    ['  family: own-table', '  seismic_design_enforced_from: 1950', ...lines.map((line) => `  ${line}`), ''].join('\n'),
  );

const ROWS = [
  'table:',
  '  - {from_year: 1950, level: working, coefficient: 0.05, source: city archive}',
  '  - from_year: 1975',
  '    level: strength',
  '    by_system: {concrete-moment-frame: 0.08}',
  '    reduction: 4',
  '    period: {coefficient: 0.075, exponent: 0.75, corner_s: 0.5, fall: 1}',
];

const CSV = `from_year,system,coefficient,level,reduction,period_coefficient,period_exponent,corner_s,fall,source
1975,concrete-moment-frame,0.08,strength,4,0.075,0.75,0.5,1,
1950,,0.05,working,,,,,,city archive
`;

describe('code_history of family own-table', () => {
  it('reads rows in the study, and the same from a file beside it', async () => {
    const folder = mkdtempSync(join(tmpdir(), 'own-table-'));
    writeFileSync(join(folder, 'eras.csv'), CSV);
    writeFileSync(join(folder, 'study.yaml'), withTable('table_file: eras.csv'));
    const settings = await settingsOf(await loadStudy(join(folder, 'study.yaml')), []);
    const rows = studyFromText(withTable(...ROWS)).study.code_history;
    expect(settings.codeHistory?.table).toEqual('table' in rows ? rows.table : null);
    expect(settings.codeHistory?.table).toEqual([
      { from_year: 1950, level: 'working', coefficient: 0.05, source: 'city archive' },
      {
        from_year: 1975,
        level: 'strength',
        by_system: { 'concrete-moment-frame': 0.08 },
        reduction: 4,
        period: { coefficient: 0.075, exponent: 0.75, corner_s: 0.5, fall: 1 },
      },
    ]);
    rmSync(folder, { recursive: true });
  });

  it('says at its place what is wrong with a row', () => {
    const line = SAMPLE.slice(0, SAMPLE.indexOf(US)).split('\n').length;
    const bad = withTable(
      'table:',
      '  - {from_year: 1975, level: working, coefficient: 7}',
      '  - {from_year: 1975, level: strong, coefficient: 0.1}',
      '  - {from_year: 1990, level: strength}',
    );
    expect(complaintsOf(() => studyFromText(bad))).toEqual([
      `study.yaml:${String(line + 3)}:54 code_history.table.1.coefficient: expected a number > 0 and <= 1.5, got 7`,
      `study.yaml:${String(line + 4)}:19 code_history.table.2.from_year: expected a year after 1975, that of the row above, got 1975`,
      `study.yaml:${String(line + 4)}:32 code_history.table.2.level: unknown word "strong"; known: working, strength`,
      `study.yaml:${String(line + 5)}:7 code_history.table.3: expected a coefficient, or by_system`,
    ]);
    expect(complaintsOf(() => studyFromText(withTable()))[0]).toMatch(/code_history: own-table needs its rows/);
    expect(complaintsOf(() => studyFromText(withTable(...ROWS, 'table_file: eras.csv')))[0]).toMatch(
      /code_history\.table_file: table has the rows already/,
    );
  });
});

describe('ownTableFromText', () => {
  it('gathers the lines of a year, a blank system for all others', () => {
    const text = 'from_year,coefficient,level,system\n1960,0.04,working,\n1960,0.06,working,concrete-shear-wall\n';
    expect(ownTableFromText(text)).toEqual([
      { from_year: 1960, level: 'working', coefficient: 0.04, by_system: { 'concrete-shear-wall': 0.06 } },
    ]);
    expect(ownTableFromText(text.replaceAll(',', ';'))).toEqual(ownTableFromText(text));
  });

  it('names row and column of everything it cannot read', () => {
    const text = [
      'from_year,coefficient,level,system,period_coefficient,period_exponent,corner_s,fall',
      '1960,0.04,working,,,,,',
      '1960,0.05,working,,,,,',
      '1960,0.05,strength,concrete-shear-wall,,,,',
      '1966.5,many,firm,concrete-wall,0.05,,,',
      '1970,0.1,working',
    ].join('\n');
    expect(complaintsOf(() => ownTableFromText(text))).toEqual([
      'eras.csv row 3, column system: all others of 1960 stands above already; keep one',
      'eras.csv row 4, column from_year: level, reduction and period differ from those of the first line of 1960',
      'eras.csv row 5, column from_year: expected a year 1800 to 2100, got "1966.5"',
      'eras.csv row 5, column coefficient: expected a number > 0 and <= 1.5, got "many"',
      'eras.csv row 5, column level: expected working or strength, got "firm"',
      `eras.csv row 5, column system: unknown word "concrete-wall"; known: ${SYSTEMS.join(', ')}`,
      'eras.csv row 5, column period_exponent: expected all four numbers of the period, or none',
      'eras.csv row 6: expected 8 cells, got 3',
    ]);
    expect(complaintsOf(() => ownTableFromText('from_year,coeff,level\n'))).toHaveLength(2);
    expect(complaintsOf(() => ownTableFromText('from_year,coefficient,level\n'))).toEqual([
      'eras.csv: expected 1 to 24 years, got 0',
    ]);
  });
});

describe('loadOwnTable', () => {
  it('says which file it looked for', async () => {
    await expect(loadOwnTable('/nowhere/eras.csv')).rejects.toThrow(/table of eras/);
  });

  it('takes semicolons or tabs between the cells of the file', () => {
    for (const mark of [';', '\t']) expect(ownTableFromText(CSV.replaceAll(',', mark))).toEqual(ownTableFromText(CSV));
  });
});

import { describe, expect, it } from 'vitest';
import { UserError, formatError } from '../../src/errors.js';
import { loadSpectrumFile, spectrumFromText } from '../../src/study/spectrum-file.js';
import type { SpectrumFile, SpectrumFileOptions } from '../../src/study/spectrum-file.js';

// The layouts are common practice of hazard services and spreadsheets, no source; the values are invented.
const read = (text: string, options?: SpectrumFileOptions): SpectrumFile =>
  spectrumFromText(text, 'hazard.csv', options);

function complaints(text: string, options?: SpectrumFileOptions): string[] {
  try {
    read(text, options);
  } catch (error) {
    if (error instanceof UserError) return formatError(error).split('\n');
    throw error;
  }
  return [];
}

const PERIODS = [0, 0.2, 1];
const ORDINATES = [0.4, 1, 0.35];

describe('spectrumFromText', () => {
  it('reads two columns with a heading that names the unit, and says so', () => {
    const expected = { periods_s: PERIODS, ordinates_g: ORDINATES };
    expect(read('T (s),Sa (g)\n0,0.4\n0.2,1.0\n1.0,0.35\n')).toEqual({
      ...expected,
      unit: 'g',
      statements: ['two columns', 'unit g as the heading says'],
    });
    expect(read('\ufeffperiod_s\tsa_g\r\n0\t0.4\r\n0.2\t1\r\n1\t0.35\r\n')).toMatchObject(expected);
    expect(read('# a service\n# made today\n\nPeriod;SA [g];\n0;0.4;\n\n0.2;1;\n1;3.5e-1;')).toMatchObject(expected);
    expect(read('Sa, g;Periodo, s\n0,4;0\n1,0;0,2\n0,35;1')).toMatchObject({
      ...expected,
      statements: ['two columns, the second of periods', 'unit g as the heading says', 'commas for decimals'],
    });
    expect(read('Site class C\nPeriod;Sa\ns;g\n0;0.4\n0.2;1\n1;0.35')).toMatchObject(expected);
  });

  it('reads a table without heading when the study says the unit', () => {
    expect(read('0,0.4\n.2,1.\n1,0.35', { unit: 'g' })).toMatchObject({
      periods_s: PERIODS,
      ordinates_g: ORDINATES,
      statements: ['two columns', 'unit g as the study says'],
    });
    expect(read('"0,0","40,0"\n"0,2","100,0"', { unit: '%g' }).ordinates_g).toEqual([0.4, 1]);
  });

  it('turns every unit into g', () => {
    // standard gravity 9.80665 m/s² (ISO 80000-3)
    const cases = [
      ['Sa (m/s2)', 9.80665],
      ['Sa [m/s^2]', 9.80665],
      ['Sa m/s²', 9.80665],
      ['sa_m_per_s2', 9.80665],
      ['Sa (cm/s2)', 980.665],
      ['PSA (gal)', 980.665],
      ['PSA (%g)', 100],
      ['Sa, percent of g', 100],
      ['Sa (g)', 1],
    ] as const;
    for (const [heading, one] of cases)
      expect(read(`"T, s","${heading}"\n0.1,${String(one)}\n1,${String(one / 2)}`).ordinates_g, heading).toEqual([
        1, 0.5,
      ]);
  });

  it('reads a row of periods over a row of ordinates', () => {
    for (const text of [
      '0,0.2,1\n0.4,1,0.35',
      'Period (s),0,0.2,1\nSa (g),0.4,1,0.35',
      'name,lon,PGA,SA(0.2),SA(1.0)\nhere,there,0.4,1,0.35',
      'PGA;T = 0,2 s;T = 1 s\n0,4;1;0,35',
    ])
      expect(read(text, text.includes('(g)') ? {} : { unit: 'g' })).toMatchObject({
        periods_s: PERIODS,
        ordinates_g: ORDINATES,
      });
  });

  it('reads one row of 22 ordinates at the periods of ASCE 7-22', () => {
    const values = Array.from({ length: 22 }, (_, i) => String(0.5 + i / 100));
    const file = read(`Sa (g)\nMCE,${values.join(',')}`);
    // spectra.md 1.3
    expect(file.periods_s).toEqual([
      0, 0.01, 0.02, 0.03, 0.05, 0.075, 0.1, 0.15, 0.2, 0.25, 0.3, 0.4, 0.5, 0.75, 1.0, 1.5, 2.0, 3.0, 4.0, 5.0, 7.5,
      10.0,
    ]);
    expect(file.ordinates_g).toEqual(values.map(Number));
    expect(file.statements[0]).toContain('ASCE/SEI 7-22');
    expect(complaints(values.slice(1).join(','), { unit: 'g' })[0]).toContain(
      'one row of 21 ordinates without periods',
    );
  });

  it('reports every problem at once, by line', () => {
    const table = [
      'T,Sa (g)',
      '0.0,0.4',
      '# a remark',
      '0.2,x',
      '0.2,0.9',
      '0.1,0.8',
      '-1,0.5',
      '2,0',
      '3,85',
      '400,0.1',
    ];
    expect(complaints(table.join('\n'))).toEqual([
      'hazard.csv:4: ordinate "x": a number is expected',
      'hazard.csv:5: expected a period > 0.2, got 0.2; periods increase',
      'hazard.csv:6: expected a period > 0.2, got 0.1; periods increase',
      'hazard.csv:7: expected a period of 0 to 100 s, got -1',
      'hazard.csv:8: expected an ordinate > 0, got 0',
      'hazard.csv:9: expected an ordinate of at most 10 g, got 85 g; is the unit another?',
      'hazard.csv:10: expected a period of 0 to 100 s, got 400',
    ]);
    expect(complaints('T;Sa (g)\n0.1;0.4\n0,2;0.5')).toEqual([
      'hazard.csv:3: period "0,2": the cells above have points for decimals; write all alike',
    ]);
    expect(complaints('T,Sa (g)\n0,1,0,4\n0,2,0,5\n0,3,0,5')[0]).toBe(
      'hazard.csv:2: expected 2 cells, got 4; with commas for decimals, put semicolons between cells',
    );
    expect(complaints('T;Sa (g)\n0;0.4\n1;0.5', { interpolation: 'log-log' })).toEqual([
      'hazard.csv:2: log-log needs periods > 0, got 0; use linear or remove the row',
    ]);
    expect(complaints('PGA,SA(0.2),mean\n0.4,1,2', { unit: 'g' })).toEqual([
      'hazard.csv:1: no period in the heading "mean"',
    ]);
  });

  it('asks for the unit where nobody names it, and refuses two', () => {
    expect(complaints('T,Sa\n0,0.4\n1,0.3')).toEqual([
      'hazard.csv: the unit of the ordinates is not known: no heading names it; say unit: g, m/s2, cm/s2, %g in the study',
    ]);
    expect(complaints('T,Sa (m/s2)\n0,4\n1,3', { unit: 'g' })).toEqual([
      'hazard.csv: the heading says m/s2 and the study says g; make them alike',
    ]);
  });

  it('refuses what is no such table', () => {
    expect(complaints('')[0]).toContain('no numbers in it');
    expect(complaints('Sa,T\n')[0]).toContain('no numbers in it');
    expect(complaints('0.1,0.4', { unit: 'g' })[0]).toContain('at least two periods are needed, got 1');
    expect(complaints('Frequency (Hz),Sa (g)\n0.1,0.4\n1,0.2')[0]).toContain('is of frequencies');
    expect(complaints('T,Sa (g)\n0.1,"0.4\n1,0.2')[0]).toContain('not a table');
  });
});

describe('loadSpectrumFile', () => {
  it('names the file that is not there', async () => {
    await expect(loadSpectrumFile('none/hazard.csv')).rejects.toThrow('no such file; give the path of the table');
  });
});

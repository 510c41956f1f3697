import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { calculate, methodCalled } from '../../src/engineering/calc.js';
import { drawCalculation, drawnPeriods, writeSpectra } from '../../src/exports/spectrum-files.js';
import { readSpectrum } from '../../src/exports/spectrum-reading.js';
import { studyFromText } from '../../src/study/load.js';
import { loadSpectrumFile } from '../../src/study/spectrum-file.js';
import { SMALL_STUDY } from '../support/cli.js';

const folder = mkdtempSync(join(tmpdir(), 'swaymark-spectra-'));
afterAll(() => {
  rmSync(folder, { recursive: true, force: true });
});
const loaded = studyFromText(SMALL_STUDY);
const path = (name: string): string => join(folder, name);

describe('drawnPeriods', () => {
  it('holds every corner and every period asked for, in order', () => {
    const periods = drawnPeriods([readSpectrum(loaded, 'design', [])], [0.333, 5]);
    // own arithmetic: corners 0.1 and 0.5 s, T_L = 8 s lies beyond the 5 s asked for
    for (const period of [0, 0.1, 0.333, 0.5, 4, 5]) expect(periods).toContain(period);
    expect(periods.at(-1)).toBe(5);
    expect(periods).toEqual([...periods].sort((a, b) => a - b));
  });
});

describe('writeSpectra', () => {
  it('writes one spectrum as a table that reads back to the bit', async () => {
    await writeSpectra(loaded, ['design'], [], { csv: path('one.csv') });
    const { periods_s, ordinates_g, unit } = await loadSpectrumFile(path('one.csv'));
    expect(unit).toBe('g');
    expect(ordinates_g).toEqual(readSpectrum(loaded, 'design', periods_s).ordinates.map(({ sa_g }) => sa_g));
    expect(periods_s.length).toBeGreaterThan(200);
  });

  it('writes several side by side, at the periods asked for', async () => {
    await writeSpectra(loaded, ['design', 'table'], [1, 0.2], { csv: path('two.csv') });
    // ASCE 7-22 11.4.5.2 with SDS 0.8, SD1 0.4 (own arithmetic); the table as the study states it
    expect(readFileSync(path('two.csv'), 'utf8')).toBe(
      '\ufeffperiod_s,design sa_g,table sa_g\r\n0.2,0.8,1\r\n1,0.4,0.5\r\n',
    );
  });

  it('draws them with titles, units, a description, and a dash for each', async () => {
    const [written] = await writeSpectra(loaded, ['design', 'table'], [1], { svg: path('two.svg') });
    const svg = readFileSync(written ?? '', 'utf8');
    for (const text of ['Period T (s)', 'Spectral acceleration S_a (g)', '<title>design, table</title>'])
      expect(svg).toContain(text);
    expect(svg).toMatch(
      /<desc>Spectral acceleration over period from 0 to 4\.00 s\. design: plateau of 0\.800 g .*0\.400 g at 1\.00 s/,
    );
    expect(svg).toContain('fainter where the period is longer than the publication covers');
    expect(svg).toMatch(/stroke-dasharray="7,3"/);
    expect(svg).not.toMatch(/NaN|undefined/);
  });

  it('refuses more than can be told apart', async () => {
    await expect(writeSpectra(loaded, Array<string>(7).fill('design'), [], { svg: path('x.svg') })).rejects.toThrow(
      'at most 6 spectra',
    );
  });
});

describe('drawCalculation', () => {
  it('draws a spectrum record and refuses others', async () => {
    const id = 'en1998-1-2004/spectrum/elastic-type-1';
    const result = calculate(methodCalled(id), ['ag_g=0.25', 'ground=C', 'period_s=0.8']);
    const svg = readFileSync(await drawCalculation(result, path('calc.svg')), 'utf8');
    // EN 1998-1 (3.3): 0.25 × 1.15 × 2.5 = 0.719 g from 0.2 to 0.6 s; (3.4): × 0.6/0.8 = 0.539 g (own arithmetic)
    expect(svg).toContain('plateau of 0.719 g from 0.200 to 0.600 s, 0.539 g at 0.800 s');
    const other = calculate(methodCalled('asce7-22/period/other'), ['height_ft=93']);
    await expect(drawCalculation(other, path('none.svg'))).rejects.toThrow('is no spectrum');
  });
});

import { describe, expect, it } from 'vitest';
import { readSpectrum, spectrumNames } from '../../src/exports/spectrum-reading.js';
import { studyFromText } from '../../src/study/load.js';
import { SMALL_STUDY } from '../support/cli.js';

const loaded = studyFromText(SMALL_STUDY);

describe('readSpectrum', () => {
  it('reads the ordinates with their branch', () => {
    const { ordinates, corners_s, read_by, plateau } = readSpectrum(loaded, 'design', [0.2, 1, 10]);
    // ASCE 7-22 11.4.5.2 with SDS 0.8, SD1 0.4, TL 8 (own arithmetic): plateau to 0.5 s; 0.4/1; 0.4·8/100.
    expect(ordinates.map(({ sa_g }) => sa_g)).toEqual([0.8, 0.4, 0.032]);
    expect(ordinates.map(({ clause }) => clause)).toEqual(['T0 ≤ T ≤ Ts', 'Ts < T ≤ TL', 'T > TL']);
    expect(corners_s).toEqual([0.1, 0.5, 8].map((corner) => expect.closeTo(corner, 12) as number));
    expect(plateau.sa_g).toBe(0.8);
    expect(read_by).toEqual(['design level']);
  });

  it('gives the displacement S_a g (T/2π)²', () => {
    // 0.4 g at 1 s: 0.4 · 9.80665 / 39.47842 = 0.099362 m (own arithmetic).
    expect(readSpectrum(loaded, 'design', [1]).ordinates[0]?.sd_m).toBeCloseTo(0.099362, 6);
  });

  it('marks periods beyond what the table covers', () => {
    expect(readSpectrum(loaded, 'table', [2, 3]).ordinates.map(({ beyond }) => beyond)).toEqual([false, true]);
  });

  it('names the spectra for an unknown one and refuses a negative period', () => {
    expect(() => readSpectrum(loaded, 'desgin')).toThrow(
      'unknown spectrum "desgin" (did you mean "design"?); in this study: design, table',
    );
    expect(() => readSpectrum(loaded, '__proto__')).toThrow('unknown spectrum');
    expect(() => readSpectrum(loaded, 'design', [-1])).toThrow('at least 0 s');
    expect(spectrumNames(loaded)).toEqual(['design', 'table']);
  });
});

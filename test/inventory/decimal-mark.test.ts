import { describe, expect, it } from 'vitest';
import { detectDecimal } from '../../src/inventory/decimal-mark.js';

const detect = (cells: readonly string[], delimiter = ','): ReturnType<typeof detectDecimal> =>
  detectDecimal(
    cells.map((cell, at) => [`Building ${at}, west`, cell]),
    delimiter,
    ['', '-'],
  );

// No outside source: which sign a cell can have follows from groups of three digits.
describe('detectDecimal', () => {
  it('goes by the cells that leave no choice', () => {
    expect(detect(['45,0', '3.937,5', '48,00123', '3.937', '-', '-', '-', '-', '-'])).toEqual({ mark: ',' });
    expect(detect(['45.0', '3,937.5', '3,937', '12.5 m'])).toEqual({ mark: '.' });
    expect(detect(['1.234.567', '12'])).toEqual({ mark: ',' });
    expect(detect(['1,234,567', '12'])).toEqual({ mark: '.' });
    expect(detect(['45', '46'], ';')).toEqual({ mark: '.' });
    expect(detect(['12.05.1990', '13.05.1990', 'about 1,5', 'x'])).toEqual({ mark: '.' });
  });

  it('asks where the cells disagree or leave the choice', () => {
    expect(detect(['45,0', '46,5', '12.25'])).toEqual({
      mark: ',',
      question: '2 sampled numbers have a comma for decimals (45,0), 1 have a point (12.25); which is right?',
    });
    expect(detect(['3.937'], ';')).toMatchObject({ mark: ',', question: expect.stringContaining('3.937') as string });
    expect(detect(['3,937'])).toMatchObject({ mark: '.' });
  });
});

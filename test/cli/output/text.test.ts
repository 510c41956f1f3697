import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { table } from '../../../src/cli/output/table.js';
import { progressLine } from '../../../src/cli/output/progress.js';
import { takesStyle } from '../../../src/cli/output/style.js';
import { clean, fit, pad, width, wrap } from '../../../src/cli/output/text.js';

describe('clean', () => {
  it('takes out what steers a terminal and keeps the words', () => {
    expect(clean('evil\u001b[31m\u202ename\u0007\u009b')).toBe('evil[31mname');
    expect(clean('two\r\nlines\tand\u2028more')).toBe('two lines and more');
    expect(clean('Señora Núñez 東京')).toBe('Señora Núñez 東京');
  });
});

describe('width', () => {
  it.each([
    // East Asian Width property (Unicode Annex 11): ideographs, kana, full-width forms take two columns, half-width kana one.
    ['abc', 3],
    ['東京', 4],
    ['カナ', 4],
    ['ｶﾅ', 2],
    ['Ａ', 2],
    ['e\u0301', 1],
    ['한글', 4],
    ['S_a × µ', 7],
    ['', 0],
  ])('of %j is %i', (text, columns) => {
    expect(width(text)).toBe(columns);
  });
});

describe('fit', () => {
  it('never exceeds the columns and never halves a wide character', () => {
    expect(fit('東京都庁', 5)).toBe('東京…');
    expect(fit('abcdef', 4)).toBe('abc…');
    expect(fit('abc', 3)).toBe('abc');
    fc.assert(
      fc.property(
        fc.string({ unit: 'grapheme' }),
        fc.integer({ min: 1, max: 30 }),
        (text, columns) => width(fit(clean(text), columns)) <= columns,
      ),
    );
  });
});

describe('pad', () => {
  it('fills by columns, not by characters', () => {
    expect(pad('東', 4)).toBe('東  ');
    expect(pad('7', 3, true)).toBe('  7');
  });
});

describe('wrap', () => {
  it('breaks at blanks and indents', () => {
    expect(wrap('one two three four', 9, '  ', '    ')).toEqual(['  one two', '    three', '    four']);
    expect(wrap('', 10, 'x')).toEqual(['x']);
  });
});

describe('table', () => {
  const columns = [
    { title: 'Rank', right: true },
    { title: 'Name', shrinkTo: 6 },
    { title: 'Note', spare: 1 },
  ];

  it('fits the width: cuts what may shrink, then leaves out what is spare', () => {
    const rows = [
      ['1', 'a long name indeed', 'a remark'],
      ['12', '東京都庁第一本庁舎', ''],
    ];
    for (const line of table(columns, rows, 30)) expect(width(line)).toBeLessThanOrEqual(30);
    expect(table(columns, rows, 30)).toEqual(
      ['Rank  Name          Note', '   1  a long name…  a remark', '  12  東京都庁第一…'].map(
        (line) => expect.stringContaining(line.slice(0, 14)) as string,
      ),
    );
    expect(table(columns, rows, 15)[0]).toBe('Rank  Name');
  });

  it('cleans its cells', () => {
    expect(table([{ title: 'Name' }], [['a\u001b[2Jb\nc']], 40)[1]).toBe('a[2Jb c');
  });
});

describe('takesStyle', () => {
  it('follows NO_COLOR, FORCE_COLOR and the terminal, in that order', () => {
    expect(takesStyle({ isTTY: true }, {})).toBe(true);
    expect(takesStyle({ isTTY: true }, { NO_COLOR: '1' })).toBe(false);
    expect(takesStyle({ isTTY: true }, { NO_COLOR: '' })).toBe(true);
    expect(takesStyle({ isTTY: false }, { FORCE_COLOR: '1' })).toBe(true);
    expect(takesStyle({ isTTY: true }, { FORCE_COLOR: '0' })).toBe(false);
    expect(takesStyle({ isTTY: true }, { TERM: 'dumb' })).toBe(false);
    expect(takesStyle({}, {})).toBe(false);
  });
});

describe('progressLine', () => {
  const stream = (isTTY: boolean) => {
    const written: string[] = [];
    return {
      written,
      stream: { isTTY, columns: 40, write: (text: string) => written.push(text) > 0 } as unknown as NodeJS.WriteStream,
    };
  };

  it('redraws at most ten times a second on a terminal and wipes its line', () => {
    const { written, stream: terminal } = stream(true);
    let time = 0;
    const line = progressLine(terminal, () => time);
    for (; time < 1000; time += 5) line.update({ step: 'assessing', share: time / 1000 });
    line.end();
    expect(written.length).toBeLessThanOrEqual(11);
    expect(written[0]).toContain('assessing');
    expect(written.at(-1)).toBe('\r\u001b[K');
  });

  it('is silent in a pipe', () => {
    const { written, stream: pipe } = stream(false);
    const line = progressLine(pipe);
    line.update({ step: 'assessing', share: 0.5 });
    line.end();
    expect(written).toEqual([]);
  });
});

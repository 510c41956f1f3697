import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { detectDelimiter } from '../../src/inventory/delimiter.js';
import { LINE_BREAK, RecordWriter } from '../../src/inventory/records.js';
import type { RecordTotals } from '../../src/inventory/records.js';

function cut(
  text: string,
  size = 1 << 20,
  delimiter = ',',
): { totals: RecordTotals; text: string; lineOf: (row: number) => number } {
  const parts: string[] = [];
  const writer = new RecordWriter(delimiter, (bytes) => parts.push(bytes.toString('utf8')));
  const bytes = Buffer.from(text);
  for (let at = 0; at < bytes.length; at += size) writer.push(Buffer.from(bytes.subarray(at, at + size)));
  const totals = writer.finish();
  return { totals, text: parts.join(''), lineOf: (row) => writer.lineOf(row) };
}

describe('RecordWriter', () => {
  it('gives every record its row as a spreadsheet counts it', () => {
    const { totals, text, lineOf } = cut('id,name\n\nA,"two\nlines"\nB,x\n\n\nC,"a\r\n\r\nb"\r\nD,y');
    expect(text).toBe(`3,"A","two${LINE_BREAK}lines"\n4,B,x\n7,"C","a${LINE_BREAK}${LINE_BREAK}b"\n8,D,y\n`);
    expect(totals).toMatchObject({ written: 4, headerRow: 1, header: ['id', 'name'], hasLineBreaks: true });
    expect([3, 4, 7, 8].map(lineOf)).toEqual([3, 5, 8, 11]);
  });

  it('reads LF, CRLF, CR and mixtures of them alike', () => {
    const expected = '2,A,1\n3,B,2\n';
    for (const [a, b, c] of [
      ['\n', '\n', '\n'],
      ['\r\n', '\r\n', '\r\n'],
      ['\r', '\r', '\r'],
      ['\r\n', '\n', ''],
      ['\n', '\r', '\r\n'],
    ]) {
      expect(cut(`id,n${a}A,1${b}B,2${c}`).text).toBe(expected);
    }
  });

  it('rejects a ragged row and reads on', () => {
    const { totals, text } = cut('id,n\nA,1\nB\nC,1,2\nD,4\n');
    expect(text).toBe('2,A,1\n5,D,4\n');
    expect(totals.rejects).toEqual([
      { row: 3, line: 3, code: 'ragged-row', message: 'the row has 1 cells, the header 2', value: 'B' },
      { row: 4, line: 4, code: 'ragged-row', message: 'the row has 3 cells, the header 2', value: 'C,1,2' },
    ]);
  });

  it('rejects the one row whose quote is never closed, and reads the rows below it', () => {
    const { totals, text } = cut('id,n\nA,1\nB,"open\nC,3\nD,4\n');
    expect(text).toBe('2,A,1\n4,C,3\n5,D,4\n');
    expect(totals.rejects).toEqual([
      {
        row: 3,
        line: 3,
        code: 'unterminated-quote',
        message: 'a quote opened in this row is never closed',
        value: 'B,"open',
      },
    ]);
  });

  it('rejects the row whose open quote closes in a quoted cell further down', () => {
    const { totals, text } = cut('id,n\nA,"open\nB,2\nC,"fine, here"\n');
    expect(text).toBe('3,B,2\n4,C,"fine, here"\n');
    expect(totals.rejects.map(({ row, code }) => ({ row, code }))).toEqual([{ row: 2, code: 'text-after-quote' }]);
  });

  it('keeps quotes inside a cell, doubled quotes and blanks after a closing quote', () => {
    const { text } = cut(`id,h,n\nA,5'10",x\nB,"say ""hi""",y\nC,"z" ,w\n`);
    expect(text).toBe(`2,"A","5'10""","x"\n3,B,"say ""hi""",y\n4,"C","z","w"\n`);
  });

  it('counts rows of delimiters alone as blank lines and zero bytes as blanks', () => {
    const { totals, text } = cut('id,n\n,\nA,1\0x\n,\n');
    expect(text).toBe('3,"A","1 x"\n');
    expect(totals).toMatchObject({ emptyRows: 2, zeroBytes: 1, written: 1 });
  });

  it('takes a five megabyte cell', () => {
    const long = 'x'.repeat(5_000_000);
    const { totals } = cut(`id,n\nA,"${long}"\nB,1\n`, 1 << 16);
    expect(totals.written).toBe(2);
    expect(totals.longest).toBeGreaterThan(5_000_000);
  });

  it('gives the same whatever the size of the chunks', () => {
    const piece = fc.constantFrom('a', '1', ',', '"', '""', '\n', '\r\n', '\r', ' ', 'é', '\0', ',"x\ny",');
    fc.assert(
      fc.property(fc.array(piece, { maxLength: 40 }), fc.integer({ min: 1, max: 7 }), (pieces, size) => {
        const text = `id,n\n${pieces.join('')}`;
        const whole = cut(text);
        const parts = cut(text, size);
        expect(parts.text).toBe(whole.text);
        expect(parts.totals).toEqual(whole.totals);
      }),
      { numRuns: 300, seed: 7 },
    );
  });

  it('gives back cells written with quotes, whatever they hold', () => {
    const cell = fc.string({ maxLength: 12 }).filter((text) => !text.includes('\0') && !text.includes(LINE_BREAK));
    fc.assert(
      fc.property(fc.array(fc.tuple(cell, cell), { minLength: 1, maxLength: 6 }), (rows) => {
        const quoted = rows.map((row) => row.map((text) => `"${text.replaceAll('"', '""')}"`).join(',')).join('\n');
        const { totals, text } = cut(`id,n\n${quoted}\n`);
        expect(totals.written).toBe(rows.length);
        const back = (part: string): string => part.replaceAll(/\r\n|\r|\n/g, LINE_BREAK).replaceAll('"', '""');
        const written = rows.map((row, at) => `${at + 2},${row.map((part) => `"${back(part)}"`).join(',')}`).join('\n');
        // A cell of nothing is written without quotes.
        const plain = (part: string): string => part.replaceAll(/(?<=,|^)""(?=,|$)/gm, '');
        expect(plain(text.trimEnd())).toBe(plain(written));
      }),
      { numRuns: 200, seed: 7 },
    );
  });
});

describe('detectDelimiter', () => {
  it('counts outside quotes in the first line that is not blank', () => {
    expect(detectDelimiter('\n"a;b;c",d,e\n')).toBe(',');
    expect(detectDelimiter('a;b;c\n1,2,3,4,5')).toBe(';');
    expect(detectDelimiter('a\tb\r\n')).toBe('\t');
    expect(detectDelimiter('a|b|c')).toBe('|');
    expect(detectDelimiter('id')).toBe(',');
  });
});

// The two ways to read a table must give the same; no source outside: each is the other's check.
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { inspectSource } from '../../src/inventory/source.js';
import { FORM, findStanding } from '../../src/inventory/standing.js';
import { takeIn } from '../../src/inventory/take-in.js';
import { openDatabase } from '../../src/store/database.js';
import { prepareSchema } from '../../src/store/schema.js';
import { studyOf } from '../support/inventory-intake.js';

const folder = mkdtempSync(join(tmpdir(), 'swaymark-test-'));
afterAll(() => {
  rmSync(folder, { recursive: true, force: true });
});

function written(content: string | Buffer, name = 'table.csv'): string {
  const path = join(folder, name);
  writeFileSync(path, content);
  return path;
}

const standing = (content: string | Buffer) => findStanding(inspectSource(written(content), 'auto'), 'auto');

async function takenBy(folders: readonly string[], path: string, decimal: string): Promise<unknown> {
  const db = await openDatabase({ path: ':memory:', folders });
  try {
    await prepareSchema(db);
    const columns = {
      id: 'id',
      name: 'name',
      storeys_above: 'n',
      height_m: { column: 'h', unit: 'ft' },
      floor_area_m2: 'a',
      year_built: 'y',
      use: 'u',
      count: 'c',
    };
    const study = studyOf(path, { columns, decimal });
    const taken = await db.transaction(() => takeIn(db, study, folder)).catch((error: unknown) => String(error));
    return {
      read: db.reads(path),
      taken,
      buildings: await db.rows('SELECT * FROM building ORDER BY building_index'),
      findings: await db.rows('SELECT * FROM finding'),
    };
  } finally {
    db.close();
  }
}

const HEADER = 'id,name,n,h,a,y,u,c';
// Of these a column of numbers may consist, with decimal points or without; the others each make theirs one of text.
const PLAIN = [
  '5',
  '-5',
  '0',
  '00012',
  '-0',
  '0.0',
  '5.00',
  '5.05',
  '1960.0',
  '1960.5',
  '9'.repeat(400),
  `0.${'1'.repeat(400)}`,
];
const ODD = (
  '-|.5|5.|--5|+5|1e5|0x10|1_000|inf|nan|-nan|infinity|1.2.3|1-2|1 000|1,000|1960.| 5|5 |5\t|\u00a05|5\u00a0|30 ft|3 storeys|' +
  "n/a|NULL|?|1960s|circa 1960|true|1d|5f|5L|1E5|٣|１|=1+1|'5|5%"
).split('|');

describe('a table read where it stands', () => {
  it('is read as the rewritten one, whatever its cells hold', async () => {
    const clean = 'Z1,Hall,3,30,600,1960,office,2';
    let made = 0;
    const rows = (cell: string): string[] =>
      [2, 3, 4, 5, 7].map((at) =>
        ['R' + String((made += 1)), 'x', '4', '40', '700', '1970', 'hotel', '1'].with(at, cell).join(','),
      );
    const table = (cells: readonly string[]): string => `${HEADER}\n${clean}\n${cells.flatMap(rows).join('\n')}\n`;
    const quoted = ODD.map((cell) => (cell.includes(',') ? `"${cell}"` : cell));
    // a fraction of a year; all as numbers; all but those with values outside their limits; whole numbers as text; nothing as numbers
    const files = [
      table(['1960.5', '1961.0']),
      table(['1999', '01999.00']),
      table(['5', '-5', '0', '00012', '-0', '0.0']),
      table(PLAIN),
      table(quoted),
    ];
    files.push(
      `${HEADER}\r\n${clean}\r\n"a ""b""","x, y",3,30,600,1960,"office",2\r\nC,,,,,,,\r\n`,
      `\ufeff${HEADER}\n${clean}\nB, padded ,3,30,600,1960, Office ,2\n -,-,3,30,600,1960,office,2`,
      `${HEADER}\n${clean}\nB,x,3,30,600,1960,office,2\nB,x,3,30,600,1960,office,2\nB,x,4,30,600,1960,office,2\n`,
      `${HEADER}\n${clean}\nA,${'long '.repeat(150)},3,30,600,1960,office,2\n`,
      `${HEADER}\n\n${clean}\n,,,,,,,\nA,x,3\n`,
    );
    let direct = 0;
    for (const content of files) {
      const path = written(content);
      if (findStanding(inspectSource(path, 'auto'), 'auto') !== undefined) direct += 1;
      // the other mark for the files of all forms
      for (const decimal of [3, 4].includes(files.indexOf(content)) ? ['.', ','] : ['.']) {
        const { read, ...here } = (await takenBy([folder], path, decimal)) as { read: boolean };
        const { read: not, ...rewritten } = (await takenBy([], path, decimal)) as { read: boolean };
        expect([read, not]).toEqual([true, false]);
        expect(here, JSON.stringify(content)).toEqual(rewritten);
      }
    }
    expect(direct).toBe(files.length - 1);
  }, 240_000);

  it('tells columns of plain numbers from all others', () => {
    const forms = standing('a,b,c,d,e,f\n1,-2.5,x,,"4",1.00\n22,3,5,,1,3\n')?.forms ?? [];
    const plain = FORM.empty | FORM.whole | FORM.zeros | FORM.fraction;
    expect(Array.from(forms, (form) => (form & ~plain) === 0)).toEqual([true, true, false, true, false, true]);
    expect(Array.from(forms)).toEqual([4, 36, 68, 1, 260, 20]);
    for (const [cells, fits] of [[PLAIN, true] as const, [ODD, false] as const]) {
      for (const cell of cells) {
        const [form] = standing(`a,b\n${cell.includes(',') ? `"${cell}"` : cell},x\n`)?.forms ?? [];
        expect([cell, (form! & ~plain) === 0]).toEqual([cell, fits]);
      }
    }
  });

  it('is refused where rows and lines come apart or a record must be looked at', () => {
    const fit = ['a,b\n1,2\n', 'a,b\n1,2', 'a,b\r\n1,2\r\n', 'a;b\n1;2\n', 'a,b\n"x, ""y""",2\n', '\ufeffa,b\n1,2\n'];
    for (const text of fit) expect(standing(text)?.written, text).toBe(1);
    const unfit =
      'a,b\n1,2\n\n|a,b\n\n1,2\n|\na,b\n1,2\n|a,b\n1\n|a,b\n1,2,3\n|a,b\n,\n|a,b\r\n1,2\n|a,b\n1,2\r\n|a,b\n1,2\r|a,b\n"1\n",2\n|' +
      'a,b\n"1,2\n|a,b\n"1" ,2\n|a,b\n"1"x,2\n|a,b\n1"x,2\n|a,b\n1\0,2\n|a,b\n|a,b|a\n1\n|"a\nc",b\n1,2\n|a,b\r1,2\r';
    for (const text of unfit.split('|')) expect(standing(text), JSON.stringify(text)).toBeUndefined();
    expect(standing(Buffer.from('a,b\ncaf\xe9,2\n', 'latin1'))).toBeUndefined();
  });

  it('finds the edges of chunks no obstacle', () => {
    // chunks are of 4 MiB: the rows move across the edge one byte at a time
    for (let shift = 0; shift < 12; shift += 1) {
      const text = `a,b\r\n${'x'.repeat(4 * 1024 * 1024 - 12 + shift)},1\r\n"q""q",2\r\n`;
      expect(standing(text)?.written ?? 'refused', String(shift)).toBe('refused'); // a line of megabytes
      const rows = `${'7'.repeat(1020)},1\r\n`.repeat(4096);
      const found = standing(`a,b${'b'.repeat(shift)}\r\n${rows}"q""q",2\r\n`);
      expect(found?.written, String(shift)).toBe(4097);
    }
  });

  it('keeps the rows of the file in a table of many blocks', async () => {
    const rows = Array.from({ length: 300_000 }, (_, i) => `B${String(i).padStart(6, '0')},x,3,30,600,1960,office,1`);
    const path = written(`${HEADER}\n${rows.join('\n')}\n`, 'many.csv');
    const db = await openDatabase({ path: ':memory:', folders: [folder] });
    try {
      await prepareSchema(db);
      const columns = { id: 'id', storeys_above: 'n' };
      await db.transaction(() => takeIn(db, studyOf(path, { columns }), folder));
      expect(await db.value('SELECT count(*) FROM building WHERE first_row <> building_index + 2')).toBe(0);
      expect(
        await db.value(`SELECT count(*) FROM building WHERE id <> 'B' || lpad(CAST(first_row - 2 AS VARCHAR), 6, '0')`),
      ).toBe(0);
    } finally {
      db.close();
    }
  }, 60_000);
});

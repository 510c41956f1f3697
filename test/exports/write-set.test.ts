import { existsSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { csvText } from '../../src/exports/csv-text.js';
import { prepareFolder, writeSet } from '../../src/exports/write-set.js';
import { scratch } from '../support/cli.js';

let place: ReturnType<typeof scratch>;
beforeEach(() => {
  place = scratch();
});
afterEach(() => {
  place.remove();
});

describe('prepareFolder', () => {
  it('makes the folder and removes what a killed run left, not what a living one writes', () => {
    const folder = prepareFolder(join(place.folder, 'a', 'b'));
    // Process ids end below 2^22 on Linux (from memory), so this one is nobody's.
    writeFileSync(join(folder, '.swaymark-99999999-ranking.csv.part'), 'half');
    writeFileSync(join(folder, `.swaymark-${String(process.ppid)}-ranking.csv.part`), 'half');
    writeFileSync(join(folder, 'notes.txt'), 'mine');
    prepareFolder(folder);
    expect(readdirSync(folder).sort()).toEqual([`.swaymark-${String(process.ppid)}-ranking.csv.part`, 'notes.txt']);
  });

  it('refuses a path where a file stands', () => {
    writeFileSync(join(place.folder, 'taken'), '');
    expect(() => prepareFolder(join(place.folder, 'taken'))).toThrow('name another folder');
  });
});

describe('writeSet', () => {
  it('replaces all files together and leaves none of its own behind', async () => {
    writeFileSync(join(place.folder, 'a.txt'), 'old');
    const paths = await writeSet(place.folder, {
      'a.txt': 'new',
      'b.txt': (path) => Promise.resolve(writeFileSync(path, 'made')),
    });
    expect(paths).toEqual([join(place.folder, 'a.txt'), join(place.folder, 'b.txt')]);
    expect(readFileSync(join(place.folder, 'a.txt'), 'utf8')).toBe('new');
    expect(readdirSync(place.folder).sort()).toEqual(['a.txt', 'b.txt']);
  });

  it('replaces none when one fails', async () => {
    writeFileSync(join(place.folder, 'a.txt'), 'old');
    await expect(
      writeSet(place.folder, { 'a.txt': 'new', 'b.txt': () => Promise.reject(new Error('no')) }),
    ).rejects.toThrow('no');
    expect(readFileSync(join(place.folder, 'a.txt'), 'utf8')).toBe('old');
    expect(existsSync(join(place.folder, 'b.txt'))).toBe(false);
    expect(readdirSync(place.folder)).toEqual(['a.txt']);
  });
});

describe('csvText', () => {
  it('quotes as RFC 4180 asks and guards formulas but not numbers', () => {
    // RFC 4180, section 2: quotes around cells with commas, quotes or line breaks, quotes doubled, CRLF.
    expect(
      csvText(
        ['a', 'b'],
        [
          ['x,y', 'say "no"'],
          ['=1+1', '-2.5'],
          ['  @sum', -2.5],
          ['two\nlines', null],
          ['＝1', '−3'],
        ],
      ),
    ).toBe('\ufeffa,b\r\n"x,y","say ""no"""\r\n\'=1+1,-2.5\r\n\'  @sum,-2.5\r\n"two\nlines",\r\n\'＝1,−3\r\n');
  });
});

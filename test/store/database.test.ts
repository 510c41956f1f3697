import { existsSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { spawnSync } from 'node:child_process';
import { afterAll, describe, expect, it } from 'vitest';
import { Bug, UserError } from '../../src/errors.js';
import { openDatabase } from '../../src/store/database.js';
import { Interrupted, cutMessage } from '../../src/store/messages.js';
import { scratchFolder } from '../../src/store/scratch.js';
import { prepareSchema, schemaVersion } from '../../src/store/schema.js';
import { quoteList, quoteName, quoteText } from '../../src/store/sql.js';
import { indexRanges } from '../../src/store/chunks.js';

const folder = mkdtempSync(join(tmpdir(), 'swaymark-store-'));
afterAll(() => {
  rmSync(folder, { recursive: true, force: true });
});

describe('openDatabase', () => {
  it('keeps what one opening writes for the next', async () => {
    const path = join(folder, 'kept.duckdb');
    const db = await openDatabase({ path });
    await db.run('CREATE TABLE t AS SELECT 1 AS a');
    db.close();
    const again = await openDatabase({ path, readOnly: true });
    expect(await again.value('SELECT a FROM t')).toBe(1);
    await expect(again.run('DROP TABLE t')).rejects.toThrow(/reading only/);
    again.close();
  });

  it('shares one instance per file, so that no opening loses the writes of another', async () => {
    const path = join(folder, 'shared.duckdb');
    const first = await openDatabase({ path });
    const second = await openDatabase({ path });
    await first.run('CREATE TABLE t AS SELECT 1 AS a');
    await second.run('INSERT INTO t VALUES (2)');
    first.close();
    expect(await second.value('SELECT sum(a) FROM t')).toBe(3);
    second.close();
    second.close();
    const again = await openDatabase({ path });
    expect(await again.value('SELECT count(*) FROM t')).toBe(2);
    again.close();
  });

  it('says what is wrong with a file that is no database', async () => {
    const path = join(folder, 'text.duckdb');
    writeFileSync(path, 'id,name\n');
    await expect(openDatabase({ path })).rejects.toThrow(UserError);
    await expect(openDatabase({ path })).rejects.toThrow(/not a database swaymark can read/);
    await expect(openDatabase({ path: join(folder, 'missing.duckdb'), readOnly: true })).rejects.toThrow(
      /no database here/,
    );
  });

  it('says that a folder stands in its place', async () => {
    const path = join(folder, 'folder.duckdb');
    mkdirSync(path);
    await expect(openDatabase({ path })).rejects.toThrow(/^a folder stands where the database belongs/);
    await expect(openDatabase({ path, readOnly: true })).rejects.toBeInstanceOf(UserError);
  });

  it('says that another process holds the file', async () => {
    const path = join(folder, 'locked.duckdb');
    const db = await openDatabase({ path });
    await db.run('CREATE TABLE t AS SELECT 1 AS a');
    const script = `import { DuckDBInstance } from '@duckdb/node-api';
      try { await DuckDBInstance.create(${JSON.stringify(path)}); } catch (error) { console.log(error.message); }`;
    const { stdout } = spawnSync(process.execPath, ['--input-type=module', '-e', script], { encoding: 'utf8' });
    db.close();
    const { translateError } = await import('../../src/store/messages.js');
    const told = translateError(new Error(stdout), path);
    expect(told).toBeInstanceOf(UserError);
    expect(told.message).toMatch(/in use by another process/);
  });

  it('reaches no file outside its folders', async () => {
    const outside = join(folder, 'outside.csv');
    writeFileSync(outside, 'a\n1\n');
    const db = await openDatabase({ path: ':memory:' });
    await expect(db.run(`SELECT * FROM read_csv('${outside}')`)).rejects.toThrow(/permission|denied|disabled/i);
    db.close();
    const allowed = await openDatabase({ path: ':memory:', folders: [folder] });
    expect(await allowed.value(`SELECT a FROM read_csv('${outside}')`)).toBe(1);
    allowed.close();
  });
});

describe('Database', () => {
  it('reads columns as arrays over many chunks, with NULL as NaN, -1 and null', async () => {
    const db = await openDatabase({ path: ':memory:' });
    const read = await db.columns(
      `SELECT CASE WHEN i % 7 = 0 THEN NULL ELSE i / 2 END AS f, CASE WHEN i % 5 = 0 THEN NULL ELSE i::INTEGER END AS n,
         CASE WHEN i % 3 = 0 THEN NULL WHEN i % 2 = 0 THEN 'short' ELSE 'a text longer than twelve bytes ' || i END AS t,
         i AS big, CASE WHEN i % 2 = 0 THEN 'no' ELSE 'yes' END::ENUM ('yes', 'no') AS w
       FROM range(5000) r(i) ORDER BY i`,
      { f: 'f64', n: 'i32', t: 'text', big: 'f64', w: 'text' },
    );
    expect(read.rowCount).toBe(5000);
    expect([...read.f.subarray(0, 4)]).toEqual([NaN, 0.5, 1, 1.5]);
    expect([...read.n.subarray(4, 7)]).toEqual([4, -1, 6]);
    expect(read.t.slice(0, 4)).toEqual([null, 'a text longer than twelve bytes 1', 'short', null]);
    expect(read.t[4999]).toBe('a text longer than twelve bytes 4999');
    expect(read.big[4321]).toBe(4321);
    expect(read.w.slice(0, 2)).toEqual(['no', 'yes']);
    const codes = await db.columns("SELECT 'no'::ENUM ('yes', 'no') AS w UNION ALL SELECT NULL", { w: 'i32' });
    expect([...codes.w]).toEqual([1, -1]);
    db.close();
  });

  it('refuses a column the query does not yield and a type that does not fit', async () => {
    const db = await openDatabase({ path: ':memory:' });
    await expect(db.columns('SELECT 1 AS a', { b: 'f64' })).rejects.toThrow(Bug);
    await expect(db.columns("SELECT 'x' AS a", { a: 'f64' })).rejects.toThrow(/cast it/);
    await expect(db.columns('SELECT 1 AS a', { a: 'text' })).rejects.toThrow(/cast it/);
    db.close();
  });

  it('appends to temporary tables of a database open for reading', async () => {
    const path = join(folder, 'reading.duckdb');
    (await openDatabase({ path })).close();
    const db = await openDatabase({ path, readOnly: true });
    await db.run('CREATE TEMP TABLE t (a INTEGER)');
    await db.appendTemporary('t', [Int32Array.of(3, 4)]);
    expect(await db.value('SELECT sum(a) FROM t')).toBe(7);
    db.close();
  });

  it('appends arrays and reads the same back', async () => {
    const db = await openDatabase({ path: ':memory:' });
    await db.run('CREATE TABLE t (a DOUBLE, b INTEGER, c VARCHAR)');
    const rows = 4100;
    const a = Float64Array.from({ length: rows }, (_, i) => (i % 3 === 0 ? NaN : i / 7));
    const b = Int32Array.from({ length: rows }, (_, i) => i - 5);
    const c = Array.from({ length: rows }, (_, i) => (i % 4 === 0 ? null : `naïve – text ${i}`));
    await db.append('t', [a, b, c]);
    const read = await db.columns('SELECT * FROM t', { a: 'f64', b: 'i32', c: 'text' });
    expect(read.a).toEqual(a);
    expect(read.b).toEqual(b);
    expect(read.c).toEqual(c);
    expect(await db.value('SELECT count(*) FROM t WHERE a IS NULL')).toBe(Math.ceil(rows / 3));
    await expect(db.append('t', [a, b.subarray(1), c])).rejects.toThrow(/differ in length/);
    db.close();
  });

  it('keeps nothing of a transaction that fails', async () => {
    const db = await openDatabase({ path: ':memory:' });
    await db.run('CREATE TABLE t (a INTEGER)');
    await expect(
      db.transaction(async () => {
        await db.run('INSERT INTO t VALUES (1)');
        await db.run('SELECT nonsense');
      }),
    ).rejects.toThrow(/nonsense/);
    expect(await db.value('SELECT count(*) FROM t')).toBe(0);
    await db.transaction(() => db.run('INSERT INTO t VALUES (?)', [2]));
    expect(await db.rows('SELECT a, count(*) AS n FROM t GROUP BY a')).toEqual([{ a: 2, n: 1 }]);
    db.close();
    await expect(db.run('SELECT 1')).rejects.toThrow(/closed/);
  });

  it('begins a late transaction where it is told to, and keeps nothing of it when it fails', async () => {
    const db = await openDatabase({ path: ':memory:' });
    await db.run('CREATE TABLE t (a INTEGER)');
    await expect(
      db.lateTransaction(async (begin) => {
        await db.run('CREATE TEMP TABLE work AS SELECT 1 AS a');
        await begin();
        await begin();
        await db.run('INSERT INTO t SELECT a FROM work');
        throw new Error('too late');
      }),
    ).rejects.toThrow('too late');
    expect(await db.value('SELECT count(*) FROM t')).toBe(0);
    await db.lateTransaction(() => Promise.resolve());
    await db.lateTransaction(async (begin) => {
      await begin();
      await db.run('INSERT INTO t SELECT a FROM work');
    });
    expect(await db.value('SELECT count(*) FROM t')).toBe(1);
    db.close();
  });

  it('runs work beside its own on a second connection, which sees what is committed', async () => {
    const db = await openDatabase({ path: ':memory:' });
    await db.run('CREATE TABLE t AS SELECT 7 AS a');
    await db.run('CREATE TEMP TABLE mine AS SELECT 8 AS a');
    expect(await db.beside((other) => other.value('SELECT a FROM t'))).toBe(7);
    await expect(db.beside((other) => other.value('SELECT a FROM mine'))).rejects.toThrow(/mine/);
    expect(await db.value('SELECT a FROM mine')).toBe(8);
    db.close();
  });

  it('stops a statement and stays usable', async () => {
    const db = await openDatabase({ path: ':memory:' });
    const long = db.value('SELECT sum(a.i * b.i) FROM range(200000) a(i), range(200000) b(i)');
    setTimeout(() => {
      db.interrupt();
    }, 50);
    await expect(long).rejects.toThrow(Interrupted);
    expect(await db.value('SELECT 1')).toBe(1);
    db.close();
  });
});

describe('prepareSchema', () => {
  it('makes the tables once and leaves them on the second call', async () => {
    const db = await openDatabase({ path: ':memory:' });
    await prepareSchema(db);
    const version = await schemaVersion(db);
    expect(version).toBeGreaterThan(0);
    await prepareSchema(db);
    expect(await db.value('SELECT count(*) FROM building')).toBe(0);
    await db.run('INSERT INTO schema_version VALUES (99)');
    await expect(prepareSchema(db)).rejects.toThrow(/update swaymark/);
    db.close();
  });
});

describe('scratchFolder', () => {
  it('is one folder of this process', () => {
    expect(scratchFolder()).toBe(scratchFolder());
    expect(existsSync(scratchFolder())).toBe(true);
  });
});

describe('quoteName, quoteText and quoteList', () => {
  it('let no text out of its quotes', async () => {
    const db = await openDatabase({ path: ':memory:' });
    const nasty = `a"b'; DROP TABLE t; --`;
    expect(await db.rows(`SELECT ${quoteText(nasty)} AS ${quoteName(nasty)}`)).toEqual([{ [nasty]: nasty }]);
    expect(await db.value(`SELECT list_contains(${quoteList([nasty])}, ${quoteText(nasty)})`)).toBe(true);
    expect(await db.value(`SELECT len(${quoteList([])})`)).toBe(0);
    db.close();
  });
});

describe('indexRanges', () => {
  it('covers every index once', () => {
    expect([...indexRanges(10, 4)]).toEqual([
      { from: 0, to: 4 },
      { from: 4, to: 8 },
      { from: 8, to: 10 },
    ]);
    expect([...indexRanges(0)]).toEqual([]);
  });
});

describe('cutMessage', () => {
  it('cuts what quotes a whole line of data', () => {
    expect(cutMessage('x'.repeat(1000)).length).toBe(301);
  });
});

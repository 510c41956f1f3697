import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { explainBuilding } from '../../src/screening/explain.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import { openDatabase } from '../../src/store/database.js';
import { prepareSchema, schemaVersion } from '../../src/store/schema.js';
import { loadStudy } from '../../src/study/load.js';
import { ROOT, buildCommand, scratch, writeSmallStudy } from '../support/cli.js';
import { AFTER, NEXT, tablesOf, writeV1 } from '../support/v1-database.js';

const place = scratch();
const file = join(place.folder, 'v1.duckdb');
let stored: unknown;

beforeAll(async () => {
  buildCommand();
  writeSmallStudy(place.folder);
  const loaded = await loadStudy(join(place.folder, 'study.yaml'));
  const db = await openStudyDatabase(loaded);
  await screen(db, loaded, { made: new Date('2026-01-02T03:04:05Z') });
  stored = (await explainBuilding(db, 1, 'A2', 'si')).stored;
  await writeV1(file, db);
  db.close();
}, 300_000);
afterAll(() => {
  place.remove();
});

const built = (path: string): string => JSON.stringify(pathToFileURL(join(ROOT, 'dist', path)).href);
/** The later step, which speaks up in the middle and then takes for ever. */
const SCRIPT = `
  import { openDatabase } from ${built('store/database.js')};
  import { MIGRATIONS, prepareSchema } from ${built('store/schema.js')};
  const statements = { *[Symbol.iterator]() {
    yield* ${JSON.stringify(NEXT.statements)};
    console.log('in the middle');
    yield 'SELECT sum(a.i * b.i) FROM range(10000000) a(i), range(10000000) b(i)';
  } };
  const db = await openDatabase({ path: ${JSON.stringify(file)} });
  await prepareSchema(db, [...MIGRATIONS, { version: ${String(NEXT.version)}, statements }]);`;

describe('prepareSchema', () => {
  it('leaves version 1 whole when the process is killed in the middle, and can begin again', async () => {
    const child = spawn(process.execPath, ['--input-type=module', '-e', SCRIPT], {
      stdio: ['ignore', 'pipe', 'inherit'],
    });
    const ended = await new Promise((resolve) => {
      child.stdout.once('data', () => setTimeout(() => child.kill('SIGKILL'), 100));
      child.once('close', (_, signal) => {
        resolve(signal);
      });
    });
    expect(ended).toBe('SIGKILL');
    const db = await openDatabase({ path: file });
    expect(await schemaVersion(db)).toBe(1);
    expect((await tablesOf(db)).get('result_assessed')).not.toContain('drift_ratio');
    expect(await db.value('SELECT count(*) FROM result')).toBe(4);
    await prepareSchema(db, AFTER);
    expect((await explainBuilding(db, 1, 'A2', 'si')).stored).toEqual(stored);
    db.close();
  });
});

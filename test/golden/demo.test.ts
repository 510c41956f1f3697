import { readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { parse } from 'csv-parse/sync';
import { beforeAll, describe, expect, it } from 'vitest';
import { buildCommand } from '../support/cli.js';
import { screenedDemo } from '../support/screened-demo.js';

let fresh = '';

beforeAll(async () => {
  buildCommand();
  fresh = join(dirname(await screenedDemo()), 'reports');
}, 120_000);

const committed = 'reports';
const table = (folder: string, name: string): readonly string[][] => parse(readFileSync(join(folder, name)), { bom: true });

/** Equal text, or numbers equal to six digits: the last digits may differ between versions of the database's printing. */
function alike(a: string, b: string): boolean {
  if (a === b) return true;
  const x = Number(a);
  const y = Number(b);
  return a !== '' && b !== '' && Number.isFinite(x) && Math.abs(x - y) <= 1e-6 * Math.max(Math.abs(x), Math.abs(y));
}

describe('the committed demo reports', () => {
  it.each(['ranking.csv', 'rejects.csv', 'sites.csv', 'gaps.csv'])('%s says what the demo gives today', (name) => {
    const [now, then] = [table(fresh, name), table(committed, name)];
    expect(now.length).toBe(then.length);
    now.forEach((row, i) => {
      const other = then[i] ?? [];
      const differing = row.filter((cell, j) => !alike(cell, other[j] ?? ''));
      expect(differing, `${name} row ${String(i + 1)}: ${row[0] ?? ''}`).toEqual([]);
    });
  });

  it('summary.md says what the demo gives today, but for the run and its date', () => {
    const plain = (folder: string): string => readFileSync(join(folder, 'summary.md'), 'utf8').replace(/Run \d+, made [^.]*? UTC with/, 'Run with');
    expect(plain(fresh)).toBe(plain(committed));
  });
});

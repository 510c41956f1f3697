import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

const demo = fileURLToPath(new URL('../../data-demo/', import.meta.url));

describe('data-demo/make.mjs', () => {
  let folder = '';
  beforeAll(() => {
    folder = mkdtempSync(join(tmpdir(), 'swaymark-demo-'));
    execFileSync(process.execPath, [join(demo, 'make.mjs'), folder]);
  });
  afterAll(() => {
    rmSync(folder, { recursive: true, force: true });
  });

  it.each(['inventory.csv', 'neighbours.csv', 'system-prior.csv'])('writes the committed %s byte for byte', (file) => {
    expect(readFileSync(join(folder, file)).equals(readFileSync(join(demo, file)))).toBe(true);
  });

  it('fills the structure columns of the named assets and of no others', async () => {
    const { showcase, structureHeaders } = (await import(join(demo, 'making/structure.mjs'))) as {
      showcase: readonly { readonly id: string }[];
      structureHeaders: readonly string[];
    };
    const [header = '', ...lines] = readFileSync(join(folder, 'inventory.csv'), 'utf8').split(/\r?\n/);
    expect(header.endsWith(`,${structureHeaders.join(',')}`)).toBe(true);
    // No structure column but the last, the period of the ground, is filled in any other row.
    const known = lines.filter((line) => {
      const cells = line.split(',');
      // The first half of the name with a line break in it is shorter than a row.
      return cells.length > structureHeaders.length && cells.slice(-structureHeaders.length, -1).join('') !== '';
    });
    expect(known.map((line) => line.slice(0, 6)).sort()).toEqual(showcase.map(({ id }) => id).sort());
  });

  it('gives every group of the system prior chances that sum to one', () => {
    const sums = new Map<string, number>();
    const lines = readFileSync(join(folder, 'system-prior.csv'), 'utf8').trim().split('\n').slice(1);
    for (const line of lines) {
      const cells = line.split(',');
      const group = cells.slice(0, 5).join(',');
      // Whole hundredths, so that the sum is exact.
      sums.set(group, (sums.get(group) ?? 0) + Math.round(Number(cells[6]) * 100));
    }
    expect([...sums.values()].every((sum) => sum === 100)).toBe(true);
    expect([...sums.keys()].at(-1)).toBe(',,,,');
  });
});

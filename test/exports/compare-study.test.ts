import { existsSync, readFileSync, readdirSync } from 'node:fs';
import { basename, dirname, join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { compareStudy } from '../../src/exports/compare-study.js';
import { refreshStudy } from '../../src/exports/refresh-study.js';
import { screenedDemo } from '../support/screened-demo.js';
import { MADE } from '../support/study-folder.js';

describe('compareStudy', () => {
  it('compares the two newest runs, writes one page, and takes the later run from another study where asked', async () => {
    const path = await screenedDemo();
    await expect(compareStudy(path, { page: false })).rejects.toThrow(/no run before run 1/);
    await refreshStudy(path, { set: [{ path: 'ranking.list_size', value: 30 }], made: MADE, reports: false });

    const { comparison, page } = await compareStudy(path);
    expect([comparison.before.run, comparison.after.run]).toEqual([1, 2]);
    expect(comparison.settings).toEqual([{ path: 'ranking.list_size', before: 20, after: 30 }]);
    expect(comparison).toMatchObject({
      moved: 0,
      tau_b: 1,
      list: { overlap: 20, places_before: 20, places: 30, left: [] },
    });
    expect(comparison.list.entered).toHaveLength(10);
    expect(basename(page!)).toBe('compare-1-2.html');
    expect(readdirSync(dirname(page!)).filter((name) => name.startsWith('compare'))).toEqual(['compare-1-2.html']);
    expect(readFileSync(page!, 'utf8')).toContain('What changed from run 1 to run 2');

    const other = await screenedDemo();
    const apart = await compareStudy(path, { before: 1, otherStudy: other, output: join(dirname(path), 'elsewhere') });
    expect(apart.comparison).toMatchObject({
      moved: 0,
      common_change: 0,
      settings: [],
      data: { came: [], went: [], changed: 0 },
    });
    expect(existsSync(apart.page!)).toBe(true);
    expect(basename(apart.page!)).toBe(`compare-1-${basename(dirname(other))}-1.html`);
    // the same study under both names is one database
    expect(
      (await compareStudy(path, { before: 1, after: 2, otherStudy: path, page: false })).comparison.after.run,
    ).toBe(2);
  });
});

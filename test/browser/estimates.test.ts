/** The estimates of the period side by side, in the page: of one building and of a class. */
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import type { Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { compileContext } from '../../src/engineering/assess/context.js';
import { periodEstimates } from '../../src/engineering/assess/estimates.js';
import { buildingAt } from '../../src/engineering/building-columns.js';
import { formatNumber } from '../../src/engineering/format.js';
import { readPageScript, renderDashboard } from '../../src/reports/dashboard.js';
import { SETTINGS, pageData } from '../support/page-data.js';
import { Pages } from '../support/pages.js';

const axeSource = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

describe('estimates in the page', () => {
  const folder = mkdtempSync(join(tmpdir(), 'swaymark-estimates-'));
  const file = join(folder, 'dashboard.html');
  const address = pathToFileURL(file).href;
  const data = pageData({ listSize: 20 });
  const { inputs, pools } = data.buildings;
  const context = compileContext(SETTINGS);
  let pages: Pages;

  beforeAll(async () => {
    writeFileSync(file, renderDashboard(data, readPageScript()));
    pages = await Pages.launch();
  });
  afterAll(async () => {
    await pages.end();
    rmSync(folder, { recursive: true, force: true });
  });
  afterEach(async () => {
    await pages.closeOpened();
    expect(pages.noise.splice(0)).toEqual([]);
  });

  const open = (hash = '', width = 1280): Promise<Page> => pages.open(`${address}${hash}`, { width });
  const sheetOf = async (i: number, width = 1280): Promise<Page> => {
    const page = await open(`#building=${inputs.id[i] ?? ''}`, width);
    await page.getByRole('button', { name: 'Put all estimates side by side' }).click();
    return page;
  };
  /** Within the part that these tests are about: the whole page is looked at in dashboard.test.ts. */
  const problems = async (page: Page, part: string, rules = ''): Promise<string[]> => {
    await page.evaluate(axeSource);
    return page.evaluate(`axe.run('${part}', { resultTypes: ['violations']${rules} }).then(({ violations }) =>
      violations.map(({ id, nodes }) => id + ': ' + nodes.slice(0, 3).map(({ target }) => target.join(' ')).join(', ')))`);
  };
  const findIndex = (test: (i: number) => boolean): number => {
    const found = inputs.id.findIndex((_, i) => test(i) && data.buildings.results['not_ranked']?.[i] === null);
    expect(found).toBeGreaterThanOrEqual(0);
    return found;
  };
  const systems = inputs.words.system;

  it('puts the estimates of a building into a table, what counts marked, the same numbers as the engineering', async () => {
    const i = findIndex((each) => systems[each] === 'concrete-moment-frame');
    const page = await sheetOf(i);
    const building = buildingAt(inputs, i, pools);
    const estimates = periodEstimates(building, 'longitudinal', 'concrete-moment-frame', context);
    const applied = estimates.flatMap(({ outcome }) => (outcome.applies ? [outcome] : []));
    const table = page.locator('dialog table.estimates').first();
    expect(await table.locator('tbody tr > :nth-child(2)').allTextContents()).toEqual(
      applied.map(({ period_s }) => formatNumber(period_s, 3)),
    );
    expect(await table.locator('tbody tr.listed').count()).toBe(applied.filter(({ counts }) => counts).length);
    expect(await table.locator('tbody tr').first().textContent()).toContain('Period used');
    expect(await page.locator('#estimates').textContent()).toContain('Lateral system concrete moment frame, given.');
    // the focus goes to what the button made
    expect(await page.evaluate('document.activeElement.id')).toBe('estimates');
    expect(await page.locator('#make-estimates').isVisible()).toBe(false);
    await page.locator('#estimates details summary').first().click();
    expect(await page.locator('#estimates details li').first().textContent()).toMatch(/: .+\.$/);
  });

  it('shows the two directions apart where they differ, and a measurement that governs', async () => {
    const page = await sheetOf(findIndex((i) => (inputs.numbers.measured_period_longitudinal_s[i] ?? NaN) > 0));
    expect(await page.locator('dialog table.estimates caption').allTextContents()).toEqual([
      'Longitudinal direction',
      'Transverse direction',
    ]);
    expect(await page.locator('#estimates').textContent()).toContain('a measurement governs; the others are checks');
  });

  it('says for which system it speaks where none is on record', async () => {
    const page = await sheetOf(findIndex((i) => systems[i] === null));
    expect(await page.locator('#estimates').textContent()).toMatch(
      /not on record; shown for the likeliest, timber light frame \(chance 40 %\)/,
    );
    expect(await page.locator('dialog table.estimates').count()).toBeGreaterThan(0);
  });

  it('compares the estimates of a class of buildings, chosen by its system', async () => {
    const page = await open();
    const select = page.getByLabel('Buildings whose lateral system is on record as');
    const options = await select.locator('option').allTextContents();
    expect(options[0]).toBe('Choose a lateral system');
    const members = systems.filter(
      (system, i) => system === 'unreinforced-masonry-wall' && data.buildings.results['not_ranked']?.[i] === null,
    ).length;
    expect(options).toContain(`unreinforced masonry wall (${String(members)})`);
    await select.selectOption('unreinforced-masonry-wall');
    const table = page.locator('#class-estimates table.estimates');
    expect(await table.locator('caption').textContent()).toContain(`: ${String(members)} buildings`);
    const used = table.locator('tbody tr').first();
    expect(await used.locator(':scope > :nth-child(2)').textContent()).toBe(String(2 * members));
    expect(await table.locator('tbody tr').count()).toBeGreaterThan(20);
    await select.selectOption('concrete-moment-frame');
    expect(await table.locator('caption').textContent()).toContain('concrete moment frame');
    await select.selectOption('Choose a lateral system');
    expect(await table.count()).toBe(0);
  });

  it.each([1280, 390])(
    'gives axe nothing to report and the page nothing to scroll sideways at %d',
    async (width) => {
      const page = await open('', width);
      await page.getByLabel('Buildings whose lateral system is on record as').selectOption('concrete-moment-frame');
      await page.locator('#class-estimates table.estimates').waitFor();
      // structure does not hang on the width: all rules once, then those of sizes
      const rules = width === 1280 ? '' : ", runOnly: ['target-size', 'scrollable-region-focusable']";
      expect(await problems(page, '#class-estimates', rules)).toEqual([]);
      expect(await page.evaluate('document.documentElement.scrollWidth')).toBe(width);
      const sheet = await sheetOf(
        findIndex((i) => inputs.words.storey_stiffness_longitudinal_kN_per_m[i] !== null),
        width,
      );
      await sheet.evaluate('document.querySelectorAll("details").forEach((details) => { details.open = true; })');
      expect(await problems(sheet, 'dialog', rules)).toEqual([]);
      expect(await sheet.evaluate('document.documentElement.scrollWidth')).toBe(width);
      // wide tables scroll within themselves
      expect(
        await sheet.evaluate(
          '(() => { const d = document.querySelector("dialog"); return d.scrollWidth - d.clientWidth; })()',
        ),
      ).toBe(0);
    },
    60_000,
  );
});

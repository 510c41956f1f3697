/** The dashboard of a run whose level reads a grid, in Chromium. */
import { dirname, join } from 'node:path';
import { pathToFileURL } from 'node:url';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { screenStudy } from '../../src/exports/screen-study.js';
import { TWO_GRIDS, gridCopy, gridCsv, rising } from '../support/hazard-grid.js';
import { Pages } from '../support/pages.js';
import { MADE } from '../support/study-folder.js';

describe('the dashboard of a study with hazard grids', () => {
  let pages: Pages;
  let page: Page;
  const path = gridCopy(TWO_GRIDS, { 'h475.csv': gridCsv(rising(1)), 'h2475.csv': gridCsv(rising(1.8)) });

  beforeAll(async () => {
    await screenStudy(path, { made: MADE, outlook: false });
    pages = await Pages.launch();
    page = await pages.open(pathToFileURL(join(dirname(path), 'reports', 'dashboard.html')).href);
  }, 120_000);

  afterAll(async () => {
    await pages.end();
    expect(pages.noise).toEqual([]);
  });

  it('draws median and band of the buildings, and says so in words and numbers', async () => {
    const section = page.locator('#periods');
    const words = await section.innerText();
    expect(words).toContain('The spectra h475 and h2475 are read from grids at each building’s own place');
    expect(words).toContain('period by period');
    await expect(section.locator('.chart').first().locator('svg .mark-area path').count()).resolves.toBeGreaterThan(0);
    const table = (await section.locator('table').first().textContent()) ?? '';
    expect(table).toContain('S_a, h475, median (g)');
    expect(table).toContain('h475, 5 to 95 % (g)');
    expect(await page.locator('#inventory').innerText()).toContain('building BH-020 has no coordinates');
  });

  it('works every tenth building out again to the last bit, from the four nodes', async () => {
    const ids = await page
      .locator('#all-region a')
      .evaluateAll((links) => links.map((link) => link.getAttribute('href')));
    const some = ids.filter((_, i) => i % 10 === 0);
    expect(some.length).toBeGreaterThan(1);
    for (const href of some) {
      await page.evaluate((to) => {
        location.hash = to ?? '';
      }, href);
      await page.locator('#make-hand').click();
      expect(await page.locator('.agrees').getAttribute('data-agrees'), String(href)).toBe('exactly');
      expect(await page.locator('#hand').innerText()).toContain('Ordinate of a hazard grid, bilinear in ln S_a');
      await page.keyboard.press('Escape');
    }
  }, 60_000);
});

/** The page of a comparison as its reader opens it: from disk, in Chromium, with the built page script. */
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import type { Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { renderComparison } from '../../src/reports/compare.js';
import { readPageScript } from '../../src/reports/page-script.js';
import { inventedComparison } from '../support/comparison.js';
import { Pages } from '../support/pages.js';

const axeSource = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

describe('renderComparison', () => {
  const folder = mkdtempSync(join(tmpdir(), 'swaymark-compare-'));
  let pages: Pages;

  beforeAll(async () => {
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

  async function open(listSize: number, width: number, colorScheme: 'light' | 'dark' = 'light'): Promise<Page> {
    const file = join(folder, `compare-${String(listSize)}.html`);
    writeFileSync(file, renderComparison(inventedComparison(400, listSize), readPageScript()));
    return pages.open(pathToFileURL(file).href, { width, colorScheme });
  }

  it('draws short lists as lines and long ones as points, wide or narrow, without scrolling sideways', async () => {
    for (const [listSize, width] of [
      [20, 1280],
      [20, 390],
      [120, 1280],
      [120, 390],
    ] as const) {
      const page = await open(listSize, width);
      expect(await page.locator('.chart svg').count()).toBe(1);
      expect(await page.evaluate('document.documentElement.scrollWidth')).toBe(width);
      const words = (await page.locator('.chart svg').textContent()) ?? '';
      expect(words).toContain(listSize === 20 ? 'EX-0003' : 'Rank in run 2');
      if (process.env['SHOTS'] !== undefined)
        await page.screenshot({
          path: join(process.env['SHOTS'], `compare-${String(listSize)}-${String(width)}.png`),
          fullPage: true,
        });
    }
  });

  it('gives axe nothing to report in either scheme, and shows data as text only', async () => {
    for (const scheme of ['light', 'dark'] as const) {
      const page = await open(20, scheme === 'light' ? 1280 : 390, scheme);
      await page.evaluate(axeSource);
      expect(
        await page.evaluate(
          `axe.run({ resultTypes: ['violations']${scheme === 'light' ? '' : ", runOnly: ['color-contrast', 'target-size', 'scrollable-region-focusable', 'link-in-text-block']"} }).then(({ violations }) => violations.map(({ id, nodes }) => id + ': ' + nodes.map(({ html }) => html).join(' ')))`,
        ),
      ).toEqual([]);
      expect(await page.locator('main script, main img, main iframe').count()).toBe(0);
    }
  });

  it('is read by keyboard: the skip link, then every scrolling table takes the focus', async () => {
    const page = await open(20, 1280);
    await page.keyboard.press('Tab');
    expect(await page.evaluate('document.activeElement.textContent')).toBe('Skip to the two lists');
    await page.getByText('The numbers of this chart').focus();
    await page.keyboard.press('Enter');
    await page.keyboard.press('Tab');
    expect(await page.evaluate('document.activeElement.getAttribute("role")')).toBe('region');
  });

  it('prints in light colours with the picture and the tables whole', async () => {
    const page = await open(20, 1280, 'dark');
    await page.emulateMedia({ media: 'print', colorScheme: 'dark' });
    expect(await page.evaluate('getComputedStyle(document.body).backgroundColor')).toBe('rgb(255, 255, 255)');
    expect(await page.locator('.chart svg').isVisible()).toBe(true);
    expect(await page.locator('nav.contents').isVisible()).toBe(false);
  });
});

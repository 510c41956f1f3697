/** The dashboard as its reader opens it: from disk, in Chromium, with the built page script. */
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import type { Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { formatNumber } from '../../src/engineering/format.js';
import { LIKELY_WEAK } from '../../src/engineering/results.js';
import { readPageScript, renderDashboard } from '../../src/reports/dashboard.js';
import { HOSTILE_NAME, pageData } from '../support/page-data.js';
import { Pages } from '../support/pages.js';
import type { View } from '../support/pages.js';

const axeSource = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

describe('renderDashboard', () => {
  const folder = mkdtempSync(join(tmpdir(), 'swaymark-page-'));
  const data = pageData({ listSize: 20 });
  let pages: Pages;

  const write = (name: string, options: Parameters<typeof pageData>[0]): string => {
    const file = join(folder, name);
    writeFileSync(file, renderDashboard(pageData(options), readPageScript()));
    return pathToFileURL(file).href;
  };
  let address = '';

  beforeAll(async () => {
    address = write('dashboard.html', { listSize: 20 });
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

  const open = (url = address, view: View = {}): Promise<Page> => pages.open(url, view);

  const cells = (page: Page, column: number): Promise<string[]> =>
    page.locator(`#all-table tbody tr:not(.spacer) > :nth-child(${String(column)})`).allTextContents();

  it('draws every chart without a message, a request or sideways scrolling', async () => {
    for (const width of [1280, 390]) {
      const page = await open(address, { width });
      expect(await page.locator('.chart svg').count()).toBe(5);
      expect(await page.evaluate('document.documentElement.scrollWidth')).toBe(width);
    }
  });

  it('draws large portfolios on a canvas', async () => {
    const page = await open(write('large.html', { count: 3200, listSize: 100 }));
    expect(await page.locator('.chart canvas').count()).toBe(2);
    await page.emulateMedia({ colorScheme: 'dark' });
    await expect.poll(() => page.locator('.chart canvas').count()).toBe(2);
  });

  it('sorts by a heading, either way, blanks last', async () => {
    const page = await open();
    const head = page.locator('#all-table th', { hasText: 'People on average' });
    await head.getByRole('button').click();
    expect(await head.getAttribute('aria-sort')).toBe('ascending');
    const column = 1 + (await page.locator('#all-table thead th').allTextContents()).indexOf('People on average');
    const up = (await cells(page, column)).map(Number);
    expect(up.slice(0, 10)).toEqual([...up.slice(0, 10)].sort((a, b) => a - b));
    await head.getByRole('button').press('Enter');
    expect(await head.getAttribute('aria-sort')).toBe('descending');
    const down = (await cells(page, column)).map((text) => Number(text.replaceAll('\u202f', '')));
    expect(down[0]).toBe(Math.max(...down.filter((value) => !Number.isNaN(value))));
    await page.evaluate('document.getElementById("all-region").scrollTo(0, 1e6)');
    await page.locator('#all-table td', { hasText: 'already assessed' }).waitFor();
    expect((await cells(page, column)).at(-1)).toBe('–');
  });

  it('searches, filters, and marks inferred values in words', async () => {
    const page = await open();
    expect(
      (await page.locator('#all-table td.guess').allTextContents()).some((text) => /^≈ [\d.]+ inferred$/.test(text)),
    ).toBe(true);
    await page.getByLabel('Search identifier').fill('ex-013');
    expect(await cells(page, 2)).toEqual(['EX-013']);
    expect(await page.locator('#all-status').textContent()).toContain('1 of 60 buildings');
    await page.getByLabel('Search identifier').fill('');
    await page.getByLabel('Show').selectOption('In the list');
    expect(await page.locator('#all-table').getAttribute('aria-rowcount')).toBe('21');
    await page.getByLabel('Show').selectOption('Ranked, of a weak type');
    const chances = data.buildings.results['weak_chance'] ?? [];
    const weak = chances.filter((chance) => typeof chance === 'number' && chance >= LIKELY_WEAK).length;
    expect(await page.locator('#all-table').getAttribute('aria-rowcount')).toBe(String(weak + 1));
  });

  it('opens a sheet by keyboard, works the priority out again, and gives the focus back', async () => {
    const page = await open();
    const link = page.locator('#all-table tbody a').nth(2);
    const id = (await link.textContent()) ?? '';
    await link.focus();
    await page.keyboard.press('Enter');
    const sheet = page.locator('dialog[open]');
    await sheet.waitFor();
    expect(await sheet.locator('h2').textContent()).toContain(id);
    expect(page.url()).toContain(`#building=${id}`);
    await sheet.getByRole('button', { name: 'Work it out by hand' }).press('Enter');
    expect(await sheet.locator('.agrees').getAttribute('data-agrees')).toBe('exactly');
    expect(await sheet.locator('ol.hand > li').count()).toBeGreaterThan(10);
    await page.keyboard.press('Escape');
    await sheet.waitFor({ state: 'detached' });
    await expect.poll(() => page.url()).not.toContain('building=');
    expect(await page.evaluate('document.activeElement.textContent')).toBe(id);
  });

  it('works out what the run stored', async () => {
    const page = await open();
    for (const id of data.buildings.inputs.id.filter((_, i) => i % 3 === 0)) {
      await page.goto(`${address}#building=${id}`);
      await page.locator('#sheet-title', { hasText: id }).waitFor();
      await page.locator('#make-hand').click();
      expect(await page.locator('.agrees').textContent()).toMatch(/The two are identical|not ranked/);
    }
    // what a survey found names it, and not the owner's table
    const [surveyed = ''] = Object.keys(data.buildings.found);
    await page.goto(`${address}#building=${surveyed}`);
    await page.locator('#sheet-title', { hasText: surveyed }).waitFor();
    await page.locator('#make-hand').click();
    expect(await page.locator('#hand').innerText()).toMatch(/height: [^\n]*m\n+street visit of 2026-05-03/i);
  });

  it('leads from one building of a site to the others', async () => {
    const page = await open();
    const [site] = data.sites.sites;
    const ids = site!.members.map(({ id }) => id);
    expect(await page.locator('#sites-table tbody tr').count()).toBe(1);
    expect(await page.locator('#sites-table td.members a').allTextContents()).toEqual(ids);
    await page.locator('#sites-table td.members a').nth(1).click();
    const others = page.locator('#site-members li');
    await others.first().waitFor();
    expect(await others.locator('a').allTextContents()).toEqual(ids.filter((_, at) => at !== 1));
    expect(await others.first().textContent()).toContain(`: rank ${String(site!.members[0]!.rank)}, chance `);
    await others.locator('a').last().click();
    await page.locator('#sheet-title', { hasText: ids.at(-1)! }).waitFor();
    await page.goto(`${address}#building=${data.buildings.inputs.id[0]!}`);
    await page.locator('#sheet-title', { hasText: data.buildings.inputs.id[0]! }).waitFor();
    expect(await page.locator('#site-members').count()).toBe(0);
  });

  it('tells short gaps, and in a sheet all neighbours with what is needed', async () => {
    const page = await open();
    const { pairs, short } = data.gaps!;
    expect(await page.locator('#gaps-table tbody tr').count()).toBe(short);
    await page.locator('#gaps-table tbody td a').first().click();
    const rows = page.locator('#neighbours-table tbody tr');
    await rows.first().waitFor();
    const own = pairs[0]!.id_b;
    const theirs = pairs.filter(({ id_a, id_b }) => id_a === own || id_b === own);
    expect(await rows.count()).toBe(theirs.length);
    expect(await rows.first().locator('td').allTextContents()).toEqual([
      '0',
      formatNumber(pairs[0]!.needed_m, 2),
      'root of the squares',
      formatNumber(pairs[0]!.double_difference_m, 2),
      formatNumber(pairs[0]!.by_height_m, 2),
      expect.stringContaining('not at one level'),
      'short, by the height rule too',
    ]);
    await rows.first().locator('a').click();
    await page.locator('#sheet-title', { hasText: pairs[0]!.id_a }).waitFor();
    const wide = pairs.at(-1)!.id_b;
    await page.goto(`${address}#building=${wide}`);
    await page.locator('#sheet-title', { hasText: wide }).waitFor();
    expect(await rows.last().locator('td').last().textContent()).toBe('wide enough');
    const alone = data.buildings.inputs.id[20]!;
    await page.goto(`${address}#building=${alone}`);
    await page.getByText('No neighbour within 2.0 m is known.').waitFor();
  });

  it('opens a sheet from the list and from a mark of a chart', async () => {
    const page = await open();
    await page.locator('#list-table a').first().click();
    await page.locator('dialog[open]').waitFor();
    await page.keyboard.press('Escape');
    await page.locator('#chart-map').scrollIntoViewIfNeeded();
    await page.locator('#chart-map svg .mark-symbol.role-mark path').last().hover({ force: true });
    await page.locator('.tip').waitFor();
    await page.mouse.down();
    await page.mouse.up();
    await page.locator('dialog[open]').waitFor();
  });

  it('shows a hostile name as text and runs nothing of it', async () => {
    const page = await open();
    await page.getByLabel('Search identifier').fill('onerror');
    const name = page.locator('#all-table tbody td', { hasText: 'onerror' });
    expect(await name.textContent()).toBe(HOSTILE_NAME);
    await page.locator('#all-table tbody a').click();
    expect(await page.locator('#sheet-title').textContent()).toContain(HOSTILE_NAME);
    expect(await page.locator('img').count()).toBe(0);
  });

  // rows of the table of all buildings are made by the same lines: the first of them speak for all
  const ALIKE = '#all-table tbody tr:nth-child(n+25)';
  it.each(['light', 'dark'] as const)(
    'gives axe nothing to report in the %s scheme, wide or narrow',
    async (colorScheme) => {
      const page = await open(address, { colorScheme });
      await page.evaluate(axeSource);
      // structure does not hang on the scheme or the width: all rules once, elsewhere those of colours and sizes
      const problems = (rules: string): Promise<string[]> =>
        page.evaluate(`axe.run({ exclude: [['${ALIKE}']] }, { resultTypes: ['violations']${rules} }).then(({ violations }) =>
          violations.map(({ id, nodes }) => id + ': ' + nodes.slice(0, 3).map(({ target }) => target.join(' ')).join(', ')))`);
      await page.evaluate('document.querySelectorAll("details").forEach((details) => { details.open = true; })');
      for (const width of [1280, 390]) {
        await page.setViewportSize({ width, height: 900 });
        const rules =
          colorScheme === 'light' && width === 1280
            ? ''
            : ", runOnly: ['color-contrast', 'target-size', 'scrollable-region-focusable', 'link-in-text-block']";
        expect(await problems(rules)).toEqual([]);
        await page.locator('#list-table a').first().click();
        await page.locator('#make-hand').click();
        expect(await problems(rules)).toEqual([]);
        await page.keyboard.press('Escape');
      }
    },
    60_000,
  );

  it('prints in light colours with the list and without the table of all buildings', async () => {
    const page = await open(address, { colorScheme: 'dark' });
    await page.emulateMedia({ media: 'print', colorScheme: 'dark' });
    expect(await page.evaluate('getComputedStyle(document.body).backgroundColor')).toBe('rgb(255, 255, 255)');
    expect(await page.locator('#all-region').isVisible()).toBe(false);
    expect(await page.locator('#list-table').isVisible()).toBe(true);
  });
});

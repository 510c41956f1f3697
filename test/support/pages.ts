/** Pages of ours in Chromium, as their reader opens them: from disk. */
import { chromium } from 'playwright-core';
import type { Browser, BrowserContext, Page } from 'playwright-core';
import { inject, vi } from 'vitest';

export interface View {
  readonly width?: number;
  readonly colorScheme?: 'light' | 'dark';
}

/**
 * One browser, and one context for all pages of a test file: they share a process and what it has compiled, which halves the wait. Nothing
 * passes between them, as our pages keep nothing.
 */
export class Pages {
  /** Console messages, errors and requests other than a page itself: all of them unwanted. */
  readonly noise: string[] = [];
  readonly #browser: Browser;
  readonly #context: BrowserContext;
  readonly #opened: Page[] = [];
  /** Stays open: the process ends with its last page. */
  #first: Page | undefined;

  private constructor(browser: Browser, context: BrowserContext) {
    this.#browser = browser;
    this.#context = context;
  }

  static async launch(): Promise<Pages> {
    const browser = await chromium.launch({
      executablePath: inject('chromiumPath'),
      args: [
        '--no-sandbox',
        '--disable-gpu',
        '--disable-quic',
        '--no-first-run',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
      ],
    });
    return new Pages(browser, await browser.newContext());
  }

  /** The page at `url` with all its charts drawn. */
  async open(url: string, { width = 1280, colorScheme = 'light' }: View = {}): Promise<Page> {
    const page = await this.#context.newPage();
    if (this.#first === undefined) this.#first = page;
    else this.#opened.push(page);
    await page.setViewportSize({ width, height: 900 });
    await page.emulateMedia({ colorScheme });
    page.on('console', (message) => this.noise.push(`console: ${message.text()}`));
    page.on('pageerror', (error) => this.noise.push(`error: ${error.message}`));
    page.on('dialog', (dialog) => {
      this.noise.push(`dialog: ${dialog.message()}`);
      void dialog.dismiss();
    });
    page.on('request', (request) => {
      if (!request.isNavigationRequest()) this.noise.push(`request: ${request.url()}`);
    });
    await page.goto(url);
    // The policy of the page forbids waiting by a script of ours, so the waiting is done from here.
    const drawn = async (): Promise<boolean> => (await page.locator('.chart:not([data-drawn])').count()) === 0;
    await vi.waitUntil(drawn, { timeout: 15_000, interval: 50 });
    return page;
  }

  /** Closes what a test has opened. */
  async closeOpened(): Promise<void> {
    await Promise.all(this.#opened.splice(0).map((page) => page.close()));
  }

  async end(): Promise<void> {
    await this.#browser.close();
  }
}

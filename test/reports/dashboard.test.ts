import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { renderDashboard } from '../../src/reports/dashboard.js';
import { HOSTILE_NAME, pageData } from '../support/page-data.js';

const page = renderDashboard(pageData({ listSize: 40 }), 'void 0;');

describe('renderDashboard', () => {
  it('names in its policy exactly the style and the script it carries', () => {
    const policy = /Content-Security-Policy" content="([^"]*)"/.exec(page)?.[1]?.replaceAll('&#39;', "'") ?? '';
    const hash = (text: string): string => `'sha256-${createHash('sha256').update(text).digest('base64')}'`;
    const style = /<style>([\s\S]*?)<\/style>/.exec(page)?.[1] ?? '';
    expect(policy).toContain("default-src 'none'");
    expect(policy).toContain(`script-src ${hash('void 0;')};`);
    expect(policy).toContain(`style-src ${hash(style)};`);
    expect(policy).not.toMatch(/unsafe|https?:/);
    expect(page.match(/<style/g)).toHaveLength(1);
    expect(page).not.toMatch(/ style=| on\w+="/);
  });

  it('fetches nothing', () => {
    expect(page).not.toMatch(/<(?:link|iframe|object|embed)|<script[^>]* src=|<img|@import|url\(/);
  });

  it('shows a hostile name as text', () => {
    expect(page.includes(HOSTILE_NAME)).toBe(false);
    expect(page.includes('&lt;/script>&lt;img src=x onerror=alert(1)>')).toBe(true);
  });

  it('says what is missing without coordinates', () => {
    expect(renderDashboard(pageData({ coordinates: false }), '').includes('no coordinates, so there is no map')).toBe(true);
  });

  it('is the same text every time', () => {
    expect(renderDashboard(pageData({ listSize: 40 }), 'void 0;') === page).toBe(true);
  });

  it('prints no unknown number', () => {
    expect(page.replaceAll(/<script[\s\S]*?<\/script>/g, '')).not.toMatch(/NaN|undefined/);
  });

  it('says that a page holds fewer buildings than there are', () => {
    const data = pageData();
    const html = renderDashboard({ ...data, buildings: { ...data.buildings, all: 9000 } }, '');
    expect(html.includes('the first 60 of 9\u202f000 buildings')).toBe(true);
  });
});

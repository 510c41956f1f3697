import { describe, expect, it } from 'vitest';
import { renderSummary } from '../../src/reports/summary.js';
import { HOSTILE_NAME, pageData } from '../support/page-data.js';

describe('renderSummary', () => {
  const data = pageData({ listSize: 40 });
  const text = renderSummary(data);

  it('opens with the answer', () => {
    const wrong = Math.round(data.summary.expected_wrong_places);
    expect(text).toContain(`**Of the 40 buildings listed, out of ${String(data.summary.ranked)} ranked, `);
    expect(text).toContain(`about ${String(wrong)} are expected to be wrong`);
  });

  it('has one row for every place of the list', () => {
    const list = text.slice(text.indexOf('## The list'), text.indexOf('## Where the rows went'));
    expect(list.match(/^\| \d+ \| EX-/gm)).toHaveLength(40);
  });

  it('carries names as harmless text', () => {
    expect(text).not.toContain(HOSTILE_NAME);
    expect(text).not.toMatch(/<(?!br)/);
    expect(text).toContain('&lt;/script&gt;');
  });

  it('names every caution, assumption and account line', () => {
    for (const { statement } of data.summary.assumptions) expect(text).toContain(statement);
    for (const { title } of data.summary.account) expect(text).toContain(title);
    for (const caution of data.summary.cautions) expect(text).toContain(caution);
  });

  it('says so when everything fits the list', () => {
    expect(renderSummary(pageData({ count: 8, listSize: 20 }))).toContain('the list decides nothing yet');
  });

  it('prints no unknown number', () => {
    expect(text).not.toMatch(/NaN|undefined/);
  });
});

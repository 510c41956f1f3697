import { describe, expect, it } from 'vitest';
import { answerNotes, answerSentence, heightUnitSentence, notRankedSentence, slopeSentence, unreadSentence } from '../../../src/reports/dashboard/answers.js';
import { pageData } from '../../support/page-data.js';

const data = pageData({ listSize: 20 });

it('names the columns whose cells were not read', () => {
  const of = (column: string) => ({ code: 'unknown-word', kind: 'rejected-cell', count: 103, column, example: '' });
  expect(unreadSentence({ findings: [of('torsion'), of('setback')] })).toContain('Torsion (103); Setback (103)');
  expect(unreadSentence({ findings: [] })).toBe('');
});
const edgeNote = (from: number, to: number): string | undefined =>
  answerNotes({ ...data, summary: { ...data.summary, tie_group_at_edge: { from, to } } }).find((note) => note.includes('edge of the list'));

describe('answerNotes', () => {
  it('names the ranks across the edge only when they lie on both sides of it', () => {
    expect(edgeNote(17, 24)).toMatch(/^Ranks 17 to 24 lie across/);
    expect(edgeNote(17, 20)).toBeUndefined();
  });
});

describe('answerSentence', () => {
  it('speaks of one building as one', () => {
    expect(answerSentence(pageData({ count: 1, listSize: 1 }))).toMatch(/^The only ranked building fits the list of 1/);
  });
});

describe('notRankedSentence', () => {
  it('counts by reason, the commonest first, and sums up the rest', () => {
    const not_ranked = [
      { reason: 'a', count: 6 },
      { reason: 'b', count: 4 },
      { reason: 'c', count: 2 },
      { reason: 'd', count: 1 },
      { reason: 'e', count: 1 },
    ];
    expect(notRankedSentence({ ...data.summary, not_ranked })).toBe(
      '14 buildings are not ranked, by reason: a (6); b (4); c (2); other reasons (2).',
    );
    expect(notRankedSentence({ ...data.summary, not_ranked: [] })).toBe('');
  });
});

describe('heightUnitSentence', () => {
  it('says what to write when the column looks like feet, and nothing otherwise', () => {
    const finding = { code: 'column-looks-like-feet', kind: 'note', count: 1, example: '' };
    expect(heightUnitSentence({ findings: [finding] })).toContain('height_m: {column: …, unit: ft}');
    expect(heightUnitSentence({ findings: [] })).toBe('');
  });
});

describe('slopeSentence', () => {
  it('says once what all spectra share', () => {
    const one = { spectrum: 'assumed', k: 2.5, how: 'assumed: one level only' };
    expect(slopeSentence({ slopes: [one, { ...one, spectrum: 'rock' }] })).toBe(
      'Slope k of the hazard curve: 2.50 (assumed: one level only).',
    );
    expect(slopeSentence({ slopes: [one, { ...one, spectrum: 'rock', k: 3 }] })).toContain('2.50 for assumed');
  });
});

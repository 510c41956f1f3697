import { describe, expect, it } from 'vitest';
import type { PageData } from '../../../src/engineering/page-contract.js';
import { middleSentence, reasonTeller } from '../../../src/reports/dashboard/reasons.js';
import { pageData } from '../../support/page-data.js';

/** The first three buildings given these values; the portfolio's middle stays 0.5 g, 0.2 g and 20 people. */
function withValues(first: Readonly<Record<'sa_g' | 'capacity_g' | 'people_exposed', number>>): PageData {
  const data = pageData();
  const middles = { sa_g: 0.5, capacity_g: 0.2, people_exposed: 20 };
  const results = { ...data.buildings.results };
  for (const name of ['sa_g', 'capacity_g', 'people_exposed'] as const) {
    results[name] = (results[name] ?? []).map((_, i) => (i === 0 ? first[name] : middles[name]));
  }
  results['case_system'] = (results['case_system'] ?? []).map(() => 'concrete-shear-wall');
  results['case_edition'] = (results['case_edition'] ?? []).map(() => 'ubc-1949');
  const { inputs } = data.buildings;
  const system = inputs.words.system.map(() => 'concrete-shear-wall');
  return { ...data, buildings: { ...data.buildings, results, inputs: { ...inputs, words: { ...inputs.words, system } } } };
}

describe('reasonTeller', () => {
  it.each([
    [{ sa_g: 0.9, capacity_g: 0.2, people_exposed: 20 }, 'strong demand: 0.90 g'],
    [{ sa_g: 0.5, capacity_g: 0.08, people_exposed: 30 }, 'concrete shear wall, UBC 1949: capacity 0.080 g'],
    [
      { sa_g: 0.5, capacity_g: 0.08, people_exposed: 50 },
      'concrete shear wall, UBC 1949: capacity 0.080 g; 50 people on average',
    ],
    [{ sa_g: 0.5, capacity_g: 0.2, people_exposed: 450 }, '450 people on average'],
    [{ sa_g: 0.5, capacity_g: 0.2, people_exposed: 20 }, 'nothing stands out: close to the middle of the portfolio'],
  ])('names the term furthest above the middle of %o', (first, words) => {
    expect(reasonTeller(withValues(first))(0)).toBe(words);
  });
});

describe('middleSentence', () => {
  it('names the middles the reasons are held against', () => {
    const data = withValues({ sa_g: 0.9, capacity_g: 0.2, people_exposed: 20 });
    expect(middleSentence(data)).toBe('Middle of the portfolio: demand 0.50 g, capacity 0.20 g, 20 people on average.');
    expect(middleSentence({ ...data, summary: { ...data.summary, rank_by: 'demand' } })).toBe('Middle of the portfolio: demand 0.50 g.');
  });
});

import { readFileSync, writeFileSync } from 'node:fs';
import { beforeAll, describe, expect, it } from 'vitest';
import { surveyStudy } from '../../src/exports/survey-study.js';
import { perCostWord, planSentences, visitWord } from '../../src/reports/survey/words.js';
import { screenedDemo } from '../support/screened-demo.js';

// No outside source for these checks: what is said is our own contract. Hours are those of the usual visits.
let path = '';

beforeAll(async () => {
  path = await screenedDemo();
}, 60_000);

describe('surveyStudy', () => {
  it('says that no visit fits, and which costs least', async () => {
    const plan = (limits: { hours?: number; money?: number }): Promise<unknown> =>
      surveyStudy(path, { ...limits, page: false });
    await expect(plan({ hours: 0.1 })).rejects.toMatchObject({
      place: { key: 'survey.visits' },
      message: expect.stringMatching(
        /^no visit fits into 0\.100 h; the cheapest is street \(0\.400 h.*\): give more, or change the visits$/,
      ) as string,
    });
    const { tooLarge } = await surveyStudy(path, { hours: 0.4, page: false });
    expect(tooLarge.map(({ name }) => name)).toEqual(['desk', 'drawings']);
  });

  it('shows no worth for hours that a visit does not take', { timeout: 60_000 }, async () => {
    const text = readFileSync(path, 'utf8').replace(/^survey:\n(?: .*\n)*/m, '');
    writeFileSync(path, `${text}\nsurvey: {visits: {drone: {hours: 0, money: 90, finds: {system: 0.5}}}}\n`);
    const { plan } = await surveyStudy(path, { hours: 1, money: 900, page: false });
    expect(plan.steps.length).toBeGreaterThan(0);
    expect(new Set(plan.steps.map(perCostWord))).toEqual(new Set(['–']));
    expect(new Set(plan.steps.map(({ value_per_cost }) => value_per_cost))).toEqual(new Set([null]));
    const planned = await surveyStudy(path, { money: 900, page: false });
    expect(perCostWord(planned.plan.steps[0]!)).toMatch(/^0\.0*[1-9]/);
    const none = { ...plan, steps: [] };
    expect(planSentences(none, [{ name: 'drawings', hours: 4, money: 160, finds: {} }])[0]).toBe(
      'No visit that fits is worth anything; what does not fit into the hours or the money: drawings (4.00 h, 160.0 in money).',
    );
    expect(visitWord({ name: 'drone', hours: 0, money: 90, finds: {} })).toBe('drone (90.00 in money)');
  });
});

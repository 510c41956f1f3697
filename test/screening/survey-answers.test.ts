import { writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { answersSinceRun, withdrawAnswers } from '../../src/exports/held-answers.js';
import { takeAnswers } from '../../src/exports/take-answers.js';
import { planSentences } from '../../src/reports/survey/words.js';
import { renderSurvey } from '../../src/reports/survey.js';
import { renderSummary } from '../../src/reports/summary.js';
import { renderDashboard } from '../../src/reports/dashboard.js';
import { pageDataOf } from '../../src/screening/page-data.js';
import { baseRun, refresh } from '../../src/screening/refresh.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import { planSurvey } from '../../src/screening/survey.js';
import type { SurveyPlan } from '../../src/screening/survey.js';
import { visitsOf } from '../../src/screening/survey-outlook.js';
import type { Database } from '../../src/store/database.js';
import { loadStudy } from '../../src/study/load.js';
import type { LoadedStudy } from '../../src/study/load.js';
import { screenedDemo } from '../support/screened-demo.js';
import { MADE } from '../support/study-folder.js';

const EVERYTHING =
  'system,year_built,storeys_above,height_m,soft_storey,use,occupants_peak,design_base_shear_coefficient';

/** A sheet that answers all there is to ask, and the columns of each question. */
const CELLS: Readonly<Record<string, string>> = {
  system: 'concrete-shear-wall',
  year_built: '1968',
  storeys_above: '3',
  height_m: '10.5',
  soft_storey: 'no',
  use: 'office',
  occupants_peak: '40',
  design_base_shear_coefficient: '0.08',
};

// one study, screened, asked, answered, screened again: each test goes on where the one before ended
describe('planSurvey, between answers and the next screening', () => {
  let path = '';
  let loaded: LoadedStudy;
  let db: Database;
  let before: SurveyPlan;
  let whole: string;
  let part: string;

  const take = (text: string): Promise<unknown> => {
    const file = join(dirname(path), 'back.csv');
    writeFileSync(file, text);
    return takeAnswers(path, file, MADE);
  };
  const plan = (run: number): Promise<SurveyPlan> =>
    planSurvey(db, run, {
      visits: visitsOf(loaded.study),
      limits: { hours: 80, money: Infinity },
    });
  const askedAt = ({ steps }: SurveyPlan, id: string): readonly string[] => [
    ...new Set(steps.filter((step) => step.id === id).flatMap(({ asks }) => asks)),
  ];

  beforeAll(async () => {
    path = await screenedDemo();
    loaded = await loadStudy(path);
    db = await openStudyDatabase(loaded);
    before = await plan(1);
    const many = before.steps.filter(({ asks }) => asks.includes('system') && asks.length > 1).map(({ id }) => id);
    [whole = '', part = ''] = [...new Set(many)];
  }, 60_000);
  afterAll(() => {
    db.close();
  });

  it('says nothing of answers where there are none', () => {
    expect([before.answered_at, before.withdrawn_at]).toEqual([0, 0]);
    expect(planSentences(before).join(' ')).not.toContain('screen');
    expect(askedAt(before, whole).length).toBeGreaterThan(2);
    expect(askedAt(before, part)).toEqual(expect.arrayContaining(['system', 'height']));
  });

  it(
    'asks for nothing that has been answered, and says so in terminal, JSON and page',
    { timeout: 60_000 },
    async () => {
      // far from the edge of the list nobody is sent, but an answer is an answer
      const [far = ''] = (
        await db.rows<{ id: string }>(
          'SELECT b.id FROM result r JOIN building b USING (building_index) WHERE run_id = 1 AND rank IS NOT NULL ORDER BY rank DESC LIMIT 1',
        )
      ).map(({ id }) => id);
      const cells = EVERYTHING.split(',').map((name) => CELLS[name]!);
      await take(`id,${EVERYTHING}\n${whole},${cells.join(',')}\n`);
      await take(`id,visit,system,use\n${part},street,concrete-shear-wall,?\n${far},,timber-light-frame,\n`);
      const after = await plan(1);
      expect(askedAt(after, whole)).toEqual([]);
      expect(after.steps.some(({ id }) => id === whole)).toBe(false);
      // what was not answered there is asked still
      expect(askedAt(after, part)).not.toContain('system');
      expect(askedAt(after, part)).toContain('height');
      expect(after.answered_at).toBe(3);
      // other buildings are planned for as before, visit by visit
      const others = ({ steps }: SurveyPlan) =>
        steps
          .filter(({ id }) => id !== whole && id !== part)
          .map(({ id, visit, asks, value }) => [id, visit, asks, value]);
      expect(others(after).slice(0, 30)).toEqual(others(before).slice(0, 30));
      // what has been answered is no gain of the visits to come, and nothing that they could still find out
      expect(after.expected_wrong_before).toBe(before.expected_wrong_before);
      expect(after.expected_wrong_after).toBeGreaterThan(before.expected_wrong_after);
      expect(after.expected_wrong_least).toBeGreaterThan(before.expected_wrong_least);
      expect(after.value_of_all).toBeLessThan(before.value_of_all);
      const sentence =
        'At 3 buildings answers have come in that run 1 does not count yet: what they settle is not asked for; run swaymark screen to count them in.';
      expect(planSentences(after)).toContain(sentence);
      expect(renderSurvey('t', after, '')).toContain(sentence.slice(0, 60));
      expect(planSentences({ ...after, steps: [] })).toContain(sentence);
      expect(await answersSinceRun(path)).toEqual({ run: 1, answered_at: 3, withdrawn_at: 0 });
    },
  );

  it('tells it with a refresh, which stands on the inventory of before', { timeout: 60_000 }, async () => {
    const later = new Date('2030-01-01T00:00:00Z');
    const { runId, summary } = await refresh(db, await baseRun(db, loaded, 1), loaded, { made: later, outlook: true });
    expect(summary.survey).toMatchObject({ answered_at: 3 });
    expect(summary.survey?.steps.some(({ id }) => id === whole)).toBe(false);
    const data = await pageDataOf(db, runId, 'si');
    const words = 'At 3 buildings answers have come in that run 2 does not count yet';
    expect(renderSummary(data)).toContain(words);
    expect(renderDashboard(data, '')).toContain(words);
  });

  it(
    'asks again for what was withdrawn, and counts a design level alone as no coefficient',
    { timeout: 60_000 },
    async () => {
      await withdrawAnswers(path, { id: part, question: 'system' }, MADE);
      const again = await plan(1);
      expect(askedAt(again, part)).toContain('system');
      expect(again.answered_at).toBe(2);
      // what is withdrawn before any run has counted it is not told as withdrawn from the run
      expect(again.withdrawn_at).toBe(0);
      await withdrawAnswers(path, { id: whole }, MADE);
      await withdrawAnswers(path, { id: part }, MADE);
      const back = await plan(1);
      expect(back.answered_at).toBe(1);
      expect(back.steps).toEqual(before.steps);
      await take(`id,design_level\n${whole},strength\n`);
      const level = await plan(1);
      expect(level.steps).toEqual(before.steps);
      expect(level.answered_at).toBe(2);
    },
  );

  it('has nothing to say of answers that the run counts, told twice or not', { timeout: 60_000 }, async () => {
    await take(`id,visit,system\n${part},street,concrete-shear-wall\n`);
    const { runId } = await screen(db, loaded, { made: MADE });
    // counted by hand in data-demo/inventory.csv: 10 coefficients, 6 rows with the state "assessment done"; measured periods are of rows and of records
    const given =
      'a design coefficient, as drawings state it for 10 buildings; a finished assessment for 6 buildings; a measured period for ';
    const first = (await pageDataOf(db, 1, 'si')).summary;
    const data = await pageDataOf(db, runId, 'si');
    expect(first.level_of_work).toContain(
      `itself visited nothing and read no drawings. In the records it was given: ${given}`,
    );
    expect(data.summary.level_of_work).toContain(`it was given: answers of a survey for 3 buildings; ${given}`);
    expect(data.summary.cautions[0]).toBe(data.summary.level_of_work);
    for (const page of [renderSummary(data), renderDashboard(data, '').replaceAll(/<script[^]*?<\/script>/g, '')]) {
      // in the head and with the cautions
      expect(page.split('answers of a survey for 3 buildings')).toHaveLength(3);
      expect(page).not.toMatch(/no building was visited|no visit was made/);
    }
    const now = await plan(runId);
    expect([now.answered_at, now.withdrawn_at]).toEqual([0, 0]);
    expect(askedAt(now, part)).not.toContain('system');
    // the same answer by another visit changes nothing
    await take(`id,visit,system\n${part},desk,concrete-shear-wall\n`);
    expect(await plan(runId)).toEqual(now);
    // an earlier run counts as little of it as before
    expect((await plan(1)).answered_at).toBe(3);
    // another one does: it is news, though the run has nothing left to ask
    await take(`id,visit,system\n${part},desk,timber-light-frame\n`);
    expect((await plan(runId)).answered_at).toBe(1);
    await withdrawAnswers(path, { id: part }, MADE);
    const without = await plan(runId);
    expect([without.answered_at, without.withdrawn_at]).toEqual([0, 1]);
    expect(planSentences(without).join(' ')).toContain(
      `At one building answers that run ${String(runId)} counts were withdrawn since, and are taken as known still`,
    );
    expect((await plan(1)).withdrawn_at).toBe(0);
  });
});

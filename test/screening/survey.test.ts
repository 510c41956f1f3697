import { writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { withdrawAnswers } from '../../src/exports/held-answers.js';
import { takeAnswers } from '../../src/exports/take-answers.js';
import { failedVisits } from '../../src/inventory/kept-answers.js';
import { fieldSheet } from '../../src/exports/survey-study.js';
import { worthwhileSentence } from '../../src/reports/survey/words.js';
import { walksOf } from '../../src/reports/survey/walk.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import { planSurvey } from '../../src/screening/survey.js';
import { visitsOf } from '../../src/screening/survey-outlook.js';
import { loadStudy } from '../../src/study/load.js';
import { MADE, demoCopy } from '../support/study-folder.js';

describe('planSurvey', () => {
  it(
    'plans visits worth their cost within the hours, and says what they do to the list',
    { timeout: 60_000 },
    async () => {
      const path = demoCopy();
      const loaded = await loadStudy(path);
      const db = await openStudyDatabase(loaded);
      try {
        const { runId, summary, taken } = await screen(db, loaded, { made: MADE, outlook: true });
        const visits = visitsOf(loaded.study);
        const wish = { visits, limits: { hours: 30, money: Infinity } };
        const plan = await planSurvey(db, runId, wish);
        expect(plan.steps.length).toBeGreaterThan(10);
        expect(plan.hours).toBeLessThanOrEqual(30 + 1e-9);
        expect(plan.expected_wrong_before).toBe(summary.expected_wrong_places);
        let hours = 0;
        let wrong = plan.expected_wrong_before;
        const made = new Set<string>();
        for (const step of plan.steps) {
          const visit = visits.find(({ name }) => name === step.visit)!;
          hours += visit.hours;
          expect(step.hours_so_far).toBeCloseTo(hours, 9);
          expect(step.value).toBeGreaterThan(0);
          expect(step.value_per_cost).toBeCloseTo(step.value / visit.hours, 9);
          expect(step.asks.every((unknown) => (visit.finds[unknown] ?? 0) > 0)).toBe(true);
          expect(step.asks.length).toBeGreaterThan(0);
          expect(Math.max(...step.shares)).toBeLessThanOrEqual(1);
          expect(step.expected_wrong_places).toBeLessThanOrEqual(wrong + 1e-6);
          wrong = step.expected_wrong_places;
          // nobody goes to a building twice for the same kind of visit
          expect(made.has(`${step.id} ${step.visit}`)).toBe(false);
          made.add(`${step.id} ${step.visit}`);
        }
        expect(await planSurvey(db, runId, wish)).toEqual(plan);
        // what the run itself told is the same plan
        const { survey } = summary;
        const longer = await planSurvey(db, runId, { ...wish, limits: { hours: 200, money: Infinity } });
        expect(longer.steps[0]).toEqual(survey?.steps[0]);
        expect(survey?.reach_wrong).toBe(longer.expected_wrong_after);
        // what nearly all of the worth hangs on is a part of the inventory, not whatever a loose bound lets through
        expect(plan.buildings_of_80_percent).toBeLessThan(plan.buildings_of_99_percent);
        expect(plan.buildings_of_99_percent).toBeLessThan(plan.weighed);
        expect(survey?.buildings_of_99_percent).toBe(plan.buildings_of_99_percent);
        expect(worthwhileSentence(survey!, plan.ranked)).toBe(
          `Of 227 ranked buildings ${String(plan.buildings_of_80_percent)} hold 80 % of what visits can find out that matters to the list, ${String(plan.buildings_of_99_percent)} hold 99 %.`,
        );
        // what is on record is asked of nobody
        const known = await db.rows<{ id: string; system: string | null; year: number | null }>(
          'SELECT id, CAST(system AS VARCHAR) AS system, year_built AS year FROM building',
        );
        for (const { id, asks } of longer.steps) {
          const { system, year } = known.find((one) => one.id === id)!;
          if (asks.includes('system')) expect([null, 'unknown']).toContain(system);
          if (asks.includes('year')) expect(year).toBeNull();
        }

        // a visit that looked for a system and found none: another kind of visit goes for it, that one does not go again
        const missed = plan.steps.find(({ visit, asks }) => visit === 'street' && asks.includes('system'))!;
        const take = (row: string): Promise<unknown> => {
          const file = join(dirname(path), 'back.csv');
          writeFileSync(file, `id,visit,system\n${missed.id},${row}\n`);
          return takeAnswers(path, file, MADE);
        };
        const asked = ({ steps }: typeof plan, visit: string): boolean =>
          steps.some((one) => one.id === missed.id && one.visit === visit && one.asks.includes('system'));
        await take('Street,?');
        const without = await planSurvey(db, runId, { ...wish, limits: { hours: 200, money: Infinity } });
        expect([plan.failed_at, without.failed_at]).toEqual([0, 1]);
        expect(asked(without, 'street')).toBe(false);
        expect(asked(without, 'desk') || asked(without, 'drawings')).toBe(true);
        expect(
          without.steps.some(
            ({ id, visit, asks }) => id !== missed.id && visit === 'street' && asks.includes('system'),
          ),
        ).toBe(true);
        // what no visit can find out is counted on by nobody
        await take('desk,not found');
        await take('drawings,NOT FOUND');
        const never = await planSurvey(db, runId, wish);
        expect(never.steps.some(({ id, asks }) => id === missed.id && asks.includes('system'))).toBe(false);
        expect(never.expected_wrong_least).toBeGreaterThan(plan.expected_wrong_least);
        expect(never.value_of_all).toBeLessThan(plan.value_of_all);
        // an answer taken later by any visit supersedes all of them; a failure after it stands for itself; withdrawn, none counts
        const { inventoryId } = taken;
        const failed = async (): Promise<unknown> =>
          [...(await failedVisits(db, inventoryId)).values()].map((visits) =>
            [...visits].map(([visit, of]) => [visit, ...of]),
          );
        expect(await failed()).toEqual([
          [
            ['desk', 'system'],
            ['drawings', 'system'],
            ['street', 'system'],
          ],
        ]);
        await take('desk,concrete-shear-wall');
        expect(await failed()).toEqual([]);
        await take('street,?');
        expect(await failed()).toEqual([[['street', 'system']]]);
        await withdrawAnswers(path, { id: missed.id, question: 'system' }, MADE);
        expect(await failed()).toEqual([]);
      } finally {
        db.close();
      }
    },
  );

  it('refuses where the list holds every building', { timeout: 60_000 }, async () => {
    const loaded = await loadStudy(demoCopy({ study: (text) => text.replace(/list_size: \d+/, 'list_size: 500') }));
    const db = await openStudyDatabase(loaded);
    try {
      const { runId, summary } = await screen(db, loaded, { made: MADE, outlook: true });
      expect(summary.survey).toBeNull();
      const wish = { visits: visitsOf(loaded.study), limits: { hours: 8, money: Infinity } };
      await expect(planSurvey(db, runId, wish)).rejects.toThrow('holds all 227 ranked buildings');
    } finally {
      db.close();
    }
  });
});

const step = (place: number, id: string, group: string | null, lon: number | null) => ({
  place,
  id,
  name: null,
  group,
  lon,
  lat: lon === null ? null : 10,
  rank: place,
  visit: 'street',
  asks: ['system' as const],
  shares: [0.3],
  value: 1,
  value_per_cost: 2,
  hours: 0.5,
  money: 0,
  hours_so_far: 0.5 * place,
  money_so_far: 0,
  expected_wrong_places: 5,
});

describe('walksOf', () => {
  it('goes block by block, each time to the nearest building not yet visited', () => {
    const steps = [
      step(1, 'A1', 'A', 0),
      step(2, 'B1', 'B', 5),
      step(3, 'A9', 'A', 0.9),
      step(4, 'A0', 'A', null),
      step(5, 'A3', 'A', 0.3),
      { ...step(6, 'A1', 'A', 0), visit: 'desk' },
    ];
    const walks = walksOf(steps);
    expect(walks.map(({ block, stops }) => [block, stops.map(({ id }) => id)])).toEqual([
      ['A', ['A1', 'A3', 'A9', 'A0']],
      ['B', ['B1']],
    ]);
    expect(walks[0]?.stops[0]?.visits.map(({ visit }) => visit)).toEqual(['street', 'desk']);
    expect(walks[0]?.hours).toBe(2.5);
  });
});

describe('fieldSheet', () => {
  it('leaves what is asked blank, marks what is not, and makes formulas harmless', () => {
    const plan = { steps: [{ ...step(1, '=1+1', '@A', null), name: 'a "b", c' }] } as unknown as Parameters<
      typeof fieldSheet
    >[0];
    const [head, row] = fieldSheet(plan).replace('\ufeff', '').split('\r\n');
    expect(head).toContain('system,year_built,storeys_above,height_m');
    expect(row).toBe(
      `1,'=1+1,"a ""b"", c",'@A,,,1,street,lateral system,lateral system unknown: 30 % of the spread,,${'–,'.repeat(13)},,`,
    );
  });
});

import { describe, expect, it } from 'vitest';
import { fieldSheet } from '../../src/exports/survey-study.js';
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
      const loaded = await loadStudy(demoCopy());
      const db = await openStudyDatabase(loaded);
      try {
        const { runId, summary } = await screen(db, loaded, { made: MADE });
        const visits = visitsOf(loaded.study);
        const wish = { visits, limits: { hours: 30, money: Infinity }, cost: 'hours' as const };
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
        // what is on record is asked of nobody
        const known = await db.rows<{ id: string; system: string | null; year: number | null }>(
          'SELECT id, CAST(system AS VARCHAR) AS system, year_built AS year FROM building',
        );
        for (const { id, asks } of longer.steps) {
          const { system, year } = known.find((one) => one.id === id)!;
          if (asks.includes('system')) expect([null, 'unknown']).toContain(system);
          if (asks.includes('year')) expect(year).toBeNull();
        }
      } finally {
        db.close();
      }
    },
  );

  it('refuses where the list holds every building', { timeout: 60_000 }, async () => {
    const loaded = await loadStudy(demoCopy({ study: (text) => text.replace(/list_size: \d+/, 'list_size: 500') }));
    const db = await openStudyDatabase(loaded);
    try {
      const { runId, summary } = await screen(db, loaded, { made: MADE });
      expect(summary.survey).toBeNull();
      const wish = { visits: visitsOf(loaded.study), limits: { hours: 8, money: Infinity }, cost: 'hours' as const };
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

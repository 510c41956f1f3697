import { describe, expect, it } from 'vitest';
import { bestCampaign, knownSet, planCampaign, withinReach } from '../../../src/engineering/priority/campaign.js';
import type { Candidate, Visit } from '../../../src/engineering/priority/campaign.js';
import type { Worth } from '../../../src/engineering/priority/survey-value.js';
import { random } from '../../support/engineering-random.js';

/** Two unknowns whose values simply add. */
const adding = (system: number, year: number): Worth => ({
  unknowns: ['system', 'year'],
  value: Float64Array.of(0, system, year, system + year),
  wrongOf: (set) => [0.4, 0.3, 0.2, 0.1][set]!,
});

const STREET: Visit = { name: 'street', hours: 0.5, money: 50, finds: { system: 1 } };
const DESK: Visit = { name: 'desk', hours: 1, money: 20, finds: { year: 1 } };
const free = { hours: Infinity, money: Infinity };

describe('bestCampaign', () => {
  const worthOf = (planned: readonly { readonly value: number }[]): number =>
    planned.reduce((sum, { value }) => sum + value, 0);
  const drawings: Visit = { name: 'drawings', hours: 0.5, money: 400, finds: { system: 1, year: 1 } };
  const many: Candidate[] = Array.from({ length: 12 }, (_, index) => ({ index, worth: adding(1 + 0.1 * index, 1) }));

  it('weighs by what is limited', () => {
    expect(bestCampaign(many, [STREET, drawings], { hours: 3, money: Infinity }).cost).toBe('hours');
    expect(bestCampaign(many, [STREET, drawings], { hours: Infinity, money: 500 }).cost).toBe('money');
  });

  it('is worth no less with hours beside the money than the money alone buys, nor with money beside the hours', () => {
    for (const money of [100, 430, 1000, 2500])
      for (const hours of [1, 2, 4, 1000]) {
        const both = worthOf(bestCampaign(many, [STREET, drawings], { hours, money }).planned);
        const byHours = planCampaign(many, [STREET, drawings], { hours, money }, 'hours');
        const byMoney = planCampaign(many, [STREET, drawings], { hours, money }, 'money');
        expect(both).toBeGreaterThanOrEqual(Math.max(worthOf(byHours), worthOf(byMoney)) * (1 - 1e-9));
        if (hours === 1000)
          expect(both).toBeGreaterThanOrEqual(
            worthOf(bestCampaign(many, [STREET, drawings], { hours: Infinity, money }).planned) * (1 - 1e-9),
          );
      }
    // by hours alone the dear visit wins and the money is gone after two: 2.2 + 2.3; for the money ten street visits are worth far more
    const wealthy = bestCampaign(many, [STREET, drawings], { hours: 1000, money: 900 });
    expect(wealthy.cost).not.toBe('hours');
    expect(wealthy.planned.at(-1)!.money).toBeLessThanOrEqual(900);
  });
});

describe('planCampaign', () => {
  it('takes the visits in the order of value for cost and stops at the limit', () => {
    const candidates: Candidate[] = [
      { index: 7, worth: adding(1, 4) },
      { index: 3, worth: adding(3, 0.5) },
    ];
    const all = planCampaign(candidates, [STREET, DESK], free, 'hours');
    // for an hour: 6 (3 street), 4 (7 desk), 2 (7 street), 0.5 (3 desk)
    expect(all.map(({ index, visit }) => `${String(index)} ${visit.name}`)).toEqual([
      '3 street',
      '7 desk',
      '7 street',
      '3 desk',
    ]);
    expect(all.map(({ valuePerCost }) => valuePerCost)).toEqual([6, 4, 2, 0.5]);
    expect(all.at(-1)).toMatchObject({ hours: 3, money: 140 });
    const short = planCampaign(candidates, [STREET, DESK], { hours: 1.5, money: Infinity }, 'hours');
    expect(short.map(({ index, visit }) => `${String(index)} ${visit.name}`)).toEqual(['3 street', '7 desk']);
    // money decides otherwise: 0.2 and 0.025 of a desk, 0.06 and 0.02 of a street visit
    const cheap = planCampaign(candidates, [STREET, DESK], { hours: Infinity, money: 70 }, 'money');
    expect(cheap.map(({ index, visit }) => `${String(index)} ${visit.name}`)).toEqual(['7 desk', '3 street']);
  });

  it('passes over a visit that no longer fits for one that does', () => {
    const plan = planCampaign(
      [{ index: 0, worth: adding(1, 9) }],
      [STREET, DESK],
      { hours: 0.5, money: Infinity },
      'hours',
    );
    expect(plan.map(({ visit }) => visit.name)).toEqual(['street']);
  });

  it('counts a second visit only for what the first has left open, and the values add to that of both', () => {
    const again: Visit = { name: 'drawings', hours: 4, money: 400, finds: { system: 1, year: 1 } };
    const half: Visit = { name: 'desk', hours: 1, money: 20, finds: { year: 0.5 } };
    const plan = planCampaign([{ index: 0, worth: adding(2, 1) }], [half, again], free, 'hours');
    const total = plan.reduce((sum, { value }) => sum + value, 0);
    expect(plan.map(({ visit, value }) => [visit.name, value])).toEqual([['drawings', 3]]);
    expect(total).toBeCloseTo(3, 12);
  });

  it('does not count on a visit that failed to find an unknown out at that building, but on others and elsewhere', () => {
    const drawings: Visit = { name: 'drawings', hours: 4, money: 400, finds: { system: 1, year: 1 } };
    const failed = new Map([['street', new Set(['system'] as const)]]);
    const candidates: Candidate[] = [
      { index: 0, worth: adding(2, 1), failed },
      { index: 1, worth: adding(2, 1) },
    ];
    const made = (visits: readonly Visit[]) =>
      planCampaign(candidates, visits, free, 'hours').map(({ index, visit, asks, value }) => [
        index,
        visit.name,
        asks.join(' '),
        value,
      ]);
    expect(made([STREET])).toEqual([[1, 'street', 'system', 2]]);
    // building 0 keeps its desk visit, and its system is worth 2 of the 4 h of drawings
    expect(made([STREET, DESK, drawings])).toEqual([
      [1, 'street', 'system', 2],
      [0, 'desk', 'year', 1],
      [1, 'desk', 'year', 1],
      [0, 'drawings', 'system', 2],
    ]);
    // a visit that failed on one thing of two still goes for the other
    const both: Visit = { name: 'street', hours: 0.5, money: 50, finds: { system: 1, year: 1 } };
    expect(made([both])).toEqual([
      [1, 'street', 'system year', 3],
      [0, 'street', 'year', 1],
    ]);
    // sets of system (1) and year (2) that can still be found out
    expect(candidates.map((one) => withinReach(one, [STREET]))).toEqual([0, 1]);
    expect(candidates.map((one) => withinReach(one, [STREET, DESK]))).toEqual([2, 3]);
    expect(withinReach(candidates[0]!, [drawings])).toBe(3);
  });

  it('asks for nothing that is known by now, and weighs visits by what they add to it', () => {
    const drawings: Visit = { name: 'drawings', hours: 4, money: 400, finds: { system: 1, year: 1 } };
    // values that do not add: of a building whose system is known its year is worth 0.5, not 1
    const worth: Worth = { ...adding(2, 1), value: Float64Array.of(0, 2, 1, 2.5) };
    const candidates: Candidate[] = [
      { index: 0, worth, known: new Set(['system']) },
      { index: 1, worth: adding(9, 9), known: new Set(['system', 'year']) },
    ];
    expect(
      planCampaign(candidates, [STREET, DESK, drawings], free, 'hours').map((one) => [
        one.index,
        one.visit.name,
        one.asks,
        one.value,
        // known from the start: 0.3 of the sets' chances, then both 0.1
        one.wrongBefore,
        one.wrongAfter,
      ]),
    ).toEqual([[0, 'desk', ['year'], 0.5, 0.3, 0.1]]);
    expect(candidates.map(knownSet)).toEqual([1, 3]);
    expect(candidates.map((one) => withinReach(one, [STREET]))).toEqual([1, 3]);
    expect(withinReach(candidates[0]!, [DESK])).toBe(3);
  });

  it('is never better served by another order of the same number of visits, where values add', () => {
    const { uniform } = random(42);
    for (let world = 0; world < 20; world += 1) {
      const candidates = Array.from({ length: 6 }, (_, index) => ({ index, worth: adding(uniform(), uniform()) }));
      const plan = planCampaign(
        candidates,
        [
          { ...STREET, hours: 1 },
          { ...DESK, hours: 1 },
        ],
        { hours: 5, money: Infinity },
        'hours',
      );
      const best = candidates
        .flatMap(({ worth }) => [worth.value[1]!, worth.value[2]!])
        .sort((a, b) => b - a)
        .slice(0, 5);
      expect(plan.reduce((sum, { value }) => sum + value, 0)).toBeCloseTo(
        best.reduce((sum, value) => sum + value, 0),
        12,
      );
    }
  });

  it('leaves out what is worth nothing', () => {
    const plan = planCampaign(
      [
        { index: 0, worth: adding(1, 1) },
        { index: 1, worth: adding(1e-9, 0) },
      ],
      [STREET, DESK],
      free,
      'hours',
    );
    expect(plan.every(({ index }) => index === 0)).toBe(true);
    expect(planCampaign([], [STREET], free, 'hours')).toEqual([]);
  });
});

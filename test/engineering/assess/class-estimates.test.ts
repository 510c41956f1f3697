import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ClassEstimates } from '../../../src/engineering/assess/class-estimates.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import { periodEstimates } from '../../../src/engineering/assess/estimates.js';
import type { Estimate } from '../../../src/engineering/assess/estimate.js';
import { openDatabase } from '../../../src/store/database.js';
import type { Database } from '../../../src/store/database.js';
import { building, given } from '../../support/engineering-building.js';
import { random } from '../../support/engineering-random.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const context = compileContext(SETTINGS);
const { uniform } = random(11);
/** Forty frames of 1 to 12 storeys, every third of them measured. */
const lists: readonly (readonly Estimate[])[] = Array.from({ length: 40 }, (_, i) => {
  const storeys = 1 + Math.floor(12 * uniform());
  const T = 0.1 * storeys * (0.7 + uniform());
  return periodEstimates(
    building({
      storeys: given(storeys),
      height_m: given(storeys * (2.8 + uniform())),
      measured_period_s: { longitudinal: i % 3 === 0 ? T : NaN, transverse: NaN },
      measured_amplitude: 'strong',
    }),
    'longitudinal',
    'concrete-moment-frame',
    context,
  );
});

describe('ClassEstimates', () => {
  let db: Database;
  beforeAll(async () => {
    db = await openDatabase({ path: ':memory:' });
  });
  afterAll(() => {
    db.close();
  });
  const gathered = new ClassEstimates();
  for (const list of lists) gathered.add(list);
  const summary = gathered.summary();

  // source: DuckDB, quantile_cont
  it('gives the quantiles that the database gives', async () => {
    let compared = 0;
    for (const each of summary) {
      const pairs = lists.flatMap((list) => {
        const used = list[0]!.outcome;
        return list
          .filter(({ id }) => id === each.id)
          .flatMap(({ outcome }) =>
            outcome.applies && used.applies ? [[outcome.period_s, outcome.period_s / used.period_s] as const] : [],
          );
      });
      expect(pairs.length, each.id).toBe(each.applies);
      if (pairs.length === 0) {
        expect([each.median_s, each.p10_s, each.p90_s, each.over_used]).toEqual([NaN, NaN, NaN, NaN]);
        continue;
      }
      const values = pairs.map(([t, ratio]) => `(${String(t)}::DOUBLE, ${String(ratio)}::DOUBLE)`).join(', ');
      const [row] = await db.rows<{ p10: number; p50: number; p90: number; ratio: number }>(
        `SELECT quantile_cont(t, 0.1) AS p10, quantile_cont(t, 0.5) AS p50, quantile_cont(t, 0.9) AS p90,
         quantile_cont(ratio, 0.5) AS ratio FROM (VALUES ${values}) AS v(t, ratio)`,
      );
      expect(each.p10_s, each.id).toBeCloseTo(row!.p10, 12);
      expect(each.median_s, each.id).toBeCloseTo(row!.p50, 12);
      expect(each.p90_s, each.id).toBeCloseTo(row!.p90, 12);
      expect(each.over_used, each.id).toBeCloseTo(row!.ratio, 12);
      compared += 1;
    }
    expect(compared).toBeGreaterThan(30);
  });

  it('counts where an estimate applies and where it counts, and tells the commonest reason', () => {
    const of = (id: string) => summary.find((each) => each.id === id)!;
    expect(of('used')).toMatchObject({ applies: 40, counts: 40, over_used: 1 });
    expect(of('swaymark/period/measured-strong')).toMatchObject({
      applies: 14,
      counts: 14,
      why: 'a measurement governs; the others are checks',
    });
    expect(of('asce41-17/period/concrete-moment-frame')).toMatchObject({
      applies: 40,
      counts: 26,
      why: 'the formula of the chosen standard',
    });
    expect(of('stiffness/walls').applies).toBe(0);
    expect(of('stiffness/walls').why.length).toBeGreaterThan(10);
  });

  it('leaves nothing of nothing', () => {
    expect(new ClassEstimates().summary()).toEqual([]);
  });
});

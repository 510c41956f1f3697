import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import type { AssessContext } from '../../../src/engineering/assess/context.js';
import type { AppliedEstimate, Estimate, EstimateKind } from '../../../src/engineering/assess/estimate.js';
import { periodEstimates } from '../../../src/engineering/assess/estimates.js';
import { NO_PERIOD, periodModel } from '../../../src/engineering/assess/period.js';
import type { AssessSettings } from '../../../src/engineering/assess/settings.js';
import { SYSTEMS } from '../../../src/engineering/building.js';
import type { Building, System } from '../../../src/engineering/building.js';
import { DIRECTIONS } from '../../../src/engineering/direction.js';
import { PERIOD_STANDARDS } from '../../../src/engineering/period/choose.js';
import { building, given, inferred, structure } from '../../support/engineering-building.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const studying = (period: Partial<AssessSettings['period']>): AssessContext =>
  compileContext({ ...SETTINGS, period: { ...SETTINGS.period, ...period } });
const context = compileContext(SETTINGS);

const applied = (estimates: readonly Estimate[], id: string): AppliedEstimate => {
  const found = estimates.find((each) => each.id === id);
  if (found?.outcome.applies !== true) throw new Error(`${id}: ${JSON.stringify(found)}`);
  return found.outcome;
};
const reasonOf = (estimates: readonly Estimate[], id: string): string | undefined => {
  const found = estimates.find((each) => each.id === id);
  return found?.outcome.applies === false ? found.outcome.reason : undefined;
};

const KNOWN = structure({
  column_count: 20,
  column_width_m: 0.45,
  column_depth_m: 0.5,
  beam_width_m: 0.3,
  beam_depth_m: 0.6,
  bay_length_m: 6,
  wall_areas_m2: { longitudinal: [2, 3], transverse: [4] },
  wall_lengths_m: { longitudinal: [8, 12], transverse: [14] },
  top_displacement_m: { longitudinal: 0.08, transverse: NaN },
  concrete_strength_MPa: 25,
  vs30_mps: 200,
});
const KINDS: readonly EstimateKind[] = ['used', 'measured', 'stiffness', 'standard', 'other standard', 'regression'];

/** Rows that know less and more. */
const ROWS: Readonly<Record<string, Partial<Building>>> = {
  height: {},
  structure: { structure: KNOWN },
  stiffness: { storey_stiffness_kN_per_m: { longitudinal: [2e5], transverse: [3e5] } },
  measured: {
    structure: KNOWN,
    measured_period_s: { longitudinal: 0.4, transverse: NaN },
    measured_amplitude: 'ambient',
  },
};
const STUDIES: Readonly<Record<string, AssessContext>> = {
  usual: context,
  design: studying({ standard: 'asce7-22', basis: 'design' }),
  india: studying({ standard: 'is1893-2016' }),
  regression: studying({
    formulaFor: Object.fromEntries(SYSTEMS.map((system) => [system, 'ellis-1980/period/tall-buildings'])),
  }),
  frugal: studying({
    switchedOff: ['swaymark/period/measured-small', 'stiffness/columns-and-beams', 'asce41-17/period/other'],
  }),
};
const all = Object.entries(STUDIES).flatMap(([study, under]) =>
  Object.entries(ROWS).flatMap(([row, fields]) =>
    SYSTEMS.map((system): [string, Building, System, AssessContext] => [
      `${study} ${row} ${system}`,
      building({ ...fields, system }),
      system,
      under,
    ]),
  ),
);

describe('periodEstimates', () => {
  it('marks as counting exactly what the period is made of', () => {
    for (const [name, one, system, under] of all) {
      for (const direction of DIRECTIONS) {
        const estimates = periodEstimates(one, direction, system, under);
        const model = periodModel(one, direction, system, under);
        const counted = estimates.filter(({ kind, outcome }) => kind !== 'used' && outcome.applies && outcome.counts);
        const parts = [model?.measuredId, model?.formula?.id, model?.routeId].filter((id) => typeof id === 'string');
        expect(counted.map(({ id }) => id).sort(), name).toEqual(parts.sort());
      }
    }
  });

  it('lists the period used first and every other estimate once', () => {
    for (const [name, one, system, under] of all) {
      const estimates = periodEstimates(one, 'longitudinal', system, under);
      const ids = estimates.map(({ id }) => id);
      expect(ids[0]).toBe('used');
      expect(ids.length - new Set(ids).size, name).toBe(0);
      const places = estimates.map(({ kind }) => KINDS.indexOf(kind));
      expect(places, name).toEqual([...places].sort((x, y) => x - y));
    }
  });

  it('gives the median period of the result, where system and height are given', () => {
    for (const [name, one, system, under] of all) {
      const result = assess(one, under);
      for (const direction of DIRECTIONS) {
        const estimates = periodEstimates(one, direction, system, under);
        if (!isRanked(result)) {
          expect(result.reason, name).toBe(NO_PERIOD);
          continue;
        }
        expect(applied(estimates, 'used').period_s, name).toBe(result.leading.directions[direction].period_s);
        if (direction === 'longitudinal')
          expect(applied(estimates, 'used').period_s, name).toBe(result.period.longitudinal.p50_s);
      }
    }
  });

  it('shows a range about every period, and a reason beside every estimate', () => {
    for (const [name, one, system, under] of all) {
      for (const { id, outcome } of periodEstimates(one, 'longitudinal', system, under)) {
        if (!outcome.applies) {
          expect(outcome.reason.length, `${name} ${id}`).toBeGreaterThan(5);
          continue;
        }
        expect(outcome.low_s, `${name} ${id}`).toBeLessThan(outcome.period_s);
        expect(outcome.high_s, `${name} ${id}`).toBeGreaterThan(outcome.period_s);
        expect(outcome.why.length).toBeGreaterThan(5);
      }
    }
  });

  it('shows the forms of every standard that speaks', () => {
    const ids = periodEstimates(building(), 'longitudinal', 'concrete-moment-frame', context).map(({ id }) => id);
    // ASCE 7 and the Korean standard that follows it print the same rows under ids of their own
    for (const standard of PERIOD_STANDARDS)
      expect(
        ids.some((id) => id.startsWith(`${standard}/`)),
        standard,
      ).toBe(true);
  });

  it('says why each of them does not count or cannot be used', () => {
    const of = (fields: Partial<Building>, under = context, system: System = 'concrete-moment-frame') =>
      periodEstimates(building(fields), 'longitudinal', system, under);
    const measured = of(ROWS['measured']!);
    expect(applied(measured, 'swaymark/period/measured-small')).toMatchObject({
      why: 'a measurement governs; the others are checks',
      notes: ['measured 0.4 s at small amplitude'],
      period_s: expect.closeTo(0.52, 12) as number,
      // σ 0.20, ambient converted [judgement]
      low_s: expect.closeTo(0.52 * Math.exp(-0.2), 12) as number,
    });
    expect(applied(measured, 'stiffness/columns-and-beams').why).toBe('a check: a measurement governs');
    expect(applied(measured, 'asce41-17/period/concrete-moment-frame').why).toBe('a check: a measurement governs');
    const off = of(ROWS['measured']!, STUDIES['frugal']);
    expect(applied(off, 'swaymark/period/measured-small').why).toBe('switched off by the study');
    expect(applied(off, 'stiffness/columns-and-beams').why).toBe('switched off by the study');
    expect(applied(off, 'stiffness/gravity-sway').counts).toBe(true);
    const walls = of({ structure: KNOWN }, STUDIES['design'], 'concrete-shear-wall');
    expect(applied(walls, 'asce7-22/period/concrete-or-masonry-walls').counts).toBe(true);
    expect(applied(walls, 'asce7-22/period/other').why).toBe('one of its kind counts, and a better one does');
    expect(
      reasonOf(of({}, STUDIES['design'], 'concrete-shear-wall'), 'asce7-22/period/concrete-or-masonry-walls'),
    ).toBe('not on record: areas of the walls in this direction');
    expect(
      reasonOf(
        of({ storeys: given(14), height_m: given(45) }, STUDIES['design']),
        'asce7-22/period/moment-frame-by-storeys',
      ),
    ).toContain('outside its published limit');
  });

  it('gives no period by IS 1893 "all other" without plan and area, and says what is missing', () => {
    const bare = building({ plan_length_m: NaN, plan_width_m: NaN, floor_area_m2: given(NaN) });
    const estimates = periodEstimates(bare, 'longitudinal', 'reinforced-masonry-wall', STUDIES['india']!);
    expect(reasonOf(estimates, 'used')).toBe(NO_PERIOD);
    expect(reasonOf(estimates, 'is1893-2016/period/other')).toBe('not on record: plan dimensions or floor area');
    expect(estimates.some(({ kind, outcome }) => kind === 'other standard' && outcome.applies)).toBe(true);
  });

  it('lengthens laws of small amplitude, whether they count or not', () => {
    const shown = periodEstimates(building(), 'longitudinal', 'concrete-infilled-frame', context);
    // Ellis 1980, T = h/46, × 1.5 [judgement]
    expect(applied(shown, 'ellis-1980/period/tall-buildings')).toMatchObject({
      counts: false,
      period_s: expect.closeTo((1.5 * 14) / 46, 12) as number,
      notes: expect.arrayContaining(['a law of small amplitude, lengthened for strong shaking']) as string[],
    });
    const asked = periodEstimates(building(), 'longitudinal', 'concrete-infilled-frame', STUDIES['regression']!);
    expect(applied(asked, 'ellis-1980/period/tall-buildings')).toMatchObject({ counts: true });
    expect(applied(asked, 'used').period_s).toBe(applied(asked, 'ellis-1980/period/tall-buildings').period_s);
  });

  it('brings an inferred height into the range of the period used, by what the period owes to it', () => {
    const spread = (one: Building, system: System): number => {
      const { period_s, high_s } = applied(periodEstimates(one, 'longitudinal', system, context), 'used');
      return Math.log(high_s / period_s);
    };
    // T = 0.018 h^0.9: 0.9 of the spread of the height, beside the 0.30 of the formula
    expect(spread(building({ height_m: inferred(14, 0.2) }), 'concrete-moment-frame')).toBeCloseTo(
      Math.hypot(0.3, 0.9 * 0.2),
      10,
    );
    expect(spread(building({ height_m: inferred(14, 0.2), ...ROWS['measured'] }), 'concrete-moment-frame')).toBeCloseTo(
      0.2,
      12,
    );
  });
});

import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import type { Assessment } from '../../../src/engineering/assess/assess.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import type { AssessContext } from '../../../src/engineering/assess/context.js';
import { stiffnessPeriod } from '../../../src/engineering/assess/evidence.js';
import { NO_PERIOD, alikeAcross, periodAt, periodModel } from '../../../src/engineering/assess/period.js';
import type { PeriodEstimate } from '../../../src/engineering/assess/period.js';
import type { AssessSettings } from '../../../src/engineering/assess/settings.js';
import { SYSTEMS } from '../../../src/engineering/building.js';
import type { Building, System } from '../../../src/engineering/building.js';
import { HEIGHT_NODES } from '../../../src/engineering/numeric/nodes.js';
import { BASES, PERIOD_STANDARDS } from '../../../src/engineering/period/choose.js';
import { building, given, inferred, structure } from '../../support/engineering-building.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const context = compileContext(SETTINGS);
const studying = (period: Partial<AssessSettings['period']>): AssessContext =>
  compileContext({ ...SETTINGS, period: { ...SETTINGS.period, ...period } });
const estimate = (one: Building, under = context): PeriodEstimate => {
  const model = periodModel(one, 'longitudinal', one.system!, under);
  if (model === null) throw new Error('no period');
  return periodAt(model, one.height_m.value, under);
};
const ranked = (one: Building, under = context): Assessment => {
  const result = assess(one, under);
  if (!isRanked(result)) throw new Error(result.reason);
  return result;
};

describe('periodModel', () => {
  it('lets a measurement govern, lengthened by its amplitude', () => {
    const at = (
      amplitude: 'ambient' | 'strong',
      system: 'concrete-moment-frame' | 'unreinforced-masonry-wall',
    ): number =>
      estimate(
        building({ measured_period_s: { longitudinal: 0.5, transverse: NaN }, measured_amplitude: amplitude, system }),
      ).period_s;
    expect(at('strong', 'concrete-moment-frame')).toBe(0.5);
    expect(at('ambient', 'concrete-moment-frame')).toBeCloseTo(0.65, 14);
    expect(at('ambient', 'unreinforced-masonry-wall')).toBeCloseTo(0.75, 14);
  });

  it('keeps the other estimates as checks of a measurement, and flags one a factor of 2 apart', () => {
    // ASCE/SEI 41-17 7.4.1.2.2: 0.018 h^0.9, h in feet; 14 m give 0.564 s
    const formula = 0.018 * (14 / 0.3048) ** 0.9;
    const measuring = (T: number, more: Partial<Building> = {}): Building =>
      building({ measured_period_s: { longitudinal: T, transverse: T }, measured_amplitude: 'strong', ...more });
    const near = measuring(formula * 1.9);
    expect(estimate(near)).toEqual({
      period_s: formula * 1.9,
      sigma: 0.1,
      disagreement: expect.closeTo(1.9, 10) as number,
    });
    expect(ranked(near).flags).not.toContain('estimates-differ');
    for (const factor of [2.05, 1 / 2.05]) {
      const far = measuring(formula * factor);
      expect(estimate(far).period_s).toBe(formula * factor);
      expect(estimate(far).disagreement).toBeCloseTo(2.05, 10);
      expect(ranked(far).flags).toContain('estimates-differ');
      expect(ranked(far).leading).toMatchObject({ evidence: 'measured', basis: 'measured', formula: null });
    }
    // a stiffness route is a check too
    const soft = measuring(formula, {
      seismic_weight_kN: 20_000,
      storey_stiffness_kN_per_m: { longitudinal: [20_000], transverse: [20_000] },
    });
    expect(estimate(soft).period_s).toBe(formula);
    expect(ranked(soft).flags).toContain('estimates-differ');
  });

  it('lengthens a regression of small amplitude that the study asks for', () => {
    const asked = (system: System, id: string): { period_s: number; basis: string } => {
      const under = studying({ formulaFor: { [system]: id } });
      const one = building({ system });
      return { period_s: estimate(one, under).period_s, basis: ranked(one, under).leading.basis };
    };
    // Ellis 1980: T = h/46, tall buildings of any kind, small amplitude; × 1.3, × 1.5 where infill or masonry cracks early [judgement]
    const ELLIS = 'ellis-1980/period/tall-buildings';
    const ambient = (factor: number): object => ({
      period_s: expect.closeTo((14 / 46) * factor, 12) as number,
      basis: 'ambient',
    });
    expect(asked('concrete-moment-frame', ELLIS)).toEqual(ambient(1.3));
    expect(asked('concrete-shear-wall', ELLIS)).toEqual(ambient(1.3));
    expect(asked('concrete-infilled-frame', ELLIS)).toEqual(ambient(1.5));
    expect(asked('unreinforced-masonry-wall', ELLIS)).toEqual(ambient(1.5));
    // one of strong shaking is taken as printed: Hong and Hwang 2000, 0.0294 h^0.804
    expect(asked('concrete-moment-frame', 'hong-hwang-2000/period/concrete-moment-frame')).toEqual({
      period_s: expect.closeTo(0.0294 * 14 ** 0.804, 12) as number,
      basis: 'best-fit',
    });
  });

  it('prints the basis of the formula that counts, and that of the evidence where none does', () => {
    expect(ranked(building()).leading.basis).toBe('best-fit');
    expect(ranked(building(), studying({ standard: 'asce7-22', basis: 'design' })).leading.basis).toBe('design');
    const stiff = building({ storey_stiffness_kN_per_m: { longitudinal: [2e5], transverse: [2e5] } });
    const off = studying({ switchedOff: ['asce41-17/period/concrete-moment-frame'] });
    expect(ranked(stiff, off).leading).toMatchObject({ evidence: 'stiffness', basis: 'mechanics', formula: null });
  });

  // IS 1893 (Part 1), 7.6.2: all but bare frames take 0.09 h/√d, which no height alone gives
  it('gives no period by the "all other" form of IS 1893 without plan and area, and says why', () => {
    const bare = building({
      system: 'reinforced-masonry-wall',
      plan_length_m: NaN,
      plan_width_m: NaN,
      floor_area_m2: given(NaN),
      occupants_peak: 40,
    });
    for (const standard of ['is1893-2002', 'is1893-2016'] as const) {
      const under = studying({ standard });
      expect(assess(bare, under)).toEqual({ id: bare.id, reason: NO_PERIOD });
      expect(ranked({ ...bare, plan_length_m: 20, plan_width_m: 15 }, under).leading.basis).toBe('design');
      expect(ranked({ ...bare, system: 'concrete-moment-frame' }, under).leading.basis).toBe('design');
      // a measurement needs no formula
      expect(
        ranked({ ...bare, measured_period_s: { longitudinal: 0.3, transverse: 0.3 } }, under).leading.evidence,
      ).toBe('measured');
    }
    expect(NO_PERIOD).toContain('not on record');
  });

  it('owes a stated weight nothing to the floor area', () => {
    const stiff = {
      storey_stiffness_kN_per_m: { longitudinal: [200_000], transverse: null },
      floor_area_m2: inferred(1800, 0.3),
    };
    expect(
      periodModel(building({ ...stiff, seismic_weight_kN: 18_000 }), 'longitudinal', 'concrete-moment-frame', context)
        ?.sharedSigma,
    ).toBe(0);
    expect(
      periodModel(building({ ...stiff, unit_weight_kN_per_m2: 10 }), 'longitudinal', 'concrete-moment-frame', context)
        ?.sharedSigma,
    ).toBeCloseTo(0.15, 12);
    // the unit weight of the table adds its own 0.15 [judgement]: half of √(0.3² + 0.15²)
    expect(periodModel(building(stiff), 'longitudinal', 'concrete-moment-frame', context)?.sharedSigma).toBeCloseTo(
      0.5 * Math.hypot(0.3, 0.15),
      12,
    );
  });

  it('uses a list of stiffness only when it has one entry a storey', () => {
    const with2 = building({ storey_stiffness_kN_per_m: { longitudinal: [1e5, 1e5], transverse: null } });
    expect(periodModel(with2, 'longitudinal', 'concrete-moment-frame', context)?.evidence).toBe('formula');
    const with4 = building({ storey_stiffness_kN_per_m: { longitudinal: [1e5, 1e5, 1e5, 1e5], transverse: null } });
    expect(periodModel(with4, 'longitudinal', 'concrete-moment-frame', context)?.evidence).toBe(
      'formula and stiffness',
    );
    expect(periodModel(with4, 'transverse', 'concrete-moment-frame', context)?.evidence).toBe('formula');
  });
});

describe('periodAt', () => {
  /** Four storeys of 100 t: the stiffness for a period T, T = π √(m/k) / sin(π/18). */
  const chain = (period_s: number): Building => {
    const k = 100 * (Math.PI / (Math.sin(Math.PI / 18) * period_s)) ** 2;
    return building({
      seismic_weight_kN: 4 * 100 * 9.80665,
      storey_stiffness_kN_per_m: { longitudinal: [k], transverse: null },
    });
  };
  const formula = 0.018 * (14 / 0.3048) ** 0.9;

  it('combines formula and stiffness by the inverse of their variances', () => {
    // own arithmetic: weights 1/0.3² and 1/0.2² stand as 4 to 9
    const close = estimate(chain(0.9 * formula));
    expect(close.period_s).toBeCloseTo(formula * 0.9 ** (9 / 13), 10);
    // 1/√(1/0.09 + 1/0.04) = 0.1664 is under the least 0.20
    expect(close.sigma).toBeCloseTo(0.2, 12);
    expect(close.disagreement).toBeCloseTo(1 / 0.9, 10);
  });

  it('widens by the squared Birge ratio when the two disagree', () => {
    // own arithmetic: ln 2.5 apart, χ² = ln²2.5/(0.09 + 0.04) = 6.458, σ = 0.1664 √6.458
    const far = estimate(chain(2.5 * formula));
    expect(far.sigma).toBeCloseTo(Math.sqrt(((Math.log(2.5) ** 2 / 0.13) * (0.09 * 0.04)) / 0.13), 10);
    expect(far.disagreement).toBeCloseTo(2.5, 10);
  });

  it('gives a height formula alone its own spread', () => {
    expect(estimate(building({ height_m: given(30) })).sigma).toBe(0.3);
  });

  it('is not surer than its parts allow where the two happen to agree', () => {
    // own arithmetic: χ² of 0 counts as 1, so 1/√(1/0.3² + 1/0.2²)
    const bare = compileContext({ ...SETTINGS, spreads: { ...SETTINGS.spreads, leastPeriod: 0 } });
    expect(estimate(chain(formula), bare).sigma).toBeCloseTo(1 / Math.sqrt(1 / 0.09 + 1 / 0.04), 12);
  });

  it('adds the error of the mass once, by the share of the stiffness', () => {
    // own arithmetic: unit weight not on record, ½ · 0.15; the stiffness has 9 parts of 13
    const close = estimate({
      ...chain(0.95 * formula),
      seismic_weight_kN: NaN,
      unit_weight_kN_per_m2: NaN,
      floor_area_m2: given(1800),
    });
    const model = periodModel(
      { ...chain(formula), seismic_weight_kN: NaN },
      'longitudinal',
      'concrete-moment-frame',
      context,
    )!;
    expect(model.sharedSigma).toBeCloseTo(0.075, 12);
    const w = [1 / 0.09, 1 / 0.04];
    const gap = Math.log(close.disagreement);
    const chi = gap ** 2 / (0.09 + 0.04);
    const method = Math.max(Math.sqrt(Math.max(1, chi) / (w[0]! + w[1]!)), 0.2);
    expect(close.sigma).toBeCloseTo(Math.hypot(method, (9 / 13) * 0.075), 12);
  });

  it('is never surer than the least spread, 0.20 of an estimate and 0.10 of a measurement', () => {
    const spreads = {
      ...SETTINGS.spreads,
      heightFormula: 0.01,
      storeyStiffness: 0.01,
      measuredStrong: 0.01,
      measuredSmall: 0.01,
    };
    const sure = compileContext({ ...SETTINGS, spreads });
    const measuring = building({
      measured_period_s: { longitudinal: 0.5, transverse: NaN },
      measured_amplitude: 'strong',
    });
    expect(estimate(building(), sure).sigma).toBe(0.2);
    expect(estimate(chain(formula), sure).sigma).toBeCloseTo(0.2, 12);
    expect(estimate(measuring, sure).sigma).toBe(0.1);
    const alone = compileContext({
      ...SETTINGS,
      spreads,
      period: { ...SETTINGS.period, switchedOff: ['asce41-17/period/concrete-moment-frame'] },
    });
    expect(estimate(chain(formula), alone).sigma).toBe(0.2);
  });
});

/** Twenty columns, four storeys. */
const FRAME = structure({
  column_count: 20,
  column_width_m: 0.45,
  column_depth_m: 0.5,
  beam_width_m: 0.3,
  beam_depth_m: 0.6,
  bay_length_m: 6,
  concrete_strength_MPa: 25,
  vs30_mps: 200,
});

describe('stiffnessAt', () => {
  const at = (height: number): number => {
    const known = building({ height_m: given(height), structure: FRAME });
    return stiffnessPeriod(known, 'longitudinal', 'concrete-moment-frame', context)!.period_s;
  };

  it('takes the stiffness period at every node of an inferred height as if that height were on record', () => {
    const one = building({ height_m: inferred(14, 0.2), structure: FRAME });
    const model = periodModel(one, 'longitudinal', 'concrete-moment-frame', context)!;
    const heights = Array.from(HEIGHT_NODES.z, (z) => 14 * Math.exp(0.2 * z));
    expect(heights.length).toBeGreaterThan(2);
    expect(new Set(heights.map((h) => model.stiffnessAt?.(h))).size).toBe(heights.length);
    for (const h of heights) {
      expect(model.stiffnessAt?.(h)).toBe(at(h));
      const known = building({ height_m: given(h), structure: FRAME });
      expect(periodAt(model, h, context).period_s).toBe(
        periodAt(periodModel(known, 'longitudinal', 'concrete-moment-frame', context)!, h, context).period_s,
      );
    }
  });

  it('is not asked for where the height is given, or nothing depends on it', () => {
    const model = (one: Building) => periodModel(one, 'longitudinal', 'concrete-moment-frame', context)!;
    expect(model(building({ structure: FRAME })).stiffnessAt).toBeNull();
    const stiff = { storey_stiffness_kN_per_m: { longitudinal: [2e5], transverse: null }, height_m: inferred(14, 0.2) };
    expect(model(building(stiff)).stiffnessAt).toBeNull();
    // a first storey of its own height softens the more, the lower the others are
    const tall = model(building({ ...stiff, first_storey_height_m: 5 }));
    expect(tall.stiffnessAt?.(11)).toBeGreaterThan(tall.stiffnessAt?.(17) ?? NaN);
  });
});

describe('alikeAcross', () => {
  const alike = (one: Building, system: System, under = context): boolean =>
    alikeAcross(one, periodModel(one, 'longitudinal', system, under)!, system, under);
  const areas = structure({
    wall_areas_m2: { longitudinal: null, transverse: [2, 3] },
    wall_lengths_m: { longitudinal: null, transverse: [8, 12] },
  });

  it('tells the directions apart wherever the formula or the row does', () => {
    expect(alike(building(), 'concrete-moment-frame')).toBe(true);
    expect(alike(building(), 'concrete-shear-wall', studying({ standard: 'asce7-22', basis: 'design' }))).toBe(true);
    expect(alike(building(), 'reinforced-masonry-wall', india)).toBe(false);
    expect(alike(building({ plan_width_m: 30 }), 'reinforced-masonry-wall', india)).toBe(true);
    expect(alike(building({ structure: areas }), 'concrete-shear-wall')).toBe(false);
  });

  const india = studying({ standard: 'is1893-2016' });
  const design = studying({ standard: 'asce7-22', basis: 'design', switchedOff: ['stiffness/walls'] });
  // IS 1893 (Part 1), 7.6.2: T = 0.09 h/√d along the force, here 30 m along and 15 m across
  const byPlan = (d: number): number => (0.09 * 14) / Math.sqrt(d);
  const cw = (100 / (30 * 15)) * (2 / (1 + 0.83 * (14 / 8) ** 2) + 3 / (1 + 0.83 * (14 / 12) ** 2));
  const cases = [
    ['the plan', ranked(building({ system: 'reinforced-masonry-wall' }), india), byPlan(30), byPlan(15)],
    [
      'the walls',
      ranked(building({ system: 'concrete-shear-wall', structure: areas }), design),
      0.02 * (14 / 0.3048) ** 0.75,
      (0.0019 * 14) / 0.3048 / Math.sqrt(cw),
    ],
  ] as const;

  it.each(cases)('takes the transverse period of the leading case from %s across', (_what, result, along, across) => {
    expect(result.leading.directions.longitudinal.period_s).toBeCloseTo(along, 12);
    expect(result.leading.directions.transverse.period_s).toBeCloseTo(across, 12);
  });

  it.each(cases)('takes the transverse period of the result from %s across', (_what, result, along, across) => {
    expect(result.period.longitudinal.p50_s).toBeCloseTo(along, 12);
    expect(result.period.transverse.p50_s).toBeCloseTo(across, 12);
  });
});

describe('PERIOD_STANDARDS', () => {
  const full = building({
    plan_length_m: 30,
    plan_width_m: 15,
    structure: structure({
      wall_areas_m2: { longitudinal: [2, 3], transverse: [2, 3] },
      wall_lengths_m: { longitudinal: [8, 12], transverse: [8, 12] },
      top_displacement_m: { longitudinal: 0.09, transverse: 0.09 },
      steel_height_share: 0,
    }),
  });
  const bare = building({ plan_length_m: NaN, plan_width_m: NaN, floor_area_m2: given(NaN) });
  /** Forms by the plan alone: IS 1893 "all other", clause 7.6.2. */
  const needsPlan = (standard: string, system: System): boolean =>
    standard.startsWith('is1893-') &&
    !['steel-moment-frame', 'concrete-moment-frame', 'precast-concrete-frame'].includes(system);

  it.each(PERIOD_STANDARDS)('gives every system a period by %s', (standard) => {
    for (const basis of BASES) {
      const under = studying({ standard, basis });
      for (const system of SYSTEMS) {
        const known = periodModel(full, 'longitudinal', system, under);
        expect(known?.formula, system).not.toBeNull();
        const { period_s } = periodAt(known!, 14, under);
        // four storeys: wide bounds [judgement]
        expect(period_s, system).toBeGreaterThan(0.08);
        expect(period_s, system).toBeLessThan(1.5);
        const least = periodModel(bare, 'longitudinal', system, under);
        expect(least === null, `${standard} ${system}`).toBe(needsPlan(standard, system));
        if (least !== null) expect(periodAt(least, 14, under).period_s).toBeGreaterThan(0.08);
      }
    }
  });
});

import { describe, expect, it } from 'vitest';
import { compileContext } from '../../../src/engineering/assess/context.js';
import type { AssessContext } from '../../../src/engineering/assess/context.js';
import { chosenFormula, measured, stiffnessPeriod } from '../../../src/engineering/assess/evidence.js';
import type { AssessSettings } from '../../../src/engineering/assess/settings.js';
import { periodAt, periodModel } from '../../../src/engineering/assess/period.js';
import type { Building, System } from '../../../src/engineering/building.js';
import { handSteps } from '../../../src/engineering/hand.js';
import type { HandStep } from '../../../src/engineering/hand.js';
import { Trace } from '../../../src/engineering/trace.js';
import { building, given, structure } from '../../support/engineering-building.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const studying = (period: Partial<AssessSettings['period']>): AssessContext =>
  compileContext({ ...SETTINGS, period: { ...SETTINGS.period, ...period } });
const DESIGN = studying({ standard: 'asce7-22', basis: 'design' });

function formula(
  one: Building,
  system: System,
  context: AssessContext,
): { readonly id: string | undefined; readonly step: HandStep | undefined } {
  const trace = new Trace();
  const found = chosenFormula(one, 'longitudinal', system, context, trace);
  expect(chosenFormula(one, 'longitudinal', system, context)?.record.id).toBe(found?.record.id);
  const steps = handSteps(trace, 'si');
  return { id: found?.record.id, step: steps.find(({ title }) => title === 'Which formula') };
}

const walls = (areas: readonly number[], lengths: readonly number[] | null): Partial<Building> => ({
  structure: structure({
    wall_areas_m2: { longitudinal: areas, transverse: null },
    wall_lengths_m: { longitudinal: lengths, transverse: null },
  }),
});

describe('chosenFormula', () => {
  const AREA = 'asce7-22/period/concrete-or-masonry-walls';

  it('takes the form by wall area where areas and lengths are known, the plain one otherwise, with the reason', () => {
    expect(formula(building(walls([2, 3], [8, 12])), 'concrete-shear-wall', DESIGN).id).toBe(AREA);
    const without = formula(building(), 'concrete-shear-wall', DESIGN);
    expect(without.id).toBe('asce7-22/period/other');
    expect(JSON.stringify(without.step)).toContain('not on record: areas of the walls in this direction');
    const half = formula(building(walls([2, 3], null)), 'concrete-shear-wall', DESIGN);
    expect(half.id).toBe('asce7-22/period/other');
    expect(JSON.stringify(half.step)).toContain('not on record: lengths of the walls in this direction');
    const uneven = formula(building(walls([2, 3], [8])), 'concrete-shear-wall', DESIGN);
    expect(uneven.id).toBe('asce7-22/period/other');
    expect(JSON.stringify(uneven.step)).toContain('2 wall areas and 1 wall lengths');
    const noPlan = building({ ...walls([2], [8]), plan_length_m: NaN, floor_area_m2: given(NaN) });
    expect(formula(noPlan, 'concrete-shear-wall', DESIGN).id).toBe('asce7-22/period/other');
  });

  // own arithmetic in feet, ASCE/SEI 7-22 equations 12.8-10 and 12.8-11: T = 0.0019 h/√C_w, C_w = 100/A_B Σ A_i/(1 + 0.83 (h/D_i)²)
  it('works the form by wall area out as the code does', () => {
    const one = building({ ...walls([2, 3], [8, 12]), height_m: given(14), plan_length_m: 30, plan_width_m: 15 });
    const model = periodModel(one, 'longitudinal', 'concrete-shear-wall', {
      ...DESIGN,
      settings: { ...DESIGN.settings, period: { ...DESIGN.settings.period, switchedOff: ['stiffness/walls'] } },
    })!;
    const cw = (100 / (30 * 15)) * (2 / (1 + 0.83 * (14 / 8) ** 2) + 3 / (1 + 0.83 * (14 / 12) ** 2));
    expect(model.evidence).toBe('formula');
    expect(periodAt(model, 14, DESIGN).period_s).toBeCloseTo((0.0019 * 14) / 0.3048 / Math.sqrt(cw), 12);
  });

  it('passes over what the study has switched off, and says so', () => {
    const context = studying({ standard: 'asce7-22', basis: 'design', switchedOff: [AREA] });
    const passed = formula(building(walls([2, 3], [8, 12])), 'concrete-shear-wall', context);
    expect(passed.id).toBe('asce7-22/period/other');
    expect(JSON.stringify(passed.step)).toContain('switched off by the study');
    const none = studying({ standard: 'asce7-22', basis: 'design', switchedOff: [AREA, 'asce7-22/period/other'] });
    const nothing = formula(building(walls([2, 3], [8, 12])), 'concrete-shear-wall', none);
    expect([nothing.id, nothing.step?.kind]).toEqual([undefined, 'choice']);
  });

  // ASCE/SEI 7-22 12.8.2.1: the form by wall area is for heights up to 120 ft, 36.576 m
  it('passes over a form that the publication forbids at this height', () => {
    const tall = (height: number): Building =>
      building({ ...walls([2, 3], [8, 12]), height_m: given(height), storeys: given(11) });
    expect(formula(tall(36.5), 'concrete-shear-wall', DESIGN).id).toBe(AREA);
    const passed = formula(tall(36.6), 'concrete-shear-wall', DESIGN);
    expect(passed.id).toBe('asce7-22/period/other');
    expect(JSON.stringify(passed.step)).toContain('outside its published limit');
  });

  it('tries the formula that the study names before those of the standard, once', () => {
    const context = studying({
      formulaFor: { 'concrete-moment-frame': 'hong-hwang-2000/period/concrete-moment-frame' },
    });
    expect(formula(building(), 'concrete-moment-frame', context).id).toBe(
      'hong-hwang-2000/period/concrete-moment-frame',
    );
    const off = studying({
      formulaFor: { 'concrete-moment-frame': 'hong-hwang-2000/period/concrete-moment-frame' },
      switchedOff: ['hong-hwang-2000/period/concrete-moment-frame'],
    });
    expect(formula(building(), 'concrete-moment-frame', off).id).toBe('asce41-17/period/concrete-moment-frame');
    const own = studying({ formulaFor: { 'concrete-moment-frame': 'asce41-17/period/concrete-moment-frame' } });
    expect(own.formulas['concrete-moment-frame'].map(({ record }) => record.id)).toEqual([
      'asce41-17/period/concrete-moment-frame',
    ]);
  });

  it('names the plan dimension that stands in for one not on record', () => {
    const context = studying({ standard: 'is1893-2016' });
    const plate = building({ plan_length_m: NaN, plan_width_m: NaN, floor_area_m2: given(1600), storeys: given(4) });
    const assumed = formula(plate, 'reinforced-masonry-wall', context);
    expect(assumed.id).toBe('is1893-2016/period/other');
    expect(JSON.stringify(assumed.step)).toContain('plan dimension from the square root of the floor plate');
    // IS 1893 (Part 1) 7.6.2: T = 0.09 h/√d, here d = √(1600/4) = 20 m
    const model = periodModel(plate, 'longitudinal', 'reinforced-masonry-wall', context)!;
    expect(periodAt(model, 14, context).period_s).toBeCloseTo((0.09 * 14) / Math.sqrt(20), 12);
    const given30 = formula(building(), 'reinforced-masonry-wall', context);
    expect(JSON.stringify(given30.step)).not.toContain('square root');
  });
});

describe('measured', () => {
  it('can be switched off by its record, and then does not govern', () => {
    const one = building({ measured_period_s: { longitudinal: 0.5, transverse: NaN }, measured_amplitude: 'ambient' });
    expect(measured(one, 'longitudinal', 'concrete-moment-frame', DESIGN)).toMatchObject({ sigma: 0.2 });
    expect(measured(one, 'transverse', 'concrete-moment-frame', DESIGN)).toBeNull();
    const off = studying({ switchedOff: ['swaymark/period/measured-small'] });
    expect(measured(one, 'longitudinal', 'concrete-moment-frame', off)).toBeNull();
    expect(periodModel(one, 'longitudinal', 'concrete-moment-frame', off)?.evidence).toBe('formula');
  });
});

/**
 * Worked example of the soil-structure sheet (Veletsos and Meek 1974, Pais and Kausel 1988): 4 storeys, 20 × 12 m, 11,520 kN, 12.8 m,
 * T 0.30 s, across the building. Here the storey stiffness that gives 0.30 s: T = π √(m/k)/sin(π/18) for four equal storeys.
 */
const onGround = (vs30_mps: number, period_s = 0.3): Building => {
  const mass_t = 11_520 / 4 / 9.80665;
  const k = mass_t * (Math.PI / (Math.sin(Math.PI / 18) * period_s)) ** 2;
  return building({
    storeys: given(4),
    height_m: given(12.8),
    plan_length_m: 20,
    plan_width_m: 12,
    seismic_weight_kN: 11_520,
    storey_stiffness_kN_per_m: { longitudinal: null, transverse: [k] },
    structure: structure({ vs30_mps }),
  });
};
const across = (one: Building, context = DESIGN): number =>
  stiffnessPeriod(one, 'transverse', 'concrete-shear-wall', context)!.period_s;

describe('stiffnessPeriod', () => {
  it.each([
    [180, 1.24],
    [120, 1.49],
  ])('is longer on ground of %d m/s by the worked %d', (velocity, expected) => {
    expect(across(onGround(velocity)) / 0.3).toBeCloseTo(expected, 2);
  });

  // NIST GCR 12-917-21: counted above h/(V_s T) of 0.1, h two thirds of the height: 12.8 · 2/3 / (0.1 · 0.3) = 284.4 m/s
  it('is that of the fixed base where the ground is stiff against it', () => {
    expect(across(onGround(284)) / 0.3).toBeGreaterThan(1.09);
    expect(across(onGround(285))).toBeCloseTo(0.3, 12);
    expect(across(onGround(180, 0.6))).toBeCloseTo(0.6, 12);
    const trace = new Trace();
    stiffnessPeriod(onGround(285), 'transverse', 'concrete-shear-wall', DESIGN, trace);
    expect(JSON.stringify(handSteps(trace, 'si'))).toContain('h/(Vs T) of 0.1 or less');
  });

  it('leaves the ground out where it is not on record or switched off', () => {
    expect(across(onGround(NaN))).toBeCloseTo(0.3, 12);
    const off = studying({ switchedOff: ['veletsos-meek-1974/ratio/period-lengthening'] });
    expect(across(onGround(180), off)).toBeCloseTo(0.3, 12);
  });

  it('writes the step only where it counts, with the fixed-base period in it', () => {
    const trace = new Trace();
    const route = stiffnessPeriod(onGround(180), 'transverse', 'concrete-shear-wall', DESIGN, trace)!;
    const steps = handSteps(trace, 'si');
    expect(steps.map(({ value }) => value)).toContain(route.period_s);
    expect(route.low_s).toBe(route.period_s);
    expect(route.flags.join()).toContain('ground assumed');
  });

  it('is the only evidence that the ground lengthens', () => {
    const soft = { structure: structure({ vs30_mps: 120 }) };
    for (const one of [
      building({ height_m: given(12.8) }),
      building({ measured_period_s: { longitudinal: 0.3, transverse: 0.3 }, measured_amplitude: 'strong' }),
    ]) {
      const period = (b: Building): number =>
        periodAt(periodModel(b, 'transverse', 'concrete-shear-wall', DESIGN)!, 12.8, DESIGN).period_s;
      expect(period({ ...one, ...soft })).toBe(period(one));
    }
  });
});

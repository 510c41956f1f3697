import { describe, expect, it } from 'vitest';
import { compileContext } from '../../../src/engineering/assess/context.js';
import { periodAt, periodModel } from '../../../src/engineering/assess/period.js';
import type { PeriodEstimate } from '../../../src/engineering/assess/period.js';
import type { Building } from '../../../src/engineering/building.js';
import { building, given, inferred } from '../../support/engineering-building.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const context = compileContext(SETTINGS);
const estimate = (one: Building): PeriodEstimate => {
  const model = periodModel(one, 'longitudinal', one.system!, context);
  if (model === null) throw new Error('no period');
  return periodAt(model, one.height_m.value, context);
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
});

import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import type { Assessment } from '../../../src/engineering/assess/assess.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import { NO_IRREGULARITY_CHANCES } from '../../../src/engineering/assess/settings.js';
import type { Building } from '../../../src/engineering/building.js';
import { Trace } from '../../../src/engineering/trace.js';
import { building } from '../../support/engineering-building.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const context = compileContext({ ...SETTINGS, rankBy: 'ratio', irregularity: NO_IRREGULARITY_CHANCES });

function assessed(fields: Partial<Building>, trace?: Trace): Assessment {
  const result = assess(building(fields), context, trace);
  if (!isRanked(result)) throw new Error(result.reason);
  return result;
}
const strengthOf = (fields: Partial<Building>): number => {
  const trace = new Trace();
  assessed(fields, trace);
  const step = trace.steps.findLast(
    (one) => one.kind === 'formula' && one.record.id === 'swaymark/capacity/strength-coefficient',
  );
  return step?.kind === 'formula' ? step.value : NaN;
};

// A frame is designed for the larger of wind and earthquake [common practice, no source]; the figures are invented for the test.
describe('design for wind', () => {
  it('counts where it asked for more than the earthquake and than the least of 0.04', () => {
    expect(strengthOf({ years: [1930] })).toBe(0.04);
    expect(strengthOf({ years: [1930], wind_base_shear_coefficient: 0.03 })).toBe(0.04);
    expect(strengthOf({ years: [1930], wind_base_shear_coefficient: 0.09 })).toBe(0.09);
    const drawn = { design_base_shear_coefficient: 0.08, design_level: 'strength' } as const;
    expect(strengthOf({ ...drawn, wind_base_shear_coefficient: 0.05 })).toBe(0.08);
    expect(strengthOf({ ...drawn, wind_base_shear_coefficient: 0.11 })).toBe(0.11);
  });

  it('raises the capacity in proportion, never lowers it, and is left out of what other buildings are told', () => {
    const plain = assessed({ years: [1930] });
    const windy = assessed({ years: [1930], wind_base_shear_coefficient: 0.08 });
    expect(windy.leading.capacity_g / plain.leading.capacity_g).toBeCloseTo(2, 12);
    for (const years of [[1930], [1955], [1965], [1980], [2005], [2015], []])
      for (const wind of [0.01, 0.06, 0.2]) {
        const before = assessed({ years });
        const with_wind = assessed({ years, wind_base_shear_coefficient: wind });
        expect(with_wind.lnPriority).toBeLessThanOrEqual(before.lnPriority);
        // the capacities of designs are remembered: those with a wind of their own must not be
        expect(assessed({ years }).lnPriority).toBe(before.lnPriority);
      }
  });

  it('says nothing against a finished assessment', () => {
    const found = { capacity_sa_g: 0.3 };
    expect(assessed({ ...found, wind_base_shear_coefficient: 0.5 }).lnPriority).toBe(assessed(found).lnPriority);
  });
});

import { describe, expect, it } from 'vitest';
import { forbiddenBy, formulaInputs, limitNotes } from '../../../src/engineering/assess/formula-inputs.js';
import type { Building } from '../../../src/engineering/building.js';
import { periodFormula } from '../../../src/engineering/period/choose.js';
import { PERIOD_RECORDS } from '../../../src/engineering/period/periods.js';
import { building, given, structure } from '../../support/engineering-building.js';

const fed = (id: string, one: Building, system = one.system!) =>
  formulaInputs(periodFormula(id), one, system, 'longitudinal', one.height_m.value);

describe('formulaInputs', () => {
  it('feeds each input by its name', () => {
    const one = building({
      structure: structure({
        wall_areas_m2: { longitudinal: [2, 3], transverse: null },
        wall_lengths_m: { longitudinal: [8, 12], transverse: null },
        steel_height_share: 0.25,
      }),
    });
    expect(fed('asce7-22/period/concrete-or-masonry-walls', one)).toEqual({
      inputs: { wall_areas_m2: [2, 3], wall_lengths_m: [8, 12], base_area_m2: 450, height_m: 14 },
      assumed: [],
    });
    expect(fed('asce7-10/period/concrete-or-masonry-walls', one)).toMatchObject({
      inputs: { wall_heights_m: [14, 14] },
      assumed: ['walls of full height'],
    });
    expect(fed('japan-1793/period/mixed', one)).toEqual({
      inputs: { height_m: 14, steel_or_wood_height_m: 3.5 },
      assumed: [],
    });
  });

  it('takes one material over the height where the share is not on record, by the system', () => {
    const steel = fed('japan-1793/period/mixed', building(), 'steel-moment-frame');
    expect(steel).toMatchObject({
      inputs: { steel_or_wood_height_m: 14 },
      assumed: ['one material over the whole height'],
    });
    expect(fed('japan-1793/period/mixed', building(), 'timber-light-frame')).toMatchObject({
      inputs: { steel_or_wood_height_m: 14 },
    });
    expect(fed('japan-1793/period/mixed', building(), 'concrete-shear-wall')).toMatchObject({
      inputs: { steel_or_wood_height_m: 0 },
    });
  });

  it('takes the side along the force, else the root of the plate, which it names', () => {
    const OTHER = 'is1893-2016/period/other';
    expect(fed(OTHER, building())).toEqual({ inputs: { height_m: 14, plan_dimension_m: 30 }, assumed: [] });
    const across = formulaInputs(periodFormula(OTHER), building(), 'reinforced-masonry-wall', 'transverse', 14);
    expect(across).toMatchObject({ inputs: { plan_dimension_m: 15 } });
    // 1800 m² on four storeys
    expect(fed(OTHER, building({ plan_length_m: NaN, plan_width_m: NaN }))).toEqual({
      inputs: { height_m: 14, plan_dimension_m: Math.sqrt(450) },
      assumed: ['plan dimension from the square root of the floor plate'],
    });
    expect(fed(OTHER, building({ plan_length_m: NaN, floor_area_m2: given(NaN) }))).toBe(
      'not on record: plan dimensions or floor area',
    );
  });

  it('says of every formula, in words of its own, what a row that knows only its height lacks', () => {
    const bare = building({ storeys: given(NaN), plan_length_m: NaN, plan_width_m: NaN, floor_area_m2: given(NaN) });
    for (const { id, basis } of PERIOD_RECORDS) {
      if (basis === undefined) continue;
      const found = fed(id, bare, 'concrete-moment-frame');
      if (typeof found === 'string') expect(found, id).toMatch(/^not on record: [^_]+$/);
    }
  });
});

describe('forbiddenBy', () => {
  const FRAME = 'asce7-22/period/moment-frame-by-storeys';
  const forbidden = (storeys: number, height: number): string | null =>
    forbiddenBy(
      periodFormula(FRAME),
      building({ storeys: given(storeys), height_m: given(height) }),
      'concrete-moment-frame',
      'longitudinal',
      height,
    );

  // ASCE/SEI 7-22 12.8.2.1: 0.1 N up to 12 storeys of at least 3 m on average
  it('knows the limits of 0.1 N', () => {
    expect(forbidden(12, 36)).toBeNull();
    expect(forbidden(13, 40)).toContain('outside its published limit');
    expect(forbidden(4, 11.9)).toContain('outside its published limit');
    expect(forbidden(4, 12)).toBeNull();
  });

  it('lets a limit that only warns pass, and notes it', () => {
    const EN = periodFormula('en1998-1-2004/period/other');
    const tall = building({ height_m: given(41), storeys: given(12) });
    expect(forbiddenBy(EN, tall, 'concrete-shear-wall', 'longitudinal', 41)).toBeNull();
    // EN 1998-1 4.3.3.2.2(3): up to 40 m
    expect(limitNotes(EN, tall, 'concrete-shear-wall', 'longitudinal', 41).join()).toContain('40 m');
    expect(limitNotes(EN, tall, 'concrete-shear-wall', 'longitudinal', 40)).toEqual([]);
  });
});

/** Limits: data sheet of stiffness and demand, section 12 (ASCE 7-16 and IS 1893:2016 restated). Factors and chances: judgement. */
import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import type { Assessment } from '../../../src/engineering/assess/assess.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import { irregularitiesRead, irregularityOf } from '../../../src/engineering/assess/irregularity.js';
import { IRREGULARITY, NO_IRREGULARITY_CHANCES } from '../../../src/engineering/assess/settings.js';
import type { AssessSettings } from '../../../src/engineering/assess/settings.js';
import type { Building } from '../../../src/engineering/building.js';
import { handSteps } from '../../../src/engineering/hand.js';
import type { IrregularityEdition } from '../../../src/engineering/irregularity/editions.js';
import { Trace } from '../../../src/engineering/trace.js';
import { NO_IRREGULARITY, building, given, structure } from '../../support/engineering-building.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const by = (edition: IrregularityEdition): AssessSettings => ({
  ...SETTINGS,
  irregularity: { ...IRREGULARITY, edition },
});
const read = (fields: Partial<Building>, edition: IrregularityEdition = 'asce7-16'): readonly string[] =>
  irregularitiesRead(building(fields), compileContext(by(edition)));
const of = (fields: Partial<Building>, settings: AssessSettings = SETTINGS) =>
  irregularityOf(building(fields), compileContext(settings));
const ranked = (fields: Partial<Building>, settings: AssessSettings = SETTINGS): Assessment => {
  const result = assess(building(fields), compileContext(settings));
  if (!isRanked(result)) throw new Error(result.reason);
  return result;
};
const stiffness = (list: readonly number[]): Pick<Building, 'storey_stiffness_kN_per_m'> => ({
  storey_stiffness_kN_per_m: { longitudinal: list, transverse: [100, 100, 100, 100] },
});

describe('irregularityOf', () => {
  it('tells a soft storey from storey stiffness by the edition, and rules it out where both directions are known', () => {
    expect(read(stiffness([69, 100, 100, 100]))).toEqual(['soft_storey']);
    expect(read(stiffness([80, 100, 100, 100]))).toEqual([]);
    // under 80 % of the mean of the three above, though over 70 % of the next
    expect(read(stiffness([75, 90, 100, 110]))).toEqual(['soft_storey']);
    // IS 1893:2016: any storey less stiff than the next
    expect(read(stiffness([99, 100, 100, 100]), 'is1893-2016')).toEqual(['soft_storey']);
    expect(read(stiffness([100, 100, 100, 100]), 'is1893-2016')).toEqual([]);
    const weakOnly = 0.1;
    expect(of(stiffness([95, 100, 100, 100])).storeyChance.frame).toBeCloseTo(weakOnly, 12);
    expect(of(stiffness([100])).storeyChance.frame).toBeCloseTo(1 - 0.85 * 0.9, 12);
  });

  it('tells it from a tall first storey: of columns by the cube of the heights, of walls by the heights', () => {
    // 4.5 m under 3.0 m: 0.30 of bare columns, 0.67 of walls (data sheet, 12)
    const tall = { first_storey_height_m: 4.5, storeys: given(4), height_m: given(13.5) };
    expect(of(tall).storeyChance).toEqual({ frame: 1, wall: 1 });
    const some = { first_storey_height_m: 3.6, storeys: given(4), height_m: given(12.6) };
    expect(of(some).storeyChance.frame).toBe(1);
    expect(of(some).storeyChance.wall).toBeCloseTo(1 - 0.95 * 0.95, 12);
    // a first storey like the others rules nothing out: it may still be open
    expect(of({ ...some, first_storey_height_m: 3.15 }).storeyChance.frame).toBeCloseTo(1 - 0.85 * 0.9, 12);
    expect(of({ ...some, soft_storey: 'no', weak_storey: 'no' }).storeyChance.frame).toBe(0);
  });

  it('tells a re-entrant corner from the footprint by the edition', () => {
    expect(read({ reentrant_projection: 0.16 })).toEqual(['reentrant_corner']);
    expect(read({ reentrant_projection: 0.15 })).toEqual([]);
    expect(read({ reentrant_projection: 0.16 }, 'asce7-22')).toEqual([]);
    expect(read({ reentrant_projection: 0.16, reentrant_area_share: 0.04 }, 'en1998-1-2004')).toEqual([]);
    expect(read({ reentrant_projection: 0.16, reentrant_area_share: 0.06 }, 'en1998-1-2004')).toEqual([
      'reentrant_corner',
    ]);
    expect(read({ reentrant_projection: 0.16, reentrant_corner: 'no' })).toEqual([]);
  });

  it('tells setbacks from areas, torsion from wall areas', () => {
    const plate = { storeys: given(8), footprint_area_m2: 1000 };
    expect(read({ ...plate, floor_area_m2: given(4800) })).toEqual(['setback']);
    expect(read({ ...plate, floor_area_m2: given(6400) })).toEqual([]);
    const walls = (areas: readonly number[]): Partial<Building> => ({
      system: 'concrete-shear-wall',
      structure: structure({ wall_areas_m2: { longitudinal: areas, transverse: null } }),
    });
    expect(read(walls([4, 1]))).toEqual(['torsion']);
    expect(read(walls([2, 1]))).toEqual([]);
    expect(read(walls([4]))).toEqual([]);
  });

  it('compares no storeys where there is one', () => {
    expect(of({ storeys: given(1), height_m: given(5) }).storeyChance).toEqual({ frame: 0, wall: 0 });
  });
});

describe('assess', () => {
  it('never has a blank for the best case, nor for the worst', () => {
    const flags = Object.keys(NO_IRREGULARITY) as (keyof typeof NO_IRREGULARITY)[];
    const best = ranked(NO_IRREGULARITY).lnPriority;
    const worst = ranked(Object.fromEntries(flags.map((flag) => [flag, 'yes']))).lnPriority;
    const blank = ranked({}).lnPriority;
    expect(blank).toBeGreaterThan(best);
    expect(blank).toBeLessThan(worst);
    for (const flag of flags) {
      const open = ranked({ ...NO_IRREGULARITY, [flag]: null }).lnPriority;
      expect(open, flag).toBeGreaterThan(best);
      expect(open, flag).toBeLessThan(ranked({ ...NO_IRREGULARITY, [flag]: 'yes' }).lnPriority);
    }
  });

  it('keeps the mean of what the flags say, each with its chance', () => {
    // ln S is linear in ln C: mean by hand, k = 2.5
    const { chances } = IRREGULARITY;
    const storey = 1 - (1 - chances.soft_storey.frame) * (1 - chances.weak_storey.frame);
    const lnC =
      storey * Math.log(0.7) +
      chances.torsion * Math.log(0.8) +
      (chances.reentrant_corner + chances.setback + chances.mass_irregularity) * Math.log(0.9);
    const blank = ranked({});
    const none = ranked(NO_IRREGULARITY);
    expect(blank.lnPriorityMean - none.lnPriorityMean).toBeCloseTo(-2.5 * lnC, 8);
    const variance = (p: number, factor: number): number => p * (1 - p) * Math.log(factor) ** 2;
    const added =
      variance(storey, 0.7) +
      variance(chances.torsion, 0.8) +
      variance(chances.reentrant_corner, 0.9) +
      variance(chances.setback, 0.9) +
      variance(chances.mass_irregularity, 0.9);
    expect(blank.lnPrioritySd ** 2 - none.lnPrioritySd ** 2).toBeCloseTo(6.25 * added, 8);
  });

  it('counts a blank as none where the settings are of an earlier version, or the study sets the chances to 0', () => {
    const { irregularity: _, ...old } = SETTINGS;
    const none = ranked(NO_IRREGULARITY).lnPriority;
    expect(ranked({ first_storey_height_m: 6 }, old).lnPriority).toBeCloseTo(none, 12);
    expect(ranked({}, { ...SETTINGS, irregularity: NO_IRREGULARITY_CHANCES }).lnPriority).toBeCloseTo(none, 12);
    expect(ranked({ torsion: 'yes' }, old).lnPriority).toBeCloseTo(none - 2.5 * Math.log(0.8), 12);
  });

  it('shows in the hand calculation what is known, what is not, and what it does', () => {
    const trace = new Trace();
    assess(building({ torsion: 'yes', reentrant_projection: 0.3 }), compileContext(SETTINGS), trace);
    const text = handSteps(trace, 'si')
      .map((step) => [step.title, step.symbolic, step.substituted, step.result, step.source, ...step.details].join(' '))
      .join('\n');
    expect(text).toMatch(/soft storey.*not known/);
    expect(text).toMatch(/torsion.*yes/);
    expect(text).toMatch(/projections beyond the corners of the footprint 30\.0 % of the plan; limit 15 %/);
    expect(text).toMatch(/0\.8000\^1/);
    expect(text).toMatch(/ln S higher by 0\.8917 with one; chance 23 % where a frame stands/);
  });
});

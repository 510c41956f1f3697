import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import type { Assessment } from '../../../src/engineering/assess/assess.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import type { StrengthCheckSettings } from '../../../src/engineering/assess/settings.js';
import { NO_IRREGULARITY_CHANCES, SPREADS } from '../../../src/engineering/assess/settings.js';
import type { Building, Structure } from '../../../src/engineering/building.js';
import { Trace } from '../../../src/engineering/trace.js';
import { NO_IRREGULARITY, building, given, structure } from '../../support/engineering-building.js';
import { SETTINGS } from '../../support/engineering-settings.js';

type Method = StrengthCheckSettings['method'];
const contextOf = (method: Method, timeIndex = 1) =>
  compileContext({
    ...SETTINGS,
    rankBy: 'ratio',
    strengthCheck: { method, timeIndex },
    irregularity: NO_IRREGULARITY_CHANCES,
  });

function assessed(method: Method, fields: Partial<Building>, trace?: Trace, timeIndex?: number): Assessment {
  const result = assess(building(fields), contextOf(method, timeIndex), trace);
  if (!isRanked(result)) throw new Error(result.reason);
  return result;
}

/** 24 columns of 0.4 m, four storeys, 7200 kN. */
const FRAME: Partial<Building> = {
  system: 'concrete-moment-frame',
  seismic_weight_kN: 7200,
  structure: structure({ column_count: 24, column_width_m: 0.4, column_depth_m: 0.4 }),
};
const walls = (along: number, across: number, more: Partial<Structure> = {}): Partial<Building> => ({
  system: 'concrete-shear-wall',
  seismic_weight_kN: 7200,
  structure: structure({ wall_areas_m2: { longitudinal: [along], transverse: [across] }, ...more }),
});

const choiceOf = (trace: Trace, question: string) =>
  trace.steps.find((step) => step.kind === 'choice' && step.question === question);

describe('strengthCheck', () => {
  it('takes ASCE 41 average shear as it is, whatever the year', () => {
    // 2.0 × 0.6894757 MPa × 3.84 m²/(1.0 × 7200 kN), nothing else applied
    const expected = (2 * 689.4757293 * 3.84) / 7200;
    for (const years of [[1930], [1965], [2015], []])
      expect(assessed('asce41-17', { ...FRAME, years }).leading.capacity_g).toBeCloseTo(expected, 9);
  });

  it('reads M_s by edition and C by storeys', () => {
    const at = (method: Method, storeys: number): number =>
      assessed(method, { ...walls(2, 2), storeys: given(storeys) }).leading.capacity_g;
    // M_s 3.0 in 41-17, 4.0 in 41-13 for life safety; C 1.4, 1.2, 1.1, 1.0
    const base = (689.4757293 * 2) / 7200;
    expect(at('asce41-17', 4)).toBeCloseTo(3 * base, 9);
    expect(at('asce41-13', 4)).toBeCloseTo(4 * base, 9);
    [1.4, 1.2, 1.1, 1].forEach((c, i) => {
      expect((3 * base) / at('asce41-17', [1, 2, 3, 9][i]!)).toBeCloseTo(c, 9);
    });
    const brick = assessed('asce41-17', { ...walls(20, 20), system: 'unreinforced-masonry-wall' });
    expect(brick.leading.capacity_g).toBeCloseTo((1.25 * 30 * 6.894757293 * 20) / 7200, 9);
  });

  it('takes C as 1.0 where the diaphragms are flexible', () => {
    // data sheet 11.1a: flexible diaphragms 1.0; one storey of walls otherwise 1.4, of columns 1.3, of braces 1.4
    const ratio = (fields: Partial<Building>, diaphragm: string | null): number => {
      const at = (word: string | null): number =>
        assessed('asce41-17', {
          ...fields,
          storeys: given(1),
          height_m: given(5),
          structure: { ...fields.structure!, diaphragm: word },
        }).leading.capacity_g;
      return at(diaphragm) / at(null);
    };
    const tiltUp = { ...walls(2, 2), system: 'precast-tilt-up-wall' as const };
    expect(ratio(tiltUp, 'flexible')).toBeCloseTo(1.4, 9);
    expect(ratio(tiltUp, ' Flexible ')).toBeCloseTo(1.4, 9);
    expect(ratio(tiltUp, 'rigid')).toBe(1);
    expect(ratio(tiltUp, 'quite flexible, they say')).toBe(1);
    expect(ratio(FRAME, 'flexible')).toBeCloseTo(1.3, 9);
    expect(ratio({ ...walls(20, 20), system: 'unreinforced-masonry-wall' }, 'flexible')).toBe(1);
    const braced = { brace_area_m2: { longitudinal: 0.02, transverse: 0.02 }, bay_length_m: 4 };
    const steel = { system: 'steel-concentric-braced-frame' as const, seismic_weight_kN: 7200 };
    expect(ratio({ ...steel, structure: structure(braced) }, 'flexible')).toBeCloseTo(1.4, 9);
  });

  it('is multiplied by the factor of irregularities, given or by chance, as every capacity but an assessed one', () => {
    const context = compileContext({
      ...SETTINGS,
      rankBy: 'ratio',
      strengthCheck: { method: 'asce41-17', timeIndex: 1 },
    });
    const at = (fields: Partial<Building>): Assessment => {
      const result = assess(building({ ...FRAME, ...fields }), context);
      if (!isRanked(result)) throw new Error(result.reason);
      return result;
    };
    const regular = at(NO_IRREGULARITY);
    expect(at({ ...NO_IRREGULARITY, torsion: 'yes' }).leading.capacity_g).toBeCloseTo(
      0.8 * regular.leading.capacity_g,
      9,
    );
    // a blank: the mixture by its chance, so the median lies above that of a regular building
    expect(at({ ...NO_IRREGULARITY, torsion: null }).lnPriority).toBeGreaterThan(regular.lnPriority + 0.01);
    expect(at({ torsion: 'yes', capacity_sa_g: 0.4 }).leading.capacity_g).toBe(0.4);
  });

  it('says that a check of timber exists and is not made', () => {
    const trace = new Trace();
    assessed('asce41-17', { ...walls(2, 2), system: 'timber-light-frame' }, trace);
    // data sheet 11.1c: wood 1,000, 700, 100 plf
    expect(choiceOf(trace, 'Way to the capacity')).toMatchObject({
      others: expect.arrayContaining([
        { what: 'strength check', why: expect.stringContaining('does not make the check') as unknown },
      ]) as unknown,
    });
  });

  it('governs in the direction with fewer walls', () => {
    const { leading } = assessed('asce41-17', walls(6, 2));
    expect(leading.directions.longitudinal.capacity_g / leading.directions.transverse.capacity_g).toBeCloseTo(3, 9);
    expect(leading.governing).toBe('transverse');
  });

  it('ranks by the capacity that it shows', () => {
    // on the plateau nothing but the capacity is left: the median of ln S is k ln(S_a/C)
    const { leading, lnPriority, slope_k } = assessed('asce41-17', {
      ...walls(2, 2),
      measured_period_s: { longitudinal: 0.3, transverse: 0.3 },
    });
    expect(lnPriority).toBeCloseTo(slope_k * Math.log(leading.sa_g / leading.capacity_g), 2);
  });

  it('carries its own spread and no era', () => {
    const { mixture, slope_k } = assessed('asce41-17', {
      ...walls(2, 2),
      measured_period_s: { longitudinal: 0.3, transverse: 0.3 },
    });
    // on the plateau the period adds nothing
    for (let i = mixture.from; i < mixture.to; i += 1)
      expect(mixture.sd[i]).toBeCloseTo(slope_k * SPREADS.strengthCheck, 2);
  });

  it('gives way to an assessed capacity and to the drawings, and comes before the code of the era', () => {
    expect(assessed('asce41-17', { ...FRAME, capacity_sa_g: 0.9 }).leading.capacity_g).toBe(0.9);
    const drawings = { ...FRAME, design_base_shear_coefficient: 0.1, design_level: 'strength' as const };
    expect(assessed('asce41-17', drawings).leading.capacity_g).toBe(assessed('none', drawings).leading.capacity_g);
    expect(assessed('asce41-17', FRAME).leading.capacity_g).not.toBe(assessed('none', FRAME).leading.capacity_g);
  });

  it('says which way was taken, and why not the others', () => {
    const trace = new Trace();
    const traced = assessed('asce41-17', FRAME, trace);
    expect(choiceOf(trace, 'Way to the capacity')).toMatchObject({ taken: 'strength check of the first storey' });
    expect(traced.lnPriority).toBe(assessed('asce41-17', FRAME).lnPriority);
    const shown = trace.steps.flatMap((step) => (step.kind === 'formula' ? [step.record.id] : []));
    expect(shown).toContain('hassan-sozen-1997/index/priority');
    const none = new Trace();
    assessed('asce41-17', { ...FRAME, system: 'steel-moment-frame' }, none);
    expect(choiceOf(none, 'Way to the capacity')).toMatchObject({
      taken: 'code of the era',
      others: expect.arrayContaining([
        { what: 'strength check', why: 'this program makes no average-stress check of steel-moment-frame' },
      ]) as unknown,
    });
  });

  it('needs the slope of braces', () => {
    const braced = (bay_length_m: number): Partial<Building> => ({
      system: 'steel-concentric-braced-frame',
      seismic_weight_kN: 7200,
      height_m: given(12),
      structure: structure({ brace_area_m2: { longitudinal: 0.02, transverse: 0.02 }, bay_length_m }),
    });
    // 3.0 × 124 MPa × 0.02 m² × 4/5 over 7200 kN
    expect(assessed('asce41-17', braced(4)).leading.capacity_g).toBeCloseTo((3 * 124000 * 0.02 * 0.8) / 7200, 9);
    expect(assessed('asce41-17', braced(NaN)).leading.capacity_g).toBe(
      assessed('none', braced(NaN)).leading.capacity_g,
    );
  });

  it('works the Japanese first level with its ductility and time index, for concrete', () => {
    const mixed = walls(1.8, 1.8, {
      column_count: 25,
      column_width_m: 0.4,
      column_depth_m: 0.4,
      concrete_strength_MPa: 18,
    });
    const period = { measured_period_s: { longitudinal: 3, transverse: 3 }, measured_amplitude: 'strong' as const };
    const one = assessed(
      'japan-first-level',
      { ...mixed, ...period, storeys: given(3), height_m: given(6.6) },
      undefined,
      0.95,
    );
    // walls without boundary columns: 1.8 × 0.9/7.2 + 0.7 × 4 × 0.9/7.2, T 0.95, μ 2 before detailing beyond the corner, α_1 0.85
    const strength = (1.8 * 0.9) / 7.2 + (0.7 * 4 * 0.9) / 7.2;
    expect(one.leading.capacity_g).toBeCloseTo((strength * 0.95 * 2) / 0.85, 9);
    const steel = { ...mixed, system: 'steel-moment-frame' as const };
    expect(assessed('japan-first-level', steel).leading.capacity_g).toBe(assessed('none', steel).leading.capacity_g);
  });

  it('costs rows that know no structure nothing: their results are the same to the bit', () => {
    for (const years of [[1930], [1975, 1980], []])
      expect(assessed('asce41-17', { years }).lnPriority).toBe(assessed('none', { years }).lnPriority);
  });
});

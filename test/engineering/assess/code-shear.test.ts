/** Formulas by row 9.2 and 9.3 of the data sheet of stiffness and demand; R, q, μ by system are the program's own tables (from memory). */
import { describe, expect, it } from 'vitest';
import { codeShear } from '../../../src/engineering/assess/code-shear.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import type { AssessSettings } from '../../../src/engineering/assess/settings.js';
import type { Building, System } from '../../../src/engineering/building.js';
import { handSteps } from '../../../src/engineering/hand.js';
import { Trace } from '../../../src/engineering/trace.js';
import { building, given } from '../../support/engineering-building.js';
import { SETTINGS } from '../../support/engineering-settings.js';

type Spectra = AssessSettings['spectra'];

function worked(
  definition: Spectra[string],
  period_s: number,
  more: {
    readonly system?: System;
    readonly storeys?: number;
    readonly fields?: Partial<Building>;
    readonly beside?: Spectra;
  } = {},
) {
  const { system = 'concrete-moment-frame', storeys = 4, fields = {}, beside = {} } = more;
  const context = compileContext({ ...SETTINGS, spectra: { ...SETTINGS.spectra, ...beside, looked: definition } });
  const trace = new Trace();
  const spectrum = context.spectra['looked']!;
  const shear = codeShear({ building: building(fields), system, storeys, spectrum, period_s, context, trace });
  const steps = handSteps(trace, 'si');
  const choice = (title: string) => steps.find((step) => step.kind === 'choice' && step.title === title);
  return { shear, steps, choice };
}

/** So tall that no period of these tests is beyond C_u T_a. */
const TALL = { fields: { height_m: given(250) } };

describe('codeShear', () => {
  const mapped = (edition: string, ss_g: number, s1_g: number, more = {}) =>
    ({ code: `asce7-${edition}-two-period`, ss_g, s1_g, site_class: 'C', tl_s: 8, ...more }) as Spectra[string];

  it.each(['05', '10', '16'])('is worked for ASCE 7-%s from the mapped values and the site class', (edition) => {
    // class C: F_a 1.0 (1.2 in 7-16) at S_S 1.5, F_v 1.3 (1.4) at S_1 0.5 and more (tables 11.4-1 and 11.4-2); R 8
    const fa = edition === '16' ? 1.2 : 1;
    const fv = edition === '16' ? 1.4 : 1.3;
    expect(worked(mapped(edition, 1.5, 0.6), 0.2).shear).toBeCloseTo(((2 / 3) * fa * 1.5) / 8, 9);
    expect(worked(mapped(edition, 1.5, 0.6), 1.2, TALL).shear).toBeCloseTo(((2 / 3) * fv * 0.6) / 1.2 / 8, 9);
    // the spectrum of the maximum considered shaking has the same base shear: it is of the design shaking
    const maximum = mapped(edition, 1.5, 0.6, { shaking: 'maximum-considered' });
    expect(worked(maximum, 0.2).shear).toBeCloseTo(((2 / 3) * fa * 1.5) / 8, 9);
  });

  it('reads the base shear at no longer period than C_u T_a (12.8.2), and says so', () => {
    // concrete moment frame of the tests: 14 m, T_a = 0.0466 × 14^0.9 = 0.501 s (table 12.8-2, metric); C_u 1.4 from S_D1 0.4 on: 0.70 s
    const stated = { code: 'asce7-22-two-period', sds_g: 1, sd1_g: 0.6, tl_s: 8 } as Spectra[string];
    const limit = 1.4 * 0.0466 * 14 ** 0.9;
    const long = worked(stated, 1.145);
    expect(long.shear).toBeCloseTo(0.6 / (8 * limit), 4);
    expect(long.choice('Period of the base shear')!.source).toContain('12.8.2');
    const short = worked(stated, 0.65);
    expect(short.shear).toBeCloseTo(0.6 / (8 * 0.65), 9);
    expect(short.choice('Period of the base shear')).toBeUndefined();
  });

  it('takes S_1 of the spectrum into the floor near faults, from 0.6 g on', () => {
    // eq. 12.8-6: 0.5 × 0.9/8 = 0.05625 rules over 0.044 S_DS = 0.0528 (F_a 1.2) and 0.56 × 1.5/(4 × 8)
    const near = worked(mapped('16', 1.5, 0.9), 4, TALL);
    expect(near.shear).toBeCloseTo((0.5 * 0.9) / 8, 12);
    expect(near.choice('Floor of the base shear near faults')!.symbolic).toBe('counts');
    const far = worked(mapped('16', 1.5, 0.59), 4, TALL);
    expect(far.shear).toBeCloseTo(0.044 * 1.2, 12);
    expect(far.choice('Floor of the base shear near faults')).toMatchObject({ symbolic: 'does not apply' });
    expect(far.choice('Floor of the base shear near faults')!.source).toContain('S_1 = 0.5900 g');
  });

  it('says that the floor could not be checked where S_1 is not known, and does not print it as evaluated', () => {
    const stated = worked({ code: 'asce7-22-two-period', sds_g: 1, sd1_g: 0.6, tl_s: 8 }, 3, TALL);
    expect(stated.shear).toBeCloseTo(0.044, 12);
    expect(stated.choice('Floor of the base shear near faults')).toMatchObject({ symbolic: 'could not be checked' });
    const formula = stated.steps.find((step) => step.method?.startsWith('asce7-16/base-shear'))!;
    expect(formula.symbolic).not.toContain('0.5');
    expect(formula.symbolic).toContain('least');
  });

  it('takes λ and the design spectrum of EN 1998-1, with q of the study or the lower bound of q', () => {
    const elastic = { code: 'en1998-1-2004-elastic-type-1', ag_g: 0.25, ground: 'B' } as Spectra[string];
    // 0.85 × 2.5 × 0.25 × 1.2/q: T under 2 T_C = 1 s, more than two storeys
    expect(worked(elastic, 0.4).shear).toBeCloseTo((0.85 * 2.5 * 0.25 * 1.2) / 1.5, 9);
    const design = { ...elastic, code: 'en1998-1-2004-design-type-1', behaviour_factor: 3.9 } as Spectra[string];
    expect(worked(elastic, 0.4, { beside: { design } }).shear).toBeCloseTo(0.163462, 6);
    expect(worked(elastic, 0.4, { beside: { design }, storeys: 2 }).shear).toBeCloseTo(0.163462 / 0.85, 5);
    // another ground's q is not this one's
    const other = { ...design, ground: 'C' } as Spectra[string];
    expect(worked(elastic, 0.4, { beside: { other } }).shear).toBeCloseTo((0.85 * 2.5 * 0.25 * 1.2) / 1.5, 9);
    // never under β a_g
    expect(worked(elastic, 4, { beside: { design }, storeys: 8 }).shear).toBeCloseTo(0.2 * 0.25, 12);
    const important = worked(elastic, 0.4, { beside: { design }, fields: { importance_factor: 1.4 } });
    expect(important.shear).toBeCloseTo(1.4 * 0.163462, 5);
  });

  it('takes the design action coefficient of NZS 1170.5', () => {
    // class C at 0.4 s: C_h 2.36 of the static form (table 3.1); μ 4: S_p 0.7, k_μ 1 + 3 × 0.4/0.7
    const site = { code: 'nzs1170-5-2004', site_class: 'C', zone_factor: 0.4, return_factor: 1, distance_km: 20 };
    const { shear } = worked(site, 0.4);
    expect(shear).toBeCloseTo((2.36 * 0.4 * 0.7) / (1 + (3 * 0.4) / 0.7), 2);
    // the least: (Z/20 + 0.02) R over 0.03 R
    expect(worked(site as Spectra[string], 4.4).shear).toBeCloseTo(0.04, 9);
    const soft = worked({ ...site, site_class: 'E' }, 0.4);
    expect(soft.shear).toBeNull();
    expect(soft.choice('Base shear by code')!.source).toContain('site classes A to D');
  });

  it('takes NBC with its cap and floor, M_v said to be 1', () => {
    const nbc = { code: 'nbc-2010', ordinates_g: [0.9, 0.6, 0.3, 0.15], fa: 1, fv: 1 } as Spectra[string];
    // R_d R_o 6.8: (0.6 − 0.4 × 0.3)/6.8, the cap 2/3 S(0.2), the floor S(2.0)
    expect(worked(nbc, 0.7).shear).toBeCloseTo(0.070588, 6);
    expect(worked(nbc, 0.1).shear).toBeCloseTo(0.088235, 6);
    expect(worked(nbc, 5, TALL).shear).toBeCloseTo(0.022059, 6);
    expect(worked(nbc, 5, { fields: { ...TALL.fields, importance_factor: 1.5 } }).shear).toBeCloseTo(1.5 * 0.022059, 5);
    expect(worked(nbc, 5).steps.some(({ title, source }) => title === 'M v' && source.includes('nobody states'))).toBe(
      true,
    );
    // 4.1.8.11 (3)(d): moment frames no longer than 1.5 T_a, 0.075 × 14^0.75 here: S between 0.6 g at 0.5 s and 0.3 g at 1 s
    const limit = 1.5 * 0.075 * 14 ** 0.75;
    expect(worked(nbc, 5).shear).toBeCloseTo((0.6 - 0.6 * (limit - 0.5)) / 6.8, 6);
    expect(worked(nbc, 5).choice('Period of the base shear')!.source).toContain('NBC 2015, 4.1.8.11');
  });

  it('gives the printed coefficient of IS 1893 with its importance', () => {
    // base shear calculation sheet, seven-storey school (SP-27): Z 0.36, I 1.5, R 5, medium soil, 0.48 s: A_h 0.135
    const is = { code: 'is1893-2016', zone_factor: 0.36, soil: 'medium' } as Spectra[string];
    expect(worked(is, 0.48, { fields: { importance_factor: 1.5 } }).shear).toBeCloseTo(0.135, 9);
  });

  it('takes TBDY with S_DS and S_D1 of the spectrum, and Japan with D_s', () => {
    // class ZB: F_S 0.9, F_1 0.8 (table 2.1, 2.2): S_DS 0.9, S_D1 0.32; R 8: 0.32/1/8 = 0.04 over 0.04 × 0.9
    const tbdy = { code: 'tbdy-2018', ss_g: 1, s1_g: 0.4, site_class: 'ZB' } as Spectra[string];
    expect(worked(tbdy, 1).shear).toBeCloseTo(0.04, 9);
    // 4.7.3.4: no longer than 1.4 T_pA, T_pA = 0.1 × 14^0.75
    expect(worked(tbdy, 2).shear).toBeCloseTo(0.32 / (1.4 * 0.1 * 14 ** 0.75) / 8, 6);
    // Z 1, R_t 1, D_s 0.30 of the most ductile concrete buildings (published)
    const rt = { code: 'japan-rt', zone_factor: 1, ground: 'type-2' } as Spectra[string];
    expect(worked(rt, 0.5).shear).toBeCloseTo(0.3, 9);
    // 0.8 at twice T_c
    expect(worked(rt, 1.2).shear).toBeCloseTo(0.24, 9);
  });

  it('says what is missing where no formula is carried', () => {
    const table = worked({ code: 'table', periods_s: [0.1, 1], ordinates_g: [0.5, 0.2], interpolation: 'linear' }, 0.4);
    expect(table.shear).toBeNull();
    expect(table.choice('Base shear by code')).toMatchObject({ symbolic: 'not worked' });
    const multi = worked({ code: 'asce7-22-multi-period', ordinates_g: Array<number>(22).fill(0.5), tl_s: 8 }, 0.4);
    expect(multi.choice('Base shear by code')!.source).toContain('S_DS and S_D1');
    const ntc = worked({ code: 'ntc-2018', ag_g: 0.2, f0: 2.5, tc_star_s: 0.3, ground: 'B' }, 0.4);
    expect(ntc.choice('Base shear by code')!.source).toContain('behaviour factor');
  });
});

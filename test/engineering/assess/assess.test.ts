import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import type { Assessment } from '../../../src/engineering/assess/assess.js';
import { EDITION_LABELS } from '../../../src/engineering/assess/code-history.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import { NO_IRREGULARITY_CHANCES } from '../../../src/engineering/assess/settings.js';
import type { AssessSettings } from '../../../src/engineering/assess/settings.js';
import type { Building } from '../../../src/engineering/building.js';
import { handSteps } from '../../../src/engineering/hand.js';
import { mixtureMoments } from '../../../src/engineering/priority/mixture.js';
import { Trace } from '../../../src/engineering/trace.js';
import { NO_IRREGULARITY, building, given, inferred } from '../../support/engineering-building.js';
import { inventedPortfolio } from '../../support/engineering-portfolio.js';
import { random } from '../../support/engineering-random.js';
import { NO_SPREADS, SETTINGS } from '../../support/engineering-settings.js';

const context = compileContext(SETTINGS);
function ranked(one: Building, settings: AssessSettings = SETTINGS): Assessment {
  const result = assess(one, settings === SETTINGS ? context : compileContext(settings));
  if (!isRanked(result)) throw new Error(result.reason);
  return result;
}
const reason = (one: Building, settings: AssessSettings = SETTINGS): string => {
  const result = assess(one, compileContext(settings));
  return isRanked(result) ? 'ranked' : result.reason;
};
/** `one` without what is not known of it, so that other values may stand under it. */
const stated = (one: Building): Building =>
  Object.fromEntries(
    Object.entries(one).filter(([name, value]) => value !== null || !(name in NO_IRREGULARITY)),
  ) as unknown as Building;
const PORTFOLIO = inventedPortfolio(150, random(77));

describe('assess', () => {
  it('worked by hand for a concrete frame of 1965 on firm ground', () => {
    // own arithmetic throughout; formulas as cited by the steps of the hand calculation
    const result = ranked(building(NO_IRREGULARITY), { ...SETTINGS, spreads: NO_SPREADS });
    const T = 0.018 * (14 / 0.3048) ** 0.9;
    const sa = Math.min(1, 0.6 / T);
    // UBC 1961: T = 0.1 × 4 s, C = 0.05/T^(1/3), K = 1 before ductile detailing; working stress
    const coefficient = 0.05 / 0.4 ** (1 / 3);
    // μ = 2 before the detailing year, under the 8/K of the edition (8/(1.4 × 2) = 2.86)
    const reduction = Math.min(2, 1 + T / 0.6);
    const capacity = (Math.max(coefficient * 1.4, 0.04) * 2 * reduction) / 0.85;
    const people = (1800 * 0.043 * 50) / 168;
    expect(result.leading.directions.longitudinal.period_s).toBeCloseTo(T, 12);
    expect(result.leading.sa_g).toBeCloseTo(sa, 12);
    expect(result.leading.capacity_g).toBeCloseTo(capacity, 12);
    expect(result.people_exposed).toBeCloseTo(people, 12);
    expect(result.lnPriority).toBeCloseTo(2.5 * Math.log(sa / capacity) + Math.log(people), 12);
    expect(result.lnPrioritySd).toBe(0);
  });

  it('equals its leading case when nothing is uncertain', () => {
    const certain = { ...SETTINGS, spreads: NO_SPREADS };
    let compared = 0;
    for (const one of PORTFOLIO) {
      if (
        one.system === null ||
        one.years.length !== 1 ||
        one.height_m.sigma > 0 ||
        one.storey_stiffness_kN_per_m.longitudinal !== null
      )
        continue;
      if (one.design_base_shear_coefficient > 0 && one.design_level === null) continue;
      const trace = new Trace();
      const result = assess(
        { ...NO_IRREGULARITY, ...stated(one), floor_area_m2: given(one.floor_area_m2.value) },
        compileContext(certain),
        trace,
      );
      const score = trace.steps.findLast(
        (step) => step.kind === 'formula' && step.record.id === 'swaymark/priority/log-score',
      );
      if (!isRanked(result) || score?.kind !== 'formula') throw new Error('no score');
      expect(Math.abs(result.lnPriority - score.value), one.id).toBeLessThan(1e-12);
      compared += 1;
    }
    expect(compared).toBeGreaterThan(10);
  });

  it('names the code that gives the capacity of a strengthened building: its construction’s where that asked for more', () => {
    const history = { ...SETTINGS, irregularity: NO_IRREGULARITY_CHANCES };
    const one = (retrofit_level: number) => {
      const trace = new Trace();
      const fields = { years: [1985], year_retrofitted: 2012, retrofit_level };
      const result = assess(building(fields), compileContext(history), trace);
      if (!isRanked(result)) throw new Error(result.reason);
      const code = trace.steps.find((step) => step.kind === 'value' && step.name === 'code edition');
      const chosen = trace.steps.find((step) => step.kind === 'choice' && step.question === 'Construction or retrofit');
      const labels = Array.from(result.mixture.label!.slice(result.mixture.from, result.mixture.to));
      return { edition: result.leading.edition, code, chosen, labels: [...new Set(labels)] };
    };
    const [slight, full] = [one(0.1), one(1)];
    expect(slight.edition).toBe('ubc-1976');
    expect(slight.code).toMatchObject({ value: 'ubc-1976', why: expect.stringContaining('asked for more') as string });
    expect(slight.chosen).toMatchObject({ taken: 'ubc-1976 of its construction' });
    expect(slight.labels).toEqual([EDITION_LABELS.indexOf('ubc-1976')]);
    expect(full.edition).toBe('asce7-2002');
    expect(full.code).toMatchObject({ why: 'seismic retrofit of 2012, level 1 of that code' });
    expect(full.labels).toEqual([EDITION_LABELS.indexOf('asce7-2002')]);
  });

  it('gives the same numbers with a trace, and the trace ends in them', () => {
    for (const one of PORTFOLIO) {
      const trace = new Trace();
      const traced = assess(one, context, trace);
      const plain = assess(one, context);
      if (!isRanked(traced) || !isRanked(plain)) throw new Error('not ranked');
      expect(traced.lnPriority).toBe(plain.lnPriority);
      expect(traced.leading).toEqual(plain.leading);
      const last = trace.steps.at(-1);
      expect(last?.kind === 'value' ? last.value : NaN).toBe(plain.lnPriority);
      for (const step of handSteps(trace, 'si'))
        expect(`${step.symbolic}${step.substituted}${step.result}`, one.id).not.toMatch(/NaN|undefined/);
    }
  });

  it('adds ln 2 when the people double, and the logarithm of the importance once', () => {
    const one = building({ occupants_peak: 100 });
    const base = ranked(one).lnPriority;
    expect(ranked({ ...one, occupants_peak: 200 }).lnPriority - base).toBeCloseTo(Math.LN2, 12);
    expect(ranked({ ...one, importance_factor: 1.5 }).lnPriority - base).toBeCloseTo(Math.log(1.5), 12);
  });

  it('adds k ln c to every building when all spectra are scaled by c', () => {
    const scaled = {
      ...SETTINGS,
      spectra: Object.fromEntries(
        Object.entries(SETTINGS.spectra).map(([name, spectrum]) => {
          if (spectrum.code !== 'asce7-22-two-period') throw new Error(name);
          return [
            name,
            { ...spectrum, sds_g: Number(spectrum['sds_g']) * 1.7, sd1_g: Number(spectrum['sd1_g']) * 1.7 },
          ];
        }),
      ),
    };
    for (const one of PORTFOLIO)
      expect(ranked(one, scaled).lnPriority - ranked(one).lnPriority, one.id).toBeCloseTo(2.5 * Math.log(1.7), 8);
  });

  it('moves a stronger building down and a softer site up', () => {
    const regular = (fields: Partial<Building> = {}): Building => building({ ...NO_IRREGULARITY, ...fields });
    const base = ranked(regular()).lnPriority;
    expect(ranked(regular({ years: [1995] })).lnPriority).toBeLessThan(base);
    expect(ranked(regular({ site_class: 'D' })).lnPriority).toBeGreaterThan(base);
    expect(ranked(regular({ soft_storey: 'yes' })).lnPriority - base).toBeCloseTo(-2.5 * Math.log(0.7), 10);
    expect(ranked(regular({ soft_storey: 'yes', weak_storey: 'yes' })).lnPriority - base).toBeCloseTo(
      -2.5 * Math.log(0.7),
      10,
    );
    expect(ranked(regular({ torsion: 'yes', setback: 'yes' })).lnPriority - base).toBeCloseTo(
      -2.5 * Math.log(0.8 * 0.9),
      10,
    );
  });

  it('is wider the less is known', () => {
    const known = ranked(building()).lnPrioritySd;
    expect(ranked(building({ height_m: inferred(14, 0.2) })).lnPrioritySd).toBeGreaterThan(known);
    expect(ranked(building({ system: null })).lnPrioritySd).toBeGreaterThan(known);
    expect(ranked(building({ years: [1920, 1965, 2005] })).lnPrioritySd).toBeGreaterThan(known);
    expect(ranked(building({ use: 'unknown' })).lnPrioritySd).toBeGreaterThan(known);
  });

  it('has the mixture of its moments, median inside its percentiles', () => {
    for (const one of PORTFOLIO) {
      const result = ranked(one);
      const { mean, sd } = mixtureMoments(result.mixture);
      expect(result.lnPriorityMean).toBe(mean);
      expect(result.lnPrioritySd).toBe(sd);
      for (const { p16_s, p50_s, p84_s } of [result.period.longitudinal, result.period.transverse]) {
        expect(p16_s).toBeLessThan(p50_s);
        expect(p50_s).toBeLessThan(p84_s);
      }
    }
  });

  it('ranks by spectral demand alone when the study says so', () => {
    const settings = { ...SETTINGS, rankBy: 'demand' as const, spreads: NO_SPREADS };
    const result = ranked(building(), settings);
    expect(result.lnPriority).toBeCloseTo(Math.log(result.demand_g), 12);
    expect(result.leading.sa_g).toBe(result.demand_g);
  });

  it('leaves people out of a ranking by ratio', () => {
    const settings = { ...SETTINGS, rankBy: 'ratio' as const };
    expect(ranked(building({ occupants_peak: 10 }), settings).lnPriority).toBe(
      ranked(building({ occupants_peak: 9000, importance_factor: 1.5 }), settings).lnPriority,
    );
  });

  it('takes the capacity of a finished assessment as it stands', () => {
    const result = ranked(building({ capacity_sa_g: 0.5, soft_storey: 'yes' }), { ...SETTINGS, spreads: NO_SPREADS });
    expect(result.leading.capacity_g).toBe(0.5);
  });

  it('lets the worse direction count', () => {
    const along = building({ measured_period_s: { longitudinal: 1.6, transverse: 0.5 }, measured_amplitude: 'strong' });
    const across = building({
      measured_period_s: { longitudinal: 0.5, transverse: 1.6 },
      measured_amplitude: 'strong',
    });
    expect(ranked(along).leading.governing).toBe('transverse');
    expect(ranked(across).leading.governing).toBe('longitudinal');
    expect(ranked(along).lnPriority).toBeCloseTo(ranked(across).lnPriority, 12);
  });

  it('holds the plateau below its start unless the study reads the ramp', () => {
    const stiff = building({
      measured_period_s: { longitudinal: 0.05, transverse: 0.05 },
      measured_amplitude: 'strong',
    });
    expect(ranked(stiff).leading.sa_g).toBe(1);
    // S_DS (0.4 + 0.6 T/T0), T0 = 0.12 s: 0.65 g (own arithmetic)
    expect(ranked(stiff, { ...SETTINGS, holdPlateau: false }).leading.sa_g).toBeCloseTo(0.65, 12);
  });

  it('says why a building is not ranked', () => {
    expect(reason(building({ status: 'assessed' }))).toBe('already assessed');
    expect(reason(building({ status: 'to-be-demolished' }))).toBe('to be demolished');
    expect(reason(building({ height_m: given(NaN), storeys: given(NaN) }))).toContain('neither height nor storeys');
    expect(reason(building({ system: null }), { ...SETTINGS, systemPrior: null })).toContain(
      'no table of system chances',
    );
    expect(reason(building({ floor_area_m2: given(NaN) }))).toBe('neither people nor floor area is known');
    const strict = { ...SETTINGS, levels: [{ ...SETTINGS.levels[0]!, otherwise: null }] };
    expect(reason(building({ site_class: null }), strict)).toContain('site class not known');
    expect(reason(building({ site_class: 'constructor' }), strict)).toContain('"constructor"');
  });

  it('gives every building the same bits whatever was assessed before it', () => {
    const backwards = compileContext(SETTINGS);
    const kept = new Map([...PORTFOLIO].reverse().map((one) => [one.id, assess(one, backwards)]));
    for (const one of PORTFOLIO) {
      const fresh = assess(one, compileContext(SETTINGS));
      const other = kept.get(one.id)!;
      if (!isRanked(fresh) || !isRanked(other)) throw new Error('not ranked');
      const { mixture: a, ...rest } = fresh;
      const { mixture: b, ...others } = other;
      expect(others).toEqual(rest);
      for (const name of ['weight', 'mean', 'sd'] as const)
        expect(b[name].slice(b.from, b.to), name).toEqual(a[name].slice(a.from, a.to));
    }
  });

  it('flags weak types by the chance of the cases that are', () => {
    const result = ranked(building({ system: null, years: [1930], storeys: given(2), height_m: given(7) }));
    expect(result.weakType).toBe('unreinforced-masonry');
    expect(result.weakChance).toBeCloseTo(0.6, 12);
  });
});

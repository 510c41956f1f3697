import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import { casesOf } from '../../../src/engineering/assess/cases.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import { unknownsOf } from '../../../src/engineering/assess/unknowns.js';
import type { Building } from '../../../src/engineering/building.js';
import { mixtureMoments } from '../../../src/engineering/priority/mixture.js';
import type { Unknowns } from '../../../src/engineering/priority/survey-value.js';
import { NO_IRREGULARITY, building, given, inferred } from '../../support/engineering-building.js';
import { inventedPortfolio } from '../../support/engineering-portfolio.js';
import { random } from '../../support/engineering-random.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const context = compileContext(SETTINGS);

const found = (one: Building): Unknowns => {
  const unknowns = unknownsOf(one, context);
  if (unknowns === null) throw new Error(`${one.id} is not ranked`);
  return unknowns;
};

const assessed = (one: Building): { readonly mean: number; readonly sd: number } => {
  const result = assess(one, context);
  if (!isRanked(result)) throw new Error(result.reason);
  return { mean: result.lnPriorityMean, sd: result.lnPrioritySd };
};

/** Mean and standard deviation of the parts that hold `value` of `unknown`. */
function classMoments({ parts, learnable }: Unknowns, unknown: string, value: number) {
  const { values } = learnable.find((one) => one.unknown === unknown)!;
  const at = Array.from(values!.keys()).filter((i) => values![i] === value);
  const all = at.reduce((sum, i) => sum + parts.weight[i]!, 0);
  const pick = (column: Float64Array, scale = 1): Float64Array => Float64Array.from(at, (i) => column[i]! / scale);
  return {
    chance: all,
    ...mixtureMoments({
      weight: pick(parts.weight, all),
      mean: pick(parts.mean),
      sd: pick(parts.sd),
      from: 0,
      to: at.length,
    }),
  };
}

describe('unknownsOf', () => {
  it('holds the whole distribution: mean and spread are those of the assessment', () => {
    for (const one of inventedPortfolio(150, random(77))) {
      const result = assess(one, context);
      const unknowns = unknownsOf(one, context);
      expect(unknowns === null).toBe(!isRanked(result));
      if (unknowns === null || !isRanked(result)) continue;
      const { mean, sd } = mixtureMoments(unknowns.parts);
      expect(mean).toBeCloseTo(result.lnPriorityMean, 8);
      expect(sd).toBeCloseTo(result.lnPrioritySd, 8);
    }
  });

  it('holds for each system what the assessment says once the system is known', () => {
    const one = building({
      id: 'U-1',
      system: null,
      use: 'office',
      storeys: given(5),
      height_m: given(18),
      years: [1958],
    });
    const cases = casesOf(one, context);
    if (typeof cases === 'string') throw new Error(cases);
    const systems = [...new Set(cases.list.map(({ system }) => system))];
    expect(systems.length).toBeGreaterThan(1);
    const unknowns = found(one);
    systems.forEach((system) => {
      // numbered in the order of the cases' groups
      const number = cases.groups.findIndex(([first]) => first!.system === system);
      const own = classMoments(unknowns, 'system', number);
      const known = assessed({ ...one, system });
      expect(own.mean).toBeCloseTo(known.mean, 8);
      expect(own.sd).toBeCloseTo(known.sd, 8);
      expect(own.chance).toBeCloseTo(
        cases.list.filter((which) => which.system === system).reduce((sum, { chance }) => sum + chance, 0),
        12,
      );
    });
  });

  it('asks nothing of a building whose facts are on record but its drawings', () => {
    const known = building({
      ...NO_IRREGULARITY,
      system: 'concrete-shear-wall',
      use: 'office',
      storeys: given(4),
      height_m: given(14),
      years: [1985],
      occupants_peak: 100,
    });
    expect(found(known).learnable.map(({ unknown }) => unknown)).toEqual(['drawings']);
    expect(found({ ...known, design_base_shear_coefficient: 0.1, design_level: 'strength' }).learnable).toEqual([]);
    expect(found({ ...known, capacity_sa_g: 0.5 }).learnable).toEqual([]);
  });

  it('looks for no coefficient in the drawings of what was designed for no earthquake', () => {
    const old = building({ ...NO_IRREGULARITY, system: 'concrete-moment-frame', years: [1930], occupants_peak: 100 });
    expect(found(old).learnable).toEqual([]);
    const tau = (years: readonly number[]): number =>
      found({ ...old, years }).learnable.find(({ unknown }) => unknown === 'drawings')!.tau;
    // by hand: k 2.5 on a spread of the table of 0.2, and half of its variance where half of the years are before any code
    expect(tau([1985])).toBeCloseTo(0.5, 12);
    expect(tau([1930, 1985])).toBeCloseTo(0.5 * Math.sqrt(0.5), 12);
  });

  it('names what is not on record', () => {
    const blank = building({
      system: null,
      use: 'unknown',
      storeys: inferred(4, 0.2),
      height_m: inferred(14, 0.2),
      years: [1930, 1968, 1995],
      floor_area_m2: given(800),
    });
    expect(found(blank).learnable.map(({ unknown }) => unknown)).toEqual([
      'system',
      'year',
      'height',
      'irregularity',
      'use',
      'occupants',
      'drawings',
    ]);
  });

  it('tells a soft or weak storey apart, and takes the other irregularities off the spread', () => {
    const blank = building({ system: 'concrete-moment-frame', years: [1958] });
    const unknowns = found(blank);
    const { tau } = unknowns.learnable.find(({ unknown }) => unknown === 'irregularity')!;
    const none = classMoments(unknowns, 'irregularity', 0);
    const some = classMoments(unknowns, 'irregularity', 1);
    // chances of a soft and of a weak storey of a frame, from the settings: 1 - 0.85 × 0.9
    expect(some.chance).toBeCloseTo(0.235, 12);
    expect(some.mean - none.mean).toBeCloseTo(-2.5 * Math.log(0.7), 10);
    const storeyKnown = { ...blank, soft_storey: 'no', weak_storey: 'no' } as const;
    const open = assessed(storeyKnown);
    const shut = assessed({
      ...NO_IRREGULARITY,
      ...storeyKnown,
      torsion: 'no',
      reentrant_corner: 'no',
      setback: 'no',
      mass_irregularity: 'no',
    });
    expect(none.mean).toBeCloseTo(open.mean, 8);
    expect(none.sd).toBeCloseTo(open.sd, 8);
    expect(tau * tau).toBeCloseTo(open.sd ** 2 - shut.sd ** 2, 8);
  });

  it('asks for no irregularity where the row answers all six, or the building is assessed', () => {
    const asks = (one: Building): boolean => found(one).learnable.some(({ unknown }) => unknown === 'irregularity');
    expect(asks(building())).toBe(true);
    expect(asks(building({ ...NO_IRREGULARITY, mass_irregularity: null }))).toBe(true);
    expect(asks(building(NO_IRREGULARITY))).toBe(false);
    expect(asks(building({ ...NO_IRREGULARITY, torsion: 'yes', soft_storey: 'yes' }))).toBe(false);
    expect(asks(building({ capacity_sa_g: 0.4 }))).toBe(false);
  });

  it('takes off with the use what knowing it takes off the assessment', () => {
    const one = building({ system: 'timber-light-frame', use: 'unknown', floor_area_m2: given(500), years: [1950] });
    const { learnable } = found(one);
    const tau = learnable.find(({ unknown }) => unknown === 'use')!.tau;
    const before = assessed(one).sd;
    const after = assessed({ ...one, use: 'other' }).sd;
    expect(tau * tau).toBeCloseTo(before * before - after * after, 6);
  });

  it('takes off with the use the doubt of its hours where the people are counted', () => {
    const one = building({ system: 'timber-light-frame', use: 'unknown', occupants_peak: 40, years: [1950] });
    const tau = found(one).learnable.find(({ unknown }) => unknown === 'use')!.tau;
    expect(tau * tau).toBeCloseTo(assessed(one).sd ** 2 - assessed({ ...one, use: 'other' }).sd ** 2, 6);
    expect(found({ ...one, occupied_hours_per_week: 50 }).learnable.some(({ unknown }) => unknown === 'use')).toBe(
      false,
    );
  });
});

import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import { casesOf } from '../../../src/engineering/assess/cases.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import { IRREGULARITY } from '../../../src/engineering/assess/settings.js';
import { unknownsOf } from '../../../src/engineering/assess/unknowns.js';
import type { Building } from '../../../src/engineering/building.js';
import { mixtureMoments } from '../../../src/engineering/priority/mixture.js';
import type { Unknowns } from '../../../src/engineering/priority/learnable.js';
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

  it('keeps the law of total variance: with the system known less of the spread is left on average, by the spread of the means', () => {
    let tried = 0;
    for (const one of inventedPortfolio(400, random(78))) {
      const cases = casesOf(one, context);
      if (one.system !== null || typeof cases === 'string' || !isRanked(assess(one, context))) continue;
      const before = assessed(one);
      let left = 0;
      let between = 0;
      for (const system of new Set(cases.list.map((which) => which.system))) {
        const chance = cases.list.reduce((sum, which) => (which.system === system ? sum + which.chance : sum), 0);
        const known = assessed({ ...one, system });
        left += chance * known.sd ** 2;
        between += chance * (known.mean - before.mean) ** 2;
      }
      expect(left).toBeLessThanOrEqual(before.sd ** 2 * (1 + 1e-9));
      expect(left + between).toBeCloseTo(before.sd ** 2, 7);
      tried += 1;
    }
    expect(tried).toBeGreaterThan(40);
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
    const weights = (years: readonly number[]): [number, number][] => {
      const { parts, learnable } = found({ ...old, years });
      const { tau } = learnable.find(({ unknown }) => unknown === 'drawings')!;
      const by = new Map<number, number>();
      parts.weight.forEach((weight, i) => {
        const one = (tau as Float64Array)[i]!;
        by.set(one, (by.get(one) ?? 0) + weight);
      });
      return [...by];
    };
    // by hand: k 2.5 on a spread of the table of 0.2, off the parts of the years under a code, and off no part of those before any; of the
    // settings' table of system chances the earlier year has twice the chance of this one (0.4 and 0.2)
    expect(weights([1985])).toEqual([[0.5, expect.closeTo(1, 12)]]);
    expect(weights([1930, 1985]).sort(([a], [b]) => a - b)).toEqual([
      [0, expect.closeTo(2 / 3, 12)],
      [0.5, expect.closeTo(1 / 3, 12)],
    ]);
    // drawings that show no such design settle it
    const shown = { ...old, years: [1930, 1985], design_level: 'none' } as const;
    expect(found(shown).learnable.map(({ unknown }) => unknown)).not.toContain('drawings');
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

  it('tells a soft or weak storey apart, and three states of the other irregularities', () => {
    const blank = building({ system: 'concrete-moment-frame', years: [1958] });
    const { parts, learnable } = found(blank);
    const { values, tau } = learnable.find(({ unknown }) => unknown === 'irregularity')!;
    expect(tau).toBe(0);
    const without = parts.weight.map((weight, i) => (values![i]! % 2 === 0 ? weight : 0));
    const storey = (value: 0 | 1) => {
      const own = found(blank);
      const storeys = values!.map((one) => one % 2);
      return classMoments(
        { ...own, learnable: [{ unknown: 'irregularity', values: storeys, tau: 0 }] },
        'irregularity',
        value,
      );
    };
    const [none, some] = [storey(0), storey(1)];
    // chances of a soft and of a weak storey of a frame, from the settings: 1 - 0.85 × 0.9
    expect(some.chance).toBeCloseTo(0.235, 12);
    expect(without.reduce((sum, weight) => sum + weight, 0)).toBeCloseTo(0.765, 12);
    expect(some.mean - none.mean).toBeCloseTo(-2.5 * Math.log(0.7), 10);
    const storeyKnown = { ...blank, soft_storey: 'no', weak_storey: 'no' } as const;
    const open = assessed(storeyKnown);
    expect(none.mean).toBeCloseTo(open.mean, 8);
    expect(none.sd).toBeCloseTo(open.sd, 8);
    // mean, variance and third moment of the four others by all their 16 combinations, from the settings' chances and factors
    const { chances, factors } = IRREGULARITY;
    const others = [
      [chances.torsion, factors.torsion],
      [chances.reentrant_corner, factors.reentrant_corner],
      [chances.setback, factors.setback],
      [chances.mass_irregularity, factors.mass_irregularity],
    ] as const;
    let combinations = [[1, 0]] as [number, number][];
    for (const [chance, factor] of others)
      combinations = combinations.flatMap(([p, x]): [number, number][] => [
        [p * chance, x - 2.5 * Math.log(factor)],
        [p * (1 - chance), x],
      ]);
    const central = (states: readonly (readonly [number, number])[], power: number): number => {
      const mean = states.reduce((sum, [p, x]) => sum + p * x, 0);
      return states.reduce((sum, [p, x]) => sum + p * (x - mean) ** power, 0);
    };
    // numbered as they come: without and with a storey in one state, then in the next
    const moments = [0, 2, 4].map((value) => classMoments({ parts, learnable }, 'irregularity', value));
    const states = moments.map(({ chance, mean }) => [chance / 0.765, mean] as const);
    expect(states.reduce((sum, [p]) => sum + p, 0)).toBeCloseTo(1, 12);
    // the likeliest is none of the four, by itself
    const none4 = others.reduce((product, [chance]) => product * (1 - chance), 1);
    expect(Math.max(...states.map(([p]) => p))).toBeCloseTo(none4, 12);
    // what the states do not part stays in their spread: nothing is lost
    const within = moments.reduce((sum, { chance, sd }) => sum + (chance / 0.765) * sd * sd, 0);
    expect(central(states, 2) + within).toBeCloseTo(none.sd * none.sd, 10);
    // and it is little
    expect(central(states, 2) / central(combinations, 2)).toBeGreaterThan(0.93);
    expect(central(states, 2)).toBeLessThanOrEqual(central(combinations, 2) + 1e-12);
    expect(central(states, 3) / central(combinations, 3)).toBeGreaterThan(0.7);
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
    const tau = Number(learnable.find(({ unknown }) => unknown === 'use')!.tau);
    const before = assessed(one).sd;
    const after = assessed({ ...one, use: 'other' }).sd;
    expect(tau * tau).toBeCloseTo(before * before - after * after, 6);
  });

  it('takes off with the use the doubt of its hours where the people are counted', () => {
    const one = building({ system: 'timber-light-frame', use: 'unknown', occupants_peak: 40, years: [1950] });
    const tau = Number(found(one).learnable.find(({ unknown }) => unknown === 'use')!.tau);
    expect(tau * tau).toBeCloseTo(assessed(one).sd ** 2 - assessed({ ...one, use: 'other' }).sd ** 2, 6);
    expect(found({ ...one, occupied_hours_per_week: 50 }).learnable.some(({ unknown }) => unknown === 'use')).toBe(
      false,
    );
  });
});

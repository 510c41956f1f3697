import { describe, expect, it } from 'vitest';
import { assumedWith } from '../../../src/engineering/assess/assumed.js';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import { philox } from '../../../src/engineering/numeric/philox.js';
import { acceptability } from '../../../src/engineering/priority/weight-space.js';
import type { WeighedTerms, WeightRanges } from '../../../src/engineering/priority/weight-space.js';
import { inventedPortfolio } from '../../support/engineering-portfolio.js';
import { random } from '../../support/engineering-random.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const one = { people: 1, importance: 1 };
const fixed = { slope: [1, 1], people: [1, 1], importance: [1, 1] } as const;

const shares = (terms: WeighedTerms, ranges: WeightRanges, places: number, draws: number, seed: number): Float64Array =>
  acceptability(terms, one, ranges, places, draws, seed);

describe('acceptability', () => {
  it('is the list itself where no weight is open', () => {
    const lnPriority = Float64Array.of(3, 1, 2, 5, 4);
    const people = Float64Array.of(3, 7, 1, 3, 20);
    const terms = { lnPriority, people, importance: new Float64Array(5) };
    const share = shares(terms, fixed, 2, 50, 1);
    expect(Array.from(share, (value) => Math.round(value * 1e9) / 1e9)).toEqual([0, 0, 0, 1, 1]);
  });

  it('finds the share of the range on either side of where two orders cross', () => {
    // of the first ln of demand over capacity is 1 and people count nothing; of the second it is 0 and ln of people 4: the second leads from
    // an exponent of 1/4 on
    const terms = {
      lnPriority: Float64Array.of(1, 4),
      people: Float64Array.of(1, Math.exp(4)),
      importance: Float64Array.of(0, 1),
    };
    const share = shares(terms, { ...fixed, people: [0, 1] }, 1, 4_000, 7);
    // three standard errors of a chance of 1/4 in 4,000 draws
    expect(Math.abs(share[0]! - 0.25)).toBeLessThan(0.021);
    expect(share[0]! + share[1]!).toBeCloseTo(1, 9);
    // a slope twice as steep doubles what stands against the people
    const steep = shares(terms, { ...fixed, slope: [2, 2], people: [0, 1] }, 1, 4_000, 7);
    expect(Math.abs(steep[0]! - 0.5)).toBeLessThan(0.024);
  });

  it('is what sorting all by every weighting gives: nobody is left out who could be on the list', () => {
    const source = random(31);
    const n = 2_000;
    const terms = {
      lnPriority: Float64Array.from({ length: n }, () => 3 * source.normal()),
      people: Float64Array.from({ length: n }, () => Math.exp(1.5 * source.normal())),
      importance: Float64Array.from({ length: n }, (_, i) => (i % 9 === 0 ? 1.5 : 0)),
    };
    const ranges = { slope: [0.6, 1.6], people: [0, 1], importance: [0, 2] } as const;
    const draws = 300;
    const words = new Uint32Array(4);
    for (const places of [1, 40, 1_990]) {
      const plain = new Float64Array(n);
      for (let draw = 0; draw < draws; draw += 1) {
        philox(draw, 0, 0, 0, 5, 0x3e19a7, words);
        const [k, p, q] = Array.from(words, (word) => (word + 0.5) / 4294967296);
        const score = terms.lnPriority.map((value, i) => {
          const lnPeople = Math.log(terms.people[i]!);
          const lnImportance = terms.importance[i]! > 0 ? Math.log(1.5) : 0;
          return (0.6 + k!) * (value - lnPeople - lnImportance) + p! * lnPeople + 2 * q! * lnImportance;
        });
        const edge = score.slice().sort()[n - places]!;
        score.forEach((value, i) => (plain[i]! += value >= edge ? 1 / draws : 0));
      }
      const found = shares(terms, ranges, places, draws, 5);
      const off = found.map((value, i) => Math.abs(value - plain[i]!));
      expect(off.reduce((a, b) => Math.max(a, b), 0)).toBeLessThan(1e-9);
    }
  });

  it('moves priorities as assessing again by other exponents does', () => {
    const context = compileContext(SETTINGS);
    const again = compileContext({
      ...SETTINGS,
      assumed: { ...assumedWith(undefined), peopleWeight: 0.4, importanceWeight: 1.7 },
    });
    let seen = 0;
    for (const building of inventedPortfolio(100, random(9))) {
      const before = assess(building, context);
      const after = assess(building, again);
      if (!isRanked(before) || !isRanked(after)) continue;
      seen += 1;
      const importance = building.importance_factor > 0 ? building.importance_factor : 1;
      const moved = before.lnPriority - 0.6 * Math.log(before.people_exposed) + 0.7 * Math.log(importance);
      // the median of a mixture is not that of its parts: their spread has changed
      expect(Math.abs(after.lnPriority - moved)).toBeLessThan(0.12);
    }
    expect(seen).toBeGreaterThan(90);
  });
});

import { describe, expect, it } from 'vitest';
import { atLeastOne, siteFigures } from '../../../src/engineering/priority/sites.js';
import { random } from '../../support/engineering-random.js';

describe('atLeastOne', () => {
  it('is one less the product of the chances of missing', () => {
    // own arithmetic: 1 − 0.5³, 1 − 0.8 × 0.7 × 0.4
    expect(atLeastOne([0.5, 0.5, 0.5])).toBe(0.875);
    expect(atLeastOne([0.2, 0.3, 0.6])).toBeCloseTo(0.776, 15);
    expect(atLeastOne([0.9, 0.2, 0.3, 0.6, 0.9], 1, 4)).toBeCloseTo(0.776, 15);
    for (const n of [1, 2, 7, 40]) expect(atLeastOne(new Array<number>(n).fill(0.1))).toBeCloseTo(1 - 0.9 ** n, 14);
  });

  it('keeps chances too small for the product, and certainty', () => {
    expect(atLeastOne([1e-20, 3e-20])).toBeCloseTo(4e-20, 30);
    expect(atLeastOne([0.3, 1, 0.2])).toBe(1);
    expect(atLeastOne([])).toBe(0);
    expect(atLeastOne([0, 0])).toBe(0);
  });

  it('lies between the largest chance and the sum of all (bounds of Fréchet)', () => {
    const { uniform } = random(11);
    for (let round = 0; round < 200; round += 1) {
      const chances = Array.from({ length: 1 + Math.floor(6 * uniform()) }, () => uniform() ** 2);
      const some = atLeastOne(chances);
      expect(some).toBeGreaterThanOrEqual(Math.max(...chances) - 1e-12);
      expect(some).toBeLessThanOrEqual(
        Math.min(
          1,
          chances.reduce((a, b) => a + b),
        ) + 1e-12,
      );
    }
  });

  // Who belongs to the first places is drawn, not worked out: 300 buildings, 30 places, sites of three.
  it.each([
    { share: 0, independent: true },
    { share: 0.8, independent: false },
  ])('says what draws of whole rankings say, and too much where members share $share of their ignorance', (given) => {
    const { normal } = random(5);
    const [n, places, draws] = [300, 30, 6000];
    const mean = Array.from({ length: n }, () => 1.2 * normal());
    const start = [...mean.keys()].sort((a, b) => mean[b]! - mean[a]!);
    const sites = [0, 1, 2, 3].map((s) => [20 + s, 32 + s, 44 + 2 * s].map((place) => start[place]!));
    const siteOf = new Map(sites.flatMap((members, s) => members.map((i) => [i, s] as const)));
    const inside = new Float64Array(n);
    const some = new Float64Array(sites.length);
    for (let d = 0; d < draws; d += 1) {
      const common = sites.map(() => normal());
      const drawn = mean.map((m, i) => {
        const s = siteOf.get(i);
        const own = normal();
        return (
          m + 0.6 * (s === undefined ? own : Math.sqrt(given.share) * common[s]! + Math.sqrt(1 - given.share) * own)
        );
      });
      const edge = Float64Array.from(drawn).sort()[n - places]!;
      drawn.forEach((x, i) => {
        if (x >= edge) inside[i]! += 1 / draws;
      });
      sites.forEach((members, s) => {
        if (members.some((i) => drawn[i]! >= edge)) some[s]! += 1 / draws;
      });
    }
    sites.forEach((members, s) => {
      const chances = members.map((i) => inside[i]!);
      const told = atLeastOne(chances);
      // three standard errors of 6,000 draws are 0.02
      if (given.independent) expect(Math.abs(told - some[s]!)).toBeLessThan(0.02);
      else {
        expect(some[s]).toBeLessThan(told - 0.05);
        expect(some[s]).toBeGreaterThanOrEqual(Math.max(...chances));
      }
    });
  });
});

describe('siteFigures', () => {
  const member = {
    rank: [9, 4, 17, NaN, 2],
    chance: [0.9, 0.5, 0.2, NaN, 0.8],
    people: [5, 12, NaN, 3, 7],
  };

  it('counts the ranked, and the people of those that are not too', () => {
    // own arithmetic: 1 − 0.5 × 0.8 = 0.6; 0.5 + 0.2; 12 + 3
    expect(siteFigures(member, 1, 4)).toEqual({ ranked: 2, bestRank: 4, chance: 0.6, expected: 0.7, people: 15 });
  });

  it('knows nothing of a site in which nothing is known', () => {
    const blank = [NaN, NaN];
    expect(siteFigures({ rank: blank, chance: blank, people: blank }, 0, 2)).toEqual({
      ranked: 0,
      bestRank: NaN,
      chance: NaN,
      expected: NaN,
      people: NaN,
    });
  });
});

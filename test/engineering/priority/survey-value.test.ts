import { describe, expect, it } from 'vitest';
import type { Mixture } from '../../../src/engineering/priority/mixture.js';
import { UNKNOWNS, shareOf } from '../../../src/engineering/priority/learnable.js';
import { edgeOf, expectedExcess, mostWorth, worthAt, worthOf } from '../../../src/engineering/priority/survey-value.js';
import type { Learnable, Unknowns } from '../../../src/engineering/priority/learnable.js';
import type { Edge } from '../../../src/engineering/priority/survey-value.js';
import { random } from '../../support/engineering-random.js';

const normal = (mean: number, sd: number): Mixture => ({
  weight: Float64Array.of(1),
  mean: Float64Array.of(mean),
  sd: Float64Array.of(sd),
  from: 0,
  to: 1,
});

const edgeAt = (threshold: number): Edge => ({ threshold, cut: threshold, chance: 0.5, unit: 0 });

/** One normal of which the share `share` of the variance can be learnt. */
const oneNormal = (mean: number, sd: number, share: number): Unknowns => ({
  parts: normal(mean, sd),
  learnable: [{ unknown: 'occupants', values: null, tau: sd * Math.sqrt(share) }],
});

/** Parts of two words and a height, and two spreads to learn. */
function invented(seed: number): Unknowns {
  const { uniform } = random(seed);
  const weight: number[] = [];
  const mean: number[] = [];
  const sd: number[] = [];
  const told: number[][] = [[], [], []];
  const tau = [0.2 + 0.2 * uniform(), 0.3 * uniform()];
  for (let a = 0; a < 3; a += 1)
    for (let b = 0; b < 2; b += 1)
      for (let h = 0; h < 2; h += 1) {
        weight.push(0.1 + uniform());
        mean.push(1.2 * a * uniform() - b * uniform() + 0.4 * h);
        sd.push(0.5 + 0.5 * uniform());
        [a, b, h].forEach((value, i) => told[i]!.push(value));
      }
  const total = weight.reduce((sum, value) => sum + value, 0);
  const learnable: Learnable[] = [
    ...(['system', 'year', 'height'] as const).map((unknown, i) => ({
      unknown,
      values: Int32Array.from(told[i]!),
      tau: 0,
    })),
    { unknown: 'occupants', values: null, tau: tau[0]! },
    { unknown: 'drawings', values: Int32Array.from(told[1]!), tau: tau[1]! },
  ];
  const parts = {
    weight: Float64Array.from(weight, (value) => value / total),
    mean: Float64Array.from(mean),
    sd: Float64Array.from(sd),
    from: 0,
    to: weight.length,
  };
  return { parts, learnable };
}

describe('worthOf', () => {
  // the data sheet of ranking, 4.3: δ, s, share, chance of error now and after, by formula and by brute force to 0.001
  it.each([
    [0.1, 0.7, 0.5, 0.443, 0.246],
    [0.5, 0.7, 0.5, 0.238, 0.181],
    [0.5, 0.9, 0.2, 0.289, 0.269],
    [1.0, 0.6, 0.8, 0.048, 0.033],
  ])('gives the chances of error of the sheet for δ %s, s %s, share %s', (delta, sd, share, now, after) => {
    const { wrongOf } = worthOf(oneNormal(delta, sd, share), edgeAt(0));
    expect(wrongOf(0)).toBeCloseTo(now, 3);
    // the sheet's own two differ by 0.001
    expect(Math.abs(wrongOf(1) - after)).toBeLessThan(0.0015);
  });

  it('halves the chance of error at the edge as arccos says', () => {
    // two normals of correlation √share have opposite signs with chance arccos(√share)/π (Sheppard 1899)
    for (const share of [0.2, 0.5, 0.9]) {
      const { wrongOf } = worthOf(oneNormal(0, 0.8, share), edgeAt(0));
      // the lesser of two chances has a kink, which 33 nodes meet to 0.006
      expect(Math.abs(wrongOf(1) - Math.acos(Math.sqrt(share)) / Math.PI)).toBeLessThan(0.006);
    }
  });

  it.each([1, 2, 3, 4, 5])('agrees with a nested simulation, world %s', (seed) => {
    const unknowns = invented(seed);
    const { parts, learnable } = unknowns;
    const edge = edgeAt(0.9);
    const worth = worthOf(unknowns, edge);
    const source = random(1000 + seed);
    const T = Math.exp(edge.threshold);
    const varianceOf = (list: readonly Learnable[]): number => list.reduce((sum, one) => sum + Number(one.tau) ** 2, 0);
    // what no survey finds out is left out: S counts as the median once all is learnt; no two parts are alike in all that may be
    const most = varianceOf(learnable);
    const mean = parts.weight.reduce((sum, w, i) => sum + w * Math.exp(parts.mean[i]! + 0.5 * most), 0);
    // worth is E[max(m, T)] - max(E[m], T) with m the expectation given what is learnt: of a building that is on the list anyway what it
    // lacks, of another what it exceeds by, from the same draws as E[m]
    const gainOf = (m: number): number => (mean > T ? Math.max(T - m, 0) : Math.max(m - T, 0));
    const pick = (u: number): number => {
      let left = u;
      return Math.max(
        parts.weight.findIndex((w) => (left -= w) < 0),
        0,
      );
    };
    const OUTER = 8000;
    const INNER = 20;
    let clear = 0;
    for (const set of [1, 2, 8, 9, 16, 31]) {
      const learnt = learnable.filter((_, i) => ((set >> i) & 1) === 1);
      const tau = Math.sqrt(varianceOf(learnt));
      const rest = Math.sqrt(Math.max(most - tau * tau, 0));
      const gains: number[] = [];
      const means: number[] = [];
      for (let outer = 0; outer < OUTER; outer += 1) {
        // a true building, what is learnt of it, and all buildings that look the same
        const truth = pick((outer + source.uniform()) / OUTER);
        const shift = tau * source.normal();
        const alike = Array.from(parts.weight, (w, i) =>
          learnt.every(({ values }) => values === null || values[i] === values[truth])
            ? w * Math.exp(parts.mean[i]!)
            : 0,
        );
        const all = parts.weight.reduce((sum, w, i) => sum + (alike[i]! > 0 ? w : 0), 0);
        const known = Math.exp(shift) * alike.reduce((sum, w) => sum + w / all, 0);
        // what is left open, in antithetic pairs: two halves
        const halves = [0, 0];
        for (let inner = 0; inner < INNER; inner += 1) {
          const up = Math.exp(rest * source.normal());
          halves[inner % 2]! += (up + 1 / up) / INNER;
        }
        const [first, second] = halves.map((half) => known * half) as [number, number];
        const m = 0.5 * (first + second);
        // noise in m lifts the larger of two by its variance, in a half by twice that: the difference is taken off
        gains.push(2 * gainOf(m) - 0.5 * (gainOf(first) + gainOf(second)));
        means.push(m);
      }
      // E[m] is known: what the draws miss of it they miss of the gain, by the slope of one on the other
      const average = (list: readonly number[]): number => list.reduce((sum, x) => sum + x, 0) / OUTER;
      const [gain, drawn] = [average(gains), average(means)];
      const spread = average(means.map((m) => (m - drawn) ** 2));
      const slope = average(means.map((m, i) => (m - drawn) * (gains[i]! - gain))) / spread;
      const found = gain + slope * (mean - drawn);
      const error = Math.sqrt(average(gains.map((g, i) => (g - gain - slope * (means[i]! - drawn)) ** 2)) / OUTER);
      const allowed = 4 * error + 1e-3;
      expect(Math.abs(found - worth.value[set]!), `set ${String(set)}`).toBeLessThan(allowed);
      if (allowed < 0.2 * worth.value[set]!) clear += 1;
    }
    // the test would be empty if 0 were within what is allowed
    expect(clear).toBeGreaterThanOrEqual(4);
  });

  it('is never below 0, never less for a larger set, and nothing for nothing', () => {
    for (let seed = 1; seed <= 200; seed += 1) {
      const { value, wrongOf } = worthOf(invented(seed), edgeAt(-1 + (seed % 30) / 10));
      expect(value[0]).toBe(0);
      for (let set = 0; set < value.length; set += 1) {
        for (let bit = 0; bit < 5; bit += 1) {
          if (((set >> bit) & 1) === 1) continue;
          expect(value[set | (1 << bit)]!).toBeGreaterThanOrEqual(value[set]! - 1e-12);
          if (seed <= 10) expect(wrongOf(set | (1 << bit))).toBeLessThanOrEqual(wrongOf(set) + 1e-4);
        }
      }
    }
  });

  it('never exceeds what knowing S itself is worth, and vanishes far from the edge', () => {
    for (let seed = 1; seed <= 100; seed += 1) {
      const { parts, learnable } = invented(seed);
      for (const threshold of [-6, -1, 0, 1, 2, 9]) {
        const edge = edgeAt(threshold);
        const most = mostWorth(parts, edge);
        const { value } = worthOf({ parts, learnable }, edge);
        expect(value.at(-1)!).toBeLessThanOrEqual(most + 1e-9);
        if (Math.abs(threshold) > 5) expect(value.at(-1)!).toBeLessThan(0.02);
      }
    }
  });

  it('learns of a discrete unknown by its classes alone', () => {
    // two classes, no spread: in one the building is worth 3, in the other 1; the edge is at 2; by hand ½ (3 - 2)
    const parts: Mixture = {
      weight: Float64Array.of(0.5, 0.5),
      mean: Float64Array.of(Math.log(1), Math.log(3)),
      sd: Float64Array.of(1e-9, 1e-9),
      from: 0,
      to: 2,
    };
    const learnable: Learnable[] = [{ unknown: 'system', values: Int32Array.of(0, 1), tau: 0 }];
    const { value, wrongOf } = worthOf({ parts, learnable }, edgeAt(Math.log(2)));
    expect(value[1]).toBeCloseTo(0.5, 9);
    expect(wrongOf(1)).toBeCloseTo(0, 9);
    expect(wrongOf(0)).toBeCloseTo(0.5, 9);
  });

  it('sends somebody to a building that one of its systems would put on the list, however wide the rest of its spread', () => {
    // by hand: with chance 0.2 its median is 2.5 and the edge at 1; then it gains 2.5 - 1, and with chance 0.8 nothing
    for (const sd of [0.1, 1.3]) {
      const parts: Mixture = {
        weight: Float64Array.of(0.8, 0.2),
        mean: Float64Array.of(Math.log(0.1), Math.log(2.5)),
        sd: Float64Array.of(sd, sd),
        from: 0,
        to: 2,
      };
      const learnable: Learnable[] = [{ unknown: 'system', values: Int32Array.of(0, 1), tau: 0 }];
      const { value } = worthOf({ parts, learnable }, edgeAt(0));
      expect(value[1]).toBeCloseTo(0.2 * 1.5, 9);
    }
  });
});

describe('edgeOf', () => {
  it('lies halfway from where the list ends today to where it would end if all were known', () => {
    // two places: today the list ends between 4 and 3, by hand 3.5; the median building is the third, of 3; one either side of the end
    // stands two of its spreads below the threshold, Φ(-2) = 0.02275 (tables), the other four
    const order = [4, 1, 2, 0, 3];
    const median = [2, 4, 3, 1, 5];
    const mixtures = median.map((value) => normal(value, value === 4 ? 0.25 : 0.375));
    const edge = edgeOf({ order, threshold: 4.5 }, { median, mixtures }, 2);
    expect(edge).toMatchObject({ threshold: 4.5, cut: 4, unit: 3 });
    expect(edge.chance).toBeCloseTo(0.5 * (0.5 * (0.02275 + 0.00003) + 0.5), 4);
  });

  it('takes the lesser loss against the chance of the building whose place it takes', () => {
    // point masses: above with chance 0.3, the other belongs with 0.2; by hand off the list 0.3 × 0.8, on it 0.7 × 0.2; a place counts twice
    const parts: Mixture = {
      weight: Float64Array.of(0.3, 0.7),
      mean: Float64Array.of(1, -1),
      sd: Float64Array.of(1e-9, 1e-9),
      from: 0,
      to: 2,
    };
    const learnable: Learnable[] = [{ unknown: 'system', values: Int32Array.of(0, 1), tau: 0 }];
    const { wrongOf } = worthOf({ parts, learnable }, { ...edgeAt(0), chance: 0.2 });
    expect(wrongOf(0)).toBeCloseTo(2 * 0.7 * 0.2, 12);
    expect(wrongOf(0, 0.5)).toBeCloseTo(0.3, 12);
    expect(wrongOf(0, 0.4)).toBeCloseTo(2 * 0.3 * 0.6, 12);
    expect(wrongOf(1)).toBeCloseTo(0, 12);
  });

  it('weighs by the cut, and tells who belongs by the threshold', () => {
    const unknowns = invented(3);
    const worth = worthOf(unknowns, { ...edgeAt(1.5), cut: 0.5 });
    expect(worth.value).toEqual(worthOf(unknowns, edgeAt(0.5)).value);
    expect(worth.value).not.toEqual(worthOf(unknowns, edgeAt(1.5)).value);
    for (const set of [0, 1, 31]) expect(worth.wrongOf(set)).toBe(worthOf(unknowns, edgeAt(1.5)).wrongOf(set));
  });
});

describe('expectedExcess', () => {
  it('is m Φ(d1) - T Φ(d2)', () => {
    // m 100, T 100, τ 0.2: 7.9656 (handbook value of the closed form of an option at the money without interest; from memory)
    expect(expectedExcess(100, 0.2, 100)).toBeCloseTo(7.9656, 4);
    expect(expectedExcess(3, 0, 2)).toBe(1);
    expect(expectedExcess(1, 0, 2)).toBe(0);
    expect(expectedExcess(0, 1, 2)).toBe(0);
    expect(expectedExcess(2, 1, 0)).toBe(2);
  });
});

describe('worthAt', () => {
  it('runs from nothing to everything, and learns the stated share of the variance', () => {
    const worth = worthOf(invented(7), edgeAt(1));
    expect(worthAt(worth, () => 0).value).toBe(0);
    expect(worthAt(worth, () => 1).value).toBeCloseTo(worth.value.at(-1)!, 12);
    const half = worthAt(worth, () => 0.5).value;
    expect(half).toBeGreaterThan(0);
    expect(half).toBeLessThan(worth.value.at(-1)!);
  });
});

describe('shareOf', () => {
  it('is the share that was put in', () => {
    for (const share of [0.1, 0.5, 1])
      expect(shareOf(oneNormal(0, 0.7, share), oneNormal(0, 0.7, share).learnable[0]!)).toBeCloseTo(share, 12);
  });

  it('is the variance of the class means over the whole variance', () => {
    const unknowns = invented(11);
    const { parts, learnable } = unknowns;
    const source = random(5);
    const draws = Array.from({ length: 40_000 }, () => {
      let left = source.uniform();
      let i = 0;
      while (i < parts.to - 1 && left > parts.weight[i]!) {
        left -= parts.weight[i]!;
        i += 1;
      }
      return { system: learnable[0]!.values![i]!, x: parts.mean[i]! + parts.sd[i]! * source.normal() };
    });
    const mean = (list: readonly { readonly x: number }[]): number =>
      list.reduce((sum, { x }) => sum + x, 0) / list.length;
    const middle = mean(draws);
    const variance = draws.reduce((sum, { x }) => sum + (x - middle) ** 2, 0) / draws.length;
    let between = 0;
    for (const system of [0, 1, 2]) {
      const own = draws.filter((one) => one.system === system);
      between += (own.length / draws.length) * (mean(own) - middle) ** 2;
    }
    expect(Math.abs(shareOf(unknowns, learnable[0]!) - between / variance)).toBeLessThan(0.02);
  });
});

describe('UNKNOWNS', () => {
  it('names each once', () => {
    expect(new Set(UNKNOWNS).size).toBe(UNKNOWNS.length);
  });
});

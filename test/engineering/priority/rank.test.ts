import { describe, expect, it } from 'vitest';
import { bandsAgainst, countRanks } from '../../support/engineering-bands.js';
import { mixtureOf, normalOf, randomMixtures, rankInput } from '../../support/engineering-mixture.js';
import { random } from '../../support/engineering-random.js';
import { largestAbove } from '../../support/engineering-select.js';
import { orderOf, rankAll } from '../../../src/engineering/priority/rank.js';
import type { RankInput } from '../../../src/engineering/priority/rank.js';
import { beats } from '../../../src/engineering/priority/pairwise.js';
import { normalCdf } from '../../../src/engineering/numeric/normal.js';

const sum = (values: ArrayLike<number>): number => Array.from(values).reduce((a, b) => a + b, 0);

function shuffled(input: RankInput, seed: number): { readonly input: RankInput; readonly from: readonly number[] } {
  const { uniform } = random(seed);
  const from = Array.from(input.id.keys());
  for (let i = from.length - 1; i > 0; i -= 1) {
    const j = Math.floor(uniform() * (i + 1));
    [from[i], from[j]] = [from[j]!, from[i]!];
  }
  const of = <T>(list: ArrayLike<T>): T[] => from.map((i) => list[i]!);
  return {
    input: { id: of(input.id), mixtures: of(input.mixtures), median: of(input.median), people: of(input.people) },
    from,
  };
}

describe('rankAll', () => {
  it.each([1, 37, 400, 999])('gives chances that sum to a list of %i', (listSize) => {
    const ranking = rankAll(rankInput(randomMixtures(1000, random(1))), listSize, 1);
    expect(Math.abs(sum(ranking.chance) - listSize)).toBeLessThan(1e-6);
    for (const p of ranking.chance) {
      expect(p).toBeGreaterThanOrEqual(0);
      expect(p).toBeLessThanOrEqual(1);
    }
  });

  it.each([150, 600])('changes nothing when the rows of %i buildings are shuffled', (count) => {
    const input = rankInput(randomMixtures(count, random(2)));
    const straight = rankAll(input, 50, 9);
    const { input: other, from } = shuffled(input, 3);
    const mixed = rankAll(other, 50, 9);
    from.forEach((i, j) => {
      expect(mixed.rank[j]).toBe(straight.rank[i]);
      expect(mixed.chance[j]).toBeCloseTo(straight.chance[i]!, 9);
      expect(Math.abs(mixed.rankBest[j]! - straight.rankBest[i]!)).toBeLessThanOrEqual(count < 200 ? 0 : 1);
      expect(Math.abs(mixed.rankWorst[j]! - straight.rankWorst[i]!)).toBeLessThanOrEqual(count < 200 ? 0 : 1);
      expect(mixed.tieGroup[j]).toBe(straight.tieGroup[i]);
    });
    expect(mixed.threshold).toBeCloseTo(straight.threshold, 9);
  });

  it('lets equal point masses share the places that are left', () => {
    // own arithmetic: ten above for sure, three places left for 40 that are equal
    const mixtures = [
      ...Array.from({ length: 10 }, () => normalOf(5, 0)),
      ...Array.from({ length: 40 }, () => normalOf(1, 0)),
      ...Array.from({ length: 200 }, () => normalOf(-5, 0)),
    ];
    const ranking = rankAll(rankInput(mixtures), 13, 1);
    expect(ranking.chance[0]).toBeCloseTo(1, 9);
    expect(ranking.chance[10]).toBeCloseTo(3 / 40, 6);
    expect(ranking.chance[49]).toBeCloseTo(3 / 40, 6);
    expect(ranking.chance[60]).toBeCloseTo(0, 9);
    expect(ranking.largestEqualBlock).toBe(200);
    expect(ranking.expectedWrong).toBeCloseTo(3 * (1 - 3 / 40), 5);
  });

  it.each([150, 300])('gives every one of %i buildings the chance 1 when the list holds them all', (count) => {
    const ranking = rankAll(rankInput(randomMixtures(count, random(4))), count, 1);
    for (const p of ranking.chance) expect(p).toBe(1);
    expect(ranking.threshold).toBe(-Infinity);
    expect(ranking.expectedWrong).toBe(0);
  });

  it('agrees with drawing normals: chances, and the ends of the rank bands', () => {
    const count = 300;
    const listSize = 30;
    const draws = 20_000;
    const source = random(5);
    const means = Array.from({ length: count }, () => 1.3 * source.normal());
    const sds = Array.from({ length: count }, () => 0.3 + source.uniform());
    const ranking = rankAll(rankInput(means.map((mean, i) => normalOf(mean, sds[i]!))), listSize, 1);
    const inside = new Float64Array(count);
    const score = new Float64Array(count);
    const work = new Float64Array(count);
    const ranks = means.map(() => new Uint32Array(count + 1));
    for (let d = 0; d < draws; d += 1) {
      for (let i = 0; i < count; i += 1) score[i] = means[i]! + sds[i]! * source.normal();
      const edge = largestAbove(score, listSize, work);
      for (let i = 0; i < count; i += 1) if (score[i]! >= edge) inside[i]! += 1;
      if (d < 4000) countRanks(score, ranks, work);
    }
    let beyond = 0;
    for (let i = 0; i < count; i += 1) {
      const p = ranking.chance[i]!;
      const gap = Math.abs(inside[i]! / draws - p);
      // the threshold is taken as fixed: a few thousandths at 300 buildings
      expect(gap).toBeLessThan(0.02);
      if (gap > 0.01) beyond += 1;
    }
    expect(beyond).toBeLessThanOrEqual(0.1 * count);
    const { bandsBeyond, bandsLargest } = bandsAgainst(ranks, ranking.rankBest, ranking.rankWorst, 4000);
    expect(bandsBeyond).toBeLessThanOrEqual(0.01 * count);
    expect(bandsLargest).toBeLessThan(0.02);
  });

  // sanity test (viii) of the data sheet of ranking
  it('agrees with drawing mixtures at 2,000 buildings: at most 1 % beyond three standard errors, none by 0.02', () => {
    const [count, listSize, draws] = [2000, 150, 10_000];
    const mixtures = randomMixtures(count, random(21));
    const { chance } = rankAll(rankInput(mixtures), listSize, 1);
    const source = random(22);
    const inside = new Float64Array(count);
    const score = new Float64Array(count);
    const work = new Float64Array(count);
    for (let d = 0; d < draws; d += 1) {
      for (let i = 0; i < count; i += 1) {
        const { weight, mean, sd, to } = mixtures[i]!;
        let part = 0;
        for (let left = source.uniform(); part < to - 1 && left >= weight[part]!; part += 1) left -= weight[part]!;
        score[i] = mean[part]! + sd[part]! * source.normal();
      }
      const edge = largestAbove(score, listSize, work);
      for (let i = 0; i < count; i += 1) if (score[i]! >= edge) inside[i]! += 1;
    }
    let beyond = 0;
    let widest = 0;
    chance.forEach((p, i) => {
      const gap = Math.abs(inside[i]! / draws - p);
      widest = Math.max(widest, gap);
      // under one draw the standard error says nothing
      if (gap > 3 * Math.sqrt((p * (1 - p)) / draws) + 1 / draws) beyond += 1;
    });
    expect(sum(inside)).toBe(draws * listSize);
    expect(beyond).toBeLessThanOrEqual(0.01 * count);
    expect(widest).toBeLessThan(0.02);
  });

  // sanity test (ix); that a duplicated row raises a flag: test/inventory/take-in.test.ts
  it.each([
    [40, 12, [5, 14]],
    [400, 30, [0, 5, 29, 60, 140]],
  ] as const)('loses at most one place to a row that stands twice among %i', (count, listSize, places) => {
    const mixtures = randomMixtures(count, random(31));
    const once = rankAll(rankInput(mixtures), listSize, 1);
    // simulated under 200: to the noise of 20,000 draws
    const noise = count < 200 ? 0.02 : 1e-9;
    for (const place of places) {
      const twin = once.order[place]!;
      const { chance } = rankAll(rankInput([...mixtures, mixtures[twin]!]), listSize, 1);
      const others = (list: Float64Array): number => sum(list.slice(0, count)) - list[twin]!;
      const lost = others(once.chance) - others(chance);
      expect(lost).toBeGreaterThanOrEqual(-noise);
      expect(lost).toBeLessThanOrEqual(1 + noise);
      // the two share what one had and what it takes from the others, and nobody gains
      expect(Math.abs(chance[count]! - chance[twin]!)).toBeLessThanOrEqual(noise);
      for (let i = 0; i < count; i += 1) expect(chance[i]! - once.chance[i]!).toBeLessThanOrEqual(noise);
    }
  });

  it('puts the rank of nearly every building inside its band', () => {
    const ranking = rankAll(rankInput(randomMixtures(800, random(6))), 80, 1);
    let outside = 0;
    ranking.rank.forEach((rank, i) => {
      expect(ranking.rankBest[i]).toBeLessThanOrEqual(ranking.rankWorst[i]!);
      if (rank < ranking.rankBest[i]! || rank > ranking.rankWorst[i]!) outside += 1;
    });
    // the order goes by medians, the band by expected counts: among skew mixtures the two part now and then
    expect(outside).toBeLessThanOrEqual(8);
  });

  it('cuts tie groups where the leader beats the next with 0.80, without gaps', () => {
    const input = rankInput(randomMixtures(400, random(7)));
    const { order, tieGroup } = rankAll(input, 40, 1);
    let leader = 0;
    for (let place = 1; place < order.length; place += 1) {
      const step = tieGroup[order[place]!]! - tieGroup[order[place - 1]!]!;
      const told = beats(input.mixtures[order[leader]!]!, input.mixtures[order[place]!]!) >= 0.8;
      expect(step).toBe(told ? 1 : 0);
      if (told) leader = place;
    }
    expect(tieGroup[order[0]!]).toBe(1);
  });

  // 190 are simulated, 210 are not: the closed form is an approximation that must not jump at the border
  it('hardly changes between simulation and closed form', () => {
    const mixtures = randomMixtures(210, random(8));
    const all = rankInput(mixtures);
    const closed = rankAll(all, 25, 1);
    // twenty that are never in the list leave, and nothing else changes
    const low = new Set(Array.from(closed.order.slice(190)));
    const kept = Array.from(mixtures.keys()).filter((i) => !low.has(i));
    const of = <T>(list: ArrayLike<T>): T[] => kept.map((i) => list[i]!);
    const drawn = rankAll(
      { id: of(all.id), mixtures: of(all.mixtures), median: of(all.median), people: of(all.people) },
      25,
      1,
    );
    kept.forEach((i, j) => {
      expect(Math.abs(drawn.chance[j]! - closed.chance[i]!)).toBeLessThan(0.025);
      expect(Math.abs(drawn.rankBest[j]! - closed.rankBest[i]!)).toBeLessThanOrEqual(9);
    });
    expect(Math.abs(sum(drawn.chance) - 25)).toBeLessThan(1e-9);
  });
});

describe('orderOf', () => {
  it('goes by median, then people, then id', () => {
    const input: RankInput = {
      id: ['b', 'a', 'c', 'd'],
      mixtures: [],
      median: [1, 1 + 1e-11, 1, 2],
      people: [5, 5, 9, 1],
    };
    expect([...orderOf(input)]).toEqual([3, 2, 1, 0]);
  });

  it('is the order of a plain comparing sort', () => {
    const { uniform, normal } = random(12);
    const count = 3000;
    // far apart, close together and equal medians; equal people
    const median = Array.from({ length: count }, (_, i) =>
      i % 3 === 0
        ? Math.round(20 * normal()) / 4
        : i % 3 === 1
          ? 1 + 1e-8 * Math.round(50 * uniform())
          : 100 * normal(),
    );
    const people = Array.from({ length: count }, () => Math.round(3 * uniform()));
    const id = Array.from({ length: count }, (_, i) => `B-${String((i * 7919) % count)}`);
    const plain = Array.from(id.keys()).sort((a, b) => {
      const apart = median[b]! - median[a]!;
      if (Math.abs(apart) > 5e-10) return apart;
      return people[b]! - people[a]! || (id[a]! < id[b]! ? -1 : 1);
    });
    expect([...orderOf({ id, mixtures: [], median, people })]).toEqual(plain);
  });
});

describe('beats', () => {
  // difference of two normals: Φ((a - b)/√(s² + s²)), textbook
  it('is the chance that one normal exceeds another', () => {
    expect(beats(normalOf(1, 0.6), normalOf(0, 0.8))).toBeCloseTo(normalCdf(1), 14);
    expect(beats(normalOf(1, 0), normalOf(1, 0))).toBe(0.5);
    expect(beats(normalOf(2, 0), normalOf(1, 0))).toBe(1);
  });

  it('and its opposite sum to 1', () => {
    const mixtures = randomMixtures(20, random(10));
    const point = mixtureOf([{ weight: 1, mean: 0.2, sd: 0 }]);
    for (const a of mixtures)
      for (const b of [...mixtures, point]) expect(beats(a, b) + beats(b, a)).toBeCloseTo(1, 12);
  });
});

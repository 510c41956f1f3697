import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { changeParts, rankMoves } from '../../../src/engineering/priority/compare.js';
import type { Ladder, ScoreTerms } from '../../../src/engineering/priority/compare.js';

const positive = fc.double({ min: 0.01, max: 50, noNaN: true });
const terms: fc.Arbitrary<ScoreTerms> = fc.record({
  ln_priority: fc.double({ min: -20, max: 20, noNaN: true }),
  slope_k: fc.double({ min: 1, max: 5, noNaN: true }),
  sa_g: positive,
  capacity_g: fc.oneof(positive, fc.constant(NaN)),
  people_exposed: fc.oneof(positive, fc.constant(NaN)),
  importance_factor: positive,
  zone_term: fc.double({ min: -8, max: 8, noNaN: true }),
});
const sum = (parts: object): number => (Object.values(parts) as number[]).reduce((total, part) => total + part, 0);

describe('changeParts', () => {
  it('adds to the change of ln S within 1e-12, either way round', () => {
    fc.assert(
      fc.property(terms, terms, (a, b) => {
        const parts = changeParts(a, b);
        expect(Math.abs(sum(parts) - (b.ln_priority - a.ln_priority))).toBeLessThan(1e-12);
        const back = changeParts(b, a);
        for (const [name, part] of Object.entries(parts))
          expect((back as unknown as Record<string, number>)[name]! + part).toBeCloseTo(0, 12);
      }),
      { seed: 4, numRuns: 300 },
    );
  });

  it('puts a change of one term into its own part', () => {
    // own arithmetic: ln S = k ln(D/C) + ln E + ln I + zone, one term changed at a time
    const base: ScoreTerms = {
      ln_priority: 2.5 * Math.log(0.5 / 0.2) + Math.log(40),
      slope_k: 2.5,
      sa_g: 0.5,
      capacity_g: 0.2,
      people_exposed: 40,
      importance_factor: 1,
      zone_term: 0,
    };
    const changed = (change: Partial<ScoreTerms>, by: number) =>
      changeParts(base, { ...base, ...change, ln_priority: base.ln_priority + by });
    const none = { demand: 0, capacity: 0, people: 0, importance: 0, slope: 0, zone: 0 };
    const expectOnly = (parts: object, name: string, by: number): void => {
      for (const [part, value] of Object.entries(parts)) expect(value, part).toBeCloseTo(part === name ? by : 0, 12);
    };
    expectOnly(changed({ sa_g: 1 }, 2.5 * Math.LN2), 'demand', 2.5 * Math.LN2);
    expectOnly(changed({ capacity_g: 0.4 }, -2.5 * Math.LN2), 'capacity', -2.5 * Math.LN2);
    expectOnly(changed({ people_exposed: 80 }, Math.LN2), 'people', Math.LN2);
    expectOnly(changed({ importance_factor: 1.5 }, Math.log(1.5)), 'importance', Math.log(1.5));
    expectOnly(changed({ slope_k: 3.5 }, Math.log(2.5)), 'slope', Math.log(2.5));
    expectOnly(changed({ zone_term: -0.4 }, -0.4), 'zone', -0.4);
    expect(changed({}, 0.3)).toEqual({ ...none, spread_and_cases: expect.closeTo(0.3, 12) as number });
  });
});

/** A ladder of ids and ln S, sorted here. */
function ladder(entries: readonly (readonly [string, number])[]): Ladder {
  const sorted = [...entries].sort(([x, a], [y, b]) => b - a || (x < y ? -1 : 1));
  return { id: sorted.map(([id]) => id), lnPriority: sorted.map(([, value]) => value), people: sorted.map(() => 1) };
}

describe('rankMoves', () => {
  it('splits every move so that own, others, came and left add to it', () => {
    const value = fc.integer({ min: -20, max: 20 }).map((n) => n / 4);
    const side = fc.dictionary(fc.constantFrom(...'abcdefghijkl'), value, { noNullPrototype: true });
    fc.assert(
      fc.property(side, side, (a, b) => {
        const { moves } = rankMoves(ladder(Object.entries(a)), ladder(Object.entries(b)));
        expect(moves.size).toBe(Object.keys(a).filter((id) => id in b).length);
        for (const { rank, rank_before, own, others, came_and_left } of moves.values())
          expect(own + others + came_and_left).toBe(rank - rank_before);
      }),
      { seed: 4, numRuns: 300 },
    );
  });

  it('gives own change the place the building would take by its new value among the others as they were', () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(fc.integer({ min: 0, max: 30 }), fc.integer({ min: 0, max: 30 })), {
          minLength: 1,
          maxLength: 15,
        }),
        (list) => {
          const name = (i: number): string => String.fromCharCode(97 + i);
          const [before, after] = [0, 1].map((side) =>
            ladder(list.map((pair, i) => [name(i), pair[side]!] as const)),
          ) as [Ladder, Ladder];
          const { common, moves } = rankMoves(before, after);
          list.forEach(([was, now], i) => {
            // counted one by one: how many of the others, as they were, stand ahead of it
            const mine = now - common;
            const ahead = list.filter(
              ([theirs], j) => j !== i && (theirs > mine || (theirs === mine && name(j) < name(i))),
            ).length;
            const stood = list.filter(([theirs], j) => theirs > was || (theirs === was && j < i)).length;
            expect(moves.get(name(i))!.own).toBe(ahead - stood);
          });
        },
      ),
      { seed: 4, numRuns: 300 },
    );
  });

  it('moves nobody by a change common to all, and none by a run against itself', () => {
    const a = ladder([
      ['p', 3],
      ['q', 2],
      ['r', 2],
      ['s', -1],
    ]);
    const b = { ...a, lnPriority: Array.from(a.lnPriority, (value) => value + 0.7301) };
    for (const other of [a, b]) {
      for (const move of rankMoves(a, other).moves.values())
        expect(move).toMatchObject({ own: 0, others: 0, came_and_left: 0 });
    }
    expect(rankMoves(a, b).common).toBeCloseTo(0.7301, 12);
  });

  it('tells the places of buildings that came and left from the changes of the others', () => {
    const a = ladder([
      ['gone', 9],
      ['p', 3],
      ['q', 2],
    ]);
    const b = ladder([
      ['p', 3],
      ['new', 2.5],
      ['q', 2],
    ]);
    const { moves } = rankMoves(a, b);
    expect(moves.get('p')).toEqual({ rank_before: 2, rank: 1, own: 0, others: 0, came_and_left: -1 });
    expect(moves.get('q')).toEqual({ rank_before: 3, rank: 3, own: 0, others: 0, came_and_left: 0 });
  });
});

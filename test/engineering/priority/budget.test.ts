import { describe, expect, it } from 'vitest';
import { chooseWithin, costOfMusts } from '../../../src/engineering/priority/budget.js';
import type { BudgetItems } from '../../../src/engineering/priority/budget.js';
import { random as generator } from '../../support/engineering-random.js';

/** Value and cost of a subset given as bits, or null where it is not allowed. */
function worth(items: BudgetItems, bits: number, money: number, mobilisation: number): number | null {
  let [value, cost] = [0, 0];
  const open = new Set<number>();
  for (let i = 0; i < items.value.length; i += 1) {
    const is = (bits >> i) & 1;
    if ((items.must[i]! > 0 && is === 0) || (items.must[i]! < 0 && is === 1)) return null;
    if (is === 0) continue;
    value += items.value[i]!;
    cost += items.cost[i]!;
    open.add(items.batch[i]! < 0 ? -1 - i : items.batch[i]!);
  }
  return cost + open.size * mobilisation <= money ? value : null;
}

/** Outside check: every subset there is. */
function exact(items: BudgetItems, money: number, mobilisation: number): number | null {
  let best: number | null = null;
  for (let bits = 0; bits < 1 << items.value.length; bits += 1) {
    const value = worth(items, bits, money, mobilisation);
    if (value !== null && (best === null || value > best)) best = value;
  }
  return best;
}

/** Outside check: the knapsack by dynamic programming over whole money (textbook recursion). */
function knapsack(value: readonly number[], cost: readonly number[], money: number): number {
  const best = new Float64Array(money + 1);
  value.forEach((v, i) => {
    for (let m = money; m >= cost[i]!; m -= 1) best[m] = Math.max(best[m]!, best[m - cost[i]!]! + v);
  });
  return best[money]!;
}

const free = (value: readonly number[], cost: readonly number[]): BudgetItems => ({
  value,
  cost,
  batch: value.map(() => -1),
  must: value.map(() => 0),
});

/** What is chosen adds up, keeps to the money and obeys the musts. */
function expectSound(items: BudgetItems, money: number, mobilisation: number): ReturnType<typeof chooseWithin> {
  const choice = chooseWithin(items, money, mobilisation);
  const bits = choice.chosen.reduce((sum, i) => sum | (1 << i), 0);
  const value = worth(items, bits, money, mobilisation);
  expect(value).not.toBeNull();
  expect(choice.value).toBeCloseTo(value!, 10);
  expect(choice.cost).toBeLessThanOrEqual(money);
  return choice;
}

describe('chooseWithin', () => {
  it('is half of the exact knapsack at least and bounded above, over 400 random cases', () => {
    const random = generator(11).uniform;
    let exactly = 0;
    for (let round = 0; round < 400; round += 1) {
      const n = 1 + Math.floor(random() * 24);
      const value = Array.from({ length: n }, () => Math.exp(3 * random()) * (random() < 0.2 ? 0 : 1));
      const cost = Array.from({ length: n }, () => Math.floor(random() * 40));
      const money = Math.floor(random() * 250);
      const best = knapsack(value, cost, money);
      const choice = expectSound(free(value, cost), money, 0);
      expect(choice.value).toBeLessThanOrEqual(best * (1 + 1e-12));
      expect(choice.value).toBeGreaterThanOrEqual(best / 2);
      expect(choice.bound).toBeGreaterThanOrEqual(best);
      if (choice.value >= best * (1 - 1e-12)) exactly += 1;
    }
    expect(exactly).toBeGreaterThan(200);
  });

  it('is bounded above by its bound with batches, musts and must-nots, against every subset of 400 small cases', () => {
    const random = generator(12).uniform;
    let feasible = 0;
    let shortfall = 0;
    for (let round = 0; round < 400; round += 1) {
      const n = 2 + Math.floor(random() * 9);
      const items: BudgetItems = {
        value: Array.from({ length: n }, () => Math.exp(2 * random())),
        cost: Array.from({ length: n }, () => Math.floor(random() * 20)),
        batch: Array.from({ length: n }, () => Math.floor(random() * 4) - 1),
        must: Array.from({ length: n }, () => (random() < 0.1 ? 1 : random() < 0.1 ? -1 : 0)),
      };
      const mobilisation = Math.floor(random() * 30);
      const money = Math.floor(random() * 150);
      const best = exact(items, money, mobilisation);
      if (best === null) {
        expect(costOfMusts(items, mobilisation)).toBeGreaterThan(money);
        expect(() => chooseWithin(items, money, mobilisation)).toThrow(RangeError);
        continue;
      }
      feasible += 1;
      const choice = expectSound(items, money, mobilisation);
      expect(choice.bound).toBeGreaterThanOrEqual(best * (1 - 1e-15));
      expect(choice.value).toBeLessThanOrEqual(best * (1 + 1e-12));
      if (best > 0) shortfall += 1 - choice.value / best;
    }
    expect(feasible).toBeGreaterThan(250);
    // how good the greedy choice is on the average of small cases; no theorem
    expect(shortfall / feasible).toBeLessThan(0.05);
  });

  it('comes within 0.1 % of its bound for 20,000 buildings, with and without batches', () => {
    const random = generator(13).uniform;
    const n = 20_000;
    const items: BudgetItems = {
      value: Float64Array.from({ length: n }, () => Math.exp(6 * random())),
      cost: Int32Array.from({ length: n }, () => 600_000 + Math.floor(random() * 1_000_000)),
      batch: Int32Array.from({ length: n }, () => Math.floor(random() * 900)),
      must: new Int8Array(n),
    };
    for (const mobilisation of [0, 2_000_000]) {
      const choice = chooseWithin(items, 2_000_000_000, mobilisation);
      expect(choice.value / choice.bound).toBeGreaterThan(0.999);
      expect(choice.value).toBeLessThanOrEqual(choice.bound);
    }
  });

  it('takes the one great item that the ratio would leave out', () => {
    // the usual bad case of the ratio: a crumb of the best ratio blocks nearly all the value
    const choice = chooseWithin(free([2, 99], [1, 100]), 100);
    expect([...choice.chosen]).toEqual([1]);
    expect(choice.start).toBe('single');
    expect(choice.bound).toBeGreaterThanOrEqual(99);
  });

  it('pays a mobilisation once and prefers the block that shares it', () => {
    const items: BudgetItems = { value: [10, 10, 11], cost: [10, 10, 10], batch: [0, 0, 1], must: [0, 0, 0] };
    const choice = chooseWithin(items, 30, 10);
    expect([...choice.chosen]).toEqual([0, 1]);
    expect(choice.cost).toBe(30);
  });

  it('gives ties to the lower index, and buys nothing for too little', () => {
    expect([...chooseWithin(free([5, 5, 5], [10, 10, 10]), 20).chosen]).toEqual([0, 1]);
    const nothing = chooseWithin(free([5, 5], [10, 10]), 9);
    expect([...nothing.chosen]).toEqual([]);
    expect(nothing.bound).toBe(0);
    expect(chooseWithin(free([], []), 9)).toMatchObject({ value: 0, cost: 0, bound: 0 });
  });

  it('spends on everything where the money suffices', () => {
    const choice = chooseWithin(free([1, 2, 4], [10, 20, 30]), 1e15);
    expect([...choice.chosen]).toEqual([0, 1, 2]);
    expect(choice.bound).toBe(choice.value);
  });
});

describe('costOfMusts', () => {
  it('counts each batch once, and each building without one', () => {
    const items = { value: [0, 0, 0, 0], cost: [1, 2, 4, 8], batch: [0, 0, -1, -1], must: [1, 1, 1, 1] };
    expect(costOfMusts(items, 100)).toBe(15 + 300);
    expect(costOfMusts({ ...items, must: [1, 0, 0, -1] }, 100)).toBe(101);
  });
});

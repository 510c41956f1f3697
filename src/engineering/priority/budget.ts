/**
 * Which buildings to assess for a sum of money: the largest sum of values (chance of belonging to the list × priority) whose cost stays
 * within it, with musts, must-nots and batches that cost a mobilisation once. Greedy by value per cost, with an upper bound on the best
 * possible choice beside it.
 */

export interface BudgetItems {
  /** What an assessment of each is worth, at least 0. */
  readonly value: ArrayLike<number>;
  /** Whole numbers of the smallest coin, at least 0: sums of them are exact. */
  readonly cost: ArrayLike<number>;
  /** Number of each item's batch from 0; below 0: a batch by itself. */
  readonly batch: ArrayLike<number>;
  /** Above 0: chosen whatever it is worth; below 0: never chosen. */
  readonly must: ArrayLike<number>;
}

export interface BudgetChoice {
  /** Indices of the chosen, increasing. */
  readonly chosen: Int32Array;
  readonly value: number;
  /** Mobilisations included. */
  readonly cost: number;
  /** No choice within the money is worth more. */
  readonly bound: number;
  /** Which start the greedy choice went furthest from: the best ratio, the one most valuable item, or the one most valuable batch. */
  readonly start: 'ratio' | 'single' | 'batch';
}

/** What is bought together: the part of a batch that pays its mobilisation best, or one item more. */
interface Segment {
  readonly items: readonly number[];
  readonly value: number;
  readonly cost: number;
  readonly batch: number;
  /** The mobilisation is in the cost. */
  readonly opens: boolean;
}

interface State {
  readonly taken: Uint8Array;
  readonly open: Uint8Array;
  left: number;
}

/** Products and quotients of the bound round either way; it is raised by more than they can have lost. */
const ROUNDED = 1 + 1e-12;

/** Value per cost; what costs nothing comes first. */
function ratio(value: number, cost: number): number {
  return cost > 0 ? value / cost : Infinity;
}

/** Cost of the items that must be chosen, with the mobilisation of each of their batches. */
export function costOfMusts({ cost, batch, must }: BudgetItems, mobilisation: number): number {
  let sum = 0;
  const open = new Set<number>();
  for (let i = 0; i < must.length; i += 1) {
    if (!(must[i]! > 0)) continue;
    sum += cost[i]!;
    const opens = batch[i]! < 0 || !open.has(batch[i]!);
    if (opens) sum += mobilisation;
    open.add(batch[i]!);
  }
  return sum;
}

/**
 * The best choice found within `money` where each batch with a chosen item costs `mobilisation` once (both in the smallest coin).
 *
 * Without mobilisation this is the knapsack: by falling value per cost, and once more from the most valuable item that fits, which makes it
 * worth half of the best possible at least (Dantzig 1957 and the usual argument [memory]); where items are small against the money it is far
 * closer, and `bound` says how close.
 *
 * **Why the bound holds with batches.** Let h(b) be the largest value that a batch gives for a cost b when its items may be taken in parts:
 * nothing below the mobilisation F, then its items by falling ratio. Any choice that spends b on the batch is worth at most h(b). With
 * V_j the value of its first j items and C_j = F + their cost, let f be the line from the origin to the point (C_j, V_j) of the largest
 * V_j/C_j, and h from there on. f is at least h: before that point because no point of h lies above the steepest line from the origin that
 * touches it (between two of its corners h is straight, so a corner is touched), after it because it is h. And f is concave: the line first, then
 * ratios that fall, the first of them at most V_j/C_j, or the next item would have made it larger. So the best choice is worth at most the
 * largest Σ f(b) with Σ b within the money, and for concave parts that is: the pieces of all f by falling slope until the money is
 * spent, the last one in part. A batch that a must has opened has F = 0. Items that alone exceed the money left are in no choice and left out.
 *
 * Ties go to the larger value, then to the lower index. @throws RangeError where the musts cost more than `money`.
 */
export function chooseWithin(items: BudgetItems, money: number, mobilisation = 0): BudgetChoice {
  const { value, must } = items;
  const n = value.length;
  const { batchOf, batches } = batchNumbers(items, mobilisation);
  const base: State = { taken: new Uint8Array(n), open: new Uint8Array(batches), left: money };
  for (let i = 0; i < n; i += 1) if (must[i]! > 0) take(base, i, batchOf, items, mobilisation);
  if (base.left < 0)
    throw new RangeError(`what must be chosen costs ${String(money - base.left)}, the money is ${String(money)}`);
  const free = freeItems(items, base, batchOf, mobilisation);
  const segments = segmentsOf(free, items, base, batchOf, mobilisation);
  const fixed = sumOver(base.taken, value);
  let best: { readonly state: State; readonly value: number; readonly start: BudgetChoice['start'] } | null = null;
  for (const start of ['ratio', 'single', 'batch'] as const) {
    const state = started(start, free, items, base, batchOf, mobilisation);
    if (state === null) continue;
    fill(state, segments, items, batchOf, mobilisation);
    const found = sumOver(state.taken, value);
    if (best === null || found > best.value) best = { state, value: found, start };
  }
  const { state, value: found, start } = best!;
  return {
    chosen: Int32Array.from(indicesOf(state.taken)),
    value: found,
    cost: money - state.left,
    bound: Math.max(found, boundOf(segments, base.left, fixed) ?? found),
    start,
  };
}

/** Without mobilisation nothing binds items together. */
function batchNumbers(
  { batch }: BudgetItems,
  mobilisation: number,
): { readonly batchOf: Int32Array; readonly batches: number } {
  const n = batch.length;
  const batchOf = new Int32Array(n);
  let batches = 0;
  if (mobilisation > 0) for (let i = 0; i < n; i += 1) batches = Math.max(batches, batch[i]! + 1);
  for (let i = 0; i < n; i += 1) {
    const own = mobilisation > 0 ? batch[i]! : -1;
    batchOf[i] = own < 0 ? batches++ : own;
  }
  return { batchOf, batches };
}

function take(state: State, i: number, batchOf: Int32Array, { cost }: BudgetItems, mobilisation: number): void {
  const batch = batchOf[i]!;
  state.left -= cost[i]! + (state.open[batch] === 1 ? 0 : mobilisation);
  state.open[batch] = 1;
  state.taken[i] = 1;
}

/** Items that may be chosen and alone fit the money left, by falling value per cost. */
function freeItems(
  { value, cost, must }: BudgetItems,
  { open, left }: State,
  batchOf: Int32Array,
  mobilisation: number,
): Int32Array {
  const kept: number[] = [];
  for (let i = 0; i < value.length; i += 1) {
    const whole = cost[i]! + (open[batchOf[i]!] === 1 ? 0 : mobilisation);
    if (must[i] === 0 && value[i]! > 0 && whole <= left) kept.push(i);
  }
  const ratios = new Float64Array(value.length);
  for (const i of kept) ratios[i] = ratio(value[i]!, cost[i]!);
  return Int32Array.from(kept).sort((a, b) =>
    ratios[a] === ratios[b] ? value[b]! - value[a]! || a - b : ratios[b]! > ratios[a]! ? 1 : -1,
  );
}

/** The pieces of the concave bounds of all batches, by falling slope. */
function segmentsOf(
  free: Int32Array,
  { value, cost }: BudgetItems,
  { open }: State,
  batchOf: Int32Array,
  mobilisation: number,
): readonly Segment[] {
  const segments: Segment[] = [];
  const single = (i: number, batch: number): Segment => ({
    items: [i],
    value: value[i]!,
    cost: cost[i]!,
    batch,
    opens: false,
  });
  // without mobilisation they stand in their order already
  if (!(mobilisation > 0)) return Array.from(free, (i) => single(i, batchOf[i]!));
  const members = new Map<number, number[]>();
  for (const i of free) {
    const list = members.get(batchOf[i]!);
    if (list === undefined) members.set(batchOf[i]!, [i]);
    else list.push(i);
  }
  for (const [batch, list] of members) {
    let from = 0;
    if (open[batch] !== 1) {
      let packed = 0;
      let spent = mobilisation;
      while (from < list.length && ratio(value[list[from]!]!, cost[list[from]!]!) > packed / spent) {
        packed += value[list[from]!]!;
        spent += cost[list[from]!]!;
        from += 1;
      }
      segments.push({ items: list.slice(0, from), value: packed, cost: spent, batch, opens: true });
    }
    for (const i of list.slice(from)) segments.push(single(i, batch));
  }
  return segments.sort((a, b) => {
    const [x, y] = [ratio(a.value, a.cost), ratio(b.value, b.cost)];
    return x === y ? b.value - a.value || a.items[0]! - b.items[0]! : y > x ? 1 : -1;
  });
}

/** The state to fill up from: the musts alone, or with the most valuable item, or with the most valuable batch; null where there is none. */
function started(
  start: BudgetChoice['start'],
  free: Int32Array,
  items: BudgetItems,
  { taken, open, left }: State,
  batchOf: Int32Array,
  mobilisation: number,
): State | null {
  const state: State = { taken: taken.slice(), open: open.slice(), left };
  if (start === 'ratio') return state;
  const { value } = items;
  if (start === 'single') {
    let best = -1;
    for (const i of free) if (best < 0 || value[i]! > value[best]! || (value[i] === value[best] && i < best)) best = i;
    if (best < 0) return null;
    take(state, best, batchOf, items, mobilisation);
    return state;
  }
  if (!(mobilisation > 0)) return null;
  const worth = new Map<number, number>();
  const room = new Map<number, number>();
  for (const i of free) {
    const batch = batchOf[i]!;
    const rest = room.get(batch) ?? left - (open[batch] === 1 ? 0 : mobilisation);
    if (items.cost[i]! > rest) continue;
    room.set(batch, rest - items.cost[i]!);
    worth.set(batch, (worth.get(batch) ?? 0) + value[i]!);
  }
  const [first] = [...worth].sort(([a, x], [b, y]) => y - x || a - b);
  if (first === undefined) return null;
  for (const i of free) if (batchOf[i] === first[0]) takeIfItFits(state, i, batchOf, items, mobilisation);
  return state;
}

function takeIfItFits(state: State, i: number, batchOf: Int32Array, items: BudgetItems, mobilisation: number): void {
  const whole = items.cost[i]! + (state.open[batchOf[i]!] === 1 ? 0 : mobilisation);
  if (state.taken[i] === 0 && whole <= state.left) take(state, i, batchOf, items, mobilisation);
}

/** Whole segments while they fit, then in the same order whatever single items still fit. */
function fill(
  state: State,
  segments: readonly Segment[],
  items: BudgetItems,
  batchOf: Int32Array,
  mobilisation: number,
): void {
  for (const { items: some, batch, opens } of segments) {
    // an item behind the pack that opens its batch waits where the pack did not fit
    if (!opens && mobilisation > 0 && state.open[batch] !== 1) continue;
    let cost = state.open[batch] === 1 ? 0 : mobilisation;
    for (const i of some) if (state.taken[i] === 0) cost += items.cost[i]!;
    if (cost > state.left) continue;
    for (const i of some) if (state.taken[i] === 0) take(state, i, batchOf, items, mobilisation);
  }
  for (const { items: some } of segments) for (const i of some) takeIfItFits(state, i, batchOf, items, mobilisation);
}

/** Null where all of it is affordable: then all of it is chosen. */
function boundOf(segments: readonly Segment[], money: number, fixed: number): number | null {
  let bound = fixed;
  let left = money;
  for (const { value, cost } of segments) {
    if (cost > left) return (bound + (value * left) / cost) * ROUNDED;
    bound += value;
    left -= cost;
  }
  return null;
}

function sumOver(taken: Uint8Array, value: ArrayLike<number>): number {
  let sum = 0;
  for (let i = 0; i < taken.length; i += 1) if (taken[i] === 1) sum += value[i]!;
  return sum;
}

function* indicesOf(taken: Uint8Array): Generator<number> {
  for (let i = 0; i < taken.length; i += 1) if (taken[i] === 1) yield i;
}

/**
 * The expected number of buildings above x, F(x) = Σ P(ln S > x): tabulated once for rank bands, and solved exactly for the
 * threshold at which it equals the size of the list.
 */
import { exp } from '../numeric/elementary.js';
import { INVERSE_ROOT_TWO_PI, cdfFrom, normalCdf } from '../numeric/normal.js';
import type { Mixture } from './mixture.js';

/** F as data, so that threads can read it too. */
export interface Exceedance {
  /** Buildings in all. */
  readonly n: number;
  /** Smallest spread of any part. */
  readonly least: number;
  readonly low: number;
  readonly step: number;
  readonly value: Float64Array;
  /** Where parts have no spread: the places at which they stand, increasing, and the weight of all above each, exactly. */
  readonly places: Float64Array | null;
  readonly above: Float64Array | null;
}

const POINTS = 2048;
const SD_CLASSES = 24;
/** Point masses closer to the threshold than this are at it. */
const AT = 1e-9;

/**
 * What is asked of every set of mixtures on the way to F and its threshold. The answers are summed in the order of the sets: whoever
 * works them out, one thread or many, changes no bit.
 */
export type SetTask =
  { readonly kind: 'range' } | ({ readonly kind: 'grid' } & Range) | { readonly kind: 'count'; readonly x: number };

/** The ends of the parts of all mixtures, five spreads out, and their smallest and largest spread. */
export interface Range {
  readonly low: number;
  readonly high: number;
  readonly least: number;
  readonly most: number;
}

/** A few numbers for a task: the range; the weight on each point of the grid; the count above x and its density. */
export type SetAnswer = Float64Array;

/** Works out a task for one set. */
export function answerOf(mixtures: readonly Mixture[], task: SetTask): SetAnswer {
  if (task.kind === 'range') return rangeOf(mixtures);
  return task.kind === 'grid' ? gridOf(mixtures, task) : exact(mixtures, task.x);
}

/** Tabulates F of `n` buildings: yields tasks, takes the answers of all sets to each; `mixtures` are all of them, in one list of any kind. */
export function* exceedance(
  mixtures: readonly Mixture[],
  n: number,
): Generator<SetTask, Exceedance, readonly SetAnswer[]> {
  const range = widest(yield { kind: 'range' });
  const { low, least } = range;
  const step = stepOf(range);
  const weights = summed(yield { kind: 'grid', ...range });
  const value = new Float64Array(POINTS);
  variancesOf(range).forEach((variance, c) => {
    spreadOut(weights.subarray(c * ROW, (c + 1) * ROW), Math.sqrt(variance) / step, value);
  });
  const steps = least === 0 ? stepsOf(mixtures) : null;
  return { low, step, value, least, n, places: steps?.places ?? null, above: steps?.above ?? null };
}

function summed(answers: readonly SetAnswer[]): Float64Array {
  const sum = answers[0]?.slice() ?? new Float64Array(0);
  for (const answer of answers.slice(1)) for (let i = 0; i < sum.length; i += 1) sum[i]! += answer[i]!;
  return sum;
}

/** F(x), from the table; where parts have no spread, those above x, exactly. */
export function countAbove(table: Exceedance, x: number): number {
  return table.places === null ? interpolated(table, x) : stepped(table, x + AT);
}

/** The same with those at x: differs only where parts have no spread. */
export function countFrom(table: Exceedance, x: number): number {
  return table.places === null ? interpolated(table, x) : stepped(table, x - AT);
}

function interpolated(table: Exceedance, x: number): number {
  const at = (x - table.low) / table.step;
  if (at <= 0) return table.n;
  const i = Math.floor(at);
  if (i >= POINTS - 1) return 0;
  const f = at - i;
  return table.value[i]! * (1 - f) + table.value[i + 1]! * f;
}

function stepped({ places, above }: Exceedance, x: number): number {
  let low = 0;
  let high = places!.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (places![middle]! > x) high = middle;
    else low = middle + 1;
  }
  return above![low]!;
}

/** The places of all parts, each taken at its mean, with the weight above. */
function stepsOf(mixtures: readonly Mixture[]): { readonly places: Float64Array; readonly above: Float64Array } {
  const weightOf = new Map<number, number>();
  for (const { mean, weight, from, to } of mixtures) {
    for (let i = from; i < to; i += 1) {
      weightOf.set(mean[i]!, (weightOf.get(mean[i]!) ?? 0) + weight[i]!);
    }
  }
  const places = Float64Array.from(weightOf.keys()).sort();
  const above = new Float64Array(places.length + 1);
  for (let i = places.length - 1; i >= 0; i -= 1) above[i] = above[i + 1]! + weightOf.get(places[i]!)!;
  return { places, above };
}

function rangeOf(mixtures: readonly Mixture[]): SetAnswer {
  let low = Infinity;
  let high = -Infinity;
  let least = Infinity;
  let most = 0;
  for (const { mean, sd, from, to } of mixtures) {
    for (let i = from; i < to; i += 1) {
      low = Math.min(low, mean[i]! - 5 * sd[i]!);
      high = Math.max(high, mean[i]! + 5 * sd[i]!);
      least = Math.min(least, sd[i]!);
      most = Math.max(most, sd[i]!);
    }
  }
  return Float64Array.of(low, high, least, most);
}

function widest(answers: readonly SetAnswer[]): Range {
  let [low, high, least, most] = [Infinity, -Infinity, Infinity, 0];
  for (const answer of answers) {
    low = Math.min(low, answer[0]!);
    high = Math.max(high, answer[1]!);
    least = Math.min(least, answer[2]!);
    most = Math.max(most, answer[3]!);
  }
  if (!(high > low)) {
    low -= 1;
    high += 1;
  }
  return { low: low - 1e-6, high, least, most };
}

function stepOf({ low, high }: Range): number {
  return (high - low) / (POINTS - 2);
}

function variancesOf({ least, most }: Range): readonly number[] {
  return Array.from(
    { length: SD_CLASSES },
    (_, c) => least * least + ((most * most - least * least) * c) / (SD_CLASSES - 1),
  );
}

/** Points of the grid of one class of spread. */
const ROW = POINTS + 1;

/**
 * The parts shared out over neighbouring grid points and neighbouring classes of spread (keeping their mean and variance), so that
 * the cost does not grow with buildings times points.
 */
function gridOf(mixtures: readonly Mixture[], range: Range): SetAnswer {
  const { low, least, most } = range;
  const step = stepOf(range);
  const grid = new Float64Array(SD_CLASSES * ROW);
  for (const { weight, mean, sd, from, to } of mixtures) {
    for (let i = from; i < to; i += 1) {
      const at = (mean[i]! - low) / step;
      const g = Math.min(POINTS - 1, Math.floor(at));
      const f = at - g;
      const v =
        most > least ? ((sd[i]! * sd[i]! - least * least) / (most * most - least * least)) * (SD_CLASSES - 1) : 0;
      const c = Math.min(SD_CLASSES - 2, Math.floor(v));
      const r = v - c;
      const w = weight[i]!;
      const here = c * ROW + g;
      grid[here]! += w * (1 - r) * (1 - f);
      grid[here + 1]! += w * (1 - r) * f;
      grid[here + ROW]! += w * r * (1 - f);
      grid[here + ROW + 1]! += w * r * f;
    }
  }
  return grid;
}

/** Adds to `value` the exceedance of the counts, each spread normally with `sd` in grid steps. */
function spreadOut(counts: Float64Array, sd: number, value: Float64Array): void {
  const reach = Math.ceil(6 * sd);
  const kernel = new Float64Array(2 * reach + 1);
  for (let k = -reach; k <= reach; k += 1) kernel[k + reach] = sd > 0 ? normalCdf(k / sd) : k > 0 ? 1 : k < 0 ? 0 : 0.5;
  let beyond = 0;
  for (let j = 0; j < counts.length; j += 1) if (counts[j]! > 0) beyond += counts[j]!;
  if (beyond === 0) return;
  // counts far above x count fully: a running sum; near ones through the kernel
  const above = new Float64Array(counts.length + 1);
  for (let j = counts.length - 1; j >= 0; j -= 1) above[j] = above[j + 1]! + counts[j]!;
  for (let i = 0; i < value.length; i += 1) {
    let sum = above[Math.min(counts.length, i + reach + 1)]!;
    const from = Math.max(0, i - reach);
    const to = Math.min(counts.length - 1, i + reach);
    for (let j = from; j <= to; j += 1) sum += counts[j]! * kernel[j - i + reach]!;
    value[i]! += sum;
  }
}

/** The count above x and its density. */
function exact(mixtures: readonly Mixture[], x: number): SetAnswer {
  let count = 0;
  let density = 0;
  for (const { weight, mean, sd, from, to } of mixtures) {
    for (let i = from; i < to; i += 1) {
      const s = sd[i]!;
      const gap = mean[i]! - x;
      if (s > 0) {
        // nearly all are far below: told without a division
        if (gap < -9 * s) continue;
        const z = gap / s;
        if (z > 9) count += weight[i]!;
        else {
          const e = exp(-0.5 * z * z);
          count += weight[i]! * cdfFrom(z, e);
          density += (weight[i]! * e) / s;
        }
      } else if (gap > 0) count += weight[i]!;
    }
  }
  return Float64Array.of(count, density * INVERSE_ROOT_TWO_PI);
}

/**
 * x with F(x) = n, to 1e-9 buildings, or the place where F steps over n: Newton on the exact F from the table's answer, inside a
 * bracket. Yields tasks, takes the answers of all sets to each.
 */
export function* threshold(n: number, table: Exceedance): Generator<SetTask, number, readonly SetAnswer[]> {
  let i = 0;
  while (i < POINTS - 1 && table.value[i + 1]! > n) i += 1;
  let low = table.low - 1;
  let high = table.low + table.step * POINTS + 1;
  let x = table.low + table.step * (i + 0.5);
  for (let pass = 0; pass < 100; pass += 1) {
    const [count = 0, density = 0] = summed(yield { kind: 'count', x });
    const error = count - n;
    if (Math.abs(error) < 1e-9) return x;
    if (error > 0) low = x;
    else high = x;
    let next = density > 0 ? x + error / density : NaN;
    if (!(next > low && next < high)) next = 0.5 * (low + high);
    if (high - low < 1e-12 * (1 + Math.abs(x))) return next;
    x = next;
  }
  return x;
}

/** Of each building the chance above a threshold, and the weight of its point masses at it. */
export interface AboveThreshold {
  readonly above: Float64Array;
  readonly tied: Float64Array;
}

export function aboveThreshold(mixtures: readonly Mixture[], x: number): AboveThreshold {
  const above = new Float64Array(mixtures.length);
  const tied = new Float64Array(mixtures.length);
  mixtures.forEach((m, b) => {
    let sum = 0;
    for (let i = m.from; i < m.to; i += 1) {
      const s = m.sd[i]!;
      const gap = m.mean[i]! - x;
      if (s > 0) sum += m.weight[i]! * normalCdf(gap / s);
      else if (gap > AT) sum += m.weight[i]!;
      else if (gap > -AT) tied[b]! += m.weight[i]!;
    }
    // weights sum to 1 but for the last bit
    above[b] = Math.min(1, sum);
  });
  return { above, tied };
}

/** Chance of each building to be among the first `n`: point masses at the threshold share the places left over equally. */
export function sharedChances({ above, tied }: AboveThreshold, n: number): Float64Array {
  const chance = above.slice();
  let sum = 0;
  let ties = 0;
  for (let b = 0; b < chance.length; b += 1) {
    sum += above[b]!;
    ties += tied[b]!;
  }
  if (ties > 0) {
    const share = Math.min(1, Math.max(0, (n - sum) / ties));
    for (let b = 0; b < chance.length; b += 1) chance[b]! += share * tied[b]!;
  }
  return chance;
}

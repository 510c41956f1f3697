/**
 * Chances and rank bands by simulation, for portfolios too small for the closed form's fixed threshold. Draws are keyed by the
 * building's id, so the order of rows changes nothing.
 */
import { normalQuantile } from '../numeric/normal.js';
import { hashText, philox } from '../numeric/philox.js';
import type { Mixture } from './mixture.js';

export const SIMULATED_UNDER = 200;
export const DRAWS = 20_000;

export interface Simulated {
  readonly chance: Float64Array;
  readonly rankBest: Int32Array;
  readonly rankWorst: Int32Array;
}

/** One draw of ln S from a mixture: one word picks the part, one the place in it. */
function draw(m: Mixture, pick: number, place: number): number {
  let left = (pick + 0.5) / 4294967296;
  let i = m.from;
  while (i < m.to - 1 && left > m.weight[i]!) {
    left -= m.weight[i]!;
    i += 1;
  }
  const s = m.sd[i]!;
  return s > 0 ? m.mean[i]! + s * normalQuantile((place + 0.5) / 4294967296) : m.mean[i]!;
}

/** Simulates `DRAWS` rankings of a list of `listSize`. Ties within a draw are shared equally by mid-ranks. */
export function simulate(
  id: readonly string[],
  mixtures: readonly Mixture[],
  listSize: number,
  seed: number,
): Simulated {
  const n = id.length;
  const keys = id.map(hashText);
  const chance = new Float64Array(n);
  const ranks = Array.from({ length: n }, () => new Uint32Array(n + 1));
  const words = new Uint32Array(4);
  const score = new Float64Array(n);
  const order = Array.from(id.keys());
  for (let d = 0; d < DRAWS; d += 1) {
    for (let i = 0; i < n; i += 1) {
      philox(d, 0, keys[i]!, 0, seed, 0x5eed, words);
      score[i] = draw(mixtures[i]!, words[0]!, words[1]!);
    }
    order.sort((a, b) => score[b]! - score[a]!);
    for (let place = 0; place < n;) {
      let end = place + 1;
      while (end < n && score[order[end]!] === score[order[place]!]) end += 1;
      const inside = Math.max(0, Math.min(end, listSize) - place) / (end - place);
      const middle = Math.round((place + end + 1) / 2);
      for (let k = place; k < end; k += 1) {
        chance[order[k]!]! += inside;
        ranks[order[k]!]![middle]! += 1;
      }
      place = end;
    }
  }
  const quantile = (counts: Uint32Array, q: number): number => {
    const all = counts.reduce((sum, count) => sum + count, 0);
    let seen = 0;
    for (let r = 1; r <= n; r += 1) {
      seen += counts[r]!;
      if (seen >= q * all) return r;
    }
    return n;
  };
  for (const group of alike(mixtures)) {
    const mean = group.reduce((sum, i) => sum + chance[i]!, 0) / group.length;
    for (const i of group) chance[i] = mean;
    const pooled = new Uint32Array(n + 1);
    for (const i of group) ranks[i]!.forEach((count, r) => (pooled[r]! += count));
    for (const i of group) ranks[i] = pooled;
  }
  return {
    chance: chance.map((count) => count / DRAWS),
    rankBest: Int32Array.from(ranks, (counts) => quantile(counts, 0.05)),
    rankWorst: Int32Array.from(ranks, (counts) => quantile(counts, 0.95)),
  };
}

/** Buildings that nothing tells apart share what the draws gave them: groups of equal mixtures. */
function alike(mixtures: readonly Mixture[]): readonly (readonly number[])[] {
  const groups = new Map<string, number[]>();
  mixtures.forEach((m, i) => {
    const key = [m.weight, m.mean, m.sd].map((list) => list.subarray(m.from, m.to).join(' ')).join('|');
    const group = groups.get(key);
    if (group === undefined) groups.set(key, [i]);
    else group.push(i);
  });
  return [...groups.values()].filter((group) => group.length > 1);
}

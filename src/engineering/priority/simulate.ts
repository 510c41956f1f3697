/**
 * Chances and rank bands by simulation, for portfolios too small for the closed form's fixed threshold. Draws are keyed by the
 * building's id, so the order of rows changes nothing.
 */
import { normalQuantile } from '../numeric/normal.js';
import { hashText, philox } from '../numeric/philox.js';
import { NO_LABEL, labelOf } from './mixture.js';
import type { Mixture } from './mixture.js';
import { changedSpread, toOwn } from './shared.js';
import type { Common } from './shared.js';

export const SIMULATED_UNDER = 200;
export const DRAWS = 20_000;

export interface Simulated {
  readonly chance: Float64Array;
  readonly rankBest: Int32Array;
  readonly rankWorst: Int32Array;
  /** 5 and 95 % of the number of places of the published list that are wrong. */
  readonly wrongLow: number;
  readonly wrongHigh: number;
}

/** The part of a mixture that one word picks. */
function partOf(m: Mixture, pick: number): number {
  let left = (pick + 0.5) / 4294967296;
  let i = m.from;
  while (i < m.to - 1 && left > m.weight[i]!) {
    left -= m.weight[i]!;
    i += 1;
  }
  return i;
}

/** Common errors of one draw, by label and by zone. */
interface CommonDraw {
  readonly ofLabel: Float64Array;
  readonly ofZone: Float64Array;
}

/** One draw of ln S of building b: a part of its mixture, a word that gives the place in it, and the errors it has in common. */
function draw(m: Mixture, part: number, place: number, b: number, common: Common | undefined, z: CommonDraw): number {
  const label = labelOf(m, part);
  const sd = common === undefined ? m.sd[part]! : changedSpread(m.sd[part]!, toOwn(common, b, label));
  const own = sd > 0 ? m.mean[part]! + sd * normalQuantile((place + 0.5) / 4294967296) : m.mean[part]!;
  if (common === undefined) return own;
  const zone = common.shared.zone[b]!;
  const { eraLoad, siteLoad } = common.shared.zones[zone]!;
  return own + siteLoad * z.ofZone[zone]! + (label === NO_LABEL ? 0 : eraLoad * z.ofLabel[label]!);
}

/**
 * Simulates `DRAWS` rankings of a list of `listSize`, on which the buildings `listed` stand. Ties within a draw are shared equally by
 * mid-ranks. The `mixtures` are those seen from the edge of the list; common errors are drawn again, once for all they are common to.
 */
export function simulate(
  id: readonly string[],
  mixtures: readonly Mixture[],
  listed: Int32Array,
  listSize: number,
  seed: number,
  common?: Common,
): Simulated {
  const n = id.length;
  const keys = id.map(hashText);
  const chance = new Float64Array(n);
  const ranks = Array.from({ length: n }, () => new Uint32Array(n + 1));
  const words = new Uint32Array(4);
  const score = new Float64Array(n);
  const order = Array.from(id.keys());
  const isListed = new Uint8Array(n);
  for (const building of listed) isListed[building] = 1;
  const wrong = new Uint32Array(listed.length + 1);
  // an edition that no part stands for is not drawn
  const labelKeys =
    common?.shared.labels.map((name, l) =>
      common.draws.ofLabel[l]!.length > 0 ? hashText(`edition ${name}`) : null,
    ) ?? [];
  const zoneKeys = common?.shared.zones.map(({ name }) => hashText(`zone ${name}`)) ?? [];
  const z = { ofLabel: new Float64Array(labelKeys.length), ofZone: new Float64Array(zoneKeys.length) };
  const fill = (out: Float64Array, of: readonly (number | null)[], d: number): void => {
    of.forEach((key, f) => {
      if (key === null) return;
      philox(d, 0, key, 0, seed, 0x5eee, words);
      out[f] = normalQuantile((words[0]! + 0.5) / 4294967296);
    });
  };
  for (let d = 0; d < DRAWS; d += 1) {
    fill(z.ofLabel, labelKeys, d);
    fill(z.ofZone, zoneKeys, d);
    for (let i = 0; i < n; i += 1) {
      philox(d, 0, keys[i]!, 0, seed, 0x5eed, words);
      score[i] = draw(mixtures[i]!, partOf(mixtures[i]!, words[0]!), words[1]!, i, common, z);
    }
    let wrongPlaces = 0;
    order.sort((a, b) => score[b]! - score[a]!);
    for (let place = 0; place < n;) {
      let end = place + 1;
      while (end < n && score[order[end]!] === score[order[place]!]) end += 1;
      const inside = Math.max(0, Math.min(end, listSize) - place) / (end - place);
      const middle = Math.round((place + end + 1) / 2);
      for (let k = place; k < end; k += 1) {
        chance[order[k]!]! += inside;
        wrongPlaces += isListed[order[k]!]! * (1 - inside);
        ranks[order[k]!]![middle]! += 1;
      }
      place = end;
    }
    wrong[Math.round(wrongPlaces)]! += 1;
  }
  for (const group of alike(mixtures, common)) {
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
    wrongLow: quantile(wrong, 0.05),
    wrongHigh: quantile(wrong, 0.95),
  };
}

/** The smallest number up to which a share q of the `counts` lies. */
function quantile(counts: Uint32Array, q: number): number {
  const all = counts.reduce((sum, count) => sum + count, 0);
  let seen = 0;
  for (let r = 0; r < counts.length; r += 1) {
    seen += counts[r]!;
    if (seen >= q * all) return r;
  }
  return counts.length - 1;
}

/** Buildings that nothing tells apart share what the draws gave them: groups of equal mixtures and common errors. */
function alike(mixtures: readonly Mixture[], common: Common | undefined): readonly (readonly number[])[] {
  const groups = new Map<string, number[]>();
  mixtures.forEach((m, i) => {
    const labels = Array.from({ length: m.to - m.from }, (_, k) => labelOf(m, m.from + k)).join(' ');
    const values = [m.weight, m.mean, m.sd].map((list) => list.subarray(m.from, m.to).join(' '));
    const key = [...values, ...(common === undefined ? [] : [labels, common.shared.zone[i]])].join('|');
    const group = groups.get(key);
    if (group === undefined) groups.set(key, [i]);
    else group.push(i);
  });
  return [...groups.values()].filter((group) => group.length > 1);
}

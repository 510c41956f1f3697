/** Buildings of neighbouring ranks that cannot be told apart. */
import { labelOf, mixtureMoments } from './mixture.js';
import type { Mixture } from './mixture.js';
import { beats } from './pairwise.js';
import { pairChange } from './shared.js';
import type { Common } from './shared.js';

/** The leader of a tie group is told from the first building it beats with this chance [judgement]. */
const TOLD_APART = 0.8;

/**
 * From its leader down to the first building that the leader beats with a chance of at least 0.80; contiguous. Errors `common` to
 * both of a pair are left out of the comparison.
 */
export function tieGroups(order: Int32Array, mixtures: readonly Mixture[], common?: Common): Int32Array {
  const group = new Int32Array(order.length);
  if (order.length === 0) return group;
  let first = order[0]!;
  let leader = mixtures[first]!;
  let moments = mixtureMoments(leader);
  let labels = labelWeights(leader);
  let label = 1;
  for (const building of order) {
    const other = mixtures[building]!;
    if (building !== first) {
      const own = mixtureMoments(other);
      const change = common === undefined ? undefined : pairChange(common, first, building);
      if (toldApart(leader, moments, labels, other, own, change)) {
        first = building;
        leader = other;
        moments = own;
        labels = labelWeights(leader);
        label += 1;
      }
    }
    group[building] = label;
  }
  return group;
}

/** Weight of each label of a mixture. */
function labelWeights(mixture: Mixture): readonly (readonly [number, number])[] {
  const weights = new Map<number, number>();
  for (let k = mixture.from; k < mixture.to; k += 1) {
    const label = labelOf(mixture, k);
    weights.set(label, (weights.get(label) ?? 0) + mixture.weight[k]!);
  }
  return [...weights];
}

type Moments = ReturnType<typeof mixtureMoments>;

type PairChange = ReturnType<typeof pairChange>;

/** Settled from means and spreads where that is clear, by the whole mixtures otherwise; `labels` are those of a, with their weights. */
function toldApart(
  a: Mixture,
  p: Moments,
  labels: ReturnType<typeof labelWeights>,
  b: Mixture,
  q: Moments,
  change: PairChange | undefined,
): boolean {
  let variance = p.sd * p.sd + q.sd * q.sd;
  if (change !== undefined)
    for (const [label, weight] of labels)
      for (let k = b.from; k < b.to; k += 1) variance += weight * b.weight[k]! * change(label, labelOf(b, k));
  if (variance > 0) {
    const z = (p.mean - q.mean) / Math.sqrt(variance);
    if (z < 0.3) return false;
    if (z > 2) return true;
  }
  return beats(a, b, change) >= TOLD_APART;
}

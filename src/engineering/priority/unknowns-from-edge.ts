/** What is unknown of a building where errors are common to many: what is common to all is no matter to the list. */
import { NO_LABEL, labelOf } from './mixture.js';
import { changedMixture, changesOf } from './shared.js';
import type { Common } from './shared.js';
import type { Learnable, Unknowns } from './learnable.js';

/**
 * `unknowns` of building i as seen from the edge of the list. What drawings tell of the table of an edition keeps no more than the
 * share of the common errors that moves the building against the edge.
 */
export function seenFromEdge({ parts, learnable }: Unknowns, common: Common, i: number): Unknowns {
  const change = changesOf(common, i);
  const { eraLoad, siteLoad } = common.shared.zones[common.shared.zone[i]!]!;
  const era = eraLoad * eraLoad;
  const all = era + siteLoad * siteLoad;
  /** Share of the errors in common that is left to a part of the label. */
  const kept = (label: number): number =>
    label === NO_LABEL || !(all > 0) ? 1 : Math.min(1, Math.max(0, change[label]! + era) / all);
  const left = Float64Array.from({ length: parts.to - parts.from }, (_, k) => kept(labelOf(parts, parts.from + k)));
  return {
    parts: changedMixture(parts, change),
    learnable: learnable.map((one): Learnable => {
      if (one.unknown !== 'drawings') return one;
      const tau = left.map((share, k) => {
        const was = typeof one.tau === 'number' ? one.tau : one.tau[k]!;
        return Math.sqrt(Math.max(0, was * was - (1 - share) * era));
      });
      return { ...one, tau };
    }),
  };
}

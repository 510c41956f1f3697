/** What is unknown of a building where errors are common to many: what is common to all is no matter to the list. */
import { NO_LABEL, labelOf } from './mixture.js';
import { changedMixture, changesOf } from './shared.js';
import type { Common } from './shared.js';
import type { Unknowns } from './survey-value.js';

/**
 * `unknowns` of building i as seen from the edge of the list. What drawings tell of the table of an edition keeps no more than the
 * share of the common errors that moves the building against the edge.
 */
export function seenFromEdge({ parts, learnable }: Unknowns, common: Common, i: number): Unknowns {
  const change = changesOf(common, i);
  const { eraLoad, siteLoad } = common.shared.zones[common.shared.zone[i]!]!;
  const era = eraLoad * eraLoad;
  let heaviest = parts.from;
  for (let k = parts.from; k < parts.to; k += 1) if (parts.weight[k]! > parts.weight[heaviest]!) heaviest = k;
  const label = labelOf(parts, heaviest);
  const all = era + siteLoad * siteLoad;
  const kept = label === NO_LABEL || !(all > 0) ? 1 : Math.min(1, Math.max(0, change[label]! + era) / all);
  return {
    parts: changedMixture(parts, change),
    learnable: learnable.map((one) =>
      one.unknown === 'drawings' ? { ...one, tau: Math.sqrt(Math.max(0, one.tau * one.tau - (1 - kept) * era)) } : one,
    ),
  };
}

/** Ranks the assessed buildings and writes rank, chance, band and tie group into their result columns. */
import { rankAll } from '../engineering/priority/rank.js';
import type { Ranking } from '../engineering/priority/rank.js';
import type { Assessed } from './assess-all.js';

export interface Ranked {
  readonly ranking: Ranking;
  /** Median ln S of the portfolio: priority 1. */
  readonly medianOfPortfolio: number;
}

/** Fills the ranking columns of `assessed.results`. */
export function rankInto(assessed: Assessed, listSize: number, seed: number): Ranked {
  const { results, index, id, mixtures, median, people, demand } = assessed;
  const ranking = rankAll({ id, mixtures, median, people }, listSize, seed);
  const n = id.length;
  const { wholes, numbers, texts } = results;
  const medianOfPortfolio = n === 0 ? 0 : median[ranking.order[Math.floor((n - 1) / 2)]!]!;
  for (let i = 0; i < n; i += 1) {
    const at = index[i]!;
    wholes['rank']![at] = ranking.rank[i]!;
    wholes['rank_best']![at] = ranking.rankBest[i]!;
    wholes['rank_worst']![at] = ranking.rankWorst[i]!;
    wholes['tie_group']![at] = ranking.tieGroup[i]!;
    numbers['chance']![at] = ranking.chance[i]!;
    numbers['priority']![at] = Math.exp(median[i]! - medianOfPortfolio);
    texts['in_list']![at] = ranking.rank[i]! <= listSize ? 'yes' : 'no';
  }
  const byDemand = Int32Array.from(id.keys()).sort(
    (a, b) => demand[b]! - demand[a]! || people[b]! - people[a]! || (id[a]! < id[b]! ? -1 : 1),
  );
  byDemand.forEach((building, place) => {
    wholes['demand_rank']![index[building]!] = place + 1;
  });
  return { ranking, medianOfPortfolio };
}

/** Ranks the assessed buildings and writes rank, chance, band and tie group into their result columns. */
import { rankAll, relativePriority, roundedMedian } from '../engineering/priority/rank.js';
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
    numbers['priority']![at] = relativePriority(median[i]!, medianOfPortfolio);
    texts['in_list']![at] = ranking.rank[i]! <= listSize ? 'yes' : 'no';
  }
  // equal demands share their places: on a plateau there is no order by demand
  const key = Float64Array.from(demand, roundedMedian);
  const byDemand = Int32Array.from(id.keys()).sort((a, b) => key[b]! - key[a]!);
  for (let from = 0; from < n;) {
    let to = from + 1;
    while (to < n && key[byDemand[to]!] === key[byDemand[from]!]) to += 1;
    for (let place = from; place < to; place += 1) {
      const at = index[byDemand[place]!]!;
      wholes['demand_rank']![at] = from + 1;
      wholes['demand_rank_last']![at] = to;
    }
    from = to;
  }
  return { ranking, medianOfPortfolio };
}

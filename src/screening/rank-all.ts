/** Ranks the assessed buildings: rank, chance, band and tie group as columns over the whole inventory. */
import { basisOf, commonTo, fallingOrder, orderOf, rankAll, relativePriority } from '../engineering/priority/rank.js';
import type { Ranking } from '../engineering/priority/rank.js';
import type { Bands } from '../engineering/priority/rank-bands.js';
import { rungPlaces, rungsOf } from '../engineering/priority/rungs.js';
import { tieGroups } from '../engineering/priority/tie-groups.js';
import { drawShared, hasShared } from '../engineering/priority/shared.js';
import type { SharedDraws } from '../engineering/priority/shared.js';
import { NULL_CODE } from '../store/codes.js';
import { RANKED_COLUMNS, RESULT_WORDS } from '../store/schema.js';
import { NULL_I32 } from '../store/vectors.js';
import type { Assessed } from './assess-all.js';
import type { Assessor } from './assess-threads.js';
import { seeFromEdge } from './flat-mixtures.js';
import type { RankedColumns } from './keep-results.js';

export interface Ranked {
  readonly ranking: Ranking;
  /** Draws of common errors; null where there are none. */
  readonly draws: SharedDraws | null;
  /** Median ln S of the portfolio: priority 1. */
  readonly medianOfPortfolio: number;
  readonly columns: RankedColumns;
}

const IN_LIST = RESULT_WORDS['in_list']!;

/**
 * Ranks an inventory of `count` buildings; `assessor` works out the chances and bands, in its threads if it has any. The spreads of
 * `assessed` become those seen from the edge of the list.
 */
export async function rankInventory(
  assessed: Assessed,
  count: number,
  listSize: number,
  seed: number,
  assessor: Assessor,
): Promise<Ranked> {
  const { index, id, mixtures, median, people, demand, shared } = assessed;
  const input = { id, mixtures, median, people, shared };
  const places = rungPlaces(id.length);
  const draws = hasShared(shared) ? drawShared(mixtures, shared, listSize, seed, places) : null;
  const common = commonTo(input, { draws });
  if (common !== undefined) seeFromEdge(assessed.flat, common);
  const found = basisBy(assessor, assessed, listSize);
  // meanwhile, in this thread
  const order = orderOf(input);
  const n = id.length;
  const columns = emptyColumns(count);
  const { numbers, wholes, words } = columns;
  const medianOfPortfolio = n === 0 ? 0 : median[order[Math.floor((n - 1) / 2)]!]!;
  fillDemandRanks(columns, index, demand);
  const { curve, threshold } = await found;
  const edge = { curve, threshold, rungs: rungsOf(places, curve, order, mixtures, common) };
  const basis = { order, mixtures, draws, ...edge };
  let first = 0;
  const parts = Promise.all(
    assessed.flat.map((flat) => {
      const zone = common?.shared.zone.slice(first, (first += flat.start.length - 1));
      return assessor.bands(flat, { ...edge, zone });
    }),
  );
  // and again
  const groups = tieGroups(order, mixtures, common);
  const priority = numbers['priority']!;
  for (let i = 0; i < n; i += 1) priority[index[i]!] = relativePriority(median[i]!, medianOfPortfolio);
  const ranking = rankAll(input, listSize, seed, basis, groups, joined(await parts, n));
  const put = (out: Float64Array | Int32Array | undefined, values: Float64Array | Int32Array) => {
    for (let i = 0; i < n; i += 1) out![index[i]!] = values[i]!;
  };
  put(wholes['rank'], ranking.rank);
  put(wholes['rank_best'], ranking.rankBest);
  put(wholes['rank_worst'], ranking.rankWorst);
  put(wholes['tie_group'], ranking.tieGroup);
  put(numbers['chance'], ranking.chance);
  const inList = words['in_list']!;
  const [inside, outside] = [IN_LIST.indexOf('yes'), IN_LIST.indexOf('no')];
  for (let i = 0; i < n; i += 1) inList[index[i]!] = ranking.rank[i]! <= listSize ? inside : outside;
  return { ranking, draws, medianOfPortfolio, columns };
}

/** Expected numbers above and threshold, worked out set by set; the sets do not depend on the number of threads. */
async function basisBy(assessor: Assessor, { flat, mixtures, id }: Assessed, listSize: number) {
  const sets = flat.map(({ weight, mean, sd, start }) => ({ weight, mean, sd, from: 0, to: start.at(-1)! }));
  const steps = basisOf(mixtures, id.length, listSize);
  let next = steps.next();
  while (next.done !== true) {
    const { value } = next;
    next = steps.next(await Promise.all(sets.map((set) => assessor.answer(set, value))));
  }
  return next.value;
}

/** Equal demands share their places: on a plateau there is no order by demand. */
function fillDemandRanks({ wholes }: RankedColumns, index: Int32Array, demand: Float64Array): void {
  const n = index.length;
  const { order: byDemand, steps } = fallingOrder(demand);
  const firstPlace = wholes['demand_rank']!;
  const lastPlace = wholes['demand_rank_last']!;
  for (let from = 0; from < n;) {
    let to = from + 1;
    while (to < n && steps[byDemand[to]!] === steps[byDemand[from]!]) to += 1;
    for (let place = from; place < to; place += 1) {
      const at = index[byDemand[place]!]!;
      firstPlace[at] = from + 1;
      lastPlace[at] = to;
    }
    from = to;
  }
}

/** The bands of all buildings from those of one set after the other. */
function joined(parts: readonly Bands[], n: number): Bands {
  const all = {
    above: new Float64Array(n),
    tied: new Float64Array(n),
    rankBest: new Int32Array(n),
    rankWorst: new Int32Array(n),
  };
  let at = 0;
  for (const { above, tied, rankBest, rankWorst } of parts) {
    all.above.set(above, at);
    all.tied.set(tied, at);
    all.rankBest.set(rankBest, at);
    all.rankWorst.set(rankWorst, at);
    at += above.length;
  }
  return all;
}

function emptyColumns(count: number): RankedColumns {
  const of = <A>(kind: string, make: () => A): Readonly<Record<string, A>> =>
    Object.fromEntries(RANKED_COLUMNS.filter((column) => column.kind === kind).map(({ name }) => [name, make()]));
  return {
    numbers: of('number', () => new Float64Array(count).fill(NaN)),
    wholes: of('whole', () => new Int32Array(count).fill(NULL_I32)),
    words: of('text', () => new Uint8Array(count).fill(NULL_CODE)),
  };
}

/** The run in figures: counts, certainty of the list, provenance; stored with the run and shown by every report. */
import { findColumn } from '../engineering/columns.js';
import type { AccountLine, AttributeCount, FindingCount, PageSummary } from '../engineering/page-contract.js';
import { LIKELY_WEAK } from '../engineering/results.js';
import type { Attributes } from '../inventory/attributes.js';
import type { RowAccount } from '../inventory/account.js';
import type { Database } from '../store/database.js';
import type { Assessed } from './assess-all.js';
import type { Ranked } from './rank-all.js';

const ACCOUNT_TITLES: Readonly<Record<string, string>> = {
  'merged-into-ranked': 'rows of ranked buildings',
  'merged-into-not-ranked': 'rows of buildings not ranked',
  'site-without-building': 'rows of sites without a building',
  rejected: 'rows rejected',
  'exact-duplicate': 'exact duplicates of other rows',
};

/** A place is called sure from this chance of belonging on. */
export const SURE = 0.8;

export type StoredSummary = Pick<
  PageSummary,
  | 'rows_in'
  | 'buildings'
  | 'ranked'
  | 'list_size'
  | 'expected_wrong_places'
  | 'wrong_places_range'
  | 'sure_places'
  | 'largest_equal_block'
  | 'tie_group_at_edge'
  | 'weak_in_list'
  | 'weak_outside'
  | 'account'
  | 'attributes'
  | 'assumptions'
  | 'slopes'
  | 'survey'
  | 'doubts'
  | 'budget'
  | 'sensitivity'
  | 'grids'
>;

export function accountLines(account: RowAccount): readonly AccountLine[] {
  return Object.entries(account).map(([kind, rows]) => ({ kind, title: ACCOUNT_TITLES[kind] ?? kind, rows }));
}

export function attributeCounts(attributes: Attributes): readonly AttributeCount[] {
  return Object.entries(attributes).map(([attribute, counts]) => ({
    attribute,
    title: findColumn(attribute)?.title ?? attribute,
    given: counts.given,
    inferred: counts.inferred,
    default: counts.default,
    unknown: counts.unknown,
  }));
}

/** Figures of the ranking. */
export function rankingFigures(
  assessed: Assessed,
  { ranking }: Ranked,
  listSize: number,
): Pick<
  StoredSummary,
  | 'ranked'
  | 'list_size'
  | 'expected_wrong_places'
  | 'wrong_places_range'
  | 'sure_places'
  | 'largest_equal_block'
  | 'tie_group_at_edge'
  | 'weak_in_list'
  | 'weak_outside'
> {
  const n = assessed.id.length;
  const places = Math.min(listSize, n);
  let sure = 0;
  let weakIn = 0;
  let weakOut = 0;
  ranking.order.forEach((building, place) => {
    if (place < places && ranking.chance[building]! >= SURE) sure += 1;
    if (!(assessed.weakChance[building]! >= LIKELY_WEAK)) return;
    if (place < places) weakIn += 1;
    else weakOut += 1;
  });
  const edge = n === 0 ? 0 : ranking.tieGroup[ranking.order[places - 1]!]!;
  const isOfEdge = (building: number): boolean => ranking.tieGroup[building] === edge;
  return {
    ranked: n,
    list_size: listSize,
    expected_wrong_places: ranking.expectedWrong,
    wrong_places_range: { low: ranking.wrongLow, high: ranking.wrongHigh },
    sure_places: sure,
    largest_equal_block: ranking.largestEqualBlock,
    tie_group_at_edge: { from: ranking.order.findIndex(isOfEdge) + 1, to: ranking.order.findLastIndex(isOfEdge) + 1 },
    weak_in_list: weakIn,
    weak_outside: weakOut,
  };
}

/** Findings of an inventory counted by code, words and numbers that were not read by column too, with one example each. */
export async function findingCounts(db: Database, inventoryId: string): Promise<readonly FindingCount[]> {
  const rows = await db.rows<{
    code: string;
    kind: string;
    count: number;
    row: number | null;
    column_name: string | null;
    message: string;
  }>(
    `SELECT code, kind, count(*) AS count, min("row") AS row, coalesce(arg_min(column_name, "row"), min(column_name)) AS column_name,
       coalesce(arg_min(message, "row"), min(message)) AS message
     FROM finding WHERE inventory_id = ? GROUP BY code, kind, CASE WHEN kind = 'rejected-cell' THEN column_name END ORDER BY kind DESC, count DESC, code, column_name`,
    [inventoryId],
  );
  return rows.map(({ code, kind, count, row, column_name, message }) => ({
    code,
    kind,
    count,
    ...(kind === 'rejected-cell' && column_name !== null ? { column: column_name } : {}),
    example:
      `${[row === null ? '' : `row ${String(row)}`, column_name ?? ''].filter((part) => part !== '').join(', ')}: ${message}`.replace(
        /^: /,
        '',
      ),
  }));
}

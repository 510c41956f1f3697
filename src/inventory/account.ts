import { Bug } from '../errors.js';
import type { Database } from '../store/database.js';

/** What became of the inventory's rows; the kinds sum to the rows read. */
export const ACCOUNT_KINDS = [
  'merged-into-ranked',
  'merged-into-not-ranked',
  'site-without-building',
  'rejected',
  'exact-duplicate',
] as const;
export type AccountKind = (typeof ACCOUNT_KINDS)[number];
export type RowAccount = Readonly<Record<AccountKind, number>>;

/** Counts and stores what became of every row. @throws Bug when the kinds do not sum to `rowsIn`. */
export async function storeAccount(
  db: Database,
  inventoryId: string,
  number: number,
  rowsIn: number,
): Promise<RowAccount> {
  const found = await db.rows<{ kind: AccountKind; rows: number }>(
    `SELECT fate AS kind, CAST(count(*) AS INTEGER) AS rows FROM intake_fate GROUP BY fate
     UNION ALL SELECT CASE WHEN not_ranked IS NULL THEN 'merged-into-ranked' ELSE 'merged-into-not-ranked' END,
       CAST(sum(rows) AS INTEGER) FROM building_core WHERE inventory_number = ? GROUP BY 1`,
    [number],
  );
  const account: Record<AccountKind, number> = {
    'merged-into-ranked': 0,
    'merged-into-not-ranked': 0,
    'site-without-building': 0,
    rejected: 0,
    'exact-duplicate': 0,
  };
  for (const { kind, rows } of found) account[kind] += rows;
  checkAccount(account, rowsIn);
  await db.append('row_account', [
    ACCOUNT_KINDS.map(() => inventoryId),
    [...ACCOUNT_KINDS],
    Int32Array.from(ACCOUNT_KINDS, (kind) => account[kind]),
  ]);
  return account;
}

/** @throws Bug when the kinds do not sum to `rowsIn`. */
export function checkAccount(account: RowAccount, rowsIn: number): void {
  const sum = ACCOUNT_KINDS.reduce((total, kind) => total + account[kind], 0);
  if (sum !== rowsIn)
    throw new Bug(
      `the account of rows does not add up: ${rowsIn} rows read, ${sum} accounted for (${JSON.stringify(account)})`,
    );
}

/** The stored account of an inventory. */
export async function readAccount(db: Database, inventoryId: string): Promise<RowAccount> {
  const rows = await db.rows<{ kind: AccountKind; rows: number }>(
    'SELECT kind, rows FROM row_account WHERE inventory_id = ?',
    [inventoryId],
  );
  return Object.fromEntries(rows.map(({ kind, rows: count }) => [kind, count])) as unknown as RowAccount;
}

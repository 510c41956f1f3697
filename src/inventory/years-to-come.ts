/** Years that have not come: of a building nothing can be dated there, whatever the limits of its column. */
import type { Database } from '../store/database.js';
import { quoteList } from '../store/sql.js';
import type { Mapping } from './header.js';

/** The year it is anywhere on earth, at the latest. */
export function presentYear(made: Date): number {
  return new Date(made.getTime() + EAST_OF_UTC_MS).getUTCFullYear();
}

/** The easternmost zones are 14 h ahead. */
const EAST_OF_UTC_MS = 14 * 3_600_000;

/** `mapping` with no year after `year` within limits. */
export function until(year: number, mapping: Mapping): Mapping {
  const columns = mapping.columns.map((mapped) => {
    const { column } = mapped;
    if (column.kind !== 'year') return mapped;
    const [low, high] = column.limits ?? [-Infinity, Infinity];
    return { ...mapped, column: { ...column, limits: [low, Math.min(high, year)] as const } };
  });
  return { ...mapping, columns };
}

/** Whether a year was refused as it is outside its limits. */
export async function refusedYears(db: Database, { columns }: Mapping): Promise<boolean> {
  const years = columns.flatMap(({ column }) => (column.kind === 'year' ? [column.name] : []));
  if (years.length === 0) return false;
  const found = await db.value(
    `SELECT count(*) FROM intake_finding WHERE code = 'outside-limits' AND list_contains(${quoteList(years)}, column_name)`,
  );
  return found !== 0;
}

/**
 * What a building of several rows is called: the name of the row that stands for the whole, one without a unit mark,
 * the largest of these by floor area; else what the names of its units begin with; else the first name, without its unit mark.
 */
import type { Database } from '../store/database.js';

// `83 THIRD ST #2`, `5 Elm St, Unit 4`. [common practice, no source]
const UNIT_MARK = `(#|\\b(unit|apt|apartment|suite|ste)\\b[. ]*\\S+\\s*$)`;

/** True in SQL where `name` names a unit of a building. */
export function isUnitSql(name: string): string {
  return `regexp_matches(${name}, '${UNIT_MARK}', 'i')`;
}

/** Makes the temporary table `intake_name` (key, name) of the merged rows `parts`. */
export async function nameBuildings(db: Database, parts: string, hasArea: boolean): Promise<void> {
  const order = hasArea ? 'floor_area_m2 DESC NULLS LAST, name' : 'name';
  await db.run(`CREATE OR REPLACE TEMP TABLE intake_name AS
    SELECT key, first(name ORDER BY ${order}) AS name FROM ${parts} WHERE name IS NOT NULL AND NOT ${isUnitSql('name')} GROUP BY key`);
  const { rowCount, key, low, high } = await db.columns(
    `SELECT key, min(name) AS low, max(name) AS high FROM ${parts} p ANTI JOIN intake_name n ON n.key = p.key
     WHERE name IS NOT NULL GROUP BY key`,
    { key: 'text', low: 'text', high: 'text' },
  );
  if (rowCount > 0)
    await db.append('intake_name', [key, low.map((name, at) => commonName(name ?? '', high[at] ?? ''))]);
}

/** What two names have in common at their beginning, up to the end of a word and without a unit mark; where that names nothing, `low` without its own. */
export function commonName(low: string, high: string): string {
  if (low === high) return low;
  let end = 0;
  while (end < low.length && low[end] === high[end]) end += 1;
  const isInWord = (at: number): boolean => /[\p{L}\p{N}]/u.test(low[at] ?? '') || /[\p{L}\p{N}]/u.test(high[at] ?? '');
  let start = low.slice(0, end);
  if (isInWord(end)) start = start.replace(/[\p{L}\p{N}]+$/u, '');
  start = withoutUnit(start);
  // A house number alone names nothing.
  if (/\p{L}{2}/u.test(start)) return start;
  const whole = withoutUnit(low);
  return /\p{L}{2}/u.test(whole) ? whole : low;
}

function withoutUnit(name: string): string {
  return name
    .replace(/#.*$/, '')
    .replace(/\b(?:unit|apt|apartment|suite|ste)\b[. ]*\S*\s*$/i, '')
    .replace(/[^\p{L}\p{N}.)]+$/u, '');
}

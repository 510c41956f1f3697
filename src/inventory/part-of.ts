/** Wings and additions: rows that name the main building they are joined to. What a name leads to, and what is wrong with it. */
import type { Database } from '../store/database.js';
import { CHECKS } from './checks.js';
import type { Check } from './checks.js';
import type { Mapping } from './header.js';

export interface Roots {
  /** Where each link leads in the end: the building that is part of no other; in a circle the least of those in it. */
  readonly root: Int32Array;
  /** Buildings that name one another, one list for each circle, each in the order of the names. */
  readonly circles: readonly (readonly number[])[];
}

/**
 * Follows links from parts to what they are part of, to the end. Each building is a number; `part` holds none twice, and none is linked
 * to itself. The work grows with the number of links, whatever their shape.
 */
export function rootsOf(part: Int32Array, main: Int32Array): Roots {
  const mainOf = new Map<number, number>();
  part.forEach((each, i) => mainOf.set(each, main[i]!));
  const rootOf = new Map<number, number>();
  const circles: number[][] = [];
  const root = new Int32Array(part.length);
  part.forEach((start, i) => {
    const path: number[] = [];
    const placeOf = new Map<number, number>();
    let at = start;
    for (;;) {
      const known = rootOf.get(at);
      const seen = placeOf.get(at);
      const next = mainOf.get(at);
      if (known === undefined && seen === undefined && next !== undefined) {
        placeOf.set(at, path.length);
        path.push(at);
        at = next;
        continue;
      }
      let end = known ?? at;
      if (seen !== undefined) {
        const circle = path.slice(seen);
        circles.push(circle);
        end = circle.reduce((least, each) => Math.min(least, each));
      }
      for (const each of path) rootOf.set(each, end);
      root[i] = end;
      return;
    }
  });
  return { root, circles };
}

/** Names of a circle told in a message. */
const TOLD = 5;

/** Notes every part_of that names no building, the building itself, a part, or a building that leads back. */
export async function notePartOf(db: Database, mapping: Mapping): Promise<void> {
  if (!mapping.columns.some(({ column }) => column.name === 'part_of')) return;
  await db.run(
    `CREATE OR REPLACE TEMP TABLE intake_link AS SELECT b.first_row AS "row", b.id, b.part_of, m.first_row AS main
     FROM (SELECT first_row, id, part_of FROM intake_building WHERE part_of IS NOT NULL) b
     LEFT JOIN (SELECT first_row, id FROM intake_building) m ON m.id = b.part_of`,
  );
  const note = async ({ code, column, action }: Check, message: string, where: string): Promise<void> => {
    await db.run(
      `INSERT INTO intake_finding SELECT "row", id, ?, part_of, ?, ?, ?, 'note' FROM intake_link WHERE ${where}`,
      [column, code, message, action],
    );
  };
  await note(CHECKS.mainUnknown, 'no building of the inventory has this identifier', 'main IS NULL');
  await note(CHECKS.partOfItself, 'the building names itself as its main building', 'main = "row"');
  // only what leads on can be a chain or a circle
  const on = await db.columns(
    `SELECT a."row", a.main, a.id, a.part_of, b.part_of AS beyond FROM intake_link a JOIN intake_link b ON b."row" = a.main
     WHERE a.main <> a."row" AND b.main <> b."row" ORDER BY a."row"`,
    { row: 'i32', main: 'i32', id: 'text', part_of: 'text', beyond: 'text' },
  );
  if (on.rowCount === 0) return;
  const { circles } = rootsOf(on.row, on.main);
  const placeOf = new Map<number, number>();
  on.row.forEach((row, i) => placeOf.set(row, i));
  const names = new Map<number, string>();
  for (const circle of circles) {
    const ids = circle.slice(0, TOLD).map((row) => String(on.id[placeOf.get(row)!]));
    const text = circle.length > TOLD ? `${ids.join(', ')} and ${String(circle.length - TOLD)} more` : ids.join(', ');
    for (const row of circle) names.set(row, text);
  }
  const checkOf = (row: number): Check => (names.has(row) ? CHECKS.partOfCircle : CHECKS.partOfPart);
  const rows = Array.from(on.row);
  await db.append('intake_finding', [
    on.row,
    on.id,
    rows.map((row) => checkOf(row).column),
    on.part_of,
    rows.map((row) => checkOf(row).code),
    rows.map((row, i) => {
      const circle = names.get(row);
      return circle === undefined
        ? `${String(on.part_of[i])} is itself part of ${String(on.beyond[i])}`
        : `each is said to be part of the next, and the last of the first: ${circle}`;
    }),
    rows.map((row) => checkOf(row).action),
    rows.map(() => 'note'),
  ]);
}

/** Rows that become no building of their own: rejected, exact duplicates, sites without a building. */
import type { Database } from '../store/database.js';
import { keySql } from './cells.js';
import type { Mapping } from './header.js';
import { readTableSql } from './read.js';
import type { Table } from './table.js';

const LEFT_OUT = 'the row is left out';

/**
 * Makes the temporary table `intake_fate` (row, fate) and its findings. Rows that the reader itself rejected are in it too.
 *
 * Rows with one id: a row equal to an earlier one in every cell is an exact duplicate, another one is rejected. Where
 * rows are merged, rows that only repeat the merge key are parts of one building, equal or not: units of one size are
 * common. Only a separate id column tells a repeated row from a second unit.
 */
export async function decideFates(db: Database, table: Table, mapping: Mapping): Promise<void> {
  await db.run('CREATE OR REPLACE TEMP TABLE intake_fate ("row" INTEGER, fate VARCHAR)');
  const { rejects } = table;
  if (rejects.length > 0) {
    await db.append('intake_fate', [Int32Array.from(rejects, ({ row }) => row), rejects.map(() => 'rejected')]);
    const none = rejects.map(() => null);
    await db.append('intake_finding', [
      Int32Array.from(rejects, ({ row }) => row),
      none,
      none,
      rejects.map(({ value }) => value),
      rejects.map(({ code }) => code),
      rejects.map(({ message }) => message),
      rejects.map(() => LEFT_OUT),
      rejects.map(() => 'rejected-row'),
    ]);
  }
  await rejectRowsWithoutKey(db, mapping);
  const idPosition = mapping.columns.find(({ column }) => column.name === 'id')?.position;
  if (mapping.mergeBy === undefined || mapping.mergeBy !== idPosition) await findTwins(db, table, mapping);
  if (mapping.noBuilding !== undefined) await setSitesApart(db, mapping);
}

async function rejectRowsWithoutKey(db: Database, mapping: Mapping): Promise<void> {
  const key = keySql(mapping);
  const changed = await db.run(
    `INSERT INTO intake_fate SELECT c."row", 'rejected' FROM intake_cell c WHERE ${key} IS NULL`,
  );
  if (changed === 0) return;
  const merged = mapping.mergeBy !== undefined;
  await db.run(
    `INSERT INTO intake_finding SELECT c."row", NULL, 'id', NULL, 'no-id', ?, ?, 'rejected-row'
     FROM intake_cell c WHERE ${key} IS NULL`,
    [merged ? `the row has no ${mapping.header[mapping.mergeBy ?? 0] ?? 'merge key'}` : 'the row has no id', LEFT_OUT],
  );
}

async function findTwins(db: Database, table: Table, mapping: Mapping): Promise<void> {
  // Grouped by hash: a tenth of the work; what only shares its hash falls out when the ids themselves are compared below.
  await db.run(`CREATE OR REPLACE TEMP TABLE intake_repeated AS
    SELECT c."row", c.id FROM intake_cell c
    WHERE hash(c.id) IN (SELECT hash(id) FROM intake_cell WHERE id IS NOT NULL GROUP BY 1 HAVING count(*) > 1)`);
  if ((await db.value('SELECT count(*) FROM intake_repeated')) === 0) return;
  const cells = table.header.map((_, at) => `coalesce(c${at}, '')`).join(', ');
  await db.run(`CREATE OR REPLACE TEMP TABLE intake_twin AS
    SELECT "row", id, min("row") OVER (PARTITION BY id) AS first_row, min("row") OVER (PARTITION BY id, digest) AS same_row
    FROM (SELECT r."row", r.id, md5(concat_ws(chr(31), ${cells})) AS digest
          FROM ${readTableSql(table.rewritten())} t JOIN intake_repeated r ON r."row" = t."row")`);
  const kept = mapping.mergeBy === undefined ? '' : 'AND same_row <> "row"';
  await db.run(`INSERT INTO intake_fate
    SELECT "row", CASE WHEN same_row < "row" THEN 'exact-duplicate' ELSE 'rejected' END
    FROM intake_twin WHERE first_row <> "row" ${kept}`);
  await db.run(
    `INSERT INTO intake_finding
     SELECT "row", id, 'id', id, 'exact-duplicate', 'every cell equals row ' || same_row, 'collapsed into that row', 'note'
     FROM intake_twin WHERE same_row < "row"`,
  );
  if (mapping.mergeBy !== undefined) return;
  await db.run(
    `INSERT INTO intake_finding
     SELECT "row", id, 'id', id, 'repeated-id', 'row ' || first_row || ' has this id too, with other cells', ?, 'rejected-row'
     FROM intake_twin WHERE first_row <> "row" AND same_row = "row"`,
    [LEFT_OUT],
  );
}

async function setSitesApart(db: Database, mapping: Mapping): Promise<void> {
  const key = keySql(mapping);
  const sites =
    mapping.mergeBy === undefined
      ? 'c."site only"'
      : `${key} IN (SELECT ${key} FROM intake_cell c GROUP BY 1 HAVING bool_and(c."site only"))`;
  await db.run(`INSERT INTO intake_fate SELECT c."row", 'site-without-building' FROM intake_cell c
    ANTI JOIN intake_fate f ON f."row" = c."row" WHERE ${sites}`);
}

/** Years of construction that are not known: ten equally likely years of like buildings, never one guess. */
import type { Database } from '../store/database.js';
import { DECADE } from './cells.js';
import { CHECKS } from './checks.js';
import type { Mapping } from './header.js';

const FEWEST_KNOWN = 8;
const MID_DECILES = '[0.05, 0.15, 0.25, 0.35, 0.45, 0.55, 0.65, 0.75, 0.85, 0.95]';

/**
 * Makes `intake_year` (first_row, pool) for buildings without a year, and `intake_pool` with their pools: the
 * years of the decade where that is known; else of at least 8 buildings of the same group and use; else of the same
 * use; else of all.
 */
export async function makeYearPools(db: Database, mapping: Mapping): Promise<void> {
  const has = (name: string): boolean => mapping.columns.some(({ column }) => column.name === name);
  await db.run('CREATE OR REPLACE TEMP TABLE intake_year (first_row INTEGER, pool INTEGER)');
  if (!has('year_built')) return;
  const use = has('use') ? "coalesce(use, 'unknown')" : "'unknown'";
  const group = has('group') ? '"group"' : 'CAST(NULL AS VARCHAR)';
  await db.run(`CREATE OR REPLACE TEMP TABLE intake_blank_year AS
    SELECT first_row, ${group} AS g, ${use} AS u, ${DECADE} AS decade FROM intake_building WHERE year_built IS NULL`);
  await noteHeaping(db);
  if ((await db.value('SELECT count(*) FROM intake_blank_year')) === 0) return;
  // Read once: the query behind intake_building joins words and odd cells.
  await db.run(`CREATE OR REPLACE TEMP TABLE intake_known_year AS
    SELECT ${group} AS g, ${use} AS u, year_built FROM intake_building WHERE year_built IS NOT NULL`);
  const pools = (level: number, g: string, u: string, by: string, label: string): string =>
    `SELECT ${level} AS level, ${g} AS g, ${u} AS u, CAST(NULL AS DOUBLE) AS decade, quantile_disc(year_built, ${MID_DECILES}) AS years,
       ${label} AS label
     FROM intake_known_year ${by}`;
  const enough = `HAVING count(*) >= ${FEWEST_KNOWN}`;
  await db.run(`CREATE OR REPLACE TEMP TABLE intake_pool AS
    SELECT CAST(row_number() OVER (ORDER BY level, decade, g, u) - 1 AS INTEGER) AS pool, * FROM (
      SELECT 0 AS level, NULL AS g, NULL AS u, decade, list_transform(range(10), lambda i: decade + i) AS years,
        'the ' || CAST(decade AS INTEGER) || 's' AS label FROM (SELECT DISTINCT decade FROM intake_blank_year WHERE decade IS NOT NULL)
      UNION ALL ${pools(1, 'g', 'u', `WHERE g IS NOT NULL GROUP BY g, u ${enough}`, "count(*) || ' known years: group ' || g || ', use ' || u")}
      UNION ALL ${pools(2, 'NULL', 'u', `GROUP BY u ${enough}`, "count(*) || ' known years: use ' || u")}
      UNION ALL ${pools(3, 'NULL', 'NULL', 'HAVING count(*) > 0', "count(*) || ' known years: all buildings'")})`);
  await db.run(`INSERT INTO intake_year SELECT b.first_row, coalesce(d.pool, gu.pool, us.pool, al.pool)
    FROM intake_blank_year b
    LEFT JOIN intake_pool d ON d.level = 0 AND d.decade = b.decade
    LEFT JOIN intake_pool gu ON gu.level = 1 AND gu.g = b.g AND gu.u = b.u
    LEFT JOIN intake_pool us ON us.level = 2 AND us.u = b.u
    LEFT JOIN intake_pool al ON al.level = 3
    WHERE coalesce(d.pool, gu.pool, us.pool, al.pool) IS NOT NULL`);
}

/** Stores the pools that a building takes its year from. */
export async function storeYearPools(db: Database, inventoryId: string): Promise<void> {
  if ((await db.value('SELECT count(*) FROM intake_year')) === 0) return;
  await db.run(
    `INSERT INTO year_pool SELECT ?, pool, label, generate_subscripts(years, 1) - 1 AS position, unnest(years)
     FROM intake_pool WHERE pool IN (SELECT pool FROM intake_year) ORDER BY pool, position`,
    [inventoryId],
  );
}

// Old buildings of unknown year are often entered as 1800 or 1900.
async function noteHeaping(db: Database): Promise<void> {
  const check = CHECKS.yearHeap;
  const heaps = await db.rows<{ y: number; hits: number; usual: number }>(
    `SELECT y, count(*) FILTER (WHERE year_built = y) AS hits, count(*) FILTER (WHERE year_built <> y) / 10.0::DOUBLE AS usual
     FROM (SELECT unnest([1800, 1900]) AS y) JOIN (SELECT year_built FROM intake_building WHERE year_built BETWEEN 1795 AND 1905)
       ON abs(year_built - y) <= 5
     GROUP BY y HAVING hits >= 5 AND hits > 3 * usual ORDER BY y`,
  );
  for (const { y, hits, usual } of heaps) {
    await db.run(
      `INSERT INTO intake_finding SELECT first_row, id, ?, ?, ?, ?, ?, 'note' FROM intake_building WHERE year_built = ?`,
      [
        check.column,
        String(y),
        check.code,
        `${hits} buildings give ${y}, ${usual} a year do around it`,
        check.action,
        y,
      ],
    );
  }
}

import { EDITION_LABELS } from '../engineering/assess/code-history.js';
import { WEAK_TYPES } from '../engineering/assess/weak.js';
import { ORIGINS, SYSTEMS } from '../engineering/building.js';
import { COLUMNS } from '../engineering/columns.js';
import type { InventoryColumn } from '../engineering/columns.js';
import { RESULT_COLUMNS } from '../engineering/results.js';
import type { ResultColumn } from '../engineering/results.js';
import { UserError } from '../errors.js';
import type { Database } from './database.js';
import { SCHEMA_V1 } from './schema-v1.js';
import { quoteName, quoteText } from './sql.js';

export interface Migration {
  readonly version: number;
  readonly statements: readonly string[];
}

/**
 * Columns nearly every inventory has. The others stand in `building_extra`, with rows only for buildings that have any
 * of them: forty columns of nothing would cost more to write than all the rest.
 */
const CORE = new Set(
  (
    'id name group lon lat storeys_above height_m plan_length_m plan_width_m floor_area_m2 year_built status system use ' +
    'occupants_peak site_class'
  ).split(' '),
);
/** Attributes that carry origin, spread and rule. */
export const FILLED_ATTRIBUTES = ['storeys_above', 'height_m', 'floor_area_m2'] as const;

/** The columns of COLUMNS that stand in `building_core`, and those that stand in `building_extra`. */
export const CORE_COLUMNS = COLUMNS.filter(({ name }) => CORE.has(name));
export const EXTRA_COLUMNS = COLUMNS.filter(({ name }) => !CORE.has(name));

/** The database type of an inventory column: words are enumerated, so that a code costs a byte and reads as its word. */
export function columnType({ kind, words }: InventoryColumn): string {
  if (kind === 'word' && words !== undefined) return enumType(words);
  return kind === 'number' || kind === 'whole' || kind === 'year' ? 'DOUBLE' : 'VARCHAR';
}

function enumType(words: readonly string[]): string {
  return `ENUM (${words.map(quoteText).join(', ')})`;
}

/** The database type of an origin. */
export const ORIGIN_TYPE = enumType(ORIGINS);

const RESULT_TYPES = { number: 'DOUBLE', whole: 'INTEGER', text: 'VARCHAR' } as const;

/** Results that are one of a few words of ours, by column: enumerated, as text costs more than all the numbers. A new word needs a migration. */
export const RESULT_WORDS: Readonly<Record<string, readonly string[]>> = {
  in_list: ['yes', 'no'],
  governing: ['longitudinal', 'transverse'],
  period_evidence: ['measured', 'formula', 'stiffness', 'formula and stiffness'],
  period_basis: ['best-fit', 'design', 'ambient', 'measured', 'mechanics'],
  case_system: SYSTEMS,
  case_edition: EDITION_LABELS,
  weak_type: WEAK_TYPES.map(({ name }) => name),
};

const RANKED = new Set(
  'rank in_list chance rank_best rank_worst tie_group priority demand_rank demand_rank_last'.split(' '),
);
/** What the ranking says of a building, known when all are assessed; in `result_ranked`. */
export const RANKED_COLUMNS = RESULT_COLUMNS.filter(({ name }) => RANKED.has(name));
/** What is known of it alone, kept while the others are assessed; in `result_assessed`. The view `result` has both. */
export const ASSESSED_COLUMNS = RESULT_COLUMNS.filter(({ name }) => !RANKED.has(name));

/** The database type of a result. */
export function resultType({ name, kind }: ResultColumn): string {
  const words = RESULT_WORDS[name];
  return words === undefined ? RESULT_TYPES[kind] : enumType(words);
}

function buildingView(): string {
  const columns = COLUMNS.map(({ name }) => `${CORE.has(name) ? 'c' : 'e'}.${quoteName(name)}`);
  const filled = FILLED_ATTRIBUTES.flatMap((name, at) => [
    `f${at}.origin AS ${name}_origin`,
    `f${at}.sigma AS ${name}_sigma`,
    `f${at}.rule AS ${name}_rule`,
  ]);
  const joins = FILLED_ATTRIBUTES.map(
    (name, at) => `JOIN fill f${at} ON f${at}.inventory_number = c.inventory_number AND f${at}.fill = c.${name}_fill`,
  );
  return `CREATE OR REPLACE VIEW building AS
    SELECT i.inventory_id, c.building_index, ${columns.join(', ')}, ${filled.join(', ')}, c.year_built_origin, c.year_pool,
      c.use_origin, c.system_origin, c.rows, c.first_row, c.findings, c.not_ranked
    FROM building_core c JOIN inventory i ON i.inventory_number = c.inventory_number ${joins.join(' ')}
    LEFT JOIN building_extra e ON e.inventory_number = c.inventory_number AND e.building_index = c.building_index`;
}

/** What statements read: made from the registers whenever the tables have changed, as they hold nothing of their own. */
const VIEWS: readonly string[] = [
  buildingView(),
  `CREATE OR REPLACE VIEW result AS SELECT a.run_id, a.building_index, ${RESULT_COLUMNS.map(
    (column) => `${RANKED_COLUMNS.includes(column) ? 'k' : 'a'}.${quoteName(column.name)}`,
  ).join(', ')}
     FROM result_assessed a JOIN result_ranked k ON k.run_id = a.run_id AND k.building_index = a.building_index`,
];

/**
 * Every step from an empty database to today's tables, in order, as fixed text: a step once released is never edited. A new column or
 * word in a register needs a further step (DEVELOPERS.md says how); test/store/schema.test.ts compares the registers with what they yield.
 */
export const MIGRATIONS: readonly Migration[] = [
  { version: 1, statements: SCHEMA_V1 },
  {
    version: 2,
    statements: [
      'ALTER TABLE building_extra ADD COLUMN "spectrum" VARCHAR',
      // The numbers of deleted runs are not given again.
      'CREATE TABLE run_deleted (run_id INTEGER NOT NULL, deleted VARCHAR NOT NULL)',
      // Hazard on grids: each kept once by its fingerprint; `axes` holds periods and lines as JSON, places are counted line by line.
      'CREATE TABLE hazard_grid (grid_number INTEGER PRIMARY KEY, grid_id VARCHAR NOT NULL, axes VARCHAR NOT NULL)',
      'CREATE TABLE hazard_ordinate (grid_number INTEGER NOT NULL, place INTEGER NOT NULL, period INTEGER NOT NULL, sa_g DOUBLE NOT NULL)',
      'CREATE TABLE run_grid (run_id INTEGER NOT NULL, grid_number INTEGER NOT NULL)',
      // What surveys have found out, cell by cell as it was written down, NULL where it could not be found out; of two answers to one
      // question the later counts. What is withdrawn stays, with the time of that.
      'CREATE TABLE survey_answer (answer INTEGER NOT NULL, id VARCHAR NOT NULL, column_name VARCHAR NOT NULL, cell VARCHAR, visit VARCHAR, surveyor VARCHAR, surveyed_on VARCHAR, remark VARCHAR, taken VARCHAR NOT NULL, withdrawn VARCHAR)',
      `ALTER TABLE result_assessed ALTER COLUMN "case_edition" SET DATA TYPE ENUM ('no seismic design', 'ubc-1927', 'ubc-1935',
      'ubc-1949', 'ubc-1961', 'ubc-1976', 'ubc-1988', 'ubc-1997', 'asce7-2002', 'japan-1924', 'japan-1950', 'japan-1981',
      'nz-1935', 'nz-1955', 'nz-1965', 'nz-1976', 'nz-2004', 'italy-1909', 'italy-1935', 'italy-1975', 'italy-2003',
      'greece-1959', 'greece-1985', 'greece-1995', 'turkey-1949', 'turkey-1968', 'turkey-1975', 'turkey-1998', 'turkey-2018',
      'india-1970', 'india-2002', 'india-2016', 'canada-1953', 'canada-1975', 'canada-1990', 'canada-2005',
      'own-1', 'own-2', 'own-3', 'own-4', 'own-5', 'own-6', 'own-7', 'own-8', 'own-9',
      'own-10', 'own-11', 'own-12', 'own-13', 'own-14', 'own-15', 'own-16', 'own-17', 'own-18',
      'own-19', 'own-20', 'own-21', 'own-22', 'own-23', 'own-24')`,
    ],
  },
  {
    version: 3,
    statements: ['reentrant_projection', 'reentrant_area_share', 'footprint_area_m2'].map(
      (name) => `ALTER TABLE building_extra ADD COLUMN "${name}" DOUBLE`,
    ),
  },
  {
    version: 4,
    statements: [
      // Drawings that show no design for earthquakes.
      `ALTER TABLE building_extra ALTER COLUMN "design_level" SET DATA TYPE ENUM ('working', 'strength', 'none')`,
    ],
  },
  { version: 5, statements: ['ALTER TABLE building_extra ADD COLUMN "wind_base_shear_coefficient" DOUBLE'] },
];

/**
 * Brings the tables up to date, in one transaction: killed or failing in the middle, it leaves them as they were.
 * @throws UserError when a newer program wrote the database.
 */
export async function prepareSchema(db: Database, migrations: readonly Migration[] = MIGRATIONS): Promise<void> {
  if ((await schemaState(db, migrations)) === 'current') return;
  const found = await schemaVersion(db);
  await db.transaction(async () => {
    await db.run('CREATE TABLE IF NOT EXISTS schema_version (version INTEGER NOT NULL)');
    for (const { version, statements } of migrations) {
      if (version <= found) continue;
      for (const statement of statements) await db.run(statement);
      await db.run('INSERT INTO schema_version VALUES (?)', [version]);
    }
    for (const view of VIEWS) await db.run(view);
  });
}

/** Whether the database has all tables of today, those of an earlier version, or none. @throws UserError when a newer program wrote it. */
export async function schemaState(
  db: Database,
  migrations: readonly Migration[] = MIGRATIONS,
): Promise<'current' | 'earlier' | 'empty'> {
  const latest = Math.max(...migrations.map(({ version }) => version));
  const found = await schemaVersion(db);
  if (found > latest) {
    throw new UserError(
      `the database has tables of version ${String(found)}, this program knows ${String(latest)}; update swaymark, or move the file away and screen again`,
      { file: db.file },
    );
  }
  if (found === latest) return 'current';
  return found === 0 ? 'empty' : 'earlier';
}

/** The version of the tables in the database, 0 when it has none. */
export async function schemaVersion(db: Database): Promise<number> {
  const known = await db.value("SELECT count(*) FROM information_schema.tables WHERE table_name = 'schema_version'");
  return known === 0 ? 0 : Number((await db.value('SELECT max(version) FROM schema_version')) ?? 0);
}

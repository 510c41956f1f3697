/** What the reports draw: a run out of the database as PageData. */
import { BUILDING_NUMBERS, BUILDING_WORDS } from '../engineering/building-columns.js';
import type { BuildingColumns } from '../engineering/building-columns.js';
import { textInDisplay } from '../engineering/format.js';
import type { Display } from '../engineering/format.js';
import { compileContext } from '../engineering/assess/context.js';
import { settingsFromJson } from '../engineering/assess/settings.js';
import type { AssessSettings } from '../engineering/assess/settings.js';
import type { PageData } from '../engineering/page-contract.js';
import { RESULT_COLUMNS } from '../engineering/results.js';
import { cropped } from '../engineering/spectrum/grid-carry.js';
import { STRUCTURE_NUMBERS, STRUCTURE_WORDS } from '../engineering/structure-columns.js';
import { UserError } from '../errors.js';
import type { Database } from '../store/database.js';
import { RANKED_COLUMNS } from '../store/schema.js';
import { quoteName } from '../store/sql.js';
import type { ColumnKind } from '../store/vectors.js';
import { CAUTIONS } from './assumptions.js';
import { gapsOf } from './gaps.js';
import { gridRejects } from './grid-rejects.js';
import { foundBy } from './found-by.js';
import { readGrids } from './kept-grids.js';
import { STRUCTURE_SPEC, knowsStructure, readPools } from './read-buildings.js';
import { levelOfWork, workOfOthers } from './level-of-work.js';
import { findingCounts } from './summarise.js';
import type { StoredSummary } from './summarise.js';
import { pageSites } from './sites.js';

/** Buildings a page carries at most: beyond it the first ranks, and ranking.csv holds all. */
export const SHOWN_AT_MOST = 20_000;

export interface StoredRun {
  readonly run_id: number;
  readonly made: string;
  readonly program: string;
  readonly note: string;
  readonly title: string;
  /** Name of the study file; null where an earlier program kept none. */
  readonly study_file: string | null;
  readonly inventory_id: string;
  readonly study_fingerprint: string;
  readonly methods_fingerprint: string;
  readonly settings: AssessSettings;
  readonly summary: StoredSummary;
  readonly rank_by: string;
  readonly seed: number;
}

/** A run's record. @throws UserError when there is none of that number. */
export async function readRun(db: Database, runId: number): Promise<StoredRun> {
  const [row] = await db.rows<
    Omit<StoredRun, 'settings' | 'summary' | 'study_file'> & { settings: string; summary: string }
  >(
    `SELECT run_id, made, program, note, title, inventory_id, study_fingerprint, methods_fingerprint, settings, summary, rank_by,
       CAST(seed AS DOUBLE) AS seed
     FROM run WHERE run_id = ?`,
    [runId],
  );
  if (row === undefined) throw new UserError(`there is no run ${String(runId)}; swaymark runs lists them`);
  const { study_file = null, ...summary } = JSON.parse(row.summary) as StoredSummary & { study_file?: string };
  return { ...row, study_file, settings: settingsFromJson(row.settings), summary };
}

const KIND: Readonly<Record<string, ColumnKind>> = { number: 'f64', whole: 'i32', text: 'text' };

/** Everything the reports of run `runId` need. */
export async function pageDataOf(db: Database, runId: number, display: Display): Promise<PageData> {
  const run = await readRun(db, runId);
  const others = ['name', 'group', 'part_of', 'heritage'] as const;
  const spec: Record<string, ColumnKind> = { id: 'text', first_row: 'f64', lon: 'f64', lat: 'f64' };
  for (const name of others) spec[name] = 'text';
  for (const name of BUILDING_NUMBERS) spec[name] = 'f64';
  for (const name of BUILDING_WORDS) spec[name] = 'text';
  const structured = await knowsStructure(db, run.inventory_id);
  if (structured) Object.assign(spec, STRUCTURE_SPEC);
  const resultSpec: Record<string, ColumnKind> = {};
  const results = RESULT_COLUMNS.map((column) => {
    const { name, kind } = column;
    resultSpec[`r_${name}`] = KIND[kind] === 'i32' ? 'f64' : KIND[kind]!;
    return `${RANKED_COLUMNS.includes(column) ? 'k' : 'a'}.${quoteName(name)} AS ${quoteName(`r_${name}`)}`;
  });
  const buildings = Object.keys(spec).map((name) => `b.${quoteName(name)}`);
  // The places first, and past the view of results: joining and sorting a million rows of all columns to show some thousands takes seconds.
  await db.run(
    `CREATE OR REPLACE TEMP TABLE page_place AS SELECT building_index, row_number() OVER (ORDER BY "rank" NULLS LAST, building_index) AS place
     FROM (SELECT building_index, "rank" FROM result_ranked WHERE run_id = ? ORDER BY "rank" NULLS LAST, building_index LIMIT ${String(SHOWN_AT_MOST)})`,
    [runId],
  );
  const ofBuildings = await db.columns(
    `SELECT ${buildings.join(', ')} FROM building b JOIN page_place p USING (building_index) WHERE b.inventory_id = ? ORDER BY p.place`,
    spec,
    [run.inventory_id],
  );
  const ofResults = await db.columns(
    `SELECT ${results.join(', ')} FROM result_assessed a JOIN page_place p ON p.building_index = a.building_index
     JOIN result_ranked k ON k.run_id = a.run_id AND k.building_index = p.building_index WHERE a.run_id = ? ORDER BY p.place`,
    resultSpec,
    [runId],
  );
  const { sites, siteOf } = await pageSites(db, run);
  await db.run('DROP TABLE page_place');
  const read = { ...ofBuildings, ...ofResults } as unknown as Readonly<
    Record<string, readonly (string | null)[] | Float64Array>
  > & { readonly rowCount: number };
  const pick = (names: readonly string[]): Readonly<Record<string, unknown>> =>
    Object.fromEntries(names.map((name) => [name, Array.from<string | number | null>(read[name]!)]));
  const numbers = (name: string): (number | null)[] =>
    Array.from(read[name] as Float64Array, (value) => (Number.isNaN(value) ? null : value));
  const texts = (name: string): (string | null)[] => [...(read[name] as readonly (string | null)[])];
  const grids = await readGrids(db, run.settings);
  const place = { lon: read['lon'] as Float64Array, lat: read['lat'] as Float64Array };
  const level = levelOfWork(await workOfOthers(db, run.inventory_id));
  const { made, program, title, rank_by, inventory_id, study_fingerprint, methods_fingerprint } = run;
  return {
    summary: {
      ...run.summary,
      title,
      run: String(runId),
      made,
      program,
      rank_by,
      fingerprints: { study: study_fingerprint, inventory: inventory_id, methods: methods_fingerprint },
      findings: [...(await gridRejects(db, run)), ...(await findingCounts(db, inventory_id))].map((finding) => ({
        ...finding,
        example: textInDisplay(finding.example, display),
      })),
      not_ranked: await db.rows<{ reason: string; count: number }>(
        'SELECT not_ranked AS reason, count(*) AS count FROM result_assessed WHERE run_id = ? AND not_ranked IS NOT NULL GROUP BY 1 ORDER BY 2 DESC, 1',
        [runId],
      ),
      level_of_work: level,
      cautions: [level, ...CAUTIONS],
    },
    settings: run.settings,
    buildings: {
      shown: read.rowCount,
      all: run.summary.buildings,
      inputs: {
        id: texts('id') as string[],
        numbers: pick(BUILDING_NUMBERS) as unknown as BuildingColumns['numbers'],
        words: pick(BUILDING_WORDS) as unknown as BuildingColumns['words'],
        structure: structured
          ? ({
              numbers: pick(STRUCTURE_NUMBERS),
              words: pick(STRUCTURE_WORDS),
            } as unknown as BuildingColumns['structure'])
          : undefined,
        place: grids.size > 0 ? { lon: Array.from(place.lon), lat: Array.from(place.lat) } : undefined,
      },
      pools: await readPools(db, inventory_id),
      name: texts('name'),
      group: texts('group'),
      part_of: texts('part_of'),
      site: siteOf,
      lon: numbers('lon'),
      lat: numbers('lat'),
      heritage: texts('heritage'),
      first_row: Array.from(read['first_row'] as Float64Array),
      results: Object.fromEntries(
        RESULT_COLUMNS.map(({ name, kind }) => [name, kind === 'text' ? texts(`r_${name}`) : numbers(`r_${name}`)]),
      ),
      found: await foundBy(db, inventory_id, texts('id') as string[]),
    },
    sites,
    gaps: await gapsOf(db, run, run.summary.list_size, () => compileContext(run.settings, grids)),
    grids: Object.fromEntries([...grids].map(([name, grid]) => [name, cropped(grid, place.lon, place.lat)])),
    display,
  };
}

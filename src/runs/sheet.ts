/** Everything kept about one run. */
import type { AccountLine } from '../engineering/page-contract.js';
import { Bug, UserError } from '../errors.js';
import { readRun } from '../screening/page-data.js';
import type { StoredRun } from '../screening/page-data.js';
import type { Database } from '../store/database.js';
import { changesBetween } from '../study/changes.js';
import { studyFromText } from '../study/load.js';
import type { Study } from '../study/schema.js';
import { dotted } from '../study/problems.js';
import { areOfOneStudy, listRuns, runById } from './history.js';
import type { RunEntry } from './history.js';

/** A place of a run's list. */
export interface ListedBuilding {
  readonly rank: number;
  readonly id: string;
  readonly name: string | null;
  readonly group: string | null;
  /** Chance of belonging to the list, 0 to 1. */
  readonly chance: number;
  readonly rank_best: number;
  readonly rank_worst: number;
  readonly tie_group: number;
}

/** A value that differs between two runs; undefined where it is not there. */
export interface SettingDifference {
  /** Dotted, list positions counted from 1. */
  readonly path: string;
  readonly from: unknown;
  readonly to: unknown;
}

/** How a run differs from the one before it. */
export interface RunChanges {
  /** The run before: of the same study where there is one. */
  readonly run: number;
  /** What the study file says otherwise, by the paths of `refresh --set`; null when this version does not read one of the two. */
  readonly study: readonly SettingDifference[] | null;
  /** What the assessment was told otherwise, by the paths of the kept settings: also what the files named by the study say. */
  readonly settings: readonly SettingDifference[];
  /** Which of the study file, the fingerprints and the program are others. */
  readonly others: readonly ('study file' | 'inventory' | 'methods' | 'program')[];
}

/** Everything kept about a run besides its results. */
export interface RunSheet extends RunEntry {
  readonly seed: number;
  readonly inventory: {
    readonly file: string;
    readonly encoding: string;
    readonly delimiter: string;
    readonly rows_in: number;
    readonly buildings: number;
  };
  /** Where every row of the inventory went. */
  readonly account: readonly AccountLine[];
  readonly not_ranked: number;
  readonly expected_wrong_places: number;
  readonly sure_places: number;
  /** In the order of rank, at most `list_size`. */
  readonly list: readonly ListedBuilding[];
  /** Null for the oldest run kept. */
  readonly before: RunChanges | null;
}

/** The sheet of run `id`. @throws UserError when there is none of that number. */
export async function runSheet(db: Database, id: number): Promise<RunSheet> {
  const entry = await runById(db, id);
  const stored = await readRun(db, id);
  const [inventory] = await db.rows<RunSheet['inventory']>(
    'SELECT file, encoding, delimiter, rows_in, buildings FROM inventory WHERE inventory_id = ?',
    [stored.inventory_id],
  );
  if (inventory === undefined) throw new Bug(`run ${String(id)} has no inventory`);
  const { account, expected_wrong_places, sure_places } = stored.summary;
  // The one before of the same study; where that has none, of whichever study of the folder.
  const earlier = (await listRuns(db)).filter(({ run }) => run < id);
  const before = earlier.findLast((run) => areOfOneStudy(run, entry)) ?? earlier.at(-1);
  return {
    ...entry,
    seed: Number(await db.value('SELECT seed FROM run WHERE run_id = ?', [id])),
    inventory,
    account,
    not_ranked: entry.buildings - entry.ranked,
    expected_wrong_places,
    sure_places,
    list: await listOf(db, stored),
    before: before === undefined ? null : await changesFrom(db, before, entry, stored),
  };
}

function listOf(db: Database, { run_id, inventory_id }: StoredRun): Promise<readonly ListedBuilding[]> {
  return db.rows<ListedBuilding & Record<string, never>>(
    `SELECT r."rank", b.id, b.name, b."group", r.chance, r.rank_best, r.rank_worst, r.tie_group
     FROM result_ranked r JOIN building_core b USING (building_index)
     WHERE r.run_id = ? AND r.in_list = 'yes'
       AND b.inventory_number = (SELECT inventory_number FROM inventory WHERE inventory_id = ?)
     ORDER BY r."rank"`,
    [run_id, inventory_id],
  );
}

async function changesFrom(db: Database, before: RunEntry, now: RunEntry, stored: StoredRun): Promise<RunChanges> {
  const [was, is] = [await keptStudy(db, before.run), await keptStudy(db, now.run)];
  const { settings } = await readRun(db, before.run);
  const others = {
    'study file': !areOfOneStudy(before, now),
    inventory: before.fingerprints.inventory !== now.fingerprints.inventory,
    methods: before.fingerprints.methods !== now.fingerprints.methods,
    program: before.program !== now.program,
  };
  return {
    run: before.run,
    study: was === null || is === null ? null : changed(was, is),
    settings: changed(settings, stored.settings),
    others: (['study file', 'inventory', 'methods', 'program'] as const).filter((name) => others[name]),
  };
}

function changed(from: unknown, to: unknown): readonly SettingDifference[] {
  return changesBetween(from, to).map((change) => ({ ...change, path: dotted(change.path) }));
}

/** The study as it was kept with a run, without the folder of reports; null when this version does not read it. */
async function keptStudy(db: Database, run: number): Promise<Omit<Study, 'output'> | null> {
  try {
    const text = await db.value('SELECT study_text FROM run WHERE run_id = ?', [run]);
    const { output: _output, ...study } = studyFromText(String(text)).study;
    return study;
  } catch (error) {
    if (error instanceof UserError) return null;
    throw error;
  }
}

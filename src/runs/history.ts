/** The runs a study's database keeps. */
import { UserError } from '../errors.js';
import type { Database } from '../store/database.js';

/** A run as a list shows it. */
export interface RunEntry {
  readonly run: number;
  /** ISO 8601. */
  readonly made: string;
  readonly program: string;
  readonly note: string;
  readonly title: string;
  readonly buildings: number;
  readonly ranked: number;
  readonly list_size: number;
  readonly rank_by: string;
  readonly fingerprints: { readonly study: string; readonly inventory: string; readonly methods: string };
}

interface Row extends Omit<RunEntry, 'fingerprints'> {
  readonly study_fingerprint: string;
  readonly inventory_id: string;
  readonly methods_fingerprint: string;
}

const NO_RUNS = 'this study has no run yet; run `swaymark screen` first';

/** Every run, oldest first; none in a database without tables. */
export async function listRuns(db: Database): Promise<readonly RunEntry[]> {
  if ((await db.value("SELECT count(*) FROM information_schema.tables WHERE table_name = 'run'")) === 0) return [];
  const rows = await db.rows<Row>(
    `SELECT run_id AS run, made, program, note, title, buildings, ranked, list_size, rank_by, study_fingerprint, inventory_id, methods_fingerprint
     FROM run ORDER BY run_id`,
  );
  return rows.map(({ study_fingerprint, inventory_id, methods_fingerprint, ...run }) => ({
    ...run,
    fingerprints: { study: study_fingerprint, inventory: inventory_id, methods: methods_fingerprint },
  }));
}

/** The newest run. @throws UserError when there is none. */
export async function latestRun(db: Database): Promise<RunEntry> {
  const newest = (await listRuns(db)).at(-1);
  if (newest === undefined) throw new UserError(NO_RUNS, { file: db.file });
  return newest;
}

/** The run of that number. @throws UserError when there is none, naming those there are. */
export async function runById(db: Database, id: number): Promise<RunEntry> {
  const runs = await listRuns(db);
  const found = runs.find(({ run }) => run === id);
  if (found !== undefined) return found;
  const first = runs[0]?.run;
  if (first === undefined) throw new UserError(NO_RUNS, { file: db.file });
  const last = runs.at(-1)?.run ?? first;
  throw new UserError(
    `there is no run ${String(id)}; kept: ${first === last ? String(first) : `${String(first)} to ${String(last)}`}`,
    { file: db.file },
  );
}

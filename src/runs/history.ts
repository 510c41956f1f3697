/**
 * The runs that the database of a folder keeps, and which of them are a study's: several study files of one folder share it. A run is of the
 * file it was made with, by name, whatever has been edited in it since. Where no name was kept, or that file is gone (renamed), it is
 * of the study that has its title.
 */
import { existsSync } from 'node:fs';
import { basename, join } from 'node:path';
import { Bug, UserError, showValue } from '../errors.js';
import type { Database } from '../store/database.js';
import type { LoadedStudy } from '../study/load.js';

/** A run as a list shows it. */
export interface RunEntry {
  readonly run: number;
  /** ISO 8601. */
  readonly made: string;
  readonly program: string;
  readonly note: string;
  readonly title: string;
  /** Name of the study file it was made with; null where an earlier program kept none. */
  readonly study_file: string | null;
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
    `SELECT run_id AS run, made, program, note, title, json_extract_string(summary, '$.study_file') AS study_file, buildings, ranked, list_size, rank_by, study_fingerprint, inventory_id, methods_fingerprint
     FROM run ORDER BY run_id`,
  );
  return rows.map(({ study_fingerprint, inventory_id, methods_fingerprint, ...run }) => ({
    ...run,
    fingerprints: { study: study_fingerprint, inventory: inventory_id, methods: methods_fingerprint },
  }));
}

/** The newest run, of whichever study. @throws UserError when there is none. */
export async function latestRun(db: Database): Promise<RunEntry> {
  const newest = (await listRuns(db)).at(-1);
  if (newest === undefined) throw new UserError(NO_RUNS, { file: db.file });
  return newest;
}

/** Whether `run` is of the study `loaded`. */
export function isOwnRun({ study_file, title }: RunEntry, { file, folder, study }: LoadedStudy): boolean {
  if (study_file === basename(file)) return true;
  return title === study.title && (study_file === null || !existsSync(join(folder, study_file)));
}

/** Whether two runs are of one study, as far as they tell themselves. */
export function areOfOneStudy(a: RunEntry, b: RunEntry): boolean {
  return a.study_file === null || b.study_file === null ? a.title === b.title : a.study_file === b.study_file;
}

/** The runs of the study `loaded`, oldest first. @throws UserError when there is none, saying whose are there. */
export async function ownRuns(db: Database, loaded: LoadedStudy): Promise<readonly RunEntry[]> {
  const runs = await listRuns(db);
  const own = runs.filter((run) => isOwnRun(run, loaded));
  if (own.length > 0) return own;
  const newest = runs.at(-1);
  if (newest === undefined) throw new UserError(NO_RUNS, { file: db.file });
  const others = [...new Set(runs.map(({ study_file, title }) => study_file ?? `a study called ${showValue(title)}`))];
  throw new UserError(
    `no run was made with this study: the runs kept in its folder are of ${others.join(', ')} (the newest: run ${String(newest.run)}); run \`swaymark screen\` with this file first, or name one of them with --run`,
    { file: loaded.file },
  );
}

/** The newest run of the study `loaded`. @throws UserError when there is none, saying whose are there. */
export async function latestOwnRun(db: Database, loaded: LoadedStudy): Promise<RunEntry> {
  const newest = (await ownRuns(db, loaded)).at(-1);
  if (newest === undefined) throw new Bug('a study with runs has no newest');
  return newest;
}

/** The run of that number. @throws UserError when there is none, naming those there are. */
export async function runById(db: Database, id: number): Promise<RunEntry> {
  const [found] = await runsByIds(db, [id]);
  if (found === undefined) throw new Bug(`run ${String(id)} is neither there nor missing`);
  return found;
}

/** The runs of these numbers, oldest first, each once. @throws UserError naming every one that is not there, and those that are. */
export async function runsByIds(db: Database, ids: readonly number[]): Promise<readonly RunEntry[]> {
  const runs = await listRuns(db);
  const kept = runs.map(({ run }) => run);
  if (kept.length === 0 && (await deletedRuns(db)).size === 0) throw new UserError(NO_RUNS, { file: db.file });
  const missing = [...new Set(ids)].filter((id) => !kept.includes(id));
  if (missing.length > 0) {
    const deleted = await deletedRuns(db);
    throw UserError.of(
      missing.map((id) => ({ place: { file: db.file }, message: missingRun(id, deleted.get(id), kept) })),
    );
  }
  return runs.filter(({ run }) => ids.includes(run));
}

function missingRun(id: number, deleted: string | undefined, kept: readonly number[]): string {
  const what =
    deleted === undefined
      ? `there is no run ${String(id)}`
      : `run ${String(id)} was deleted on ${deleted.slice(0, 10)}`;
  return `${what}; kept: ${kept.length === 0 ? 'none' : spans(kept)}`;
}

/** "1, 3, 5 to 9". */
function spans(numbers: readonly number[]): string {
  const parts: [number, number][] = [];
  for (const number of numbers) {
    const last = parts.at(-1);
    if (last?.[1] === number - 1) last[1] = number;
    else parts.push([number, number]);
  }
  return parts.map(([from, to]) => (from === to ? String(from) : `${String(from)} to ${String(to)}`)).join(', ');
}

/** When each deleted run was deleted, ISO 8601, by its number. */
async function deletedRuns(db: Database): Promise<ReadonlyMap<number, string>> {
  if ((await db.value("SELECT count(*) FROM information_schema.tables WHERE table_name = 'run_deleted'")) === 0)
    return new Map();
  const rows = await db.rows<{ run_id: number; deleted: string }>('SELECT run_id, deleted FROM run_deleted');
  return new Map(rows.map(({ run_id, deleted }) => [run_id, deleted]));
}

/** Puts `note` in the place of the run's note; empty text leaves it without. @returns the run as it was before. @throws UserError for an unknown run. */
export async function writeNote(db: Database, id: number, note: string): Promise<RunEntry> {
  const before = await runById(db, id);
  await db.run('UPDATE run SET note = ? WHERE run_id = ?', [note, id]);
  return before;
}

/** What studies stand on: files of the owner that nothing we write may take the place of. */
import { readFileSync, readdirSync, realpathSync, statSync } from 'node:fs';
import { basename, dirname, join, resolve } from 'node:path';
import { UserError } from '../errors.js';
import type { Place } from '../errors.js';
import { databasePath } from '../screening/screen.js';
import { loadStudyAlone, studyFromText } from '../study/load.js';
import type { LoadedStudy } from '../study/load.js';

/** One file that something stands on. */
export interface Rest {
  /** As it is named, relative to the current folder or whole. */
  readonly path: string;
  /** As the study writes it. */
  readonly name: string;
  /** What it is, after "over": `the inventory of study.yaml`. */
  readonly what: string;
  /** The key that names it; null for the study file and its database. */
  readonly place: Place | null;
}

/** The file of a study itself, its database, and every file that it names. */
export function restsOf(loaded: LoadedStudy): readonly Rest[] {
  const { file, folder, placeOf } = loaded;
  // the text, as a study that was loaded with its tables no longer says where they stood
  const { study } = studyFromText(loaded.text, file);
  const { inventory, neighbours, system_prior, hazard, code_history } = study;
  const named = [
    { key: ['inventory', 'file'], name: inventory.file, kind: 'the inventory' },
    { key: ['neighbours', 'file'], name: neighbours?.file, kind: 'the table of neighbours' },
    { key: ['system_prior'], name: system_prior, kind: 'the table of system chances' },
    {
      key: ['code_history', 'table_file'],
      name: 'table_file' in code_history ? code_history.table_file : undefined,
      kind: 'the table of eras',
    },
    ...Object.entries(hazard.spectra).map(([name, entry]) => ({
      key: ['hazard', 'spectra', name, 'file'],
      name: typeof entry['file'] === 'string' ? entry['file'] : undefined,
      kind: `the table of spectrum ${name}`,
    })),
  ];
  return [
    ...ownFiles(loaded),
    ...named.flatMap(({ key, name, kind }) =>
      name === undefined
        ? []
        : [{ path: resolve(folder, name), name, what: `${kind} of ${basename(file)}`, place: placeOf(key) }],
    ),
  ];
}

function ownFiles(loaded: Pick<LoadedStudy, 'file' | 'folder'>): readonly Rest[] {
  const database = databasePath(loaded);
  const own = (path: string, what: string): Rest => ({ path, name: basename(path), what, place: null });
  return [
    own(loaded.file, 'the study file'),
    own(database, 'the database of the runs and answers'),
    own(`${database}.wal`, 'a part of the database of the runs and answers'),
  ];
}

/** The files that the studies in `folder` stand on; files that are no studies are passed over. */
async function restsIn(folder: string): Promise<readonly Rest[]> {
  let names: readonly string[];
  try {
    names = readdirSync(folder).filter((name) => /\.ya?ml$/i.test(name));
  } catch {
    return [];
  }
  const found: Rest[] = [];
  for (const name of names) {
    const file = join(folder, name);
    try {
      found.push(...restsOf(await loadStudyAlone(file)));
    } catch (error) {
      if (!(error instanceof UserError)) throw error;
      if (looksLikeStudy(file)) found.push(...ownFiles({ file, folder }));
    }
  }
  return found;
}

/** A study that has a fault for now is a study file all the same. */
function looksLikeStudy(file: string): boolean {
  try {
    return /^(?:inventory|hazard|code_history)\s*:/m.test(readFileSync(file, 'utf8'));
  } catch {
    return false;
  }
}

/** What must stay of files in `folder`: those of the study `loaded`, and those of other studies that lie there. */
export async function restsAround(loaded: LoadedStudy | null, folder: string): Promise<readonly Rest[]> {
  return [...(loaded === null ? [] : restsOf(loaded)), ...(await restsIn(folder))];
}

/** Which of `rests` stands at `target`, or null. Links, `./` and spellings that the file system takes for one do not hide it. */
export function restAt(target: string, rests: readonly Rest[]): Rest | null {
  const spots = spotsOf(target);
  return rests.find(({ path }) => spotsOf(path).some((spot) => spots.includes(spot))) ?? null;
}

/** Marks by which two paths are known to mean one file: where the name itself stands, where it leads, and the file there. */
function spotsOf(path: string): readonly string[] {
  const whole = resolve(path);
  const spots = [`name ${join(real(dirname(whole)), basename(whole))}`];
  try {
    spots.push(`name ${realpathSync(whole)}`);
    const { dev, ino } = statSync(whole, { bigint: true });
    spots.push(`file ${String(dev)} ${String(ino)}`);
  } catch {
    // not there yet
  }
  return spots;
}

/** The real path of a folder, as far as it is there. */
function real(folder: string): string {
  try {
    return realpathSync(folder);
  } catch {
    const above = dirname(folder);
    return above === folder ? folder : join(real(above), basename(folder));
  }
}

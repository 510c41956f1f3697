import { dirname } from 'node:path';
import { UserError } from '../errors.js';
import type { Place, Problem } from '../errors.js';
import { crossCheck } from './checks.js';
import type { HazardGrids } from '../engineering/spectrum/grid.js';
import { readDocument } from './document.js';
import type { KeyPath } from './document.js';
import { dotted, findingsOf } from './problems.js';
import { readText } from './read-text.js';
import { StudySchema } from './schema.js';
import type { Study } from './schema.js';
import { withHazardGrids } from './hazard-grids.js';
import type { GridReading } from './hazard-grids.js';
import { withTableFiles } from './table-files.js';

/** A study with the file it comes from. */
export interface LoadedStudy {
  readonly study: Study;
  /** Grids of hazard that it names, by fingerprint. */
  readonly grids: HazardGrids;
  /** Path as it was given. */
  readonly file: string;
  /** Folder against which the paths in the study are resolved. */
  readonly folder: string;
  /** The file's text, without byte order mark. */
  readonly text: string;
  /** Where a key stands, for messages about what it names; for a key that is not there, where its parent stands. */
  readonly placeOf: (path: KeyPath) => Place;
}

/**
 * Reads and checks a study file, and the tables (`table-file` becomes `table`) and grids of spectra that it names.
 * @throws UserError carrying every problem, in the order of the file, each with line, column and key.
 */
export async function loadStudy(path: string): Promise<LoadedStudy> {
  return withFiles(await loadStudyAlone(path));
}

/** Reads and checks a study file without the files it names. @throws UserError as `loadStudy`. */
export async function loadStudyAlone(path: string): Promise<LoadedStudy> {
  return studyFromText(await readText(path, 'a study file, for instance study.yaml'), path);
}

/** `loaded` with the tables and grids of spectra that it names. @throws UserError naming file and line. */
export async function withFiles(loaded: LoadedStudy, reading: GridReading = {}): Promise<LoadedStudy> {
  const study = await withTableFiles(loaded.study, loaded.folder);
  return { ...loaded, ...(await withHazardGrids(study, loaded.folder, reading)) };
}

/** Checks the text of a study file without reading the files it names; `file` stands in messages, and its folder is the one paths are relative to. @throws UserError as `loadStudy`. */
export function studyFromText(text: string, file = 'study.yaml'): LoadedStudy {
  const body = text.replace(/^\ufeff/u, '');
  const { value, errors, usable, offsetOf, positionAt } = readDocument(body);
  const found: { offset: number; problem: Problem }[] = errors.map(({ offset, message }) => {
    return { offset, problem: { place: { file, ...positionAt(offset) }, message } };
  });
  const result = usable ? StudySchema.safeParse(value) : undefined;
  if (result !== undefined) {
    for (const { path, message, atKey } of [...findingsOf(result.error?.issues ?? []), ...crossCheck(value)]) {
      const offset = offsetOf(path, atKey === true ? 'key' : 'value');
      found.push({ offset, problem: { place: { file, ...positionAt(offset), key: dotted(path) }, message } });
    }
  }
  if (found.length > 0 || !result?.success) {
    // Stable: problems of one place keep the order in which the schema names its keys.
    throw UserError.of(found.sort((a, b) => a.offset - b.offset).map(({ problem }) => problem));
  }
  const placeOf = (path: KeyPath): Place => ({ file, ...positionAt(offsetOf(path)), key: dotted(path) });
  return { study: result.data, grids: new Map(), file, folder: dirname(file), text: body, placeOf };
}

/** Deleting runs of a study file: what goes, and which reports stay on the disk. */
import { existsSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { deleteRuns, planDeletion } from '../runs/delete.js';
import type { Deletion } from '../runs/delete.js';
import { changeStudyDatabase, withStudyDatabase } from '../runs/open.js';
import type { LoadedStudy } from '../study/load.js';
import { REPORT_FILES } from './reports.js';

export interface StudyDeletion extends Deletion {
  /** Paths of the reports in the study's folder of reports; they stay, whichever run they are of. */
  readonly reports: readonly string[];
}

/**
 * What deleting the runs `ids` of the study at `path` would take away; changes nothing.
 * @throws UserError for a study without runs, or when one of them is not there.
 * @example
 * const { inventories } = await planStudyDeletion('study.yaml', [1, 2]);
 */
export async function planStudyDeletion(path: string, ids: readonly number[]): Promise<StudyDeletion> {
  return withStudyDatabase(path, async (db, loaded) => ({
    ...(await planDeletion(db, ids)),
    reports: reportsOf(loaded),
  }));
}

/**
 * Deletes the runs `ids` of the study at `path` with their results, and the inventories that no other run uses, in one transaction. Their
 * numbers are not given again; reports on the disk stay.
 * @throws UserError for a study without runs, or when one of them is not there; then nothing is deleted.
 * @example
 * const { left } = await deleteStudyRuns('study.yaml', [1, 2]);
 */
export async function deleteStudyRuns(
  path: string,
  ids: readonly number[],
  when: Date = new Date(),
): Promise<StudyDeletion> {
  return changeStudyDatabase(path, async (db, loaded) => ({
    ...(await deleteRuns(db, ids, when)),
    reports: reportsOf(loaded),
  }));
}

function reportsOf({ folder, study }: LoadedStudy): readonly string[] {
  const output = resolve(folder, study.output);
  return REPORT_FILES.map((name) => join(output, name)).filter((path) => existsSync(path));
}

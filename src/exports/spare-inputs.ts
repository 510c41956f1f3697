/** Reports have fixed names: none may take the place of a table the study reads. */
import { existsSync, realpathSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { UserError } from '../errors.js';
import type { LoadedStudy } from '../study/load.js';
import { REPORT_FILES } from './reports.js';

/**
 * Refuses to write the reports of a study into `into` (as `prepareFolder` returned it) over one of its own tables.
 * @throws UserError naming the key of the study and the file.
 */
export function spareInputs({ study, folder, placeOf }: LoadedStudy, into: string): void {
  const inputs = [
    { path: ['inventory', 'file'], file: study.inventory.file },
    { path: ['neighbours', 'file'], file: study.neighbours?.file },
    { path: ['system_prior'], file: study.system_prior },
  ];
  for (const { path, file } of inputs) {
    if (file === undefined) continue;
    const whole = resolve(folder, file);
    if (!existsSync(whole)) continue;
    const real = realpathSync(whole);
    if (REPORT_FILES.some((name) => join(into, name) === real))
      throw new UserError(
        `the reports would be written over ${file}, which the study reads; name another folder with output or --output, or give the file another name`,
        placeOf(path),
      );
  }
}

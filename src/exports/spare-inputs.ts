/** Reports have fixed names: none may take the place of a file that a study stands on. */
import { join } from 'node:path';
import { UserError } from '../errors.js';
import type { LoadedStudy } from '../study/load.js';
import { restAt, restsAround } from './rests.js';

/**
 * Refuses to write the files `names` of a study into `into` (as `prepareFolder` returned it) over one that a study stands on.
 * @throws UserError naming the key of the study, the file and what it is.
 */
export async function spareInputs(loaded: LoadedStudy, into: string, names: readonly string[]): Promise<void> {
  const rests = await restsAround(loaded, into);
  for (const name of names) {
    const rest = restAt(join(into, name), rests);
    if (rest === null) continue;
    throw new UserError(
      `the reports would be written over ${rest.name}, ${rest.what}; name another folder with output or --output, or give the file another name`,
      rest.place ?? { file: rest.path },
    );
  }
}

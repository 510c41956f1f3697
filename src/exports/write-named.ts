/** One file under the name the user gave it. */
import { basename, dirname } from 'node:path';
import { UserError } from '../errors.js';
import { prepareFolder, writeSet } from './write-set.js';

/** Writes `text` to `path`, which stood after `option`, at once or not at all. @returns the path. @throws UserError when it cannot be written. */
export async function writeNamed(path: string, text: string, option: string): Promise<string> {
  try {
    const [written = path] = await writeSet(prepareFolder(dirname(path)), { [basename(path)]: text });
    return written;
  } catch (error) {
    if (!(error instanceof UserError)) throw error;
    const problems = error.problems.map(({ place, message }) => ({
      place,
      message: message.replace('--output', option),
    }));
    throw UserError.of(problems);
  }
}

/** One file under the name the user gave it. */
import { basename, dirname } from 'node:path';
import { UserError } from '../errors.js';
import type { LoadedStudy } from '../study/load.js';
import { spareAnswers } from './filled-sheet.js';
import { restAt, restsAround } from './rests.js';
import type { Rest } from './rests.js';
import { prepareFolder, writeSet } from './write-set.js';

export interface NamedFileAbout {
  /** The study that the command is about; null where it is about none. */
  readonly study: LoadedStudy | null;
  /** Other files that the command reads. */
  readonly reads?: readonly Rest[];
}

/** A file that an option names, found to be no file of the owner's: there is no other way to write one. */
export class NamedFile {
  readonly #path: string;
  readonly #option: string;

  private constructor(path: string, option: string) {
    this.#path = path;
    this.#option = option;
  }

  /**
   * The file at `path`, which stood after `option`; asked for before the work begins.
   * @throws UserError where a study stands on it, here or in its folder, or it is a sheet filled in whose answers are not on record.
   */
  static async claim(path: string, option: string, { study, reads = [] }: NamedFileAbout): Promise<NamedFile> {
    const rest = restAt(path, [...reads, ...(await restsAround(study, dirname(path)))]);
    if (rest !== null)
      throw new UserError(
        `${option} would be written over ${rest.what}${rest.place?.key === undefined ? '' : ` (${rest.place.key})`}; name another file`,
        { file: path },
      );
    await spareAnswers(path, option, study);
    return new NamedFile(path, option);
  }

  /** The same where the option may have been left out. */
  static async claimAny(path: string | undefined, option: string, about: NamedFileAbout): Promise<NamedFile | null> {
    return path === undefined ? null : NamedFile.claim(path, option, about);
  }

  /** Writes `text` at once or not at all. @returns the path. @throws UserError when it cannot be written. */
  async write(text: string): Promise<string> {
    try {
      const [written = this.#path] = await writeSet(prepareFolder(dirname(this.#path)), {
        [basename(this.#path)]: text,
      });
      return written;
    } catch (error) {
      if (!(error instanceof UserError)) throw error;
      const problems = error.problems.map(({ place, message }) => ({
        place,
        message: message.replace('--output', this.#option),
      }));
      throw UserError.of(problems);
    }
  }
}

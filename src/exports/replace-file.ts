/** A text file replaced at once: the new text under a temporary name beside it, then renamed. */
import { readFileSync, realpathSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { UserError } from '../errors.js';

/**
 * Puts `text` in place of the text of `file`, which was `before` when it was read; byte order mark and permissions stay.
 * @returns the path. @throws UserError when the file has changed since or cannot be written; then it is as it was.
 */
export function replaceFile(file: string, before: string, text: string): string {
  const real = realpathSync(file);
  const temporary = `${real}.swaymark-${String(process.pid)}.part`;
  try {
    const now = readFileSync(real, 'utf8');
    const mark = now.startsWith('\ufeff') ? '\ufeff' : '';
    if (now.slice(mark.length) !== before)
      throw new UserError('changed while the run was made; the run is kept, the file is left as it is', { file });
    writeFileSync(temporary, mark + text, { mode: statSync(real).mode });
    renameSync(temporary, real);
    return file;
  } catch (cause) {
    rmSync(temporary, { force: true });
    if (cause instanceof UserError || (cause as NodeJS.ErrnoException).code === undefined) throw cause;
    throw new UserError('cannot be written here; the run is kept, the file is left as it is', { file }, { cause });
  }
}

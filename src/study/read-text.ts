import { readFile } from 'node:fs/promises';
import { UserError } from '../errors.js';

const REASONS: Readonly<Record<string, string>> = {
  ENOENT: 'no such file',
  ENOTDIR: 'no such file',
  EISDIR: 'this is a folder',
  EACCES: 'this file may not be read',
};

/** The error for a file that cannot be opened, or undefined for a cause of another kind. */
export function unreadable(path: string, what: string, cause: unknown): UserError | undefined {
  const reason = REASONS[(cause as NodeJS.ErrnoException).code ?? ''];
  return reason === undefined
    ? undefined
    : new UserError(`${reason}; give the path of ${what}`, { file: path }, { cause });
}

/** The text of a small UTF-8 file without its byte order mark; `what` names it in messages. @throws UserError when it cannot be read. */
export async function readText(path: string, what: string): Promise<string> {
  let bytes: Buffer;
  try {
    bytes = await readFile(path);
  } catch (cause) {
    throw unreadable(path, what, cause) ?? cause;
  }
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch (cause) {
    throw new UserError('not UTF-8 text; save it as UTF-8', { file: path }, { cause });
  }
}

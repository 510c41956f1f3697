/** Files that appear together or not at all: each is written beside its place under a temporary name, then all are renamed. */
import { accessSync, constants, mkdirSync, readdirSync, realpathSync, renameSync, rmSync } from 'node:fs';
import { writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { allDone } from './all-done.js';
import { Bug, UserError } from '../errors.js';

/** Text to write, or a function that writes to the path it is given; one that resolves to false has nothing to write. */
export type FileSource = string | ((path: string) => Promise<unknown>);

const TEMPORARY = /^\.swaymark-(\d+)-.*\.part$/;

const REASONS: Readonly<Record<string, string>> = {
  EACCES: 'no permission to write here',
  EPERM: 'no permission to write here',
  EROFS: 'this place is read-only',
  ENOSPC: 'the disk is full; free some space and run again',
  EEXIST: 'a file of this name stands where a folder is needed',
  ENOTDIR: 'a file stands where a folder is needed',
};

function mended(error: unknown, file: string): unknown {
  const reason = REASONS[(error as NodeJS.ErrnoException).code ?? ''];
  return reason === undefined
    ? error
    : new UserError(`${reason}; name another folder with --output`, { file }, { cause: error });
}

/**
 * Makes `folder` if missing, checks that it can be written to and removes what a killed run left there.
 * @returns its real path. @throws UserError when it cannot be written to.
 */
export function prepareFolder(folder: string): string {
  try {
    mkdirSync(folder, { recursive: true });
    accessSync(folder, constants.W_OK);
    const real = realpathSync(folder);
    for (const name of readdirSync(real)) {
      const owner = Number(TEMPORARY.exec(name)?.[1] ?? NaN);
      if (!Number.isNaN(owner) && !isRunning(owner)) rmSync(join(real, name), { force: true });
    }
    return real;
  } catch (error) {
    throw mended(error, folder);
  }
}

// A process that is still there may be writing; its own file of this process is from an earlier set that failed.
function isRunning(pid: number): boolean {
  if (pid === process.pid) return false;
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return (error as NodeJS.ErrnoException).code === 'EPERM';
  }
}

/** Writes `files` into `folder`, all at once, (as `prepareFolder` returned it). @returns their paths. @throws UserError when the disk refuses; then none is replaced. */
export async function writeSet(
  folder: string,
  files: Readonly<Record<string, FileSource>>,
): Promise<readonly string[]> {
  const names = Object.keys(files);
  const temporary = (name: string): string => join(folder, `.swaymark-${String(process.pid)}-${name}.part`);
  try {
    for (const name of names)
      if (name.includes('/') || name.includes('\\')) throw new Bug(`writeSet: ${name} is not a file name`);
    const empty = new Set<string>();
    await allDone(
      Object.entries(files).map(async ([name, source]) => {
        if (typeof source === 'string') await writeFile(temporary(name), source);
        else if ((await source(temporary(name))) === false) empty.add(name);
      }),
    );
    const written = names.filter((name) => !empty.has(name));
    for (const name of written) renameSync(temporary(name), join(folder, name));
    return written.map((name) => join(folder, name));
  } catch (error) {
    for (const name of names) rmSync(temporary(name), { force: true });
    throw mended(error, folder);
  }
}

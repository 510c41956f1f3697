/** A table of an earlier run taken away, and no file of anyone else's. */
import { closeSync, lstatSync, openSync, readSync, rmSync } from 'node:fs';

/** Removes the file at `path` where it is there and begins with `begin`, as only ours do. */
export function removeOwn(path: string, begin: string): void {
  const wanted = Buffer.from(begin, 'utf8');
  const found = Buffer.alloc(wanted.length);
  let file: number;
  try {
    if (!lstatSync(path).isFile()) return;
    file = openSync(path, 'r');
  } catch {
    return;
  }
  try {
    readSync(file, found, 0, found.length, 0);
  } catch {
    return;
  } finally {
    closeSync(file);
  }
  if (found.equals(wanted)) rmSync(path, { force: true });
}

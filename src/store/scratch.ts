import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

let folder: string | undefined;

/**
 * A folder of this process alone, made on first use and removed at exit. Two processes that spill into one folder
 * overwrite each other's data without an error, so it is never shared.
 */
export function scratchFolder(): string {
  if (folder === undefined) {
    const made = mkdtempSync(join(tmpdir(), 'swaymark-'));
    process.once('exit', () => {
      rmSync(made, { recursive: true, force: true });
    });
    folder = made;
  }
  return folder;
}

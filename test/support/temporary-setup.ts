/** One folder for what the tests of a run lay down, removed when all have ended. */
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

let root: string | undefined;

export function setup(): void {
  root = mkdtempSync(join(tmpdir(), 'swaymark-tests-'));
  process.env['SWAYMARK_TEST_ROOT'] = root;
}

export function teardown(): void {
  if (root !== undefined) rmSync(root, { recursive: true, force: true });
}

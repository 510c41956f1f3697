/** One folder for what the tests of a run lay down, removed when all have ended. */
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

export default function setup(): () => void {
  const root = mkdtempSync(join(tmpdir(), 'swaymark-tests-'));
  process.env['SWAYMARK_TEST_ROOT'] = root;
  return () => {
    rmSync(root, { recursive: true, force: true });
  };
}

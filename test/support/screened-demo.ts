/** The demo as screening leaves it: made once for all tests of a run, copied for each. */
import { cpSync, existsSync, mkdirSync, mkdtempSync, renameSync, rmdirSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { setTimeout } from 'node:timers/promises';
import { screenStudy } from '../../src/exports/screen-study.js';
import { MADE, demoCopy } from './study-folder.js';
import { testRoot } from './test-root.js';

/** Path of study.yaml in `folder`, one of its own when left out, with study.duckdb (run 1, made at MADE, with its outlook) and reports. */
export async function screenedDemo(folder = mkdtempSync(join(testRoot(), 'screened-'))): Promise<string> {
  cpSync(await screenedOnce(), folder, { recursive: true });
  return join(folder, 'study.yaml');
}

// Test files run in processes of their own: the first takes the lock, the others wait for what it makes.
async function screenedOnce(): Promise<string> {
  const made = join(testRoot(), 'demo-screened');
  const lock = join(testRoot(), 'demo-screened.lock');
  for (;;) {
    if (existsSync(made)) return made;
    if (taken(lock)) break;
    await setTimeout(100);
  }
  try {
    if (!existsSync(made)) {
      const path = demoCopy();
      await screenStudy(path, { made: MADE });
      renameSync(dirname(path), made);
    }
  } finally {
    rmdirSync(lock);
  }
  return made;
}

function taken(lock: string): boolean {
  try {
    mkdirSync(lock);
    return true;
  } catch {
    return false;
  }
}

/** A copy of the demo in a folder of its own, removed when all tests have ended. */
import { cpSync, mkdtempSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { testRoot } from './test-root.js';

/** Path of the copy's study.yaml; `change` may rewrite the inventory's text or the study's. */
export function demoCopy(
  change: { inventory?: (text: string) => string; study?: (text: string) => string } = {},
): string {
  const folder = mkdtempSync(join(testRoot(), 'study-'));
  for (const name of ['inventory.csv', 'neighbours.csv', 'system-prior.csv', 'study.yaml']) {
    cpSync(join('data-demo', name), join(folder, name));
  }
  const rewrite = (name: string, f: ((text: string) => string) | undefined): void => {
    if (f === undefined) return;
    const path = join(folder, name);
    writeFileSync(path, f(readFileSync(path, 'utf8')));
  };
  rewrite('inventory.csv', change.inventory);
  rewrite('study.yaml', (text) => {
    const own = text.replace('output: ../reports', 'output: reports');
    return change.study === undefined ? own : change.study(own);
  });
  return join(folder, 'study.yaml');
}

export const MADE = new Date('2026-06-11T09:00:00Z');

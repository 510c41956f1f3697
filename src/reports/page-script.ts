/** The built client of the dashboard page. */
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { Bug } from '../errors.js';

/** Text of dist/browser/page.js, made by the build. @throws Bug when the build has not run. */
export function readPageScript(): string {
  // From dist/reports beside it; from src/reports (tests) over in dist.
  for (const place of ['../browser/page.js', '../../dist/browser/page.js']) {
    try {
      return readFileSync(fileURLToPath(new URL(place, import.meta.url)), 'utf8');
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code !== 'ENOENT') throw error;
    }
  }
  throw new Bug('the page script is missing from dist/browser: run the build first');
}

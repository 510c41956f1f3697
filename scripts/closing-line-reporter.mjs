// @ts-check
// A vitest reporter that ends a run with the plain line `N passed, N failed`.
import { writeFileSync } from 'node:fs';

/**
 * Counts tests; a file that fails to load and an error outside any test count as one failure each.
 * With SWAYMARK_COUNTS_FILE set, the counts go there as JSON and the caller prints the line.
 */
export default class ClosingLineReporter {
  /**
   * @param {readonly import('vitest/node').TestModule[]} modules
   * @param {readonly unknown[]} unhandledErrors
   */
  onTestRunEnd(modules, unhandledErrors) {
    let passed = 0;
    let failed = unhandledErrors.length;
    for (const module of modules) {
      // Errors of the file or of a suite (an import, a beforeAll) belong to no single test.
      failed += module.errors().length;
      for (const suite of module.children.allSuites()) failed += suite.errors().length;
      for (const test of module.children.allTests()) {
        const { state } = test.result();
        if (state === 'passed') passed += 1;
        if (state === 'failed') failed += 1;
      }
    }
    const countsFile = process.env['SWAYMARK_COUNTS_FILE'];
    if (countsFile === undefined) console.log(`${passed} passed, ${failed} failed`);
    else writeFileSync(countsFile, JSON.stringify({ passed, failed }));
  }
}

import type { TestProject } from 'vitest/node';
import { findChromium } from '../../scripts/chromium.mjs';

declare module 'vitest' {
  interface ProvidedContext {
    /** Absolute path of the Chromium that page tests drive: `inject('chromiumPath')`. */
    chromiumPath: string;
  }
}

/** Gives every page test the browser's path; stops the project with one clear line when there is none. */
export function setup(project: TestProject): void {
  project.provide('chromiumPath', findChromium());
}

/** Program and version, as stored with every run. Kept equal to package.json by a test. */
export const VERSION = '0.1.0';
export const PROGRAM = `swaymark ${VERSION}`;

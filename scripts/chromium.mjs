// @ts-check
// Finds the Chromium that the page tests drive, installing the distribution's package where that is possible.
import { spawnSync } from 'node:child_process';
import { accessSync, constants, statSync } from 'node:fs';
import { delimiter, join, resolve } from 'node:path';
import { pathToFileURL } from 'node:url';

const PATH_NAMES = ['chromium', 'chromium-browser', 'google-chrome'];
const MAC_APPS = [
  '/Applications/Chromium.app/Contents/MacOS/Chromium',
  '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
];

/** @param {string} path */
function isExecutable(path) {
  try {
    accessSync(path, constants.X_OK);
    return statSync(path).isFile();
  } catch {
    return false;
  }
}

/** @returns {string | undefined} */
function installedChromium() {
  const folders = (process.env['PATH'] ?? '').split(delimiter).filter((folder) => folder !== '');
  const onPath = PATH_NAMES.flatMap((name) => folders.map((folder) => join(folder, name)));
  return [...onPath, ...(process.platform === 'darwin' ? MAC_APPS : [])].find(isExecutable);
}

/** @param {string[]} args */
function aptGet(...args) {
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  const run = spawnSync('apt-get', args, { stdio: 'ignore', env, timeout: 300_000 });
  return run.status === 0;
}

/**
 * The absolute path of a Chromium: CHROMIUM_PATH, then PATH, then macOS apps, then (as root) the Debian package.
 * @returns {string}
 * @throws Error with one line saying what to do.
 */
export function findChromium() {
  const named = process.env['CHROMIUM_PATH'];
  if (named !== undefined && named !== '') {
    if (isExecutable(named)) return resolve(named);
    throw new Error(`CHROMIUM_PATH: no executable file at "${named}"; point it at a Chromium or unset it`);
  }
  const found = installedChromium();
  if (found !== undefined) return found;

  if (process.getuid?.() === 0 && aptGet('--version')) {
    const install = ['install', '-y', '--no-install-recommends', 'chromium'];
    // The package lists may be missing or old: refresh them only when the first try fails.
    if (aptGet(...install) || (aptGet('update') && aptGet(...install))) {
      const installed = installedChromium();
      if (installed !== undefined) return installed;
    }
  }
  throw new Error('Chromium not found: install it (Debian: apt-get install chromium) or set CHROMIUM_PATH to it');
}

if (process.argv[1] !== undefined && import.meta.url === pathToFileURL(process.argv[1]).href) {
  try {
    console.log(findChromium());
  } catch (error) {
    console.error(error instanceof Error ? error.message : String(error));
    process.exitCode = 1;
  }
}

// @ts-check
// Builds dist: library and command with tsc; with esbuild the page client as one script, and the command in a few parts.
// With --if-stale it returns at once when nothing it builds from is newer than the last build. With --js esbuild takes the types off instead of
// tsc: no declarations, and a tenth of the wait, for who only wants to run it.
import { spawnSync } from 'node:child_process';
import { chmodSync, existsSync, readdirSync, rmSync, statSync, utimesSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const root = dirname(dirname(fileURLToPath(import.meta.url)));
const src = join(root, 'src');
const dist = join(root, 'dist');
const stamp = join(dist, '.stamp');

/** @param {string} folder */
function everythingUnder(folder) {
  return readdirSync(folder, { recursive: true, encoding: 'utf8' });
}

function isStale() {
  if (!existsSync(stamp)) return true;
  if (!process.argv.includes('--js') && !existsSync(join(dist, 'index.d.ts'))) return true;
  const built = statSync(stamp).mtimeMs;
  const settings = ['tsconfig.json', 'tsconfig.build.json', 'package-lock.json', 'scripts/build.mjs'];
  // Folders are looked at too: removing a file touches only its folder.
  const inputs = [src, ...everythingUnder(src).map((name) => join(src, name)), ...settings.map((n) => join(root, n))];
  return inputs.some((path) => existsSync(path) && statSync(path).mtimeMs > built);
}

// Files whose source has gone are removed one by one, so that a command running from dist is not pulled from under.
function removeOrphans() {
  for (const name of everythingUnder(dist)) {
    const source = name.replace(/(\.d\.ts|\.js)$/, '.ts');
    if (source === name || name === join('browser', 'page.js')) continue;
    if (!existsSync(join(src, source))) rmSync(join(dist, name));
  }
}

/** Library and command with their declarations. @returns whether it could. */
function compile() {
  const tsc = createRequire(import.meta.url).resolve('typescript/bin/tsc');
  // On the way to a run types are taken as checked (npm test checks them), which halves the wait; a build for its own sake checks.
  const unchecked = process.argv.includes('--if-stale') ? ['--noCheck'] : [];
  const compiled = spawnSync(process.execPath, [tsc, '-p', join(root, 'tsconfig.build.json'), ...unchecked], {
    stdio: 'inherit',
  });
  return compiled.status === 0;
}

/** Library and command file by file, without declarations. */
async function transpile() {
  const files = everythingUnder(src).filter(
    (name) => name.endsWith('.ts') && !name.endsWith('.d.ts') && !name.startsWith('browser'),
  );
  await build({
    entryPoints: files.map((name) => join(src, name)),
    outbase: src,
    outdir: dist,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    charset: 'utf8',
    logLevel: 'warning',
  });
  // those of an earlier build are of other sources: the next build that is asked for them makes them
  rmSync(join(dist, 'index.d.ts'), { force: true });
}

async function main() {
  if (process.argv.includes('--if-stale') && !isStale()) return;
  const started = new Date();

  if (process.argv.includes('--js')) await transpile();
  else if (!compile()) {
    process.exitCode = 1;
    return;
  }
  const page = join(src, 'browser', 'main.ts');
  if (existsSync(page)) {
    await build({
      entryPoints: [page],
      outfile: join(dist, 'browser', 'page.js'),
      bundle: true,
      minify: true,
      format: 'iife',
      target: 'es2022',
      charset: 'utf8',
      legalComments: 'none',
      logLevel: 'warning',
    });
  }

  removeOrphans();
  const command = join(dist, 'cli', 'main.js');
  if (existsSync(command)) {
    // A few hundred small modules take a third of a second to load one by one. The parts stand where files beside them are looked for
    // from: `./assess-worker.js` and `../browser/page.js`.
    await build({
      entryPoints: { 'cli/main': command },
      outdir: dist,
      allowOverwrite: true,
      bundle: true,
      splitting: true,
      chunkNames: 'screening/part-[hash]',
      platform: 'node',
      format: 'esm',
      target: 'node20',
      packages: 'external',
      charset: 'utf8',
      legalComments: 'none',
      logLevel: 'warning',
    });
    chmodSync(command, 0o755);
  }
  // The stamp carries the time the build began: a file saved while it ran is built next time.
  writeFileSync(stamp, `${started.toISOString()}\n`);
  utimesSync(stamp, started, started);
}

await main();

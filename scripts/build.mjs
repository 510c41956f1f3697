// @ts-check
// Builds dist: library and command with tsc; with esbuild the page client as one script, and the command in a few parts.
// With --if-stale it returns at once when nothing it builds from is newer than the last build. With --js esbuild takes the types off instead of
// tsc: no declarations, and a tenth of the wait, for who only wants to run it.
import { spawnSync } from 'node:child_process';
import { chmodSync, existsSync, readFileSync, readdirSync, rmSync, statSync, utimesSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const root = dirname(dirname(fileURLToPath(import.meta.url)));
const src = join(root, 'src');
const dist = join(root, 'dist');
const stamp = join(dist, '.stamp');
/** What the command loads from its package: a binary, and what only writing pages and pictures needs. */
const NOT_BUNDLED = ['@duckdb/node-bindings', 'vega', 'vega-lite', 'vega-interpreter'];

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

/** The licence of a package: a file of its own, or the last part of what is to be read first. @param {string} folder */
function licenceOf(folder) {
  const files = readdirSync(join(root, folder));
  const own = files.find((name) => /^licen[cs]e/i.test(name));
  const text = readFileSync(
    join(root, folder, own ?? files.find((name) => /^readme/i.test(name)) ?? 'package.json'),
    'utf8',
  );
  const from = own === undefined ? text.search(/^#+ licen[cs]e/im) : 0;
  if (from < 0) throw new Error(`${folder} has no licence beside it`);
  return text.slice(from).trim();
}

/** Those of the packages that went into the command, beside it. @param {string[]} inputs */
function writeLicences(inputs) {
  const packages = new Set(inputs.flatMap((path) => path.match(/^.*node_modules\/(?:@[^/]+\/)?[^/]+/)?.[0] ?? []));
  const texts = [...packages]
    .sort()
    .map((folder) => `${folder.slice(folder.lastIndexOf('node_modules/') + 13)}\n\n${licenceOf(folder)}\n`);
  writeFileSync(join(dist, 'cli', 'LICENCES.txt'), texts.join('\n----\n\n'));
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
    // A few hundred small modules take a third of a second to load one by one, those of the packages as much again. The parts stand where files beside them are looked for
    // from: `./assess-worker.js` and `../browser/page.js`.
    const { metafile } = await build({
      entryPoints: { 'cli/main': command },
      outdir: dist,
      allowOverwrite: true,
      bundle: true,
      splitting: true,
      chunkNames: 'screening/part-[hash]',
      platform: 'node',
      format: 'esm',
      target: 'node20',
      external: NOT_BUNDLED,
      // what is required at run time inside a package written for the older kind of modules
      banner: {
        js: "import { createRequire as requireFrom } from 'node:module'; const require = requireFrom(import.meta.url);",
      },
      metafile: true,
      charset: 'utf8',
      legalComments: 'none',
      logLevel: 'warning',
    });
    chmodSync(command, 0o755);
    writeLicences(Object.keys(metafile.inputs));
  }
  // The stamp carries the time the build began: a file saved while it ran is built next time.
  writeFileSync(stamp, `${started.toISOString()}\n`);
  utimesSync(stamp, started, started);
}

await main();

// @ts-check
// node scripts/run-source.mjs <file.ts> [arguments …]: bundles a TypeScript file that imports the sources, and runs it.
import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, symlinkSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const root = dirname(dirname(fileURLToPath(import.meta.url)));
const [entry = '', ...rest] = process.argv.slice(2);
const folder = mkdtempSync(join(tmpdir(), 'swaymark-source-'));
try {
  // what is left out of the bundle is found beside it
  symlinkSync(join(root, 'node_modules'), join(folder, 'node_modules'), 'junction');
  const bundle = join(folder, 'main.mjs');
  await build({
    entryPoints: [join(root, entry)],
    outfile: bundle,
    bundle: true,
    platform: 'node',
    format: 'esm',
    packages: 'external',
    logLevel: 'warning',
  });
  const run = spawnSync(process.execPath, [bundle, ...rest], { cwd: root, stdio: 'inherit' });
  process.exitCode = run.status ?? 1;
} finally {
  rmSync(folder, { recursive: true, force: true });
}

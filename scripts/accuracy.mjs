// @ts-check
// Bundles test/accuracy/main.ts (TypeScript that imports the sources) and runs it: errors of every method, into docs/accuracy.md.
import { spawnSync } from 'node:child_process';
import { rmSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const root = dirname(dirname(fileURLToPath(import.meta.url)));
// Beside the packages, so that what is left out of the bundle is found.
const bundle = join(root, 'node_modules', '.swaymark-accuracy.mjs');
try {
  await build({
    entryPoints: [join(root, 'test', 'accuracy', 'main.ts')],
    outfile: bundle,
    bundle: true,
    platform: 'node',
    format: 'esm',
    packages: 'external',
    logLevel: 'warning',
  });
  const run = spawnSync(process.execPath, [bundle, join(root, 'docs', 'accuracy.md')], { cwd: root, stdio: 'inherit' });
  process.exitCode = run.status ?? 1;
} finally {
  rmSync(bundle, { force: true });
}

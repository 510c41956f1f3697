// @ts-check
// The whole check, in order: build, static checks, Chromium, tests. A failed step does not stop the others.
// Each step counts as one; the last line is the plain `N passed, N failed`.
import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { findChromium } from './chromium.mjs';

const root = dirname(dirname(fileURLToPath(import.meta.url)));
let passed = 0;
let failed = 0;

/** @param {string} name */
const bin = (name) => join(root, 'node_modules', '.bin', name);

/** @param {string} folder */
const hasTypeScript = (folder) =>
  existsSync(join(root, folder)) &&
  readdirSync(join(root, folder), { recursive: true, encoding: 'utf8' }).some((name) => name.endsWith('.ts'));

/**
 * @param {string} title
 * @param {() => { ok: boolean, output: string } | Promise<{ ok: boolean, output: string }>} run
 */
async function step(title, run) {
  const started = performance.now();
  const { ok, output } = await run();
  const seconds = ((performance.now() - started) / 1000).toFixed(1);
  console.log(`${ok ? 'ok    ' : 'FAILED'} ${title} ${seconds} s`);
  if (ok) {
    passed += 1;
  } else {
    failed += 1;
    console.log(output.trimEnd());
  }
  return ok;
}

/**
 * @param {string} title
 * @param {string} command
 * @param {string[]} args
 */
function check(title, command, ...args) {
  return step(title, () => {
    const child = spawn(command, args, { cwd: root });
    let output = '';
    for (const stream of [child.stdout, child.stderr])
      stream.setEncoding('utf8').on('data', (text) => (output += text));
    return new Promise((resolve) => {
      child.on('error', ({ message }) => resolve({ ok: false, output: message }));
      child.on('close', (code) => resolve({ ok: code === 0, output }));
    });
  });
}

await check('build', process.execPath, 'scripts/build.mjs', '--if-stale');
// The linter takes as long as all others together: they go beside it, and the tests after them too.
const lint = check('lint', bin('eslint'), '--max-warnings', '0', '.');
await check('format', bin('prettier'), '--check', '.', '--log-level', 'warn');
await check('types', bin('tsc'), '-p', 'tsconfig.json');
for (const folder of ['src/engineering', 'src/browser']) {
  if (hasTypeScript(folder)) await check(`types ${folder}`, bin('tsc'), '-p', folder);
}
await check('import floors', bin('depcruise'), '--config', '.dependency-cruiser.cjs', 'src');
await check('start-up imports', bin('depcruise'), '--config', '.dependency-cruiser-startup.cjs', 'src');
await check('unused code', bin('knip'), '--no-progress');
if (existsSync(join(root, 'src', 'cli', 'main.ts'))) await check('package', bin('publint'), '--strict');

let chromiumProblem = '';
const hasChromium = await step('Chromium', () => {
  try {
    process.env['CHROMIUM_PATH'] = findChromium();
    return { ok: true, output: '' };
  } catch (error) {
    chromiumProblem = error instanceof Error ? error.message : String(error);
    return { ok: false, output: chromiumProblem };
  }
});

const scratch = mkdtempSync(join(tmpdir(), 'swaymark-test-'));
const countsFile = join(scratch, 'counts.json');
// Without a browser the page tests cannot run; the rest still tells what it can.
const vitestArgs = [
  'run',
  ...(hasChromium ? [] : ['--project', 'unit', '--project', 'engineering']),
  ...process.argv.slice(2),
];
const vitest = spawn(bin('vitest'), vitestArgs, {
  cwd: root,
  // Both streams into one, so that nothing can follow the closing line.
  stdio: ['ignore', 1, 1],
  env: { ...process.env, SWAYMARK_COUNTS_FILE: countsFile },
});
const status = await new Promise((resolve) => {
  vitest.on('error', () => resolve(1));
  vitest.on('close', (code) => resolve(code ?? 1));
});

await lint;

const counts = existsSync(countsFile) ? JSON.parse(readFileSync(countsFile, 'utf8')) : { passed: 0, failed: 0 };
rmSync(scratch, { recursive: true, force: true });
passed += counts.passed;
failed += counts.failed;
// vitest that fails without a failed test (no test found, a crash) is a failure all the same.
if (status !== 0 && counts.failed === 0) failed += 1;
if (chromiumProblem !== '') console.log(chromiumProblem);
process.exitCode = failed === 0 ? 0 : 1;
console.log(`${passed} passed, ${failed} failed`);

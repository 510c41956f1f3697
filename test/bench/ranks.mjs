// npm run bench:ranks [-- rows]: ranks, chances, bands, tie groups and survey values of an assessed inventory, against DuckDB sorting the
// same buildings by priority; each in a process of its own, with one thread and with two, and every column compared bit for bit.
import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { screenStudy } from '../../dist/index.js';
import { PRIOR, STUDY, writeInventory } from './inventory.mjs';

const here = fileURLToPath(new URL('.', import.meta.url));
const rows = Number(process.argv[2] ?? 1_000_000);

function child(script, ...rest) {
  const { stdout, stderr, status } = spawnSync(process.execPath, ['--expose-gc', join(here, script), ...rest], {
    encoding: 'utf8',
    maxBuffer: 1 << 26,
  });
  if (status !== 0) throw new Error(`${script} failed (${status}): ${stderr}`);
  return JSON.parse(stdout.trim().split('\n').at(-1));
}

const folder = mkdtempSync(join(tmpdir(), 'swaymark-bench-'));
try {
  await writeInventory(join(folder, 'inventory.csv'), rows);
  writeFileSync(join(folder, 'study.yaml'), STUDY);
  writeFileSync(join(folder, 'system-prior.csv'), PRIOR);
  await screenStudy(join(folder, 'study.yaml'), { made: new Date('2026-06-11T00:00:00Z') });
  const threads = [1, 2];
  const floors = threads.map((count) => child('ranks-floor.mjs', folder, String(count)));
  const found = threads.map((count) => child('ranks-of.mjs', folder, String(count)));
  console.log(`${found[0].ranked} of ${rows} buildings ranked, a list of ${found[0].listSize}`);
  console.log(
    'threads  step                                     seconds   CPU s  of the sort, seconds  of the sort, CPU   peak MB',
  );
  found.forEach(({ steps }, i) => {
    const floor = floors[i];
    const line = (title, { seconds, cpu, peakMB }) =>
      console.log(
        `${String(threads[i]).padStart(7)}  ${title.padEnd(40)} ${seconds.toFixed(2).padStart(7)} ${cpu.toFixed(2).padStart(7)} ${(seconds / floor.seconds).toFixed(1).padStart(21)} ${(cpu / floor.cpu).toFixed(1).padStart(17)} ${peakMB.toFixed(0).padStart(9)}`,
      );
    line('DuckDB sorts by priority (best of five)', floor);
    for (const { title, ...figures } of steps) line(title, figures);
  });
  const [one, two] = found.map(({ digests }) => digests);
  const differ = Object.keys({ ...one, ...two }).filter((name) => one[name] !== two[name]);
  console.log(
    differ.length === 0
      ? `one thread and two give the same bits: ${Object.keys(one).join(', ')}`
      : `DIFFERENT with one thread and two: ${differ.join(', ')}`,
  );
  if (differ.length > 0) process.exitCode = 1;
} finally {
  rmSync(folder, { recursive: true, force: true });
}

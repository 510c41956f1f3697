// npm run bench [-- rows …]: the whole screening (all outputs) against the floor, in one run, each in a process of its own.
import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { PRIOR, STUDY, writeInventory } from './inventory.mjs';

const here = fileURLToPath(new URL('.', import.meta.url));
const sizes = process.argv
  .slice(2)
  .map(Number)
  .filter((rows) => rows > 0);

function child(script, folder) {
  const { stdout, stderr, status } = spawnSync(process.execPath, [join(here, script), folder], {
    encoding: 'utf8',
    maxBuffer: 1 << 26,
  });
  if (status !== 0) throw new Error(`${script} failed (${status}): ${stderr}`);
  return JSON.parse(stdout.trim().split('\n').at(-1));
}

console.log('rows        floor s  screening s  ratio  CPU s  floor MB  screening MB  threads');
for (const rows of sizes.length > 0 ? sizes : [10_000, 100_000, 1_000_000]) {
  const folder = mkdtempSync(join(tmpdir(), 'swaymark-bench-'));
  try {
    await writeInventory(join(folder, 'inventory.csv'), rows);
    writeFileSync(join(folder, 'study.yaml'), STUDY);
    writeFileSync(join(folder, 'system-prior.csv'), PRIOR);
    const floor = child('floor.mjs', folder);
    const screening = child('screening.mjs', folder);
    const ratio = screening.seconds / floor.seconds;
    console.log(
      `${String(rows).padEnd(10)}  ${floor.seconds.toFixed(2).padStart(7)}  ${screening.seconds.toFixed(2).padStart(11)}  ${ratio.toFixed(2).padStart(5)}  ${screening.cpuSeconds.toFixed(1).padStart(5)}  ${floor.peakMB.toFixed(0).padStart(8)}  ${screening.peakMB.toFixed(0).padStart(12)}  ${String(screening.threads).padStart(7)}`,
    );
    console.log(
      `            ${screening.steps.map(({ step, seconds }) => `${step} ${seconds.toFixed(2)}`).join(', ')}`,
    );
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

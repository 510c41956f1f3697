// npm run bench:refresh [-- rows …]: a refresh with its reports against the whole screening with its, and against reading the run's table
// again, which is the floor. The best of three refreshes; the screening is the first, with intake.
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { refreshStudy, screenStudy, withStudyDatabase } from '../../dist/index.js';
import { RESULT_COLUMNS } from '../../dist/engineering/results.js';
import { quoteName } from '../../dist/store/sql.js';
import { PRIOR, STUDY, writeInventory } from './inventory.mjs';

const sizes = process.argv
  .slice(2)
  .map(Number)
  .filter((rows) => rows > 0);
const made = new Date('2026-06-11T00:00:00Z');
const KINDS = { number: 'f64', whole: 'i32', text: 'text' };

/** Seconds of `work` on the clock and of all processors, which a busy machine disturbs less, and those of its steps. */
async function timed(work) {
  const steps = [];
  const before = process.cpuUsage();
  const started = process.hrtime.bigint();
  const since = () => Number(process.hrtime.bigint() - started) / 1e9;
  let current = { step: 'starting', from: 0 };
  const turn = (step) => {
    if (step === current.step) return;
    steps.push(`${current.step} ${(since() - current.from).toFixed(2)}`);
    current = { step, from: since() };
  };
  await work(({ step }) => turn(step));
  turn('end');
  const { user, system } = process.cpuUsage(before);
  return { seconds: since(), cpu: (user + system) / 1e6, steps };
}

/** The whole result of run `run` into arrays. */
async function readTable(study, run) {
  const spec = Object.fromEntries(RESULT_COLUMNS.map(({ name, kind }) => [name, KINDS[kind]]));
  await withStudyDatabase(study, (db) =>
    db.columns(`SELECT ${Object.keys(spec).map(quoteName).join(', ')} FROM result WHERE run_id = ?`, spec, [run]),
  );
}

for (const rows of sizes.length > 0 ? sizes : [20_000, 1_000_000]) {
  const folder = mkdtempSync(join(tmpdir(), 'swaymark-bench-'));
  try {
    await writeInventory(join(folder, 'inventory.csv'), rows);
    const study = join(folder, 'study.yaml');
    writeFileSync(study, STUDY);
    writeFileSync(join(folder, 'system-prior.csv'), PRIOR);
    const whole = await timed((onProgress) => screenStudy(study, { made, onProgress }));
    for (const name of ['inventory.csv', 'system-prior.csv']) rmSync(join(folder, name));
    const best = async (reports) => {
      let least = null;
      for (const sds_g of [0.9, 1, 1.1]) {
        const set = [{ path: 'hazard.spectra.c.sds_g', value: sds_g }];
        const run = await timed((onProgress) => refreshStudy(study, { made, set, reports, onProgress }));
        if (least === null || run.seconds < least.seconds) least = run;
      }
      return least;
    };
    const refreshed = await best(true);
    const bare = await best(false);
    const floor = await timed(() => readTable(study, 2));
    const ratio = (value, of) => (value / of).toFixed(2).padStart(6);
    const line = (what, { seconds, cpu, steps }) => {
      console.log(
        `  ${what.padEnd(34)} ${seconds.toFixed(2).padStart(7)} s ${ratio(seconds, whole.seconds)} of the screening ${ratio(seconds, floor.seconds)} of the floor; CPU ${cpu.toFixed(2)} s ${ratio(cpu, whole.cpu)} of the screening`,
      );
      if (steps.length > 1) console.log(`      ${steps.join(', ')}`);
    };
    console.log(`${rows} buildings`);
    line('whole screening with reports', whole);
    line('refresh with reports', refreshed);
    line('refresh without', bare);
    line("floor: the run's table read again", floor);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

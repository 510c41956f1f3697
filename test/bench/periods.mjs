// npm run bench:periods [-- rows]: the period step alone, as a share of the whole run. Half of the buildings carry a ten-storey chain in both
// directions; five estimates apply in each: three standards, the number of storeys, and the stiffness.
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { compileContext } from '../../dist/engineering/assess/context.js';
import { periodAt, periodModel } from '../../dist/engineering/assess/period.js';
import { buildingReader } from '../../dist/engineering/building-columns.js';
import { apply } from '../../dist/engineering/formula.js';
import { findMethod } from '../../dist/engineering/methods.js';
import { screenStudy, withStudyDatabase } from '../../dist/index.js';
import { indexRanges } from '../../dist/store/chunks.js';
import { readBuildings, readPools } from '../../dist/screening/read-buildings.js';
import { PRIOR, STUDY, writeInventory } from './inventory.mjs';

const rows = Number(process.argv[2] ?? 1_000_000);
const beside = [
  'asce7-22/period/concrete-moment-frame',
  'en1998-1-2004/period/concrete-moment-frame-or-eccentric-braced',
  'practice-taiwan/period/by-storeys',
].map(findMethod);
const folder = mkdtempSync(join(tmpdir(), 'swaymark-bench-'));
try {
  await writeInventory(join(folder, 'inventory.csv'), rows, { chains: true });
  const columns =
    '    storey_stiffness_longitudinal_kN_per_m: k_along\n    storey_stiffness_transverse_kN_per_m: k_across\n';
  const study = join(folder, 'study.yaml');
  writeFileSync(study, STUDY.replace('    occupants_peak: occupants\n', `    occupants_peak: occupants\n${columns}`));
  writeFileSync(join(folder, 'system-prior.csv'), PRIOR);

  const started = process.hrtime.bigint();
  const { data } = await screenStudy(study, { made: new Date('2026-06-11T00:00:00Z') });
  const whole = Number(process.hrtime.bigint() - started) / 1e9;

  await withStudyDatabase(study, async (db) => {
    const [{ inventory_id }] = await db.rows('SELECT inventory_id FROM run LIMIT 1');
    const pools = await readPools(db, inventory_id);
    const context = compileContext(data.settings);
    let counted = 0n;
    let all = 0n;
    let chains = 0;
    let sum = 0;
    for (const range of indexRanges(rows)) {
      const block = await readBuildings(db, inventory_id, range);
      const read = buildingReader(block.columns, pools);
      const buildings = Array.from({ length: block.rows }, (_, i) => read(i));
      const from = process.hrtime.bigint();
      for (const building of buildings) {
        const system = building.system ?? 'concrete-moment-frame';
        for (const direction of ['longitudinal', 'transverse']) {
          const model = periodModel(building, direction, system, context);
          sum += periodAt(model, building.height_m.value, context).period_s;
          if (model.routeId !== null) chains += 1;
        }
      }
      const between = process.hrtime.bigint();
      for (const building of buildings) {
        const inputs = { height_m: building.height_m.value, storeys: building.storeys.value };
        for (let direction = 0; direction < 2; direction += 1)
          for (const record of beside) sum += apply(record, inputs);
      }
      counted += between - from;
      all += process.hrtime.bigint() - from;
    }
    const seconds = (time) => Number(time) / 1e9;
    const line = (what, time) =>
      `${what.padEnd(44)} ${seconds(time).toFixed(2).padStart(8)} s  ${((100 * seconds(time)) / whole).toFixed(1).padStart(5)} %  ${((1e6 * seconds(time)) / rows).toFixed(2)} µs a building`;
    console.log(
      `${rows} buildings, ${chains / 2} of them with chains in both directions (checksum ${sum.toPrecision(6)})`,
    );
    console.log(`${'the whole run'.padEnd(44)} ${whole.toFixed(2).padStart(8)} s`);
    console.log(line('periods that count, combined', counted));
    console.log(line('five estimates a direction', all));
  });
} finally {
  rmSync(folder, { recursive: true, force: true });
}

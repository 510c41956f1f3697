// Ranks and survey values of the kept run's buildings with so many threads, in a process of its own.
// Prints {ranked, listSize, steps, digests}: figures of each step, and a digest of every column.
import { createHash } from 'node:crypto';
import { join } from 'node:path';
import { assessAll } from '../../dist/screening/assess-all.js';
import { startAssessor } from '../../dist/screening/assess-threads.js';
import { readRun } from '../../dist/screening/page-data.js';
import { rankInventory } from '../../dist/screening/rank-all.js';
import { readPools } from '../../dist/screening/read-buildings.js';
import { openStudyDatabase } from '../../dist/screening/screen.js';
import { planOn } from '../../dist/screening/survey.js';
import { visitsOf } from '../../dist/screening/survey-outlook.js';
import { edgeOf, mostWorth } from '../../dist/engineering/priority/survey-value.js';
import { loadStudy } from '../../dist/study/load.js';

const [, , folder, threads] = process.argv;
const steps = [];
async function timed(title, work) {
  globalThis.gc();
  const before = process.cpuUsage();
  const started = process.hrtime.bigint();
  const result = await work();
  const seconds = Number(process.hrtime.bigint() - started) / 1e9;
  const { user, system } = process.cpuUsage(before);
  steps.push({ title, seconds, cpu: (user + system) / 1e6, peakMB: process.resourceUsage().maxRSS / 1024 });
  return result;
}
const digest = (bytes) => createHash('sha256').update(bytes).digest('hex');
const bytesOf = ({ buffer, byteOffset, byteLength }) => new Uint8Array(buffer, byteOffset, byteLength);

const loaded = await loadStudy(join(folder, 'study.yaml'));
const { study, grids } = loaded;
const db = await openStudyDatabase(loaded, true);
const assessor = startAssessor(Number(threads));
try {
  const { settings, inventory_id: inventoryId, summary } = await readRun(db, 1);
  const { buildings: count, list_size: listSize } = summary;
  const pools = await readPools(db, inventoryId);
  assessor.begin(settings, pools, grids);
  const assessed = await timed('(before: read and assessed)', () =>
    assessAll(db, inventoryId, null, count, assessor, false, settings),
  );
  const { ranking, draws, columns } = await timed('ranks, chances, bands, tie groups', () =>
    rankInventory(assessed, count, listSize, study.seed, assessor),
  );
  const { mixtures } = assessed;
  const edge = edgeOf(ranking, assessed, listSize);
  const worth = await timed('survey value of every building at most', () =>
    Float64Array.from(mixtures, (mixture) => mostWorth(mixture, edge)),
  );
  const expectedWrong = ranking.expectedWrong;
  const basis = { runId: 1, inventoryId, settings, grids, pools, count, listSize, expectedWrong, assessed };
  basis.ranked = { ...ranking, mixtures, draws };
  const wish = { visits: visitsOf(study), limits: { hours: 40, money: Infinity } };
  const plan = await timed('plan of 40 h, its most promising weighed', () => planOn(db, basis, wish));
  const digests = { worth: digest(bytesOf(worth)), plan: digest(JSON.stringify(plan)) };
  for (const kind of ['numbers', 'wholes', 'words'])
    for (const [name, values] of Object.entries(columns[kind])) digests[name] = digest(bytesOf(values));
  process.stdout.write(JSON.stringify({ ranked: assessed.id.length, listSize, steps, digests }));
} finally {
  await assessor.close();
  db.close();
}

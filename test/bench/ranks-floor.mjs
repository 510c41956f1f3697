// The floor of the ranks: DuckDB sorts the buildings of the kept run by priority into a table, in memory. Prints {seconds, cpu, peakMB}.
import { DuckDBInstance } from '@duckdb/node-api';
import { join } from 'node:path';

const [, , folder, threads] = process.argv;
const instance = await DuckDBInstance.create(':memory:', { threads });
const connection = await instance.connect();
await connection.run(`ATTACH '${join(folder, 'study.duckdb')}' AS kept (READ_ONLY)`);
await connection.run(
  'CREATE TABLE t AS SELECT building_index, ln_priority FROM kept.result_assessed WHERE ln_priority IS NOT NULL',
);
let best = null;
for (let i = 0; i < 5; i += 1) {
  const before = process.cpuUsage();
  const started = process.hrtime.bigint();
  await connection.run('CREATE OR REPLACE TABLE s AS SELECT * FROM t ORDER BY ln_priority DESC, building_index');
  const seconds = Number(process.hrtime.bigint() - started) / 1e9;
  const { user, system } = process.cpuUsage(before);
  if (best === null || seconds < best.seconds) best = { seconds, cpu: (user + system) / 1e6 };
}
connection.closeSync();
instance.closeSync();
process.stdout.write(JSON.stringify({ ...best, peakMB: process.resourceUsage().maxRSS / 1024 }));

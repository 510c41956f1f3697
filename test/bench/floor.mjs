// The floor: the same DuckDB reads the same CSV into a table and writes it back sorted. Prints {seconds, peakMB}.
import { DuckDBInstance } from '@duckdb/node-api';
import { join } from 'node:path';

const folder = process.argv[2];
const started = process.hrtime.bigint();
const instance = await DuckDBInstance.create(join(folder, 'floor.duckdb'), { temp_directory: join(folder, 'tmp') });
const connection = await instance.connect();
await connection.run(
  `CREATE TABLE t AS SELECT * FROM read_csv('${join(folder, 'inventory.csv')}', all_varchar = true)`,
);
await connection.run(`COPY (SELECT * FROM t ORDER BY id) TO '${join(folder, 'floor.csv')}' (HEADER)`);
connection.closeSync();
instance.closeSync();
process.stdout.write(
  JSON.stringify({
    seconds: Number(process.hrtime.bigint() - started) / 1e9,
    peakMB: process.resourceUsage().maxRSS / 1024,
  }),
);

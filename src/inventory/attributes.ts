import type { Origin } from '../engineering/building.js';
import { COLUMNS } from '../engineering/columns.js';
import type { Database } from '../store/database.js';
import { EXTRA_COLUMNS, FILLED_ATTRIBUTES } from '../store/schema.js';
import { quoteName } from '../store/sql.js';
import type { Mapping } from './header.js';
import type { Inferred } from './infer.js';

/** Per attribute, how many buildings have it given, inferred, by default, or not at all. */
export type Attributes = Readonly<Record<string, Readonly<Record<Origin, number>>>>;

const WITH_ORIGIN = ['year_built', 'use', 'system'] as const;
const FROM_FOOTPRINT = new Set([
  'plan_length_m',
  'plan_width_m',
  'lon',
  'lat',
  'reentrant_projection',
  'reentrant_area_share',
  'footprint_area_m2',
]);

/** Counts where every attribute of the stored buildings comes from; what the study does not map and nothing fills is left out. */
export async function countAttributes(
  db: Database,
  number: number,
  mapping: Mapping,
  inferred: Inferred,
): Promise<Attributes> {
  const total = inferred.sizeless.length;
  const attributes: Record<string, Record<Origin, number>> = {};
  for (const name of FILLED_ATTRIBUTES) {
    const counts = { given: 0, inferred: 0, default: 0, unknown: 0 };
    const perFill = new Float64Array(inferred.fills.length);
    const { fill: fills } = inferred[name];
    for (let at = 0; at < fills.length; at += 1) perFill[fills[at]!]! += 1;
    inferred.fills.forEach(({ origin }, fill) => {
      counts[origin] += perFill[fill] ?? 0;
    });
    attributes[name] = counts;
  }
  for (const name of WITH_ORIGIN) {
    const counts = { given: 0, inferred: 0, default: 0, unknown: 0 };
    const rows = await db.rows<{ origin: Origin; n: number }>(
      `SELECT ${name}_origin AS origin, count(*) AS n FROM building_core WHERE inventory_number = ? GROUP BY 1`,
      [number],
    );
    for (const { origin, n } of rows) counts[origin] = n;
    attributes[name] = counts;
  }
  const mapped = new Set(mapping.columns.map(({ column }) => column.name));
  const extra = new Set(EXTRA_COLUMNS.map(({ name }) => name));
  for (const inExtra of [false, true]) {
    const names = COLUMNS.map(({ name }) => name).filter(
      (name) =>
        name !== 'id' &&
        attributes[name] === undefined &&
        extra.has(name) === inExtra &&
        (mapped.has(name) || FROM_FOOTPRINT.has(name)),
    );
    if (names.length === 0) continue;
    const [row = {}] = await db.rows<Record<string, number>>(
      `SELECT ${names.map((name) => `count(${quoteName(name)}) AS ${quoteName(name)}`).join(', ')}
       FROM ${inExtra ? 'building_extra' : 'building_core'} WHERE inventory_number = ?`,
      [number],
    );
    for (const name of names) {
      const known = row[name] ?? 0;
      if (!mapped.has(name) && known === 0) continue;
      const [given, found] = mapped.has(name) ? [known, 0] : [0, known];
      attributes[name] = { given, inferred: found, default: 0, unknown: total - known };
    }
  }
  return Object.fromEntries(
    COLUMNS.flatMap(({ name }) => (attributes[name] === undefined ? [] : [[name, attributes[name]]])),
  );
}

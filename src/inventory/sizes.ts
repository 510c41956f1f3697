/** The sizes of all buildings as columns, in no fixed order: what inference and checks read and write. */
import { USES } from '../engineering/building.js';
import type { Database } from '../store/database.js';
import { quoteName } from '../store/sql.js';
import type { Mapping } from './header.js';

const NUMBERS = [
  'storeys_above',
  'storeys_below',
  'storeys_total',
  'height_m',
  'first_storey_height_m',
  'plan_length_m',
  'plan_width_m',
  'floor_area_m2',
  'year_built',
  'year_retrofitted',
  'count',
  'lon',
  'lat',
  'reentrant_projection',
  'reentrant_area_share',
  'footprint_area_m2',
] as const;
type NumberName = (typeof NUMBERS)[number];

/** Arrays of one length; NaN is unknown. `use` indexes USES. A column the study does not map is undefined. */
export interface Sizes extends Readonly<Partial<Record<NumberName, Float64Array>>> {
  readonly rowCount: number;
  /** The building's first row, which is its key until it is stored. */
  readonly first_row: Int32Array;
  readonly use: Int32Array;
  /** 1 where the floor area is a sum of some of the parts, 2 where one part may be the whole. */
  readonly partial: Int32Array;
  /** 1 where the storeys are those of several rows, 2 where they come from the units of a building alone. */
  readonly merged_storeys: Int32Array;
  readonly footprint?: (string | null)[];
}

/** Reads the columns of `intake_building` that the study maps. */
export async function readSizes(db: Database, mapping: Mapping): Promise<Sizes> {
  const has = new Set(mapping.columns.map(({ column }) => column.name));
  const numbers = NUMBERS.filter((name) => has.has(name));
  const unknown = USES.indexOf('unknown');
  const selected = [
    'first_row',
    '"use number" AS use',
    '"partial area" AS partial',
    '"merged storeys" AS merged_storeys',
    ...numbers.map(quoteName),
    ...(has.has('footprint') ? ['footprint'] : []),
  ];
  const spec: Record<string, 'f64' | 'i32' | 'text'> = {
    first_row: 'i32',
    use: 'i32',
    partial: 'i32',
    merged_storeys: 'i32',
  };
  for (const name of numbers) spec[name] = 'f64';
  if (has.has('footprint')) spec['footprint'] = 'text';
  const sizes = (await db.columns(`SELECT ${selected.join(', ')} FROM intake_building`, spec)) as unknown as Sizes;
  const { use } = sizes;
  for (let at = 0; at < use.length; at += 1) if (use[at] === -1) use[at] = unknown;
  return sizes;
}

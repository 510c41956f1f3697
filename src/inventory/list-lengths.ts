/** Lists that belong together and do not fit: walls with as many areas as lengths, storey stiffness with as many as storeys. */
import type { Database } from '../store/database.js';
import { quoteName } from '../store/sql.js';
import { CHECKS } from './checks.js';
import type { BuildingNotes } from './findings.js';
import type { Mapping } from './header.js';

const DIRECTIONS = ['longitudinal', 'transverse'] as const;
const count = (column: string): string => `len(string_split(${quoteName(column)}, ';'))`;

interface Misfit {
  readonly first_row: number;
  readonly have: number;
  readonly want: number;
}

/** Notes every list of `intake_building` that does not fit its partner. */
export async function noteListLengths(db: Database, mapping: Mapping, notes: BuildingNotes): Promise<void> {
  const has = new Set(mapping.columns.map(({ column }) => column.name));
  for (const direction of DIRECTIONS) {
    const areas = `wall_areas_${direction}_m2`;
    const lengths = `wall_lengths_${direction}_m`;
    if (has.has(areas) && has.has(lengths)) {
      const found = await misfits(db, count(areas), count(lengths), 'true');
      for (const { first_row, have, want } of found)
        notes.add(
          { ...CHECKS.listsDiffer, column: areas },
          first_row,
          have,
          `${have} wall areas and ${want} wall lengths, ${direction}`,
        );
    }
    const springs = `storey_stiffness_${direction}_kN_per_m`;
    if (has.has(springs) && has.has('storeys_above')) {
      const found = await misfits(db, count(springs), 'round(storeys_above)', `${count(springs)} > 1`);
      for (const { first_row, have, want } of found)
        notes.add(
          { ...CHECKS.listsDiffer, column: springs },
          first_row,
          have,
          `${have} storey stiffnesses for ${want} storeys, ${direction}`,
        );
    }
  }
}

function misfits(db: Database, have: string, want: string, where: string): Promise<Misfit[]> {
  return db.rows<Misfit>(
    `SELECT first_row, CAST(${have} AS INTEGER) AS have, CAST(${want} AS INTEGER) AS want FROM intake_building
     WHERE ${where} AND ${have} <> ${want} ORDER BY first_row`,
  );
}

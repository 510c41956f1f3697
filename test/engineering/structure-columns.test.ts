import { describe, expect, it } from 'vitest';
import { findColumn } from '../../src/engineering/columns.js';
import {
  STRUCTURE_KNOWN_BY,
  STRUCTURE_NUMBERS,
  STRUCTURE_WORDS,
  structureReader,
} from '../../src/engineering/structure-columns.js';
import type { StructureColumns } from '../../src/engineering/structure-columns.js';

/** Two rows: the first knows nothing, the second what is given. */
function columns(known: Readonly<Record<string, number | string>>): StructureColumns {
  return {
    numbers: Object.fromEntries(STRUCTURE_NUMBERS.map((name) => [name, [NaN, known[name] ?? NaN]])),
    words: Object.fromEntries(STRUCTURE_WORDS.map((name) => [name, [null, known[name] ?? null]])),
  } as unknown as StructureColumns;
}

describe('structureReader', () => {
  it('reads what a row knows, and nothing of a row that knows nothing', () => {
    const read = structureReader(
      columns({ column_count: 12, wall_areas_longitudinal_m2: '1.2;3', base_fixity: 'pinned', vs30_mps: 240 }),
    );
    expect(read(0)).toBeNull();
    expect(read(1)).toMatchObject({
      column_count: 12,
      wall_areas_m2: { longitudinal: [1.2, 3], transverse: null },
      base_fixity: 'pinned',
      vs30_mps: 240,
      column_width_m: NaN,
    });
  });

  it('reads the diaphragm beside other facts, and makes nothing of it alone', () => {
    expect(structureReader(columns({ diaphragm: 'flexible' }))(1)).toBeNull();
    expect(structureReader(columns({ diaphragm: 'flexible', column_count: 12 }))(1)?.diaphragm).toBe('flexible');
    expect(STRUCTURE_KNOWN_BY).not.toContain('diaphragm');
  });

  it('finds a row whose only fact is a word', () => {
    expect(structureReader(columns({ base_fixity: 'fixed' }))(1)?.base_fixity).toBe('fixed');
  });
});

describe('STRUCTURE_NUMBERS and STRUCTURE_WORDS', () => {
  it('are columns of the inventory', () => {
    for (const name of [...STRUCTURE_NUMBERS, ...STRUCTURE_WORDS]) expect(findColumn(name)?.name).toBe(name);
  });
});

/** The columns of `Structure`: kept apart because a million rows that know nothing of it should not pay for twenty columns. */
import type { BaseFixity, Structure } from './building.js';

export const STRUCTURE_NUMBERS = [
  'column_count',
  'column_width_m',
  'column_depth_m',
  'beam_width_m',
  'beam_depth_m',
  'bay_length_m',
  'top_displacement_longitudinal_m',
  'top_displacement_transverse_m',
  'brace_area_longitudinal_m2',
  'brace_area_transverse_m2',
  'infill_thickness_m',
  'infill_length_longitudinal_m',
  'infill_length_transverse_m',
  'concrete_strength_MPa',
  'steel_height_share',
  'vs30_mps',
  'site_period_s',
] as const;

export const STRUCTURE_WORDS = [
  'base_fixity',
  'wall_areas_longitudinal_m2',
  'wall_areas_transverse_m2',
  'wall_lengths_longitudinal_m',
  'wall_lengths_transverse_m',
  'diaphragm',
] as const;

/** Says nothing of a structure by itself: many inventories have it, and it is read beside the others alone. */
const BESIDE = 'diaphragm';
/** The columns of which one at least must be filled for a row to have a `Structure`. */
export const STRUCTURE_KNOWN_BY: readonly string[] = [
  ...STRUCTURE_NUMBERS,
  ...STRUCTURE_WORDS.filter((name) => name !== BESIDE),
];

type StructureNumber = (typeof STRUCTURE_NUMBERS)[number];
type StructureWord = (typeof STRUCTURE_WORDS)[number];

/** Numbers (NaN unknown) and words (null unknown) by column. */
export interface StructureColumns {
  readonly numbers: Readonly<Record<StructureNumber, ArrayLike<number>>>;
  readonly words: Readonly<Record<StructureWord, readonly (string | null)[]>>;
}

/** A list as the database holds it, "1.2;3;4"; null: not known. */
export function numbersOf(text: string | null): readonly number[] | null {
  return text === null ? null : text.split(';').map(Number);
}

/** Reads rows of the columns as Structures; null for a row that knows none of it. */
export function structureReader({ numbers, words }: StructureColumns): (i: number) => Structure | null {
  const numberColumns = STRUCTURE_NUMBERS.map((name) => numbers[name]);
  const wordColumns = STRUCTURE_WORDS.filter((name) => name !== BESIDE).map((name) => words[name]);
  const isKnown = (i: number): boolean => {
    for (const column of numberColumns) if (!Number.isNaN(column[i]!)) return true;
    for (const column of wordColumns) if (column[i]! !== null) return true;
    return false;
  };
  return (i) => {
    if (!isKnown(i)) return null;
    const number = (name: StructureNumber): number => numbers[name][i]!;
    const list = (name: StructureWord): readonly number[] | null => numbersOf(words[name][i]!);
    return {
      column_count: number('column_count'),
      column_width_m: number('column_width_m'),
      column_depth_m: number('column_depth_m'),
      beam_width_m: number('beam_width_m'),
      beam_depth_m: number('beam_depth_m'),
      bay_length_m: number('bay_length_m'),
      base_fixity: words.base_fixity[i] as BaseFixity | null,
      wall_areas_m2: {
        longitudinal: list('wall_areas_longitudinal_m2'),
        transverse: list('wall_areas_transverse_m2'),
      },
      wall_lengths_m: {
        longitudinal: list('wall_lengths_longitudinal_m'),
        transverse: list('wall_lengths_transverse_m'),
      },
      top_displacement_m: {
        longitudinal: number('top_displacement_longitudinal_m'),
        transverse: number('top_displacement_transverse_m'),
      },
      brace_area_m2: {
        longitudinal: number('brace_area_longitudinal_m2'),
        transverse: number('brace_area_transverse_m2'),
      },
      infill_thickness_m: number('infill_thickness_m'),
      infill_length_m: {
        longitudinal: number('infill_length_longitudinal_m'),
        transverse: number('infill_length_transverse_m'),
      },
      diaphragm: words.diaphragm[i]!,
      concrete_strength_MPa: number('concrete_strength_MPa'),
      steel_height_share: number('steel_height_share'),
      vs30_mps: number('vs30_mps'),
      site_period_s: number('site_period_s'),
    };
  };
}

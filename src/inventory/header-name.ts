/** What the name of a column of theirs says: words, unit, direction, and whether it is one of our own names. */
import { COLUMNS } from '../engineering/columns.js';
import type { InventoryColumn } from '../engineering/columns.js';
import { findUnit, unitsOf } from '../engineering/units.js';
import type { Unit } from '../engineering/units.js';
import { foldWord } from './cell.js';

export type HeaderDirection = 'longitudinal' | 'transverse' | 'both' | undefined;

export interface HeaderName {
  readonly words: string;
  readonly unit: Unit | undefined;
  /** The direction of the plan it names; both when it names both. */
  readonly direction: HeaderDirection;
  /** Our column of exactly this name, its unit left out or another of the same kind. */
  readonly own: InventoryColumn | undefined;
}

/** `Height (ft)`, `height_ft`, `BldgHeight` → words, unit, direction; `wall_areas_transverse_m2` → our own column besides. */
export function readHeaderName(name: string): HeaderName {
  const bracket = /[([]([^)\]]+)[)\]]/.exec(name);
  const spaced = name
    .replace(/[([][^)\]]*[)\]]/, ' ')
    .replaceAll(/(\p{Ll})(\p{Lu})/gu, '$1 $2')
    .replaceAll(/[_./-]+/g, ' ');
  const words = foldWord(spaced);
  const inBracket = bracket?.[1] === undefined ? undefined : findUnit(bracket[1]);
  const own = OWN_NAMES.get(ownSpelling(name)) ?? OWN_NAMES.get(words.replaceAll(' ', '_'));
  if (own !== undefined) return { words, unit: own.unit ?? inBracket, direction: directionOf(words), own: own.column };
  const last =
    /^(.+) (ft2|ft|feet|sq ?ft|sqft|sf|m2|sqm|sq m|mm|cm|m|metres?|meters?|kn|kip|mpa|kpa|psi|ksi|psf|s|g)$/.exec(
      words,
    );
  const bare = inBracket !== undefined || last === null ? words : (last[1] ?? words);
  // A direction in brackets is no unit, and still a direction.
  const direction = directionOf(foldWord(`${spaced} ${inBracket === undefined ? (bracket?.[1] ?? '') : ''}`));
  return { words: bare, unit: inBracket ?? findUnit(last?.[2] ?? ''), direction, own: undefined };
}

interface OwnName {
  readonly column: InventoryColumn;
  readonly unit: Unit | undefined;
}

/** Every way of writing a name of ours: with its unit, with another of the same dimension, without. */
const OWN_NAMES: ReadonlyMap<string, OwnName> = new Map(
  COLUMNS.flatMap((column): (readonly [string, OwnName])[] => {
    const { name, dimension } = column;
    const unit = column.unit === undefined ? undefined : findUnit(column.unit);
    if (unit === undefined || dimension === undefined) return [[ownSpelling(name), { column, unit: undefined }]];
    const stem = name.slice(0, -(unit.id.length + 1));
    return [
      ...unitsOf(dimension).map((other) => [ownSpelling(`${stem}_${other.id}`), { column, unit: other }] as const),
      [ownSpelling(stem), { column, unit: undefined }],
    ];
  }),
);

function ownSpelling(name: string): string {
  return foldWord(name).replaceAll(/[\s-]+/g, '_');
}

// Words by which tables tell the directions of a plan; x runs along, y across, as everywhere in Swaymark. [common practice, no source]
const ALONG = /\b(?:x|xx|long|longit|lengthwise|lengthways)\b|longitudinal|along/g;
const ACROSS = /\b(?:y|yy|trans|transv|short|crosswise|crossways|widthwise)\b|transverse|transversal|across/g;

function directionOf(words: string): HeaderDirection {
  const [along, across] = [words.search(ALONG) >= 0, words.search(ACROSS) >= 0];
  if (along && across) return 'both';
  return along ? 'longitudinal' : across ? 'transverse' : undefined;
}

/** `words` without those that tell a direction. */
export function withoutDirection(words: string): string {
  return foldWord(words.replaceAll(ALONG, ' ').replaceAll(ACROSS, ' ').replaceAll(',', ' '));
}

const DIRECTIONS: Readonly<Record<string, 'longitudinal' | 'transverse'>> = {
  plan_length_m: 'longitudinal',
  plan_width_m: 'transverse',
  column_depth_m: 'longitudinal',
  column_width_m: 'transverse',
  system: 'longitudinal',
  system_transverse: 'transverse',
};

/** The direction of the plan that a column of ours is about, undefined where it is about none. */
export function columnDirection({ name }: InventoryColumn): 'longitudinal' | 'transverse' | undefined {
  return (
    DIRECTIONS[name] ??
    (name.includes('longitudinal') ? 'longitudinal' : name.includes('transverse') ? 'transverse' : undefined)
  );
}

const TWINS: readonly (readonly [InventoryColumn, InventoryColumn])[] = COLUMNS.flatMap((column) => {
  const along = column.name === 'system_transverse' ? 'system' : column.name.replace('transverse', 'longitudinal');
  const twin = along === column.name ? undefined : COLUMNS.find(({ name }) => name === along);
  return twin === undefined ? [] : [[twin, column] as const];
});

/** The column that says of the other direction what `column` says of its own. */
export function otherWay(column: InventoryColumn): InventoryColumn | undefined {
  return TWINS.find((twins) => twins.includes(column))?.find((twin) => twin !== column);
}

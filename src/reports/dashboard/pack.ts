/**
 * Columns made small for the page: a constant once, repeated values as a dictionary with places, the rest as they are.
 * Unknown numbers travel as null. The page's unpack.ts is the other half; a test sends data through both.
 */
import { BUILDING_NUMBERS, BUILDING_WORDS } from '../../engineering/building-columns.js';
import { GAP_COLUMNS } from '../../engineering/page-contract.js';
import type { PageData } from '../../engineering/page-contract.js';
import { RESULT_COLUMNS } from '../../engineering/results.js';
import { STRUCTURE_NUMBERS, STRUCTURE_WORDS } from '../../engineering/structure-columns.js';

type Cell = number | string | null;

/** `[0, n, value]`: one value n times; `[1, values, places]`: a dictionary; `[2, values]`: as they are. */
export type Packed = readonly [0, number, Cell] | readonly [1, readonly Cell[], readonly number[]] | readonly [2, readonly Cell[]];

/** Numbers the page recomputes or compares travel to the last bit; the rest to six significant digits. */
const EXACT: ReadonlySet<string> = new Set(['ln_priority', 'ln_priority_sd']);

/** What travels for `value`: null for an unknown number, others to `digits` significant digits. */
function travelling(value: Cell, digits: number | undefined): Cell {
  if (typeof value !== 'number') return value;
  if (!Number.isFinite(value)) return null;
  return digits === undefined ? value : Number(value.toPrecision(digits));
}

/** `values` in the shortest of the three forms. */
export function packColumn(values: ArrayLike<Cell>, digits?: number): Packed {
  const most = Math.min(values.length / 3, 5000);
  /** Place of each value to travel, and of each value as it came: rounding costs far more than looking up. */
  const placeOf = new Map<Cell, number>();
  const known = new Map<Cell, number>();
  const places = new Array<number>(values.length);
  for (let i = 0; i < values.length; i += 1) {
    const value = values[i] ?? null;
    let place = known.get(value);
    if (place === undefined) {
      const cell = travelling(value, digits);
      place = placeOf.get(cell) ?? placeOf.size;
      placeOf.set(cell, place);
      known.set(value, place);
      // one value is a constant, however few cells there are
      if (placeOf.size > 1 && placeOf.size > most) return [2, Array.from(values, (each) => travelling(each, digits))];
    }
    places[i] = place;
  }
  const [only, ...others] = placeOf.keys();
  if (only !== undefined && others.length === 0) return [0, values.length, only];
  return [1, [...placeOf.keys()], places];
}

/** Pairs with a shown building, by column, without the names, which the page has. */
function packGaps({ gaps, buildings }: PageData): unknown {
  if (gaps === null) return null;
  const shown = new Set(buildings.inputs.id);
  const pairs = gaps.pairs.filter(({ id_a, id_b }) => shown.has(id_a) || shown.has(id_b));
  const column = (name: (typeof GAP_COLUMNS)[number]): Packed =>
    packColumn(
      pairs.map((pair) => (name === 'much_taller' ? Number(pair[name]) : pair[name])),
      4,
    );
  return { ...gaps, pairs: Object.fromEntries(GAP_COLUMNS.map((name) => [name, column(name)])) };
}

/** Page data with every column packed. */
export function packPage(data: PageData): unknown {
  const { buildings } = data;
  const { inputs } = buildings;
  const { structure } = inputs;
  return {
    ...data,
    gaps: packGaps(data),
    buildings: {
      shown: buildings.shown,
      all: buildings.all,
      pools: buildings.pools,
      inputs: {
        id: packColumn(inputs.id),
        numbers: Object.fromEntries(BUILDING_NUMBERS.map((name) => [name, packColumn(inputs.numbers[name])])),
        words: Object.fromEntries(BUILDING_WORDS.map((name) => [name, packColumn(inputs.words[name])])),
        structure:
          structure === undefined
            ? undefined
            : {
                numbers: Object.fromEntries(STRUCTURE_NUMBERS.map((name) => [name, packColumn(structure.numbers[name])])),
                words: Object.fromEntries(STRUCTURE_WORDS.map((name) => [name, packColumn(structure.words[name])])),
              },
        place: inputs.place === undefined ? undefined : { lon: packColumn(inputs.place.lon), lat: packColumn(inputs.place.lat) },
      },
      name: packColumn(buildings.name),
      group: packColumn(buildings.group),
      part_of: packColumn(buildings.part_of),
      site: packColumn(buildings.site),
      heritage: packColumn(buildings.heritage),
      first_row: packColumn(buildings.first_row),
      found: buildings.found,
      results: Object.fromEntries(
        RESULT_COLUMNS.map(({ name, kind }) => [
          name,
          packColumn(buildings.results[name] ?? [], kind === 'number' && !EXACT.has(name) ? 6 : undefined),
        ]),
      ),
    },
  };
}

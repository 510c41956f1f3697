/** The other half of the report's pack.ts: columns as they were, unknown numbers NaN again. */
import type { BuildingColumns } from '../engineering/building-columns.js';
import { GAP_COLUMNS } from '../engineering/page-contract.js';
import type { GapPair, PageBuildings, PageData, PageGaps } from '../engineering/page-contract.js';

type Cell = number | string | null;
export type Packed =
  readonly [0, number, Cell] | readonly [1, readonly Cell[], readonly number[]] | readonly [2, readonly Cell[]];

/** The values of a packed column. */
export function unpackColumn(packed: Packed): readonly Cell[] {
  switch (packed[0]) {
    case 0:
      return Array.from({ length: packed[1] }, () => packed[2]);
    case 1: {
      const values = packed[1];
      return packed[2].map((place) => values[place] ?? null);
    }
    case 2:
      return packed[1];
  }
}

const numbers = (packed: Packed): Float64Array =>
  Float64Array.from(unpackColumn(packed), (cell) => (typeof cell === 'number' ? cell : NaN));

interface PackedColumns {
  readonly numbers: Readonly<Record<string, Packed>>;
  readonly words: Readonly<Record<string, Packed>>;
}

interface PackedBuildings extends Pick<PageBuildings, 'shown' | 'all' | 'pools' | 'found'> {
  readonly inputs: PackedColumns & {
    readonly id: Packed;
    readonly structure?: PackedColumns;
    readonly place?: { readonly lon: Packed; readonly lat: Packed };
  };
  readonly name: Packed;
  readonly group: Packed;
  readonly part_of: Packed;
  readonly site: Packed;
  readonly heritage: Packed;
  readonly first_row: Packed;
  readonly results: Readonly<Record<string, Packed>>;
}

type LoadedPair = Pick<GapPair, (typeof GAP_COLUMNS)[number]>;

/** What the page knows of its data: all but the coordinates, which the map alone carries, and the names of neighbours, which it has. */
export type LoadedPage = Omit<PageData, 'buildings' | 'gaps'> & {
  readonly buildings: Omit<PageBuildings, 'lon' | 'lat'>;
  readonly gaps: (Omit<PageGaps, 'pairs'> & { readonly pairs: readonly LoadedPair[] }) | null;
};

type PackedGaps = Omit<PageGaps, 'pairs'> & { readonly pairs: Readonly<Record<(typeof GAP_COLUMNS)[number], Packed>> };

function unpackPairs(columns: PackedGaps['pairs']): readonly LoadedPair[] {
  const cells = GAP_COLUMNS.map((name) => [name, unpackColumn(columns[name])] as const);
  return Array.from({ length: unpackColumn(columns.id_a).length }, (_, i) => {
    const pair = Object.fromEntries(cells.map(([name, values]) => [name, values[i] ?? null]));
    return { ...pair, much_taller: pair['much_taller'] === 1 } as LoadedPair;
  });
}

const mapped = <T>(columns: Readonly<Record<string, Packed>>, unpack: (packed: Packed) => T): Record<string, T> =>
  Object.fromEntries(Object.entries(columns).map(([name, packed]) => [name, unpack(packed)]));

/** Page data from the text of its data block. */
export function unpackPage(json: string): LoadedPage {
  const packed = JSON.parse(json) as Omit<PageData, 'buildings' | 'gaps'> & {
    readonly buildings: PackedBuildings;
    readonly gaps: PackedGaps | null;
  };
  const { inputs, ...rest } = packed.buildings;
  const words = (column: Packed): readonly (string | null)[] => unpackColumn(column) as readonly (string | null)[];
  return {
    summary: packed.summary,
    settings: packed.settings,
    sites: packed.sites,
    gaps: packed.gaps === null ? null : { ...packed.gaps, pairs: unpackPairs(packed.gaps.pairs) },
    grids: packed.grids,
    display: packed.display,
    buildings: {
      shown: rest.shown,
      all: rest.all,
      pools: rest.pools,
      found: rest.found,
      inputs: {
        id: unpackColumn(inputs.id) as readonly string[],
        numbers: mapped(inputs.numbers, numbers) as unknown as BuildingColumns['numbers'],
        words: mapped(inputs.words, words) as unknown as BuildingColumns['words'],
        structure:
          inputs.structure === undefined
            ? undefined
            : ({
                numbers: mapped(inputs.structure.numbers, numbers),
                words: mapped(inputs.structure.words, words),
              } as unknown as BuildingColumns['structure']),
        place:
          inputs.place === undefined ? undefined : { lon: numbers(inputs.place.lon), lat: numbers(inputs.place.lat) },
      },
      name: words(rest.name),
      group: words(rest.group),
      part_of: words(rest.part_of),
      site: unpackColumn(rest.site) as readonly (number | null)[],
      heritage: words(rest.heritage),
      first_row: unpackColumn(rest.first_row) as readonly number[],
      results: mapped(rest.results, unpackColumn),
    },
  };
}

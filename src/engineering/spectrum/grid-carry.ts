/** A hazard grid as plain numbers: how a database keeps it and a page carries it, whole or only what some places read. */
import { ln } from '../numeric/elementary.js';
import type { HazardGrid, HazardGrids } from './grid.js';
import { cellAt } from './grid-read.js';

/** Places are counted line of latitude after line of latitude, south to north, each from west to east. */
export interface CarriedGrid {
  readonly periods_s: readonly number[];
  /** Lines, degrees. */
  readonly lon: readonly number[];
  readonly lat: readonly number[];
  /** Places that have a node, increasing. */
  readonly places: readonly number[];
  /** g; one for each period, node after node. */
  readonly sa_g: readonly number[];
}

/** `grid` as plain numbers. */
export function carried(grid: HazardGrid): CarriedGrid {
  const { nodeAt, sa_g } = grid;
  const periods = grid.periods_s.length;
  const places: number[] = [];
  const ordinates: number[] = [];
  nodeAt.forEach((node, place) => {
    if (node < 0) return;
    places.push(place);
    for (let p = 0; p < periods; p += 1) ordinates.push(sa_g[node * periods + p]!);
  });
  return { periods_s: [...grid.periods_s], lon: [...grid.lon], lat: [...grid.lat], places, sa_g: ordinates };
}

/** The grid again: every place reads what it read, to the bit. */
export function uncarried({
  periods_s,
  lon,
  lat,
  places,
  sa_g,
}: {
  readonly [K in keyof CarriedGrid]: ArrayLike<number>;
}): HazardGrid {
  const nodeAt = new Int32Array(lon.length * lat.length).fill(-1);
  for (let node = 0; node < places.length; node += 1) nodeAt[places[node]!] = node;
  const ordinates = Float64Array.from(sa_g);
  return {
    periods_s: Float64Array.from(periods_s),
    lon: Float64Array.from(lon),
    lat: Float64Array.from(lat),
    nodeAt,
    sa_g: ordinates,
    ln_sa: ordinates.map(ln),
  };
}

/** Grids by fingerprint, as a page carries them. */
export function gridsOf(grids: Readonly<Record<string, CarriedGrid>>): HazardGrids {
  return new Map(Object.entries(grids).map(([fingerprint, grid]) => [fingerprint, uncarried(grid)]));
}

/** The part of `grid` that the places `lon`, `lat` (degrees, NaN unknown) read; the same everywhere in their cells, outside elsewhere. */
export function cropped(grid: HazardGrid, lon: ArrayLike<number>, lat: ArrayLike<number>): CarriedGrid {
  const width = grid.lon.length;
  const used = new Uint8Array(grid.nodeAt.length);
  let [west, east, south, north] = [Infinity, -1, Infinity, -1];
  for (let i = 0; i < lon.length; i += 1) {
    const cell = cellAt(grid, lon[i]!, lat[i]!);
    if (cell === null) continue;
    const at = cell.south * width + cell.west;
    for (const place of [at, at + 1, at + width, at + width + 1]) used[place] = 1;
    west = Math.min(west, cell.west);
    east = Math.max(east, cell.west + 1);
    south = Math.min(south, cell.south);
    north = Math.max(north, cell.south + 1);
  }
  if (east < 0) return { periods_s: [...grid.periods_s], lon: [], lat: [], places: [], sa_g: [] };
  const columns = east - west + 1;
  const nodeAt = new Int32Array(columns * (north - south + 1)).fill(-1);
  for (let place = 0; place < nodeAt.length; place += 1) {
    const whole = (south + Math.floor(place / columns)) * width + west + (place % columns);
    if (used[whole] === 1) nodeAt[place] = grid.nodeAt[whole]!;
  }
  return carried({ ...grid, lon: grid.lon.subarray(west, east + 1), lat: grid.lat.subarray(south, north + 1), nodeAt });
}

/** Reading a hazard grid at a place: from the four nodes around it, bilinear in ln S_a (grid-records.ts has the formula). */
import type { HazardGrid } from './grid.js';
import { bilinear, shareBetween, sharedByCorners } from './grid-records.js';

/** The cell of a place: lines around it, nodes at its corners (-1 where there is none), and where in it the place lies. */
export interface GridCell {
  /** Lines west and south of the place; the others follow them. */
  readonly west: number;
  readonly south: number;
  /** South-west, south-east, north-west, north-east. */
  readonly nodes: readonly [number, number, number, number];
  /** Longitude of the place as the grid counts it. */
  readonly lon: number;
  /** Shares of the way from the western line to the eastern, from the southern to the northern. */
  readonly east: number;
  readonly north: number;
}

/** The interval of `lines` that holds `value`, -1 outside or for NaN; the last line belongs to the last interval. */
function intervalOf(lines: Float64Array, value: number): number {
  const last = lines.length - 1;
  if (!(value >= lines[0]! && value <= lines[last]!)) return -1;
  let i = Math.min(Math.floor(((value - lines[0]!) / (lines[last]! - lines[0]!)) * last), last - 1);
  // Lines lie a little off their even places.
  while (i > 0 && lines[i]! > value) i -= 1;
  while (i < last - 1 && lines[i + 1]! <= value) i += 1;
  return i;
}

/**
 * The cell that holds a place; null where it is outside, where a corner that counts is missing, or for coordinates that are NaN.
 * Longitudes may differ from the grid's by a full turn.
 */
export function cellAt(grid: HazardGrid, lon: number, lat: number): GridCell | null {
  const { nodeAt } = grid;
  const width = grid.lon.length;
  const x = lon < grid.lon[0]! ? lon + 360 : lon > grid.lon[width - 1]! ? lon - 360 : lon;
  const west = intervalOf(grid.lon, x);
  const south = intervalOf(grid.lat, lat);
  if (west < 0 || south < 0) return null;
  const east = shareBetween(x, grid.lon[west]!, grid.lon[west + 1]!);
  const north = shareBetween(lat, grid.lat[south]!, grid.lat[south + 1]!);
  const sw = nodeAt[south * width + west]!;
  const se = nodeAt[south * width + west + 1]!;
  const nw = nodeAt[(south + 1) * width + west]!;
  const ne = nodeAt[(south + 1) * width + west + 1]!;
  // A corner without weight may be missing: the edge of a hole belongs to the cell beside it.
  if (
    (sw < 0 && east < 1 && north < 1) ||
    (se < 0 && east > 0 && north < 1) ||
    (nw < 0 && east < 1 && north > 0) ||
    (ne < 0 && east > 0 && north > 0)
  )
    return null;
  return { west, south, nodes: [sw, se, nw, ne], lon: x, east, north };
}

/** Writes the P ordinates (g) at a site to `out` from `at` on; false, and nothing written, where the site has no cell. */
export function readGrid(grid: HazardGrid, lon: number, lat: number, out: Float64Array, at = 0): boolean {
  const cell = cellAt(grid, lon, lat);
  if (cell === null) return false;
  const { sa_g, ln_sa } = grid;
  const { nodes, east, north } = cell;
  const periods = grid.periods_s.length;
  // a corner that is missing has no weight: its places are those of another
  const there = Math.max(...nodes);
  const [sw, se, nw, ne] = nodes.map((node) => (node < 0 ? there : node) * periods) as [number, number, number, number];
  for (let p = 0; p < periods; p += 1) {
    const shared = sharedByCorners(sa_g[sw + p]!, sa_g[se + p]!, sa_g[nw + p]!, sa_g[ne + p]!, east, north);
    out[at + p] = Number.isNaN(shared)
      ? bilinear(ln_sa[sw + p]!, ln_sa[se + p]!, ln_sa[nw + p]!, ln_sa[ne + p]!, east, north)
      : shared;
  }
  return true;
}

/** The P ordinates (g) at a site; null outside. */
export function ordinatesAt(grid: HazardGrid, lon: number, lat: number): Float64Array | null {
  const out = new Float64Array(grid.periods_s.length);
  return readGrid(grid, lon, lat, out) ? out : null;
}

export interface SiteOrdinates {
  /** g; P for each site, site after site; NaN for sites outside. */
  readonly sa_g: Float64Array;
  /** 1 for sites that the grid covers. */
  readonly inside: Uint8Array;
}

/** The ordinates of many sites at once; `lon` and `lat` of the same length, degrees, NaN where not known. */
export function ordinatesOfSites(grid: HazardGrid, lon: Float64Array, lat: Float64Array): SiteOrdinates {
  const periods = grid.periods_s.length;
  const sa_g = new Float64Array(lon.length * periods).fill(NaN);
  const inside = new Uint8Array(lon.length);
  for (let site = 0; site < lon.length; site += 1) {
    if (readGrid(grid, lon[site]!, lat[site]!, sa_g, site * periods)) inside[site] = 1;
  }
  return { sa_g, inside };
}

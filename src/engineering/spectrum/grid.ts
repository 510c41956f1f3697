/**
 * Hazard that varies over the map: nodes of a regular grid in longitude and latitude carry ordinates at named periods; a site reads
 * them bilinearly in ln S_a from the four nodes around it. Places without a node leave holes: a site in a cell that lacks a corner
 * is outside, as is one beyond the grid. Sizes: n nodes, P periods.
 */
import { ln } from '../numeric/elementary.js';

export interface GridNodes {
  /** Increasing, s; P of them. */
  readonly periods_s: readonly number[];
  /** Degrees; n each. */
  readonly lon: Float64Array;
  readonly lat: Float64Array;
  /** Positive, g; n × P, node after node. A node whose first value is NaN counts as missing. */
  readonly sa_g: Float64Array;
}

export interface HazardGrid {
  readonly periods_s: Float64Array;
  /** Longitudes and latitudes of the lines of the grid, increasing, degrees. */
  readonly lon: Float64Array;
  readonly lat: Float64Array;
  /** Node at [line of latitude × lines of longitude + line of longitude]; -1 where there is none. */
  readonly nodeAt: Int32Array;
  readonly sa_g: Float64Array;
  readonly ln_sa: Float64Array;
}

/** As a study names such a spectrum; it is read with the study, and its ordinates are those of each building's place. */
export const HAZARD_GRID = 'hazard-grid';

/** Grids by their fingerprints. */
export type HazardGrids = ReadonlyMap<string, HazardGrid>;

/** Nodes that form no regular grid; `node` is the place of the one that shows it, null where none does. */
export class GridError extends RangeError {
  override readonly name = 'GridError';
  readonly node: number | null;

  constructor(message: string, node: number | null) {
    super(message);
    this.node = node;
  }
}

/** Coordinates this near are one line, degrees (0.1 m) [judgement]. */
const SAME_LINE_DEG = 1e-6;
/** A line may lie this share of a step off its place, since coordinates are printed rounded [judgement]. */
const OFF_PLACE = 0.1;
/** Places of the grid for each node, beyond which nodes are scattered rather than a grid with holes [judgement]. */
const MOST_PLACES = 64;

interface Axis {
  readonly lines: Float64Array;
  /** Line of each node. */
  readonly at: Int32Array;
}

function shown(value: number): string {
  return String(Number(value.toPrecision(6)));
}

/** Finds the lines that `values` lie on: one step apart, lines without any node included. @throws GridError */
function axisOf(values: Float64Array, what: string): Axis {
  const sorted = values.slice().sort();
  const groups: number[] = [];
  for (const value of sorted) {
    if (groups.length === 0 || value - groups.at(-1)! > SAME_LINE_DEG) groups.push(value);
  }
  const nodeOf = (value: number): number => values.indexOf(value);
  if (groups.length < 2) throw new GridError(`all nodes have the same ${what}; a grid has two and more`, null);
  const gaps = groups.slice(1).map((value, i) => value - groups[i]!);
  const middle = gaps.slice().sort((a, b) => a - b)[gaps.length >> 1]!;
  // Coordinates are printed rounded, and gaps with them: their mean is nearer the true step.
  const near = gaps.filter((gap) => Math.abs(gap - middle) < 0.25 * middle);
  const rough = near.reduce((sum, gap) => sum + gap, 0) / near.length;
  const place = new Int32Array(groups.length);
  gaps.forEach((gap, i) => {
    const steps = Math.round(gap / rough);
    if (steps < 1 || Math.abs(gap / rough - steps) > 0.25) {
      throw new GridError(
        `${what} ${String(groups[i + 1])} lies ${shown(gap)}° from the line before it, where most lie ${shown(rough)}° apart`,
        nodeOf(groups[i + 1]!),
      );
    }
    place[i + 1] = place[i]! + steps;
  });
  const lines = place.at(-1)! + 1;
  const first = groups[0]!;
  const step = (groups.at(-1)! - first) / (lines - 1);
  if (lines > MOST_PLACES * values.length) {
    throw new GridError(
      `${what} ${String(groups.at(-1))}: ${String(values.length)} nodes on ${String(lines)} lines are scattered, not a grid`,
      nodeOf(groups.at(-1)!),
    );
  }
  groups.forEach((value, i) => {
    const off = (value - first) / step - place[i]!;
    if (Math.abs(off) > OFF_PLACE) {
      throw new GridError(
        `${what} ${String(value)} lies ${Math.abs(off).toFixed(2)} of a step off the grid, whose lines are ${shown(step)}° apart from ${String(first)}`,
        nodeOf(value),
      );
    }
  });
  const all = Float64Array.from({ length: lines }, (_, k) => first + k * step);
  groups.forEach((value, i) => {
    all[place[i]!] = value;
  });
  const at = new Int32Array(values.length);
  values.forEach((value, i) => {
    let [low, high] = [0, groups.length - 1];
    while (low < high) {
      const middle = (low + high + 1) >> 1;
      if (groups[middle]! <= value) low = middle;
      else high = middle - 1;
    }
    at[i] = place[low]!;
  });
  return { lines: all, at };
}

/** Finds the regular grid in `nodes`. @throws GridError for nodes that are scattered, stand twice, or enclose no cell. */
export function layGrid({ periods_s, lon, lat, sa_g }: GridNodes): HazardGrid {
  if (lon.length === 0) throw new GridError('no nodes', null);
  const x = axisOf(lon, 'longitude');
  const y = axisOf(lat, 'latitude');
  const width = x.lines.length;
  if (width * y.lines.length > MOST_PLACES * lon.length + 1000) {
    throw new GridError(
      `${String(lon.length)} nodes on a grid of ${String(width)} by ${String(y.lines.length)} places are scattered, not a grid`,
      lon.length - 1,
    );
  }
  const nodeAt = new Int32Array(width * y.lines.length).fill(-1);
  for (let node = 0; node < lon.length; node += 1) {
    const place = y.at[node]! * width + x.at[node]!;
    if (nodeAt[place]! >= 0)
      throw new GridError(`a second node at longitude ${String(lon[node])}, latitude ${String(lat[node])}`, node);
    nodeAt[place] = node;
  }
  const periods = periods_s.length;
  for (let place = 0; place < nodeAt.length; place += 1) {
    if (nodeAt[place]! >= 0 && Number.isNaN(sa_g[nodeAt[place]! * periods])) nodeAt[place] = -1;
  }
  if (!hasCell(nodeAt, width)) {
    const [dx, dy] = [x.lines[1]! - x.lines[0]!, y.lines[1]! - y.lines[0]!];
    throw new GridError(`no four nodes enclose a cell of ${shown(dx)}° by ${shown(dy)}°`, null);
  }
  return {
    periods_s: Float64Array.from(periods_s),
    lon: x.lines,
    lat: y.lines,
    nodeAt,
    sa_g,
    ln_sa: sa_g.map(ln),
  };
}

function hasCell(nodeAt: Int32Array, width: number): boolean {
  for (let place = 0; place + width + 1 < nodeAt.length; place += 1) {
    if (
      place % width < width - 1 &&
      nodeAt[place]! >= 0 &&
      nodeAt[place + 1]! >= 0 &&
      nodeAt[place + width]! >= 0 &&
      nodeAt[place + width + 1]! >= 0
    )
      return true;
  }
  return false;
}

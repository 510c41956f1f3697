/** The interpolation of a hazard grid: where a place lies in its cell, and the ordinate there from those of the four nodes. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { exp, ln } from '../numeric/elementary.js';
import { LARGEST_G } from './family.js';

/** Share of the way from one line to the next. */
export function shareBetween(place: number, from: number, to: number): number {
  return (place - from) / (to - from);
}

/**
 * The value that all corners with weight have, at a node that of the node; NaN where they differ. It is the ordinate as it stands, which
 * the logarithm and back may miss by a bit.
 */
export function sharedByCorners(sw: number, se: number, nw: number, ne: number, east: number, north: number): number {
  const south = acrossEdge(sw, se, east);
  const upper = acrossEdge(nw, ne, east);
  return acrossEdge(south, upper, north);
}

function acrossEdge(one: number, two: number, share: number): number {
  if (share === 0) return one;
  return share === 1 || one === two ? two : NaN;
}

/** S_a from the logarithms at the four corners; one without weight is not read and may be NaN. */
export function bilinear(sw: number, se: number, nw: number, ne: number, east: number, north: number): number {
  const a = (1 - east) * (1 - north);
  const b = east * (1 - north);
  const c = (1 - east) * north;
  const d = east * north;
  let sum = 0;
  if (a > 0) sum += a * sw;
  if (b > 0) sum += b * se;
  if (c > 0) sum += c * nw;
  if (d > 0) sum += d * ne;
  return exp(sum);
}

const SOURCE = { standard: 'interpolation on a grid', edition: '' } as const;

const DEGREES = { kind: 'number', from: -360, to: 720 } as const;

const share: Family<
  { readonly place_deg: number; readonly line_1_deg: number; readonly line_2_deg: number },
  Record<never, number>
> = {
  id: 'spectrum/grid-share',
  yields: 'share',
  unit: null,
  symbol: 'share',
  inputs: [
    { name: 'place_deg', ...DEGREES, meaning: 'longitude or latitude of the place, degrees' },
    { name: 'line_1_deg', ...DEGREES, meaning: 'line of the grid west or south of it, degrees' },
    { name: 'line_2_deg', ...DEGREES, meaning: 'next line, degrees' },
  ],
  expression: '(place_deg - line_1_deg) / (line_2_deg - line_1_deg)',
  evaluate: ({ place_deg, line_1_deg, line_2_deg }) => {
    if (!(line_2_deg > line_1_deg))
      throw new RangeError(
        `line_2_deg must lie beyond line_1_deg, got ${String(line_1_deg)} and ${String(line_2_deg)}`,
      );
    return shareBetween(place_deg, line_1_deg, line_2_deg);
  },
};

/** Where a place lies between two lines of a grid. */
export const GRID_SHARE = record({
  id: 'grid/place/share',
  title: 'Share of the way between two lines of the grid',
  family: share,
  constants: {},
  source: { ...SOURCE, clause: 'linear in degrees' },
  verified: 'mechanics',
  limits: [],
});

interface FourNodes {
  readonly east_share: number;
  readonly north_share: number;
  readonly sa_sw_g: number;
  readonly sa_se_g: number;
  readonly sa_nw_g: number;
  readonly sa_ne_g: number;
}

const node = (name: string, where: string) =>
  ({ name, kind: 'number', unit: 'g', above: 0, to: LARGEST_G, meaning: `S_a at the ${where} node` }) as const;
const within = { kind: 'number', from: 0, to: 1 } as const;

const fourNodes: Family<FourNodes, Record<never, number>> = {
  id: 'spectrum/grid-bilinear',
  yields: 'sa_g',
  unit: 'g',
  symbol: 'S_a',
  inputs: [
    { name: 'east_share', ...within, meaning: 'share of the way from the western to the eastern line' },
    { name: 'north_share', ...within, meaning: 'share of the way from the southern to the northern line' },
    node('sa_sw_g', 'south-western'),
    node('sa_se_g', 'south-eastern'),
    node('sa_nw_g', 'north-western'),
    node('sa_ne_g', 'north-eastern'),
  ],
  expression:
    'exp((1 - north_share) * ((1 - east_share) * ln(sa_sw_g) + east_share * ln(sa_se_g)) + north_share * ((1 - east_share) * ln(sa_nw_g) + east_share * ln(sa_ne_g)))',
  evaluate: ({ east_share, north_share, sa_sw_g, sa_se_g, sa_nw_g, sa_ne_g }) => {
    const shared = sharedByCorners(sa_sw_g, sa_se_g, sa_nw_g, sa_ne_g, east_share, north_share);
    if (!Number.isNaN(shared)) return shared;
    return bilinear(ln(sa_sw_g), ln(sa_se_g), ln(sa_nw_g), ln(sa_ne_g), east_share, north_share);
  },
};

/** The ordinate of a place from those of the four nodes around it. */
export const GRID_BILINEAR = record({
  id: 'grid/spectrum/bilinear',
  title: 'Ordinate of a hazard grid, bilinear in ln S_a',
  family: fourNodes,
  constants: {},
  source: { ...SOURCE, clause: 'bilinear in ln S_a between four nodes' },
  verified: 'mechanics',
  limits: [],
});

export const GRID_RECORDS: readonly AnyRecord[] = [GRID_SHARE, GRID_BILINEAR];

/** Interpolation on a hazard grid, worked by hand. */
import { exactly, half } from './case.js';
import type { ReferenceCase } from './case.js';

const SHARE = 'grid/place/share';
const BILINEAR = 'grid/spectrum/bilinear';
const own = { mark: 'own arithmetic' } as const;

export const GRID_CASES: readonly ReferenceCase[] = [
  {
    id: 'grid-share-half',
    method: SHARE,
    inputs: { place_deg: 13.25, line_1_deg: 13, line_2_deg: 13.5 },
    ...exactly(0.5),
    source: '0.25 of a step of 0.5',
    ...own,
  },
  {
    id: 'grid-share-west',
    method: SHARE,
    inputs: { place_deg: -71.2, line_1_deg: -71.5, line_2_deg: -71 },
    ...exactly(0.6),
    source: '0.3 of a step of 0.5, longitudes west',
    ...own,
  },
  {
    id: 'grid-bilinear-middle',
    method: BILINEAR,
    inputs: { east_share: 0.5, north_share: 0.5, sa_sw_g: 0.2, sa_se_g: 0.4, sa_nw_g: 0.3, sa_ne_g: 0.6 },
    expected: 0.346410162,
    tolerance: half(9),
    source: 'in the middle the geometric mean: (0.2 × 0.4 × 0.3 × 0.6)^(1/4) = √0.12',
    ...own,
  },
  {
    id: 'grid-bilinear-edge',
    method: BILINEAR,
    inputs: { east_share: 0.25, north_share: 0, sa_sw_g: 0.1, sa_se_g: 1.6, sa_nw_g: 0.9, sa_ne_g: 0.9 },
    ...exactly(0.2),
    source: 'on the southern edge the northern nodes do not count: 0.1 × 16^(1/4)',
    ...own,
  },
  {
    id: 'grid-bilinear-inside',
    method: BILINEAR,
    inputs: { east_share: 0.5, north_share: 0.25, sa_sw_g: 0.01, sa_se_g: 0.16, sa_nw_g: 0.64, sa_ne_g: 0.64 },
    ...exactly(0.08),
    source: 'south √(0.01 × 0.16) = 0.04, north 0.64; 0.04 × 16^(1/4) = 0.08',
    ...own,
  },
  {
    id: 'grid-bilinear-node',
    method: BILINEAR,
    inputs: { east_share: 1, north_share: 1, sa_sw_g: 0.2, sa_se_g: 0.4, sa_nw_g: 0.3, sa_ne_g: 0.7 },
    ...exactly(0.7),
    source: 'at a node the ordinate of the node',
    ...own,
  },
];

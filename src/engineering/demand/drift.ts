/** Roof displacement, storey drift, and the drifts at which systems are said to be past use, past safety, near collapse. */
import type { System } from '../building.js';
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';

const MIRANDA = { standard: 'Miranda', edition: '1999', clause: 'roof displacement β₁ S_d, largest drift β₂ u/H' };

interface RoofInput {
  readonly sd_m: number;
  readonly participation: number;
  readonly c1: number;
  readonly c2: number;
}
const roof: Family<RoofInput, Record<never, number>> = {
  id: 'demand/roof-displacement',
  yields: 'roof_displacement_m',
  unit: 'm',
  symbol: 'u_roof',
  inputs: [
    { name: 'sd_m', kind: 'number', unit: 'm', meaning: 'spectral displacement' },
    { name: 'participation', kind: 'number', meaning: 'roof participation of the first mode, β₁' },
    { name: 'c1', kind: 'number', meaning: 'inelastic over elastic displacement' },
    { name: 'c2', kind: 'number', meaning: 'loss of stiffness and strength' },
  ],
  expression: 'participation * c1 * c2 * sd_m',
  evaluate: ({ participation, c1, c2, sd_m }) => participation * c1 * c2 * sd_m,
};
export const ROOF_DISPLACEMENT = record({
  id: 'miranda-1999/drift/roof',
  title: 'Roof displacement, inelastic',
  family: roof,
  constants: {},
  source: MIRANDA,
  verified: 'restated',
  limits: [],
});

interface StoreyInput {
  readonly roof_displacement_m: number;
  readonly height_m: number;
  readonly drift_factor: number;
}
const storey: Family<StoreyInput, Record<never, number>> = {
  id: 'demand/storey-drift',
  yields: 'drift_ratio',
  unit: null,
  symbol: 'θ_max',
  inputs: [
    { name: 'roof_displacement_m', kind: 'number', unit: 'm', meaning: 'roof displacement' },
    { name: 'height_m', kind: 'number', unit: 'm', meaning: 'height above ground' },
    { name: 'drift_factor', kind: 'number', meaning: 'largest over mean drift, β₂' },
  ],
  expression: 'drift_factor * roof_displacement_m / height_m',
  evaluate: ({ roof_displacement_m, height_m, drift_factor }) => (drift_factor * roof_displacement_m) / height_m,
};
export const STOREY_DRIFT = record({
  id: 'miranda-1999/drift/storey',
  title: 'Largest storey drift',
  family: storey,
  constants: {},
  source: MIRANDA,
  verified: 'restated',
  limits: [],
});

/** Drift ratios at immediate occupancy, life safety, collapse prevention: FEMA 356 Table C1-3, from memory; nearest kind for the others. */
type Marks = readonly [number, number, number];
const CONCRETE_FRAME: Marks = [0.01, 0.02, 0.04];
const STEEL_FRAME: Marks = [0.007, 0.025, 0.05];
const BRACED: Marks = [0.005, 0.015, 0.02];
const CONCRETE_WALL: Marks = [0.005, 0.01, 0.02];
const INFILL: Marks = [0.001, 0.005, 0.006];
const URM: Marks = [0.003, 0.006, 0.01];
const RM: Marks = [0.002, 0.006, 0.015];
const TIMBER: Marks = [0.01, 0.02, 0.03];

export const DRIFT_MARKS: Readonly<Record<System, Marks>> = {
  'steel-moment-frame': STEEL_FRAME,
  'steel-concentric-braced-frame': BRACED,
  'steel-eccentric-braced-frame': BRACED,
  'steel-buckling-restrained-braced-frame': BRACED,
  'steel-light-frame': TIMBER,
  'concrete-moment-frame': CONCRETE_FRAME,
  'concrete-infilled-frame': INFILL,
  'concrete-shear-wall': CONCRETE_WALL,
  'concrete-wall-frame': CONCRETE_WALL,
  'precast-concrete-frame': CONCRETE_FRAME,
  'precast-tilt-up-wall': CONCRETE_WALL,
  'reinforced-masonry-wall': RM,
  'confined-masonry-wall': RM,
  'unreinforced-masonry-wall': URM,
  'timber-light-frame': TIMBER,
  'timber-post-and-beam': TIMBER,
};
export const MARK_NAMES = ['immediate occupancy', 'life safety', 'collapse prevention'] as const;

/** The last mark that a drift passes, or null; with the marks of the system. */
export function driftMark(
  system: System,
  drift_ratio: number,
): { readonly passed: (typeof MARK_NAMES)[number] | null; readonly marks: Marks } {
  const marks = DRIFT_MARKS[system];
  const beyond = marks.filter((mark) => drift_ratio > mark).length;
  return { passed: beyond === 0 ? null : MARK_NAMES[beyond - 1]!, marks };
}

export const DRIFT_RECORDS: readonly AnyRecord[] = [ROOF_DISPLACEMENT, STOREY_DRIFT];

/** Wall and frame in parallel: a bending and a shear cantilever tied along their height. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { wallFrameMode, wallFrameRoot } from '../numeric/wall-frame.js';
import { HEIGHT, plain, quantity } from './specs.js';
import type { None } from './specs.js';

interface Alpha {
  readonly stiffness_ratio: number;
}
const ALPHA = plain('stiffness_ratio', 'α = H √(GA/EI), frame over wall');

const alphaOf: Family<
  { readonly height_m: number; readonly shear_rigidity_kN: number; readonly flexural_rigidity_kN_m2: number },
  None
> = {
  id: 'stiffness/wall-frame-ratio',
  yields: 'stiffness_ratio',
  unit: null,
  symbol: 'α',
  inputs: [
    HEIGHT,
    quantity('shear_rigidity', 'kN', 'of the frame: storey stiffness × storey height'),
    quantity('flexural_rigidity', 'kN_m2', 'EI of the walls'),
  ],
  expression: 'height_m * sqrt(shear_rigidity_kN / flexural_rigidity_kN_m2)',
  evaluate: ({ height_m, shear_rigidity_kN, flexural_rigidity_kN_m2 }) =>
    height_m * Math.sqrt(shear_rigidity_kN / flexural_rigidity_kN_m2),
};

const EQUATION =
  '2 + (2 + α⁴/(γ²β²)) cos γ cosh β + (α²/(γβ)) sin γ sinh β = 0, β² = γ² + α², solved for γ by bisection to 1e-12';

const period: Family<
  Alpha & {
    readonly height_m: number;
    readonly mass_per_height_t_per_m: number;
    readonly flexural_rigidity_kN_m2: number;
  },
  None
> = {
  id: 'stiffness/wall-frame-period',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [
    HEIGHT,
    quantity('mass_per_height', 't_per_m', 'mass over height'),
    quantity('flexural_rigidity', 'kN_m2', 'EI of the walls'),
    ALPHA,
  ],
  expression: null,
  procedure: `T = 2π H² √(μ/EI)/(γβ); ${EQUATION}`,
  evaluate: ({ height_m, mass_per_height_t_per_m, flexural_rigidity_kN_m2, stiffness_ratio }) => {
    const gamma = wallFrameRoot(stiffness_ratio);
    const beta = Math.sqrt(gamma * gamma + stiffness_ratio * stiffness_ratio);
    return (
      (2 * Math.PI * height_m * height_m * Math.sqrt(mass_per_height_t_per_m / flexural_rigidity_kN_m2)) /
      (gamma * beta)
    );
  },
};

const root: Family<Alpha & { readonly mode: number }, None> = {
  id: 'stiffness/wall-frame-root',
  yields: 'root',
  unit: null,
  symbol: 'γ',
  inputs: [ALPHA, { name: 'mode', kind: 'number', meaning: '1 the fundamental, 2 the next', fallback: 1 }],
  expression: null,
  procedure: EQUATION,
  evaluate: ({ stiffness_ratio, mode }) => wallFrameRoot(stiffness_ratio, mode),
};

const participation: Family<Alpha, None> = {
  id: 'stiffness/wall-frame-participation',
  yields: 'participation',
  unit: null,
  symbol: 'Γ',
  inputs: [ALPHA],
  expression: null,
  procedure: 'Γ = ∫φ / ∫φ² over the height, φ the first mode of wall with frame, 1 at the roof',
  evaluate: ({ stiffness_ratio }) => wallFrameMode(stiffness_ratio).participation,
};
const massShare: Family<Alpha, None> = {
  ...participation,
  id: 'stiffness/wall-frame-mass-share',
  yields: 'effective_mass_share',
  symbol: 'M*/M',
  procedure: 'M*/M = (∫φ)² / ∫φ² over the height, φ the first mode of wall with frame',
  evaluate: ({ stiffness_ratio }) => wallFrameMode(stiffness_ratio).effectiveMassShare,
};
const drift: Family<Alpha, None> = {
  ...participation,
  id: 'stiffness/wall-frame-drift',
  yields: 'drift_factor',
  symbol: 'β₂',
  procedure: 'largest slope of the first mode of wall with frame over its mean slope',
  evaluate: ({ stiffness_ratio }) => wallFrameMode(stiffness_ratio).driftFactor,
};

const MIRANDA = (clause: string) => ({ standard: 'Miranda and Taghavi', edition: '2005', clause });
const common = { constants: {}, limits: [] } as const;

export const WALL_FRAME_RATIO = record({
  ...common,
  id: 'miranda-taghavi-2005/ratio/wall-with-frame',
  title: 'Frame over wall, α',
  family: alphaOf,
  source: MIRANDA('α = H √(GA/EI)'),
  verified: 'restated',
});
export const WALL_FRAME_PERIOD = record({
  ...common,
  id: 'miranda-taghavi-2005/period/wall-with-frame',
  title: 'Wall with frame',
  family: period,
  source: MIRANDA('eq. 6'),
  verified: 'restated',
});

export const WALL_FRAME_RECORDS: readonly AnyRecord[] = [
  WALL_FRAME_RATIO,
  WALL_FRAME_PERIOD,
  record({
    ...common,
    id: 'miranda-taghavi-2005/ratio/root',
    title: 'Root of the characteristic equation of wall with frame',
    family: root,
    source: MIRANDA('eq. 6'),
    verified: 'restated',
  }),
  record({
    ...common,
    id: 'miranda-taghavi-2005/participation/roof',
    title: 'Roof participation of wall with frame',
    family: participation,
    source: MIRANDA('mode shape'),
    verified: 'restated',
  }),
  record({
    ...common,
    id: 'miranda-taghavi-2005/mass/effective-share',
    title: 'Effective mass of wall with frame over the total',
    family: massShare,
    source: MIRANDA('mode shape'),
    verified: 'restated',
  }),
  record({
    ...common,
    id: 'miranda-taghavi-2005/drift/largest-over-mean',
    title: 'Largest drift of wall with frame over the mean one',
    family: drift,
    source: MIRANDA('mode shape'),
    verified: 'restated',
  }),
];

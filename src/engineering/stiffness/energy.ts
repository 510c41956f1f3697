/** Energy and bounding methods: Rayleigh, Dunkerley, series and parallel, gravity sway. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { MASSES, STIFFNESSES, list, mechanics, plain, quantity } from './specs.js';
import type { None } from './specs.js';
import type { ChainInput } from './chain.js';

const GRAVITY_MPS2 = 9.80665;

function paired(a: readonly number[], b: readonly number[], what: string): void {
  if (a.length === 0 || a.length !== b.length)
    throw new RangeError(`as many masses as ${what} are needed, got ${String(a.length)} and ${String(b.length)}`);
}

const rayleighShape: Family<ChainInput & { readonly shape: readonly number[] }, None> = {
  id: 'stiffness/rayleigh-shape',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [MASSES, STIFFNESSES, { name: 'shape', kind: 'list', meaning: 'assumed displacements, bottom to top' }],
  expression: null,
  procedure: 'T = 2π √(Σ m φ² / Σ k (φ(i) - φ(i-1))²): never longer than the true period, whatever the shape',
  evaluate: ({ masses_t, storey_stiffness_kN_per_m, shape }) => {
    paired(masses_t, storey_stiffness_kN_per_m, 'storey stiffnesses');
    paired(masses_t, shape, 'displacements of the shape');
    let kinetic = 0;
    let strain = 0;
    masses_t.forEach((mass, i) => {
      const step = shape[i]! - (shape[i - 1] ?? 0);
      kinetic += mass * shape[i]! * shape[i]!;
      strain += storey_stiffness_kN_per_m[i]! * step * step;
    });
    return 2 * Math.PI * Math.sqrt(kinetic / strain);
  },
};

const DISPLACEMENTS = list('displacements', 'm', 'sways of the floors under the forces');
const rayleighForces: Family<
  {
    readonly masses_t: readonly number[];
    readonly forces_kN: readonly number[];
    readonly displacements_m: readonly number[];
  },
  None
> = {
  id: 'stiffness/rayleigh-forces',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [MASSES, list('forces', 'kN', 'any plausible lateral forces on the floors'), DISPLACEMENTS],
  expression: null,
  procedure: 'T = 2π √(Σ m δ² / Σ f δ)',
  evaluate: ({ masses_t, forces_kN, displacements_m }) => {
    paired(masses_t, forces_kN, 'forces');
    paired(masses_t, displacements_m, 'displacements');
    let kinetic = 0;
    let work = 0;
    masses_t.forEach((mass, i) => {
      kinetic += mass * displacements_m[i]! * displacements_m[i]!;
      work += forces_kN[i]! * displacements_m[i]!;
    });
    return 2 * Math.PI * Math.sqrt(kinetic / work);
  },
};

const rayleighGravity: Family<
  { readonly masses_t: readonly number[]; readonly displacements_m: readonly number[] },
  { readonly gravity_mps2: number }
> = {
  id: 'stiffness/rayleigh-gravity',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [MASSES, { ...DISPLACEMENTS, meaning: 'sways of the floors under their own weight applied sideways' }],
  expression: null,
  procedure: 'T = 2π √(Σ m δ² / (g Σ m δ))',
  evaluate: ({ masses_t, displacements_m }, { gravity_mps2 }) => {
    paired(masses_t, displacements_m, 'displacements');
    let kinetic = 0;
    let work = 0;
    masses_t.forEach((mass, i) => {
      kinetic += mass * displacements_m[i]! * displacements_m[i]!;
      work += mass * displacements_m[i]!;
    });
    return 2 * Math.PI * Math.sqrt(kinetic / (gravity_mps2 * work));
  },
};

const dunkerley: Family<ChainInput, None> = {
  id: 'stiffness/dunkerley',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [MASSES, STIFFNESSES],
  expression: null,
  procedure: 'T = 2π √(Σ m(i) Σ_{j≤i} 1/k(j)), the trace of the flexibility: never shorter than the true period',
  evaluate: ({ masses_t, storey_stiffness_kN_per_m }) => {
    paired(masses_t, storey_stiffness_kN_per_m, 'storey stiffnesses');
    let flexibility = 0;
    let trace = 0;
    masses_t.forEach((mass, i) => {
      flexibility += 1 / storey_stiffness_kN_per_m[i]!;
      trace += mass * flexibility;
    });
    return 2 * Math.PI * Math.sqrt(trace);
  },
};

interface TwoPeriods {
  readonly period_1_s: number;
  readonly period_2_s: number;
}
const PARTS = [quantity('period_1', 's', 'with one part flexible'), quantity('period_2', 's', 'with the other')];
const series: Family<TwoPeriods, None> = {
  id: 'stiffness/series',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: PARTS,
  expression: 'sqrt(period_1_s * period_1_s + period_2_s * period_2_s)',
  evaluate: ({ period_1_s, period_2_s }) => Math.sqrt(period_1_s * period_1_s + period_2_s * period_2_s),
};
const parallel: Family<TwoPeriods, None> = {
  ...series,
  id: 'stiffness/parallel',
  expression: '1 / sqrt(1 / (period_1_s * period_1_s) + 1 / (period_2_s * period_2_s))',
  evaluate: ({ period_1_s, period_2_s }) =>
    1 / Math.sqrt(1 / (period_1_s * period_1_s) + 1 / (period_2_s * period_2_s)),
};

const gravitySway: Family<{ readonly top_displacement_m: number }, { readonly gravity_mps2: number }> = {
  id: 'stiffness/gravity-sway',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [quantity('top_displacement', 'm', 'sway when the own weight acts sideways')],
  expression: '2 * pi * sqrt(top_displacement_m / gravity_mps2)',
  evaluate: ({ top_displacement_m }, { gravity_mps2 }) => 2 * Math.PI * Math.sqrt(top_displacement_m / gravity_mps2),
};

const damped: Family<{ readonly period_s: number; readonly damping_ratio: number }, None> = {
  id: 'stiffness/damped',
  yields: 'period_s',
  unit: 's',
  symbol: 'T_D',
  inputs: [quantity('period', 's', 'undamped period'), plain('damping_ratio', 'share of critical damping')],
  expression: 'period_s / sqrt(1 - damping_ratio * damping_ratio)',
  evaluate: ({ period_s, damping_ratio }) => period_s / Math.sqrt(1 - damping_ratio * damping_ratio),
};

const plainRecord = { constants: {}, limits: [] } as const;

export const ENERGY_RECORDS: readonly AnyRecord[] = [
  record({
    ...plainRecord,
    id: 'mechanics/period/rayleigh-shape',
    title: 'Rayleigh quotient of an assumed shape',
    family: rayleighShape,
    source: mechanics('Rayleigh; Thomson, Theory of Vibration'),
    verified: 'restated',
  }),
  record({
    ...plainRecord,
    id: 'asce7-22/period/rayleigh-forces',
    title: 'Rayleigh from forces and sways',
    family: rayleighForces,
    source: { standard: 'ASCE/SEI 7', edition: '22', clause: 'eq. 15.4-6' },
    verified: 'restated',
  }),
  record({
    id: 'mechanics/period/rayleigh-gravity',
    title: 'Rayleigh from the sways under the own weight',
    family: rayleighGravity,
    constants: { gravity_mps2: GRAVITY_MPS2 },
    source: mechanics('Rayleigh; textbook'),
    verified: 'restated',
    limits: [],
  }),
  record({
    ...plainRecord,
    id: 'mechanics/period/dunkerley',
    title: 'Dunkerley, the lower bound of the frequency',
    family: dunkerley,
    source: mechanics('Thomson, Theory of Vibration, eq. 12.2-3'),
    verified: 'restated',
  }),
  record({
    ...plainRecord,
    id: 'mechanics/period/series',
    title: 'Two flexibilities one after the other',
    family: series,
    source: mechanics('sum of squares, each part flexible and the rest rigid (Dunkerley)'),
    verified: 'restated',
    note: 'Too long, exact with one mass only.',
  }),
  record({
    ...plainRecord,
    id: 'mechanics/period/parallel',
    title: 'Two stiffnesses side by side',
    family: parallel,
    source: mechanics('Southwell'),
    verified: 'memory',
    note: 'Too long, by up to 18 % for a wall with a frame.',
  }),
  record({
    id: 'mechanics/period/gravity-sway',
    title: 'Period from the sway under gravity, one mass',
    family: gravitySway,
    constants: { gravity_mps2: GRAVITY_MPS2 },
    source: mechanics('one mass: g/Δ = ω²'),
    verified: 'mechanics',
    limits: [],
  }),
  record({
    id: 'mechanics/period/damped',
    title: 'Damped period',
    family: damped,
    constants: {},
    source: mechanics('textbook'),
    verified: 'memory',
    limits: [
      {
        input: 'damping_ratio',
        from: 0,
        to: 0.99,
        whose: 'ours',
        outside: 'reject',
        text: 'less than critical damping',
      },
    ],
  }),
];

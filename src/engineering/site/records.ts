/** The ground's own period, and how close a building comes to it. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';

const oneLayer: Family<
  { readonly layer_depth_m: number; readonly layer_velocity_mps: number },
  Record<never, number>
> = {
  id: 'site/one-layer',
  yields: 'site_period_s',
  unit: 's',
  symbol: 'T_s',
  inputs: [
    { name: 'layer_depth_m', kind: 'number', unit: 'm', meaning: 'depth of the soft ground' },
    { name: 'layer_velocity_mps', kind: 'number', unit: 'mps', meaning: 'its shear-wave velocity' },
  ],
  expression: '4 * layer_depth_m / layer_velocity_mps',
  evaluate: ({ layer_depth_m, layer_velocity_mps }) => (4 * layer_depth_m) / layer_velocity_mps,
};

const layers: Family<
  { readonly layer_depths_m: readonly number[]; readonly layer_velocities_mps: readonly number[] },
  Record<never, number>
> = {
  ...(oneLayer as Omit<typeof oneLayer, 'shownAt'>),
  id: 'site/layers',
  inputs: [
    { name: 'layer_depths_m', kind: 'list', unit: 'm', meaning: 'thickness of each layer' },
    { name: 'layer_velocities_mps', kind: 'list', unit: 'mps', meaning: 'shear-wave velocity of each layer' },
  ],
  expression: null,
  procedure: 'T_s = 4 ΣH / V, V = ΣH / Σ(H/V) the velocity by travel time',
  evaluate: ({ layer_depths_m, layer_velocities_mps }) => {
    if (layer_depths_m.length === 0 || layer_depths_m.length !== layer_velocities_mps.length)
      throw new RangeError(
        `as many velocities as layers are needed, got ${String(layer_velocities_mps.length)} and ${String(layer_depths_m.length)}`,
      );
    return 4 * layer_depths_m.reduce((sum, depth, i) => sum + depth / layer_velocities_mps[i]!, 0);
  },
};

interface Two {
  readonly period_s: number;
  readonly site_period_s: number;
}
const TWO = [
  { name: 'period_s', kind: 'number', unit: 's', meaning: 'fundamental period of the building' },
  { name: 'site_period_s', kind: 'number', unit: 's', meaning: 'period of the ground' },
] as const;
const ratio: Family<Two, Record<never, number>> = {
  id: 'site/period-ratio',
  yields: 'site_ratio',
  unit: null,
  symbol: 'T/T_s',
  inputs: TWO,
  expression: 'period_s / site_period_s',
  evaluate: ({ period_s, site_period_s }) => period_s / site_period_s,
};

const resonance: Family<
  Two,
  { readonly least_period_s: number; readonly site_from_s: number; readonly site_to_s: number }
> = {
  id: 'site/resonance-1976',
  yields: 'site_factor',
  unit: null,
  symbol: 'S',
  inputs: TWO,
  expression: null,
  procedure:
    'r = T/T_s, T at least 0.3 s, T_s 0.5 to 2.5 s; S = 1 + r - 0.5 r² up to r = 1, 1.2 + 0.6 r - 0.3 r² beyond, at least 1',
  evaluate: ({ period_s, site_period_s }, { least_period_s, site_from_s, site_to_s }) => {
    const r = Math.max(period_s, least_period_s) / Math.min(site_to_s, Math.max(site_from_s, site_period_s));
    return Math.max(1, r <= 1 ? 1 + r - 0.5 * r * r : 1.2 + 0.6 * r - 0.3 * r * r);
  },
};

export const SITE_RATIO = record({
  id: 'mechanics/ratio/building-over-site',
  title: 'Period of the building over that of the ground',
  family: ratio,
  constants: {},
  source: { standard: 'soil dynamics', edition: '', clause: 'resonance' },
  verified: 'mechanics',
  limits: [],
});

export const SITE_RECORDS: readonly AnyRecord[] = [
  record({
    id: 'mechanics/period/site-layer',
    title: 'Period of the ground, one soft layer on firm ground',
    family: oneLayer,
    constants: {},
    source: { standard: 'soil dynamics', edition: '', clause: '4H/V_s, quarter wave' },
    verified: 'restated',
    limits: [],
  }),
  record({
    id: 'mechanics/period/site-layers',
    title: 'Period of the ground, several layers',
    family: layers,
    constants: {},
    source: { standard: 'soil dynamics', edition: '', clause: '4 ΣH/V by travel time' },
    verified: 'memory',
    limits: [],
    note: 'Within some 20 %.',
  }),
  SITE_RATIO,
  record({
    id: 'ubc-1976/site/resonance',
    title: 'Site-structure resonance coefficient',
    family: resonance,
    constants: { least_period_s: 0.3, site_from_s: 0.5, site_to_s: 2.5 },
    source: { standard: 'UBC', edition: '1976', clause: '2312(d)' },
    verified: 'memory',
    limits: [],
    note: 'To the edition of 1982. Where the period of the ground is not known the code takes 1.5.',
  }),
];

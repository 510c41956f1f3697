/** Site, damping, return period and near-fault factors. */
import { exactly, half } from './case.js';
import type { ReferenceCase } from './case.js';

type Row = readonly [id: string, inputs: ReferenceCase['inputs'], expected: number, tolerance: number];
type Rest = Pick<ReferenceCase, 'source' | 'mark'> & { readonly note?: string };

const rows = (method: string, rest: Rest, ...list: readonly Row[]): readonly ReferenceCase[] =>
  list.map(([id, inputs, expected, tolerance]) => ({ id, method, inputs, expected, tolerance, ...rest }));

const SAN_JOAQUIN = 'USGS Design Maps detailed report filed by San Joaquin County, ASCE 7-10 tables';
const EUGENE = 'Design report filed by City of Eugene, IBC 2012 table 1613.3.3';
const SANTA_ANA = 'Report filed with City of Santa Ana';
const ELF = 'Published ELF calculation example, ASCE 7-16';
const BERKELEY = 'UC Berkeley CE 120, homework 7 of 2015, ASCE 7-10';

const SITE: readonly ReferenceCase[] = [
  ...rows('asce7-10/site-factor/short-period', { source: SAN_JOAQUIN, mark: 'restated' }, [
    'SP-01-fa',
    { site_class: 'D', ss_g: 0.943 },
    1.123,
    half(3),
  ]),
  ...rows('asce7-10/site-factor/one-second', { source: SAN_JOAQUIN, mark: 'restated' }, [
    'SP-01-fv',
    { site_class: 'D', s1_g: 0.344 },
    1.712,
    half(3),
  ]),
  ...rows(
    'asce7-10/site-factor/short-period',
    { source: SAN_JOAQUIN, mark: 'restated', note: 'the report held more digits of S_S than it prints' },
    ['SP-03', { site_class: 'E', ss_g: 0.97 }, 0.935, 0.002],
  ),
  ...rows('asce7-10/site-factor/short-period', { source: EUGENE, mark: 'restated' }, [
    'SP-04-fa',
    { site_class: 'D', ss_g: 0.762 },
    1.195,
    half(3),
  ]),
  ...rows('asce7-10/site-factor/one-second', { source: EUGENE, mark: 'restated' }, [
    'SP-04-fv',
    { site_class: 'D', s1_g: 0.4 },
    1.6,
    half(3),
  ]),
  ...rows('asce7-16/site-factor/short-period', { source: SANTA_ANA, mark: 'restated' }, [
    'SP-06-fa',
    { site_class: 'D', ss_g: 1.288 },
    1,
    half(3),
  ]),
  ...rows('asce7-16/site-factor/one-second', { source: SANTA_ANA, mark: 'restated' }, [
    'SP-06-fv',
    { site_class: 'D', s1_g: 0.459 },
    1.841,
    half(3),
  ]),
  ...rows('asce7-05/site-factor/short-period', { source: SANTA_ANA, mark: 'restated' }, [
    'SP-12-fa',
    { site_class: 'D', ss_g: 1.39 },
    1,
    half(2),
  ]),
  ...rows('asce7-05/site-factor/one-second', { source: SANTA_ANA, mark: 'restated' }, [
    'SP-12-fv',
    { site_class: 'D', s1_g: 0.5 },
    1.5,
    half(2),
  ]),
  ...rows('asce7-10/site-factor/short-period', { source: BERKELEY, mark: 'restated' }, [
    'SP-13-fa',
    { site_class: 'C', ss_g: 2.466 },
    1,
    half(2),
  ]),
  ...rows('asce7-10/site-factor/one-second', { source: BERKELEY, mark: 'restated' }, [
    'SP-13-fv',
    { site_class: 'C', s1_g: 1.025 },
    1.3,
    half(2),
  ]),
  ...rows('asce7-16/site-factor/short-period', { source: ELF, mark: 'restated' }, [
    'SP-15-fa',
    { site_class: 'C', ss_g: 1.5 },
    1.2,
    half(2),
  ]),
  ...rows('asce7-16/site-factor/one-second', { source: ELF, mark: 'restated' }, [
    'SP-15-fv',
    { site_class: 'C', s1_g: 0.5 },
    1.5,
    half(2),
  ]),
  ...rows(
    'asce7-16/site-factor/short-period',
    { source: 'ASCE 7-16 11.4.4: class D as the default class takes F_a of at least 1.2', mark: 'restated' },
    ['default-class-low', { site_class: 'default', ss_g: 0.625 }, 1.3, half(3)],
    ['default-class-high', { site_class: 'default', ss_g: 1.1 }, 1.2, half(3)],
  ),
  ...rows(
    'asce7-16/site-factor/one-second',
    {
      source: 'ASCE 7-16 Supplement 1, table 11.4-2: class E at S_1 = 0.4 g (a review paper prints 2.2)',
      mark: 'restated',
    },
    ['class-e-at-0.4', { site_class: 'E', s1_g: 0.4 }, 2.4, half(2)],
  ),
  ...rows(
    'asce7-16/design-value/short-period',
    { source: `${SANTA_ANA}: 2/3 of F_a S_S, F_a given`, mark: 'restated' },
    ['SP-07-sds', { ss_g: 1.277, fa: 1.2 }, 1.022, half(3)],
    ['SP-09-sds', { ss_g: 1.319, fa: 1.2 }, 1.055, half(3)],
  ),
  ...rows(
    'asce7-16/design-value/one-second',
    { source: `${SANTA_ANA}: 2/3 of F_v S_1, F_v given`, mark: 'restated' },
    ['SP-07-sd1', { s1_g: 0.458, fv: 1.5 }, 0.458, half(3)],
    ['SP-09-sd1', { s1_g: 0.47, fv: 1.8 }, 0.564, half(3)],
  ),
];

const percent = (value: number): ReferenceCase['inputs'] => ({ damping_ratio: value / 100 });
const WORKED = 'the formula worked elsewhere, four digits';

const DAMPING: readonly ReferenceCase[] = [
  ...rows(
    'en1998-1-2004/damping/eta',
    { source: WORKED, mark: 'own arithmetic' },
    ...[1.1952, 1.0, 0.8165, 0.6325, 0.5505, 0.55].map((eta, i): Row => {
      const damping = [2, 5, 10, 20, 28, 30][i]!;
      return [`SP-51-${String(damping)}`, percent(damping), eta, half(4)];
    }),
  ),
  ...rows('asce41-17/damping/b1', { source: 'Public page that restates ASCE 41-17 (2-3)', mark: 'restated' }, [
    'SP-37',
    percent(5),
    1.0024,
    half(4),
  ]),
  ...rows(
    'asce41-17/damping/b1',
    { source: WORKED, mark: 'own arithmetic' },
    ...[0.8152, 1.0024, 1.2131, 1.5359, 1.8192].map((b1, i): Row => {
      const damping = [2, 5, 10, 20, 30][i]!;
      return [`SP-52-${String(damping)}`, percent(damping), b1, half(4)];
    }),
  ),
  ...rows(
    'nz-assessment/damping/k-zeta',
    { source: '√(7/(2 + 5)) and √(7/(2 + 26))', mark: 'own arithmetic' },
    ['k-zeta-5', percent(5), 1, 1e-12],
    ['k-zeta-26', percent(26), 0.5, 1e-12],
  ),
  ...rows(
    'asce7-16/damping/b-added-damping',
    { source: 'ASCE 7 table 18.7-1; at 15 % half way between 1.2 and 1.5', mark: 'memory' },
    ['b-18-10', percent(10), 1.2, 1e-12],
    ['b-18-15', percent(15), 1.35, 1e-12],
    ['b-18-1', percent(1), 0.8, 1e-12],
  ),
  ...rows(
    'asce7-16/damping/b-isolated',
    { source: 'ASCE 7 table 17.5-1; at 25 % half way between 1.5 and 1.7', mark: 'memory' },
    ['b-17-30', percent(30), 1.7, 1e-12],
    ['b-17-25', percent(25), 1.6, 1e-12],
  ),
  ...rows(
    'is1893-2002/damping/multiplier',
    { source: 'IS 1893:2002 table 3', mark: 'restated' },
    ['is-damping-2', percent(2), 1.4, half(2)],
    ['is-damping-5', percent(5), 1, half(2)],
    ['is-damping-10', percent(10), 0.8, half(2)],
  ),
];

const NZ: readonly ReferenceCase[] = [
  ...rows(
    'nzs1170-5-2004/return-factor/table',
    { source: 'NZS 1170.5 table 3.5', mark: 'restated' },
    ['return-500', { return_period: '500' }, 1, half(2)],
    ['return-2500', { return_period: '2500' }, 1.8, half(2)],
  ),
  ...rows(
    'nzs1170-5-2004/near-fault/factor',
    { source: 'NZS 1170.5 table 3.7: N_max at 2, 3 and 4 s and from 5 s on', mark: 'restated' },
    ['near-fault-2s', { distance_km: 2, return_factor: 1, period_s: 2 }, 1.12, half(2)],
    ['near-fault-3s', { distance_km: 1, return_factor: 1, period_s: 3 }, 1.36, half(2)],
    ['near-fault-4s', { distance_km: 2, return_factor: 1, period_s: 4 }, 1.6, half(2)],
    ['near-fault-6s', { distance_km: 2, return_factor: 1, period_s: 6 }, 1.72, half(2)],
  ),
  ...rows(
    'nzs1170-5-2004/near-fault/factor',
    { source: '1 + (1.36 - 1)(20 - 11)/18; 1 where R is at most 0.75', mark: 'own arithmetic' },
    ['near-fault-11km', { distance_km: 11, return_factor: 1, period_s: 3 }, 1.18, 1e-12],
    ['near-fault-250-years', { distance_km: 1, return_factor: 0.75, period_s: 3 }, 1, 1e-12],
  ),
  // C(T) by hand: T = 0.4 s at the cap 3.0 × 0.7; T = 1 s: 2 (0.5)^0.75 × 1.31 × 0.7; 2 s: 0.66 × 1.31 × 0.7 × 1.12
  ...rows(
    'nzs1170-5-2004/base-shear/design-action',
    { source: 'C_d = C(T) S_p/k_μ with Z 0.4, R 1.8, μ 2, S_p 0.7, worked elsewhere', mark: 'own arithmetic' },
    ...(
      [
        [0.4, 2.1, 0.93545],
        [1, 1.0905038, 0.38168],
        [2, 0.6778464, 0.23725],
      ] as const
    ).map(([period_s, sa_g, expected]): Row => [
      `SP-53-cd-${String(period_s)}s`,
      { sa_g, performance_factor: 0.7, ductility: 2, zone_factor: 0.4, return_factor: 1.8, period_s },
      expected,
      half(5),
    ]),
    [
      'cd-floor',
      { sa_g: 0.01, performance_factor: 0.7, ductility: 2, zone_factor: 0.4, return_factor: 1.8, period_s: 4 },
      0.072,
      1e-12,
    ],
  ),
];

/** F(T) of NBC 2015 as recalled for classes A, B, D and E at PGA_ref 0.1, and D half way to the next column. */
const NBC_ROWS: readonly (readonly [string, number, number, number, number, number])[] = [
  ['f-0p2s', 0.69, 0.77, 1.24, 1.64, 1.165],
  ['f-0p5s', 0.57, 0.65, 1.47, 2.47, 1.385],
  ['f-1s', 0.57, 0.63, 1.55, 2.81, 1.47],
  ['f-2s', 0.58, 0.63, 1.57, 2.9, 1.505],
  ['f-5s', 0.61, 0.64, 1.58, 2.93, 1.53],
];
const NBC: readonly ReferenceCase[] = [
  ...NBC_ROWS.flatMap(([which, a, b, d, e, between]) =>
    rows(
      `nbc-2015/site-factor/${which}`,
      { source: 'NBC 2015 tables 4.1.8.4', mark: 'memory' },
      [`nbc-${which}-a`, { site_class: 'A', pga_ref_g: 0.3 }, a, half(2)],
      [`nbc-${which}-b`, { site_class: 'B', pga_ref_g: 0.3 }, b, half(2)],
      [`nbc-${which}-c`, { site_class: 'C', pga_ref_g: 0.3 }, 1, half(2)],
      [`nbc-${which}-d`, { site_class: 'D', pga_ref_g: 0.05 }, d, half(2)],
      [`nbc-${which}-e`, { site_class: 'E', pga_ref_g: 0.1 }, e, half(2)],
      [`nbc-${which}-d-between`, { site_class: 'D', pga_ref_g: 0.15 }, between, 1e-9],
    ),
  ),
  {
    id: 'nbc-f-10s-b',
    method: 'nbc-2015/site-factor/f-10s',
    inputs: { site_class: 'B', pga_ref_g: 0.2 },
    ...exactly(0.69),
    source: 'NBC 2015 table 4.1.8.4, F(10) of class B',
    mark: 'memory',
  },
];

export const SPECTRUM_FACTOR_CASES: readonly ReferenceCase[] = [...SITE, ...DAMPING, ...NZ, ...NBC];

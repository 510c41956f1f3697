/**
 * The clauses of codes outside North America and Europe written out by hand, as published, with their tables typed again from the
 * data sheet: what the segments are held against. Periods in s, values in g, importance and reduction at 1.
 */
import type { Inputs } from '../../../src/engineering/formula.js';

export interface Clause {
  /** Record id. */
  readonly method: string;
  /** Parameter sets read at 20,000 periods. */
  readonly sets: readonly Inputs[];
  readonly direct: (inputs: Inputs, period_s: number) => number;
}

const n = (inputs: Inputs, name: string): number => inputs[name] as number;

/** Piecewise linear, flat outside. */
function table(xs: readonly number[], ys: readonly number[], x: number): number {
  for (let i = 1; i < xs.length; i += 1) {
    if (x <= xs[i - 1]!) return ys[i - 1]!;
    if (x <= xs[i]!) return ys[i - 1]! + ((x - xs[i - 1]!) / (xs[i]! - xs[i - 1]!)) * (ys[i]! - ys[i - 1]!);
  }
  return ys.at(-1)!;
}

// spectra.md 7.1
const japan: Clause = {
  method: 'japan-rt/spectrum/elastic',
  sets: ['type-1', 'type-2', 'type-3'].map((ground) => ({ zone_factor: 0.9, ground, standard_shear_coefficient: 1 })),
  direct: (inputs, t) => {
    const tc = { 'type-1': 0.4, 'type-2': 0.6, 'type-3': 0.8 }[inputs['ground'] as string]!;
    const rt = t < tc ? 1 : t < 2 * tc ? 1 - 0.2 * (t / tc - 1) ** 2 : (1.6 * tc) / t;
    return n(inputs, 'zone_factor') * rt * n(inputs, 'standard_shear_coefficient');
  },
};

// spectra.md 7.2 with the tables of 1.2
const FS: Record<string, readonly number[]> = {
  ZA: [0.8, 0.8, 0.8, 0.8, 0.8, 0.8],
  ZB: [0.9, 0.9, 0.9, 0.9, 0.9, 0.9],
  ZC: [1.3, 1.3, 1.2, 1.2, 1.2, 1.2],
  ZD: [1.6, 1.4, 1.2, 1.1, 1.0, 1.0],
  ZE: [2.4, 1.7, 1.3, 1.1, 0.9, 0.8],
};
const F1: Record<string, readonly number[]> = {
  ZA: [0.8, 0.8, 0.8, 0.8, 0.8, 0.8],
  ZB: [0.8, 0.8, 0.8, 0.8, 0.8, 0.8],
  ZC: [1.5, 1.5, 1.5, 1.5, 1.5, 1.4],
  ZD: [2.4, 2.2, 2.0, 1.9, 1.8, 1.7],
  ZE: [4.2, 3.3, 2.8, 2.4, 2.2, 2.0],
};
const turkey: Clause = {
  method: 'tbdy-2018/spectrum/elastic',
  sets: Object.keys(FS).flatMap((site_class) => [
    { ss_g: 0.927, s1_g: 0.259, site_class },
    { ss_g: 0.3, s1_g: 0.08, site_class },
    { ss_g: 1.82, s1_g: 0.77, site_class },
  ]),
  direct: (inputs, t) => {
    const sds =
      n(inputs, 'ss_g') *
      table([0.25, 0.5, 0.75, 1, 1.25, 1.5], FS[inputs['site_class'] as string]!, n(inputs, 'ss_g'));
    const sd1 =
      n(inputs, 's1_g') * table([0.1, 0.2, 0.3, 0.4, 0.5, 0.6], F1[inputs['site_class'] as string]!, n(inputs, 's1_g'));
    const [ta, tb, tl] = [(0.2 * sd1) / sds, sd1 / sds, 6];
    if (t < ta) return (0.4 + (0.6 * t) / ta) * sds;
    if (t <= tb) return sds;
    return t <= tl ? sd1 / t : (sd1 * tl) / t ** 2;
  },
};

// spectra.md 7.3
const DS61: Record<string, readonly [number, number, number]> = {
  A: [0.9, 0.15, 2],
  B: [1, 0.3, 1.5],
  C: [1.05, 0.4, 1.6],
  D: [1.2, 0.75, 1],
  E: [1.3, 1.2, 1],
};
const chile: Clause = {
  method: 'nch433-ds61/spectrum/elastic',
  sets: Object.keys(DS61).map((ground) => ({ ag_g: 0.3, ground })),
  direct: (inputs, t) => {
    const [s, to, p] = DS61[inputs['ground'] as string]!;
    return (s * n(inputs, 'ag_g') * (1 + 4.5 * (t / to) ** p)) / (1 + (t / to) ** 3);
  },
};

// spectra.md 7.4
function influence(amax: number, tg: number, z: number, period: number): number {
  const t = Math.min(period, 6);
  const gamma = 0.9 + (0.05 - z) / (0.3 + 6 * z);
  const eta1 = Math.max(0, 0.02 + (0.05 - z) / (4 + 32 * z));
  const eta2 = Math.max(0.55, 1 + (0.05 - z) / (0.08 + 1.6 * z));
  if (t < 0.1) return (0.45 + ((eta2 - 0.45) * t) / 0.1) * amax;
  if (t <= tg) return eta2 * amax;
  if (t <= 5 * tg) return (tg / t) ** gamma * eta2 * amax;
  return (eta2 * 0.2 ** gamma - eta1 * (t - 5 * tg)) * amax;
}
const AMAX: Record<string, readonly [number, number]> = {
  'degree-6': [0.04, 0.28],
  'degree-7': [0.08, 0.5],
  'degree-7-0.15g': [0.12, 0.72],
  'degree-8': [0.16, 0.9],
  'degree-8-0.30g': [0.24, 1.2],
  'degree-9': [0.32, 1.4],
};
const TG: Record<string, readonly [number, number, number]> = {
  I0: [0.2, 0.25, 0.3],
  I1: [0.25, 0.3, 0.35],
  II: [0.35, 0.4, 0.45],
  III: [0.45, 0.55, 0.65],
  IV: [0.65, 0.75, 0.9],
};
const china: Clause = {
  method: 'gb50011-2010/spectrum/elastic',
  sets: Object.keys(TG).flatMap((site_class, i) =>
    ['group-1', 'group-2', 'group-3'].flatMap((design_group) =>
      ['frequent', 'rare'].map((earthquake) => ({
        intensity: Object.keys(AMAX)[i]!,
        earthquake,
        site_class,
        design_group,
      })),
    ),
  ),
  direct: (inputs, t) => {
    const rare = inputs['earthquake'] === 'rare';
    const tg = TG[inputs['site_class'] as string]![Number((inputs['design_group'] as string).slice(-1)) - 1]!;
    return influence(AMAX[inputs['intensity'] as string]![rare ? 1 : 0], tg + (rare ? 0.05 : 0), 0.05, t);
  },
};
const chinaStated: Clause = {
  method: 'gb50011-2010/spectrum/stated-coefficients',
  sets: [{ alpha_max_g: 0.45, tg_s: 0.4 }],
  direct: (inputs, t) => influence(n(inputs, 'alpha_max_g'), n(inputs, 'tg_s'), 0.05, t),
};
const chinaDamped: Clause = {
  method: 'gb50011-2010/spectrum/damped',
  sets: [0.01, 0.02, 0.035, 0.05, 0.1, 0.2, 0.3].map((damping_ratio) => ({
    alpha_max_g: 0.16,
    tg_s: 0.35,
    damping_ratio,
  })),
  direct: (inputs, t) => influence(n(inputs, 'alpha_max_g'), n(inputs, 'tg_s'), n(inputs, 'damping_ratio'), t),
};

// spectra.md 7.5
const italy: Clause = {
  method: 'ntc-2018/spectrum/elastic',
  sets: ['A', 'B', 'C', 'D', 'E'].flatMap((ground) => [
    { ag_g: 0.1, f0: 2.5, tc_star_s: 0.3, ground, topography: 'T1' },
    { ag_g: 0.26, f0: 2.38, tc_star_s: 0.35, ground, topography: 'T4' },
    { ag_g: 0.45, f0: 2.9, tc_star_s: 0.5, ground, topography: 'T2' },
  ]),
  direct: (inputs, t) => {
    const [ag, f0, tcs] = [n(inputs, 'ag_g'), n(inputs, 'f0'), n(inputs, 'tc_star_s')];
    const clamp = (low: number, value: number, high: number): number => Math.min(high, Math.max(low, value));
    const ss = {
      A: 1,
      B: clamp(1, 1.4 - 0.4 * f0 * ag, 1.2),
      C: clamp(1, 1.7 - 0.6 * f0 * ag, 1.5),
      D: clamp(0.9, 2.4 - 1.5 * f0 * ag, 1.8),
      E: clamp(1, 2 - 1.1 * f0 * ag, 1.6),
    }[inputs['ground'] as string]!;
    const cc = { A: 1, B: 1.1 * tcs ** -0.2, C: 1.05 * tcs ** -0.33, D: 1.25 * tcs ** -0.5, E: 1.15 * tcs ** -0.4 }[
      inputs['ground'] as string
    ]!;
    const st = { T1: 1, T2: 1.2, T3: 1.2, T4: 1.4 }[inputs['topography'] as string]!;
    const [s, tc] = [ss * st, cc * tcs];
    const [tb, td] = [tc / 3, 4 * ag + 1.6];
    if (t < tb) return ag * s * f0 * (t / tb + (1 / f0) * (1 - t / tb));
    if (t < tc) return ag * s * f0;
    return t < td ? (ag * s * f0 * tc) / t : (ag * s * f0 * tc * td) / t ** 2;
  },
};

// spectra.md 7.8; the tables of zones and soils from memory
const e030 = (zus: number, tp: number, tl: number, t: number): number =>
  zus * (t < tp ? 2.5 : t <= tl ? (2.5 * tp) / t : (2.5 * tp * tl) / t ** 2);
const peru: Clause = {
  method: 'e030-2018/spectrum/elastic',
  sets: ['S0', 'S1', 'S2', 'S3'].flatMap((ground) =>
    [1, 2, 3, 4].map((zone) => ({ zone: `zone-${String(zone)}`, ground })),
  ),
  direct: (inputs, t) => {
    const i = Number((inputs['zone'] as string).slice(-1)) - 1;
    const [row, tp, tl] = {
      S0: [[0.8, 0.8, 0.8, 0.8], 0.3, 3] as const,
      S1: [[1, 1, 1, 1], 0.4, 2.5] as const,
      S2: [[1.6, 1.2, 1.15, 1.05], 0.6, 2] as const,
      S3: [[2, 1.4, 1.2, 1.1], 1, 1.6] as const,
    }[inputs['ground'] as string]!;
    return e030([0.1, 0.25, 0.35, 0.45][i]! * row[i]!, tp, tl, t);
  },
};
const peruStated: Clause = {
  method: 'e030-2018/spectrum/stated-factors',
  sets: [{ zone_factor: 0.45, site_factor: 1.15, tp_s: 0.6, tl_s: 2 }],
  direct: (inputs, t) =>
    e030(n(inputs, 'zone_factor') * n(inputs, 'site_factor'), n(inputs, 'tp_s'), n(inputs, 'tl_s'), t),
};

// spectra.md 7.9
const nepal: Clause = {
  method: 'nbc105-2020/spectrum/elastic',
  sets: ['A', 'B', 'C', 'D'].map((ground) => ({ zone_factor: 0.35, ground })),
  direct: (inputs, t) => {
    const [ta, tc, a, k] = {
      A: [0.1, 0.5, 2.5, 1.8] as const,
      B: [0.1, 0.7, 2.5, 1.8] as const,
      C: [0.1, 1, 2.5, 1.8] as const,
      D: [0.5, 2, 2.25, 0.8] as const,
    }[inputs['ground'] as string]!;
    const ch = t < ta ? 1 + ((a - 1) * t) / ta : t < tc ? a : a * (k + (1 - k) * (tc / t) ** 2) * (tc / t) ** 2;
    return ch * n(inputs, 'zone_factor');
  },
};

// spectra.md 7.7
function taiwanShape(sds: number, t0: number, t: number): number {
  if (t <= 0.2 * t0) return sds * (0.4 + (3 * t) / t0);
  if (t <= t0) return sds;
  return t <= 2.5 * t0 ? (sds * t0) / t : 0.4 * sds;
}
const taiwan: Clause = {
  method: 'taiwan-2011/spectrum/general',
  sets: [
    { sds_g: 0.8, sd1_g: 0.45 },
    { sds_g: 0.5, sd1_g: 0.6 },
  ],
  direct: (inputs, t) => taiwanShape(n(inputs, 'sds_g'), n(inputs, 'sd1_g') / n(inputs, 'sds_g'), t),
};
const taipei: Clause = {
  method: 'taiwan-2011/spectrum/taipei-basin',
  sets: ['zone-1', 'zone-2', 'zone-3'].map((zone) => ({ sds_g: 0.6, zone })),
  direct: (inputs, t) =>
    taiwanShape(n(inputs, 'sds_g'), { 'zone-1': 1.6, 'zone-2': 1.3, 'zone-3': 1.05 }[inputs['zone'] as string]!, t),
};

// spectra.md 7.6
const korea: Clause = {
  method: 'kds-41-17/spectrum/elastic',
  sets: [{ ag_g: 0.22, fa: 1.36, fv: 1.84 }],
  direct: (inputs, t) => {
    const sds = n(inputs, 'ag_g') * 2.5 * n(inputs, 'fa') * (2 / 3);
    const sd1 = n(inputs, 'ag_g') * n(inputs, 'fv') * (2 / 3);
    const ts = sd1 / sds;
    if (t < 0.2 * ts) return sds * (0.4 + (0.6 * t) / (0.2 * ts));
    if (t <= ts) return sds;
    return t <= 5 ? sd1 / t : (sd1 * 5) / t ** 2;
  },
};

// spectra.md 7.10
const MEXICO: Record<string, readonly [number, number, number, number, number]> = {
  I: [0.16, 0.04, 0.2, 1.35, 1],
  II: [0.32, 0.08, 0.2, 1.35, 1.33],
  IIIa: [0.4, 0.1, 0.53, 1.8, 2],
  IIIb: [0.45, 0.11, 0.85, 3, 2],
  IIIc: [0.4, 0.1, 1.25, 4.2, 2],
  IIId: [0.3, 0.1, 0.85, 4.2, 2],
};
const mexico: Clause = {
  method: 'mexico-ntcs-2004/spectrum/design',
  sets: Object.keys(MEXICO).map((zone) => ({ zone })),
  direct: (inputs, t) => {
    const [c, a0, ta, tb, r] = MEXICO[inputs['zone'] as string]!;
    return t < ta ? a0 + ((c - a0) * t) / ta : t <= tb ? c : c * (tb / t) ** r;
  },
};

export const WORLD_CLAUSES: readonly Clause[] = [
  japan,
  turkey,
  chile,
  china,
  chinaStated,
  chinaDamped,
  italy,
  peru,
  peruStated,
  nepal,
  taiwan,
  taipei,
  korea,
  mexico,
];

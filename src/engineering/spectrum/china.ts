/** China: seismic influence coefficient of GB 50011-2010, 5.1.4 and 5.1.5. */
import { record } from '../formula.js';
import type { InputSpec, MethodRecord } from '../formula.js';
import { power } from '../numeric/power.js';
import { level, rise, rowOf, spectrumFamily, stated, times } from './branches.js';
import type { Shown } from './branches.js';
import type { SpectrumCode } from './code.js';
import type { CompiledSpectrum } from './compiled.js';
import { PERIOD_INPUT } from './family.js';

export interface InfluenceInput {
  readonly intensity: string;
  readonly earthquake: string;
  readonly site_class: string;
  readonly design_group: string;
  readonly period_s: number;
}

export interface StatedInfluenceInput {
  readonly alpha_max_g: number;
  readonly tg_s: number;
  readonly period_s: number;
}

export interface DampedInfluenceInput extends StatedInfluenceInput {
  readonly damping_ratio: number;
}

/** α_max of the frequent and of the rare earthquake. */
export const GB_ALPHA_MAX_G: Readonly<Record<string, readonly [number, number]>> = {
  'degree-6': [0.04, 0.28],
  'degree-7': [0.08, 0.5],
  'degree-7-0.15g': [0.12, 0.72],
  'degree-8': [0.16, 0.9],
  'degree-8-0.30g': [0.24, 1.2],
  'degree-9': [0.32, 1.4],
};
/** T_g of design earthquake groups 1, 2, 3, s. */
export const GB_TG_S: Readonly<Record<string, readonly [number, number, number]>> = {
  I0: [0.2, 0.25, 0.3],
  I1: [0.25, 0.3, 0.35],
  II: [0.35, 0.4, 0.45],
  III: [0.45, 0.55, 0.65],
  IV: [0.65, 0.75, 0.9],
};
const EARTHQUAKES = { frequent: 0, rare: 1 } as const;
const GROUPS = { 'group-1': 0, 'group-2': 1, 'group-3': 2 } as const;
/** T_g is longer by this for the rare earthquake. */
const RARE_TG_S = 0.05;
/** End of the printed curve; beyond it the ordinate is held, since the falling line would cross zero at about 12 s. */
const LONGEST_S = 6;

/** γ, η1 and η2 at a damping ratio. */
function damping(ratio: Shown): { readonly gamma: Shown; readonly eta1: Shown; readonly eta2: Shown } {
  const z = ratio.value;
  if (z === 0.05) return { gamma: stated(0.9), eta1: stated(0.02), eta2: stated(1) };
  const t = ratio.text;
  return {
    gamma: stated(0.9 + (0.05 - z) / (0.3 + 6 * z), `(0.9 + (0.05 - ${t}) / (0.3 + 6 * ${t}))`),
    eta1: stated(Math.max(0, 0.02 + (0.05 - z) / (4 + 32 * z)), `max(0, 0.02 + (0.05 - ${t}) / (4 + 32 * ${t}))`),
    eta2: stated(
      Math.max(0.55, 1 + (0.05 - z) / (0.08 + 1.6 * z)),
      `max(0.55, 1 + (0.05 - ${t}) / (0.08 + 1.6 * ${t}))`,
    ),
  };
}

function compileInfluence(alpha: Shown, tg: Shown, ratio: Shown): CompiledSpectrum {
  const { gamma, eta1, eta2 } = damping(ratio);
  const a = alpha.value;
  const g = tg.value;
  const plateau = eta2.value === 1 ? alpha : times(eta2, alpha);
  const low = eta2.value * power(0.2, gamma.value);
  const lowText = `${eta2.text} * 0.2 ^ ${gamma.text}`;
  const start = 5 * g;
  const tail = (period: string): string => `(${lowText} - ${eta1.text} * (${period} - 5 * ${tg.text})) * ${alpha.text}`;
  return {
    segments: [
      // 0.45 α_max at 0 whatever the damping
      rise(
        { from_s: 0, to_s: 0.1, clause: '0 ≤ T < 0.1 s' },
        plateau,
        stated(0.45 / eta2.value, `(0.45 / ${eta2.text})`),
        stated(0.1),
      ),
      level({ from_s: 0.1, to_s: g, clause: '0.1 s ≤ T ≤ T_g' }, plateau),
      {
        from_s: g,
        to_s: start,
        terms: [{ coefficient: plateau.value * power(g, gamma.value), exponent: -gamma.value }],
        clause: 'T_g < T ≤ 5 T_g',
        expression: `(${tg.text} / period_s) ^ ${gamma.text} * ${plateau.text}`,
      },
      {
        from_s: start,
        to_s: LONGEST_S,
        terms: [
          { coefficient: (low + eta1.value * start) * a, exponent: 0 },
          { coefficient: -eta1.value * a, exponent: 1 },
        ],
        clause: '5 T_g < T ≤ 6 s',
        expression: tail('period_s'),
      },
      level(
        { from_s: LONGEST_S, to_s: Infinity, clause: 'beyond 6 s: the ordinate at 6 s held' },
        stated((low - eta1.value * (LONGEST_S - start)) * a, tail(String(LONGEST_S))),
      ),
    ],
    plateau_from_s: 0.1,
    plateau_to_s: g,
    valid_to_s: LONGEST_S,
  };
}

const AT_5 = stated(0.05);
const ALPHA: InputSpec = {
  name: 'alpha_max_g',
  kind: 'number',
  unit: 'g',
  meaning: 'largest seismic influence coefficient α_max',
  above: 0,
  to: 3,
};
const TG: InputSpec = {
  name: 'tg_s',
  kind: 'number',
  unit: 's',
  meaning: 'characteristic period T_g',
  from: 0.15,
  to: 1.15,
};
const SHAPE =
  '[0.45 + (η2 − 0.45) T/0.1] α_max below 0.1 s, η2 α_max to T_g, (T_g/T)^γ η2 α_max to 5 T_g, [η2 0.2^γ − η1 (T − 5 T_g)] α_max to 6 s';
const SOURCE = { standard: 'GB 50011', edition: '2010', clause: '5.1.5' } as const;
const BEYOND = [
  { input: 'period_s', to: LONGEST_S, whose: 'publication', outside: 'flag', text: 'periods up to 6 s' },
] as const;

export const GB50011_ELASTIC: MethodRecord<InfluenceInput, Record<never, number>> = record({
  id: 'gb50011-2010/spectrum/elastic',
  title: 'Seismic influence coefficient at 5 % damping',
  family: spectrumFamily<InfluenceInput>({
    id: 'spectrum/gb50011-2010',
    symbol: 'α',
    inputs: [
      {
        name: 'intensity',
        kind: 'word',
        words: Object.keys(GB_ALPHA_MAX_G),
        meaning: 'fortification intensity, with the design acceleration where two share it',
      },
      {
        name: 'earthquake',
        kind: 'word',
        words: Object.keys(EARTHQUAKES),
        meaning: 'frequent or rare earthquake (T_g is 0.05 s longer for the rare)',
      },
      { name: 'site_class', kind: 'word', words: Object.keys(GB_TG_S), meaning: 'site class' },
      { name: 'design_group', kind: 'word', words: Object.keys(GROUPS), meaning: 'design earthquake group' },
      PERIOD_INPUT,
    ],
    procedure: `${SHAPE}; γ 0.9, η1 0.02, η2 1; α_max by intensity, T_g by site class and group`,
    compile: ({ intensity, earthquake, site_class, design_group }) => {
      const rare = rowOf(EARTHQUAKES, earthquake, 'earthquake');
      const tg = rowOf(GB_TG_S, site_class, 'site class')[rowOf(GROUPS, design_group, 'design group')];
      return compileInfluence(
        stated(rowOf(GB_ALPHA_MAX_G, intensity, 'intensity')[rare]),
        rare === 1 ? stated(tg + RARE_TG_S, `(${String(tg)} + ${String(RARE_TG_S)})`) : stated(tg),
        AT_5,
      );
    },
  }),
  constants: {},
  source: SOURCE,
  verified: 'restated',
  limits: BEYOND,
});

export const GB50011_STATED: MethodRecord<StatedInfluenceInput, Record<never, number>> = record({
  id: 'gb50011-2010/spectrum/stated-coefficients',
  title: 'Seismic influence coefficient at 5 % damping, from stated α_max and T_g',
  family: spectrumFamily<StatedInfluenceInput>({
    id: 'spectrum/gb50011-stated',
    symbol: 'α',
    inputs: [ALPHA, TG, PERIOD_INPUT],
    procedure: `${SHAPE}; γ 0.9, η1 0.02, η2 1`,
    compile: ({ alpha_max_g, tg_s }) =>
      compileInfluence(stated(alpha_max_g, 'alpha_max_g'), stated(tg_s, 'tg_s'), AT_5),
  }),
  constants: {},
  source: SOURCE,
  verified: 'restated',
  limits: BEYOND,
});

/** Other dampings than 5 %: for a hand calculation, never what ranks. */
export const GB50011_DAMPED: MethodRecord<DampedInfluenceInput, Record<never, number>> = record({
  id: 'gb50011-2010/spectrum/damped',
  title: 'Seismic influence coefficient at another damping',
  family: spectrumFamily<DampedInfluenceInput>({
    id: 'spectrum/gb50011-damped',
    symbol: 'α',
    inputs: [
      ALPHA,
      TG,
      { name: 'damping_ratio', kind: 'number', meaning: 'damping ratio', from: 0.01, to: 0.3, fallback: 0.05 },
      PERIOD_INPUT,
    ],
    procedure: `${SHAPE}; γ = 0.9 + (0.05 − ζ)/(0.3 + 6ζ), η1 = 0.02 + (0.05 − ζ)/(4 + 32ζ) ≥ 0, η2 = 1 + (0.05 − ζ)/(0.08 + 1.6ζ) ≥ 0.55`,
    compile: ({ alpha_max_g, tg_s, damping_ratio }) =>
      compileInfluence(
        stated(alpha_max_g, 'alpha_max_g'),
        stated(tg_s, 'tg_s'),
        stated(damping_ratio, 'damping_ratio'),
      ),
  }),
  constants: {},
  source: SOURCE,
  verified: 'restated',
  limits: BEYOND,
});

export const CHINA_CODES: readonly SpectrumCode[] = [
  { code: 'gb50011-2010', title: 'China, GB 50011-2010, by intensity and site class', record: GB50011_ELASTIC },
  { code: 'gb50011-2010-stated', title: 'China, GB 50011-2010, from stated α_max and T_g', record: GB50011_STATED },
];

/** Italy: horizontal elastic spectrum of NTC 2018, 3.2.3.2.1, at 5 % damping. */
import { record } from '../formula.js';
import type { MethodRecord } from '../formula.js';
import { power } from '../numeric/power.js';
import { fall, fallSquared, level, rise, rowOf, spectrumFamily, stated, times } from './branches.js';
import type { Shown } from './branches.js';
import type { SpectrumCode } from './code.js';
import type { CompiledSpectrum } from './compiled.js';
import { PERIOD_INPUT } from './family.js';

export interface NtcInput {
  readonly ag_g: number;
  readonly f0: number;
  readonly tc_star_s: number;
  readonly ground: string;
  readonly topography: string;
  readonly period_s: number;
}

interface Ground {
  /** S_S = constant - slope F0 ag/g within the limits; null where it is 1. */
  readonly ss: {
    readonly constant: number;
    readonly slope: number;
    readonly least: number;
    readonly most: number;
  } | null;
  /** C_C = coefficient TC*^-exponent; null where it is 1. */
  readonly cc: { readonly coefficient: number; readonly exponent: number } | null;
}

export const NTC_GROUNDS: Readonly<Record<string, Ground>> = {
  A: { ss: null, cc: null },
  B: { ss: { constant: 1.4, slope: 0.4, least: 1, most: 1.2 }, cc: { coefficient: 1.1, exponent: 0.2 } },
  C: { ss: { constant: 1.7, slope: 0.6, least: 1, most: 1.5 }, cc: { coefficient: 1.05, exponent: 0.33 } },
  D: { ss: { constant: 2.4, slope: 1.5, least: 0.9, most: 1.8 }, cc: { coefficient: 1.25, exponent: 0.5 } },
  E: { ss: { constant: 2, slope: 1.1, least: 1, most: 1.6 }, cc: { coefficient: 1.15, exponent: 0.4 } },
};

/** S_T. */
export const NTC_TOPOGRAPHY: Readonly<Record<string, number>> = { T1: 1, T2: 1.2, T3: 1.2, T4: 1.4 };

function stratigraphic({ ss }: Ground, f0: number, ag_g: number): Shown {
  if (ss === null) return stated(1);
  const { constant, slope, least, most } = ss;
  return stated(
    Math.max(least, Math.min(most, constant - slope * f0 * ag_g)),
    `max(${String(least)}, min(${String(most)}, ${String(constant)} - ${String(slope)} * f0 * ag_g))`,
  );
}

function corner({ cc }: Ground, tc_star_s: number): Shown {
  if (cc === null) return stated(tc_star_s, 'tc_star_s');
  const { coefficient, exponent } = cc;
  return stated(
    coefficient * power(tc_star_s, -exponent) * tc_star_s,
    `(${String(coefficient)} * tc_star_s ^ (-${String(exponent)}) * tc_star_s)`,
  );
}

function compileNtc({ ag_g, f0, tc_star_s, ground, topography }: Omit<NtcInput, 'period_s'>): CompiledSpectrum {
  const row = rowOf(NTC_GROUNDS, ground, 'ground');
  const st = rowOf(NTC_TOPOGRAPHY, topography, 'topography');
  const ss = stratigraphic(row, f0, ag_g);
  const tc = corner(row, tc_star_s);
  const tb = stated(tc.value / 3, `${tc.text} / 3`);
  const td = stated(4 * ag_g + 1.6, '(4 * ag_g + 1.6)');
  const plateau = stated(ag_g * ss.value * st * f0, `ag_g * ${ss.text} * ${String(st)} * f0`);
  const velocity = times(plateau, tc);
  return {
    segments: [
      rise({ from_s: 0, to_s: tb.value, clause: '0 ≤ T < TB' }, plateau, stated(1 / f0, '(1 / f0)'), tb),
      level({ from_s: tb.value, to_s: tc.value, clause: 'TB ≤ T < TC' }, plateau),
      fall({ from_s: tc.value, to_s: td.value, clause: 'TC ≤ T < TD' }, velocity),
      fallSquared({ from_s: td.value, to_s: Infinity, clause: 'TD ≤ T' }, times(velocity, td)),
    ],
    plateau_from_s: tb.value,
    plateau_to_s: tc.value,
    valid_to_s: 4,
  };
}

export const NTC_2018: MethodRecord<NtcInput, Record<never, number>> = record({
  id: 'ntc-2018/spectrum/elastic',
  title: 'Horizontal elastic spectrum',
  family: spectrumFamily<NtcInput>({
    id: 'spectrum/ntc-2018',
    symbol: 'S_e',
    inputs: [
      {
        name: 'ag_g',
        kind: 'number',
        unit: 'g',
        meaning: 'largest horizontal acceleration on rigid ground',
        above: 0,
        to: 1.5,
      },
      { name: 'f0', kind: 'number', meaning: 'largest amplification F0 of the spectrum', from: 1.5, to: 5 },
      {
        name: 'tc_star_s',
        kind: 'number',
        unit: 's',
        meaning: 'reference period TC* of the constant-velocity branch',
        from: 0.05,
        to: 1,
      },
      { name: 'ground', kind: 'word', words: Object.keys(NTC_GROUNDS), meaning: 'subsoil category' },
      {
        name: 'topography',
        kind: 'word',
        words: Object.keys(NTC_TOPOGRAPHY),
        meaning: 'topographic category: S_T 1.0, 1.2, 1.2, 1.4',
        fallback: 'T1',
      },
      PERIOD_INPUT,
    ],
    procedure:
      'S = S_S S_T; a_g S F0 [T/TB + (1/F0)(1 − T/TB)] below TB, a_g S F0 to TC, a_g S F0 TC/T to TD, a_g S F0 TC TD/T² beyond; TC = C_C TC*, TB = TC/3, TD = 4 a_g/g + 1.6 (η = 1)',
    compile: compileNtc,
  }),
  constants: {},
  source: { standard: 'NTC', edition: '2018', clause: '3.2.3.2.1' },
  verified: 'restated',
  limits: [
    {
      input: 'period_s',
      to: 4,
      whose: 'publication',
      outside: 'flag',
      text: 'periods up to 4 s (limit from memory)',
    },
  ],
});

export const ITALY_CODES: readonly SpectrumCode[] = [
  { code: 'ntc-2018', title: 'Italy, NTC 2018 elastic spectrum', record: NTC_2018 },
];

/** Japan: the design spectral coefficient R_t of Notification 1793 of 1980, read as a spectrum. */
import { record } from '../formula.js';
import type { MethodRecord } from '../formula.js';
import { fall, level, rowOf, spectrumFamily, stated, times } from './branches.js';
import type { SpectrumCode } from './code.js';
import type { CompiledSpectrum } from './compiled.js';
import { PERIOD_INPUT } from './family.js';

export interface RtInput {
  readonly zone_factor: number;
  readonly ground: string;
  readonly standard_shear_coefficient: number;
  readonly period_s: number;
}

/** T_c, s. */
export const RT_CORNERS_S: Readonly<Record<string, number>> = { 'type-1': 0.4, 'type-2': 0.6, 'type-3': 0.8 };

function compileRt({ zone_factor, ground, standard_shear_coefficient }: Omit<RtInput, 'period_s'>): CompiledSpectrum {
  const tc = rowOf(RT_CORNERS_S, ground, 'ground');
  const plateau = stated(zone_factor * standard_shear_coefficient, 'zone_factor * standard_shear_coefficient');
  return {
    segments: [
      level({ from_s: 0, to_s: tc, clause: 'T < T_c' }, plateau),
      {
        from_s: tc,
        to_s: 2 * tc,
        // 1 - 0.2 (T/T_c - 1)² written out
        terms: [
          { coefficient: 0.8 * plateau.value, exponent: 0 },
          { coefficient: (0.4 * plateau.value) / tc, exponent: 1 },
          { coefficient: (-0.2 * plateau.value) / (tc * tc), exponent: 2 },
        ],
        clause: 'T_c ≤ T < 2 T_c',
        expression: `${plateau.text} * (1 - 0.2 * (period_s / ${String(tc)} - 1) ^ 2)`,
      },
      fall(
        { from_s: 2 * tc, to_s: Infinity, clause: '2 T_c ≤ T' },
        times(plateau, stated(1.6 * tc, `1.6 * ${String(tc)}`)),
      ),
    ],
    plateau_from_s: 0,
    plateau_to_s: tc,
    valid_to_s: Infinity,
  };
}

export const JAPAN_RT: MethodRecord<RtInput, Record<never, number>> = record({
  id: 'japan-rt/spectrum/elastic',
  title: 'Shear coefficient Z R_t C0 of the first storey',
  family: spectrumFamily<RtInput>({
    id: 'spectrum/japan-rt',
    symbol: 'Z R_t C₀',
    inputs: [
      {
        name: 'zone_factor',
        kind: 'number',
        meaning: 'seismic zone coefficient Z, 0.7 to 1.0',
        above: 0,
        to: 1.5,
      },
      {
        name: 'ground',
        kind: 'word',
        words: Object.keys(RT_CORNERS_S),
        meaning: 'ground type 1 (rock, stiff), 2 or 3 (soft): T_c 0.4, 0.6, 0.8 s',
      },
      {
        name: 'standard_shear_coefficient',
        kind: 'number',
        meaning: 'standard shear coefficient C0: 1.0 for severe shaking (elastic), 0.2 for moderate',
        above: 0,
        to: 2,
        fallback: 1,
      },
      PERIOD_INPUT,
    ],
    procedure: 'Z C0 R_t; R_t = 1 below T_c, 1 − 0.2 (T/T_c − 1)² to 2 T_c, 1.6 T_c/T beyond',
    compile: compileRt,
  }),
  constants: {},
  source: { standard: 'Enforcement Order art. 88 and Notification 1793', edition: '1980', clause: 'R_t' },
  verified: 'restated',
  limits: [],
  note: 'The coefficient is of the weight above the first storey (A_i = 1), in g.',
});

export const JAPAN_CODES: readonly SpectrumCode[] = [
  { code: 'japan-rt', title: 'Japan, R_t of Notification 1793 (1980)', record: JAPAN_RT },
];

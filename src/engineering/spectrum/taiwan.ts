/** Taiwan: design spectrum of the 2011 code, general sites and the Taipei basin. */
import { record } from '../formula.js';
import type { MethodRecord } from '../formula.js';
import { fall, level, rise, rowOf, spectrumFamily, stated, times } from './branches.js';
import type { Shown } from './branches.js';
import type { SpectrumCode } from './code.js';
import type { CompiledSpectrum } from './compiled.js';
import { PERIOD_INPUT } from './family.js';

export interface TaiwanInput {
  readonly sds_g: number;
  readonly sd1_g: number;
  readonly period_s: number;
}

export interface TaipeiInput {
  readonly sds_g: number;
  readonly zone: string;
  readonly period_s: number;
}

/** T_0 of the zones of the Taipei basin, s; zone 3 restated, zones 1 and 2 from memory. */
export const TAIPEI_T0_S: Readonly<Record<string, number>> = { 'zone-1': 1.6, 'zone-2': 1.3, 'zone-3': 1.05 };

function compileTaiwan(sds: Shown, t0: Shown, velocity: Shown): CompiledSpectrum {
  const start = stated(0.2 * t0.value, `0.2 * ${t0.text}`);
  const end = 2.5 * t0.value;
  return {
    segments: [
      rise({ from_s: 0, to_s: start.value, clause: 'T ≤ 0.2 T0' }, sds, stated(0.4), start),
      level({ from_s: start.value, to_s: t0.value, clause: '0.2 T0 < T ≤ T0' }, sds),
      fall({ from_s: t0.value, to_s: end, clause: 'T0 < T ≤ 2.5 T0' }, velocity),
      level({ from_s: end, to_s: Infinity, clause: '2.5 T0 < T' }, times(stated(0.4), sds)),
    ],
    plateau_from_s: start.value,
    plateau_to_s: t0.value,
    valid_to_s: Infinity,
  };
}

const SHAPE = 'S_DS (0.4 + 3 T/T0) below 0.2 T0, S_DS to T0';

export const TAIWAN_GENERAL: MethodRecord<TaiwanInput, Record<never, number>> = record({
  id: 'taiwan-2011/spectrum/general',
  title: 'Design spectrum of general sites',
  family: spectrumFamily<TaiwanInput>({
    id: 'spectrum/taiwan-2011',
    symbol: 'S_aD',
    inputs: [
      {
        name: 'sds_g',
        kind: 'number',
        unit: 'g',
        meaning: 'site-adjusted short-period acceleration S_DS (S_MS for the larger level)',
        above: 0,
        to: 4,
      },
      {
        name: 'sd1_g',
        kind: 'number',
        unit: 'g',
        meaning: 'site-adjusted 1 s acceleration S_D1 (S_M1 for the larger level)',
        above: 0,
        to: 3,
      },
      PERIOD_INPUT,
    ],
    procedure: `${SHAPE}, S_D1/T to 2.5 T0, 0.4 S_DS beyond; T0 = S_D1/S_DS`,
    compile: ({ sds_g, sd1_g }) =>
      compileTaiwan(stated(sds_g, 'sds_g'), stated(sd1_g / sds_g, '(sd1_g / sds_g)'), stated(sd1_g, 'sd1_g')),
  }),
  constants: {},
  source: { standard: 'Taiwan seismic design code', edition: '2011', clause: 'chapter 2, general sites' },
  verified: 'restated',
  limits: [],
  note: 'The spectrum does not fall below 0.4 S_DS.',
});

export const TAIWAN_TAIPEI: MethodRecord<TaipeiInput, Record<never, number>> = record({
  id: 'taiwan-2011/spectrum/taipei-basin',
  title: 'Design spectrum of the Taipei basin',
  family: spectrumFamily<TaipeiInput>({
    id: 'spectrum/taiwan-2011-taipei-basin',
    symbol: 'S_aD',
    inputs: [
      {
        name: 'sds_g',
        kind: 'number',
        unit: 'g',
        meaning: 'S_DS: 0.6 g for design, 0.8 g (S_MS) for the larger level',
        above: 0,
        to: 4,
        fallback: 0.6,
      },
      {
        name: 'zone',
        kind: 'word',
        words: Object.keys(TAIPEI_T0_S),
        meaning: 'zone of the basin: T0 1.60, 1.30, 1.05 s',
      },
      PERIOD_INPUT,
    ],
    procedure: `${SHAPE}, S_DS T0/T to 2.5 T0, 0.4 S_DS beyond; T0 by zone`,
    compile: ({ sds_g, zone }) => {
      const sds = stated(sds_g, 'sds_g');
      const t0 = stated(rowOf(TAIPEI_T0_S, zone, 'zone'));
      return compileTaiwan(sds, t0, times(sds, t0));
    },
  }),
  constants: {},
  source: { standard: 'Taiwan seismic design code', edition: '2011', clause: 'chapter 2, Taipei basin' },
  verified: 'memory',
  limits: [],
  note: 'Shape and zone 3 restated; T0 of zones 1 and 2 from memory. The spectrum does not fall below 0.4 S_DS.',
});

export const TAIWAN_CODES: readonly SpectrumCode[] = [
  { code: 'taiwan-2011', title: 'Taiwan, 2011 code, general sites', record: TAIWAN_GENERAL },
  { code: 'taiwan-2011-taipei-basin', title: 'Taiwan, 2011 code, Taipei basin', record: TAIWAN_TAIPEI },
];

/** Peru: E.030 (2018) with importance U and reduction R at 1. */
import { record } from '../formula.js';
import type { MethodRecord } from '../formula.js';
import { fall, fallSquared, level, rowOf, spectrumFamily, stated, times } from './branches.js';
import type { Shown } from './branches.js';
import type { SpectrumCode } from './code.js';
import type { CompiledSpectrum } from './compiled.js';
import { PERIOD_INPUT } from './family.js';

export interface E030Input {
  readonly zone: string;
  readonly ground: string;
  readonly period_s: number;
}

export interface E030StatedInput {
  readonly zone_factor: number;
  readonly site_factor: number;
  readonly tp_s: number;
  readonly tl_s: number;
  readonly period_s: number;
}

/** Z by zone. */
export const E030_ZONES: Readonly<Record<string, number>> = {
  'zone-1': 0.1,
  'zone-2': 0.25,
  'zone-3': 0.35,
  'zone-4': 0.45,
};
/** S by soil profile, zones 1 to 4. */
export const E030_SOILS: Readonly<Record<string, Readonly<Record<string, number>>>> = {
  S0: { 'zone-1': 0.8, 'zone-2': 0.8, 'zone-3': 0.8, 'zone-4': 0.8 },
  S1: { 'zone-1': 1, 'zone-2': 1, 'zone-3': 1, 'zone-4': 1 },
  S2: { 'zone-1': 1.6, 'zone-2': 1.2, 'zone-3': 1.15, 'zone-4': 1.05 },
  S3: { 'zone-1': 2, 'zone-2': 1.4, 'zone-3': 1.2, 'zone-4': 1.1 },
};
/** TP, TL, s. */
export const E030_CORNERS_S: Readonly<Record<string, readonly [number, number]>> = {
  S0: [0.3, 3],
  S1: [0.4, 2.5],
  S2: [0.6, 2],
  S3: [1, 1.6],
};

function compileE030(plateau: Shown, tp: Shown, tl: Shown): CompiledSpectrum {
  if (!(tl.value > tp.value)) throw new RangeError(`TL ${String(tl.value)} s must lie beyond TP ${String(tp.value)} s`);
  const velocity = times(plateau, tp);
  return {
    segments: [
      level({ from_s: 0, to_s: tp.value, clause: 'T < TP' }, plateau),
      fall({ from_s: tp.value, to_s: tl.value, clause: 'TP < T < TL' }, velocity),
      fallSquared({ from_s: tl.value, to_s: Infinity, clause: 'T > TL' }, times(velocity, tl)),
    ],
    plateau_from_s: 0,
    plateau_to_s: tp.value,
    valid_to_s: Infinity,
  };
}

const SHAPE = 'C = 2.5 below TP, 2.5 TP/T to TL, 2.5 TP TL/T² beyond';
const SOURCE = { standard: 'E.030', edition: '2018', clause: 'amplification factor C' } as const;

export const E030_ELASTIC: MethodRecord<E030Input, Record<never, number>> = record({
  id: 'e030-2018/spectrum/elastic',
  title: 'Elastic spectrum Z C S',
  family: spectrumFamily<E030Input>({
    id: 'spectrum/e030-2018',
    symbol: 'S_a',
    inputs: [
      { name: 'zone', kind: 'word', words: Object.keys(E030_ZONES), meaning: 'seismic zone: Z 0.10, 0.25, 0.35, 0.45' },
      {
        name: 'ground',
        kind: 'word',
        words: Object.keys(E030_SOILS),
        meaning: 'soil profile, S0 hard rock to S3 soft',
      },
      PERIOD_INPUT,
    ],
    procedure: `Z C S; ${SHAPE}`,
    compile: ({ zone, ground }) => {
      const z = rowOf(E030_ZONES, zone, 'zone');
      const s = rowOf(rowOf(E030_SOILS, ground, 'ground'), zone, 'zone');
      const [tp, tl] = rowOf(E030_CORNERS_S, ground, 'ground');
      return compileE030(stated(z * s * 2.5, `${String(z)} * ${String(s)} * 2.5`), stated(tp), stated(tl));
    },
  }),
  constants: {},
  source: SOURCE,
  verified: 'memory',
  limits: [],
  note: 'The shape is restated; Z, S, TP and TL of the tables are from memory.',
});

export const E030_STATED: MethodRecord<E030StatedInput, Record<never, number>> = record({
  id: 'e030-2018/spectrum/stated-factors',
  title: 'Elastic spectrum Z C S, from stated Z, S, TP and TL',
  family: spectrumFamily<E030StatedInput>({
    id: 'spectrum/e030-stated',
    symbol: 'S_a',
    inputs: [
      { name: 'zone_factor', kind: 'number', meaning: 'zone factor Z, 0.10 to 0.45', above: 0, to: 1.5 },
      { name: 'site_factor', kind: 'number', meaning: 'soil factor S', from: 0.5, to: 3 },
      { name: 'tp_s', kind: 'number', unit: 's', meaning: 'end of the plateau TP', from: 0.1, to: 1.2 },
      {
        name: 'tl_s',
        kind: 'number',
        unit: 's',
        meaning: 'start of the constant-displacement branch TL',
        from: 1.3,
        to: 20,
      },
      PERIOD_INPUT,
    ],
    procedure: `Z C S; ${SHAPE}`,
    compile: ({ zone_factor, site_factor, tp_s, tl_s }) =>
      compileE030(
        stated(zone_factor * site_factor * 2.5, 'zone_factor * site_factor * 2.5'),
        stated(tp_s, 'tp_s'),
        stated(tl_s, 'tl_s'),
      ),
  }),
  constants: {},
  source: SOURCE,
  verified: 'restated',
  limits: [],
});

export const PERU_CODES: readonly SpectrumCode[] = [
  { code: 'e030-2018', title: 'Peru, E.030 (2018), by zone and soil profile', record: E030_ELASTIC },
  { code: 'e030-2018-stated', title: 'Peru, E.030 (2018), from stated factors', record: E030_STATED },
];

/** IS 1893 (Part 1):2016 design acceleration spectrum, 6.4.2, with importance and reduction factors of 1. */
import { record } from '../formula.js';
import type { AnyRecord } from '../formula.js';
import type { SpectrumCode } from './code.js';
import { ordinate } from './compiled.js';
import type { CompiledSpectrum, Segment } from './compiled.js';
import type { SpectrumFamily } from './family.js';
import { PERIOD_INPUT, SHAKING_INPUT } from './family.js';

interface DesignInput {
  readonly zone_factor: number;
  readonly soil: string;
  readonly shaking: string;
  readonly period_s: number;
}

/** End of the plateau (s), coefficient of the branch over T to 4 s, S_a/g beyond 4 s. */
const SOILS = {
  rock: [0.4, 1.0, 0.25],
  medium: [0.55, 1.36, 0.34],
  soft: [0.67, 1.67, 0.42],
} as const;

/** For the catalogue. */
export const IS1893_SOILS = SOILS;

function compileDesign(ramp: boolean, { zone_factor, soil, shaking }: Omit<DesignInput, 'period_s'>): CompiledSpectrum {
  const row = Object.hasOwn(SOILS, soil) ? SOILS[soil as keyof typeof SOILS] : undefined;
  if (row === undefined) throw new RangeError(`unknown soil "${soil}"; known: ${Object.keys(SOILS).join(', ')}`);
  const [end_s, velocity, long] = row;
  const half = shaking !== 'maximum-considered';
  const z = half ? zone_factor / 2 : zone_factor;
  const by = half ? 'zone_factor / 2' : 'zone_factor';
  const start: readonly Segment[] = ramp
    ? [
        {
          from_s: 0,
          to_s: 0.1,
          terms: [
            { coefficient: z, exponent: 0 },
            { coefficient: 15 * z, exponent: 1 },
          ],
          clause: '0 ≤ T < 0.10 s',
          expression: `${by} * (1 + 15 * period_s)`,
        },
      ]
    : [];
  return {
    segments: [
      ...start,
      {
        from_s: ramp ? 0.1 : 0,
        to_s: end_s,
        terms: [{ coefficient: 2.5 * z, exponent: 0 }],
        clause: `T < ${String(end_s)} s`,
        expression: `${by} * 2.5`,
      },
      {
        from_s: end_s,
        to_s: 4,
        terms: [{ coefficient: velocity * z, exponent: -1 }],
        clause: `${String(end_s)} s ≤ T < 4 s`,
        expression: `${by} * ${String(velocity)} / period_s`,
      },
      {
        from_s: 4,
        to_s: Infinity,
        terms: [{ coefficient: long * z, exponent: 0 }],
        clause: 'T ≥ 4 s',
        expression: `${by} * ${String(long)}`,
      },
    ],
    plateau_from_s: ramp ? 0.1 : 0,
    plateau_to_s: end_s,
    // one source asks for a site-specific study beyond 4 s, where others print constants
    valid_to_s: 4,
  };
}

function designRecord(ramp: boolean): AnyRecord {
  const form = ramp ? 'modal' : 'equivalent-static';
  const compile = (input: Omit<DesignInput, 'period_s'>): CompiledSpectrum => compileDesign(ramp, input);
  const family: SpectrumFamily<DesignInput> = {
    id: `spectrum/is1893-${form}`,
    yields: 'sa_g',
    unit: 'g',
    symbol: 'S_a',
    inputs: [
      {
        name: 'zone_factor',
        kind: 'number',
        from: 0.05,
        to: 0.5,
        meaning: 'zone factor Z: 0.10, 0.16, 0.24, 0.36 for zones II to V',
      },
      {
        name: 'soil',
        kind: 'word',
        words: Object.keys(SOILS),
        meaning: 'rock or hard soil (I), medium (II), soft (III)',
      },
      SHAKING_INPUT,
      PERIOD_INPUT,
    ],
    expression: null,
    procedure: `Z/2 (maximum considered: Z) times ${ramp ? '1 + 15 T to 0.10 s, ' : ''}2.5 to 0.40, 0.55 or 0.67 s, then 1.00, 1.36 or 1.67 over T to 4 s, then 0.25, 0.34 or 0.42`,
    compile,
    evaluate: (input) => ordinate(compile(input), input.period_s),
  };
  return record({
    id: `is1893-2016/spectrum/${form}`,
    title: `Design acceleration spectrum with I/R of 1, ${ramp ? 'response spectrum method' : 'equivalent static method'}`,
    family,
    constants: {},
    source: { standard: 'IS 1893 (Part 1)', edition: '2016', clause: `6.4.2${ramp ? '(b)' : '(a)'}` },
    verified: ramp ? 'restated' : 'memory',
    limits: [{ input: 'period_s', to: 4, whose: 'ours', outside: 'flag', text: 'sources differ beyond 4 s' }],
    note: 'The branches step by up to 1.1 % where they meet, as printed.',
  });
}

const MODAL = designRecord(true);

export const IS1893_CODES: readonly SpectrumCode[] = [
  {
    code: 'is1893-2016',
    title: 'IS 1893 (Part 1):2016 design acceleration spectrum',
    record: MODAL,
    choice: {
      name: 'form',
      meaning: 'response spectrum method with the rise below 0.1 s (modal), or the equivalent static method without it',
      fallback: 'modal',
      records: { modal: MODAL, 'equivalent-static': designRecord(false) },
    },
  },
];

/** Türkiye: horizontal elastic spectrum of TBDY 2018, chapter 2. */
import { apply, record } from '../formula.js';
import type { AnyRecord, MethodRecord } from '../formula.js';
import { fall, fallSquared, level, rise, spectrumFamily, stated } from './branches.js';
import type { SpectrumCode } from './code.js';
import type { CompiledSpectrum } from './compiled.js';
import { factorFamily } from './factor-table.js';
import type { FactorInput, FactorTable } from './factor-table.js';
import { PERIOD_INPUT } from './family.js';

export interface TbdyInput {
  readonly ss_g: number;
  readonly s1_g: number;
  readonly site_class: string;
  readonly period_s: number;
}

/** Class ZF needs a study of the site and has no row. */
const SHORT: FactorTable = {
  columns: [0.25, 0.5, 0.75, 1, 1.25, 1.5],
  rows: {
    ZA: [0.8, 0.8, 0.8, 0.8, 0.8, 0.8],
    ZB: [0.9, 0.9, 0.9, 0.9, 0.9, 0.9],
    ZC: [1.3, 1.3, 1.2, 1.2, 1.2, 1.2],
    ZD: [1.6, 1.4, 1.2, 1.1, 1, 1],
    ZE: [2.4, 1.7, 1.3, 1.1, 0.9, 0.8],
  },
};
/** Rows ZC to ZE from memory (those of ASCE 7-16); the others restated. */
const LONG: FactorTable = {
  columns: [0.1, 0.2, 0.3, 0.4, 0.5, 0.6],
  rows: {
    ZA: [0.8, 0.8, 0.8, 0.8, 0.8, 0.8],
    ZB: [0.8, 0.8, 0.8, 0.8, 0.8, 0.8],
    ZC: [1.5, 1.5, 1.5, 1.5, 1.5, 1.4],
    ZD: [2.4, 2.2, 2, 1.9, 1.8, 1.7],
    ZE: [4.2, 3.3, 2.8, 2.4, 2.2, 2],
  },
};
export const TBDY_SITE_TABLES = { SHORT, LONG };

const SS = { name: 'ss_g', unit: 'g', meaning: 'mapped short-period coefficient S_S', from: 0.01, to: 5 } as const;
const S1 = { name: 's1_g', unit: 'g', meaning: 'mapped 1 s coefficient S_1', from: 0.01, to: 3 } as const;

const SHORT_FACTOR: MethodRecord<FactorInput<'ss_g'>, Record<never, number>> = record({
  id: 'tbdy-2018/site-factor/short-period',
  title: 'Local site coefficient F_S',
  family: factorFamily('site-factor/tbdy-2018-short', 'fs', 'F_S', SHORT, SS),
  constants: {},
  source: { standard: 'TBDY', edition: '2018', clause: '2.3, table of F_S' },
  verified: 'restated',
  limits: [],
});
const LONG_FACTOR: MethodRecord<FactorInput<'s1_g'>, Record<never, number>> = record({
  id: 'tbdy-2018/site-factor/one-second',
  title: 'Local site coefficient F_1',
  family: factorFamily('site-factor/tbdy-2018-long', 'f1', 'F_1', LONG, S1),
  constants: {},
  source: { standard: 'TBDY', edition: '2018', clause: '2.3, table of F_1' },
  verified: 'memory',
  limits: [],
  note: 'Rows ZA and ZB restated; rows ZC to ZE from memory, equal to ASCE 7-16.',
});
export const TBDY_FACTOR_RECORDS: readonly AnyRecord[] = [SHORT_FACTOR, LONG_FACTOR];

const TL_S = 6;

function compileTbdy({ ss_g, s1_g, site_class }: Omit<TbdyInput, 'period_s'>): CompiledSpectrum {
  const fs = apply(SHORT_FACTOR, { ss_g, site_class });
  const f1 = apply(LONG_FACTOR, { s1_g, site_class });
  const sds = stated(ss_g * fs, 'ss_g * fs');
  const sd1 = stated(s1_g * f1, 's1_g * f1');
  const tb = stated(sd1.value / sds.value, `${sd1.text} / (${sds.text})`);
  const ta = stated(0.2 * tb.value, `0.2 * ${tb.text}`);
  // never below TB, which a large S1 over S_S would otherwise pass
  const tl = Math.max(TL_S, tb.value);
  const long = stated(sd1.value * tl, `${sd1.text} * max(${String(TL_S)}, ${tb.text})`);
  return {
    segments: [
      rise({ from_s: 0, to_s: ta.value, clause: '0 ≤ T ≤ TA' }, sds, stated(0.4), ta),
      level({ from_s: ta.value, to_s: tb.value, clause: 'TA ≤ T ≤ TB' }, sds),
      fall({ from_s: tb.value, to_s: tl, clause: 'TB ≤ T ≤ TL' }, sd1),
      fallSquared({ from_s: tl, to_s: Infinity, clause: 'TL ≤ T' }, long),
    ],
    plateau_from_s: ta.value,
    plateau_to_s: tb.value,
    valid_to_s: Infinity,
    quantities: { fs, f1 },
  };
}

export const TBDY_2018: MethodRecord<TbdyInput, Record<never, number>> = record({
  id: 'tbdy-2018/spectrum/elastic',
  title: 'Horizontal elastic design spectrum',
  family: spectrumFamily<TbdyInput>({
    id: 'spectrum/tbdy-2018',
    symbol: 'S_ae',
    inputs: [
      { ...SS, kind: 'number' },
      { ...S1, kind: 'number' },
      {
        name: 'site_class',
        kind: 'word',
        words: Object.keys(SHORT.rows),
        meaning: 'local site class; ZF needs a study of the site',
      },
      PERIOD_INPUT,
    ],
    procedure:
      'S_DS = S_S F_S, S_D1 = S_1 F_1; S_DS (0.4 + 0.6 T/TA) below TA, S_DS to TB, S_D1/T to TL, S_D1 TL/T² beyond; TB = S_D1/S_DS, TA = 0.2 TB, TL = 6 s',
    compile: compileTbdy,
  }),
  constants: {},
  source: { standard: 'TBDY', edition: '2018', clause: '2.3' },
  verified: 'memory',
  limits: [],
  note: 'Earthquake levels DD-1 to DD-4 return in 2475, 475, 72 and 43 years. Shape, F_S and rows ZA, ZB of F_1 restated; rows ZC to ZE of F_1 from memory.',
});

export const TURKEY_CODES: readonly SpectrumCode[] = [
  { code: 'tbdy-2018', title: 'Türkiye, TBDY 2018 elastic spectrum', record: TBDY_2018 },
];

/** Mexico City: design spectrum of the complementary technical norms of 2004, main body. */
import { record } from '../formula.js';
import type { MethodRecord } from '../formula.js';
import { power } from '../numeric/power.js';
import { level, rise, rowOf, spectrumFamily, stated } from './branches.js';
import type { SpectrumCode } from './code.js';
import type { CompiledSpectrum } from './compiled.js';
import { PERIOD_INPUT } from './family.js';

export interface Mexico2004Input {
  readonly zone: string;
  readonly period_s: number;
}

/** c, a0, Ta, Tb, r. */
export const MEXICO_ZONES: Readonly<Record<string, readonly [number, number, number, number, number]>> = {
  I: [0.16, 0.04, 0.2, 1.35, 1],
  II: [0.32, 0.08, 0.2, 1.35, 1.33],
  IIIa: [0.4, 0.1, 0.53, 1.8, 2],
  IIIb: [0.45, 0.11, 0.85, 3, 2],
  IIIc: [0.4, 0.1, 1.25, 4.2, 2],
  IIId: [0.3, 0.1, 0.85, 4.2, 2],
};

function compileMexico2004({ zone }: Omit<Mexico2004Input, 'period_s'>): CompiledSpectrum {
  const [c, a0, ta, tb, r] = rowOf(MEXICO_ZONES, zone, 'zone');
  const plateau = stated(c);
  return {
    segments: [
      rise(
        { from_s: 0, to_s: ta, clause: 'T < Ta' },
        plateau,
        stated(a0 / c, `(${String(a0)} / ${String(c)})`),
        stated(ta),
      ),
      level({ from_s: ta, to_s: tb, clause: 'Ta ≤ T ≤ Tb' }, plateau),
      {
        from_s: tb,
        to_s: Infinity,
        terms: [{ coefficient: c * power(tb, r), exponent: -r }],
        clause: 'T > Tb',
        expression: `${String(c)} * (${String(tb)} / period_s) ^ ${String(r)}`,
      },
    ],
    plateau_from_s: ta,
    plateau_to_s: tb,
    valid_to_s: Infinity,
    flags: ['contains-overstrength'],
  };
}

export const MEXICO_2004: MethodRecord<Mexico2004Input, Record<never, number>> = record({
  id: 'mexico-ntcs-2004/spectrum/design',
  title: 'Design spectrum of Mexico City, structures of group B',
  family: spectrumFamily<Mexico2004Input>({
    id: 'spectrum/mexico-ntcs-2004',
    symbol: 'a',
    inputs: [
      {
        name: 'zone',
        kind: 'word',
        words: Object.keys(MEXICO_ZONES),
        meaning: 'seismic zone, I hills to III lake bed',
      },
      PERIOD_INPUT,
    ],
    procedure: 'a0 + (c − a0) T/Ta below Ta, c to Tb, c (Tb/T)^r beyond; c, a0, Ta, Tb, r by zone',
    compile: compileMexico2004,
  }),
  constants: {},
  source: { standard: 'NTC-Sismo', edition: '2004', clause: 'design spectra by zone' },
  verified: 'memory',
  limits: [],
  note: 'The spectra of the main body are taken to hold an overstrength already [memory], so their ordinates lie below an elastic spectrum: compare within this code only.',
});

export const MEXICO_CODES: readonly SpectrumCode[] = [
  { code: 'mexico-ntcs-2004', title: 'Mexico City, norms of 2004, by zone', record: MEXICO_2004 },
];

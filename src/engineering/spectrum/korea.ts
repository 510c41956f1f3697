/** Korea: KDS 41 17 00 with the site coefficients stated, since their tables are not in the data sheet. */
import { record } from '../formula.js';
import type { MethodRecord } from '../formula.js';
import { fall, fallSquared, level, rise, spectrumFamily, stated } from './branches.js';
import type { SpectrumCode } from './code.js';
import type { CompiledSpectrum } from './compiled.js';
import { PERIOD_INPUT } from './family.js';

export interface KdsInput {
  readonly ag_g: number;
  readonly fa: number;
  readonly fv: number;
  readonly period_s: number;
}

const TL_S = 5;

function compileKds({ ag_g, fa, fv }: Omit<KdsInput, 'period_s'>): CompiledSpectrum {
  const sds = stated((ag_g * 2.5 * fa * 2) / 3, 'ag_g * 2.5 * fa * 2 / 3');
  const sd1 = stated((ag_g * fv * 2) / 3, 'ag_g * fv * 2 / 3');
  const ts = stated(sd1.value / sds.value, 'fv / (2.5 * fa)');
  const t0 = stated(0.2 * ts.value, `0.2 * ${ts.text}`);
  return {
    segments: [
      rise({ from_s: 0, to_s: t0.value, clause: 'T < T0' }, sds, stated(0.4), t0),
      level({ from_s: t0.value, to_s: ts.value, clause: 'T0 ≤ T ≤ Ts' }, sds),
      fall({ from_s: ts.value, to_s: TL_S, clause: 'Ts < T ≤ TL' }, sd1),
      fallSquared(
        { from_s: TL_S, to_s: Infinity, clause: 'T > TL' },
        stated(sd1.value * TL_S, `${sd1.text} * ${String(TL_S)}`),
      ),
    ],
    plateau_from_s: t0.value,
    plateau_to_s: ts.value,
    valid_to_s: Infinity,
  };
}

export const KDS_41_17: MethodRecord<KdsInput, Record<never, number>> = record({
  id: 'kds-41-17/spectrum/elastic',
  title: 'Design spectrum from stated site coefficients',
  family: spectrumFamily<KdsInput>({
    id: 'spectrum/kds-41-17',
    symbol: 'S_a',
    inputs: [
      {
        name: 'ag_g',
        kind: 'number',
        unit: 'g',
        meaning: 'effective ground acceleration S (2400 years)',
        above: 0,
        to: 1,
      },
      { name: 'fa', kind: 'number', meaning: 'short-period site coefficient F_a', from: 0.5, to: 4 },
      { name: 'fv', kind: 'number', meaning: '1 s site coefficient F_v', from: 0.5, to: 6 },
      PERIOD_INPUT,
    ],
    procedure:
      'S_DS = S × 2.5 × F_a × 2/3, S_D1 = S × F_v × 2/3; S_DS (0.4 + 0.6 T/T0) below T0, S_DS to Ts, S_D1/T to 5 s, S_D1 × 5/T² beyond; Ts = S_D1/S_DS, T0 = 0.2 Ts',
    compile: compileKds,
  }),
  constants: {},
  source: { standard: 'KDS 41 17 00', edition: '', clause: 'design spectrum' },
  verified: 'memory',
  limits: [],
  note: 'S_DS and S_D1 restated; the shape and TL = 5 s from memory.',
});

export const KOREA_CODES: readonly SpectrumCode[] = [
  { code: 'kds-41-17', title: 'Korea, KDS 41 17 00, site coefficients stated', record: KDS_41_17 },
];

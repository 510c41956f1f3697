/** ASCE/SEI 7-05, 7-10 and 7-16: the two-period spectrum from the mapped S_S and S_1 and the site class. */
import { apply, record } from '../formula.js';
import type { Inputs, InputSpec } from '../formula.js';
import { compileTwoPeriod } from './asce7.js';
import { classesOf, LONG_FACTOR, S1_ARGUMENT, SHORT_FACTOR, SS_ARGUMENT } from './asce7-factors.js';
import type { Edition } from './asce7-factors.js';
import type { SpectrumCode } from './code.js';
import { ordinate } from './compiled.js';
import type { CompiledSpectrum } from './compiled.js';
import type { SpectrumFamily } from './family.js';
import { PERIOD_INPUT, SHAKING_INPUT, TL_INPUT } from './family.js';

interface MappedInput {
  readonly ss_g: number;
  readonly s1_g: number;
  readonly site_class: string;
  readonly tl_s: number;
  readonly shaking: string;
  /** 7-16 only. */
  readonly supplement_3?: string;
  readonly period_s: number;
}

const EDITIONS = ['05', '10', '16'] as const;
const mappedId = (edition: Edition): string => `asce7-${edition}/spectrum/two-period`;

/** From this S_1 on the cells of classes D and E are starred (g). */
const STARRED_FROM_G = 0.2;

type MappedSite = Omit<MappedInput, 'period_s'>;

/** S_M1 is raised by half (Supplement 3), or would have to be. */
function starredState(edition: Edition, { s1_g, site_class, supplement_3 }: MappedSite): 'raised' | 'starred' | null {
  if (edition !== '16' || s1_g < STARRED_FROM_G || !['D', 'E', 'default'].includes(site_class)) return null;
  return supplement_3 === 'not-applied' ? 'starred' : 'raised';
}

/** S_DS and S_D1 of the design shaking, or S_MS and S_M1 with `share` 1, in g. */
function ordinatesOf(edition: Edition, site: MappedSite, share: number) {
  const { ss_g, s1_g, site_class } = site;
  const fa = apply(SHORT_FACTOR[edition], { ss_g, site_class });
  const fv = apply(LONG_FACTOR[edition], { s1_g, site_class });
  const raise = starredState(edition, site) === 'raised' ? 1.5 : 1;
  // 2/3 of the rounded-free product, in the order of the clauses
  return { fa, fv, sds_g: share * (fa * ss_g), sd1_g: share * (fv * s1_g * raise) };
}

/** What the base shear reads of a mapped spectrum: S_DS and S_D1 of the design shaking, whichever shaking the spectrum is of; null for other records. */
export function mappedDesignValues(
  recordId: string,
  inputs: Inputs,
): { readonly fa: number; readonly fv: number; readonly sds_g: number; readonly sd1_g: number } | null {
  const edition = EDITIONS.find((one) => recordId === mappedId(one));
  return edition === undefined ? null : ordinatesOf(edition, inputs as unknown as MappedSite, 2 / 3);
}

function compileMapped(edition: Edition, input: MappedSite): CompiledSpectrum {
  const { site_class, tl_s, shaking } = input;
  const state = starredState(edition, input);
  const maximum = shaking === 'maximum-considered';
  const { fa, fv, sds_g, sd1_g } = ordinatesOf(edition, input, maximum ? 1 : 2 / 3);
  const text = maximum ? '' : '2 / 3 * ';
  const names = { short: `${text}fa * ss_g`, one: `${text}fv * s1_g${state === 'raised' ? ' * 1.5' : ''}` };
  const flags = [
    ...(site_class === 'default' ? ['default-site-class'] : []),
    ...(site_class === 'B-unmeasured' ? ['rock-unmeasured'] : []),
    ...(state === 'raised' ? ['supplement-3'] : state === 'starred' ? ['site-specific-required'] : []),
  ];
  return { ...compileTwoPeriod({ sds_g, sd1_g, tl_s }, names), quantities: { fa, fv }, flags };
}

const SUPPLEMENT: InputSpec = {
  name: 'supplement_3',
  kind: 'word',
  words: ['applied', 'not-applied'],
  fallback: 'applied',
  meaning: 'Supplement 3: S_M1 times 1.5 for classes D and E with S_1 of 0.2 g or more',
};

const CLAUSES: Readonly<Record<Edition, string>> = {
  '05': '11.4.3 to 11.4.6, tables 11.4-1 and 11.4-2',
  '10': '11.4.3 to 11.4.6, tables 11.4-1 and 11.4-2',
  '16': '11.4.4 to 11.4.8, tables 11.4-1 and 11.4-2, Supplements 1 and 3',
};

function mappedCode(edition: Edition): SpectrumCode {
  const compile = (input: MappedSite): CompiledSpectrum => compileMapped(edition, input);
  const family: SpectrumFamily<MappedInput> = {
    id: `spectrum/asce7-${edition}-mapped`,
    yields: 'sa_g',
    unit: 'g',
    symbol: 'S_a',
    inputs: [
      { ...SS_ARGUMENT, kind: 'number' },
      { ...S1_ARGUMENT, kind: 'number' },
      {
        name: 'site_class',
        kind: 'word',
        words: classesOf(edition),
        meaning:
          edition === '16'
            ? 'site class; default: class D with F_a at least 1.2; B-unmeasured: rock without a measured velocity'
            : 'site class; default: class D',
      },
      TL_INPUT,
      SHAKING_INPUT,
      ...(edition === '16' ? [SUPPLEMENT] : []),
      PERIOD_INPUT,
    ],
    expression: null,
    procedure:
      'S_DS = 2/3 F_a S_S, S_D1 = 2/3 F_v S_1 (maximum considered: without 2/3); S_DS (0.4 + 0.6 T/T0) below T0 = 0.2 Ts, S_DS to Ts = S_D1/S_DS, S_D1/T to TL, S_D1 TL/T² beyond',
    compile,
    evaluate: (input) => ordinate(compile(input), input.period_s),
  };
  return {
    code: `asce7-${edition}-two-period`,
    title: `ASCE 7-${edition} two-period spectrum from S_S, S_1 and site class`,
    record: record({
      id: mappedId(edition),
      title: 'Two-period spectrum from the mapped values and the site class',
      family,
      constants: {},
      source: { standard: 'ASCE/SEI 7', edition, clause: CLAUSES[edition] },
      verified: 'restated',
      limits: [],
      ...(edition === '16'
        ? {
            note: 'Classes D and E with S_1 of 0.2 g or more take the table value of F_v, and S_M1 is raised by half (Supplement 3).',
          }
        : {}),
    }),
  };
}

export const ASCE7_MAPPED_CODES: readonly SpectrumCode[] = EDITIONS.map(mappedCode);

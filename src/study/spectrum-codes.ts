/** The spectra a study may define, one entry per code. To add a code, add its mapping here: schema, types and editor follow. */
import { z } from 'zod';
import { showValue } from '../errors.js';
import { expected, list, number, strict, text, word } from './fields.js';

/** Largest spectral value taken at face value, in g [judgement: catches percent of g and m/s²]. */
const LARGEST_G = 10;

const common = {
  return_period_years: number({ above: 0, to: 100000, unit: 'years' })
    .exactOptional()
    .describe('Mean return period of the shaking, years. Two levels that state theirs give the slope k.'),
  note: text().exactOptional().describe('Where the numbers come from; printed with the spectrum.'),
};

function en1998<const Code extends string>(code: Code, title: string) {
  return strict({
    code: z.literal(code).describe(title),
    ag_g: number({ above: 0, to: LARGEST_G, unit: 'g' }).describe('Design ground acceleration on ground type A, g.'),
    ground: word(['A', 'B', 'C', 'D', 'E']).describe('Ground type.'),
    ...common,
  });
}

const asce7TwoPeriod = strict({
  code: z.literal('asce7-22-two-period').describe('ASCE 7-22 two-period design spectrum.'),
  sds_g: number({ above: 0, to: LARGEST_G, unit: 'g' }).describe('Spectral acceleration at short periods SDS, g.'),
  sd1_g: number({ above: 0, to: LARGEST_G, unit: 'g' }).describe('Spectral acceleration at 1 s SD1, g.'),
  tl_s: number({ above: 0, to: 100, unit: 's' }).describe('Long-period transition period TL, s.'),
  ...common,
});

const table = strict({
  code: z.literal('table').describe('A spectrum given by its ordinates.'),
  periods_s: list(number({ from: 0, to: 100, unit: 's' }), 'a list of at least two periods in s', 2).describe(
    'Periods, s, increasing.',
  ),
  ordinates_g: list(
    number({ above: 0, to: LARGEST_G, unit: 'g' }),
    'a list of at least two ordinates in g',
    2,
  ).describe('5 % elastic spectral acceleration at those periods, g.'),
  interpolation: word(['linear', 'log-log']).describe('Between the periods: linear, or straight in logarithms.'),
  ...common,
});

const SPECTRA = [
  asce7TwoPeriod,
  en1998('en1998-1-2004-elastic-type-1', 'EN 1998-1:2004 elastic spectrum, type 1.'),
  en1998('en1998-1-2004-elastic-type-2', 'EN 1998-1:2004 elastic spectrum, type 2.'),
  table,
] as const;

/** Ids of the spectrum codes a study may name. */
export const SPECTRUM_CODES: readonly z.output<(typeof SPECTRA)[number]>['code'][] = SPECTRA.map(
  (entry) => entry.shape.code.value,
);

export const SpectrumSchema = z.discriminatedUnion('code', SPECTRA, {
  error: (issue) => {
    if (issue.code !== 'invalid_union') return expected('a spectrum: its code and parameters')(issue);
    const code = (issue.input as { code?: unknown }).code;
    const problem = code === undefined ? 'missing' : `unknown code ${showValue(code)}`;
    return `${problem}; known: ${SPECTRUM_CODES.join(', ')}`;
  },
});

/** The branches that design spectra are made of, each with its terms and the display formula that says the same. */
import { ordinate } from './compiled.js';
import type { CompiledSpectrum, Segment, Term } from './compiled.js';
import type { SpectrumFamily } from './family.js';

/** A number with the formula, over the inputs of a record, that it comes from. */
export interface Shown {
  readonly value: number;
  readonly text: string;
}

/** A number as it stands. */
export const stated = (value: number, text = String(value)): Shown => ({ value, text });

export interface Span {
  readonly from_s: number;
  readonly to_s: number;
  readonly clause: string;
}

const term = (coefficient: number, exponent: number): Term => ({ coefficient, exponent });

/** A straight rise from `share` of the plateau at 0 s to the plateau at the end of the span. */
export function rise(span: Span, plateau: Shown, share: Shown, end: Shown): Segment {
  const start = plateau.value * share.value;
  return {
    ...span,
    terms: [term(start, 0), term((plateau.value - start) / end.value, 1)],
    expression: `${plateau.text} * (${share.text} + (1 - ${share.text}) * period_s / (${end.text}))`,
  };
}

/** A constant. */
export function level(span: Span, plateau: Shown): Segment {
  return { ...span, terms: [term(plateau.value, 0)], expression: plateau.text };
}

/** numerator / T. */
export function fall(span: Span, numerator: Shown): Segment {
  return { ...span, terms: [term(numerator.value, -1)], expression: `${numerator.text} / period_s` };
}

/** numerator / T². */
export function fallSquared(span: Span, numerator: Shown): Segment {
  return { ...span, terms: [term(numerator.value, -2)], expression: `${numerator.text} / period_s ^ 2` };
}

/** The product of two shown numbers. */
export function times(a: Shown, b: Shown): Shown {
  return { value: a.value * b.value, text: `${a.text} * ${b.text}` };
}

/** The row of `table` called `word`. @throws RangeError naming the words there are. */
export function rowOf<T>(table: Readonly<Record<string, T>>, word: string, what: string): T {
  const row = Object.hasOwn(table, word) ? table[word] : undefined;
  if (row === undefined) throw new RangeError(`unknown ${what} "${word}"; known: ${Object.keys(table).join(', ')}`);
  return row;
}

/** The family of a code's spectrum: what it yields and how it is read are the same for all. */
export function spectrumFamily<I extends { readonly period_s: number }>(
  fields: Pick<SpectrumFamily<I>, 'id' | 'symbol' | 'inputs'> & {
    readonly procedure: string;
    readonly compile: (input: Omit<I, 'period_s'>) => CompiledSpectrum;
  },
): SpectrumFamily<I> {
  return {
    ...fields,
    yields: 'sa_g',
    unit: 'g',
    expression: null,
    evaluate: (input) => ordinate(fields.compile(input), input.period_s),
  };
}

/**
 * The compiled form of every spectrum: contiguous half-open segments, each a short sum of powers of the period (over another such
 * sum for the ratio shapes). S_a in g. What is compiled is data: it can be stored, drawn, integrated.
 */
import { power } from '../numeric/power.js';

export interface Term {
  readonly coefficient: number;
  readonly exponent: number;
}

export interface Segment {
  readonly from_s: number;
  /** Infinity in the last segment. */
  readonly to_s: number;
  readonly terms: readonly Term[];
  readonly over?: readonly Term[];
  /** Which branch of the publication this is. */
  readonly clause: string;
  /** The branch as a display formula over the record's inputs and the spectrum's quantities (expression.ts). */
  readonly expression: string;
}

export interface CompiledSpectrum {
  readonly segments: readonly Segment[];
  /** Start of the plateau: below it the ranking holds the plateau. */
  readonly plateau_from_s: number;
  /** End of the plateau (corner period T_c). */
  readonly plateau_to_s: number;
  /** Longest period the publication covers; beyond it the last branch is continued and flagged. */
  readonly valid_to_s: number;
  /** Numbers on the way from the inputs to the segments that the display formulas name, such as site factors. */
  readonly quantities?: Readonly<Record<string, number>>;
  /** What a reader must know about these parameters; words in flags.ts. */
  readonly flags?: readonly string[];
}

/** coefficient × period_s^exponent, the common exponents without a power. */
export function termAt(coefficient: number, exponent: number, period_s: number): number {
  if (exponent === 0) return coefficient;
  if (exponent === -1) return coefficient / period_s;
  if (exponent === 1) return coefficient * period_s;
  if (exponent === -2) return coefficient / (period_s * period_s);
  return coefficient * power(period_s, exponent);
}

function sum(terms: readonly Term[], period_s: number): number {
  let value = 0;
  for (const { coefficient, exponent } of terms) value += termAt(coefficient, exponent, period_s);
  return value;
}

/** The segment that holds `period_s` (half-open: a corner belongs to the segment that starts there). @throws RangeError below 0. */
export function segmentAt(spectrum: CompiledSpectrum, period_s: number): Segment {
  if (!(period_s >= 0)) throw new RangeError(`a period of at least 0 s is needed, got ${String(period_s)}`);
  const { segments } = spectrum;
  let low = 0;
  let high = segments.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if (segments[middle]!.from_s <= period_s) low = middle;
    else high = middle - 1;
  }
  return segments[low]!;
}

/** S_a (g) at `period_s`. @throws RangeError below 0. */
export function ordinate(spectrum: CompiledSpectrum, period_s: number): number {
  const segment = segmentAt(spectrum, period_s);
  const top = sum(segment.terms, period_s);
  return segment.over === undefined ? top : top / sum(segment.over, period_s);
}

/** The spectrum with every ordinate times `factor`: same corners, same branches. */
export function scaled(spectrum: CompiledSpectrum, factor: number): CompiledSpectrum {
  if (factor === 1) return spectrum;
  const segments = spectrum.segments.map((segment) => ({
    ...segment,
    terms: segment.terms.map(({ coefficient, exponent }) => ({ coefficient: coefficient * factor, exponent })),
  }));
  return { ...spectrum, segments };
}

/** Spectral displacement (m): S_d = S_a g (T/2π)². */
export function displacement_m(spectrum: CompiledSpectrum, period_s: number): number {
  const t = period_s / (2 * Math.PI);
  return ordinate(spectrum, period_s) * 9.80665 * t * t;
}

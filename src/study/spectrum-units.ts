/** Units of spectral acceleration met in tables of ordinates, and how a heading names them. */
import { UserError } from '../errors.js';

export const SPECTRUM_UNITS = ['g', 'm/s2', 'cm/s2', '%g'] as const;
export type SpectrumUnit = (typeof SPECTRUM_UNITS)[number];

/** Standard gravity, ISO 80000-3. */
const GRAVITY_MPS2 = 9.80665;

const DIVISOR: Readonly<Record<SpectrumUnit, number>> = {
  g: 1,
  'm/s2': GRAVITY_MPS2,
  'cm/s2': 100 * GRAVITY_MPS2,
  '%g': 100,
};

/** `value` in `unit` as a multiple of gravity. */
export function toG(value: number, unit: SpectrumUnit): number {
  return value / DIVISOR[unit];
}

const PER_SECOND_SQUARED = String.raw`\s*(?:/|_per_|\.)\s*s(?:ec)?\s*(?:\^|\*\*|-)?\s*[2²]`;
/** In order: the first that matches is meant. */
const NAMES: readonly (readonly [RegExp, SpectrumUnit])[] = [
  [/%\s*g(?![a-z])|(?:percent|pct)[\s_]*(?:of[\s_]*)?g(?![a-z])/i, '%g'],
  [new RegExp(String.raw`(?<![a-z])cm${PER_SECOND_SQUARED}|(?<![a-z])gals?(?![a-z])`, 'i'), 'cm/s2'],
  [new RegExp(String.raw`(?<![a-z])m${PER_SECOND_SQUARED}|(?<![a-z])mps2(?![a-z])`, 'i'), 'm/s2'],
  [/(?<![a-z0-9])g(?![a-z0-9])/i, 'g'],
];

/** The unit that a heading such as `Sa (m/s²)`, `sa_g` or `PSA [%g]` names; undefined when it names none. */
export function unitNamedIn(heading: string): SpectrumUnit | undefined {
  return NAMES.find(([pattern]) => pattern.test(heading))?.[1];
}

export interface SettledUnit {
  readonly unit: SpectrumUnit;
  readonly from: 'study' | 'heading';
}

/** The unit of a file, from what the study says and what its headings name. @throws UserError where they differ or neither says. */
export function settleUnit(headings: readonly string[], told: SpectrumUnit | undefined, file: string): SettledUnit {
  const [first, ...others] = new Set(headings.flatMap((heading) => unitNamedIn(heading) ?? []));
  if (first !== undefined && others.length > 0)
    throw new UserError(`the headings name the units ${[first, ...others].join(' and ')}; keep one`, { file });
  if (told !== undefined && first !== undefined && told !== first)
    throw new UserError(`the heading says ${first} and the study says ${told}; make them alike`, { file });
  const unit = told ?? first;
  if (unit === undefined) {
    const ask = `say unit: ${SPECTRUM_UNITS.join(', ')} in the study`;
    throw new UserError(`the unit of the ordinates is not known: no heading names it; ${ask}`, { file });
  }
  return { unit, from: told === undefined ? 'heading' : 'study' };
}

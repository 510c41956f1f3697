/** What every spectrum family shares: it compiles its parameters to segments and is read at a period. */
import type { Family } from '../formula.js';
import type { CompiledSpectrum } from './compiled.js';

export interface SpectrumFamily<I> extends Family<I, Record<never, number>> {
  readonly compile: (input: I) => CompiledSpectrum;
}

export const PERIOD_INPUT = { name: 'period_s', kind: 'number', unit: 's', from: 0, meaning: 'period read' } as const;

/** Largest spectral value taken at face value, in g [judgement: catches percent of g and m/s²]. */
export const LARGEST_G = 10;

/** Long-period transition T_L of the US standards. */
export const TL_INPUT = {
  name: 'tl_s',
  kind: 'number',
  unit: 's',
  above: 0,
  to: 100,
  meaning: 'long-period transition period T_L',
  fallback: 8,
  stated: true,
} as const;

/** Which of a code's two levels of shaking is meant. */
export const SHAKING_INPUT = {
  name: 'shaking',
  kind: 'word',
  words: ['design', 'maximum-considered'],
  fallback: 'design',
  meaning: 'design shaking, or the maximum considered one that it is a fraction of',
} as const;

export const DAMPING_INPUT = {
  name: 'damping_ratio',
  kind: 'number',
  from: 0.02,
  to: 0.5,
  fallback: 0.05,
  meaning: 'viscous damping as a share of critical',
} as const;

export const ORDINATES = { name: 'ordinates_g', kind: 'list', unit: 'g', above: 0, to: LARGEST_G } as const;

export const AG_INPUT = {
  name: 'ag_g',
  kind: 'number',
  unit: 'g',
  above: 0,
  to: LARGEST_G,
  meaning: 'design ground acceleration on ground type A',
} as const;

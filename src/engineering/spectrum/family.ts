/** What every spectrum family shares: it compiles its parameters to segments and is read at a period. */
import type { Family } from '../formula.js';
import type { CompiledSpectrum } from './compiled.js';

export interface SpectrumFamily<I> extends Family<I, Record<never, number>> {
  readonly compile: (input: I) => CompiledSpectrum;
}

export const PERIOD_INPUT = { name: 'period_s', kind: 'number', unit: 's', meaning: 'period read' } as const;

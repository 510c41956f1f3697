/** The cases of a building as data, and a memory of those already listed. */
import type { System } from '../building.js';
import type { EditionId } from './code-history.js';

export interface Case {
  readonly system: System;
  readonly system_transverse: System;
  /** null: no seismic design. */
  readonly edition: EditionId | null;
  /** 1, or the share of its year's code that a retrofit reached. */
  readonly retrofit_level: number;
  /** The era is that of a seismic retrofit. */
  readonly strengthened: boolean;
  readonly chance: number;
}

export interface Cases {
  /** By falling chance; equal chances in order of system and edition. */
  readonly list: readonly Case[];
  /** The same by pair of systems, in order of first appearance: what depends on the system alone is worked once. */
  readonly groups: readonly (readonly Case[])[];
  readonly systemKnown: boolean;
  /** Label of the prior group used, for the trace. */
  readonly prior: string | null;
}

export interface CaseMemory {
  readonly cases: Map<string, Cases | string>;
  /** By system and year, for the common building: both known, one system in both directions, no retrofit. */
  readonly plain: Map<string, Map<number, Cases | string>>;
  /** Number of each pool of years: one array for all who share it. */
  readonly pools: WeakMap<readonly number[], number>;
  count: number;
}

export function newCaseMemory(): CaseMemory {
  return { cases: new Map(), plain: new Map(), pools: new WeakMap(), count: 0 };
}

/** The pool's number in this memory. */
export function poolNumber(years: readonly number[], memory: CaseMemory): number {
  const old = memory.pools.get(years);
  if (old !== undefined) return old;
  memory.count += 1;
  memory.pools.set(years, memory.count);
  return memory.count;
}

/** The cases of a building as data, and a memory of those already listed. */
import type { PerDirection, System, Use } from '../building.js';
import type { DependsOn } from '../capacity/edition.js';
import type { EditionId, Era } from './code-history.js';

export interface CapacityAtHeight {
  /** Strength coefficient × level. */
  readonly strength_coefficient: number;
  readonly overstrength: number;
  readonly ductility: number;
  /** ln of strength coefficient × overstrength. */
  readonly lnStrength: number;
  /** It comes from a strength check: a capacity to be taken as it is, or a strength to which ductility and share of mass still come. */
  readonly checked?: 'as it is' | 'with ductility';
  /** What a check taken as it is multiplied its strength by (M_s) and divided it by (C). */
  readonly checkFactors?: { readonly modifier_ms: number; readonly modification_c: number };
}

/** The capacities of a system designed to an edition, already found: all cases of the two share them. */
export interface Design {
  /** What of a building the design coefficient depends on; where it is more than that one number nothing is kept. */
  readonly dependsOn: DependsOn;
  readonly found: Map<number, CapacityAtHeight>;
  /** The last one found: overstrength and ductility are those of every building where `dependsOn` is `more`. */
  last: CapacityAtHeight | null;
}

export interface Case {
  readonly system: System;
  readonly system_transverse: System;
  /** null: no seismic design. */
  readonly edition: EditionId | null;
  /** Its number among all editions: what the parts of the distribution are labelled with. */
  readonly label: number;
  /** Its year; 0 without one. */
  readonly editionYear: number;
  /** 1, or the share of its year's code that a retrofit reached. */
  readonly retrofit_level: number;
  /** The era is that of a seismic retrofit. */
  readonly strengthened: boolean;
  /** Of what was strengthened: the edition it was built to. */
  readonly builtTo: { readonly edition: EditionId | null; readonly year: number } | null;
  readonly chance: number;
  readonly design: PerDirection<Design>;
}

export interface Cases {
  /** By falling chance; equal chances in order of system and edition. */
  readonly list: readonly Case[];
  /** The same by pair of systems, in order of first appearance: what depends on the system alone is worked once. */
  readonly groups: readonly (readonly Case[])[];
  readonly systemKnown: boolean;
  /** Labels of the prior groups used, for the trace. */
  readonly prior: string | null;
}

export type EraChances = readonly { readonly era: Era; readonly chance: number }[];

/** What an irregularity does to the capacity of a building; independent of its systems but for the chance of the storey. */
export interface Irregularity {
  /** Chance of a soft or weak storey where a frame carries sideways load, and where walls or braces do. */
  readonly storeyChance: { readonly frame: number; readonly wall: number };
  /** ln of its factor. */
  readonly lnStorey: number;
  /** Mean and variance of ln of the factor of the others. */
  readonly lnRest: number;
  readonly varianceRest: number;
  /** States of the others with their chances: ln of their factor from the mean, and its variance within; none where all is known. */
  readonly statesRest: readonly { readonly chance: number; readonly ln: number; readonly variance: number }[];
  /** The whole factor at its central value, without a soft or weak storey and with one. */
  readonly central: readonly [number, number];
}

export interface CaseMemory {
  readonly cases: Map<string, Cases | string>;
  /** By system and year, for the common building: one system in both directions, no retrofit. */
  readonly known: Map<System, Map<number, Cases | string>>;
  /** The same with system or year not known: by system, use, class of storeys and years. */
  readonly byPrior: Map<System | null, Map<Use | null, Map<number, Map<number, Cases | string>>>>;
  /** Number of each pool of years: one array for all who share it. */
  readonly pools: WeakMap<readonly number[], number>;
  readonly eras: Map<number, EraChances>;
  readonly designs: Map<string, Design>;
  /** By the states of the flags (irregularity.ts). */
  readonly irregularities: (Irregularity | undefined)[];
  poolCount: number;
  /** Lists of cases kept. */
  count: number;
}

export function newCaseMemory(): CaseMemory {
  return {
    cases: new Map(),
    known: new Map(),
    byPrior: new Map(),
    pools: new WeakMap(),
    eras: new Map(),
    designs: new Map(),
    irregularities: [],
    poolCount: 0,
    count: 0,
  };
}

/** A number that stands for the years in this memory: the year itself, 0 for none, below 0 for a pool. */
export function yearsNumber(years: readonly number[], memory: CaseMemory): number {
  if (years.length === 1) return years[0]!;
  if (years.length === 0) return 0;
  const old = memory.pools.get(years);
  if (old !== undefined) return old;
  memory.poolCount += 1;
  memory.pools.set(years, -memory.poolCount);
  return -memory.poolCount;
}

interface Memory<K, V> {
  readonly get: (key: K) => V | undefined;
  readonly set: (key: K, value: V) => unknown;
}

/** The entry of `key`, made when missing. */
export function entryOf<K, V>(map: Memory<K, V>, key: K, make: () => V): V {
  let found = map.get(key);
  if (found === undefined) map.set(key, (found = make()));
  return found;
}

/** For `entryOf`. */
export function newMap<K, V>(): Map<K, V> {
  return new Map();
}

/**
 * Worlds in which the attributes of buildings are drawn. In the believed world they come as the study says; in a shifted one the planner is
 * wrong: chances of systems and irregularities are others, years lie elsewhere, every spread is half as large again, one era's table is
 * off. How wrong is the bench's own choice [judgement].
 */
import type { AssessContext } from '../../../src/engineering/assess/context.js';
import type { EditionId } from '../../../src/engineering/assess/code-history.js';
import { NAMES } from '../../../src/engineering/assess/irregularity-found.js';
import type { Name } from '../../../src/engineering/assess/irregularity-found.js';
import { SYSTEMS } from '../../../src/engineering/building.js';
import type { Building, System, Use } from '../../../src/engineering/building.js';
import { drawsOf } from './draws.js';

export interface World {
  readonly number: number;
  readonly seed: number;
  /** On every spread of the study. */
  readonly spread: number;
  /** Chance of a system as a share, from that of the study's table. */
  readonly systemShare: (system: System, chance: number) => number;
  /** Chance of an irregularity from the study's. */
  readonly irregularityChance: (name: Name, chance: number) => number;
  /** Added to the years of a pool. */
  readonly years: number;
  /** Storeys that are not known for certain are others too. */
  readonly storeysMove: boolean;
  /** Uses of buildings whose use is not known, each as likely as the others; null: the spread of the people stands for them. */
  readonly uses: readonly Use[] | null;
  /** The edition whose table is off, and what its capacities are in truth. */
  readonly wrongEdition: EditionId | null;
  readonly wrongFactor: number;
}

/** The world as the study describes it. */
export function believedWorld(number: number, seed: number): World {
  return {
    number,
    seed,
    spread: 1,
    systemShare: (_, chance) => chance,
    irregularityChance: (_, chance) => chance,
    years: 0,
    storeysMove: false,
    uses: null,
    wrongEdition: null,
    wrongFactor: 1,
  };
}

const SPREAD = 1.5;
const FLATTER = 0.6;
const WRONG_TABLE = 0.6;
/** Of the natural logarithm of what a chance of a system is multiplied with. */
const SYSTEM_TILT = 0.7;
/** Of the log-odds of an irregularity. */
const IRREGULARITY_TILT = 0.7;
const YEARS = 10;

/** A world that the planner does not know; each number gives another one. */
export function shiftedWorld(
  number: number,
  seed: number,
  buildings: readonly Building[],
  { eras }: AssessContext,
): World {
  const { uniform, normal } = drawsOf(seed, number, 'the world');
  const tilts = new Map(SYSTEMS.map((system) => [system, Math.exp(SYSTEM_TILT * normal(system))]));
  const odds = new Map(NAMES.map((name) => [name, Math.exp(IRREGULARITY_TILT * normal(name))]));
  const editions = eras.flatMap(({ edition }) => (edition === null ? [] : [edition]));
  return {
    number,
    seed,
    spread: SPREAD,
    systemShare: (system, chance) => Math.pow(chance, FLATTER) * tilts.get(system)!,
    irregularityChance: (name, chance) => {
      const tilted = chance * odds.get(name)!;
      return chance > 0 && chance < 1 ? tilted / (1 - chance + tilted) : chance;
    },
    years: uniform('years') < 0.5 ? -YEARS : YEARS,
    storeysMove: true,
    uses: buildings.flatMap(({ use }) => (use === 'unknown' ? [] : [use])),
    wrongEdition: editions[Math.floor(uniform('edition') * editions.length)] ?? null,
    wrongFactor: WRONG_TABLE,
  };
}

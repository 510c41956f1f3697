/**
 * The irregularities of a building: said by the row's flags, else read from its numbers by the code the study names, else a chance.
 *
 * Six flags would be 64 combinations. A soft or weak storey weighs most, and its chance goes with the system: it stays a state of
 * its own, two nodes in the distribution of ln S. The other four, each a tenth or two off the capacity, are gathered by mean and
 * variance of ln C: against the spread of a capacity their skewness is nothing. What is gathered depends on the states of the flags
 * alone and is kept by them.
 */
import type { Building, System } from '../building.js';
import { formatShare } from '../format.js';
import { apply } from '../formula.js';
import { IRREGULARITY_EDITIONS } from '../irregularity/editions.js';
import type { IrregularityRules } from '../irregularity/editions.js';
import {
  FIRST_STOREY_COLUMNS,
  FIRST_STOREY_WALLS,
  IRREGULARITY_FACTOR,
  IRREGULARITY_SPREAD,
} from '../irregularity/records.js';
import type { FactorInput } from '../irregularity/records.js';
import { ln } from '../numeric/elementary.js';
import type { Trace } from '../trace.js';
import type { Case, Irregularity } from './case-memory.js';
import type { AssessContext } from './context.js';
import { FRAMES, NAMES, UNKNOWN, WORDS, YES, find } from './irregularity-found.js';
import type { Name, State } from './irregularity-found.js';
import { NO_IRREGULARITY_CHANCES } from './settings.js';
import type { AssessSettings } from './settings.js';

/** Nothing to take off: a finished assessment has seen the building as it is. */
export const REGULAR: Irregularity = {
  storeyChance: { frame: 0, wall: 0 },
  lnStorey: 0,
  lnRest: 0,
  varianceRest: 0,
  statesRest: [],
  central: [1, 1],
};

/** Chance of a soft or weak storey in a case: that of a frame where one stands in either direction. */
export function storeyChanceOf({ storeyChance }: Irregularity, { system, system_transverse }: Case): number {
  return FRAMES.has(system) || FRAMES.has(system_transverse) ? storeyChance.frame : storeyChance.wall;
}

const RULES_OF = ({ irregularity }: AssessSettings): IrregularityRules | null =>
  irregularity === undefined ? null : IRREGULARITY_EDITIONS[irregularity.edition];

/** Names of the irregularities that are read from the numbers of the row, in the order of the flags. */
export function irregularitiesRead(building: Building, { settings }: AssessContext): readonly Name[] {
  const rules = RULES_OF(settings);
  if (rules === null) return [];
  const names: Name[] = [];
  for (const name of NAMES) {
    if (building[name] !== null) continue;
    const { state, ofWalls } = find(name, building, rules);
    if (state === YES || ofWalls === YES) names.push(name);
  }
  return names;
}

/** The irregularity of `building`; one object for all whose flags are in the same states. */
export function irregularityOf(building: Building, context: AssessContext): Irregularity {
  const rules = RULES_OF(context.settings);
  let key = 0;
  for (const name of NAMES) {
    const { state, ofWalls } = find(name, building, rules);
    key = key * 3 + state;
    if (name === 'soft_storey') key = key * 3 + ofWalls;
  }
  const kept = context.caseMemory.irregularities;
  let found = kept[key];
  if (found === undefined) kept[key] = found = gathered(building, rules, context.settings);
  return found;
}

function gathered(building: Building, rules: IrregularityRules | null, settings: AssessSettings): Irregularity {
  const { factors, chances } = settings.irregularity ?? NO_IRREGULARITY_CHANCES;
  const inputs = factorInputs(building, rules, settings);
  const ofClass = (which: 'frame' | 'wall'): number => {
    const chance = (name: 'soft_storey' | 'weak_storey'): number => {
      const { state, ofWalls } = find(name, building, rules);
      return chanceOf(which === 'frame' ? state : ofWalls, chances[name][which]);
    };
    return 1 - (1 - chance('soft_storey')) * (1 - chance('weak_storey'));
  };
  const sigma = apply(IRREGULARITY_SPREAD, inputs);
  return {
    storeyChance: { frame: ofClass('frame'), wall: ofClass('wall') },
    lnStorey: ln(factors.soft_or_weak_storey),
    lnRest: ln(apply(IRREGULARITY_FACTOR, inputs)),
    varianceRest: sigma * sigma,
    statesRest: statesOf(inputs),
    central: [
      apply(IRREGULARITY_FACTOR, inputs),
      apply(IRREGULARITY_FACTOR, { ...inputs, storey_factor: factors.soft_or_weak_storey }),
    ],
  };
}

/** None, one and several of the four, mostly; with all sixteen combinations values of a survey move by less than a thousandth of a place. */
const MOST_STATES = 3;

type RestState = Irregularity['statesRest'][number];

/** What may be found of all but the storey: the combinations, those of nearly equal factors gathered. */
function statesOf(inputs: FactorInput): Irregularity['statesRest'] {
  let states: RestState[] = [{ chance: 1, ln: 0, variance: 0 }];
  const add = (factor: number, p: number): void => {
    const x = ln(factor);
    states = states.flatMap((one) =>
      [
        { ...one, chance: one.chance * (1 - p), ln: one.ln - p * x },
        { ...one, chance: one.chance * p, ln: one.ln + (1 - p) * x },
      ].filter(({ chance }) => chance > 0),
    );
  };
  add(inputs.torsion_factor, inputs.torsion_chance);
  add(inputs.reentrant_factor, inputs.reentrant_chance);
  add(inputs.setback_factor, inputs.setback_chance);
  add(inputs.mass_factor, inputs.mass_chance);
  states.sort((a, b) => a.ln - b.ln);
  while (states.length > 1) {
    const merged = states.slice(1).map((b, i) => together(states[i]!, b));
    const least = merged.reduce((best, one, i) => (one.gain < merged[best]!.gain ? i : best), 0);
    // a factor of 1 parts nothing
    if (states.length <= MOST_STATES && merged[least]!.gain > 0) break;
    states.splice(least, 2, merged[least]!);
  }
  return states.length > 1 ? states : [];
}

/** Two states as one, of their mean and variance; `gain` is what it adds to the variance within. */
function together(a: RestState, b: RestState): RestState & { readonly gain: number } {
  const chance = a.chance + b.chance;
  const apart = b.ln - a.ln;
  const between = (a.chance * b.chance * apart * apart) / (chance * chance);
  const variance = (a.chance * a.variance + b.chance * b.variance) / chance + between;
  return { chance, ln: (a.chance * a.ln + b.chance * b.ln) / chance, variance, gain: chance * between };
}

const chanceOf = (state: State, prior: number): number => (state === UNKNOWN ? prior : state);

/** Factors and chances of all but the storey, which is left at 1. */
function factorInputs(building: Building, rules: IrregularityRules | null, settings: AssessSettings): FactorInput {
  const { factors, chances } = settings.irregularity ?? NO_IRREGULARITY_CHANCES;
  const chance = (name: Name, prior: number): number => chanceOf(find(name, building, rules).state, prior);
  return {
    storey_factor: 1,
    torsion_factor: factors.torsion,
    torsion_chance: chance('torsion', chances.torsion),
    reentrant_factor: factors.reentrant_corner,
    reentrant_chance: chance('reentrant_corner', chances.reentrant_corner),
    setback_factor: factors.setback,
    setback_chance: chance('setback', chances.setback),
    mass_factor: factors.mass_irregularity,
    mass_chance: chance('mass_irregularity', chances.mass_irregularity),
  };
}

/** Factor of a case at its central values: the likelier state of the storey, the geometric mean of the others. */
export function centralFactor(building: Building, which: Case, context: AssessContext, trace?: Trace): number {
  const irregularity = irregularityOf(building, context);
  const chance = storeyChanceOf(irregularity, which);
  const { factors } = context.settings.irregularity ?? NO_IRREGULARITY_CHANCES;
  const isIrregular = chance > 0.5;
  if (trace === undefined) return irregularity.central[isIrregular ? 1 : 0];
  const storey_factor = isIrregular ? factors.soft_or_weak_storey : 1;
  const rules = RULES_OF(context.settings);
  for (const name of NAMES) {
    const { state, ofWalls, origin, why } = find(name, building, rules);
    const own = FRAMES.has(which.system) || FRAMES.has(which.system_transverse) ? state : ofWalls;
    trace.value(
      WORDS[name],
      own === UNKNOWN ? 'not known' : own === YES ? 'yes' : 'no',
      own === UNKNOWN ? 'prior' : origin,
      why,
    );
  }
  const inputs = factorInputs(building, rules, context.settings);
  if (chance > 0 && chance < 1)
    trace.choice({
      question: 'Soft or weak storey',
      taken: isIrregular ? 'there is one, the likelier' : 'none, the likelier',
      because: `chance of one ${formatShare(chance)} [judgement, or as the study says]`,
      others: [
        isIrregular
          ? { what: 'none', why: `counts with its chance, ${formatShare(1 - chance)}` }
          : {
              what: `capacity × ${String(factors.soft_or_weak_storey)}`,
              why: `counts with its chance, ${formatShare(chance)}`,
            },
      ],
    });
  const central = apply(IRREGULARITY_FACTOR, { ...inputs, storey_factor }, trace);
  if (irregularity.varianceRest > 0) apply(IRREGULARITY_SPREAD, inputs, trace);
  return central;
}

/** Stiffness of a soft first storey as a share of those above, and where it comes from; null where none is known. */
export function softFirstStorey(
  building: Building,
  system: System,
  { settings }: AssessContext,
): { readonly share: number; readonly why: string } | null {
  const found = find('soft_storey', building, RULES_OF(settings));
  const isFrame = FRAMES.has(system);
  if ((isFrame ? found.state : found.ofWalls) !== YES) return null;
  const { first_storey_height_m, storeys, height_m } = building;
  const usual_storey_height_m = (height_m.value - first_storey_height_m) / (storeys.value - 1);
  const heights = { usual_storey_height_m, first_storey_height_m };
  const byHeight = usual_storey_height_m > 0 ? apply(isFrame ? FIRST_STOREY_COLUMNS : FIRST_STOREY_WALLS, heights) : 1;
  return byHeight < CODE_LINE
    ? {
        share: byHeight,
        why: found.origin === 'given' ? 'soft storey on record; by the heights of the storeys' : found.why,
      }
    : { share: CODE_LINE, why: `${found.why}; taken at the line of the codes, 70 % [judgement]` };
}

/** Below this share of the storey above most codes call a storey soft. */
const CODE_LINE = 0.7;

/** The study's capacity, people and spreads: what an assessment assumes where a row does not say, each with its default. */
import { ASSUMED } from '../engineering/assess/assumed.js';
import type { Assumed, Ductilities } from '../engineering/assess/assumed.js';
import { SPREADS } from '../engineering/assess/settings.js';
import type { Spreads } from '../engineering/assess/settings.js';
import { USES } from '../engineering/building.js';
import type { Use } from '../engineering/building.js';
import { number, strict } from './fields.js';

const ductility = (name: keyof Ductilities, what: string) =>
  number({ from: 1, to: 10 }).default(ASSUMED.ductility[name]).describe(`Displacement ductility of ${what}.`);

export const CapacitySchema = strict({
  overstrength: number({ from: 1, to: 5 })
    .default(ASSUMED.overstrength)
    .describe('Overstrength Ω [default judgement].'),
  least_coefficient: number({ from: 0.001, to: 0.5 })
    .default(ASSUMED.leastCoefficient)
    .describe('Least strength coefficient of any building, V/W [default judgement].'),
  ductility: strict({
    brittle: ductility('brittle', 'masonry where nothing was designed, and of systems that no detailing makes ductile'),
    none: ductility('none', 'other buildings designed to no code'),
    before: ductility('before', 'buildings of a code, before the detailing rules'),
    after: ductility('after', 'buildings after them'),
    special: ductility('special', 'the systems with the most ductile detailing'),
  })
    .prefault({})
    .describe('Displacement ductility by detailing class [defaults judgement].'),
  retrofit_level: number({ from: 0.05, to: 2 })
    .default(ASSUMED.retrofitLevel)
    .describe("Share of its year's code that a retrofit reached, where the row does not say [default judgement]."),
});

const use = (name: Use) => {
  const { people_per_m2, hours_per_week } = ASSUMED.uses[name];
  return strict({
    people_per_m2: number({ above: 0, to: 5 })
      .default(people_per_m2)
      .describe('People on a square metre of floor at the peak.'),
    hours_per_week: number({ above: 0, to: 168 })
      .default(hours_per_week)
      .describe('Hours a week for which the peak stands, in all.'),
  })
    .prefault({})
    .describe(`People in buildings of the use ${name}.`);
};

export const PeopleSchema = strict({
  weight: number({ from: 0, to: 3 })
    .default(ASSUMED.peopleWeight)
    .describe('Exponent of the people exposed in the priority [default judgement].'),
  importance_weight: number({ from: 0, to: 3 })
    .default(ASSUMED.importanceWeight)
    .describe('Exponent of the importance factor in the priority [default judgement].'),
  uses: strict(Object.fromEntries(USES.map((name) => [name, use(name)])) as Record<Use, ReturnType<typeof use>>)
    .prefault({})
    .describe('People by use, where nobody counted them.'),
});

/** What each spread is of; their keys in the study are those of the register with underscores. */
const SPREAD_WORDS: Readonly<Record<keyof Spreads, string>> = {
  heightFormula: 'a height formula, of ln T',
  storeyStiffness: 'a period from given storey stiffness, of ln T',
  storeySections: 'a period from sections or braces, of ln T',
  storeyWalls: 'a period from walls, of ln T',
  storeySway: 'a period from sway under gravity, of ln T',
  measuredStrong: 'a period measured in strong shaking, of ln T',
  measuredSmall: 'a period measured in small shaking, of ln T',
  leastPeriod: 'any period that was not measured, at least, of ln T',
  leastMeasured: 'any measured period, at least, of ln T',
  unitWeight: 'the weight of a building, of ln m',
  era: 'a building within its era, of ln C',
  eraTable: 'the table of an edition, common to its buildings, of ln C',
  siteClass: 'the site class of a zone, common to its buildings, of ln S_a',
  overstrength: 'the overstrength, of ln Ω',
  strengthCheck: 'a capacity from areas of columns, walls or braces, of ln C',
  assessedCapacity: 'a capacity found by an assessment, of ln C',
  peopleKnownUse: 'people by floor area where the use is known, of ln E',
  peopleUnknownUse: 'people by floor area where it is not, of ln E',
  peopleCounted: 'people that were counted, of ln E',
  editionChange_years: '',
};

const NAMES = Object.keys(SPREADS) as (keyof Spreads)[];

/** The study's key of a spread: heightFormula -> height_formula. */
export function spreadKeyOf(name: string): string {
  return name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);
}

export const SpreadsSchema = strict(
  Object.fromEntries(
    NAMES.map((name) => [
      spreadKeyOf(name),
      name === 'editionChange_years'
        ? number({ from: 0, to: 20 })
            .default(SPREADS[name])
            .describe('Years either side of a change of edition over which the chance moves from the old to the new.')
        : number({ from: 0, to: 2 }).default(SPREADS[name]).describe(`Standard deviation: ${SPREAD_WORDS[name]}.`),
    ]),
  ),
);

/** The register of spreads as the study states it. */
export function spreadsOf(stated: Readonly<Record<string, number>>): Spreads {
  return Object.fromEntries(NAMES.map((name) => [name, stated[spreadKeyOf(name)]])) as unknown as Spreads;
}

interface Stated {
  readonly capacity: {
    readonly overstrength: number;
    readonly least_coefficient: number;
    readonly ductility: Ductilities;
    readonly retrofit_level: number;
  };
  readonly people: {
    readonly weight: number;
    readonly importance_weight: number;
    readonly uses: Readonly<Record<Use, { readonly people_per_m2: number; readonly hours_per_week: number }>>;
  };
}

/** What the study assumes, and of each use whether the study says so or by default. */
export function assumedOf({ capacity, people }: Stated): Assumed {
  const uses = Object.fromEntries(
    USES.map((name) => {
      const [own, before] = [people.uses[name], ASSUMED.uses[name]];
      const same = own.people_per_m2 === before.people_per_m2 && own.hours_per_week === before.hours_per_week;
      return [name, same ? before : { ...own, verified: 'study' as const }];
    }),
  ) as unknown as Assumed['uses'];
  return {
    ...ASSUMED,
    overstrength: capacity.overstrength,
    leastCoefficient: capacity.least_coefficient,
    ductility: capacity.ductility,
    retrofitLevel: capacity.retrofit_level,
    peopleWeight: people.weight,
    importanceWeight: people.importance_weight,
    uses,
  };
}

/** The study's kinds of visit: what each costs and how surely it finds each unknown out. */
import type { z } from 'zod';
import { UNKNOWNS } from '../engineering/priority/survey-value.js';
import type { Unknown } from '../engineering/priority/survey-value.js';
import { mapping, number, strict, text } from './fields.js';

const finds = Object.fromEntries(
  UNKNOWNS.map((unknown) => [
    unknown,
    number({ from: 0, to: 1 }).exactOptional().describe(`Chance that the visit finds out: ${unknown}.`),
  ]),
) as Readonly<Record<Unknown, z.ZodExactOptional<z.ZodNumber>>>;

const VisitSchema = strict({
  hours: number({ from: 0, to: 1000 }).describe('Hours a visit to one building takes, the way there included.'),
  money: number({ from: 0, to: 1e9 }).default(0).describe("What it costs, in the study's currency."),
  finds: strict(finds).describe('What it finds out, each with the chance that it does.'),
});

/**
 * Visits where the study states none. Hours of a street visit: 15 to 30 minutes a building (restated in the data sheet of ranking,
 * 4.4); storeys seen from the street to within one in 98 of 100 (there too); all else judgement.
 */
export const USUAL_VISITS = {
  desk: { hours: 0.75, finds: { year: 0.85, use: 0.9, occupants: 0.5, system: 0.4, height: 0.5 } },
  street: { hours: 0.4, finds: { height: 0.95, system: 0.6, irregularity: 0.75, use: 0.95 } },
  drawings: {
    hours: 4,
    finds: { system: 0.95, year: 0.95, height: 0.98, irregularity: 0.9, drawings: 0.9 },
  },
};

export const SurveySchema = strict({
  visits: mapping(text(), VisitSchema, 'kinds of visit by name, each with hours, money and finds', 1)
    .default(() =>
      Object.fromEntries(Object.entries(USUAL_VISITS).map(([name, visit]) => [name, { ...visit, money: 0 }])),
    )
    .describe('Kinds of visit by name; left out: desk, street and drawings with usual values [judgement].'),
  money_per_hour: number({ from: 0, to: 1e7 })
    .default(0)
    .describe("What an hour of a visit costs besides, in the study's currency."),
});

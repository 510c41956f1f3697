/** The study's kinds of visit: what each costs and how surely it finds each unknown out. */
import type { z } from 'zod';
import { UNKNOWNS } from '../engineering/priority/learnable.js';
import type { Unknown } from '../engineering/priority/learnable.js';
import { mapping, number, strict, text } from './fields.js';
import type { Finding } from './problems.js';

const finds = Object.fromEntries(
  UNKNOWNS.map((unknown) => [
    unknown,
    number({ from: 0, to: 1 }).exactOptional().describe(`Chance that the visit finds out: ${unknown}.`),
  ]),
) as Readonly<Record<Unknown, z.ZodExactOptional<z.ZodNumber>>>;

const VisitSchema = strict({
  hours: number({ from: 0, to: 1000 }).describe(
    'Hours a visit to one building takes, the way there included; 0 only where it costs money.',
  ),
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

/**
 * Visits that cost nothing or find nothing out, of the raw value of `survey`: worth is weighed by hours or money, and without either it
 * would be without end.
 */
export function checkVisits(survey: unknown): Finding[] {
  return Object.entries(mappingOf(mappingOf(survey)['visits'])).flatMap(([name, visit]) => {
    const { hours, money = 0, finds } = mappingOf(visit);
    const path = ['survey', 'visits', name];
    const found = Object.values(mappingOf(finds));
    return [
      ...(hours === 0 && money === 0
        ? [
            {
              path: [...path, 'hours'],
              message: 'expected hours over 0, or money over 0 beside them, got 0: a visit costs something',
            },
          ]
        : []),
      ...(finds !== undefined && finds !== null && found.every((chance) => chance === 0)
        ? [{ path: [...path, 'finds'], message: 'expected a chance over 0 of finding something out, got none' }]
        : []),
    ];
  });
}

function mappingOf(value: unknown): Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value) ? { ...value } : {};
}

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

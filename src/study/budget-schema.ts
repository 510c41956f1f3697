/** `budget`: what an assessment costs, and who must or must not be among those assessed. Read by `swaymark budget` alone. */
import type { z } from 'zod';
import { list, number, strict, text } from './fields.js';

const money = (what: string) => number({ from: 0, to: 1e9 }).describe(what);

const override = strict({
  id: text('the id of a building').describe('Id of the building.'),
  reason: text('the reason in words').describe('Why: it is printed with the choice.'),
  author: text().exactOptional().describe('Who decided it.'),
});

/** Where the study states no costs [judgement]: of the order of a detailed assessment in a currency like the dollar. */
export const COST_DEFAULTS = { fixed: 5000, per_m2: 2, least: 6000 } as const;
/** A building less likely to belong to the list is not assessed only because the crew is next door [judgement]. */
export const LEAST_CHANCE = 0.05;

export const BudgetSchema = strict({
  money: number({ from: 0.01, to: 1e12 })
    .exactOptional()
    .describe('The sum there is for assessments: every run then says what it buys.'),
  currency: text().exactOptional().describe('The word behind amounts of money.'),
  cost: strict({
    fixed: money('Cost of an assessment whatever the size.').default(COST_DEFAULTS.fixed),
    per_m2: money('Cost per m² of floor area.').default(COST_DEFAULTS.per_m2),
    least: money('No assessment costs less.').default(COST_DEFAULTS.least),
  })
    .exactOptional()
    .describe('Cost of an assessment where the column assessment_cost of the inventory is blank.'),
  include: list(override, 'a list of {id, reason, author}')
    .default([])
    .describe('Buildings assessed whatever they are worth.'),
  exclude: list(override, 'a list of {id, reason, author}')
    .default([])
    .describe('Buildings not assessed whatever they are worth.'),
  batches: strict({
    mobilisation: money('Cost of going to a block (column group), once for all its buildings.'),
    least_chance: number({ from: 0, to: 1 })
      .default(LEAST_CHANCE)
      .describe('Buildings less likely to belong to the list are not taken along.'),
  })
    .exactOptional()
    .describe('Assessments by block: each block with a chosen building costs a mobilisation once.'),
});

export type BudgetStudy = z.output<typeof BudgetSchema>;

/** The plain code ratio: what the latest code of the place asks over what the code of the era asked, both at strength level. */
import { record } from '../formula.js';
import type { Family } from '../formula.js';
import { number } from './edition.js';

interface RatioInput {
  readonly strength_today: number;
  readonly strength_then: number;
  readonly importance_factor: number;
}

const family: Family<RatioInput, Record<never, number>> = {
  id: 'capacity/code-ratio',
  yields: 'code_ratio',
  unit: null,
  symbol: 'r',
  inputs: [
    number('strength_today', 'strength coefficient of the latest code of the place'),
    number('strength_then', 'strength coefficient of the code of its era'),
    number('importance_factor', 'importance factor, the same in both'),
  ],
  expression: '(strength_today * importance_factor) / (strength_then * importance_factor)',
  evaluate: ({ strength_today, strength_then, importance_factor }) =>
    (strength_today * importance_factor) / (strength_then * importance_factor),
};

export const CODE_RATIO = record({
  id: 'swaymark/capacity/code-ratio',
  title: "Today's design coefficient over that of the era",
  family,
  constants: {},
  source: { standard: 'Swaymark', edition: '', clause: 'shown beside the capacity, counted nowhere' },
  verified: 'judgement',
  limits: [],
  note: 'Both at strength level, at least 0.04; both with the importance of the building, which cancels.',
});

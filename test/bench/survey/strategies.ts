/** Ways to go through a survey: which building to visit next, and how. */
import { planCampaign } from '../../../src/engineering/priority/campaign.js';
import type { Candidate, Visit } from '../../../src/engineering/priority/campaign.js';
import { worthOf } from '../../../src/engineering/priority/survey-value.js';
import type { Unknowns } from '../../../src/engineering/priority/learnable.js';
import type { Edge, Worth } from '../../../src/engineering/priority/survey-value.js';
import { drawsOf } from './draws.js';
import { unknownsIn } from './portfolio.js';
import type { Portfolio } from './portfolio.js';
import type { World } from './world.js';

export interface Step {
  /** Place of the building among the ranked ones. */
  readonly index: number;
  readonly visit: Visit;
}

/** What the survey of a portfolio is chosen from, worked out once. */
export interface Choices {
  /** The program's plan. */
  readonly plan: readonly Step[];
  /** What the plan says after each of its visits. */
  readonly promised: readonly number[];
  /** The same greedy way, each visit weighed by the wrong places it mends rather than by S. */
  readonly byPlaces: readonly Step[];
  /** In the order of the ranks, each building by the visit that is worth most for its hours. */
  readonly worstFirst: readonly Step[];
  /** The same, those first of which it is least sure on which side of the edge they stand. */
  readonly nearestEdge: readonly Step[];
}

/** The strategies that do not hang on the world. */
export function choicesOf(portfolio: Portfolio, hours: number): Choices {
  const { buildings, plan, visits, order, chance, edge } = portfolio;
  const at = new Map(buildings.map(({ id }, index) => [id, index]));
  const named = new Map(visits.map((visit) => [visit.name, visit]));
  const worths = new Map<number, Worth | null>();
  const worth = (index: number): Worth | null => {
    let found = worths.get(index);
    if (found === undefined)
      worths.set(index, (found = worthIn(unknownsIn(buildings[index]!, portfolio.contexts), edge)));
    return found;
  };
  const inOrder = (list: Iterable<number>): Step[] => {
    const steps: Step[] = [];
    let left = hours;
    for (const index of list) {
      const found = worth(index);
      const step = found === null ? undefined : bestVisit({ index, worth: found }, visits);
      if (step === undefined) continue;
      left -= step.visit.hours;
      if (left < -1e-9) break;
      steps.push(step);
    }
    return steps;
  };
  const unsure = Array.from(order).sort((a, b) => Math.abs(chance[a]! - 0.5) - Math.abs(chance[b]! - 0.5));
  // those that stand on the wrong side with a chance of one in a hundred at least: weighing by places takes a second a hundred
  const open = Array.from(order).filter((index) => chance[index]! > 0.01 && chance[index]! < 0.99);
  return {
    plan: plan.steps.map(({ id, visit }) => ({ index: at.get(id)!, visit: named.get(visit)! })),
    promised: plan.steps.map(({ expected_wrong_places }) => expected_wrong_places),
    byPlaces: planByPlaces(
      open.flatMap((index) => {
        const found = worth(index);
        return found === null ? [] : [{ index, worth: found }];
      }),
      visits,
      hours,
    ),
    worstFirst: inOrder(order),
    nearestEdge: inOrder(unsure),
  };
}

/** What may be learnt of a building, weighed; null where there is nothing. */
export function worthIn(unknowns: Unknowns, edge: Edge): Worth | null {
  return unknowns.learnable.length === 0 ? null : worthOf(unknowns, edge);
}

function bestVisit(candidate: Candidate, visits: readonly Visit[]): Step | undefined {
  const most = Math.max(...visits.map((visit) => visit.hours));
  return planCampaign([candidate], visits, { hours: most, money: Infinity }, 'hours')[0];
}

function planByPlaces(candidates: readonly Candidate[], visits: readonly Visit[], hours: number): readonly Step[] {
  const byPlaces = candidates.map(({ index, worth }) => {
    const value = Float64Array.from(worth.value, (_, set) => Math.max(0, worth.wrongOf(0) - worth.wrongOf(set)));
    return { index, worth: { ...worth, value } };
  });
  return planCampaign(byPlaces, visits, { hours, money: Infinity }, 'hours');
}

/** The visits of `steps` in their order, each to a building drawn from all the ranked ones, none twice by the same kind of visit. */
export function atRandom(steps: readonly Step[], count: number, { seed, number }: World): readonly Step[] {
  const { uniform } = drawsOf(seed, number, 'the surveyor');
  const orders = new Map<string, number[]>();
  return steps.flatMap(({ visit }) => {
    let order = orders.get(visit.name);
    if (order === undefined) {
      order = Array.from({ length: count }, (_, index) => index);
      for (let i = count - 1; i > 0; i -= 1) {
        const j = Math.floor(uniform(`${visit.name} ${String(i)}`) * (i + 1));
        [order[i], order[j]] = [order[j]!, order[i]!];
      }
      orders.set(visit.name, order);
    }
    const index = order.pop();
    return index === undefined ? [] : [{ index, visit }];
  });
}

/** The survey of one world, by every strategy: how much of the list is wrong after so many hours. */
import { planCampaign } from '../../../src/engineering/priority/campaign.js';
import type { Candidate } from '../../../src/engineering/priority/campaign.js';
import { rankBasis } from '../../../src/engineering/priority/rank.js';
import { edgeOf } from '../../../src/engineering/priority/survey-value.js';
import type { Unknowns } from '../../../src/engineering/priority/learnable.js';
import { EVERYTHING, foundBy, laid } from './answers.js';
import type { Found } from './answers.js';
import { inputOf, listOf, score, unknownsIn } from './portfolio.js';
import type { Portfolio, Scored } from './portfolio.js';
import { atRandom, worthIn } from './strategies.js';
import type { Choices, Step } from './strategies.js';
import { truthOf } from './truth.js';
import type { Truth } from './truth.js';
import type { World } from './world.js';

/** How wrong a list is. */
export interface Miss {
  /** Places of the true list held by others. */
  readonly places: number;
  /** Share of the true list's S that the list does not hold. */
  readonly share: number;
}

export const STRATEGIES = ['plan', 'replanned', 'by places', 'nearest the edge', 'worst first', 'at random'] as const;
export type Strategy = (typeof STRATEGIES)[number];

export interface Surveyed {
  readonly before: Miss;
  /** By strategy, after each of the hours asked for. */
  readonly after: Readonly<Record<Strategy, readonly Miss[]>>;
  /** Everything known that a visit can find out. */
  readonly bound: Miss;
}

/** Hours after which a surveyor who plans anew does so. */
const REPLAN_H = 8;

/** One world with its truths, and the buildings as they are known after visits. */
export class Survey {
  readonly #portfolio: Portfolio;
  readonly #world: World;
  readonly truths: readonly Truth[];
  readonly #trueList: readonly number[];
  readonly #scores = new Map<number, Scored>();
  readonly #unknowns = new Map<number, Unknowns>();

  constructor(portfolio: Portfolio, world: World) {
    this.#portfolio = portfolio;
    this.#world = world;
    const { buildings, contexts, listSize } = portfolio;
    this.truths = buildings.map((building) => truthOf(building, world, contexts));
    const truly = Array.from(buildings.keys());
    truly.sort((a, b) => this.truths[b]!.lnPriority - this.truths[a]!.lnPriority);
    this.#trueList = truly.slice(0, listSize);
  }

  /** The list as it stands when `found` is known. */
  miss(found: ReadonlyMap<number, Found>): Miss {
    const { buildings, listSize } = this.#portfolio;
    const list = listOf(buildings, this.#scored(found), listSize);
    const top = Math.max(...this.#trueList.map((index) => this.truths[index]!.lnPriority));
    const sum = (some: Iterable<number>): number => {
      let s = 0;
      for (const index of some) s += Math.exp(this.truths[index]!.lnPriority - top);
      return s;
    };
    return {
      places: this.#trueList.filter((index) => !list.has(index)).length,
      share: 1 - sum(list) / sum(this.#trueList),
    };
  }

  /** Everything known of every building. */
  bound(): Miss {
    return this.miss(new Map(this.truths.map((_, index) => [index, EVERYTHING])));
  }

  /** What the visits of `steps` within `hours` find. */
  findings(steps: readonly Step[], hours: number): ReadonlyMap<number, Found> {
    const found = new Map<number, Found>();
    let left = hours + 1e-9;
    for (const { index, visit } of steps) {
      left -= visit.hours;
      if (left < 0) break;
      const { id } = this.#portfolio.buildings[index]!;
      found.set(index, (found.get(index) ?? 0) | foundBy(visit, id, this.#world));
    }
    return found;
  }

  /** The visits of a surveyor who brings the answers home every eight hours and plans anew with them; none is made twice. */
  replanned(hours: number): readonly Step[] {
    const { buildings, listSize, visits, contexts } = this.#portfolio;
    const steps: Step[] = [];
    const made = new Set<string>();
    let spent = 0;
    for (let until = REPLAN_H; until <= hours + 1e-9; until += REPLAN_H) {
      const found = this.findings(steps, Infinity);
      const scored = this.#scored(found);
      const input = inputOf(buildings, scored, contexts);
      const basis = rankBasis(input, listSize, 1);
      const edge = edgeOf(basis, { ...input, mixtures: basis.mixtures }, listSize);
      const candidates: Candidate[] = [];
      for (const index of basis.order) {
        const key = keyOf(index, found.get(index) ?? 0);
        let unknowns = this.#unknowns.get(key);
        if (unknowns === undefined)
          this.#unknowns.set(
            key,
            (unknowns = unknownsIn(laid(buildings[index]!, this.truths[index]!, found.get(index) ?? 0), contexts)),
          );
        const worth = worthIn(unknowns, edge);
        if (worth !== null) candidates.push({ index, worth });
      }
      for (const { index, visit } of planCampaign(candidates, visits, { hours: until, money: Infinity }, 'hours')) {
        const key = `${String(index)} ${visit.name}`;
        if (made.has(key) || spent + visit.hours > until + 1e-9) continue;
        made.add(key);
        spent += visit.hours;
        steps.push({ index, visit });
      }
    }
    return steps;
  }

  /** All strategies after each of `hours`; the one that plans anew costs a hundred times the others. */
  by(choices: Choices, hours: readonly number[], replan: boolean): Surveyed {
    const most = hours.at(-1)!;
    const { plan, byPlaces, nearestEdge, worstFirst } = choices;
    const ways: Readonly<Record<Strategy, readonly Step[] | null>> = {
      plan,
      replanned: replan ? this.replanned(most) : null,
      'by places': byPlaces,
      'nearest the edge': nearestEdge,
      'worst first': worstFirst,
      'at random': atRandom(plan, this.truths.length, this.#world),
    };
    const after = (steps: readonly Step[] | null): readonly Miss[] =>
      steps === null ? [] : hours.map((h) => this.miss(this.findings(steps, h)));
    return {
      before: this.miss(new Map()),
      after: Object.fromEntries(STRATEGIES.map((strategy) => [strategy, after(ways[strategy])])) as Record<
        Strategy,
        readonly Miss[]
      >,
      bound: this.bound(),
    };
  }

  #scored(found: ReadonlyMap<number, Found>): readonly Scored[] {
    const { buildings, scored, contexts } = this.#portfolio;
    const now = scored.slice();
    for (const [index, what] of found) {
      if (what === 0) continue;
      const key = keyOf(index, what);
      let one = this.#scores.get(key);
      if (one === undefined) {
        const made = score(laid(buildings[index]!, this.truths[index]!, what), contexts);
        if (made === null) throw new Error(`${buildings[index]!.id} cannot be ranked any more`);
        this.#scores.set(key, (one = made));
      }
      now[index] = one;
    }
    return now;
  }
}

function keyOf(index: number, found: Found): number {
  return index * (EVERYTHING + 1) + found;
}

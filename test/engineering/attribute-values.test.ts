/**
 * What finding out one attribute is worth, and what it leaves of the chance of error, against drawing the attributes: all of a building's
 * are drawn, those found out are laid over it, and `assess` is run again. A decision by the median it then gives, at the cut that
 * turns out best, is worth as much as the closed form says. No closed form of values or chances is used on the side of the draws.
 * Allowance as the work on this program was agreed: at most 1 % of the figures beyond 3 standard errors of what is allowed for the
 * closed form's approximations, none off by over 0.02 as a chance, or 0.04 of the worth of a place (two states stand for all combinations of four irregularities).
 */
import { describe, expect, it } from 'vitest';
import type { AssessSettings } from '../../src/engineering/assess/settings.js';
import type { Building } from '../../src/engineering/building.js';
import { rankBasis } from '../../src/engineering/priority/rank.js';
import { UNKNOWNS } from '../../src/engineering/priority/learnable.js';
import { edgeOf, worthOf } from '../../src/engineering/priority/survey-value.js';
import type { Unknown } from '../../src/engineering/priority/learnable.js';
import type { Edge } from '../../src/engineering/priority/survey-value.js';
import { laid } from '../bench/survey/answers.js';
import { inputOf, score, unknownsIn } from '../bench/survey/portfolio.js';
import { contextsOf, truthOf } from '../bench/survey/truth.js';
import type { Contexts } from '../bench/survey/truth.js';
import { believedWorld } from '../bench/survey/world.js';
import { inventedPortfolio } from '../support/engineering-portfolio.js';
import { random } from '../support/engineering-random.js';
import { SETTINGS } from '../support/engineering-settings.js';

const DRAWS = Math.min(Number(process.env['SWAYMARK_MONTE_CARLO_DRAWS'] ?? 600), 10_000);
/** Buildings nearest the edge, where it matters what is found out, and the nearest two of every kind of unknown. */
const NEAREST = DRAWS > 1_000 ? 100 : 12;
const OF_EACH = 2;
const SEED = 20_260_611;

const spreadsOf = (spreads: Partial<AssessSettings['spreads']>): AssessSettings => ({
  ...SETTINGS,
  // the edge stands still here: what moves all of a zone is another matter
  spreads: { ...SETTINGS.spreads, siteClass: 0, ...spreads },
});

const PORTFOLIOS = [
  { title: 'of 600 buildings', buildings: 600, list: 60, settings: spreadsOf({}) },
  {
    title: 'of 400 with a strong error of the tables',
    buildings: 400,
    list: 40,
    settings: spreadsOf({ eraTable: 0.5 }),
  },
  { title: 'of 150', buildings: 150, list: 20, settings: spreadsOf({}) },
];

interface Figure {
  readonly building: string;
  readonly found: string;
  readonly value: number;
  readonly valueError: number;
  readonly closedValue: number;
  readonly wrong: number;
  readonly wrongError: number;
  readonly closedWrong: number;
}

/** Sets of unknowns to find out: none, each alone, all; by name, with their bits among the building's own and among all. */
function setsOf(names: readonly Unknown[]): { found: string; own: number; all: number }[] {
  const all = names.reduce((bits, name) => bits | (1 << UNKNOWNS.indexOf(name)), 0);
  return [
    { found: 'nothing', own: 0, all: 0 },
    ...names.map((name, bit) => ({ found: name, own: 1 << bit, all: 1 << UNKNOWNS.indexOf(name) })),
    ...(names.length > 1 ? [{ found: 'all', own: (1 << names.length) - 1, all }] : []),
  ];
}

function figuresOf(building: Building, edge: Edge, contexts: Contexts): Figure[] {
  const worth = worthOf(unknownsIn(building, contexts), edge);
  const sets = setsOf(worth.unknowns);
  const cut = Math.exp(edge.cut - edge.unit);
  /** Worth once everything is found out, as a multiple of the cut, and whether it belongs. */
  const worths = new Float64Array(DRAWS);
  const belongs = new Uint8Array(DRAWS);
  const medians = sets.map(() => new Float64Array(DRAWS));
  const everything = sets.at(-1)!.all;
  for (let draw = 0; draw < DRAWS; draw += 1) {
    const truth = truthOf(building, believedWorld(draw, SEED), contexts);
    const medianWith = (found: number): number => score(laid(building, truth, found), contexts)!.median;
    worths[draw] = Math.exp(medianWith(everything) - edge.unit) / cut;
    belongs[draw] = truth.lnPriority > edge.threshold ? 1 : 0;
    sets.forEach(({ all }, s) => (medians[s]![draw] = all === 0 ? 0 : medianWith(all)));
  }
  const always = mean(worths) > 1;
  return sets.map(({ found, own }, s) => {
    const order = Array.from(worths.keys()).sort((a, b) => medians[s]![a]! - medians[s]![b]!);
    const isEnd = (place: number): boolean =>
      place === 0 || place === DRAWS || medians[s]![order[place]!]! - medians[s]![order[place - 1]!]! > 1e-9;
    const gainOf = (draw: number, isIn: boolean): number => (isIn ? worths[draw]! : 1) - (always ? worths[draw]! : 1);
    const lossOf = (draw: number, isIn: boolean): number => {
      if (isIn) return belongs[draw] === 1 ? 0 : 2 * edge.chance;
      return belongs[draw] === 1 ? 2 * (1 - edge.chance) : 0;
    };
    const value = best(order, isEnd, (draw, isIn) => -gainOf(draw, isIn));
    const wrong = best(order, isEnd, lossOf);
    return {
      building: building.id,
      found,
      value: -value.mean,
      valueError: value.error,
      closedValue: worth.value[own]! / cut,
      wrong: wrong.mean,
      wrongError: wrong.error,
      closedWrong: worth.wrongOf(own),
    };
  });
}

/** The least mean loss over all cuts of the rising `order` of draws, those below left out and those above taken in; with its standard error. */
function best(
  order: readonly number[],
  isEnd: (place: number) => boolean,
  lossOf: (draw: number, isIn: boolean) => number,
): { readonly mean: number; readonly error: number } {
  let sum = order.reduce((total, draw) => total + lossOf(draw, true), 0);
  let least = Infinity;
  let cut = 0;
  for (let place = 0; place <= order.length; place += 1) {
    if (isEnd(place) && sum < least) {
      least = sum;
      cut = place;
    }
    if (place < order.length) sum += lossOf(order[place]!, false) - lossOf(order[place]!, true);
  }
  const losses = order.map((draw, place) => lossOf(draw, place >= cut));
  const average = mean(losses);
  const variance = mean(losses.map((loss) => (loss - average) ** 2));
  return { mean: average, error: Math.sqrt(variance / order.length) };
}

function mean(values: ArrayLike<number>): number {
  return Array.from(values).reduce((sum, value) => sum + value, 0) / values.length;
}

describe('worthOf and unknownsOf', () => {
  it.each(PORTFOLIOS)(
    'agree with drawing attributes, laying them over and assessing again: portfolio $title',
    { timeout: 600_000 },
    ({ buildings, list, settings }) => {
      const contexts = contextsOf(settings, new Map());
      const portfolio = inventedPortfolio(buildings, random(20_260_101));
      const scored = portfolio.map((one) => score(one, contexts)!);
      const input = inputOf(portfolio, scored, contexts);
      const basis = rankBasis(input, list, 1);
      const edge = edgeOf(basis, { ...input, mixtures: basis.mixtures }, list);
      const all = [...portfolio.keys()]
        // one coefficient of the drawings for two systems, of which a code may know one alone, is no matter of this check
        .filter((i) => portfolio[i]!.system_transverse === null)
        .filter((i) => unknownsIn(portfolio[i]!, contexts).learnable.length > 0)
        .sort((a, b) => Math.abs(scored[a]!.median - edge.cut) - Math.abs(scored[b]!.median - edge.cut));
      const having = (unknown: Unknown): number[] =>
        all.filter((i) => unknownsIn(portfolio[i]!, contexts).learnable.some((one) => one.unknown === unknown));
      const near = new Set([...all.slice(0, NEAREST), ...UNKNOWNS.flatMap((one) => having(one).slice(0, OF_EACH))]);
      const figures = [...near].flatMap((i) => figuresOf(portfolio[i]!, edge, contexts));
      const off = figures.map(({ value, closedValue, wrong, closedWrong }) => ({
        value: Math.abs(value - closedValue),
        // half of it is a chance of error
        wrong: 0.5 * Math.abs(wrong - closedWrong),
      }));
      const beyond = figures.filter(
        ({ valueError, wrongError }, i) =>
          off[i]!.value > 3 * valueError + 0.01 || off[i]!.wrong > 1.5 * wrongError + 0.005,
      );
      const told = new Set(figures.map(({ found }) => found));
      if (process.env['SWAYMARK_SHOW'] !== undefined) {
        const sums = [...told].map((found) => {
          const those = figures.filter((one) => one.found === found);
          const sum = (of: (one: Figure) => number): string =>
            those.reduce((total, one) => total + of(one), 0).toFixed(3);
          return `${found} (${String(those.length)}): value ${sum((one) => one.value)} closed ${sum((one) => one.closedValue)}; wrong ${sum((one) => one.wrong)} closed ${sum((one) => one.closedWrong)}`;
        });
        const largest = {
          value: Math.max(...off.map((one) => one.value)),
          wrong: Math.max(...off.map((one) => one.wrong)),
        };
        process.stdout.write(`${sums.join('\n')}\n${JSON.stringify({ figures: figures.length, beyond, largest })}\n`);
      }
      // every kind of unknown was among them
      expect([...told].sort()).toEqual([...UNKNOWNS, 'all', 'nothing'].sort());
      expect(beyond.length, JSON.stringify(beyond)).toBeLessThanOrEqual(Math.ceil(0.01 * figures.length));
      figures.forEach((one, i) => {
        expect(off[i]!.value, JSON.stringify(one)).toBeLessThan(0.04 + 3 * one.valueError);
        expect(off[i]!.wrong, JSON.stringify(one)).toBeLessThan(0.02 + 1.5 * one.wrongError);
      });
    },
  );
});

/**
 * Which buildings stay on the list whatever weights are thought right: slope, exponent of the people and exponent of the importance drawn
 * evenly from their ranges, the order taken by medians (Lahdelma and Salminen 2001, from memory: rank acceptability over unknown weights).
 */
import { ln } from '../numeric/elementary.js';
import { philox } from '../numeric/philox.js';

/** Evenly drawn between the two. */
export type Range = readonly [number, number];

export interface WeightRanges {
  /** Slope of the hazard curve over that of the run. */
  readonly slope: Range;
  readonly people: Range;
  readonly importance: Range;
}

/** The ranked buildings, one entry each. */
export interface WeighedTerms {
  /** Median of ln S by the weights of the run. */
  readonly lnPriority: Float64Array;
  /** People inside on average, above 0. */
  readonly people: Float64Array;
  /** Importance factor; what is not above 0 counts as 1. */
  readonly importance: Float64Array;
}

/** What the weights multiply: ln of demand over capacity with what zones differ by, ln of the people, ln of the importance. */
interface Scored {
  readonly load: Float64Array;
  readonly lnPeople: Float64Array;
  readonly lnImportance: Float64Array;
}

type Weighting = readonly [slope: number, people: number, importance: number];
/** Bounds of the three. */
type Cell = readonly [Range, Range, Range];

/** Parts that each range is cut into. */
const CUTS = 8;
/** Sums in another order differ by less than this share of 1 and the largest. */
const ROUNDING = 1e-9;

/**
 * Of each building the share of `draws` weightings in which it is among the first `places`; equal buildings at the edge count all. `people` and
 * `importance` are the exponents in `lnPriority`. The ranges are cut into cells: within one only few buildings can be on the list.
 */
export function acceptability(
  { lnPriority, people, importance }: WeighedTerms,
  exponents: { readonly people: number; readonly importance: number },
  ranges: WeightRanges,
  places: number,
  draws: number,
  seed: number,
): Float64Array {
  const n = lnPriority.length;
  const held = Math.min(places, n);
  const count = new Float64Array(n);
  if (held === 0) return count;
  const lnPeople = people.map((value) => ln(value));
  const lnImportance = importance.map((value) => (value > 0 ? ln(value) : 0));
  const load = lnPriority.map(
    (value, i) => value - exponents.people * lnPeople[i]! - exponents.importance * lnImportance[i]!,
  );
  const scored = { load, lnPeople, lnImportance };
  // where no factor is given its exponent moves nothing
  const idle = lnImportance.every((value) => value === 0);
  const cells = drawn([ranges.slope, ranges.people, idle ? [1, 1] : ranges.importance], draws, seed);
  for (const { cell, weightings } of cells) {
    const index = contenders(scored, cell, held);
    const few = {
      load: Float64Array.from(index, (i) => load[i]!),
      lnPeople: Float64Array.from(index, (i) => lnPeople[i]!),
      lnImportance: Float64Array.from(index, (i) => lnImportance[i]!),
    };
    const score = new Float64Array(index.length);
    const sorted = new Float64Array(index.length);
    for (const weighting of weightings) {
      scoreBy(few, weighting, score);
      sorted.set(score);
      const edge = sorted.sort()[index.length - held]!;
      for (let i = 0; i < index.length; i += 1) if (score[i]! >= edge) count[index[i]!]! += 1;
    }
  }
  return count.map((times) => times / draws);
}

/** `draws` weightings drawn evenly from the ranges, by the cell they fall into. */
function drawn(
  ranges: Cell,
  draws: number,
  seed: number,
): Iterable<{ readonly cell: Cell; readonly weightings: Weighting[] }> {
  const cells = new Map<string, { readonly cell: Cell; readonly weightings: Weighting[] }>();
  const words = new Uint32Array(4);
  for (let draw = 0; draw < draws; draw += 1) {
    philox(draw, 0, 0, 0, seed, 0x3e19a7, words);
    const share = (at: number): number => (words[at]! + 0.5) / 4294967296;
    const value = (at: 0 | 1 | 2): number => ranges[at][0] + (ranges[at][1] - ranges[at][0]) * share(at);
    const cut = (at: 0 | 1 | 2): number => (ranges[at][0] < ranges[at][1] ? Math.floor(CUTS * share(at)) : 0);
    const bounds = (at: 0 | 1 | 2): Range => {
      const [low, high] = ranges[at];
      return [low + ((high - low) * cut(at)) / CUTS, low + ((high - low) * (cut(at) + 1)) / CUTS];
    };
    const key = `${String(cut(0))} ${String(cut(1))} ${String(cut(2))}`;
    const found = cells.get(key) ?? { cell: [bounds(0), bounds(1), bounds(2)], weightings: [] };
    found.weightings.push([value(0), value(1), value(2)]);
    cells.set(key, found);
  }
  return cells.values();
}

function scoreBy({ load, lnPeople, lnImportance }: Scored, [k, p, q]: Weighting, score: Float64Array): void {
  for (let i = 0; i < score.length; i += 1) score[i] = k * load[i]! + p * lnPeople[i]! + q * lnImportance[i]!;
}

/**
 * Who may be among the first `held` by some weights of the cell; the others are on no list. A score is linear in each weight: it is largest
 * and smallest at corners, and whose largest is less than the smallest of `held` others stays behind them.
 */
function contenders(scored: Scored, [slope, people, importance]: Cell, held: number): Int32Array {
  const n = scored.load.length;
  const least = new Float64Array(n).fill(Infinity);
  const most = new Float64Array(n).fill(-Infinity);
  const score = new Float64Array(n);
  for (const k of slope)
    for (const p of people)
      for (const q of importance) {
        scoreBy(scored, [k, p, q], score);
        for (let i = 0; i < n; i += 1) {
          if (score[i]! < least[i]!) least[i] = score[i]!;
          if (score[i]! > most[i]!) most[i] = score[i]!;
        }
      }
  const edge = least.sort()[n - held]!;
  const behind = edge - ROUNDING * (1 + Math.abs(edge));
  return Int32Array.from({ length: n }, (_, i) => i).filter((i) => most[i]! >= behind);
}

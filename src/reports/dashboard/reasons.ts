/** The main reason for a place: the terms of ln S that lift a building most above the middle of the portfolio. */
import { editionWords, formatNumber, formatQuantity, formatShare, plainWords } from '../../engineering/format.js';
import type { PageData } from '../../engineering/page-contract.js';
import { middle, numberAt, rankedShown, textAt } from './reading.js';

interface Term {
  readonly name: 'sa_g' | 'capacity_g' | 'people_exposed';
  /** What the term adds to ln S for a ratio to the middle of the portfolio. */
  readonly weigh: (ratio: number, slope_k: number) => number;
  readonly say: (i: number) => string;
  readonly sayMiddle: (value: number) => string;
}

/** A second term is named when alone it at least doubles the priority. */
const SECOND_TERM = Math.log(2);

/** Terms of the study's ranking quantity. */
function termsOf(data: PageData): readonly Term[] {
  const g = (value: number): string => formatQuantity(value, 'g', data.display, 2);
  const terms: readonly Term[] = [
    {
      name: 'sa_g',
      weigh: (ratio, slope_k) => slope_k * Math.log(ratio),
      say: (i) => `strong demand: ${g(numberAt(data, 'sa_g', i))}`,
      sayMiddle: (value) => `demand ${g(value)}`,
    },
    {
      name: 'capacity_g',
      weigh: (ratio, slope_k) => -slope_k * Math.log(ratio),
      say: (i) => `${caseWords(data, i)}: capacity ${g(numberAt(data, 'capacity_g', i))}`,
      sayMiddle: (value) => `capacity ${g(value)}`,
    },
    {
      name: 'people_exposed',
      weigh: (ratio) => Math.log(ratio),
      say: (i) => `${formatNumber(numberAt(data, 'people_exposed', i), 2)} people on average`,
      sayMiddle: (value) => `${formatNumber(value, 2)} people on average`,
    },
  ];
  return terms.slice(0, data.summary.rank_by === 'demand' ? 1 : data.summary.rank_by === 'ratio' ? 2 : 3);
}

function middlesOf(data: PageData, terms: readonly Term[]): ReadonlyMap<string, number> {
  const order = Array.from({ length: rankedShown(data) }, (_, i) => i);
  return new Map(terms.map(({ name }) => [name, middle(order.map((i) => numberAt(data, name, i)))]));
}

/** "Middle of the portfolio: demand 0.82 g, capacity 0.40 g, 14 people on average." */
export function middleSentence(data: PageData): string {
  const terms = termsOf(data);
  const middles = middlesOf(data, terms);
  const words = terms.filter(({ name }) => (middles.get(name) ?? NaN) > 0).map(({ name, sayMiddle }) => sayMiddle(middles.get(name) ?? NaN));
  return words.length === 0 ? '' : `Middle of the portfolio: ${words.join(', ')}.`;
}

/** A function that says why building `i` stands where it does: what stands furthest above the portfolio's middle in ln S. */
export function reasonTeller(data: PageData): (i: number) => string {
  const terms = termsOf(data);
  const middles = middlesOf(data, terms);
  return (i) => {
    const slope_k = numberAt(data, 'slope_k', i);
    const [first, second] = terms
      .map((term) => ({ term, size: term.weigh(numberAt(data, term.name, i) / (middles.get(term.name) ?? NaN), slope_k) }))
      .filter(({ size }) => !Number.isNaN(size))
      .sort((a, b) => b.size - a.size);
    if (first === undefined) return '';
    if (first.size <= 0.05) return 'nothing stands out: close to the middle of the portfolio';
    const more = second !== undefined && second.size > SECOND_TERM ? `; ${second.term.say(i)}` : '';
    return `${first.term.say(i)}${more}`;
  };
}

/** What the capacity rests on: the best of the four ways that the row allows. */
function capacityBasis(data: PageData, i: number): string {
  const { capacity_sa_g, design_base_shear_coefficient } = data.buildings.inputs.numbers;
  if ((capacity_sa_g[i] ?? NaN) > 0) return 'finished assessment';
  if ((design_base_shear_coefficient[i] ?? NaN) > 0) return 'coefficient from the drawings';
  if (textAt(data, 'flags', i).split(' ').includes('strength-check')) return 'by the areas of its columns, walls or braces';
  return editionWords(textAt(data, 'case_edition', i));
}

/** "unreinforced masonry wall, no seismic design", marked where it is only the most likely case. */
function caseWords(data: PageData, i: number): string {
  const words = `${plainWords(textAt(data, 'case_system', i))}, ${capacityBasis(data, i)}`;
  const system = data.buildings.inputs.words.system[i] ?? 'unknown';
  return system === 'unknown' ? `most likely ${words}` : words;
}

/** What the place of listed building i is most uncertain by; empty where the run did not tell. */
export function doubtWords({ summary: { doubts } }: PageData, i: number): string {
  return (doubts?.[i] ?? []).map(({ word, share }) => `${word} ${formatShare(share)}`).join(', ');
}

/** True where the run told it of any. */
export function tellsDoubts({ summary: { doubts } }: PageData): boolean {
  return doubts?.some((doubt) => doubt.length > 0) === true;
}

/** Gaps to neighbours in words. */
import { floorsWords } from '../../engineering/assess/neighbours.js';
import { formatCount, formatNumber, formatQuantity, shownValue } from '../../engineering/format.js';
import type { Display } from '../../engineering/format.js';
import type { GapPair, PageData, PageGaps } from '../../engineering/page-contract.js';
import { markdownText } from '../markdown.js';

/** A length of a table whose heading names the unit. */
export function lengthCell(value_m: number, display: Display): string {
  return value_m === 0 ? '0' : formatNumber(shownValue(value_m, 'm', display), 2);
}

/** What is lacking of the gap both sway. */
export function lackCell({ gap_m, needed_m }: GapPair, display: Display): string {
  return needed_m > gap_m ? lengthCell(needed_m - gap_m, display) : 'by height alone';
}

/** Floors, and what else makes striking worse. */
export function remarkCell({ floors_aligned, much_taller }: GapPair): string {
  return `${floorsWords(floors_aligned)}${much_taller ? '; one half as tall again' : ''}`;
}

/** Which buildings were worked; empty where all were. */
function coverWords({ of, first }: PageGaps): string {
  if (of === 'all') return '';
  const which = first === null ? 'buildings of the list' : `the first ${formatCount(first)} buildings of the list`;
  return `The inventory is large: only gaps of ${which} were worked out; explain tells those of any building.`;
}

/** How many gaps are short, which is the worst, and what is not told. */
export function gapsSentences(gaps: PageGaps, display: Display): readonly string[] {
  const { pairs, short, unknown, alike, complete } = gaps;
  const listed = pairs.slice(0, short);
  const [worst] = listed;
  const metres = (value: number): string => formatQuantity(value, 'm', display, 2);
  const apart = listed.filter(({ floors_aligned }) => floors_aligned === 'no').length;
  const counted = `${formatCount(short)} of ${formatCount(pairs.length)} ${pairs.length === 1 ? 'pair of neighbours' : 'pairs of neighbours'}`;
  return [
    pairs.length === 0
      ? 'No two neighbours could be weighed against each other.'
      : worst === undefined
        ? `None of ${formatCount(pairs.length)} ${pairs.length === 1 ? 'pair' : 'pairs'} of neighbours stands closer than both may sway together, or than the height rule asks.`
        : `${counted} ${short === 1 ? 'stands' : 'stand'} closer than both may sway together, or than the height rule asks${apart === 0 ? '' : `, ${formatCount(apart)} of them with floors not at one level`}; the most is lacking between ${worst.id_a} and ${worst.id_b}: ${metres(worst.gap_m)} where ${metres(worst.needed_m > worst.gap_m ? worst.needed_m : worst.by_height_m)} are needed.`,
    ...(unknown === 0 ? [] : [`${formatCount(unknown)} further ${unknown === 1 ? 'pair has a building' : 'pairs have a building'} of which too little is known to work out its sway.`]),
    ...(alike === 0 ? [] : [`${formatCount(alike)} ${alike === 1 ? 'pair of buildings has' : 'pairs of buildings have'} one and the same outline, which tells of no gap.`]),
    ...(complete ? [] : ['So many outlines overlap that measuring was broken off: pairs are missing.']),
    coverWords(gaps),
  ].filter((text) => text !== '');
}

/** How the figures are meant. */
export const GAPS_NOTE =
  'Gap: given in the table of neighbours, else measured between outlines within 2 m. Needed: what both sway at the height of the shorter, in their most likely cases, by the root of the squares (ASCE/SEI 7-16 12.12-2), 0.7 of it where floors are at one level (EN 1998-1 4.4.2.7). Double difference: what is needed if buildings of like period sway together (Jeng, Kasai and Maison 1992). Height rule: a share of the shorter building’s height (ASCE/SEI 41-17 Table 17-2). A reason to look, and no part of the ranking: an outline traced from the air may be off by more than a gap.';

/** The sentence of the summary; nothing where no gap is known. */
export function gapsPart({ gaps, display }: Pick<PageData, 'gaps' | 'display'>): readonly string[] {
  if (gaps === null) return [];
  const where = gaps.short === 0 ? '' : ' All of them stand in gaps.csv. No part of the ranking.';
  return ['## Gaps to neighbours', markdownText(`${gapsSentences(gaps, display).join(' ')}${where}`)];
}

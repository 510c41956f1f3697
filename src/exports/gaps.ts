/** The short gaps of a run as a table. */
import { neededWords } from '../engineering/assess/neighbours.js';
import { shownUnit, shownValue } from '../engineering/format.js';
import type { PageData } from '../engineering/page-contract.js';
import { csvText } from './csv-text.js';

/** How the file begins. */
export const GAPS_BEGIN = '\ufeffid_a,name_a,rank_a,id_b,';

/** Every pair whose gap is short, the worst first, lengths in units of display; null where there is none. */
export function gapsCsv({ gaps, display }: Pick<PageData, 'gaps' | 'display'>): string | null {
  if (gaps === null || gaps.short === 0) return null;
  const unit = shownUnit('m', display);
  const length = (value: number): number => Number(shownValue(value, 'm', display).toPrecision(6));
  const lengths = ['gap', 'needed', 'lacking', 'double_difference', 'height_rule'].map((name) => `${name}_${unit}`);
  const head = [
    'id_a',
    'name_a',
    'rank_a',
    'id_b',
    'name_b',
    'rank_b',
    ...lengths,
    'gap_from',
    'needed_by',
    'floors_aligned',
    'one_much_taller',
  ];
  const rows = gaps.pairs
    .slice(0, gaps.short)
    .map((pair) => [
      pair.id_a,
      pair.name_a,
      pair.rank_a,
      pair.id_b,
      pair.name_b,
      pair.rank_b,
      length(pair.gap_m),
      length(pair.needed_m),
      Math.max(0, length(pair.needed_m - pair.gap_m)),
      length(pair.double_difference_m),
      length(pair.by_height_m),
      pair.gap_from,
      neededWords(pair.floors_aligned),
      pair.floors_aligned,
      pair.much_taller ? 'yes' : 'no',
    ]);
  return csvText(head, rows);
}

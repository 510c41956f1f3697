/** Columns of the table of all buildings: what sorts and what is shown. */
import { formatCount, formatNumber, formatShare, plainWords, shownValue, unitLabel } from '../../engineering/format.js';
import { LIKELY_WEAK } from '../../engineering/results.js';
import type { Portfolio } from '../portfolio.js';
import { weakWords } from '../words.js';

export interface TableColumn {
  readonly title: string;
  readonly kind: 'number' | 'text';
  /** What sorts: NaN and empty text go last. */
  readonly key: (i: number) => number | string;
  readonly show: (i: number) => string;
  /** True where the value is not from the inventory. */
  readonly guessed?: (i: number) => boolean;
  /** The cell is a link to the building's sheet. */
  readonly opens?: boolean;
}

const blankNaN = (value: number, show: (value: number) => string): string => (Number.isNaN(value) ? '–' : show(value));

/** All columns, in order. */
export function tableColumns(p: Portfolio): readonly TableColumn[] {
  const { display } = p.page;
  const result = (title: string, name: string, show: (value: number) => string): TableColumn => ({
    title,
    kind: 'number',
    key: (i) => p.number(name, i),
    show: (i) => blankNaN(p.number(name, i), show),
  });
  const words = (title: string, text: (i: number) => string): TableColumn => ({
    title,
    kind: 'text',
    key: text,
    show: (i) => text(i) || '–',
  });
  const three = (value: number): string => formatNumber(value, 3);
  const counts = (value: number): string => (Number.isInteger(value) ? formatCount(value) : three(value));
  const two = (value: number): string => formatNumber(value, 2);
  const height = (i: number): number => shownValue(p.input('height_m', i), 'm', display);
  const notGiven =
    (column: 'height_m_origin' | 'storeys_above_origin' | 'year_built_origin') =>
    (i: number): boolean => {
      const origin = p.word(column, i);
      return origin !== '' && origin !== 'given';
    };
  const year = (i: number): number => p.input('year_built', i);
  const system = (i: number): string => p.word('system', i);
  const knownSystem = (i: number): boolean => system(i) !== '' && system(i) !== 'unknown';
  return [
    result('Rank', 'rank', formatCount),
    { ...words('Identifier', p.id), opens: true },
    words('Name', p.name),
    words('Block', p.group),
    words('In the list', (i) => p.text('in_list', i)),
    result('Chance of belonging', 'chance', formatShare),
    {
      ...result('Band of the rank', 'rank_best', formatCount),
      show: (i) =>
        blankNaN(
          p.number('rank_best', i),
          (best) => `${formatCount(best)} to ${formatCount(p.number('rank_worst', i))}`,
        ),
    },
    result('Tie group', 'tie_group', formatCount),
    {
      ...result('Rank by demand', 'demand_rank', formatCount),
      show: (i) => blankNaN(p.number('demand_rank', i), () => p.demandPlaces(i)),
    },
    { title: 'Period T (s)', kind: 'number', key: p.period_s, show: (i) => blankNaN(p.period_s(i), three) },
    result('Demand Sₐ (g)', 'sa_g', three),
    result('Capacity (g)', 'capacity_g', two),
    result('Demand over capacity', 'demand_over_capacity', two),
    result('People on average', 'people_exposed', two),
    {
      title: 'Lateral system',
      kind: 'text',
      key: (i) => (knownSystem(i) ? system(i) : p.text('case_system', i)),
      show: (i) => plainWords((knownSystem(i) ? system(i) : p.text('case_system', i)) || '–'),
      guessed: (i) => !knownSystem(i) && p.text('case_system', i) !== '',
    },
    words('Use', (i) => plainWords(p.word('use', i))),
    {
      title: `Height (${unitLabel('m', display)})`,
      kind: 'number',
      key: height,
      show: (i) => blankNaN(height(i), three),
      guessed: notGiven('height_m_origin'),
    },
    {
      title: 'Storeys',
      kind: 'number',
      key: (i) => p.input('storeys_above', i),
      show: (i) => blankNaN(p.input('storeys_above', i), counts),
      guessed: notGiven('storeys_above_origin'),
    },
    {
      title: 'Year built',
      kind: 'number',
      key: year,
      show: (i) => (year(i) > 0 ? String(year(i)) : 'not known'),
      guessed: (i) => year(i) > 0 && notGiven('year_built_origin')(i),
    },
    words('Weak type', (i) => weakCell(p, i)),
    words('Not ranked because', (i) => p.text('not_ranked', i)),
  ];
}

/** The weak type, with its chance where it is less likely than not: the counts leave such a building out. */
function weakCell(p: Portfolio, i: number): string {
  if (p.text('weak_type', i) === '') return '';
  const chance = p.number('weak_chance', i);
  return `${weakWords(p.text('weak_type', i))}${chance < LIKELY_WEAK ? ` (chance ${formatShare(chance)})` : ''}`;
}

/** The cell's text, with its mark where the value is not from the inventory. */
export function cellText(column: TableColumn, i: number, likely: boolean): string {
  const text = column.show(i);
  if (column.guessed?.(i) !== true || text === '–') return text;
  return column.kind === 'text' && likely ? `≈ ${text}, most likely` : `≈ ${text} inferred`;
}

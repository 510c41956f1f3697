/** The list: one row per listed building, with how sure its place is and why it stands there. */
import { h } from 'preact';
import type { ComponentChild } from 'preact';
import { formatCount, formatNumber, formatShare } from '../../../engineering/format.js';
import type { PageData } from '../../../engineering/page-contract.js';
import type { Chart } from '../charts/chart.js';
import { Section } from '../elements.js';
import { capacityWords, demandPlaces, governingPeriod, listLength, numberAt } from '../reading.js';
import { doubtWords, middleSentence, reasonTeller, tellsDoubts } from '../reasons.js';
import { ChartFigure } from './chart-figure.js';

/** From so many places on the list scrolls in its own region. */
const LONG_LIST = 40;

const HEAD: readonly (readonly [string, string])[] = [
  ['Rank', 'num'],
  ['Building', 'name'],
  ['Block', ''],
  ['Chance', 'num'],
  ['Band of rank', 'num'],
  ['Tie group', 'num'],
  ['Rank by demand', 'num'],
  ['T (s)', 'num'],
  ['Sₐ (g)', 'num'],
  ['Capacity (g)', 'num'],
  ['Main reason', 'reason'],
];

const DOUBT = ['Uncertain by', ''] as const;

/** Link that opens the sheet of building `id`. */
export function sheetAddress(id: string): string {
  return `#building=${encodeURIComponent(id)}`;
}

function Row({ data, i, reason, last }: { data: PageData; i: number; reason: string; last: boolean }): ComponentChild {
  const { buildings } = data;
  const id = buildings.inputs.id[i] ?? '';
  const name = buildings.name[i] ?? '';
  const whole = (column: string): string => formatCount(numberAt(data, column, i));
  const cells: readonly ComponentChild[] = [
    whole('rank'),
    [h('a', { href: sheetAddress(id) }, id), name === '' ? null : ` ${name}`],
    buildings.group[i] ?? '',
    formatShare(numberAt(data, 'chance', i)),
    `${whole('rank_best')} to ${whole('rank_worst')}`,
    whole('tie_group'),
    demandPlaces(data, i),
    formatNumber(governingPeriod(data, i), 3),
    formatNumber(numberAt(data, 'sa_g', i), 3),
    capacityWords(data, i),
    reason,
    ...(tellsDoubts(data) ? [doubtWords(data, i).replaceAll(' %', '\u00a0%')] : []),
  ];
  return h(
    'tr',
    last ? { class: 'edge' } : null,
    cells.map((cell, c) => (c === 1 ? h('th', { scope: 'row', class: 'name' }, cell) : h('td', { class: (HEAD[c] ?? DOUBT)[1] || undefined }, cell))),
  );
}

export function ListSection({ data, chart }: { readonly data: PageData; readonly chart: Chart }): ComponentChild {
  const listed = listLength(data);
  const reason = reasonTeller(data);
  const head = tellsDoubts(data) ? [...HEAD, DOUBT] : HEAD;
  const caption = 'Chance: that the building truly belongs to the list; band: where its true rank lies, 5 to 95 %; T: median period in the governing direction; Sₐ and capacity: of the most likely case.';
  return h(
    Section,
    { id: 'list', title: `The list: the first ${formatCount(listed)} for detailed assessment` },
    h('p', { class: 'quiet' }, `${caption} ${middleSentence(data)}${tellsDoubts(data) ? ' Uncertain by: the largest share of the spread of its priority (the variance of ln S), then the largest that a visit can find out; strength is that as built, beyond what a code asked.' : ''}`),
    h('p', { class: 'quiet narrow-only' }, 'The list is wider than this screen: it scrolls sideways.'),
    h(
      'div',
      { class: listed > LONG_LIST ? 'scroll long' : 'scroll', role: 'region', 'aria-label': 'The list', tabIndex: 0 },
      h(
        'table',
        { id: 'list-table', class: data.buildings.group.some((group) => group !== null) ? undefined : 'no-blocks' },
        h('caption', { class: 'unseen' }, 'The list, first place first'),
        h('thead', null, h('tr', null, head.map(([title, kind]) => h('th', { scope: 'col', class: kind || undefined }, title)))),
        h('tbody', null, Array.from({ length: listed }, (_, i) => h(Row, { data, i, reason: reason(i), last: i === listed - 1 }))),
      ),
    ),
    h(ChartFigure, { chart }),
  );
}

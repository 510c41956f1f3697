/** Neighbours that stand closer than they may sway together. */
import { h } from 'preact';
import type { ComponentChild } from 'preact';
import { formatCount, textInDisplay, unitLabel } from '../../../engineering/format.js';
import type { GapPair, PageData } from '../../../engineering/page-contract.js';
import { GAPS_NOTE, gapsSentences, lackCell, lengthCell, remarkCell } from '../../gaps/words.js';
import { Section } from '../elements.js';
import { sheetAddress } from './list.js';

/** Pairs told on the page; the file gaps.csv has all. */
const GAPS_TOLD = 50;

function Row({ pair, data, shown }: { readonly pair: GapPair; readonly data: PageData; readonly shown: ReadonlySet<string> }): ComponentChild {
  const { display } = data;
  const called = (id: string, name: string | null, rank: number | null): ComponentChild => [
    shown.has(id) ? h('a', { href: sheetAddress(id) }, id) : id,
    name === null || name === id ? '' : ` ${name}`,
    rank === null ? ', not ranked' : `, rank ${formatCount(rank)}`,
  ];
  const lengths = [lengthCell(pair.gap_m, display), lengthCell(pair.needed_m, display), lackCell(pair, display), lengthCell(pair.double_difference_m, display), lengthCell(pair.by_height_m, display)];
  return h(
    'tr',
    null,
    h('th', { scope: 'row', class: 'name' }, called(pair.id_a, pair.name_a, pair.rank_a)),
    h('td', { class: 'name' }, called(pair.id_b, pair.name_b, pair.rank_b)),
    lengths.map((cell) => h('td', { class: 'num' }, cell)),
    h('td', null, pair.gap_from === 'given' ? 'table' : 'outlines'),
    h('td', null, remarkCell(pair)),
  );
}

/** Null where no gap is known. */
export function GapsSection({ data }: { readonly data: PageData }): ComponentChild {
  const { gaps, display, buildings } = data;
  if (gaps === null) return null;
  const told = gaps.pairs.slice(0, Math.min(gaps.short, GAPS_TOLD));
  const shown = new Set(buildings.inputs.id);
  const unit = unitLabel('m', display);
  const head = ['Building', 'Neighbour', `Gap (${unit})`, `Needed (${unit})`, `Lacking (${unit})`, `Double difference (${unit})`, `Height rule (${unit})`, 'Known from', 'Floors'];
  const left = gaps.short > told.length ? ` The first ${formatCount(told.length)} of ${formatCount(gaps.short)}; all of them are in gaps.csv.` : '';
  return h(
    Section,
    { id: 'gaps', title: 'Neighbours with short gaps' },
    h('p', null, gapsSentences(gaps, display).join(' ')),
    h('p', { class: 'quiet' }, `${textInDisplay(GAPS_NOTE, display)}${left}`),
    told.length === 0 ? null : h('p', { class: 'quiet narrow-only' }, 'The table is wider than this screen: it scrolls sideways.'),
    told.length === 0
      ? null
      : h(
          'div',
          { class: 'scroll long', role: 'region', 'aria-label': 'Short gaps', tabIndex: 0 },
          h(
            'table',
            { id: 'gaps-table' },
            h('caption', { class: 'unseen' }, 'Pairs of neighbours, the most lacking first'),
            h('thead', null, h('tr', null, head.map((title, i) => h('th', { scope: 'col', class: i > 1 && i < 7 ? 'num' : undefined }, title)))),
            h('tbody', null, told.map((pair) => h(Row, { pair, data, shown }))),
          ),
        ),
  );
}

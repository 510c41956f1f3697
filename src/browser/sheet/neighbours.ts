/** The neighbours of a building: each gap against what both may sway together. */
import { floorsWords, neededWords } from '../../engineering/assess/neighbours.js';
import { formatNumber, formatQuantity, unitLabel, shownValue } from '../../engineering/format.js';
import { sheetAddress } from '../address.js';
import { el } from '../dom.js';
import type { Portfolio } from '../portfolio.js';

type Pair = NonNullable<Portfolio['page']['gaps']>['pairs'][number];

const pairsOf = new WeakMap<readonly Pair[], ReadonlyMap<string, readonly Pair[]>>();

/** Pairs by building, gathered when the first sheet is opened. */
function byBuilding(pairs: readonly Pair[]): ReadonlyMap<string, readonly Pair[]> {
  const known = pairsOf.get(pairs);
  if (known !== undefined) return known;
  const found = new Map<string, Pair[]>();
  for (const pair of pairs)
    for (const id of [pair.id_a, pair.id_b]) {
      const list = found.get(id);
      if (list === undefined) found.set(id, [pair]);
      else list.push(pair);
    }
  pairsOf.set(pairs, found);
  return found;
}

function verdict({ gap_m, needed_m, by_height_m }: Pair): string {
  if (gap_m < needed_m) return gap_m < by_height_m ? 'short, by the height rule too' : 'short';
  return gap_m < by_height_m ? 'short by the height rule alone' : 'wide enough';
}

/** Nothing where no gap of the building is known. */
export function neighbourParts(p: Portfolio, i: number): readonly HTMLElement[] {
  const { gaps, display } = p.page;
  if (gaps === null) return [];
  const own = p.id(i);
  const pairs = [...(byBuilding(gaps.pairs).get(own) ?? [])].sort((one, other) => one.gap_m - other.gap_m);
  const title = el('h3', {}, 'Neighbours');
  if (pairs.length === 0) {
    const left =
      gaps.of === 'list' && p.text('in_list', i) !== 'yes'
        ? 'In this large inventory gaps were worked out for buildings of the list; explain tells those of this one.'
        : `No neighbour within ${formatQuantity(2, 'm', display, 2)} is known.`;
    return [title, el('p', {}, left)];
  }
  const length = (value: number): string => (value === 0 ? '0' : formatNumber(shownValue(value, 'm', display), 2));
  const unit = unitLabel('m', display);
  const head = [
    'Neighbour',
    `Gap (${unit})`,
    `Needed (${unit})`,
    'By',
    `Double difference (${unit})`,
    `Height rule (${unit})`,
    'Floors',
    'The gap is',
  ];
  const row = (pair: Pair): HTMLElement => {
    const id = pair.id_a === own ? pair.id_b : pair.id_a;
    const place = p.placeOf(id);
    return el(
      'tr',
      {},
      el(
        'th',
        { scope: 'row', class: 'name' },
        place === undefined ? id : el('a', { href: sheetAddress(id) }, id),
        place === undefined || p.name(place) === '' ? '' : ` ${p.name(place)}`,
      ),
      el('td', { class: 'num' }, length(pair.gap_m)),
      el('td', { class: 'num' }, length(pair.needed_m)),
      el('td', {}, neededWords(pair.floors_aligned)),
      el('td', { class: 'num' }, length(pair.double_difference_m)),
      el('td', { class: 'num' }, length(pair.by_height_m)),
      el('td', {}, `${floorsWords(pair.floors_aligned)}${pair.much_taller ? '; one half as tall again' : ''}`),
      el('td', {}, verdict(pair)),
    );
  };
  return [
    title,
    el(
      'p',
      { class: 'quiet' },
      'Each gap, given in the table of neighbours or measured between outlines, against what both buildings sway at the height of the shorter, in their most likely cases. No part of the ranking; explain has the steps.',
    ),
    el(
      'div',
      { class: 'scroll', role: 'region', 'aria-label': 'Neighbours', tabindex: '0' },
      el(
        'table',
        { id: 'neighbours-table' },
        el(
          'thead',
          {},
          el(
            'tr',
            {},
            ...head.map((text) => el('th', { scope: 'col', ...(/\(/.test(text) ? { class: 'num' } : {}) }, text)),
          ),
        ),
        el('tbody', {}, ...pairs.map(row)),
      ),
    ),
  ];
}

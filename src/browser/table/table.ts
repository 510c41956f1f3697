/** The table of all buildings: a real table whose rows exist only where they can be seen. */
import { formatCount, plainWords } from '../../engineering/format.js';
import { LIKELY_WEAK } from '../../engineering/results.js';
import { sheetAddress } from '../address.js';
import { byId, el } from '../dom.js';
import type { Portfolio } from '../portfolio.js';
import { cellText, tableColumns } from './columns.js';
import type { TableColumn } from './columns.js';
import { folded, sorted, sortKeys } from './order.js';
import type { Sorting } from './order.js';

const ROW_PX = 36;
const SPARE_ROWS = 12;

const FILTERS: readonly (readonly [string, string])[] = [
  ['', 'All buildings'],
  ['list', 'In the list'],
  ['weak', 'Ranked, of a weak type'],
  ['not-ranked', 'Not ranked'],
];

/** Builds tools and table in their places on the page. */
export function startTable(p: Portfolio): void {
  const columns = tableColumns(p);
  const keys = new Map<number, Float64Array>();
  const everyone = Array.from({ length: p.count }, (_, i) => i);
  const haystack = everyone.map((i) =>
    folded(
      [
        p.id(i),
        p.name(i),
        p.group(i),
        p.word('use', i),
        plainWords(p.word('system', i)),
        plainWords(p.text('case_system', i)),
      ].join(' '),
    ),
  );
  let rows: readonly number[] = everyone;
  let by = 0;
  let sorting: Sorting = 'ascending';

  const search = el('input', { type: 'search', id: 'all-search', autocomplete: 'off', spellcheck: 'false' });
  const filter = el('select', { id: 'all-filter' }, ...FILTERS.map(([value, title]) => el('option', { value }, title)));
  const status = el('p', { class: 'status', role: 'status', id: 'all-status' });
  byId('all-tools').append(
    el('label', {}, 'Search identifier, name, block, use, system', search),
    el('label', {}, 'Show', filter),
    status,
  );

  const region = byId('all-region');
  const heads = columns.map((column, c) =>
    headCell(column, () => {
      sortBy(c);
    }),
  );
  const body = el('tbody');
  const table = el(
    'table',
    { id: 'all-table' },
    el('caption', { class: 'unseen' }, 'All buildings; headings sort'),
    el('thead', {}, el('tr', { 'aria-rowindex': '1' }, ...heads)),
    body,
  );
  region.append(table);

  const sortBy = (c: number): void => {
    sorting = c === by && sorting === 'ascending' ? 'descending' : 'ascending';
    by = c;
    refresh();
  };

  const refresh = (): void => {
    const words = folded(search.value)
      .split(/\s+/)
      .filter((word) => word !== '');
    const members = everyone.filter(
      (i) => passes(p, filter.value, i) && words.every((word) => haystack[i]?.includes(word) === true),
    );
    const column = columns[by];
    if (column !== undefined && !keys.has(by)) keys.set(by, sortKeys(p.count, column.key));
    rows = sorted(members, keys.get(by) ?? new Float64Array(p.count), sorting);
    heads.forEach((head, c) => {
      if (c === by) head.setAttribute('aria-sort', sorting);
      else head.removeAttribute('aria-sort');
    });
    table.setAttribute('aria-rowcount', String(rows.length + 1));
    status.textContent = `${formatCount(rows.length)} of ${formatCount(p.count)} buildings, by ${(column?.title ?? '').toLowerCase()}, ${sorting}`;
    region.scrollTop = 0;
    draw(true);
  };

  let drawnFrom = -1;
  let drawnTo = -1;
  const draw = (anew: boolean): void => {
    const from = Math.max(0, Math.floor(region.scrollTop / ROW_PX) - SPARE_ROWS);
    const to = Math.min(
      rows.length,
      Math.ceil((region.scrollTop + Math.max(region.clientHeight, 400)) / ROW_PX) + SPARE_ROWS,
    );
    if (!anew && from === drawnFrom && to === drawnTo) return;
    [drawnFrom, drawnTo] = [from, to];
    // A link that has the focus keeps it through the redrawing.
    const focused = body.contains(document.activeElement) ? document.activeElement?.getAttribute('href') : null;
    body.replaceChildren(
      ...spacer(from, columns.length),
      ...rows.slice(from, to).map((i, r) => bodyRow(p, columns, i, from + r + 2)),
      ...spacer(rows.length - to, columns.length),
    );
    if (typeof focused === 'string')
      body.querySelector<HTMLElement>(`a[href=${CSS.escape(focused)}]`)?.focus({ preventScroll: true });
  };

  search.addEventListener('input', refresh);
  filter.addEventListener('change', refresh);
  region.addEventListener(
    'scroll',
    () => {
      draw(false);
    },
    { passive: true },
  );
  new ResizeObserver(() => {
    draw(false);
  }).observe(region);
  refresh();
}

function passes(p: Portfolio, filter: string, i: number): boolean {
  switch (filter) {
    case 'list':
      return p.text('in_list', i) === 'yes';
    case 'weak':
      // As the sentence at the head of the page counts them.
      return p.text('not_ranked', i) === '' && p.number('weak_chance', i) >= LIKELY_WEAK;
    case 'not-ranked':
      return p.text('not_ranked', i) !== '';
    default:
      return true;
  }
}

function headCell(column: TableColumn, sort: () => void): HTMLTableCellElement {
  const button = el('button', { type: 'button' }, column.title);
  button.addEventListener('click', sort);
  return el('th', { scope: 'col', ...(column.kind === 'number' ? { class: 'num' } : {}) }, button);
}

function bodyRow(p: Portfolio, columns: readonly TableColumn[], i: number, place: number): HTMLTableRowElement {
  const cells = columns.map((column) => {
    const text = cellText(column, i, true);
    if (column.opens === true) return el('th', { scope: 'row' }, el('a', { href: sheetAddress(p.id(i)) }, text));
    const classes = [column.kind === 'number' ? 'num' : '', text.startsWith('≈') ? 'guess' : '']
      .filter((name) => name !== '')
      .join(' ');
    const cell = el('td', classes === '' ? {} : { class: classes }, text);
    if (text.length > 36) cell.title = text;
    return cell;
  });
  return el(
    'tr',
    { 'aria-rowindex': String(place), ...(p.text('in_list', i) === 'yes' ? { class: 'listed' } : {}) },
    ...cells,
  );
}

/** A row that stands for `count` rows out of sight. */
function spacer(count: number, columns: number): HTMLTableRowElement[] {
  if (count <= 0) return [];
  const cell = el('td', { colspan: String(columns) });
  cell.style.height = `${String(count * ROW_PX)}px`;
  return [el('tr', { class: 'spacer', 'aria-hidden': 'true' }, cell)];
}

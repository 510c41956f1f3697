/** Small pieces that several sections use. */
import { h } from 'preact';
import type { ComponentChild } from 'preact';
import type { DataTable } from './charts/chart.js';

/** A table that scrolls in a region of its own, so that the page never does sideways. */
export function TableRegion({ table, label, id }: { readonly table: DataTable; readonly label: string; readonly id?: string }): ComponentChild {
  return h(
    'div',
    { class: 'scroll', role: 'region', 'aria-label': label, tabIndex: 0, ...(id === undefined ? {} : { id }) },
    h(
      'table',
      null,
      h('caption', null, table.caption),
      h('thead', null, h('tr', null, table.head.map((cell, i) => h('th', { scope: 'col', class: i === 0 ? undefined : numeric(table, i) }, cell)))),
      h(
        'tbody',
        null,
        table.rows.map((row) => h('tr', null, row.map((cell, i) => (i === 0 ? h('th', { scope: 'row' }, cell) : h('td', { class: numeric(table, i) }, cell))))),
      ),
    ),
  );
}

/** A number, perhaps of or to another, perhaps with a unit: a building called "12-7 High Street" is none. */
const NUMBER = /^[≈−+]?\d[\d.,\s\u202f]*(?:(?:to|of) [−\d.,\s\u202f]+)?(?:%|[a-z²/]{0,7})$/u;

/** Columns that hold numbers stand right. */
function numeric({ rows }: DataTable, column: number): string | undefined {
  return rows.length > 0 && rows.every((row) => NUMBER.test(row[column] ?? '')) ? 'num' : undefined;
}

/** A titled part of the page that the contents link to. */
export function Section({ id, title, children }: { readonly id: string; readonly title: string; readonly children?: ComponentChild }): ComponentChild {
  return h('section', { id, 'aria-labelledby': `${id}-title` }, h('h2', { id: `${id}-title` }, title), children);
}

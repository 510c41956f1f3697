/** The sections of record: all buildings, inventory, assumptions, cautions, foot. */
import { h } from 'preact';
import type { ComponentChild } from 'preact';
import { formatCount, plainWords } from '../../../engineering/format.js';
import type { PageData } from '../../../engineering/page-contract.js';
import { madeAt } from '../../made-at.js';
import { Section, TableRegion } from '../elements.js';

/** The page's script fills the table; what it needs to be announced stands here. */
export function AllSection({ data }: { readonly data: PageData }): ComponentChild {
  const { shown, all } = data.buildings;
  return h(
    Section,
    { id: 'all', title: 'All buildings' },
    shown < all
      ? h('p', null, `This page carries the first ${formatCount(shown)} of ${formatCount(all)} buildings; all of them are in `, h('code', null, 'ranking.csv'), '.')
      : null,
    h('p', { class: 'quiet' }, '≈ marks a value that is not in the inventory: inferred, or the most likely one. Coloured rows are in the list. Choose an identifier for the building’s sheet with its hand calculation.'),
    h('noscript', null, h('p', null, 'This table and the charts need the script of this page, which the browser has switched off. The list above and ranking.csv do not.')),
    h('div', { id: 'all-tools', class: 'tools screen-only' }),
    h('div', { id: 'all-region', class: 'scroll screen-only', role: 'region', 'aria-label': 'Table of all buildings', tabIndex: 0 }),
  );
}

export function InventorySection({ data }: { readonly data: PageData }): ComponentChild {
  const { summary } = data;
  const account = { caption: summary.rows_in === 1 ? 'What became of the one row read' : `What became of the ${formatCount(summary.rows_in)} rows read`, head: ['Rows', 'Number'], rows: summary.account.map(({ title, rows }) => [title, formatCount(rows)]) };
  const findings = {
    caption: 'Findings of the checks; nothing was corrected silently',
    head: ['Finding', 'Kind', 'Number', 'Example'],
    rows: summary.findings.map(({ code, kind, count, example }) => [plainWords(code), plainWords(kind), formatCount(count), example]),
  };
  return h(
    Section,
    { id: 'inventory', title: 'State of the inventory' },
    h(TableRegion, { table: account, label: account.caption }),
    h('p', null),
    summary.findings.length === 0 ? h('p', null, 'The checks found nothing to report.') : h(TableRegion, { table: findings, label: findings.caption }),
  );
}

export function AssumptionsSection({ data }: { readonly data: PageData }): ComponentChild {
  const { assumptions } = data.summary;
  const table = {
    caption: 'Register of assumptions',
    head: ['Assumption', 'Value', 'Rests on', 'Name in the register'],
    rows: assumptions.map(({ id, statement, value, source }) => [statement, value, source, id]),
  };
  return h(Section, { id: 'assumptions', title: 'Assumptions' }, h(TableRegion, { table, label: table.caption }));
}

export function CautionsSection({ data }: { readonly data: PageData }): ComponentChild {
  return h(
    Section,
    { id: 'cautions', title: 'Cautions' },
    h('ul', { class: 'plain' }, data.summary.cautions.map((caution) => h('li', null, caution))),
  );
}

export function Foot({ data }: { readonly data: PageData }): ComponentChild {
  const { program, run, made, fingerprints } = data.summary;
  return h(
    'footer',
    null,
    h('p', null, `${program}, run ${run}, ${madeAt(made)}.`),
    h('p', null, 'Fingerprints: study ', h('code', null, fingerprints.study), ', inventory ', h('code', null, fingerprints.inventory), ', methods ', h('code', null, fingerprints.methods), '.'),
  );
}

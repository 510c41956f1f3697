/** What the money buys, and what the list hangs on. */
import { h } from 'preact';
import type { ComponentChild } from 'preact';
import type { PageData } from '../../../engineering/page-contract.js';
import { budgetSentences, budgetTable, sensitivitySentences, switchesTable } from '../../decide/words.js';
import type { DataTable } from '../charts/chart.js';
import { Section, TableRegion } from '../elements.js';

function withTable(sentences: readonly string[], table: DataTable | null, label: string): ComponentChild {
  return [
    ...sentences.map((text, i) => h('p', i > 0 && i === sentences.length - 1 ? { class: 'quiet' } : null, text)),
    table === null ? null : h('p', { class: 'quiet narrow-only' }, 'The table is wider than this screen: it scrolls sideways.'),
    table === null ? null : h(TableRegion, { table, label }),
  ];
}

export function BudgetSection({ data: { summary } }: { readonly data: PageData }): ComponentChild {
  const { budget } = summary;
  return h(
    Section,
    { id: 'budget', title: 'What the money buys' },
    budget == null
      ? h('p', null, 'No choice was made with this run. The command budget chooses the assessments that a sum of money buys.')
      : withTable(budgetSentences(budget), budgetTable(budget), 'Assessments bought'),
  );
}

export function SensitivitySection({ data: { summary } }: { readonly data: PageData }): ComponentChild {
  const { sensitivity } = summary;
  return h(
    Section,
    { id: 'sensitivity', title: 'What the list hangs on' },
    sensitivity == null
      ? h('p', null, 'No assumption was switched with this run: the inventory is large, or the list holds every building. The command sensitivity switches them one at a time.')
      : withTable(sensitivitySentences(sensitivity), switchesTable(sensitivity), 'Assumptions switched'),
  );
}

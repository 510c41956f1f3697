/** A chart with its title, its sentence and its numbers. */
import { h } from 'preact';
import type { ComponentChild } from 'preact';
import type { Chart } from '../charts/chart.js';
import { TableRegion } from '../elements.js';

/** The page's script draws into the box; without it the sentence and the numbers stand alone. */
export function ChartFigure({ chart, hint }: { readonly chart: Chart; readonly hint?: string }): ComponentChild {
  const pickable = Object.values(chart.data).some((columns) => 'i' in columns);
  return h(
    'figure',
    null,
    h('figcaption', null, chart.title),
    h('p', { class: 'quiet' }, chart.sentence, hint === undefined ? null : ` ${hint}`),
    h('div', { id: `chart-${chart.id}`, class: pickable ? 'chart points' : 'chart', role: 'img', 'aria-label': `${chart.title}. ${chart.sentence}` }),
    h('details', null, h('summary', null, 'The numbers of this chart'), h(TableRegion, { table: chart.table, label: chart.table.caption })),
  );
}

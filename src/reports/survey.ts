/** The page of a survey: what it does to the list, where its visits are, and the list to walk with, block by block. */
import { Fragment, h } from 'preact';
import type { ComponentChild } from 'preact';
import { formatNumber } from '../engineering/format.js';
import type { Visit } from '../engineering/priority/campaign.js';
import type { SurveyPlan } from '../screening/survey.js';
import { compileChart } from './dashboard/charts/compile.js';
import { Section, TableRegion } from './dashboard/elements.js';
import { ChartFigure } from './dashboard/sections/chart-figure.js';
import { BASE_STYLE } from './dashboard/style/base.js';
import { PARTS_STYLE } from './dashboard/style/parts.js';
import { scriptJson } from './html.js';
import { renderPage } from './page.js';
import { gainChart, visitsMap } from './survey/charts.js';
import { walksOf } from './survey/walk.js';
import type { BlockWalk } from './survey/walk.js';
import { ASKED, perCostWord, planSentences, reasonWord } from './survey/words.js';

const CAUTIONS: readonly string[] = [
  'What a visit finds out firms up an order for further assessment; it is no statement on the safety of any building.',
  'Values rest on the spreads and chances of the study, and on how surely a visit finds things out: judgement, shown in the study under survey.',
  'A visit from the street enters no building. Whoever goes inside or looks at damage keeps to local rules and to the owner’s leave.',
  'Local codes govern, and a licensed engineer decides.',
];

const WALK_STYLE = `
.walk td.answer { min-width: 9rem; height: 2.4rem; }
.walk .box { display: inline-block; width: .8rem; height: .8rem; border: 1px solid var(--ink-soft); margin-right: .4rem; vertical-align: -.1rem; }
@media print { .walk { break-inside: avoid; } .walk h3 { break-after: avoid; } }
`;

/**
 * A survey plan as the text of an HTML file.
 * @param title of the study
 * @param pageScript the built client (`readPageScript()`)
 * @param tooLarge kinds of visit that do not fit even once
 */
export function renderSurvey(title: string, plan: SurveyPlan, pageScript: string, tooLarge: readonly Visit[] = []): string {
  const charts = plan.steps.length === 0 ? [] : [gainChart(plan), visitsMap(plan)].filter((chart) => chart !== null);
  const walks = walksOf(plan.steps);
  const body = h(
    Fragment,
    null,
    h('a', { class: 'skip', href: '#walk' }, 'Skip to the walking list'),
    h(
      'div',
      { class: 'frame' },
      h(
        'header',
        { class: 'top' },
        h('p', { class: 'kicker' }, 'Survey next'),
        h('h1', null, `What to find out next: ${title}`),
        planSentences(plan, tooLarge).map((sentence, i) => h('p', i === 0 ? { class: 'answer' } : null, sentence)),
      ),
      h(
        'main',
        null,
        charts.length === 0
          ? null
          : h(
              Section,
              { id: 'gain', title: 'What it brings' },
              charts.map((chart) => h(ChartFigure, { chart })),
            ),
        h(
          Section,
          { id: 'walk', title: 'Walking list' },
          walks.length === 0 ? h('p', null, 'No visit is planned.') : walks.map((walk) => h(Walk, { walk })),
        ),
        walks.length === 0 ? null : h(Order, { plan }),
        h(
          Section,
          { id: 'cautions', title: 'Cautions' },
          h(
            'ul',
            { class: 'plain' },
            CAUTIONS.map((caution) => h('li', null, caution)),
          ),
        ),
      ),
    ),
  );
  return renderPage({
    title: `Survey next: ${title}`,
    style: BASE_STYLE + PARTS_STYLE + WALK_STYLE,
    script: pageScript,
    body,
    blocks: { 'page-charts': scriptJson(charts.map(compileChart)) },
  });
}

function Walk({ walk: { block, stops, hours } }: { readonly walk: BlockWalk }): ComponentChild {
  const name = block ?? 'No block';
  const head = ['Building', 'Visit', 'Find out', 'Answer'];
  return h(
    'div',
    { class: 'walk' },
    h('h3', null, `${name}: ${formatNumber(hours, 3)} h`),
    h(
      'div',
      { class: 'scroll', role: 'region', 'aria-label': `Visits in ${name}`, tabIndex: 0 },
      h(
        'table',
        null,
        h(
          'thead',
          null,
          h(
            'tr',
            null,
            head.map((cell) => h('th', { scope: 'col' }, cell)),
          ),
        ),
        h(
          'tbody',
          null,
          stops.flatMap(({ id, name: called, visits }) =>
            visits.map(({ place, visit, asks }) =>
              h(
                'tr',
                null,
                h('th', { scope: 'row' }, called === null ? id : `${id} ${called}`),
                h('td', null, `${visit} (visit ${String(place)})`),
                h(
                  'td',
                  null,
                  asks.map((unknown) => h('div', null, h('span', { class: 'box', 'aria-hidden': true }), ASKED[unknown])),
                ),
                h('td', { class: 'answer' }),
              ),
            ),
          ),
        ),
      ),
    ),
  );
}

function Order({ plan: { steps, cost } }: { readonly plan: SurveyPlan }): ComponentChild {
  const table = {
    caption: 'Visits in the order of their worth for their cost',
    head: ['Visit', 'Building', 'Rank', 'Kind', 'Because', 'Worth', { hours: 'Worth per hour', money: 'Worth per money', both: 'Worth per % of hours and money' }[cost], 'Hours so far', 'Expected wrong places'],
    rows: steps.map((step) => [
      String(step.place),
      step.name === null ? step.id : `${step.id} ${step.name}`,
      String(step.rank),
      step.visit,
      reasonWord(step),
      formatNumber(step.value, 3),
      perCostWord(step),
      formatNumber(step.hours_so_far, 3),
      formatNumber(step.expected_wrong_places, 3),
    ]),
  };
  return h(
    Section,
    { id: 'order', title: 'Order of visits' },
    h('p', { class: 'quiet' }, 'Worth is in units of the priority of the median building.'),
    h(TableRegion, { table, label: table.caption }),
  );
}

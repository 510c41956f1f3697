/** The page of a comparison: one self-contained HTML file, like the dashboard. */
import { Fragment, h } from 'preact';
import type { ComponentChild } from 'preact';
import { formatCount } from '../engineering/format.js';
import type { Comparison } from '../screening/compare-runs.js';
import { beforeAfterChart } from './compare/chart.js';
import { DataSection, MovesSection, SettingsSection } from './compare/sections.js';
import { differenceSentences, listSentence, orderSentences, runNames } from './compare/words.js';
import { compileChart } from './dashboard/charts/compile.js';
import { Section } from './dashboard/elements.js';
import { ChartFigure } from './dashboard/sections/chart-figure.js';
import { BASE_STYLE } from './dashboard/style/base.js';
import { PARTS_STYLE } from './dashboard/style/parts.js';
import { scriptJson } from './html.js';
import { madeAt } from './made-at.js';
import { renderPage } from './page.js';

const CONTENTS: readonly (readonly [string, string])[] = [
  ['lists', 'The two lists'],
  ['moves', 'Why they moved'],
  ['data', 'What changed in the data'],
  ['settings', 'What changed in the settings'],
  ['cautions', 'Cautions'],
];

const CAUTIONS: readonly string[] = [
  'Both runs order buildings for further assessment; neither is a statement on the safety of any building, and a lower rank than before is not clearance.',
  'The parts of a change of ln S are those of the most likely case of system and era, at its central values; “spread and cases” is what is left of the change of the median: spread, the other cases, the other direction.',
  'Ranks inside a tie group are not distinguishable: a move within one means little.',
  'Local codes govern, and a licensed engineer decides.',
];

/**
 * The comparison of two runs as the text of an HTML file.
 * @param pageScript the built client (`readPageScript()`)
 */
export function renderComparison(comparison: Comparison, pageScript: string): string {
  const chart = beforeAfterChart(comparison);
  const [before, after] = runNames(comparison);
  const title = `What changed from ${before} to ${after}`;
  const body = h(
    Fragment,
    null,
    h('a', { class: 'skip', href: '#lists' }, 'Skip to the two lists'),
    h(
      'div',
      { class: 'frame' },
      h(Top, { comparison, title }),
      h(
        'main',
        null,
        h(Section, { id: 'lists', title: 'The two lists' }, h(ChartFigure, { chart })),
        h(MovesSection, { comparison }),
        h(DataSection, { comparison }),
        h(SettingsSection, { comparison }),
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
      h('footer', null, `Written by ${comparison.after.program}.`),
    ),
  );
  return renderPage({
    title,
    style: BASE_STYLE + PARTS_STYLE,
    script: pageScript,
    body,
    blocks: { 'page-charts': scriptJson([compileChart(chart)]) },
  });
}

function Top({ comparison, title }: { readonly comparison: Comparison; readonly title: string }): ComponentChild {
  const run = ({ run: number, title: of, made, note, buildings, ranked, list_size, rank_by }: Comparison['before']) =>
    `Run ${String(number)} of “${of}”, made ${madeAt(made)}: ${formatCount(buildings)} buildings, ${formatCount(ranked)} ranked by ${rank_by}, a list of ${formatCount(list_size)}.${note === '' ? '' : ` Note: ${note}`}`;
  return h(
    'header',
    { class: 'top' },
    h('p', { class: 'kicker' }, 'Two rankings side by side'),
    h('h1', null, title),
    h('p', { class: 'quiet' }, `Before: ${run(comparison.before)}`),
    h('p', { class: 'quiet' }, `After: ${run(comparison.after)}`),
    h('p', { class: 'answer' }, listSentence(comparison)),
    [...orderSentences(comparison), ...differenceSentences(comparison)].map((sentence) => h('p', null, sentence)),
    h(
      'nav',
      { class: 'contents', 'aria-label': 'Contents' },
      h(
        'ul',
        null,
        CONTENTS.map(([id, name]) => h('li', null, h('a', { href: `#${id}` }, name))),
      ),
    ),
  );
}

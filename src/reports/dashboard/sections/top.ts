/** The head of the page: what this is, the answer, the cautions, the contents. */
import { h } from 'preact';
import type { ComponentChild } from 'preact';
import type { PageData } from '../../../engineering/page-contract.js';
import { madeAt } from '../../made-at.js';
import { counted } from '../reading.js';
import { answerNotes, answerSentence, orderSentence } from '../answers.js';

const CONTENTS: readonly (readonly [string, string])[] = [
  ['list', 'The list'],
  ['periods', 'Spectrum and periods'],
  ['places', 'Map'],
  ['origins', 'Where the numbers came from'],
  ['sites', 'Sites'],
  ['gaps', 'Short gaps'],
  ['survey', 'What to find out next'],
  ['budget', 'What the money buys'],
  ['sensitivity', 'What the list hangs on'],
  ['all', 'All buildings'],
  ['inventory', 'State of the inventory'],
  ['assumptions', 'Assumptions'],
  ['cautions', 'Cautions'],
];

/** Sections that stand only where there is something to tell. */
function isThere(id: string, data: PageData): boolean {
  return id === 'sites' ? data.sites.all > 0 : id !== 'gaps' || data.gaps !== null;
}

export function Top({ data }: { readonly data: PageData }): ComponentChild {
  const { summary } = data;
  return h(
    'header',
    { class: 'top' },
    h('p', { class: 'kicker' }, 'Which buildings should be assessed in detail first'),
    h('h1', null, summary.title),
    h(
      'p',
      { class: 'quiet' },
      `${summary.level_of_work} Run ${summary.run}, made ${madeAt(summary.made)}; ${counted(summary.buildings, 'building', 'buildings')} from ${counted(summary.rows_in, 'row', 'rows')}.`,
    ),
    h('p', { class: 'answer' }, answerSentence(data)),
    h(
      'div',
      { class: 'two' },
      h('div', null, [orderSentence(data), ...answerNotes(data)].map((note) => h('p', null, note))),
      h(
        'aside',
        { class: 'careful', 'aria-labelledby': 'careful-title' },
        h('h2', { id: 'careful-title' }, 'Before you use this'),
        h('ul', null, summary.cautions.filter((caution) => caution !== summary.level_of_work).slice(0, 4).map((caution) => h('li', null, caution))),
        h('p', { class: 'quiet' }, h('a', { href: '#cautions' }, 'All cautions')),
      ),
    ),
    h('nav', { class: 'contents', 'aria-label': 'Contents' }, h('ul', null, CONTENTS.filter(([id]) => isThere(id, data)).map(([id, title]) => h('li', null, h('a', { href: `#${id}` }, title))))),
  );
}

/** What to find out next: the first visits of a survey, and what they do to the list. */
import { h } from 'preact';
import type { ComponentChild } from 'preact';
import { formatCount, formatNumber } from '../../../engineering/format.js';
import type { PageData, SurveyOutlook } from '../../../engineering/page-contract.js';
import { askedWords, outlookSentence, perCostWord, reasonWord, sinceSentences, worthwhileSentence } from '../../survey/words.js';
import type { DataTable } from '../charts/chart.js';
import { Section, TableRegion } from '../elements.js';

/** The visits as a table, in the order of their worth for their cost. */
export function visitsTable({ steps, visits }: SurveyOutlook): DataTable {
  return {
    caption: `The first ${formatCount(steps.length)} of ${formatCount(visits)} visits, those worth most for an hour first`,
    head: ['Visit', 'Building', 'Rank', 'Kind', 'Find out', 'Because', 'Worth per hour', 'Hours so far', 'Expected wrong places'],
    rows: steps.map((step) => [
      formatCount(step.place),
      step.name === null ? step.id : `${step.id} ${step.name}`,
      formatCount(step.rank),
      step.visit,
      askedWords(step),
      reasonWord(step),
      perCostWord(step),
      formatNumber(step.hours_so_far, 3),
      formatNumber(step.expected_wrong_places, 3),
    ]),
  };
}

export function SurveySection({ data: { summary } }: { readonly data: PageData }): ComponentChild {
  const { survey } = summary;
  return h(
    Section,
    { id: 'survey', title: 'What to find out next' },
    survey == null
      ? h('p', null, 'No survey was planned with this run: the inventory is large, or the list holds every building. The command survey plans one.')
      : [
          h('p', null, outlookSentence(survey)),
          ...sinceSentences(summary.run, survey).map((sentence) => h('p', null, sentence)),
          h('p', { class: 'quiet' }, `${worthwhileSentence(survey, summary.ranked)} Worth is in units of the priority of the median building; the command survey plans any number of hours, with a walking list and a sheet for the field.`),
          survey.steps.length === 0 ? null : h('p', { class: 'quiet narrow-only' }, 'The table is wider than this screen: it scrolls sideways.'),
          survey.steps.length === 0 ? null : h(TableRegion, { table: visitsTable(survey), label: 'The first visits of a survey' }),
        ],
  );
}

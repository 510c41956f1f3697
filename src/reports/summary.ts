/** The summary: one page of Markdown that a council can read. */
import { formatCount, formatNumber, formatShare } from '../engineering/format.js';
import type { PageData } from '../engineering/page-contract.js';
import { answerNotes, answerSentence, attributeTotal, decisiveAttributes, orderSentence, slopeSentence } from './dashboard/answers.js';
import { capacityWords, demandPlaces, governingPeriod, listLength, numberAt } from './dashboard/reading.js';
import { doubtWords, middleSentence, reasonTeller, tellsDoubts } from './dashboard/reasons.js';
import { visitsTable } from './dashboard/sections/survey.js';
import type { DataTable } from './dashboard/charts/chart.js';
import { budgetSentences, budgetTable, sensitivitySentences, switchesTable } from './decide/words.js';
import { madeAt } from './made-at.js';
import { markdownTable, markdownText } from './markdown.js';
import { gapsPart } from './gaps/words.js';
import { sitesPart } from './sites/summary-part.js';
import { outlookSentence, sinceSentences, worthwhileSentence } from './survey/words.js';

/** Longest list printed in full; the rest stands in ranking.csv. */
const MOST_PLACES = 60;

/** The summary of a run as Markdown; every text of the inventory is made harmless. */
export function renderSummary(data: PageData): string {
  const { summary } = data;
  const parts = [
    `# ${markdownText(summary.title)}: which buildings should be assessed in detail first`,
    `${markdownText(summary.level_of_work)} Run ${markdownText(summary.run)}, made ${markdownText(madeAt(summary.made))} with ${markdownText(summary.program)}.`,
    `**${answerSentence(data)}**`,
    orderSentence(data),
    ...answerNotes(data).map((note) => markdownText(note)),
    '## The list',
    listPart(data),
    ...sitesPart(data),
    ...gapsPart(data),
    ...surveyPart(data),
    ...decidePart(data),
    '## Where the rows went',
    markdownTable(['Rows', 'Number'], [...summary.account.map(({ title, rows }) => [markdownText(title), formatCount(rows)]), ['All rows read', formatCount(summary.rows_in)]], [1]),
    '## Where the numbers came from',
    markdownTable(
      ['Attribute', 'Given', 'Inferred', 'Default', 'Unknown', 'Given, share'],
      decisiveAttributes(summary).map((attribute) => [
        markdownText(attribute.title),
        formatCount(attribute.given),
        formatCount(attribute.inferred),
        formatCount(attribute.default),
        formatCount(attribute.unknown),
        formatShare(attribute.given / attributeTotal(attribute)),
      ]),
      [1, 2, 3, 4, 5],
    ),
    `Largest block of equal priorities: ${formatCount(summary.largest_equal_block)} ${summary.largest_equal_block === 1 ? 'building, so no two share one' : 'buildings'}.`,
    ...slopesPart(data),
    '## Assumptions',
    markdownTable(
      ['Assumption', 'Value', 'Rests on'],
      summary.assumptions.map(({ statement, value, source }) => [statement, value, source].map(markdownText)),
    ),
    '## Cautions',
    summary.cautions.map((caution) => `- ${markdownText(caution)}`).join('\n'),
    `Fingerprints: study ${markdownText(summary.fingerprints.study)}, inventory ${markdownText(summary.fingerprints.inventory)}, methods ${markdownText(summary.fingerprints.methods)}.`,
  ];
  return `${parts.join('\n\n')}\n`;
}

function listPart(data: PageData): string {
  const places = listLength(data);
  if (places === 0) return 'No building could be ranked.';
  const shown = Math.min(places, MOST_PLACES);
  const reason = reasonTeller(data);
  const { buildings } = data;
  const rows = Array.from({ length: shown }, (_, i) => {
    const whole = (column: string): string => formatCount(numberAt(data, column, i));
    return [
      whole('rank'),
      markdownText(buildings.inputs.id[i] ?? ''),
      markdownText(buildings.name[i] ?? ''),
      markdownText(buildings.group[i] ?? ''),
      formatShare(numberAt(data, 'chance', i)),
      `${whole('rank_best')} to ${whole('rank_worst')}`,
      whole('tie_group'),
      demandPlaces(data, i),
      formatNumber(governingPeriod(data, i), 3),
      formatNumber(numberAt(data, 'sa_g', i), 3),
      capacityWords(data, i),
      reason(i),
      ...(tellsDoubts(data) ? [doubtWords(data, i)] : []),
    ];
  });
  const head = ['Rank', 'Id', 'Name', 'Block', 'Chance', 'Band of rank', 'Tie group', 'Rank by demand', 'T (s)', 'S_a (g)', 'Capacity (g)', 'Main reason', ...(tellsDoubts(data) ? ['Uncertain by'] : [])];
  const notes = [
    'Chance: that the building truly belongs to the list. Band: where its true rank lies, 5 to 95 %. T: median period in the governing direction. S_a and capacity: of the most likely case.',
    middleSentence(data),
    ...(tellsDoubts(data) ? ['Uncertain by: the largest share of the spread of its priority (the variance of ln S), then the largest that a visit can find out; strength is that as built, beyond what a code asked.'] : []),
    ...(shown < places ? [`The first ${formatCount(shown)} of ${formatCount(places)} places; all of them stand in ranking.csv.`] : []),
  ];
  return [markdownTable(head.map(markdownText), rows, [0, 4, 5, 6, 7, 8, 9, 10]), ...notes.map((note) => note.replaceAll('_', '\\_'))].join('\n\n');
}

/** The first visits of a survey; nothing where none was planned. */
function surveyPart({ summary: { run, survey, ranked } }: PageData): readonly string[] {
  if (survey == null) return [];
  const { head, rows } = visitsTable(survey);
  return [
    '## What to find out next',
    [outlookSentence(survey), worthwhileSentence(survey, ranked), ...sinceSentences(run, survey)].filter((text) => text !== '').join(' '),
    ...(rows.length === 0 ? [] : [markdownTable(head, rows.map((row) => row.map(markdownText)), [0, 2, 6, 7, 8])]),
  ];
}

/** What the money buys, and what the list hangs on; nothing in runs of earlier versions. */
function decidePart({ summary: { budget, sensitivity } }: PageData): readonly string[] {
  const part = (title: string, sentences: readonly string[], table: DataTable | null, right: readonly number[]): readonly string[] => [
    title,
    sentences.map(markdownText).join(' '),
    ...(table === null ? [] : [markdownTable(table.head.map(markdownText), table.rows.map((row) => row.map(markdownText)), right)]),
  ];
  return [
    ...(budget == null ? [] : part('## What the money buys', budgetSentences(budget), budgetTable(budget), [2, 3, 4])),
    ...(sensitivity == null ? [] : part('## What the list hangs on', sensitivitySentences(sensitivity), switchesTable(sensitivity), [2, 3])),
  ];
}

function slopesPart({ summary }: PageData): readonly string[] {
  const sentence = slopeSentence(summary);
  return sentence === '' ? [] : [markdownText(sentence)];
}

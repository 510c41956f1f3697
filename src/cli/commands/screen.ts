import { relative } from 'node:path';
import { formatCount, formatPlaces, formatShare } from '../../engineering/format.js';
import type { PageData } from '../../engineering/page-contract.js';
import { EXIT } from '../../errors.js';
import { screenStudy } from '../../exports/screen-study.js';
import type { ScreenedStudy } from '../../exports/screen-study.js';
import {
  answerSentence,
  heightUnitSentence,
  notRankedSentence,
  unreadSentence,
} from '../../reports/dashboard/answers.js';
import { interruptible } from '../interrupt.js';
import { printError, printJson, printLines, terminalColumns } from '../output/print.js';
import { progressLine } from '../output/progress.js';
import { styled } from '../output/style.js';
import { table } from '../output/table.js';
import { clean, wrap } from '../output/text.js';
import { accountBlock, overLimit } from './quality.js';

const SHOWN = 10;

interface Options {
  readonly note: string;
  readonly output?: string;
  readonly units: 'si' | 'us';
  readonly json?: true;
}

/** `swaymark screen`: the whole job. */
export async function screen(file: string, options: Options): Promise<number> {
  const progress = progressLine();
  return interruptible(
    async ({ onOpen, check }) => {
      try {
        const screened = await screenStudy(file, {
          made: new Date(),
          note: options.note,
          units: options.units,
          output: options.output,
          onOpen,
          onProgress: (step) => {
            check();
            progress.update(step);
          },
        });
        progress.end();
        if (options.json) printJson(asJson(screened));
        else printLines(lines(screened, terminalColumns()));
        return screened.rejected.over ? EXIT.findings : EXIT.clean;
      } finally {
        progress.end();
      }
    },
    () => {
      printError('stopped; nothing of this run is kept, earlier runs and reports are as they were');
    },
  );
}

interface Place {
  readonly rank: number;
  readonly id: string;
  readonly name: string | null;
  readonly chance: number;
  readonly rank_best: number;
  readonly rank_worst: number;
  readonly tie_group: number;
  readonly demand_rank: number;
  /** Last of the places that buildings of the same demand share; NaN where the run has none on record. */
  readonly demand_rank_last: number;
}

/** The places of the list, as far as the page holds them. */
function places({ summary, buildings }: PageData): readonly Place[] {
  const count = Math.min(summary.list_size, summary.ranked, buildings.shown);
  return Array.from({ length: count }, (_, i) => {
    const number = (name: string): number => Number(buildings.results[name]?.[i] ?? NaN);
    return {
      rank: number('rank'),
      id: buildings.inputs.id[i] ?? '',
      name: buildings.name[i] ?? null,
      chance: number('chance'),
      rank_best: number('rank_best'),
      rank_worst: number('rank_worst'),
      tie_group: number('tie_group'),
      demand_rank: number('demand_rank'),
      demand_rank_last: number('demand_rank_last'),
    };
  });
}

function asJson({ runId, data, files, rejected }: ScreenedStudy): unknown {
  return {
    ...data.summary,
    run: runId,
    answer: answerSentence(data),
    unread: unreadSentence(data.summary),
    rejected,
    list: places(data),
    files,
  };
}

function lines({ runId, data, files, rejected }: ScreenedStudy, columns: number): string[] {
  const { summary } = data;
  const list = places(data);
  const rows = list
    .slice(0, SHOWN)
    .map((place) => [
      String(place.rank),
      place.id,
      place.name ?? '',
      formatShare(place.chance),
      `${formatCount(place.rank_best)} to ${formatCount(place.rank_worst)}`,
      String(place.tie_group),
      formatPlaces(place.demand_rank, place.demand_rank_last),
    ]);
  const head = [
    { title: 'Rank', right: true },
    { title: 'Building', shrinkTo: 8 },
    { title: 'Name', shrinkTo: 10, spare: 1 },
    { title: 'Chance', right: true },
    { title: 'Rank band', right: true },
    { title: 'Tie group', right: true },
    { title: 'Demand rank', right: true },
  ];
  const more = list.length - rows.length;
  const seen = files.map((path) => relative(process.cwd(), path) || path);
  return [
    styled('bold', clean(summary.title)),
    '',
    ...accountBlock(summary.rows_in, summary.buildings, summary.account),
    '',
    ...wrap(clean(answerSentence(data)), columns),
    '',
    ...[notRankedSentence(summary), unreadSentence(summary), heightUnitSentence(summary)].flatMap((sentence) =>
      sentence === '' ? [] : [...wrap(clean(sentence), columns), ''],
    ),
    ...(rows.length === 0
      ? []
      : [...table(head, rows, columns), ...(more > 0 ? [`and ${formatCount(more)} more on the list`] : []), '']),
    ...(rows.length === 0
      ? []
      : [
          ...wrap(
            'Chance: of truly belonging to the list. Rank band: 90 % range of the rank. Tie group: buildings that cannot be told apart. Demand rank: by spectral demand alone.',
            columns,
          ),
          '',
        ]),
    `Run ${String(runId)} is kept. Written:`,
    ...seen.map((path) => `  ${clean(path)}`),
    '',
    ...(rejected.over ? [...wrap(overLimit(rejected), columns), ''] : []),
    ...wrap(
      'An order for further assessment, not a statement on the safety of any building; the cautions stand in every report.',
      columns,
    ),
  ];
}

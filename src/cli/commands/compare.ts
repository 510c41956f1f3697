import { relative } from 'node:path';
import { formatCount } from '../../engineering/format.js';
import { EXIT } from '../../errors.js';
import { compareStudy } from '../../exports/compare-study.js';
import {
  differenceSentences,
  listSentence,
  listWord,
  moveWords,
  orderSentences,
  partsWords,
  rankWord,
  reasonWords,
  runNames,
  settingValue,
} from '../../reports/compare/words.js';
import type { Comparison, ExplainedMove } from '../../screening/compare-runs.js';
import { findStudy } from '../find-study.js';
import { printJson, printLines, terminalColumns } from '../output/print.js';
import { styled } from '../output/style.js';
import { table } from '../output/table.js';
import { clean, wrap } from '../output/text.js';

export interface CompareCommandOptions {
  readonly study?: string;
  readonly otherStudy?: string;
  readonly most: number;
  readonly output?: string;
  readonly page: boolean;
  readonly json?: true;
}

/** Buildings whose move is written out in words, of those that entered, left or moved. */
const WRITTEN_OUT = 12;
/** Fields, settings and rows of the list shown; the JSON and the page have more. */
const SHOWN = 12;
const ROWS = 40;

/** `swaymark compare`: two runs side by side. */
export async function compare(
  before: number | undefined,
  after: number | undefined,
  options: CompareCommandOptions,
): Promise<number> {
  const { otherStudy, most, output, page: wanted } = options;
  const { comparison, page } = await compareStudy(findStudy(options.study), {
    before,
    after,
    otherStudy,
    most,
    output,
    page: wanted,
  });
  if (options.json) printJson({ ...comparison, page });
  else printLines(lines(comparison, page, terminalColumns()));
  return EXIT.clean;
}

function lines(comparison: Comparison, page: string | null, columns: number): string[] {
  const [before, after] = runNames(comparison);
  const paragraphs = [listSentence(comparison), ...orderSentences(comparison), ...differenceSentences(comparison)];
  return [
    ...wrap(clean(`From ${before} to ${after}`), columns).map((line) => styled('bold', line)),
    ...paragraphs.flatMap((text) => wrap(clean(text), columns)),
    '',
    ...settingLines(comparison, columns),
    ...fieldLines(comparison, columns),
    ...moveTable(comparison, columns),
    ...reasonLines(comparison, columns),
    ...(page === null ? [] : [`Written: ${clean(relative(process.cwd(), page) || page)}`, '']),
    ...wrap('An order for further assessment, not a statement on the safety of any building.', columns),
  ];
}

function more(all: number, shown: number, indent = ''): string[] {
  return all > shown ? [`${indent}and ${formatCount(all - shown)} more`] : [];
}

function settingLines({ settings, before, after }: Comparison, columns: number): string[] {
  if (settings.length === 0) return [];
  return [
    ...table(
      [
        { title: 'Setting', shrinkTo: 20 },
        { title: `Run ${String(before.run)}`, shrinkTo: 10 },
        { title: `Run ${String(after.run)}`, shrinkTo: 10 },
      ],
      settings.slice(0, SHOWN).map((change) => [change.path, settingValue(change.before), settingValue(change.after)]),
      columns,
    ),
    ...more(settings.length, SHOWN),
    '',
  ];
}

function fieldLines({ data }: Comparison, columns: number): string[] {
  if (data.fields.length === 0) return [];
  return [
    ...table(
      [
        { title: 'Field that differs', shrinkTo: 16 },
        { title: 'Buildings', right: true },
        { title: 'given both times', right: true },
      ],
      data.fields
        .slice(0, SHOWN)
        .map(({ title, buildings, given_both }) => [title, formatCount(buildings), formatCount(given_both)]),
      columns,
    ),
    ...more(data.fields.length, SHOWN),
    '',
  ];
}

/** It stands at another rank or on one list only; where nothing of this is so there is nothing to say of a building. */
function isMoved({ rank, rank_before, listed, listed_before }: ExplainedMove): boolean {
  return rank !== rank_before || listed !== listed_before;
}

function moveTable({ buildings, before, after }: Comparison, columns: number): string[] {
  const moved = buildings.filter(isMoved);
  if (moved.length === 0) return [];
  return [
    ...table(
      [
        { title: 'Building', shrinkTo: 8 },
        { title: 'Name', shrinkTo: 10, spare: 1 },
        { title: `Run ${String(before.run)}`, right: true },
        { title: `Run ${String(after.run)}`, right: true },
        { title: 'List' },
        { title: 'Own', right: true },
        { title: 'Others', right: true },
        { title: 'Came, left', right: true, spare: 2 },
      ],
      moved
        .slice(0, ROWS)
        .map((one) => [
          one.id,
          one.name ?? '',
          rankWord(one.rank_before),
          rankWord(one.rank),
          listWord(one),
          ...(one.move === null ? ['', '', ''] : [one.move.own, one.move.others, one.move.came_and_left].map(places)),
        ]),
      columns,
    ),
    ...more(moved.length, ROWS),
    ...wrap('Own, Others, Came and left: places gained (+) or lost (−); they add to the move.', columns),
    '',
  ];
}

/** Places gained are counted up, as a reader of a list does. */
function places(down: number): string {
  return down === 0 ? '0' : `${down < 0 ? '+' : '−'}${formatCount(Math.abs(down))}`;
}

function reasonLines({ buildings }: Comparison, columns: number): string[] {
  const moved = buildings.filter((one) => isMoved(one) || one.inputs.length > 0);
  const weight = ({ listed, listed_before }: ExplainedMove): number => (listed === listed_before ? 1 : 0);
  const first = [...moved].sort((a, b) => weight(a) - weight(b)).slice(0, WRITTEN_OUT);
  if (first.length === 0) return [];
  return [
    styled('bold', 'Why'),
    ...first.flatMap((one) =>
      wrap(
        clean(
          `${one.id}: ${[`rank ${rankWord(one.rank_before)} → ${rankWord(one.rank)}`, moveWords(one), partsWords(one), reasonWords(one)].filter((text) => text !== '').join('; ')}`,
        ),
        columns,
        '  ',
        '      ',
      ),
    ),
    ...more(moved.length, WRITTEN_OUT, '  '),
    '',
  ];
}

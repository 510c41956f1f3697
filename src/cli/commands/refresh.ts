import { relative } from 'node:path';
import { formatCount } from '../../engineering/format.js';
import { EXIT, UserError, showValue } from '../../errors.js';
import { refreshStudy, sweepStudy } from '../../exports/refresh-study.js';
import type { RefreshChoice, RefreshedStudy, SweptStudy } from '../../exports/refresh-study.js';
import type { ListChange, ListMove } from '../../screening/list-changes.js';
import { parameterFromText, rangeFromText } from '../../study/parameters.js';
import { dotted } from '../../study/problems.js';
import { findStudy } from '../find-study.js';
import { interruptible } from '../interrupt.js';
import { printError, printJson, printLines, terminalColumns } from '../output/print.js';
import { progressLine } from '../output/progress.js';
import { table } from '../output/table.js';
import { clean, wrap } from '../output/text.js';
import { overLimit } from './quality.js';

/** Buildings shown that entered, and that left; the JSON has all. */
const SHOWN = 10;
/** The same in one cell of the table of a sweep. */
const SHOWN_IN_CELL = 3;

export interface RefreshCommandOptions {
  readonly set: readonly string[];
  readonly with?: string;
  readonly sweep?: string;
  readonly study?: string;
  readonly run?: number;
  readonly write?: true;
  readonly note: string;
  readonly reports: boolean;
  readonly output?: string;
  readonly units: 'si' | 'us';
  readonly json?: true;
}

/** `swaymark refresh`: a new run with changed parameters, or a sweep over a range of one. */
export async function refresh(options: RefreshCommandOptions): Promise<number> {
  const study = findStudy(options.study);
  const set = options.set.map((text) => parameterFromText(text, `--set ${text}`));
  const { sweep } = options;
  if (sweep !== undefined) refuseKeeping(options);
  const progress = progressLine();
  return interruptible(
    async ({ onOpen, check }) => {
      const choice = {
        set,
        with: options.with,
        run: options.run,
        onOpen,
        onProgress: (step: { readonly step: string; readonly share: number }): void => {
          check();
          progress.update(step);
        },
      } satisfies RefreshChoice & { readonly onProgress: unknown };
      try {
        if (sweep !== undefined) {
          const swept = await sweepStudy(study, rangeFromText(sweep, `--sweep ${sweep}`), choice);
          progress.end();
          if (options.json) printJson(swept);
          else printLines(sweepLines(swept, terminalColumns()));
          return EXIT.clean;
        }
        const { note, units, output, reports, write = false } = options;
        const refreshed = await refreshStudy(study, { ...choice, note, units, output, reports, write });
        progress.end();
        if (options.json) printJson(asJson(refreshed));
        else printLines(refreshLines(refreshed, terminalColumns()));
        return refreshed.rejected.over ? EXIT.findings : EXIT.clean;
      } finally {
        progress.end();
      }
    },
    () => {
      printError('stopped; nothing of this run is kept, earlier runs and reports are as they were');
    },
  );
}

/** @throws UserError for an option about the run that a sweep does not keep. */
function refuseKeeping({ write, note, output, reports }: RefreshCommandOptions): void {
  const given = [
    write === true ? '--write' : '',
    note === '' ? '' : '--note',
    output === undefined ? '' : '--output',
    reports ? '' : '--no-reports',
  ].filter((name) => name !== '');
  if (given.length > 0)
    throw new UserError(`a sweep keeps no run and writes no file; leave out ${given.join(' and ')}`, {
      key: '--sweep',
    });
}

function asJson({ runId, base, changes, list, summary, files, written, rejected }: RefreshedStudy): unknown {
  return {
    run: runId,
    base,
    changes: changes.map(({ path, from, to }) => ({ path: dotted(path), from: from ?? null, to: to ?? null })),
    ...summary,
    list,
    rejected,
    files,
    written,
  };
}

/** "18 of 20". */
function overlapOf({ overlap, places }: ListChange): string {
  return `${formatCount(overlap)} of ${formatCount(places)}`;
}

const rankText = (rank: number | null): string => (rank === null ? 'not ranked' : formatCount(rank));

function moveRows(what: string, moves: readonly ListMove[]): string[][] {
  const rows = moves
    .slice(0, SHOWN)
    .map(({ id, name, rank_before, rank }) => [what, id, name ?? '', rankText(rank_before), rankText(rank)]);
  if (moves.length > SHOWN) rows.push([what, `and ${formatCount(moves.length - SHOWN)} more`, '', '', '']);
  return rows;
}

function refreshLines(refreshed: RefreshedStudy, columns: number): string[] {
  const { runId, base, changes, list, summary, files, written, rejected } = refreshed;
  const [before, now] = [`Run ${String(base)}`, `Run ${String(runId)}`];
  const shown = (value: unknown): string => (value === undefined ? 'not there' : showValue(value));
  const parameters = changes.map(({ path, from, to }) => [dotted(path), shown(from), shown(to)]);
  const moves = [...moveRows('enters', list.entered), ...moveRows('leaves', list.left)];
  const seen = (path: string): string => clean(relative(process.cwd(), path) || path);
  return [
    ...wrap(`${now} ranks the ${formatCount(summary.buildings)} buildings kept with run ${String(base)}.`, columns),
    '',
    ...(parameters.length === 0
      ? [`No parameter differs from those of run ${String(base)}.`]
      : table(
          [
            { title: 'Parameter', shrinkTo: 20 },
            { title: before, shrinkTo: 10 },
            { title: now, shrinkTo: 10 },
          ],
          parameters,
          columns,
        )),
    '',
    ...wrap(
      `Of the ${formatCount(list.places)} places of the list ${formatCount(list.overlap)} are held by buildings of the list of run ${String(base)}; ${summary.expected_wrong_places.toFixed(1)} are expected to be wrong, ${formatCount(summary.sure_places)} are sure.`,
      columns,
    ),
    '',
    ...(moves.length === 0
      ? []
      : [
          ...table(
            [
              { title: 'List' },
              { title: 'Building', shrinkTo: 8 },
              { title: 'Name', shrinkTo: 10, spare: 1 },
              { title: `Rank in run ${String(base)}`, right: true },
              { title: `in run ${String(runId)}`, right: true },
            ],
            moves,
            columns,
          ),
          '',
        ]),
    `Run ${String(runId)} is kept.${files.length === 0 ? '' : ' Written:'}`,
    ...files.map((path) => `  ${seen(path)}`),
    ...(written === null ? [] : [`The parameters stand in ${seen(written)} now.`]),
    '',
    ...(rejected.over ? [...wrap(overLimit(rejected), columns), ''] : []),
    ...wrap('An order for further assessment, not a statement on the safety of any building.', columns),
  ];
}

function sweepLines({ base, path, values }: SweptStudy, columns: number): string[] {
  const cell = (moves: readonly ListMove[]): string => {
    const ids = moves.slice(0, SHOWN_IN_CELL).map(({ id }) => id);
    const more = moves.length - ids.length;
    return `${ids.join(', ')}${more > 0 ? ` and ${formatCount(more)} more` : ''}`;
  };
  return [
    ...wrap(`${clean(path)}: the list against that of run ${String(base)}`, columns),
    '',
    ...table(
      [
        { title: 'Value', right: true },
        { title: 'Overlap', right: true },
        { title: 'Enter', shrinkTo: 8, spare: 1 },
        { title: 'Leave', shrinkTo: 8, spare: 2 },
        { title: 'Wrong', right: true },
        { title: 'Sure', right: true },
      ],
      values.map((one) => [
        String(one.value),
        overlapOf(one),
        cell(one.entered),
        cell(one.left),
        one.expected_wrong_places.toFixed(1),
        formatCount(one.sure_places),
      ]),
      columns,
    ),
    '',
    ...wrap(
      `Overlap: places held by buildings that are on the list of run ${String(base)} too. Wrong: places expected to be wrong. Sure: places held with a chance of at least 80 %. Nothing is kept.`,
      columns,
    ),
  ];
}

import { formatCount, formatShare } from '../../engineering/format.js';
import { EXIT, showValue } from '../../errors.js';
import { listStudyRuns, noteRun, showRun } from '../../runs/open.js';
import type { FolderRun } from '../../runs/open.js';
import type { RunChanges, RunSheet, SettingDifference } from '../../runs/sheet.js';
import { findStudy } from '../find-study.js';
import { printJson, printLines, terminalColumns } from '../output/print.js';
import { styled } from '../output/style.js';
import { table } from '../output/table.js';
import { clean, pad, wrap } from '../output/text.js';
import { accountBlock } from './quality.js';

export interface RunsOptions {
  readonly study?: string;
  readonly json?: true;
}

/** Places of the list shown, and differing values; the JSON has all. */
const SHOWN = 100;
const SHOWN_CHANGES = 30;

/** When a run was made, to the minute. */
export function minuteOf(made: string): string {
  return made.slice(0, 16).replace('T', ' ');
}

/** `swaymark runs`: the runs kept for a study. */
export async function runs(options: RunsOptions): Promise<number> {
  const kept = await listStudyRuns(findStudy(options.study));
  if (options.json) printJson(kept);
  else printLines(listLines(kept, terminalColumns()));
  return EXIT.clean;
}

function listLines(kept: readonly FolderRun[], columns: number): string[] {
  if (kept.length === 0) return ['This study has no run; swaymark screen makes one.'];
  const others = kept.some(({ own }) => !own);
  const head = [
    { title: 'Run', right: true },
    { title: 'Made (UTC)', spare: 1 },
    ...(others ? [{ title: 'Study file', shrinkTo: 10 }] : []),
    { title: 'Title', shrinkTo: 12, spare: 6 },
    { title: 'Buildings', right: true, spare: 5 },
    { title: 'Ranked', right: true, spare: 3 },
    { title: 'List', right: true, spare: 2 },
    { title: 'Rank by', spare: 4 },
    { title: 'Study' },
    { title: 'Inventory' },
    { title: 'Methods' },
  ];
  const [title = '', ...lines] = table(
    head,
    kept.map((run) => [
      String(run.run),
      minuteOf(run.made),
      ...(others ? [run.study_file ?? 'not kept'] : []),
      run.title,
      formatCount(run.buildings),
      formatCount(run.ranked),
      formatCount(run.list_size),
      run.rank_by,
      ...[run.fingerprints.study, run.fingerprints.inventory, run.fingerprints.methods].map((one) => one.slice(0, 8)),
    ]),
    columns,
  );
  // A note stands under its run: beside it, nothing of it would be left.
  const indent = ' '.repeat(Math.max(3, String(kept.at(-1)?.run).length) + 2);
  return [
    title,
    ...lines.flatMap((line, at) => {
      const note = clean(kept[at]?.note ?? '');
      return note === '' ? [line] : [line, ...wrap(note, columns, indent)];
    }),
    ...(others ? ['', ...wrap(folderSentence(kept), columns)] : []),
  ];
}

/** Which run commands take where study files share a folder. */
function folderSentence(kept: readonly FolderRun[]): string {
  const newest = kept.findLast(({ own }) => own);
  const rule =
    'A run is of the study file it was made with; one of another file of the folder is taken where --run names it';
  return newest === undefined
    ? `None of them was made with this study. ${rule}.`
    : `Commands take run ${String(newest.run)}, the newest of this study. ${rule}.`;
}

/** `swaymark runs show`: everything kept about a run. */
export async function showOneRun(run: number, options: RunsOptions): Promise<number> {
  const sheet = await showRun(findStudy(options.study), run);
  if (options.json) printJson(sheet);
  else printLines(sheetLines(sheet, Math.min(terminalColumns(), 100)));
  return EXIT.clean;
}

function sheetLines(sheet: RunSheet, columns: number): string[] {
  const { fingerprints, inventory } = sheet;
  const facts: readonly (readonly [string, string])[] = [
    ['Made', `${minuteOf(sheet.made)} UTC by ${sheet.program}`],
    ['Note', sheet.note === '' ? 'none' : sheet.note],
    ['Study', `${fingerprints.study}${sheet.study_file === null ? '' : `, ${sheet.study_file}`}`],
    ['Inventory', `${fingerprints.inventory}, ${inventory.file} in ${inventory.encoding}`],
    ['Methods', fingerprints.methods],
    ['Ranked', `${formatCount(sheet.ranked)}, not ranked ${formatCount(sheet.not_ranked)}`],
    ['Rank by', sheet.rank_by],
    ['List size', formatCount(sheet.list_size)],
    ['Seed', String(sheet.seed)],
    [
      'List',
      `${sheet.expected_wrong_places.toFixed(1)} places expected to be wrong, ${formatCount(sheet.sure_places)} sure`,
    ],
  ];
  return [
    ...wrap(`Run ${String(sheet.run)}: ${clean(sheet.title)}`, columns).map((line) => styled('bold', line)),
    '',
    ...facts.flatMap(([name, value]) => wrap(clean(value), columns, `  ${pad(name, 9)}  `, ' '.repeat(13))),
    '',
    ...accountBlock(inventory.rows_in, inventory.buildings, sheet.account),
    '',
    ...listBlock(sheet, columns),
    '',
    ...(sheet.before === null ? ['The oldest run kept.'] : changeLines(sheet, sheet.before, columns)),
  ];
}

function listBlock({ list }: RunSheet, columns: number): string[] {
  const rows = list
    .slice(0, SHOWN)
    .map(({ rank, id, name, group, chance, rank_best, rank_worst }) => [
      formatCount(rank),
      id,
      name ?? '',
      group ?? '',
      formatShare(chance),
      `${formatCount(rank_best)} to ${formatCount(rank_worst)}`,
    ]);
  const head = [
    { title: 'Rank', right: true },
    { title: 'Building', shrinkTo: 8 },
    { title: 'Name', shrinkTo: 10, spare: 1 },
    { title: 'Group', shrinkTo: 8, spare: 2 },
    { title: 'Chance', right: true },
    { title: 'Band', right: true },
  ];
  return [...table(head, rows, columns), ...more(list.length - SHOWN)];
}

function changeLines({ run }: RunSheet, before: RunChanges, columns: number): string[] {
  const base = String(before.run);
  const { others } = before;
  const lines =
    others.length === 0 ? [] : [...wrap(`Against run ${base}: another ${others.join(', another ')}.`, columns)];
  // What the study's file says is what `refresh --set` knows; the settings tell where only a file it names, or nothing of it, differs.
  const isStudy = before.study !== null && before.study.length > 0;
  const changes = isStudy ? (before.study ?? []) : before.settings;
  if (changes.length === 0) return [...lines, `No setting differs from those of run ${base}.`];
  const what = isStudy ? 'Study' : 'Setting';
  return [
    ...lines,
    ...table(
      [
        { title: what, shrinkTo: 20 },
        { title: `Run ${base}`, shrinkTo: 10 },
        { title: `Run ${String(run)}`, shrinkTo: 10 },
      ],
      changes.slice(0, SHOWN_CHANGES).map((change) => changeRow(change)),
      columns,
    ),
    ...more(changes.length - SHOWN_CHANGES),
  ];
}

function changeRow({ path, from, to }: SettingDifference): readonly string[] {
  const shown = (value: unknown): string => (value === undefined ? 'not there' : showValue(value));
  return [path, shown(from), shown(to)];
}

function more(count: number): string[] {
  return count > 0 ? [`and ${formatCount(count)} more (--json has all)`] : [];
}

/** `swaymark runs note`: another note for a run. */
export async function noteOneRun(run: number, text: string, options: RunsOptions): Promise<number> {
  const before = await noteRun(findStudy(options.study), run, text);
  if (options.json) {
    printJson({ run, note: text, note_before: before.note });
    return EXIT.clean;
  }
  const now = text === '' ? 'has no note now' : `is noted ${showValue(text)}`;
  const was = before.note === '' ? '' : `; before: ${showValue(before.note)}`;
  printLines(wrap(clean(`Run ${String(run)} ${now}${was}.`), terminalColumns()));
  return EXIT.clean;
}

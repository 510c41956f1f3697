import { EXIT, UserError, showValue } from '../../errors.js';
import { answersSinceRun, listAnswers, withdrawAnswers } from '../../exports/held-answers.js';
import { takeAnswers } from '../../exports/take-answers.js';
import type { TakenAnswers } from '../../exports/take-answers.js';
import type { HeldAnswer } from '../../inventory/kept-answers.js';
import { ASKED, sinceSentences } from '../../reports/survey/words.js';
import { findStudy } from '../find-study.js';
import { printJson, printLines, terminalColumns } from '../output/print.js';
import { table } from '../output/table.js';
import { clean, wrap } from '../output/text.js';

export interface AnswersCommandOptions {
  readonly take?: string;
  readonly answers?: true;
  readonly withdraw?: string;
  readonly question?: string;
  readonly study?: string;
  readonly json?: true;
  /** Of a plan. */
  readonly hours?: number;
  readonly money?: number;
  readonly run?: number;
  readonly csv?: string;
  readonly output?: string;
}

/** What `survey` does to the answers of surveys, or null where it plans. @throws UserError for options that do not go together. */
export function answersJob(options: AnswersCommandOptions): (() => Promise<number>) | null {
  const { take, answers, withdraw, question, json, hours, money, run, csv, output } = options;
  const jobs = given({ take, answers, withdraw });
  const [job] = jobs;
  if (question !== undefined && withdraw === undefined)
    throw new UserError('--question says which answers for a building are withdrawn; name it: --withdraw <id>');
  if (job === undefined) return null;
  const beside = [...jobs.slice(1), ...given({ hours, money, run, csv, output })];
  if (beside.length > 0) {
    const what = { '--take': 'brings answers back', '--answers': 'lists answers', '--withdraw': 'withdraws answers' };
    throw new UserError(
      `${job} ${what[job as keyof typeof what]} and does nothing else; leave out ${beside.join(', ')}`,
    );
  }
  return () => {
    const study = findStudy(options.study);
    if (take !== undefined) return takeBack(study, take, json);
    return withdraw === undefined ? listed(study, json) : withdrawn(study, withdraw, question, json);
  };
}

function given(options: Readonly<Record<string, unknown>>): readonly string[] {
  return Object.entries(options).flatMap(([name, value]) => (value === undefined ? [] : [`--${name}`]));
}

function counted(count: number, one: string, many: string): string {
  return `${String(count)} ${count === 1 ? one : many}`;
}

/** `swaymark survey --take`: the sheet that was filled in. */
async function takeBack(study: string, file: string, json: true | undefined): Promise<number> {
  const taken = await takeAnswers(study, file, new Date());
  if (json) printJson(taken);
  else printLines(takenSentences(taken).flatMap((text) => wrap(text, terminalColumns())));
  return EXIT.clean;
}

function takenSentences({
  answers,
  buildings,
  columns,
  not_found,
  on_record,
  answered_later,
  not_read,
}: TakenAnswers): readonly string[] {
  const missing = Object.values(not_found).reduce((sum, count) => sum + count, 0);
  const named = (counts: Readonly<Record<string, number>>): string =>
    Object.entries(counts)
      .map(([name, count]) => `${name} (${String(count)})`)
      .join(', ');
  const where = `for ${counted(buildings, 'building', 'buildings')}`;
  return [
    ...(answers === 0 ? [] : [`${counted(answers, 'answer', 'answers')} ${where} taken: ${named(columns)}.`]),
    ...(missing === 0
      ? []
      : [
          `${counted(missing, 'cell', 'cells')}${answers === 0 ? ` ${where}` : ''} ${missing === 1 ? 'says' : 'say'} that it could not be found out: ${named(not_found)}. \`swaymark survey\` no longer counts on that kind of visit for it; others may still find it out.`,
        ]),
    ...(on_record === 0
      ? []
      : [
          `${counted(on_record, 'cell is', 'cells are')} on record already, with the same visit, surveyor, date and remark, and ${on_record === 1 ? 'is' : 'are'} not taken again${answered_later === 0 ? '' : `; ${String(answered_later)} of them ${answered_later === 1 ? 'was' : 'were'} answered later, and the later answer counts`}.`,
        ]),
    ...(not_read.length === 0
      ? []
      : [`Not read, as they are no columns of a sheet of answers: ${clean(not_read.map(showValue).join(', '))}.`]),
    ...(answers === 0 && missing === 0 ? ['Nothing new is taken.'] : []),
    ...(answers === 0
      ? []
      : [
          'They are kept in study.duckdb beside the inventory, whose file stays as it is; `swaymark screen` ranks with them.',
        ]),
  ];
}

/** `swaymark survey --answers`: all that surveys have brought back. */
async function listed(study: string, json: true | undefined): Promise<number> {
  const held = await listAnswers(study);
  if (json) printJson(held);
  else {
    const since = await answersSinceRun(study);
    const told = since === null ? [] : sinceSentences(String(since.run), since);
    printLines(listLines(held, told, terminalColumns()));
  }
  return EXIT.clean;
}

function listLines(held: readonly HeldAnswer[], told: readonly string[], columns: number): string[] {
  if (held.length === 0) return wrap('This study holds no answers; `swaymark survey --take` brings them in.', columns);
  return [
    ...table(
      [
        { title: 'Building', shrinkTo: 8 },
        { title: 'Question', shrinkTo: 10 },
        { title: 'Answer', shrinkTo: 10 },
        { title: 'Visit', shrinkTo: 6, spare: 1 },
        { title: 'On', shrinkTo: 10, spare: 2 },
        { title: 'By', shrinkTo: 6, spare: 3 },
        { title: 'Counts' },
      ],
      held.map((one) => [
        one.id,
        one.column,
        one.cell ?? 'not found',
        one.visit ?? '',
        one.surveyed_on ?? '',
        one.surveyor ?? '',
        countsWord(one),
      ]),
      columns,
    ),
    '',
    ...[...told, '`swaymark survey --withdraw <id>` withdraws what does not hold.'].flatMap((text) =>
      wrap(text, columns),
    ),
  ];
}

function countsWord({ counts, withdrawn: when }: HeldAnswer): string {
  if (when !== null) return `withdrawn ${when.slice(0, 10)}`;
  return counts ? 'yes' : 'no, answered later';
}

/** `swaymark survey --withdraw`. */
async function withdrawn(
  study: string,
  id: string,
  question: string | undefined,
  json: true | undefined,
): Promise<number> {
  const gone = await withdrawAnswers(study, { id, question }, new Date());
  if (json) printJson(gone);
  else {
    const columns = terminalColumns();
    printLines([
      ...wrap(`Withdrawn for ${clean(showValue(id))}:`, columns),
      ...gone.flatMap((one) => wrap(clean(goneSentence(one)), columns, '  ', '    ')),
      ...wrap(
        [
          'What is withdrawn stays on record and counts no longer.',
          ...(gone.some(({ cell }) => cell !== null)
            ? ['The next `swaymark screen` reads the cells of the inventory again.']
            : []),
        ].join(' '),
        columns,
      ),
    ]);
  }
  return EXIT.clean;
}

/** "lateral system (system): concrete shear wall, street visit of 2026-12-03 by N. N." */
function goneSentence({ question, column, cell, visit, surveyed_on, surveyor }: HeldAnswer): string {
  const source = [
    visit === null ? '' : `${visit} visit`,
    surveyed_on === null ? '' : `of ${surveyed_on}`,
    surveyor === null ? '' : `by ${surveyor}`,
  ].filter((word) => word !== '');
  return `${ASKED[question]} (${column}): ${[cell ?? 'not found', ...(source.length === 0 ? [] : [source.join(' ')])].join(', ')}`;
}

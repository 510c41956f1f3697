import { relative } from 'node:path';
import { formatNumber } from '../../engineering/format.js';
import { EXIT } from '../../errors.js';
import { surveyStudy } from '../../exports/survey-study.js';
import type { PlannedSurvey } from '../../exports/survey-study.js';
import { askedWords, perCostWord, planSentences, reasonWord } from '../../reports/survey/words.js';
import { findStudy } from '../find-study.js';
import { printJson, printLines, terminalColumns } from '../output/print.js';
import { progressLine } from '../output/progress.js';
import { styled } from '../output/style.js';
import { table } from '../output/table.js';
import { clean, wrap } from '../output/text.js';
import type { AnswersCommandOptions } from './survey-answers.js';

export interface SurveyCommandOptions extends AnswersCommandOptions {
  readonly page: boolean;
}

/** Visits shown; the sheet and the JSON have all. */
const SHOWN = 25;

/** `swaymark survey`: which building to visit next, for what. */
export async function survey(options: SurveyCommandOptions): Promise<number> {
  const { json, study, hours, money, run, csv, output, page } = options;
  const progress = progressLine();
  try {
    const planned = await surveyStudy(findStudy(study), {
      ...{ hours, money, run, csv, output, page },
      report: (step, share = NaN) => {
        progress.update({ step, share });
      },
    });
    progress.end();
    if (json) printJson({ ...planned.plan, csv: planned.csv, page: planned.page });
    else printLines(lines(planned, terminalColumns()));
    return EXIT.clean;
  } finally {
    progress.end();
  }
}

function lines({ plan, tooLarge, csv, page }: PlannedSurvey, columns: number): string[] {
  const { steps, cost } = plan;
  const money = plan.money > 0;
  return [
    styled('bold', `Survey for run ${String(plan.run)}`),
    ...planSentences(plan, tooLarge).flatMap((text) => wrap(text, columns)),
    '',
    ...(steps.length === 0
      ? []
      : [
          ...table(
            [
              { title: '#', right: true },
              { title: 'Building', shrinkTo: 8 },
              { title: 'Rank', right: true },
              { title: 'Visit', shrinkTo: 6 },
              { title: 'Find out', shrinkTo: 14 },
              { title: { hours: 'Worth/h', money: 'Worth/money', both: 'Worth/% spent' }[cost], right: true, spare: 1 },
              { title: 'Hours', right: true },
              ...(money ? [{ title: 'Money', right: true }] : []),
              { title: 'Wrong', right: true },
            ],
            steps
              .slice(0, SHOWN)
              .map((step) => [
                String(step.place),
                step.id,
                String(step.rank),
                step.visit,
                askedWords(step),
                perCostWord(step),
                formatNumber(step.hours_so_far, 3),
                ...(money ? [formatNumber(step.money_so_far, 4)] : []),
                formatNumber(step.expected_wrong_places, 2),
              ]),
            columns,
          ),
          ...(steps.length > SHOWN ? [`and ${String(steps.length - SHOWN)} more (--csv, --json)`] : []),
          '',
          ...wrap(
            'Worth: in units of the priority of the median building. Hours, Wrong: all visits to here, and the places of the list then expected to be wrong.',
            columns,
          ),
          '',
          styled('bold', 'Why'),
          ...steps
            .slice(0, 5)
            .flatMap((step) => wrap(clean(`${step.id}: ${reasonWord(step)}`), columns, '  ', '      ')),
          '',
        ]),
    ...[page, csv].flatMap((path) =>
      path === null ? [] : [`Written: ${clean(relative(process.cwd(), path) || path)}`],
    ),
    '',
    ...wrap(
      'What a visit finds out firms up an order for further assessment; it is no statement on the safety of any building.',
      columns,
    ),
  ];
}

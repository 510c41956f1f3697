/** The survey of a study planned, its page, and its sheet for the field. */
import { resolve } from 'node:path';
import { fits } from '../engineering/priority/campaign.js';
import type { Limits, Visit } from '../engineering/priority/campaign.js';
import { formatNumber } from '../engineering/format.js';
import { UserError } from '../errors.js';
import { ANSWERS, ANSWER_COLUMNS } from '../inventory/answers.js';
import { readPageScript } from '../reports/page-script.js';
import { renderSurvey } from '../reports/survey.js';
import { askedWords, reasonWord, visitWord } from '../reports/survey/words.js';
import { chosenRun, withStudyDatabase } from '../runs/open.js';
import type { Report } from '../screening/assess-inventory.js';
import { visitsOf } from '../screening/survey-outlook.js';
import { planSurvey } from '../screening/survey.js';
import type { SurveyPlan } from '../screening/survey.js';
import { loadStudyAlone } from '../study/load.js';
import { csvText } from './csv-text.js';
import { SHEET_HEAD, SHEET_TAIL } from './sheet-cells.js';
import { spareInputs } from './spare-inputs.js';
import { NamedFile } from './write-named.js';
import { prepareFolder, writeSet } from './write-set.js';

export interface SurveyChoice {
  /** Hours there are for visits; no limit when left out. */
  readonly hours?: number | undefined;
  /** Money there is for visits, in the study's currency; no limit when left out. */
  readonly money?: number | undefined;
  /** The run planned from; the newest when left out. */
  readonly run?: number | undefined;
  /** File the sheet for the field is written to. */
  readonly csv?: string | undefined;
  /** Write no page. */
  readonly page?: boolean;
  /** Folder of the page; the study's own when left out. */
  readonly output?: string | undefined;
  readonly report?: Report;
}

export interface PlannedSurvey {
  readonly plan: SurveyPlan;
  /** Kinds of visit that do not fit into the hours and the money even once. */
  readonly tooLarge: readonly Visit[];
  /** Path of the sheet, or null. */
  readonly csv: string | null;
  /** Path of the page, or null. */
  readonly page: string | null;
}

/**
 * Plans the visits to make next for the study at `path`: always the one that is worth most for an hour, or for money, or for both where both are
 * limited and that is worth more in all, until hours and money are spent. Writes survey-<run>.html into the study's folder of reports, unless told not to.
 * @throws UserError when neither is limited, for a study without runs, an unknown run, money that no visit costs, or hours or money that no visit fits into.
 * @example
 * const { plan } = await surveyStudy('study.yaml', { hours: 16 });
 */
export async function surveyStudy(
  path: string,
  { hours = Infinity, money = Infinity, run, csv, page = true, output, report }: SurveyChoice,
): Promise<PlannedSurvey> {
  if (hours === Infinity && money === Infinity)
    throw new UserError('a survey is planned within hours or money: say how many, for instance --hours 16');
  const limits = { hours, money };
  const own = await loadStudyAlone(path);
  const named = await NamedFile.claimAny(csv, '--csv', { study: own });
  const { plan, tooLarge } = await withStudyDatabase(path, async (db, loaded) => {
    const { study, file } = loaded;
    const visits = visitsOf(study);
    if (money < Infinity && visits.every((visit) => visit.money === 0))
      throw new UserError('no visit costs money in this study: set survey.money_per_hour or the money of a visit', {
        file,
        key: 'survey',
      });
    const { run: runId } = await chosenRun(db, loaded, { run });
    const tooLarge = visits.filter((visit) => !fits(visit, limits));
    if (tooLarge.length === visits.length) throw noneFits(visits, limits, file);
    return { plan: await planSurvey(db, runId, { visits, limits }, report), tooLarge };
  });
  const sheet = named === null ? null : await named.write(fieldSheet(plan));
  if (!page) return { plan, tooLarge, csv: sheet, page: null };
  const { study, folder } = own;
  const into = prepareFolder(output ?? resolve(folder, study.output));
  const name = `survey-${String(plan.run)}.html`;
  await spareInputs(own, into, [name]);
  await writeSet(into, { [name]: renderSurvey(study.title, plan, readPageScript(), tooLarge) });
  return { plan, tooLarge, csv: sheet, page: resolve(into, name) };
}

function noneFits(visits: readonly Visit[], { hours, money }: Limits, file: string): UserError {
  const cost = hours === Infinity ? 'money' : 'hours';
  const cheapest = visits.reduce((a, b) => (b[cost] < a[cost] ? b : a));
  const given = [
    ...(hours === Infinity ? [] : [`${formatNumber(hours, 3)} h`]),
    ...(money === Infinity ? [] : [`${formatNumber(money, 4)} in money`]),
  ];
  return new UserError(
    `no visit fits into ${given.join(' and ')}; the cheapest is ${visitWord(cheapest)}: give more, or change the visits`,
    { file, key: 'survey.visits' },
  );
}

/**
 * The plan as a table for a tablet: a row a visit, cells of what is asked left blank, cells of what is not asked holding a dash so that
 * nobody looks for more. What is filled in goes back with `survey --take`.
 */
export function fieldSheet({ steps }: SurveyPlan): string {
  const rows = steps.map((step) => {
    const asked = new Set(step.asks.flatMap((unknown) => ANSWERS[unknown]));
    return [
      step.place,
      step.id,
      step.name,
      step.group,
      step.lon,
      step.lat,
      step.rank,
      step.visit,
      askedWords(step),
      reasonWord(step),
      ...ANSWER_COLUMNS.map((column) => (asked.has(column) ? null : '–')),
      ...SHEET_TAIL.map(() => null),
    ] satisfies (string | number | null)[];
  });
  return csvText([...SHEET_HEAD, ...ANSWER_COLUMNS, ...SHEET_TAIL], rows);
}

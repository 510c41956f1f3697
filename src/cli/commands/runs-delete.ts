import { relative } from 'node:path';
import { formatCount } from '../../engineering/format.js';
import { EXIT, UserError } from '../../errors.js';
import { deleteStudyRuns, planStudyDeletion } from '../../exports/delete-runs.js';
import type { StudyDeletion } from '../../exports/delete-runs.js';
import type { RunEntry } from '../../runs/history.js';
import { askYes } from '../ask.js';
import { findStudy } from '../find-study.js';
import { printError, printJson, printLines, terminalColumns } from '../output/print.js';
import { clean, wrap } from '../output/text.js';
import { minuteOf } from './runs.js';
import type { RunsOptions } from './runs.js';

/** `swaymark runs delete`: asks on a terminal; elsewhere only with `--yes`. */
export async function deleteRuns(
  ids: readonly number[],
  options: RunsOptions & { readonly yes?: true },
): Promise<number> {
  const study = findStudy(options.study);
  const plan = await planStudyDeletion(study, ids);
  const columns = terminalColumns();
  if (options.yes !== true) {
    if (!process.stdin.isTTY || !process.stderr.isTTY)
      throw new UserError(
        `deleting ${namesOf(plan.runs)} asks first, and there is no terminal to ask on; with --yes it deletes without asking`,
        { key: '--yes' },
      );
    printError(planLines(plan, columns).join('\n'));
    if (!(await askYes(`Delete ${namesOf(plan.runs)}?`))) {
      printError('Nothing is deleted.');
      return EXIT.clean;
    }
  }
  const done = await deleteStudyRuns(study, ids);
  if (options.json) {
    printJson({ ...done, runs: done.runs.map(({ run }) => run) });
    return EXIT.clean;
  }
  printLines([
    ...(options.yes === true ? planLines(done, columns) : []),
    `Deleted: ${namesOf(done.runs)}. ${done.left.length === 0 ? 'No run is left.' : `Left: ${namesOf(done.left.map((run) => ({ run })))}.`}`,
  ]);
  return EXIT.clean;
}

/** "run 1", "runs 1, 2 and 4". */
function namesOf(runs: readonly Pick<RunEntry, 'run'>[]): string {
  const numbers = runs.map(({ run }) => String(run));
  const last = numbers.pop() ?? '';
  return numbers.length === 0 ? `run ${last}` : `runs ${numbers.join(', ')} and ${last}`;
}

function planLines({ runs, inventories, inventories_kept, reports }: StudyDeletion, columns: number): string[] {
  const say = (text: string): string[] => wrap(clean(text), columns, '', '  ');
  const seen = (path: string): string => relative(process.cwd(), path) || path;
  return [
    ...runs.flatMap(({ run, made, note, buildings }) =>
      say(
        `Run ${String(run)}, made ${minuteOf(made)} UTC${note === '' ? '' : ` (${note})`}: the results of its ${formatCount(buildings)} buildings go for good.`,
      ),
    ),
    ...inventories.flatMap(({ inventory, file, rows_in, buildings }) =>
      say(
        `Inventory ${inventory.slice(0, 8)} of ${file}: no other run uses it; its ${formatCount(buildings)} buildings and the findings on its ${formatCount(rows_in)} rows go too. The file stays.`,
      ),
    ),
    ...inventories_kept.flatMap(({ inventory, file, used_by }) =>
      say(
        `Inventory ${inventory.slice(0, 8)} of ${file} stays: ${namesOf(used_by.map((run) => ({ run })))} ${used_by.length === 1 ? 'uses' : 'use'} it.`,
      ),
    ),
    ...say(`${runs.length === 1 ? 'The number is' : 'The numbers are'} not given again.`),
    ...(reports.length === 0
      ? []
      : [...say('Reports on the disk stay; each names its run:'), ...reports.map((path) => `  ${clean(seen(path))}`)]),
  ];
}

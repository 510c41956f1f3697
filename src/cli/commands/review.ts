import { join, relative, resolve } from 'node:path';
import { EXIT } from '../../errors.js';
import { reviewSheet } from '../../exports/review.js';
import { spareReview } from '../../exports/filled-sheet.js';
import { spareInputs } from '../../exports/spare-inputs.js';
import { prepareFolder, writeSet } from '../../exports/write-set.js';
import { chosenRun, withStudyDatabase } from '../../runs/open.js';
import { findStudy } from '../find-study.js';
import { printLines, terminalColumns } from '../output/print.js';
import { clean, wrap } from '../output/text.js';

interface Options {
  readonly sample: number;
  readonly units: 'si' | 'us';
  readonly output?: string;
  readonly study?: string;
  readonly run?: number;
}

/** `swaymark review`: a sheet for an independent check by hand. */
export async function review(options: Options): Promise<number> {
  const columns = terminalColumns();
  await withStudyDatabase(findStudy(options.study), async (db, loaded) => {
    const { run } = await chosenRun(db, loaded, options);
    const output = prepareFolder(options.output ?? resolve(loaded.folder, loaded.study.output));
    await spareInputs(loaded, output, ['review.csv']);
    spareReview(join(output, 'review.csv'));
    const sheet = await reviewSheet(db, run, options.sample, options.units);
    const [path = ''] = await writeSet(output, { 'review.csv': sheet.csv });
    printLines([
      ...wrap(`${sheet.drawn}.`, columns),
      ...wrap(clean(`Buildings: ${sheet.buildings.join(', ')}`), columns, '', '  '),
      '',
      ...wrap(
        `${String(sheet.steps)} formula steps to check, with blank cells for an independent value; the program's own values stand in the last column.`,
        columns,
      ),
      `written: ${clean(relative(process.cwd(), path) || path)}`,
    ]);
  });
  return EXIT.clean;
}

import { formatCount } from '../../engineering/format.js';
import { EXIT } from '../../errors.js';
import { listStudyRuns } from '../../runs/open.js';
import { findStudy } from '../find-study.js';
import { printJson, printLines, terminalColumns } from '../output/print.js';
import { table } from '../output/table.js';

/** `swaymark runs`: the runs kept for a study. */
export async function runs(options: { readonly study?: string; readonly json?: true }): Promise<number> {
  const kept = await listStudyRuns(findStudy(options.study));
  if (options.json) {
    printJson(kept);
    return EXIT.clean;
  }
  const head = [
    { title: 'Run', right: true },
    { title: 'Made (UTC)' },
    { title: 'Note', shrinkTo: 6 },
    { title: 'Title', shrinkTo: 8, spare: 4 },
    { title: 'Buildings', right: true, spare: 2 },
    { title: 'Ranked', right: true },
    { title: 'List', right: true },
    { title: 'Rank by' },
    { title: 'Study', spare: 1 },
    { title: 'Inventory', spare: 1 },
    { title: 'Methods', spare: 3 },
  ];
  const rows = kept.map((run) => [
    String(run.run),
    run.made.slice(0, 16).replace('T', ' '),
    run.note,
    run.title,
    formatCount(run.buildings),
    formatCount(run.ranked),
    formatCount(run.list_size),
    run.rank_by,
    ...[run.fingerprints.study, run.fingerprints.inventory, run.fingerprints.methods].map((print) => print.slice(0, 8)),
  ]);
  printLines(table(head, rows, terminalColumns()));
  return EXIT.clean;
}

/** A kept run of a study ranked again with one assumption switched at a time, as plain data and as a table for a spreadsheet. */
import { chosenRun, withStudyDatabase } from '../runs/open.js';
import type { RunChoice } from '../runs/open.js';
import { sensitivityOf } from '../screening/sensitivity.js';
import type { Sensitivity, SensitivityOptions } from '../screening/sensitivity.js';
import type { Database } from '../store/database.js';
import { csvText } from './csv-text.js';
import { loadStudyAlone } from '../study/load.js';
import { NamedFile } from './write-named.js';

export interface SensitivityStudyOptions extends SensitivityOptions, Pick<RunChoice, 'run'> {
  /** Write the table there as CSV. */
  readonly csv?: string | undefined;
  /** Hears of the open database, for one who wants to interrupt it. */
  readonly onOpen?: (db: Database) => void;
}

/**
 * Ranks the inventory of a kept run of the study at `path` (the newest when none is named) with each assumption of its register switched, one
 * at a time, and says how the list changes: overlap, Kendall's tau-b, who enters and leaves, who stays whatever is assumed. Keeps nothing.
 * One ranking per switch, some sixty; `only` and `sample` shorten it.
 * @returns plain data, the largest effect first.
 * @throws UserError for an unknown run, an assumption that is not switched, or a sample of fewer than 2.
 * @example
 * const { switches, always } = await sensitivityStudy('study.yaml', { only: ['slope', 'system-prior'] });
 */
export async function sensitivityStudy(path: string, options: SensitivityStudyOptions = {}): Promise<Sensitivity> {
  const csv = await NamedFile.claimAny(options.csv, '--csv', { study: await loadStudyAlone(path) });
  const found = await withStudyDatabase(path, async (db, loaded) => {
    options.onOpen?.(db);
    const { run } = await chosenRun(db, loaded, options);
    return sensitivityOf(db, run, options);
  });
  await csv?.write(sensitivityCsv(found));
  return found;
}

const HEAD = [
  'assumption',
  'statement',
  'from',
  'source',
  'mark',
  'to',
  'ranked',
  'places_before',
  'places',
  'overlap',
];

function sensitivityCsv({ switches, sample }: Sensitivity): string {
  const ids = (moves: readonly { readonly id: string }[]): string => moves.map(({ id }) => id).join(' ');
  return csvText(
    [...HEAD, 'overlap_share', 'tau_b', 'entered', 'left', 'sample_every'],
    switches.map((one) => [
      ...[one.assumption, one.statement, one.from, one.source, one.mark, one.to, one.ranked],
      ...[one.places_before, one.places, one.overlap, one.overlap_share, one.tau_b],
      ...[ids(one.entered), ids(one.left), sample?.every ?? 1],
    ]),
  );
}

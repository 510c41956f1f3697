/** An inventory's table, ready to be read: where it stands, or rewritten. */
import type { Database } from '../store/database.js';
import { normalise } from './normalise.js';
import type { PlainTable } from './normalise.js';
import type { RecordTotals } from './records.js';
import type { Source } from './source.js';
import { findStanding } from './standing.js';
import type { Standing } from './standing.js';

export interface Table extends RecordTotals {
  readonly delimiter: string;
  readonly lineOf: (row: number) => number;
  /** Where the database can read the file as it is; row `n` of the result is row `n + 2` of the file. */
  readonly standing: Standing | undefined;
  /** The table with the row number in front of every record; made when first asked for. */
  readonly rewritten: () => PlainTable;
  readonly remove: () => void;
}

/** Opens a table; `remove` it when done. @throws UserError when there is no header. */
export function openTable(db: Database, source: Source, delimiter: string): Table {
  const standing = db.reads(source.path) ? findStanding(source, delimiter) : undefined;
  let plain: PlainTable | undefined;
  const rewritten = (): PlainTable => (plain ??= normalise(source, delimiter));
  return {
    ...(standing ?? rewritten()),
    lineOf: standing === undefined ? rewritten().lineOf : (row) => row,
    standing,
    rewritten,
    remove: () => {
      plain?.remove();
    },
  };
}

import { closeSync, openSync, rmSync, writeSync } from 'node:fs';
import { join } from 'node:path';
import { UserError } from '../errors.js';
import { scratchFolder } from '../store/scratch.js';
import { detectDelimiter } from './delimiter.js';
import { RecordWriter } from './records.js';
import type { RecordTotals } from './records.js';
import { readUtf8 } from './source.js';
import type { Source } from './source.js';

/** A table rewritten in the one dialect the database reads; `remove` it when done. */
export interface PlainTable extends RecordTotals {
  /** The rewritten file: no header, the row number in front of every record. */
  readonly path: string;
  readonly delimiter: string;
  readonly lineOf: (row: number) => number;
  readonly remove: () => void;
}

let made = 0;

/**
 * Rewrites a CSV file of any encoding and line end into the scratch folder, in bounded memory.
 * @throws UserError when there is no header.
 */
export function normalise(source: Source, delimiter: string): PlainTable {
  made += 1;
  const path = join(scratchFolder(), `table-${made}.csv`);
  const remove = (): void => {
    rmSync(path, { force: true });
  };
  const file = openSync(path, 'w');
  let writer: RecordWriter | undefined;
  let mark = delimiter === 'tab' ? '\t' : delimiter;
  try {
    for (const chunk of readUtf8(source)) {
      if (writer === undefined) {
        if (delimiter === 'auto') mark = detectDelimiter(chunk.toString('utf8', 0, 65_536));
        writer = new RecordWriter(mark, (bytes) => {
          writeWhole(file, bytes);
        });
      }
      writer.push(chunk);
    }
    const totals = writer?.finish();
    if (totals === undefined || totals.header.length === 0) {
      throw new UserError('the file has no header; its first line must name the columns', { file: source.path });
    }
    const lineOf = (row: number): number => writer?.lineOf(row) ?? row;
    return { ...totals, path, delimiter: mark, lineOf, remove };
  } catch (error) {
    remove();
    throw error;
  } finally {
    closeSync(file);
  }
}

function writeWhole(file: number, bytes: Buffer): void {
  let done = 0;
  while (done < bytes.length) done += writeSync(file, bytes, done);
}

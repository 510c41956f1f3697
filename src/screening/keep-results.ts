/** Results into the tables of a run. */
import type { Database } from '../store/database.js';
import { ASSESSED_COLUMNS, RANKED_COLUMNS, RESULT_WORDS } from '../store/schema.js';
import type { WritableColumn } from '../store/vectors.js';
import { decoded } from './assess-block.js';
import type { BlockResult } from './assess-block.js';

function rowKeys(runId: number, from: number, rows: number): readonly [Int32Array, Int32Array] {
  return [new Int32Array(rows).fill(runId), Int32Array.from({ length: rows }, (_, i) => from + i)];
}

function enumerated(name: string, codes: Uint8Array): WritableColumn {
  return { words: RESULT_WORDS[name]!, codes, length: codes.length };
}

/** Keeps the assessed part of one block that begins at building `from`. */
export async function keepAssessed(
  db: Database,
  runId: number,
  from: number,
  { rows, numbers, words, texts }: BlockResult,
): Promise<void> {
  await db.append('result_assessed', [
    ...rowKeys(runId, from, rows),
    ...ASSESSED_COLUMNS.map(({ name, kind }): WritableColumn => {
      if (kind !== 'text') return numbers[name]!;
      return RESULT_WORDS[name] === undefined ? decoded(texts[name]!) : enumerated(name, words[name]!);
    }),
  ]);
}

/** The ranking's columns by name, one entry per building of the inventory. */
export interface RankedColumns {
  readonly numbers: Readonly<Record<string, Float64Array>>;
  readonly wholes: Readonly<Record<string, Int32Array>>;
  /** Codes of RESULT_WORDS. */
  readonly words: Readonly<Record<string, Uint8Array>>;
}

/** Keeps the ranks of all `count` buildings. */
export async function keepRanked(
  db: Database,
  runId: number,
  count: number,
  { numbers, wholes, words }: RankedColumns,
): Promise<void> {
  await db.append('result_ranked', [
    ...rowKeys(runId, 0, count),
    ...RANKED_COLUMNS.map(({ name, kind }): WritableColumn => {
      if (kind === 'number') return numbers[name]!;
      return kind === 'whole' ? wholes[name]! : enumerated(name, words[name]!);
    }),
  ]);
}

/** What the main thread and the threads that assess tell each other. Columns cross as numbers: a text costs more than a building. */
import type { AssessSettings } from '../engineering/assess/settings.js';
import type { YearPools } from '../engineering/building-columns.js';
import type { Bands, RankBasis } from '../engineering/priority/rank.js';
import { Bug } from '../errors.js';
import { coded, decoded } from './assess-block.js';
import type { BlockInput, BlockResult, Coded } from './assess-block.js';
import type { FlatArrays } from './flat-mixtures.js';

/** A column or a record of columns, ready to cross. */
export type Packed =
  | { readonly kind: 'numbers'; readonly values: Float64Array }
  | { readonly kind: 'texts'; readonly texts: Coded }
  | { readonly kind: 'no numbers' | 'no texts' }
  | { readonly kind: 'record'; readonly entries: Readonly<Record<string, Packed>> };

export type BandBasis = Pick<RankBasis, 'curve' | 'threshold'>;

export type ToThread =
  | { readonly kind: 'begin'; readonly settings: AssessSettings; readonly pools: YearPools }
  | { readonly kind: 'block'; readonly task: number; readonly rows: number; readonly block: Packed }
  | { readonly kind: 'bands'; readonly task: number; readonly mixtures: FlatArrays; readonly basis: BandBasis };

export type FromThread =
  | { readonly kind: 'done'; readonly task: number; readonly result: BlockResult | Bands }
  | { readonly kind: 'failed'; readonly task: number; readonly message: string };

/** A block ready to cross. */
export function packBlock({ columns, notRanked }: BlockInput): Packed {
  // the ids stay behind: nothing is computed from them
  return packed({ ...columns, id: [], notRanked });
}

/** The block on the other side; the ids are blank. */
export function unpackBlock(block: Packed, rows: number): BlockInput {
  const blank = { numbers: new Float64Array(rows).fill(NaN), texts: new Array<null>(rows).fill(null) };
  const { notRanked, ...columns } = unpacked(block, blank) as BlockInput['columns'] & Pick<BlockInput, 'notRanked'>;
  return { columns: { ...columns, id: new Array<string>(rows).fill('') }, notRanked, rows };
}

function packed(value: unknown): Packed {
  if (value instanceof Float64Array)
    return value.every(Number.isNaN) ? { kind: 'no numbers' } : { kind: 'numbers', values: value };
  if (value instanceof Int32Array) return { kind: 'numbers', values: Float64Array.from(value) };
  if (Array.isArray(value)) {
    const texts = coded(value as (string | null)[]);
    return texts.words.length === 0 ? { kind: 'no texts' } : { kind: 'texts', texts };
  }
  if (typeof value !== 'object' || value === null) throw new Bug(`a column cannot be ${String(value)}`);
  const entries = Object.entries(value).filter(([, entry]) => entry !== undefined);
  return { kind: 'record', entries: Object.fromEntries(entries.map(([name, entry]) => [name, packed(entry)])) };
}

interface Blank {
  readonly numbers: Float64Array;
  readonly texts: readonly null[];
}

function unpacked(value: Packed, blank: Blank): unknown {
  switch (value.kind) {
    case 'numbers':
      return value.values;
    case 'texts':
      return decoded(value.texts);
    case 'no numbers':
      return blank.numbers;
    case 'no texts':
      return blank.texts;
    case 'record':
      return Object.fromEntries(Object.entries(value.entries).map(([name, entry]) => [name, unpacked(entry, blank)]));
  }
}

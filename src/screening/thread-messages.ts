/** What the main thread and the threads that assess tell each other. Columns cross as numbers: a text costs more than a building. */
import type { AssessSettings } from '../engineering/assess/settings.js';
import type { YearPools } from '../engineering/building-columns.js';
import type { SetAnswer, SetTask } from '../engineering/priority/exceedance.js';
import type { Mixture } from '../engineering/priority/mixture.js';
import type { Bands, Edge } from '../engineering/priority/rank-bands.js';
import type { HazardGrid, HazardGrids } from '../engineering/spectrum/grid.js';
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

/** What the bands of a set of mixtures are read from, with the zones of its buildings where errors are common. */
export interface BandBasis extends Edge {
  readonly zone: Uint16Array | undefined;
}

export type ToThread =
  | {
      readonly kind: 'begin';
      readonly settings: AssessSettings;
      readonly pools: YearPools;
      readonly grids: HazardGrids;
    }
  | { readonly kind: 'block'; readonly task: number; readonly block: PackedBlock }
  | { readonly kind: 'set'; readonly task: number; readonly set: Mixture; readonly of: SetTask }
  | { readonly kind: 'bands'; readonly task: number; readonly mixtures: FlatArrays; readonly basis: BandBasis };

export type FromThread =
  | { readonly kind: 'done'; readonly task: number; readonly result: BlockResult | Bands | SetAnswer }
  | { readonly kind: 'failed'; readonly task: number; readonly message: string };

/** A block ready to cross. */
export interface PackedBlock {
  readonly rows: number;
  readonly columns: Packed;
}

/** Packs a block. */
export function packBlock({ columns, notRanked, rows }: BlockInput): PackedBlock {
  // the ids stay behind: nothing is computed from them
  return { rows, columns: packed({ ...columns, id: [], notRanked }) };
}

/** Parts of at most `size` rows of a block that begins at building `start`, in memory of their own. */
export function* partsOf(
  { columns, rows }: PackedBlock,
  start: number,
  size: number,
): Generator<{ readonly from: number; readonly part: PackedBlock }> {
  for (let from = 0; from < rows; from += size) {
    const to = Math.min(rows, from + size);
    yield { from: start + from, part: { rows: to - from, columns: cut(columns, from, to) } };
  }
}

function cut(value: Packed, from: number, to: number): Packed {
  switch (value.kind) {
    case 'numbers':
      return { ...value, values: value.values.slice(from, to) };
    case 'texts':
      return { ...value, texts: { ...value.texts, codes: value.texts.codes.slice(from, to) } };
    case 'record':
      return {
        ...value,
        entries: Object.fromEntries(Object.entries(value.entries).map(([name, entry]) => [name, cut(entry, from, to)])),
      };
    default:
      return value;
  }
}

/**
 * The memory under the typed arrays of a message, to be handed over instead of copied: the sender must not use them again. What is
 * shared between threads anyway is left out.
 */
export function memoryOf(value: unknown): ArrayBuffer[] {
  if (ArrayBuffer.isView(value)) return value.buffer instanceof ArrayBuffer ? [value.buffer] : [];
  if (typeof value !== 'object' || value === null) return [];
  return Object.values(value).flatMap(memoryOf);
}

/** The block on the other side; the ids are blank. */
export function unpackBlock({ columns: block, rows }: PackedBlock): BlockInput {
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

/** Grids in memory that threads look at together: each would else get a copy of its own. */
export function sharedGrids(grids: HazardGrids): HazardGrids {
  const shared = (values: Float64Array): Float64Array => {
    const copy = new Float64Array(new SharedArrayBuffer(values.byteLength));
    copy.set(values);
    return copy;
  };
  const share = (grid: HazardGrid): HazardGrid => ({ ...grid, sa_g: shared(grid.sa_g), ln_sa: shared(grid.ln_sa) });
  return new Map([...grids].map(([fingerprint, grid]) => [fingerprint, share(grid)]));
}

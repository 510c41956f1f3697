/**
 * Columns between typed arrays and the engine's vectors, through the public bindings: the wrappers' own getters cost
 * a call per value. `vector_get_data` returns a copy, so arrays stay valid after the result is gone.
 */
import bindings from '@duckdb/node-bindings';
import type { DataChunk, Vector } from '@duckdb/node-bindings';
import { DuckDBTypeId } from '@duckdb/node-api';
import type { DuckDBDataChunk } from '@duckdb/node-api';
import { Bug } from '../errors.js';
import { NULL_CODE } from './codes.js';

/** f64: Float64Array, NULL is NaN; i32: Int32Array, NULL is -1; text: strings, NULL is null. */
export type ColumnKind = 'f64' | 'i32' | 'text';

/** Written to a whole-number column it stands for NULL, as NaN does in a column of numbers. */
export const NULL_I32 = -2_147_483_648;

export interface ColumnArrays {
  readonly f64: Float64Array;
  readonly i32: Int32Array;
  readonly text: (string | null)[];
}

export type ColumnsOf<S extends Readonly<Record<string, ColumnKind>>> = { readonly [K in keyof S]: ColumnArrays[S[K]] };

/** A column of enumerated words by code, a byte each, NULL_CODE for NULL. */
export interface EnumCodes {
  readonly words: readonly string[];
  readonly codes: Uint8Array;
  readonly length: number;
}

/** A column to write: NaN in a Float64Array becomes NULL, NULL_I32 in an Int32Array, null in a list of strings. */
export type WritableColumn = Float64Array | Int32Array | readonly (string | null)[] | EnumCodes;

type NumberArray =
  | Float64Array
  | Float32Array
  | Int32Array
  | Uint32Array
  | Int16Array
  | Uint16Array
  | Int8Array
  | Uint8Array
  | BigInt64Array
  | BigUint64Array;

interface NumberType {
  readonly bytes: number;
  readonly view: (buffer: ArrayBufferLike, offset: number, length: number) => NumberArray;
}

const NUMBER_TYPES: ReadonlyMap<DuckDBTypeId, NumberType> = new Map<DuckDBTypeId, NumberType>([
  [DuckDBTypeId.DOUBLE, { bytes: 8, view: (b, o, n) => new Float64Array(b, o, n) }],
  [DuckDBTypeId.FLOAT, { bytes: 4, view: (b, o, n) => new Float32Array(b, o, n) }],
  [DuckDBTypeId.INTEGER, { bytes: 4, view: (b, o, n) => new Int32Array(b, o, n) }],
  [DuckDBTypeId.UINTEGER, { bytes: 4, view: (b, o, n) => new Uint32Array(b, o, n) }],
  [DuckDBTypeId.SMALLINT, { bytes: 2, view: (b, o, n) => new Int16Array(b, o, n) }],
  [DuckDBTypeId.USMALLINT, { bytes: 2, view: (b, o, n) => new Uint16Array(b, o, n) }],
  [DuckDBTypeId.TINYINT, { bytes: 1, view: (b, o, n) => new Int8Array(b, o, n) }],
  [DuckDBTypeId.UTINYINT, { bytes: 1, view: (b, o, n) => new Uint8Array(b, o, n) }],
  [DuckDBTypeId.BOOLEAN, { bytes: 1, view: (b, o, n) => new Uint8Array(b, o, n) }],
  [DuckDBTypeId.BIGINT, { bytes: 8, view: (b, o, n) => new BigInt64Array(b, o, n) }],
  [DuckDBTypeId.UBIGINT, { bytes: 8, view: (b, o, n) => new BigUint64Array(b, o, n) }],
]);

function validityOf(chunk: DataChunk, column: number, rows: number): Uint8Array | null {
  const vector = bindings.data_chunk_get_vector(chunk, column);
  // null, whatever the typings say, when every value is valid.
  return bindings.vector_get_validity(vector, Math.ceil(rows / 64) * 8);
}

/** Columns that an inventory does not have are the common case: nothing of them needs reading. */
function allNull(valid: Uint8Array | null, rows: number): boolean {
  if (valid === null) return false;
  const whole = rows >> 3;
  for (let i = 0; i < whole; i += 1) if (valid[i] !== 0) return false;
  return (rows & 7) === 0 || (valid[whole]! & ((1 << (rows & 7)) - 1)) === 0;
}

/** The type whose bytes hold the codes of an enumeration of this many words. */
export function enumCodeType(words: number): DuckDBTypeId {
  if (words <= 0xff) return DuckDBTypeId.UTINYINT;
  return words <= 0xffff ? DuckDBTypeId.USMALLINT : DuckDBTypeId.UINTEGER;
}

/** Reads one column of enumerated words of a chunk into `out` from `offset` on. */
export function readWords(
  chunk: DuckDBDataChunk,
  column: number,
  words: readonly string[],
  out: (string | null)[],
  offset: number,
): void {
  if (allNull(validityOf(chunk.chunk, column, chunk.rowCount), chunk.rowCount)) {
    out.fill(null, offset, offset + chunk.rowCount);
    return;
  }
  const codes = new Int32Array(chunk.rowCount);
  readNumbers(chunk, column, enumCodeType(words.length), codes, 0, -1);
  for (let i = 0; i < codes.length; i += 1) out[offset + i] = words[codes[i]!] ?? null;
}

/** Reads the numbers of one column of a chunk into `out` from `offset` on, writing `missing` for NULL. @throws Bug for other types. */
export function readNumbers(
  chunk: DuckDBDataChunk,
  column: number,
  type: DuckDBTypeId,
  out: Float64Array | Int32Array,
  offset: number,
  missing: number,
): void {
  const rows = chunk.rowCount;
  const kind = NUMBER_TYPES.get(type);
  if (kind === undefined) {
    throw new Bug(`column ${column + 1} is of type ${DuckDBTypeId[type]}: cast it to DOUBLE or INTEGER in the query`);
  }
  const data = bindings.vector_get_data(bindings.data_chunk_get_vector(chunk.chunk, column), rows * kind.bytes);
  const values = kind.view(data.buffer, data.byteOffset, rows);
  if (values instanceof BigInt64Array || values instanceof BigUint64Array) {
    for (let i = 0; i < rows; i += 1) out[offset + i] = Number(values[i]!);
  } else {
    out.set(values, offset);
  }
  const valid = validityOf(chunk.chunk, column, rows);
  if (valid === null) return;
  for (let byte = 0; 8 * byte < rows; byte += 1) {
    // eight values at a time: most are there
    const bits = valid[byte]!;
    if (bits === 0xff) continue;
    const end = Math.min(rows, 8 * byte + 8);
    for (let i = 8 * byte; i < end; i += 1) if (((bits >> (i & 7)) & 1) === 0) out[offset + i] = missing;
  }
}

const INLINE_BYTES = 12;
const STRING_BYTES = 16;

/** Reads one text column of a chunk into `out` from `offset` on. */
export function readTexts(chunk: DuckDBDataChunk, column: number, out: (string | null)[], offset: number): void {
  const rows = chunk.rowCount;
  const valid = validityOf(chunk.chunk, column, rows);
  if (allNull(valid, rows)) {
    out.fill(null, offset, offset + rows);
    return;
  }
  const vector = chunk.getColumnVector(column);
  const raw = bindings.vector_get_data(bindings.data_chunk_get_vector(chunk.chunk, column), rows * STRING_BYTES);
  const bytes = Buffer.from(raw.buffer, raw.byteOffset, raw.byteLength);
  for (let i = 0; i < rows; i += 1) {
    if (valid !== null && ((valid[i >> 3]! >> (i & 7)) & 1) === 0) {
      out[offset + i] = null;
      continue;
    }
    const start = i * STRING_BYTES;
    const length = bytes.readUInt32LE(start);
    // Short strings sit in the vector itself; only long ones are worth a call.
    out[offset + i] =
      length <= INLINE_BYTES ? bytes.toString('utf8', start + 4, start + 4 + length) : String(vector.getItem(i));
  }
}

/** Writes rows `from` to `from + rows` of `values` into a column of a chunk of that many rows. */
export function writeColumn(chunk: DuckDBDataChunk, column: number, values: WritableColumn, from: number): void {
  const rows = chunk.rowCount;
  const vector = bindings.data_chunk_get_vector(chunk.chunk, column);
  // A slice is a plain buffer: views on shared memory are refused.
  if (values instanceof Float64Array) {
    const part = values.slice(from, from + rows);
    bindings.copy_data_to_vector(vector, 0, part.buffer, 0, part.byteLength);
    let first = 0;
    while (first < rows && part[first] === part[first]) first += 1;
    if (first < rows) writeValidity(vector, rows, (i) => !Number.isNaN(part[i]!));
  } else if (values instanceof Int32Array) {
    const part = values.slice(from, from + rows);
    bindings.copy_data_to_vector(vector, 0, part.buffer, 0, part.byteLength);
    if (part.includes(NULL_I32)) writeValidity(vector, rows, (i) => part[i] !== NULL_I32);
  } else if ('codes' in values) {
    const part = values.codes.slice(from, from + rows);
    bindings.copy_data_to_vector(vector, 0, part.buffer, 0, part.byteLength);
    writeValidity(vector, rows, (i) => part[i] !== NULL_CODE);
  } else {
    writeTexts(vector, values, from, rows);
  }
}

function writeTexts(vector: Vector, values: readonly (string | null)[], from: number, rows: number): void {
  const bytes = Buffer.alloc(rows * STRING_BYTES);
  const long: number[] = [];
  for (let i = 0; i < rows; i += 1) {
    const text = values[from + i]!;
    if (text === null || text === '') continue;
    const start = i * STRING_BYTES;
    // UTF-8 has at least a byte per unit: what is longer than the vector holds inline need not be tried.
    const length = text.length > INLINE_BYTES ? INLINE_BYTES + 1 : Buffer.byteLength(text);
    if (length > INLINE_BYTES) long.push(i);
    else {
      bytes.writeUInt32LE(length, start);
      bytes.write(text, start + 4, 'utf8');
    }
  }
  bindings.copy_data_to_vector(vector, 0, bytes.buffer, bytes.byteOffset, bytes.byteLength);
  for (const i of long) bindings.vector_assign_string_element(vector, i, values[from + i]!);
  writeValidity(vector, rows, (i) => values[from + i] !== null);
}

function writeValidity(vector: Vector, rows: number, isValid: (row: number) => boolean): void {
  let valid: Uint8Array<ArrayBuffer> | undefined;
  for (let i = 0; i < rows; i += 1) {
    if (isValid(i)) continue;
    valid ??= new Uint8Array(Math.ceil(rows / 64) * 8).fill(255);
    valid[i >> 3]! &= ~(1 << (i & 7));
  }
  if (valid === undefined) return;
  bindings.vector_ensure_validity_writable(vector);
  bindings.copy_data_to_vector_validity(vector, 0, valid.buffer, 0, valid.byteLength);
}

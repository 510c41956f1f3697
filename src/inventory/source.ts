import { isUtf8 } from 'node:buffer';
import { createHash } from 'node:crypto';
import type { Hash } from 'node:crypto';
import { closeSync, openSync, readSync } from 'node:fs';
import { UserError } from '../errors.js';

/** The encodings read, by the name they have in a study file; latin-1 is read as windows-1252, which holds all of it. */
export type Encoding = 'utf-8' | 'windows-1252' | 'utf-16le' | 'utf-16be';

export interface Source {
  readonly path: string;
  readonly encoding: Encoding;
  /** Bytes of the byte order mark at the start. */
  readonly markBytes: number;
  /** SHA-256 of the file's bytes; `copy()` it to add more. */
  readonly hash: Hash;
}

const CHUNK_BYTES = 4 * 1024 * 1024;

/**
 * Reads the file once: its encoding (byte order mark, else strict UTF-8, else Windows-1252) and its hash.
 * @throws UserError when it cannot be opened, is a spreadsheet or archive, is empty, or is not in the encoding named.
 */
export function inspectSource(path: string, encoding: string): Source {
  const hash = createHash('sha256');
  let bytes = 0;
  let firstBad = -1;
  let head: Buffer = Buffer.alloc(0);
  let held: Buffer = Buffer.alloc(0);
  for (const chunk of readBytes(path)) {
    if (bytes === 0) head = Buffer.from(chunk.subarray(0, 4096));
    hash.update(chunk);
    if (firstBad < 0) {
      const joined = held.length === 0 ? chunk : Buffer.concat([held, chunk]);
      const whole = lastWholeCharacter(joined);
      if (isUtf8(joined.subarray(0, whole))) held = Buffer.from(joined.subarray(whole));
      else firstBad = bytes - held.length;
    }
    bytes += chunk.length;
  }
  if (firstBad < 0 && held.length > 0) firstBad = bytes - held.length;
  if (bytes === 0) throw new UserError('the file is empty; it needs a header and rows', { file: path });
  if (head[0] === 0x50 && head[1] === 0x4b && head[2] === 3 && head[3] === 4) {
    throw new UserError('this is a spreadsheet or archive, not text; save it as CSV', { file: path });
  }
  const mark = byteOrderMark(head);
  const chosen = chooseEncoding(encoding, mark?.encoding, head, firstBad < 0);
  if (chosen === 'utf-8' && firstBad >= 0) {
    throw new UserError(
      `the file is not UTF-8 (a wrong byte after byte ${firstBad}); set inventory.encoding to auto or windows-1252`,
      { file: path },
    );
  }
  return { path, encoding: chosen, markBytes: mark?.encoding === chosen ? mark.bytes : 0, hash };
}

function chooseEncoding(named: string, marked: Encoding | undefined, head: Buffer, validUtf8: boolean): Encoding {
  if (named === 'latin-1') return 'windows-1252';
  if (named === 'utf-8' || named === 'windows-1252' || named === 'utf-16le' || named === 'utf-16be') return named;
  return marked ?? guessWide(head) ?? (validUtf8 ? 'utf-8' : 'windows-1252');
}

function byteOrderMark(head: Buffer): { encoding: Encoding; bytes: number } | undefined {
  if (head[0] === 0xef && head[1] === 0xbb && head[2] === 0xbf) return { encoding: 'utf-8', bytes: 3 };
  if (head[0] === 0xff && head[1] === 0xfe) return { encoding: 'utf-16le', bytes: 2 };
  if (head[0] === 0xfe && head[1] === 0xff) return { encoding: 'utf-16be', bytes: 2 };
  return undefined;
}

// A header is mostly ASCII: in UTF-16 every second byte of it is then zero.
function guessWide(head: Buffer): Encoding | undefined {
  const pairs = head.length >> 1;
  let even = 0;
  let odd = 0;
  for (let i = 0; i < pairs * 2; i += 2) {
    if (head[i] === 0) even += 1;
    if (head[i + 1] === 0) odd += 1;
  }
  if (odd > pairs * 0.7 && even < pairs * 0.1) return 'utf-16le';
  return even > pairs * 0.7 && odd < pairs * 0.1 ? 'utf-16be' : undefined;
}

// Where the last, possibly unfinished, character of a UTF-8 chunk begins.
function lastWholeCharacter(bytes: Uint8Array): number {
  for (let back = 1; back <= Math.min(3, bytes.length); back += 1) {
    const byte = bytes[bytes.length - back] ?? 0;
    if (byte < 0x80) return bytes.length;
    if (byte >= 0xc0) {
      const needs = byte >= 0xf0 ? 4 : byte >= 0xe0 ? 3 : 2;
      return back < needs ? bytes.length - back : bytes.length;
    }
  }
  return bytes.length;
}

/** The file's text as UTF-8 in chunks, without byte order mark. */
export function* readUtf8({ path, encoding, markBytes }: Source): Generator<Buffer> {
  let skip = markBytes;
  const decoder = encoding === 'utf-8' ? undefined : new TextDecoder(encoding, { ignoreBOM: true });
  for (const chunk of readBytes(path)) {
    const part = chunk.subarray(Math.min(skip, chunk.length));
    skip -= chunk.length - part.length;
    if (part.length === 0) continue;
    yield decoder === undefined ? part : Buffer.from(decoder.decode(part, { stream: true }), 'utf8');
  }
  const rest = decoder?.decode() ?? '';
  if (rest !== '') yield Buffer.from(rest, 'utf8');
}

// One buffer serves every chunk: what must outlive the step is copied by the reader.
function* readBytes(path: string): Generator<Buffer> {
  let file: number;
  try {
    file = openSync(path, 'r');
  } catch (cause) {
    const missing = cause instanceof Error && 'code' in cause && cause.code === 'ENOENT';
    throw new UserError(missing ? 'there is no such file' : 'the file cannot be opened', { file: path }, { cause });
  }
  try {
    const buffer = Buffer.allocUnsafe(CHUNK_BYTES);
    for (;;) {
      let count: number;
      try {
        count = readSync(file, buffer, 0, CHUNK_BYTES, null);
      } catch (cause) {
        throw new UserError('the file cannot be read; is it a folder?', { file: path }, { cause });
      }
      if (count === 0) return;
      yield buffer.subarray(0, count);
    }
  } finally {
    closeSync(file);
  }
}

/**
 * A table that the database can read where it stands: UTF-8, one kind of line end, no blank lines, every record of as many cells
 * as the header, quotes only around whole cells and without line breaks inside. Nearly every export is one; rewriting it would
 * cost as much as reading it. The same pass tells which columns hold nothing but plain numbers.
 */
import { resolve } from 'node:path';
import { detectDelimiter } from './delimiter.js';
import { CR, LF, QUOTE } from './record-scanner.js';
import { RecordWriter } from './records.js';
import type { RecordTotals } from './records.js';
import { readUtf8 } from './source.js';
import type { Source } from './source.js';

/** What the cells of a column look like, as bits. */
export const FORM = { empty: 1, whole: 4, zeros: 16, fraction: 32 } as const;

export interface Standing extends RecordTotals {
  readonly path: string;
  readonly delimiter: string;
  readonly lineEnd: '\n' | '\r\n';
  /** Per column the forms of its cells: `FORM`, other bits for everything else. */
  readonly forms: Uint16Array;
}

// Inside a cell: what it is so far. The forms are bits by these numbers.
const EMPTY = 0;
const MINUS = 1;
const WHOLE = 2;
const POINT = 3;
const ZEROS = 4;
const FRACTION = 5;
const OTHER = 6;
const IN_QUOTES = 7;
const QUOTE_SEEN = 8;
const AFTER_CR = 9;
const STATES = 10;
// What ends a cell.
const CELL_END = 10;
const CR_END = 11;
const LINE_END = 12;
const UNFIT = 13;

const [ZERO, NINE, DASH, DOT] = [48, 57, 45, 46] as const;

/** A longer line is no line of a table; whether it is must be looked at with more care. */
const LONGEST_LINE = 1024 * 1024;

/** The next state by state and byte. */
function transitions(delimiter: number, lineEnd: '\n' | '\r\n'): Uint8Array {
  const next = new Uint8Array(256 * STATES).fill(OTHER);
  const set = (state: number, byte: number, to: number): void => {
    next[256 * state + byte] = to;
  };
  for (let digit = ZERO; digit <= NINE; digit += 1) {
    for (const state of [EMPTY, MINUS, WHOLE]) set(state, digit, WHOLE);
    for (const state of [POINT, ZEROS, FRACTION]) set(state, digit, FRACTION);
  }
  for (const state of [POINT, ZEROS]) set(state, ZERO, ZEROS);
  set(EMPTY, DASH, MINUS);
  set(WHOLE, DOT, POINT);
  for (let state = EMPTY; state <= OTHER; state += 1) {
    set(state, delimiter, CELL_END);
    set(state, LF, lineEnd === '\n' ? LINE_END : UNFIT);
    set(state, CR, lineEnd === '\n' ? UNFIT : CR_END);
    set(state, QUOTE, state === EMPTY ? IN_QUOTES : UNFIT);
    set(state, 0, UNFIT);
  }
  next.fill(IN_QUOTES, 256 * IN_QUOTES, 256 * QUOTE_SEEN);
  for (const byte of [LF, CR, 0]) set(IN_QUOTES, byte, UNFIT);
  set(IN_QUOTES, QUOTE, QUOTE_SEEN);
  next.fill(UNFIT, 256 * QUOTE_SEEN);
  set(QUOTE_SEEN, QUOTE, IN_QUOTES);
  set(QUOTE_SEEN, delimiter, CELL_END);
  if (lineEnd === '\n') set(QUOTE_SEEN, LF, LINE_END);
  else set(QUOTE_SEEN, CR, CR_END);
  set(AFTER_CR, LF, LINE_END);
  return next;
}

/** The table as it stands, undefined where it must be rewritten. */
export function findStanding(source: Source, delimiter: string): Standing | undefined {
  if (source.encoding !== 'utf-8') return undefined;
  let scanner: StandingScanner | undefined;
  for (const chunk of readUtf8(source)) {
    if (scanner === undefined) {
      const mark =
        delimiter === 'auto'
          ? detectDelimiter(chunk.toString('utf8', 0, 65_536))
          : delimiter === 'tab'
            ? '\t'
            : delimiter;
      const head = chunk.indexOf(LF);
      const header = head < 0 ? undefined : headerOf(chunk.subarray(0, head + 1), mark);
      if (header === undefined) return undefined;
      if (head > LONGEST_LINE) return undefined;
      scanner = new StandingScanner(header, mark, chunk[head - 1] === CR ? '\r\n' : '\n');
      if (!scanner.push(chunk, head + 1)) return undefined;
    } else if (!scanner.push(chunk, 0)) return undefined;
  }
  const found = scanner?.finish();
  return found === undefined ? undefined : { ...found, path: resolve(source.path) };
}

function headerOf(line: Buffer, mark: string): readonly string[] | undefined {
  if (mark.length !== 1 || mark.charCodeAt(0) > 127 || mark === '"') return undefined;
  const writer = new RecordWriter(mark, () => undefined);
  writer.push(line);
  const { header, headerRow, hasLineBreaks, rejects } = writer.finish();
  return headerRow === 1 && header.length > 1 && !hasLineBreaks && rejects.length === 0 ? header : undefined;
}

class StandingScanner {
  readonly #header: readonly string[];
  readonly #mark: string;
  readonly #lineEnd: '\n' | '\r\n';
  readonly #next: Uint8Array;
  readonly #forms: Uint16Array;
  #state = EMPTY;
  #cell = 0;
  /** Bytes of the record before this chunk. */
  #before = 0;
  #rows = 0;
  #longest = 0;

  constructor(header: readonly string[], mark: string, lineEnd: '\n' | '\r\n') {
    this.#header = header;
    this.#mark = mark;
    this.#lineEnd = lineEnd;
    this.#next = transitions(mark.charCodeAt(0), lineEnd);
    this.#forms = new Uint16Array(header.length);
  }

  /** False where the table cannot be read as it stands. Hot: every byte of the file passes here once. */
  push(bytes: Buffer, from: number): boolean {
    const next = this.#next;
    const forms = this.#forms;
    const cells = forms.length;
    const end = bytes.length;
    const ending = this.#lineEnd.length;
    let state = this.#state;
    let cell = this.#cell;
    let start = from - this.#before;
    let longest = this.#longest;
    let rows = this.#rows;
    for (let at = from; at < end; at += 1) {
      const was = state;
      state = next[(was << 8) | bytes[at]!]!;
      if (state < STATES) continue;
      if (state === UNFIT) return false;
      if (was !== AFTER_CR) {
        if (cell === cells) return false;
        forms[cell]! |= 1 << was;
        cell += 1;
      }
      if (state === CELL_END) state = EMPTY;
      else if (state === CR_END) state = AFTER_CR;
      else {
        const size = at - start - ending + 1;
        // A row of delimiters alone is a blank line.
        if (cell !== cells || size < cells) return false;
        if (size > longest) longest = size;
        rows += 1;
        cell = 0;
        start = at + 1;
        state = EMPTY;
      }
    }
    this.#state = state;
    this.#cell = cell;
    this.#before = end - start;
    this.#longest = longest;
    this.#rows = rows;
    return true;
  }

  finish(): Omit<Standing, 'path'> | undefined {
    // The last line may do without its end.
    if (this.#before > 0 && (this.#state === AFTER_CR || !this.push(Buffer.from(this.#lineEnd), 0))) return undefined;
    if (this.#rows === 0 || this.#longest > LONGEST_LINE) return undefined;
    return {
      header: this.#header,
      headerRow: 1,
      written: this.#rows,
      longest: this.#longest,
      emptyRows: 0,
      zeroBytes: 0,
      hasLineBreaks: false,
      rejects: [],
      delimiter: this.#mark,
      lineEnd: this.#lineEnd,
      forms: this.#forms,
    };
  }
}

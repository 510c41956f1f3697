/**
 * Cuts CSV text into records and writes each well-formed one again behind its row number, in one plain dialect: LF
 * ends, no blank lines, no line break inside a cell (they become `LINE_BREAK`), quotes only around whole cells. The
 * database then reads the file without guessing, and every cell still knows its row as a spreadsheet counts it:
 * the first line is row 1, blank lines count, a record with line breaks inside quotes is one row.
 */
import { UserError } from '../errors.js';
import { CR, LF, QUOTE, RecordScanner, hasLineEnd } from './record-scanner.js';
import type { Ending } from './record-scanner.js';

/** Stands for a line break inside a cell until the database has read it (the record separator of ASCII). */
export const LINE_BREAK = '\x1e';

export interface RowReject {
  readonly row: number;
  readonly line: number;
  readonly code: 'ragged-row' | 'unterminated-quote' | 'text-after-quote' | 'row-too-long';
  readonly message: string;
  /** The beginning of the line. */
  readonly value: string;
}

export interface RecordTotals {
  /** Records written, the header left out. */
  readonly written: number;
  /** Rows that hold only delimiters. */
  readonly emptyRows: number;
  readonly zeroBytes: number;
  /** Bytes of the longest record written. */
  readonly longest: number;
  readonly hasLineBreaks: boolean;
  readonly rejects: readonly RowReject[];
  readonly headerRow: number;
  readonly header: readonly string[];
}

const BREAK = 30;
const SPACE = 32;
const LONGEST_RECORD = 32 * 1024 * 1024;
const MOST_REJECTS_KEPT = 100_000;

export class RecordWriter {
  readonly #delimiter: number;
  readonly #sink: (bytes: Buffer) => void;
  readonly #scanner: RecordScanner;
  #out = Buffer.allocUnsafe(4 * 1024 * 1024);
  #used = 0;
  #held: Buffer = Buffer.alloc(0);
  #row = 0;
  #extraLines = 0;
  #header: string[] | undefined;
  #headerRow = 0;
  #written = 0;
  #emptyRows = 0;
  #zeroBytes = 0;
  #longest = 0;
  #hasLineBreaks = false;
  readonly #rejects: RowReject[] = [];
  readonly #shifts: { readonly row: number; readonly lines: number }[] = [];

  constructor(delimiter: string, sink: (bytes: Buffer) => void) {
    this.#delimiter = delimiter.charCodeAt(0);
    this.#sink = sink;
    this.#scanner = new RecordScanner(this.#delimiter);
  }

  /** Takes the next chunk; what it holds of an unfinished record is kept. */
  push(chunk: Buffer): void {
    this.#take(this.#held.length === 0 ? chunk : Buffer.concat([this.#held, chunk]), false);
  }

  /** Takes the rest and says what was found. */
  finish(): RecordTotals {
    this.#take(this.#held, true);
    if (this.#used > 0) this.#sink(this.#out.subarray(0, this.#used));
    this.#used = 0;
    return {
      written: this.#written,
      emptyRows: this.#emptyRows,
      zeroBytes: this.#zeroBytes,
      longest: this.#longest,
      hasLineBreaks: this.#hasLineBreaks,
      rejects: this.#rejects,
      headerRow: this.#headerRow,
      header: this.#header ?? [],
    };
  }

  /** The physical line on which a row begins. */
  lineOf(row: number): number {
    let low = 0;
    let high = this.#shifts.length;
    while (low < high) {
      const middle = (low + high) >> 1;
      if ((this.#shifts[middle]?.row ?? 0) < row) low = middle + 1;
      else high = middle;
    }
    return row + (low === 0 ? 0 : (this.#shifts[low - 1]?.lines ?? 0));
  }

  #take(bytes: Buffer, last: boolean): void {
    let start = 0;
    while (start < bytes.length) {
      let ending = this.#scanner.scan(bytes, start, last);
      // What cannot be read is left out line by line: the end of its line must be in sight.
      if (ending !== 'done' && !last && !hasLineEnd(bytes, start)) ending = 'more';
      if (ending === 'more' && bytes.length - start <= LONGEST_RECORD) break;
      this.#row += 1;
      if (ending === 'done') {
        this.#record(bytes, start);
        start = this.#scanner.next;
      } else {
        start = this.#malformed(bytes, start, ending);
      }
    }
    this.#held = Buffer.from(bytes.subarray(start));
  }

  #record(bytes: Buffer, start: number): void {
    const size = this.#scanner.end - start;
    const row = this.#row;
    if (size === 0) return;
    if (this.#header !== undefined && size === this.#scanner.fields - 1) {
      this.#emptyRows += 1;
      return;
    }
    if (this.#scanner.breaks > 0) {
      this.#extraLines += this.#scanner.breaks;
      this.#shifts.push({ row, lines: this.#extraLines });
    }
    if (this.#header === undefined) {
      this.#header = this.#cells(bytes, start).map((cell) => cell.toString('utf8').replaceAll(/\s+/g, ' ').trim());
      this.#headerRow = row;
      return;
    }
    if (this.#scanner.fields !== this.#header.length) {
      const message = `the row has ${this.#scanner.fields} cells, the header ${this.#header.length}`;
      this.#reject(bytes, start, this.#scanner.end, row, 'ragged-row', message);
      return;
    }
    this.#written += 1;
    if (this.#scanner.odd) this.#writeCells(row, this.#cells(bytes, start));
    else {
      this.#room(size + 16);
      this.#number(row);
      bytes.copy(this.#out, this.#used, start, this.#scanner.end);
      this.#used += size;
      this.#out[this.#used] = LF;
      this.#used += 1;
    }
    if (size > this.#longest) this.#longest = size;
  }

  // The record cannot be read: its first line is the reject, and reading resumes on the line below it.
  #malformed(bytes: Buffer, start: number, ending: Exclude<Ending, 'done'>): number {
    const code = ending === 'more' ? 'row-too-long' : ending;
    let end = start;
    while (end < bytes.length && bytes[end] !== LF && bytes[end] !== CR) end += 1;
    const message = {
      'row-too-long': `the row is longer than ${LONGEST_RECORD} bytes; is a quote left open in it?`,
      'unterminated-quote': 'a quote opened in this row is never closed',
      'text-after-quote': 'a quote opened in this row closes before other text; quotes inside a cell are written twice',
    }[code];
    this.#reject(bytes, start, end, this.#row, code, message);
    return bytes[end] === CR && bytes[end + 1] === LF ? end + 2 : end + 1;
  }

  #reject(bytes: Buffer, start: number, end: number, row: number, code: RowReject['code'], message: string): void {
    if (this.#rejects.length >= MOST_REJECTS_KEPT) {
      // Beyond this the file is not the table the study takes it for.
      throw new UserError(
        `more than ${MOST_REJECTS_KEPT} rows cannot be read (the last: ${message}); check the delimiter`,
        { row },
      );
    }
    const value = bytes.toString('utf8', start, Math.min(end, start + 800)).slice(0, 200);
    this.#rejects.push({
      row,
      line: row + this.#extraLines - (code === 'ragged-row' ? this.#scanner.breaks : 0),
      code,
      message,
      value,
    });
  }

  #cells(bytes: Buffer, start: number): Buffer[] {
    const cells: Buffer[] = [];
    let at = start;
    for (;;) {
      let end: number;
      if (bytes[at] === QUOTE) {
        let close = at + 1;
        for (;;) {
          close = bytes.indexOf(QUOTE, close);
          if (bytes[close + 1] !== QUOTE) break;
          close += 2;
        }
        cells.push(Buffer.from(bytes.toString('latin1', at + 1, close).replaceAll('""', '"'), 'latin1'));
        end = close + 1;
        while (bytes[end] === SPACE) end += 1;
      } else {
        end = at;
        while (end < this.#scanner.end && bytes[end] !== this.#delimiter) end += 1;
        cells.push(Buffer.from(bytes.subarray(at, end)));
      }
      if (end >= this.#scanner.end) return cells;
      at = end + 1;
    }
  }

  #writeCells(row: number, cells: readonly Buffer[]): void {
    this.#room(16);
    this.#number(row);
    cells.forEach((cell, index) => {
      this.#room(2 * cell.length + 8);
      if (index > 0) this.#byte(this.#delimiter);
      if (cell.length === 0) return;
      this.#byte(QUOTE);
      for (let i = 0; i < cell.length; i += 1) {
        const byte = cell[i] as number;
        if (byte === LF || byte === CR) {
          this.#hasLineBreaks = true;
          if (byte === LF || cell[i + 1] !== LF) this.#byte(BREAK);
        } else if (byte === 0) {
          this.#zeroBytes += 1;
          this.#byte(SPACE);
        } else {
          if (byte === QUOTE) this.#byte(QUOTE);
          this.#byte(byte);
        }
      }
      this.#byte(QUOTE);
    });
    this.#byte(LF);
  }

  #byte(byte: number): void {
    this.#out[this.#used] = byte;
    this.#used += 1;
  }

  #number(row: number): void {
    let left = row;
    let at = this.#used + 1;
    for (let power = 10; power <= row; power *= 10) at += 1;
    this.#used = at;
    do {
      at -= 1;
      this.#out[at] = 48 + (left % 10);
      left = Math.floor(left / 10);
    } while (left > 0);
    this.#byte(this.#delimiter);
  }

  #room(size: number): void {
    if (this.#used + size + 64 <= this.#out.length) return;
    if (this.#used > 0) this.#sink(this.#out.subarray(0, this.#used));
    this.#used = 0;
    if (size + 64 > this.#out.length) this.#out = Buffer.allocUnsafe(size + 64);
  }
}

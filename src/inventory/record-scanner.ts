/** Where a record of CSV text ends, and what is in it. */
export const LF = 10;
export const CR = 13;
export const QUOTE = 34;
const SPACE = 32;

// What a byte means outside quotes; everything else is 0.
const DELIMITER = 1;
const LINE_END = 2;
const ODD = 3;

/** `more`: the bytes end before the record does. */
export type Ending = 'done' | 'more' | 'unterminated-quote' | 'text-after-quote';

/** Finds the end of one record after the other; its fields say what the last scan found. */
export class RecordScanner {
  /** One past the last byte of the record. */
  end = 0;
  /** Where the next record begins. */
  next = 0;
  fields = 0;
  /** True when the record cannot be copied as it stands. */
  odd = false;
  /** Line breaks inside quotes. */
  breaks = 0;
  readonly #meaning = new Uint8Array(256);

  constructor(delimiter: number) {
    this.#meaning[delimiter] = DELIMITER;
    this.#meaning[LF] = LINE_END;
    this.#meaning[CR] = LINE_END;
    this.#meaning[QUOTE] = ODD;
    this.#meaning[0] = ODD;
  }

  // Hot: every byte of the file passes here once.
  scan(bytes: Buffer, start: number, last: boolean): Ending {
    const meaning = this.#meaning;
    const length = bytes.length;
    let at = start;
    let fields = 1;
    let fieldStart = start;
    this.odd = false;
    this.breaks = 0;
    while (at < length) {
      const byte = bytes[at] as number;
      const what = meaning[byte];
      if (what === 0) {
        at += 1;
      } else if (what === DELIMITER) {
        fields += 1;
        at += 1;
        fieldStart = at;
      } else if (what === LINE_END) {
        if (byte === CR && at + 1 === length && !last) return 'more';
        this.end = at;
        this.next = byte === CR && bytes[at + 1] === LF ? at + 2 : at + 1;
        this.fields = fields;
        return 'done';
      } else if (byte === QUOTE && at === fieldStart) {
        const close = this.#closing(bytes, at + 1);
        if (close < 0) return last ? 'unterminated-quote' : 'more';
        at = close + 1;
        if (at === length && !last) return 'more';
        while (bytes[at] === SPACE) {
          this.odd = true;
          at += 1;
        }
        if (at < length && meaning[bytes[at] as number] !== DELIMITER && meaning[bytes[at] as number] !== LINE_END) {
          return 'text-after-quote';
        }
      } else {
        this.odd = true;
        at += 1;
      }
    }
    if (!last) return 'more';
    this.end = length;
    this.next = length;
    this.fields = fields;
    return 'done';
  }

  /** Position of the quote that closes a cell, -1 when there is none in these bytes. */
  #closing(bytes: Buffer, from: number): number {
    const length = bytes.length;
    let at = from;
    while (at < length) {
      const byte = bytes[at] as number;
      if (byte === QUOTE) {
        if (bytes[at + 1] !== QUOTE) return at;
        at += 1;
      } else if (byte <= CR) {
        if (byte === LF || (byte === CR && bytes[at + 1] !== LF)) this.breaks += 1;
        if (byte === LF || byte === CR || byte === 0) this.odd = true;
      }
      at += 1;
    }
    return -1;
  }
}

/** True when the line that begins at `start` ends within these bytes for certain. */
export function hasLineEnd(bytes: Buffer, start: number): boolean {
  for (let at = start; at < bytes.length; at += 1) {
    if (bytes[at] === LF) return true;
    if (bytes[at] === CR) return at + 1 < bytes.length;
  }
  return false;
}

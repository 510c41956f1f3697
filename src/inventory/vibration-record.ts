/** Reads one channel of a vibration record; the file streams, the channel is kept: 8 bytes a sample. */
import { UserError, showValue } from '../errors.js';
import type { Gap, Signal } from '../engineering/vibration/signal.js';
import { inspectSource, readUtf8 } from './source.js';
import { cellNumber, clockSeconds, isNothing, pickCells } from './vibration-cells.js';
import { vibrationLayout } from './vibration-layout.js';
import type { ColumnChoice, VibrationColumn, VibrationLayout } from './vibration-layout.js';
import { TimeAxis } from './vibration-time.js';

export interface RecordRequest extends Omit<ColumnChoice, 'hasRate'> {
  readonly rate_hz?: number;
  /** Counted from the first sample. */
  readonly from_s?: number;
  readonly to_s?: number;
}

export interface VibrationRecord {
  readonly signal: Signal;
  readonly channel: VibrationColumn;
  readonly channels: readonly VibrationColumn[];
  readonly columns: number;
  /** Where the sampling rate comes from; null when it was given. */
  readonly time: VibrationColumn | null;
  readonly duration_s: number;
  readonly notes: readonly string[];
}

export const MOST_SAMPLES = 50_000_000;
const HEAD_LINES = 200;

/** @throws UserError when the file cannot be read as a record, or its time column goes backwards. */
export function readVibrationRecord(path: string, request: RecordRequest): VibrationRecord {
  const lines = linesOf(path);
  const head: string[] = [];
  for (let next = lines.next(); !next.done; next = lines.next()) {
    head.push(next.value);
    if (head.length >= HEAD_LINES) break;
  }
  while (head.length > 0 && (head.at(-1) ?? '').trim() === '') head.pop();
  const layout = within(path, () => vibrationLayout(head, { ...request, hasRate: request.rate_hz !== undefined }));
  const reader = new ChannelReader(path, layout, request);
  head.forEach((line, i) => {
    if (i >= layout.skip) reader.take(line, i + 1);
  });
  let number = head.length;
  for (const line of lines) {
    number += 1;
    reader.take(line, number);
  }
  return reader.finish();
}

/** Runs a step whose complaints do not know the file. */
export function within<T>(file: string, step: () => T): T {
  try {
    return step();
  } catch (error) {
    if (!(error instanceof UserError) || error.place.file !== undefined) throw error;
    throw UserError.of(error.problems.map(({ place, message }) => ({ place: { ...place, file }, message })));
  }
}

// LF, CR LF or, in a file without any LF, CR.
function* linesOf(path: string): Generator<string> {
  let held = '';
  let end = '';
  const decoder = new TextDecoder('utf-8');
  for (const chunk of readUtf8(inspectSource(path, 'auto'))) {
    const text = held + decoder.decode(chunk, { stream: true });
    if (end === '') end = text.includes('\n') || !text.includes('\r') ? '\n' : '\r';
    let at = 0;
    for (let next = text.indexOf(end); next >= 0; next = text.indexOf(end, at)) {
      yield text.slice(at, next);
      at = next + 1;
    }
    held = text.slice(at);
  }
  if (held !== '') yield held;
}

class ChannelReader {
  readonly #path: string;
  readonly #layout: VibrationLayout;
  readonly #request: RecordRequest;
  readonly #wanted: readonly number[];
  readonly #axis: TimeAxis | undefined;
  #values = new Float64Array(1 << 16);
  #count = 0;
  #rows = 0;
  #blank = 0;
  #bad = 0;
  #firstBad: { line: number; cell: string } | undefined;

  constructor(path: string, layout: VibrationLayout, request: RecordRequest) {
    this.#path = path;
    this.#layout = layout;
    this.#request = request;
    const { time, channel } = layout;
    if (time !== null && request.rate_hz === undefined) this.#axis = new TimeAxis(path, time.column.name);
    this.#wanted = [...new Set([channel.number - 1, ...(time === null ? [] : [time.column.number - 1])])].sort(
      (a, b) => a - b,
    );
  }

  take(line: string, number: number): void {
    if (line.trim() === '') return;
    const { time, channel, delimiter, mark } = this.#layout;
    const cells = pickCells(line, delimiter, this.#wanted);
    const cell = cells[this.#wanted.indexOf(channel.number - 1)];
    const axis = this.#axis;
    let elapsed_s = this.#rows / (this.#request.rate_hz ?? 1);
    if (axis !== undefined && time !== null) {
      const text = cells[this.#wanted.indexOf(time.column.number - 1)] ?? '';
      const plain = cellNumber(text, mark);
      const seconds = Number.isNaN(plain) ? clockSeconds(text) : plain * time.factor;
      if (Number.isNaN(seconds)) {
        this.#complain(number, text);
        return;
      }
      elapsed_s = axis.elapsed(seconds);
      if (!this.#isWanted(elapsed_s)) return axis.skip();
      // A time that occurs twice is one sample.
      if (!axis.take(seconds, number, this.#count)) return;
    }
    this.#rows += 1;
    if (!this.#isWanted(elapsed_s)) return;
    this.#push(this.#sample(cell, number));
  }

  finish(): VibrationRecord {
    const { channel, channels, columns, time } = this.#layout;
    const values = this.#values.subarray(0, this.#count);
    if (this.#count === 0) {
      throw new UserError('no samples between --from-s and --to-s', { file: this.#path });
    }
    if (this.#bad + this.#blank > 0.5 * this.#count) {
      throw new UserError(
        `${String(this.#bad + this.#blank)} of ${String(this.#count)} samples cannot be read; choose another with --channel`,
        { file: this.#path, columnName: channel.name },
      );
    }
    const axis = this.#axis?.finish();
    const rate_hz = this.#request.rate_hz ?? axis?.rate_hz ?? NaN;
    const gaps: readonly Gap[] = axis?.gaps ?? [];
    const duration_s = values.length / rate_hz + gaps.reduce((sum, { missing_s }) => sum + missing_s, 0);
    const notes = [...(axis?.notes ?? []), ...this.#notes()];
    if (time !== null && this.#axis === undefined)
      notes.push(`column ${time.column.name} is not read: --rate-hz governs, and gaps are not seen`);
    return {
      signal: { rate_hz, values, gaps },
      channel,
      channels,
      columns: columns.length,
      time: axis === undefined ? null : (time?.column ?? null),
      duration_s,
      notes,
    };
  }

  #notes(): string[] {
    const found: string[] = [];
    if (this.#firstBad !== undefined) {
      const { line, cell } = this.#firstBad;
      const count = this.#bad === 1 ? '1 row' : `${String(this.#bad)} rows`;
      found.push(`line ${String(line)}: ${showValue(cell)} is not a number; ${count} like this cut out`);
    }
    if (this.#blank > 0)
      found.push(
        `${String(this.#blank)} ${this.#blank === 1 ? 'sample is' : 'samples are'} blank or marked as missing`,
      );
    return found;
  }

  #isWanted(elapsed_s: number): boolean {
    const { from_s = 0, to_s = Infinity } = this.#request;
    return elapsed_s >= from_s && elapsed_s <= to_s;
  }

  #sample(cell: string | undefined, line: number): number {
    if (cell === undefined || isNothing(cell)) {
      this.#blank += 1;
      return NaN;
    }
    const value = cellNumber(cell, this.#layout.mark);
    if (Number.isNaN(value)) this.#complain(line, cell);
    return value;
  }

  #complain(line: number, cell: string): void {
    this.#bad += 1;
    this.#firstBad ??= { line, cell };
  }

  #push(value: number): void {
    if (this.#count === MOST_SAMPLES) {
      throw new UserError(`more than ${String(MOST_SAMPLES)} samples; take a part with --from-s and --to-s`, {
        file: this.#path,
      });
    }
    if (this.#count === this.#values.length) {
      const larger = new Float64Array(2 * this.#values.length);
      larger.set(this.#values);
      this.#values = larger;
    }
    this.#values[this.#count] = value;
    this.#count += 1;
  }
}

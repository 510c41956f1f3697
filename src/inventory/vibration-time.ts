/** The time column of a record: its sampling rate, its gaps, and what is wrong with it. */
import type { Gap } from '../engineering/vibration/signal.js';
import { UserError } from '../errors.js';

/** Steps from which the usual one is known, before gaps can be told. */
const FIRST_STEPS = 1000;
/** A step this many times the usual one has samples missing. */
const GAP = 1.5;
const UNEVEN = 0.35;

interface Step {
  readonly step: number;
  readonly at: number;
}

export class TimeAxis {
  readonly #file: string;
  readonly #columnName: string;
  #first = NaN;
  #last = NaN;
  #lastLine = 0;
  #early: Step[] | undefined = [];
  #usual = NaN;
  #steps = 0;
  #span = 0;
  #squares = 0;
  #repeated = 0;
  #firstRepeated = 0;
  readonly #gaps: { at: number; step: number }[] = [];

  constructor(file: string, columnName: string) {
    this.#file = file;
    this.#columnName = columnName;
  }

  /** Seconds since the first sample of the file. */
  elapsed(seconds: number): number {
    if (Number.isNaN(this.#first)) this.#first = seconds;
    return seconds - this.#first;
  }

  /** A sample outside the part asked for. */
  skip(): void {
    this.#last = NaN;
  }

  /** The sample that will be number `at` of the channel. @returns whether it is one of its own. @throws UserError when time goes backwards. */
  take(seconds: number, line: number, at: number): boolean {
    const step = seconds - this.#last;
    const before = this.#last;
    if (step < 0) {
      throw new UserError(
        `time goes backwards, from ${String(before)} to ${String(seconds)} s; cut the file there, or give --rate-hz if only the clock jumped`,
        { file: this.#file, line, columnName: this.#columnName },
      );
    }
    if (step === 0) {
      this.#repeated += 1;
      if (this.#repeated === 1) this.#firstRepeated = line;
      return false;
    }
    this.#last = seconds;
    this.#lastLine = line;
    if (!Number.isNaN(step)) this.#keep({ step, at });
    return true;
  }

  finish(): { readonly rate_hz: number; readonly gaps: readonly Gap[]; readonly notes: readonly string[] } {
    this.#settle();
    const place = { file: this.#file, columnName: this.#columnName };
    if (this.#steps === 0)
      throw new UserError('one sample only; a record has many', { ...place, line: this.#lastLine });
    if (this.#repeated > 0.01 * this.#steps) {
      throw new UserError(
        `${String(this.#repeated)} samples have the time of the one before; the column has too few digits: give the sampling rate with --rate-hz`,
        { ...place, line: this.#firstRepeated },
      );
    }
    const step = this.#span / this.#steps;
    const gaps = this.#gaps.map((gap) => ({ at: gap.at, missing_s: Math.max(0, gap.step - step) }));
    const notes: string[] = [];
    if (this.#repeated > 0) {
      notes.push(
        `line ${String(this.#firstRepeated)}: a time that occurs twice; the second sample is left out, ${String(this.#repeated)} in all`,
      );
    }
    const scatter = Math.sqrt(Math.max(0, this.#squares / this.#steps - step * step)) / step;
    if (scatter > UNEVEN) {
      notes.push(
        `the samples are unevenly spaced (steps vary by ${String(Math.round(100 * scatter))} %); they are taken as even`,
      );
    }
    return { rate_hz: 1 / step, gaps, notes };
  }

  #keep(one: Step): void {
    if (this.#early === undefined) return this.#count(one);
    this.#early.push(one);
    if (this.#early.length >= FIRST_STEPS) this.#settle();
  }

  #settle(): void {
    const early = this.#early;
    if (early === undefined) return;
    this.#early = undefined;
    const steps = early.map(({ step }) => step).sort((a, b) => a - b);
    this.#usual = steps[steps.length >> 1] ?? NaN;
    for (const one of early) this.#count(one);
  }

  #count({ step, at }: Step): void {
    // The mean of the steps, not the usual one, gives the rate: coarse digits make 256 Hz step by 0.004, 0.004, 0.003 s.
    if (step > GAP * this.#usual) {
      this.#gaps.push({ at, step });
      return;
    }
    this.#steps += 1;
    this.#span += step;
    this.#squares += step * step;
  }
}

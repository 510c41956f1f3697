/** The steps of a hand calculation, noted by the code that computes. */
import type { AnyRecord, Inputs } from './formula.js';

export interface FormulaStep {
  readonly kind: 'formula';
  readonly record: AnyRecord;
  readonly inputs: Inputs;
  readonly value: number;
}

/** A choice between methods: what was taken, why, and what was turned down. */
export interface ChoiceStep {
  readonly kind: 'choice';
  readonly question: string;
  readonly taken: string;
  readonly because: string;
  /** What was not taken and why; or, of an answer in several parts, what belongs to it `also`. */
  readonly others: readonly { readonly what: string; readonly why: string; readonly also?: true }[];
}

/** A value that enters the calculation: given by the inventory, inferred, a default, a setting of the study. */
export interface ValueStep {
  readonly kind: 'value';
  readonly name: string;
  readonly value: number | string;
  readonly origin: string;
  readonly why: string;
}

export interface HeadingStep {
  readonly kind: 'heading';
  readonly text: string;
}

export type TraceStep = FormulaStep | ChoiceStep | ValueStep | HeadingStep;

/** Who found out what stands in place of the owner's cell, in words by column of the inventory: `street visit of 2026-05-03`. */
export type FoundBy = Readonly<Record<string, string>>;

/** Columns by the names under which their values enter, where these differ by more than blanks. */
const COLUMN_OF: Readonly<Record<string, string>> = {
  storeys: 'storeys_above',
  'code edition': 'year_built',
  're-entrant corner': 'reentrant_corner',
};

export class Trace {
  readonly steps: TraceStep[] = [];
  readonly #foundBy: FoundBy;

  /** `foundBy`: what surveys found of the building, so that its values name their source. */
  constructor(foundBy: FoundBy = {}) {
    this.#foundBy = foundBy;
  }

  /** Formula steps since the last heading: the same record at the same inputs is written once. */
  readonly #written = new Set<string>();

  formula(record: AnyRecord, inputs: Inputs, value: number): void {
    const key = `${record.id} ${JSON.stringify(inputs)}`;
    if (this.#written.has(key)) return;
    this.#written.add(key);
    this.steps.push({ kind: 'formula', record, inputs, value });
  }

  choice(step: Omit<ChoiceStep, 'kind'>): void {
    this.steps.push({ kind: 'choice', ...step });
  }

  value(name: string, value: number | string, origin: string, why: string): void {
    this.steps.push({ kind: 'value', name, value, origin, why: origin === 'given' ? this.#source(name, why) : why });
  }

  heading(text: string): void {
    this.#written.clear();
    this.steps.push({ kind: 'heading', text });
  }

  #source(name: string, why: string): string {
    const column = COLUMN_OF[name] ?? name.replaceAll(' ', '_');
    if (!Object.hasOwn(this.#foundBy, column)) return why;
    const by = this.#foundBy[column]!;
    return why === 'from the inventory' ? by : `${why}, ${by}`;
  }
}

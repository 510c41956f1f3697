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

export class Trace {
  readonly steps: TraceStep[] = [];

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
    this.steps.push({ kind: 'value', name, value, origin, why });
  }

  heading(text: string): void {
    this.#written.clear();
    this.steps.push({ kind: 'heading', text });
  }
}

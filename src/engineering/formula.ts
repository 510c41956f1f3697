/**
 * A published method is a record: the numbers as printed and where they stand. The code that evaluates it stands once, in its
 * family. `apply` is the only way an engineering number is made; with a trace it also writes the step down.
 */
import type { Source, Verified } from './source.js';

export type InputValue = number | readonly number[] | string;
export type Inputs = Readonly<Record<string, InputValue>>;
export type Constants = Readonly<Record<string, number>>;

export interface InputSpec {
  readonly name: string;
  readonly kind: 'number' | 'list' | 'word';
  /** Unit id (units.ts) for quantities; absent for pure numbers and words. */
  readonly unit?: string;
  readonly meaning: string;
  readonly words?: readonly string[];
  /** Value taken when `calc` is not given one. */
  readonly fallback?: InputValue;
}

export interface Family<I = Inputs, C = Constants> {
  readonly id: string;
  /** Name of the result, with its unit suffix. */
  readonly yields: string;
  /** Unit id of the result; null for a pure number. */
  readonly unit: string | null;
  /** Symbol of the result in the hand calculation. */
  readonly symbol: string;
  readonly inputs: readonly InputSpec[];
  /** Display formula over input and constant names (grammar: expression.ts); null when it is a procedure, told in `procedure`. */
  readonly expression: string | null;
  readonly procedure?: string;
  readonly evaluate: (inputs: I, constants: C) => number;
}

export interface Limit {
  readonly input: string;
  readonly from?: number;
  readonly to?: number;
  /** Whose limit it is, and what happens outside it. */
  readonly whose: 'publication' | 'ours';
  readonly outside: 'reject' | 'flag' | 'clamp';
  readonly text: string;
}

export interface MethodRecord<I = Inputs, C = Constants> {
  readonly id: string;
  readonly title: string;
  readonly family: Family<I, C>;
  readonly constants: C;
  readonly source: Source;
  readonly verified: Verified;
  readonly limits: readonly Limit[];
  readonly note?: string;
  /** Period formulas only: what the formula was fitted to. */
  readonly basis?: 'design' | 'best-fit' | 'ambient';
}

/** A record whose input and constant types are not needed by the caller. */
// eslint-disable-next-line @typescript-eslint/no-explicit-any -- the register holds records of every family
export type AnyRecord = MethodRecord<any, any>;

/** Where formula steps are noted (trace.ts). */
export interface FormulaSink {
  formula(record: AnyRecord, inputs: Inputs, value: number): void;
}

/** Freezes a record and keeps its types. */
export function record<I, C>(fields: MethodRecord<I, C>): MethodRecord<I, C> {
  return Object.freeze({ ...fields, constants: Object.freeze({ ...fields.constants }) });
}

/** The value of `method` at `inputs`; with a trace the step is noted. */
export function apply<I, C>(method: MethodRecord<I, C>, inputs: I, trace?: FormulaSink): number {
  const value = method.family.evaluate(inputs, method.constants);
  if (trace !== undefined) trace.formula(method as AnyRecord, inputs as Inputs, value);
  return value;
}

/** `apply` for a record taken from a register, whose input names the caller has matched to the family. */
export function applyAny(method: AnyRecord, inputs: Inputs, trace?: FormulaSink): number {
  return apply(method as MethodRecord<Inputs, unknown>, inputs, trace);
}

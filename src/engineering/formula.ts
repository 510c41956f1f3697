/**
 * A published method is a record: the numbers as printed and where they stand. The code that evaluates it stands once, in its
 * family. `apply` is the only way an engineering number is made; with a trace it also writes the step down.
 */
import type { Source, Verified } from './source.js';

export type InputValue = number | readonly number[] | string;
export type Inputs = Readonly<Record<string, InputValue>>;
export type Constants = Readonly<Record<string, number>>;

/** Where a number may lie; for a list, where each of its numbers may lie. */
export interface NumberRange {
  /** Smallest value allowed. */
  readonly from?: number;
  /** Value it must exceed. */
  readonly above?: number;
  /** Largest value allowed. */
  readonly to?: number;
}

export interface InputSpec extends NumberRange {
  readonly name: string;
  readonly kind: 'number' | 'list' | 'word';
  /** Unit id (units.ts) for quantities; absent for pure numbers and words. */
  readonly unit?: string;
  readonly meaning: string;
  readonly words?: readonly string[];
  /** Fewest and most numbers of a list. */
  readonly least?: number;
  readonly most?: number;
  /** Value taken when `calc` is not given one. */
  readonly fallback?: InputValue;
  /** A study must state it all the same. */
  readonly stated?: true;
}

export interface ShownFormula {
  /** Display formula (grammar: expression.ts). */
  readonly expression: string;
  /** Which branch or row of the publication this is. */
  readonly clause: string;
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
  /** The formula that serves these inputs, where it depends on them (a row of a table, a branch), and where it stands. */
  // a method, so that a family made from another with more inputs may be spread from it
  shownAt?(inputs: I, constants: C): ShownFormula;
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

/** The range in words: "a number in g > 0 and <= 10". `kind` is what is asked for. */
export function describeRange(kind: string, { from, above, to }: NumberRange, unit?: string): string {
  const of = unit === undefined ? kind : `${kind} in ${unit}`;
  if (from !== undefined && to !== undefined)
    return to >= Number.MAX_SAFE_INTEGER ? `${of} >= ${String(from)}` : `${of} ${String(from)} to ${String(to)}`;
  if (above !== undefined)
    return to === undefined ? `${of} > ${String(above)}` : `${of} > ${String(above)} and <= ${String(to)}`;
  return from === undefined ? of : `${of} >= ${String(from)}`;
}

/** What `spec` asks for in words: a number in its range, a list with its length, one of its words. */
export function describeSpec(spec: InputSpec): string {
  if (spec.kind === 'word') return `one of ${(spec.words ?? []).join(', ')}`;
  if (spec.kind === 'number') return describeRange('a number', spec, spec.unit);
  const { least, most } = spec;
  const count = least !== undefined && least === most ? `${String(least)} ` : '';
  const atLeast = count === '' && least !== undefined ? `at least ${String(least)} ` : '';
  return `a list of ${atLeast}${describeRange(`${count}numbers`, spec, spec.unit)}`;
}

/** What is wrong with `value` as `spec`, as "expected …, got …"; null when it fits. */
export function misfit(spec: InputSpec, value: InputValue): string | null {
  if (typeof value === 'string') {
    if (spec.kind === 'word' && (spec.words === undefined || spec.words.includes(value))) return null;
    return spec.kind === 'word'
      ? `unknown ${spec.name} "${value}"; known: ${(spec.words ?? []).join(', ')}`
      : `expected ${describeSpec(spec)}, got "${value}"`;
  }
  if (typeof value === 'number') {
    return spec.kind === 'number' && isWithin(spec, value)
      ? null
      : `expected ${describeSpec(spec)}, got ${String(value)}`;
  }
  if (spec.kind !== 'list') return `expected ${describeSpec(spec)}, got a list`;
  if (value.length < (spec.least ?? 0) || value.length > (spec.most ?? Infinity))
    return `expected ${describeSpec(spec)}, got ${String(value.length)}`;
  const wrong = value.find((entry) => !isWithin(spec, entry));
  return wrong === undefined ? null : `expected ${describeSpec(spec)}, got ${String(wrong)} among them`;
}

function isWithin({ from, above, to }: NumberRange, value: number): boolean {
  return value >= (from ?? -Infinity) && value > (above ?? -Infinity) && value <= (to ?? Infinity);
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

/** One record of the register evaluated alone, from inputs written as text: what `calc` and the library do. */
import { UserError, showValue } from '../errors.js';
import { readAssignments } from './calc-inputs.js';
import { apply, describeSpec, misfit } from './formula.js';
import type { AnyRecord, Inputs, InputSpec, InputValue, Limit, MethodRecord } from './formula.js';
import { findMethod, METHODS } from './methods.js';
import type { SpectrumFamily } from './spectrum/family.js';
import { flagWords } from './spectrum/flags.js';
import { Trace } from './trace.js';
import { findUnit } from './units.js';

export interface Calculation {
  readonly method: AnyRecord;
  /** Every input in its SI unit, fallbacks included. */
  readonly inputs: Readonly<Record<string, InputValue>>;
  /** In `unit`. */
  readonly value: number;
  /** Unit id of the value; null for a pure number. */
  readonly unit: string | null;
  /** Limits passed that do not forbid the value, and limits that could not be checked. */
  readonly flags: readonly string[];
  readonly trace: Trace;
}

/**
 * The record called `id`.
 * @throws UserError naming the nearest ids when there is none.
 */
export function methodCalled(id: string): AnyRecord {
  const found = findMethod(id);
  if (found !== undefined) return found;
  const close = nearestMethods(id);
  throw new UserError(
    `unknown method ${showValue(id)}${close.length === 0 ? '' : `; nearest: ${close.join(', ')}`}; \`swaymark methods\` lists them all`,
  );
}

/** Ids of the register that look most like `id`, best first, at most three. */
export function nearestMethods(id: string): readonly string[] {
  const asked = pairs(id);
  return METHODS.map((method) => ({ id: method.id, likeness: likeness(asked, pairs(method.id)) }))
    .filter((entry) => entry.likeness >= 0.4)
    .sort((a, b) => b.likeness - a.likeness || (a.id < b.id ? -1 : 1))
    .slice(0, 3)
    .map((entry) => entry.id);
}

/**
 * Evaluates `method` at inputs written `name=value` (`height_m=28`, `height_ft=93`, `masses_t=200,200,180`, `ground=C`).
 * @throws UserError for an input that is unknown, missing or given twice, a unit that does not fit, a value outside a limit
 * that rejects, or inputs for which the method has no value.
 * @example
 * const { value, unit } = calculate(methodCalled('asce7-22/period/other'), ['height_ft=93']); // 0.599 s
 */
export function calculate(method: AnyRecord, assignments: readonly string[]): Calculation {
  const specs = method.family.inputs;
  const extra = checkedInputs(method);
  const given = readAssignments(method.id, [...specs, ...extra], assignments);
  const missing = specs.filter((spec) => !given.has(spec.name) && spec.fallback === undefined);
  if (missing.length > 0) throw new UserError(`${method.id}: missing ${missing.map(describeInput).join('; ')}`);

  const trace = new Trace();
  trace.heading('Inputs');
  const inputs: Record<string, InputValue> = {};
  for (const spec of [...specs, ...extra]) {
    const entry = given.get(spec.name);
    const value = entry?.value ?? spec.fallback;
    if (value === undefined) continue;
    const wrong = misfit(spec, value);
    if (wrong !== null) throw new UserError(`${method.id}: ${spec.name}: ${wrong}`);
    const origin = entry === undefined ? 'default' : entry.conversion === null ? 'given' : 'converted';
    trace.value(
      spec.name,
      typeof value === 'object' ? value.join('; ') : value,
      origin,
      entry?.conversion ?? spec.meaning,
    );
    inputs[spec.name] = value;
  }
  const flags = method.limits.flatMap((limit) => checkLimit(method, limit, inputs[limit.input]));
  const own = Object.fromEntries(specs.map(({ name }) => [name, inputs[name]]));
  const value = evaluate(method, own, trace);
  flags.push(...spectrumFlags(method, own as Inputs));
  return { method, inputs, value, unit: method.family.unit, flags, trace };
}

/** What a compiled spectrum says about its own parameters, in words. */
function spectrumFlags(method: AnyRecord, inputs: Inputs): readonly string[] {
  const { compile } = method.family as Partial<Pick<SpectrumFamily<Inputs>, 'compile'>>;
  return compile === undefined ? [] : flagWords(compile(inputs));
}

function evaluate(method: AnyRecord, inputs: Readonly<Record<string, unknown>>, trace: Trace): number {
  let value: number;
  try {
    value = apply(method as MethodRecord<Readonly<Record<string, unknown>>>, inputs, trace);
  } catch (cause) {
    // RangeError is how a kernel refuses an argument; anything else is ours to mend.
    if (!(cause instanceof RangeError)) throw cause;
    throw new UserError(`${method.id}: ${cause.message}`, {}, { cause });
  }
  if (!Number.isFinite(value))
    throw new UserError(`${method.id}: no finite value for these inputs; check that none of them is zero or negative`);
  return value;
}

/** What an input is, with its unit and those it may be given in: for messages and for `methods <id>`. */
export function describeInput(spec: InputSpec): string {
  const words = spec.words === undefined ? '' : `, one of ${spec.words.join(', ')}`;
  const list = spec.kind === 'list' ? ', a list separated by commas' : '';
  const bounded = spec.from ?? spec.above ?? spec.to ?? spec.least;
  const range = bounded === undefined ? '' : `, ${describeSpec(spec)}`;
  const fallback = spec.fallback === undefined ? '' : `, ${String(spec.fallback)} when left out`;
  return `${spec.name} (${spec.meaning}${words}${list}${range}${fallback})`;
}

/** Quantities that a limit is on and the formula itself does not take, such as the mean storey height: they may be given to be checked. */
export function checkedInputs(method: AnyRecord): readonly InputSpec[] {
  const names = new Set(method.family.inputs.map(({ name }) => name));
  return method.limits
    .filter(({ input }) => !names.has(input))
    .map(({ input, text }) => {
      const unit = input.split('_').at(-1) ?? '';
      const known = findUnit(unit)?.id === unit;
      return known
        ? { name: input, kind: 'number', unit, meaning: `checked only: ${text}` }
        : { name: input, kind: 'number', meaning: `checked only: ${text}` };
    });
}

function checkLimit(method: AnyRecord, limit: Limit, value: InputValue | undefined): readonly string[] {
  if (value === undefined) return [`not checked, ${limit.input} was not given: ${limit.text}`];
  const outside = [value]
    .flat()
    .filter(
      (entry) => typeof entry === 'number' && (entry < (limit.from ?? -Infinity) || entry > (limit.to ?? Infinity)),
    );
  if (outside.length === 0) return [];
  const whose = limit.whose === 'publication' ? `limit of ${method.source.standard}` : 'our own limit';
  const message = `${limit.input} = ${outside.map(String).join(', ')} is outside the ${whose}: ${limit.text}`;
  if (limit.outside === 'reject') throw new UserError(`${method.id}: ${message}`);
  return [message];
}

/** Pairs of neighbouring letters and digits of each part of a name. */
function pairs(text: string): ReadonlySet<string> {
  const found = new Set<string>();
  for (const part of text
    .toLowerCase()
    .slice(0, 200)
    .split(/[^\p{L}\p{N}]+/u)) {
    for (let i = 0; i + 1 < part.length; i += 1) found.add(part.slice(i, i + 2));
  }
  return found;
}

/** Share of the pairs of `asked` that `known` has, and a little for how much of `known` they make up. */
function likeness(asked: ReadonlySet<string>, known: ReadonlySet<string>): number {
  let shared = 0;
  for (const pair of asked) if (known.has(pair)) shared += 1;
  return asked.size === 0 ? 0 : (0.8 * shared) / asked.size + (0.2 * shared) / known.size;
}

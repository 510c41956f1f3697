/** Inputs of `calc` as they are typed: `name=value`, in any registered unit of the quantity. */
import { UserError, showValue } from '../errors.js';
import type { InputSpec, InputValue } from './formula.js';
import { convert, findUnit, unitsOf } from './units.js';
import type { Dimension, Unit } from './units.js';

export interface GivenInput {
  /** In the SI unit of the input. */
  readonly value: InputValue;
  /** How it was brought to that unit; null when given in it. */
  readonly conversion: string | null;
}

/** Quantities that make no sense at zero; times and accelerations may be zero. */
const POSITIVE: ReadonlySet<Dimension> = new Set(['length', 'area', 'mass', 'stiffness', 'force', 'pressure', 'speed']);
const NUMBER = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/;

/**
 * The inputs by their names in `specs`.
 * @throws UserError for text without `=`, an unknown name, a unit that does not fit, a value that does not fit, a name given twice.
 */
export function readAssignments(
  methodId: string,
  specs: readonly InputSpec[],
  assignments: readonly string[],
): ReadonlyMap<string, GivenInput> {
  const given = new Map<string, GivenInput>();
  for (const text of assignments) {
    const equals = text.indexOf('=');
    if (equals < 1) throw new UserError(`${methodId}: expected name=value, got ${showValue(text)}`);
    const name = text.slice(0, equals).trim();
    const { spec, unit } = inputNamed(methodId, specs, name);
    if (given.has(spec.name)) throw new UserError(`${methodId}: ${spec.name} is given twice`);
    given.set(spec.name, readValue(spec, unit, name, text.slice(equals + 1).trim()));
  }
  return given;
}

/** `height_m` without its unit. */
function stem(spec: InputSpec): string {
  return spec.unit !== undefined && spec.name.endsWith(`_${spec.unit}`)
    ? spec.name.slice(0, -spec.unit.length - 1)
    : spec.name;
}

function inputNamed(
  methodId: string,
  specs: readonly InputSpec[],
  name: string,
): { spec: InputSpec; unit: Unit | null } {
  const exact = specs.find((spec) => spec.name === name);
  if (exact !== undefined) return { spec: exact, unit: null };
  // The longest stem first: of sa_1_g and sa_g the longer one is meant by sa_1_m_per_s2.
  const quantities = specs.filter((spec) => spec.unit !== undefined).sort((a, b) => stem(b).length - stem(a).length);
  const spec = quantities.find((entry) => name === stem(entry) || name.startsWith(`${stem(entry)}_`));
  const base = findUnit(spec?.unit ?? '');
  if (spec === undefined || base === undefined) {
    throw new UserError(
      `${methodId}: unknown input ${showValue(name)}; it takes ${specs.map((entry) => entry.name).join(', ') || 'none'}`,
    );
  }
  const allowed = unitsOf(base.dimension);
  const suffix = name.slice(stem(spec).length + 1);
  const unit = allowed.find(({ id }) => id === suffix);
  if (unit !== undefined) return { spec, unit };
  const known = `write ${allowed.map(({ id }) => `${stem(spec)}_${id}`).join(', ')}`;
  if (suffix === '') throw new UserError(`${methodId}: ${name} has no unit; ${known}`);
  const other = findUnit(suffix);
  throw new UserError(
    other?.id === suffix
      ? `${methodId}: ${name}: ${suffix} is a unit of ${other.dimension}, and ${stem(spec)} is ${article(base.dimension)} ${base.dimension}; ${known}`
      : `${methodId}: ${name}: unknown unit ${showValue(suffix)}; ${known}`,
  );
}

function article(word: string): string {
  return /^[aeiou]/.test(word) ? 'an' : 'a';
}

function readValue(spec: InputSpec, unit: Unit | null, name: string, text: string): GivenInput {
  if (spec.kind === 'word') {
    const word =
      spec.words === undefined ? text : spec.words.find((entry) => entry.toLowerCase() === text.toLowerCase());
    if (word === undefined || word === '')
      throw new UserError(`${name}: unknown word ${showValue(text)}; known: ${(spec.words ?? []).join(', ')}`);
    return { value: word, conversion: null };
  }
  const parts = spec.kind === 'list' ? text.split(/\s*[,;]\s*/) : [text];
  const base = findUnit(spec.unit ?? '');
  const numbers = parts.map((part) => readNumber(name, part, spec.kind === 'list', base));
  const converted = unit === null || base === undefined ? numbers : numbers.map((value) => convert(value, unit, base));
  const [first = NaN] = converted;
  return {
    value: spec.kind === 'list' ? converted : first,
    conversion:
      unit === null || base === undefined || unit === base
        ? null
        : `${numbers.join('; ')} ${unit.label} × ${String(unit.factor / base.factor)}`,
  };
}

function readNumber(name: string, text: string, inList: boolean, base: Unit | undefined): number {
  const value = NUMBER.test(text) ? Number(text) : NaN;
  if (!Number.isFinite(value)) {
    const hint = text.includes(',')
      ? '; write 1200.5, without thousands separators'
      : inList
        ? '; a list is written 200,200,180'
        : '; the unit belongs to the name, as in height_ft=93';
    throw new UserError(`${name}: ${showValue(text)} is not a number${hint}`);
  }
  if (base === undefined) return value;
  if (POSITIVE.has(base.dimension) && value <= 0)
    throw new UserError(`${name}: ${String(value)} given; it must be above 0`);
  if (value < 0) throw new UserError(`${name}: ${String(value)} given; it must not be negative`);
  return value;
}

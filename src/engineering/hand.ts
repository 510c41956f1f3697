/** A trace as text: symbols, numbers put in, result with unit, clause. Shared by terminal, page and review sheet. */
import { evaluateExpression, parseExpression, writeExpression } from './expression.js';
import { formatCount, formatNumber, formatQuantity, shownUnit, unitLabel, textInDisplay } from './format.js';
import type { Display } from './format.js';
import { applyAny } from './formula.js';
import type { AnyRecord, Family, InputValue } from './formula.js';
import { symbol, symbolIn } from './hand-symbols.js';
import { cite } from './source.js';
import { segmentAt } from './spectrum/compiled.js';
import type { SpectrumFamily } from './spectrum/family.js';
import type { Inputs } from './formula.js';
import { Trace } from './trace.js';
import type { FormulaStep, ValueStep } from './trace.js';
import { findUnit } from './units.js';

export interface HandStep {
  readonly kind: 'heading' | 'value' | 'formula' | 'choice';
  readonly title: string;
  /** Formula in symbols, or the statement of a choice. */
  readonly symbolic: string;
  /** The same with its numbers. */
  readonly substituted: string;
  readonly result: string;
  readonly source: string;
  readonly mark: string;
  readonly details: readonly string[];
  /** The record behind a formula step. */
  readonly method: string | null;
  /** The value to full precision, formula steps only. */
  readonly value: number | null;
}

/** Quantities that count things: whole ones print without decimals. */
const COUNTS: ReadonlySet<string> = new Set(['storeys', 'occupants_peak', 'occupied_hours_per_week']);

function showNumber(name: string, value: number): string {
  if (COUNTS.has(name) && Number.isInteger(value)) return formatCount(value);
  // a metre is the fifth decimal of a degree
  return formatNumber(value, name.endsWith('_deg') ? 8 : 4);
}

/** A number as the formula takes it, in the unit of its record; the unit is named where the display shows the quantity in another. */
function showInput(name: string, value: InputValue, display: Display): string {
  if (typeof value === 'string') return value;
  const unit = unitOfName(name);
  const named = unit === null || shownUnit(unit, display) === unit ? '' : ` ${unitLabel(unit, 'si')}`;
  if (typeof value === 'number') return `${showNumber(name, value)}${named}`;
  return `[${value.map((entry) => formatNumber(entry, 4)).join('; ')}]${named}`;
}

/** The result in the unit that its formula yields, since the numbers put in are in such units; then in the display's unit. */
function showResult(value: number, unit: string | null, display: Display): string {
  const own = formatQuantity(value, unit, 'si', 4);
  if (unit === null || Number.isNaN(value) || shownUnit(unit, display) === unit) return own;
  return `${own} (${formatQuantity(value, unit, display, 4)})`;
}

/** "height_m" -> "height": the unit stands with the value. */
export function nameWithoutUnit(name: string, unit: string | null = unitOfName(name)): string {
  return (unit === null ? name : name.slice(0, -unit.length - 1)).replaceAll('_', ' ');
}

function showValueStep({ name, value, origin }: ValueStep, display: Display): Pick<HandStep, 'title' | 'result'> {
  const unit = unitOfName(name);
  const title = nameWithoutUnit(name, unit);
  // Lists come as text, in the unit of their name.
  if (typeof value === 'string') return { title, result: unit === null ? value : `${value} ${unitLabel(unit, 'si')}` };
  if (unit === null) return { title, result: showNumber(name, value) };
  // The conversion that stands beside it yields the unit of the record, whatever is displayed.
  return { title, result: formatQuantity(value, unit, origin === 'converted' ? 'si' : display, 4) };
}

/** The display formula of a step: the family's own, or the branch of the spectrum that was read. */
export function expressionOf(step: Pick<FormulaStep, 'record' | 'inputs'>): {
  readonly text: string | null;
  readonly branch: string;
  /** Numbers that the formula names besides inputs and constants. */
  readonly quantities: Readonly<Record<string, number>>;
} {
  const family = step.record.family as Family<Inputs, unknown> & Partial<Pick<SpectrumFamily<Inputs>, 'compile'>>;
  if (family.compile !== undefined && typeof step.inputs['period_s'] === 'number') {
    const compiled = family.compile(step.inputs);
    const segment = segmentAt(compiled, step.inputs['period_s']);
    return { text: segment.expression, branch: segment.clause, quantities: compiled.quantities ?? {} };
  }
  const shown = family.shownAt?.(step.inputs, step.record.constants);
  return { text: shown?.expression ?? family.expression, branch: shown?.clause ?? '', quantities: {} };
}

function formulaStep(step: FormulaStep, display: Display): HandStep {
  const { record, inputs, value } = step;
  const { text, branch, quantities } = expressionOf(step);
  const constants: Readonly<Record<string, number>> = {
    ...(record.constants as Readonly<Record<string, number>>),
    ...quantities,
  };
  let symbolic = record.family.procedure ?? '';
  let substituted = Object.entries(inputs)
    .map(([name, input]) => `${symbol(name)} = ${showInput(name, input, display)}`)
    .join(', ');
  if (text !== null) {
    const node = parseExpression(text);
    symbolic = writeExpression(node, symbolIn(record.family.id));
    substituted = writeExpression(node, (name) => showInput(name, inputs[name] ?? constants[name] ?? name, display));
  }
  return {
    kind: 'formula',
    title: record.title,
    symbolic: text === null ? symbolic : `${record.family.symbol} = ${symbolic}`,
    substituted: text === null ? substituted : `= ${substituted}`,
    result: `= ${showResult(value, record.family.unit, display)}`,
    source: branch === '' ? cite(record.source) : `${cite(record.source)}, ${branch}`,
    mark: record.verified,
    details: record.note === undefined ? [] : [record.note],
    method: record.id,
    value,
  };
}

/** The steps of a trace as text. */
export function handSteps(trace: Trace, display: Display): readonly HandStep[] {
  return trace.steps.map((step): HandStep => {
    const blank = {
      symbolic: '',
      substituted: '',
      result: '',
      source: '',
      mark: '',
      details: [],
      method: null,
      value: null,
    };
    switch (step.kind) {
      case 'heading':
        return { ...blank, kind: 'heading', title: step.text };
      case 'value':
        return {
          ...blank,
          kind: 'value',
          ...showValueStep(step, display),
          source: textInDisplay(step.why, display),
          mark: step.origin,
        };
      case 'choice':
        return {
          ...blank,
          kind: 'choice',
          title: step.question,
          symbolic: textInDisplay(step.taken, display),
          source: textInDisplay(step.because, display),
          details: step.others.map(
            ({ what, why, also }) => `${also === true ? 'also' : 'not'} ${what}: ${textInDisplay(why, display)}`,
          ),
        };
      case 'formula':
        return formulaStep(step, display);
    }
  });
}

/** Unit id at the end of a quantity's name: `height_m` -> m, `storey_stiffness_kN_per_m` -> kN_per_m; null for pure numbers. */
export function unitOfName(name: string): string | null {
  if (name.startsWith('people_per_')) return null;
  const parts = name.split('_');
  for (let from = 1; from < parts.length; from += 1) {
    const tail = parts.slice(from).join('_');
    const unit = findUnit(tail);
    if (unit !== undefined && unit.id === tail) return unit.id;
  }
  return null;
}

/** A formula with its numbers put in, without the sign of equality; for a sentence that says how a value was come by. */
export function substituted(record: AnyRecord, inputs: Inputs): string {
  const trace = new Trace();
  applyAny(record, inputs, trace);
  return handSteps(trace, 'si')
    .map((step) => step.substituted.replace(/^= /, ''))
    .join('; ');
}

/** The display formula evaluated on its own: what the tests hold against the code. Null when the method is a procedure. */
export function evaluateDisplayed(step: Pick<FormulaStep, 'record' | 'inputs'>): number | null {
  const { text, quantities } = expressionOf(step);
  if (text === null) return null;
  const constants = step.record.constants as Readonly<Record<string, number>>;
  return evaluateExpression(parseExpression(text), {
    ...constants,
    ...quantities,
    ...(step.inputs as Readonly<Record<string, number>>),
  });
}

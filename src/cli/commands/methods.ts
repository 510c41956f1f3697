import { checkedInputs, describeInput, methodCalled } from '../../engineering/calc.js';
import { parseExpression, writeExpression } from '../../engineering/expression.js';
import type { AnyRecord, InputSpec, Limit } from '../../engineering/formula.js';
import { METHODS } from '../../engineering/methods.js';
import { cite } from '../../engineering/source.js';
import { findUnit, unitsOf } from '../../engineering/units.js';
import { EXIT } from '../../errors.js';
import { printJson, printLines, terminalColumns } from '../output/print.js';
import { markWords } from '../output/steps.js';
import { styled } from '../output/style.js';
import { wrap } from '../output/text.js';

/** `swaymark methods`: the register, or one record in full. */
export function methods(id: string | undefined, options: { readonly json?: true }): number {
  const columns = Math.min(terminalColumns(), 100);
  if (id === undefined) {
    if (options.json) printJson(METHODS.map(asJson));
    else printLines(METHODS.flatMap((method) => entryLines(method, columns)));
    return EXIT.clean;
  }
  const method = methodCalled(id);
  if (options.json) printJson(asJson(method));
  else printLines(methodLines(method, columns));
  return EXIT.clean;
}

function asJson(method: AnyRecord): unknown {
  const { id, title, family, source, verified, limits, note, basis } = method;
  const constants = method.constants as Readonly<Record<string, number>>;
  const withUnits = (spec: InputSpec): unknown => ({
    ...spec,
    ...(spec.unit === undefined ? {} : { units: unitsFor(spec.unit) }),
  });
  return {
    id,
    title,
    clause: cite(source),
    source,
    verified,
    ...(basis === undefined ? {} : { basis }),
    yields: family.yields,
    unit: family.unit,
    inputs: family.inputs.map(withUnits),
    optional: checkedInputs(method).map(withUnits),
    constants,
    expression: family.expression,
    procedure: family.procedure ?? null,
    limits,
    note: note ?? null,
  };
}

function unitsFor(unit: string): string[] {
  const base = findUnit(unit);
  return base === undefined ? [] : unitsOf(base.dimension).map(({ id }) => id);
}

function inputList(method: AnyRecord): string {
  return method.family.inputs.map(({ name }) => name).join(', ');
}

function limitText({ text, whose, outside }: Limit): string {
  const what = { reject: 'refused outside', flag: 'flagged outside', clamp: 'held at the limit' }[outside];
  return `${text} (${whose === 'ours' ? 'our limit' : 'limit of the publication'}, ${what})`;
}

function entryLines(method: AnyRecord, columns: number): string[] {
  const { id, title, source, verified, limits, family } = method;
  return [
    styled('bold', id),
    ...wrap(title, columns, '    '),
    ...wrap(`${cite(source)} [${verified}]`, columns, '    '),
    ...wrap(`from ${inputList(method)} to ${family.yields}`, columns, '    ', '      '),
    ...limits.flatMap((limit) => wrap(`limit: ${limitText(limit)}`, columns, '    ', '      ')),
  ];
}

function inputLines(spec: InputSpec, columns: number): string[] {
  return [
    ...wrap(describeInput(spec), columns, '  ', '    '),
    ...(spec.unit === undefined ? [] : wrap(`units: ${unitsFor(spec.unit).join(', ')}`, columns, '      ')),
  ];
}

/** One record in full. */
export function methodLines(method: AnyRecord, columns: number): string[] {
  const { id, title, family, source, verified, limits, note, basis } = method;
  const constants = Object.entries(method.constants as Readonly<Record<string, number>>);
  const formula =
    family.expression === null
      ? (family.procedure ?? '')
      : writeExpression(parseExpression(family.expression), (name) => name);
  const section = (head: string, lines: readonly string[]): string[] =>
    lines.length === 0 ? [] : ['', styled('bold', head), ...lines];
  return [
    styled('bold', id),
    ...wrap(title, columns),
    ...wrap(`${cite(source)} [${markWords(verified)}]`, columns),
    ...(basis === undefined
      ? []
      : [
          `fitted for: ${basis === 'best-fit' ? 'the best estimate' : basis === 'design' ? 'design (short side)' : 'small amplitude'}`,
        ]),
    ...section(
      family.expression === null ? 'Procedure' : 'Formula',
      wrap(`${family.yields} = ${formula}`, columns, '  ', '    '),
    ),
    ...section(
      'Inputs',
      family.inputs.flatMap((spec) => inputLines(spec, columns)),
    ),
    ...section(
      'Optional inputs, not in the formula',
      checkedInputs(method).flatMap((spec) => inputLines(spec, columns)),
    ),
    ...section(
      'Constants',
      constants.map(([name, value]) => `  ${name} = ${String(value)}`),
    ),
    ...section(
      'Limits',
      limits.flatMap((limit) => wrap(limitText(limit), columns, '  ', '    ')),
    ),
    ...section('Note', note === undefined ? [] : wrap(note, columns, '  ')),
    ...section('Result', [
      `  ${family.yields}${family.unit === null ? ', a pure number' : `, in ${findUnit(family.unit)?.label ?? family.unit}`}`,
    ]),
  ];
}

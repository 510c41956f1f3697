import { checkedInputs, describeInput, methodCalled } from '../../engineering/calc.js';
import { parseExpression, writeExpression } from '../../engineering/expression.js';
import type { AnyRecord, InputSpec, Limit } from '../../engineering/formula.js';
import { METHODS, findMethod } from '../../engineering/methods.js';
import { LEFT_OUT } from '../../engineering/period/left-out.js';
import { cite } from '../../engineering/source.js';
import { STIFFNESS_LEFT_OUT } from '../../engineering/stiffness/left-out.js';
import { findUnit, unitsOf } from '../../engineering/units.js';
import { EXIT } from '../../errors.js';
import { printJson, printLines, terminalColumns } from '../output/print.js';
import { markWords } from '../output/steps.js';
import { styled } from '../output/style.js';
import { wrap } from '../output/text.js';

/** `swaymark methods`: the register, the records that hold every word asked for, or one record in full by its id. */
export function methods(words: readonly string[], options: { readonly json?: true; readonly leftOut?: true }): number {
  const columns = Math.min(terminalColumns(), 100);
  if (options.leftOut) {
    const rows = [...LEFT_OUT, ...STIFFNESS_LEFT_OUT];
    if (options.json) printJson(rows);
    else printLines(rows.flatMap(({ row, reason }) => [styled('bold', row), ...wrap(reason, columns, '    ')]));
    return EXIT.clean;
  }
  const [first = ''] = words;
  const exact = words.length === 1 ? findMethod(first) : undefined;
  if (exact !== undefined) {
    if (options.json) printJson(asJson(exact));
    else printLines(methodLines(exact, columns));
    return EXIT.clean;
  }
  const found = METHODS.filter((method) => holdsAll(method, words));
  // A mistyped id is answered with the nearest ones.
  if (found.length === 0) methodCalled(words.join(' '));
  if (options.json) printJson(found.map(asJson));
  else printLines([...found.flatMap((method) => entryLines(method, columns)), '', ...closing(found.length, columns)]);
  return EXIT.clean;
}

function holdsAll({ id, title, source, verified, basis }: AnyRecord, words: readonly string[]): boolean {
  const text = `${id} ${title} ${cite(source)} ${verified} ${basis ?? ''}`.toLowerCase();
  return words.every((word) => text.includes(word.toLowerCase()));
}

function closing(count: number, columns: number): string[] {
  const all = count === METHODS.length;
  return wrap(
    `${String(count)} ${count === 1 ? 'method' : 'methods'}${all ? '' : ` of ${String(METHODS.length)}`}; one in full by its id, fewer by words: swaymark methods period wall`,
    columns,
  );
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

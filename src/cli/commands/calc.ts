import { calculate, checkedInputs, methodCalled } from '../../engineering/calc.js';
import type { Calculation } from '../../engineering/calc.js';
import { formatQuantity } from '../../engineering/format.js';
import type { InputSpec } from '../../engineering/formula.js';
import { handSteps, nameWithoutUnit } from '../../engineering/hand.js';
import { cite } from '../../engineering/source.js';
import { EXIT } from '../../errors.js';
import { drawCalculation } from '../../exports/spectrum-files.js';
import { printJson, printLines, terminalColumns } from '../output/print.js';
import { stepLines } from '../output/steps.js';
import { styled } from '../output/style.js';
import { clean, wrap } from '../output/text.js';
import { methodLines } from './methods.js';

/** `swaymark calc`: one method by itself. */
export async function calc(
  id: string,
  inputs: readonly string[],
  options: { readonly units: 'si' | 'us'; readonly json?: true; readonly svg?: string },
): Promise<number> {
  const method = methodCalled(id);
  const columns = Math.min(terminalColumns(), 100);
  if (inputs.length === 0 && method.family.inputs.length > 0) {
    const written = ({ name, kind, words }: InputSpec): string =>
      `${name}=${kind === 'list' ? '…,…' : (words?.[0] ?? '…')}`;
    const names = [
      ...method.family.inputs.map(written),
      ...checkedInputs(method).map((spec) => `[${written(spec)}]`),
    ].join(' ');
    if (options.json) printJson({ id, needs: method.family.inputs, optional: checkedInputs(method) });
    else printLines([...methodLines(method, columns), '', `swaymark calc ${id} ${names}`]);
    return EXIT.clean;
  }
  const result = calculate(method, inputs);
  const svg = options.svg === undefined ? null : await drawCalculation(result, options.svg);
  if (options.json) printJson(asJson(result, options.units));
  else {
    const drawn = svg === null ? [] : wrap(clean(`spectrum drawn in ${svg}`), columns);
    printLines([...lines(result, options.units, columns), ...drawn]);
  }
  return EXIT.clean;
}

function asJson({ method, inputs, value, unit, flags, trace }: Calculation, display: 'si' | 'us'): unknown {
  return {
    id: method.id,
    title: method.title,
    clause: cite(method.source),
    verified: method.verified,
    yields: method.family.yields,
    value,
    unit,
    inputs,
    flags,
    trace: handSteps(trace, display),
  };
}

function lines({ method, value, unit, flags, trace }: Calculation, display: 'si' | 'us', columns: number): string[] {
  return [
    ...stepLines(handSteps(trace, display), columns),
    '',
    styled('bold', `${nameWithoutUnit(method.family.yields)}: ${formatQuantity(value, unit, display, 4)}`),
    ...flags.flatMap((flag) => wrap(`note: ${flag}`, columns, '', '  ')),
  ];
}

/** A hand calculation for the terminal. */
import type { HandStep } from '../../engineering/hand.js';
import { styled } from './style.js';
import { clean, width, wrap } from './text.js';

/** How the numbers of a publication were come by, in words. */
const MARKS: Readonly<Record<string, string>> = {
  printed: 'read in the publication',
  restated: 'restated by another publication',
  memory: 'from memory, to be checked in the publication',
  judgement: 'judgement',
  mechanics: 'mechanics',
};

export function markWords(mark: string): string {
  return MARKS[mark] ?? mark;
}

/** Lines of at most `columns`: headings, values with their origin, choices with what was turned down, formulas with numbers put in. */
export function stepLines(steps: readonly HandStep[], columns: number): string[] {
  return steps.flatMap((step, i) => {
    const afterFormula = steps[i - 1]?.kind === 'formula' ? [''] : [];
    switch (step.kind) {
      case 'heading':
        return [
          ...(i === 0 ? [] : ['']),
          styled('bold', clean(step.title)),
          '─'.repeat(Math.min(columns, width(clean(step.title)))),
        ];
      case 'value':
        return [...afterFormula, ...valueLines(step, columns)];
      case 'choice':
        return [...afterFormula, ...choiceLines(step, columns)];
      case 'formula':
        return formulaLines(step, columns);
    }
  });
}

function valueLines({ title, result, mark, source }: HandStep, columns: number): string[] {
  const why = source === '' ? mark : `${mark}: ${source}`;
  return wrap(clean(`${title} = ${result}   [${why}]`), columns, '  ', '      ');
}

function choiceLines({ title, symbolic, source, details }: HandStep, columns: number): string[] {
  return [
    ...wrap(clean(`${title}: ${symbolic}`), columns, '  ', '      '),
    ...(source === '' ? [] : wrap(clean(`because ${source}`), columns, '      ')),
    ...details.flatMap((detail) => wrap(clean(detail), columns, '      ', '        ')),
  ];
}

function formulaLines(
  { title, symbolic, substituted, result, source, mark, details, method }: HandStep,
  columns: number,
): string[] {
  const [left = '', ...right] = symbolic.split(' = ');
  const symbol = `      ${left} `;
  const under = ' '.repeat(width(symbol));
  const further = `${under}  `;
  return [
    '',
    ...wrap(clean(title), columns, '  ', '    '),
    ...wrap(`= ${clean(right.join(' = '))}`, columns, symbol, further),
    ...(result.startsWith(substituted) ? [] : wrap(clean(substituted), columns, under, further)),
    styled('bold', `${under}${clean(result)}`),
    ...wrap(
      clean(source.endsWith(`[${mark}]`) ? source : `${source} [${markWords(mark)}]`),
      columns,
      '      ',
      '        ',
    ),
    ...(method === null ? [] : [styled('dim', `      ${method}`)]),
    ...details.flatMap((detail) => wrap(clean(detail), columns, '      ', '        ')),
  ];
}

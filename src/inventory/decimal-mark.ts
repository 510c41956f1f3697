/** Which sign the numbers of a table are written with, by the cells that leave no choice. */
import { foldWord } from './cell.js';

export interface DecimalMark {
  readonly mark: '.' | ',';
  /** Asked when the cells do not settle it. */
  readonly question?: string;
}

type Reading = '.' | ',' | 'either' | undefined;

/**
 * The decimal mark of most unambiguous cells of the columns that look like numbers. `45,0` and `3.937,5` say comma,
 * `45.0` and `3,937.5` say point; `3,937` may be either. A semicolon between cells decides only where nothing else does.
 */
export function detectDecimal(
  rows: readonly (readonly string[])[],
  delimiter: string,
  blank: readonly string[],
): DecimalMark {
  const blanks = new Set(blank.map(foldWord));
  const width = rows.reduce((most, row) => Math.max(most, row.length), 0);
  const counts = { '.': 0, ',': 0, either: 0 };
  const examples: Partial<Record<keyof typeof counts, string>> = {};
  for (let at = 0; at < width; at += 1) {
    const cells = rows.map((row) => bareCell(row[at] ?? '')).filter((cell) => !blanks.has(cell));
    const numbers = cells.filter((cell) => /^[+-]?[\d.,][\d., ’']*$/.test(cell) && /\d/.test(cell));
    // Half and more, as for a column that is taken for numbers.
    if (numbers.length === 0 || numbers.length < 0.5 * cells.length) continue;
    for (const cell of numbers) {
      const reading = readingOf(cell);
      if (reading === undefined) continue;
      counts[reading] += 1;
      examples[reading] ??= cell;
    }
  }
  const mark = counts[','] > counts['.'] ? ',' : '.';
  const other = mark === ',' ? '.' : ',';
  const name = (sign: string): string => (sign === ',' ? 'a comma' : 'a point');
  if (counts[other] > 0) {
    const question =
      `${counts[mark]} sampled numbers have ${name(mark)} for decimals (${examples[mark] ?? ''}), ` +
      `${counts[other]} have ${name(other)} (${examples[other] ?? ''}); which is right?`;
    return { mark, question };
  }
  if (counts[mark] > 0 || counts.either === 0) return { mark };
  const guess = delimiter === ';' ? ',' : '.';
  return { mark: guess, question: `is ${examples.either ?? ''} written with thousands or with decimals?` };
}

// Without the unit a cell may carry: `12,5 m`.
function bareCell(text: string): string {
  return foldWord(text)
    .replace(/(?<=\d)\s*[a-z²³%'"]+[a-z²³. ]*$/u, '')
    .trim();
}

function readingOf(cell: string): Reading {
  const digits = cell.replace(/^[+-]/, '');
  const points = digits.split('.').length - 1;
  const commas = digits.split(',').length - 1;
  if (points === 0 && commas === 0) return undefined;
  if (points > 0 && commas > 0) {
    if (commas === 1 && /^\d{1,3}(\.\d{3})+,\d+$/.test(digits)) return ',';
    if (points === 1 && /^\d{1,3}(,\d{3})+\.\d+$/.test(digits)) return '.';
    return undefined;
  }
  const sign = points > 0 ? '.' : ',';
  const count = points + commas;
  // Groups of three and more than one of them: thousands, so the other sign is left for decimals.
  if (count > 1) return /^\d{1,3}([.,]\d{3}){2,}$/.test(digits) ? (sign === ',' ? '.' : ',') : undefined;
  if (/^[1-9]\d{0,2}[.,]\d{3}$/.test(digits)) return 'either';
  return /^[\d ’']*[.,]\d+$/.test(digits) ? sign : undefined;
}

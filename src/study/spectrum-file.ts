/** A spectrum as people have it: a table of periods and ordinates from a hazard service or a spreadsheet. */
import { CsvError, parse } from 'csv-parse/sync';
import { MULTI_PERIODS_S } from '../engineering/spectrum/asce7-multi.js';
import { LARGEST_G } from '../engineering/spectrum/family.js';
import { UserError, showValue } from '../errors.js';
import type { Problem } from '../errors.js';
import { NumberReader, delimiterOf, isNumberCell, periodNamedIn } from './number-cells.js';
import { readText } from './read-text.js';
import { settleUnit, toG } from './spectrum-units.js';
import type { SpectrumUnit } from './spectrum-units.js';

export interface SpectrumFile {
  /** Increasing, s. */
  readonly periods_s: readonly number[];
  readonly ordinates_g: readonly number[];
  /** The unit of the file. */
  readonly unit: SpectrumUnit;
  /** How the file was read, to be printed with the spectrum. */
  readonly statements: readonly string[];
}

export interface SpectrumFileOptions {
  /** Unit of the ordinates as the study says; left out, the heading must name it. */
  readonly unit?: SpectrumUnit | undefined;
  /** Log-log interpolation takes no ordinate at 0 s. */
  readonly interpolation?: 'linear' | 'log-log' | undefined;
}

interface Line {
  readonly cells: readonly string[];
  readonly line: number;
}

interface Pair {
  readonly period: string;
  readonly ordinate: string;
  readonly line: number;
}

interface Layout {
  readonly headings: readonly string[];
  readonly pairs: readonly Pair[];
  readonly statement: string;
}

const LONGEST_S = 100;
const SHAPES =
  'two columns, period in s and spectral acceleration; or a row of periods over a row of ordinates; or one row of 22 ordinates';

/**
 * Reads a table of a spectrum: two columns (period, S_a) or the same laid out as a row; comma, semicolon or tab between cells,
 * point or comma for decimals, headings or none, lines beginning with # left out.
 * @throws UserError carrying every problem with its line.
 */
export async function loadSpectrumFile(path: string, options: SpectrumFileOptions = {}): Promise<SpectrumFile> {
  return spectrumFromText(await readText(path, 'the table of the spectrum'), path, options);
}

/** The spectrum in the text of such a table; `file` stands in messages. @throws UserError as `loadSpectrumFile`. */
export function spectrumFromText(text: string, file: string, options: SpectrumFileOptions = {}): SpectrumFile {
  const { headings, pairs, statement } = layOut(linesOf(text, file), file);
  const { unit, from } = settleUnit(headings, options.unit, file);
  const reader = new NumberReader();
  const problems: Problem[] = [];
  const periods_s: number[] = [];
  const ordinates_g: number[] = [];
  for (const { period, ordinate, line } of pairs) {
    const complain = (message: string): void => void problems.push({ place: { file, line }, message });
    const t = reader.read(period);
    if (t === null) complain(`period ${showValue(period)}: ${reader.complaint(period)}`);
    else if (!(t >= 0 && t <= LONGEST_S)) complain(`expected a period of 0 to ${LONGEST_S} s, got ${t}`);
    else if (t === 0 && options.interpolation === 'log-log')
      complain('log-log needs periods > 0, got 0; use linear or remove the row');
    else if (periods_s.length > 0 && t <= (periods_s.at(-1) ?? 0))
      complain(`expected a period > ${periods_s.at(-1) ?? 0}, got ${t}; periods increase`);
    const value = reader.read(ordinate);
    const value_g = value === null ? NaN : toG(value, unit);
    if (value === null) complain(`ordinate ${showValue(ordinate)}: ${reader.complaint(ordinate)}`);
    else if (!(value_g > 0)) complain(`expected an ordinate > 0, got ${ordinate}`);
    else if (value_g > LARGEST_G)
      complain(`expected an ordinate of at most ${LARGEST_G} g, got ${ordinate} ${unit}; is the unit another?`);
    if (t !== null) periods_s.push(t);
    ordinates_g.push(value_g);
  }
  if (problems.length > 0) throw UserError.of(problems);
  if (pairs.length < 2)
    throw new UserError(`at least two periods are needed, got ${pairs.length}; the table holds ${SHAPES}`, { file });
  const decimals = reader.mark === ',' ? ['commas for decimals'] : [];
  return {
    periods_s,
    ordinates_g,
    unit,
    statements: [statement, `unit ${unit} as the ${from} says`, ...decimals],
  };
}

function linesOf(text: string, file: string): Line[] {
  const options = { bom: true, trim: true, relax_column_count: true, skip_empty_lines: true, info: true } as const;
  try {
    const records = parse(text, {
      ...options,
      delimiter: delimiterOf(text.slice(0, 10_000)),
      comment: '#',
      comment_no_infix: true,
    }) as unknown as readonly { readonly record: string[]; readonly info: { readonly lines: number } }[];
    return records.flatMap(({ record, info }) => {
      const last = record.findLastIndex((cell) => cell !== '');
      return last < 0 ? [] : [{ cells: record.slice(0, last + 1), line: info.lines }];
    });
  } catch (cause) {
    if (!(cause instanceof CsvError)) throw cause;
    const line = (cause as { readonly lines?: number }).lines;
    throw new UserError(`not a table: ${cause.message}; it holds ${SHAPES}`, { file, line }, { cause });
  }
}

function layOut(lines: readonly Line[], file: string): Layout {
  const width = Math.max(0, ...lines.map(({ cells }) => cells.length));
  const numeric = lines.filter(({ cells }) => cells.some(isNumberCell));
  if (numeric.length === 0) throw new UserError(`no numbers in it; the table holds ${SHAPES}`, { file });
  return width > 2 && numeric.length <= 2 ? asRow(lines, file) : asColumns(lines, file);
}

function asColumns(lines: readonly Line[], file: string): Layout {
  const first = lines.findIndex(({ cells }) => cells.some(isNumberCell));
  const headings = [0, 1].map((at) =>
    lines
      .slice(0, first)
      .map(({ cells }) => cells[at] ?? '')
      .join(' ')
      .trim(),
  );
  const line = lines[first - 1]?.line;
  const isPeriod = (heading = ''): boolean => /^t(?:n|_n)?(?![a-z])|p[eé]r[ií]o/i.test(heading);
  const swapped = isPeriod(headings[1]) && !isPeriod(headings[0]);
  const [periodAt, ordinateAt] = swapped ? [1, 0] : [0, 1];
  if (/freq|hz/i.test(headings[periodAt] ?? ''))
    throw new UserError(`the heading ${showValue(headings[periodAt])} is of frequencies; periods in s are needed`, {
      file,
      line,
    });
  const data = lines.slice(first);
  const wrong = data.filter(({ cells }) => cells.length !== 2);
  if (wrong.length > 0) {
    throw UserError.of(
      wrong.slice(0, 20).map((one) => ({
        place: { file, line: one.line },
        message: `expected 2 cells, got ${one.cells.length}; with commas for decimals, put semicolons between cells`,
      })),
    );
  }
  return {
    headings: [headings[ordinateAt] ?? ''],
    pairs: data.map(({ cells, line: at }) => ({
      period: cells[periodAt] ?? '',
      ordinate: cells[ordinateAt] ?? '',
      line: at,
    })),
    statement: swapped ? 'two columns, the second of periods' : 'two columns',
  };
}

function asRow(lines: readonly Line[], file: string): Layout {
  const values = lines.findLast(({ cells }) => cells.some(isNumberCell));
  if (values === undefined) throw new UserError(`the table holds ${SHAPES}`, { file });
  const { line } = values;
  const start = values.cells.findIndex(isNumberCell);
  const ordinates = values.cells.slice(start);
  const above = lines[lines.indexOf(values) - 1];
  const over = above?.cells.slice(start) ?? [];
  const periods = over.map(periodNamedIn);
  const labels = [
    ...lines.slice(0, lines.indexOf(values)).flatMap(({ cells }) => cells),
    ...values.cells.slice(0, start),
  ];
  if (above !== undefined && periods.some((period) => period !== undefined)) {
    if (over.length !== ordinates.length)
      throw new UserError(`expected one ordinate for each of the ${over.length} periods, got ${ordinates.length}`, {
        file,
        line,
      });
    const problems = periods.flatMap((period, i) =>
      period === undefined
        ? [{ place: { file, line: above.line }, message: `no period in the heading ${showValue(over[i])}` }]
        : [],
    );
    if (problems.length > 0) throw UserError.of(problems);
    return {
      headings: labels,
      pairs: ordinates.map((ordinate, i) => ({ period: pointed(periods[i] ?? NaN, ordinates), ordinate, line })),
      statement: 'a row of periods over a row of ordinates',
    };
  }
  if (ordinates.length !== MULTI_PERIODS_S.length)
    throw new UserError(`one row of ${ordinates.length} ordinates without periods; the table holds ${SHAPES}`, {
      file,
      line,
    });
  return {
    headings: labels,
    pairs: ordinates.map((ordinate, i) => ({ period: pointed(MULTI_PERIODS_S[i] ?? NaN, ordinates), ordinate, line })),
    statement: 'one row of 22 ordinates at the periods of ASCE/SEI 7-22, 11.4.5.1',
  };
}

/** A period read already, written as its neighbours are. */
function pointed(period: number, neighbours: readonly string[]): string {
  return neighbours.some((cell) => cell.includes(',')) ? String(period).replace('.', ',') : String(period);
}

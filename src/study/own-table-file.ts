/** The study's own table of eras in a file: one line a year and system, a blank system meaning all others. */
import { CsvError, parse } from 'csv-parse/sync';
import { SYSTEMS } from '../engineering/building.js';
import { MOST_OWN_ERAS } from '../engineering/capacity/own-table.js';
import type { OwnEra } from '../engineering/capacity/own-table.js';
import { describeRange } from '../engineering/formula.js';
import type { NumberRange } from '../engineering/formula.js';
import { UserError, showValue } from '../errors.js';
import type { Problem } from '../errors.js';
import { suggest } from './nearest.js';
import { delimiterOf } from './number-cells.js';
import { OWN_COEFFICIENT, OWN_LEVELS, OWN_PERIOD_RANGES, OWN_REDUCTION, OWN_YEAR } from './own-table.js';
import { readText } from './read-text.js';

const NEEDED = ['from_year', 'coefficient', 'level'] as const;
const PERIOD = ['period_coefficient', 'period_exponent', 'corner_s', 'fall'] as const;
const COLUMNS = [...NEEDED, 'system', 'reduction', ...PERIOD, 'source'] as const;
type Column = (typeof COLUMNS)[number];

type NumberColumn = Exclude<Column, 'level' | 'system' | 'source'>;

const RANGES: Readonly<Record<NumberColumn, NumberRange & { readonly to: number }>> = {
  from_year: OWN_YEAR,
  coefficient: OWN_COEFFICIENT,
  reduction: OWN_REDUCTION,
  period_coefficient: OWN_PERIOD_RANGES.coefficient,
  period_exponent: OWN_PERIOD_RANGES.exponent,
  corner_s: OWN_PERIOD_RANGES.corner_s,
  fall: OWN_PERIOD_RANGES.fall,
};

function periodOf(read: (name: NumberColumn) => number): NonNullable<OwnEra['period']> {
  return {
    coefficient: read('period_coefficient'),
    exponent: read('period_exponent'),
    corner_s: read('corner_s'),
    fall: read('fall'),
  };
}

/**
 * Reads a table of eras: from_year, coefficient, level, and if wanted system, reduction, period_coefficient, period_exponent, corner_s,
 * fall, source. @throws UserError carrying every problem, each with its row as a spreadsheet counts it and its column.
 */
export async function loadOwnTable(path: string): Promise<readonly OwnEra[]> {
  return ownTableFromText(await readText(path, 'the table of eras named by code_history.table_file'), path);
}

/** The eras in the text of such a table, by rising year; `file` stands in messages. @throws UserError as `loadOwnTable`. */
export function ownTableFromText(text: string, file = 'eras.csv'): readonly OwnEra[] {
  const [header = [], ...lines] = recordsOf(text, file);
  const problems: Problem[] = [];
  const complain = (row: number, columnName: string, message: string): void => {
    problems.push({ place: { file, row, ...(columnName === '' ? {} : { columnName }) }, message });
  };
  for (const name of header)
    if (!(COLUMNS as readonly string[]).includes(name))
      complain(1, name, `unknown column ${showValue(name)}${suggest(name, COLUMNS)}`);
  for (const name of NEEDED) if (!header.includes(name)) complain(1, name, `no column ${name}`);
  if (problems.length > 0) throw UserError.of(problems);
  const eras = new Map<number, OwnEra>();
  lines.forEach((cells, i) => {
    if (cells.every((cell) => cell === '')) return;
    const row = i + 2;
    const before = problems.length;
    if (cells.length !== header.length) complain(row, '', `expected ${header.length} cells, got ${cells.length}`);
    const cell = (name: Column): string => cells[header.indexOf(name)] ?? '';
    const read = (name: NumberColumn): number => {
      const given = cell(name);
      const range = RANGES[name];
      const value = given === '' ? NaN : Number(given);
      const fits = value >= (range.from ?? -Infinity) && value > (range.above ?? -Infinity) && value <= range.to;
      if (!fits || (name === 'from_year' && !Number.isInteger(value))) {
        const kind = name === 'from_year' ? 'a year' : 'a number';
        complain(row, name, `expected ${describeRange(kind, range)}, got ${showValue(given)}`);
      }
      return value;
    };
    const from_year = read('from_year');
    const coefficient = read('coefficient');
    const level = OWN_LEVELS.find((one) => one === cell('level'));
    if (level === undefined) complain(row, 'level', `expected working or strength, got ${showValue(cell('level'))}`);
    const system = cell('system') === '' ? null : SYSTEMS.find((one) => one === cell('system'));
    if (system === undefined)
      complain(row, 'system', `unknown word ${showValue(cell('system'))}${suggest(cell('system'), SYSTEMS)}`);
    const reduction = cell('reduction') === '' ? undefined : read('reduction');
    const blank = PERIOD.filter((name) => cell(name) === '');
    if (blank[0] !== undefined && blank.length < PERIOD.length)
      complain(row, blank[0], 'expected all four numbers of the period, or none');
    const period = blank.length > 0 ? undefined : periodOf(read);
    if (problems.length > before || level === undefined || system === undefined) return;
    const source = cell('source');
    const shared = {
      from_year,
      level,
      ...(reduction === undefined ? {} : { reduction }),
      ...(period === undefined ? {} : { period }),
    };
    const old = eras.get(from_year);
    const { coefficient: _c, by_system: _s, source: _w, ...of }: OwnEra = old ?? shared;
    if (JSON.stringify(of) !== JSON.stringify(shared)) {
      complain(row, 'from_year', `level, reduction and period differ from those of the first line of ${from_year}`);
      return;
    }
    const taken = system === null ? old?.coefficient : old?.by_system?.[system];
    if (taken !== undefined) {
      complain(row, 'system', `${system ?? 'all others'} of ${from_year} stands above already; keep one`);
      return;
    }
    eras.set(from_year, {
      ...shared,
      ...(source === '' ? {} : { source }),
      ...old,
      ...(system === null ? { coefficient } : { by_system: { ...old?.by_system, [system]: coefficient } }),
    });
  });
  if (problems.length === 0 && (eras.size === 0 || eras.size > MOST_OWN_ERAS))
    problems.push({ place: { file }, message: `expected 1 to ${MOST_OWN_ERAS} years, got ${eras.size}` });
  if (problems.length > 0) throw UserError.of(problems);
  return [...eras.values()].sort((a, b) => a.from_year - b.from_year);
}

function recordsOf(text: string, file: string): string[][] {
  try {
    return parse(text, {
      delimiter: delimiterOf(text.split(/\r\n|\r|\n/, 1)[0] ?? ''),
      bom: true,
      trim: true,
      relax_column_count: true,
      skip_empty_lines: false,
    });
  } catch (cause) {
    if (!(cause instanceof CsvError)) throw cause;
    throw new UserError(`not a table with commas, semicolons or tabs: ${cause.message}`, { file }, { cause });
  }
}

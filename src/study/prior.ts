import { CsvError, parse } from 'csv-parse/sync';
import { SYSTEMS, USES } from '../engineering/building.js';
import type { System, Use } from '../engineering/building.js';
import type { SystemPriorGroup } from '../engineering/prior/system-prior.js';
import { UserError, showValue } from '../errors.js';
import type { Problem } from '../errors.js';
import { suggest } from './nearest.js';
import { delimiterOf } from './number-cells.js';
import { readText } from './read-text.js';

const HEADER = ['use', 'storeys_from', 'storeys_to', 'built_from', 'built_to', 'system', 'chance'] as const;
const SUM_TOLERANCE = 1e-6;

interface Row {
  readonly row: number;
  readonly system: System;
  readonly chance: number;
}
type Bounds = Omit<SystemPriorGroup, 'chances' | 'label'>;
interface Group {
  readonly bounds: Bounds;
  readonly firstRow: number;
  readonly rows: Row[];
  /** False once a row of the group could not be read. */
  complete: boolean;
}
type Complain = (row: number, columnName: string, message: string) => void;

/**
 * Reads a system prior table (columns use, storeys_from, storeys_to, built_from, built_to, system, chance; blank: any).
 * @throws UserError carrying every problem, each with its row as a spreadsheet counts it (the header is row 1) and column.
 */
export async function loadPrior(path: string): Promise<readonly SystemPriorGroup[]> {
  return priorFromText(await readText(path, 'the system prior table named by system_prior'), path);
}

/** The groups of a system prior table in file order; `file` stands in messages. @throws UserError as `loadPrior`. */
export function priorFromText(text: string, file = 'system-prior.csv'): readonly SystemPriorGroup[] {
  const records = readRecords(text, file);
  const problems: Problem[] = [];
  const complain: Complain = (row, columnName, message) => problems.push({ place: { file, row, columnName }, message });
  const groups = new Map<string, Group>();
  let lostRows = 0;
  for (const [i, cells] of records.entries()) {
    const row = i + 2;
    if (cells.every((cell) => cell === '')) continue;
    if (cells.length !== HEADER.length) {
      problems.push({ place: { file, row }, message: `expected ${HEADER.length} cells, got ${cells.length}` });
      lostRows += 1;
      continue;
    }
    const before = problems.length;
    const bounds = readBounds(cells, row, complain);
    const boundsRead = problems.length === before;
    const system = readWord(cells[5] ?? '', SYSTEMS, (message) => complain(row, 'system', message));
    const chance = Number(cells[6] === '' ? NaN : cells[6]);
    const chanceRead = chance > 0 && chance <= 1;
    if (!chanceRead) complain(row, 'chance', `expected a number > 0 and <= 1, got ${showValue(cells[6])}`);
    if (!boundsRead) {
      lostRows += 1;
      continue;
    }
    const key = JSON.stringify(bounds);
    const group = groups.get(key) ?? { bounds, firstRow: row, rows: [], complete: true };
    groups.set(key, group);
    if (system === null || !chanceRead) {
      group.complete = false;
      continue;
    }
    const twin = group.rows.find((other) => other.system === system);
    if (twin !== undefined) {
      complain(row, 'system', `${system} stands in row ${twin.row} of the same group already; keep one`);
      group.complete = false;
    }
    group.rows.push({ row, system, chance });
  }
  const read = [...groups.values()];
  for (const [i, group] of read.entries()) {
    // A row that could not be placed may belong to any group, so no sum is judged then.
    if (group.complete && lostRows === 0) problems.push(...judgeSum(group, file));
    problems.push(...judgePlace(group, read.slice(0, i), file));
  }
  if (problems.length === 0 && read.length === 0)
    problems.push({ place: { file }, message: 'no rows below the header' });
  if (problems.length > 0) throw UserError.of(problems.sort((a, b) => (a.place.row ?? 0) - (b.place.row ?? 0)));
  return read.map(({ bounds, rows }) => ({
    ...bounds,
    chances: rows.map(({ system, chance }) => ({ system, chance })),
    label: labelOf(bounds),
  }));
}

function readRecords(text: string, file: string): string[][] {
  let records: string[][];
  try {
    records = parse(text, {
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
  const [header = [], ...rest] = records;
  if (header.join() !== HEADER.join()) {
    throw new UserError(`expected the columns ${HEADER.join(',')}; got ${showValue(header.join())}`, { file, row: 1 });
  }
  return rest;
}

function readBounds(cells: readonly string[], row: number, complain: Complain): Bounds {
  const whole = (i: number, from: number, to: number): number | null => {
    const cell = cells[i] ?? '';
    if (cell === '') return null;
    const value = /^\d+$/.test(cell) ? Number(cell) : NaN;
    if (value >= from && value <= to) return value;
    complain(row, HEADER[i] ?? '', `expected a whole number ${from} to ${to} or blank for any, got ${showValue(cell)}`);
    return null;
  };
  const ordered = (i: number, from: number | null, to: number | null): void => {
    if (from !== null && to !== null && from > to)
      complain(row, HEADER[i] ?? '', `expected at least ${from}, got "${to}"`);
  };
  const use: Use | null = cells[0] === '' ? null : readWord(cells[0] ?? '', USES, (m) => complain(row, 'use', m));
  const [storeysFrom, storeysTo] = [whole(1, 0, 200), whole(2, 0, 200)];
  ordered(2, storeysFrom, storeysTo);
  const [builtFrom, builtTo] = [whole(3, 0, 2200), whole(4, 0, 2200)];
  ordered(4, builtFrom, builtTo);
  return { use, storeysFrom, storeysTo, builtFrom, builtTo };
}

function readWord<T extends string>(cell: string, words: readonly T[], complain: (message: string) => void): T | null {
  const found = words.find((word) => word === cell);
  if (found === undefined) complain(`unknown word ${showValue(cell)}${suggest(cell, words)}`);
  return found ?? null;
}

function judgeSum({ bounds, firstRow, rows }: Group, file: string): Problem[] {
  const sum = rows.reduce((total, { chance }) => total + chance, 0);
  if (Math.abs(sum - 1) <= SUM_TOLERANCE) return [];
  const where = rows.length === 1 ? `row ${firstRow}` : `rows ${rows.map(({ row }) => row).join(', ')}`;
  const message = `the chances of "${labelOf(bounds)}" sum to ${Number(sum.toPrecision(9))}, not 1 (${where})`;
  return [{ place: { file, row: firstRow, columnName: 'chance' }, message }];
}

function judgePlace({ bounds, firstRow }: Group, earlier: readonly Group[], file: string): Problem[] {
  const cover = earlier.find((other) => covers(other.bounds, bounds));
  if (cover === undefined) return [];
  const first = `"${labelOf(cover.bounds)}" of row ${cover.firstRow}`;
  const message = `"${labelOf(bounds)}" never applies: ${first} comes first and covers it; move it above`;
  return [{ place: { file, row: firstRow }, message }];
}

function covers(wide: Bounds, narrow: Bounds): boolean {
  const low = (a: number | null, b: number | null): boolean => a === null || (b !== null && a <= b);
  const high = (a: number | null, b: number | null): boolean => a === null || (b !== null && a >= b);
  return (
    (wide.use === null || wide.use === narrow.use) &&
    low(wide.storeysFrom, narrow.storeysFrom) &&
    high(wide.storeysTo, narrow.storeysTo) &&
    low(wide.builtFrom, narrow.builtFrom) &&
    high(wide.builtTo, narrow.builtTo)
  );
}

function labelOf({ use, storeysFrom, storeysTo, builtFrom, builtTo }: Bounds): string {
  const storeys = rangeOf(storeysFrom, storeysTo);
  const years = rangeOf(builtFrom, builtTo);
  return [
    use ?? 'any use',
    storeys === null ? 'any number of storeys' : `${storeys} ${storeys === '1' ? 'storey' : 'storeys'}`,
    years === null ? 'any year' : `built ${years}`,
  ].join(', ');
}

function rangeOf(from: number | null, to: number | null): string | null {
  if (from === null) return to === null ? null : `up to ${to}`;
  if (to === null) return `from ${from}`;
  return from === to ? String(from) : `${from} to ${to}`;
}

/** How a vibration record is written: where its samples begin, which column is time, which the channel. */
import { UserError, showValue } from '../errors.js';
import { cellNumber, clockSeconds, isNothing, splitCells } from './vibration-cells.js';
import type { Mark } from './vibration-cells.js';

export interface VibrationColumn {
  /** From 1. */
  readonly number: number;
  readonly name: string;
  /** As the header writes it; null when it writes none. */
  readonly unit: string | null;
}

export interface VibrationLayout {
  readonly delimiter: string;
  readonly mark: Mark;
  /** Lines above the samples. */
  readonly skip: number;
  readonly columns: readonly VibrationColumn[];
  /** Column of time and seconds of one of its units; null without. */
  readonly time: { readonly column: VibrationColumn; readonly factor: number } | null;
  readonly channel: VibrationColumn;
  readonly channels: readonly VibrationColumn[];
}

export interface ColumnChoice {
  readonly time?: string;
  readonly channel?: string;
  /** A rate is given, so that no time column is needed. */
  readonly hasRate: boolean;
}

const TIME_NAME =
  /^(?:t|time|times|seconds?|secs?|s|ms|timestamp|date ?time|utc|elapsed|zeit|temps|tiempo|tempo)(?:[ _].*)?$/;
const COUNTER_NAME =
  /^(?:n|no|nr|#|i|index|samples?|count(?:er)?|row|line|number)(?:[ _](?:n|no|nr|index|number|count))?$/;
const MILLISECONDS = /^(?:ms|msec|milliseconds?)$/;

/** Reads the layout off the first lines. @throws UserError when there are no samples, or a column asked for is not there. */
export function vibrationLayout(lines: readonly string[], choice: ColumnChoice): VibrationLayout {
  const { delimiter, mark, skip, rows } = dialect(lines);
  const width = rows[0]?.length ?? 0;
  const { names, units } = headings(lines.slice(0, skip), delimiter, width);
  const columns = Array.from({ length: width }, (_, i): VibrationColumn => {
    const name = names[i] ?? '';
    return { number: i + 1, name: name === '' ? `column ${String(i + 1)}` : name, unit: units[i] ?? null };
  });
  const read = (row: readonly string[], i: number): number => {
    const cell = row[i] ?? '';
    const number = cellNumber(cell, mark);
    return Number.isNaN(number) ? clockSeconds(cell) : number;
  };
  const counter = columns.find(({ name, number }, i) => {
    if (COUNTER_NAME.test(name.toLowerCase())) return true;
    // Without a name, 0, 1, 2 … counts samples.
    return (
      width > 1 &&
      names.length === 0 &&
      number === 1 &&
      rows.every((row, k) => read(row, i) === read(rows[0] ?? [], i) + k)
    );
  });
  const time = timeColumn(columns, choice, counter, (i) => rows.map((row) => read(row, i)), names.length > 0);
  const channels = columns.filter(
    (column, i) =>
      column !== time && column !== counter && rows.some((row) => !Number.isNaN(cellNumber(row[i] ?? '', mark))),
  );
  const channel = choice.channel === undefined ? channels[0] : chosen(columns, choice.channel, '--channel');
  if (channel === undefined || channel === time) {
    throw new UserError(
      width === 1
        ? 'the file has a time column only, or is not separated by commas, semicolons, tabs or blanks'
        : 'no column of samples besides time was found; name one with --channel',
    );
  }
  if (time === undefined && !choice.hasRate) {
    const why =
      width === 1
        ? 'the file has one column'
        : counter === undefined
          ? 'no time column was found'
          : `column ${counter.name} only counts the samples`;
    throw new UserError(
      `${why}, so that the sampling rate is not known; give it with --rate-hz${width === 1 ? '' : ', or name the time column with --time'}`,
    );
  }
  const factor =
    MILLISECONDS.test((time?.unit ?? '').toLowerCase()) || MILLISECONDS.test((time?.name ?? '').toLowerCase())
      ? 0.001
      : 1;
  return {
    delimiter,
    mark,
    skip,
    columns,
    time: time === undefined ? null : { column: time, factor },
    channel,
    channels,
  };
}

function chosen(columns: readonly VibrationColumn[], asked: string, option: string): VibrationColumn {
  const found =
    columns.find(({ name }) => name === asked) ??
    columns.find(({ name }) => name.toLowerCase() === asked.trim().toLowerCase()) ??
    columns.find(({ number }) => String(number) === asked.trim());
  if (found !== undefined) return found;
  const list = columns.map(({ number, name }) => `${String(number)} ${name}`).join(', ');
  throw new UserError(`${option} ${showValue(asked)}: there is no such column; the columns are ${list}`);
}

function timeColumn(
  columns: readonly VibrationColumn[],
  { time, channel }: ColumnChoice,
  counter: VibrationColumn | undefined,
  values: (i: number) => readonly number[],
  named: boolean,
): VibrationColumn | undefined {
  if (time !== undefined) return chosen(columns, time, '--time');
  const asked = channel === undefined ? undefined : chosen(columns, channel, '--channel');
  const byName = columns.find((column) => column !== asked && TIME_NAME.test(column.name.toLowerCase()));
  if (byName !== undefined || named || columns.length < 2) return byName;
  return columns.find((column, i) => column !== asked && column !== counter && risesEvenly(values(i)));
}

function risesEvenly(values: readonly number[]): boolean {
  const steps = values.slice(1).map((value, i) => value - (values[i] ?? NaN));
  const middle = [...steps].sort((a, b) => a - b)[steps.length >> 1] ?? 0;
  return (
    steps.length > 2 &&
    steps.every((step) => step > 0) &&
    steps.filter((step) => step <= 1.6 * middle).length >= 0.9 * steps.length
  );
}

interface Dialect {
  readonly delimiter: string;
  readonly mark: Mark;
  readonly skip: number;
  readonly rows: readonly (readonly string[])[];
}

const isSample = (row: readonly string[], mark: Mark): boolean =>
  row.some((cell) => !Number.isNaN(cellNumber(cell, mark))) &&
  row.every((cell) => isNothing(cell) || !Number.isNaN(cellNumber(cell, mark)) || !Number.isNaN(clockSeconds(cell)));

// The way to read the lines by which most of them are rows of numbers; of two as good, the earlier in this list.
function dialect(lines: readonly string[]): Dialect {
  const sample = lines.slice(Math.max(0, lines.length - 50)).join('\n');
  const marks = ['.', ','] as const;
  const separated = [';', '\t', '|']
    .filter((one) => sample.includes(one))
    .flatMap((one) => marks.map((mark) => [one, mark] as const));
  const tries: readonly (readonly [string, Mark])[] = commaIsDecimal(lines)
    ? [[';', ',']]
    : [...separated, [',', '.'], ...(/\S[ \t]+\S/.test(sample) ? marks.map((mark) => [' ', mark] as const) : [])];
  let best: Dialect | undefined;
  for (const [delimiter, mark] of tries) {
    const cells = lines.map((line) => splitCells(line, delimiter));
    const width = cells.at(-1)?.length ?? 0;
    const rows = cells.map((row) => row.length === width && isSample(row, mark));
    // The samples begin with the first of two rows of numbers in a row.
    const skip = rows.findIndex((row, i) => row && (rows[i + 1] ?? true));
    const found = skip < 0 ? [] : cells.filter((_, i) => i >= skip && rows[i] === true);
    if (found.length > (best?.rows.length ?? 0)) best = { delimiter, mark, skip, rows: found };
  }
  if (best === undefined) {
    throw new UserError(
      `no rows of numbers in the first ${String(lines.length)} lines; a record is a table of samples, a line each`,
    );
  }
  return best;
}

// One column with decimal commas: no point anywhere, one comma a line, whole digits on both sides, and a second part that begins with 0 or
// a heading of one column.
function commaIsDecimal(lines: readonly string[]): boolean {
  const numbers = lines.filter((line) => /^\s*[+-]?\d+,\d+\s*$/.test(line));
  if (numbers.length < 3 || numbers.length < lines.length - 3) return false;
  const heading = lines.find((line) => /[a-z]/i.test(line));
  return heading === undefined ? numbers.some((line) => /,0\d/.test(line)) : !heading.includes(',');
}

// The last line above the samples with as many cells; one more up when that holds nothing but units.
function headings(
  above: readonly string[],
  delimiter: string,
  width: number,
): { names: string[]; units: (string | null)[] } {
  const rows = above
    .map((line) => splitCells(line.replace(/^\s*[#%]+\s*/, ''), delimiter))
    .filter((row) => row.length === width && row.some((cell) => cell !== ''));
  const last = rows.at(-1);
  if (last === undefined) return { names: [], units: [] };
  const before = rows.at(-2);
  if (before !== undefined && last.every((cell) => cell === '' || isUnit(bare(cell)))) {
    return {
      names: before.map((cell) => splitName(cell).name),
      units: last.map((cell) => (cell === '' ? null : bare(cell))),
    };
  }
  const parts = last.map(splitName);
  return { names: parts.map(({ name }) => name), units: parts.map(({ unit }) => unit) };
}

const bare = (cell: string): string => cell.replace(/^[[(]\s*|\s*[\])]$/g, '').trim();

const UNIT =
  /^(?:m?s|sec|m?g|gal|[nµu]?m|[cmµn]m|in|ft|counts?|m?v|(?:[cmµn]?m|in|ft|um)(?:\/|_per_)?(?:s|sec)(?:[²2]|\^2)?)$/i;

function isUnit(text: string): boolean {
  return UNIT.test(text);
}

// `acc x (m/s²)`, `acc_x [g]`, `vel_mm_per_s`, `time_ms`
function splitName(cell: string): { name: string; unit: string | null } {
  const bracket = /^(.*?)\s*[[(]([^\])]*)[\])]\s*$/.exec(cell);
  if (bracket !== null) return { name: bracket[1] ?? '', unit: bracket[2]?.trim() || null };
  const suffix = /^.+?_((?:[a-zµ]+_per_)?[a-zµ²0-9]+)$/i.exec(cell);
  return {
    name: cell,
    unit: suffix !== null && isUnit(suffix[1] ?? '') ? (suffix[1] ?? '').replace('_per_', '/') : null,
  };
}

/** The cells of a vibration record: numbers, clock times, and those that hold nothing. */

/** Splits a line; a delimiter of one blank stands for any run of blanks and tabs. */
export function splitCells(line: string, delimiter: string): string[] {
  if (delimiter === ' ') return line.trim().split(/[ \t]+/);
  if (!line.includes('"')) return line.split(delimiter).map((cell) => cell.trim());
  const cells: string[] = [];
  for (let at = 0; at <= line.length;) {
    const quoted = /^\s*"((?:[^"]|"")*)"\s*/.exec(line.slice(at));
    const next = line.indexOf(delimiter, quoted === null ? at : at + quoted[0].length);
    const end = next < 0 ? line.length : next;
    cells.push(quoted === null ? line.slice(at, end).trim() : (quoted[1] ?? '').replaceAll('""', '"'));
    at = end + 1;
  }
  return cells;
}

/** The cells `wanted` (in rising order of their place) of a line without quotes; undefined for one that is not there. */
export function pickCells(line: string, delimiter: string, wanted: readonly number[]): (string | undefined)[] {
  if (delimiter === ' ' || line.includes('"')) {
    const cells = splitCells(line, delimiter);
    return wanted.map((place) => cells[place]);
  }
  let at = 0;
  let place = 0;
  return wanted.map((one) => {
    for (; place < one && at >= 0; place += 1) {
      const next = line.indexOf(delimiter, at);
      at = next < 0 ? -1 : next + 1;
    }
    if (at < 0) return undefined;
    const end = line.indexOf(delimiter, at);
    return line.slice(at, end < 0 ? line.length : end).trim();
  });
}

const NOTHING = /^(?:|-+|nan|na|n\/a|null|none|missing|[+-]?inf(?:inity)?|#.*)$/i;

/** Whether a cell says that there is no sample. */
export function isNothing(cell: string): boolean {
  return NOTHING.test(cell);
}

const NUMBER = {
  '.': /^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?$/i,
  ',': /^[+-]?(?:\d+,?\d*|,\d+)(?:e[+-]?\d+)?$/i,
} as const;

export type Mark = '.' | ',';

/** The number in a cell; NaN when it is none. */
export function cellNumber(cell: string, mark: Mark): number {
  if (!NUMBER[mark].test(cell)) return NaN;
  return Number(mark === ',' ? cell.replace(',', '.') : cell);
}

const CLOCK = /^(?:(\d{4})-(\d{2})-(\d{2})[T ]+)?(\d{1,2}):(\d{2}):(\d{2}(?:[.,]\d+)?)(?: *(?:Z|[+-]\d{2}:?\d{2}))?$/;

/** Seconds of a clock time, `12:00:00.005` with or without a date in front (2026-05-01T…); NaN when it is none. */
export function clockSeconds(cell: string): number {
  const found = CLOCK.exec(cell);
  if (found === null) return NaN;
  const [, year, month, day, hour, minute, second] = found;
  const days = year === undefined ? 0 : Date.UTC(Number(year), Number(month) - 1, Number(day)) / 86_400_000;
  return ((days * 24 + Number(hour)) * 60 + Number(minute)) * 60 + Number((second ?? '').replace(',', '.'));
}

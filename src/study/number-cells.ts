/** Cells of tables of numbers as hazard services and spreadsheets write them: the delimiter, the decimal sign, periods as headings. */

const NUMBER = /^[+-]?(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:[eE][+-]?\d+)?$/;

/** Tab or semicolon where a line of `head` holds one, else the comma: a comma beside them is a decimal sign. */
export function delimiterOf(head: string): ',' | ';' | '\t' {
  const lines = head.split(/\r\n|\r|\n/).filter((line) => line.trim() !== '' && !line.startsWith('#'));
  return lines.some((line) => line.includes('\t')) ? '\t' : lines.some((line) => line.includes(';')) ? ';' : ',';
}

/** Reads numbers with a point or a comma for decimals, one of the two throughout. */
export class NumberReader {
  #mark: '.' | ',' | null = null;

  /** The decimal sign met so far. */
  get mark(): '.' | ',' | null {
    return this.#mark;
  }

  /** The number in `cell`, null when it is none or has the other decimal sign than cells before it. */
  read(cell: string): number | null {
    if (!NUMBER.test(cell)) return null;
    const mark = cell.includes(',') ? ',' : cell.includes('.') ? '.' : null;
    if (mark !== null) {
      if (this.#mark !== null && this.#mark !== mark) return null;
      this.#mark = mark;
    }
    const value = Number(cell.replace(',', '.'));
    return Number.isFinite(value) ? value : null;
  }

  /** What is wrong with a cell that `read` refused. */
  complaint(cell: string): string {
    const other = this.#mark === ',' ? 'commas' : 'points';
    return NUMBER.test(cell) ? `the cells above have ${other} for decimals; write all alike` : 'a number is expected';
  }
}

export function isNumberCell(cell: string): boolean {
  return NUMBER.test(cell);
}

const PERIOD_HEADING =
  /^(?:p?sa|s_?a|spectral acceleration|t|period)?[\s_:=([-]*(\d+(?:[.,p]\d+)?|[.,]\d+)[\s_]*(?:s|sec|seconds?)?[\s_)\]]*(.*)$/i;
const PEAK = /^pga(?![a-z0-9])/i;
/** What may follow the period in a heading: a unit of acceleration in brackets or after a blank or underscore. */
const AFTER = /^[\s_,([-]*(?:%?\s*g|gals?|c?m\s*(?:\/|_per_)\s*s(?:ec)?\s*(?:\^|\*\*)?\s*[2²])?[\s)\]]*$/i;

/** The period, s, that a heading stands for: `0.2`, `SA(0.2)`, `sa_0p2_g`, `T = 0,2 s`, `PGA` (0 s); undefined for any other. */
export function periodNamedIn(heading: string): number | undefined {
  const text = heading.trim();
  if (PEAK.test(text)) return AFTER.test(text.slice(3)) ? 0 : undefined;
  const found = PERIOD_HEADING.exec(text);
  if (found === null || !AFTER.test(found[2] ?? '')) return undefined;
  return Number((found[1] ?? '').replace(/[,p]/i, '.'));
}

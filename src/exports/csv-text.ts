/** Small tables as CSV text; the large ones are written by the database. */
import { FORMULA_STARTS, NUMERIC } from './spreadsheet.js';

const NUMBER = new RegExp(`^(?:${NUMERIC})$`);

/** One cell: a formula made harmless, quoted where RFC 4180 asks for it. */
function cell(value: string | number | null): string {
  if (value === null) return '';
  if (typeof value === 'number') return String(value);
  const first = value.replace(/^ +/, '').charAt(0);
  const guarded = FORMULA_STARTS.includes(first) && first !== '' && !NUMBER.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(guarded) ? `"${guarded.replaceAll('"', '""')}"` : guarded;
}

/** A table as a spreadsheet opens it: byte order mark, CRLF, header first. */
export function csvText(head: readonly string[], rows: readonly (readonly (string | number | null)[])[]): string {
  return `\ufeff${[head, ...rows].map((row) => `${row.map(cell).join(',')}\r\n`).join('')}`;
}

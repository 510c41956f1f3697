/** SQL that makes text safe in a spreadsheet: a cell that would be read as a formula gets a leading apostrophe. */
import { quoteName, quoteText } from '../store/sql.js';

/** First characters that spreadsheets take for a formula, their full-width twins included. */
export const FORMULA_STARTS: readonly string[] = [
  '=',
  '+',
  '-',
  '@',
  '\uff1d',
  '\uff0b',
  '\uff0d',
  '\uff20',
  '\t',
  '\r',
  '\n',
];
/** A plain number, as a pattern both languages read. */
export const NUMERIC = '[+-]?(\\d+\\.?\\d*|\\.\\d+)([eE][+-]?\\d+)?';

/** A select expression for text column `column`, guarded; text that is a plain number stays as it is. */
export function guardedText(column: string): string {
  const starts = FORMULA_STARTS.map(quoteText).join(', ');
  // Cheap test first: over a million rows a regular expression on every cell costs seconds.
  return `CASE WHEN left(ltrim(${column}, ' '), 1) IN (${starts}) AND NOT regexp_full_match(${column}, ${quoteText(NUMERIC)}) THEN '''' || ${column} ELSE ${column} END`;
}

/** Options of COPY for a table that a spreadsheet opens: RFC 4180, CRLF, header. */
export const CSV_OPTIONS = "(FORMAT csv, HEADER true, NEW_LINE '\\r\\n')";

/** Name of the first column: the byte order mark before it makes spreadsheets read UTF-8. */
export function firstColumn(name: string): string {
  return quoteName(`\ufeff${name}`);
}

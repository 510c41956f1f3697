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
  // Cheap tests first: over a million rows the list and the regular expression cost seconds. Every start, and the blank
  // that may stand before it, sorts before "A" or from the full-width forms on.
  return `CASE WHEN (${column} < 'A' OR ${column} >= '\uff01') AND left(ltrim(${column}, ' '), 1) IN (${starts}) AND NOT regexp_full_match(${column}, ${quoteText(NUMERIC)}) THEN '''' || ${column} ELSE ${column} END`;
}

/**
 * Options of COPY for a table that a spreadsheet opens: RFC 4180, CRLF, header. The order is asked for outright: a large
 * table without ORDER BY in the query is else written in blocks as the threads finish them.
 */
export const CSV_OPTIONS = "(FORMAT csv, HEADER true, NEW_LINE '\\r\\n', PRESERVE_ORDER true)";
/** The same for rows that follow those of another file. */
export const CSV_OPTIONS_BODY = CSV_OPTIONS.replace('HEADER true', 'HEADER false');

/** Name of the first column: the byte order mark before it makes spreadsheets read UTF-8. */
export function firstColumn(name: string): string {
  return quoteName(`\ufeff${name}`);
}

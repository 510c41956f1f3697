import { normalise } from './normalise.js';
import { readSync, openSync, closeSync } from 'node:fs';
import { inspectSource } from './source.js';
import type { Encoding } from './source.js';
import { LINE_BREAK } from './records.js';

/** The header and the first rows of a table, as text. */
export interface Sample {
  readonly header: readonly string[];
  readonly rows: readonly (readonly string[])[];
  readonly encoding: Encoding;
  readonly delimiter: string;
  /** Rows in the whole file. */
  readonly total: number;
}

const SAMPLE_BYTES = 8 * 1024 * 1024;

/** Reads a table's header and as many rows as fit into 8 MB. @throws UserError as the intake does. */
export function readSample(path: string): Sample {
  const source = inspectSource(path, 'auto');
  const table = normalise(source, 'auto');
  try {
    const buffer = Buffer.alloc(SAMPLE_BYTES);
    const file = openSync(table.path, 'r');
    let size: number;
    try {
      size = readSync(file, buffer, 0, SAMPLE_BYTES, 0);
    } finally {
      closeSync(file);
    }
    const lines = buffer.toString('utf8', 0, size).split('\n');
    // The last piece is empty, or a row cut short.
    lines.pop();
    const rows = lines.map((line) => splitLine(line, table.delimiter).slice(1));
    return {
      header: table.header,
      rows,
      encoding: source.encoding,
      delimiter: table.delimiter,
      total: table.written + table.rejects.length,
    };
  } finally {
    table.remove();
  }
}

// The rewritten dialect: quotes only around whole cells, no line breaks inside.
function splitLine(line: string, delimiter: string): string[] {
  const cells: string[] = [];
  let at = 0;
  for (;;) {
    if (line[at] === '"') {
      let close = at + 1;
      while (close < line.length && !(line[close] === '"' && line[close + 1] !== '"'))
        close += line[close] === '"' ? 2 : 1;
      cells.push(
        line
          .slice(at + 1, close)
          .replaceAll('""', '"')
          .replaceAll(LINE_BREAK, '\n'),
      );
      at = close + 1;
    } else {
      const end = line.indexOf(delimiter, at);
      cells.push(line.slice(at, end < 0 ? line.length : end));
      at = end < 0 ? line.length : end;
    }
    if (at >= line.length) return cells;
    at += 1;
  }
}

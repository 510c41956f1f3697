// CSV text as a spreadsheet exports it: BOM, CRLF, quotes only where needed.

const cell = (text) => (/[",\n\r]/.test(text) || text !== text.trim() ? `"${text.split('"').join('""')}"` : text);

/** Plain CSV, LF ends, for the small tables. */
export function plainCsv(headers, rows) {
  return `${[headers, ...rows].map((row) => row.map(cell).join(',')).join('\n')}\n`;
}

/** The inventory's bytes: `blankAfter` rows come before one empty line; rows in `loneLineFeeds` end without CR. */
export function inventoryCsv(headers, rows, blankAfter, loneLineFeeds) {
  let out = `\uFEFF${headers.map(cell).join(',')}\r\n`;
  rows.forEach((row, index) => {
    out += headers.map((header) => cell(row[header])).join(',') + (loneLineFeeds.has(index) ? '\n' : '\r\n');
    if (index + 1 === blankAfter) out += '\r\n';
  });
  return out;
}

/** Row number as a spreadsheet shows it: the header is row 1, and the empty line takes a row. */
export const sheetRow = (index, blankAfter) => index + 2 + (index >= blankAfter ? 1 : 0);

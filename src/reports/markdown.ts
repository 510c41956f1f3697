/** Text from an inventory made harmless in Markdown. */

/**
 * `text` as plain words in one line of Markdown: markup of HTML becomes entities, marks of Markdown are escaped, line breaks become
 * blanks, so that it can stand in a sentence or a table cell.
 */
export function markdownText(text: string): string {
  return text
    .replaceAll(/[\p{Cc}\u2028\u2029]+/gu, ' ')
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll(/[\\`*_{}[\]#!|~]/g, '\\$&')
    // Bare addresses would become links.
    .replaceAll('://', ':&#47;&#47;')
    .replaceAll('@', '&#64;')
    .replaceAll(/(?<=www)\./gi, '&#46;')
    .trim();
}

/** A table of Markdown; cells are taken as they are: pass data through `markdownText`. Columns named in `right` are set right. */
export function markdownTable(head: readonly string[], rows: readonly (readonly string[])[], right: readonly number[] = []): string {
  const line = (cells: readonly string[]): string => `| ${cells.join(' | ')} |`;
  return [line(head), line(head.map((_, i) => (right.includes(i) ? '---:' : '---'))), ...rows.map(line)].join('\n');
}

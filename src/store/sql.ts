/** Spelling names and values inside SQL text; values go through parameters wherever a statement allows them. */

/** `name` as a quoted identifier. */
export function quoteName(name: string): string {
  return `"${name.replaceAll('"', '""')}"`;
}

/** `text` as a string literal. */
export function quoteText(text: string): string {
  return `'${text.replaceAll("'", "''")}'`;
}

/** `texts` as a list literal of strings, typed even when empty. */
export function quoteList(texts: readonly string[]): string {
  return `[${texts.map(quoteText).join(', ')}]::VARCHAR[]`;
}

const CANDIDATES = [',', ';', '\t', '|'];

/** The delimiter that occurs most often outside quotes in the first line that is not blank; a comma when none does. */
export function detectDelimiter(head: string): string {
  const line = head.split(/\r\n|\r|\n/).find((text) => text.trim() !== '') ?? '';
  const bare = line.replaceAll(/"(?:[^"]|"")*"/g, '');
  const count = (mark: string): number => bare.split(mark).length - 1;
  return CANDIDATES.reduce((best, mark) => (count(mark) > count(best) ? mark : best), ',');
}

const FARTHEST_SHARE = 0.4;
const YEAR = /(?<!\d)(?:1[89]|20)\d\d(?!\d)/;

/** The one of `known` that `word` was most likely meant to be, or undefined when none is close (at most 40 % of its letters differ). */
export function nearest(word: string, known: readonly string[]): string | undefined {
  return nearestFew(word, known, 1)[0];
}

/** The ones of `known` close to `word` as for `nearest`, the closest first, at most `most`. */
export function nearestFew(word: string, known: readonly string[], most: number): readonly string[] {
  const folded = word.toLowerCase();
  const limit = Math.max(1, Math.floor(FARTHEST_SHARE * word.length)) + 1;
  // Another year is another edition, not a slip.
  const year = YEAR.exec(word)?.[0];
  const isOfThatYear = (candidate: string): boolean =>
    year === undefined || (YEAR.exec(candidate)?.[0] ?? year) === year;
  return known
    .filter(isOfThatYear)
    .map((candidate) => ({ candidate, distance: editDistance(folded, candidate.toLowerCase(), limit) }))
    .filter(({ distance }) => distance < limit)
    .sort((a, b) => a.distance - b.distance)
    .slice(0, most)
    .map(({ candidate }) => candidate);
}

/** How many single letters must be put in, left out, replaced or swapped with a neighbour; `limit` or more once it is that far. */
function editDistance(a: string, b: string, limit: number): number {
  if (Math.abs(a.length - b.length) >= limit) return limit;
  let before: number[] = [];
  let above = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i += 1) {
    const row = [i];
    for (let j = 1; j <= b.length; j += 1) {
      const replaced = (above[j - 1] ?? 0) + (a[i - 1] === b[j - 1] ? 0 : 1);
      const swapped = a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1] ? (before[j - 2] ?? Infinity) + 1 : Infinity;
      row.push(Math.min(replaced, swapped, (above[j] ?? 0) + 1, (row[j - 1] ?? 0) + 1));
    }
    before = above;
    above = row;
  }
  return above[b.length] ?? limit;
}

/** `; did you mean "…"?` or, when nothing is close, `; known: …`: the end of a message about an unknown word. */
export function suggest(word: string, known: readonly string[]): string {
  const guess = nearest(word, known);
  return guess === undefined ? `; known: ${known.join(', ')}` : ` (did you mean "${guess}"?)`;
}

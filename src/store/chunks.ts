export interface IndexRange {
  /** First building index of the range. */
  readonly from: number;
  /** One past the last. */
  readonly to: number;
}

/** Consecutive ranges of building indices that cover 0 to `count`, each of at most `size`. */
export function* indexRanges(count: number, size = 65_536): Generator<IndexRange> {
  for (let from = 0; from < count; from += size) yield { from, to: Math.min(count, from + size) };
}

/** Rank bands against drawn ranks. */

/**
 * How far the chance to stand at one of the first `end` places is from q; 0 where the place itself spans it. `counts` are draws by rank,
 * from 1.
 */
export function offAt(end: number, q: number, counts: Uint32Array): number {
  const draws = counts.reduce((sum, count) => sum + count, 0);
  const before = counts.subarray(0, end).reduce((sum, count) => sum + count, 0);
  return Math.max(0, before / draws - q, q - (before + counts[end]!) / draws);
}

/** Adds a draw of all scores to the counts by rank of each building; `work` is room of as many numbers. */
export function countRanks(score: Float64Array, ranks: readonly Uint32Array[], work: Float64Array): void {
  work.set(score);
  work.sort();
  score.forEach((one, i) => {
    let [low, high] = [0, work.length];
    while (low < high) {
      const middle = (low + high) >> 1;
      if (work[middle]! > one) high = middle;
      else low = middle + 1;
    }
    ranks[i]![work.length - low + 1]! += 1;
  });
}

/**
 * Buildings whose band from `best` to `worst` has an end more than 3 standard errors off its 5 or 95 %, and the largest such distance;
 * `twice` where the bands are themselves drawn.
 */
export function bandsAgainst(
  ranks: readonly Uint32Array[],
  best: ArrayLike<number>,
  worst: ArrayLike<number>,
  draws: number,
  twice = 1,
): { readonly bandsBeyond: number; readonly bandsLargest: number } {
  const off = ranks.map((counts, i) => Math.max(offAt(best[i]!, 0.05, counts), offAt(worst[i]!, 0.95, counts)));
  const error = twice * Math.sqrt((0.05 * 0.95) / draws);
  return { bandsBeyond: off.filter((one) => one > 3 * error).length, bandsLargest: Math.max(...off) };
}

/** Rank correlation of two lists of values, ties counted: Kendall's tau-b by Knight's merge sort, O(N log N). */

/**
 * Kendall's tau-b of paired values: (concordant - discordant) / √((pairs - ties in x)(pairs - ties in y)).
 * @returns NaN with fewer than two pairs or where all values of one list are equal.
 * Source: Knight, 1966, A computer method for calculating Kendall's tau [memory].
 */
export function kendallTauB(x: ArrayLike<number>, y: ArrayLike<number>): number {
  const n = x.length;
  if (n < 2) return NaN;
  const order = Uint32Array.from({ length: n }, (_, i) => i).sort((a, b) => x[a]! - x[b]! || y[a]! - y[b]!);
  const pairs = (n * (n - 1)) / 2;
  const tiedX = tiedPairs(n, (i) => x[order[i]!]! === x[order[i - 1]!]!);
  const tiedBoth = tiedPairs(n, (i) => x[order[i]!]! === x[order[i - 1]!]! && y[order[i]!]! === y[order[i - 1]!]!);
  const values = Float64Array.from(order, (at) => y[at]!);
  const swaps = sortCounting(values);
  const tiedY = tiedPairs(n, (i) => values[i]! === values[i - 1]!);
  // Pairs tied in neither list are concordant or discordant; each discordant one is one swap.
  const told = pairs - tiedX - tiedY + tiedBoth;
  return (told - 2 * swaps) / Math.sqrt((pairs - tiedX) * (pairs - tiedY));
}

/** Pairs within runs of equal neighbours. */
function tiedPairs(n: number, sameAsBefore: (i: number) => boolean): number {
  let ties = 0;
  let run = 1;
  for (let i = 1; i <= n; i += 1) {
    if (i < n && sameAsBefore(i)) run += 1;
    else {
      ties += (run * (run - 1)) / 2;
      run = 1;
    }
  }
  return ties;
}

/** Sorts `values` in place, smallest first. @returns how many pairs stood the wrong way round. */
function sortCounting(values: Float64Array): number {
  const n = values.length;
  let from: Float64Array = values;
  let into: Float64Array = new Float64Array(n);
  let swaps = 0;
  for (let width = 1; width < n; width *= 2) {
    for (let start = 0; start < n; start += 2 * width) {
      const middle = Math.min(start + width, n);
      const end = Math.min(start + 2 * width, n);
      let left = start;
      let right = middle;
      for (let at = start; at < end; at += 1) {
        if (left < middle && (right >= end || from[left]! <= from[right]!)) {
          into[at] = from[left]!;
          left += 1;
        } else {
          into[at] = from[right]!;
          right += 1;
          swaps += middle - left;
        }
      }
    }
    [from, into] = [into, from];
  }
  if (from !== values) values.set(from);
  return swaps;
}

/** Sample quantiles by linear interpolation between order statistics (Hyndman and Fan 1996, definition 7). */

/** The `p`-quantile (0 to 1) of ascending `sorted`; NaN of nothing. */
export function quantileOfSorted(sorted: Float64Array, p: number): number {
  if (sorted.length === 0) return NaN;
  const at = p * (sorted.length - 1);
  const below = Math.floor(at);
  const low = sorted[below]!;
  const high = sorted[Math.min(below + 1, sorted.length - 1)]!;
  return low + (at - below) * (high - low);
}

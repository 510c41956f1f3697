const SAMPLES = 2048;

/**
 * Middle value of the entries that are not NaN (the lower of two), NaN of none; the answer does not depend on their
 * order. A sample brackets the middle, and only what lies between is sorted: a full sort of a million values takes ten times as long.
 */
export function medianOf(values: Float64Array): number {
  const known = new Float64Array(values.length);
  let count = 0;
  for (let i = 0; i < values.length; i += 1) {
    const value = values[i]!;
    if (value === value) {
      known[count] = value;
      count += 1;
    }
  }
  if (count === 0) return NaN;
  const middle = (count - 1) >> 1;
  if (count <= 4 * SAMPLES) return known.subarray(0, count).sort()[middle]!;
  const sample = Float64Array.from({ length: SAMPLES }, (_, i) => known[Math.floor((i * count) / SAMPLES)]!).sort();
  const low = sample[Math.floor(0.44 * SAMPLES)]!;
  const high = sample[Math.floor(0.56 * SAMPLES)]!;
  const between = new Float64Array(count);
  let below = 0;
  let inside = 0;
  for (let i = 0; i < count; i += 1) {
    const value = known[i]!;
    if (value < low) below += 1;
    else if (value <= high) {
      between[inside] = value;
      inside += 1;
    }
  }
  const at = middle - below;
  // a sample that misses the middle, as of values in some order: sort them all
  return at >= 0 && at < inside ? between.subarray(0, inside).sort()[at]! : known.subarray(0, count).sort()[middle]!;
}

/** The `n`-th largest of `values` by quickselect in `work` (same length); `values` stays as it is. */
export function largestAbove(values: Float64Array, n: number, work: Float64Array): number {
  work.set(values);
  const k = values.length - n;
  let low = 0;
  let high = values.length - 1;
  while (low < high) {
    const pivot = work[(low + high) >> 1]!;
    let i = low;
    let j = high;
    while (i <= j) {
      while (work[i]! < pivot) i += 1;
      while (work[j]! > pivot) j -= 1;
      if (i <= j) {
        const t = work[i]!;
        work[i] = work[j]!;
        work[j] = t;
        i += 1;
        j -= 1;
      }
    }
    if (k <= j) high = j;
    else if (k >= i) low = i;
    else break;
  }
  return work[k]!;
}

/** Where `uniform` falls among `shares`. */
export function pickShare(shares: readonly number[], uniform: number): number {
  let left = uniform * shares.reduce((sum, share) => sum + share, 0);
  let i = 0;
  while (i < shares.length - 1 && left >= shares[i]!) {
    left -= shares[i]!;
    i += 1;
  }
  return i;
}

/** Bins in which the parts of a mixture are gathered: rows of cells, one a label, of weight, first and second moment. */

/** Bins and cells of less weight are folded into a neighbour. */
const THIN = 1e-3;

/**
 * Adds end bins of less weight than THIN to their inner neighbour; mean and variance of the whole stay. Not over an empty bin: a
 * far part folded into the middle would widen it.
 */
export function foldThinEnds(bins: Float64Array, n: number, slots: number, total: number): void {
  const thin = THIN * total;
  const weightOf = (bin: number): number => {
    let sum = 0;
    for (let slot = 0; slot < slots; slot += 1) sum += bins[3 * (bin * slots + slot)]!;
    return sum;
  };
  const foldBin = (from: number, to: number): void => {
    for (let slot = 0; slot < slots; slot += 1) fold(bins, from * slots + slot, to * slots + slot);
  };
  let first = 0;
  let last = n - 1;
  while (first < last && weightOf(first) < thin && weightOf(first + 1) > 0) {
    foldBin(first, first + 1);
    first += 1;
  }
  while (last > first && weightOf(last) < thin && weightOf(last - 1) > 0) {
    foldBin(last, last - 1);
    last -= 1;
  }
}

/** Within a bin adds labels of less weight than THIN to the heaviest. */
export function foldThinCells(bins: Float64Array, n: number, slots: number, total: number): void {
  const thin = THIN * total;
  for (let bin = 0; bin < n; bin += 1) {
    let heaviest = bin * slots;
    for (let cell = heaviest + 1; cell < (bin + 1) * slots; cell += 1)
      if (bins[3 * cell]! > bins[3 * heaviest]!) heaviest = cell;
    for (let cell = bin * slots; cell < (bin + 1) * slots; cell += 1)
      if (cell !== heaviest && bins[3 * cell]! > 0 && bins[3 * cell]! < thin) fold(bins, cell, heaviest);
  }
}

function fold(bins: Float64Array, from: number, to: number): void {
  for (let part = 0; part < 3; part += 1) {
    bins[3 * to + part]! += bins[3 * from + part]!;
    bins[3 * from + part] = 0;
  }
}

/** By rising mean: parts of one bin may stand in any order. */
export function sortParts({
  weight,
  mean,
  sd,
  label,
  from,
  to,
}: {
  readonly weight: Float64Array;
  readonly mean: Float64Array;
  readonly sd: Float64Array;
  readonly label: Uint8Array;
  readonly from: number;
  readonly to: number;
}): void {
  for (let i = from + 1; i < to; i += 1) {
    const [w, m, s, l] = [weight[i]!, mean[i]!, sd[i]!, label[i]!];
    let j = i - 1;
    while (j >= from && mean[j]! > m) {
      weight[j + 1] = weight[j]!;
      mean[j + 1] = mean[j]!;
      sd[j + 1] = sd[j]!;
      label[j + 1] = label[j]!;
      j -= 1;
    }
    weight[j + 1] = w;
    mean[j + 1] = m;
    sd[j + 1] = s;
    label[j + 1] = l;
  }
}

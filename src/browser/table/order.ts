/** Which buildings the table shows, in which order. */

export type Sorting = 'ascending' | 'descending';

/** Sort keys by building: numbers, or places in the alphabet; NaN: blank, last either way. */
export function sortKeys(count: number, key: (i: number) => number | string): Float64Array {
  const raw = Array.from({ length: count }, (_, i) => key(i));
  if (raw.every((value) => typeof value === 'number')) return Float64Array.from(raw);
  // Collation is slow, so each distinct text is placed once.
  const words = [...new Set(raw.map(String))].sort(
    new Intl.Collator('en', { numeric: true, sensitivity: 'base' }).compare,
  );
  const place = new Map(words.map((word, at) => [word, word === '' ? NaN : at]));
  return Float64Array.from(raw, (value) => place.get(String(value)) ?? NaN);
}

/** `members` in order of `keys`, blanks last, equal keys as ranked. */
export function sorted(members: readonly number[], keys: Float64Array, sorting: Sorting): readonly number[] {
  const sign = sorting === 'ascending' ? 1 : -1;
  return [...members].sort((a, b) => {
    const x = keys[a] ?? NaN;
    const y = keys[b] ?? NaN;
    if (Number.isNaN(x) || Number.isNaN(y)) return Number(Number.isNaN(x)) - Number(Number.isNaN(y)) || a - b;
    return sign * (x - y) || a - b;
  });
}

/** Lower case without accents, for searching. */
export function folded(text: string): string {
  return text.normalize('NFD').replaceAll(/\p{M}/gu, '').toLowerCase();
}

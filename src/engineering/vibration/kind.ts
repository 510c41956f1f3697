/** Whether a record is a free decay or ambient vibration. */

export type RecordKind = 'ambient' | 'decay';

/** No decay of a building lasts as many cycles. */
export const MOST_DECAY_CYCLES = 3000;
const BLOCKS = 20;
const CYCLES_OF_BLOCK = 2;

/**
 * Judges by the level of successive blocks of the filtered record: a decay has its greatest block early and falls from there without
 * rising, to a quarter or further, and stays low; or falls to the end, in both halves, by half at least. Judgement.
 */
export function judgeKind(
  band: Float64Array,
  rate_hz: number,
  frequency_hz: number,
): { readonly kind: RecordKind; readonly reason: string } {
  const size = Math.max(1, Math.round((CYCLES_OF_BLOCK * rate_hz) / frequency_hz), Math.floor(band.length / BLOCKS));
  const levels = Array.from({ length: Math.floor(band.length / size) }, (_, i) =>
    Math.sqrt(band.subarray(i * size, (i + 1) * size).reduce((sum, v) => sum + v * v, 0) / size),
  );
  const greatest = levels.indexOf(Math.max(...levels));
  const from = levels.slice(greatest);
  const first = from[0] ?? 0;
  if (from.length < 4 || greatest > levels.length / 3) {
    return { kind: 'ambient', reason: 'the vibration is not strongest at the beginning' };
  }
  const later = [...from.slice(from.length >> 1)].sort((a, b) => a - b);
  const rest = later[later.length >> 1] ?? first;
  const low = from.findIndex((level) => level <= first / 4);
  const falls = (until: number): boolean => from.slice(1, until).every((level, i) => level <= 1.03 * (from[i] ?? 0));
  const share = `${String(Math.round((100 * rest) / first))} %`;
  if (low > 0 && rest <= first / 4 && falls(low + 1)) {
    return { kind: 'decay', reason: `the vibration dies away steadily, to ${share} of its start in the later half` };
  }
  const half = from[from.length >> 1] ?? first;
  const last = from.at(-1) ?? first;
  if (from.length >= 6 && falls(from.length) && last <= first / 2 && half <= 0.9 * first && last <= 0.8 * half) {
    return { kind: 'decay', reason: 'the vibration falls steadily to the end of the record' };
  }
  return { kind: 'ambient', reason: `the vibration goes on: its later half has ${share} of the strongest part` };
}

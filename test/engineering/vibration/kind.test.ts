import { describe, expect, it } from 'vitest';
import { judgeKind } from '../../../src/engineering/vibration/kind.js';
import { ambientOf, decayOf } from '../../support/engineering-vibration.js';

const RATE = 100;
const kindOf = (level: (share: number) => number): string =>
  judgeKind(
    Float64Array.from({ length: 4000 }, (_, i) => level(i / 4000) * Math.sin((2 * Math.PI * 2 * i) / RATE)),
    RATE,
    2,
  ).kind;

describe('judgeKind', () => {
  it('takes what dies away for a decay: to nothing, to a floor, or still falling at the end', () => {
    expect(kindOf((x) => Math.exp(-8 * x))).toBe('decay');
    expect(kindOf((x) => Math.max(0.05, Math.exp(-12 * x)))).toBe('decay');
    expect(kindOf((x) => Math.exp(-1.2 * x))).toBe('decay');
    expect(judgeKind(decayOf({ frequency_hz: 2, damping: 0.02 }, RATE, 3000, 4), RATE, 2).kind).toBe('decay');
  });

  it('takes what goes on for ambient: steady, a weaker second half, a late burst, a decay struck again', () => {
    expect(kindOf(() => 1)).toBe('ambient');
    expect(kindOf((x) => (x < 0.3 ? 1 : 0.5))).toBe('ambient');
    expect(kindOf((x) => (x < 0.8 ? 0.1 : 1))).toBe('ambient');
    expect(kindOf((x) => Math.exp(-4 * (x % 0.5)))).toBe('ambient');
  });

  it('is not misled by chance: ambient records of little damping', () => {
    for (let seed = 1; seed <= 30; seed += 1) {
      const values = ambientOf({ frequency_hz: 2, damping: 0.005 }, RATE, 12_000, seed);
      expect(judgeKind(values, RATE, 2).kind, `seed ${String(seed)}`).toBe('ambient');
    }
  });
});

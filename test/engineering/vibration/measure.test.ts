import { describe, expect, it } from 'vitest';
import { measureRecord } from '../../../src/engineering/vibration/measure.js';
import type { MeasureOptions, Measurement } from '../../../src/engineering/vibration/measurement.js';
import { ambientOf, decayOf, noiseOf, signalOf, sumOf } from '../../support/engineering-vibration.js';

const RATE = 100;
const measure = (values: Float64Array, options: MeasureOptions = {}, rate = RATE): Measurement =>
  measureRecord(signalOf(values, rate), options);
const share = (value: number, truth: number): number => Math.abs(value / truth - 1);
const drift = (samples: number, size: number): Float64Array =>
  Float64Array.from({ length: samples }, (_, i) => size * (i / samples) ** 2);

// The truth is what the records are made of (test/support/engineering-vibration.ts); the bounds are those the purpose asks for.
describe('measureRecord, free decay', () => {
  it.each([
    [1.4, 0.0355, 3000],
    [0.5, 0.01, 2000],
    [0.5, 0.02, 2000],
    [2.5, 0.01, 12000],
    [0.25, 0.05, 1000],
  ])('finds a period of %d s to 0.002 and damping of %d to 0.02 of themselves', (period, damping, samples) => {
    const found = measure(decayOf({ frequency_hz: 1 / period, damping }, RATE, samples));
    expect(found.kind).toBe('decay');
    expect(share(found.period_s, period)).toBeLessThan(0.002);
    expect(share(found.damping.ratio, damping)).toBeLessThan(0.02);
    expect(found.decay!.beats).toBe(false);
  });

  it.each([1, 2, 3, 4, 5])('keeps to that with noise, drift and a late release (seed %d)', (seed) => {
    const mode = { frequency_hz: 2, damping: 0.02 };
    const found = measure(sumOf(decayOf(mode, RATE, 2500, 3), noiseOf(2500, seed, 0.02), drift(2500, 1)));
    expect(found.kind).toBe('decay');
    expect(share(found.period_s, 0.5)).toBeLessThan(0.002);
    expect(share(found.damping.ratio, 0.02)).toBeLessThan(0.02);
    expect(found.decay!.whole.first_amplitude).toBeLessThan(1);
  });

  it('reads on past a dropout, from the longer part', () => {
    const values = sumOf(decayOf({ frequency_hz: 2, damping: 0.01 }, RATE, 4000), noiseOf(4000, 7, 0.002));
    values.fill(0, 400, 460);
    const found = measure(values, { kind: 'decay' });
    expect(found.cuts.flat).toBe(60);
    expect(share(found.period_s, 0.5)).toBeLessThan(0.002);
    expect(share(found.damping.ratio, 0.01)).toBeLessThan(0.02);
  });

  it('says that two close modes beat, and names both where they are apart', () => {
    const two = sumOf(
      decayOf({ frequency_hz: 2, damping: 0.008 }, RATE, 4000),
      decayOf({ frequency_hz: 2.3, damping: 0.008 }, RATE, 4000, 0, 0.8),
    );
    const found = measure(two, { kind: 'decay' });
    expect(found.decay!.beats).toBe(true);
    expect(found.warnings.join()).toContain('beat');
    const both = [found.frequency_hz, ...found.close_hz].sort();
    expect(both).toHaveLength(2);
    expect(share(both[0]!, 2)).toBeLessThan(0.02);
    expect(share(both[1]!, 2.3)).toBeLessThan(0.02);
  });

  it('finds a period that shortens as the amplitude falls', () => {
    // phase of a period that goes from 0.52 to 0.50 s
    let phase = 0;
    const values = Float64Array.from({ length: 3000 }, (_, i) => {
      const t = i / RATE;
      const value = Math.exp(-0.15 * t) * Math.cos(phase);
      phase += (2 * Math.PI) / (0.5 + 0.02 * Math.exp(-0.15 * t)) / RATE;
      return value;
    });
    const [large, small] = measure(values, { kind: 'decay' }).decay!.halves!;
    expect(large.period_s).toBeGreaterThan(small.period_s + 0.003);
    expect(measure(values).warnings.join()).toContain('depends on the amplitude');
  });

  it('refuses what is too long for a decay, and a decay with too few peaks', () => {
    expect(() => measure(ambientOf({ frequency_hz: 5, damping: 0.02 }, RATE, 70_000, 1), { kind: 'decay' })).toThrow(
      'too many for a free decay',
    );
    const short = sumOf(decayOf({ frequency_hz: 0.5, damping: 0.3 }, RATE, 3000, 1), noiseOf(3000, 1, 0.02));
    expect(() => measure(short, { kind: 'decay' })).toThrow(/fewer than five peaks|no peak stands out/);
  });
});

const within = (found: Measurement, mode: { frequency_hz: number }): number =>
  Math.abs(found.frequency_hz - mode.frequency_hz) / found.frequency_se_hz;

describe('measureRecord, ambient vibration', () => {
  it.each([
    [2, 0.01, 60_000, 1],
    [2, 0.02, 60_000, 2],
    [2, 0.05, 60_000, 3],
    [0.3, 0.02, 240_000, 4],
    [5, 0.03, 30_000, 5],
    [0.8, 0.01, 120_000, 6],
  ])(
    'finds %d Hz within three standard errors and damping of %d within a half',
    (frequency_hz, damping, samples, seed) => {
      const found = measure(ambientOf({ frequency_hz, damping }, RATE, samples, seed));
      expect(found.kind).toBe('ambient');
      expect(within(found, { frequency_hz })).toBeLessThan(3);
      expect(share(found.frequency_hz, frequency_hz)).toBeLessThan(0.02);
      expect(share(found.damping.ratio, damping)).toBeLessThan(0.5);
      expect(found.period_s).toBe(1 / found.frequency_hz);
      expect(found.conditions.map(({ met }) => met)).toEqual([true, true, true]);
      expect(found.warnings.filter((text) => !text.includes('upper bound'))).toEqual([]);
    },
  );

  it('has standard errors that hold over many records', () => {
    const mode = { frequency_hz: 2, damping: 0.02 };
    const found = Array.from({ length: 24 }, (_, i) => measure(ambientOf(mode, 50, 15_000, 100 + i), {}, 50));
    const off = found.map((one) => within(one, mode));
    // of 24 normal errors some 16 lie within one standard error; ten groups scatter it
    expect(off.filter((z) => z < 1).length).toBeGreaterThan(11);
    expect(off.filter((z) => z < 2).length).toBeGreaterThan(20);
    expect(Math.max(...off)).toBeLessThan(4);
    const mean = found.reduce((sum, one) => sum + one.damping.ratio, 0) / found.length;
    // 300 s: the window's own width is still in it
    expect(mean).toBeGreaterThan(0.02);
    expect(mean).toBeLessThan(0.026);
  });

  it('keeps the frequency through noise, drift and dropouts, and says what was cut', () => {
    const mode = { frequency_hz: 1.5, damping: 0.015 };
    const values = sumOf(ambientOf(mode, RATE, 60_000, 9), noiseOf(60_000, 10, 0.3), drift(60_000, 50));
    values.fill(0, 20_000, 21_000);
    values[40_000] = NaN;
    const found = measureRecord(signalOf(values, RATE, [{ at: 30_000, missing_s: 12 }]));
    expect(within(found, mode)).toBeLessThan(3);
    expect(found.cuts).toMatchObject({ flat: 1000, unreadable: 1, gaps: 1, gap_s: 12 });
    // a gap taken for continuous time would lengthen what the windows cover
    expect(found.covered_s).toBeLessThan(590);
  });

  it('names two close modes, and takes the lower', () => {
    const two = sumOf(
      ambientOf({ frequency_hz: 2, damping: 0.01 }, RATE, 90_000, 11),
      ambientOf({ frequency_hz: 2.3, damping: 0.01 }, RATE, 90_000, 12),
    );
    const found = measure(two);
    expect(share(found.frequency_hz, 2)).toBeLessThan(0.005);
    expect(found.close_hz).toHaveLength(1);
    expect(share(found.close_hz[0]!, 2.3)).toBeLessThan(0.01);
    expect(found.warnings.join()).toMatch(/two close modes, (1\.99|2\.0\d) Hz and 2\.(29|30|31) Hz/);
  });

  it('takes the lowest peak as the fundamental though a higher mode is stronger, and says so; a band moves it', () => {
    const two = sumOf(
      ambientOf({ frequency_hz: 1.2, damping: 0.01 }, RATE, 60_000, 13),
      ambientOf({ frequency_hz: 4, damping: 0.01 }, RATE, 60_000, 14).map((v) => 2 * v),
    );
    const found = measure(two);
    expect(share(found.frequency_hz, 1.2)).toBeLessThan(0.01);
    expect(found.warnings.join()).toMatch(/the highest peak is at (3\.9\d|4\.0\d) Hz/);
    expect(share(measure(two, { band_hz: [3, 6] }).frequency_hz, 4)).toBeLessThan(0.01);
  });

  it('lengthens the period as the record is of a softer building, and widens the peak as damping grows', () => {
    const at = (frequency_hz: number, damping: number): Measurement =>
      measure(ambientOf({ frequency_hz, damping }, RATE, 60_000, 15));
    const periods = [4, 2, 1, 0.5].map((f) => at(f, 0.02).period_s);
    expect(periods).toEqual([...periods].sort((a, b) => a - b));
    const dampings = [0.01, 0.02, 0.04, 0.08].map((z) => at(2, z).damping.ratio);
    expect(dampings).toEqual([...dampings].sort((a, b) => a - b));
  });

  it('does not depend on the unit: a thousandfold record gives the same', () => {
    const values = ambientOf({ frequency_hz: 2, damping: 0.02 }, RATE, 20_000, 16);
    const small = measure(values.map((v) => v / 1024));
    expect(small.frequency_hz).toBeCloseTo(measure(values).frequency_hz, 9);
    expect(small.damping.ratio).toBeCloseTo(measure(values).damping.ratio, 9);
  });

  it('gives the same twice', () => {
    const values = ambientOf({ frequency_hz: 2, damping: 0.02 }, RATE, 20_000, 17);
    expect(JSON.stringify(measure(values))).toBe(JSON.stringify(measure(values)));
  });

  it('reports a short record as one: conditions not met', () => {
    const found = measure(ambientOf({ frequency_hz: 1, damping: 0.02 }, RATE, 6000, 18));
    expect(found.conditions.find(({ name }) => name === 'cycles in all windows')).toMatchObject({ met: false });
    expect(found.damping.upperBound).toBe(true);
  });
});

describe('measureRecord, what is no building', () => {
  it('finds nothing in noise', () => {
    for (let seed = 1; seed <= 12; seed += 1)
      expect(() => measure(noiseOf(20_000, seed)), `seed ${String(seed)}`).toThrow('no peak stands out of the noise');
  });

  it('tells a machine by its narrowness, and the mains by its frequency', () => {
    const tone = (f: number, rate: number): Float64Array =>
      Float64Array.from({ length: 120_000 }, (_, i) => Math.sin((2 * Math.PI * f * i) / rate));
    const machine = measure(sumOf(tone(8.1, RATE), noiseOf(120_000, 1, 0.2)));
    expect(machine.frequency_hz).toBeCloseTo(8.1, 3);
    expect(machine.warnings.join()).toContain('a machine running at 8.10 Hz');
    const mode = ambientOf({ frequency_hz: 3, damping: 0.02 }, 200, 120_000, 2);
    expect(
      measure(
        sumOf(
          tone(50, 200),
          mode.map((v) => 0.1 * v),
        ),
        {},
        200,
      ).warnings.join(),
    ).toContain('the mains, at 50');
    const alone = measure(sumOf(tone(50, 200), noiseOf(120_000, 3, 0.1)), { band_hz: [30, 70] }, 200);
    expect(alone.warnings.join()).toContain('the mains of 50 Hz: that is no building');
  });

  it('says what to do about a record too short, too slow, or dead', () => {
    expect(() => measure(noiseOf(100, 1))).toThrow('too short: its longest stretch without a gap has 100 samples');
    expect(() => measure(new Float64Array(5000))).toThrow('has 0 samples');
    expect(() => measure(noiseOf(5000, 1), {}, 0.2)).toThrow('sampling rate of 0.200 Hz is too low');
    expect(() => measure(noiseOf(500, 1), { band_hz: [0.1, 0.2] })).toThrow(
      'too short for frequencies of 0.100 to 0.200 Hz',
    );
    expect(() => measure(ambientOf({ frequency_hz: 2, damping: 0.02 }, RATE, 6000, 1), { window_s: 90 })).toThrow(
      '--window-s 90.0',
    );
  });

  it('warns of few samples a cycle', () => {
    const found = measure(ambientOf({ frequency_hz: 3, damping: 0.02 }, 10, 12_000, 4), {}, 10);
    expect(found.warnings.join()).toContain('samples a cycle');
    expect(found.warnings.join()).toContain('nothing above 4.00 Hz is seen');
  });
});

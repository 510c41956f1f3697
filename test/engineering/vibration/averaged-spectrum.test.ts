import { describe, expect, it } from 'vitest';
import { averagedSpectrum, detrend, hann, windowStarts } from '../../../src/engineering/vibration/averaged-spectrum.js';
import { filtered, squaredMagnitudes } from '../../../src/engineering/vibration/fourier.js';
import { noiseOf } from '../../support/engineering-vibration.js';

describe('squaredMagnitudes', () => {
  it('equals the sum written out, and keeps the energy (Parseval)', () => {
    const data = noiseOf(64, 1);
    const out = new Float64Array(33);
    squaredMagnitudes(64)(data, out);
    let energy = 0;
    for (let k = 0; k <= 32; k += 1) {
      let [re, im] = [0, 0];
      data.forEach((value, i) => {
        re += value * Math.cos((2 * Math.PI * k * i) / 64);
        im -= value * Math.sin((2 * Math.PI * k * i) / 64);
      });
      expect(out[k]).toBeCloseTo(re * re + im * im, 9);
      energy += (k === 0 || k === 32 ? 1 : 2) * out[k]!;
    }
    expect(energy / 64).toBeCloseTo(
      data.reduce((sum, v) => sum + v * v, 0),
      9,
    );
  });
});

describe('filtered', () => {
  it('gives the data back when every frequency passes, at any length', () => {
    const data = noiseOf(77, 2);
    filtered(data, () => 1).forEach((value, i) => {
      expect(value).toBeCloseTo(data[i]!, 12);
    });
  });

  it('takes one of two tones away and moves no phase', () => {
    const tone = (share: number): Float64Array =>
      Float64Array.from({ length: 256 }, (_, i) => Math.sin(2 * Math.PI * share * i + 0.4));
    const both = tone(8 / 256).map((v, i) => v + tone(64 / 256)[i]!);
    filtered(both, (share) => (share < 0.1 ? 1 : 0)).forEach((value, i) => {
      expect(value).toBeCloseTo(tone(8 / 256)[i]!, 12);
    });
  });
});

describe('detrend', () => {
  it('leaves nothing of a straight line', () => {
    const line = Float64Array.from({ length: 50 }, (_, i) => 3 - 0.7 * i);
    detrend(line);
    expect(Math.max(...line.map(Math.abs))).toBeLessThan(1e-12);
  });
});

describe('windowStarts', () => {
  it('overlaps by half and stays within the stretches', () => {
    expect(
      windowStarts(
        [
          { from: 0, to: 20 },
          { from: 30, to: 37 },
          { from: 50, to: 58 },
        ],
        8,
      ),
    ).toEqual([0, 4, 8, 12, 50]);
  });
});

describe('averagedSpectrum', () => {
  it('equals the average of windows transformed one by one by the sum written out', () => {
    const [values, rate, samples] = [noiseOf(90, 3), 10, 20];
    const spectrum = averagedSpectrum(values, rate, [{ from: 3, to: 88 }], samples, rate / 2);
    // 20 samples, lengthened to 64
    expect(spectrum.step_hz).toBe(10 / 64);
    const taper = Array.from({ length: samples }, (_, i) => 0.5 - 0.5 * Math.cos((2 * Math.PI * i) / samples));
    const weight = taper.reduce((sum, w) => sum + w * w, 0);
    const starts = [3, 13, 23, 33, 43, 53, 63];
    expect(spectrum.windows).toBe(starts.length);
    for (const k of [1, 7, 20, 32]) {
      let total = 0;
      for (const start of starts) {
        const part = Float64Array.from(values.subarray(start, start + samples));
        detrend(part);
        let [re, im] = [0, 0];
        part.forEach((value, i) => {
          re += taper[i]! * value * Math.cos((2 * Math.PI * k * i) / 64);
          im += taper[i]! * value * Math.sin((2 * Math.PI * k * i) / 64);
        });
        total += (2 * (re * re + im * im)) / (rate * weight);
      }
      expect(spectrum.density[k]).toBeCloseTo(total / starts.length, 10);
    }
  });

  it('has the variance of noise as its area', () => {
    const spectrum = averagedSpectrum(noiseOf(40_000, 4, 2), 100, [{ from: 0, to: 40_000 }], 400, 50);
    const area = spectrum.density.reduce((sum, v) => sum + v, 0) * spectrum.step_hz;
    expect(Math.abs(area / 4 - 1)).toBeLessThan(0.03);
  });

  it('is the average of its groups', () => {
    const { groups, density, windows } = averagedSpectrum(noiseOf(3000, 5), 100, [{ from: 0, to: 3000 }], 200, 50);
    expect(groups.reduce((sum, group) => sum + group.windows, 0)).toBe(windows);
    const at = groups.reduce((sum, group) => sum + group.density[9]! * group.windows, 0) / windows;
    expect(density[9]).toBeCloseTo(at, 12);
  });
});

describe('hann', () => {
  it('is the raised cosine', () => {
    hann(12).forEach((w, i) => {
      expect(w).toBeCloseTo(0.5 - 0.5 * Math.cos((2 * Math.PI * i) / 12), 14);
    });
  });
});

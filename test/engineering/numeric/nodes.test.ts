import { describe, expect, it } from 'vitest';
import { normalCdf, normalDensity } from '../../../src/engineering/numeric/normal.js';
import { HEIGHT_NODES, ONE_NODE, PERIOD_NODES } from '../../../src/engineering/numeric/nodes.js';

// Moments of the standard normal: 1, 0, 1, 0, 3 (textbook).
describe('PERIOD_NODES', () => {
  it('integrate the moments of the normal up to the tail left out beyond 4', () => {
    const moment = (power: number): number =>
      PERIOD_NODES.z.reduce((sum, z, i) => sum + PERIOD_NODES.weight[i]! * z ** power, 0);
    expect(moment(0)).toBeCloseTo(1, 14);
    expect(moment(1)).toBeCloseTo(0, 14);
    expect(Math.abs(moment(2) - 1)).toBeLessThan(1e-3);
    expect(Math.abs(moment(4) - 3)).toBeLessThan(0.02);
    expect(PERIOD_NODES.z).toHaveLength(17);
  });
});

// ln S_a about the corner of the plateau is -max(σz - c, 0): its moments are those of a truncated normal (textbook), and at the
// corner itself (c = 0, σ = 0.3) the ranking data sheet's own simulation gives mean -0.120 and sd 0.175.
describe('PERIOD_NODES at the corner of a spectrum', () => {
  it.each([-0.9, -0.5, -0.25, -0.1, 0, 0.1, 0.25, 0.37, 0.6, 0.9])(
    'give the exact moments of ln S_a, the corner %f off the median',
    (c) => {
      const sigma = 0.3;
      const a = c / sigma;
      const above = 1 - normalCdf(a);
      const density = normalDensity(a);
      const mean = -(sigma * density - c * above);
      const second = (sigma * sigma + c * c) * above - sigma * c * density;
      const g = PERIOD_NODES.z.map((z) => -Math.max(sigma * z - c, 0));
      const sum = (f: (x: number) => number): number =>
        g.reduce((total, x, i) => total + PERIOD_NODES.weight[i]! * f(x), 0);
      const m = sum((x) => x);
      expect(Math.abs(m - mean)).toBeLessThan(0.003);
      expect(Math.abs(Math.sqrt(sum((x) => x * x) - m * m) - Math.sqrt(second - mean * mean))).toBeLessThan(0.003);
      if (c === 0) {
        expect(m).toBeCloseTo(-0.12, 2);
        expect(Math.sqrt(sum((x) => x * x) - m * m)).toBeCloseTo(0.175, 2);
      }
    },
  );

  it('do better there than the slope at the median, which sees no spread below the corner', () => {
    const sigma = 0.3;
    const g = PERIOD_NODES.z.map((z) => -Math.max(sigma * z - 0.1, 0));
    const m = g.reduce((total, x, i) => total + PERIOD_NODES.weight[i]! * x, 0);
    expect(m).toBeLessThan(-0.05);
  });
});

describe('HEIGHT_NODES', () => {
  it('have a variance within half a percent of 1', () => {
    const variance = HEIGHT_NODES.z.reduce((sum, z, i) => sum + HEIGHT_NODES.weight[i]! * z * z, 0);
    expect(Math.abs(variance - 1)).toBeLessThan(0.005);
    expect(ONE_NODE).toEqual({ z: [0], weight: [1] });
  });
});

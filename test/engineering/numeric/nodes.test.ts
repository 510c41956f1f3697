import { describe, expect, it } from 'vitest';
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

describe('HEIGHT_NODES', () => {
  it('have a variance within half a percent of 1', () => {
    const variance = HEIGHT_NODES.z.reduce((sum, z, i) => sum + HEIGHT_NODES.weight[i]! * z * z, 0);
    expect(Math.abs(variance - 1)).toBeLessThan(0.005);
    expect(ONE_NODE).toEqual({ z: [0], weight: [1] });
  });
});

import { describe, expect, it } from 'vitest';
import { wallFrameMode, wallFrameRoot } from '../../../src/engineering/numeric/wall-frame.js';

/** The equation as printed, Miranda and Taghavi 2005 eq. 6. */
function printed(alpha: number, gamma: number): number {
  const beta = Math.hypot(gamma, alpha);
  const product = gamma * beta;
  return (
    2 +
    (2 + alpha ** 4 / product ** 2) * Math.cos(gamma) * Math.cosh(beta) +
    (alpha ** 2 / product) * Math.sin(gamma) * Math.sinh(beta)
  );
}

const ALPHAS = [0, 1, 2, 3, 5, 8, 12.5, 20, 30];

describe('wallFrameRoot', () => {
  it('solves the printed equation to 1e-12', () => {
    for (const alpha of ALPHAS)
      for (const mode of [1, 2, 3, 4]) {
        const root = wallFrameRoot(alpha, mode);
        expect(printed(alpha, root - 1e-12) * printed(alpha, root + 1e-12), `α ${String(alpha)}`).toBeLessThan(0);
      }
  });

  // table of wall with frame computed elsewhere: T1/T2 and T1/T3
  it.each([
    [0, 6.267, 17.55],
    [1, 5.537, 15.2],
    [2, 4.571, 11.8],
    [3, 4.009, 9.69],
    [5, 3.535, 7.59],
    [8, 3.288, 6.38],
    [12.5, 3.147, 5.7],
    [20, 3.065, 5.32],
    [30, 3.03, 5.15],
  ])('gives the ratios of the periods for α = %d', (alpha, second, third) => {
    const square = (mode: number): number => {
      const gamma = wallFrameRoot(alpha, mode);
      return gamma * Math.hypot(gamma, alpha);
    };
    expect(Math.abs(square(2) / square(1) - second)).toBeLessThanOrEqual(5.1e-4);
    expect(Math.abs(square(3) / square(1) - third)).toBeLessThanOrEqual(alpha > 0 && alpha <= 2 ? 0.051 : 0.0055);
  });

  // the same table: period over that of the frame alone, 4H √(μ/GA)
  it.each([
    [1, 0.382],
    [2, 0.58],
    [3, 0.681],
    [5, 0.788],
    [8, 0.865],
    [12.5, 0.914],
    [20, 0.947],
    [30, 0.965],
  ])('gives the period over that of the frame for α = %d', (alpha, ratio) => {
    const gamma = wallFrameRoot(alpha);
    expect((2 * Math.PI * alpha) / (gamma * Math.hypot(gamma, alpha)) / 4).toBeCloseTo(ratio, 3);
  });

  it('refuses what is no ratio and no mode', () => {
    expect(() => wallFrameRoot(-1)).toThrow(RangeError);
    expect(() => wallFrameRoot(NaN)).toThrow(RangeError);
    expect(() => wallFrameRoot(1, 0)).toThrow(RangeError);
  });
});

describe('wallFrameMode', () => {
  // shear cantilever: Γ = 4/π, M* = 8/π², steepest slope π/2
  it('tends to the shear cantilever, without overflow', () => {
    const { participation, effectiveMassShare, driftFactor } = wallFrameMode(3000);
    expect(participation).toBeCloseTo(4 / Math.PI, 3);
    expect(effectiveMassShare).toBeCloseTo(8 / Math.PI ** 2, 3);
    expect(driftFactor).toBeCloseTo(Math.PI / 2, 2);
  });
});

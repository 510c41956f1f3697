/**
 * Equal-step nodes of the standard normal: z = -4, -3.5, … 4 with weights φ(z) Δz scaled to sum 1. Against Gauss-Hermite of the
 * same count they lie denser where the spectrum's corner matters, and the trapezoidal rule of a Gaussian converges faster than any power.
 */
import { normalDensity } from './normal.js';

export interface Nodes {
  readonly z: readonly number[];
  readonly weight: readonly number[];
}

function equalStep(reach: number, step: number): Nodes {
  const z: number[] = [];
  const half = Math.round(reach / step);
  for (let i = -half; i <= half; i += 1) z.push(i * step);
  const density = z.map(normalDensity);
  const total = density.reduce((sum, value) => sum + value, 0);
  return { z, weight: density.map((value) => value / total) };
}

/** For the error of the period: 17 nodes half a standard deviation apart. */
export const PERIOD_NODES = equalStep(4, 0.5);
/** For an inferred height: 7 nodes one standard deviation apart. */
export const HEIGHT_NODES = equalStep(3, 1);
/** For what a survey learns: 33 nodes, because the lesser of two chances has a kink that costs accuracy. */
export const LEARNT_NODES = equalStep(4, 0.25);
/** A value known exactly. */
export const ONE_NODE: Nodes = { z: [0], weight: [1] };

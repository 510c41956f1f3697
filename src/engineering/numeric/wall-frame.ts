/**
 * A bending cantilever and a shear cantilever tied together along their height, mass spread evenly (wall with frame).
 * Characteristic equation of Miranda and Taghavi (2005), eq. 6, divided by cosh β so that nothing overflows:
 * 2/cosh β + (2 + α⁴/(γ²β²)) cos γ + (α²/(γβ)) sin γ tanh β = 0, β² = γ² + α².
 */
import { cosine, exp, sine } from './elementary.js';

function characteristic(alpha: number, gamma: number): number {
  const a2 = alpha * alpha;
  const beta = Math.sqrt(gamma * gamma + a2);
  const e = exp(-beta);
  const e2 = e * e;
  const product = gamma * beta;
  return (
    (4 * e) / (1 + e2) +
    (2 + (a2 / product) * (a2 / product)) * cosine(gamma) +
    ((a2 / product) * sine(gamma) * (1 - e2)) / (1 + e2)
  );
}

/**
 * Root γ of mode `mode` for the stiffness ratio `alpha` = H √(GA/EI), by bisection to neighbouring doubles (better than 1e-12).
 * The first lies between π/2 (shear alone) and π, mode r between (r-1)π and rπ: the equation changes its sign there once.
 * @throws RangeError for a negative ratio or a mode below 1.
 */
export function wallFrameRoot(alpha: number, mode = 1): number {
  if (!(alpha >= 0 && alpha <= 1e4)) throw new RangeError(`a ratio of 0 to 10,000 is needed, got ${String(alpha)}`);
  if (!Number.isInteger(mode) || mode < 1 || mode > 100) throw new RangeError(`mode ${String(mode)} is not 1 to 100`);
  let low = mode === 1 ? Math.PI / 2 : (mode - 1) * Math.PI;
  let high = mode * Math.PI;
  const sign = mode % 2 === 1 ? 1 : -1;
  for (;;) {
    const middle = 0.5 * (low + high);
    if (middle <= low || middle >= high) return middle;
    if (sign * characteristic(alpha, middle) > 0) low = middle;
    else high = middle;
  }
}

export interface WallFrameMode {
  readonly gamma: number;
  readonly beta: number;
  /** Roof participation for an even mass. */
  readonly participation: number;
  readonly effectiveMassShare: number;
  /** Largest slope over the mean slope. */
  readonly driftFactor: number;
}

/** Steps of the height for the integrals of the shape (Simpson). */
const STEPS = 2000;

/** Modes by ratio: an inventory asks for a few ratios over and over, and each costs thousands of exponentials. */
const KEPT = new Map<number, WallFrameMode>();
const MOST_KEPT = 64;

/** The fundamental mode of wall with frame: root, participation, effective mass, drift. */
export function wallFrameMode(alpha: number): WallFrameMode {
  const kept = KEPT.get(alpha);
  if (kept !== undefined) return kept;
  const mode = workedMode(alpha);
  if (KEPT.size < MOST_KEPT) KEPT.set(alpha, mode);
  return mode;
}

function workedMode(alpha: number): WallFrameMode {
  const gamma = wallFrameRoot(alpha);
  const beta = Math.sqrt(gamma * gamma + alpha * alpha);
  const e = exp(-beta);
  const [s, c] = [sine(gamma), cosine(gamma)];
  // φ = cos γx - cosh βx + b (sin γx - (γ/β) sinh βx), no moment at the top; the growing part is written with e^(β(x-1)).
  const bottom = beta * gamma * s * e + 0.5 * beta * beta * (1 - e * e);
  const eta = (gamma * gamma * c * e + 0.5 * beta * beta * (1 + e * e)) / bottom;
  const growing = (gamma * gamma * c - beta * gamma * s + beta * beta * e) / bottom;
  const b = (-eta * beta) / gamma;
  const shape = (x: number): number =>
    cosine(gamma * x) + b * sine(gamma * x) + 0.5 * growing * exp(beta * (x - 1)) - 0.5 * (1 + eta) * exp(-beta * x);
  const slope = (x: number): number =>
    -gamma * sine(gamma * x) +
    b * gamma * cosine(gamma * x) +
    0.5 * beta * growing * exp(beta * (x - 1)) +
    0.5 * beta * (1 + eta) * exp(-beta * x);
  const top = shape(1);
  let first = 0;
  let second = 0;
  let steepest = 0;
  for (let i = 0; i <= STEPS; i += 1) {
    const x = i / STEPS;
    const weight = i === 0 || i === STEPS ? 1 : i % 2 === 1 ? 4 : 2;
    const value = shape(x) / top;
    first += weight * value;
    second += weight * value * value;
    steepest = Math.max(steepest, slope(x) / top);
  }
  first /= 3 * STEPS;
  second /= 3 * STEPS;
  return {
    gamma,
    beta,
    participation: first / second,
    effectiveMassShare: (first * first) / second,
    driftFactor: steepest,
  };
}

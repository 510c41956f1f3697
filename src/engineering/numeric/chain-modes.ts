/**
 * Any mode of a chain of masses and springs (chain.ts has the fundamental one, which the assessment needs).
 *
 * Going down from the top, s = shear over displacement and r = (displacement one storey below) / displacement = 1 - s/k. The number
 * of negative r is the number of eigenvalues below λ (Sturm), so bisection on it needs no luck with any storey pattern: a bracket
 * [0, Gershgorin] halves at every step until its ends are neighbouring doubles. What the recurrence computes is exact for masses and
 * springs that differ from the given ones by a few units in the last place, so the eigenvalue is right to about N × 1e-16.
 */
import type { ChainMode } from './chain.js';

/** Below this share of the largest movement a roof cannot be the measure of the others. */
const STILL = 1e-9;
/** Stands for a zero ratio, which would divide. */
const TINY = 1e-290;

/** Eigenvalues below `lambda` of the chain; lists bottom to top. */
export function eigenvaluesBelow(masses: readonly number[], stiffness: readonly number[], lambda: number): number {
  let count = 0;
  let s = 0;
  for (let i = masses.length - 1; i >= 0; i -= 1) {
    s += lambda * masses[i]!;
    let r = 1 - s / stiffness[i]!;
    if (r === 0) r = TINY;
    if (r < 0) count += 1;
    s /= r;
  }
  return count;
}

/**
 * Mode `mode` (1 the fundamental) of a chain; `masses` (t) and `stiffness` (kN/m) bottom to top, same length N, all positive.
 * The shape is 1 at the roof; where the roof stands all but still, 1 at the floor that moves most.
 * @throws RangeError for lists of different length, entries that are not positive, or a mode that is not 1 to N.
 */
export function chainModeOf(masses: readonly number[], stiffness: readonly number[], mode: number): ChainMode {
  const n = masses.length;
  if (n === 0 || stiffness.length !== n)
    throw new RangeError(
      `as many masses as storey stiffnesses are needed, got ${String(n)} and ${String(stiffness.length)}`,
    );
  if (!Number.isInteger(mode) || mode < 1 || mode > n)
    throw new RangeError(`mode ${String(mode)} of a chain that has ${String(n)}`);
  let high = 0;
  for (let i = 0; i < n; i += 1) {
    if (!(masses[i]! > 0) || !(stiffness[i]! > 0)) throw new RangeError('masses and stiffnesses must be positive');
    high = Math.max(high, (2 * (stiffness[i]! + (stiffness[i + 1] ?? 0))) / masses[i]!);
  }
  let low = 0;
  for (;;) {
    const middle = 0.5 * (low + high);
    if (middle <= low || middle >= high) break;
    if (eigenvaluesBelow(masses, stiffness, middle) >= mode) high = middle;
    else low = middle;
  }
  return { eigenvalue: high, shape: shapeAt(masses, stiffness, high) };
}

/**
 * Mode shape at an eigenvalue: ratios of neighbouring displacements from the top down and from the ground up, joined at the floor
 * where the two disagree least in force per mass (a twisted factorisation), each used on the side it comes from: walking one way alone
 * would lose a mode that lives at the far end.
 */
function shapeAt(masses: readonly number[], stiffness: readonly number[], lambda: number): Float64Array {
  const n = masses.length;
  const down = new Float64Array(n);
  const shearOver = new Float64Array(n);
  let s = 0;
  for (let i = n - 1; i >= 0; i -= 1) {
    s += lambda * masses[i]!;
    shearOver[i] = s;
    const r = 1 - s / stiffness[i]!;
    down[i] = r === 0 ? TINY : r;
    s /= down[i]!;
  }
  const up = new Float64Array(n);
  let g = stiffness[0]!;
  let at = 0;
  let least = Infinity;
  for (let i = 0; i < n; i += 1) {
    const gap = Math.abs(g - shearOver[i]!) / masses[i]!;
    if (gap < least) {
      least = gap;
      at = i;
    }
    if (i + 1 === n) break;
    const h = g - lambda * masses[i]!;
    const u = 1 + h / stiffness[i + 1]!;
    up[i] = u === 0 ? TINY : u;
    g = h / up[i]!;
  }
  const shape = new Float64Array(n);
  shape[at] = 1;
  for (let i = at; i + 1 < n; i += 1) shape[i + 1] = shape[i]! / down[i + 1]!;
  for (let i = at; i > 0; i -= 1) shape[i - 1] = shape[i]! / up[i - 1]!;
  const top = shape[n - 1]!;
  let most = 0;
  for (const value of shape) if (Math.abs(value) > Math.abs(most)) most = value;
  const unit = Math.abs(top) > STILL * Math.abs(most) ? top : most;
  return shape.map((value) => value / unit);
}

/** Largest storey drift over the mean storey drift of a shape, storeys of equal height. */
export function driftFactor({ shape }: ChainMode): number {
  const n = shape.length;
  let largest = 0;
  for (let i = 0; i < n; i += 1) largest = Math.max(largest, Math.abs(shape[i]! - (shape[i - 1] ?? 0)));
  return (largest * n) / Math.abs(shape[n - 1]!);
}

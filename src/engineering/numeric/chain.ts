/** The fundamental mode of a chain of masses and springs, fixed at the bottom and free at the top (a shear building). */

export interface ChainMode {
  /** ω², 1/s² when masses are in t and stiffness in kN/m. */
  readonly eigenvalue: number;
  /** Mode shape, bottom to top, 1 at the top. */
  readonly shape: Float64Array;
}

/**
 * Walks from the top down: with the top displaced by 1 and ω² = λ the displacement one storey below is the one above less the
 * shear over the stiffness. Below the first eigenvalue every displacement down to the ground stays positive (Sturm), which gives
 * a predicate that bisection can trust for any pattern of storeys. Returns the displacement of the ground, or -1 at the first crossing.
 */
function ground(
  masses: readonly number[],
  stiffness: readonly number[],
  lambda: number,
  shape: Float64Array | null,
): number {
  let x = 1;
  let shear = 0;
  for (let i = masses.length - 1; i >= 0; i -= 1) {
    if (shape !== null) shape[i] = x;
    shear += lambda * masses[i]! * x;
    x -= shear / stiffness[i]!;
    if (x <= 0 && i > 0) return -1;
  }
  return x;
}

/**
 * First mode of a chain; `masses` (t) and `stiffness` (kN/m) bottom to top, same length N >= 1, all positive.
 * The eigenvalue is bracketed by Dunkerley (below) and Rayleigh with the self-weight sway (above) and bisected to the last bits.
 * Dunkerley falls short by a factor of N at most, so every halving leaves a width of at most N 2^-j of the value: 60 halvings bring 120 storeys
 * under 1e-16, and 80 are allowed. The walk is exact for masses and springs a few units in the last place from the given ones.
 * @throws RangeError for lists of different length or entries that are not positive.
 */
export function chainMode(masses: readonly number[], stiffness: readonly number[]): ChainMode {
  const n = masses.length;
  if (n === 0 || stiffness.length !== n)
    throw new RangeError(
      `as many masses as storey stiffnesses are needed, got ${String(n)} and ${String(stiffness.length)}`,
    );
  let flexibility = 0;
  let trace = 0;
  let gravityTop = 0;
  let gravityBottom = 0;
  for (let i = 0; i < n; i += 1) {
    if (!(masses[i]! > 0) || !(stiffness[i]! > 0)) throw new RangeError('masses and stiffnesses must be positive');
    flexibility += 1 / stiffness[i]!;
    trace += flexibility * masses[i]!;
  }
  let above = 0;
  for (let i = n - 1; i >= 0; i -= 1) above += masses[i]!;
  let sway = 0;
  for (let i = 0; i < n; i += 1) {
    sway += above / stiffness[i]!;
    above -= masses[i]!;
    gravityTop += masses[i]! * sway;
    gravityBottom += masses[i]! * sway * sway;
  }
  let low = (1 / trace) * (1 - 1e-12);
  let high = (gravityTop / gravityBottom) * (1 + 1e-12);
  for (let i = 0; i < 80 && high - low > 2e-16 * high; i += 1) {
    const middle = 0.5 * (low + high);
    if (middle <= low || middle >= high) break;
    if (ground(masses, stiffness, middle, null) > 0) low = middle;
    else high = middle;
  }
  const eigenvalue = 0.5 * (low + high);
  const shape = new Float64Array(n);
  ground(masses, stiffness, low, shape);
  return { eigenvalue, shape };
}

export interface ChainProperties {
  /** Roof participation Γ = Σmφ / Σmφ² with φ = 1 at the roof. */
  readonly participation: number;
  /** Effective modal mass over total mass. */
  readonly effectiveMassShare: number;
  /** First storey's share of the roof displacement. */
  readonly firstStoreyShare: number;
}

/** Participation, effective mass and the first storey's share of roof displacement in the first mode. */
export function chainProperties(masses: readonly number[], mode: ChainMode): ChainProperties {
  let sum = 0;
  let first = 0;
  let second = 0;
  masses.forEach((mass, i) => {
    const x = mode.shape[i]!;
    sum += mass;
    first += mass * x;
    second += mass * x * x;
  });
  return {
    participation: first / second,
    effectiveMassShare: (first * first) / second / sum,
    firstStoreyShare: mode.shape[0]!,
  };
}

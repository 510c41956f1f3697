/** The fundamental mode of a cantilever that bends and shears, with its mass in the floors. */

/**
 * ω² (1/s²) by matrix iteration (Stodola): the floors' masses times the last shape load the cantilever sideways, and its deflection is
 * the next shape. The deflection is a sum of positive terms, so nothing cancels. Rayleigh's quotient of the last shape is taken; its
 * error shrinks by (ω1/ω2)^4 a pass, 1/81 for a slender shear cantilever and less for bending, and the passes end when it stands still.
 * `masses` (t) and `storeyHeights` (m) bottom to top; `bending` EI in kN m², `shear` GA over its shape factor in kN (Infinity: rigid).
 * @throws RangeError for lists of different length, entries that are not positive, or no rest after 2000 passes.
 */
export function cantileverEigenvalue(
  masses: readonly number[],
  storeyHeights: readonly number[],
  bending: number,
  shear: number,
): number {
  const n = masses.length;
  if (n === 0 || storeyHeights.length !== n)
    throw new RangeError(
      `as many masses as storey heights are needed, got ${String(n)} and ${String(storeyHeights.length)}`,
    );
  if (![...masses, ...storeyHeights, bending, shear].every((value) => value > 0))
    throw new RangeError('masses, heights and rigidities must be positive');
  const force = new Float64Array(n);
  const sway = new Float64Array(n);
  const above = new Float64Array(n);
  const overturning = new Float64Array(n);
  for (let i = 0; i < n; i += 1) force[i] = masses[i]!;
  let last = 0;
  for (let pass = 0; pass < 2000; pass += 1) {
    // V of each storey and the moment at its upper floor, from the top
    let v = 0;
    let moment = 0;
    for (let i = n - 1; i >= 0; i -= 1) {
      v += force[i]!;
      above[i] = v;
      overturning[i] = moment;
      moment += v * storeyHeights[i]!;
    }
    let rotation = 0;
    let x = 0;
    let work = 0;
    let square = 0;
    for (let i = 0; i < n; i += 1) {
      const l = storeyHeights[i]!;
      const m = overturning[i]!;
      x += rotation * l + (l * l * (m / 2 + (above[i]! * l) / 3)) / bending + (above[i]! * l) / shear;
      rotation += (l * (m + (above[i]! * l) / 2)) / bending;
      sway[i] = x;
      work += force[i]! * x;
      square += masses[i]! * x * x;
    }
    const eigenvalue = work / square;
    if (Math.abs(eigenvalue - last) <= 4e-16 * eigenvalue) return eigenvalue;
    last = eigenvalue;
    for (let i = 0; i < n; i += 1) force[i] = (masses[i]! * sway[i]!) / x;
  }
  throw new RangeError('the iteration of the cantilever did not come to rest');
}

export interface Line {
  readonly slope: number;
  /** Standard error of the slope, from the scatter about the line. */
  readonly slope_se: number;
  readonly at: (x: number) => number;
}

/** The straight line of weighted least squares; at least three points. */
export function weightedLine(x: readonly number[], y: readonly number[], weights: readonly number[]): Line {
  const sum = (term: (i: number) => number): number => x.reduce((total, _, i) => total + weights[i]! * term(i), 0);
  const weight = sum(() => 1);
  const [xm, ym] = [sum((i) => x[i]!) / weight, sum((i) => y[i]!) / weight];
  const spread = sum((i) => (x[i]! - xm) * (x[i]! - xm));
  const slope = sum((i) => (x[i]! - xm) * (y[i]! - ym)) / spread;
  const at = (place: number): number => ym + slope * (place - xm);
  const residual = sum((i) => (y[i]! - at(x[i]!)) * (y[i]! - at(x[i]!)));
  return { slope, slope_se: Math.sqrt(residual / (x.length - 2) / spread), at };
}

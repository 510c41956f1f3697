/**
 * Demand at the nodes of the period's error. Buildings share it by height and formula, so that most find it ready: ln(S_a / R_μ)
 * does not depend on the strength, whose logarithm is taken off node by node.
 */
import { reductionFactor } from '../capacity/records.js';
import { exp, ln } from '../numeric/elementary.js';
import { PERIOD_NODES } from '../numeric/nodes.js';
import type { AnyRecord } from '../formula.js';
import { entryOf, newMap } from './case-memory.js';
import { readAt } from './context.js';
import type { AssessContext, ContextSpectrum } from './context.js';
import { MOST_HEIGHTS } from './curve-memory.js';
import type { Curve } from './curve-memory.js';
import { periodAt } from './period.js';
import type { PeriodModel } from './period.js';
import { lend } from './scratch.js';
import type { Scratch } from './scratch.js';

/** True where the period is a function of formula and height alone, whatever the building. */
export function isByHeight({ evidence, formula, inputsAt, strengthened }: PeriodModel): boolean {
  return evidence === 'formula' && formula !== null && inputsAt === null && strengthened === null;
}

/** The curves by height that `model` shares with others; null where its period is the building's own. */
export function curvesOf(
  model: PeriodModel,
  spectrum: ContextSpectrum,
  { curveMemory }: AssessContext,
): Map<number, Curve> | null {
  // what a building reads from a grid is its own
  if (spectrum.site !== null || model.formula === null || !isByHeight(model)) return null;
  const byFormula = entryOf(curveMemory.curves, spectrum, newMap<AnyRecord, Map<number, Curve>>);
  return entryOf(byFormula, model.formula, newMap<number, Curve>);
}

/** The period of `model` at a height, with nothing read yet or with what others have read. */
export function curveAt(
  model: PeriodModel,
  height_m: number,
  shared: Map<number, Curve> | null,
  context: AssessContext,
): Curve {
  const old = shared?.get(height_m);
  if (old !== undefined) return old;
  const { period_s, sigma, disagreement } = periodAt(model, height_m, context);
  const made: Curve = { period_s, sigma, disagreement, reduced: [], own: shared === null };
  if (shared !== null) {
    if (shared.size >= MOST_HEIGHTS) shared.clear();
    shared.set(height_m, made);
  }
  return made;
}

/** ln(S_a / R_μ) at the nodes of the curve's period; a ductility of 1 leaves S_a as it is. */
export function reducedAt(curve: Curve, ductility: number, spectrum: ContextSpectrum, scratch: Scratch): Float64Array {
  const { reduced, sigma, period_s } = curve;
  for (let i = 0; i < reduced.length; i += 1) if (reduced[i]!.ductility === ductility) return reduced[i]!.ln_g;
  const { stretch } = scratch;
  if (scratch.stretchSigma !== sigma) {
    for (let j = 0; j < stretch.length; j += 1) stretch[j] = exp(sigma * PERIOD_NODES.z[j]!);
    scratch.stretchSigma = sigma;
  }
  const corner = spectrum.corner_s;
  const lnAt = (t: number): number => {
    const sa_g = readAt(spectrum, t);
    return ln(ductility === 1 ? sa_g : sa_g / reductionFactor(ductility, t, corner));
  };
  const ln_g = curve.own ? lend(scratch) : new Float64Array(stretch.length);
  // a period without a spread is the same at every node: a simulation draws a million such
  if (sigma === 0) ln_g.fill(lnAt(period_s));
  else for (let j = 0; j < stretch.length; j += 1) ln_g[j] = lnAt(period_s * stretch[j]!);
  reduced.push({ ductility, ln_g });
  return ln_g;
}

/** Formulas held against buildings whose period was measured: how far each lies from the measurement. */
import { applyAny } from '../../src/engineering/formula.js';
import type { AnyRecord } from '../../src/engineering/formula.js';
import {
  PERIOD_STANDARDS,
  candidates,
  inputNames,
  periodFormula,
  regressionsFor,
  toStrongShaking,
} from '../../src/engineering/period/choose.js';
import type { MeasuredBuilding } from '../reference/measured-buildings.js';

/** Formulas of every standard and the regressions that the building's height and storeys allow. */
export function applicable({ system, height_m, storeys }: MeasuredBuilding): readonly AnyRecord[] {
  if (system === null) return [periodFormula('practice-taiwan/period/by-storeys')];
  const all = [
    ...PERIOD_STANDARDS.flatMap((standard) => candidates(system, standard, 'design')),
    ...regressionsFor(system),
  ];
  all.push(...candidates(system, 'asce41-17', 'best-fit'));
  const known = [...(height_m === null ? [] : ['height_m']), ...(storeys === null ? [] : ['storeys'])];
  return [...new Set(all)].filter((method) => inputNames(method).every((name) => known.includes(name)));
}

/** The formula over each measured period, both at the amplitude that the formula speaks of. */
export function ratios(
  method: AnyRecord,
  { system, height_m, storeys, periods_s, small }: MeasuredBuilding,
): readonly number[] {
  const value = applyAny(method, { height_m: height_m ?? NaN, storeys: storeys ?? NaN });
  const lengthen = system !== null && small && method.basis !== 'ambient' ? toStrongShaking(system) : null;
  const shorten = system !== null && !small && method.basis === 'ambient' ? toStrongShaking(system) : null;
  return periods_s.map((period_s) => {
    const measured = lengthen === null ? period_s : applyAny(lengthen, { period_s });
    return (shorten === null ? value : applyAny(shorten, { period_s: value })) / measured;
  });
}

/** Ids of the formulas that leave half to twice the measured period. */
export const outside = (one: MeasuredBuilding): string[] =>
  applicable(one)
    .filter((method) => ratios(method, one).some((ratio) => ratio < 0.5 || ratio > 2))
    .map(({ id }) => id.replace('/period/', ' '))
    .sort();

/** The formulas of one measured building over its measured periods: extremes, and which leave half to twice the measurement. */
export function spreadOf(one: MeasuredBuilding): {
  readonly formulas: number;
  readonly least: number;
  readonly most: number;
} {
  const all = applicable(one).flatMap((method) => ratios(method, one));
  return { formulas: applicable(one).length, least: Math.min(...all), most: Math.max(...all) };
}

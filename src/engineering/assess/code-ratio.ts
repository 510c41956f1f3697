/** The plain code ratio of a case, beside its capacity in the hand calculation. */
import type { Building, DirectionName } from '../building.js';
import { CODE_RATIO } from '../capacity/code-ratio.js';
import { apply } from '../formula.js';
import type { Trace } from '../trace.js';
import { designOf, keptCapacity } from './capacity.js';
import type { Case } from './case-memory.js';
import { editionOf } from './code-history.js';
import type { AssessContext } from './context.js';
import { importanceOf } from './terms.js';

/**
 * Today's strength coefficient over that of the era; NaN where the study has no code history. A retrofit counts with the level it
 * reached.
 */
export function codeRatio(
  building: Building,
  which: Case,
  direction: DirectionName,
  context: AssessContext,
  trace?: Trace,
): number {
  const latest = context.eras.at(-1);
  if (latest === undefined || latest.edition === null) return NaN;
  const height_m = building.height_m.value;
  const { system, system_transverse } = which;
  const design = (one: Case['system']): Case['design']['longitudinal'] =>
    designOf(one, latest.edition, 1, false, context);
  const today: Case = {
    ...which,
    edition: latest.edition,
    editionYear: editionOf(latest.edition, context.settings.codeHistory!).year,
    retrofit_level: 1,
    strengthened: false,
    builtTo: null,
    design: { longitudinal: design(system), transverse: design(system_transverse) },
  };
  const strength_today = keptCapacity(building, today, direction, height_m, context).strength_coefficient;
  const strength_then = keptCapacity(building, which, direction, height_m, context).strength_coefficient;
  trace?.value(
    'strength_today',
    strength_today,
    'computed',
    `${latest.edition}, the latest edition of the study, by the same steps`,
  );
  trace?.value(
    'strength_then',
    strength_then,
    'computed',
    `${which.edition ?? 'no seismic design'}, the code of its era`,
  );
  return apply(CODE_RATIO, { strength_today, strength_then, importance_factor: importanceOf(building) }, trace);
}

/** The plain code ratio of a case, beside its capacity in the hand calculation. */
import type { Building, DirectionName } from '../building.js';
import { CODE_RATIO } from '../capacity/code-ratio.js';
import { apply } from '../formula.js';
import type { Trace } from '../trace.js';
import { governingCase, keptCapacity } from './capacity.js';
import { designOf } from './era-design.js';
import type { Case } from './case-memory.js';
import { editionOf } from './code-history.js';
import { rowOf } from './edition-rows.js';
import type { AssessContext } from './context.js';
import { importanceOf } from './terms.js';

/**
 * Today's strength coefficient over that of the era, of earthquakes alone; a text where there is none: why. A retrofit counts with the level it
 * reached.
 */
export function codeRatio(
  building: Building,
  which: Case,
  direction: DirectionName,
  context: AssessContext,
  trace?: Trace,
): number | string {
  const latest = context.eras.at(-1);
  if (latest === undefined || latest.edition === null) return 'the study has no code history';
  const history = context.settings.codeHistory!;
  const height_m = building.height_m.value;
  const { system, system_transverse } = which;
  const design = (one: Case['system']): Case['design']['longitudinal'] =>
    designOf(one, latest.edition, 1, false, context);
  const today: Case = {
    ...which,
    edition: latest.edition,
    editionYear: editionOf(latest.edition, history).year,
    retrofit_level: 1,
    strengthened: false,
    builtTo: null,
    design: { longitudinal: design(system), transverse: design(system_transverse) },
  };
  const own = direction === 'longitudinal' ? system : system_transverse;
  if (rowOf(own, today, history) === null)
    return `${latest.edition}, the latest edition of the study, has no coefficient for a new building of ${own}`;
  // what the wind asked for is no matter of the two codes
  const calm = { ...building, wind_base_shear_coefficient: NaN };
  const then = governingCase(calm, which, direction, height_m, context);
  const strength_today = keptCapacity(calm, today, direction, height_m, context).strength_coefficient;
  const strength_then = keptCapacity(calm, which, direction, height_m, context).strength_coefficient;
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
    then.edition === null
      ? 'no seismic design: the least that counts'
      : `${then.edition}, the code ${then === which && which.strengthened ? 'of its retrofit' : 'of its era'}`,
  );
  return apply(CODE_RATIO, { strength_today, strength_then, importance_factor: importanceOf(building) }, trace);
}

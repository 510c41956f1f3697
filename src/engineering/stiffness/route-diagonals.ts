/** Period of braced frames, and of concrete frames with infill panels as struts. */
import type { System } from '../building.js';
import { apply } from '../formula.js';
import { BRACE } from './braces.js';
import { INFILL_STRUT, STRUT_PARAMETER, STRUT_WIDTH, WITH_PANELS } from './infill.js';
import { frameOf } from './route-frame.js';
import { STEEL_MODULUS_MPA, masonryModulus } from './route-materials.js';
import { NO_MASS, chainPeriod, massOf, springsOf, storeyHeights, storeysOf } from './route-mass.js';
import type { RouteContext, Worked } from './route-mass.js';

/** Where not on record [judgement]. */
const USUAL_BAY_M = 6;
const USUAL_INFILL_THICKNESS_M = 0.2;
const USUAL_BEAM_DEPTH_M = 0.5;

const BRACED: ReadonlySet<System> = new Set<System>([
  'steel-concentric-braced-frame',
  'steel-buckling-restrained-braced-frame',
]);

/** Period of a frame whose braces carry. */
export function fromBraces(context: RouteContext): Worked | string {
  const { building, direction, system, trace } = context;
  if (!BRACED.has(system))
    return system === 'steel-eccentric-braced-frame'
      ? 'the links of an eccentrically braced frame bend, which brace areas do not tell'
      : 'the system is not a braced frame';
  const brace_area_m2 = building.structure?.brace_area_m2[direction] ?? NaN;
  if (!(brace_area_m2 > 0)) return 'no area of the braces on record';
  const mass = massOf(context);
  if (mass === null) return NO_MASS;
  const flags: string[] = [];
  const given = building.structure?.bay_length_m ?? NaN;
  const bay_length_m = given > 0 ? given : USUAL_BAY_M;
  if (!(given > 0)) {
    trace?.value('bay_length_m', bay_length_m, 'default', 'usual bay [judgement]');
    flags.push('bay length assumed');
  }
  trace?.value('modulus_MPa', STEEL_MODULUS_MPA, 'default', 'structural steel, from memory');
  const storeys = storeysOf(building);
  if (storeys > 5) flags.push('columns taken as rigid along their axis: the period is short');
  const { first_m, upper_m } = storeyHeights(context);
  const at = (storey_height_m: number): number =>
    apply(BRACE, { modulus_MPa: STEEL_MODULUS_MPA, brace_area_m2, bay_length_m, storey_height_m }, trace);
  const first = at(first_m);
  const springs = springsOf(storeys, first, upper_m === first_m ? first : at(upper_m));
  return { period_s: chainPeriod(mass.mass_t, springs, trace), massSigma: mass.massSigma, flags };
}

/** Period of a concrete frame with its infill panels as struts. */
export function fromInfilledFrame(context: RouteContext): Worked | string {
  const { building, direction, system, trace } = context;
  if (system !== 'concrete-infilled-frame') return 'the system is not an infilled frame';
  const { structure } = building;
  const panels_m = structure?.infill_length_m[direction] ?? NaN;
  if (structure === null || !(panels_m > 0))
    return 'no length of solid infill on record; the bare frame would be far too soft';
  const frame = frameOf(context);
  if (typeof frame === 'string') return frame;
  const mass = massOf(context);
  if (mass === null) return NO_MASS;
  const flags = [...frame.flags, 'upper storeys taken as infilled like the first'];
  const thickness = structure.infill_thickness_m;
  const infill_thickness_m = thickness > 0 ? thickness : USUAL_INFILL_THICKNESS_M;
  if (!(thickness > 0)) {
    trace?.value('infill_thickness_m', infill_thickness_m, 'default', 'usual thickness [judgement]');
    flags.push('infill thickness assumed');
  }
  const beam_depth_m = frame.beam_depth_m > 0 ? frame.beam_depth_m : USUAL_BEAM_DEPTH_M;
  if (!(frame.beam_depth_m > 0)) trace?.value('beam_depth_m', beam_depth_m, 'default', 'usual depth [judgement]');
  const infill_length_m = frame.bay_length_m - frame.column_side_m;
  if (!(infill_length_m > 0)) return 'the columns leave no room for a panel in a bay';
  const infill_modulus_MPa = masonryModulus(context);
  const panels = panels_m / infill_length_m;
  const withPanels = (spring: number, storey_height_m: number): number => {
    const infill_height_m = storey_height_m - beam_depth_m;
    const panel = { infill_modulus_MPa, infill_thickness_m, infill_height_m, infill_length_m };
    const strut_parameter_per_m = apply(
      STRUT_PARAMETER,
      {
        ...panel,
        frame_modulus_MPa: frame.modulus_MPa,
        column_second_moment_m4: frame.column_second_moment_m4,
      },
      trace,
    );
    const strut_width_m = apply(
      STRUT_WIDTH,
      { strut_parameter_per_m, storey_height_m, infill_height_m, infill_length_m },
      trace,
    );
    const panel_stiffness_kN_per_m = apply(INFILL_STRUT, { ...panel, strut_width_m }, trace);
    return apply(WITH_PANELS, { stiffness_kN_per_m: spring, panels, panel_stiffness_kN_per_m }, trace);
  };
  const { first_m, upper_m } = storeyHeights(context);
  if (!(Math.min(first_m, upper_m) > beam_depth_m)) return 'the beams leave no room for a panel in a storey';
  const storeys = storeysOf(building);
  const first = withPanels(frame.springs[0]!, first_m);
  const upper = storeys === 1 ? first : withPanels(frame.springs[1]!, upper_m);
  return {
    period_s: chainPeriod(mass.mass_t, springsOf(storeys, first, upper), trace),
    massSigma: mass.massSigma,
    flags,
  };
}

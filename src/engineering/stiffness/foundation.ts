/** How much a flexible ground lengthens a period that was worked out on a fixed base. */
import type { Building, DirectionName } from '../building.js';
import { apply } from '../formula.js';
import type { Trace } from '../trace.js';
import { storeysOf } from './route-mass.js';
import {
  EFFECTIVE_STRUCTURE,
  PERIOD_LENGTHENING,
  ROCK_LONG,
  ROCK_SHORT,
  SOIL_SHEAR_MODULUS,
  SWAY_LONG,
  SWAY_SHORT,
  WAVE_PARAMETER,
} from './soil.js';

/** Assumed of the ground [judgement; METHODS: ν 0.35, G/G₀ 0.7]. */
const DENSITY_T_PER_M3 = 1.8;
const POISSON_RATIO = 0.35;
const MODULUS_RATIO = 0.7;
/** Share of weight and height in the first mode; all of both for one storey (ASCE/SEI 7-05 19.2.1). */
const EFFECTIVE_SHARE = 0.7;
/** From this wave parameter on the effect is worth counting (NIST GCR 12-917-21). */
const WORTH_COUNTING = 0.1;

export interface FoundationFactor {
  /** T̃/T, at least 1. */
  readonly factor: number;
  readonly worthCounting: boolean;
  readonly flags: readonly string[];
}

/**
 * T̃/T for a fixed-base period (s) and a seismic weight (kN), the base a rigid rectangle of the plan on the surface of the ground.
 * Not for measured periods nor height formulas: those contain the ground. A string says why it cannot be told.
 */
export function foundationFactor(
  building: Building,
  direction: DirectionName,
  period_s: number,
  weight_kN: number,
  trace?: Trace,
): FoundationFactor | string {
  const vs30_mps = building.structure?.vs30_mps ?? NaN;
  const { plan_length_m, plan_width_m } = building;
  if (!(vs30_mps > 0)) return 'no shear-wave velocity of the ground on record';
  if (!(plan_length_m > 0) || !(plan_width_m > 0)) return 'no plan dimensions on record';
  if (!(weight_kN > 0)) return 'no seismic weight known';
  const height_m = building.height_m.value;
  const wave = apply(WAVE_PARAMETER, { height_m, vs30_mps, period_s }, trace);
  trace?.value('density_t_per_m3', DENSITY_T_PER_M3, 'default', 'ordinary ground [judgement]');
  trace?.value('poisson_ratio', POISSON_RATIO, 'default', 'ordinary ground [judgement]');
  trace?.value('modulus_ratio', MODULUS_RATIO, 'default', 'softening of the ground in shaking [judgement]');
  const soil_shear_modulus_kN_per_m2 = apply(
    SOIL_SHEAR_MODULUS,
    { density_t_per_m3: DENSITY_T_PER_M3, vs30_mps, modulus_ratio: MODULUS_RATIO },
    trace,
  );
  const along = direction === 'longitudinal' ? plan_length_m >= plan_width_m : plan_width_m > plan_length_m;
  const base = {
    soil_shear_modulus_kN_per_m2,
    half_width_m: Math.min(plan_length_m, plan_width_m) / 2,
    half_length_m: Math.max(plan_length_m, plan_width_m) / 2,
    poisson_ratio: POISSON_RATIO,
  };
  const share = storeysOf(building) === 1 ? 1 : EFFECTIVE_SHARE;
  const stiffness_kN_per_m = apply(EFFECTIVE_STRUCTURE, { weight_kN: share * weight_kN, period_s }, trace);
  const factor = apply(
    PERIOD_LENGTHENING,
    {
      stiffness_kN_per_m,
      foundation_stiffness_kN_per_m: apply(along ? SWAY_LONG : SWAY_SHORT, base, trace),
      rocking_stiffness_kN_m: apply(along ? ROCK_LONG : ROCK_SHORT, base, trace),
      effective_height_m: share * height_m,
    },
    trace,
  );
  return {
    factor,
    worthCounting: wave > WORTH_COUNTING,
    flags: ['density and softening of the ground assumed', 'velocity of the upper 30 m taken for that under the base'],
  };
}

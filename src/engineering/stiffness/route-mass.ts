/** What every route needs: the building as masses and storey heights, and the chain that carries them. */
import type { Building, DirectionName, System } from '../building.js';
import { apply } from '../formula.js';
import { UNIT_WEIGHT_KN_PER_M2 } from '../prior/unit-weight.js';
import type { Trace } from '../trace.js';
import { GENERAL_CHAIN, SINGLE_MASS, UNIFORM_CHAIN } from './chain.js';
import { FLOOR_MASS, WEIGHT_OF_AREA } from './weight.js';

/** Spreads of ln T by route, and of the unit weight: entries of the study's register, handed over by the caller. */
export interface RouteSpreads {
  readonly storeyStiffness: number;
  readonly storeySections: number;
  readonly storeyWalls: number;
  readonly storeySway: number;
  readonly unitWeight: number;
}

/** Which values of what is assumed: the usual ones, or those at the soft or stiff end of their ranges. */
export type Assumed = 'usual' | 'soft' | 'stiff';

export interface RouteContext {
  readonly building: Building;
  readonly direction: DirectionName;
  readonly system: System;
  readonly spreads: RouteSpreads;
  /** Height at which the route is worked; the building's own unless the effect of the height is asked for. */
  readonly height_m: number;
  readonly assumed: Assumed;
  readonly trace: Trace | undefined;
}

/** A route worked out; or why it cannot be, in words. */
export interface Worked {
  readonly period_s: number;
  /** Spread of ln T that the mass brings. */
  readonly massSigma: number;
  /** What was assumed or left out, in words. */
  readonly flags: readonly string[];
}

export interface Mass {
  readonly weight_kN: number;
  readonly mass_t: number;
  readonly massSigma: number;
}

/** Whole storeys, at least one. */
export function storeysOf(building: Building): number {
  return Math.max(1, Math.round(building.storeys.value));
}

/** The mass of a floor, from the seismic weight or from unit weight times area; null when neither weight nor area is known. */
export function massOf({ building, system, spreads, trace }: RouteContext): Mass | null {
  const storeys = storeysOf(building);
  const weighed = building.seismic_weight_kN > 0;
  const perArea = building.unit_weight_kN_per_m2 > 0 ? building.unit_weight_kN_per_m2 : UNIT_WEIGHT_KN_PER_M2[system];
  if (!weighed && !(building.floor_area_m2.value > 0)) return null;
  if (!weighed && !(building.unit_weight_kN_per_m2 > 0)) {
    trace?.value('unit_weight_kN_per_m2', perArea, 'default', `unit weight of ${system} [judgement]`);
  }
  const weight_kN = weighed
    ? building.seismic_weight_kN
    : apply(WEIGHT_OF_AREA, { floor_area_m2: building.floor_area_m2.value, unit_weight_kN_per_m2: perArea }, trace);
  const mass_t = apply(FLOOR_MASS, { weight_kN, storeys }, trace);
  // T goes with the square root of the mass; a stated weight owes nothing to the floor area
  const areaSigma = building.floor_area_m2.sigma;
  const unitSigma = building.unit_weight_kN_per_m2 > 0 ? 0 : spreads.unitWeight;
  const massSigma = weighed ? 0 : 0.5 * Math.sqrt(unitSigma * unitSigma + areaSigma * areaSigma);
  return { weight_kN, mass_t, massSigma };
}

export const NO_MASS = 'neither seismic weight nor floor area is known';

/** Height of the first storey and of the others. */
export function storeyHeights({ building, height_m }: RouteContext): {
  readonly first_m: number;
  readonly upper_m: number;
} {
  const storeys = storeysOf(building);
  const first = building.first_storey_height_m;
  if (storeys === 1) return { first_m: height_m, upper_m: height_m };
  if (!(first > 0) || !(height_m > first)) return { first_m: height_m / storeys, upper_m: height_m / storeys };
  return { first_m: first, upper_m: (height_m - first) / (storeys - 1) };
}

/** Period of equal floor masses on storey springs, by the closed form where it holds. */
export function chainPeriod(mass_t: number, springs: readonly number[], trace: Trace | undefined): number {
  const storeys = springs.length;
  const alike = springs.every((value) => value === springs[0]);
  const stiffness_kN_per_m = springs[0]!;
  return storeys === 1
    ? apply(SINGLE_MASS, { mass_t, stiffness_kN_per_m }, trace)
    : alike
      ? apply(UNIFORM_CHAIN, { storeys, mass_t, stiffness_kN_per_m }, trace)
      : apply(GENERAL_CHAIN, { masses_t: springs.map(() => mass_t), storey_stiffness_kN_per_m: springs }, trace);
}

/** Storey springs, the first apart. */
export function springsOf(storeys: number, first: number, upper: number): readonly number[] {
  return Array.from({ length: storeys }, (_, i) => (i === 0 ? first : upper));
}

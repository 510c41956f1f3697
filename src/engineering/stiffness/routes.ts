/**
 * The simplified stiffness of whatever the row knows: every route to a period from mass and stiffness, best first.
 * All stand on a fixed base; foundation.ts tells how much flexible ground lengthens them.
 */
import type { Building, DirectionName, System } from '../building.js';
import { ln } from '../numeric/elementary.js';
import type { Trace } from '../trace.js';
import { fromBraces, fromInfilledFrame } from './route-diagonals.js';
import { fromSections } from './route-frame.js';
import type { RouteContext, RouteSpreads, Worked } from './route-mass.js';
import { fromStoreyStiffness, fromSway } from './route-storey.js';
import { fromWallFrame, fromWalls } from './route-walls.js';

export type { RouteSpreads };

export interface StiffnessRoute {
  readonly id: RouteId;
  readonly title: string;
  readonly period_s: number;
  /** Method error, spread of ln T. */
  readonly sigma: number;
  /** Spread of ln T that the mass brings: an input shared with nothing else of the period. */
  readonly massSigma: number;
  /** Spread of ln T that an inferred height brings; 0 where the height is given or does not enter. */
  readonly heightSigma: number;
  /** Period with what is assumed (modulus, cracking) at the stiff and the soft end of its range; the period itself where nothing is. */
  readonly low_s: number;
  readonly high_s: number;
  /** What was assumed or left out, in words. */
  readonly flags: readonly string[];
}

export interface RouteNotTaken {
  readonly id: RouteId;
  readonly title: string;
  readonly reason: string;
}

interface Route {
  readonly id: string;
  readonly title: string;
  readonly sigma: Exclude<keyof RouteSpreads, 'unitWeight'>;
  /** Assumes a modulus or cracking, so that it has a band. */
  readonly assumes: boolean;
  readonly usesHeight: boolean;
  readonly work: (context: RouteContext) => Worked | string;
}

/** Best first. */
export const STIFFNESS_ROUTES = [
  {
    id: 'stiffness/storey-stiffness',
    title: 'Storey stiffness on record: shear chain',
    sigma: 'storeyStiffness',
    assumes: false,
    usesHeight: false,
    work: fromStoreyStiffness,
  },
  {
    id: 'stiffness/columns-and-beams',
    title: 'Columns and beams: D-values, shear chain',
    sigma: 'storeySections',
    assumes: true,
    usesHeight: true,
    work: fromSections,
  },
  {
    id: 'stiffness/infilled-frame',
    title: 'Columns and beams with infill struts: shear chain',
    sigma: 'storeySections',
    assumes: true,
    usesHeight: true,
    work: fromInfilledFrame,
  },
  {
    id: 'stiffness/walls',
    title: 'Walls: cantilever or piers',
    sigma: 'storeyWalls',
    assumes: true,
    usesHeight: true,
    work: fromWalls,
  },
  {
    id: 'stiffness/wall-with-frame',
    title: 'Wall with frame',
    sigma: 'storeyWalls',
    assumes: true,
    usesHeight: true,
    work: fromWallFrame,
  },
  {
    id: 'stiffness/gravity-sway',
    title: 'Sway under gravity applied sideways',
    sigma: 'storeySway',
    assumes: false,
    usesHeight: false,
    work: fromSway,
  },
  {
    id: 'stiffness/braces',
    title: 'Braces: shear chain',
    sigma: 'storeySections',
    assumes: false,
    usesHeight: true,
    work: fromBraces,
  },
] as const satisfies readonly Route[];

export type RouteId = (typeof STIFFNESS_ROUTES)[number]['id'];

/** Step of the height by which its effect on the period is found. */
const HEIGHT_STEP = 1.02;

function take(
  route: (typeof STIFFNESS_ROUTES)[number],
  building: Building,
  direction: DirectionName,
  system: System,
  spreads: RouteSpreads,
  trace: Trace | undefined,
): StiffnessRoute | RouteNotTaken {
  const { id, title } = route;
  const height_m = building.height_m.value;
  const context: RouteContext = { building, direction, system, spreads, height_m, assumed: 'usual', trace };
  const worked = route.work(context);
  if (typeof worked === 'string') return { id, title, reason: worked };
  const { period_s, massSigma, flags } = worked;
  const other = (change: Partial<RouteContext>): number => {
    const changed = route.work({ ...context, trace: undefined, ...change });
    return typeof changed === 'string' ? period_s : changed.period_s;
  };
  const heightSigma =
    route.usesHeight && building.height_m.sigma > 0
      ? (Math.abs(ln(other({ height_m: height_m * HEIGHT_STEP }) / period_s)) / ln(HEIGHT_STEP)) *
        building.height_m.sigma
      : 0;
  return {
    id,
    title,
    period_s,
    sigma: spreads[route.sigma],
    massSigma,
    heightSigma,
    low_s: route.assumes ? other({ assumed: 'stiff' }) : period_s,
    high_s: route.assumes ? other({ assumed: 'soft' }) : period_s,
    flags,
  };
}

/** True where the row gives nothing that a route could start from: the usual case, told cheaply. */
function knowsNothing(building: Building, direction: DirectionName): boolean {
  if (building.storey_stiffness_kN_per_m[direction] !== null) return false;
  const { structure } = building;
  if (structure === null) return true;
  // the ground alone may be on record: that is no structure
  return (
    !(structure.column_count > 0) &&
    structure.wall_areas_m2[direction] === null &&
    structure.wall_lengths_m[direction] === null &&
    !(structure.top_displacement_m[direction] > 0) &&
    !(structure.brace_area_m2[direction] > 0)
  );
}

/** Every route for one direction, were the lateral system `system`: its period (s), or why it does not apply. */
export function stiffnessRoutes(
  building: Building,
  direction: DirectionName,
  system: System,
  spreads: RouteSpreads,
  trace?: Trace,
): readonly (StiffnessRoute | RouteNotTaken)[] {
  return STIFFNESS_ROUTES.map((route) => take(route, building, direction, system, spreads, trace));
}

/** The best route that applies and is not switched off by id; null when none does. */
export function bestStiffnessRoute(
  building: Building,
  direction: DirectionName,
  system: System,
  spreads: RouteSpreads,
  switchedOff: readonly string[],
  trace?: Trace,
): StiffnessRoute | null {
  if (knowsNothing(building, direction)) return null;
  for (const route of STIFFNESS_ROUTES) {
    if (switchedOff.includes(route.id)) continue;
    const taken = take(route, building, direction, system, spreads, trace);
    if (!('reason' in taken)) return taken;
  }
  return null;
}

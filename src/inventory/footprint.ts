/** Footprints: outlines in degrees to area, plan sides, corners and centre. */

import { readOutlines } from './outline-text.js';
import type { Rings } from './outline-text.js';
import { planShape, ringArea } from './plan-shape.js';
import type { PlanShape, Point } from './plan-shape.js';

export interface Footprint {
  /** Of all outlines together, courtyards taken out. */
  readonly area_m2: number;
  /** Null where the building has several outlines: no rectangle around them tells of any one of them. */
  readonly shape: PlanShape | null;
  readonly outlines: number;
  readonly lon: number;
  readonly lat: number;
}

const SEMI_MAJOR_M = 6_378_137;
const ECCENTRICITY_SQUARED = 0.006_694_379_990_14;
const RADIANS = Math.PI / 180;

/**
 * Reads a WKT polygon, or several, in degrees; undefined when it is none or one of them has no extent. Sizes in m about the centre of each
 * outline (WGS 84 radii of curvature); the centre of several is that of their areas.
 */
export function readFootprint(text: string): Footprint | undefined {
  const outlines = readOutlines(text);
  if (outlines === undefined) return undefined;
  if (outlines.length === 1) {
    const only = measure(outlines[0]!);
    const shape = only === undefined ? undefined : planShape(only.outer);
    if (only === undefined || shape === undefined) return undefined;
    return { area_m2: only.area_m2, shape, outlines: 1, lon: only.lon, lat: only.lat };
  }
  let [area_m2, east, north] = [0, 0, 0];
  for (const outline of outlines) {
    const part = measure(outline);
    if (part === undefined) return undefined;
    area_m2 += part.area_m2;
    east += part.area_m2 * part.lon;
    north += part.area_m2 * part.lat;
  }
  return { area_m2, shape: null, outlines: outlines.length, lon: east / area_m2, lat: north / area_m2 };
}

interface MeasuredOutline {
  readonly area_m2: number;
  readonly lon: number;
  readonly lat: number;
  /** In m about its centre. */
  readonly outer: readonly Point[];
}

/** Undefined where it is not on earth or has no area. */
function measure(rings: Rings): MeasuredOutline | undefined {
  const corners = rings[0]!;
  const lon = corners.reduce((sum, [x]) => sum + x, 0) / corners.length;
  const lat = corners.reduce((sum, [, y]) => sum + y, 0) / corners.length;
  if (Math.abs(lon) > 180 || Math.abs(lat) > 90) return undefined;
  const { east_m, north_m } = groundScale(lat);
  const flat = rings.map((ring) => ring.map(([x, y]): Point => [(x - lon) * east_m, (y - lat) * north_m]));
  const [outer = [], ...courtyards] = flat;
  const area_m2 = ringArea(outer) - courtyards.reduce((sum, ring) => sum + ringArea(ring), 0);
  return area_m2 > 0 ? { area_m2, lon, lat, outer } : undefined;
}

/** Metres of a degree to the east and to the north at a latitude (WGS 84 radii of curvature). */
export function groundScale(lat: number): { readonly east_m: number; readonly north_m: number } {
  const w = 1 - ECCENTRICITY_SQUARED * Math.sin(lat * RADIANS) * Math.sin(lat * RADIANS);
  return {
    east_m: (SEMI_MAJOR_M / Math.sqrt(w)) * Math.cos(lat * RADIANS) * RADIANS,
    north_m: ((SEMI_MAJOR_M * (1 - ECCENTRICITY_SQUARED)) / (w * Math.sqrt(w))) * RADIANS,
  };
}

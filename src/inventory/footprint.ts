/** Footprints: a WKT polygon in degrees to area, plan sides, corners and centre. */

import { planShape, ringArea } from './plan-shape.js';
import type { PlanShape, Point } from './plan-shape.js';

export interface Footprint extends PlanShape {
  readonly area_m2: number;
  readonly lon: number;
  readonly lat: number;
}

const SEMI_MAJOR_M = 6_378_137;
const ECCENTRICITY_SQUARED = 0.006_694_379_990_14;
const RADIANS = Math.PI / 180;

/** Reads `POLYGON ((lon lat, …), (hole), …)`; undefined when it is none. Sizes in m about its own centre (WGS 84 radii of curvature). */
export function readFootprint(text: string): Footprint | undefined {
  const rings = readRings(text);
  const outer = rings?.[0];
  if (rings === undefined || outer === undefined) return undefined;
  const lon = outer.reduce((sum, [x]) => sum + x, 0) / outer.length;
  const lat = outer.reduce((sum, [, y]) => sum + y, 0) / outer.length;
  if (Math.abs(lon) > 180 || Math.abs(lat) > 90) return undefined;
  const { east_m, north_m } = groundScale(lat);
  const flat = rings.map((ring) => ring.map(([x, y]): Point => [(x - lon) * east_m, (y - lat) * north_m]));
  const [first = [], ...holes] = flat;
  const area_m2 = ringArea(first) - holes.reduce((sum, hole) => sum + ringArea(hole), 0);
  const shape = planShape(first);
  if (shape === undefined || !(area_m2 > 0)) return undefined;
  return { area_m2, ...shape, lon, lat };
}

/** Rings of a WKT polygon in degrees, the outer first, none closed; undefined when it is none. */
export function readRings(text: string): readonly (readonly Point[])[] | undefined {
  const match = /^\s*(?:SRID=4326;\s*)?POLYGON\s*(?:Z\s*)?\(\s*(\(.*\))\s*\)\s*$/is.exec(text);
  if (match === null) return undefined;
  const rings: Point[][] = [];
  for (const part of (match[1] ?? '').split(/\)\s*,\s*\(/)) {
    const ring = readRing(part);
    if (ring === undefined) return undefined;
    rings.push(ring);
  }
  return rings;
}

/** Metres of a degree to the east and to the north at a latitude (WGS 84 radii of curvature). */
export function groundScale(lat: number): { readonly east_m: number; readonly north_m: number } {
  const w = 1 - ECCENTRICITY_SQUARED * Math.sin(lat * RADIANS) * Math.sin(lat * RADIANS);
  return {
    east_m: (SEMI_MAJOR_M / Math.sqrt(w)) * Math.cos(lat * RADIANS) * RADIANS,
    north_m: ((SEMI_MAJOR_M * (1 - ECCENTRICITY_SQUARED)) / (w * Math.sqrt(w))) * RADIANS,
  };
}

function readRing(text: string): Point[] | undefined {
  const points: Point[] = [];
  for (const pair of text.replaceAll(/[()]/g, '').split(',')) {
    const numbers = pair.trim().split(/\s+/).map(Number);
    const [x, y] = numbers;
    if (x === undefined || y === undefined || numbers.some((n) => !Number.isFinite(n))) return undefined;
    points.push([x, y]);
  }
  const last = points.at(-1);
  // The closing point repeats the first.
  if (points.length > 1 && last?.[0] === points[0]?.[0] && last?.[1] === points[0]?.[1]) points.pop();
  return points.length >= 3 ? points : undefined;
}

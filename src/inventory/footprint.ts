/** Footprints: a WKT polygon in degrees to area, plan sides and centre. */

export interface Footprint {
  readonly area_m2: number;
  /** Sides of the smallest rectangle around it, the longer first. */
  readonly length_m: number;
  readonly width_m: number;
  readonly lon: number;
  readonly lat: number;
}

type Point = readonly [number, number];

const SEMI_MAJOR_M = 6_378_137;
const ECCENTRICITY_SQUARED = 0.006_694_379_990_14;
const RADIANS = Math.PI / 180;

/** Reads `POLYGON ((lon lat, …), (hole), …)`; undefined when it is none. Sizes in m about its own centre (WGS 84 radii of curvature). */
export function readFootprint(text: string): Footprint | undefined {
  const match = /^\s*(?:SRID=4326;\s*)?POLYGON\s*(?:Z\s*)?\(\s*(\(.*\))\s*\)\s*$/is.exec(text);
  if (match === null) return undefined;
  const rings = (match[1] ?? '').split(/\)\s*,\s*\(/).map(readRing);
  const outer = rings[0];
  if (outer === undefined || rings.some((ring) => ring === undefined)) return undefined;
  const lon = outer.reduce((sum, [x]) => sum + x, 0) / outer.length;
  const lat = outer.reduce((sum, [, y]) => sum + y, 0) / outer.length;
  if (Math.abs(lon) > 180 || Math.abs(lat) > 90) return undefined;
  const w = 1 - ECCENTRICITY_SQUARED * Math.sin(lat * RADIANS) * Math.sin(lat * RADIANS);
  const east_m = (SEMI_MAJOR_M / Math.sqrt(w)) * Math.cos(lat * RADIANS) * RADIANS;
  const north_m = ((SEMI_MAJOR_M * (1 - ECCENTRICITY_SQUARED)) / (w * Math.sqrt(w))) * RADIANS;
  const flat = rings.map((ring) => (ring ?? []).map(([x, y]): Point => [(x - lon) * east_m, (y - lat) * north_m]));
  const [first = [], ...holes] = flat;
  const area_m2 = ringArea(first) - holes.reduce((sum, hole) => sum + ringArea(hole), 0);
  const sides = smallestRectangle(first);
  if (sides === undefined || !(area_m2 > 0)) return undefined;
  return { area_m2, length_m: sides[0], width_m: sides[1], lon, lat };
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

function ringArea(ring: readonly Point[]): number {
  let twice = 0;
  ring.forEach(([x, y], at) => {
    const [nextX, nextY] = ring[(at + 1) % ring.length] ?? [0, 0];
    twice += x * nextY - nextX * y;
  });
  return Math.abs(twice) / 2;
}

/** Longer and shorter side of the rectangle of least area; one of its sides lies on an edge of the convex hull. */
function smallestRectangle(ring: readonly Point[]): readonly [number, number] | undefined {
  const hull = convexHull(ring);
  let best: readonly [number, number] | undefined;
  hull.forEach(([x, y], at) => {
    const [nextX, nextY] = hull[(at + 1) % hull.length] ?? [0, 0];
    const length = Math.hypot(nextX - x, nextY - y);
    if (length === 0) return;
    const ux = (nextX - x) / length;
    const uy = (nextY - y) / length;
    const along = hull.map(([px, py]) => px * ux + py * uy);
    const across = hull.map(([px, py]) => py * ux - px * uy);
    const a = Math.max(...along) - Math.min(...along);
    const b = Math.max(...across) - Math.min(...across);
    if (best === undefined || a * b < best[0] * best[1]) best = a >= b ? [a, b] : [b, a];
  });
  return best;
}

function convexHull(points: readonly Point[]): readonly Point[] {
  const sorted = [...points].sort((a, b) => a[0] - b[0] || a[1] - b[1]);
  const half = (list: readonly Point[]): Point[] => {
    const chain: Point[] = [];
    for (const point of list) {
      while (chain.length > 1 && turn(chain.at(-2), chain.at(-1), point) <= 0) chain.pop();
      chain.push(point);
    }
    chain.pop();
    return chain;
  };
  return [...half(sorted), ...half(sorted.reverse())];
}

function turn(a: Point | undefined, b: Point | undefined, c: Point): number {
  if (a === undefined || b === undefined) return 1;
  return (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);
}

/** The shape of an outline on the ground: the smallest rectangle around it, its hull, what its re-entrant corners leave out. */

export type Point = readonly [number, number];

export interface PlanShape {
  /** Sides of the smallest rectangle around it, the longer first. */
  readonly length_m: number;
  readonly width_m: number;
  /**
   * Beyond a re-entrant corner the building projects in two directions of the rectangle. The lesser of the two, as a share of the
   * side it lies along; the largest of all corners; 0 where there is none.
   */
  readonly reentrant_projection: number;
  /** The largest single area between outline and hull, over the area of the outline. */
  readonly reentrant_area_share: number;
}

/** A dent less deep than this share of the width is no corner: outlines are drawn by hand [judgement]. */
const LEAST_DEPTH = 0.05;

/** Unit vector along the longer side of a rectangle, and where the rectangle lies along and across it. */
interface Rectangle {
  readonly ux: number;
  readonly uy: number;
  readonly along: readonly [number, number];
  readonly across: readonly [number, number];
}

/** Shape of the ring (m, not closed); undefined when it has no extent. */
export function planShape(ring: readonly Point[]): PlanShape | undefined {
  const hull = convexHull(ring);
  const rectangle = smallestRectangle(ring, hull);
  if (rectangle === undefined) return undefined;
  const length_m = rectangle.along[1] - rectangle.along[0];
  const width_m = rectangle.across[1] - rectangle.across[0];
  const area = ringArea(ring);
  let projection = 0;
  let largest = 0;
  for (const pocket of pocketsOf(ring, hull)) {
    largest = Math.max(largest, ringArea(pocket));
    for (let i = 1; i + 1 < pocket.length; i += 1)
      projection = Math.max(projection, projectionAt(pocket, i, rectangle, LEAST_DEPTH * width_m));
  }
  return {
    length_m,
    width_m,
    reentrant_projection: projection,
    reentrant_area_share: area > 0 ? largest / area : 0,
  };
}

export function ringArea(ring: readonly Point[]): number {
  return Math.abs(signedArea(ring));
}

function signedArea(ring: readonly Point[]): number {
  let twice = 0;
  ring.forEach(([x, y], at) => {
    const [nextX, nextY] = ring[(at + 1) % ring.length] ?? [0, 0];
    twice += x * nextY - nextX * y;
  });
  return twice / 2;
}

/** The rectangle of least area; one of its sides lies on an edge of the hull. */
function smallestRectangle(ring: readonly Point[], hull: readonly Point[]): Rectangle | undefined {
  let best: Rectangle | undefined;
  let least = Infinity;
  hull.forEach(([x, y], at) => {
    const [nextX, nextY] = hull[(at + 1) % hull.length] ?? [0, 0];
    const length = Math.hypot(nextX - x, nextY - y);
    if (length === 0) return;
    const ux = (nextX - x) / length;
    const uy = (nextY - y) / length;
    const along = range(hull, ux, uy);
    const across = range(hull, -uy, ux);
    const a = along[1] - along[0];
    const b = across[1] - across[0];
    if (a * b >= least) return;
    least = a * b;
    best = a >= b ? { ux, uy, along, across } : { ux: -uy, uy: ux, along: across, across: range(hull, -ux, -uy) };
  });
  return best;
}

function range(points: readonly Point[], ux: number, uy: number): readonly [number, number] {
  let low = Infinity;
  let high = -Infinity;
  for (const [x, y] of points) {
    const at = x * ux + y * uy;
    if (at < low) low = at;
    if (at > high) high = at;
  }
  return [low, high];
}

/** What lies between the outline and each edge of its hull: the chain of the outline from one end of the edge to the other. */
function pocketsOf(ring: readonly Point[], hull: readonly Point[]): readonly (readonly Point[])[] {
  const outline = signedArea(ring) < 0 ? [...ring].reverse() : ring;
  const onHull = new Set(hull.map(([x, y]) => `${String(x)} ${String(y)}`));
  const isOnHull = ([x, y]: Point): boolean => onHull.has(`${String(x)} ${String(y)}`);
  const first = outline.findIndex(isOnHull);
  const pockets: Point[][] = [];
  let chain: Point[] = [];
  for (let step = 0; step <= outline.length; step += 1) {
    const point = outline[(first + step) % outline.length]!;
    chain.push(point);
    if (step === 0 || !isOnHull(point)) continue;
    if (chain.length > 2) pockets.push(chain);
    chain = [point];
  }
  return pockets;
}

/** Of a corner of a pocket that turns inwards: the lesser of its two projections, as a share; 0 for other corners and mere dents. */
function projectionAt(
  pocket: readonly Point[],
  at: number,
  { ux, uy, along, across }: Rectangle,
  depth: number,
): number {
  const [ax, ay] = pocket[at - 1]!;
  const [x, y] = pocket[at]!;
  const [bx, by] = pocket[at + 1]!;
  if ((x - ax) * (by - y) - (bx - x) * (y - ay) >= 0) return 0;
  const [fromX, fromY] = pocket[0]!;
  const [toX, toY] = pocket.at(-1)!;
  const chord = Math.hypot(toX - fromX, toY - fromY);
  if (!(Math.abs((toX - fromX) * (y - fromY) - (x - fromX) * (toY - fromY)) / chord >= depth)) return 0;
  // the sum of the unit vectors to both neighbours points to the open side
  const a = Math.hypot(ax - x, ay - y);
  const b = Math.hypot(bx - x, by - y);
  const outX = (ax - x) / a + (bx - x) / b;
  const outY = (ay - y) / a + (by - y) / b;
  return Math.min(
    beyond(x * ux + y * uy, outX * ux + outY * uy, along),
    beyond(y * ux - x * uy, outY * ux - outX * uy, across),
  );
}

/** Distance from `at` to the end of the range on the open side, as a share; to the nearer end where neither side is the open one. */
function beyond(at: number, open: number, [low, high]: readonly [number, number]): number {
  const up = (high - at) / (high - low);
  if (Math.abs(open) < 1e-6) return Math.min(up, 1 - up);
  return open > 0 ? up : 1 - up;
}

/** Corners of the hull, counter-clockwise. */
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

/**
 * Gaps between footprints, in metres on the ground. Neighbours are found through a grid of cells, so that the work grows with the number
 * of footprints, not with its square. Each gap is measured on a plane that touches the ground at the first of the two buildings: over
 * 200 m the scale is off by less than 200/6,371,000 × tan(latitude), 0.1 mm in a gap of a metre at 60°.
 */
import { groundScale, readRings } from './footprint.js';
import type { Point } from './plan-shape.js';

export interface Gap {
  /** Places of the two in the list, the lesser first. */
  readonly a: number;
  readonly b: number;
  /** 0 where they touch or overlap. */
  readonly gap_m: number;
}

/** The wider a cell, the fewer cells a building covers and the more buildings share one [judgement]. */
const CELL_M = 40;
/** An outline longer than this is no building, and would fill cells without end. */
const LONGEST_M = 2000;

/** A degree to the north differs by 1 % between equator and pole. */
const MARGIN = 1.02;
/** So near the poles degrees of longitude mean nothing. */
const MOST_STRETCH = 100;

interface Box {
  readonly west: number;
  readonly east: number;
  readonly south: number;
  readonly north: number;
}

/** Every pair of footprints (WKT polygons in degrees; null: none) no further apart than `reach_m`, in order of their places. */
export function gapsWithin(footprints: readonly (string | null)[], reach_m: number): readonly Gap[] {
  const rings = footprints.map((text) => (text === null ? undefined : readRings(text)?.[0]));
  const boxes = rings.map((ring) => {
    const box = ring === undefined ? undefined : boxOf(ring);
    return box !== undefined && isBuilding(box) ? box : undefined;
  });
  const found = boxes.filter((box) => box !== undefined);
  if (found.length < 2) return [];
  // cells need no exact ground: one scale for all, and the reach is widened where a degree is shorter than in the middle
  const { east_m, north_m } = groundScale(found.reduce((sum, { south }) => sum + south, 0) / found.length);
  const cells = new Map<string, number[]>();
  const cellsOf = ({ west, east, south, north }: Box, margin_m: number): readonly [number, number, number, number] => [
    Math.floor((west * east_m - margin_m) / CELL_M),
    Math.floor((east * east_m + margin_m) / CELL_M),
    Math.floor((south * north_m - margin_m) / CELL_M),
    Math.floor((north * north_m + margin_m) / CELL_M),
  ];
  const gaps: Gap[] = [];
  boxes.forEach((box, b) => {
    if (box === undefined) return;
    const near = new Set<number>();
    const stretch = MARGIN * Math.min(MOST_STRETCH, Math.max(1, east_m / groundScale(box.south).east_m));
    const [x0, x1, y0, y1] = cellsOf(box, reach_m * stretch);
    for (let x = x0; x <= x1; x += 1)
      for (let y = y0; y <= y1; y += 1) for (const a of cells.get(`${String(x)} ${String(y)}`) ?? []) near.add(a);
    for (const a of [...near].sort((one, other) => one - other)) {
      const gap_m = gapBetween(rings[a]!, rings[b]!, reach_m);
      if (gap_m <= reach_m) gaps.push({ a, b, gap_m });
    }
    const [u0, u1, v0, v1] = cellsOf(box, 0);
    for (let x = u0; x <= u1; x += 1)
      for (let y = v0; y <= v1; y += 1) {
        const key = `${String(x)} ${String(y)}`;
        const list = cells.get(key);
        if (list === undefined) cells.set(key, [b]);
        else list.push(b);
      }
  });
  return gaps.sort((one, other) => one.a - other.a || one.b - other.b);
}

function isBuilding({ west, east, south, north }: Box): boolean {
  if (!(west >= -180 && east <= 180 && south >= -90 && north <= 90)) return false;
  const { east_m, north_m } = groundScale(0);
  return (east - west) * east_m <= LONGEST_M && (north - south) * north_m <= LONGEST_M;
}

function boxOf(ring: readonly Point[]): Box {
  const box = { west: Infinity, east: -Infinity, south: Infinity, north: -Infinity };
  for (const [x, y] of ring) {
    box.west = Math.min(box.west, x);
    box.east = Math.max(box.east, x);
    box.south = Math.min(box.south, y);
    box.north = Math.max(box.north, y);
  }
  return box;
}

/** Gap between two rings in degrees; Infinity where their boxes are further apart than `reach_m`. */
function gapBetween(first: readonly Point[], second: readonly Point[], reach_m: number): number {
  const [lon, lat] = first[0]!;
  const { east_m, north_m } = groundScale(lat);
  const flat = (ring: readonly Point[]): readonly Point[] =>
    ring.map(([x, y]): Point => [(x - lon) * east_m, (y - lat) * north_m]);
  const a = flat(first);
  const b = flat(second);
  const [p, q] = [boxOf(a), boxOf(b)];
  if (Math.max(p.west - q.east, q.west - p.east, p.south - q.north, q.south - p.north) > reach_m) return Infinity;
  if (isInside(a[0]!, b) || isInside(b[0]!, a)) return 0;
  let least = Infinity;
  for (let i = 0; i < a.length; i += 1) {
    const a1 = a[i]!;
    const a2 = a[(i + 1) % a.length]!;
    for (let j = 0; j < b.length; j += 1) {
      const b1 = b[j]!;
      const b2 = b[(j + 1) % b.length]!;
      if (isCrossing(a1, a2, b1, b2)) return 0;
      least = Math.min(least, toSegment(a1, b1, b2), toSegment(b1, a1, a2));
    }
  }
  return least;
}

function toSegment([x, y]: Point, [ax, ay]: Point, [bx, by]: Point): number {
  const dx = bx - ax;
  const dy = by - ay;
  const square = dx * dx + dy * dy;
  const t = square === 0 ? 0 : Math.max(0, Math.min(1, ((x - ax) * dx + (y - ay) * dy) / square));
  return Math.hypot(x - ax - t * dx, y - ay - t * dy);
}

function side([ax, ay]: Point, [bx, by]: Point, [x, y]: Point): number {
  return (bx - ax) * (y - ay) - (by - ay) * (x - ax);
}

function isCrossing(a1: Point, a2: Point, b1: Point, b2: Point): boolean {
  return side(a1, a2, b1) * side(a1, a2, b2) < 0 && side(b1, b2, a1) * side(b1, b2, a2) < 0;
}

function isInside([x, y]: Point, ring: readonly Point[]): boolean {
  let inside = false;
  ring.forEach(([ax, ay], i) => {
    const [bx, by] = ring[(i + 1) % ring.length]!;
    if (ay > y !== by > y && x < ax + ((y - ay) / (by - ay)) * (bx - ax)) inside = !inside;
  });
  return inside;
}

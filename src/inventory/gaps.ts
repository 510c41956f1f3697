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

export interface Measured {
  /** In the order of their places. */
  readonly gaps: readonly Gap[];
  /** False where so many outlines overlap that the work was broken off: pairs are missing. */
  readonly complete: boolean;
  /** Pairs passed over because both have one and the same outline: a parcel or a building told twice has no gap to itself. */
  readonly alike: number;
}

export interface MeasureOptions {
  /** Pairs count only where one of the two is wanted; all are when left out. */
  readonly wanted?: (place: number) => boolean;
  /** Work allowed: about one for each pair of walls compared, 20 ns. */
  readonly steps?: number;
}

/** Work of looking a neighbour up in a cell, in walls compared. */
const LOOK = 8;

/** Every pair of footprints (WKT polygons in degrees; null: none) no further apart than `reach_m`, in order of their places. */
export function gapsWithin(footprints: readonly (string | null)[], reach_m: number): readonly Gap[] {
  return measureGaps(footprints, reach_m).gaps;
}

/** The same, with what was left out. */
export function measureGaps(
  footprints: readonly (string | null)[],
  reach_m: number,
  { wanted = () => true, steps = Infinity }: MeasureOptions = {},
): Measured {
  const rings = footprints.map((text) => (text === null ? undefined : readRings(text)?.[0]));
  const boxes = rings.map((ring) => {
    const box = ring === undefined ? undefined : boxOf(ring);
    return box !== undefined && isBuilding(box) ? box : undefined;
  });
  const found = boxes.filter((box) => box !== undefined);
  if (found.length < 2) return { gaps: [], complete: true, alike: 0 };
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
  let left = steps;
  let alike = 0;
  for (let b = 0; b < boxes.length && left > 0; b += 1) {
    const box = boxes[b];
    if (box === undefined) continue;
    const near = new Set<number>();
    const stretch = MARGIN * Math.min(MOST_STRETCH, Math.max(1, east_m / groundScale(box.south).east_m));
    const [x0, x1, y0, y1] = cellsOf(box, reach_m * stretch);
    const isWanted = wanted(b);
    for (let x = x0; x <= x1; x += 1)
      for (let y = y0; y <= y1; y += 1) {
        const list = cells.get(`${String(x)} ${String(y)}`) ?? [];
        left -= LOOK * (1 + list.length);
        for (const a of list) if (isWanted || wanted(a)) near.add(a);
      }
    for (const a of [...near].sort((one, other) => one - other)) {
      if (footprints[a] === footprints[b]) {
        alike += 1;
        continue;
      }
      if (left <= 0) break;
      const { gap_m, work } = gapBetween(rings[a]!, rings[b]!, reach_m);
      left -= work;
      if (gap_m <= reach_m) gaps.push({ a, b, gap_m });
    }
    const [u0, u1, v0, v1] = cellsOf(box, 0);
    for (let x = u0; x <= u1; x += 1)
      for (let y = v0; y <= v1; y += 1) {
        const key = `${String(x)} ${String(y)}`;
        const list = cells.get(key);
        if (list === undefined) cells.set(key, [b]);
        else list.push(b);
        left -= LOOK;
      }
  }
  return { gaps: gaps.sort((one, other) => one.a - other.a || one.b - other.b), complete: left > 0, alike };
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

interface Between {
  readonly gap_m: number;
  /** Walls compared. */
  readonly work: number;
}

/** Gap between two rings in degrees; Infinity where they are further apart than `reach_m`. */
function gapBetween(first: readonly Point[], second: readonly Point[], reach_m: number): Between {
  const [lon, lat] = first[0]!;
  const { east_m, north_m } = groundScale(lat);
  const flat = (ring: readonly Point[]): readonly Point[] =>
    ring.map(([x, y]): Point => [(x - lon) * east_m, (y - lat) * north_m]);
  const a = flat(first);
  const b = flat(second);
  const [p, q] = [boxOf(a), boxOf(b)];
  const work = a.length + b.length;
  if (Math.max(p.west - q.east, q.west - p.east, p.south - q.north, q.south - p.north) > reach_m)
    return { gap_m: Infinity, work };
  if (isInside(a[0]!, b) || isInside(b[0]!, a)) return { gap_m: 0, work };
  // what comes within reach lies within the other's box widened by it
  const ofA = wallsWithin(a, q, reach_m);
  const ofB = wallsWithin(b, p, reach_m);
  let least = Infinity;
  for (const i of ofA) {
    const a1 = a[i]!;
    const a2 = a[(i + 1) % a.length]!;
    for (const j of ofB) {
      const b1 = b[j]!;
      const b2 = b[(j + 1) % b.length]!;
      if (isCrossing(a1, a2, b1, b2)) return { gap_m: 0, work: work + ofA.length * ofB.length };
      least = Math.min(
        least,
        toSegment(a1, b1, b2),
        toSegment(a2, b1, b2),
        toSegment(b1, a1, a2),
        toSegment(b2, a1, a2),
      );
    }
  }
  return { gap_m: least, work: work + ofA.length * ofB.length };
}

/** Which walls of a ring, by their first corner, touch a box widened by `margin_m`. */
function wallsWithin(ring: readonly Point[], { west, east, south, north }: Box, margin_m: number): readonly number[] {
  const walls: number[] = [];
  for (let i = 0; i < ring.length; i += 1) {
    const [ax, ay] = ring[i]!;
    const [bx, by] = ring[(i + 1) % ring.length]!;
    if (
      Math.max(ax, bx) >= west - margin_m &&
      Math.min(ax, bx) <= east + margin_m &&
      Math.max(ay, by) >= south - margin_m &&
      Math.min(ay, by) <= north + margin_m
    )
      walls.push(i);
  }
  return walls;
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

/**
 * Gaps between footprints, in metres on the ground. Neighbours are found through a grid of cells, so that the work grows with the number
 * of footprints, not with its square. Each gap is measured on a plane that touches the ground at the first of the two buildings: over
 * 200 m the scale is off by less than 200/6,371,000 × tan(latitude), 0.1 mm in a gap of a metre at 60°. A building in the courtyard of another
 * stands as far from it as from the courtyard's walls.
 */
import { groundScale } from './footprint.js';
import { readOutlines } from './outline-text.js';
import type { Rings } from './outline-text.js';
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

/** Every pair of footprints (WKT, one polygon or several, in degrees; null: none) no further apart than `reach_m`, in order of their places. */
export function gapsWithin(footprints: readonly (string | null)[], reach_m: number): readonly Gap[] {
  return measureGaps(footprints, reach_m).gaps;
}

/** The same, with what was left out. */
export function measureGaps(
  footprints: readonly (string | null)[],
  reach_m: number,
  { wanted = () => true, steps = Infinity }: MeasureOptions = {},
): Measured {
  // Each outline of a building stands in the grid by itself: they may lie far apart.
  const parts = footprints.map((text, of) => (text === null ? [] : partsOf(text, of)));
  const found = parts.flat();
  if (parts.filter((list) => list.length > 0).length < 2) return { gaps: [], complete: true, alike: 0 };
  // cells need no exact ground: one scale for all, and the reach is widened where a degree is shorter than in the middle
  const { east_m, north_m } = groundScale(found.reduce((sum, { box }) => sum + box.south, 0) / found.length);
  const cells = new Map<string, Part[]>();
  const cellsOf = ({ west, east, south, north }: Box, margin_m: number): readonly [number, number, number, number] => [
    Math.floor((west * east_m - margin_m) / CELL_M),
    Math.floor((east * east_m + margin_m) / CELL_M),
    Math.floor((south * north_m - margin_m) / CELL_M),
    Math.floor((north * north_m + margin_m) / CELL_M),
  ];
  const gaps: Gap[] = [];
  let left = steps;
  let alike = 0;
  for (let b = 0; b < parts.length && left > 0; b += 1) {
    const own = parts[b]!;
    const isWanted = wanted(b);
    const nearest = new Map<number, number>();
    const same = new Set<number>();
    let broken = false;
    for (const part of own) {
      if (broken) break;
      const near = new Set<Part>();
      const stretch = MARGIN * Math.min(MOST_STRETCH, Math.max(1, east_m / groundScale(part.box.south).east_m));
      const [x0, x1, y0, y1] = cellsOf(part.box, reach_m * stretch);
      for (let x = x0; x <= x1; x += 1)
        for (let y = y0; y <= y1; y += 1) {
          const list = cells.get(`${String(x)} ${String(y)}`) ?? [];
          left -= LOOK * (1 + list.length);
          for (const other of list) if (isWanted || wanted(other.of)) near.add(other);
        }
      for (const other of near) {
        if (footprints[other.of] === footprints[b]) {
          same.add(other.of);
          continue;
        }
        broken = left <= 0;
        if (broken) break;
        const { gap_m, work } = gapBetween(other.rings, part.rings, reach_m);
        left -= work;
        if (gap_m <= reach_m) nearest.set(other.of, Math.min(gap_m, nearest.get(other.of) ?? Infinity));
      }
    }
    alike += same.size;
    // Of a pair whose outlines were not all compared the nearest may be missing.
    if (!broken) for (const [a, gap_m] of nearest) gaps.push({ a, b, gap_m });
    for (const part of own) {
      const [u0, u1, v0, v1] = cellsOf(part.box, 0);
      for (let x = u0; x <= u1; x += 1)
        for (let y = v0; y <= v1; y += 1) {
          const key = `${String(x)} ${String(y)}`;
          const list = cells.get(key);
          if (list === undefined) cells.set(key, [part]);
          else list.push(part);
          left -= LOOK;
        }
    }
  }
  return { gaps: gaps.sort((one, other) => one.a - other.a || one.b - other.b), complete: left > 0, alike };
}

/** One outline of a building. */
interface Part {
  /** Place of the building in the list. */
  readonly of: number;
  readonly rings: Rings;
  readonly box: Box;
}

function partsOf(text: string, of: number): readonly Part[] {
  const outlines = readOutlines(text) ?? [];
  return outlines.map((rings) => ({ of, rings, box: boxOf(rings[0]!) })).filter(({ box }) => isBuilding(box));
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

/** Gap between two outlines in degrees, courtyards open; Infinity where they are further apart than `reach_m`. */
function gapBetween(first: Rings, second: Rings, reach_m: number): Between {
  const [lon, lat] = first[0]![0]!;
  const { east_m, north_m } = groundScale(lat);
  const flat = (rings: Rings): Rings =>
    rings.map((ring) => ring.map(([x, y]): Point => [(x - lon) * east_m, (y - lat) * north_m]));
  const a = flat(first);
  const b = flat(second);
  const [p, q] = [boxOf(a[0]!), boxOf(b[0]!)];
  const work = cornersOf(a) + cornersOf(b);
  if (Math.max(p.west - q.east, q.west - p.east, p.south - q.north, q.south - p.north) > reach_m)
    return { gap_m: Infinity, work };
  // Where no wall crosses another, one corner of the outer ring tells for all of them on which side of the other's walls they lie.
  if (isBuilt(a[0]![0]!, b) || isBuilt(b[0]![0]!, a)) return { gap_m: 0, work };
  // what comes within reach lies within the other's box widened by it
  const ofA = wallsWithin(a, q, reach_m);
  const ofB = wallsWithin(b, p, reach_m);
  let least = Infinity;
  for (const [a1, a2] of ofA)
    for (const [b1, b2] of ofB) {
      if (isCrossing(a1, a2, b1, b2)) return { gap_m: 0, work: work + ofA.length * ofB.length };
      least = Math.min(
        least,
        toSegment(a1, b1, b2),
        toSegment(a2, b1, b2),
        toSegment(b1, a1, a2),
        toSegment(b2, a1, a2),
      );
    }
  return { gap_m: least, work: work + ofA.length * ofB.length };
}

function cornersOf(rings: Rings): number {
  return rings.reduce((sum, ring) => sum + ring.length, 0);
}

/** The walls, those around courtyards too, that touch a box widened by `margin_m`. */
function wallsWithin(
  rings: Rings,
  { west, east, south, north }: Box,
  margin_m: number,
): readonly (readonly [Point, Point])[] {
  const walls: (readonly [Point, Point])[] = [];
  for (const ring of rings)
    for (let i = 0; i < ring.length; i += 1) {
      const from = ring[i]!;
      const to = ring[(i + 1) % ring.length]!;
      const [ax, ay] = from;
      const [bx, by] = to;
      if (
        Math.max(ax, bx) >= west - margin_m &&
        Math.min(ax, bx) <= east + margin_m &&
        Math.max(ay, by) >= south - margin_m &&
        Math.min(ay, by) <= north + margin_m
      )
        walls.push([from, to]);
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

/** Inside the outer ring and in no courtyard. */
function isBuilt(point: Point, [outer, ...courtyards]: Rings): boolean {
  return isInside(point, outer!) && !courtyards.some((ring) => isInside(point, ring));
}

function isInside([x, y]: Point, ring: readonly Point[]): boolean {
  let inside = false;
  ring.forEach(([ax, ay], i) => {
    const [bx, by] = ring[(i + 1) % ring.length]!;
    if (ay > y !== by > y && x < ax + ((y - ay) / (by - ay)) * (bx - ax)) inside = !inside;
  });
  return inside;
}

// Puts each quarter's lots along streets: four rows a quarter, two streets, backs to backs, then turns the quarter about its corner.
import { roundTo } from './random.mjs';

const origin = { lon: -40.02, lat: 35.01 };
const metresPerDegree = { lon: 91290, lat: 110940 }; // fixed, near this latitude: no cosine, so no rounding differences
const streetWidth = 13;
const rowDepth = 36;
const backYard = 6;
const tierTop = [0, 262, 520];

const toLonLat = ([x, y]) => [origin.lon + x / metresPerDegree.lon, origin.lat + y / metresPerDegree.lat];
const coordinate = (value) => value.toFixed(8);

/** Gap in metres between two lots that follow each other along a street. */
function gapBetween(random, before, after) {
  if (before === undefined) return 0;
  if (after.mainOf !== undefined) return roundTo(random.between(0.02, 0.1), 2);
  if (before.gap === 'campus' || after.gap === 'campus') return roundTo(random.between(7, 15), 1);
  if (before.gap === 'open' || after.gap === 'open') return roundTo(random.between(2.2, 6.5), 1);
  if (before.gap === 'shared' && after.gap === 'shared') return random.chance(0.55) ? 0 : roundTo(random.between(0.02, 0.08), 2);
  return random.chance(0.8) ? roundTo(random.between(0.02, 0.15), 2) : roundTo(random.between(0.3, 1.4), 1);
}

/** Corners in metres of a lot's outline; an L loses its far right corner, so the street front stays whole. */
function corners(lot, x, front, up) {
  const far = front + up * lot.depth;
  if (lot.notch === undefined) return [[x, front], [x + lot.width, front], [x + lot.width, far], [x, far]];
  const inX = x + lot.width - lot.notch.width;
  const inY = far - up * lot.notch.depth;
  return [[x, front], [x + lot.width, front], [x + lot.width, inY], [inX, inY], [inX, far], [x, far]];
}

/** Groups a main building with its wings, so that a row never breaks between them. */
function groups(lots) {
  const out = [];
  for (const lot of lots) {
    if (lot.mainOf !== undefined) out[out.length - 1].push(lot);
    else out.push([lot]);
  }
  return out;
}

/**
 * Places every lot: sets lon, lat, outline, street, number, shape (metres).
 * Returns the neighbouring pairs nearer than 3 m.
 */
export function layOut(random, quarters) {
  const pairs = [];
  const tierX = [0, 30, 70];
  for (const quarter of quarters) {
    const [cos, sin] = quarter.turn;
    let total = 0;
    for (const lot of quarter.lots) total += lot.width + 4;
    const limit = total / 4 + 12;
    const height = 4 * rowDepth + 2 * streetWidth + backYard;
    const originX = tierX[quarter.tier] + (sin > 0 ? height * sin : 0);
    const originY = tierTop[quarter.tier] + (sin < 0 ? -limit * sin * 1.2 : 0);
    const turn = ([x, y]) => [originX + x * cos - y * sin, originY + x * sin + y * cos];
    let row = 0;
    let x = 0;
    let widest = 0;
    let before;
    const numbers = [1, 2, 1, 2];
    for (const group of groups(quarter.lots)) {
      let need = 0;
      for (const lot of group) need += lot.width;
      if (row < 3 && x + need > limit + 10) {
        row += 1;
        x = 0;
        before = undefined;
      }
      for (const lot of group) {
        const gap = gapBetween(random, before, lot);
        x += gap;
        const street = row < 2 ? 0 : 1;
        const north = row % 2 === 1;
        const base = street * (2 * rowDepth + streetWidth + backYard) + rowDepth;
        lot.shape = corners(lot, x, north ? base + streetWidth : base, north ? 1 : -1).map(turn);
        const centre = turn([x + lot.width / 2, (north ? base + streetWidth : base) + ((north ? 1 : -1) * lot.depth) / 2]);
        const ring = lot.shape.map(toLonLat);
        lot.outline = `POLYGON ((${[...ring, ring[0]].map((p) => p.map(coordinate).join(' ')).join(', ')}))`;
        [lot.lon, lot.lat] = toLonLat(centre);
        lot.street = quarter.streets[street];
        lot.number = numbers[row];
        if (lot.mainOf === undefined) numbers[row] += 2;
        else lot.number = lot.mainOf.number;
        if (before !== undefined && gap < 3 && before.kind !== 'yard' && lot.kind !== 'yard') pairs.push({ a: before, b: lot, gap_m: gap });
        x += lot.width;
        before = lot;
      }
      if (x > widest) widest = x;
    }
    tierX[quarter.tier] += widest * cos + height * (sin < 0 ? -sin : sin) + 22;
  }
  return pairs;
}

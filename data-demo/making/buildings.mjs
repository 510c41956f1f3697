// Draws the lots of every quarter: what each building truly is, before the owner's file forgets or mistypes any of it.
import { roundTo } from './random.mjs';
import { kinds, storeyHeights } from './stock.mjs';
import { properNames } from './places.mjs';

const tallSkew = (random, low, high) => low + Math.floor((high - low + 1 - 1e-9) * random.next() * Math.sqrt(random.next()));

function systemFor(random, kind, year, storeys) {
  const fitting = kind.systems.filter(([from, to, least, most]) => year >= from && year <= to && storeys >= least && storeys <= most);
  return fitting.length === 0 ? undefined : random.weighted(fitting.map(([, , , , system, weight]) => [system, weight]));
}

/** Year, storeys and structure that go together: drawn again until the kind has a structure for them. */
function drawFacts(random, kind) {
  for (;;) {
    const year = random.whole(kind.years[0], kind.years[1]);
    const storeys = kind.storeys[1] > 6 ? tallSkew(random, kind.storeys[0], kind.storeys[1]) : random.whole(kind.storeys[0], kind.storeys[1]);
    const system = systemFor(random, kind, year, storeys);
    if (system !== undefined) return { year, storeys, system };
  }
}

function dimensions(random, lot) {
  const floor = storeyHeights[lot.use] * (1 + 0.06 * random.normal());
  lot.floorHeight = floor;
  lot.groundHeight = lot.openFront || lot.use === 'offices' ? floor + random.between(0.5, 1.3) : floor;
  if (lot.kind === 'chapel') lot.groundHeight = random.between(8, 12);
  lot.height = roundTo(lot.groundHeight + floor * (lot.storeys - 1) + (lot.use === 'house' ? 1.1 : 0.6), 1);
  let plate = lot.width * lot.depth;
  if (lot.notch !== undefined) plate -= lot.notch.width * lot.notch.depth;
  lot.plate = plate;
  lot.area = Math.round((plate * lot.storeys * 0.96) / 10) * 10;
}

function notchFor(random, lot) {
  if (lot.width < 20 || !random.chance(0.2)) return undefined;
  return { width: roundTo(lot.width * random.between(0.35, 0.5), 1), depth: roundTo(lot.depth * random.between(0.35, 0.5), 1) };
}

function drawLot(random, quarter, key) {
  if (key === 'yard') return { kind: 'yard', use: 'open yard', quarter, width: roundTo(random.between(20, 30), 1), depth: roundTo(random.between(20, 30), 1), gap: 'open' };
  const kind = kinds[key];
  const lot = { kind: key, use: kind.use, quarter, gap: kind.gap, ...drawFacts(random, kind) };
  lot.width = roundTo(random.between(kind.width[0], kind.width[1]), 1);
  lot.depth = roundTo(random.between(kind.depth[0], kind.depth[1]), 1);
  // A tower keeps a plan that its height can stand on.
  if (lot.storeys > 9 && lot.width < 22) lot.width = 22;
  lot.notch = notchFor(random, lot);
  lot.openFront = random.chance(kind.openFront ?? 0);
  lot.basements = lot.storeys > 7 ? random.whole(1, 3) : random.chance(0.22) && !['house', 'store house', 'works'].includes(lot.use) ? 1 : 0;
  dimensions(random, lot);
  return lot;
}

function drawWing(random, main) {
  const later = main.year < 1950 ? random.whole(1953, 1975) : Math.min(main.year + random.whole(8, 24), 2021);
  const source = later < 1986 ? kinds.teaching : kinds.newScience;
  let facts;
  do {
    const storeys = random.whole(3, Math.max(3, main.storeys));
    facts = { year: later, storeys, system: systemFor(random, source, later, storeys) };
  } while (facts.system === undefined);
  const wing = { kind: 'wing', use: main.use, quarter: main.quarter, gap: 'campus', mainOf: main, ...facts, openFront: false, basements: 0 };
  wing.width = roundTo(random.between(14, 24), 1);
  wing.depth = roundTo(random.between(12, Math.max(13, main.depth - 2)), 1);
  dimensions(random, wing);
  return wing;
}

function nameLots(quarters) {
  const used = {};
  for (const quarter of quarters) {
    for (const lot of quarter.lots) {
      if (lot.mainOf !== undefined) continue;
      const list = properNames[lot.kind] ?? [];
      const at = used[lot.kind] ?? 0;
      used[lot.kind] = at + 1;
      lot.name = list[at];
    }
  }
}

/** Fills quarter.lots for every quarter, in street order, wings directly after their main building. */
export function drawBuildings(random, quarters) {
  for (const quarter of quarters) {
    const keys = [];
    for (const key of Object.keys(quarter.stock)) for (let i = 0; i < quarter.stock[key]; i += 1) keys.push(key);
    quarter.lots = [];
    for (const key of random.shuffle(keys)) {
      const lot = drawLot(random, quarter, key);
      quarter.lots.push(lot);
      if (random.chance(kinds[key]?.wing ?? 0)) quarter.lots.push(drawWing(random, lot));
    }
  }
  nameLots(quarters);
}

// What an engineer once measured or calculated: periods, storey stiffness, weights, coefficients, finished assessments.
import { fifthRoot, roundTo } from './random.mjs';

const isFrame = (system) => system.endsWith('moment-frame') || system === 'precast-concrete-frame';
const isSteel = (system) => system.startsWith('steel');
const isTimber = (system) => system.startsWith('timber');

/** Seismic weight per square metre of floor, kN/m2, typical of the structure. */
export function unitWeight(random, system) {
  const [low, high] = isTimber(system) ? [3.4, 4.8] : system === 'steel-light-frame' ? [3.2, 4.4] : isSteel(system) ? [7.2, 8.8] : system.includes('masonry') ? [11.5, 13.8] : [10.4, 12.4];
  return roundTo(random.between(low, high), 1);
}

/** Period near the usual height formula, s, before scatter: 0.05 H^0.9 concrete frames, 0.09 H^0.8 steel frames, 0.05 H^0.75 the rest. */
function formulaPeriod(system, height_m) {
  const fifth = fifthRoot(height_m);
  const root = Math.sqrt(height_m);
  if (system === 'steel-moment-frame') return 0.09 * fifth * fifth * fifth * fifth;
  if (system === 'concrete-moment-frame' || system === 'precast-concrete-frame') return 0.05 * fifth * fifth * fifth * fifth * Math.sqrt(fifth);
  return 0.05 * root * Math.sqrt(root);
}

function measurePeriods(random, lot, strong) {
  const base = formulaPeriod(lot.system, lot.height) * (1 + 0.25 * 0.8 * random.normal());
  // Small vibrations find a stiffer building than strong shaking does.
  const seen = strong ? base : base / 1.25;
  lot.periodLong = roundTo(seen, 2);
  lot.periodAcross = roundTo(seen * random.between(0.85, 1.2), 2);
  lot.amplitude = strong ? 'strong' : random.chance(0.15) ? 'forced' : 'ambient';
}

function stiffnessList(random, lot, softer) {
  const ratio = isSteel(lot.system) && isFrame(lot.system) ? random.between(900, 1500) : isFrame(lot.system) || lot.system === 'concrete-infilled-frame' ? random.between(1700, 2500) : random.between(3300, 5600);
  const mass_t = (lot.unitWeight * lot.plate * 0.96) / 9.81;
  const typical = ratio * mass_t * softer;
  const list = [];
  for (let i = 0; i < lot.storeys; i += 1) list.push(Math.round((typical * (1 - (0.25 * i) / lot.storeys)) / 1000) * 1000);
  if (lot.openFront) {
    const h = lot.floorHeight / lot.groundHeight;
    list[0] = Math.round((typical * (isFrame(lot.system) ? h * h * h : h * 0.7)) / 1000) * 1000;
  }
  return list;
}

function giveStiffness(random, lot) {
  lot.unitWeight = unitWeight(random, lot.system);
  const uniform = !lot.openFront && random.chance(0.35);
  const along = stiffnessList(random, lot, 1);
  const across = stiffnessList(random, lot, random.between(0.75, 1.1));
  lot.stiffnessLong = uniform ? `${along[0]}` : along.join(';');
  lot.stiffnessAcross = uniform ? `${across[0]}` : across.join(';');
  lot.keepFacts = true; // a stiffness without height, storeys and area would be of no use
}

function giveCoefficient(random, lot) {
  const [low, high, level] = lot.year < 1976 ? [0.05, 0.09, 'working'] : lot.year < 2000 ? [0.07, 0.12, 'working'] : [0.09, 0.14, 'strength'];
  lot.coefficient = roundTo(random.between(low, high), 3);
  lot.coefficientLevel = level;
}

const taller = (system, least, most) => (lot) => lot.system === system && lot.storeys >= least && lot.storeys <= most;

/** Adds the rare columns to some of the buildings. */
export function addBehaviour(random, lots) {
  const buildings = lots.filter((lot) => lot.kind !== 'yard');
  const take = (count, test) => random.shuffle(buildings.filter(test)).slice(0, count);
  const frames = [...take(7, taller('concrete-moment-frame', 3, 10)), ...take(4, taller('steel-moment-frame', 3, 10)), ...take(3, taller('concrete-infilled-frame', 3, 8))];
  const walls = [...take(4, taller('concrete-shear-wall', 3, 10)), ...take(3, taller('reinforced-masonry-wall', 1, 4)), ...take(2, (lot) => lot.system === 'unreinforced-masonry-wall' && lot.storeys > 2)];
  for (const lot of [...frames, ...walls, ...take(2, (lot) => lot.openFront && lot.storeys > 2 && isFrame(lot.system))]) giveStiffness(random, lot);
  for (const lot of take(26, (lot) => lot.storeys >= 3)) measurePeriods(random, lot, false);
  for (const lot of take(7, (lot) => lot.storeys >= 4 && lot.periodLong === undefined)) measurePeriods(random, lot, true);
  for (const lot of take(10, (lot) => lot.year >= 1954 && lot.storeys >= 3)) giveCoefficient(random, lot);
  for (const lot of take(18, (lot) => lot.unitWeight === undefined)) lot.unitWeight = unitWeight(random, lot.system);
  for (const lot of take(6, (lot) => lot.storeys >= 3 && lot.unitWeight === undefined)) {
    lot.weight = Math.round((unitWeight(random, lot.system) * lot.area) / 100) * 100;
  }
  for (const lot of take(6, (lot) => lot.year < 1976)) {
    lot.state = 'assessment done';
    lot.capacity = roundTo(random.between(0.16, 0.55), 2);
  }
  for (const lot of take(4, (lot) => lot.year < 1990 && lot.state === undefined)) lot.state = 'coming down';
  for (const lot of take(11, (lot) => lot.year < 1972 && lot.state === undefined)) {
    lot.strengthened = random.whole(1988, 2021);
    if (random.chance(0.4)) lot.retrofitShare = random.pick(['0.67', '0.8', '1.0']);
  }
  for (const lot of take(7, () => true)) lot.vs30 = lot.quarter.ground === 'fill' ? random.whole(190, 280) : lot.quarter.ground === 'ridge rock' ? random.whole(790, 1050) : random.whole(390, 620);
  for (const lot of take(12, (lot) => lot.storeys >= 3)) lot.cost = random.whole(9, 46) * 1000;
}

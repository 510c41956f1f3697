// What drawings and old calculations told an engineer of some structures: columns, beams, walls, braces, infill, sway; and the ground's period.
// Drawn from a stream of its own after everything else, so that it moves no other cell. Buildings are named: each shows one thing.
import { fifthRoot, roundTo } from './random.mjs';

export const structureHeaders = [
  'Wall areas along (m2)', 'Wall areas across (m2)', 'Wall lengths along (m)', 'Wall lengths across (m)', 'Columns', 'Column across (mm)', 'Column along (mm)', 'Beam width (mm)', 'Beam depth (mm)', 'Bay (m)', 'Column feet',
  'Gravity sway along (mm)', 'Gravity sway across (mm)', 'Braces along (m2)', 'Braces across (m2)', 'Brick infill (in)', 'Infill along (m)', 'Infill across (m)', 'Concrete strength (psi)', 'Steel part of height', 'Ground period (s)',
];

/** Which asset shows what; `feet`, `psi` and `steelPart` are what its drawings say, `areasOnly` that they give no lengths of walls. */
export const showcase = [
  { id: 'BH-067', what: 'frame', feet: 'built in' },
  { id: 'BH-122', what: 'frame', psi: 2500, steelPart: 0.2 },
  { id: 'BH-123', what: 'frame', feet: 'built in' }, // tall ground storey, number of storeys not on record
  { id: 'BH-041', what: 'frame' }, // tall open ground storey, storey stiffness and a measured period besides
  { id: 'SC-010', what: 'frame', feet: 'built in' },
  { id: 'SC-020', what: 'frame', feet: 'free to turn' },
  { id: 'SC-014', what: 'frame', noBeams: true },
  { id: 'BH-054', what: 'frame', noBeams: true, feet: 'built in', bay: 7.6 },
  { id: 'SC-035', what: 'frame', bay: 7.4 }, // precast
  { id: 'SC-001', what: 'frame', psi: 3000, feet: 'built in' },
  { id: 'SC-037', what: 'frame', psi: 3000 },
  { id: 'SC-038', what: 'frame' },
  { id: 'BH-176', what: 'frame', dirt: 'column' },
  { id: 'BH-019', what: 'concrete walls', psi: 4000 },
  { id: 'SC-022', what: 'concrete walls', areasOnly: 'each' },
  { id: 'SC-023', what: 'block walls' },
  { id: 'BH-130', what: 'block walls' },
  { id: 'BH-115', what: 'brick walls' },
  { id: 'BH-016', what: 'brick walls', areasOnly: 'sum' },
  { id: 'BH-057', what: 'concrete walls', dirt: 'lists' },
  { id: 'BH-053', what: 'walls and frame', psi: 5000 },
  { id: 'BH-174', what: 'walls and frame', steelPart: 0.1 },
  { id: 'BH-031', what: 'braces' },
  { id: 'BH-068', what: 'braces' },
  { id: 'SC-030', what: 'braces' },
  { id: 'BH-036', what: 'infilled frame', psi: 2500 },
  { id: 'BH-148', what: 'infilled frame' },
  { id: 'BH-090', what: 'infilled frame' }, // open shop front: little infill along
  { id: 'SC-034', what: 'sway' },
  { id: 'BH-114', what: 'sway' },
  { id: 'SC-031', what: 'sway' },
];
const softBlock = 'Lantern Dock';

const to50 = (mm) => Math.round(mm / 50) * 50;
const lines = (side, bay) => Math.max(2, Math.round(side / bay) + 1);
const drawn = (count, make) => {
  const out = [];
  for (let i = 0; i < count; i += 1) out.push(make(i));
  return out;
};

/** Columns on a grid that fits the plan, thicker under more and higher storeys. Returns what the infill needs. */
function frame(random, lot, row, { bay: wanted, noBeams, feet }, slender = 0) {
  const bay = wanted ?? random.between(4.6, 5.8);
  const along = lines(lot.width, bay);
  const across = lines(lot.depth, bay);
  const side = to50(((430 + 30 * lot.storeys + (bay > 7 ? 50 : 0)) * lot.floorHeight) / 3.6 - slender + random.between(-40, 40));
  const flat = random.chance(0.35);
  row.Columns = `${along * across}`;
  row['Column across (mm)'] = `${flat ? side - 50 : side}`;
  row['Column along (mm)'] = `${flat ? side + 50 : side}`;
  const mean = roundTo((lot.width + lot.depth) / (along + across - 2), 1);
  row['Bay (m)'] = `${mean}`;
  if (noBeams !== true) {
    row['Beam width (mm)'] = `${random.pick([300, 300, 350])}`;
    row['Beam depth (mm)'] = `${to50(110 * bay + random.between(0, 80))}`;
  }
  if (feet !== undefined) row['Column feet'] = feet;
  return { along, across, clear: mean - side / 1000 };
}

function putWalls(row, direction, lengths, thickness, areasOnly) {
  const areas = lengths.map((length) => roundTo(length * thickness, 2));
  row[`Wall areas ${direction} (m2)`] = areasOnly === 'sum' ? `${roundTo(areas.reduce((sum, area) => sum + area, 0), 1)}` : areas.join(';');
  if (areasOnly === undefined) row[`Wall lengths ${direction} (m)`] = lengths.join(';');
}

/** Concrete walls round stairs and along gables: a few long ones, longer in taller buildings. */
function concreteWalls(random, lot, row, { areasOnly }, count = 5) {
  const thickness = lot.storeys > 9 ? 0.3 : lot.storeys > 6 ? 0.25 : 0.2;
  for (const [direction, side] of [['along', lot.width], ['across', lot.depth]]) {
    const usual = Math.min(0.42 * side, Math.max(3.6, lot.height / 3.6));
    putWalls(row, direction, drawn(count + random.whole(0, 1), () => roundTo(usual * random.between(0.8, 1.2), 1)), thickness, areasOnly);
  }
}

/** Block walls between the openings, 190 mm thick. */
function blockWalls(random, lot, row) {
  for (const direction of ['along', 'across']) {
    const metres = ((0.011 + 0.003 * lot.storeys) * lot.plate) / 0.19;
    const count = Math.max(4, Math.round(metres / 6.5));
    putWalls(row, direction, drawn(count, () => roundTo((metres / count) * random.between(0.75, 1.25), 1)), 0.19);
  }
}

/** Brick piers of the fronts along; gables and cross walls across. */
function brickWalls(random, lot, row, { areasOnly }) {
  const thickness = lot.storeys > 4 ? 0.45 : 0.34;
  const metres = ((0.03 + 0.008 * lot.storeys) * lot.plate) / thickness;
  const count = Math.round(metres / 2.8);
  const piers = drawn(count, () => roundTo((metres / count) * random.between(0.7, 1.3), 1));
  const gables = drawn(4, (i) => roundTo(lot.depth * (i < 2 ? 0.92 : random.between(0.3, 0.6)), 1));
  putWalls(row, 'along', piers, thickness, areasOnly);
  putWalls(row, 'across', gables, thickness, areasOnly);
}

/** Area of the braces that carry in one storey and direction, one of each crossing pair. */
function braces(random, lot, row) {
  if (lot.storeys > 2 || lot.width < 25) row['Bay (m)'] = `${roundTo(random.between(5.5, 7.2), 1)}`;
  for (const direction of ['along', 'across']) row[`Braces ${direction} (m2)`] = `${roundTo(lot.plate * (0.000035 + 0.000012 * lot.storeys) * random.between(0.7, 1.3), 4)}`;
}

/** Panels in the outer lines and in one or two inner ones; an open front has them at the back only. */
function infill(random, lot, row, show) {
  const grid = frame(random, lot, row, show, 50);
  row['Brick infill (in)'] = lot.storeys > 6 ? '9' : random.pick(['9', '9', '4.5']);
  const solid = (bays, rows) => roundTo(bays * rows * grid.clear * random.between(0.55, 0.85), 1);
  row['Infill along (m)'] = `${solid(grid.along - 1, lot.openFront ? 1 : 3)}`;
  row['Infill across (m)'] = `${solid(grid.across - 1, 4)}`;
}

/** Sway from an old analysis with the weight put on sideways, mm: (T/2)² m for a period near the usual one. */
function sway(random, lot, row) {
  const fifth = fifthRoot(lot.height);
  const usual = (lot.system === 'steel-moment-frame' ? 0.045 : 0.034) * fifth * fifth * fifth * fifth * random.between(0.9, 1.35);
  for (const direction of ['along', 'across']) {
    const half = usual * random.between(0.92, 1.1);
    row[`Gravity sway ${direction} (mm)`] = `${Math.round(half * half * 1000)}`;
  }
}

const wants = {
  frame, sway, braces, 'concrete walls': concreteWalls, 'block walls': blockWalls, 'brick walls': brickWalls, 'infilled frame': infill,
  'walls and frame': (random, lot, row, show) => {
    frame(random, lot, row, show, 150);
    concreteWalls(random, lot, row, show, 3);
  },
};

function spoil(row, dirt, notes) {
  if (dirt === 'column') {
    row['Column across (mm)'] = '4500';
    notes.push({ row, column: 'Column across (mm)', what: 'a nought too many: 4.5 m' });
  }
  if (dirt === 'lists') {
    const lengths = row['Wall lengths along (m)'].split(';');
    row['Wall lengths along (m)'] = lengths.slice(0, lengths.length - 1).join(';');
    notes.push({ row, column: 'Wall lengths along (m)', what: `${lengths.length - 1} lengths for ${lengths.length} walls` });
  }
}

/** Fills the structure columns of the rows (of entries {lot, row}) in place. `isSpoilt(row)`: rows to be left as they are. Notes the two rows it spoils. */
export function addStructure(random, rows, entries, isSpoilt, notes) {
  for (const row of rows) for (const header of structureHeaders) row[header] = '';
  for (const show of showcase) {
    const entry = entries.find(({ lot }) => lot.id === show.id);
    if (entry === undefined || isSpoilt(entry.row)) throw new Error(`structure: ${show.id} is not free`);
    const { lot, row } = entry;
    wants[show.what](random, lot, row, show);
    if (show.psi !== undefined) row['Concrete strength (psi)'] = `${show.psi}`;
    if (show.steelPart !== undefined) row['Steel part of height'] = `${show.steelPart}`;
    if (show.dirt !== undefined) spoil(row, show.dirt, notes);
  }
  const soft = entries.filter(({ lot, row }) => lot.quarter.name === softBlock && lot.kind !== 'yard' && !isSpoilt(row));
  for (const { row } of random.shuffle(soft).slice(0, 12)) row['Ground period (s)'] = `${roundTo(random.between(0.42, 0.78), 2)}`;
}

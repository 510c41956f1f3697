// Writes a building the way its owner's file would: own headers, own words, much of it never recorded.
import { roundTo } from './random.mjs';
import { crowds } from './stock.mjs';

export const headers = [
  'Asset no.', 'Building', 'Quarter', 'Address', 'Belongs to', 'State', 'Structure', 'Structure across', 'Floor decks', 'Use', 'Condition', 'Ground', 'Vs30 (m/s)', 'Lon', 'Lat', 'Outline', 'Houses in row',
  'Storeys', 'Basements', 'All levels', 'Height (m)', 'Ground storey (ft)', 'Length (m)', 'Width (m)', 'Floor area (m2)', 'Built', 'Strengthened', 'Share of code', 'People at busiest', 'Hours a week', 'Importance',
  'Total weight (kN)', 'Weight (kN/m2)', 'Stiffness along (kN/m)', 'Stiffness across (kN/m)', 'Period along (s)', 'Period across (s)', 'Shaking when measured', 'Open ground storey', 'Weak storey', 'Twists in plan',
  'Inner corner', 'Setback', 'Listed', 'Drawings coefficient', 'Coefficient basis', 'Assessed capacity (g)', 'Assessment cost', 'Remarks',
];

const ownWords = {
  'steel-moment-frame': ['steel frame', 'steel frame', 'Steel frame'], 'steel-concentric-braced-frame': ['braced steel frame'], 'steel-eccentric-braced-frame': ['offset-braced steel frame'],
  'steel-buckling-restrained-braced-frame': ['steel frame with sleeved braces'], 'steel-light-frame': ['light steel'], 'concrete-moment-frame': ['RC frame', 'RC frame', 'rc frame', ' RC Frame'],
  'concrete-infilled-frame': ['RC frame, brick infill'], 'concrete-shear-wall': ['RC walls'], 'concrete-wall-frame': ['RC walls and frame'], 'precast-concrete-frame': ['precast frame'],
  'precast-tilt-up-wall': ['tilted wall panels'], 'reinforced-masonry-wall': ['reinforced block'], 'confined-masonry-wall': ['tied brickwork'],
  'unreinforced-masonry-wall': ['brick walls', 'brick walls', 'stone walls'], 'timber-light-frame': ['timber stud'], 'timber-post-and-beam': ['timber posts'],
};
const secondSystem = { 'steel-moment-frame': 'braced steel frame', 'concrete-moment-frame': 'RC walls', 'precast-concrete-frame': 'RC walls', 'steel-concentric-braced-frame': 'steel frame' };
const silent = ['', '', '', '', 'not recorded', '?', '-', 'n/a', 'NULL'];

const thousands = (value) => {
  const digits = `${value}`;
  return digits.length > 3 ? `${digits.slice(0, digits.length - 3)},${digits.slice(digits.length - 3)}` : digits;
};
const yesOr = (random, flag, other) => (flag ? 'Y' : random.chance(other) ? 'N' : '');

function occupants(random, lot) {
  const [density] = crowds[lot.use];
  return Math.max(1, Math.round(lot.area * density * random.between(0.7, 1.3)));
}

function importance(random, lot, people) {
  if (lot.use === 'fire and rescue' || lot.use === 'clinic') return '1.5';
  if (lot.use === 'teaching') return '1.25';
  if (lot.use === 'gathering' && people > 250) return '1.25';
  return random.chance(0.1) ? '1' : '';
}

function identity(random, lot) {
  const suffix = lot.mainOf === undefined ? '' : lot.mainOf.wings > 1 ? ', second wing' : random.pick([', north wing', ', east wing', ', extension']);
  const address = `${lot.number} ${lot.street}`;
  return {
    'Asset no.': lot.id, Building: lot.mainOf === undefined ? (lot.name ?? address) : `${lot.mainOf.name ?? address}${suffix}`, Quarter: lot.quarter.name, Address: address,
    'Belongs to': lot.mainOf?.id ?? '', Ground: random.chance(0.06) ? '' : lot.quarter.ground, Lon: lot.lon.toFixed(6), Lat: lot.lat.toFixed(6), Outline: random.chance(0.06) ? '' : lot.outline, Use: lot.use,
  };
}

function year(random, lot) {
  if (random.chance(0.05)) return random.pick(['', '', '?']);
  // Old years were never looked up: the clerk wrote 1900.
  if (lot.year < 1915 && random.chance(0.45)) return '1900';
  return `${lot.year}`;
}

/** One row as an object of the owner's headers. */
export function ownerRow(random, lot) {
  const row = {};
  for (const header of headers) row[header] = '';
  Object.assign(row, identity(random, lot));
  if (lot.kind === 'yard') return Object.assign(row, { Building: '', State: 'in service', 'Floor area (m2)': '', Outline: '' });
  const keep = lot.keepFacts === true;
  const hide = (p) => !keep && random.chance(p);
  const people = occupants(random, lot);
  const structure = random.chance(keep || lot.state === 'assessment done' ? 0 : 0.35) ? random.pick(silent) : random.pick(ownWords[lot.system]);
  Object.assign(row, {
    State: lot.state ?? (random.chance(0.2) ? '' : 'in service'), Structure: structure,
    'Structure across': structure !== '' && lot.storeys > 3 && secondSystem[lot.system] !== undefined && random.chance(0.35) ? secondSystem[lot.system] : '',
    'Floor decks': random.chance(0.6) ? '' : lot.system.includes('timber') || lot.system.includes('unreinforced') ? 'flexible' : 'rigid',
    Condition: random.pick(['', '', '', 'good', 'fair', 'fair', 'worn', 'cracked render', 'rust stains']),
    Storeys: hide(0.07) ? random.pick(['', '', '0']) : `${lot.storeys}`, Basements: random.chance(0.5) ? '' : `${lot.basements}`, 'Height (m)': hide(0.24) ? '' : `${lot.height}`,
    'Ground storey (ft)': lot.openFront || random.chance(0.06) ? `${roundTo(lot.groundHeight / 0.3048, 1)}` : '',
    'Length (m)': hide(0.35) ? '' : `${lot.width}`, 'Floor area (m2)': hide(0.06) ? '' : random.chance(0.3) ? thousands(lot.area) : `${lot.area}`, Built: year(random, lot),
    Strengthened: lot.strengthened === undefined ? '' : `${lot.strengthened}`, 'Share of code': lot.retrofitShare ?? '', 'People at busiest': random.chance(0.48) ? '' : random.chance(0.2) ? thousands(people) : `${people}`,
    'Hours a week': random.chance(0.6) ? '' : `${crowds[lot.use][1]}`, Importance: importance(random, lot, people), 'Open ground storey': yesOr(random, lot.openFront, 0.2),
    'Weak storey': lot.openFront && random.chance(0.35) ? 'Y' : '', 'Twists in plan': yesOr(random, lot.notch !== undefined && random.chance(0.4), 0.12), 'Inner corner': lot.notch !== undefined && random.chance(0.8) ? 'Y' : '',
    Setback: lot.storeys > 8 && random.chance(0.35) ? 'Y' : '', Listed: yesOr(random, lot.year < 1935 && random.chance(0.3), 0.3),
  });
  row['Width (m)'] = row['Length (m)'] === '' ? '' : `${lot.depth}`;
  if (row.Storeys !== '' && row.Storeys !== '0' && row.Basements !== '' && random.chance(0.7)) row['All levels'] = `${lot.storeys + lot.basements}`;
  const rare = {
    'Vs30 (m/s)': lot.vs30, 'Total weight (kN)': lot.weight, 'Weight (kN/m2)': lot.unitWeight, 'Stiffness along (kN/m)': lot.stiffnessLong, 'Stiffness across (kN/m)': lot.stiffnessAcross, 'Period along (s)': lot.periodLong,
    'Period across (s)': lot.periodAcross, 'Shaking when measured': lot.amplitude, 'Drawings coefficient': lot.coefficient, 'Coefficient basis': lot.coefficientLevel, 'Assessed capacity (g)': lot.capacity, 'Assessment cost': lot.cost,
  };
  for (const header of Object.keys(rare)) if (rare[header] !== undefined) row[header] = header === 'Assessment cost' ? thousands(rare[header]) : `${rare[header]}`;
  return row;
}

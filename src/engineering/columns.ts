/**
 * The inventory's columns: one spelling from mapping file to database column to kernel to chart.
 * `limits` are the values taken at face value; outside them a cell is rejected (`outside-limits`), all of them ours [judgement].
 */
import type { Dimension } from './units.js';
import { AMPLITUDES, BASE_FIXITIES, DESIGN_LEVELS, STATUSES, SYSTEMS, USES } from './building.js';

export interface InventoryColumn {
  readonly name: string;
  /** text: kept as it is; word: one of `words`; number; whole; list: numbers bottom to top; year. */
  readonly kind: 'text' | 'word' | 'number' | 'whole' | 'list' | 'year';
  readonly title: string;
  readonly dimension?: Dimension;
  /** SI unit in which it is stored (unit id); none for pure numbers. */
  readonly unit?: string;
  readonly limits?: readonly [number, number];
  readonly words?: readonly string[];
  /** Which entry of the study's `words` translates it. */
  readonly vocabulary?:
    'system' | 'use' | 'status' | 'site_class' | 'yes_no' | 'amplitude' | 'design_level' | 'base_fixity';
  /** Header words by which `init` recognises it, lower case. */
  readonly hints: readonly string[];
}

const YES_NO = ['yes', 'no'] as const;

function text(name: string, title: string, ...hints: string[]): InventoryColumn {
  return { name, kind: 'text', title, hints };
}
function word(
  name: string,
  title: string,
  words: readonly string[],
  vocabulary: NonNullable<InventoryColumn['vocabulary']>,
  ...hints: string[]
): InventoryColumn {
  return { name, kind: 'word', title, words, vocabulary, hints };
}
function measure(
  name: string,
  title: string,
  dimension: Dimension,
  unit: string,
  limits: readonly [number, number],
  ...hints: string[]
): InventoryColumn {
  return { name, kind: 'number', title, dimension, unit, limits, hints };
}
function plain(
  name: string,
  kind: 'number' | 'whole' | 'year',
  title: string,
  limits: readonly [number, number],
  ...hints: string[]
): InventoryColumn {
  return { name, kind, title, limits, hints };
}

function list(
  name: string,
  title: string,
  dimension: Dimension,
  unit: string,
  limits: readonly [number, number],
  ...hints: string[]
): InventoryColumn {
  return { name, kind: 'list', title, dimension, unit, limits, hints };
}

export const COLUMNS: readonly InventoryColumn[] = [
  text('id', 'Identifier', 'id', 'asset', 'building no', 'ref', 'parcel', 'map lot', 'ml', 'number'),
  text('name', 'Name', 'name', 'building', 'location', 'address', 'title'),
  text('group', 'Block or zone', 'block', 'group', 'quarter', 'campus', 'district', 'neighbourhood', 'neighborhood'),
  text('part_of', 'Part of', 'part of', 'main building', 'joined to', 'belongs to'),
  plain('lon', 'number', 'Longitude', [-180, 180], 'lon', 'longitude', 'x', 'long'),
  plain('lat', 'number', 'Latitude', [-90, 90], 'lat', 'latitude', 'y'),
  text('footprint', 'Footprint', 'footprint', 'outline', 'wkt', 'geometry', 'polygon'),
  plain(
    'count',
    'whole',
    'Buildings in the row',
    [1, 10000],
    'count',
    'number of buildings',
    'buildings',
    'houses in row',
  ),
  plain(
    'storeys_above',
    'number',
    'Storeys above ground',
    [1, 60],
    'storeys',
    'stories',
    'floors',
    'levels',
    'bldgstories',
  ),
  plain('storeys_below', 'number', 'Storeys below ground', [0, 12], 'basements', 'below', 'basement floors'),
  plain(
    'storeys_total',
    'number',
    'Storeys in all',
    [1, 72],
    'total floors',
    'total storeys',
    'all levels',
    'all storeys',
  ),
  measure('height_m', 'Height', 'length', 'm', [2, 320], 'height', 'eaves height', 'roof height', 'measuredheight'),
  measure(
    'first_storey_height_m',
    'First storey height',
    'length',
    'm',
    [2, 20],
    'first storey height',
    'ground floor height',
    'ground storey',
  ),
  measure('plan_length_m', 'Plan length', 'length', 'm', [2, 1000], 'length', 'plan length', 'long side'),
  measure('plan_width_m', 'Plan width', 'length', 'm', [2, 1000], 'width', 'plan width', 'short side', 'depth'),
  measure(
    'floor_area_m2',
    'Floor area',
    'area',
    'm2',
    [5, 2000000],
    'floor area',
    'gross area',
    'grossarea',
    'gfa',
    'area',
  ),
  plain(
    'year_built',
    'year',
    'Year built',
    [1100, 2100],
    'year built',
    'built',
    'year',
    'yearbuilt',
    'construction year',
  ),
  plain(
    'year_retrofitted',
    'year',
    'Year of seismic retrofit',
    [1900, 2100],
    'retrofit year',
    'strengthened',
    'retrofitted',
  ),
  plain('retrofit_level', 'number', 'Retrofit level', [0.1, 1.5], 'retrofit level', 'share of code'),
  word('status', 'Status', STATUSES, 'status', 'status', 'state'),
  word(
    'system',
    'Lateral system',
    [...SYSTEMS, 'unknown'],
    'system',
    'system',
    'structure',
    'structural type',
    'lateral system',
    'construction',
  ),
  word(
    'system_transverse',
    'Lateral system across',
    [...SYSTEMS, 'unknown'],
    'system',
    'system across',
    'transverse system',
  ),
  text('diaphragm', 'Diaphragm', 'diaphragm', 'floor type', 'floor deck', 'floor decks'),
  word('use', 'Use', USES, 'use', 'use', 'usage', 'occupancy', 'usedescription', 'function'),
  plain('occupants_peak', 'number', 'People at peak', [0, 200000], 'occupants', 'people', 'persons', 'population'),
  plain(
    'occupied_hours_per_week',
    'number',
    'Occupied hours a week',
    [0, 168],
    'hours',
    'hours per week',
    'occupied hours',
  ),
  plain('importance_factor', 'number', 'Importance factor', [0.5, 3], 'importance'),
  word('heritage', 'Heritage', YES_NO, 'yes_no', 'heritage', 'listed', 'protected'),
  measure('seismic_weight_kN', 'Seismic weight', 'force', 'kN', [10, 1e8], 'seismic weight', 'weight'),
  measure(
    'unit_weight_kN_per_m2',
    'Unit weight',
    'pressure',
    'kN_per_m2',
    [0.5, 40],
    'unit weight',
    'weight per area',
    'weight',
  ),
  {
    name: 'storey_stiffness_longitudinal_kN_per_m',
    kind: 'list',
    title: 'Storey stiffness, longitudinal',
    dimension: 'stiffness',
    unit: 'kN_per_m',
    limits: [1e2, 1e9],
    hints: ['storey stiffness', 'stiffness long', 'stiffness x'],
  },
  {
    name: 'storey_stiffness_transverse_kN_per_m',
    kind: 'list',
    title: 'Storey stiffness, transverse',
    dimension: 'stiffness',
    unit: 'kN_per_m',
    limits: [1e2, 1e9],
    hints: ['storey stiffness across', 'stiffness trans', 'stiffness y'],
  },
  list(
    'wall_areas_longitudinal_m2',
    'Wall areas, longitudinal',
    'area',
    'm2',
    [0.01, 500],
    'wall areas',
    'wall area',
    'wall area along',
    'wall area x',
    'wall areas x',
  ),
  list(
    'wall_areas_transverse_m2',
    'Wall areas, transverse',
    'area',
    'm2',
    [0.01, 500],
    'wall areas across',
    'wall area across',
    'wall area y',
    'wall areas y',
  ),
  list(
    'wall_lengths_longitudinal_m',
    'Wall lengths, longitudinal',
    'length',
    'm',
    [0.2, 500],
    'wall lengths',
    'wall length',
    'wall length along',
    'wall length x',
    'wall lengths x',
  ),
  list(
    'wall_lengths_transverse_m',
    'Wall lengths, transverse',
    'length',
    'm',
    [0.2, 500],
    'wall lengths across',
    'wall length across',
    'wall length y',
    'wall lengths y',
  ),
  plain(
    'column_count',
    'whole',
    'Columns of the first storey',
    [1, 5000],
    'number of columns',
    'column count',
    'pillars',
    'columns',
  ),
  measure('column_width_m', 'Column width, across', 'length', 'm', [0.1, 4], 'column width', 'column across'),
  measure(
    'column_depth_m',
    'Column depth, along',
    'length',
    'm',
    [0.1, 4],
    'column depth',
    'column along',
    'column size',
  ),
  measure('beam_width_m', 'Beam width', 'length', 'm', [0.1, 4], 'beam width'),
  measure('beam_depth_m', 'Beam depth', 'length', 'm', [0.1, 4], 'beam depth', 'girder depth'),
  measure('bay_length_m', 'Bay length', 'length', 'm', [1.5, 30], 'bay length', 'bay', 'column spacing', 'beam span'),
  word('base_fixity', 'Base of the columns', BASE_FIXITIES, 'base_fixity', 'column base', 'base fixity'),
  measure(
    'top_displacement_longitudinal_m',
    'Sway under gravity sideways, longitudinal',
    'length',
    'm',
    [0.0005, 20],
    'top displacement',
    'gravity sway',
    'top displacement x',
  ),
  measure(
    'top_displacement_transverse_m',
    'Sway under gravity sideways, transverse',
    'length',
    'm',
    [0.0005, 20],
    'top displacement across',
    'gravity sway across',
    'top displacement y',
  ),
  measure(
    'brace_area_longitudinal_m2',
    'Active braces of a storey, longitudinal',
    'area',
    'm2',
    [0.0001, 5],
    'brace area',
    'brace area x',
    'braces',
  ),
  measure(
    'brace_area_transverse_m2',
    'Active braces of a storey, transverse',
    'area',
    'm2',
    [0.0001, 5],
    'brace area across',
    'brace area y',
    'braces across',
  ),
  measure(
    'infill_thickness_m',
    'Infill thickness',
    'length',
    'm',
    [0.04, 1],
    'infill thickness',
    'panel thickness',
    'brick infill',
  ),
  measure(
    'infill_length_longitudinal_m',
    'Solid infill of the first storey, longitudinal',
    'length',
    'm',
    [0.5, 2000],
    'infill length',
    'infill length x',
    'infill',
  ),
  measure(
    'infill_length_transverse_m',
    'Solid infill of the first storey, transverse',
    'length',
    'm',
    [0.5, 2000],
    'infill length across',
    'infill length y',
    'infill across',
  ),
  measure(
    'concrete_strength_MPa',
    'Concrete strength',
    'pressure',
    'MPa',
    [3, 120],
    'concrete strength',
    'concrete grade',
  ),
  plain(
    'steel_height_share',
    'number',
    'Share of the height in steel or timber',
    [0, 1],
    'steel height share',
    'steel part of height',
    'steel part',
  ),
  measure(
    'measured_period_longitudinal_s',
    'Measured period, longitudinal',
    'time',
    's',
    [0.02, 20],
    'measured period',
    'period long',
    'period x',
  ),
  measure(
    'measured_period_transverse_s',
    'Measured period, transverse',
    'time',
    's',
    [0.02, 20],
    'measured period across',
    'period trans',
    'period y',
  ),
  word(
    'measured_amplitude',
    'Amplitude of the measurement',
    AMPLITUDES,
    'amplitude',
    'amplitude',
    'vibration',
    'shaking when measured',
  ),
  word(
    'soft_storey',
    'Soft storey',
    YES_NO,
    'yes_no',
    'soft storey',
    'soft story',
    'open ground floor',
    'open ground storey',
  ),
  word('weak_storey', 'Weak storey', YES_NO, 'yes_no', 'weak storey', 'weak story'),
  word('torsion', 'Torsion', YES_NO, 'yes_no', 'torsion', 'eccentric', 'twists in plan'),
  word('reentrant_corner', 'Re-entrant corner', YES_NO, 'yes_no', 're-entrant corner', 'plan shape', 'inner corner'),
  word('setback', 'Setback', YES_NO, 'yes_no', 'setback'),
  word('mass_irregularity', 'Mass irregularity', YES_NO, 'yes_no', 'mass irregularity', 'heavy floor'),
  plain(
    'reentrant_projection',
    'number',
    'Projection beyond a re-entrant corner, share of the plan',
    [0, 1],
    'reentrant projection',
  ),
  plain(
    'reentrant_area_share',
    'number',
    'Area between outline and hull, share of the floor',
    [0, 10],
    'reentrant area share',
  ),
  measure('footprint_area_m2', 'Footprint area', 'area', 'm2', [2, 1000000], 'footprint area', 'ground area'),
  text('condition', 'Condition', 'condition'),
  {
    name: 'site_class',
    kind: 'text',
    title: 'Site class',
    vocabulary: 'site_class',
    hints: ['site class', 'ground', 'soil', 'soil class'],
  },
  measure('vs30_mps', 'Shear-wave velocity, upper 30 m', 'speed', 'mps', [50, 3000], 'vs30'),
  measure('site_period_s', 'Site period', 'time', 's', [0.01, 10], 'site period', 'ground period'),
  text('hazard_zone', 'Hazard zone', 'hazard zone', 'seismic zone', 'zone'),
  text('spectrum', 'Spectrum of the study', 'spectrum'),
  plain(
    'design_base_shear_coefficient',
    'number',
    'Design base shear coefficient',
    [0.005, 1],
    'base shear coefficient',
    'design coefficient',
    'drawings coefficient',
  ),
  plain(
    'wind_base_shear_coefficient',
    'number',
    'Base shear coefficient of the wind it was designed for, strength level',
    [0.001, 1],
    'wind base shear',
    'wind coefficient',
  ),
  word(
    'design_level',
    'Level of the design coefficient',
    DESIGN_LEVELS,
    'design_level',
    'design level',
    'coefficient basis',
  ),
  measure(
    'capacity_sa_g',
    'Capacity from an assessment',
    'acceleration',
    'g',
    [0.005, 5],
    'capacity',
    'assessed capacity',
  ),
  plain('assessment_cost', 'number', 'Cost of an assessment', [0, 1e9], 'assessment cost', 'cost'),
];

const BY_NAME: ReadonlyMap<string, InventoryColumn> = new Map(COLUMNS.map((column) => [column.name, column]));

/** The inventory column called `name`, or undefined. */
export function findColumn(name: string): InventoryColumn | undefined {
  return BY_NAME.get(name);
}

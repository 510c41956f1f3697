/**
 * Units: each belongs to one dimension and carries the factor that turns one of it into the SI unit of that dimension.
 * Factors are exact by definition where the unit is (foot 0.3048 m, pound-force 4.4482216152605 N: ISO 80000, NIST SP 811).
 */
export type Dimension =
  | 'length'
  | 'area'
  | 'time'
  | 'acceleration'
  | 'speed'
  | 'force'
  | 'mass'
  | 'stiffness'
  | 'pressure'
  | 'volume'
  | 'second moment of area'
  | 'mass per length'
  | 'moment'
  | 'flexural rigidity'
  | 'angle'
  | 'money'
  | 'count'
  | 'ratio';

export interface Unit {
  /** Spelling used as a name suffix (`height_ft`) and in the study file. */
  readonly id: string;
  readonly dimension: Dimension;
  /** One of this unit in the dimension's base unit. */
  readonly factor: number;
  /** How it is printed. */
  readonly label: string;
  /** Other spellings met in inventories, compared without case and dots. */
  readonly also?: readonly string[];
}

const FOOT_M = 0.3048;
const POUND_FORCE_KN = 0.0044482216152605;

export const UNITS: readonly Unit[] = [
  { id: 'm', dimension: 'length', factor: 1, label: 'm', also: ['metre', 'metres', 'meter', 'meters', 'mtr'] },
  { id: 'mm', dimension: 'length', factor: 0.001, label: 'mm' },
  { id: 'cm', dimension: 'length', factor: 0.01, label: 'cm' },
  { id: 'km', dimension: 'length', factor: 1000, label: 'km' },
  { id: 'ft', dimension: 'length', factor: FOOT_M, label: 'ft', also: ["'", '′', 'feet', 'foot'] },
  { id: 'in', dimension: 'length', factor: FOOT_M / 12, label: 'in', also: ['"', '″', 'inch', 'inches'] },
  {
    id: 'm2',
    dimension: 'area',
    factor: 1,
    label: 'm²',
    also: ['m²', 'sqm', 'sq m', 'square metres', 'square meters'],
  },
  {
    id: 'ft2',
    dimension: 'area',
    factor: FOOT_M * FOOT_M,
    label: 'ft²',
    also: ['ft²', 'sf', 'sqft', 'sq ft', 'square feet'],
  },
  { id: 'ha', dimension: 'area', factor: 10000, label: 'ha' },
  { id: 's', dimension: 'time', factor: 1, label: 's', also: ['sec', 'seconds'] },
  { id: 'ms', dimension: 'time', factor: 0.001, label: 'ms' },
  { id: 'g', dimension: 'acceleration', factor: 1, label: 'g' },
  { id: 'm_per_s2', dimension: 'acceleration', factor: 1 / 9.80665, label: 'm/s²', also: ['m/s2', 'm/s²'] },
  { id: 'mps', dimension: 'speed', factor: 1, label: 'm/s', also: ['m/s'] },
  { id: 'ftps', dimension: 'speed', factor: FOOT_M, label: 'ft/s', also: ['ft/s', 'fps'] },
  { id: 'kN', dimension: 'force', factor: 1, label: 'kN' },
  { id: 'MN', dimension: 'force', factor: 1000, label: 'MN' },
  { id: 'kip', dimension: 'force', factor: 1000 * POUND_FORCE_KN, label: 'kip', also: ['kips'] },
  { id: 't', dimension: 'mass', factor: 1, label: 't', also: ['tonne', 'tonnes'] },
  { id: 'kg', dimension: 'mass', factor: 0.001, label: 'kg' },
  { id: 'kN_per_m', dimension: 'stiffness', factor: 1, label: 'kN/m', also: ['kn/m'] },
  { id: 'MN_per_m', dimension: 'stiffness', factor: 1000, label: 'MN/m', also: ['mn/m'] },
  { id: 'N_per_m', dimension: 'stiffness', factor: 0.001, label: 'N/m', also: ['n/m'] },
  {
    id: 'kip_per_in',
    dimension: 'stiffness',
    factor: (1000 * POUND_FORCE_KN) / (FOOT_M / 12),
    label: 'kip/in',
    also: ['kip/in', 'k/in'],
  },
  {
    id: 'lb_per_in',
    dimension: 'stiffness',
    factor: POUND_FORCE_KN / (FOOT_M / 12),
    label: 'lb/in',
    also: ['lb/in'],
  },
  { id: 'kN_per_m2', dimension: 'pressure', factor: 1, label: 'kN/m²', also: ['kpa', 'kn/m2'] },
  { id: 'psf', dimension: 'pressure', factor: POUND_FORCE_KN / (FOOT_M * FOOT_M), label: 'psf' },
  { id: 'MPa', dimension: 'pressure', factor: 1000, label: 'MPa', also: ['N/mm2', 'N/mm²'] },
  { id: 'GPa', dimension: 'pressure', factor: 1e6, label: 'GPa' },
  { id: 'psi', dimension: 'pressure', factor: POUND_FORCE_KN / ((FOOT_M / 12) * (FOOT_M / 12)), label: 'psi' },
  { id: 'ksi', dimension: 'pressure', factor: (1000 * POUND_FORCE_KN) / ((FOOT_M / 12) * (FOOT_M / 12)), label: 'ksi' },
  { id: 'm3', dimension: 'volume', factor: 1, label: 'm³' },
  { id: 'mm3', dimension: 'volume', factor: 1e-9, label: 'mm³' },
  { id: 'm4', dimension: 'second moment of area', factor: 1, label: 'm⁴' },
  { id: 'mm4', dimension: 'second moment of area', factor: 1e-12, label: 'mm⁴' },
  {
    id: 'in4',
    dimension: 'second moment of area',
    factor: (FOOT_M / 12) * (FOOT_M / 12) * (FOOT_M / 12) * (FOOT_M / 12),
    label: 'in⁴',
  },
  { id: 't_per_m', dimension: 'mass per length', factor: 1, label: 't/m' },
  { id: 'kg_per_m', dimension: 'mass per length', factor: 0.001, label: 'kg/m' },
  { id: 'kN_m', dimension: 'moment', factor: 1, label: 'kNm' },
  { id: 'MN_m', dimension: 'moment', factor: 1000, label: 'MNm' },
  { id: 'kN_m2', dimension: 'flexural rigidity', factor: 1, label: 'kNm²' },
  { id: 'MN_m2', dimension: 'flexural rigidity', factor: 1000, label: 'MNm²' },
  { id: 'deg', dimension: 'angle', factor: 1, label: '°' },
];

const BY_SPELLING: ReadonlyMap<string, Unit> = new Map(
  UNITS.flatMap((unit) => [unit.id, unit.label, ...(unit.also ?? [])].map((name) => [fold(name), unit] as const)),
);

function fold(name: string): string {
  return name.trim().toLowerCase().replaceAll('.', '').replaceAll(/\s+/g, ' ');
}

/** The unit written as `spelling` (case, dots and outer blanks ignored), or undefined. `MN` and `mN` fold alike: only MN is registered. */
export function findUnit(spelling: string): Unit | undefined {
  return UNITS.find((unit) => unit.id === spelling) ?? BY_SPELLING.get(fold(spelling));
}

/** The units that measure `dimension`, in register order. */
export function unitsOf(dimension: Dimension): readonly Unit[] {
  return UNITS.filter((unit) => unit.dimension === dimension);
}

/** `value` in `from` expressed in `to`; both must measure the same dimension. @throws Error otherwise. */
export function convert(value: number, from: Unit, to: Unit): number {
  if (from.dimension !== to.dimension) throw new Error(`cannot turn ${from.id} into ${to.id}`);
  return from === to ? value : (value * from.factor) / to.factor;
}

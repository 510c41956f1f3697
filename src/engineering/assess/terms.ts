/** Terms of a building that do not depend on its period. */
import type { Building, Structure } from '../building.js';
import { WORKING_TO_STRENGTH } from '../capacity/records.js';
import { massShare } from './capacity.js';
import type { Case } from './case-memory.js';
import type { AssessContext } from './context.js';

/** Importance factor, 1 where the row gives none. */
export function importanceOf(building: Building): number {
  return building.importance_factor > 0 ? building.importance_factor : 1;
}

/** Mass share: what multiplies strength, overstrength and ductility alike in every case. */
export function massFactor(building: Building, context: AssessContext): number {
  return context.capacityFactor / massShare(building);
}

type Levels = readonly { readonly level: number | null; readonly chance: number }[];
const NO_DRAWINGS: Levels = [{ level: null, chance: 1 }];
const AT_WORKING: Levels = [{ level: WORKING_TO_STRENGTH, chance: 1 }];
const AT_STRENGTH: Levels = [{ level: 1, chance: 1 }];
const EITHER_LEVEL: Levels = [
  { level: WORKING_TO_STRENGTH, chance: 0.5 },
  { level: 1, chance: 0.5 },
];

/** True where the drawings show that nothing was designed for earthquakes. */
export function isUndesigned({ design_level, design_base_shear_coefficient: coefficient }: Building): boolean {
  return design_level === 'none' && !(coefficient > 0);
}

/** Level of the drawings' coefficient: as stated, both alike when not stated; null when there is none. */
export function drawingsLevels(
  building: Building,
): readonly { readonly level: number | null; readonly chance: number }[] {
  if (!(building.design_base_shear_coefficient > 0)) return NO_DRAWINGS;
  if (building.design_level === 'working') return AT_WORKING;
  return building.design_level === 'strength' ? AT_STRENGTH : EITHER_LEVEL;
}

/** True where the drawings' coefficient gives the capacity and may be at either level. */
export function levelNotStated(building: Building): boolean {
  return !(building.capacity_sa_g > 0) && drawingsLevels(building) === EITHER_LEVEL;
}

/** True where nothing tells the two directions apart: one system, nothing measured or given per direction, no plan dimension in the era's formula. */
export function directionsAlike(building: Building, which: Case): boolean {
  if (which.system !== which.system_transverse) return false;
  const { measured_period_s: measured, storey_stiffness_kN_per_m: stiffness } = building;
  if (
    measured.longitudinal > 0 ||
    measured.transverse > 0 ||
    stiffness.longitudinal !== null ||
    stiffness.transverse !== null
  )
    return false;
  return (
    which.design.longitudinal.dependsOn !== 'more' && (building.structure === null || areasAlike(building.structure))
  );
}

/** No area that a strength check would read by direction. */
function areasAlike({
  wall_areas_m2: walls,
  brace_area_m2: braces,
  column_width_m,
  column_depth_m,
}: Structure): boolean {
  if (walls.longitudinal !== null || walls.transverse !== null) return false;
  if (braces.longitudinal > 0 || braces.transverse > 0) return false;
  return !(column_width_m > 0) || column_width_m === column_depth_m;
}

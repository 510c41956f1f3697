/**
 * Seismic weight per floor area by system, dead load and seismic live load together, kN/m²: a synthesis of published sizing notes
 * and worked weights [judgement]; a row of the inventory that gives its own weight replaces it.
 */
import type { System } from '../building.js';

export const UNIT_WEIGHT_KN_PER_M2: Readonly<Record<System, number>> = {
  'steel-moment-frame': 5,
  'steel-concentric-braced-frame': 5,
  'steel-eccentric-braced-frame': 5,
  'steel-buckling-restrained-braced-frame': 5,
  'steel-light-frame': 4,
  'concrete-moment-frame': 11,
  'concrete-infilled-frame': 12,
  'concrete-shear-wall': 13,
  'concrete-wall-frame': 12,
  'precast-concrete-frame': 10,
  'precast-tilt-up-wall': 5,
  'reinforced-masonry-wall': 10,
  'confined-masonry-wall': 11,
  'unreinforced-masonry-wall': 12,
  'timber-light-frame': 2.5,
  'timber-post-and-beam': 4,
};

/** One building as the assessment sees it, after intake and inference. Numbers unknown are NaN, words unknown are null. */
import type { DirectionName } from './direction.js';

/** Where a value comes from. */
export const ORIGINS = ['given', 'inferred', 'default', 'unknown'] as const;
export type Origin = (typeof ORIGINS)[number];

export const SYSTEMS = [
  'steel-moment-frame',
  'steel-concentric-braced-frame',
  'steel-eccentric-braced-frame',
  'steel-buckling-restrained-braced-frame',
  'steel-light-frame',
  'concrete-moment-frame',
  'concrete-infilled-frame',
  'concrete-shear-wall',
  'concrete-wall-frame',
  'precast-concrete-frame',
  'precast-tilt-up-wall',
  'reinforced-masonry-wall',
  'confined-masonry-wall',
  'unreinforced-masonry-wall',
  'timber-light-frame',
  'timber-post-and-beam',
] as const;
export type System = (typeof SYSTEMS)[number];

export const USES = [
  'residential',
  'hotel',
  'office',
  'school',
  'hospital',
  'retail',
  'assembly',
  'laboratory',
  'industrial',
  'warehouse',
  'parking',
  'emergency',
  'other',
  'unknown',
] as const;
export type Use = (typeof USES)[number];

export const STATUSES = ['in-use', 'assessed', 'to-be-demolished'] as const;
export type Status = (typeof STATUSES)[number];

export const AMPLITUDES = ['ambient', 'forced', 'strong'] as const;
export type Amplitude = (typeof AMPLITUDES)[number];

/** Level of a design coefficient; none: the drawings show no design for earthquakes, and there is no coefficient. */
export const DESIGN_LEVELS = ['working', 'strength', 'none'] as const;
export type DesignLevel = (typeof DESIGN_LEVELS)[number];

export type YesNo = 'yes' | 'no';

/** A value with the spread of its natural logarithm (0 when given) and where it comes from. */
export interface Filled {
  readonly value: number;
  readonly sigma: number;
  readonly origin: Origin;
  /** The rule that filled it, in words; empty when given. */
  readonly rule: string;
}

export interface PerDirection<T> {
  readonly longitudinal: T;
  readonly transverse: T;
}

export const BASE_FIXITIES = ['fixed', 'pinned'] as const;
export type BaseFixity = (typeof BASE_FIXITIES)[number];

/** What drawings or a survey tell of the structure and its ground. Most rows know none of it, and then there is no such object. */
export interface Structure {
  readonly column_count: number;
  /** Across the building. */
  readonly column_width_m: number;
  /** Along the building. */
  readonly column_depth_m: number;
  readonly beam_width_m: number;
  readonly beam_depth_m: number;
  readonly bay_length_m: number;
  readonly base_fixity: BaseFixity | null;
  /** Walls of the first storey that stand along the direction, one entry a wall; null: not known. */
  readonly wall_areas_m2: PerDirection<readonly number[] | null>;
  readonly wall_lengths_m: PerDirection<readonly number[] | null>;
  /** Sway of the top under gravity applied sideways. */
  readonly top_displacement_m: PerDirection<number>;
  /** Active braces of a storey together. */
  readonly brace_area_m2: PerDirection<number>;
  readonly infill_thickness_m: number;
  /** Solid panels of the first storey together. */
  readonly infill_length_m: PerDirection<number>;
  /** Floor and roof decks in the owner's word: `flexible` is read; null: not known. */
  readonly diaphragm: string | null;
  readonly concrete_strength_MPa: number;
  /** Share of the height that is of steel or timber. */
  readonly steel_height_share: number;
  readonly vs30_mps: number;
  readonly site_period_s: number;
}

export interface Building {
  readonly id: string;
  readonly status: Status;
  readonly storeys: Filled;
  readonly height_m: Filled;
  readonly first_storey_height_m: number;
  readonly plan_length_m: number;
  readonly plan_width_m: number;
  readonly floor_area_m2: Filled;
  /** Equally likely years of construction: one when known, a pool of the years of like neighbours when not, none when there is no pool. */
  readonly years: readonly number[];
  readonly yearOrigin: Origin;
  readonly year_retrofitted: number;
  readonly retrofit_level: number;
  /** null: not known, the study's prior table speaks. */
  readonly system: System | null;
  readonly system_transverse: System | null;
  readonly use: Use;
  readonly occupants_peak: number;
  readonly occupied_hours_per_week: number;
  readonly importance_factor: number;
  readonly seismic_weight_kN: number;
  readonly unit_weight_kN_per_m2: number;
  /** Bottom to top; one entry: every storey alike; null: not known. */
  readonly storey_stiffness_kN_per_m: PerDirection<readonly number[] | null>;
  readonly measured_period_s: PerDirection<number>;
  readonly measured_amplitude: Amplitude | null;
  readonly soft_storey: YesNo | null;
  readonly weak_storey: YesNo | null;
  readonly torsion: YesNo | null;
  readonly reentrant_corner: YesNo | null;
  readonly setback: YesNo | null;
  readonly mass_irregularity: YesNo | null;
  /** Of the footprint: the larger over its corners of the lesser projection beyond the corner, as a share of the plan. */
  readonly reentrant_projection: number;
  /** Of the footprint: the largest area between outline and hull, as a share of the floor. */
  readonly reentrant_area_share: number;
  readonly footprint_area_m2: number;
  readonly site_class: string | null;
  readonly hazard_zone: string | null;
  /** Where it stands, degrees; NaN where not known, and where no spectrum of the study hangs on the place. */
  readonly lon: number;
  readonly lat: number;
  /** Name of the spectrum it reads, where the inventory says so itself. */
  readonly spectrum: string | null;
  readonly design_base_shear_coefficient: number;
  /** V/W of the wind it was designed for, strength level. */
  readonly wind_base_shear_coefficient: number;
  readonly design_level: DesignLevel | null;
  readonly capacity_sa_g: number;
  readonly structure: Structure | null;
}

export type { DirectionName };

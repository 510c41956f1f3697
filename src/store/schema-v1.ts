/**
 * The tables of version 1, as databases out there have them. Never edited: the registers of columns and words move on, these do not.
 * What differs today is said by the later migrations in schema.ts.
 */
export const SCHEMA_V1: readonly string[] = [
  `CREATE TABLE inventory (inventory_id VARCHAR PRIMARY KEY, file VARCHAR NOT NULL, encoding VARCHAR NOT NULL,
      delimiter VARCHAR NOT NULL, rows_in INTEGER NOT NULL, buildings INTEGER NOT NULL, attributes VARCHAR NOT
      NULL, inventory_number INTEGER NOT NULL)`,
  `CREATE TABLE building_core (inventory_number INTEGER NOT NULL, building_index INTEGER NOT NULL, "id" VARCHAR,
      "name" VARCHAR, "group" VARCHAR, "lon" DOUBLE, "lat" DOUBLE, "storeys_above" DOUBLE, "height_m" DOUBLE,
      "plan_length_m" DOUBLE, "plan_width_m" DOUBLE, "floor_area_m2" DOUBLE, "year_built" DOUBLE, "status" ENUM
      ('in-use', 'assessed', 'to-be-demolished'), "system" ENUM ('steel-moment-frame',
      'steel-concentric-braced-frame', 'steel-eccentric-braced-frame', 'steel-buckling-restrained-braced-frame',
      'steel-light-frame', 'concrete-moment-frame', 'concrete-infilled-frame', 'concrete-shear-wall',
      'concrete-wall-frame', 'precast-concrete-frame', 'precast-tilt-up-wall', 'reinforced-masonry-wall',
      'confined-masonry-wall', 'unreinforced-masonry-wall', 'timber-light-frame', 'timber-post-and-beam',
      'unknown'), "use" ENUM ('residential', 'hotel', 'office', 'school', 'hospital', 'retail', 'assembly',
      'laboratory', 'industrial', 'warehouse', 'parking', 'emergency', 'other', 'unknown'), "occupants_peak"
      DOUBLE, "site_class" VARCHAR, storeys_above_fill INTEGER NOT NULL, height_m_fill INTEGER NOT NULL,
      floor_area_m2_fill INTEGER NOT NULL, year_built_origin ENUM ('given', 'inferred', 'default', 'unknown') NOT
      NULL, year_pool INTEGER, use_origin ENUM ('given', 'inferred', 'default', 'unknown') NOT NULL, system_origin
      ENUM ('given', 'inferred', 'default', 'unknown') NOT NULL, rows INTEGER NOT NULL, first_row INTEGER NOT
      NULL, findings INTEGER NOT NULL, not_ranked VARCHAR)`,
  `CREATE TABLE building_extra (inventory_number INTEGER NOT NULL, building_index INTEGER NOT NULL, "part_of"
      VARCHAR, "footprint" VARCHAR, "count" DOUBLE, "storeys_below" DOUBLE, "storeys_total" DOUBLE,
      "first_storey_height_m" DOUBLE, "year_retrofitted" DOUBLE, "retrofit_level" DOUBLE, "system_transverse" ENUM
      ('steel-moment-frame', 'steel-concentric-braced-frame', 'steel-eccentric-braced-frame',
      'steel-buckling-restrained-braced-frame', 'steel-light-frame', 'concrete-moment-frame',
      'concrete-infilled-frame', 'concrete-shear-wall', 'concrete-wall-frame', 'precast-concrete-frame',
      'precast-tilt-up-wall', 'reinforced-masonry-wall', 'confined-masonry-wall', 'unreinforced-masonry-wall',
      'timber-light-frame', 'timber-post-and-beam', 'unknown'), "diaphragm" VARCHAR, "occupied_hours_per_week"
      DOUBLE, "importance_factor" DOUBLE, "heritage" ENUM ('yes', 'no'), "seismic_weight_kN" DOUBLE,
      "unit_weight_kN_per_m2" DOUBLE, "storey_stiffness_longitudinal_kN_per_m" VARCHAR,
      "storey_stiffness_transverse_kN_per_m" VARCHAR, "wall_areas_longitudinal_m2" VARCHAR,
      "wall_areas_transverse_m2" VARCHAR, "wall_lengths_longitudinal_m" VARCHAR, "wall_lengths_transverse_m"
      VARCHAR, "column_count" DOUBLE, "column_width_m" DOUBLE, "column_depth_m" DOUBLE, "beam_width_m" DOUBLE,
      "beam_depth_m" DOUBLE, "bay_length_m" DOUBLE, "base_fixity" ENUM ('fixed', 'pinned'),
      "top_displacement_longitudinal_m" DOUBLE, "top_displacement_transverse_m" DOUBLE,
      "brace_area_longitudinal_m2" DOUBLE, "brace_area_transverse_m2" DOUBLE, "infill_thickness_m" DOUBLE,
      "infill_length_longitudinal_m" DOUBLE, "infill_length_transverse_m" DOUBLE, "concrete_strength_MPa" DOUBLE,
      "steel_height_share" DOUBLE, "measured_period_longitudinal_s" DOUBLE, "measured_period_transverse_s" DOUBLE,
      "measured_amplitude" ENUM ('ambient', 'forced', 'strong'), "soft_storey" ENUM ('yes', 'no'), "weak_storey"
      ENUM ('yes', 'no'), "torsion" ENUM ('yes', 'no'), "reentrant_corner" ENUM ('yes', 'no'), "setback" ENUM
      ('yes', 'no'), "mass_irregularity" ENUM ('yes', 'no'), "condition" VARCHAR, "vs30_mps" DOUBLE,
      "site_period_s" DOUBLE, "hazard_zone" VARCHAR, "design_base_shear_coefficient" DOUBLE, "design_level" ENUM
      ('working', 'strength'), "capacity_sa_g" DOUBLE, "assessment_cost" DOUBLE)`,
  `CREATE TABLE fill (inventory_number INTEGER NOT NULL, fill INTEGER NOT NULL, origin ENUM ('given', 'inferred',
      'default', 'unknown') NOT NULL, sigma DOUBLE NOT NULL, rule VARCHAR NOT NULL)`,
  `CREATE VIEW building AS SELECT i.inventory_id, c.building_index, c."id", c."name", c."group", e."part_of",
      c."lon", c."lat", e."footprint", e."count", c."storeys_above", e."storeys_below", e."storeys_total",
      c."height_m", e."first_storey_height_m", c."plan_length_m", c."plan_width_m", c."floor_area_m2",
      c."year_built", e."year_retrofitted", e."retrofit_level", c."status", c."system", e."system_transverse",
      e."diaphragm", c."use", c."occupants_peak", e."occupied_hours_per_week", e."importance_factor",
      e."heritage", e."seismic_weight_kN", e."unit_weight_kN_per_m2", e."storey_stiffness_longitudinal_kN_per_m",
      e."storey_stiffness_transverse_kN_per_m", e."wall_areas_longitudinal_m2", e."wall_areas_transverse_m2",
      e."wall_lengths_longitudinal_m", e."wall_lengths_transverse_m", e."column_count", e."column_width_m",
      e."column_depth_m", e."beam_width_m", e."beam_depth_m", e."bay_length_m", e."base_fixity",
      e."top_displacement_longitudinal_m", e."top_displacement_transverse_m", e."brace_area_longitudinal_m2",
      e."brace_area_transverse_m2", e."infill_thickness_m", e."infill_length_longitudinal_m",
      e."infill_length_transverse_m", e."concrete_strength_MPa", e."steel_height_share",
      e."measured_period_longitudinal_s", e."measured_period_transverse_s", e."measured_amplitude",
      e."soft_storey", e."weak_storey", e."torsion", e."reentrant_corner", e."setback", e."mass_irregularity",
      e."condition", c."site_class", e."vs30_mps", e."site_period_s", e."hazard_zone",
      e."design_base_shear_coefficient", e."design_level", e."capacity_sa_g", e."assessment_cost", f0.origin AS
      storeys_above_origin, f0.sigma AS storeys_above_sigma, f0.rule AS storeys_above_rule, f1.origin AS
      height_m_origin, f1.sigma AS height_m_sigma, f1.rule AS height_m_rule, f2.origin AS floor_area_m2_origin,
      f2.sigma AS floor_area_m2_sigma, f2.rule AS floor_area_m2_rule, c.year_built_origin, c.year_pool,
      c.use_origin, c.system_origin, c.rows, c.first_row, c.findings, c.not_ranked FROM building_core c JOIN
      inventory i ON i.inventory_number = c.inventory_number JOIN fill f0 ON f0.inventory_number =
      c.inventory_number AND f0.fill = c.storeys_above_fill JOIN fill f1 ON f1.inventory_number =
      c.inventory_number AND f1.fill = c.height_m_fill JOIN fill f2 ON f2.inventory_number = c.inventory_number
      AND f2.fill = c.floor_area_m2_fill LEFT JOIN building_extra e ON e.inventory_number = c.inventory_number AND
      e.building_index = c.building_index`,
  `CREATE TABLE year_pool (inventory_id VARCHAR NOT NULL, pool INTEGER NOT NULL, label VARCHAR NOT NULL, position
      INTEGER NOT NULL, year DOUBLE NOT NULL)`,
  `CREATE TABLE neighbour (inventory_id VARCHAR NOT NULL, id_a VARCHAR NOT NULL, id_b VARCHAR NOT NULL, gap_m
      DOUBLE, floors_aligned VARCHAR)`,
  `CREATE TABLE row_account (inventory_id VARCHAR NOT NULL, kind VARCHAR NOT NULL, rows INTEGER NOT NULL)`,
  `CREATE TABLE finding (inventory_id VARCHAR NOT NULL, "row" INTEGER, line INTEGER, id VARCHAR, column_name
      VARCHAR, value VARCHAR, code VARCHAR NOT NULL, message VARCHAR NOT NULL, action VARCHAR NOT NULL, kind
      VARCHAR NOT NULL)`,
  `CREATE TABLE run (run_id INTEGER PRIMARY KEY, made VARCHAR NOT NULL, program VARCHAR NOT NULL, note VARCHAR NOT
      NULL, title VARCHAR NOT NULL, inventory_id VARCHAR NOT NULL, study_fingerprint VARCHAR NOT NULL,
      methods_fingerprint VARCHAR NOT NULL, settings VARCHAR NOT NULL, study_text VARCHAR NOT NULL, summary
      VARCHAR NOT NULL, buildings INTEGER NOT NULL, ranked INTEGER NOT NULL, list_size INTEGER NOT NULL, rank_by
      VARCHAR NOT NULL, seed BIGINT NOT NULL)`,
  `CREATE TABLE result_assessed (run_id INTEGER NOT NULL, building_index INTEGER NOT NULL, "ln_priority" DOUBLE,
      "ln_priority_sd" DOUBLE, "governing" ENUM ('longitudinal', 'transverse'), "period_longitudinal_s" DOUBLE,
      "period_longitudinal_16_s" DOUBLE, "period_longitudinal_84_s" DOUBLE, "period_transverse_s" DOUBLE,
      "period_transverse_16_s" DOUBLE, "period_transverse_84_s" DOUBLE, "period_evidence" ENUM ('measured',
      'formula', 'stiffness', 'formula and stiffness'), "period_basis" ENUM ('best-fit', 'design', 'ambient',
      'measured', 'mechanics'), "sa_g" DOUBLE, "sa_level_2_g" DOUBLE, "capacity_g" DOUBLE, "demand_over_capacity"
      DOUBLE, "people_exposed" DOUBLE, "slope_k" DOUBLE, "spectrum" VARCHAR, "case_system" ENUM
      ('steel-moment-frame', 'steel-concentric-braced-frame', 'steel-eccentric-braced-frame',
      'steel-buckling-restrained-braced-frame', 'steel-light-frame', 'concrete-moment-frame',
      'concrete-infilled-frame', 'concrete-shear-wall', 'concrete-wall-frame', 'precast-concrete-frame',
      'precast-tilt-up-wall', 'reinforced-masonry-wall', 'confined-masonry-wall', 'unreinforced-masonry-wall',
      'timber-light-frame', 'timber-post-and-beam'), "case_edition" ENUM ('no seismic design', 'ubc-1927',
      'ubc-1935', 'ubc-1949', 'ubc-1961', 'ubc-1976', 'ubc-1988', 'ubc-1997', 'asce7-2002'), "case_chance" DOUBLE,
      "weak_type" ENUM ('unreinforced-masonry', 'concrete-frame-before-detailing', 'welded-steel-frame',
      'open-front-timber', 'tilt-up-before-wall-anchors', 'precast-frame'), "weak_chance" DOUBLE, "flags" VARCHAR,
      "not_ranked" VARCHAR)`,
  `CREATE TABLE result_ranked (run_id INTEGER NOT NULL, building_index INTEGER NOT NULL, "rank" INTEGER, "in_list"
      ENUM ('yes', 'no'), "chance" DOUBLE, "rank_best" INTEGER, "rank_worst" INTEGER, "tie_group" INTEGER,
      "priority" DOUBLE, "demand_rank" INTEGER, "demand_rank_last" INTEGER)`,
  `CREATE VIEW result AS SELECT a.run_id, a.building_index, k."rank", k."in_list", k."chance", k."rank_best",
      k."rank_worst", k."tie_group", k."priority", a."ln_priority", a."ln_priority_sd", k."demand_rank",
      k."demand_rank_last", a."governing", a."period_longitudinal_s", a."period_longitudinal_16_s",
      a."period_longitudinal_84_s", a."period_transverse_s", a."period_transverse_16_s",
      a."period_transverse_84_s", a."period_evidence", a."period_basis", a."sa_g", a."sa_level_2_g",
      a."capacity_g", a."demand_over_capacity", a."people_exposed", a."slope_k", a."spectrum", a."case_system",
      a."case_edition", a."case_chance", a."weak_type", a."weak_chance", a."flags", a."not_ranked" FROM
      result_assessed a JOIN result_ranked k ON k.run_id = a.run_id AND k.building_index = a.building_index`,
];

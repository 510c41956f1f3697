/** An invented place for every family of codes: each edition with its own hazard inputs. */
import type { CarriedFamily } from '../../src/engineering/capacity/families.js';
import type { EditionInputs } from '../../src/engineering/capacity/stated.js';
import type { CodeHistorySettings } from '../../src/engineering/assess/settings.js';
import { SETTINGS } from './engineering-settings.js';

const EDITIONS: Readonly<Record<CarriedFamily, EditionInputs>> = {
  'us-ubc-asce7': {
    'ubc-1927': { soil: 'soft' },
    'ubc-1935': { coefficient: 0.1 },
    ...SETTINGS.codeHistory!.editions,
  },
  japan: { 'japan-1924': {}, 'japan-1950': { zone_factor: 1 }, 'japan-1981': { zone_factor: 1, ground: 'type-2' } },
  'new-zealand': {
    'nz-1935': {},
    'nz-1955': {},
    'nz-1965': { zone: 'B' },
    'nz-1976': { zone: 'B' },
    'nz-2004': { site_class: 'C', zone_factor: 0.3, distance_km: 20 },
  },
  italy: {
    'italy-1909': {},
    'italy-1935': { category: 2 },
    'italy-1975': { category: 2 },
    'italy-2003': { ag_g: 0.25, soil_factor: 1.2, tc_s: 0.5 },
  },
  greece: {
    'greece-1959': { zone: 'II', ground: 'medium' },
    'greece-1985': { zone: 'II', ground: 'medium' },
    'greece-1995': { zone_g: 0.24, ground: 'B' },
  },
  turkey: {
    'turkey-1949': { coefficient: 0.03 },
    'turkey-1968': { zone: 1 },
    'turkey-1975': { zone: 1, ground_period_s: 0.5 },
    'turkey-1998': { zone: 1, ground: 'Z3' },
    'turkey-2018': { sds_g: 1.1, sd1_g: 0.5 },
  },
  india: {
    'india-1970': { zone: 'IV', soil_factor: 1.2 },
    'india-2002': { zone_factor: 0.24, soil: 'medium' },
    'india-2016': { zone_factor: 0.24, soil: 'medium' },
  },
  canada: {
    'canada-1953': { zone: 3 },
    'canada-1975': { zone: 3, foundation_factor: 1.3 },
    'canada-1990': { velocity_ratio: 0.2, acceleration_zone: 'equal', foundation_factor: 1.3 },
    'canada-2005': { s_0p2_g: 0.9, s_0p5_g: 0.6, s_1_g: 0.3, s_2_g: 0.15 },
  },
};

export function codeHistory(family: CarriedFamily, fields: Partial<CodeHistorySettings> = {}): CodeHistorySettings {
  return {
    place: 'invented',
    family,
    seismic_design_enforced_from: 1900,
    adoption_lag_years: 2,
    editions: EDITIONS[family],
    ...fields,
  };
}

/** What a study states for each edition of each family of codes. The names are those of engineering/capacity/stated.ts. */
import { z } from 'zod';
import { expected, number, strict, word } from './fields.js';

const zone_factor = number({ above: 0, to: 1 }).describe('Zone factor Z of the place in this edition.');
const site_factor = number({ from: 1, to: 2 }).describe('Site factor S.');
const g = (title: string) => number({ above: 0, to: 10, unit: 'g' }).describe(title);

/** One of the whole numbers 1 to `last`. */
function numbered<const T extends readonly number[]>(zones: T, what: string, title: string) {
  const list = `${zones.slice(0, -1).join(', ')} or ${String(zones.at(-1))}`;
  return z.literal(zones as readonly T[number][], { error: expected(`${what}: ${list}`) }).describe(title);
}
const zone3 = numbered([1, 2, 3], 'a zone', 'Zone of the place: 1, 2 or 3.');

const us = {
  'ubc-1927': strict({ soil: word(['firm', 'soft']).describe('Soil under the foundations.') }).describe(
    'UBC 1927 appendix; optional at the time: listing it says that the place adopted it.',
  ),
  'ubc-1935': strict({
    coefficient: number({ from: 0.08, to: 0.16 }).describe('Base shear coefficient the place used, 0.08 to 0.16.'),
  }).describe('UBC 1935 to 1946 appendix; optional at the time: listing it says that the place adopted it.'),
  'ubc-1949': strict({ zone: zone3 }).describe('UBC 1949 to 1958.'),
  'ubc-1961': strict({ zone_factor }).describe('UBC 1961 to 1973.'),
  'ubc-1976': strict({ zone_factor, site_factor }).describe('UBC 1976 to 1985.'),
  'ubc-1988': strict({ zone_factor, site_factor }).describe('UBC 1988 to 1994.'),
  'ubc-1997': strict({
    ca_g: g('Seismic coefficient Ca, g.'),
    cv_g: g('Seismic coefficient Cv, g.'),
    zone_factor,
    nv: number({ from: 1, to: 2 }).describe('Near-source factor Nv; 1 away from faults.'),
  }).describe('UBC 1997.'),
  'asce7-2002': strict({ sds_g: g('SDS, g.'), sd1_g: g('SD1, g.'), s1_g: g('S1, g.') }).describe(
    'ASCE 7-02 and later, with the values in force then.',
  ),
};

const japaneseZone = number({ from: 0.7, to: 1 }).describe('Seismic zone coefficient Z of the place, 0.7 to 1.0.');
const japan = {
  'japan-1924': strict({}).describe('Urban building law of 1924, in the cities it named: seismic coefficient 0.1.'),
  'japan-1950': strict({ zone_factor: japaneseZone }).describe('Building standard law of 1950: 0.2.'),
  'japan-1981': strict({
    zone_factor: japaneseZone,
    ground: word(['type-1', 'type-2', 'type-3']).describe('Ground type 1 (rock, stiff), 2 or 3 (soft).'),
  }).describe('New seismic design of June 1981.'),
};

const newZealandZone = word(['A', 'B', 'C']).describe('Seismic zone of the place.');
const newZealand = {
  'nz-1935': strict({}).describe('Model by-law of 1935: 0.08.'),
  'nz-1955': strict({}).describe('NZSS 95 of 1955: 0.08.'),
  'nz-1965': strict({ zone: newZealandZone }).describe('NZSS 1900 chapter 8 of 1965.'),
  'nz-1976': strict({ zone: newZealandZone }).describe('NZS 4203 of 1976 and 1984.'),
  'nz-2004': strict({
    site_class: word(['A', 'B', 'C', 'D']).describe('Site subsoil class.'),
    zone_factor: number({ from: 0.05, to: 1 }).describe('Hazard factor Z.'),
    distance_km: number({ from: 0, to: 1000, unit: 'km' }).describe(
      'Distance to the nearest major fault, km; 20 or more: far.',
    ),
  }).describe('NZS 1170.5 of 2004, at 500 years.'),
};

const category = (last: 2 | 3) =>
  last === 2
    ? numbered([1, 2], 'a category', 'Category of the municipality: 1 or 2.')
    : numbered([1, 2, 3], 'a category', 'Category of the municipality: 1, 2 or 3.');
const italy = {
  'italy-1909': strict({}).describe('Decree of 1909; listing it says that the municipality was listed.'),
  'italy-1935': strict({ category: category(2) }).describe('Rules of 1935 to 1975.'),
  'italy-1975': strict({ category: category(3) }).describe('Decrees of 1975 to 1996.'),
  'italy-2003': strict({
    ag_g: g('Design ground acceleration on rock, g.'),
    soil_factor: number({ from: 1, to: 2 }).describe('Soil factor S.'),
    tc_s: number({ from: 0.1, to: 2, unit: 's' }).describe('End of the plateau TC, s.'),
  }).describe('OPCM 3274 of 2003, NTC 2008 and NTC 2018, with the values in force then.'),
};

const greekTable = strict({
  zone: word(['I', 'II', 'III']).describe('Seismicity zone of the place.'),
  ground: word(['firm', 'medium', 'soft']).describe('Ground under the foundations.'),
});
const greece = {
  'greece-1959': greekTable.describe('Royal decree of 1959.'),
  'greece-1985': greekTable.describe('Additional articles of 1985: coefficients of 1959, detailing to be ductile.'),
  'greece-1995': strict({
    zone_g: number({ from: 0.08, to: 0.36, unit: 'g' }).describe('Ground acceleration A of the zone, g.'),
    ground: word(['A', 'B', 'C', 'D']).describe('Ground class of the code.'),
  }).describe('Spectral codes of 1995, 2000 and 2003.'),
};

const zone4 = numbered([1, 2, 3, 4], 'a zone', 'Zone of the place: 1, 2, 3 or 4.');
const turkey = {
  'turkey-1949': strict({
    coefficient: number({ from: 0.02, to: 0.04 }).describe('Seismic coefficient of the place, 0.02 to 0.04.'),
  }).describe('Regulation of 1949.'),
  'turkey-1968': strict({ zone: zone3 }).describe('Regulation of 1968.'),
  'turkey-1975': strict({
    zone: zone4,
    ground_period_s: number({ from: 0.1, to: 2, unit: 's' }).describe('Ground period T0, s.'),
  }).describe('Regulation of 1975.'),
  'turkey-1998': strict({
    zone: zone4,
    ground: word(['Z1', 'Z2', 'Z3', 'Z4']).describe('Local site class of the code.'),
  }).describe('Codes of 1998 and 2007.'),
  'turkey-2018': strict({ sds_g: g('SDS at 475 years, g.'), sd1_g: g('SD1 at 475 years, g.') }).describe('TBDY 2018.'),
};

const indianSpectral = strict({
  zone_factor: number({ from: 0.1, to: 0.36 }).describe('Zone factor Z of the place.'),
  soil: word(['hard', 'medium', 'soft']).describe('Soil type.'),
});
const india = {
  'india-1970': strict({
    zone: word(['I', 'II', 'III', 'IV', 'V']).describe('Zone of the place.'),
    soil_factor: number({ from: 1, to: 1.5 }).describe('Factor of soil and foundation β.'),
  }).describe('IS 1893 of 1970, 1975 and 1984.'),
  'india-2002': indianSpectral.describe('IS 1893 Part 1 of 2002.'),
  'india-2016': indianSpectral.describe('IS 1893 Part 1 of 2016.'),
};

const foundation_factor = (to: number) => number({ from: 1, to }).describe('Foundation factor F.');
const canada = {
  'canada-1953': strict({ zone: zone3 }).describe('NBC 1953, by number of storeys.'),
  'canada-1975': strict({ zone: zone3, foundation_factor: foundation_factor(1.5) }).describe('NBC 1975 to 1985.'),
  'canada-1990': strict({
    velocity_ratio: number({ above: 0, to: 0.4 }).describe('Zonal velocity ratio v of the place.'),
    acceleration_zone: word(['above', 'equal', 'below']).describe('The acceleration zone against the velocity zone.'),
    foundation_factor: foundation_factor(2),
  }).describe('NBC 1990 and 1995.'),
  'canada-2005': strict({
    s_0p2_g: g('S(0.2) with the site factor, g.'),
    s_0p5_g: g('S(0.5) with the site factor, g.'),
    s_1_g: g('S(1.0) with the site factor, g.'),
    s_2_g: g('S(2.0) with the site factor, g.'),
  }).describe('NBC 2005 to 2020, with the values in force then.'),
};

/** The fields of the editions of each family, oldest first. */
export const EDITION_FIELDS = {
  'us-ubc-asce7': us,
  japan,
  'new-zealand': newZealand,
  italy,
  greece,
  turkey,
  india,
  canada,
};

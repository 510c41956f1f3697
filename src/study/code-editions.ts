/** `code_history`: the editions a place used, each with the hazard inputs it was used with. Nothing here has a default except the lag. */
import { z } from 'zod';
import { SYSTEMS } from '../engineering/building.js';
import { expected, number, strict, text, whole, word } from './fields.js';

const zone_factor = number({ above: 0, to: 1 }).describe('Zone factor Z of the place in this edition.');
const site_factor = number({ from: 1, to: 2 }).describe('Site factor S.');
const g = (title: string) => number({ above: 0, to: 10, unit: 'g' }).describe(title);
const zones = [1, 2, 3] as const;

const editions = {
  'ubc-1927': strict({ soil: word(['firm', 'soft']).describe('Soil under the foundations.') }).describe(
    'UBC 1927 appendix; optional at the time: listing it says that the place adopted it.',
  ),
  'ubc-1935': strict({
    coefficient: number({ from: 0.08, to: 0.16 }).describe('Base shear coefficient the place used, 0.08 to 0.16.'),
  }).describe('UBC 1935 to 1946 appendix; optional at the time: listing it says that the place adopted it.'),
  'ubc-1949': strict({
    zone: z.literal(zones, { error: expected('a zone: 1, 2 or 3') }).describe('Zone of the place: 1, 2 or 3.'),
  }).describe('UBC 1949 to 1958.'),
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

/** Ids of the code editions a study may list, oldest first. */
export const CODE_EDITIONS = Object.keys(editions) as readonly (keyof typeof editions)[];

function optional<T extends Record<string, z.ZodType>>(shape: T) {
  return Object.fromEntries(Object.entries(shape).map(([key, schema]) => [key, z.exactOptional(schema)])) as {
    [K in keyof T]: z.ZodExactOptional<T[K]>;
  };
}

const year = (title: string) => whole({ from: 1800, to: 2100, what: 'a year' }).describe(title);

const detailing = Object.fromEntries(
  SYSTEMS.map((system) => [system, year(`Year from which ${system} was detailed to be ductile.`)]),
) as Record<(typeof SYSTEMS)[number], z.ZodInt>;

export const CodeHistorySchema = strict({
  place: text().describe('Whose code history this is; printed with the results.'),
  family: word(['us-ubc-asce7']).describe('Family of codes.'),
  seismic_design_enforced_from: year('First year in which seismic design was enforced; before it there was none.'),
  adoption_lag_years: number({ from: 0, to: 20, unit: 'years' })
    .default(2)
    .describe('Years from an edition to the buildings designed by it.'),
  editions: strict(optional(editions)).describe('Only the editions the place used, each with its own hazard inputs.'),
  detailing_from: strict(optional(detailing))
    .exactOptional()
    .describe('Year from which a system was detailed to be ductile, where the place differs from the family.'),
});

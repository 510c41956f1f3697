/** `code_history`: the editions a place used, each with the hazard inputs it was used with. Nothing here has a default except the lag. */
import { z } from 'zod';
import { SYSTEMS } from '../engineering/building.js';
import { CODE_FAMILIES, FAMILY_IDS, OWN_FAMILY, OWN_FAMILY_ID } from '../engineering/capacity/families.js';
import type { CarriedFamily } from '../engineering/capacity/families.js';
import { showValue } from '../errors.js';
import { EDITION_FIELDS } from './edition-fields.js';
import { expected, number, strict, text, whole } from './fields.js';
import { nearest, suggest } from './nearest.js';
import { ownTableFields } from './own-table.js';
import type { Finding } from './problems.js';

/** Ids of the code editions a study may list, family by family, oldest first. */
export const CODE_EDITIONS: readonly string[] = Object.values(EDITION_FIELDS).flatMap((fields) => Object.keys(fields));

type Optional<T extends Record<string, z.ZodType>> = { [K in keyof T]: z.ZodExactOptional<T[K]> };
function optional<T extends Record<string, z.ZodType>>(shape: T): Optional<T> {
  return Object.fromEntries(
    Object.entries(shape).map(([key, schema]) => [key, z.exactOptional(schema)]),
  ) as Optional<T>;
}

const year = (title: string) => whole({ from: 1800, to: 2100, what: 'a year' }).describe(title);

const detailing = Object.fromEntries(
  SYSTEMS.map((system) => [system, year(`Year from which ${system} was detailed to be ductile.`)]),
) as Record<(typeof SYSTEMS)[number], z.ZodInt>;

const common = {
  place: text().describe('Whose code history this is; printed with the results.'),
  seismic_design_enforced_from: year('First year in which seismic design was enforced; before it there was none.'),
  adoption_lag_years: number({ from: 0, to: 20, unit: 'years' })
    .default(2)
    .describe('Years from an edition to the buildings designed by it.'),
  detailing_from: strict(optional(detailing))
    .exactOptional()
    .describe('Year from which a system was detailed to be ductile, where the place differs from the family.'),
  weak_types: strict({
    tilt_up_before: year('Tilt-up walls by an edition before this year lack wall anchors.').exactOptional(),
    precast_before: year('Precast frames by an edition before this year are a weak type.').exactOptional(),
    welded_from: year('Welded steel moment frames by an edition from this year on are a weak type.').exactOptional(),
    welded_before: year('And by one before this year.').exactOptional(),
  })
    .exactOptional()
    .describe('Dates of weak structural types, where the place differs from the family.'),
};

const EDITIONS_HINT = 'Only the editions the place used, each with its own hazard inputs.';
const HISTORY_KEYS = 'place, family, seismic_design_enforced_from and editions below it (docs/code-histories.md)';

function wantedEditions(ids: readonly string[]): string {
  return (
    `the editions the place used, at least one of ${ids.join(', ')}, each with its hazard inputs; ` +
    'where seismic design was never required, one of them and seismic_design_enforced_from after the last building'
  );
}

function history<Id extends CarriedFamily>(family: Id) {
  const editions: (typeof EDITION_FIELDS)[Id] = EDITION_FIELDS[family];
  return strict({
    ...common,
    family: z.literal(family).describe(`Family of codes. ${CODE_FAMILIES[family].title}.`),
    editions: strict(optional(editions), {
      wanted: wantedEditions(Object.keys(editions)),
      unknown: unknownEdition,
    }).describe(EDITIONS_HINT),
  });
}

/** No edition at all, of the raw value of `code_history`: every building would count as not designed, without a word. */
export function checkEditions(history: unknown): Finding[] {
  const { family, editions } = (history ?? {}) as { readonly family?: unknown; readonly editions?: unknown };
  const fields = Object.entries(EDITION_FIELDS).find(([name]) => name === family)?.[1];
  const isEmpty = typeof editions === 'object' && editions !== null && Object.keys(editions).length === 0;
  if (fields === undefined || !isEmpty || Array.isArray(editions)) return [];
  const message = `expected ${wantedEditions(Object.keys(fields))}; got none`;
  return [{ path: ['code_history', 'editions'], message }];
}

/** Buildings after an edition that is not carried are read by the one before it. */
function unknownEdition(key: string, known: readonly string[]): string {
  const year = (id: string): number => Number(/\d{4}$/.exec(id)?.[0] ?? NaN);
  const code = (id: string): string => id.replace(/\d{4}$/, '');
  const before = known.findLast((id) => code(id) === code(key) && year(id) < year(key));
  if (nearest(key, known) !== undefined || before === undefined) return suggest(key, known);
  return `; known: ${known.join(', ')}; the last before ${String(year(key))} is ${before}`;
}

const known = [...FAMILY_IDS, OWN_FAMILY_ID].join(', ');

export const CodeHistorySchema = z.discriminatedUnion(
  'family',
  [
    history('us-ubc-asce7'),
    history('japan'),
    history('new-zealand'),
    history('italy'),
    history('greece'),
    history('turkey'),
    history('india'),
    history('canada'),
    strict({
      ...common,
      family: z.literal(OWN_FAMILY_ID).describe(`Family of codes. ${OWN_FAMILY.title}.`),
      ...ownTableFields,
    }),
  ],
  {
    error: (issue) => {
      if (issue.code !== 'invalid_union') return expected(HISTORY_KEYS)(issue);
      const { family } = issue.input as { readonly family?: unknown };
      if (family === undefined) return `missing; expected one of ${known}`;
      return typeof family === 'string'
        ? `unknown word ${showValue(family)}; known: ${known}`
        : `expected one of ${known}, got ${family === null ? 'nothing' : showValue(family)}`;
    },
  },
);

/** The study file: one schema gives the type, the validation and the JSON Schema for editors. */
import { z } from 'zod';
import { SYSTEMS } from '../engineering/building.js';
import type { System } from '../engineering/building.js';
import { STRENGTH_CHECKS } from '../engineering/assess/settings.js';
import { BASES, PERIOD_STANDARDS } from '../engineering/period/choose.js';
import { VS30_TABLES } from '../engineering/site/vs30.js';
import { showValue } from '../errors.js';
import { CapacitySchema, PeopleSchema, SpreadsSchema } from './assumed-schema.js';
import { BudgetSchema } from './budget-schema.js';
import { CodeHistorySchema } from './code-editions.js';
import { expected, list, mapping, number, strict, text, whole, word } from './fields.js';
import { InventorySchema, NeighboursSchema, WordsSchema } from './inventory-schema.js';
import { IrregularitySchema } from './irregularity-schema.js';
import { SpectrumSchema } from './spectrum-codes.js';
import { SurveySchema } from './survey-schema.js';

const levelTitle = text().describe('Name of the level in reports; no two alike.');
const spectrumName = text('the name of a spectrum of hazard.spectra');

const otherwise = spectrumName
  .exactOptional()
  .describe('The spectrum of buildings whose value is blank or not listed; without it they are not ranked.');

const byColumn = strict({
  title: levelTitle,
  by: word(['site_class', 'hazard_zone']).describe('The column that says which spectrum a building reads.'),
  spectra: mapping(z.string(), spectrumName, 'site classes or zones, each with the name of a spectrum', 1).describe(
    'Its values, each with the name of a spectrum.',
  ),
  otherwise,
});

const VELOCITY_CODES = Object.keys(VS30_TABLES) as readonly (keyof typeof VS30_TABLES)[];

const byVelocity = strict({
  title: levelTitle,
  by: z.literal('vs30').describe('The site class of vs30_mps; where that is blank, the one of the column site_class.'),
  classes: word(VELOCITY_CODES).describe(
    'The code whose site classes are meant: letters do not carry from one to another.',
  ),
  spectra: mapping(z.string(), spectrumName, 'site classes, each with the name of a spectrum', 1).describe(
    'Site classes of that code, each with the name of a spectrum.',
  ),
  otherwise,
});

const byName = strict({
  title: levelTitle,
  by: z.literal('spectrum').describe('The column spectrum of the inventory names the spectrum of each building.'),
  spectra: mapping(z.string(), spectrumName, 'names of the inventory, each with the name of a spectrum', 1)
    .exactOptional()
    .describe('Names of the inventory, each with the name of a spectrum; left out, they are names of hazard.spectra.'),
  otherwise,
});

const LEVEL_KEYS = ['site_class', 'hazard_zone', 'vs30', 'spectrum'] as const;

const LevelSchema = z.union(
  [
    strict({ title: levelTitle, spectrum: spectrumName.describe('The spectrum every building reads.') }),
    z.discriminatedUnion('by', [byColumn, byVelocity, byName], {
      error: (issue) => {
        const by = (issue.input as { by?: unknown } | undefined)?.by;
        return by === undefined ? undefined : `unknown word ${showValue(by)}; known: ${LEVEL_KEYS.join(', ')}`;
      },
    }),
  ],
  { error: expected('{title, spectrum} or {title, by, spectra, otherwise}') },
);

const entryName = z.string().regex(/^[^\s./\\]+$/, {
  error: ({ input }) =>
    `the name ${JSON.stringify(input)} of a spectrum may not be empty or hold blanks, dots or slashes`,
});

const HazardSchema = strict({
  spectra: mapping(entryName, SpectrumSchema, 'at least one spectrum with a name', 1).describe(
    'Spectra by name: the 5 % elastic spectral acceleration in g.',
  ),
  levels: list(LevelSchema, 'a list of at least one level', 1).describe(
    'Levels of shaking; the first ranks, all are reported.',
  ),
  hold_plateau: z
    .boolean({ error: expected('true or false') })
    .default(true)
    .describe('true: below the plateau the ranking holds its value; false: the ramp is used.'),
});

const formulaFor = Object.fromEntries(
  SYSTEMS.map((system) => [
    system,
    text('the id of a period formula').exactOptional().describe(`Id of the period formula tried first for ${system}.`),
  ]),
) as Readonly<Record<System, z.ZodExactOptional<z.ZodString>>>;

const PeriodSchema = strict({
  standard: word(PERIOD_STANDARDS).default('asce41-17').describe('Whose period formulas are used.'),
  basis: word(BASES)
    .default('best-fit')
    .describe(
      'Best estimate, or the short side used for design. ASCE 7 has no best-fit set: ASCE 41-17 is read; the other standards have one set each.',
    ),
  formula_for: strict(formulaFor)
    .prefault({})
    .describe(
      'Lateral systems, each with the id of a formula tried before those of the standard: a regression, or another standard.',
    ),
  switched_off: list(text('the id of a method'), 'a list of method ids')
    .default([])
    .describe('Ids of period formulas and stiffness routes not to be used.'),
});

const slope = expected('from-levels or a number 1 to 5');

const RankingSchema = strict({
  rank_by: word(['people', 'ratio', 'demand'])
    .default('people')
    .describe('people: demand over capacity times people; ratio: without people; demand: spectral demand alone.'),
  list_size: whole({ from: 1, to: Number.MAX_SAFE_INTEGER }).default(20).describe('How many buildings the list holds.'),
  k: z
    .union([z.literal('from-levels'), z.number({ error: slope }).gte(1, { error: slope }).lte(5, { error: slope })], {
      error: slope,
    })
    .default('from-levels')
    .describe(
      'Slope of the hazard curve in logarithms: from two levels, or a number 1 to 5. Left out with one level it is 2.5, reported as assumed.',
    ),
});

const StrengthCheckSchema = strict({
  method: word(STRENGTH_CHECKS)
    .default('asce41-17')
    .describe('Average stress of ASCE 41 by edition, the Japanese first-level index (concrete), or none.'),
  time_index: number({ from: 0.7, to: 1 })
    .default(0.9)
    .describe('Time index T of the Japanese index: age and state, 0.7 to 1.0 [judgement].'),
});

/** The shape of study.yaml. What one key says about another is checked in checks.ts. */
export const StudySchema = strict({
  title: text().describe('Title of the study, printed on every report.'),
  inventory: InventorySchema.describe('The table of buildings.'),
  neighbours: NeighboursSchema.exactOptional(),
  words: WordsSchema.prefault({}).describe("The study's own words and ours; case and outer blanks do not matter."),
  hazard: HazardSchema.describe('Spectra, and who reads which.'),
  period: PeriodSchema.prefault({}).describe('How periods are estimated.'),
  code_history: CodeHistorySchema.describe('What the place required of new buildings, and when.'),
  strength_check: StrengthCheckSchema.prefault({}).describe(
    'Capacity from areas of columns, walls or braces, for rows that have them and no design coefficient.',
  ),
  system_prior: text('the path of a file')
    .exactOptional()
    .describe('Table of chances of the lateral system by use, storeys and year; needed where systems are unknown.'),
  capacity: CapacitySchema.prefault({}).describe('What capacities rest on besides the codes.'),
  people: PeopleSchema.prefault({}).describe('People by use, and how much they weigh.'),
  spreads: SpreadsSchema.prefault({}).describe(
    'The one register of spreads, in natural logarithms [defaults judgement].',
  ),
  irregularity: IrregularitySchema.prefault({}).describe('Irregularities: limits, factors, chances.'),
  ranking: RankingSchema.prefault({}).describe('What the list is ordered by, and how long it is.'),
  survey: SurveySchema.prefault({}).describe('What visits cost and find out, for planning a survey.'),
  budget: BudgetSchema.exactOptional().describe('What assessments cost, and which must or must not be among them.'),
  seed: whole({ from: 0, to: 2 ** 32 - 1 })
    .default(1)
    .describe('Seed of every random draw.'),
  output: text('the path of a folder').default('reports').describe('Folder for reports, relative to this file.'),
});

/** A study with every default filled in. */
export type Study = z.output<typeof StudySchema>;
/** One entry of `hazard.levels`. */
export type Level = Study['hazard']['levels'][number];

/** The JSON Schema (draft 7) of study.yaml, for editors; defaults and descriptions included. */
export function studyJsonSchema(): Record<string, unknown> {
  const { $schema, ...rest } = z.toJSONSchema(StudySchema, { io: 'input', target: 'draft-7' });
  return { $schema, title: 'swaymark study', ...rest };
}

/** The spectra a study may define, made from the register of spectrum codes: schema, messages and editor follow the records. */
import { z } from 'zod';
import { describeSpec } from '../engineering/formula.js';
import type { InputSpec } from '../engineering/formula.js';
import { parametersOf } from '../engineering/spectrum/code.js';
import type { SpectrumCode } from '../engineering/spectrum/code.js';
import { HAZARD_GRID } from '../engineering/spectrum/grid.js';
import { compileSpectrum, SPECTRUM_REGISTER } from '../engineering/spectrum/definition.js';
import type { SpectrumDefinition } from '../engineering/spectrum/definition.js';
import { showValue } from '../errors.js';
import { expected, list, number, strict, text, word } from './fields.js';
import { SPECTRUM_UNITS } from './spectrum-units.js';

/** A spectrum of a study: its code and parameters, and what the study says about it. */
export type SpectrumEntry = SpectrumDefinition & {
  readonly return_period_years?: number;
  readonly note?: string;
};

const common = {
  return_period_years: number({ above: 0, to: 100000, unit: 'years' })
    .exactOptional()
    .describe('Mean return period of the shaking, years. Two levels that state theirs give the slope k.'),
  note: text().exactOptional().describe('Where the numbers come from; printed with the spectrum.'),
};

function fieldOf(spec: InputSpec): z.ZodType {
  if (spec.kind === 'word') return word(spec.words ?? []);
  if (spec.kind === 'number') return number(spec);
  return list(number(spec), describeSpec(spec), spec.least ?? 0, spec.most);
}

/** The field of one parameter: what may be left out gets its default, and the editor is told what it is. */
function parameter(spec: InputSpec): z.ZodType {
  const meaning = `${spec.meaning.charAt(0).toUpperCase()}${spec.meaning.slice(1)}`;
  const described = spec.unit === undefined ? `${meaning}.` : `${meaning}, ${spec.unit}.`;
  const field = fieldOf(spec);
  return (spec.fallback === undefined ? field : field.default(spec.fallback)).describe(described);
}

function schemaOf(entry: SpectrumCode) {
  return strict({
    code: z.literal(entry.code).describe(`${entry.title}.`),
    ...Object.fromEntries(parametersOf(entry).map((spec) => [spec.name, parameter(spec)])),
    ...common,
  });
}

/** A table in a file of its own; it is read with the study (table-files.ts) and becomes a `table`. */
export const TABLE_FILE = 'table-file';

const tableFile = strict({
  code: z.literal(TABLE_FILE).describe('A spectrum given by its ordinates in a file.'),
  file: text('the path of a file').describe('Table of periods and 5 % elastic ordinates, relative to this file.'),
  unit: word(SPECTRUM_UNITS)
    .exactOptional()
    .describe('Unit of the ordinates; left out, the heading of the file names it.'),
  interpolation: word(['linear', 'log-log']).describe('Between the periods: linear, or straight in logarithms.'),
  ...common,
});

const hazardGrid = strict({
  code: z.literal(HAZARD_GRID).describe('Hazard that varies over the map: each building reads its own spectrum.'),
  file: text('the path of a file').describe(
    'Grid of 5 % elastic ordinates, CSV or Parquet, relative to this file: one row a node with lon, lat and a column for each period, such as SA(0.2).',
  ),
  unit: word(SPECTRUM_UNITS)
    .exactOptional()
    .describe('Unit of the ordinates; left out, the headings of the file name it.'),
  interpolation: word(['linear', 'log-log']).describe(
    'Between the periods: linear, or straight in logarithms. Between the nodes it is bilinear in ln S_a.',
  ),
  ...common,
});

const SPECTRA = [...SPECTRUM_REGISTER.map(schemaOf), tableFile, hazardGrid] as unknown as [
  ReturnType<typeof schemaOf>,
  ...ReturnType<typeof schemaOf>[],
];

/** Ids of the spectrum codes a study may name. */
export const SPECTRUM_CODES: readonly string[] = [
  ...SPECTRUM_REGISTER.map(({ code }) => code),
  TABLE_FILE,
  HAZARD_GRID,
];

const union = z.discriminatedUnion('code', SPECTRA, {
  error: (issue) => {
    if (issue.code !== 'invalid_union') return expected('a spectrum: its code and parameters')(issue);
    const code = (issue.input as { code?: unknown }).code;
    const problem = code === undefined ? 'missing' : `unknown code ${showValue(code)}`;
    return `${problem}; known: ${SPECTRUM_CODES.join(', ')}`;
  },
}) as unknown as z.ZodType<SpectrumEntry, SpectrumEntry>;

/** A code and its parameters, each in its range and all of them together such that the code has a spectrum for them. */
export const SpectrumSchema = union.superRefine((entry, context) => {
  // checks.ts speaks of tables, place by place; a file of its own is read later; what a range refuses has been said
  if (entry.code === 'table' || entry.code === TABLE_FILE || entry.code === HAZARD_GRID) return;
  if (context.issues.length > 0) return;
  try {
    compileSpectrum(entry);
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    context.addIssue({ code: 'custom', message: error.message });
  }
});

/** A spectrum as the study states it (code and parameters), and how it becomes a record, its inputs and segments. */
import { misfit } from '../formula.js';
import type { AnyRecord, Inputs, InputValue } from '../formula.js';
import { ASCE41_CODES } from './asce41.js';
import { ASCE7_CODES } from './asce7.js';
import { ASCE7_MAPPED_CODES } from './asce7-mapped.js';
import { ASCE7_MULTI_CODES } from './asce7-multi.js';
import { parametersOf } from './code.js';
import type { SpectrumCode } from './code.js';
import type { CompiledSpectrum } from './compiled.js';
import { EN1998_CODES } from './en1998.js';
import { EN1998_DESIGN_CODES } from './en1998-design.js';
import type { SpectrumFamily } from './family.js';
import { IS1893_CODES } from './is1893.js';
import { NBC_CODES } from './nbc.js';
import { NZS1170_CODES } from './nzs1170.js';
import { TABLE_CODES } from './table.js';
import { WORLD_CODES, WORLD_RECORDS } from './world.js';

/** Every code a study may name, in the order they are listed. */
export const SPECTRUM_REGISTER: readonly SpectrumCode[] = [
  ...ASCE7_CODES,
  ...ASCE7_MULTI_CODES,
  ...ASCE7_MAPPED_CODES,
  ...ASCE41_CODES,
  ...EN1998_CODES,
  ...EN1998_DESIGN_CODES,
  ...NZS1170_CODES,
  ...NBC_CODES,
  ...IS1893_CODES,
  ...WORLD_CODES,
  ...TABLE_CODES,
];

/** `code` and its parameters by their names; what is left out takes the fallback of the record's input. */
export interface SpectrumDefinition {
  readonly code: string;
  readonly [parameter: string]: InputValue | undefined;
}

export interface SpectrumReading {
  readonly record: AnyRecord;
  /** The record's inputs but the period, fallbacks included. */
  readonly inputs: Inputs;
  readonly compiled: CompiledSpectrum;
}

/** The record that evaluates a definition, with its inputs and compiled segments. @throws RangeError for parameters it cannot take. */
export function compileSpectrum(definition: SpectrumDefinition): SpectrumReading {
  const entry = SPECTRUM_REGISTER.find(({ code }) => code === definition.code);
  if (entry === undefined) throw new RangeError(`unknown spectrum code "${definition.code}"`);
  const given: Record<string, InputValue> = {};
  for (const spec of parametersOf(entry)) {
    const value = definition[spec.name] ?? spec.fallback;
    if (value === undefined) throw new RangeError(`${definition.code} needs ${spec.name}`);
    // The ranges of numbers are checked where numbers come in (the study, calc); a scaled spectrum may leave them.
    const wrong = typeof value === 'string' || spec.kind === 'word' ? misfit(spec, value) : null;
    if (wrong !== null) throw new RangeError(wrong);
    given[spec.name] = value;
  }
  const { record, inputs } = recordAndInputs(entry, given);
  return { record, inputs, compiled: (record.family as SpectrumFamily<Inputs>).compile(inputs) };
}

function recordAndInputs(
  { record, choice }: SpectrumCode,
  given: Readonly<Record<string, InputValue>>,
): Pick<SpectrumReading, 'record' | 'inputs'> {
  if (choice === undefined) return { record, inputs: given };
  const { [choice.name]: word, ...inputs } = given;
  return { record: choice.records[String(word)] ?? record, inputs };
}

export const SPECTRUM_RECORDS: readonly AnyRecord[] = [
  ...SPECTRUM_REGISTER.flatMap(({ record, choice }) =>
    choice === undefined ? [record] : Object.values(choice.records),
  ),
  ...WORLD_RECORDS,
];

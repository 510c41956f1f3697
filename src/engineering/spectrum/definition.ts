/** A spectrum as the study states it (code and parameters), and how it becomes a record, its inputs and segments. */
import type { AnyRecord, Inputs } from '../formula.js';
import { ASCE7_22_TWO_PERIOD } from './asce7.js';
import type { CompiledSpectrum } from './compiled.js';
import { EN1998_ELASTIC_TYPE_1, EN1998_ELASTIC_TYPE_2 } from './en1998.js';
import type { SpectrumFamily } from './family.js';
import { TABLE_LINEAR, TABLE_LOG_LOG } from './table.js';

export type SpectrumDefinition =
  | { readonly code: 'asce7-22-two-period'; readonly sds_g: number; readonly sd1_g: number; readonly tl_s: number }
  | {
      readonly code: 'en1998-1-2004-elastic-type-1' | 'en1998-1-2004-elastic-type-2';
      readonly ag_g: number;
      readonly ground: string;
    }
  | {
      readonly code: 'table';
      readonly periods_s: readonly number[];
      readonly ordinates_g: readonly number[];
      readonly interpolation: 'linear' | 'log-log';
    };

export interface SpectrumReading {
  readonly record: AnyRecord;
  /** The record's inputs but the period. */
  readonly inputs: Inputs;
  readonly compiled: CompiledSpectrum;
}

/** The record that evaluates a definition, with its inputs and compiled segments. @throws RangeError for parameters it cannot take. */
export function compileSpectrum(definition: SpectrumDefinition): SpectrumReading {
  const method = methodOf(definition);
  const inputs = Object.fromEntries(
    Object.entries(definition).filter(([name]) => method.family.inputs.some((input) => input.name === name)),
  ) as Inputs;
  const family = method.family as SpectrumFamily<Inputs>;
  return { record: method, inputs, compiled: family.compile(inputs) };
}

function methodOf(definition: SpectrumDefinition): AnyRecord {
  switch (definition.code) {
    case 'asce7-22-two-period':
      return ASCE7_22_TWO_PERIOD;
    case 'en1998-1-2004-elastic-type-1':
      return EN1998_ELASTIC_TYPE_1;
    case 'en1998-1-2004-elastic-type-2':
      return EN1998_ELASTIC_TYPE_2;
    case 'table':
      return definition.interpolation === 'linear' ? TABLE_LINEAR : TABLE_LOG_LOG;
  }
}

export const SPECTRUM_RECORDS: readonly AnyRecord[] = [
  ASCE7_22_TWO_PERIOD,
  EN1998_ELASTIC_TYPE_1,
  EN1998_ELASTIC_TYPE_2,
  TABLE_LINEAR,
  TABLE_LOG_LOG,
];

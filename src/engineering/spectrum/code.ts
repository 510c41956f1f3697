/** A spectrum as a study may name it: the one source of its parameters is the record's family (inputs but the period). */
import type { AnyRecord, InputSpec } from '../formula.js';

export interface SpectrumCode {
  /** As the study writes it. */
  readonly code: string;
  readonly title: string;
  /** Its family is a SpectrumFamily. */
  readonly record: AnyRecord;
  /** The spectrum contains a behaviour, reduction or importance factor: it serves base shear, and no level may read it. */
  readonly reduced?: true;
  /** A parameter of the study that says which of several records with the same inputs is read. */
  readonly choice?: {
    readonly name: string;
    readonly meaning: string;
    readonly records: Readonly<Record<string, AnyRecord>>;
    /** Word taken when the study gives none. */
    readonly fallback?: string;
  };
}

/** The parameters of a code in the order a study is asked for them; those it must state have no fallback. */
export function parametersOf({ record, choice }: SpectrumCode): readonly InputSpec[] {
  const own = record.family.inputs.filter(({ name }) => name !== 'period_s').map(asked);
  if (choice === undefined) return own;
  const { name, meaning, records, fallback } = choice;
  const spec = { name, kind: 'word', words: Object.keys(records), meaning } as const;
  return [...own, fallback === undefined ? spec : { ...spec, fallback }];
}

function asked(spec: InputSpec): InputSpec {
  if (spec.stated !== true) return spec;
  const { fallback: _fallback, ...rest } = spec;
  return rest;
}

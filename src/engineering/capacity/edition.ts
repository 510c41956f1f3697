/** An edition of a code as data: what it is, how it was come by, and what it asked of a building. */
import { SYSTEMS } from '../building.js';
import type { Building, DirectionName, System } from '../building.js';
import { record } from '../formula.js';
import type { AnyRecord, Family, Inputs, InputSpec, Limit, MethodRecord } from '../formula.js';
import type { Source, Verified } from '../source.js';
import type { Trace } from '../trace.js';

/** What of a building the coefficient of an edition depends on; `more`: on its plan too. */
export type DependsOn = 'nothing' | 'storeys' | 'height' | 'more';

/** What an edition reads of a building. */
export interface DesignFacts {
  readonly building: Building;
  readonly direction: DirectionName;
  readonly system: System;
  readonly height_m: number;
  /** Detailed to be ductile by the rules of the family. */
  readonly ductile: boolean;
}

/** What an edition asked. */
export interface EraDesign {
  /** V/W at the level of the edition. */
  readonly coefficient: number;
  /** From that level to strength. */
  readonly levelFactor: number;
  /** The edition's own reduction of the elastic force, Infinity where it knows none. It may depend on system and detailing alone. */
  readonly reduction: number;
}

export const NOT_DESIGNED: EraDesign = { coefficient: 0, levelFactor: 1, reduction: Infinity };

export interface CodeEdition<Stated = unknown> {
  /** Year in print, or in force where it came at once. */
  readonly year: number;
  readonly title: string;
  readonly source: Source;
  /** How the row was come by: the weakest of what it needs. */
  readonly verified: Verified;
  readonly note?: string;
  /** False for a system to which it gives no coefficient: such a building counts as not designed. Left out: it has one for all. */
  readonly hasRow?: (system: System) => boolean;
  readonly dependsOn: (system: System) => DependsOn;
  /** What it asked, with its own period formula and what the study states for the place. */
  readonly design: (facts: DesignFacts, stated: Stated, trace?: Trace) => EraDesign;
}

/** Plan dimension along the force: the length for the longitudinal direction. Square root of the plate's area when not known. */
export function planDimension_m({ building, direction }: DesignFacts): number {
  const side = direction === 'longitudinal' ? building.plan_length_m : building.plan_width_m;
  if (side > 0) return side;
  const plate = building.floor_area_m2.value / Math.max(1, building.storeys.value);
  return plate > 0 ? Math.sqrt(plate) : 15;
}

/** The record of that id. @throws Error for an id that is not there: a slip of ours. */
export function recordOf(list: readonly AnyRecord[], id: string): AnyRecord {
  const found = list.find((one) => one.id === id);
  if (found === undefined) throw new Error(`no record ${id}`);
  return found;
}

/** A value by system: `otherwise` for those that are not listed. */
export function bySystem<T>(otherwise: T, listed: Partial<Record<System, T>>): Readonly<Record<System, T>> {
  return Object.fromEntries(SYSTEMS.map((system) => [system, listed[system] ?? otherwise])) as Record<System, T>;
}

/** Which of four rows of a period table a system reads. */
export type PeriodClass = 'steel-moment-frame' | 'concrete-moment-frame' | 'eccentric-braced' | 'other';
export const PERIOD_CLASSES = bySystem<PeriodClass>('other', {
  'steel-moment-frame': 'steel-moment-frame',
  'concrete-moment-frame': 'concrete-moment-frame',
  'precast-concrete-frame': 'concrete-moment-frame',
  'steel-eccentric-braced-frame': 'eccentric-braced',
  'steel-buckling-restrained-braced-frame': 'eccentric-braced',
});

export function isMomentFrame(system: System): boolean {
  const row = PERIOD_CLASSES[system];
  return row === 'steel-moment-frame' || row === 'concrete-moment-frame';
}

/** Input of the coefficient records. */
export const number = (name: string, meaning: string, unit?: string): InputSpec =>
  unit === undefined ? { name, kind: 'number', meaning } : { name, kind: 'number', unit, meaning };
export const PERIOD: InputSpec = number('period_s', "period by the edition's own formula", 's');

type Numbers = Readonly<Record<string, number>>;
type Coefficient = MethodRecord<Inputs, Numbers>;

/** How a coefficient is worked out. */
export interface CoefficientForm {
  readonly id: string;
  readonly inputs: readonly InputSpec[];
  readonly expression: string;
  readonly evaluate: (inputs: Numbers, constants: Numbers) => number;
  readonly yields?: string;
  readonly symbol?: string;
}

/** A record of a design coefficient, or of a factor of one (`which`). */
export function coefficientRecord(
  id: string,
  title: string,
  { id: form, inputs, expression, evaluate, yields, symbol }: CoefficientForm,
  facts: {
    readonly source: Source;
    readonly verified: Verified;
    readonly note: string;
    readonly limits?: readonly Limit[];
  },
  constants: Numbers = {},
): Coefficient {
  const family: Family<Inputs, Numbers> = {
    id: form,
    yields: yields ?? 'design_base_shear_coefficient',
    unit: null,
    symbol: symbol ?? 'C_d',
    inputs,
    expression,
    evaluate: (given, fixed) => evaluate(given as Numbers, fixed),
  };
  return record({ id, title, family, constants, limits: [], ...facts });
}

/** The coefficient is a number of the code itself. */
export const fixedForm: CoefficientForm = {
  id: 'base-shear/fixed',
  inputs: [],
  expression: 'coefficient',
  evaluate: (_inputs, { coefficient }) => coefficient!,
};

/** The coefficient stands in a table of the code by zone or ground. */
export const tabledForm: CoefficientForm = {
  id: 'base-shear/tabled',
  inputs: [number('coefficient', 'coefficient of the zone and ground of the place')],
  expression: 'coefficient',
  evaluate: ({ coefficient }) => coefficient!,
};

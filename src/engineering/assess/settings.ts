/** Everything of a study that an assessment depends on, as plain data: stored with the run and shipped with the page. */
import type { System } from '../building.js';
import type { Basis, PeriodStandard } from '../period/choose.js';
import type { SystemPriorGroup } from '../prior/system-prior.js';
import type { VelocityCode } from '../site/vs30.js';
import type { SpectrumDefinition } from '../spectrum/definition.js';
import { assumedWith } from './assumed.js';
import type { Assumed } from './assumed.js';

export const RANK_BY = ['people', 'ratio', 'demand'] as const;
export type RankBy = (typeof RANK_BY)[number];

export type NamedSpectrum = SpectrumDefinition & { readonly return_period_years?: number | undefined };

export interface LevelSettings {
  readonly title: string;
  /** What says which spectrum a building reads; vs30: the site class of its shear-wave velocity; null: one spectrum for all. */
  readonly by: 'site_class' | 'hazard_zone' | 'vs30' | 'spectrum' | null;
  /** With `by` vs30 only: the code whose classes are meant. */
  readonly classes?: VelocityCode | undefined;
  /** Site class, zone or name in the inventory -> spectrum name; with `by` null the only entry is "all". */
  readonly spectra: Readonly<Record<string, string>>;
  /** Spectrum of buildings whose class, zone or name is blank or not listed. */
  readonly otherwise: string | null;
}

/** Editions of the US code history a place used, each with its own hazard inputs. */
export interface EditionInputs {
  readonly 'ubc-1927'?: { readonly soil: 'firm' | 'soft' } | undefined;
  readonly 'ubc-1935'?: { readonly coefficient: number } | undefined;
  readonly 'ubc-1949'?: { readonly zone: number } | undefined;
  readonly 'ubc-1961'?: { readonly zone_factor: number } | undefined;
  readonly 'ubc-1976'?: { readonly zone_factor: number; readonly site_factor: number } | undefined;
  readonly 'ubc-1988'?: { readonly zone_factor: number; readonly site_factor: number } | undefined;
  readonly 'ubc-1997'?:
    { readonly ca_g: number; readonly cv_g: number; readonly zone_factor: number; readonly nv: number } | undefined;
  readonly 'asce7-2002'?: { readonly sds_g: number; readonly sd1_g: number; readonly s1_g: number } | undefined;
}

export interface CodeHistorySettings {
  readonly place: string;
  readonly seismic_design_enforced_from: number;
  readonly adoption_lag_years: number;
  readonly editions: EditionInputs;
  readonly detailing_from?: Partial<Record<System, number>> | undefined;
}

/** Standard deviations of natural logarithms: the one register of spreads [judgement throughout]. */
export interface Spreads {
  readonly heightFormula: number;
  readonly storeyStiffness: number;
  readonly storeySections: number;
  readonly storeyWalls: number;
  readonly storeySway: number;
  readonly measuredStrong: number;
  readonly measuredSmall: number;
  readonly leastPeriod: number;
  readonly leastMeasured: number;
  readonly unitWeight: number;
  readonly era: number;
  readonly eraTable: number;
  readonly overstrength: number;
  readonly assessedCapacity: number;
  readonly peopleKnownUse: number;
  readonly peopleUnknownUse: number;
  readonly peopleCounted: number;
  /** Years either side of a change of edition over which the chance moves from the old to the new. */
  readonly editionChange_years: number;
}

export const SPREADS: Spreads = {
  heightFormula: 0.3,
  storeyStiffness: 0.2,
  storeySections: 0.3,
  storeyWalls: 0.35,
  storeySway: 0.3,
  measuredStrong: 0.1,
  measuredSmall: 0.2,
  leastPeriod: 0.2,
  leastMeasured: 0.1,
  unitWeight: 0.15,
  era: 0.15,
  eraTable: 0.2,
  overstrength: 0.3,
  assessedCapacity: 0.2,
  peopleKnownUse: 0.4,
  peopleUnknownUse: 0.7,
  peopleCounted: 0.2,
  editionChange_years: 3,
};

export interface AssessSettings {
  readonly spectra: Readonly<Record<string, NamedSpectrum>>;
  readonly levels: readonly LevelSettings[];
  readonly holdPlateau: boolean;
  readonly period: {
    readonly standard: PeriodStandard;
    readonly basis: Basis;
    /** Ids of formulas tried before those of the standard. */
    readonly formulaFor: Partial<Readonly<Record<System, string>>>;
    readonly switchedOff: readonly string[];
  };
  readonly codeHistory: CodeHistorySettings | null;
  readonly systemPrior: readonly SystemPriorGroup[] | null;
  readonly rankBy: RankBy;
  /** A number for all, or one per spectrum of the ranking level (found from two levels). */
  readonly slope: number | Readonly<Record<string, number>>;
  readonly slopeSource: 'two levels' | 'stated' | 'assumed';
  readonly spreads: Spreads;
  /** Left out in runs made before these were settings: the defaults then. */
  readonly assumed?: Assumed | undefined;
}

/** The settings kept with a run, with what its version did not write yet. */
export function settingsFromJson(text: string): AssessSettings {
  const stored = JSON.parse(text) as AssessSettings;
  return { ...stored, assumed: assumedWith(stored.assumed) };
}

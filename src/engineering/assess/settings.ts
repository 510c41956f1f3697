/** Everything of a study that an assessment depends on, as plain data: stored with the run and shipped with the page. */
import type { System } from '../building.js';
import type { FamilyId, WeakDates } from '../capacity/families.js';
import type { OwnEra } from '../capacity/own-table.js';
import type { EditionInputs } from '../capacity/stated.js';
import type { IrregularityEdition } from '../irregularity/editions.js';
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

export interface CodeHistorySettings {
  readonly place: string;
  /** Left out in settings kept before there was more than one. */
  readonly family?: FamilyId | undefined;
  readonly seismic_design_enforced_from: number;
  readonly adoption_lag_years: number;
  readonly editions: EditionInputs;
  /** Rows of the study's own table, by rising year; with family own-table alone. */
  readonly table?: readonly OwnEra[] | undefined;
  /** Dates of weak types where the place differs from the family. */
  readonly weak_types?: Partial<Omit<WeakDates, 'source'>> | undefined;
  readonly detailing_from?: Partial<Record<System, number>> | undefined;
}

export const STRENGTH_CHECKS = ['asce41-17', 'asce41-13', 'japan-first-level', 'none'] as const;

export interface StrengthCheckSettings {
  readonly method: (typeof STRENGTH_CHECKS)[number];
  /** T of the Japanese index: age and state of the building, 0.7 to 1.0. */
  readonly timeIndex: number;
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
  /** Common to all buildings of an edition. */
  readonly eraTable: number;
  /** Of ln S_a: the site class of a zone, common to all that read its spectrum. */
  readonly siteClass: number;
  readonly overstrength: number;
  /** Of a capacity from areas of columns, walls or braces: it stands for era, era table and overstrength together. */
  readonly strengthCheck: number;
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
  siteClass: 0.2,
  overstrength: 0.3,
  strengthCheck: 0.35,
  assessedCapacity: 0.2,
  peopleKnownUse: 0.4,
  peopleUnknownUse: 0.7,
  peopleCounted: 0.2,
  editionChange_years: 3,
};

/** Factors on the capacity, and chances where a row says nothing [judgement throughout]. */
export interface IrregularitySettings {
  /** Whose limits tell an irregularity from the numbers of a row. */
  readonly edition: IrregularityEdition;
  readonly factors: {
    readonly soft_or_weak_storey: number;
    readonly torsion: number;
    readonly reentrant_corner: number;
    readonly setback: number;
    readonly mass_irregularity: number;
  };
  readonly chances: {
    /** Where a frame stands in either direction, and elsewhere. */
    readonly soft_storey: { readonly frame: number; readonly wall: number };
    readonly weak_storey: { readonly frame: number; readonly wall: number };
    readonly torsion: number;
    readonly reentrant_corner: number;
    readonly setback: number;
    readonly mass_irregularity: number;
  };
}

/**
 * Judgement. An open ground storey is mostly a matter of frames (shops and cars under flats); corner lots and cores to one side make
 * torsion, wings make re-entrant corners.
 */
export const IRREGULARITY: IrregularitySettings = {
  edition: 'asce7-16',
  factors: { soft_or_weak_storey: 0.7, torsion: 0.8, reentrant_corner: 0.9, setback: 0.9, mass_irregularity: 0.9 },
  chances: {
    soft_storey: { frame: 0.15, wall: 0.05 },
    weak_storey: { frame: 0.1, wall: 0.05 },
    torsion: 0.15,
    reentrant_corner: 0.15,
    setback: 0.1,
    mass_irregularity: 0.05,
  },
};

/** What runs were assessed with that knew no chances: a blank counted as none. */
export const NO_IRREGULARITY_CHANCES: IrregularitySettings = {
  ...IRREGULARITY,
  chances: {
    soft_storey: { frame: 0, wall: 0 },
    weak_storey: { frame: 0, wall: 0 },
    torsion: 0,
    reentrant_corner: 0,
    setback: 0,
    mass_irregularity: 0,
  },
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
  /** Left out, as in settings kept before there were any: none. */
  readonly strengthCheck?: StrengthCheckSettings | undefined;
  readonly systemPrior: readonly SystemPriorGroup[] | null;
  readonly rankBy: RankBy;
  /** A number for all, or one per spectrum of the ranking level (found from two levels). */
  readonly slope: number | Readonly<Record<string, number>>;
  readonly slopeSource: 'two levels' | 'stated' | 'assumed';
  readonly spreads: Spreads;
  /** Left out in runs made before these were settings: the defaults then. */
  readonly assumed?: Assumed | undefined;
  /** Absent in runs of earlier versions: NO_IRREGULARITY_CHANCES, and nothing read from numbers. */
  readonly irregularity?: IrregularitySettings | undefined;
}

/** The settings kept with a run, with what its version did not write yet. */
export function settingsFromJson(text: string): AssessSettings {
  const stored = JSON.parse(text) as AssessSettings;
  return {
    ...stored,
    spreads: { ...stored.spreads, siteClass: siteClassOf(stored) },
    assumed: assumedWith(stored.assumed),
  };
}

/** Runs of earlier versions counted no error of the site class. */
function siteClassOf({ spreads }: { readonly spreads: Partial<Spreads> }): number {
  return spreads.siteClass ?? 0;
}

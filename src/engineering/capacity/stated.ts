/** What a study states for each edition it lists: the hazard inputs the place was designed with. Nothing here has a default. */
import type { CodeEdition } from './edition.js';

interface UsStated {
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

interface JapanStated {
  readonly 'japan-1924'?: Record<never, never> | undefined;
  readonly 'japan-1950'?: { readonly zone_factor: number } | undefined;
  readonly 'japan-1981'?: { readonly zone_factor: number; readonly ground: 'type-1' | 'type-2' | 'type-3' } | undefined;
}

export type NewZealandZone = 'A' | 'B' | 'C';
interface NewZealandStated {
  readonly 'nz-1935'?: Record<never, never> | undefined;
  readonly 'nz-1955'?: Record<never, never> | undefined;
  readonly 'nz-1965'?: { readonly zone: NewZealandZone } | undefined;
  readonly 'nz-1976'?: { readonly zone: NewZealandZone } | undefined;
  readonly 'nz-2004'?:
    | { readonly site_class: 'A' | 'B' | 'C' | 'D'; readonly zone_factor: number; readonly distance_km: number }
    | undefined;
}

interface ItalyStated {
  readonly 'italy-1909'?: Record<never, never> | undefined;
  readonly 'italy-1935'?: { readonly category: number } | undefined;
  readonly 'italy-1975'?: { readonly category: number } | undefined;
  readonly 'italy-2003'?: { readonly ag_g: number; readonly soil_factor: number; readonly tc_s: number } | undefined;
}

export type GreekSeismicity = 'I' | 'II' | 'III';
export type GreekGround = 'firm' | 'medium' | 'soft';
interface GreeceStated {
  readonly 'greece-1959'?: { readonly zone: GreekSeismicity; readonly ground: GreekGround } | undefined;
  readonly 'greece-1985'?: { readonly zone: GreekSeismicity; readonly ground: GreekGround } | undefined;
  readonly 'greece-1995'?: { readonly zone_g: number; readonly ground: 'A' | 'B' | 'C' | 'D' } | undefined;
}

interface TurkeyStated {
  readonly 'turkey-1949'?: { readonly coefficient: number } | undefined;
  readonly 'turkey-1968'?: { readonly zone: number } | undefined;
  readonly 'turkey-1975'?: { readonly zone: number; readonly ground_period_s: number } | undefined;
  readonly 'turkey-1998'?: { readonly zone: number; readonly ground: 'Z1' | 'Z2' | 'Z3' | 'Z4' } | undefined;
  readonly 'turkey-2018'?: { readonly sds_g: number; readonly sd1_g: number } | undefined;
}

export type IndianSoil = 'hard' | 'medium' | 'soft';
interface IndiaStated {
  readonly 'india-1970'?: { readonly zone: 'I' | 'II' | 'III' | 'IV' | 'V'; readonly soil_factor: number } | undefined;
  readonly 'india-2002'?: { readonly zone_factor: number; readonly soil: IndianSoil } | undefined;
  readonly 'india-2016'?: { readonly zone_factor: number; readonly soil: IndianSoil } | undefined;
}

interface CanadaStated {
  readonly 'canada-1953'?: { readonly zone: number } | undefined;
  readonly 'canada-1975'?: { readonly zone: number; readonly foundation_factor: number } | undefined;
  readonly 'canada-1990'?:
    | {
        readonly velocity_ratio: number;
        readonly acceleration_zone: 'above' | 'equal' | 'below';
        readonly foundation_factor: number;
      }
    | undefined;
  readonly 'canada-2005'?:
    { readonly s_0p2_g: number; readonly s_0p5_g: number; readonly s_1_g: number; readonly s_2_g: number } | undefined;
}

/** Editions a place used, each with its own hazard inputs. A study lists editions of one family. */
export interface EditionInputs
  extends UsStated, JapanStated, NewZealandStated, ItalyStated, GreeceStated, TurkeyStated, IndiaStated, CanadaStated {}

/** What is stated for one edition. */
export type StatedFor<Id extends keyof EditionInputs> = NonNullable<EditionInputs[Id]>;

/** The editions of one family, each reading what is stated for it. */
export type EditionTable<Id extends keyof EditionInputs> = {
  readonly [K in Id]: CodeEdition<StatedFor<K>>;
};

/** The codes of Asia, Latin America, Italy and Türkiye in one list for the register. */
import { CHILE_CODES, DS61_SOILS } from './chile.js';
import { CHINA_CODES, GB50011_DAMPED, GB_ALPHA_MAX_G, GB_TG_S } from './china.js';
import type { AnyRecord } from '../formula.js';
import type { SpectrumCode } from './code.js';
import { ITALY_CODES, NTC_GROUNDS, NTC_TOPOGRAPHY } from './italy.js';
import { JAPAN_CODES, RT_CORNERS_S } from './japan.js';
import { KOREA_CODES } from './korea.js';
import { MEXICO_CODES, MEXICO_ZONES } from './mexico.js';
import { NEPAL_CODES, NBC105_SOILS } from './nepal.js';
import { PERU_CODES, E030_CORNERS_S, E030_SOILS, E030_ZONES } from './peru.js';
import { TAIWAN_CODES, TAIPEI_T0_S } from './taiwan.js';
import { TURKEY_CODES, TBDY_SITE_TABLES } from './turkey.js';

export const WORLD_CODES: readonly SpectrumCode[] = [
  ...JAPAN_CODES,
  ...TURKEY_CODES,
  ...CHILE_CODES,
  ...CHINA_CODES,
  ...ITALY_CODES,
  ...PERU_CODES,
  ...NEPAL_CODES,
  ...TAIWAN_CODES,
  ...KOREA_CODES,
  ...MEXICO_CODES,
];

/** Spectra for hand calculations only: no study may rank by them. */
export const WORLD_RECORDS: readonly AnyRecord[] = [GB50011_DAMPED];

/** Printed tables that these records read besides their constants: they enter the fingerprint of the catalogue. */
export const WORLD_TABLES: Readonly<Record<string, unknown>> = {
  RT_CORNERS_S,
  TBDY_SITE_TABLES,
  DS61_SOILS,
  GB_ALPHA_MAX_G,
  GB_TG_S,
  NTC_GROUNDS,
  NTC_TOPOGRAPHY,
  E030_ZONES,
  E030_SOILS,
  E030_CORNERS_S,
  NBC105_SOILS,
  TAIPEI_T0_S,
  MEXICO_ZONES,
};

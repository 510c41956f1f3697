/**
 * Design base shear coefficients of the US code history: V/W as the edition asked, with the place's own hazard inputs.
 * Forms restated, constants as marked; coefficients before 1997 are at working-stress level.
 */
import { record } from '../formula.js';
import type { AnyRecord, Family, Inputs, InputSpec, MethodRecord } from '../formula.js';
import { power } from '../numeric/power.js';
import type { Source, Verified } from '../source.js';

const T: InputSpec = { name: 'period_s', kind: 'number', unit: 's', meaning: "period by the edition's own formula" };
const number = (name: string, meaning: string, unit?: string): InputSpec =>
  unit === undefined ? { name, kind: 'number', meaning } : { name, kind: 'number', unit, meaning };
const ZONE = number('zone_factor', 'zone factor Z of the edition');
const SITE = number('site_factor', 'site (soil) factor S of the edition');
const K = number('structure_factor', 'horizontal force factor K of the system');
const R = number('reduction_r', 'response reduction factor of the edition for the system');

type Numbers = Readonly<Record<string, number>>;

function family(
  id: string,
  inputs: readonly InputSpec[],
  expression: string,
  evaluate: (x: Numbers) => number,
): Family<Inputs, Record<never, number>> {
  return {
    id: `base-shear/${id}`,
    yields: 'design_base_shear_coefficient',
    unit: null,
    symbol: 'C_d',
    inputs,
    expression,
    evaluate: (inputs) => evaluate(inputs as Numbers),
  };
}

function edition(
  id: string,
  title: string,
  form: Family<Inputs, Record<never, number>>,
  source: Source,
  verified: Verified,
  note: string,
): MethodRecord<Inputs, Record<never, number>> {
  return record({
    id: `${id}/base-shear/static`,
    title,
    family: form,
    constants: {},
    source,
    verified,
    limits: [],
    note,
  });
}

const ubc = (year: string, clause: string): Source => ({ standard: 'UBC', edition: year, clause });

export const UBC_1927 = edition(
  'ubc-1927',
  'Design base shear coefficient, UBC 1927 to 1946 appendix',
  family(
    'stated',
    [number('coefficient', 'coefficient the appendix asks on the soil of the place')],
    'coefficient',
    ({ coefficient }) => coefficient!,
  ),
  ubc('27 to 46', 'appendix (optional)'),
  'memory',
  'Working-stress level. 0.075 on firm and 0.10 on soft ground in 1927; 0.08 to 0.16 in zone 3 from 1935.',
);

export const UBC_1949 = edition(
  'ubc-1949',
  'Design base shear coefficient, UBC 1949 to 1958',
  family(
    'by-storeys',
    [number('zone_share', 'share of zone 3: 1, 1/2, 1/4 for zones 3, 2, 1'), number('storeys', 'storeys above')],
    'zone_share * 0.60 / (storeys + 4.5)',
    ({ zone_share, storeys }) => (zone_share! * 0.6) / (storeys! + 4.5),
  ),
  ubc('49 to 58', 'section 2312'),
  'memory',
  'Working-stress level. That the coefficient goes by the number of storeys is restated; the constants are from memory.',
);

export const UBC_1961 = edition(
  'ubc-1961',
  'Design base shear coefficient, UBC 1961 to 1973',
  family(
    'cube-root',
    [ZONE, K, T],
    'zone_factor * structure_factor * min(0.05 / period_s ^ (1 / 3), 0.10)',
    ({ zone_factor, structure_factor, period_s }) =>
      zone_factor! * structure_factor! * Math.min(0.05 / power(period_s!, 1 / 3), 0.1),
  ),
  ubc('61 to 73', 'section 2314'),
  'restated',
  'V = Z K C W, C = 0.05/T^(1/3), at most 0.10. Working-stress level.',
);

export const UBC_1976 = edition(
  'ubc-1976',
  'Design base shear coefficient, UBC 1976 to 1985',
  family(
    'square-root',
    [ZONE, K, SITE, T],
    'zone_factor * structure_factor * min(min(1 / (15 * sqrt(period_s)), 0.12) * site_factor, 0.14)',
    ({ zone_factor, structure_factor, site_factor, period_s }) =>
      zone_factor! * structure_factor! * Math.min(Math.min(1 / (15 * Math.sqrt(period_s!)), 0.12) * site_factor!, 0.14),
  ),
  ubc('76 to 85', '2312(d)'),
  'restated',
  'V = Z I K C S W, C = 1/(15 √T), at most 0.12; C S at most 0.14; I = 1. Working-stress level; the 0.12 cap is from memory. I = 1 here: importance weighs once, in the priority.',
);

export const UBC_1988 = edition(
  'ubc-1988',
  'Design base shear coefficient, UBC 1988 to 1994',
  family(
    'two-thirds',
    [ZONE, SITE, R, T],
    'zone_factor * max(min(1.25 * site_factor / period_s ^ (2 / 3), 2.75) / reduction_r, 0.075)',
    ({ zone_factor, site_factor, reduction_r, period_s }) =>
      zone_factor! * Math.max(Math.min((1.25 * site_factor!) / power(period_s!, 2 / 3), 2.75) / reduction_r!, 0.075),
  ),
  ubc('88 to 94', '2312(e), 1628'),
  'restated',
  'V = Z I C W/R_w, C = 1.25 S/T^(2/3), at most 2.75; C/R_w at least 0.075; I = 1. Working-stress level. Z and 2.75 restated; the form of C and the 0.075 floor from memory.',
);

export const UBC_1997 = edition(
  'ubc-1997',
  'Design base shear coefficient, UBC 1997',
  family(
    'ca-cv',
    [
      number('ca_g', 'seismic coefficient C_a', 'g'),
      number('cv_g', 'seismic coefficient C_v', 'g'),
      number('zone_floor', '0.8 Z N_v in zone 4, 0 elsewhere'),
      R,
      T,
    ],
    'max(max(min(cv_g / (reduction_r * period_s), 2.5 * ca_g / reduction_r), 0.11 * ca_g), zone_floor / reduction_r)',
    ({ ca_g, cv_g, zone_floor, reduction_r, period_s }) =>
      Math.max(
        Math.max(Math.min(cv_g! / (reduction_r! * period_s!), (2.5 * ca_g!) / reduction_r!), 0.11 * ca_g!),
        zone_floor! / reduction_r!,
      ),
  ),
  ubc('97', '1630.2.1, equations 30-4 to 30-7'),
  'restated',
  'V = C_v I W/(R T), at most 2.5 C_a I W/R, at least 0.11 C_a I W and 0.8 Z N_v I W/R; I = 1. Strength level.',
);

export const ASCE7_2002 = edition(
  'asce7-2002',
  'Seismic response coefficient, ASCE/SEI 7 from 2002',
  family(
    'cs',
    [
      number('sds_g', 'S_DS', 'g'),
      number('sd1_g', 'S_D1', 'g'),
      number('near_fault_s1_g', 'S1 where it is at least 0.6 g, else 0', 'g'),
      R,
      T,
    ],
    'max(max(max(min(sds_g / reduction_r, sd1_g / (period_s * reduction_r)), 0.044 * sds_g), 0.01), 0.5 * near_fault_s1_g / reduction_r)',
    ({ sds_g, sd1_g, near_fault_s1_g, reduction_r, period_s }) =>
      Math.max(
        Math.max(Math.max(Math.min(sds_g! / reduction_r!, sd1_g! / (period_s! * reduction_r!)), 0.044 * sds_g!), 0.01),
        (0.5 * near_fault_s1_g!) / reduction_r!,
      ),
  ),
  { standard: 'ASCE/SEI 7', edition: '02 to today', clause: '12.8.1.1' },
  'restated',
  'C_s = S_DS/R, at most S_D1/(T R), at least 0.044 S_DS, 0.01 and, where S1 is 0.6 g or more, 0.5 S1/R; I_e = 1. Strength level.',
);

export const EDITION_RECORDS: readonly AnyRecord[] = [
  UBC_1927,
  UBC_1949,
  UBC_1961,
  UBC_1976,
  UBC_1988,
  UBC_1997,
  ASCE7_2002,
];

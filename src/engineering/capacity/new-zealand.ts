/** New Zealand: model by-law of 1935, NZSS 95 of 1955, NZSS 1900 of 1965, NZS 4203 of 1976 and 1984, NZS 1170.5 of 2004. */
import { apply, applyAny } from '../formula.js';
import { OCEANIA_NEPAL_PERIODS } from '../period/oceania-nepal.js';
import { NZS1170_CODES } from '../spectrum/nzs1170.js';
import { NZS1170_FACTOR_RECORDS } from '../spectrum/nzs1170-factors.js';
import { PERIOD, PERIOD_CLASSES, bySystem, coefficientRecord, fixedForm, number, recordOf } from './edition.js';
import type { PeriodClass } from './edition.js';
import { WORKING_TO_STRENGTH } from './records.js';
import type { EditionTable, NewZealandZone } from './stated.js';

const nz = (standard: string, edition: string, clause: string) => ({ standard, edition, clause });

const eightPercent = (year: string, standard: string, note: string) =>
  coefficientRecord(
    `nz-${year}/base-shear/static`,
    `Lateral force coefficient of ${year}`,
    fixedForm,
    { source: nz(standard, year, 'lateral force'), verified: 'memory', note },
    { coefficient: 0.08 },
  );
const PUBLIC = 'Working-stress level. 0.10 for public buildings: importance weighs once, in the priority.';
export const NZ_1935 = eightPercent('1935', 'Model building by-law, New Zealand', PUBLIC);
export const NZ_1955 = eightPercent(
  '1955',
  'NZSS 95',
  `${PUBLIC} Similar to 1935; a triangular distribution was allowed.`,
);

/** Level to 0.45 s, falling to one half at 1.2 s. */
const shape = 'max(0.5, min(1, 1 - 0.5 * (period_s - 0.45) / 0.75))';
const shapeAt = (period_s: number): number => Math.max(0.5, Math.min(1, 1 - (0.5 * (period_s - 0.45)) / 0.75));
const ZONE_SHARE = number('zone_share', 'share of zone A: 1, 5/6, 2/3 for zones A, B, C');

export const NZ_1965 = coefficientRecord(
  'nz-1965/base-shear/static',
  'Seismic coefficient of NZSS 1900 chapter 8',
  {
    id: 'base-shear/nz-1965',
    inputs: [ZONE_SHARE, PERIOD],
    expression: `zone_share * plateau * ${shape}`,
    evaluate: ({ zone_share, period_s }, { plateau }) => zone_share! * plateau! * shapeAt(period_s!),
  },
  {
    source: nz('NZSS 1900', '1965', 'chapter 8'),
    verified: 'memory',
    note: 'Working-stress level. 0.12 in zone A, 0.16 for public buildings; half of it from 1.2 s on.',
  },
  { plateau: 0.12 },
);

export const NZ_1976 = coefficientRecord(
  'nz-1976/base-shear/static',
  'Seismic design coefficient C R S M of NZS 4203',
  {
    id: 'base-shear/nz-1976',
    inputs: [
      ZONE_SHARE,
      number('structural_type_factor', 'structural type factor S'),
      number('material_factor', 'material factor M'),
      PERIOD,
    ],
    expression: `zone_share * plateau * ${shape} * structural_type_factor * material_factor`,
    evaluate: ({ zone_share, structural_type_factor, material_factor, period_s }, { plateau }) =>
      zone_share! * plateau! * shapeAt(period_s!) * structural_type_factor! * material_factor!,
  },
  {
    source: nz('NZS 4203', '76 and 84', 'part 3'),
    verified: 'memory',
    note: 'C 0.15 falling to 0.075 in zone A; R (importance) is 1 here. Strength level. S and M by system from memory.',
  },
  { plateau: 0.15 },
);

/** S of NZS 4203 by system, from memory: ductile frames 0.8, walls and braces more. */
export const NZ_S = bySystem(1.6, {
  'steel-moment-frame': 0.8,
  'concrete-moment-frame': 0.8,
  'steel-eccentric-braced-frame': 1,
  'steel-buckling-restrained-braced-frame': 1,
  'concrete-shear-wall': 1,
  'concrete-wall-frame': 0.8,
  'reinforced-masonry-wall': 1.2,
  'timber-light-frame': 1.2,
});
/** M of NZS 4203 by material, from memory. */
export const NZ_M = bySystem(0.8, {
  'reinforced-masonry-wall': 1,
  'confined-masonry-wall': 1.2,
  'unreinforced-masonry-wall': 1.2,
  'timber-light-frame': 1,
  'timber-post-and-beam': 1,
});
/** μ a design by NZS 1170.5 rests on, from memory of the material standards: the usual ductile class of the system. */
export const NZ_DUCTILITY = bySystem(1.25, {
  'steel-moment-frame': 4,
  'steel-eccentric-braced-frame': 4,
  'steel-buckling-restrained-braced-frame': 4,
  'steel-concentric-braced-frame': 2,
  'concrete-moment-frame': 4,
  'concrete-shear-wall': 3,
  'concrete-wall-frame': 4,
  'reinforced-masonry-wall': 2,
  'timber-light-frame': 3,
});

/** S_p of NZS 1170.5 4.4 at a ductility, from memory. */
export const performanceOf = (ductility: number): number => Math.max(0.7, 1.3 - 0.3 * ductility);

const ZONE_SHARES: Readonly<Record<NewZealandZone, number>> = { A: 1, B: 5 / 6, C: 2 / 3 };

const period = (which: string) => recordOf(OCEANIA_NEPAL_PERIODS, `nzs1170-5-2004/period/${which}`);
const rows = (end: string) =>
  ({
    'steel-moment-frame': period(`steel-moment-frame${end}`),
    'concrete-moment-frame': period(`concrete-moment-frame${end}`),
    'eccentric-braced': period(`steel-eccentric-braced${end}`),
    other: period(`other${end}`),
  }) satisfies Record<PeriodClass, unknown>;
/** Stands in for a calculated period, which the editions before 2004 asked for [judgement]. */
const SERVICEABILITY = rows('-serviceability');
const ULTIMATE = rows('');

const STATIC = NZS1170_CODES[0]!.choice!.records['equivalent-static']!;
const ACTION = recordOf(NZS1170_FACTOR_RECORDS, 'nzs1170-5-2004/base-shear/design-action');

export type NewZealandEdition = 'nz-1935' | 'nz-1955' | 'nz-1965' | 'nz-1976' | 'nz-2004';

const STAND_IN = 'The edition asked for a calculated period; k_t h^0.75 of NZS 1170.5 stands in for it [judgement].';

export const NEW_ZEALAND_EDITIONS: EditionTable<NewZealandEdition> = {
  'nz-1935': {
    year: 1935,
    title: NZ_1935.title,
    source: NZ_1935.source,
    verified: 'memory',
    dependsOn: () => 'nothing',
    design: (_facts, _stated, trace) => ({
      coefficient: apply(NZ_1935, {}, trace),
      levelFactor: WORKING_TO_STRENGTH,
      reduction: Infinity,
    }),
  },
  'nz-1955': {
    year: 1955,
    title: NZ_1955.title,
    source: NZ_1955.source,
    verified: 'memory',
    dependsOn: () => 'nothing',
    design: (_facts, _stated, trace) => ({
      coefficient: apply(NZ_1955, {}, trace),
      levelFactor: WORKING_TO_STRENGTH,
      reduction: Infinity,
    }),
  },
  'nz-1965': {
    year: 1965,
    title: NZ_1965.title,
    source: NZ_1965.source,
    verified: 'memory',
    note: STAND_IN,
    dependsOn: () => 'height',
    design: ({ system, height_m }, { zone }, trace) => {
      const period_s = applyAny(SERVICEABILITY[PERIOD_CLASSES[system]], { height_m }, trace);
      return {
        coefficient: apply(NZ_1965, { zone_share: ZONE_SHARES[zone], period_s }, trace),
        levelFactor: WORKING_TO_STRENGTH,
        reduction: Infinity,
      };
    },
  },
  'nz-1976': {
    year: 1976,
    title: `${NZ_1976.title}, 1976 and 1984`,
    source: NZ_1976.source,
    verified: 'memory',
    note: `${STAND_IN} Also read for NZS 4203 of 1992, whose table is not carried here.`,
    dependsOn: () => 'height',
    design: ({ system, height_m }, { zone }, trace) => {
      const period_s = applyAny(SERVICEABILITY[PERIOD_CLASSES[system]], { height_m }, trace);
      const structural_type_factor = NZ_S[system];
      const material_factor = NZ_M[system];
      return {
        coefficient: apply(
          NZ_1976,
          { zone_share: ZONE_SHARES[zone], structural_type_factor, material_factor, period_s },
          trace,
        ),
        levelFactor: 1,
        // 4/(S M) is the ductility behind S and M, as published with the code [memory]
        reduction: 4 / (structural_type_factor * material_factor),
      };
    },
  },
  'nz-2004': {
    year: 2004,
    title: 'NZS 1170.5, design action coefficient',
    source: ACTION.source,
    verified: 'memory',
    note: 'Spectrum and C_d restated; μ by system, S_p 0.7 and the period formula from memory. 500 years.',
    dependsOn: () => 'height',
    design: ({ system, height_m }, { site_class, zone_factor, distance_km }, trace) => {
      const period_s = applyAny(ULTIMATE[PERIOD_CLASSES[system]], { height_m }, trace);
      const site = { site_class, zone_factor, return_factor: 1, distance_km, site_period_s: 1.5 };
      const sa_g = applyAny(STATIC, { ...site, period_s }, trace);
      const ductility = NZ_DUCTILITY[system];
      const performance_factor = performanceOf(ductility);
      const action = { sa_g, performance_factor, ductility, zone_factor, return_factor: 1, period_s };
      return {
        coefficient: applyAny(ACTION, action, trace),
        levelFactor: 1,
        reduction: ductility / performance_factor,
      };
    },
  },
};

export const NEW_ZEALAND_RECORDS = [NZ_1935, NZ_1955, NZ_1965, NZ_1976];

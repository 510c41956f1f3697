/**
 * Base shear by the code that the spectrum is of, with that code's limits: shown beside the elastic one, counted nowhere. Where the
 * program carries no record of a code's formula, or the spectrum does not state what the formula asks, the hand calculation says so.
 */
import type { Building, System } from '../building.js';
import { CANADA_2005, NBC_RD_RO } from '../capacity/canada.js';
import { INDIAN_R, INDIA_2002 } from '../capacity/india.js';
import { JAPAN_1981, JAPAN_DS, JAPAN_RT_FACTOR } from '../capacity/japan.js';
import { NZ_DUCTILITY, performanceOf } from '../capacity/new-zealand.js';
import { recordOf } from '../capacity/edition.js';
import { SYSTEM_FACTORS } from '../capacity/systems.js';
import { TURKEY_2018, TURKISH_R, overstrengthOf } from '../capacity/turkey.js';
import { BASE_SHEAR_ASCE7, BASE_SHEAR_EN1998, BASE_SHEAR_IMPORTANCE } from '../demand/base-shear.js';
import { formatNumber } from '../format.js';
import { apply, applyAny } from '../formula.js';
import type { AnyRecord } from '../formula.js';
import { heightFormula, periodFormula } from '../period/choose.js';
import type { PeriodStandard } from '../period/choose.js';
import { cite } from '../source.js';
import { mappedDesignValues } from '../spectrum/asce7-mapped.js';
import { ordinate } from '../spectrum/compiled.js';
import { EN1998_DESIGN_CODES } from '../spectrum/en1998-design.js';
import { IS1893_SOILS } from '../spectrum/is1893.js';
import { RT_CORNERS_S } from '../spectrum/japan.js';
import { NZS1170_CODES } from '../spectrum/nzs1170.js';
import { NZS1170_FACTOR_RECORDS } from '../spectrum/nzs1170-factors.js';
import { Trace } from '../trace.js';
import type { AssessContext, ContextSpectrum } from './context.js';
import { importanceOf } from './terms.js';

interface ShearFacts {
  readonly building: Building;
  readonly system: System;
  readonly storeys: number;
  readonly spectrum: ContextSpectrum;
  readonly period_s: number;
  readonly context: AssessContext;
  readonly trace: Trace;
}

/** Base shear of one code; the text says what it needs and nobody states. */
type CodeShear = (facts: ShearFacts) => number | string;

/** Writes down the base shear by code of a building at its period; null where there is none. */
export function codeShear(facts: ShearFacts): number | null {
  const { id, source } = facts.spectrum.record;
  const found = CARRIED.find(([start]) => id.startsWith(start))?.[1] ?? ((): string => reasonOf(id));
  const worked = found(facts);
  if (typeof worked === 'number') return worked;
  facts.trace.choice({
    question: 'Base shear by code',
    taken: 'not worked',
    because: `${source.standard === '' ? 'the spectrum' : source.standard}: ${worked}`,
    others: [],
  });
  return null;
}

/** S_1 from which the floor near faults counts, g (12.8.1.1). */
const NEAR_FAULT_FROM_G = 0.6;

function asce7(facts: ShearFacts): number | string {
  const { building, system, spectrum, trace } = facts;
  const { inputs, record } = spectrum;
  const mapped = mappedDesignValues(record.id, inputs);
  const sds_g = mapped?.sds_g ?? inputs['sds_g'];
  const sd1_g = mapped?.sd1_g ?? inputs['sd1_g'];
  if (typeof sds_g !== 'number' || typeof sd1_g !== 'number')
    return 'S_DS and S_D1 of the site are not among the ordinates of the spectrum';
  if (mapped !== null) {
    const { fa, fv } = mapped;
    trace.value('sds_g', sds_g, 'computed', `2/3 F_a S_S with F_a = ${formatNumber(fa, 4)}`);
    trace.value('sd1_g', sd1_g, 'computed', `2/3 of S_M1 of the spectrum, F_v = ${formatNumber(fv, 4)}`);
  }
  const s1_g = mapped === null ? null : Number(inputs['s1_g']);
  nearFaultWords(s1_g, trace);
  const period_s = withinLimit(facts, 'asce7-22', () => 'calculated', { sd1_g });
  const { tl_s } = inputs;
  trace.value('reduction_r', SYSTEM_FACTORS[system].r2002, 'computed', `R of ${system}, from memory of ASCE/SEI 7`);
  return apply(
    BASE_SHEAR_ASCE7,
    {
      sds_g,
      sd1_g,
      tl_s: typeof tl_s === 'number' ? tl_s : 8,
      near_fault_s1_g: s1_g !== null && s1_g >= NEAR_FAULT_FROM_G ? s1_g : 0,
      reduction_r: SYSTEM_FACTORS[system].r2002,
      importance_factor: importanceOf(building),
      period_s,
    },
    trace,
  );
}

/** The period that a base shear may be read at: no longer than the code's own limit, a multiple of its approximate period by height. */
function withinLimit(
  { building, system, period_s, trace }: ShearFacts,
  standard: PeriodStandard,
  limitFor: (formula: AnyRecord) => string,
  besides: Readonly<Record<string, number>> = {},
): number {
  const formula = heightFormula(system, standard, 'design');
  const limit = periodFormula(`${standard}/period-limit/${limitFor(formula)}`);
  const steps = new Trace();
  const approximate_s = applyAny(formula, { height_m: building.height_m.value }, steps);
  const limit_s = applyAny(limit, { period_s: approximate_s, ...besides }, steps);
  if (period_s <= limit_s) return period_s;
  for (const step of steps.steps) trace.steps.push(step);
  trace.choice({
    question: 'Period of the base shear',
    taken: `${formatNumber(limit_s, 4)} s`,
    because: `${cite(limit.source)}: no longer than that, however long the period that ranks, ${formatNumber(period_s, 4)} s`,
    others: [],
  });
  return limit_s;
}

/** The limit of NBC goes with the kind of structure that its formula is for. */
function nbcLimit({ id }: AnyRecord): string {
  const which = id.slice(id.lastIndexOf('/') + 1);
  return which.endsWith('moment-frame') ? 'moment-frame' : which;
}

function nearFaultWords(s1_g: number | null, trace: Trace): void {
  const counts = s1_g !== null && s1_g >= NEAR_FAULT_FROM_G;
  const floor = `V/W is at least 0.5 S_1/(R/I_e) where S_1 is ${String(NEAR_FAULT_FROM_G)} g or more`;
  trace.choice({
    question: 'Floor of the base shear near faults',
    taken: s1_g === null ? 'could not be checked' : counts ? 'counts' : 'does not apply',
    because:
      s1_g === null
        ? `the spectrum is stated by S_DS and S_D1, S_1 is not known; ${floor}`
        : `S_1 = ${formatNumber(s1_g, 4)} g of the spectrum; ${floor}`,
    others: [],
  });
}

/** q that EN 1998-1 allows any structure for overstrength alone (5.3.3, 6.1.2, 9.3), from memory. */
const LEAST_Q = 1.5;

function en1998({ building, storeys, spectrum, period_s, context, trace }: ShearFacts): number {
  const { record, inputs } = spectrum;
  const type = record.id.endsWith('type-2') ? 1 : 0;
  const design = EN1998_DESIGN_CODES[type]!.record;
  const stated = Object.values(context.spectra).find(
    (one) =>
      one.record.id === design.id && one.inputs['ag_g'] === inputs['ag_g'] && one.inputs['ground'] === inputs['ground'],
  );
  const behaviour_factor = Number(stated?.inputs['behaviour_factor'] ?? LEAST_Q);
  trace.value(
    'behaviour_factor',
    behaviour_factor,
    stated === undefined ? 'default' : 'setting',
    stated === undefined
      ? 'the study states no design spectrum for this ground: the lower bound of EN 1998-1, for overstrength alone (from memory); a ductile design has a smaller force'
      : `of the study's design spectrum ${stated.name}`,
  );
  const importance = importanceOf(building);
  const ag_g = Number(inputs['ag_g']) * importance;
  if (importance !== 1)
    trace.value('ag_g', ag_g, 'computed', `a_g of the spectrum times the importance ${formatNumber(importance, 4)}`);
  const lower_bound_factor = Number(stated?.inputs['lower_bound_factor'] ?? 0.2);
  const design_sa_g = applyAny(
    design,
    { ag_g, ground: inputs['ground']!, behaviour_factor, lower_bound_factor, period_s },
    trace,
  );
  return apply(BASE_SHEAR_EN1998, { design_sa_g, period_s, corner_period_s: spectrum.corner_s, storeys }, trace);
}

const NZ_STATIC = NZS1170_CODES[0]!.choice!.records['equivalent-static']!;
const NZ_ACTION = recordOf(NZS1170_FACTOR_RECORDS, 'nzs1170-5-2004/base-shear/design-action');

function nzs1170({ system, spectrum: { inputs }, period_s, trace }: ShearFacts): number | string {
  if (inputs['site_class'] === 'E') return 'the record of its design action coefficient holds for site classes A to D';
  const sa_g = applyAny(NZ_STATIC, { ...inputs, period_s }, trace);
  const ductility = NZ_DUCTILITY[system];
  trace.value('ductility', ductility, 'computed', `μ of a design of ${system} today, from memory`);
  const { zone_factor, return_factor } = inputs as Readonly<Record<string, number>>;
  const known = { zone_factor: zone_factor!, return_factor: return_factor! };
  const performance_factor = performanceOf(ductility);
  trace.value('performance_factor', performance_factor, 'computed', 'S_p = 1.3 - 0.3 μ, at least 0.7, from memory');
  return applyAny(NZ_ACTION, { sa_g, performance_factor, ductility, ...known, period_s }, trace);
}

function nbc(facts: ShearFacts): number {
  const { building, system, spectrum, trace } = facts;
  const at = (t_s: number): number => ordinate(spectrum.compiled, t_s);
  const reduction_r = NBC_RD_RO[system];
  trace.value('reduction_r', reduction_r, 'computed', `R_d R_o of ${system}, from memory`);
  trace.value('M_v', 1, 'default', 'factor of the higher modes: nobody states it; walls of long period have more');
  if (spectrum.record.id.endsWith('log-log'))
    trace.value('S(T)', 'straight lines', 'computed', 'between 0.2, 0.5, 1 and 2 s, where the spectrum is log-log');
  const period_s = withinLimit(facts, 'nbc-2015', nbcLimit);
  const ordinates = { s_0p2_g: at(0.2), s_0p5_g: at(0.5), s_1_g: at(1), s_2_g: at(2) };
  return withImportance(apply(CANADA_2005, { ...ordinates, reduction_r, period_s }, trace), building, trace);
}

function is1893({ building, system, spectrum: { inputs }, period_s, trace }: ShearFacts): number {
  const [, fall_s] = IS1893_SOILS[inputs['soil'] as keyof typeof IS1893_SOILS];
  const reduction_r = INDIAN_R[system];
  trace.value('reduction_r', reduction_r, 'computed', `R of ${system}, most from memory`);
  const zone_factor = Number(inputs['zone_factor']);
  return withImportance(apply(INDIA_2002, { zone_factor, fall_s, reduction_r, period_s }, trace), building, trace);
}

function withImportance(base_shear_coefficient: number, building: Building, trace: Trace): number {
  const importance_factor = importanceOf(building);
  if (importance_factor === 1) return base_shear_coefficient;
  return apply(BASE_SHEAR_IMPORTANCE, { base_shear_coefficient, importance_factor }, trace);
}

function tbdy(facts: ShearFacts): number {
  const {
    system,
    spectrum: { inputs, compiled },
    trace,
  } = facts;
  const { fs, f1 } = compiled.quantities!;
  const sds_g = Number(inputs['ss_g']) * fs!;
  const sd1_g = Number(inputs['s1_g']) * f1!;
  trace.value('sds_g', sds_g, 'computed', 'S_S F_S of the spectrum');
  trace.value('sd1_g', sd1_g, 'computed', 'S_1 F_1 of the spectrum');
  const reduction_r = TURKISH_R[system];
  trace.value('reduction_r', reduction_r, 'computed', `R of ${system}, from memory; importance 1`);
  const overstrength_d = overstrengthOf(reduction_r);
  const period_s = withinLimit(facts, 'tbdy-2018', () => 'calculated');
  return apply(TURKEY_2018, { sds_g, sd1_g, reduction_r, overstrength_d, period_s }, trace);
}

function japan({ system, spectrum: { inputs }, period_s, trace }: ShearFacts): number {
  const rt = apply(JAPAN_RT_FACTOR, { corner_period_s: RT_CORNERS_S[String(inputs['ground'])]!, period_s }, trace);
  const structural_factor = JAPAN_DS[system];
  trace.value('structural_factor', structural_factor, 'computed', `D_s of ${system}, from memory; shape factor 1`);
  return apply(JAPAN_1981, { zone_factor: Number(inputs['zone_factor']), rt, structural_factor }, trace);
}

/** By the beginning of the spectrum's record. */
const CARRIED: readonly (readonly [string, CodeShear])[] = [
  ['asce7-', asce7],
  ['en1998-1-2004/spectrum/elastic', en1998],
  ['nzs1170-5-2004/', nzs1170],
  ['nbc-20', nbc],
  ['is1893-2016/', is1893],
  ['tbdy-2018/', tbdy],
  ['japan-rt/', japan],
];

/** What the base shear of a code asks beyond its elastic spectrum, where no record of ours carries it (names from memory). */
const NEEDED: Readonly<Record<string, string>> = {
  asce41: 'a standard for existing buildings, without a design base shear',
  'ntc-2018': 'needs the behaviour factor q, and its design spectrum with F0 is not carried',
  'nch433-ds61': 'needs R* of the system and the bounds of the seismic coefficient, which nobody states',
  'gb50011-2010': 'needs the coefficient of the frequent earthquake and the equivalent weight, which nobody states',
  'e030-2018': 'needs R and U of the building, which nobody states',
  'mexico-ntcs-2004': 'needs Q and R of the system, which nobody states',
  'kds-41-17': 'needs R of the system, which nobody states',
  'nbc105-2020': 'needs R_μ and Ω_u of the system, which nobody states',
  'taiwan-2011': 'needs F_u and α_y of the system, which nobody states',
};

function reasonOf(id: string): string {
  const known = Object.entries(NEEDED).find(([start]) => id.startsWith(start));
  return known?.[1] ?? 'a table of ordinates, which belongs to no code with a base shear of its own';
}

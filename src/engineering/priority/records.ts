/** Slope of the hazard curve, people exposed, and the priority itself. */
import { ln } from '../numeric/elementary.js';
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';

const source = (clause: string) => ({ standard: 'Swaymark', edition: '', clause });

const slope: Family<
  {
    readonly sa_1_g: number;
    readonly sa_2_g: number;
    readonly return_period_1_years: number;
    readonly return_period_2_years: number;
  },
  { readonly from: number; readonly to: number }
> = {
  id: 'priority/hazard-slope',
  yields: 'slope_k',
  unit: null,
  symbol: 'k',
  inputs: [
    { name: 'sa_1_g', kind: 'number', unit: 'g', meaning: 'S_a of the ranking level' },
    { name: 'sa_2_g', kind: 'number', unit: 'g', meaning: 'S_a of the second level' },
    { name: 'return_period_1_years', kind: 'number', meaning: 'return period of the ranking level, years' },
    { name: 'return_period_2_years', kind: 'number', meaning: 'return period of the second level, years' },
  ],
  expression: 'max(from, min(to, ln(return_period_2_years / return_period_1_years) / ln(sa_2_g / sa_1_g)))',
  // within the bounds they need not be read
  shownAt: ({ sa_1_g, sa_2_g, return_period_1_years, return_period_2_years }, { from, to }) => {
    const k = ln(return_period_2_years / return_period_1_years) / ln(sa_2_g / sa_1_g);
    return k >= from && k <= to
      ? { expression: 'ln(return_period_2_years / return_period_1_years) / ln(sa_2_g / sa_1_g)', clause: '' }
      : {
          expression: 'max(from, min(to, ln(return_period_2_years / return_period_1_years) / ln(sa_2_g / sa_1_g)))',
          clause: 'kept within its bounds',
        };
  },
  evaluate: ({ sa_1_g, sa_2_g, return_period_1_years, return_period_2_years }, { from, to }) =>
    Math.max(from, Math.min(to, ln(return_period_2_years / return_period_1_years) / ln(sa_2_g / sa_1_g))),
};

export const HAZARD_SLOPE = record({
  id: 'swaymark/priority/hazard-slope',
  title: 'Slope of the hazard curve between two levels, kept within 1 to 5',
  family: slope,
  constants: { from: 1, to: 5 },
  source: {
    standard: 'Cornell, Jalayer, Hamburger and Foutch',
    edition: '2002',
    clause: 'power-law hazard λ = k₀ a^(-k)',
  },
  verified: 'memory',
  limits: [],
});

const exposed: Family<
  { readonly occupants_peak: number; readonly occupied_hours_per_week: number },
  { readonly least: number }
> = {
  id: 'priority/people-exposed',
  yields: 'people_exposed',
  unit: null,
  symbol: 'E',
  inputs: [
    { name: 'occupants_peak', kind: 'number', meaning: 'people at peak' },
    { name: 'occupied_hours_per_week', kind: 'number', meaning: 'occupied hours a week' },
  ],
  expression: 'max(occupants_peak * occupied_hours_per_week / 168, least)',
  evaluate: ({ occupants_peak, occupied_hours_per_week }, { least }) =>
    Math.max((occupants_peak * occupied_hours_per_week) / 168, least),
};

export const PEOPLE_EXPOSED = record({
  id: 'swaymark/priority/people-exposed',
  title: 'People present on average over the week',
  family: exposed,
  constants: { least: 0.1 },
  source: source('people at peak × share of the 168 hours of a week; at least 0.1 [judgement]'),
  verified: 'judgement',
  limits: [],
});

const peak: Family<{ readonly floor_area_m2: number; readonly people_per_m2: number }, Record<never, number>> = {
  id: 'priority/people-at-peak',
  yields: 'occupants_peak',
  unit: null,
  symbol: 'P',
  inputs: [
    { name: 'floor_area_m2', kind: 'number', unit: 'm2', meaning: 'floor area' },
    { name: 'people_per_m2', kind: 'number', meaning: 'people per m² at peak' },
  ],
  expression: 'floor_area_m2 * people_per_m2',
  evaluate: ({ floor_area_m2, people_per_m2 }) => floor_area_m2 * people_per_m2,
};

export const PEOPLE_AT_PEAK = record({
  id: 'swaymark/priority/people-at-peak',
  title: 'People at peak from floor area and use',
  family: peak,
  constants: {},
  source: source('floor area × density of the use'),
  verified: 'judgement',
  limits: [],
});

const score: Family<
  {
    readonly slope_k: number;
    readonly sa_g: number;
    readonly capacity_sa_g: number;
    readonly people_exposed: number;
    readonly importance_factor: number;
    readonly zone_term: number;
  },
  Record<never, number>
> = {
  id: 'priority/log-score',
  yields: 'ln_priority',
  unit: null,
  symbol: 'ln S',
  inputs: [
    { name: 'slope_k', kind: 'number', meaning: 'slope of the hazard curve' },
    { name: 'sa_g', kind: 'number', unit: 'g', meaning: 'spectral demand' },
    { name: 'capacity_sa_g', kind: 'number', unit: 'g', meaning: 'capacity' },
    { name: 'people_exposed', kind: 'number', meaning: 'people present on average' },
    { name: 'importance_factor', kind: 'number', meaning: 'importance', fallback: 1 },
    { name: 'zone_term', kind: 'number', meaning: 'ln λ₀ + k² 0.4²/2 where zones differ, else 0', fallback: 0 },
  ],
  expression: 'slope_k * ln(sa_g / capacity_sa_g) + ln(people_exposed) + ln(importance_factor) + zone_term',
  evaluate: ({ slope_k, sa_g, capacity_sa_g, people_exposed, importance_factor, zone_term }) =>
    slope_k * ln(sa_g / capacity_sa_g) + ln(people_exposed) + ln(importance_factor) + zone_term,
};

export const LOG_SCORE = record({
  id: 'swaymark/priority/log-score',
  title: 'Priority: annual rate at which demand exceeds capacity, times the people present (natural logarithm)',
  family: score,
  constants: {},
  source: {
    standard: 'Cornell, Jalayer, Hamburger and Foutch',
    edition: '2002',
    clause: 'rate ∝ (D/C)^k; times people present and importance',
  },
  verified: 'memory',
  limits: [],
});

export const PRIORITY_RECORDS: readonly AnyRecord[] = [HAZARD_SLOPE, PEOPLE_AT_PEAK, PEOPLE_EXPOSED, LOG_SCORE];

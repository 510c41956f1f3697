/** A survey in words: what is asked, why, and what it does to the list. */
import { formatNumber, formatShare } from '../../engineering/format.js';
import type { Unknown } from '../../engineering/priority/survey-value.js';
import type { SurveyPlan, SurveyStep } from '../../screening/survey.js';

/** What a surveyor is asked for. */
export const ASKED: Readonly<Record<Unknown, string>> = {
  system: 'lateral system',
  year: 'year of construction',
  height: 'storeys and height',
  irregularity: 'irregularities',
  use: 'use',
  occupants: 'people',
  drawings: 'design coefficient',
};

/** Inventory columns that answer each question. */
export const ANSWERS: Readonly<Record<Unknown, readonly string[]>> = {
  system: ['system'],
  year: ['year_built'],
  height: ['storeys_above', 'height_m'],
  irregularity: ['soft_storey', 'weak_storey', 'torsion', 'reentrant_corner', 'setback', 'mass_irregularity'],
  use: ['use'],
  occupants: ['occupants_peak'],
  drawings: ['design_base_shear_coefficient', 'design_level'],
};

export function askedWords({ asks }: Pick<SurveyStep, 'asks'>): string {
  return asks.map((unknown) => ASKED[unknown]).join(', ');
}

/** "lateral system unknown: 61 % of the spread", the largest unknown of those asked for. */
export function reasonWord({ asks, shares }: Pick<SurveyStep, 'asks' | 'shares'>): string {
  const share = Math.max(...shares);
  const unknown = asks[shares.indexOf(share)];
  return unknown === undefined
    ? ''
    : `${ASKED[unknown]} ${unknown === 'occupants' ? 'not counted' : unknown === 'height' ? 'inferred' : 'unknown'}: ${formatShare(share)} of the spread`;
}

/** What the whole plan does to the list. */
export function planSentences(plan: SurveyPlan): readonly string[] {
  const { steps, buildings, hours, money, expected_wrong_before, expected_wrong_after, list_size } = plan;
  if (steps.length === 0)
    return [
      'No visit that fits is worth anything: what is unknown at the edge of the list would not change it, or is known already.',
    ];
  const cost = [`${formatNumber(hours, 3)} h`, ...(money > 0 ? [`${formatNumber(money, 4)} in money`] : [])].join(', ');
  return [
    `${String(steps.length)} ${steps.length === 1 ? 'visit' : 'visits'} to ${String(buildings)} ${buildings === 1 ? 'building' : 'buildings'}, ${cost}: of the ${String(list_size)} places about ${formatNumber(expected_wrong_before, 2)} are expected to be wrong now, about ${formatNumber(expected_wrong_after, 2)} once all visits are made.`,
    `Of ${String(plan.ranked)} ranked buildings ${String(plan.worth_visiting)} are worth any visit at all; ${String(plan.buildings_of_80_percent)} hold 80 % of what there is to learn. Far from the edge of the list nothing found out would change it, however poor the record.`,
    ...(plan.capped
      ? [`The ${String(plan.weighed)} that could be worth most were weighed one by one.`]
      : []),
  ];
}

/** A survey in words: what is asked, why, and what it does to the list. */
import { formatCount, formatNumber, formatShare } from '../../engineering/format.js';
import type { Unknown } from '../../engineering/priority/learnable.js';
import type { Visit } from '../../engineering/priority/campaign.js';
import type { SurveyOutlook, SurveyVisit } from '../../engineering/page-contract.js';
import type { SurveyPlan } from '../../screening/survey.js';

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

export function askedWords({ asks }: Pick<SurveyVisit, 'asks'>): string {
  return asks.map((unknown) => ASKED[unknown]).join(', ');
}

/** "lateral system unknown: 61 % of the spread", the largest unknown of those asked for. */
export function reasonWord({ asks, shares, again }: Pick<SurveyVisit, 'asks' | 'shares' | 'again'>): string {
  const share = Math.max(...shares);
  const unknown = asks[shares.indexOf(share)];
  return unknown === undefined
    ? ''
    : `${ASKED[unknown]} ${unknown === 'occupants' ? 'not counted' : unknown === 'height' ? 'inferred' : 'unknown'}: ${formatShare(share)} of the spread${again === true ? ', where a visit before has not found it' : ''}`;
}

/** Worth for an hour, or for money; a dash where the visit costs nothing of it. */
export function perCostWord({ value_per_cost }: Pick<SurveyVisit, 'value_per_cost'>): string {
  return value_per_cost === null ? '–' : formatNumber(value_per_cost, 3);
}

/** "street (0.4 h)", "drawings (4 h, 160 in money)". */
export function visitWord({ name, hours, money }: Visit): string {
  const cost = [...(hours > 0 ? [`${formatNumber(hours, 3)} h`] : []), ...(money > 0 ? [`${formatNumber(money, 4)} in money`] : [])];
  return `${name} (${cost.join(', ')})`;
}

/** What the whole plan does to the list. `tooLarge`: kinds of visit that do not fit into hours and money even once. */
export function planSentences(plan: SurveyPlan, tooLarge: readonly Visit[] = []): readonly string[] {
  const { steps, buildings, hours, money, expected_wrong_before, expected_wrong_after, list_size } = plan;
  const since = sinceSentences(String(plan.run), plan);
  if (steps.length === 0)
    return [
      tooLarge.length === 0
        ? 'No visit that fits is worth anything: what is unknown at the edge of the list would not change it, or is known already.'
        : `No visit that fits is worth anything; what does not fit into the hours or the money: ${tooLarge.map(visitWord).join(', ')}.`,
      ...since,
    ];
  const cost = [`${formatNumber(hours, 3)} h`, ...(money > 0 ? [`${formatNumber(money, 4)} in money`] : [])].join(', ');
  return [
    `${String(steps.length)} ${steps.length === 1 ? 'visit' : 'visits'} to ${String(buildings)} ${buildings === 1 ? 'building' : 'buildings'}, ${cost}: of the ${String(list_size)} places about ${formatNumber(expected_wrong_before, 2)} are expected to be wrong now, about ${formatNumber(expected_wrong_after, 2)} once all visits are made.`,
    ...since,
    `${heldSentence(plan, plan.ranked)} Far from the edge of the list hardly anything found out would change it, however poor the record.`,
    ...(plan.failed_at === 0
      ? []
      : [
          `At ${plan.failed_at === 1 ? 'one building' : `${formatCount(plan.failed_at)} buildings`} a visit has looked for something and not found it; such a visit is not counted on for it again.`,
        ]),
    ...(plan.capped
      ? [`The ${formatCount(plan.weighed)} that could be worth most were weighed one by one.`]
      : []),
  ];
}

/** What has become of answers that the run does not know of; one sentence each, none where there is nothing. */
export function sinceSentences(
  run: string,
  { answered_at = 0, withdrawn_at = 0 }: Partial<Pick<SurveyPlan, 'answered_at' | 'withdrawn_at'>>,
): readonly string[] {
  const at = (count: number): string => `At ${count === 1 ? 'one building' : `${formatCount(count)} buildings`}`;
  return [
    ...(answered_at === 0
      ? []
      : [
          `${at(answered_at)} answers have come in that run ${run} does not count yet: what they settle is not asked for; run swaymark screen to count them in.`,
        ]),
    ...(withdrawn_at === 0
      ? []
      : [
          `${at(withdrawn_at)} answers that run ${run} counts were withdrawn since, and are taken as known still; run swaymark screen to count without them.`,
        ]),
  ];
}

/** What a survey would do to the list, in a sentence a council understands. */
export function outlookSentence(outlook: SurveyOutlook): string {
  const { hours, expected_wrong_before: before, expected_wrong_after: after, halving_hours, least_wrong } = outlook;
  if (hours === 0)
    return 'No visit would change the list: what is unknown at its edge is known already or cannot be seen.';
  if (halving_hours !== null) return `${formatNumber(halving_hours, 2)} h of visits would halve that.`;
  const [reached, least] = [formatNumber(after, 2), formatNumber(least_wrong, 2)];
  if (reached === least)
    return `${formatNumber(hours, 2)} h of visits would bring the places expected to be wrong from about ${formatNumber(before, 2)} to about ${reached}, about as far as visits can; the rest take a detailed assessment.`;
  const told = `${formatNumber(hours, 2)} h of visits would bring the places expected to be wrong from about ${formatNumber(before, 2)} to about ${reached}`;
  return `${told}; with all found out that a visit can find out, about ${least} would remain, which take a detailed assessment.`;
}

/** Where there is something to learn; empty where there is nothing. */
export function worthwhileSentence(outlook: SurveyOutlook, ranked: number): string {
  return outlook.expected_wrong_before > 0 && outlook.buildings_of_80_percent > 0 ? heldSentence(outlook, ranked) : '';
}

type Held = Pick<SurveyOutlook, 'buildings_of_80_percent' | 'buildings_of_99_percent'>;

function heldSentence({ buildings_of_80_percent: most, buildings_of_99_percent: nearlyAll }: Held, ranked: number): string {
  const nearly = nearlyAll > most ? `, ${formatCount(nearlyAll)} hold 99 %` : '';
  return `Of ${formatCount(ranked)} ranked buildings ${formatCount(most)} ${most === 1 ? 'holds' : 'hold'} 80 % of what visits can find out that matters to the list${nearly}.`;
}

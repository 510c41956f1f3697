/** What the money buys and what the list hangs on, in words and tables that page and summary share. */
import { formatCount, formatNumber, formatShare } from '../../engineering/format.js';
import type { BudgetOutlook, SensitivityOutlook } from '../../engineering/page-contract.js';
import type { DataTable } from '../dashboard/charts/chart.js';

/** "178,400 crowns"; hundredths only where there are any. */
export function amount(value: number, currency: string | null): string {
  const whole = Math.round(value) === value;
  const text = whole ? formatCount(value) : `${formatCount(Math.trunc(value))}.${value.toFixed(2).slice(-2)}`;
  return currency === null ? text : `${text} ${currency}`;
}

/** More ids than this are counted only. */
const MOST_NAMED = 25;

const counted = (count: number, one: string, many: string): string => `${formatCount(count)} ${count === 1 ? one : many}`;

/** What the whole list costs, then what the money buys. */
export function budgetSentences(budget: BudgetOutlook): readonly string[] {
  const { list_cost, currency, cost_source, problem, plan } = budget;
  const costs = cost_source === 'study' ? 'by the costs of the study' : 'by assumed costs, since the study states none [judgement]';
  const list = `To assess every building on the list in detail would cost about ${amount(list_cost, currency)}, ${costs}.`;
  if (problem !== null) return [list, `What the money of the study buys cannot be told: ${problem}.`];
  if (plan === null) return [list, 'The study names no sum of money; the command budget chooses within one.'];
  const { money, spent, left, gap, count, of_list, on_list, mobilisation, excluded } = plan;
  if (count === 0) return [list, `${amount(money, currency)} buys no assessment.`];
  const best = gap > 0 ? `${gap < 0.001 ? 'less than 0.1 %' : `at most ${formatShare(gap)}`} of the best possible worth is missed` : 'no choice within the money is worth more';
  return [
    list,
    `${amount(money, currency)} buys ${counted(count, 'assessment', 'assessments')} for ${amount(spent, currency)}${mobilisation > 0 ? ', mobilisations included' : ''}, with ${amount(left, null)} left: ${formatCount(of_list)} of the ${counted(on_list, 'building', 'buildings')} on the list ${of_list === 1 ? 'is' : 'are'} among them, and ${best}.`,
    ...(excluded > 0 ? [`${counted(excluded, 'building is', 'buildings are')} left out because the study says so.`] : []),
  ];
}

/** The assessments bought; null where there are none. */
export function budgetTable({ plan, currency }: BudgetOutlook): DataTable | null {
  if (plan === null || plan.chosen.length === 0) return null;
  const all = plan.chosen.length === plan.count;
  return {
    caption: all ? `The ${counted(plan.count, 'assessment', 'assessments')} bought, by rank` : `The first ${formatCount(plan.chosen.length)} of ${formatCount(plan.count)} assessments bought, by rank`,
    head: ['Building', 'Block', 'Rank', 'Chance', `Cost${currency === null ? '' : ` (${currency})`}`, 'Decided by'],
    rows: plan.chosen.map(({ id, name, group, rank, chance, cost, must }) => [
      name === null ? id : `${id} ${name}`,
      group ?? '',
      rank === null ? 'not ranked' : formatCount(rank),
      chance === null ? '' : formatShare(chance),
      amount(cost, null),
      must ? 'the study: must be among them' : 'chance × priority for the cost',
    ]),
  };
}

/** How much of the list stays, and what moves it most. */
export function sensitivitySentences(found: SensitivityOutlook): readonly string[] {
  const { rankings, of_rankings, places, sample, always, switches, weights } = found;
  const first = switches[0];
  const whole = sample === null ? `the ${formatCount(places)} on the list` : `the ${formatCount(places)} that stand for the list in a sample of ${formatCount(sample.buildings)} buildings`;
  const named = always.length === 0 || always.length > MOST_NAMED ? '' : `: ${always.join(', ')}`;
  return [
    `With ${counted(rankings, 'switch of an assumption', 'switches of assumptions')} made, one at a time, ${always.length === 0 ? 'none' : formatCount(always.length)} of ${whole} ${always.length === 1 ? 'stays' : 'stay'} on it whichever of these is made${named}.`,
    ...(first === undefined ? [] : [`What moves it most: ${first.statement.replace(/\.$/, '')}, ${first.to}: ${formatCount(first.overlap)} of ${formatCount(first.places)} stay.`]),
    ...(weights === undefined
      ? []
      : [`With ${weights.slope === false ? '' : 'slope, '}people and importance weighed otherwise, all at once, ${formatCount(weights.safe)} of the ${formatCount(weights.places)} keep their place in ${formatShare(weights.safe_share)} of ${formatCount(weights.draws)} weightings or more.`]),
    `The command sensitivity makes all ${formatCount(of_rankings)} switches${sample === null ? '' : ' on every building'}.`,
  ];
}

/** The switches with the largest effects. */
export function switchesTable({ switches, rankings }: SensitivityOutlook): DataTable | null {
  if (switches.length === 0) return null;
  return {
    caption: `The ${formatCount(switches.length)} largest effects of ${formatCount(rankings)} switches`,
    head: ['Assumption', 'Switched to', 'Stay on the list', 'Kendall’s tau-b', 'Was', 'Rests on'],
    rows: switches.map(({ statement, from, to, mark, overlap, places, tau_b }) => [
      statement,
      to,
      `${formatCount(overlap)} of ${formatCount(places)}`,
      tau_b === null ? '' : formatNumber(tau_b, 3),
      from,
      mark,
    ]),
  };
}

import { relative } from 'node:path';
import { formatCount, formatNumber, formatShare } from '../../engineering/format.js';
import { EXIT } from '../../errors.js';
import { budgetStudy } from '../../exports/budget-study.js';
import { amount } from '../../reports/decide/words.js';
import type { BudgetBuilding, BudgetPlan } from '../../screening/budget-plan.js';
import { findStudy } from '../find-study.js';
import { printJson, printLines, terminalColumns } from '../output/print.js';
import { styled } from '../output/style.js';
import { table } from '../output/table.js';
import { clean, wrap } from '../output/text.js';

export interface BudgetCommandOptions {
  readonly money?: number;
  readonly study?: string;
  readonly run?: number;
  readonly csv?: string;
  readonly json?: true;
}

/** Rows shown; the table of --csv and the JSON have all. */
const SHOWN = 40;

/** `swaymark budget`: the assessments that a sum of money buys. Ends with 1 where it buys none. */
export async function budget(options: BudgetCommandOptions): Promise<number> {
  const { money, run, csv } = options;
  const plan = await budgetStudy(findStudy(options.study), money, { run, csv });
  if (options.json) printJson(plan);
  else printLines(lines(plan, csv, terminalColumns()));
  return plan.chosen.length === 0 ? EXIT.findings : EXIT.clean;
}

const counted = (count: number, one: string, many: string): string =>
  `${formatCount(count)} ${count === 1 ? one : many}`;

function lines(plan: BudgetPlan, csv: string | undefined, columns: number): string[] {
  const paragraphs = plan.chosen.length === 0 ? nothingBought(plan) : bought(plan);
  return [
    ...paragraphs.flatMap((text) => wrap(clean(text), columns)),
    '',
    ...wrap(clean(costSentence(plan)), columns),
    '',
    ...chosenLines(plan, columns),
    ...batchLines(plan, columns),
    ...overrideLines(plan, columns),
    ...(csv === undefined ? [] : [`Written: ${clean(relative(process.cwd(), csv) || csv)}`, '']),
    ...wrap('An order for further assessment, not a statement on the safety of any building.', columns),
  ];
}

function nothingBought({ run, money, currency, cheapest }: BudgetPlan): string[] {
  const why =
    cheapest === null
      ? 'there is no building to choose from'
      : `the cheapest assessment that counts costs ${amount(cheapest, currency)}`;
  return [`${amount(money, currency)} buys no assessment out of run ${String(run)}: ${why}.`];
}

function bought(plan: BudgetPlan): string[] {
  const { run, money, spent, left, currency, chosen, of_list, on_list, gap, bound, value, unlikely } = plan;
  const best =
    value >= bound
      ? provenWords(plan)
      : `${gap < 0.001 ? 'Less than 0.1 %' : `At most ${formatPercent(gap)}`} of the best possible worth is missed: no choice within the money is worth more than ${formatNumber(bound, 5)}, this one is worth ${formatNumber(value, 5)} (sum of chance of belonging × priority).`;
  return [
    `${counted(chosen.length, 'assessment', 'assessments')} out of run ${String(run)} for ${amount(spent, currency)}; of ${amount(money, currency)} there ${left === 1 ? 'is' : 'are'} ${amount(left, null)} left.`,
    `${formatCount(of_list)} of the ${counted(on_list, 'building', 'buildings')} on the list ${of_list === 1 ? 'is' : 'are'} among them. ${best}`,
    ...(unlikely === 0
      ? []
      : [
          `${counted(unlikely, 'building', 'buildings')} among them ${unlikely === 1 ? 'belongs' : 'belong'} to the list with a chance below 5 %: more money buys little.`,
        ]),
  ];
}

/** Why no choice is worth more: the musts leave nothing, or all is chosen that may be. */
function provenWords({ chosen, overrides, ranked, left, currency }: BudgetPlan): string {
  const musts = new Set(overrides.filter(({ what }) => what === 'include').map(({ id }) => id));
  const isRanked = ({ rank }: BudgetBuilding): boolean => rank !== null;
  const mayBe = ranked - overrides.filter((one) => one.what === 'exclude' && isRanked(one)).length;
  if (chosen.filter(isRanked).length === mayBe)
    return 'No choice within the money is worth more: all that may be chosen is.';
  if (chosen.length > 0 && chosen.every(({ id }) => musts.has(id)))
    return `What must be among them leaves ${left === 0 ? 'no money' : `${amount(left, currency)}, too little`} for any other.`;
  return 'No choice within the money is worth more.';
}

function formatPercent(share: number): string {
  return `${(100 * share).toFixed(1)} %`;
}

function costSentence({ cost_model, mobilisation, currency }: BudgetPlan): string {
  const { fixed, per_m2, least, source } = cost_model;
  const model = `An assessment costs what the inventory says, else ${amount(fixed, null)} + ${amount(per_m2, null)} per m² of floor area, at least ${amount(least, currency)}${source === 'judgement' ? ' (judgement: the study states no cost)' : ''}.`;
  if (mobilisation === null) return model;
  return `${model} Every block with a chosen building costs ${amount(mobilisation.cost, currency)} once; buildings with a chance below ${formatShare(mobilisation.least_chance)} are not taken along.`;
}

function chosenLines({ chosen, overrides }: BudgetPlan, columns: number): string[] {
  if (chosen.length === 0) return [];
  const must = new Set(overrides.map(({ id }) => id));
  const cost = ({ cost, cost_from }: BudgetBuilding): string =>
    `${amount(cost, null)}${cost_from === 'inventory' ? '' : cost_from === 'floor area' ? ' ' : '?'}`;
  const rows = chosen
    .slice(0, SHOWN)
    .map((one) => [
      one.rank === null ? '' : formatCount(one.rank),
      one.id,
      one.name ?? '',
      one.group ?? '',
      one.chance === null ? '' : formatShare(one.chance),
      formatNumber(one.value),
      cost(one),
      must.has(one.id) ? 'must' : '',
    ]);
  return [
    ...table(
      [
        { title: 'Rank', right: true },
        { title: 'Building', shrinkTo: 8 },
        { title: 'Name', shrinkTo: 10, spare: 2 },
        { title: 'Block', shrinkTo: 8, spare: 1 },
        { title: 'Chance', right: true },
        { title: 'Worth', right: true },
        { title: 'Cost', right: true },
        { title: '' },
      ],
      rows,
      columns,
    ),
    ...(chosen.length > SHOWN ? [`and ${formatCount(chosen.length - SHOWN)} more`] : []),
    ...(chosen.some(({ cost_from }) => cost_from === 'median floor area')
      ? wrap('?: floor area not known, reckoned with the median of the others', columns)
      : []),
    '',
  ];
}

function batchLines({ batches }: BudgetPlan, columns: number): string[] {
  if (batches.length === 0) return [];
  const rows = batches
    .slice(0, SHOWN)
    .map(({ group, buildings, value, cost }) => [
      group ?? 'no block',
      formatCount(buildings),
      formatNumber(value),
      amount(cost, null),
    ]);
  return [
    ...table(
      [
        { title: 'Block', shrinkTo: 10 },
        { title: 'Buildings', right: true },
        { title: 'Worth', right: true },
        { title: 'Cost with mobilisation', right: true },
      ],
      rows,
      columns,
    ),
    ...(batches.length > SHOWN ? [`and ${formatCount(batches.length - SHOWN)} more`] : []),
    '',
  ];
}

function overrideLines({ overrides, currency }: BudgetPlan, columns: number): string[] {
  if (overrides.length === 0) return [];
  return [
    styled('bold', 'Decided by the study'),
    ...overrides.flatMap((one) => {
      const standing =
        one.rank === null ? `not ranked: ${one.not_ranked ?? 'no result'}` : `rank ${formatCount(one.rank)}`;
      const by = one.author === null ? '' : ` (${one.author})`;
      return wrap(
        clean(
          `${one.what === 'include' ? 'in' : 'out'}: ${one.id}${one.name === null ? '' : ` ${one.name}`}, ${standing}, ${amount(one.cost, currency)}: ${one.reason}${by}`,
        ),
        columns,
        '  ',
        '      ',
      );
    }),
    '',
  ];
}

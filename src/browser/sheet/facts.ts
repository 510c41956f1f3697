/** What the sheet tells of a building, as pairs of name and words. */
import {
  editionWords,
  formatCount,
  formatNumber,
  formatQuantity,
  formatShare,
  plainWords,
  textInDisplay,
} from '../../engineering/format.js';
import { BUILDING_NUMBERS, BUILDING_WORDS } from '../../engineering/building-columns.js';
import { findColumn } from '../../engineering/columns.js';
import { STRUCTURE_NUMBERS, STRUCTURE_WORDS } from '../../engineering/structure-columns.js';
import type { Portfolio } from '../portfolio.js';

export type Fact = readonly [string, string];

/** Rank, chance, band and tie group in sentences. */
export function placeSentences(p: Portfolio, i: number): readonly string[] {
  const reason = p.text('not_ranked', i);
  if (reason !== '') return [`Not ranked: ${reason}.`];
  const { summary } = p.page;
  const whole = (name: string): string => formatCount(p.number(name, i));
  const listed = p.text('in_list', i) === 'yes';
  const group = p.number('tie_group', i);
  const fellows = Array.from({ length: p.count }, (_, j) => j).filter((j) => p.number('tie_group', j) === group);
  const first = p.number('rank', fellows[0] ?? i);
  const last = p.number('rank', fellows.at(-1) ?? i);
  return [
    `Rank ${whole('rank')} of ${formatCount(summary.ranked)}: ${listed ? 'in' : 'not in'} the list of ${formatCount(summary.list_size)}. The chance that it truly belongs there is ${formatShare(p.number('chance', i))}.`,
    `With 90 % confidence its true rank lies between ${whole('rank_best')} and ${whole('rank_worst')}.`,
    fellows.length > 1
      ? `It belongs to tie group ${formatCount(group)}, ranks ${formatCount(first)} to ${formatCount(last)}, whose order cannot be told apart.`
      : 'No neighbour in rank is tied with it.',
    demandSentence(p, i),
  ];
}

function demandSentence(p: Portfolio, i: number): string {
  const shared = p.number('demand_rank_last', i) > p.number('demand_rank', i);
  return shared
    ? `By spectral demand alone it would share ranks ${p.demandPlaces(i)} with buildings of the same demand.`
    : `By spectral demand alone it would stand at rank ${p.demandPlaces(i)}.`;
}

/** Periods, demand, capacity, priority. */
export function resultFacts(p: Portfolio, i: number): readonly Fact[] {
  const { display } = p.page;
  const quantity = (name: string, unit: string | null, digits = 3): string =>
    formatQuantity(p.number(name, i), unit, display, digits);
  const period = (direction: string): string =>
    `${quantity(`period_${direction}_s`, 's')} (16 to 84 %: ${quantity(`period_${direction}_16_s`, 's')} to ${quantity(`period_${direction}_84_s`, 's')})`;
  const secondLevel = p.number('sa_level_2_g', i);
  const level = p.page.settings.levels[1]?.title ?? 'second level';
  const facts: Fact[] = [
    ['Period, longitudinal', period('longitudinal')],
    ['Period, transverse', period('transverse')],
    ['Period from', p.text('period_evidence', i)],
    ['Governing direction', p.text('governing', i)],
    ['Spectrum', p.text('spectrum', i)],
    ['Spectral demand Sₐ', quantity('sa_g', 'g')],
  ];
  if (!Number.isNaN(secondLevel)) facts.push([`Sₐ, ${level}`, formatQuantity(secondLevel, 'g', display, 3)]);
  facts.push(
    [
      'Most likely case',
      `${plainWords(p.text('case_system', i))}, ${editionWords(p.text('case_edition', i))} (chance ${formatShare(p.number('case_chance', i))})`,
    ],
    ...(p.page.summary.rank_by === 'demand' && Number.isNaN(p.number('capacity_g', i))
      ? [['Capacity', 'not used: ranked by demand alone'] as const]
      : [
          ['Capacity of that case', quantity('capacity_g', 'g')] as const,
          ['Demand over capacity', quantity('demand_over_capacity', null)] as const,
        ]),
  );
  if (!Number.isNaN(p.number('people_exposed', i)))
    facts.push(['People present on average', quantity('people_exposed', null)]);
  facts.push(
    ['Slope k of the hazard curve', quantity('slope_k', null)],
    ['Priority', `${quantity('priority', null)} times the middle of the portfolio`],
    [
      'ln S, median and spread',
      `${formatNumber(p.number('ln_priority', i), 5)} ± ${formatNumber(p.number('ln_priority_sd', i), 3)}`,
    ],
  );
  return facts;
}

const COMPANION = /_(?:origin|rule|sigma|pool)$/;

/** Every value the assessment used, with its unit and where it comes from. */
export function inputFacts(p: Portfolio, i: number): readonly Fact[] {
  const { display } = p.page;
  const facts: Fact[] = [];
  const title = (name: string): string => findColumn(name)?.title ?? plainWords(name.replaceAll('_', ' '));
  for (const name of BUILDING_NUMBERS) {
    if (COMPANION.test(name)) continue;
    const value = p.input(name, i);
    if (Number.isNaN(value)) continue;
    const unit = findColumn(name)?.unit;
    const shown = name.startsWith('year')
      ? String(value)
      : unit === undefined && Number.isInteger(value)
        ? formatCount(value)
        : formatQuantity(value, unit, display, 4);
    facts.push([title(name), `${shown}${origin(p, name, i)}`]);
  }
  if (!(p.input('year_built', i) > 0)) {
    const pool = p.page.buildings.pools[p.input('year_pool', i)] ?? [];
    const span =
      pool.length === 0
        ? ''
        : `; ${formatCount(pool.length)} years of like buildings, ${String(Math.min(...pool))} to ${String(Math.max(...pool))}, stand in`;
    facts.push([title('year_built'), `not known${span}`]);
  }
  for (const name of BUILDING_WORDS) {
    if (COMPANION.test(name)) continue;
    const value = p.word(name, i);
    if (value !== '') facts.push([title(name), plainWords(value)]);
  }
  if (p.word('system', i) === '') facts.push([title('system'), 'not known; the study’s table of chances speaks']);
  return [...facts, ...structureFacts(p, i)];
}

/** What is known of the structure and the ground under it. */
function structureFacts(p: Portfolio, i: number): readonly Fact[] {
  const { structure } = p.page.buildings.inputs;
  if (structure === undefined) return [];
  const facts: Fact[] = [];
  for (const name of STRUCTURE_NUMBERS) {
    const value = structure.numbers[name][i] ?? NaN;
    const column = findColumn(name);
    if (Number.isNaN(value) || column === undefined) continue;
    const whole = column.unit === undefined && Number.isInteger(value);
    facts.push([
      column.title,
      `${whole ? formatCount(value) : formatQuantity(value, column.unit, p.page.display, 4)}, given`,
    ]);
  }
  for (const name of STRUCTURE_WORDS) {
    const value = structure.words[name][i] ?? null;
    if (value !== null) facts.push([findColumn(name)?.title ?? name, plainWords(value)]);
  }
  return facts;
}

function origin(p: Portfolio, name: string, i: number): string {
  switch (name) {
    case 'storeys_above':
    case 'height_m':
    case 'floor_area_m2': {
      const from = p.word(`${name}_origin`, i);
      const rule = p.word(`${name}_rule`, i);
      const sigma = p.input(`${name}_sigma`, i);
      if (from === '' || from === 'given') return ', given';
      return `, ${from}${rule === '' ? '' : `: ${textInDisplay(rule, p.page.display)}`}${sigma > 0 ? ` (spread ${formatShare(sigma)})` : ''}`;
    }
    case 'year_built':
      return `, ${p.word('year_built_origin', i) || 'given'}`;
    default:
      return ', given';
  }
}

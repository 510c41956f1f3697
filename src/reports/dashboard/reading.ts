/** Reading one value of the page's columns. */
import { formatNumber, formatPlaces } from '../../engineering/format.js';
import type { PageData } from '../../engineering/page-contract.js';

/** The number of result column `name` for building `i`; NaN when blank. */
export function numberAt({ buildings }: PageData, name: string, i: number): number {
  const value = buildings.results[name]?.[i];
  return typeof value === 'number' ? value : NaN;
}

/** The words of result column `name` for building `i`; empty when blank. */
export function textAt({ buildings }: PageData, name: string, i: number): string {
  const value = buildings.results[name]?.[i];
  return value === null || value === undefined ? '' : String(value);
}

/** How many of the shown buildings are ranked: they come first, in rank order. */
export function rankedShown(data: PageData): number {
  return Math.min(data.summary.ranked, data.buildings.shown);
}

/** How many places of the list are filled. */
export function listLength(data: PageData): number {
  return Math.min(data.summary.list_size, rankedShown(data));
}

/** "BH-012 Customs House", or the identifier alone. */
export function buildingLabel({ buildings }: PageData, i: number): string {
  const id = buildings.inputs.id[i] ?? '';
  const name = buildings.name[i] ?? '';
  return name === '' || name === id ? id : `${id} ${name}`;
}

/** Period in the governing direction, s. */
export function governingPeriod(data: PageData, i: number): number {
  return numberAt(data, textAt(data, 'governing', i) === 'transverse' ? 'period_transverse_s' : 'period_longitudinal_s', i);
}

/** The middle value of the numbers in `values`; NaN when there is none. */
export function middle(values: readonly number[]): number {
  // typed numbers sort by themselves, several times as fast as with a comparison of ours
  const known = Float64Array.from(values.filter((value) => !Number.isNaN(value))).sort();
  const half = known.length >> 1;
  const upper = known[half] ?? NaN;
  return known.length % 2 === 1 ? upper : ((known[half - 1] ?? NaN) + upper) / 2;
}

/** Rank by demand: one place, or the places that equal demands share. */
export function demandPlaces(data: PageData, i: number): string {
  return formatPlaces(numberAt(data, 'demand_rank', i), numberAt(data, 'demand_rank_last', i));
}

/** Capacity in g without its unit; where the order uses none, that is said. */
export function capacityWords(data: PageData, i: number): string {
  const capacity_g = numberAt(data, 'capacity_g', i);
  return Number.isNaN(capacity_g) && data.summary.rank_by === 'demand' ? 'not used' : formatNumber(capacity_g, 2);
}

/** "one building", "3 buildings". */
export function counted(count: number, one: string, many: string): string {
  return count === 1 ? `1 ${one}` : `${String(count).replaceAll(/\B(?=(\d{3})+$)/g, '\u202f')} ${many}`;
}

/** The loaded page, read building by building. */
import type { BuildingColumns } from '../engineering/building-columns.js';
import { formatPlaces } from '../engineering/format.js';
import type { LoadedPage } from './unpack.js';

type NumberName = keyof BuildingColumns['numbers'];
type WordName = keyof BuildingColumns['words'];

export interface Portfolio {
  readonly page: LoadedPage;
  readonly count: number;
  readonly id: (i: number) => string;
  readonly name: (i: number) => string;
  /** Identifier and name. */
  readonly label: (i: number) => string;
  /** Place of the building with this identifier, or undefined. */
  readonly placeOf: (id: string) => number | undefined;
  /** A result as a number; NaN when blank. */
  readonly number: (column: string, i: number) => number;
  /** A result as words; empty when blank. */
  readonly text: (column: string, i: number) => string;
  /** An input as a number; NaN when unknown. */
  readonly input: (column: NumberName, i: number) => number;
  /** An input as words; empty when unknown. */
  readonly word: (column: WordName, i: number) => string;
  /** Rank by demand: one place, or the places that equal demands share. */
  readonly demandPlaces: (i: number) => string;
  readonly group: (i: number) => string;
  readonly period_s: (i: number) => number;
}

/** Accessors over the page's columns. */
export function portfolioOf(page: LoadedPage): Portfolio {
  const { buildings } = page;
  const { inputs, results } = buildings;
  const places = new Map(inputs.id.map((id, i) => [id, i]));
  const id = (i: number): string => inputs.id[i] ?? '';
  const name = (i: number): string => buildings.name[i] ?? '';
  const number = (column: string, i: number): number => {
    const value = results[column]?.[i];
    return typeof value === 'number' ? value : NaN;
  };
  const text = (column: string, i: number): string => {
    const value = results[column]?.[i];
    return value === null || value === undefined ? '' : String(value);
  };
  return {
    page,
    count: buildings.shown,
    id,
    name,
    label: (i) => (name(i) === '' ? id(i) : `${id(i)} ${name(i)}`),
    placeOf: (wanted) => places.get(wanted),
    number,
    text,
    input: (column, i) => inputs.numbers[column][i] ?? NaN,
    word: (column, i) => inputs.words[column][i] ?? '',
    demandPlaces: (i) => formatPlaces(number('demand_rank', i), number('demand_rank_last', i)),
    group: (i) => buildings.group[i] ?? '',
    period_s: (i) => number(text('governing', i) === 'transverse' ? 'period_transverse_s' : 'period_longitudinal_s', i),
  };
}

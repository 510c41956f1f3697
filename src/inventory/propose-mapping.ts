/** Which of their columns is likely which of ours: by the words of the header, then by what the cells hold. */
import { COLUMNS } from '../engineering/columns.js';
import type { InventoryColumn } from '../engineering/columns.js';
import { findUnit } from '../engineering/units.js';
import type { Unit } from '../engineering/units.js';
import { showValue } from '../errors.js';
import { BLANK } from '../study/inventory-schema.js';
import { foldWord, readNumberCell } from './cell.js';
import { hintsOf } from './column-hints.js';
import { columnDirection, otherWay, readHeaderName, withoutDirection } from './header-name.js';
import type { HeaderName } from './header-name.js';
import { medianOf } from './median.js';

export interface ProposedColumn {
  readonly ours: string;
  readonly theirs: string;
  readonly unit?: string;
  /** What only the owner of the table can answer. */
  readonly question?: string;
}

export interface Proposal {
  readonly columns: readonly ProposedColumn[];
  /** Questions about the table as a whole. */
  readonly questions: readonly string[];
  /** Their columns that found no place. */
  readonly unused: readonly string[];
}

/** More than any likeness scores. */
const OWN_NAME = 1000;

interface Score {
  readonly score: number;
  /** What it would score if it did not name the other direction: whatever scores less has only a part of the name. */
  readonly refused: number;
}

const NONE: Score = { score: 0, refused: 0 };

function score(column: InventoryColumn, { words, unit, direction, own }: HeaderName): Score {
  if (own !== undefined)
    return own === column ? { score: OWN_NAME + Number(unit?.id === column.unit), refused: 0 } : NONE;
  if (unit !== undefined && unit.dimension !== column.dimension) return NONE;
  const wanted = columnDirection(column);
  const hints = [...hintsOf(column), column.title.toLowerCase(), foldWord(column.name.replaceAll('_', ' '))];
  const asWritten = likeness(words, hints);
  if (wanted === undefined || direction === undefined) return { score: asWritten, refused: 0 };
  // `brace areas across` is what `brace area` is, across.
  const twin = otherWay(column);
  const shared = [...hints, ...(twin === undefined ? [] : hintsOf(twin))].map(withoutDirection);
  const alike = Math.max(asWritten, likeness(withoutDirection(words), shared));
  return direction === wanted ? { score: alike, refused: 0 } : { score: 0, refused: alike };
}

function likeness(words: string, hints: readonly string[]): number {
  const joined = words.replaceAll(' ', '');
  let best = 0;
  for (const hint of hints) {
    if (words === hint || joined === hint.replaceAll(' ', '')) best = Math.max(best, 100 + hint.length);
    else if (hint.length > 2 && ` ${words} `.includes(` ${hint} `)) best = Math.max(best, 40 + hint.length);
    else if (hint.length > 4 && joined.includes(hint.replaceAll(' ', ''))) best = Math.max(best, 20 + hint.length);
  }
  return best;
}

/**
 * Pairs columns by the best score, each used once; `rows` are sample rows in the order of the header, `decimal` the
 * sign their numbers are written with.
 */
export function proposeMapping(
  header: readonly string[],
  rows: readonly (readonly string[])[],
  decimal = '.',
): Proposal {
  const names = header.map(readHeaderName);
  const scored = COLUMNS.flatMap((column) =>
    names.map((name, position) => ({ column, position, ...(header[position] === '' ? NONE : score(column, name)) })),
  );
  const refused = new Float64Array(names.length);
  for (const pair of scored) refused[pair.position] = Math.max(refused[pair.position] ?? 0, pair.refused);
  const pairs = scored.filter((pair) => pair.score > 0 && pair.score >= (refused[pair.position] ?? 0));
  pairs.sort((a, b) => b.score - a.score || a.position - b.position);
  const chosen = new Map<InventoryColumn, number>();
  const taken = new Set<number>();
  const unread: { readonly column: InventoryColumn; readonly position: number }[] = [];
  for (const { column, position } of pairs) {
    if (chosen.has(column) || taken.has(position)) continue;
    if (isNumber(column) && shareOfNumbers(filledOf(rows, position), column, decimal) < 0.5) {
      unread.push({ column, position });
      continue;
    }
    chosen.set(column, position);
    taken.add(position);
  }
  const numbersOf = (name: string): Float64Array | undefined => {
    const column = COLUMNS.find((one) => one.name === name);
    const position = column === undefined ? undefined : chosen.get(column);
    return column === undefined || position === undefined
      ? undefined
      : Float64Array.from(rows, (row) => bareNumber(row[position] ?? '', column, decimal));
  };
  const columns = COLUMNS.flatMap((column): ProposedColumn[] => {
    const position = chosen.get(column);
    const theirs = position === undefined ? undefined : header[position];
    if (position === undefined || theirs === undefined) return [];
    const { unit, question } = unitOf(column, names[position]?.unit, numbersOf);
    const asked = [question, directionQuestion(column, names[position])].filter((one) => one !== undefined);
    return [
      {
        ours: column.name,
        theirs,
        ...(unit === undefined ? {} : { unit }),
        ...(asked.length === 0 ? {} : { question: asked.join(' And ') }),
      },
    ];
  });
  // Each column once, as the best of ours it resembles; not where another column holds that already.
  const asked = new Map<number, InventoryColumn>();
  for (const { column, position } of unread) {
    if (!taken.has(position) && !asked.has(position) && !chosen.has(column)) asked.set(position, column);
  }
  return {
    columns,
    questions: [
      ...[...asked].map(([position, column]) =>
        unreadQuestion(header[position] ?? '', filledOf(rows, position), column),
      ),
      ...questionsOf(columns, rows, header),
    ],
    unused: header.filter((name, at) => name !== '' && !taken.has(at) && !asked.has(at)),
  };
}

function isNumber({ kind }: InventoryColumn): boolean {
  return kind === 'number' || kind === 'whole' || kind === 'year';
}

const BLANKS = new Set(BLANK.map(foldWord));

/** True for a cell that says that nothing is known. */
export function isBlank(cell: string): boolean {
  return BLANKS.has(foldWord(cell));
}

function filledOf(rows: readonly (readonly string[])[], position: number): string[] {
  return rows.map((row) => row[position]?.trim() ?? '').filter((cell) => !isBlank(cell));
}

function unreadQuestion(theirs: string, cells: readonly string[], { name, title }: InventoryColumn): string {
  const shown = [...new Set(cells)].slice(0, 3).map(showValue).join(', ');
  return `${showValue(theirs)} looks like ${name} (${title.toLowerCase()}), but its cells cannot be read as such: ${shown}; how are they written?`;
}

function bareNumber(text: string, column: InventoryColumn, decimal: string): number {
  return readNumberCell(text, { ...column, kind: 'number', limits: [-Infinity, Infinity] }, { decimal }).value;
}

function shareOfNumbers(filled: readonly string[], column: InventoryColumn, decimal: string): number {
  if (filled.length === 0) return 1;
  const unit = column.unit === undefined ? undefined : findUnit(column.unit);
  const format = { decimal, unit, stored: unit };
  const open = { ...column, limits: [-Infinity, Infinity] as const };
  return (
    filled.filter((cell) => readNumberCell(cell, open, format).note?.kind !== 'rejected-cell').length / filled.length
  );
}

function unitOf(
  column: InventoryColumn,
  inHeader: Unit | undefined,
  numbersOf: (name: string) => Float64Array | undefined,
): { unit?: string; question?: string } {
  if (column.unit === undefined) return {};
  if (inHeader !== undefined) return { unit: inHeader.id };
  if (column.name === 'height_m') {
    const height = numbersOf('height_m');
    const storeys = numbersOf('storeys_above');
    const ratio =
      height === undefined || storeys === undefined ? NaN : medianOf(height.map((h, at) => h / (storeys[at] ?? NaN)));
    const shown = Number(ratio.toPrecision(3));
    if (ratio >= 9 && ratio <= 14)
      return { unit: 'ft', question: `feet, by the data: the median height per storey is ${shown}. Is it?` };
    if (ratio >= 2.3 && ratio <= 5)
      return { unit: 'm', question: `metres, by the data: the median height per storey is ${shown}. Is it?` };
  }
  const others = column.dimension === 'area' ? 'm2 or ft2' : column.dimension === 'length' ? 'm or ft' : 'another';
  return { unit: column.unit, question: `the header names no unit; ${others}?` };
}

/** A name like `wall area` may mean either direction. */
function directionQuestion({ name }: InventoryColumn, header: HeaderName | undefined): string | undefined {
  if (!name.includes('longitudinal') || header?.direction !== undefined) return undefined;
  return 'the header names no direction; longitudinal?';
}

function questionsOf(
  columns: readonly ProposedColumn[],
  rows: readonly (readonly string[])[],
  header: readonly string[],
): string[] {
  const questions: string[] = [];
  const id = columns.find(({ ours }) => ours === 'id');
  if (id === undefined) questions.push('no column looks like an identifier; which one names a building?');
  else {
    const position = header.indexOf(id.theirs);
    const ids = filledOf(rows, position);
    const repeated = ids.length - new Set(ids).size;
    if (repeated > 0.01 * ids.length) {
      questions.push(
        `${repeated} of ${ids.length} sampled rows repeat an earlier ${id.theirs}; are they parts of one building? Then set merge_rows_by`,
      );
    }
  }
  for (const [ours, what] of [
    ['storeys_above', 'storeys'],
    ['year_built', 'year of construction'],
    ['use', 'use'],
    ['system', 'lateral system'],
  ] as const) {
    if (!columns.some((column) => column.ours === ours))
      questions.push(`no column looks like the ${what}; is there one?`);
  }
  return questions;
}

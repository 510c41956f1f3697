/** Reading one cell that is not a plain number: separators, unit suffixes, feet and inches, years in words. */
import type { InventoryColumn } from '../engineering/columns.js';
import { findUnit } from '../engineering/units.js';
import type { Unit } from '../engineering/units.js';
import { showValue } from '../errors.js';
import { nearestFew } from '../study/nearest.js';

export interface CellNote {
  readonly code: string;
  readonly message: string;
  readonly action: string;
  readonly kind: 'rejected-cell' | 'note';
}

export interface ReadCell {
  /** In SI; NaN when nothing is known. */
  readonly value: number;
  /** First year of the decade when only that is known, else NaN. */
  readonly decade: number;
  readonly note?: CellNote;
}

export interface NumberFormat {
  readonly decimal: string;
  /** The unit of a cell that names none. */
  readonly unit?: Unit | undefined;
  /** The unit in which the column is stored. */
  readonly stored?: Unit | undefined;
}

const NOTHING: ReadCell = { value: NaN, decade: NaN };
export const TREATED_AS_UNKNOWN = 'treated as unknown';

// Words that only repeat what the column says.
const IDLE_SUFFIX =
  /^(?:storeys?|stories|story|floors?|fl|levels?|lvl|people|persons?|pers|pax|occupants?|years?|yrs?|h|hrs?|hours?|units?|no|nos|%?)$/;
const APPROXIMATE = /^(?:approx(?:imately)?|about|circa|ca|c|est|around|~|≈|±)[.:]?\s*(?=\d)/;

/** The cell of a number, whole-number or year column as a value in SI, with a note where it was not taken as it stands. */
export function readNumberCell(text: string, column: InventoryColumn, format: NumberFormat): ReadCell {
  const cell = text
    .replaceAll(/[\s\u00a0\u2007\u2009\u202f]+/g, ' ')
    .replaceAll(/[\u2212\u2013](?=\d)/g, '-')
    .trim();
  if (cell === '') return NOTHING;
  if (column.kind === 'year') {
    const year = readYear(cell);
    if (year !== undefined) return inLimits(year.value, text, column, year);
  }
  const bare = cell.toLowerCase().replace(APPROXIMATE, '');
  const approximate = bare.length < cell.length;
  const parts = splitNumber(bare, format);
  if (parts === undefined) return refuse('not-a-number', notANumber(text, column, format));
  const value = toStored(parts, format, column);
  if (value === undefined) {
    // Letters alone may be a unit; `0x10` and `3+` are no number at all.
    if (!/^[a-z²³ ./]+$/.test(parts.suffix.trim())) return refuse('not-a-number', notANumber(text, column, format));
    return refuse('unknown-unit', `${showValue(text)}: the unit is not one this column can have`);
  }
  if (column.kind !== 'number' && !Number.isInteger(value.si)) {
    return refuse('not-whole', `${showValue(text)} is not a whole number`);
  }
  const base: ReadCell = { value: value.si, decade: NaN };
  if (value.note !== undefined) return inLimits(value.si, text, column, { ...base, note: value.note });
  return inLimits(value.si, text, column, approximate ? { ...base, note: approximately(text, value.si) } : base);
}

function refuse(code: string, message: string): ReadCell {
  return { ...NOTHING, note: { code, message, action: TREATED_AS_UNKNOWN, kind: 'rejected-cell' } };
}

function inLimits(value: number, text: string, column: InventoryColumn, read: ReadCell): ReadCell {
  const [low, high] = column.limits ?? [-Infinity, Infinity];
  if (value >= low && value <= high) return read;
  if (value === 0) {
    const message = 'zero stands for unknown here';
    return { ...NOTHING, note: { code: 'zero', message, action: TREATED_AS_UNKNOWN, kind: 'note' } };
  }
  if (value < 0 && column.name === 'floor_area_m2') {
    return refuse('negative-area', `${showValue(text)} is a negative area`);
  }
  const unit = column.unit === undefined ? '' : ` ${findUnit(column.unit)?.label ?? column.unit}`;
  return refuse('outside-limits', `${showValue(text)} is outside ${low} to ${high}${unit}`);
}

function approximately(text: string, value: number): CellNote {
  return {
    code: 'approximate-value',
    message: `${showValue(text)} read as ${value}`,
    action: 'taken as given',
    kind: 'note',
  };
}

interface Parts {
  readonly number: number;
  readonly suffix: string;
  readonly inches?: number;
}

const FEET_AND_INCHES =
  /^(\d+(?:[.,]\d+)?)\s*(?:'|′|’|ft|feet|foot)\.?\s*-?\s*(\d+(?:[.,]\d+)?)\s*(?:"|″|”|''|in|inch|inches)?\.?$/;

function splitNumber(cell: string, format: NumberFormat): Parts | undefined {
  const feet = FEET_AND_INCHES.exec(cell);
  if (feet !== null) {
    const whole = plainNumber(feet[1] ?? '', format.decimal);
    const inches = plainNumber(feet[2] ?? '', format.decimal);
    if (whole !== undefined && inches !== undefined && inches < 12) return { number: whole, suffix: 'ft', inches };
  }
  const match = /^([+-]?(?:[\d.,][\d., ’']*[\d.]|\d)(?:e[+-]?\d{1,3})?)\s*(.*)$/.exec(cell);
  if (match === null) return undefined;
  const number = plainNumber(match[1] ?? '', format.decimal);
  return number === undefined ? undefined : { number, suffix: match[2] ?? '' };
}

/** A number with thousands separators, by the decimal mark of the study; undefined when it is not one. */
function plainNumber(text: string, decimal: string): number | undefined {
  const trimmed = text.trim();
  const plain =
    decimal === ',' ? /^[+-]?(?:\d+(?:,\d*)?|,\d+)(?:e[+-]?\d+)?$/ : /^[+-]?(?:\d+(?:\.\d*)?|\.\d+)(?:e[+-]?\d+)?$/;
  const grouped =
    decimal === ','
      ? /^[+-]?\d{1,3}(?:([ .’'])\d{3})(?:\1\d{3})*(?:,\d+)?$/
      : /^[+-]?\d{1,3}(?:([ ,’'])\d{3})(?:\1\d{3})*(?:\.\d+)?$/;
  const isPlain = plain.test(trimmed);
  if (!isPlain && !grouped.test(trimmed)) return undefined;
  const digits = isPlain ? trimmed : trimmed.replaceAll(decimal === ',' ? /[ .’']/g : /[ ,’']/g, '');
  const value = Number(decimal === ',' ? digits.replace(',', '.') : digits);
  return Number.isFinite(value) ? value : undefined;
}

function toStored(
  parts: Parts,
  { unit, stored }: NumberFormat,
  column: InventoryColumn,
): { readonly si: number; readonly note?: CellNote } | undefined {
  const suffix = parts.suffix.trim();
  if (stored === undefined || unit === undefined) {
    return suffix === '' || IDLE_SUFFIX.test(suffix.replaceAll('.', '')) ? { si: parts.number } : undefined;
  }
  if (suffix === '') return { si: toSi(parts.number, unit, stored) };
  const named = findUnit(suffix);
  if (named?.dimension !== stored.dimension) return undefined;
  const inch = findUnit('in');
  const rest = parts.inches === undefined || inch === undefined ? 0 : toSi(parts.inches, inch, stored);
  const si = toSi(parts.number, named, stored) + rest;
  if (named.id === unit.id) return { si };
  const message = `the cell names its unit: read as ${Number(si.toPrecision(6))} ${stored.label}`;
  const action = `converted from ${named.label}; the column ${column.name} is in ${unit.label} elsewhere`;
  return { si, note: { code: 'unit-suffix', message, action, kind: 'note' } };
}

// The same two operations in the same order as the query that reads plain numbers.
function toSi(value: number, unit: Unit, stored: Unit): number {
  return unit.id === stored.id ? value : (value * unit.factor) / stored.factor;
}

function notANumber(text: string, column: InventoryColumn, { decimal }: NumberFormat): string {
  const kind = column.kind === 'year' ? 'a year' : 'a number';
  const mark = decimal === ',' ? 'a comma' : 'a point';
  const hint = /^\D*\d+[.,]\d+\D*$/.test(text) ? `; the study says that decimals are written with ${mark}` : '';
  return `${showValue(text)} is not ${kind}${hint}`;
}

function readYear(cell: string): ReadCell | undefined {
  const text = cell.toLowerCase();
  const decade = /^(?:c\.?|ca\.?|circa|about|the)?\s*(\d{3}0)\s*['’]?s\.?\??$/.exec(text);
  if (decade !== null) {
    const first = Number(decade[1]);
    const message = `${showValue(cell)}: only the decade is known`;
    const note: CellNote = { code: 'year-decade', message, action: 'ten equally likely years', kind: 'note' };
    return { value: first, decade: first, note };
  }
  const day = /^(\d{4})-\d{2}-\d{2}(?:[t ].*)?$/.exec(text);
  const about =
    /^(?:c\.?|ca\.?|circa|about|approx\.?|est\.?|~|≈|before|pre-?|after|post-?)?\s*(\d{4})\s*(?:\?|\(?(?:est|approx|c|ca|circa)\.?\)?)?$/.exec(
      text,
    );
  const range = /^(\d{4})\s*(?:[-/]|to)\s*(?:\d{4}|\d{2})$/.exec(text);
  const year = Number((day ?? about ?? range)?.[1] ?? NaN);
  if (Number.isNaN(year)) return undefined;
  if (text === String(year)) return { value: year, decade: NaN };
  const note: CellNote = {
    code: 'year-in-words',
    message: `${showValue(cell)} read as ${year}`,
    action: 'taken as given',
    kind: 'note',
  };
  return { value: year, decade: NaN, note };
}

/** A list of numbers bottom to top, `9e4;8e4`, as SI numbers joined by `;`, or the reason why it is none. */
export function readListCell(
  text: string,
  column: InventoryColumn,
  format: NumberFormat,
): { list: string | null; note?: CellNote } {
  const values: number[] = [];
  for (const part of text.split(';')) {
    const read = readNumberCell(part, { ...column, kind: 'number' }, format);
    if (Number.isNaN(read.value)) {
      const message = `${showValue(text)}: ${showValue(part.trim())} is not a number this column can have`;
      return { list: null, note: { code: 'not-a-list', message, action: TREATED_AS_UNKNOWN, kind: 'rejected-cell' } };
    }
    values.push(read.value);
  }
  return { list: values.join(';') };
}

/** Words as they are compared: outer blanks, case and repeated blanks ignored. */
export function foldWord(text: string): string {
  return text.trim().toLowerCase().replaceAll(/\s+/g, ' ');
}

/** A cell of a word column as one of our words: the study's own words first, then ours. */
export function readWordCell(
  text: string,
  column: InventoryColumn,
  words: ReadonlyMap<string, string>,
): { word: string | null; note?: CellNote } {
  const own = words.get(foldWord(text));
  const word = own ?? foldWord(text).replaceAll(/[\s_]+/g, '-');
  if (column.words === undefined) return { word: own ?? text.trim() };
  if (column.words.includes(word)) return { word };
  // Not all of ours: the message stands in every row with the word.
  const close = nearestFew(word, column.words, 3);
  const hint = close.length === 0 ? '' : ` (nearest: ${close.join(', ')})`;
  const list = column.vocabulary === undefined ? '' : `; list it under words.${column.vocabulary} of the study`;
  const message = `${showValue(text)} is not a word of ${column.name}${hint}${list}; the study's JSON Schema has all words`;
  return { word: null, note: { code: 'unknown-word', message, action: TREATED_AS_UNKNOWN, kind: 'rejected-cell' } };
}

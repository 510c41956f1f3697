/** Display: rounding and units happen here and nowhere else, for terminal, page and browser alike. */
import { convert, findUnit } from './units.js';

export type Display = 'si' | 'us';

/** Unit shown for a stored unit in US display. */
const US: Readonly<Record<string, string>> = {
  m: 'ft',
  m2: 'ft2',
  kN: 'kip',
  kN_per_m: 'kip_per_in',
  kN_per_m2: 'psf',
  mps: 'ftps',
};

/** `value` to `digits` significant digits, plain notation, thousands apart by a thin space from 10,000 on. NaN prints as "not known". */
export function formatNumber(value: number, digits = 3): string {
  if (Number.isNaN(value)) return 'not known';
  if (!Number.isFinite(value)) return value > 0 ? '∞' : '−∞';
  if (value === 0) return '0';
  const size = Math.abs(value);
  if (size >= 1e9 || size < 1e-4) return value.toPrecision(digits).replace('-', '−');
  // The power of ten of the rounded value: 0.0999 to two digits is 0.10, not 0.100.
  const power = Number(size.toExponential(digits - 1).split('e')[1]);
  const decimals = Math.max(0, digits - 1 - power);
  const text = value.toFixed(Math.min(decimals, 12));
  const [whole = '', part] = text.replace('-', '').split('.');
  const grouped = whole.length > 4 ? whole.replaceAll(/\B(?=(\d{3})+$)/g, '\u202f') : whole;
  return `${value < 0 ? '−' : ''}${grouped}${part === undefined ? '' : `.${part}`}`;
}

/** A whole number, thousands apart. */
export function formatCount(value: number): string {
  return String(Math.round(value)).replaceAll(/\B(?=(\d{3})+$)/g, '\u202f');
}

/**
 * A share as a percentage: "63 %", and "under 1 %", "over 99 %" rather than a false 0 or 100. Cut, not rounded, so that a share below a
 * threshold never prints as the threshold: 0.796 is "79 %" where sure means at least 80 %.
 */
export function formatShare(value: number): string {
  if (Number.isNaN(value)) return 'not known';
  if (value > 0 && value < 0.01) return 'under 1 %';
  if (value < 1 && value > 0.99) return 'over 99 %';
  // 0.29 × 100 is 28.999… in binary.
  return `${String(Math.floor(value * 100 + 1e-9))} %`;
}

/** A place, or the places that equals share: "5", "1 to 73"; `last` may be unknown. */
export function formatPlaces(first: number, last: number): string {
  if (Number.isNaN(first)) return 'not known';
  return last > first ? `${formatCount(first)} to ${formatCount(last)}` : formatCount(first);
}

/** The unit in which a stored unit is shown. */
export function shownUnit(unitId: string, display: Display): string {
  return display === 'us' ? (US[unitId] ?? unitId) : unitId;
}

/** `value`, stored in `unitId`, in the display unit. */
export function shownValue(value: number, unitId: string, display: Display): number {
  const from = findUnit(unitId);
  const to = findUnit(shownUnit(unitId, display));
  return from === undefined || to === undefined ? value : convert(value, from, to);
}

/** Printed label of the display unit: "m", "ft", "kN/m". */
export function unitLabel(unitId: string, display: Display): string {
  return findUnit(shownUnit(unitId, display))?.label ?? unitId;
}

/** "12.5 m", "41.0 ft", "not known". */
export function formatQuantity(value: number, unitId: string | null | undefined, display: Display, digits = 3): string {
  if (unitId === null || unitId === undefined) return formatNumber(value, digits);
  if (Number.isNaN(value)) return 'not known';
  return `${formatNumber(shownValue(value, unitId, display), digits)} ${unitLabel(unitId, display)}`;
}

/**
 * A sentence with its metres and square metres in display units: findings and rules are kept in SI. What stands in quotation marks is
 * the owner's and stays.
 */
export function textInDisplay(text: string, display: Display): string {
  if (display === 'si') return text;
  return text
    .split(/("[^"]*")/u)
    .map((part, i) =>
      i % 2 === 1
        ? part
        : part.replaceAll(/(\d+(?:\.\d+)?) (m²|m)(?![\w²])/gu, (_all, number: string, unit: string) =>
            formatQuantity(Number(number), unit === 'm' ? 'm' : 'm2', display),
          ),
    )
    .join('');
}

/** A code of ours in plain words: "concrete-moment-frame" -> "concrete moment frame". */
export function plainWords(code: string): string {
  return code.replaceAll('-', ' ');
}

const CODE_WORDS: Readonly<Record<string, string>> = {
  ubc: 'UBC',
  asce7: 'ASCE 7 of',
  japan: 'Japanese code of',
  nz: 'New Zealand code of',
  italy: 'Italian code of',
  greece: 'Greek code of',
  turkey: 'Turkish code of',
  india: 'Indian code of',
  canada: 'Canadian code of',
  own: "the study's own code, row",
};

/** An edition in words: "ubc-1976" -> "UBC 1976", "italy-1975" -> "Italian code of 1975"; other words as they are. */
export function editionWords(code: string): string {
  const [, family = '', year = ''] = /^([a-z0-9]+)-(\d+)$/.exec(code) ?? [];
  const words = CODE_WORDS[family];
  return words === undefined ? code : `${words} ${year}`;
}

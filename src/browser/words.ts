/** Codes of the engineering in words. */
import { FLAGS } from '../engineering/assess/flags.js';
import { plainWords } from '../engineering/format.js';
import { WEAK_TYPES } from '../engineering/assess/weak.js';

/** The title of a weak type. */
export function weakWords(code: string): string {
  return WEAK_TYPES.find(({ name }) => name === code)?.title ?? plainWords(code);
}

/** Flags, blank-separated codes, as sentences. */
export function flagSentences(codes: string): readonly string[] {
  return codes
    .split(' ')
    .filter((code) => code !== '')
    .map((code) => FLAGS[code] ?? plainWords(code));
}

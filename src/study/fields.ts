/** The building blocks of the study's schema: each says in its own words what it expects, so that messages read alike. */
import { z } from 'zod';
import { describeRange } from '../engineering/formula.js';
import type { NumberRange } from '../engineering/formula.js';
import { showValue } from '../errors.js';
import { suggest } from './nearest.js';

type Complaint = (issue: z.core.$ZodRawIssue) => string;

/** The message of a field that wants `what`; a key that is absent or empty is told apart from a wrong value. */
export function expected(what: string): Complaint {
  return ({ input }) => {
    if (input === undefined) return `missing; expected ${what}`;
    return `expected ${what}, got ${input === null ? 'nothing' : showValue(input)}`;
  };
}

interface StrictWords {
  /** What is wanted where the mapping is missing or something else; the keys it cannot do without when left out. */
  readonly wanted?: string;
  /** The end of the message about a key it does not know; the nearest known one when left out. */
  readonly unknown?: (key: string, known: readonly string[]) => string;
}

/** A mapping that refuses keys it does not know, naming the nearest one. Several unknown keys give one line each. */
export function strict<T extends z.core.$ZodLooseShape>(
  shape: T,
  words: StrictWords = {},
): z.ZodObject<T, z.core.$strict> {
  const known = Object.keys(shape);
  const { unknown = suggest } = words;
  return z.strictObject(shape, {
    error: (issue) =>
      issue.code === 'unrecognized_keys'
        ? issue.keys.map((key) => `unknown key${unknown(key, known)}`).join('\n')
        : expected(words.wanted ?? keysBelow(shape))(issue),
  });
}

/** `place, family and editions below it`: the keys that have no default, else the first few there are. */
function keysBelow(shape: z.core.$ZodLooseShape): string {
  const needed = Object.keys(shape).filter((key) => {
    const field = shape[key] as z.core.$ZodType | undefined;
    return field !== undefined && !z.safeParse(field, undefined).success;
  });
  if (needed.length > 0) return `${inWords(needed)} below it`;
  const some = Object.keys(shape);
  return some.length === 0
    ? '{}'
    : `keys and values below it (${some.slice(0, 8).join(', ')}${some.length > 8 ? ', …' : ''}), or {}`;
}

function inWords(names: readonly string[]): string {
  return names.length < 2 ? names.join('') : `${names.slice(0, -1).join(', ')} and ${names.at(-1) ?? ''}`;
}

/** Text that is not blank. Numbers are refused, since `007` would already have become 7. */
export function text(what = 'text') {
  const error: Complaint = (issue) =>
    typeof issue.input === 'number' || typeof issue.input === 'boolean'
      ? `${expected(what)(issue)}; put it in quotes`
      : expected(what)(issue);
  return z.string({ error }).regex(/\S/u, { error });
}

/** One of `words`. */
export function word<const T extends readonly string[]>(words: T) {
  const list = words.join(', ');
  return z.enum(words, {
    error: (issue) =>
      typeof issue.input === 'string'
        ? `unknown word ${showValue(issue.input)}; known: ${list}`
        : expected(`one of ${list}`)(issue),
  });
}

interface Range extends NumberRange {
  readonly unit?: string;
}

/** A finite number within a range. */
export function number(range: Range) {
  const error = expected(describeRange('a number', range, range.unit));
  let schema = z.number({ error });
  if (range.from !== undefined) schema = schema.gte(range.from, { error });
  if (range.above !== undefined) schema = schema.gt(range.above, { error });
  if (range.to !== undefined) schema = schema.lte(range.to, { error });
  return schema;
}

/** A whole number within a range. */
export function whole(range: { readonly from: number; readonly to: number; readonly what?: string }) {
  const error = expected(describeRange(range.what ?? 'a whole number', range));
  return z.int({ error }).gte(range.from, { error }).lte(range.to, { error });
}

/** A list of at least `least` and at most `most` items. */
export function list<T extends z.ZodType>(item: T, what: string, least = 0, most?: number) {
  const error = expected(what);
  const items = z.array(item, { error }).min(least, { error });
  return most === undefined ? items : items.max(most, { error });
}

/** A mapping from free names to values, with at least `least` entries. */
export function mapping<T extends z.ZodType>(key: z.ZodString, value: T, what: string, least = 0) {
  const error = expected(what);
  return z.record(key, value, { error }).refine((entries) => Object.keys(entries).length >= least, { error });
}

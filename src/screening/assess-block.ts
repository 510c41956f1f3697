/** One block of buildings through `assess`, into columns of results: the same code in this thread and in a worker. */
import { assess, isRanked } from '../engineering/assess/assess.js';
import type { Assessment } from '../engineering/assess/assess.js';
import type { AssessContext } from '../engineering/assess/context.js';
import { newScratch } from '../engineering/assess/scratch.js';
import type { Scratch } from '../engineering/assess/scratch.js';
import { buildingReader } from '../engineering/building-columns.js';
import type { BuildingColumns, YearPools } from '../engineering/building-columns.js';
import { RESULT_COLUMNS } from '../engineering/results.js';
import { Bug } from '../errors.js';
import { RESULT_WORDS } from '../store/schema.js';
import { NULL_CODE } from '../store/codes.js';
import { FlatMixtures } from './flat-mixtures.js';
import type { FlatArrays } from './flat-mixtures.js';

export interface BlockInput {
  readonly columns: BuildingColumns;
  /** Reason of the inventory why a building cannot be ranked, or null. */
  readonly notRanked: readonly (string | null)[];
  readonly rows: number;
}

/** Texts as numbers in a list of words, NONE where there is none. */
export interface Coded {
  readonly words: readonly string[];
  readonly codes: Uint16Array;
}

export const NONE = 0xffff;

export interface BlockResult {
  readonly rows: number;
  /** Result columns by name, one entry per row; those that the ranking fills are left out. */
  readonly numbers: Readonly<Record<string, Float64Array>>;
  /** Enumerated words: codes of RESULT_WORDS. */
  readonly words: Readonly<Record<string, Uint8Array>>;
  readonly texts: Readonly<Record<string, Coded>>;
  /** Rows that are ranked, and of each of them the demand and the distribution of ln S. */
  readonly ranked: Int32Array;
  readonly demand_g: Float64Array;
  readonly mixtures: FlatArrays;
}

/** What assessing fills, column by column; the rest is the ranking's. */
const NUMBERS: Readonly<Record<string, (result: Assessment) => number>> = {
  ln_priority: (result) => result.lnPriority,
  ln_priority_sd: (result) => result.lnPrioritySd,
  period_longitudinal_s: ({ period }) => period.longitudinal.p50_s,
  period_longitudinal_16_s: ({ period }) => period.longitudinal.p16_s,
  period_longitudinal_84_s: ({ period }) => period.longitudinal.p84_s,
  period_transverse_s: ({ period }) => period.transverse.p50_s,
  period_transverse_16_s: ({ period }) => period.transverse.p16_s,
  period_transverse_84_s: ({ period }) => period.transverse.p84_s,
  sa_g: ({ leading }) => leading.sa_g,
  sa_level_2_g: ({ leading }) => leading.sa_level_2_g,
  capacity_g: ({ leading }) => leading.capacity_g,
  demand_over_capacity: ({ leading }) => leading.demand_over_capacity,
  people_exposed: (result) => result.people_exposed,
  slope_k: (result) => result.slope_k,
  case_chance: ({ leading }) => leading.chance,
  weak_chance: (result) => result.weakChance,
};
const WORDS: Readonly<Record<string, (result: Assessment) => string | null>> = {
  governing: ({ leading }) => leading.governing,
  period_evidence: ({ leading }) => leading.evidence,
  period_basis: ({ leading }) => leading.basis,
  case_system: ({ leading }) => leading.system,
  case_edition: ({ leading }) => leading.edition ?? 'no seismic design',
  weak_type: (result) => result.weakType,
};
const TEXTS: Readonly<Record<string, (result: Assessment) => string | null>> = {
  spectrum: (result) => result.spectrum,
  flags: ({ flags }) => (flags.length === 0 ? '' : flags.length === 1 ? flags[0]! : flags.join(' ')),
};
/** Filled where a building is not ranked. */
const REASON = 'not_ranked';

/** Assesses blocks one after the other, in one thread. */
export class BlockAssessor {
  readonly #context: AssessContext;
  readonly #pools: YearPools;
  readonly #scratch: Scratch = newScratch();
  readonly #codes = new Map<string, ReadonlyMap<string | null, number>>(
    Object.keys(WORDS).map((name) => [name, codesOf(name)]),
  );

  constructor(context: AssessContext, pools: YearPools) {
    this.#context = context;
    this.#pools = pools;
  }

  /** The results of the buildings of one block. */
  assess({ columns, notRanked, rows }: BlockInput): BlockResult {
    const read = buildingReader(columns, this.#pools);
    const scratch = this.#scratch;
    const numbers = Object.entries(NUMBERS).map(
      ([name, value]) => [name, value, new Float64Array(rows).fill(NaN)] as const,
    );
    const words = Object.entries(WORDS).map(
      ([name, value]) => [name, value, this.#codes.get(name)!, new Uint8Array(rows).fill(NULL_CODE)] as const,
    );
    const texts = Object.entries(TEXTS).map(([name, value]) => [name, value, new Coder(rows)] as const);
    const reasons = new Coder(rows);
    const ranked = new Int32Array(rows);
    const demand_g = new Float64Array(rows);
    const mixtures = new FlatMixtures(rows);
    let count = 0;
    for (let i = 0; i < rows; i += 1) {
      const early = notRanked[i]!;
      if (early !== null) {
        reasons.set(i, early);
        continue;
      }
      scratch.pool.restart();
      const result = assess(read(i), this.#context, undefined, scratch);
      if (!isRanked(result)) {
        reasons.set(i, result.reason);
        continue;
      }
      for (let c = 0; c < numbers.length; c += 1) numbers[c]![2][i] = numbers[c]![1](result);
      for (let c = 0; c < words.length; c += 1) {
        const [name, value, codes, out] = words[c]!;
        const text = value(result);
        const code = codes.get(text);
        if (code === undefined) throw new Bug(`${name}: ${String(text)} is none of its words`);
        out[i] = code;
      }
      for (let c = 0; c < texts.length; c += 1) texts[c]![2].set(i, texts[c]![1](result));
      mixtures.add(result.mixture);
      demand_g[count] = result.demand_g;
      ranked[count] = i;
      count += 1;
    }
    return {
      rows,
      numbers: Object.fromEntries(numbers.map(([name, , out]) => [name, out])),
      words: Object.fromEntries(words.map(([name, , , out]) => [name, out])),
      texts: Object.fromEntries([
        ...texts.map(([name, , coder]) => [name, coder] as const),
        [REASON, reasons] as const,
      ]),
      ranked: ranked.slice(0, count),
      demand_g: demand_g.slice(0, count),
      mixtures: mixtures.finish(),
    };
  }
}

function codesOf(name: string): ReadonlyMap<string | null, number> {
  const words = RESULT_WORDS[name];
  if (words === undefined || RESULT_COLUMNS.every((column) => column.name !== name))
    throw new Bug(`${name} is no enumerated column of the results`);
  return new Map<string | null, number>([...words.map((word, code) => [word, code] as const), [null, NULL_CODE]]);
}

/** Codes of texts, numbered as they come. */
class Coder implements Coded {
  readonly words: string[] = [];
  readonly codes: Uint16Array;
  readonly #numbers = new Map<string, number>();

  constructor(rows: number) {
    this.codes = new Uint16Array(rows).fill(NONE);
  }

  set(row: number, text: string | null): void {
    if (text === null) return;
    let code = this.#numbers.get(text);
    if (code === undefined) {
      code = this.words.length;
      if (code >= NONE) throw new Bug('too many different texts in one block of results');
      this.words.push(text);
      this.#numbers.set(text, code);
    }
    this.codes[row] = code;
  }
}

/** `texts` as codes. */
export function coded(texts: readonly (string | null)[]): Coded {
  const coder = new Coder(texts.length);
  for (let i = 0; i < texts.length; i += 1) coder.set(i, texts[i]!);
  return { words: coder.words, codes: coder.codes };
}

/** The texts again. */
export function decoded({ words, codes }: Coded): (string | null)[] {
  const texts = new Array<string | null>(codes.length);
  for (let i = 0; i < texts.length; i += 1) texts[i] = codes[i] === NONE ? null : words[codes[i]!]!;
  return texts;
}

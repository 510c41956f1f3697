/** One block of buildings through `assess`, into columns of results: the same code in this thread and in a worker. */
import { assess, isRanked } from '../engineering/assess/assess.js';
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

/** The columns of enumerated words that assessing fills. */
const WORDS = ['governing', 'period_evidence', 'period_basis', 'case_system', 'case_edition', 'weak_type'] as const;
/** Filled where a building is not ranked. */
const REASON = 'not_ranked';

/** Assesses blocks one after the other, in one thread. */
export class BlockAssessor {
  readonly #context: AssessContext;
  readonly #pools: YearPools;
  readonly #scratch: Scratch = newScratch();
  readonly #codes = Object.fromEntries(WORDS.map((name) => [name, codesOf(name)])) as Record<
    (typeof WORDS)[number],
    ReadonlyMap<string | null, number>
  >;

  constructor(context: AssessContext, pools: YearPools) {
    this.#context = context;
    this.#pools = pools;
  }

  /** The results of the buildings of one block. */
  assess({ columns, notRanked, rows }: BlockInput): BlockResult {
    const read = buildingReader(columns, this.#pools);
    const scratch = this.#scratch;
    // spelt out column by column: a table of functions made the whole a quarter slower
    const numbers = {
      ln_priority: new Float64Array(rows).fill(NaN),
      ln_priority_sd: new Float64Array(rows).fill(NaN),
      period_longitudinal_s: new Float64Array(rows).fill(NaN),
      period_longitudinal_16_s: new Float64Array(rows).fill(NaN),
      period_longitudinal_84_s: new Float64Array(rows).fill(NaN),
      period_transverse_s: new Float64Array(rows).fill(NaN),
      period_transverse_16_s: new Float64Array(rows).fill(NaN),
      period_transverse_84_s: new Float64Array(rows).fill(NaN),
      sa_g: new Float64Array(rows).fill(NaN),
      sa_level_2_g: new Float64Array(rows).fill(NaN),
      capacity_g: new Float64Array(rows).fill(NaN),
      demand_over_capacity: new Float64Array(rows).fill(NaN),
      people_exposed: new Float64Array(rows).fill(NaN),
      slope_k: new Float64Array(rows).fill(NaN),
      case_chance: new Float64Array(rows).fill(NaN),
      weak_chance: new Float64Array(rows).fill(NaN),
    };
    const words = Object.fromEntries(WORDS.map((name) => [name, new Uint8Array(rows).fill(NULL_CODE)])) as Record<
      (typeof WORDS)[number],
      Uint8Array
    >;
    const codes = this.#codes;
    const spectra = new Coder(rows);
    const flagged = new Coder(rows);
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
      const { leading, period, flags } = result;
      numbers.ln_priority[i] = result.lnPriority;
      numbers.ln_priority_sd[i] = result.lnPrioritySd;
      numbers.period_longitudinal_s[i] = period.longitudinal.p50_s;
      numbers.period_longitudinal_16_s[i] = period.longitudinal.p16_s;
      numbers.period_longitudinal_84_s[i] = period.longitudinal.p84_s;
      numbers.period_transverse_s[i] = period.transverse.p50_s;
      numbers.period_transverse_16_s[i] = period.transverse.p16_s;
      numbers.period_transverse_84_s[i] = period.transverse.p84_s;
      numbers.sa_g[i] = leading.sa_g;
      numbers.sa_level_2_g[i] = leading.sa_level_2_g;
      numbers.capacity_g[i] = leading.capacity_g;
      numbers.demand_over_capacity[i] = leading.demand_over_capacity;
      numbers.people_exposed[i] = result.people_exposed;
      numbers.slope_k[i] = result.slope_k;
      numbers.case_chance[i] = leading.chance;
      numbers.weak_chance[i] = result.weakChance;
      words.governing[i] = codeOf(codes.governing, leading.governing);
      words.period_evidence[i] = codeOf(codes.period_evidence, leading.evidence);
      words.period_basis[i] = codeOf(codes.period_basis, leading.basis);
      words.case_system[i] = codeOf(codes.case_system, leading.system);
      words.case_edition[i] = codeOf(codes.case_edition, leading.edition ?? 'no seismic design');
      words.weak_type[i] = codeOf(codes.weak_type, result.weakType);
      spectra.set(i, result.spectrum);
      flagged.set(i, flags.length === 0 ? '' : flags.length === 1 ? flags[0]! : flags.join(' '));
      mixtures.add(result.mixture);
      demand_g[count] = result.demand_g;
      ranked[count] = i;
      count += 1;
    }
    return {
      rows,
      numbers,
      words,
      texts: { spectrum: spectra, flags: flagged, [REASON]: reasons },
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

function codeOf(codes: ReadonlyMap<string | null, number>, word: string | null): number {
  const code = codes.get(word);
  if (code === undefined) throw new Bug(`${String(word)} is none of ${[...codes.keys()].join(', ')}`);
  return code;
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

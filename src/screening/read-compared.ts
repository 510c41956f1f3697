/** One run as a comparison needs it: its record, and its buildings by index. */
import { compileContext } from '../engineering/assess/context.js';
import { settingsFromJson } from '../engineering/assess/settings.js';
import type { AssessSettings } from '../engineering/assess/settings.js';
import type { Ladder, ScoreTerms } from '../engineering/priority/compare.js';
import { UserError } from '../errors.js';
import type { Database } from '../store/database.js';
import { quoteName } from '../store/sql.js';
import type { InventorySide } from './compare-inputs.js';

/** A run of one of the two studies, or the same. */
export interface RunOf {
  readonly db: Database;
  readonly runId: number;
}

/** What identifies a compared run. */
export interface ComparedRun {
  readonly run: number;
  /** ISO 8601. */
  readonly made: string;
  readonly program: string;
  readonly note: string;
  readonly title: string;
  /** Name of the inventory's file. */
  readonly file: string;
  readonly buildings: number;
  readonly ranked: number;
  readonly list_size: number;
  readonly rank_by: string;
  readonly fingerprints: { readonly study: string; readonly inventory: string; readonly methods: string };
}

/** The leading case of a building, as stored. */
export interface LeadingSide extends ScoreTerms {
  readonly period_s: number;
  readonly system: string | null;
  readonly edition: string | null;
  readonly spectrum: string | null;
}

export interface ComparedSide extends InventorySide {
  readonly entry: ComparedRun;
  readonly settings: AssessSettings;
  readonly seed: number;
  readonly id: readonly string[];
  readonly name: readonly (string | null)[];
  /** 0 or less where not ranked. */
  readonly rank: Int32Array;
  readonly chance: Float64Array;
  readonly lnPriority: Float64Array;
  readonly notRanked: readonly (string | null)[];
  readonly ladder: Ladder;
  readonly leading: (at: number) => LeadingSide;
}

interface Row extends Omit<ComparedRun, 'run' | 'fingerprints'> {
  readonly inventory_id: string;
  readonly study_fingerprint: string;
  readonly methods_fingerprint: string;
  readonly settings: string;
  readonly seed: number | bigint;
}

const NUMBERS = [
  'chance',
  'ln_priority',
  'sa_g',
  'capacity_g',
  'people_exposed',
  'slope_k',
  'period_longitudinal_s',
  'period_transverse_s',
] as const;
const TEXTS = ['spectrum', 'governing', 'case_system', 'case_edition', 'not_ranked'] as const;

/** Reads run `runId`. @throws UserError when there is none of that number. */
export async function readCompared({ db, runId }: RunOf): Promise<ComparedSide> {
  const [row] = await db.rows<Row>(
    `SELECT made, program, note, title, (SELECT file FROM inventory i WHERE i.inventory_id = run.inventory_id) AS file,
       buildings, ranked, list_size, rank_by, inventory_id, study_fingerprint, methods_fingerprint, settings, seed
     FROM run WHERE run_id = ?`,
    [runId],
  );
  if (row === undefined)
    throw new UserError(`there is no run ${String(runId)}; swaymark runs lists them`, { file: db.file });
  const { inventory_id, study_fingerprint, methods_fingerprint, settings: text, seed, ...entry } = row;
  const settings = settingsFromJson(text);
  const count = entry.buildings;
  const of = await db.columns(
    'SELECT building_index AS at, id, name, importance_factor AS importance FROM building WHERE inventory_id = ?',
    { at: 'i32', id: 'text', name: 'text', importance: 'f64' },
    [inventory_id],
  );
  const results = await db.columns(
    `SELECT building_index AS at, "rank", ${[...NUMBERS, ...TEXTS].map(quoteName).join(', ')} FROM result WHERE run_id = ?`,
    {
      at: 'i32',
      rank: 'i32',
      ...(Object.fromEntries(NUMBERS.map((name) => [name, 'f64'])) as Record<(typeof NUMBERS)[number], 'f64'>),
      ...(Object.fromEntries(TEXTS.map((name) => [name, 'text'])) as Record<(typeof TEXTS)[number], 'text'>),
    },
    [runId],
  );
  const numbersAt = (at: Int32Array, values: Float64Array): Float64Array => {
    const placed = new Float64Array(count).fill(NaN);
    at.forEach((index, i) => (placed[index] = values[i]!));
    return placed;
  };
  const textsAt = (at: Int32Array, values: readonly (string | null)[]): (string | null)[] => {
    const placed = new Array<string | null>(count).fill(null);
    at.forEach((index, i) => (placed[index] = values[i]!));
    return placed;
  };
  const id = textsAt(of.at, of.id).map((value) => value ?? '');
  const importance = numbersAt(of.at, of.importance);
  const rank = new Int32Array(count);
  results.at.forEach((index, i) => (rank[index] = results.rank[i]!));
  const number = Object.fromEntries(NUMBERS.map((name) => [name, numbersAt(results.at, results[name])])) as Record<
    (typeof NUMBERS)[number],
    Float64Array
  >;
  const word = Object.fromEntries(TEXTS.map((name) => [name, textsAt(results.at, results[name])])) as Record<
    (typeof TEXTS)[number],
    (string | null)[]
  >;
  const { zoneTerms } = compileContext(settings);
  const byDemand = settings.rankBy === 'demand';
  const byPeople = settings.rankBy === 'people';
  const order = ranked(rank);
  return {
    db,
    inventoryId: inventory_id,
    buildings: count,
    indexOf: new Map(id.map((value, at) => [value, at])),
    entry: {
      run: runId,
      ...entry,
      fingerprints: { study: study_fingerprint, inventory: inventory_id, methods: methods_fingerprint },
    },
    settings,
    seed: Number(seed),
    id,
    name: textsAt(of.at, of.name),
    rank,
    chance: number.chance,
    lnPriority: number.ln_priority,
    notRanked: word.not_ranked,
    ladder: {
      id: order.map((at) => id[at]!),
      lnPriority: order.map((at) => number.ln_priority[at]!),
      people: order.map((at) => number.people_exposed[at]!),
    },
    leading: (at) => ({
      ln_priority: number.ln_priority[at]!,
      slope_k: byDemand ? 1 : number.slope_k[at]!,
      sa_g: number.sa_g[at]!,
      capacity_g: byDemand ? NaN : number.capacity_g[at]!,
      people_exposed: byPeople ? number.people_exposed[at]! : NaN,
      importance_factor: byPeople && importance[at]! > 0 ? importance[at]! : 1,
      zone_term: byDemand ? 0 : (zoneTerms[word.spectrum[at] ?? ''] ?? 0),
      period_s: (word.governing[at] === 'transverse' ? number.period_transverse_s : number.period_longitudinal_s)[at]!,
      system: word.case_system[at]!,
      edition: word.case_edition[at]!,
      spectrum: word.spectrum[at]!,
    }),
  };
}

/** Indices of the ranked buildings, first rank first. */
function ranked(rank: Int32Array): readonly number[] {
  const order: number[] = [];
  rank.forEach((place, at) => {
    if (place > 0) order[place - 1] = at;
  });
  return order;
}

/** Every building of an inventory through `assess`, block by block, into columns of results. */
import { assess, isRanked } from '../engineering/assess/assess.js';
import type { Assessment } from '../engineering/assess/assess.js';
import type { AssessContext } from '../engineering/assess/context.js';
import { newScratch } from '../engineering/assess/scratch.js';
import { buildingReader } from '../engineering/building-columns.js';
import type { YearPools } from '../engineering/building-columns.js';
import type { Mixture } from '../engineering/priority/mixture.js';
import { RESULT_COLUMNS } from '../engineering/results.js';
import { indexRanges } from '../store/chunks.js';
import type { Database } from '../store/database.js';
import { NULL_I32 } from '../store/vectors.js';
import { readBuildings } from './read-buildings.js';

/** Result columns by name, one entry per building in index order; what the ranking fills is filled later. */
export interface ResultArrays {
  readonly numbers: Readonly<Record<string, Float64Array>>;
  readonly wholes: Readonly<Record<string, Int32Array>>;
  readonly texts: Readonly<Record<string, (string | null)[]>>;
}

export interface Assessed {
  readonly results: ResultArrays;
  /** The ranked buildings: index, id, mixture, in index order. */
  readonly index: Int32Array;
  readonly id: readonly string[];
  /** Emptied once the ranks are made: at a million buildings the largest thing in memory. */
  readonly mixtures: Mixture[];
  readonly median: Float64Array;
  readonly people: Float64Array;
  readonly demand: Float64Array;
}

function emptyResults(count: number): ResultArrays {
  const of = (kind: string) => RESULT_COLUMNS.filter((column) => column.kind === kind).map(({ name }) => name);
  return {
    numbers: Object.fromEntries(of('number').map((name) => [name, new Float64Array(count).fill(NaN)])),
    wholes: Object.fromEntries(of('whole').map((name) => [name, new Int32Array(count).fill(NULL_I32)])),
    texts: Object.fromEntries(of('text').map((name) => [name, new Array<string | null>(count).fill(null)])),
  };
}

/** Assesses `count` buildings. `onProgress` hears how many are done. */
export async function assessAll(
  db: Database,
  inventoryId: string,
  pools: YearPools,
  count: number,
  context: AssessContext,
  onProgress?: (done: number) => void,
): Promise<Assessed> {
  const results = emptyResults(count);
  const scratch = newScratch();
  const index = new Int32Array(count);
  const id: string[] = [];
  const mixtures: Mixture[] = [];
  const median = new Float64Array(count);
  const people = new Float64Array(count);
  const demand = new Float64Array(count);
  let ranked = 0;
  for (const range of indexRanges(count)) {
    const { columns, notRanked, rows } = await readBuildings(db, inventoryId, range);
    const read = buildingReader(columns, pools);
    for (let i = 0; i < rows; i += 1) {
      const at = range.from + i;
      const early = notRanked[i]!;
      const building = read(i);
      const result =
        early === null ? assess(building, context, undefined, scratch) : { id: building.id, reason: early };
      if (!isRanked(result)) {
        results.texts['not_ranked']![at] = result.reason;
        continue;
      }
      write(results, at, result);
      index[ranked] = at;
      id.push(result.id);
      mixtures.push(result.mixture);
      median[ranked] = result.lnPriority;
      people[ranked] = Number.isNaN(result.people_exposed) ? 0 : result.people_exposed;
      demand[ranked] = result.demand_g;
      ranked += 1;
    }
    onProgress?.(range.to);
  }
  return {
    results,
    index: index.subarray(0, ranked),
    id,
    mixtures,
    median: median.subarray(0, ranked),
    people: people.subarray(0, ranked),
    demand: demand.subarray(0, ranked),
  };
}

function write({ numbers, texts }: ResultArrays, at: number, result: Assessment): void {
  const { leading, period } = result;
  const set = (name: string, value: number): void => {
    numbers[name]![at] = value;
  };
  set('ln_priority', result.lnPriority);
  set('ln_priority_sd', result.lnPrioritySd);
  set('period_longitudinal_s', period.longitudinal.p50_s);
  set('period_longitudinal_16_s', period.longitudinal.p16_s);
  set('period_longitudinal_84_s', period.longitudinal.p84_s);
  set('period_transverse_s', period.transverse.p50_s);
  set('period_transverse_16_s', period.transverse.p16_s);
  set('period_transverse_84_s', period.transverse.p84_s);
  set('sa_g', leading.sa_g);
  set('sa_level_2_g', leading.sa_level_2_g);
  set('capacity_g', leading.capacity_g);
  set('demand_over_capacity', leading.demand_over_capacity);
  set('people_exposed', result.people_exposed);
  set('slope_k', result.slope_k);
  set('case_chance', leading.chance);
  set('weak_chance', result.weakChance);
  texts['governing']![at] = leading.governing;
  texts['period_evidence']![at] = leading.evidence;
  texts['spectrum']![at] = result.spectrum;
  texts['case_system']![at] = leading.system;
  texts['case_edition']![at] = leading.edition ?? 'no seismic design';
  texts['weak_type']![at] = result.weakType;
  texts['flags']![at] = result.flags.join(' ');
}

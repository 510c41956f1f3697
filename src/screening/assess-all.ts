/** Every building of an inventory through `assess`, block by block; what the ranking needs is gathered, the rest kept at once. */
import type { Mixture } from '../engineering/priority/mixture.js';
import { EDITION_LABELS } from '../engineering/assess/code-history.js';
import type { AssessSettings } from '../engineering/assess/settings.js';
import { zoneOf } from '../engineering/assess/shared-load.js';
import type { SharedErrors, Zone } from '../engineering/priority/shared-errors.js';
import { SIMULATED_UNDER } from '../engineering/priority/simulate.js';
import { indexRanges } from '../store/chunks.js';
import type { Database } from '../store/database.js';
import type { Assessor } from './assess-threads.js';
import { NONE } from './assess-block.js';
import type { BlockResult } from './assess-block.js';
import { mixturesOf } from './flat-mixtures.js';
import type { FlatArrays } from './flat-mixtures.js';
import { keepAssessed } from './keep-results.js';
import { readBuildings, readIds } from './read-buildings.js';
import { packBlock, partsOf } from './thread-messages.js';

/** The ranked buildings in the order of their indices, one entry each. */
export interface Assessed {
  readonly index: Int32Array;
  /** Ids, or where there are many buildings their indices, which are in the order of the ids. */
  readonly id: readonly string[] | Int32Array;
  /** Emptied once the ranks are made: at a million buildings the largest thing in memory. */
  readonly mixtures: Mixture[];
  /** The same, some thousands to a set. */
  readonly flat: FlatArrays[];
  readonly median: Float64Array;
  readonly people: Float64Array;
  readonly demand: Float64Array;
  readonly weakChance: Float64Array;
  /** Errors that buildings have in common. */
  readonly shared: SharedErrors;
  /** How many buildings are not ranked, by reason. */
  readonly reasons: ReadonlyMap<string, number>;
}

/** Buildings read at a time: a group of rows of the database, which it reads whole or not at all. */
const READ = 122_880;
/** Parts of it handed to threads. */
const PARTS = 4;

/** Assesses `count` buildings and keeps the results as those of run `runId`, or keeps none where it is null; `places`: they are told where they stand. `onProgress` hears how many are done. */
export async function assessAll(
  db: Database,
  inventoryId: string,
  runId: number | null,
  count: number,
  assessor: Assessor,
  places: boolean,
  settings: AssessSettings,
  onProgress?: (done: number) => void,
): Promise<Assessed> {
  const gathering = new Gathering(count, settings);
  const running = new Set<Promise<void>>();
  // kept in order, whichever thread is first
  let kept: Promise<void> = Promise.resolve();
  for (const range of indexRanges(count, READ)) {
    // packed whole, then cut: cutting columns of numbers and codes costs next to nothing
    const input = packBlock(await readBuildings(db, inventoryId, range, { ids: false, places }));
    for (const { from, part } of partsOf(input, range.from, Math.ceil(READ / PARTS))) {
      const result = assessor.assess(part);
      const before = kept;
      const work = (async (): Promise<void> => {
        const done = await result;
        await before;
        if (runId !== null) await keepAssessed(db, runId, from, done);
        gathering.add(from, done);
        onProgress?.(from + done.rows);
      })();
      kept = work;
      running.add(work);
      void work.then(
        () => running.delete(work),
        () => undefined,
      );
      // one block more than there are threads, so that none waits for the next to be read
      while (running.size > 2 * assessor.threads) await Promise.race(running);
    }
  }
  await Promise.all(running);
  return gathering.finish(db, inventoryId);
}

/** Collects what the ranking needs. */
class Gathering {
  readonly #index: Int32Array;
  readonly #median: Float64Array;
  readonly #people: Float64Array;
  readonly #demand: Float64Array;
  readonly #weakChance: Float64Array;
  /** Number of the zone of each building, and the zones by name. */
  readonly #zone: Uint16Array;
  readonly #zones = new Map<string, Zone>();
  readonly #settings: AssessSettings;
  readonly #mixtures: Mixture[] = [];
  readonly #flat: FlatArrays[] = [];
  readonly #reasons = new Map<string, number>();
  #count = 0;

  constructor(count: number, settings: AssessSettings) {
    this.#index = new Int32Array(count);
    this.#median = new Float64Array(count);
    this.#people = new Float64Array(count);
    this.#demand = new Float64Array(count);
    this.#weakChance = new Float64Array(count);
    this.#zone = new Uint16Array(count);
    this.#settings = settings;
  }

  add(from: number, result: BlockResult): void {
    const { ranked, numbers, demand_g, mixtures, texts } = result;
    const lnPriority = numbers['ln_priority']!;
    const exposed = numbers['people_exposed']!;
    const weak = numbers['weak_chance']!;
    for (let i = 0; i < ranked.length; i += 1) {
      const row = ranked[i]!;
      const at = this.#count + i;
      this.#index[at] = from + row;
      this.#median[at] = lnPriority[row]!;
      this.#people[at] = Number.isNaN(exposed[row]!) ? 0 : exposed[row]!;
      this.#demand[at] = demand_g[i]!;
      this.#weakChance[at] = weak[row]!;
    }
    this.#addZones(result);
    this.#count += ranked.length;
    for (const mixture of mixturesOf(mixtures)) this.#mixtures.push(mixture);
    this.#flat.push(mixtures);
    const { words, codes } = texts['not_ranked']!;
    for (const code of codes) {
      if (code !== NONE) this.#reasons.set(words[code]!, (this.#reasons.get(words[code]!) ?? 0) + 1);
    }
  }

  /** A building's zone is the spectrum it reads, with its slope. */
  #addZones({ ranked, numbers, texts }: BlockResult): void {
    const { words, codes } = texts['spectrum']!;
    const slope = numbers['slope_k']!;
    const number = new Int32Array(words.length).fill(-1);
    for (let i = 0; i < ranked.length; i += 1) {
      const row = ranked[i]!;
      const code = codes[row]!;
      if (number[code]! < 0) {
        const name = words[code]!;
        if (!this.#zones.has(name)) this.#zones.set(name, zoneOf(name, slope[row]!, this.#settings));
        number[code] = [...this.#zones.keys()].indexOf(name);
      }
      this.#zone[this.#count + i] = number[code]!;
    }
  }

  async finish(db: Database, inventoryId: string): Promise<Assessed> {
    const count = this.#count;
    const index = this.#index.subarray(0, count);
    return {
      index,
      // few buildings are ranked by simulation, whose draws hang on the ids
      id: count < SIMULATED_UNDER ? await readIds(db, inventoryId, index) : index,
      mixtures: this.#mixtures,
      flat: this.#flat,
      median: this.#median.subarray(0, count),
      people: this.#people.subarray(0, count),
      demand: this.#demand.subarray(0, count),
      weakChance: this.#weakChance.subarray(0, count),
      shared: {
        labels: EDITION_LABELS,
        zones: [...this.#zones.values()],
        zone: this.#zone.subarray(0, count),
      },
      reasons: this.#reasons,
    };
  }
}

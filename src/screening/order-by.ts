/** The order of an inventory by other settings: medians and ranks alone, without chances and bands, and nothing kept. */
import { assess, isRanked } from '../engineering/assess/assess.js';
import { compileContext } from '../engineering/assess/context.js';
import type { AssessContext, PeriodMemory } from '../engineering/assess/context.js';
import { newScratch } from '../engineering/assess/scratch.js';
import type { AssessSettings } from '../engineering/assess/settings.js';
import type { Building } from '../engineering/building.js';
import { buildingReader } from '../engineering/building-columns.js';
import type { YearPools } from '../engineering/building-columns.js';
import { orderOf } from '../engineering/priority/rank.js';
import { indexRanges } from '../store/chunks.js';
import type { HazardGrids } from '../engineering/spectrum/grid.js';
import type { Database } from '../store/database.js';
import type { Assessor } from './assess-threads.js';
import { readBuildings } from './read-buildings.js';
import { packBlock, partsOf } from './thread-messages.js';
import type { PackedBlock } from './thread-messages.js';

/** Medians and ranks of the buildings looked at; by position, unranked: NaN and 0. */
export interface Order {
  readonly median: Float64Array;
  readonly rank: Int32Array;
  readonly ranked: number;
}

/** Buildings read at a time, and parts handed to threads. */
const READ = 122_880;
const PARTS = 4;

/** Up to so many buildings are kept as such, with what was found of their periods: ranking them again costs a fraction. */
const FEW = 5_000;

interface Few {
  readonly buildings: readonly Building[];
  readonly notRanked: readonly (string | null)[];
}

/** The buildings looked at, block by block; kept in memory where they are one block. */
export class Blocks {
  readonly #db: Database;
  readonly #inventoryId: string;
  readonly #buildings: number;
  readonly #places: boolean;
  readonly every: number;
  #only: PackedBlock | null = null;
  #few: Few | null = null;
  readonly #periods = new Map<string, PeriodMemory>();

  constructor(db: Database, inventoryId: string, buildings: number, every: number, places: boolean) {
    this.#db = db;
    this.#inventoryId = inventoryId;
    this.#buildings = buildings;
    this.#places = places;
    this.every = every;
  }

  get count(): number {
    return Math.ceil(this.#buildings / this.every);
  }

  async *all(): AsyncGenerator<{ readonly from: number; readonly part: PackedBlock }> {
    for (const range of indexRanges(this.#buildings, READ * this.every)) {
      const block = this.#only ?? (await this.#read(range));
      if (this.count <= READ) this.#only = block;
      yield* partsOf(block, range.from / this.every, Math.ceil(READ / PARTS));
    }
  }

  /** The buildings themselves where they are few, else null. */
  async few(pools: YearPools): Promise<Few | null> {
    if (this.count > FEW) return null;
    if (this.#few === null) {
      const options = { every: this.every, places: this.#places };
      const block = await readBuildings(this.#db, this.#inventoryId, { from: 0, to: this.#buildings }, options);
      const read = buildingReader(block.columns, pools);
      this.#few = { buildings: Array.from({ length: block.rows }, (_, i) => read(i)), notRanked: block.notRanked };
    }
    return this.#few;
  }

  /** What was found of the periods of the few by settings that agree in what a period rests on. */
  periodMemory({ period, spreads }: AssessSettings): PeriodMemory {
    const key = JSON.stringify([period, spreads]);
    let memory = this.#periods.get(key);
    if (memory === undefined) this.#periods.set(key, (memory = new WeakMap()));
    return memory;
  }

  async #read(range: { readonly from: number; readonly to: number }): Promise<PackedBlock> {
    return packBlock(
      await readBuildings(this.#db, this.#inventoryId, range, { every: this.every, ids: false, places: this.#places }),
    );
  }
}

/** Assesses all of `source` by `settings` and ranks them by median; `onDone` hears the share done. */
export async function orderBy(
  source: Blocks,
  settings: AssessSettings,
  pools: YearPools,
  grids: HazardGrids,
  assessor: Assessor,
  onDone: (share: number) => void,
): Promise<Order> {
  const { count } = source;
  const median = new Float64Array(count).fill(NaN);
  const people = new Float64Array(count);
  const few = await source.few(pools);
  if (few !== null) {
    assessFew(few, compileContext(settings, grids, source.periodMemory(settings)), median, people);
    onDone(1);
  } else await assessBlocks(source, settings, pools, grids, assessor, median, people, onDone);
  const at = Int32Array.from(positions(median));
  const pick = (values: Float64Array): Float64Array => Float64Array.from(at, (position) => values[position]!);
  // positions are in the order of the ids, as everywhere
  const order = orderOf({ id: at, mixtures: [], median: pick(median), people: pick(people) });
  const rank = new Int32Array(count);
  order.forEach((i, place) => (rank[at[i]!] = place + 1));
  return { median, rank, ranked: at.length };
}

const scratch = newScratch();

/** Medians and people of a few buildings, in this thread. */
function assessFew(
  { buildings, notRanked }: Few,
  context: AssessContext,
  median: Float64Array,
  people: Float64Array,
): void {
  buildings.forEach((building, i) => {
    if (notRanked[i] !== null) return;
    scratch.pool.restart();
    const result = assess(building, context, undefined, scratch);
    if (!isRanked(result)) return;
    median[i] = result.lnPriority;
    people[i] = Number.isNaN(result.people_exposed) ? 0 : result.people_exposed;
  });
}

async function assessBlocks(
  source: Blocks,
  settings: AssessSettings,
  pools: YearPools,
  grids: HazardGrids,
  assessor: Assessor,
  median: Float64Array,
  people: Float64Array,
  onDone: (share: number) => void,
): Promise<void> {
  assessor.begin(settings, pools, grids);
  let done = 0;
  const running = new Set<Promise<void>>();
  for await (const { from, part } of source.all()) {
    const work = assessor.assess(part).then(({ ranked, rows, numbers }) => {
      const lnPriority = numbers['ln_priority']!;
      const exposed = numbers['people_exposed']!;
      for (const row of ranked) {
        median[from + row] = lnPriority[row]!;
        people[from + row] = Number.isNaN(exposed[row]!) ? 0 : exposed[row]!;
      }
      done += rows;
      onDone(done / source.count);
    });
    running.add(work);
    void work.then(
      () => running.delete(work),
      () => undefined,
    );
    // one part more than there are threads, so that none waits for the next to be read
    while (running.size > 2 * assessor.threads) await Promise.race(running);
  }
  await Promise.all(running);
}

/** Where a median stands. */
export function* positions(median: Float64Array): Generator<number> {
  for (let at = 0; at < median.length; at += 1) if (!Number.isNaN(median[at]!)) yield at;
}

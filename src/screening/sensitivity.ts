/**
 * Sensitivity: the inventory of a kept run ranked again with one assumption switched at a time, and how the list changes. Nothing is kept.
 * Only the order is worked out, by median; chances and bands are not, which saves half of the time.
 */
import type { AssessSettings } from '../engineering/assess/settings.js';
import type { HazardGrids } from '../engineering/spectrum/grid.js';
import type { YearPools } from '../engineering/building-columns.js';
import { kendallTauB } from '../engineering/numeric/kendall.js';
import type { Assumption } from '../engineering/page-contract.js';
import { roundedMedian } from '../engineering/priority/rank.js';
import { UserError, showValue } from '../errors.js';
import type { Database } from '../store/database.js';
import { withAssessor } from './assess-inventory.js';
import { listChange } from './list-changes.js';
import type { ListChange } from './list-changes.js';
import { readRun } from './page-data.js';
import { readGrids } from './kept-grids.js';
import { Blocks, orderBy, positions } from './order-by.js';
import type { Order } from './order-by.js';
import { readIds, readPools } from './read-buildings.js';
import type { ScreenProgress } from './progress.js';
import { withSlopes } from './slopes.js';
import { weightSpace } from './weights.js';
import type { WeightSpace } from './weights.js';
import type { Mark, Switch } from './switch.js';
import { markOf, notSwitched, switchesOf } from './switches.js';
import type { NotSwitched } from './switches.js';

export interface SensitivityOptions {
  /** Ids of the register: only these are switched; all when left out. */
  readonly only?: readonly string[] | undefined;
  /** Rank every second, third … building by id, so that about this many are left. */
  readonly sample?: number | undefined;
  readonly onProgress?: ((progress: ScreenProgress) => void) | undefined;
  /** Hears, once a few are ranked, how many rankings there are and about how long they take. */
  readonly onEstimate?: ((rankings: number, seconds: number) => void) | undefined;
}

/** One switch and what it does to the list. */
export interface SwitchEffect extends ListChange {
  /** Id of the entry in the register of assumptions. */
  readonly assumption: string;
  readonly statement: string;
  readonly from: string;
  readonly to: string;
  /** How the register came by what it was, and that in one word. */
  readonly source: string;
  readonly mark: Mark;
  readonly ranked: number;
  /** Buildings on both lists over the places of the longer one. */
  readonly overlap_share: number;
  /** Of the buildings ranked both times; null where one of the orders holds no two that differ. */
  readonly tau_b: number | null;
}

/** A building that is on the list in some of the rankings. */
export interface HeldPlace {
  readonly id: string;
  /** By the run's assumptions; null where it is not ranked. */
  readonly rank: number | null;
  /** On the list in how many of the rankings, the run's own not counted. */
  readonly held: number;
}

export interface Sensitivity {
  readonly run: number;
  readonly buildings: number;
  readonly ranked: number;
  /** Places of the list, in the sample where there is one. */
  readonly places: number;
  /** Null: all buildings were ranked. */
  readonly sample: { readonly every: number; readonly buildings: number; readonly list_size: number } | null;
  /** How many rankings were made besides the run's own. */
  readonly rankings: number;
  /** Largest effect first: smallest overlap, then smallest tau-b. */
  readonly switches: readonly SwitchEffect[];
  readonly not_switched: readonly NotSwitched[];
  /** On the list whatever is switched, by rank. */
  readonly always: readonly HeldPlace[];
  /** On the list by the run's assumptions, but not whatever is switched, by rank. */
  readonly sometimes: readonly HeldPlace[];
  /** Not on the list by the run's assumptions, but in some of the rankings; the most often held first. */
  readonly outside: readonly HeldPlace[];
  /** What weightings of slope, people and importance together do, in the whole inventory; null where people do not count. */
  readonly weights: WeightSpace | null;
}

/** What is ranked again. */
export interface SensitivityBasis {
  readonly run: number;
  readonly inventoryId: string;
  readonly settings: AssessSettings;
  readonly grids: HazardGrids;
  readonly pools: YearPools;
  readonly buildings: number;
  readonly listSize: number;
  readonly register: readonly Assumption[];
  readonly seed: number;
}

/** The switch whose duration tells that of all. */
const TELLING = 2;

/** Switches the assumptions of run `runId` one at a time. @throws UserError for an unknown run, an entry that is not there or not switched, or a bad sample. */
export async function sensitivityOf(
  db: Database,
  runId: number,
  options: SensitivityOptions = {},
): Promise<Sensitivity> {
  const { inventory_id: inventoryId, settings, summary, seed } = await readRun(db, runId);
  const { buildings, list_size: listSize, assumptions: register } = summary;
  const pools = await readPools(db, inventoryId);
  const grids = await readGrids(db, settings);
  const basis = { run: runId, inventoryId, settings, grids, pools, buildings, listSize, register, seed };
  return sensitivityOn(db, basis, chosen(switchesOf(settings), register, options.only), options);
}

/** Makes the `switches` one at a time. @throws UserError for a bad sample. */
export async function sensitivityOn(
  db: Database,
  { run, inventoryId, settings, grids, pools, buildings, listSize, register, seed }: SensitivityBasis,
  switches: readonly Switch[],
  options: Omit<SensitivityOptions, 'only'> = {},
): Promise<Sensitivity> {
  const every = stepFor(buildings, options.sample);
  const looked = Math.ceil(buildings / every);
  const places = every === 1 ? listSize : Math.max(1, Math.round((listSize * looked) / buildings));
  const source = new Blocks(db, inventoryId, buildings, every, grids.size > 0);
  const report = (step: string, share: number): void => options.onProgress?.({ step, share });
  return withAssessor(looked, async (assessor) => {
    const rank = (one: AssessSettings, what: string): Promise<Order> =>
      orderBy(source, one, pools, grids, assessor, (share) => {
        report(what, share);
      });
    const base = await rank(settings, 'as in the run');
    const effects: SwitchEffect[] = [];
    const held = new Int32Array(looked);
    for (const [i, one] of switches.entries()) {
      const what = `${one.assumption}: ${one.to} (${String(i + 1)} of ${String(switches.length)})`;
      report(what, NaN);
      const started = performance.now();
      const switched = await withFoundSlopes(db, inventoryId, buildings, pools, grids, one);
      const now = await rank(switched, what);
      for (let at = 0; at < looked; at += 1) if (onList(now, at, places)) held[at]! += 1;
      // the first ones pay for reading and warming up
      if (i === Math.min(TELLING, switches.length - 1))
        options.onEstimate?.(switches.length, (switches.length * (performance.now() - started)) / 1000);
      effects.push(await effectOf(db, inventoryId, base, now, one, register, places, every));
    }
    return {
      run,
      buildings,
      ranked: base.ranked,
      places: Math.min(places, base.ranked),
      sample: every === 1 ? null : { every, buildings: looked, list_size: listSize },
      rankings: switches.length,
      switches: effects.sort(byEffect),
      not_switched: notSwitched(register, switchesOf(settings)),
      ...(await heldPlaces(db, inventoryId, base, held, switches.length, places, every)),
      // cheap beside one ranking: of all buildings, sample or not
      weights: await weightSpace(db, run, settings, seed, listSize),
    };
  });
}

function chosen(
  all: readonly Switch[],
  register: readonly Assumption[],
  only: readonly string[] | undefined,
): readonly Switch[] {
  if (only === undefined) return all;
  const known = [...new Set(all.map(({ assumption }) => assumption))];
  const wrong = only.filter((id) => !known.includes(id));
  if (wrong.length > 0) {
    const still = notSwitched(register, all);
    throw UserError.of(
      wrong.map((id) => {
        const why = still.find(({ assumption }) => assumption === id)?.why;
        const message =
          why === undefined
            ? `no assumption is called ${showValue(id)}; those switched are ${known.join(', ')}`
            : `${id} is not switched: ${why}; those switched are ${known.join(', ')}`;
        return { place: { key: '--only' }, message };
      }),
    );
  }
  return all.filter(({ assumption }) => only.includes(assumption));
}

/** Every how manyth building leaves about `sample` of `buildings`. */
function stepFor(buildings: number, sample: number | undefined): number {
  if (sample === undefined) return 1;
  if (!Number.isInteger(sample) || sample < 2)
    throw new UserError(`a sample holds 2 buildings at least, a whole number; got ${String(sample)}`, {
      key: '--sample',
    });
  return Math.max(1, Math.ceil(buildings / sample));
}

/** Periods that change move the median period at which two levels give the slope. */
async function withFoundSlopes(
  db: Database,
  inventoryId: string,
  buildings: number,
  pools: YearPools,
  grids: HazardGrids,
  { settings, newPeriods }: Switch,
): Promise<AssessSettings> {
  if (newPeriods !== true || settings.slopeSource !== 'two levels') return settings;
  return (await withSlopes(settings, grids, true, db, inventoryId, pools, buildings)).settings;
}

function onList({ rank }: Order, at: number, places: number): boolean {
  return rank[at]! > 0 && rank[at]! <= places;
}

async function effectOf(
  db: Database,
  inventoryId: string,
  base: Order,
  now: Order,
  { assumption, to, from, mark }: Switch,
  register: readonly Assumption[],
  places: number,
  every: number,
): Promise<SwitchEffect> {
  const entry = register.find(({ id }) => id === assumption);
  const spread = ({ rank }: Order): Int32Array => {
    if (every === 1) return rank;
    const out = new Int32Array(rank.length * every);
    rank.forEach((value, at) => (out[at * every] = value));
    return out;
  };
  const list = await listChange(
    db,
    inventoryId,
    { rank: spread(base), listSize: places },
    { rank: spread(now), listSize: places },
  );
  const both = [...positions(base.median)].filter((at) => now.rank[at]! > 0);
  const rounded = ({ median }: Order): Float64Array => Float64Array.from(both, (at) => roundedMedian(median[at]!));
  const tau = kendallTauB(rounded(base), rounded(now));
  return {
    assumption,
    statement: entry?.statement ?? '',
    from: from ?? entry?.value ?? '',
    to,
    source: entry?.source ?? '',
    mark: mark ?? markOf(entry?.source ?? ''),
    ranked: now.ranked,
    overlap_share: list.overlap / Math.max(1, list.places, list.places_before),
    tau_b: Number.isNaN(tau) ? null : tau,
    ...list,
  };
}

function byEffect(a: SwitchEffect, b: SwitchEffect): number {
  return a.overlap_share - b.overlap_share || (a.tau_b ?? 1) - (b.tau_b ?? 1);
}

async function heldPlaces(
  db: Database,
  inventoryId: string,
  base: Order,
  held: Int32Array,
  rankings: number,
  places: number,
  every: number,
): Promise<Pick<Sensitivity, 'always' | 'sometimes' | 'outside'>> {
  const positionsHeld = [...held.keys()].filter((at) => held[at]! > 0 || onList(base, at, places));
  const ids = await readIds(
    db,
    inventoryId,
    Int32Array.from(positionsHeld, (at) => at * every),
  );
  const all = positionsHeld.map((at, i) => ({
    id: ids[i]!,
    rank: base.rank[at]! > 0 ? base.rank[at]! : null,
    held: held[at]!,
  }));
  const byRank = (a: HeldPlace, b: HeldPlace): number => (a.rank ?? Infinity) - (b.rank ?? Infinity);
  const listed = all.filter(({ rank }) => rank !== null && rank <= places).sort(byRank);
  return {
    always: listed.filter((one) => one.held === rankings),
    sometimes: listed.filter((one) => one.held < rankings),
    outside: all
      .filter(({ rank }) => rank === null || rank > places)
      .sort((a, b) => b.held - a.held || byRank(a, b) || (a.id < b.id ? -1 : 1)),
  };
}

/** How the list of a kept run hangs on the weights: the share of a range of weightings in which each building is on it. */
import { assumedWith } from '../engineering/assess/assumed.js';
import type { AssessSettings } from '../engineering/assess/settings.js';
import { acceptability } from '../engineering/priority/weight-space.js';
import type { Range, WeightRanges } from '../engineering/priority/weight-space.js';
import type { Database } from '../store/database.js';

/** Ranges of the exponents and of the slope, where it is not read from two levels [judgement]; the data sheet of ranking has the last. */
const PEOPLE: Range = [0, 1];
const IMPORTANCE: Range = [0, 2];
const SLOPE: Range = [1.5, 4];
const USUAL_SLOPE = 2.5;

const DRAWS = 1_000;
/** In this share of the weightings or more a place counts as safe from them [judgement]. */
const SAFE = 0.95;

export interface WeighedPlace {
  readonly id: string;
  readonly rank: number;
  /** Share of the weightings in which it is on the list. */
  readonly share: number;
}

export interface WeightSpace {
  readonly draws: number;
  /** Exponents of people and importance, and slopes, that were drawn between. */
  readonly people: Range;
  readonly importance: Range;
  /** Null where the slopes are read from two levels: then each stays as read. */
  readonly slope: Range | null;
  readonly safe_share: number;
  /** Listed buildings that are on the list in `safe_share` of the weightings or more. */
  readonly safe: number;
  readonly places: number;
  /** The listed buildings by rank. */
  readonly listed: readonly WeighedPlace[];
  /** Others that some weightings put on it, the most often first. */
  readonly outside: readonly WeighedPlace[];
}

/** Null where people do not count: then there is nothing to weigh. The list has `places`. */
export async function weightSpace(
  db: Database,
  run: number,
  settings: AssessSettings,
  seed: number,
  places: number,
): Promise<WeightSpace | null> {
  if (settings.rankBy !== 'people') return null;
  const rows = await db.columns(
    `SELECT r.ln_priority AS priority, r.people_exposed AS people, coalesce(b.importance_factor, 1) AS importance, b.building_index AS at, r.rank AS place
     FROM result r JOIN run u ON u.run_id = r.run_id JOIN building b ON b.inventory_id = u.inventory_id AND b.building_index = r.building_index
     WHERE r.run_id = ? AND r.rank IS NOT NULL ORDER BY r.rank`,
    { priority: 'f64', people: 'f64', importance: 'f64', at: 'i32', place: 'i32' },
    [run],
  );
  const n = rows.priority.length;
  const { peopleWeight, importanceWeight } = assumedWith(settings.assumed);
  const slope = settings.slopeSource === 'two levels' ? null : SLOPE;
  const ranges: WeightRanges = {
    slope: slope === null ? [1, 1] : [slope[0] / USUAL_SLOPE, slope[1] / USUAL_SLOPE],
    people: PEOPLE,
    importance: IMPORTANCE,
  };
  const shares = acceptability(
    { lnPriority: rows.priority, people: rows.people, importance: rows.importance },
    { people: peopleWeight, importance: importanceWeight },
    ranges,
    places,
    DRAWS,
    seed,
  );
  const told = Array.from(shares.keys()).filter((i) => i < places || shares[i]! > 0);
  const ids = await namesOf(
    db,
    run,
    told.map((i) => rows.at[i]!),
  );
  const all = told.map((i): WeighedPlace => ({ id: ids.get(rows.at[i]!)!, rank: rows.place[i]!, share: shares[i]! }));
  const listed = all.slice(0, Math.min(places, n));
  return {
    draws: DRAWS,
    ...{ people: PEOPLE, importance: IMPORTANCE, slope, safe_share: SAFE },
    safe: listed.filter(({ share }) => share >= SAFE - 1e-9).length,
    places: listed.length,
    listed,
    outside: all.slice(listed.length).sort((a, b) => b.share - a.share || a.rank - b.rank),
  };
}

async function namesOf(db: Database, run: number, indices: readonly number[]): Promise<ReadonlyMap<number, string>> {
  const rows = await db.rows<{ at: number; id: string }>(
    `SELECT b.building_index AS at, b.id FROM building b JOIN run u ON u.inventory_id = b.inventory_id
     WHERE u.run_id = ? AND b.building_index IN (SELECT unnest(CAST(? AS INTEGER[])))`,
    [run, `[${indices.join(',')}]`],
  );
  return new Map(rows.map(({ at, id }) => [at, id]));
}

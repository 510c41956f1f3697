/** From kept buildings and settings to results and ranks: what screening, refreshing and sweeping share. */
import type { AssessSettings } from '../engineering/assess/settings.js';
import { UserError } from '../errors.js';
import type { TakenIn } from '../inventory/take-in.js';
import type { Database } from '../store/database.js';
import type { LoadedStudy } from '../study/load.js';
import { assessAll } from './assess-all.js';
import type { Assessed } from './assess-all.js';
import { startAssessor, threadsFor } from './assess-threads.js';
import type { Assessor } from './assess-threads.js';
import { rankInventory } from './rank-all.js';
import type { Ranked } from './rank-all.js';
import { readPools } from './read-buildings.js';
import { withSlopes } from './slopes.js';

/** Hears of the steps; `share` is NaN or left out where a step cannot tell. */
export type Report = (step: string, share?: number) => void;

export type AssessedInventory = Awaited<ReturnType<typeof withSlopes>> & {
  readonly assessed: Assessed;
  readonly ranked: Ranked;
};

/** Runs `work` with as many threads as pay for `count` buildings. */
export async function withAssessor<T>(count: number, work: (assessor: Assessor) => Promise<T>): Promise<T> {
  const assessor = startAssessor(threadsFor(count));
  try {
    return await work(assessor);
  } finally {
    await assessor.close();
  }
}

/**
 * Slopes, results and ranks of all buildings of an inventory by the settings of a study (`first`: the slopes still to be found);
 * the results are kept as those of run `runId`, or not at all where it is null.
 * @throws UserError when none can be ranked.
 */
export async function assessInventory(
  db: Database,
  { study, grids }: Pick<LoadedStudy, 'study' | 'grids'>,
  first: AssessSettings,
  { inventoryId, buildings: count }: Pick<TakenIn, 'inventoryId' | 'buildings'>,
  runId: number | null,
  assessor: Assessor,
  report: Report,
): Promise<AssessedInventory> {
  const pools = await readPools(db, inventoryId);
  report('hazard slope');
  const found = await withSlopes(first, grids, study.ranking.k === 'from-levels', db, inventoryId, pools, count);
  assessor.begin(found.settings, pools, grids);
  report('assessing', 0);
  const assessed = await assessAll(db, inventoryId, runId, count, assessor, grids.size > 0, found.settings, (done) => {
    report('assessing', done / count);
  });
  if (assessed.id.length === 0) throw nothingRanked(assessed, count);
  report('ranking');
  const ranked = await rankInventory(assessed, count, study.ranking.list_size, study.seed, assessor);
  return { ...found, assessed, ranked };
}

/** What to do about a reason that keeps buildings out of the ranking. */
const REMEDIES: readonly (readonly [RegExp, string])[] = [
  [
    /^(?:outside the hazard grid|no coordinates)/,
    'map columns of lon and lat in degrees, or name a grid that covers them',
  ],
  [/^system not known/, 'give their systems, or name in system_prior a table of chances that covers them'],
  [/height/, 'map a column of heights or of storeys'],
  [/people/, 'map a column of people or of floor areas, or rank by ratio or by demand'],
  [/spectrum/, 'name a spectrum for them in the study'],
  [
    /^no method gives a period/,
    'leave a formula switched on that needs the height alone, or give what the formulas need',
  ],
  [/already assessed|demolished/, 'check the column of the status and the words it is read by'],
];

function nothingRanked({ reasons: counts }: Assessed, count: number): UserError {
  const [reason, times] = [...counts].sort((a, b) => b[1] - a[1])[0] ?? ['the inventory holds none', 0];
  const remedy = REMEDIES.find(([pattern]) => pattern.test(reason))?.[1] ?? '`swaymark check` says what is missing';
  const of = count === 1 ? 'the only building cannot' : `none of ${String(count)} buildings can`;
  return new UserError(`${of} be ranked: ${reason}${count > 1 ? ` (${String(times)})` : ''}; ${remedy}`);
}

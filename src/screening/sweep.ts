/** One parameter over a range: how the list changes, without keeping a run. */
import type { AssessSettings } from '../engineering/assess/settings.js';
import { readTaken } from '../inventory/take-in.js';
import type { Database } from '../store/database.js';
import type { LoadedStudy } from '../study/load.js';
import { assessInventory, withAssessor } from './assess-inventory.js';
import { listChange, ranksOfRun } from './list-changes.js';
import type { ListChange } from './list-changes.js';
import { gridsOn, refuseIntake, settingsOn } from './refresh.js';
import type { BaseRun } from './refresh.js';
import type { ScreenProgress } from './progress.js';
import { rankingFigures } from './summarise.js';

export interface SweptValue extends ListChange {
  readonly value: number;
  readonly ranked: number;
  readonly expected_wrong_places: number;
  /** Places of the list held with a chance of at least 0.80. */
  readonly sure_places: number;
}

/**
 * Ranks the inventory of `base` by each of `studies` and compares its list with that of `base`; nothing is kept.
 * @throws UserError for a parameter that changes intake or cannot be used, and when no building can be ranked.
 */
export async function sweep(
  db: Database,
  base: BaseRun,
  studies: readonly { readonly value: number; readonly loaded: LoadedStudy }[],
  onProgress?: (progress: ScreenProgress) => void,
): Promise<readonly SweptValue[]> {
  // all of them before the first is ranked, which may take long
  const jobs: { readonly value: number; readonly loaded: LoadedStudy; readonly settings: AssessSettings }[] = [];
  for (const { value, loaded: stated } of studies) {
    refuseIntake(base, stated);
    const loaded = await gridsOn(base, stated);
    jobs.push({ value, loaded, settings: await settingsOn(base, loaded) });
  }
  const taken = await readTaken(db, base.inventoryId);
  const before = await ranksOfRun(db, base.runId, taken.buildings, base.listSize);
  return withAssessor(taken.buildings, async (assessor) => {
    const swept: SweptValue[] = [];
    for (const [i, { value, loaded, settings }] of jobs.entries()) {
      const report = (step: string, share = NaN): void =>
        onProgress?.({ step: `${String(value)} (${String(i + 1)} of ${String(jobs.length)}): ${step}`, share });
      const { assessed, ranked } = await assessInventory(db, loaded, settings, taken, null, assessor, report);
      const listSize = loaded.study.ranking.list_size;
      const figures = rankingFigures(assessed, ranked, listSize);
      const rank = ranked.columns.wholes['rank']!;
      swept.push({
        value,
        ranked: figures.ranked,
        expected_wrong_places: figures.expected_wrong_places,
        sure_places: figures.sure_places,
        ...(await listChange(db, base.inventoryId, before, { rank, listSize })),
      });
    }
    return swept;
  });
}

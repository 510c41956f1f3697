/** How the ordinates of a study's grids spread over the buildings that read them: what a chart of one spectrum for all would hide. */
import { chooseSpectrum } from '../engineering/assess/choose-spectrum.js';
import { compileContext } from '../engineering/assess/context.js';
import type { AssessSettings } from '../engineering/assess/settings.js';
import { buildingReader } from '../engineering/building-columns.js';
import { quantileOfSorted } from '../engineering/numeric/quantile.js';
import type { GridSpread } from '../engineering/page-contract.js';
import type { HazardGrids } from '../engineering/spectrum/grid.js';
import type { TakenIn } from '../inventory/take-in.js';
import { indexRanges } from '../store/chunks.js';
import type { Database } from '../store/database.js';
import { readBuildings } from './read-buildings.js';

/** Quantiles of so many are known well: of a larger inventory every second, third … building by id is read. */
const ENOUGH = 10_000;
/** Levels that the reports draw. */
const LEVELS = 2;

/** Quantiles period by period of every grid over the ranked buildings (`index`) that read it. */
export async function gridSpreads(
  settings: AssessSettings,
  grids: HazardGrids,
  db: Database,
  { inventoryId, buildings: count }: Pick<TakenIn, 'inventoryId' | 'buildings'>,
  index: Int32Array,
): Promise<readonly GridSpread[]> {
  const context = compileContext(settings, grids);
  const isRanked = new Uint8Array(count);
  for (const at of index) isRanked[at] = 1;
  // the ordinates of each building by grid
  const read = new Map([...context.grids.keys()].map((name) => [name, [] as Float64Array[]]));
  const every = Math.ceil(count / ENOUGH);
  for (const range of indexRanges(count, 65_536 * every)) {
    const { columns, rows } = await readBuildings(db, inventoryId, range, { every, ids: false, places: true });
    const buildingAt = buildingReader(columns, {});
    const first = Math.ceil(range.from / every) * every;
    for (let i = 0; i < rows; i += 1) {
      if (isRanked[first + i * every] !== 1) continue;
      const building = buildingAt(i);
      const seen = new Set<string>();
      for (let level = 0; level < Math.min(LEVELS, settings.levels.length); level += 1) {
        const choice = chooseSpectrum(context, building, level);
        if (typeof choice === 'string' || choice.spectrum.site === null || seen.has(choice.spectrum.name)) continue;
        seen.add(choice.spectrum.name);
        read.get(choice.spectrum.name)!.push(choice.spectrum.site.sa_g);
      }
    }
  }
  return [...read].flatMap(([spectrum, ordinates]): GridSpread[] => {
    if (ordinates.length === 0) return [];
    const periods_s = [...context.grids.get(spectrum)!.grid.periods_s];
    const sorted = periods_s.map((_, p) => Float64Array.from(ordinates, (sa_g) => sa_g[p]!).sort());
    const at = (share: number): readonly number[] => sorted.map((values) => quantileOfSorted(values, share));
    return [{ spectrum, buildings: ordinates.length, periods_s, low_g: at(0.05), median_g: at(0.5), high_g: at(0.95) }];
  });
}

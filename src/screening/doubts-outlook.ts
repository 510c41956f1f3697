/** Why the places of the list are uncertain: of each listed building the largest share of the spread of its priority. */
import { chooseSpectrum } from '../engineering/assess/choose-spectrum.js';
import { compileContext } from '../engineering/assess/context.js';
import { spreadShares } from '../engineering/assess/spread-shares.js';
import type { SpreadShare } from '../engineering/assess/spread-shares.js';
import { buildingReader } from '../engineering/building-columns.js';
import { indexRanges } from '../store/chunks.js';
import type { Database } from '../store/database.js';
import { readBuildings } from './read-buildings.js';
import type { SurveyBasis } from './survey.js';

/** Larger inventories are asked building by building (`explain`). */
const MOST_BUILDINGS = 50_000;
/** Places of the list that are told. */
const MOST_PLACES = 200;
const BLOCK = 65_536;

/** The largest doubt of each listed building and the largest that a visit can settle, the first place first; null where the inventory is too large. */
export async function doubtsOutlook(
  db: Database,
  { inventoryId, settings, grids, pools, count, listSize, assessed, ranked }: SurveyBasis,
): Promise<readonly (readonly SpreadShare[])[] | null> {
  if (count > MOST_BUILDINGS) return null;
  const places = Array.from(ranked.order.subarray(0, Math.min(listSize, MOST_PLACES)), (at) => assessed.index[at]!);
  const context = compileContext(settings, grids);
  const doubts = new Map<number, readonly SpreadShare[]>();
  for (const range of indexRanges(count, BLOCK)) {
    const wanted = places.filter((index) => index >= range.from && index < range.to);
    if (wanted.length === 0) continue;
    const { columns } = await readBuildings(db, inventoryId, range, { places: grids.size > 0 });
    const read = buildingReader(columns, pools);
    for (const index of wanted) {
      const building = read(index - range.from);
      const choice = chooseSpectrum(context, building, 0);
      if (typeof choice === 'string') continue;
      const shares = spreadShares(building, choice.spectrum, context) ?? [];
      const told = [shares[0], shares.find(({ learnable }) => learnable)];
      doubts.set(
        index,
        [...new Set(told)].filter((share) => share !== undefined),
      );
    }
  }
  return places.map((index) => doubts.get(index) ?? []);
}

/** The neighbours of one building: pairs of the study's table, else gaps measured between footprints. */
import type { Building } from '../engineering/building.js';
import { buildingAt } from '../engineering/building-columns.js';
import type { Neighbour } from '../engineering/assess/neighbours.js';
import { gapsWithin } from '../inventory/gaps.js';
import type { Database } from '../store/database.js';
import { readBuildings, readPools } from './read-buildings.js';

/** Gaps wider than this need no look [judgement]: more than two 20-storey buildings ask for by the height rule. */
export const REACH_M = 2;
/** Degrees around a building in which the place of a neighbour may stand: about 220 m to the north. */
const AROUND = 0.002;

export type FoundNeighbour = Neighbour & { readonly building: Building };

/** Neighbours of the building at `index`, nearest first; a pair of the table stands before what footprints say, of its rows the least gap and `no` before `yes`. */
export async function neighboursOf(
  db: Database,
  inventoryId: string,
  index: number,
  id: string,
): Promise<readonly FoundNeighbour[]> {
  const pairs = await db.rows<{ other: number; gap_m: number | null; floors_aligned: 'yes' | 'no' | null }>(
    `SELECT b.building_index AS other, min(n.gap_m) AS gap_m, min(n.floors_aligned) AS floors_aligned FROM neighbour n
     JOIN building b ON b.inventory_id = n.inventory_id AND b.id = CASE WHEN n.id_a = ? THEN n.id_b ELSE n.id_a END
     WHERE n.inventory_id = ? AND (n.id_a = ? OR n.id_b = ?)
     GROUP BY other ORDER BY other`,
    [id, inventoryId, id, id],
  );
  const near = await db.rows<{ building_index: number; footprint: string }>(
    `SELECT o.building_index, o.footprint FROM building o, (SELECT lon, lat FROM building WHERE inventory_id = ? AND building_index = ?) h
     WHERE o.inventory_id = ? AND o.footprint IS NOT NULL
       AND abs(o.lat - h.lat) <= ? AND abs(o.lon - h.lon) * greatest(cos(radians(h.lat)), 0.01) <= ?
     ORDER BY o.building_index`,
    [inventoryId, index, inventoryId, AROUND, AROUND],
  );
  const place = near.findIndex(({ building_index }) => building_index === index);
  const measured = new Map<number, number>();
  if (place >= 0)
    for (const { a, b, gap_m } of gapsWithin(
      near.map(({ footprint }) => footprint),
      REACH_M,
    ))
      if (a === place || b === place) measured.set(near[a === place ? b : a]!.building_index, gap_m);
  const found = new Map<number, Neighbour>();
  for (const { other, gap_m: given, floors_aligned } of pairs) {
    const gap_m = given ?? measured.get(other);
    if (gap_m === undefined) continue;
    found.set(other, {
      gap_m,
      floors_aligned,
      how: given === null ? 'measured between the footprints' : 'given in the table of neighbours',
    });
  }
  for (const [other, gap_m] of measured)
    if (!found.has(other)) found.set(other, { gap_m, floors_aligned: null, how: 'measured between the footprints' });
  const pools = await readPools(db, inventoryId);
  const neighbours: FoundNeighbour[] = [];
  for (const [other, neighbour] of [...found].sort(([a, x], [b, y]) => x.gap_m - y.gap_m || a - b)) {
    const { columns } = await readBuildings(db, inventoryId, { from: other, to: other + 1 }, { places: true });
    neighbours.push({ ...neighbour, building: buildingAt(columns, 0, pools) });
  }
  return neighbours;
}

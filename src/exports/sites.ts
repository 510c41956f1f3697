/** The sites of a run as a table: a row a building, the figures of its site beside its own. */
import { laySites } from '../screening/sites.js';
import type { RunOf } from '../screening/sites.js';
import type { Database } from '../store/database.js';
import { quoteText } from '../store/sql.js';
import { CSV_OPTIONS, firstColumn, guardedText } from './spreadsheet.js';

/** How the file begins. */
export const SITES_BEGIN = '\ufeffsite,site_buildings,';

/**
 * Writes every building of every site of two or more to `path`, sites and buildings in the order of the reports; guarded for spreadsheets.
 * The folder must be open to `db`.
 * @returns false, with nothing written, where there is no site.
 */
export async function writeSitesCsv(db: Database, run: RunOf, path: string): Promise<boolean> {
  if ((await laySites(db, run)).sites === 0) return false;
  const id = String(Math.trunc(run.run_id));
  const inventory = quoteText(run.inventory_id);
  await db.run(
    `COPY (SELECT ${guardedText('o.id')} AS ${firstColumn('site')}, s.buildings AS site_buildings, s.ranked AS site_ranked,
       s.best_rank AS site_best_rank, CAST(s.chance AS FLOAT) AS site_chance, CAST(s.expected_in_list AS FLOAT) AS site_expected_in_list,
       CAST(s.people_exposed AS FLOAT) AS site_people_exposed, ${guardedText('b.id')} AS id, ${guardedText('b.name')} AS name,
       CASE WHEN m.building_index = s.main_index THEN 'yes' ELSE 'no' END AS main_building, k."rank", k.in_list,
       CAST(k.chance AS FLOAT) AS chance, CAST(a.people_exposed AS FLOAT) AS people_exposed, ${guardedText('a.not_ranked')} AS not_ranked
     FROM site_member m JOIN site s USING (place)
     JOIN building o ON o.inventory_id = ${inventory} AND o.building_index = s.main_index
     JOIN building b ON b.inventory_id = ${inventory} AND b.building_index = m.building_index
     JOIN result_ranked k ON k.run_id = ${id} AND k.building_index = m.building_index
     JOIN result_assessed a ON a.run_id = ${id} AND a.building_index = m.building_index
     ORDER BY s.place, k."rank" NULLS LAST, m.building_index) TO ${quoteText(path)} ${CSV_OPTIONS}`,
  );
  return true;
}

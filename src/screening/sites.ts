/** Sites: main buildings with the wings and additions joined to them, and what the ranks of the members say of the whole. */
import type { PageSites, Site } from '../engineering/page-contract.js';
import { siteFigures } from '../engineering/priority/sites.js';
import { Bug } from '../errors.js';
import { rootsOf } from '../inventory/part-of.js';
import type { Database } from '../store/database.js';

/** A run by its number, with its inventory. */
export interface RunOf {
  readonly run_id: number;
  readonly inventory_id: string;
}

/** Members a page names of one site; the file sites.csv has all. */
const MEMBERS_TOLD = 40;

/** How many sites of two buildings or more a run has, and how many buildings they are. */
export interface SiteCount {
  readonly sites: number;
  readonly buildings: number;
}

/**
 * Makes the temporary tables `site` (place, main_index, figures; the likeliest first) and `site_member` (place, building_index) of a run, and counts
 * them. Where no building is part of another they stay empty, which costs one look at a column.
 */
export async function laySites(db: Database, { run_id, inventory_id }: RunOf): Promise<SiteCount> {
  await db.run(`CREATE OR REPLACE TEMP TABLE site (place INTEGER, main_index INTEGER, buildings INTEGER, ranked INTEGER, best_rank INTEGER,
    chance DOUBLE, expected_in_list DOUBLE, people_exposed DOUBLE)`);
  await db.run('CREATE OR REPLACE TEMP TABLE site_member (place INTEGER, building_index INTEGER)');
  const number = await db.value('SELECT inventory_number FROM inventory WHERE inventory_id = ?', [inventory_id]);
  if (typeof number !== 'number') throw new Bug(`inventory ${inventory_id} is not in the database`);
  const links = await db.columns(
    `SELECT e.building_index AS part, m.building_index AS main FROM
       (SELECT building_index, part_of FROM building_extra WHERE inventory_number = ? AND part_of IS NOT NULL) e
     JOIN building_core m ON m.inventory_number = ? AND m.id = e.part_of WHERE m.building_index <> e.building_index ORDER BY part`,
    { part: 'i32', main: 'i32' },
    [number, number],
  );
  if (links.rowCount === 0) return { sites: 0, buildings: 0 };
  const { root } = rootsOf(links.part, links.main);
  await db.run('CREATE OR REPLACE TEMP TABLE site_link (main_index INTEGER, building_index INTEGER)');
  await db.appendTemporary('site_link', [root, links.part]);
  // the root of a circle has a link of its own: it counts once
  const member = await db.columns(
    `SELECT s.main_index, s.building_index, k."rank", k.chance, a.people_exposed FROM
       (SELECT main_index, building_index FROM site_link UNION SELECT main_index, main_index FROM site_link) s
     JOIN result_ranked k ON k.run_id = ? AND k.building_index = s.building_index
     JOIN result_assessed a ON a.run_id = ? AND a.building_index = s.building_index
     ORDER BY s.main_index, k."rank" NULLS LAST, s.building_index`,
    { main_index: 'i32', building_index: 'i32', rank: 'f64', chance: 'f64', people_exposed: 'f64' },
    [run_id, run_id],
  );
  await db.run('DROP TABLE site_link');
  const { main_index: main, rank, chance, people_exposed: people } = member;
  const mains: number[] = [];
  const sizes: number[] = [];
  const figures: ReturnType<typeof siteFigures>[] = [];
  for (let from = 0; from < member.rowCount;) {
    let to = from + 1;
    while (to < member.rowCount && main[to] === main[from]) to += 1;
    mains.push(main[from]!);
    sizes.push(to - from);
    figures.push(siteFigures({ rank, chance, people }, from, to));
    from = to;
  }
  const whole = (value: number): number => (Number.isNaN(value) ? -1 : value);
  await db.run('CREATE OR REPLACE TEMP TABLE site_figures AS SELECT * EXCLUDE (place) FROM site LIMIT 0');
  await db.appendTemporary('site_figures', [
    Int32Array.from(mains),
    Int32Array.from(sizes),
    Int32Array.from(figures, ({ ranked }) => ranked),
    Int32Array.from(figures, ({ bestRank }) => whole(bestRank)),
    Float64Array.from(figures, (each) => each.chance),
    Float64Array.from(figures, ({ expected }) => expected),
    Float64Array.from(figures, (each) => each.people),
  ]);
  await db.run(`INSERT INTO site SELECT row_number() OVER (ORDER BY chance DESC NULLS LAST, best_rank NULLS LAST, main_index), * FROM
    (SELECT * REPLACE (nullif(best_rank, -1) AS best_rank) FROM site_figures)`);
  await db.run('DROP TABLE site_figures');
  await db.run('CREATE OR REPLACE TEMP TABLE site_of (main_index INTEGER, building_index INTEGER)');
  await db.appendTemporary('site_of', [main, member.building_index]);
  await db.run(
    'INSERT INTO site_member SELECT s.place, o.building_index FROM site_of o JOIN site s USING (main_index)',
  );
  await db.run('DROP TABLE site_of');
  return { sites: mains.length, buildings: member.rowCount };
}

interface SiteRow extends Omit<Site, 'members'> {
  readonly place: number;
}

/** The sites laid whose place stands in the table `places`, with their first members; in their order. */
async function readSites(
  db: Database,
  { run_id, inventory_id }: RunOf,
  places: string,
  most: number,
): Promise<readonly Site[]> {
  const sites = await db.rows<SiteRow>(
    `SELECT s.place, b.id, b.name, s.* EXCLUDE (place, main_index) FROM site s SEMI JOIN ${places} p ON p.place = s.place
     JOIN building b ON b.inventory_id = ? AND b.building_index = s.main_index ORDER BY s.place`,
    [inventory_id],
  );
  const members = await db.rows<Site['members'][number] & { readonly place: number }>(
    `SELECT m.place, b.id, b.name, k."rank", k.chance, a.not_ranked FROM site_member m SEMI JOIN ${places} p ON p.place = m.place
     JOIN result_ranked k ON k.run_id = ? AND k.building_index = m.building_index
     JOIN result_assessed a ON a.run_id = ? AND a.building_index = m.building_index
     JOIN building b ON b.inventory_id = ? AND b.building_index = m.building_index
     QUALIFY row_number() OVER (PARTITION BY m.place ORDER BY k."rank" NULLS LAST, m.building_index) <= ${String(most)}
     ORDER BY m.place, k."rank" NULLS LAST, m.building_index`,
    [run_id, run_id, inventory_id],
  );
  const of = new Map<number, Site['members'][number][]>(sites.map(({ place }) => [place, []]));
  for (const { place, ...member } of members) of.get(place)!.push(member);
  return sites.map(({ place, ...site }) => ({ ...site, members: of.get(place)! }));
}

/** The sites a page tells of: all that have a building among those in the temporary table `page_place`. */
export async function pageSites(
  db: Database,
  run: RunOf,
): Promise<{ readonly sites: PageSites; readonly siteOf: readonly (number | null)[] }> {
  const { sites: all, buildings } = await laySites(db, run);
  await db.run(
    'CREATE OR REPLACE TEMP TABLE site_shown AS SELECT DISTINCT m.place FROM site_member m SEMI JOIN page_place p USING (building_index)',
  );
  const sites = all === 0 ? [] : await readSites(db, run, 'site_shown', MEMBERS_TOLD);
  const at = await db.columns(
    `SELECT n.at FROM page_place p LEFT JOIN site_member m USING (building_index)
     LEFT JOIN (SELECT place, row_number() OVER (ORDER BY place) - 1 AS at FROM site_shown) n ON n.place = m.place ORDER BY p.place`,
    { at: 'f64' },
  );
  await dropSites(db, 'site_shown');
  return {
    sites: { all, buildings, sites },
    siteOf: Array.from(at.at, (place) => (Number.isNaN(place) ? null : place)),
  };
}

/** The site of the building at `index` with all its members; null where it stands by itself. */
export async function siteOfBuilding(db: Database, run: RunOf, index: number): Promise<Site | null> {
  if ((await laySites(db, run)).sites === 0) return null;
  await db.run(
    `CREATE OR REPLACE TEMP TABLE site_asked AS SELECT place FROM site_member WHERE building_index = ${String(Math.trunc(index))}`,
  );
  const [site] = await readSites(db, run, 'site_asked', Number.MAX_SAFE_INTEGER);
  await dropSites(db, 'site_asked');
  return site ?? null;
}

async function dropSites(db: Database, own: string): Promise<void> {
  for (const table of [own, 'site_member', 'site']) await db.run(`DROP TABLE IF EXISTS ${table}`);
}

import { rmSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { unpackPage } from '../../src/browser/unpack.js';
import { assess, isRanked } from '../../src/engineering/assess/assess.js';
import { compileContext } from '../../src/engineering/assess/context.js';
import { buildingAt } from '../../src/engineering/building-columns.js';
import { RESULT_COLUMNS } from '../../src/engineering/results.js';
import { gridsOf } from '../../src/engineering/spectrum/grid-carry.js';
import { writeRejectsCsv } from '../../src/exports/rejects.js';
import { packPage } from '../../src/reports/dashboard/pack.js';
import { scriptJson } from '../../src/reports/html.js';
import { compareRuns } from '../../src/screening/compare-runs.js';
import { explainBuilding } from '../../src/screening/explain.js';
import { gridRejectsSql } from '../../src/screening/grid-rejects.js';
import { pageDataOf, readRun } from '../../src/screening/page-data.js';
import { baseRun, parameterChanges, refresh } from '../../src/screening/refresh.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import type { Database } from '../../src/store/database.js';
import { quoteText } from '../../src/store/sql.js';
import { loadStudy, loadStudyAlone, withFiles } from '../../src/study/load.js';
import type { LoadedStudy } from '../../src/study/load.js';
import { parameterFromText, withParameters } from '../../src/study/parameters.js';
import {
  ENTRY,
  GRID_PERIODS_S,
  TWO_GRIDS,
  flat,
  gridCopy,
  gridCsv,
  rising,
  withHazard,
} from '../support/hazard-grid.js';
import { MADE } from '../support/study-folder.js';

const RESULTS = `SELECT building_index, ${RESULT_COLUMNS.map(({ name }) => `"${name}"`).join(', ')}
  FROM result WHERE run_id = ? ORDER BY building_index`;
const RUN = `SELECT title, study_fingerprint, methods_fingerprint, settings, summary, ranked FROM run WHERE run_id = ?`;
const kept = async (db: Database, run: number): Promise<unknown> => [
  await db.rows(RESULTS, [run]),
  await db.rows(RUN, [run]),
];

/** Screens the study at `path` and hands over its database. */
async function screened<T>(path: string, work: (db: Database, loaded: LoadedStudy) => Promise<T>): Promise<T> {
  const loaded = await loadStudy(path);
  const db = await openStudyDatabase(loaded, false, [dirname(path)]);
  try {
    await screen(db, loaded, { made: MADE });
    return await work(db, loaded);
  } finally {
    db.close();
  }
}

const GRIDS = { 'h475.csv': gridCsv(rising(1)), 'h2475.csv': gridCsv(rising(1.8)) };

/** The page computes each building again from what it carries: the same bits. */
async function pageAgrees(db: Database, run: number): Promise<number> {
  const page = unpackPage(scriptJson(packPage(await pageDataOf(db, run, 'si'))));
  const { inputs, pools, results } = page.buildings;
  const context = compileContext(page.settings, gridsOf(page.grids));
  let ranked = 0;
  inputs.id.forEach((_, i) => {
    const result = assess(buildingAt(inputs, i, pools), context);
    const stored = results['ln_priority']?.[i] ?? null;
    expect(isRanked(result) ? result.lnPriority : null).toBe(stored);
    if (stored !== null) ranked += 1;
  });
  return ranked;
}

describe('a study whose level reads a grid', () => {
  it(
    'equals the same study with one table, to the last bit, where the grid is the same everywhere',
    { timeout: 120_000 },
    async () => {
      const table = (scale: number, years: number): string =>
        `{code: table, periods_s: [${GRID_PERIODS_S.join(', ')}], ordinates_g: [${GRID_PERIODS_S.map((_, p) => flat(scale)(0, 0, p)).join(', ')}], interpolation: log-log, return_period_years: ${String(years)}}`;
      const levels = '    - {title: design level, spectrum: one}\n    - {title: rare level, spectrum: two}\n';
      const results = async (spectra: string): Promise<unknown> =>
        screened(
          gridCopy(withHazard(spectra, levels), { 'a.csv': gridCsv(flat()), 'b.csv': gridCsv(flat(1.7)) }, true),
          (db) => db.rows(RESULTS, [1]),
        );
      const grid = await results(
        `    one: ${ENTRY('a.csv', 475, 'log-log')}\n    two: ${ENTRY('b.csv', 2475, 'log-log')}\n`,
      );
      expect(grid).toEqual(await results(`    one: ${table(1, 475)}\n    two: ${table(1.7, 2475)}\n`));
      expect((grid as unknown[]).length).toBeGreaterThan(200);
    },
  );

  it(
    'reads what SQL reads: bilinear in ln S_a between nodes, linear between periods',
    { timeout: 120_000 },
    async () => {
      await screened(gridCopy(TWO_GRIDS, GRIDS), async (db, loaded) => {
        // an independent calculation: DuckDB's own csv reader, ln, exp and arithmetic, nothing of ours but the places and periods stored
        const file = quoteText(join(loaded.folder, 'h475.csv'));
        const columns = GRID_PERIODS_S.map((t) => `"SA(${String(t)}) [g]"`);
        const rows = await db.rows<{ id: string; ours: number; theirs: number }>(`
        WITH node AS (SELECT lon, lat, p.t, ln(p.v) AS l FROM (SELECT lon, lat, unnest([${columns.map((c, i) => `{t: ${String(GRID_PERIODS_S[i])}, v: ${c}}`).join(', ')}]) AS p FROM read_csv(${file}))),
        site AS (SELECT b.id, b.lon, b.lat, r.sa_g, CASE r.governing WHEN 'transverse' THEN r.period_transverse_s ELSE r.period_longitudinal_s END AS t_g
          FROM result r JOIN run USING (run_id) JOIN building b USING (inventory_id, building_index)
          WHERE run_id = 1 AND r.sa_g IS NOT NULL AND r.case_chance = 1 AND b.height_m_sigma = 0),
        there AS (SELECT s.id, s.sa_g, s.t_g, n.t, exp(sum(n.l * (1 - abs(s.lon - n.lon) / 0.005) * (1 - abs(s.lat - n.lat) / 0.005))) AS v
          FROM site s JOIN node n ON abs(s.lon - n.lon) < 0.005 AND abs(s.lat - n.lat) < 0.005 GROUP BY ALL),
        held AS (SELECT *, greatest(t_g, arg_max(t, v) OVER (PARTITION BY id)) AS read_s, lead(t) OVER o AS t2, lead(v) OVER o AS v2 FROM there WINDOW o AS (PARTITION BY id ORDER BY t))
        SELECT id, sa_g AS ours, v + (v2 - v) * (read_s - t) / (t2 - t) AS theirs FROM held WHERE t <= read_s AND read_s < t2 ORDER BY id`);
        expect(rows.length).toBeGreaterThan(60);
        // the stored period is the median one and sa_g that of the leading case: the same where system and height are known
        for (const { id, ours, theirs } of rows) expect(Math.abs(ours / theirs - 1), id).toBeLessThan(1e-9);
        expect(new Set(rows.map(({ ours }) => ours)).size).toBeGreaterThan(rows.length / 2);
      });
    },
  );

  it(
    'is the same in its page, explained with the files gone, and refreshed with them gone',
    { timeout: 120_000 },
    async () => {
      const path = gridCopy(TWO_GRIDS, GRIDS);
      await screened(path, async (db) => {
        const first = await kept(db, 1);
        for (const name of Object.keys(GRIDS)) rmSync(join(dirname(path), name));
        expect(await pageAgrees(db, 1)).toBeGreaterThan(200);
        const { stored, result, steps } = await explainBuilding(db, 1, 'SC-019', 'si');
        expect(isRanked(result) && result.lnPriority).toBe(stored['ln_priority']);
        expect(steps.some(({ method }) => method === 'grid/spectrum/bilinear')).toBe(true);
        await expect(loadStudy(path)).rejects.toThrow('no such file');
        const alone = await withFiles(await loadStudyAlone(path), { leaveMissing: true });
        const base = await baseRun(db, alone, 1);
        const again = await refresh(db, base, alone, { made: MADE });
        expect(await kept(db, again.runId)).toEqual(first);
        // another unit cannot be read from what is kept
        const other = await withParameters(alone, [parameterFromText('hazard.spectra.h475.unit=m/s2')], {
          leaveMissing: true,
        });
        await expect(refresh(db, base, other, { made: MADE })).rejects.toThrow('no such file');
        // kept once, for both runs
        expect(await db.rows('SELECT count(*) AS grids FROM hazard_grid')).toEqual([{ grids: 2 }]);
      });
    },
  );

  it(
    'refreshes to another grid as a whole screening with it would, and back; the comparison says what it did',
    { timeout: 120_000 },
    async () => {
      const east = gridCsv(rising(1.3), { west: -40.015 });
      const path = gridCopy(TWO_GRIDS, { ...GRIDS, 'east.csv': east });
      const whole = await screened(
        gridCopy((text) => TWO_GRIDS(text).replace('h475.csv', 'east.csv'), { ...GRIDS, 'east.csv': east }),
        (db) => kept(db, 1),
      );
      await screened(path, async (db, loaded) => {
        const first = await kept(db, 1);
        const changed = await withParameters(loaded, [parameterFromText('hazard.spectra.h475.file=east.csv')]);
        const base = await baseRun(db, loaded, 1);
        expect((await refresh(db, base, changed, { made: MADE })).runId).toBe(2);
        expect(await kept(db, 2)).toEqual(whole);
        await refresh(db, await baseRun(db, loaded, 2), loaded, { made: MADE });
        expect(await kept(db, 3)).toEqual(first);
        expect(parameterChanges(base, changed).map(({ path: at }) => at.join('.'))).toEqual([
          'hazard.spectra.h475.file',
          'hazard.spectra.h475.grid',
        ]);
        const { settings, buildings } = await compareRuns({ db, runId: 1 }, { db, runId: 2 });
        expect(settings.map(({ path: at }) => at)).toEqual(
          expect.arrayContaining(['hazard.spectra.h475.file', 'hazard.spectra.h475.grid']),
        );
        const moved = buildings.find(({ parts }) => parts !== null)!;
        // S_a is 1.3 times what it was
        const { before, after, parts } = moved;
        expect(after!.sa_g / before!.sa_g).toBeCloseTo(1.3, 10);
        expect(parts!.demand).toBeCloseTo(((before!.slope_k + after!.slope_k) / 2) * Math.log(1.3), 10);
        expect(parts!.capacity).toBe(0);
        // the town's west lies outside: its buildings are out of the ranking and named
        const gone = buildings.filter(({ not_ranked }) => not_ranked === 'outside the hazard grid "h475"');
        expect(gone.length).toBeGreaterThan(0);
        // a file of the same name with other contents is another grid
        writeFileSync(join(dirname(path), 'h475.csv'), gridCsv(rising(1.1)));
        const edited = await loadStudy(path);
        expect(parameterChanges(base, edited).map(({ path: at }) => at.join('.'))).toEqual([
          'hazard.spectra.h475.grid',
        ]);
        const newest = await refresh(db, base, edited, { made: MADE });
        expect((await readRun(db, newest.runId)).study_fingerprint).not.toBe((await readRun(db, 1)).study_fingerprint);
      });
    },
  );

  it(
    'keeps the buildings it does not reach in the account, and names each among the rejects',
    { timeout: 120_000 },
    async () => {
      const path = gridCopy(TWO_GRIDS, { ...GRIDS, 'h475.csv': gridCsv(rising(1), { west: -40.015 }) });
      await screened(path, async (db, loaded) => {
        const run = await readRun(db, 1);
        const { summary } = await pageDataOf(db, 1, 'si');
        expect(summary.account.reduce((sum, { rows }) => sum + rows, 0)).toBe(summary.rows_in);
        const reasons = new Map(summary.not_ranked.map(({ reason, count }) => [reason, count]));
        const outside = reasons.get('outside the hazard grid "h475"')!;
        expect(outside).toBeGreaterThan(20);
        expect(reasons.get('no coordinates on record, which the hazard grid "h475" needs')).toBe(2);
        // own count: ranked ones lie east of the first line
        const east = await db.value(
          'SELECT min(b.lon) FROM result r JOIN run USING (run_id) JOIN building b USING (inventory_id, building_index) WHERE run_id = 1 AND r.not_ranked IS NULL',
        );
        expect(east).toBeGreaterThanOrEqual(-40.015);
        const codes = new Map(summary.findings.map(({ code, count }) => [code, count]));
        expect([codes.get('outside-grid'), codes.get('no-coordinates')]).toEqual([outside, 2]);
        const file = join(loaded.folder, 'rejects.csv');
        await writeRejectsCsv(db, run.inventory_id, file, gridRejectsSql(run));
        const rows = await db.rows<{ id: string; row: number; column: string; value: string | null; message: string }>(
          `SELECT id, "row", "column", value, message FROM read_csv(${quoteText(file)}, all_varchar = true) WHERE kind = 'rejected-building' AND code = 'outside-grid' ORDER BY id`,
        );
        expect(rows).toHaveLength(outside);
        for (const { id, value, message, column } of rows) {
          expect(message).toBe(`building ${id} has its place outside the hazard grid h475`);
          expect(column).toBe('lon, lat');
          expect(value).toMatch(/^'?-40\.0\d+, 35\.0\d+$/);
        }
      });
    },
  );

  it('stands beside a level of named spectra, either of them first', { timeout: 120_000 }, async () => {
    const codes = ['b', 'c', 'd']
      .map(
        (site, i) =>
          `    rare-${site}: {code: asce7-22-two-period, sds_g: ${String(1.6 + 0.1 * i)}, sd1_g: ${String(0.7 + 0.1 * i)}, tl_s: 8, return_period_years: 2475}\n`,
      )
      .join('');
    const levels = [
      '    - {title: map, spectrum: h475}\n',
      '    - {title: classes, by: site_class, spectra: {B: rare-b, C: rare-c, D: rare-d}, otherwise: rare-d}\n',
    ];
    const spectra = `    h475: ${ENTRY('h475.csv', 475)}\n${codes}`;
    for (const order of [levels, levels.toReversed()]) {
      await screened(gridCopy(withHazard(spectra, order.join('')), GRIDS), async (db) => {
        expect(await pageAgrees(db, 1)).toBeGreaterThan(200);
        const { summary, settings } = await readRun(db, 1);
        for (const { k, how } of summary.slopes) {
          // own arithmetic on what the sentence prints, the slope kept within 1 to 5
          const [, t2, t1, s2, s1] = /ln\(([\d.]+) \/ ([\d.]+)\) \/ ln\(([\d.]+) \/ ([\d.]+)\)/.exec(how)!.map(Number);
          expect(k, how).toBeCloseTo(Math.max(1, Math.min(5, Math.log(t2! / t1!) / Math.log(s2! / s1!))), 1);
          // the median lies between the 5th and the 95th percentile, and apart from the ends
          const [, low, high] = /for the middle 90 % of them k would be ([\d.]+) to ([\d.]+)/.exec(how)!.map(Number);
          expect(high! - low!, how).toBeGreaterThan(0.05);
          expect((k - low!) / (high! - low!), how).toBeGreaterThan(0.1);
          expect((k - low!) / (high! - low!), how).toBeLessThan(0.9);
        }
        expect(Object.keys(settings.slope)).toEqual(order === levels ? ['h475'] : ['rare-b', 'rare-c', 'rare-d']);
        const second = await db.value('SELECT count(DISTINCT sa_level_2_g) FROM result WHERE run_id = 1');
        expect(second).toBeGreaterThan(50);
      });
    }
  });
});

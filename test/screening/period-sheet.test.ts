import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { isRanked } from '../../src/engineering/assess/assess.js';
import type { Estimate } from '../../src/engineering/assess/estimate.js';
import { DIRECTIONS } from '../../src/engineering/direction.js';
import { explainBuilding } from '../../src/screening/explain.js';
import { periodClass, periodSheet } from '../../src/screening/period-sheet.js';
import { STRUCTURE_SPEC } from '../../src/screening/read-buildings.js';
import { openStudyDatabase } from '../../src/screening/screen.js';
import type { Database } from '../../src/store/database.js';
import { loadStudy } from '../../src/study/load.js';
import { screenedDemo } from '../support/screened-demo.js';

/** Rows that know anything of their structure know one of these. */
const STRUCTURE = Object.keys(STRUCTURE_SPEC).map((name) => `CAST(b."${name}" AS VARCHAR)`);

let db: Database;
const runId = 1;

beforeAll(async () => {
  db = await openStudyDatabase(await loadStudy(await screenedDemo()));
}, 120_000);
afterAll(() => {
  db.close();
});

const usedOf = (estimates: readonly Estimate[]): number => {
  const outcome = estimates[0]?.outcome;
  return outcome?.applies === true ? outcome.period_s : NaN;
};

describe('periodSheet', () => {
  it(
    'shows the period of the run, and the hand calculation ends in what is stored, for buildings with a structure',
    { timeout: 120_000 },
    async () => {
      const rows = await db.rows<{ id: string }>(
        `SELECT b.id FROM result r JOIN run USING (run_id)
         JOIN building b ON b.inventory_id = run.inventory_id AND b.building_index = r.building_index
         WHERE r.run_id = ? AND r.rank IS NOT NULL AND coalesce(${STRUCTURE.join(', ')}) IS NOT NULL ORDER BY b.id`,
        [runId],
      );
      let known = 0;
      let sure = 0;
      // every second is enough: all of them take as long as ten other tests
      for (const { id } of rows.filter((_, i) => i % 2 === 0)) {
        const { building, result, steps, stored } = await explainBuilding(db, runId, id, 'si');
        if (building.structure === null || !isRanked(result)) continue;
        known += 1;
        for (const direction of DIRECTIONS) {
          const { p16_s, p50_s, p84_s } = result.period[direction];
          expect([p16_s, p50_s, p84_s], id).toEqual([
            stored[`period_${direction}_16_s`],
            stored[`period_${direction}_s`],
            stored[`period_${direction}_84_s`],
          ]);
        }
        expect([result.leading.evidence, result.leading.basis], id).toEqual([
          stored['period_evidence'],
          stored['period_basis'],
        ]);
        expect(steps.map(({ value }) => value)).toContain(stored['sa_g']);
        const sheet = await periodSheet(db, runId, id);
        if (building.system === null || building.height_m.sigma > 0) continue;
        sure += 1;
        for (const direction of DIRECTIONS)
          expect(usedOf(sheet.directions[direction]), `${id} ${direction}`).toBe(stored[`period_${direction}_s`]);
      }
      expect([known > 15, sure > 10]).toEqual([true, true]);
    },
  );

  it('refuses a building that is not in the run', async () => {
    await expect(periodSheet(db, runId, 'BH-0020')).rejects.toThrow(/no building "BH-0020" in run 1; nearest: .*BH-/);
  });
});

describe('periodClass', () => {
  it('gathers the directions of every building of the system, the blocks adding up to all', async () => {
    const system = 'unreinforced-masonry-wall';
    const every = await periodClass(db, runId, system);
    const groups = await db.rows<{ group: string }>(
      `SELECT DISTINCT b."group" FROM building b JOIN result r USING (building_index)
       WHERE b."system" = ? AND r.not_ranked IS NULL AND b."group" IS NOT NULL`,
      [system],
    );
    let buildings = 0;
    for (const { group } of groups) buildings += (await periodClass(db, runId, system, group)).buildings;
    const without = await db.value(
      `SELECT count(*) FROM building b JOIN result r USING (building_index)
       WHERE b."system" = ? AND r.not_ranked IS NULL AND b."group" IS NULL`,
      [system],
    );
    expect(buildings + Number(without)).toBe(every.buildings);
    expect(every.directions).toBeLessThanOrEqual(2 * every.buildings);
    expect(every.estimates[0]).toMatchObject({ kind: 'used', applies: every.directions, over_used: 1 });
  });

  // source: DuckDB, over the stored medians; height given and nothing across, so that the period used is the stored one
  it('agrees with the stored periods', async () => {
    const [row] = await db.rows<{ n: number; p50: number }>(
      `WITH t AS (SELECT unnest([r.period_longitudinal_s, r.period_transverse_s]) AS t FROM result r JOIN run USING (run_id)
         JOIN building b ON b.inventory_id = run.inventory_id AND b.building_index = r.building_index
         WHERE r.run_id = ? AND b."system" = 'steel-moment-frame' AND r.rank IS NOT NULL)
       SELECT count(*) AS n, quantile_cont(t, 0.5) AS p50 FROM t`,
      [runId],
    );
    const { estimates, directions } = await periodClass(db, runId, 'steel-moment-frame');
    expect(directions).toBe(Number(row!.n));
    // inferred heights are integrated over in the result and not here
    expect(Math.abs((estimates[0]?.median_s ?? NaN) / row!.p50 - 1)).toBeLessThan(0.02);
  });

  it('says when there is no such building', async () => {
    await expect(periodClass(db, runId, 'steel-light-frame', 'Nowhere')).rejects.toThrow('in block "Nowhere"');
  });
});

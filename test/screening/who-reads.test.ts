import { describe, expect, it } from 'vitest';
import { unpackPage } from '../../src/browser/unpack.js';
import { assess, isRanked } from '../../src/engineering/assess/assess.js';
import { compileContext } from '../../src/engineering/assess/context.js';
import { buildingAt } from '../../src/engineering/building-columns.js';
import { packPage } from '../../src/reports/dashboard/pack.js';
import { scriptJson } from '../../src/reports/html.js';
import { explainBuilding } from '../../src/screening/explain.js';
import { pageDataOf } from '../../src/screening/page-data.js';
import { baseRun, refresh } from '../../src/screening/refresh.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import type { Database } from '../../src/store/database.js';
import { loadStudy } from '../../src/study/load.js';
import { MADE, demoCopy } from '../support/study-folder.js';

const BY_CLASS =
  /by: site_class, spectra: \{B: (design|rare)-b, C: (?:design|rare)-c, D: (?:design|rare)-d\}, otherwise: (?:design|rare)-d/g;
const results = (db: Database, run: number): Promise<unknown> =>
  db.rows(
    'SELECT building_index, "rank", ln_priority, spectrum, slope_k, flags FROM result WHERE run_id = ? ORDER BY 1',
    [run],
  );

/** The page computes each building again from what it carries: the same bits. */
async function pageAgrees(db: Database, run: number): Promise<number> {
  const page = unpackPage(scriptJson(packPage(await pageDataOf(db, run, 'si'))));
  const { inputs, pools } = page.buildings;
  const context = compileContext(page.settings);
  const kept = await db.rows<{ id: string; ln_priority: number }>(
    'SELECT b.id, r.ln_priority FROM result r JOIN run USING (run_id) JOIN building b USING (inventory_id, building_index) WHERE run_id = ? AND r.ln_priority IS NOT NULL',
    [run],
  );
  for (const { id, ln_priority } of kept) {
    const result = assess(buildingAt(inputs, inputs.id.indexOf(id), pools), context);
    expect(isRanked(result) ? result.lnPriority : result).toBe(ln_priority);
  }
  return kept.length;
}

describe('a study whose levels read velocities', () => {
  it(
    'gives each building the class of its velocity, flags the others, and the same bits everywhere',
    { timeout: 120_000 },
    async () => {
      const loaded = await loadStudy(
        demoCopy({
          study: (text) =>
            text.replaceAll(
              BY_CLASS,
              'by: vs30, classes: asce7-16, spectra: {B: $1-b, C: $1-c, D: $1-d, E: $1-d}, otherwise: $1-d',
            ),
        }),
      );
      const db = await openStudyDatabase(loaded);
      try {
        const { runId } = await screen(db, loaded, { made: MADE });
        const velocities = await db.rows<{ id: string; vs30_mps: number; spectrum: string; flags: string }>(
          `SELECT b.id, b.vs30_mps, r.spectrum, r.flags FROM result r JOIN run USING (run_id)
         JOIN building b USING (inventory_id, building_index) WHERE b.vs30_mps IS NOT NULL ORDER BY 1`,
        );
        expect(velocities.length).toBeGreaterThan(0);
        for (const { vs30_mps, spectrum } of velocities) {
          // ASCE/SEI 7-16 table 20.3-1: B above 760, C above 360 m/s
          expect(spectrum).toBe(vs30_mps > 760 ? 'design-b' : vs30_mps > 360 ? 'design-c' : 'design-d');
        }
        const first = velocities[0]!;
        const { steps, result } = await explainBuilding(db, runId, first.id, 'si');
        expect(JSON.stringify(steps)).toContain('of ASCE/SEI 7-16, table 20.3-1');
        expect(isRanked(result) && result.slope_k).toBeGreaterThan(1);
        expect(await pageAgrees(db, runId)).toBeGreaterThan(200);
        const again = await refresh(db, await baseRun(db, loaded, runId), loaded, { made: MADE });
        expect(await results(db, again.runId)).toEqual(await results(db, runId));
        const summary = JSON.stringify(again.summary.assumptions);
        expect(summary).toContain('ASCE/SEI 7-16, table 20.3-1');
      } finally {
        db.close();
      }
    },
  );
});

describe('a study whose inventory names the spectra', () => {
  it(
    'reads them, takes k from the second level of the same words, and leaves out names it does not have',
    { timeout: 120_000 },
    async () => {
      const named: Readonly<Record<string, string>> = { 'BH-002': 'hill', 'BH-005': 'quay', 'BH-006': 'moor' };
      const loaded = await loadStudy(
        demoCopy({
          inventory: (text) =>
            text
              .split(/\r?\n/)
              .map((line, i) => {
                const id = line.split(',')[0] ?? '';
                return line === '' ? line : `${line},${i === 0 ? 'Curve' : (named[id] ?? 'quay')}`;
              })
              .join('\n'),
          study: (text) =>
            text
              .replaceAll(
                /by: site_class, spectra: \{B: (design|rare)-b, .*\}\n/g,
                'by: spectrum, spectra: {hill: $1-b, quay: $1-d}}\n',
              )
              .replace('    vs30_mps: Vs30 (m/s)\n', '$&    spectrum: Curve\n'),
        }),
      );
      const db = await openStudyDatabase(loaded);
      try {
        const { runId, summary } = await screen(db, loaded, { made: MADE });
        const hill = await explainBuilding(db, runId, 'BH-002', 'si');
        expect(hill.building.spectrum).toBe('hill');
        expect(hill.stored['spectrum']).toBe('design-b');
        const quay = await explainBuilding(db, runId, 'BH-005', 'si');
        expect(quay.stored['spectrum']).toBe('design-d');
        const moor = await explainBuilding(db, runId, 'BH-006', 'si').catch((error: unknown) => String(error));
        expect(JSON.stringify(moor)).toContain('no spectrum \\"moor\\" in the study');
        // k = ln(2475/475) / ln(ratio of the ordinates), METHODS 4.4: both spectra have their partner of the second level
        expect(summary.slopes.map(({ spectrum, how }) => [spectrum, /ln\(2475 \/ 475\.0\)/.test(how)])).toEqual([
          ['design-b', true],
          ['design-d', true],
        ]);
        expect(await pageAgrees(db, runId)).toBeGreaterThan(200);
      } finally {
        db.close();
      }
    },
  );
});

import { cpSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import { loadStudy } from '../../src/study/load.js';
import { MADE } from '../support/study-folder.js';

// Data: City of Cambridge (Massachusetts) GIS open data, Public Domain Dedication and License 1.0; see test/fixtures/SOURCES.md.
// The hazard and the code history of this study are assumed, to try the tool.
const folder = mkdtempSync(join(tmpdir(), 'swaymark-assessor-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

describe('screen, on an excerpt of a real assessor table', () => {
  it('merges condominium rows, sets land apart, accounts for every row and says what it does not know', async () => {
    cpSync('test/fixtures/assessor-excerpt.csv', join(folder, 'assessor-excerpt.csv'));
    cpSync('test/fixtures/assessor', join(folder, 'study'), { recursive: true });
    const loaded = await loadStudy(join(folder, 'study', 'study.yaml'));
    const db = await openStudyDatabase(loaded);
    try {
      const { runId, summary } = await screen(db, loaded, { made: MADE });
      expect(summary.rows_in).toBe(50);
      expect(summary.account.reduce((sum, { rows }) => sum + rows, 0)).toBe(50);
      const rows = Object.fromEntries(summary.account.map((line) => [line.kind, line.rows]));
      expect(rows['site-without-building']).toBeGreaterThan(0);
      const merged = await db.value('SELECT max(rows) FROM building');
      expect(merged).toBeGreaterThanOrEqual(5);
      const system = summary.attributes.find(({ attribute }) => attribute === 'system');
      expect(system).toMatchObject({ given: 0, unknown: summary.buildings });
      const height = summary.attributes.find(({ attribute }) => attribute === 'height_m');
      expect(height?.given).toBe(0);
      // 861 square feet are 79.99 m²: the unit of the column is the study's
      expect(
        await db.value("SELECT count(*) FROM building WHERE floor_area_m2_origin = 'given' AND floor_area_m2 > 0"),
      ).toBeGreaterThan(5);
      expect(await db.value('SELECT sum(chance) FROM result WHERE run_id = ?', [runId])).toBeCloseTo(5, 6);
      expect(
        await db.value("SELECT count(*) FROM result WHERE run_id = ? AND flags LIKE '%system-unknown%'", [runId]),
      ).toBe(summary.ranked);
      expect(summary.assumptions.find(({ id }) => id === 'slope')?.source).toBe('assumed');
    } finally {
      db.close();
    }
  });
});

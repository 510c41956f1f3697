import { describe, expect, it } from 'vitest';
import { unpackPage } from '../../src/browser/unpack.js';
import { buildingAt } from '../../src/engineering/building-columns.js';
import { STRUCTURE_NUMBERS, STRUCTURE_WORDS } from '../../src/engineering/structure-columns.js';
import { packPage } from '../../src/reports/dashboard/pack.js';
import { scriptJson } from '../../src/reports/html.js';
import { explainBuilding } from '../../src/screening/explain.js';
import { pageDataOf } from '../../src/screening/page-data.js';
import { knowsStructure } from '../../src/screening/read-buildings.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import { loadStudy } from '../../src/study/load.js';
import { MADE, demoCopy } from '../support/study-folder.js';

/** A study without the columns of the structure that the demo maps. */
function plain(text: string): string {
  const names = [...STRUCTURE_NUMBERS, ...STRUCTURE_WORDS].join('|');
  return text.replaceAll(new RegExp(`^ {4}(?:${names}): .*\n`, 'gm'), '');
}

/** The demo with two more columns, filled for one building and unreadable for another. */
function withWalls(): string {
  const added: Readonly<Record<string, string>> = { 'BH-002': ',5;5;4.5,stuck in rock', 'BH-005': ',five,pinned' };
  return demoCopy({
    inventory: (text) =>
      text
        .split(/\r?\n/)
        .map((line, i) => {
          if (line === '') return line;
          return `${line}${i === 0 ? ',Walls along (m),Footing' : (added[line.split(',')[0] ?? ''] ?? ',,')}`;
        })
        .join('\n'),
    study: (text) =>
      plain(text)
        .replace(
          '    assessment_cost: Assessment cost\n',
          '$&    wall_lengths_longitudinal_m: Walls along (m)\n    base_fixity: Footing\n',
        )
        .replace('\n  base_fixity:\n', '$&    stuck in rock: fixed\n'),
  });
}

describe('what is known of a structure', () => {
  it(
    'comes from the table to the assessment and to the page, in metres and in our words',
    { timeout: 60_000 },
    async () => {
      const loaded = await loadStudy(withWalls());
      const db = await openStudyDatabase(loaded);
      try {
        const { runId } = await screen(db, loaded, { made: MADE });
        const { building } = await explainBuilding(db, runId, 'BH-002', 'si');
        expect(building.structure).toMatchObject({
          wall_lengths_m: { longitudinal: [5, 5, 4.5], transverse: null },
          base_fixity: 'fixed',
          column_count: NaN,
        });
        const other = await explainBuilding(db, runId, 'BH-005', 'si');
        expect(other.building.structure?.base_fixity).toBe('pinned');
        expect(other.building.structure?.wall_lengths_m.longitudinal).toBeNull();
        const page = unpackPage(scriptJson(packPage(await pageDataOf(db, runId, 'si'))));
        const { inputs, pools } = page.buildings;
        expect(buildingAt(inputs, inputs.id.indexOf('BH-002'), pools).structure).toEqual(building.structure);
      } finally {
        db.close();
      }
    },
  );

  it('is not looked for where the inventory has none of it', { timeout: 60_000 }, async () => {
    const path = demoCopy({ study: plain });
    const loaded = await loadStudy(path);
    const db = await openStudyDatabase(loaded);
    try {
      const { runId } = await screen(db, loaded, { made: MADE });
      expect(await knowsStructure(db, (await db.value('SELECT inventory_id FROM inventory')) as string)).toBe(false);
      expect((await explainBuilding(db, runId, 'BH-002', 'si')).building.structure).toBeNull();
      expect((await pageDataOf(db, runId, 'si')).buildings.inputs.structure).toBeUndefined();
    } finally {
      db.close();
    }
  });
});

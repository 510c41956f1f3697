/** The same survey through the program itself: answers on a sheet, `survey --take`, screened again. */
import { writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { NAMES } from '../../../src/engineering/assess/irregularity-found.js';
import type { Building } from '../../../src/engineering/building.js';
import { takeAnswers } from '../../../src/exports/take-answers.js';
import { ANSWER_COLUMNS } from '../../../src/inventory/answers.js';
import { openStudyDatabase, screen } from '../../../src/screening/screen.js';
import { loadStudy } from '../../../src/study/load.js';
import { laid } from './answers.js';
import { Survey } from './measure.js';
import { MADE, listOf, score } from './portfolio.js';
import type { Portfolio } from './portfolio.js';
import type { Choices } from './strategies.js';
import type { World } from './world.js';

const HOURS = 40;

/** Takes what a week of the plan finds in `world` into the study at `path`, screens it again, and says how far the two agree. */
export async function throughTheProgram(
  path: string,
  portfolio: Portfolio,
  choices: Choices,
  world: World,
): Promise<string> {
  const { buildings, contexts, listSize } = portfolio;
  const survey = new Survey(portfolio, world);
  const found = survey.findings(choices.plan, HOURS);
  const known = buildings.map((building, index) => laid(building, survey.truths[index]!, found.get(index) ?? 0));
  const rows = [...found.keys()].map((index) => {
    const [before, after] = [cellsOf(buildings[index]!), cellsOf(known[index]!)];
    const cells = ANSWER_COLUMNS.map((name) => (after[name] === before[name] ? '' : (after[name] ?? '')));
    return [buildings[index]!.id, ...cells];
  });
  const sheet = join(dirname(path), 'answers.csv');
  writeFileSync(sheet, [['id', ...ANSWER_COLUMNS], ...rows].map((row) => `${row.join(',')}\n`).join(''));
  const { answers } = await takeAnswers(path, sheet, MADE);
  const loaded = await loadStudy(path);
  const db = await openStudyDatabase(loaded);
  try {
    const { runId, taken } = await screen(db, loaded, { made: MADE });
    const results = await db.rows<{ id: string; ln_priority: number; in_list: string }>(
      `SELECT b.id, r.ln_priority, CAST(r.in_list AS VARCHAR) AS in_list FROM result r
       JOIN building b ON b.building_index = r.building_index AND b.inventory_id = ?
       WHERE r.run_id = ? AND r.rank IS NOT NULL`,
      [taken.inventoryId, runId],
    );
    const scored = known.map((building) => score(building, contexts)!);
    const ours = new Set([...listOf(known, scored, listSize)].map((index) => buildings[index]!.id));
    const at = new Map(buildings.map(({ id }, index) => [id, index]));
    const same = results.filter(({ id, in_list }) => in_list === 'yes' && ours.has(id)).length;
    const apart = results.filter(
      ({ id, ln_priority }) => !(Math.abs(ln_priority - scored[at.get(id)!]!.median) < 1e-6),
    );
    const visited = apart.filter(({ id }) => found.has(at.get(id)!));
    return `through the program: ${String(answers)} answers of ${String(HOURS)} h of the plan taken by survey --take, screened again: ${String(same)} of the ${String(listSize)} places are those in memory; ln S differs for ${String(apart.length)} of ${String(results.length)} buildings, ${String(visited.length)} of them visited (neighbours' years, sizes inferred anew)`;
  } finally {
    db.close();
  }
}

/** The cells a survey answers, as they stand for a building. */
function cellsOf(building: Building): Readonly<Record<string, string | undefined>> {
  const text = (value: number): string | undefined => (Number.isFinite(value) ? String(value) : undefined);
  const { storeys, height_m, years } = building;
  return {
    system: building.system ?? undefined,
    year_built: years.length === 1 ? text(years[0]!) : undefined,
    storeys_above: storeys.sigma > 0 ? undefined : text(storeys.value),
    height_m: height_m.sigma > 0 ? undefined : text(height_m.value),
    ...Object.fromEntries(NAMES.map((name) => [name, building[name] ?? undefined])),
    use: building.use === 'unknown' ? undefined : building.use,
    occupants_peak: text(building.occupants_peak),
    design_base_shear_coefficient: text(building.design_base_shear_coefficient),
    design_level: building.design_level ?? undefined,
  };
}

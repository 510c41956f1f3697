/** What was looked at before the ranking: said by every report, from the values of the run. */
import { formatCount } from '../engineering/format.js';
import type { Database } from '../store/database.js';

const OWN_WORK = 'Desk screening: Swaymark itself visited nothing and read no drawings.';

/** Buildings that bring more than a register does. */
export interface WorkOfOthers {
  /** With an answer of a survey laid over the inventory. */
  readonly surveyed: number;
  /** With a design coefficient, which only drawings or calculations tell. */
  readonly drawings: number;
  /** With the status of a finished assessment, or its capacity. */
  readonly assessed: number;
  readonly measured: number;
}

/** Counts over the buildings of an inventory. */
export async function workOfOthers(db: Database, inventoryId: string): Promise<WorkOfOthers> {
  const [counts] = await db.rows<Omit<WorkOfOthers, 'surveyed'>>(
    `SELECT count(*) FILTER (WHERE design_base_shear_coefficient IS NOT NULL) AS drawings,
       count(*) FILTER (WHERE capacity_sa_g IS NOT NULL OR status = 'assessed') AS assessed,
       count(*) FILTER (WHERE measured_period_longitudinal_s IS NOT NULL OR measured_period_transverse_s IS NOT NULL) AS measured
     FROM building WHERE inventory_id = ?`,
    [inventoryId],
  );
  const surveyed = await db.value(
    "SELECT count(DISTINCT id) FROM finding WHERE inventory_id = ? AND code = 'survey-answer'",
    [inventoryId],
  );
  return { surveyed: Number(surveyed), ...(counts ?? { drawings: 0, assessed: 0, measured: 0 }) };
}

/** In one sentence or two. */
export function levelOfWork({ surveyed, drawings, assessed, measured }: WorkOfOthers): string {
  const buildings = (count: number): string => `${formatCount(count)} ${count === 1 ? 'building' : 'buildings'}`;
  const told = [
    [surveyed, 'answers of a survey'],
    [drawings, 'a design coefficient, as drawings state it'],
    [assessed, 'a finished assessment'],
    [measured, 'a measured period'],
  ] as const;
  const parts = told.flatMap(([count, what]) => (count === 0 ? [] : [`${what} for ${buildings(count)}`]));
  const others = parts.length === 0 ? 'nothing of visits, drawings, assessments or measurements' : parts.join('; ');
  return `${OWN_WORK} In the records it was given: ${others}.`;
}

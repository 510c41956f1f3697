/** Buildings of a run that have no spectrum because a hazard grid does not reach them: findings of the run, not of the inventory. */
import type { AssessSettings } from '../engineering/assess/settings.js';
import { noPlaceReason, outsideReason } from '../engineering/assess/site-spectrum.js';
import type { FindingCount } from '../engineering/page-contract.js';
import { HAZARD_GRID } from '../engineering/spectrum/grid.js';
import type { Database } from '../store/database.js';
import { quoteText } from '../store/sql.js';

/** What of a kept run says which they are. */
interface GriddedRun {
  readonly run_id: number;
  readonly inventory_id: string;
  readonly settings: Pick<AssessSettings, 'spectra'>;
}

/** Kind of these findings, beside rejected-row and rejected-cell. */
const KIND = 'rejected-building';

/**
 * A query of the buildings of a run that a grid of its study leaves without a spectrum, in the columns of `finding`, or null where the study
 * has no grid. The reason kept with the result says which they are.
 */
export function gridRejectsSql({ run_id, inventory_id, settings }: GriddedRun): string | null {
  const grids = Object.entries(settings.spectra).flatMap(([name, { code }]) => (code === HAZARD_GRID ? [name] : []));
  if (grids.length === 0) return null;
  const reasons = grids.flatMap((name) => [
    [outsideReason(name), 'outside-grid', name],
    [noPlaceReason(name), 'no-coordinates', name],
  ]);
  const rows = reasons.map((reason) => `(${reason.map(quoteText).join(', ')})`).join(', ');
  return `SELECT b.first_row AS "row", CAST(NULL AS INTEGER) AS line, b.id, 'lon, lat' AS column_name,
      CASE WHEN b.lon IS NULL AND b.lat IS NULL THEN NULL ELSE concat(b.lon, ', ', b.lat) END AS value, w.code,
      'building ' || b.id || ' has ' || CASE w.code WHEN 'outside-grid' THEN 'its place outside the hazard grid ' ELSE 'no coordinates, which are needed to read the hazard grid ' END || w.grid AS message,
      'the building is not ranked' AS action, '${KIND}' AS kind
    FROM result_assessed r JOIN (VALUES ${rows}) w (reason, code, grid) ON r.not_ranked = w.reason
    JOIN building b ON b.building_index = r.building_index AND b.inventory_id = ${quoteText(inventory_id)}
    WHERE r.run_id = ${String(run_id)}`;
}

/** Those buildings counted by code, the first of each as an example. */
export async function gridRejects(db: Database, run: GriddedRun): Promise<readonly FindingCount[]> {
  const sql = gridRejectsSql(run);
  if (sql === null) return [];
  const rows = await db.rows<{ code: string; kind: string; count: number; row: number; message: string }>(
    `SELECT code, kind, count(*) AS count, min("row") AS row, arg_min(message, "row") AS message FROM (${sql}) GROUP BY code, kind ORDER BY code`,
  );
  return rows.map(({ code, kind, count, row, message }) => ({
    code,
    kind,
    count,
    example: `row ${String(row)}: ${message}`,
  }));
}

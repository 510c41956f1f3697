/** Grids of hazard in the database: kept once each, whatever runs read them, so that a run can be worked out again without the file. */
import type { AssessSettings } from '../engineering/assess/settings.js';
import { HAZARD_GRID } from '../engineering/spectrum/grid.js';
import type { HazardGrid, HazardGrids } from '../engineering/spectrum/grid.js';
import { carried, uncarried } from '../engineering/spectrum/grid-carry.js';
import type { CarriedGrid } from '../engineering/spectrum/grid-carry.js';
import { Bug } from '../errors.js';
import type { Database } from '../store/database.js';

/** Fingerprints of the grids that settings name, without repeats. */
export function gridsNamed({ spectra }: Pick<AssessSettings, 'spectra'>): readonly string[] {
  const grids = Object.values(spectra).flatMap(({ code, grid }) => (code === HAZARD_GRID ? [String(grid)] : []));
  return [...new Set(grids)];
}

/** Keeps the grids that `settings` name as those of run `runId`; one that is there already is not written again. */
export async function keepGrids(
  db: Database,
  runId: number,
  settings: AssessSettings,
  grids: HazardGrids,
): Promise<void> {
  for (const fingerprint of gridsNamed(settings)) {
    const grid = grids.get(fingerprint);
    if (grid === undefined) throw new Bug(`the grid ${fingerprint} has not been read`);
    const known = await db.value('SELECT grid_number FROM hazard_grid WHERE grid_id = ?', [fingerprint]);
    const number = typeof known === 'number' ? known : await writeGrid(db, fingerprint, carried(grid));
    await db.run('INSERT INTO run_grid VALUES (?, ?)', [runId, number]);
  }
}

async function writeGrid(
  db: Database,
  fingerprint: string,
  { places, sa_g, periods_s, lon, lat }: CarriedGrid,
): Promise<number> {
  const last = await db.value('SELECT max(grid_number) FROM hazard_grid');
  const number = Number(last ?? 0) + 1;
  await db.run('INSERT INTO hazard_grid VALUES (?, ?, ?)', [
    number,
    fingerprint,
    JSON.stringify({ periods_s, lon, lat }),
  ]);
  const rows = sa_g.length;
  const each = periods_s.length;
  await db.append('hazard_ordinate', [
    new Int32Array(rows).fill(number),
    Int32Array.from({ length: rows }, (_, i) => places[Math.floor(i / each)]!),
    Int32Array.from({ length: rows }, (_, i) => i % each),
    Float64Array.from(sa_g),
  ]);
  return number;
}

/** The grids that `settings` of a kept run name. */
export async function readGrids(db: Database, settings: Pick<AssessSettings, 'spectra'>): Promise<HazardGrids> {
  const grids = new Map<string, HazardGrid>();
  for (const fingerprint of gridsNamed(settings)) {
    const [entry] = await db.rows<{ grid_number: number; axes: string }>(
      'SELECT grid_number, axes FROM hazard_grid WHERE grid_id = ?',
      [fingerprint],
    );
    if (entry === undefined) throw new Bug(`the grid ${fingerprint} is not in the database`);
    const { place, sa_g } = await db.columns(
      'SELECT place, sa_g FROM hazard_ordinate WHERE grid_number = ? ORDER BY place, period',
      { place: 'i32', sa_g: 'f64' },
      [entry.grid_number],
    );
    const axes = JSON.parse(entry.axes) as Pick<CarriedGrid, 'periods_s' | 'lon' | 'lat'>;
    const each = axes.periods_s.length;
    grids.set(fingerprint, uncarried({ ...axes, places: place.filter((_, i) => i % each === 0), sa_g }));
  }
  return grids;
}

/** Every estimate of the period of one building of a run, or of a class of its buildings. */
import { ClassEstimates } from '../engineering/assess/class-estimates.js';
import type { ClassEstimate } from '../engineering/assess/class-estimates.js';
import { compileContext } from '../engineering/assess/context.js';
import type { AssessContext } from '../engineering/assess/context.js';
import { periodEstimates } from '../engineering/assess/estimates.js';
import type { Estimate } from '../engineering/assess/estimate.js';
import { shownSystem } from '../engineering/assess/shown-system.js';
import type { ShownSystem } from '../engineering/assess/shown-system.js';
import { buildingReader } from '../engineering/building-columns.js';
import type { Building, System } from '../engineering/building.js';
import { DIRECTIONS } from '../engineering/direction.js';
import type { DirectionName } from '../engineering/direction.js';
import { UserError, showValue } from '../errors.js';
import { indexRanges } from '../store/chunks.js';
import type { Database } from '../store/database.js';
import { readRun } from './page-data.js';
import { readBuildings, readPools } from './read-buildings.js';
import { findBuilding } from './explain.js';

export interface PeriodSheet {
  readonly runId: number;
  readonly building: Building;
  readonly name: string | null;
  /** The system the estimates are for: given, named by the caller, or the likeliest. */
  readonly system: System;
  /** Across the building, where it differs the transverse estimates are for this one. */
  readonly systemTransverse: System;
  readonly systemFrom: 'given' | 'asked' | 'likeliest';
  /** Chance of that system, 1 when given or asked. */
  readonly chance: number;
  readonly directions: Readonly<Record<DirectionName, readonly Estimate[]>>;
}

/**
 * Every estimate of the period of building `id` in run `runId`; for a system that is not on record the likeliest one speaks, or `asked`.
 * @throws UserError for a building that is not in the run or of which nothing can be estimated.
 */
export async function periodSheet(db: Database, runId: number, id: string, asked?: System): Promise<PeriodSheet> {
  const run = await readRun(db, runId);
  const { index, name } = await findBuilding(db, run, id);
  const { columns } = await readBuildings(db, run.inventory_id, { from: index, to: index + 1 });
  const building = buildingReader(columns, await readPools(db, run.inventory_id))(0);
  const context = compileContext(run.settings);
  const { along, across, chance, onRecord } = systemsOf(building, context, asked);
  return {
    runId,
    building,
    name,
    system: along,
    systemTransverse: across,
    systemFrom: asked !== undefined ? 'asked' : onRecord ? 'given' : 'likeliest',
    chance,
    directions: {
      longitudinal: periodEstimates(building, 'longitudinal', along, context),
      transverse: periodEstimates(building, 'transverse', across, context),
    },
  };
}

function systemsOf(building: Building, context: AssessContext, asked: System | undefined): ShownSystem {
  const known = building.height_m.value > 0 && building.storeys.value > 0;
  // a system that is named needs no table of system chances
  if (asked !== undefined && known) return { along: asked, across: asked, chance: 1, onRecord: false };
  const shown = shownSystem(building, context);
  if (typeof shown === 'string')
    throw new UserError(`building ${showValue(building.id)}: no period can be estimated, ${shown}`);
  return shown;
}

export interface PeriodClass {
  readonly runId: number;
  readonly system: System;
  readonly group: string | null;
  readonly buildings: number;
  /** Directions of those buildings that are of the system. */
  readonly directions: number;
  readonly estimates: readonly ClassEstimate[];
}

/**
 * Every estimate over the ranked buildings of run `runId` whose given system is `system`, in one block or all of them.
 * @throws UserError when there is none.
 */
export async function periodClass(db: Database, runId: number, system: System, group?: string): Promise<PeriodClass> {
  const run = await readRun(db, runId);
  const context = compileContext(run.settings);
  const pools = await readPools(db, run.inventory_id);
  const gathered = new ClassEstimates();
  let buildings = 0;
  let directions = 0;
  const total = Number(await db.value('SELECT count(*) FROM building WHERE inventory_id = ?', [run.inventory_id]));
  for (const range of indexRanges(total)) {
    const wanted = new Set(
      (
        await db.rows<{ building_index: number }>(
          `SELECT b.building_index FROM building b JOIN result r ON r.run_id = ? AND r.building_index = b.building_index
           WHERE b.inventory_id = ? AND b.building_index >= ? AND b.building_index < ?
           AND b."system" = ? AND r.not_ranked IS NULL${group === undefined ? '' : ' AND b."group" = ?'}`,
          [runId, run.inventory_id, range.from, range.to, system, ...(group === undefined ? [] : [group])],
        )
      ).map(({ building_index }) => building_index),
    );
    if (wanted.size === 0) continue;
    const { columns, rows } = await readBuildings(db, run.inventory_id, range);
    const read = buildingReader(columns, pools);
    for (let i = 0; i < rows; i += 1) {
      if (!wanted.has(range.from + i)) continue;
      const building = read(i);
      if (!(building.height_m.value > 0) || !(building.storeys.value > 0)) continue;
      buildings += 1;
      for (const direction of DIRECTIONS) {
        if (direction === 'transverse' && (building.system_transverse ?? system) !== system) continue;
        directions += 1;
        gathered.add(periodEstimates(building, direction, system, context));
      }
    }
  }
  if (buildings === 0) {
    const where = group === undefined ? '' : ` in block "${group}"`;
    throw new UserError(`run ${String(runId)} ranks no building of system ${system} on record${where}`);
  }
  return { runId, system, group: group ?? null, buildings, directions, estimates: gathered.summary() };
}

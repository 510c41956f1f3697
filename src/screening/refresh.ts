/** A run from the inventory of an earlier one with other parameters: demand is read again, the inventory's file is not. */
import { settingsFromJson } from '../engineering/assess/settings.js';
import type { AssessSettings } from '../engineering/assess/settings.js';
import { HAZARD_GRID } from '../engineering/spectrum/grid.js';
import type { HazardGrids } from '../engineering/spectrum/grid.js';
import { UserError } from '../errors.js';
import { readTaken } from '../inventory/take-in.js';
import type { Database } from '../store/database.js';
import { changesBetween } from '../study/changes.js';
import type { StudyChange } from '../study/changes.js';
import { studyFromText } from '../study/load.js';
import type { LoadedStudy } from '../study/load.js';
import { dotted } from '../study/problems.js';
import type { Study } from '../study/schema.js';
import { withKeptGrids } from '../study/hazard-grids.js';
import { keepRun } from './keep-run.js';
import { readGrids } from './kept-grids.js';
import type { ScreenOutcome } from './keep-run.js';
import type { ScreenOptions } from './screen.js';
import { settingsOf } from './settings.js';

/** The earlier run that a refresh stands on. */
export interface BaseRun {
  readonly runId: number;
  readonly inventoryId: string;
  readonly settings: AssessSettings;
  /** Its study as it was then. */
  readonly study: Study;
  readonly listSize: number;
  /** The grids of hazard kept with it. */
  readonly grids: () => Promise<HazardGrids>;
}

/** Run `runId` as the base of a refresh; `loaded` is the study whose folder holds the database. @throws UserError when its study cannot be read. */
export async function baseRun(db: Database, loaded: LoadedStudy, runId: number): Promise<BaseRun> {
  const [row] = await db.rows<{ inventory_id: string; settings: string; study_text: string; list_size: number }>(
    'SELECT inventory_id, settings, study_text, list_size FROM run WHERE run_id = ?',
    [runId],
  );
  if (row === undefined) throw new UserError(`there is no run ${String(runId)}; swaymark runs lists them`);
  const settings = settingsFromJson(row.settings);
  let grids: Promise<HazardGrids> | undefined;
  return {
    runId,
    inventoryId: row.inventory_id,
    settings,
    grids: () => (grids ??= readGrids(db, settings)),
    study: keptStudy(row.study_text, loaded, runId),
    listSize: row.list_size,
  };
}

function keptStudy(text: string, { file }: LoadedStudy, runId: number): Study {
  try {
    return studyFromText(text, file).study;
  } catch (cause) {
    if (!(cause instanceof UserError)) throw cause;
    throw new UserError(
      `the study kept with run ${String(runId)} is not one this version reads (${cause.message}); run \`swaymark screen\``,
      {},
      { cause },
    );
  }
}

/** What intake reads: the same parts that its fingerprint covers, and the names of the files, which a refresh does not open. */
function intakeOf({ inventory, words, neighbours }: Study): unknown {
  const { rejects_limit: _limit, ...reading } = inventory;
  return { inventory: reading, words, ...(neighbours === undefined ? {} : { neighbours }) };
}

/** @throws UserError for every parameter of `loaded` that would have the inventory of `base` read otherwise. */
export function refuseIntake(base: BaseRun, loaded: LoadedStudy): void {
  const changes = changesBetween(intakeOf(base.study), intakeOf(loaded.study));
  if (changes.length === 0) return;
  throw UserError.of(
    changes.map(({ path }) => ({
      place: loaded.placeOf(path),
      message: `${dotted(path)} is not what run ${String(base.runId)} was taken in with: it says how the inventory is read, and a refresh ranks the buildings kept with that run without reading them again; change it in the study file and run \`swaymark screen\``,
    })),
  );
}

/** What the study's file says otherwise than it did for `base`, key by key, besides title and folder of reports; and other contents of its grids. */
export function parameterChanges(base: BaseRun, loaded: LoadedStudy): readonly StudyChange[] {
  const { study } = studyFromText(loaded.text, loaded.file);
  const stated = changesBetween(base.study, study).filter(
    ({ path: [first] }) => first !== 'title' && first !== 'output',
  );
  const contents = Object.entries(loaded.study.hazard.spectra).flatMap(([name, { code, grid }]): StudyChange[] => {
    const before = base.settings.spectra[name];
    // one that is not read here is taken as it was kept
    return code !== HAZARD_GRID || grid === undefined || before?.code !== HAZARD_GRID || before['grid'] === grid
      ? []
      : [{ path: ['hazard', 'spectra', name, 'grid'], from: before['grid'], to: grid }];
  });
  return [...stated, ...contents];
}

/** `loaded` with the grids whose files are gone as they were kept with `base`. @throws UserError for one that is not. */
export function gridsOn(base: BaseRun, loaded: LoadedStudy): Promise<LoadedStudy> {
  return withKeptGrids(loaded, base.settings.spectra, base.grids);
}

/** Settings of `loaded` with the table of system chances of `base`, where both name the same: its file may be gone. */
export function settingsOn(base: BaseRun, loaded: LoadedStudy): Promise<AssessSettings> {
  const same = base.study.system_prior === loaded.study.system_prior;
  return settingsOf(loaded, same ? (base.settings.systemPrior ?? undefined) : undefined);
}

/**
 * Ranks the inventory of `base` by the study `stated` and keeps the run, as a whole screening with the same parameters would: equal to the last bit.
 * @throws UserError for a parameter that changes intake or cannot be used; then nothing is kept.
 */
export async function refresh(
  db: Database,
  base: BaseRun,
  stated: LoadedStudy,
  options: ScreenOptions,
): Promise<ScreenOutcome> {
  refuseIntake(base, stated);
  const loaded = await gridsOn(base, stated);
  const first = await settingsOn(base, loaded);
  return db.transaction(async () => {
    const taken = await readTaken(db, base.inventoryId);
    return keepRun(db, loaded, first, taken, options, (step, share = NaN) => options.onProgress?.({ step, share }));
  });
}

/** Intake and data quality of a study's inventory, without keeping anything. */
import { statSync } from 'node:fs';
import { chooseSpectrum } from '../engineering/assess/choose-spectrum.js';
import { compileContext } from '../engineering/assess/context.js';
import { noPlaceReason, outsideReason } from '../engineering/assess/site-spectrum.js';
import { buildingReader } from '../engineering/building-columns.js';
import type { AccountLine, AttributeCount, FindingCount } from '../engineering/page-contract.js';
import type { Answer } from '../inventory/answers.js';
import { currentAnswers } from '../inventory/kept-answers.js';
import { takeIn } from '../inventory/take-in.js';
import type { TakenIn } from '../inventory/take-in.js';
import { readBuildings } from '../screening/read-buildings.js';
import { databasePath } from '../screening/screen.js';
import { settingsOf } from '../screening/settings.js';
import { accountLines, attributeCounts, findingCounts } from '../screening/summarise.js';
import { indexRanges } from '../store/chunks.js';
import { openDatabase } from '../store/database.js';
import type { Database } from '../store/database.js';
import { prepareSchema, schemaState } from '../store/schema.js';
import { loadStudy } from '../study/load.js';
import type { LoadedStudy } from '../study/load.js';
import { writeRejectsCsv } from './rejects.js';
import { spareInputs } from './spare-inputs.js';
import { prepareFolder, writeSet } from './write-set.js';

export interface CheckOptions {
  /** Folder for rejects.csv; not written when left out. */
  readonly output?: string | undefined;
  /** When it is checked: years after it are refused. Now when left out. */
  readonly made?: Date;
  readonly onProgress?: (progress: { readonly step: string; readonly share: number }) => void;
  readonly onOpen?: (db: Database) => void;
}

export interface CheckedStudy {
  readonly title: string;
  readonly file: string;
  readonly encoding: string;
  readonly delimiter: string;
  readonly rows_in: number;
  readonly buildings: number;
  readonly account: readonly AccountLine[];
  readonly attributes: readonly AttributeCount[];
  readonly findings: readonly FindingCount[];
  /** How many buildings `screen` will not rank for want of a lateral system; empty when none. */
  readonly not_rankable: string;
  /** How many it will not rank because a hazard grid does not reach them; empty when none. */
  readonly off_grid: string;
  readonly rejected: { readonly share: number; readonly limit: number; readonly over: boolean };
  readonly files: readonly string[];
}

/** Nothing is ranked here: these two kinds only say what the intake found. */
const TITLES: Readonly<Record<string, string>> = {
  'merged-into-ranked': 'rows of buildings with a height or storeys, not yet ranked',
  'merged-into-not-ranked': 'rows of buildings that lack what an assessment needs',
};

function notRankable({ study }: LoadedStudy, { attributes }: Pick<TakenIn, 'attributes'>): string {
  const unknown = Object.entries(attributes).find(([name]) => name === 'system')?.[1].unknown ?? 0;
  if (unknown === 0 || study.system_prior !== undefined) return '';
  return `${unknown === 1 ? '1 building' : `${String(unknown)} buildings`} cannot be ranked as the study stands: the lateral system is not known and no system_prior names a table of chances.`;
}

/** Buildings that the grids of the ranking level do not reach, by reason. */
async function offGrid(
  db: Database,
  loaded: LoadedStudy,
  { inventoryId, buildings }: Pick<TakenIn, 'inventoryId' | 'buildings'>,
): Promise<string> {
  if (loaded.grids.size === 0) return '';
  // no table of system chances is needed here
  const context = compileContext(await settingsOf(loaded, []), loaded.grids);
  const reasons = new Set([...context.grids.keys()].flatMap((name) => [noPlaceReason(name), outsideReason(name)]));
  const counts = new Map<string, number>();
  for (const range of indexRanges(buildings)) {
    const { columns, rows } = await readBuildings(db, inventoryId, range, { ids: false, places: true });
    const buildingAt = buildingReader(columns, {});
    for (let i = 0; i < rows; i += 1) {
      const choice = chooseSpectrum(context, buildingAt(i), 0);
      if (typeof choice === 'string' && reasons.has(choice)) counts.set(choice, (counts.get(choice) ?? 0) + 1);
    }
  }
  const told = [...counts].map(([reason, count]) => `${reason} (${String(count)})`).join('; ');
  return told === '' ? '' : `Buildings that have no spectrum, so that \`screen\` will not rank them: ${told}.`;
}

/** Share of rejected rows against the study's limit. */
export function rejectedShare(
  { study }: LoadedStudy,
  { account, rowsIn }: Pick<TakenIn, 'account' | 'rowsIn'>,
): CheckedStudy['rejected'] {
  const share = rowsIn === 0 ? 0 : account.rejected / rowsIn;
  const limit = study.inventory.rejects_limit;
  return { share, limit, over: share > limit };
}

/** The answers of surveys that the next screening will lay over the inventory: read without bringing an earlier database up to date. */
async function answersOf(loaded: LoadedStudy): Promise<readonly Answer[]> {
  const path = databasePath(loaded);
  // one that was only begun is empty
  if ((statSync(path, { throwIfNoEntry: false })?.size ?? 0) === 0) return [];
  const db = await openDatabase({ path, readOnly: true, folders: [loaded.folder] });
  try {
    // refuses that of a newer program
    await schemaState(db);
    return await currentAnswers(db);
  } finally {
    db.close();
  }
}

/**
 * Takes the inventory of the study at `path` into memory, with the answers of surveys laid over it as `screen` would, and says what became
 * of its rows and values; nothing is kept.
 * @throws UserError for a fault in the study, the file, its header or the mapping, or a database of the study that cannot be read.
 * @example
 * const { account, findings, rejected } = await checkStudy('study.yaml');
 */
export async function checkStudy(path: string, options: CheckOptions = {}): Promise<CheckedStudy> {
  const loaded = await loadStudy(path);
  const folder = options.output === undefined ? undefined : prepareFolder(options.output);
  if (folder !== undefined) await spareInputs(loaded, folder, ['rejects.csv']);
  const answers = await answersOf(loaded);
  const db = await openDatabase({
    path: ':memory:',
    folders: [loaded.folder, ...(folder === undefined ? [] : [folder])],
  });
  try {
    options.onOpen?.(db);
    await prepareSchema(db);
    const taken = await db.lateTransaction((begin) =>
      takeIn(
        db,
        loaded.study,
        loaded.folder,
        (step) => {
          options.onProgress?.({ step, share: NaN });
        },
        begin,
        { answers, made: options.made ?? new Date() },
      ),
    );
    const { inventoryId } = taken;
    const [source] = await db.rows<{ encoding: string; delimiter: string }>(
      'SELECT encoding, delimiter FROM inventory WHERE inventory_id = ?',
      [inventoryId],
    );
    const files =
      folder === undefined
        ? []
        : await writeSet(folder, { 'rejects.csv': (to) => writeRejectsCsv(db, inventoryId, to) });
    return {
      title: loaded.study.title,
      file: loaded.study.inventory.file,
      encoding: source?.encoding ?? '',
      delimiter: source?.delimiter ?? '',
      rows_in: taken.rowsIn,
      buildings: taken.buildings,
      account: accountLines(taken.account).map((line) => ({ ...line, title: TITLES[line.kind] ?? line.title })),
      attributes: attributeCounts(taken.attributes),
      findings: await findingCounts(db, inventoryId),
      not_rankable: notRankable(loaded, taken),
      off_grid: await offGrid(db, loaded, taken),
      rejected: rejectedShare(loaded, taken),
      files,
    };
  } finally {
    db.close();
  }
}

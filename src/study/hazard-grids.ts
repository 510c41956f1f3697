/** Spectra that are a grid in a file beside the study: read with the study, so that its fingerprint covers what they say. */
import { existsSync } from 'node:fs';
import { dirname, isAbsolute, join } from 'node:path';
import type { SpectrumDefinition } from '../engineering/spectrum/definition.js';
import { HAZARD_GRID } from '../engineering/spectrum/grid.js';
import type { HazardGrid, HazardGrids } from '../engineering/spectrum/grid.js';
import { UserError } from '../errors.js';
import { openDatabase } from '../store/database.js';
import { loadHazardGrid } from './hazard-grid-file.js';
import type { HazardGridFile } from './hazard-grid-file.js';
import type { Study } from './schema.js';
import type { SpectrumEntry } from './spectrum-codes.js';
import type { SpectrumUnit } from './spectrum-units.js';

/** Spectra by name, as a study or the settings of a run have them. */
type Spectra = Readonly<Record<string, SpectrumDefinition>>;

/** A study whose grids have been read, and the grids by fingerprint. */
export interface WithGrids {
  readonly study: Study;
  readonly grids: HazardGrids;
}

export interface GridReading {
  /** Grids read before: one of the same file, unit and interpolation is not read again. */
  readonly known?: WithGrids | undefined;
  /** Leave a grid whose file is not there as the study states it, for one who has it elsewhere. */
  readonly leaveMissing?: boolean;
}

/**
 * `study` with every spectrum of code hazard-grid told what its file holds (`grid`: its fingerprint; `read`: how it was read); paths are
 * relative to `folder`.
 * @throws UserError naming file and line.
 */
export async function withHazardGrids(
  study: Study,
  folder: string,
  { known, leaveMissing = false }: GridReading = {},
): Promise<WithGrids> {
  const grids = new Map<string, HazardGrid>();
  const spectra: Record<string, SpectrumEntry> = {};
  for (const [name, entry] of Object.entries(study.hazard.spectra)) {
    if (!isUnread(entry)) {
      spectra[name] = entry;
      continue;
    }
    const path = pathOf(entry, folder);
    const before = known === undefined ? undefined : sameGrid(entry, known.study.hazard.spectra, known.grids);
    if (before !== undefined) {
      grids.set(before.fingerprint, before.grid);
      spectra[name] = { ...entry, grid: before.fingerprint, read: before.read };
    } else if (leaveMissing && !existsSync(path)) spectra[name] = entry;
    else {
      const { grid, fingerprint, statements } = await readGridFile(path, entry);
      grids.set(fingerprint, grid);
      spectra[name] = { ...entry, grid: fingerprint, read: statements.join(', ') };
    }
  }
  return { study: { ...study, hazard: { ...study.hazard, spectra } }, grids };
}

/** True where a spectrum is a grid that has not been read. */
export function isUnread(entry: SpectrumEntry): boolean {
  return entry.code === HAZARD_GRID && entry['grid'] === undefined;
}

/** `loaded` with the grids whose files are gone taken from those kept with a run whose spectra were `spectra`. @throws UserError for one that is not among them. */
export async function withKeptGrids<T extends WithGrids & { readonly folder: string }>(
  loaded: T,
  spectra: Spectra,
  kept: () => Promise<HazardGrids>,
): Promise<T> {
  const missing = Object.entries(loaded.study.hazard.spectra).filter(([, entry]) => isUnread(entry));
  if (missing.length === 0) return loaded;
  const grids = new Map(loaded.grids);
  const found: Record<string, SpectrumEntry> = {};
  for (const [name, entry] of missing) {
    const before = sameGrid(entry, spectra, await kept());
    // its file is still not there: reading it says so in the usual words
    if (before === undefined) await readGridFile(pathOf(entry, loaded.folder), entry);
    else {
      grids.set(before.fingerprint, before.grid);
      found[name] = { ...entry, grid: before.fingerprint, read: before.read };
    }
  }
  const { study } = loaded;
  const all = { ...study.hazard.spectra, ...found };
  return { ...loaded, grids, study: { ...study, hazard: { ...study.hazard, spectra: all } } };
}

/** The grid that an entry of the same file, unit and interpolation has. */
function sameGrid(
  entry: SpectrumEntry,
  spectra: Spectra,
  grids: HazardGrids,
): { readonly grid: HazardGrid; readonly fingerprint: string; readonly read: string } | undefined {
  const one = Object.values(spectra).find(
    (other) =>
      other.code === HAZARD_GRID &&
      other['grid'] !== undefined &&
      ['file', 'unit', 'interpolation'].every((key) => other[key] === entry[key]),
  );
  const fingerprint = String(one?.['grid']);
  const grid = grids.get(fingerprint);
  return one === undefined || grid === undefined ? undefined : { grid, fingerprint, read: String(one['read']) };
}

function pathOf({ file }: SpectrumEntry, folder: string): string {
  const path = String(file);
  return isAbsolute(path) ? path : join(folder, path);
}

async function readGridFile(path: string, entry: SpectrumEntry): Promise<HazardGridFile> {
  const options = {
    unit: entry['unit'] as SpectrumUnit | undefined,
    interpolation: entry['interpolation'] === 'log-log' ? 'log-log' : 'linear',
  } as const;
  if (!/\.parquet$/i.test(path)) return loadHazardGrid(path, options);
  if (!existsSync(path)) throw new UserError('no such file; the study names it as a hazard grid', { file: path });
  const database = await openDatabase({ path: ':memory:', folders: [dirname(path)] });
  try {
    return await loadHazardGrid(path, { ...options, database });
  } finally {
    database.close();
  }
}

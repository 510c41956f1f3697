/** The spectra of a study, read at periods. */
import { apply } from '../engineering/formula.js';
import type { MethodRecord } from '../engineering/formula.js';
import { SPECTRAL_DISPLACEMENT } from '../engineering/demand/records.js';
import { segmentAt } from '../engineering/spectrum/compiled.js';
import { siteSpectrum } from '../engineering/assess/site-spectrum.js';
import { formatNumber } from '../engineering/format.js';
import { compileSpectrum } from '../engineering/spectrum/definition.js';
import type { SpectrumReading } from '../engineering/spectrum/definition.js';
import { HAZARD_GRID } from '../engineering/spectrum/grid.js';
import { flagWords } from '../engineering/spectrum/flags.js';
import { cite } from '../engineering/source.js';
import { Bug, UserError, showValue } from '../errors.js';
import type { LoadedStudy } from '../study/load.js';
import { nearest } from '../study/nearest.js';
import type { SpectrumEntry } from '../study/spectrum-codes.js';

export interface Ordinate {
  readonly period_s: number;
  readonly sa_g: number;
  readonly sd_m: number;
  /** The branch of the publication that was read. */
  readonly clause: string;
  /** True where the period is longer than the publication covers. */
  readonly beyond: boolean;
}

/** A place, degrees. */
export interface SpectrumPlace {
  readonly lon: number;
  readonly lat: number;
}

export interface SpectrumSheet {
  readonly name: string;
  /** Where a grid was read; null for a spectrum that is the same everywhere. */
  readonly place: SpectrumPlace | null;
  readonly code: string;
  readonly method: string;
  readonly title: string;
  readonly source: string;
  readonly verified: string;
  /** As the study states them. */
  readonly parameters: Readonly<Record<string, string | number | readonly number[]>>;
  /** Where one branch ends and the next begins, s. */
  readonly corners_s: readonly number[];
  readonly plateau: { readonly from_s: number; readonly to_s: number; readonly sa_g: number };
  /** Longest period the publication covers, s; null without a limit. */
  readonly valid_to_s: number | null;
  /** What a reader must know about these parameters, in words. */
  readonly flags: readonly string[];
  /** Titles of the levels that read it, with the site class, zone or name in the inventory. */
  readonly read_by: readonly string[];
  readonly ordinates: readonly Ordinate[];
}

/** Periods read when none are asked for, s. */
export const DEFAULT_PERIODS_S: readonly number[] = [0, 0.1, 0.2, 0.3, 0.5, 0.75, 1, 1.5, 2, 3, 4];

/** Names of a study's spectra, in the order of the file. */
export function spectrumNames({ study }: LoadedStudy): readonly string[] {
  return Object.keys(study.hazard.spectra);
}

/**
 * Spectrum `name` of a loaded study with its ordinates at `periods_s`; of a hazard grid the one at `place`.
 * @throws UserError for an unknown name, a negative period, a grid without a place or a place that it does not cover.
 * @example
 * const { ordinates } = readSpectrum(await loadStudy('study.yaml'), 'design-c', [0.2, 1]);
 */
export function readSpectrum(
  loaded: LoadedStudy,
  name: string,
  periods_s: readonly number[] = DEFAULT_PERIODS_S,
  place?: SpectrumPlace,
): SpectrumSheet {
  const entry = Object.hasOwn(loaded.study.hazard.spectra, name) ? loaded.study.hazard.spectra[name] : undefined;
  if (entry === undefined) {
    const names = spectrumNames(loaded);
    const guess = nearest(name, names);
    throw new UserError(
      `unknown spectrum ${showValue(name)}${guess === undefined ? '' : ` (did you mean "${guess}"?)`}; in this study: ${names.join(', ')}`,
      {
        file: loaded.file,
      },
    );
  }
  const isGrid = entry.code === HAZARD_GRID;
  const { record, inputs, compiled } = isGrid ? readingAt(loaded, name, entry, place) : compileSpectrum(entry);
  const read = (period_s: number): number => apply(record as MethodRecord, { ...inputs, period_s });
  const ordinates = periods_s.map((period_s) => {
    if (!(period_s >= 0 && period_s < Infinity))
      throw new UserError(`a period of at least 0 s is needed, got ${String(period_s)}`);
    const sa_g = read(period_s);
    return {
      period_s,
      sa_g,
      sd_m: apply(SPECTRAL_DISPLACEMENT, { sa_g, period_s }),
      clause: segmentAt(compiled, period_s).clause,
      beyond: period_s > compiled.valid_to_s,
    };
  });
  const { code, grid: _grid, ...stated } = entry;
  const parameters = Object.fromEntries(
    Object.entries(stated).flatMap(([key, value]) => (value === undefined ? [] : [[key, value] as const])),
  );
  return {
    name,
    place: isGrid && place !== undefined ? place : null,
    code,
    method: record.id,
    title: record.title,
    source: cite(record.source),
    verified: record.verified,
    parameters,
    corners_s: compiled.segments.slice(1).map(({ from_s }) => from_s),
    plateau: { from_s: compiled.plateau_from_s, to_s: compiled.plateau_to_s, sa_g: read(compiled.plateau_from_s) },
    valid_to_s: Number.isFinite(compiled.valid_to_s) ? compiled.valid_to_s : null,
    flags: flagWords(compiled),
    read_by: readBy(loaded, name),
    ordinates,
  };
}

/** The table that a grid gives at a place. */
function readingAt(
  { study, grids, file }: LoadedStudy,
  name: string,
  entry: SpectrumEntry,
  place: SpectrumPlace | undefined,
): SpectrumReading {
  const grid = grids.get(String(entry['grid']));
  if (grid === undefined) throw new Bug(`the grid of ${name} has not been read`);
  const [west, east] = [grid.lon[0], grid.lon.at(-1)].map((line) => formatNumber(line ?? NaN, 7));
  const [south, north] = [grid.lat[0], grid.lat.at(-1)].map((line) => formatNumber(line ?? NaN, 7));
  const extent = `longitude ${String(west)} to ${String(east)}°, latitude ${String(south)} to ${String(north)}°`;
  if (place === undefined)
    throw new UserError(
      `${showValue(name)} is a hazard grid and differs from place to place (${extent}); say where: --lon and --lat in degrees`,
      { file },
    );
  const source = {
    name,
    grid,
    interpolation: entry['interpolation'] === 'log-log' ? 'log-log' : 'linear',
    return_period_years: entry.return_period_years ?? null,
    holdPlateau: study.hazard.hold_plateau,
    factor: 1,
  } as const;
  const found = siteSpectrum(source, place.lon, place.lat);
  if (typeof found !== 'string') return found;
  throw new UserError(
    `longitude ${String(place.lon)}, latitude ${String(place.lat)} lies ${found}: it covers ${extent}, but for cells that lack a node`,
  );
}

/** Titles of the levels that read a spectrum, with what leads there. */
export function readBy({ study }: LoadedStudy, name: string): readonly string[] {
  return study.hazard.levels.flatMap((level) => {
    if ('spectrum' in level) return level.spectrum === name ? [level.title] : [];
    if (level.spectra === undefined)
      return [`${level.title}: where the inventory names it${level.otherwise === name ? ', otherwise' : ''}`];
    const keys = Object.entries(level.spectra)
      .filter(([, spectrum]) => spectrum === name)
      .map(([key]) => key);
    const which = level.otherwise === name ? [...keys, 'otherwise'] : keys;
    const by = level.by === 'vs30' ? `site class by velocity (${level.classes})` : level.by.replace('_', ' ');
    return which.length === 0 ? [] : [`${level.title}: ${by} ${which.join(', ')}`];
  });
}

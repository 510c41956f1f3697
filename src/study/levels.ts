import type { Level, Study } from './schema.js';

/** Names of the spectra a level uses, without repeats. */
export function spectraOf(level: Level): readonly string[] {
  if ('spectrum' in level) return [level.spectrum];
  const otherwise = level.otherwise === undefined ? [] : [level.otherwise];
  return [...new Set([...Object.values(level.spectra), ...otherwise])];
}

/** Name of the spectrum a building reads at a level, by its site class or zone (null: not known); null when the level has none for it. */
export function spectrumFor(
  level: Level,
  building: { readonly site_class: string | null; readonly hazard_zone: string | null },
): string | null {
  if ('spectrum' in level) return level.spectrum;
  const value = building[level.by];
  // Own keys only: a cell may hold any text, `constructor` too.
  const listed = value !== null && Object.hasOwn(level.spectra, value) ? level.spectra[value] : undefined;
  return listed ?? level.otherwise ?? null;
}

/** Return period of a level, years, when all its spectra state the same; null otherwise. */
export function returnPeriodYears(study: Study, level: Level): number | null {
  const periods = new Set(spectraOf(level).map((name) => study.hazard.spectra[name]?.return_period_years));
  const [period] = periods;
  return periods.size === 1 && period !== undefined ? period : null;
}

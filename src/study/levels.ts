import type { Level, Study } from './schema.js';

/** Names of the spectra a level states, without repeats; none where the inventory alone names them. */
export function spectraOf(level: Level): readonly string[] {
  if ('spectrum' in level) return [level.spectrum];
  const otherwise = level.otherwise === undefined ? [] : [level.otherwise];
  return [...new Set([...Object.values(level.spectra ?? {}), ...otherwise])];
}

/** Return period of a level, years, when all its spectra state the same; null otherwise. */
export function returnPeriodYears(study: Study, level: Level): number | null {
  const periods = new Set(spectraOf(level).map((name) => study.hazard.spectra[name]?.return_period_years));
  const [period] = periods;
  return periods.size === 1 && period !== undefined ? period : null;
}

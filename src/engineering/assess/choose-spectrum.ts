/** Which spectrum a building reads at a level, and why. */
import type { Building } from '../building.js';
import { formatNumber } from '../format.js';
import { VS30_TABLES, siteClassFromVs30 } from '../site/vs30.js';
import type { AssessContext, ContextSpectrum } from './context.js';
import type { LevelSettings } from './settings.js';
import { siteSpectrum } from './site-spectrum.js';

export interface SpectrumChoice {
  readonly spectrum: ContextSpectrum;
  /** Why this one. */
  readonly because: string;
  /** True when the building's class was blank or not named and the default was taken. */
  readonly byDefault: boolean;
  /** How the site class was come by, where the level reads velocities: a code of FLAGS, or null when there is nothing to say. */
  readonly classFlag: 'class-differs' | 'velocity-unknown' | null;
}

interface Key {
  /** What is looked up among the spectra of the level; null: not known. */
  readonly key: string | null;
  readonly because?: string;
  readonly flag: SpectrumChoice['classFlag'];
}

/** What `by` is called in a sentence. */
const CALLED: Readonly<Record<NonNullable<LevelSettings['by']>, string>> = {
  site_class: 'site class',
  hazard_zone: 'hazard zone',
  vs30: 'site class',
  spectrum: 'spectrum',
};

/** The spectrum `building` reads at level `levelIndex`, or a reason why there is none. */
export function chooseSpectrum(
  context: AssessContext,
  building: Building,
  levelIndex: number,
): SpectrumChoice | string {
  const level = context.settings.levels[levelIndex];
  if (level === undefined) return 'no such level';
  if (level.by === null) {
    const name = level.spectra['all'] ?? '';
    const spectrum = spectrumCalled(name, building, context);
    if (typeof spectrum === 'string') return spectrum;
    return {
      spectrum,
      because:
        spectrum.site === null
          ? 'one spectrum for all buildings'
          : 'one grid for all buildings, read at the place of each',
      byDefault: false,
      classFlag: null,
    };
  }
  const called = CALLED[level.by];
  const { key, because, flag } =
    level.by === 'vs30' ? classOf(level, building) : { key: building[level.by], flag: null };
  // own keys only: a cell may hold any text, `constructor` too
  const named = key !== null && Object.hasOwn(level.spectra, key) ? level.spectra[key] : undefined;
  const name = named ?? level.otherwise;
  if (name === null) {
    return key === null
      ? `${called} not known and the study names no spectrum for that`
      : `no spectrum ${level.by === 'spectrum' ? `"${key}" in the study` : `for ${called} "${key}"`}`;
  }
  const spectrum = spectrumCalled(name, building, context);
  if (typeof spectrum === 'string') return spectrum;
  if (named !== undefined) {
    const plain = level.by === 'spectrum' ? `the inventory names "${String(key)}"` : `${called} ${String(key)}`;
    return { spectrum, because: because ?? plain, byDefault: false, classFlag: flag };
  }
  const reason = key === null ? `${called} not known` : `${because ?? `${called} "${key}"`} not named`;
  return { spectrum, because: `${reason}: the study's default`, byDefault: true, classFlag: flag };
}

/** The spectrum `name` of the study, of a grid that of the building's place; a reason where there is none. */
function spectrumCalled(
  name: string,
  { lon, lat }: Building,
  { spectra, grids }: AssessContext,
): ContextSpectrum | string {
  const source = grids.size > 0 ? grids.get(name) : undefined;
  if (source !== undefined) return siteSpectrum(source, lon, lat);
  return spectra[name] ?? `spectrum "${name}" is not defined`;
}

/** The site class of the velocity of the upper 30 m; where there is none, the class on record. */
function classOf({ classes = 'asce7-22' }: LevelSettings, { structure, site_class }: Building): Key {
  const vs30_mps = structure?.vs30_mps ?? NaN;
  if (!(vs30_mps > 0)) {
    if (site_class === null) return { key: null, flag: null };
    return {
      key: site_class,
      because: `shear-wave velocity not known, site class ${site_class} on record`,
      flag: 'velocity-unknown',
    };
  }
  const key = siteClassFromVs30(classes, vs30_mps);
  const differs = site_class !== null && site_class.trim().toUpperCase() !== key;
  const velocity = `shear-wave velocity ${formatNumber(vs30_mps, 4)} m/s, site class ${key} of ${VS30_TABLES[classes].source}`;
  return {
    key,
    because: differs ? `${velocity}; the inventory says ${site_class}` : velocity,
    flag: differs ? 'class-differs' : null,
  };
}

/** From the study file to the settings an assessment runs on. */
import { resolve } from 'node:path';
import type { AssessSettings, CodeHistorySettings, LevelSettings } from '../engineering/assess/settings.js';
import { OWN_FAMILY_ID } from '../engineering/capacity/families.js';
import { SPECTRUM_REGISTER } from '../engineering/spectrum/definition.js';
import { findMethod } from '../engineering/methods.js';
import { STIFFNESS_ROUTES } from '../engineering/stiffness/routes.js';
import { UserError, showValue } from '../errors.js';
import { loadPrior } from '../study/prior.js';
import { assumedOf, spreadsOf } from '../study/assumed-schema.js';
import type { LoadedStudy } from '../study/load.js';
import type { Level, Study } from '../study/schema.js';

/** Slope of the hazard curve where the study names one level only [judgement]. */
const ASSUMED_SLOPE = 2.5;

function levelOf(level: Level, study: Study): LevelSettings {
  if ('spectrum' in level) return { title: level.title, by: null, spectra: { all: level.spectrum }, otherwise: null };
  return {
    title: level.title,
    by: level.by,
    ...(level.by === 'vs30' ? { classes: level.classes } : {}),
    spectra: level.spectra ?? eachByItsName(study),
    otherwise: level.otherwise ?? null,
  };
}

/** Every elastic spectrum of the study under its own name; those that contain a behaviour factor serve base shear and are left out. */
function eachByItsName({ hazard }: Study): Readonly<Record<string, string>> {
  const reduced = new Set(SPECTRUM_REGISTER.flatMap(({ code, reduced: is }) => (is === true ? [code] : [])));
  return Object.fromEntries(
    Object.entries(hazard.spectra).flatMap(([name, { code }]) => (reduced.has(code) ? [] : [[name, name] as const])),
  );
}

function codeHistoryOf(history: Study['code_history']): CodeHistorySettings {
  const { place, family, seismic_design_enforced_from, adoption_lag_years, detailing_from, weak_types } = history;
  const common = {
    place,
    family,
    seismic_design_enforced_from,
    adoption_lag_years,
    ...(detailing_from === undefined ? {} : { detailing_from }),
    ...(weak_types === undefined ? {} : { weak_types }),
  };
  // the file of a table has been read with the study
  return history.family === OWN_FAMILY_ID
    ? { ...common, editions: {}, table: history.table ?? [] }
    : { ...common, editions: history.editions };
}

/**
 * Settings of a loaded study; the slope is the stated one, or 2.5 until two levels have given it (slopes.ts).
 * `keptPrior` stands in for the table that system_prior names.
 * @throws UserError for a system prior that cannot be read or a method switched off that does not exist.
 */
export async function settingsOf(
  loaded: LoadedStudy,
  keptPrior?: NonNullable<AssessSettings['systemPrior']>,
): Promise<AssessSettings> {
  const { study, folder } = loaded;
  study.period.switched_off.forEach((id, i) => {
    if (findMethod(id) === undefined && !STIFFNESS_ROUTES.some((route) => route.id === id)) {
      throw new UserError(
        `unknown method ${showValue(id)}; swaymark methods lists them, and the stiffness routes are ${STIFFNESS_ROUTES.map((route) => route.id).join(', ')}`,
        loaded.placeOf(['period', 'switched_off', i]),
      );
    }
  });
  for (const [system, id] of Object.entries(study.period.formula_for)) {
    if (findMethod(id)?.basis === undefined) {
      throw new UserError(
        `${showValue(id)} is not a period formula; \`swaymark methods period\` lists them`,
        loaded.placeOf(['period', 'formula_for', system]),
      );
    }
  }
  const prior =
    study.system_prior === undefined ? null : (keptPrior ?? (await loadPrior(resolve(folder, study.system_prior))));
  return {
    spectra: study.hazard.spectra,
    levels: study.hazard.levels.map((level) => levelOf(level, study)),
    holdPlateau: study.hazard.hold_plateau,
    period: {
      standard: study.period.standard,
      basis: study.period.basis,
      formulaFor: study.period.formula_for,
      switchedOff: study.period.switched_off,
    },
    codeHistory: codeHistoryOf(study.code_history),
    strengthCheck: { method: study.strength_check.method, timeIndex: study.strength_check.time_index },
    systemPrior: prior,
    rankBy: study.ranking.rank_by,
    slope: typeof study.ranking.k === 'number' ? study.ranking.k : ASSUMED_SLOPE,
    slopeSource: typeof study.ranking.k === 'number' ? 'stated' : 'assumed',
    spreads: spreadsOf(study.spreads),
    assumed: assumedOf(study),
    irregularity: study.irregularity,
  };
}

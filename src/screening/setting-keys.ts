/** The settings kept with a run by the study's own keys: what a person changes is the study. */
import { spreadKeyOf } from '../study/assumed-schema.js';
import type { KeyPath } from '../study/document.js';

/** Where the two differ by more than how a key is spelt; the longest beginning counts. */
const KEYS: readonly (readonly [setting: string, key: string])[] = [
  ['spectra', 'hazard.spectra'],
  ['levels', 'hazard.levels'],
  ['holdPlateau', 'hazard.hold_plateau'],
  ['rankBy', 'ranking.rank_by'],
  ['slope', 'ranking.k'],
  ['slopeSource', 'ranking.k (where it is from)'],
  ['listSize', 'ranking.list_size'],
  ['codeHistory', 'code_history'],
  ['strengthCheck.timeIndex', 'strength_check.time_index'],
  ['strengthCheck', 'strength_check'],
  ['systemPrior', 'system_prior'],
  ['period.formulaFor', 'period.formula_for'],
  ['period.switchedOff', 'period.switched_off'],
  ['assumed.overstrength', 'capacity.overstrength'],
  ['assumed.leastCoefficient', 'capacity.least_coefficient'],
  ['assumed.ductility', 'capacity.ductility'],
  ['assumed.retrofitLevel', 'capacity.retrofit_level'],
  ['assumed.uses', 'people.uses'],
  ['assumed.peopleWeight', 'people.weight'],
  ['assumed.importanceWeight', 'people.importance_weight'],
];

/** The path of the study that states what stands at `path` in the settings; names that the user gave stay as they are. */
export function studyKeyOf(path: KeyPath): KeyPath {
  const found = KEYS.map(([setting, key]) => ({ steps: setting.split('.'), key }))
    .filter(({ steps }) => steps.every((step, i) => path[i] === step))
    .sort((a, b) => b.steps.length - a.steps.length)[0];
  if (found !== undefined) return [...found.key.split('.'), ...path.slice(found.steps.length)];
  return path[0] === 'spreads' ? path.map((step) => (typeof step === 'string' ? spreadKeyOf(step) : step)) : path;
}

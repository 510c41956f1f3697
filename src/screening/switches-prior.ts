/** Switches of the chances of the lateral system where it is not known. */
import { SYSTEMS } from '../engineering/building.js';
import type { AssessSettings } from '../engineering/assess/settings.js';
import type { SystemPriorGroup } from '../engineering/prior/system-prior.js';
import type { Switch } from './switch.js';

/** Every system with the same chance, whatever use, storeys and year: what is believed where nothing is. */
export const UNIFORM: readonly SystemPriorGroup[] = [
  {
    use: null,
    storeysFrom: null,
    storeysTo: null,
    builtFrom: null,
    builtTo: null,
    label: 'every system alike',
    chances: SYSTEMS.map((system) => ({ system, chance: 1 / SYSTEMS.length })),
  },
];

export const UNIFORM_TO = 'uniform: all alike';

/** The uniform table is always among them, also where the study names none. */
export function priorSwitches(settings: AssessSettings): readonly Switch[] {
  const groups = settings.systemPrior;
  const switched = (to: string, systemPrior: readonly SystemPriorGroup[]): Switch => {
    return { assumption: 'system-prior', to, settings: { ...settings, systemPrior }, newPeriods: true };
  };
  return [
    switched(UNIFORM_TO, UNIFORM),
    ...(groups === null
      ? []
      : [
          switched('likeliest of each group', groups.map(likeliest)),
          switched('alike within each group', groups.map(alike)),
        ]),
  ];
}

function likeliest(group: SystemPriorGroup): SystemPriorGroup {
  const [first] = [...group.chances].sort((a, b) => b.chance - a.chance || (a.system < b.system ? -1 : 1));
  return { ...group, chances: first === undefined ? [] : [{ system: first.system, chance: 1 }] };
}

function alike(group: SystemPriorGroup): SystemPriorGroup {
  return {
    ...group,
    chances: group.chances.map(({ system }) => ({ system, chance: 1 / group.chances.length })),
  };
}

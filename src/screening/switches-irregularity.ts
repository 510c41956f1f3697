/** What a sensitivity run switches of irregularities: their factors, and the chances of those not on record. */
import { NO_IRREGULARITY_CHANCES } from '../engineering/assess/settings.js';
import type { AssessSettings } from '../engineering/assess/settings.js';
import type { Switch } from './switch.js';

export function irregularitySwitches(settings: AssessSettings): readonly Switch[] {
  const own = settings.irregularity ?? NO_IRREGULARITY_CHANCES;
  const factors = (change: (factor: number) => number): AssessSettings => {
    const { soft_or_weak_storey, torsion, reentrant_corner, setback, mass_irregularity } = own.factors;
    return {
      ...settings,
      irregularity: {
        ...own,
        factors: {
          soft_or_weak_storey: change(soft_or_weak_storey),
          torsion: change(torsion),
          reentrant_corner: change(reentrant_corner),
          setback: change(setback),
          mass_irregularity: change(mass_irregularity),
        },
      },
    };
  };
  const chances = (times: number): AssessSettings => {
    const { soft_storey: soft, weak_storey: weak, torsion, reentrant_corner, setback, mass_irregularity } = own.chances;
    const of = (chance: number): number => Math.min(1, times * chance);
    return {
      ...settings,
      irregularity: {
        ...own,
        chances: {
          soft_storey: { frame: of(soft.frame), wall: of(soft.wall) },
          weak_storey: { frame: of(weak.frame), wall: of(weak.wall) },
          torsion: of(torsion),
          reentrant_corner: of(reentrant_corner),
          setback: of(setback),
          mass_irregularity: of(mass_irregularity),
        },
      },
    };
  };
  return [
    { assumption: 'irregularity', to: 'no factor', settings: factors(() => 1) },
    { assumption: 'irregularity', to: 'each factor squared', settings: factors((factor) => factor * factor) },
    // runs of earlier versions have no such entry in their register
    ...(settings.irregularity === undefined
      ? []
      : [
          { assumption: 'irregularity-chances', to: 'blank counts as none', settings: chances(0) },
          { assumption: 'irregularity-chances', to: 'chances doubled', settings: chances(2) },
        ]),
  ];
}

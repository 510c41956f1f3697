/** Switches of how periods are found: standard and basis of the formulas, stiffness models, spreads, the plateau. */
import type { System } from '../engineering/building.js';
import { SYSTEMS } from '../engineering/building.js';
import type { AssessSettings } from '../engineering/assess/settings.js';
import { regressionsFor, standardRead } from '../engineering/period/choose.js';
import type { Basis, PeriodStandard } from '../engineering/period/choose.js';
import { STIFFNESS_ROUTES } from '../engineering/stiffness/routes.js';
import type { Switch } from './switch.js';

/** One set of formulas of each kind: design, best fit, and of three other schools [judgement]. */
const STANDARDS: readonly (readonly [PeriodStandard, Basis, string])[] = [
  ['asce7-22', 'design', 'asce7-22, design'],
  ['asce41-17', 'best-fit', 'asce41-17, best fit'],
  ['en1998-1-2004', 'design', 'en1998-1-2004'],
  ['nbc-2015', 'design', 'nbc-2015'],
  ['japan-1793', 'design', 'japan-1793'],
];

const ROUTE_IDS: readonly string[] = STIFFNESS_ROUTES.map(({ id }) => id);

export function periodSwitches(settings: AssessSettings): readonly Switch[] {
  const { period, spreads } = settings;
  const read = standardRead(period.standard, period.basis);
  const withPeriod = (change: Partial<AssessSettings['period']>): AssessSettings => ({
    ...settings,
    period: { ...period, ...change },
  });
  const ambient = Object.fromEntries(
    SYSTEMS.flatMap((system) => {
      const found = regressionsFor(system).find(({ basis }) => basis === 'ambient');
      return found === undefined ? [] : [[system, found.id]];
    }),
  ) as Partial<Record<System, string>>;
  const again = { newPeriods: true };
  return [
    ...STANDARDS.filter(([standard]) => standard !== read).map(([standard, basis, to]): Switch => {
      return { assumption: 'period-standard', to, from: read, settings: withPeriod({ standard, basis }), ...again };
    }),
    {
      assumption: 'period-standard',
      to: 'ambient laws, lengthened',
      from: read,
      settings: withPeriod({ formulaFor: ambient }),
      ...again,
    },
    ...Object.keys(period.formulaFor).map((system): Switch => {
      const { [system as System]: _own, ...others } = period.formulaFor;
      return {
        assumption: `period-formula-${system}`,
        to: `that of ${read}`,
        settings: withPeriod({ formulaFor: others }),
        ...again,
      };
    }),
    ...(period.switchedOff.length === 0
      ? []
      : [{ assumption: 'period-switched-off', to: 'none', settings: withPeriod({ switchedOff: [] }), ...again }]),
    ...[0.2, 0.45].map((heightFormula): Switch => {
      return {
        assumption: 'period-spread',
        to: String(heightFormula),
        settings: { ...settings, spreads: { ...spreads, heightFormula } },
        ...again,
      };
    }),
    {
      assumption: 'stiffness-spread',
      to: '× 1.5',
      settings: { ...settings, spreads: { ...spreads, storeyStiffness: 1.5 * spreads.storeyStiffness } },
      ...again,
    },
    {
      assumption: 'stiffness-models-spread',
      to: '× 1.5',
      settings: {
        ...settings,
        spreads: {
          ...spreads,
          storeySections: 1.5 * spreads.storeySections,
          storeyWalls: 1.5 * spreads.storeyWalls,
          storeySway: 1.5 * spreads.storeySway,
        },
      },
      ...again,
    },
    {
      assumption: 'stiffness-bias',
      to: 'no stiffness model',
      from: 'they count',
      settings: withPeriod({ switchedOff: [...new Set([...period.switchedOff, ...ROUTE_IDS])] }),
      ...again,
    },
    {
      assumption: 'hold-plateau',
      to: settings.holdPlateau ? 'no' : 'yes',
      settings: { ...settings, holdPlateau: !settings.holdPlateau },
      ...again,
    },
  ];
}

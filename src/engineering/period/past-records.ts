/** Design periods of the Uniform Building Code before 1988; used for the design coefficient of the era and nowhere else. */
import { record } from '../formula.js';
import { heightOverRootPlan, perStorey } from './families.js';

const source = { standard: 'UBC', edition: '61 to 85', clause: '2314 (1961), 2312(d) (1976)' } as const;

/** T = 0.05 h/√D in feet. */
export const UBC_1961_OTHER = record({
  id: 'ubc-1961/period/other',
  title: 'Design period, buildings other than complete moment frames',
  family: heightOverRootPlan,
  constants: { coefficient: 0.05, unit_m: 0.3048 },
  source,
  verified: 'memory',
  basis: 'design',
  limits: [],
});

/** T = 0.10 N. */
export const UBC_1961_MOMENT_FRAME = record({
  id: 'ubc-1961/period/moment-frame',
  title: 'Design period, moment-resisting space frame that resists the whole of the force',
  family: perStorey,
  constants: { coefficient: 0.1 },
  source,
  verified: 'memory',
  basis: 'design',
  limits: [],
});

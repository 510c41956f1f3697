/** Design periods of the Uniform Building Code before 1988; used for the design coefficient of the era and nowhere else. */
import { record } from '../formula.js';
import { heightOverRootPlan, heightPower, perStorey } from './families.js';

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

/** A design period c h/√d in metres. */
const byPlan = (id: string, title: string, standard: string, edition: string, coefficient: number) =>
  record({
    id: `${id}/period/other`,
    title,
    family: heightOverRootPlan,
    constants: { coefficient, unit_m: 1 },
    source: { standard, edition, clause: 'approximate period' },
    verified: 'memory',
    basis: 'design',
    limits: [],
  });

export const DM_1975_PERIOD = byPlan(
  'italy-1975',
  'Design period, framed buildings',
  'Ministerial Decrees',
  '1975 to 1996',
  0.1,
);
export const GREECE_1995_PERIOD = byPlan(
  'greece-1995',
  'Design period, no walls',
  'NEAK and EAK, Greece',
  '1995 to 2003',
  0.09,
);
export const TURKEY_1975_PERIOD = byPlan(
  'turkey-1975',
  'Design period',
  'Regulation for structures in disaster areas, Türkiye',
  '1975',
  0.09,
);
export const INDIA_1970_OTHER = byPlan('is1893-1970', 'Design period, all others', 'IS 1893', '1970 to 1984', 0.09);

/** T = 0.1 n. */
export const INDIA_1970_FRAME = record({
  id: 'is1893-1970/period/moment-frame',
  title: 'Design period, moment-resisting frames without walls or braces',
  family: perStorey,
  constants: { coefficient: 0.1 },
  source: { standard: 'IS 1893', edition: '1970 to 1984', clause: 'approximate period' },
  verified: 'memory',
  basis: 'design',
  limits: [],
});

const turkish = (which: string, what: string, coefficient: number) =>
  record({
    id: `turkey-1998/period/${which}`,
    title: `Design period, ${what}`,
    family: heightPower,
    constants: { coefficient, exponent: 0.75, unit_m: 1 },
    source: { standard: 'Regulation for structures in disaster areas, Türkiye', edition: '1998', clause: '6.7.4' },
    verified: 'memory',
    basis: 'design',
    limits: [],
  });

/** C_t H^(3/4) of 1998. */
export const TURKEY_1998_PERIODS = {
  'concrete-frames': turkish('concrete-frames', 'concrete frames', 0.07),
  'steel-frames': turkish('steel-frames', 'steel frames', 0.08),
  other: turkish('other', 'all other systems', 0.05),
};

export const PAST_PERIODS = [
  DM_1975_PERIOD,
  GREECE_1995_PERIOD,
  TURKEY_1975_PERIOD,
  INDIA_1970_OTHER,
  INDIA_1970_FRAME,
  ...Object.values(TURKEY_1998_PERIODS),
];

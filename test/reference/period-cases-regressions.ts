/** Answers that the case file states (D computed vectors, R statements), regressions. */
import { exactly } from './case.js';
import type { ReferenceCase } from './case.js';
import { answer, feet } from './period-cases-worked.js';

const AT_20 = { height_m: 20 };
const GC = 'Goel and Chopra 1997 at 100 ft';
const D11 = 'published laws for concrete at 20 m';

export const REGRESSION_PERIOD_CASES: readonly ReferenceCase[] = [
  ...(
    [
      ['concrete-moment-frame-lower', 1.0095],
      ['concrete-moment-frame-best', 1.1357],
      ['concrete-moment-frame-upper', 1.4512],
      ['steel-moment-frame-lower', 1.1147],
      ['steel-moment-frame-best', 1.3934],
      ['steel-moment-frame-upper', 1.7915],
    ] as const
  ).map(([which, expected]) =>
    answer(`D07-${which}`, `goel-chopra-1997/period/${which}`, feet(100), expected, 4, GC, 'own arithmetic'),
  ),
  ...(
    [
      ['gallipoli-2010/period/concrete', 0.32],
      ['crowley-pinho-2004/period/concrete-moment-frame', 2],
      ['crowley-pinho-2006/period/concrete-infilled-frame', 1.1],
      ['hong-hwang-2000/period/concrete-moment-frame', 0.3269],
      ['guler-2008/period/concrete-infilled-frame', 0.3854],
    ] as const
  ).map(([method, expected]) =>
    answer(`D11-${method.replace('/period/', '-')}`, method, AT_20, expected, 4, D11, 'own arithmetic'),
  ),
  ...(
    [
      ['concrete-moment-frame-lower', 0.6907],
      ['concrete-moment-frame-upper', 0.9931],
    ] as const
  ).map(([which, expected]): ReferenceCase => ({
    ...answer(`D11-${which}`, `goel-chopra-1997/period/${which}`, AT_20, expected, 4, D11, 'own arithmetic'),
    tolerance: 0.0005,
    note: 'stated with the rounded metric coefficients 0.0466 and 0.0670',
  })),
  answer(
    'R01-rock',
    'salameh-2016/period/concrete-on-rock',
    { storeys: 10 },
    0.4348,
    4,
    'Salameh et al. 2016: N/23 at ten storeys',
    'own arithmetic',
  ),
  answer(
    'R01-soft',
    'salameh-2016/period/concrete-on-soft-soil',
    { storeys: 10 },
    0.5556,
    4,
    'Salameh et al. 2016: N/18 at ten storeys',
    'own arithmetic',
  ),
  answer(
    'R02-new',
    'goel-conference/period/concrete-moment-frame',
    feet(100),
    1.1068,
    4,
    'Goel: the coefficient 0.035 at 100 ft',
    'own arithmetic',
  ),
  answer(
    'R03',
    'abo-el-saad-salama-2015/period/walls',
    feet(100),
    0.4427,
    4,
    'Abo El-saad and Salama 2015: 0.014 at 100 ft',
    'own arithmetic',
  ),
  answer(
    'R04',
    'kwon-kim-2010/period/walls-and-other',
    feet(100),
    0.4743,
    4,
    'Kwon and Kim 2010: 0.015 at 100 ft',
    'own arithmetic',
  ),
  ...([5, 10, 20] as const).map((storeys): ReferenceCase => ({
    id: `R05-${String(storeys)}`,
    method: 'practice-taiwan/period/by-storeys',
    inputs: { storeys },
    ...exactly(storeys / 10),
    source: 'Taiwan note: T = N/10 under 40 storeys',
    mark: 'own arithmetic',
  })),
];

/** China: the load code's annex on periods and the tall-building specification. Metres; B is the width in the direction considered. */
import type { AnyRecord } from '../formula.js';
import { heightOverCubeRootPlan, perStorey } from './families.js';
import { period } from './publication.js';
import type { Publication, Row } from './publication.js';
import { reducedSway } from './sway-families.js';

const GB: Publication = {
  id: 'gb50009-2012',
  source: { standard: 'GB 50009', edition: '2012', clause: 'F.2' },
  verified: 'memory',
  basis: 'design',
};
const JGJ: Publication = {
  id: 'jgj3',
  source: { standard: 'JGJ 3', edition: '', clause: 'C.0.2' },
  verified: 'restated',
  basis: 'design',
};

const storeys = (which: string, title: string, coefficient: number, row: Row = {}): AnyRecord =>
  period(GB, which, title, perStorey, { coefficient }, row);

export const CHINA_PERIODS: readonly AnyRecord[] = [
  storeys('steel-by-storeys-lower', 'Period by number of storeys, steel, lower end', 0.1),
  storeys('steel-by-storeys-upper', 'Period by number of storeys, steel, upper end', 0.15),
  storeys('concrete-by-storeys-lower', 'Period by number of storeys, concrete, lower end', 0.05, {
    note: 'The end that worked examples use for shear walls (0.05 n restated).',
  }),
  storeys('concrete-by-storeys-upper', 'Period by number of storeys, concrete, upper end', 0.1),
  period(
    GB,
    'concrete-frame-or-frame-wall',
    'Period by height and width, concrete frame or frame with walls',
    heightOverCubeRootPlan,
    { base_s: 0.25, coefficient: 0.00053, height_exponent: 2 },
    { clause: 'F.2.2' },
  ),
  period(
    GB,
    'concrete-walls',
    'Period by height and width, concrete shear walls',
    heightOverCubeRootPlan,
    { base_s: 0.03, coefficient: 0.03, height_exponent: 1 },
    { clause: 'F.2.2', verified: 'restated' },
  ),
  period(
    JGJ,
    'top-displacement',
    'Period from the top displacement under the floor weights applied sideways',
    reducedSway,
    { coefficient: 1.7 },
    {
      limits: [
        {
          input: 'wall_reduction',
          from: 0.6,
          to: 1,
          whose: 'publication',
          outside: 'flag',
          text: 'reductions of 0.6 to 1',
        },
      ],
      note: 'Reduction 0.6 to 0.7 for frames, 0.7 to 0.8 for frames with walls, 0.8 to 1.0 for shear walls (the ranges are recalled).',
    },
  ),
];

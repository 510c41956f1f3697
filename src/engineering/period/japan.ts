/** Japan: the notification of 1980, and periods by amplitude. Metres; h is the height effective for vibration. */
import type { AnyRecord } from '../formula.js';
import { heightByMaterial, heightLinear } from './families.js';
import { period } from './publication.js';
import type { Publication, Row } from './publication.js';

const NOTIFICATION: Publication = {
  id: 'japan-1793',
  source: { standard: 'Japan, Notification 1793', edition: '1980', clause: 'No. 2' },
  verified: 'restated',
  basis: 'design',
};
const AMPLITUDE: Publication = {
  id: 'satake-2003',
  source: { standard: 'AIJ; Satake et al.', edition: '2003', clause: 'periods for habitability and for safety' },
  verified: 'memory',
  basis: 'best-fit',
};
const EFFECTIVE = 'h is the height effective for vibration, which may differ from the height of the building.';
const habitability: Row = { basis: 'ambient', note: 'Small amplitude.' };

const linear = (of: Publication, which: string, title: string, coefficient: number, row: Row): AnyRecord =>
  period(of, which, title, heightLinear, { coefficient }, row);

export const JAPAN_PERIODS: readonly AnyRecord[] = [
  period(
    NOTIFICATION,
    'mixed',
    'Design period by the share of the height in steel or wood',
    heightByMaterial,
    { coefficient: 0.02, added_coefficient: 0.01 },
    { note: EFFECTIVE },
  ),
  linear(NOTIFICATION, 'concrete', 'Design period, no storey of steel or wood', 0.02, { note: EFFECTIVE }),
  linear(NOTIFICATION, 'steel-or-wood', 'Design period, every storey of steel or wood', 0.03, { note: EFFECTIVE }),
  linear(AMPLITUDE, 'concrete-habitability', 'Period for habitability, concrete and composite', 0.015, habitability),
  linear(AMPLITUDE, 'concrete-safety', 'Period for safety, concrete and composite', 0.018, {}),
  linear(AMPLITUDE, 'steel-habitability', 'Period for habitability, steel', 0.02, habitability),
  linear(AMPLITUDE, 'steel-safety', 'Period for safety, steel', 0.024, {}),
];

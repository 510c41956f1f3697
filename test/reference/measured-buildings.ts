/** Buildings whose period was measured. They check no formula: they say how far formulas lie from single buildings. */
import type { System } from '../../src/engineering/building.js';

export interface MeasuredBuilding {
  readonly id: string;
  readonly what: string;
  /** The nearest of our systems; null where the source names none. */
  readonly system: System | null;
  readonly height_m: number | null;
  /** Heights recalled, not seen with the record, say so. */
  readonly heightMark: 'seen' | 'memory' | 'none';
  readonly storeys: number | null;
  readonly periods_s: readonly number[];
  readonly excitation: string;
  /** Small amplitude: ambient or forced. */
  readonly small: boolean;
  readonly source: string;
  readonly mark: 'restated' | 'memory';
}

export const MEASURED_BUILDINGS: readonly MeasuredBuilding[] = [
  {
    id: 'M01',
    what: 'nine-storey concrete library with walls and frames, Pasadena',
    system: 'concrete-wall-frame',
    height_m: 44,
    heightMark: 'memory',
    storeys: 9,
    periods_s: [0.877, 0.599],
    excitation: 'forced vibration of 2002',
    small: true,
    source: 'report EERL 2004-03: 1.14 Hz east-west, 1.67 Hz north-south',
    mark: 'restated',
  },
  {
    id: 'M02',
    what: '24-storey steel moment frame with viscous dampers, station 03631',
    system: 'steel-moment-frame',
    height_m: 115.5,
    heightMark: 'seen',
    storeys: 24,
    periods_s: [3.333],
    excitation: 'distant earthquake of 2019, roof at 0.044 g',
    small: false,
    source: 'response study of the building: about 0.30 Hz in both directions',
    mark: 'restated',
  },
  {
    id: 'M03',
    what: '60-storey pyramid of steel, San Francisco',
    system: 'steel-moment-frame',
    height_m: 257,
    heightMark: 'memory',
    storeys: 60,
    periods_s: [3.571],
    excitation: 'Loma Prieta 1989',
    small: false,
    source: 'study of two instrumented high-rises: 0.28 Hz; the plan tapers',
    mark: 'restated',
  },
  {
    id: 'M04',
    what: '30-storey concrete moment frame of Y plan, Emeryville',
    system: 'concrete-moment-frame',
    height_m: 95,
    heightMark: 'memory',
    storeys: 30,
    periods_s: [2.5],
    excitation: 'Loma Prieta 1989',
    small: false,
    source: 'the same study and a system identification: 0.40 Hz',
    mark: 'restated',
  },
  {
    id: 'M05',
    what: '101-storey megaframe of steel and concrete, Taipei',
    system: 'steel-moment-frame',
    height_m: 508,
    heightMark: 'memory',
    storeys: 101,
    periods_s: [6.67],
    excitation: 'very distant earthquake of 2011',
    small: false,
    source: 'recordings in the tower: 0.15 Hz',
    mark: 'restated',
  },
  {
    id: 'M06',
    what: '55-storey steel tower, Osaka',
    system: 'steel-moment-frame',
    height_m: 256,
    heightMark: 'memory',
    storeys: 55,
    periods_s: [6.67],
    excitation: 'earthquake of 2011, 770 km away',
    small: false,
    source: 'survey note: 0.15 Hz; storeys, height and system recalled',
    mark: 'restated',
  },
  {
    id: 'M07',
    what: 'twin towers of 200 m, Izmir',
    system: 'concrete-wall-frame',
    height_m: 200,
    heightMark: 'seen',
    storeys: null,
    periods_s: [2.5],
    excitation: 'ambient',
    small: true,
    source: 'microtremor study: 0.4 Hz, one digit; the system is not stated',
    mark: 'restated',
  },
  {
    id: 'M08',
    what: '20-storey building, Taiwan',
    system: null,
    height_m: null,
    heightMark: 'none',
    storeys: 20,
    periods_s: [2],
    excitation: 'roof record',
    small: false,
    source: 'note on the rule T = N/10: about 2 s',
    mark: 'restated',
  },
  {
    id: 'M09',
    what: '10-storey building, Taiwan',
    system: null,
    height_m: null,
    heightMark: 'none',
    storeys: 10,
    periods_s: [1],
    excitation: 'roof record',
    small: false,
    source: 'the same note: about 1 s',
    mark: 'restated',
  },
  {
    id: 'M10',
    what: 'seven-storey concrete frame hotel, Van Nuys, 1971',
    system: 'concrete-moment-frame',
    height_m: 20,
    heightMark: 'memory',
    storeys: 7,
    periods_s: [1, 1.5],
    excitation: 'San Fernando 1971, shortest and longest; about 0.5 s before',
    small: false,
    source: 'recalled, low precision: no test of a formula',
    mark: 'memory',
  },
];

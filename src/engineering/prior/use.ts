/**
 * People per floor area at peak and occupied hours a week by use. Densities of residential, hotel, office, school, hospital, retail,
 * laboratory and warehouse from memory of a published table; the rest and all hours are judgement.
 */
import type { Use } from '../building.js';

export interface UseValues {
  readonly people_per_m2: number;
  readonly hours_per_week: number;
  readonly verified: 'memory' | 'judgement' | 'study';
}

export const USE_VALUES: Readonly<Record<Use, UseValues>> = {
  residential: { people_per_m2: 0.033, hours_per_week: 110, verified: 'memory' },
  hotel: { people_per_m2: 0.027, hours_per_week: 100, verified: 'memory' },
  office: { people_per_m2: 0.043, hours_per_week: 50, verified: 'memory' },
  school: { people_per_m2: 0.14, hours_per_week: 40, verified: 'memory' },
  hospital: { people_per_m2: 0.054, hours_per_week: 110, verified: 'memory' },
  retail: { people_per_m2: 0.065, hours_per_week: 70, verified: 'memory' },
  assembly: { people_per_m2: 0.2, hours_per_week: 20, verified: 'judgement' },
  laboratory: { people_per_m2: 0.032, hours_per_week: 50, verified: 'memory' },
  industrial: { people_per_m2: 0.015, hours_per_week: 50, verified: 'judgement' },
  warehouse: { people_per_m2: 0.011, hours_per_week: 50, verified: 'memory' },
  parking: { people_per_m2: 0.005, hours_per_week: 20, verified: 'judgement' },
  emergency: { people_per_m2: 0.03, hours_per_week: 168, verified: 'judgement' },
  other: { people_per_m2: 0.03, hours_per_week: 50, verified: 'judgement' },
  unknown: { people_per_m2: 0.03, hours_per_week: 50, verified: 'judgement' },
};

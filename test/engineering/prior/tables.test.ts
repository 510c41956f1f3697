import { describe, expect, it } from 'vitest';
import { SYSTEMS, USES } from '../../../src/engineering/building.js';
import { SYSTEM_FACTORS } from '../../../src/engineering/capacity/systems.js';
import { STOREY_HEIGHTS, storeyHeight, storeysFromHeight } from '../../../src/engineering/prior/storey-height.js';
import { UNIT_WEIGHT_KN_PER_M2 } from '../../../src/engineering/prior/unit-weight.js';
import { USE_VALUES } from '../../../src/engineering/prior/use.js';

describe('USE_VALUES', () => {
  // typed again from the engineering's own table of densities and hours; the densities are from memory of a published table
  it('hold the densities and hours agreed', () => {
    const table: Record<string, readonly [number, number]> = {
      residential: [0.033, 110],
      hotel: [0.027, 100],
      office: [0.043, 50],
      school: [0.14, 40],
      hospital: [0.054, 110],
      retail: [0.065, 70],
      assembly: [0.2, 20],
      laboratory: [0.032, 50],
      industrial: [0.015, 50],
      warehouse: [0.011, 50],
      parking: [0.005, 20],
      emergency: [0.03, 168],
      other: [0.03, 50],
      unknown: [0.03, 50],
    };
    for (const use of USES) {
      const { people_per_m2, hours_per_week } = USE_VALUES[use];
      expect([people_per_m2, hours_per_week], use).toEqual(table[use]);
    }
  });
});

describe('STOREY_HEIGHTS', () => {
  // 17 tall buildings of one city: residential 3.07 to 3.26 m, hotel 3.4 to 3.6 m, office 3.7 to 4.6 m (public table, restated)
  it('lie where a small sample of buildings does', () => {
    expect(STOREY_HEIGHTS.residential.height_m).toBeGreaterThanOrEqual(3.07);
    expect(STOREY_HEIGHTS.residential.height_m).toBeLessThanOrEqual(3.26);
    expect(STOREY_HEIGHTS.hotel.height_m).toBeGreaterThanOrEqual(3.4);
    expect(STOREY_HEIGHTS.hotel.height_m).toBeLessThanOrEqual(3.6);
    expect(STOREY_HEIGHTS.office.height_m).toBeGreaterThanOrEqual(3.7);
    expect(STOREY_HEIGHTS.office.height_m).toBeLessThanOrEqual(4.6);
  });

  it('lead from storeys to a height and back', () => {
    for (const use of USES) {
      for (let storeys = 1; storeys <= 20; storeys += 1) {
        const { height_m } = storeyHeight(use, storeys);
        // two storeys of a hall's use are about as high as one hall: not told apart by height
        if (STOREY_HEIGHTS[use].single !== undefined && storeys < 3) continue;
        expect(storeysFromHeight(use, storeys * height_m).storeys, use).toBe(storeys);
      }
    }
  });
});

describe('SYSTEM_FACTORS', () => {
  it('and UNIT_WEIGHT_KN_PER_M2 hold every system within published bounds', () => {
    for (const system of SYSTEMS) {
      const { k, rw, r1997, r2002 } = SYSTEM_FACTORS[system];
      // K 0.67 to 1.33 for buildings; R_w 4 to 12; R up to 8.5 (UBC, from memory); unreinforced masonry has no row of its own
      for (const value of k) expect([0.67, 0.8, 1, 1.33], system).toContain(value);
      expect(k[1], system).toBeLessThanOrEqual(k[0]);
      for (const value of [rw, r1997, r2002]) expect(value, system).toBeLessThanOrEqual(12);
      expect(UNIT_WEIGHT_KN_PER_M2[system], system).toBeGreaterThanOrEqual(2);
      // sizing values of 14 to 18 kN/m² are the upper side of published notes (restated)
      expect(UNIT_WEIGHT_KN_PER_M2[system], system).toBeLessThanOrEqual(14);
    }
  });
});

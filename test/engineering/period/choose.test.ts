import { describe, expect, it } from 'vitest';
import { SYSTEMS } from '../../../src/engineering/building.js';
import { applyAny } from '../../../src/engineering/formula.js';
import {
  BASES,
  PERIOD_STANDARDS,
  formulasOf,
  heightFormula,
  standardRead,
} from '../../../src/engineering/period/choose.js';

describe('heightFormula', () => {
  it('knows a formula for every system, standard and basis', () => {
    for (const standard of PERIOD_STANDARDS) {
      for (const basis of BASES) {
        for (const system of SYSTEMS) {
          const method = heightFormula(system, standard, basis);
          expect(formulasOf(standard, basis)).toContain(method);
          const low = applyAny(method, { height_m: 10 });
          expect(applyAny(method, { height_m: 20 })).toBeGreaterThan(low);
        }
      }
    }
  });

  // table 12.8-2 of ASCE 7: frames enclosed by rigid parts are "all other"
  it('counts infilled frames as other and precast frames as frames', () => {
    expect(heightFormula('concrete-infilled-frame', 'asce7-22', 'design').id).toBe('asce7-22/period/other');
    expect(heightFormula('precast-concrete-frame', 'asce7-22', 'design').id).toBe(
      'asce7-22/period/concrete-moment-frame',
    );
    expect(heightFormula('steel-buckling-restrained-braced-frame', 'asce7-22', 'design').id).toBe(
      'asce7-22/period/steel-eccentric-or-buckling-restrained',
    );
  });

  // Goel and Chopra 1997, from memory: best fits 0.035/0.028 = 1.25 and 0.018/0.016 = 1.125 times the lower bounds
  it('is longer by best fit than by design for frames', () => {
    const ratio = (system: 'steel-moment-frame' | 'concrete-moment-frame'): number =>
      applyAny(heightFormula(system, 'asce7-22', 'best-fit'), { height_m: 30 }) /
      applyAny(heightFormula(system, 'asce7-22', 'design'), { height_m: 30 });
    expect(ratio('steel-moment-frame')).toBeCloseTo(1.25, 12);
    expect(ratio('concrete-moment-frame')).toBeCloseTo(1.125, 12);
  });
});

describe('standardRead', () => {
  it('substitutes the standard that has the basis', () => {
    expect(standardRead('asce7-22', 'best-fit')).toBe('asce41-17');
    expect(standardRead('asce41-17', 'design')).toBe('asce7-22');
    expect(standardRead('en1998-1-2004', 'best-fit')).toBe('en1998-1-2004');
  });
});

import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import { casesOf } from '../../../src/engineering/assess/cases.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import type { CodeHistorySettings } from '../../../src/engineering/assess/settings.js';
import { weakOf } from '../../../src/engineering/assess/weak.js';
import type { Building, System } from '../../../src/engineering/building.js';
import { building, given } from '../../support/engineering-building.js';
import { codeHistory } from '../../support/code-histories.js';
import { SETTINGS } from '../../support/engineering-settings.js';

function weak(history: CodeHistorySettings | null, system: System, year: number): string | null {
  const context = compileContext({ ...SETTINGS, codeHistory: history });
  const one = building({ system, years: [year] });
  const cases = casesOf(one, context);
  if (typeof cases === 'string') throw new Error(cases);
  return weakOf(cases, false, history).name;
}

describe('weakOf', () => {
  const us = codeHistory('us-ubc-asce7');

  it('goes by the dates of the United States there', () => {
    // UBC 1976 anchors of tilt-up walls, connection damage of 1994: from memory; with two years of lag and away from a change
    expect(weak(us, 'precast-tilt-up-wall', 1970)).toBe('tilt-up-before-wall-anchors');
    expect(weak(us, 'precast-tilt-up-wall', 1985)).toBeNull();
    expect(weak(us, 'steel-moment-frame', 1945)).toBeNull();
    expect(weak(us, 'steel-moment-frame', 1985)).toBe('welded-steel-frame');
    expect(weak(us, 'steel-moment-frame', 2010)).toBeNull();
    expect(weak(us, 'precast-concrete-frame', 1985)).toBe('precast-frame');
    expect(weak(us, 'concrete-moment-frame', 1985)).toBeNull();
  });

  it('goes by the detailing date of another family', () => {
    const greek = codeHistory('greece');
    expect(weak(greek, 'concrete-moment-frame', 1980)).toBe('concrete-frame-before-detailing');
    expect(weak(greek, 'concrete-moment-frame', 1992)).toBeNull();
    expect(weak(greek, 'precast-concrete-frame', 1980)).toBe('precast-frame');
    expect(weak(greek, 'precast-concrete-frame', 1992)).toBeNull();
    expect(weak(greek, 'steel-moment-frame', 1980)).toBeNull();
    expect(weak(codeHistory('italy'), 'concrete-infilled-frame', 1995)).toBe('concrete-frame-before-detailing');
  });

  it('takes the dates the study states', () => {
    const weak_types = { tilt_up_before: 1988, precast_before: 1976, welded_from: 1976, welded_before: 1988 };
    const own = { ...us, weak_types };
    expect(weak(own, 'precast-tilt-up-wall', 1985)).toBe('tilt-up-before-wall-anchors');
    expect(weak(own, 'precast-concrete-frame', 1985)).toBeNull();
    expect(weak(own, 'steel-moment-frame', 1970)).toBeNull();
    expect(weak(own, 'steel-moment-frame', 1985)).toBe('welded-steel-frame');
    const greek = codeHistory('greece', { weak_types: { welded_from: 1980, welded_before: 1990 } });
    expect(weak(greek, 'steel-moment-frame', 1991)).toBe('welded-steel-frame');
  });

  it('knows timber with a soft first storey by a flag of the row, or by its numbers', () => {
    // ASCE/SEI 7-16 Table 12.3-2: under 0.7 of the stiffness above; two storeys, the first with 0.3 of the second
    const context = compileContext(SETTINGS);
    const timber = (change: Partial<Building>): string | null => {
      const found = assess(building({ system: 'timber-light-frame', years: [1960], ...change }), context);
      if (!isRanked(found)) throw new Error(found.reason);
      return found.weakType;
    };
    const stiffness = { longitudinal: [30_000, 100_000], transverse: [90_000, 100_000] };
    expect(timber({})).toBeNull();
    expect(timber({ soft_storey: 'yes' })).toBe('open-front-timber');
    expect(timber({ storeys: given(2), storey_stiffness_kN_per_m: stiffness })).toBe('open-front-timber');
    expect(timber({ storeys: given(2), storey_stiffness_kN_per_m: stiffness, soft_storey: 'no' })).toBeNull();
  });

  it('takes every building for old where there is no code history', () => {
    expect(weak(null, 'concrete-moment-frame', 2020)).toBe('concrete-frame-before-detailing');
    expect(weak(null, 'precast-tilt-up-wall', 2020)).toBe('tilt-up-before-wall-anchors');
    expect(weak(null, 'steel-moment-frame', 2020)).toBeNull();
  });
});

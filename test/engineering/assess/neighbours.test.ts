/** SD-64 (IBC eq. 16-64): 0.12 and 0.09 m need 0.15 m; the height rule of ASCE 41-17 Table 17-2, from memory. */
import { describe, expect, it } from 'vitest';
import { compileContext } from '../../../src/engineering/assess/context.js';
import { closenessOf, swayOf } from '../../../src/engineering/assess/neighbours.js';
import type { Sway } from '../../../src/engineering/assess/neighbours.js';
import { handSteps } from '../../../src/engineering/hand.js';
import { Trace } from '../../../src/engineering/trace.js';
import { building, given } from '../../support/engineering-building.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const sway = (id: string, height_m: number, roof_displacement_m: number): Sway => ({
  id,
  height_m,
  period_s: 0.5,
  roof_displacement_m,
  profile: null,
  plateau_g: 1,
});
const GAP = { gap_m: 0.12, how: 'given', floors_aligned: null } as const;

describe('closenessOf', () => {
  it('needs the root of the squares, less where floors are aligned', () => {
    const [a, b] = [sway('A', 10, 0.12), sway('B', 10, 0.09)];
    expect(closenessOf(a, b, GAP)).toMatchObject({ short: true, needed_m: expect.closeTo(0.15, 12) as number });
    expect(closenessOf(a, b, { ...GAP, floors_aligned: 'yes' })).toMatchObject({
      short: false,
      needed_m: expect.closeTo(0.105, 12) as number,
    });
    // 1.5 % of 10 m in high seismicity
    expect(closenessOf(a, b, { ...GAP, gap_m: 0.149 }).shortByHeight).toBe(true);
    expect(closenessOf(a, b, { ...GAP, gap_m: 0.151 })).toMatchObject({ short: false, shortByHeight: false });
  });

  it('hands over what each rule asks', () => {
    // one period, one damping: the motions are alike, and only the difference of the two is needed: 0.12 − 0.09
    const found = closenessOf(sway('A', 10, 0.12), sway('B', 10, 0.09), GAP);
    expect(found.double_difference_m).toBeCloseTo(0.03, 12);
    expect(found.by_height_m).toBeCloseTo(0.15, 12);
    expect(found.muchTaller).toBe(false);
    expect(closenessOf(sway('A', 15, 0.12), sway('B', 10, 0.09), GAP).muchTaller).toBe(true);
  });

  it('takes the sway at the height of the shorter, and says what makes it worse', () => {
    const found = closenessOf(sway('A', 20, 0.24), sway('B', 10, 0.09), { ...GAP, floors_aligned: 'no' });
    expect(found.needed_m).toBeCloseTo(0.15, 12);
    expect(found.worse).toHaveLength(2);
  });

  it('reads the sway of a soft first storey at the height of the shorter, and says so', () => {
    const profile = { floors_m: [5, 20], shares: [0.7, 1] };
    const trace = new Trace();
    const soft = { ...sway('A', 20, 0.24), profile };
    const found = closenessOf(soft, sway('B', 5, 0), GAP, trace);
    expect(found.needed_m).toBeCloseTo(0.7 * 0.24, 12);
    expect(JSON.stringify(trace.steps)).toContain('70 % of that of its roof, by the shape of its sway');
    expect(closenessOf(sway('A', 20, 0.24), sway('B', 5, 0), GAP).needed_m).toBeCloseTo(0.06, 12);
  });

  it('writes its steps under a heading of its own', () => {
    const trace = new Trace();
    closenessOf(sway('A', 10, 0.12), sway('B', 10, 0.09), GAP, trace);
    const ids = trace.steps.flatMap((step) => (step.kind === 'formula' ? [step.record.id] : []));
    expect(ids).toEqual([
      'asce7-16/separation/srss',
      'jeng-kasai-maison-1992/separation/correlation',
      'jeng-kasai-maison-1992/separation/double-difference',
      'asce41-17/separation/by-height-high',
    ]);
  });
});

describe('handSteps', () => {
  it('says gaps in the units shown: 0.12 m are 0.394 ft, 0.15 m 0.492 ft (0.3048 m a foot, by definition)', () => {
    const trace = new Trace();
    closenessOf(sway('A', 10, 0.12), sway('B', 10, 0.09), GAP, trace);
    const words = (display: 'si' | 'us'): unknown =>
      handSteps(trace, display)
        .filter(({ kind }) => kind === 'choice')
        .map(({ symbolic, source }) => [symbolic, source]);
    expect(words('si')).toEqual([
      ['short: 0.120 m where 0.150 m are needed', 'short by the height rule too (0.150 m)'],
    ]);
    expect(words('us')).toEqual([
      ['short: 0.394 ft where 0.492 ft are needed', 'short by the height rule too (0.492 ft)'],
    ]);
  });
});

describe('swayOf', () => {
  it('takes the larger direction, and nothing of a building that cannot be assessed', () => {
    const context = compileContext(SETTINGS);
    const slender = building({
      measured_period_s: { longitudinal: 0.3, transverse: 0.9 },
      measured_amplitude: 'strong',
    });
    expect(swayOf(slender, context)!.period_s).toBe(0.9);
    expect(swayOf(building({ height_m: given(NaN) }), context)).toBe(null);
  });
});

import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import { casesOf } from '../../../src/engineering/assess/cases.js';
import { codeRatio } from '../../../src/engineering/assess/code-ratio.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import type { CodeHistorySettings } from '../../../src/engineering/assess/settings.js';
import type { Building } from '../../../src/engineering/building.js';
import { Trace } from '../../../src/engineering/trace.js';
import { building } from '../../support/engineering-building.js';
import { codeHistory } from '../../support/code-histories.js';
import { SETTINGS } from '../../support/engineering-settings.js';

function ratio(history: CodeHistorySettings | null, fields: Partial<Building>): number | string {
  const context = compileContext({ ...SETTINGS, codeHistory: history });
  const one = building(fields);
  const cases = casesOf(one, context);
  if (typeof cases === 'string') throw new Error(cases);
  return codeRatio(one, cases.list[0]!, 'longitudinal', context);
}

describe('codeRatio', () => {
  it('is 1 for the latest code, whatever the importance', () => {
    for (const family of ['us-ubc-asce7', 'greece', 'canada'] as const)
      expect(ratio(codeHistory(family), { years: [2024], importance_factor: 1.5 })).toBe(1);
  });

  it('is today over then at strength level', () => {
    // Italy, wall of category 2: 0.07 × 1.4 in 1990 (short of 0.8 s); 0.85 × 2.5 × 0.25 × 1.2/3 today on the plateau
    const today = (0.85 * 2.5 * 0.25 * 1.2) / 3;
    expect(ratio(codeHistory('italy'), { years: [1990], system: 'concrete-shear-wall' })).toBeCloseTo(today / 0.098, 9);
    // without design the floor of 0.04 stands below
    expect(ratio(codeHistory('italy'), { years: [1890], system: 'concrete-shear-wall' })).toBeCloseTo(today / 0.04, 9);
  });

  it('has none without a code history', () => {
    expect(ratio(null, {})).toBe('the study has no code history');
  });

  it('is of earthquakes alone, and none where today’s code builds no such system', () => {
    const history = codeHistory('us-ubc-asce7');
    const years = [1930];
    const calm = ratio(history, { years });
    expect(calm).toBeTypeOf('number');
    expect(ratio(history, { years, wind_base_shear_coefficient: 0.3 })).toBe(calm);
    expect(ratio(history, { years, system: 'unreinforced-masonry-wall' })).toContain(
      'no coefficient for a new building',
    );
  });

  it('stands beside a finished assessment too', () => {
    const trace = new Trace();
    assess(building({ years: [1970], capacity_sa_g: 0.3 }), compileContext(SETTINGS), trace);
    const asked = trace.steps.map((step) => (step.kind === 'choice' ? `${step.question}: ${step.taken}` : ''));
    expect(asked).toContain('Way to the capacity: finished assessment');
    expect(
      trace.steps.some((step) => step.kind === 'formula' && step.record.id === 'swaymark/capacity/code-ratio'),
    ).toBe(true);
  });

  it('stands in the hand calculation and moves nothing', () => {
    const context = compileContext(SETTINGS);
    const trace = new Trace();
    const traced = assess(building({ years: [1970] }), context, trace);
    const plain = assess(building({ years: [1970] }), context);
    if (!isRanked(traced) || !isRanked(plain)) throw new Error('not ranked');
    expect(traced.lnPriority).toBe(plain.lnPriority);
    const shown = trace.steps.filter(
      (step) => step.kind === 'formula' && step.record.id === 'swaymark/capacity/code-ratio',
    );
    expect(shown.length).toBeGreaterThan(0);
  });
});

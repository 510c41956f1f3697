import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import { NO_IRREGULARITY_CHANCES } from '../../../src/engineering/assess/settings.js';
import type { Building } from '../../../src/engineering/building.js';
import { Trace } from '../../../src/engineering/trace.js';
import { building } from '../../support/engineering-building.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const context = compileContext({ ...SETTINGS, rankBy: 'ratio', irregularity: NO_IRREGULARITY_CHANCES });
/** On the plateau, in the middle of an era: nothing but the level is open. */
const DRAWN: Partial<Building> = {
  years: [1970],
  design_base_shear_coefficient: 0.2,
  measured_period_s: { longitudinal: 0.3, transverse: 0.3 },
  measured_amplitude: 'strong',
};

function closed(fields: Partial<Building>) {
  const trace = new Trace();
  const result = assess(building({ ...DRAWN, ...fields }), context, trace);
  if (!isRanked(result)) throw new Error(result.reason);
  const values = trace.steps.flatMap((step) => (step.kind === 'value' ? [step] : []));
  const cases = values.filter(({ name }) => name.startsWith('case ')).map(({ value }) => String(value));
  return { result, trace, values, cases };
}

const centralOf = (words: string): number => Number(/central ln S = ([-\d.]+)/.exec(words)![1]);
const chanceOf = (words: string): number => Number(/chance (\d+) %/.exec(words)![1]) / 100;

describe('closeTrace', () => {
  it('shows either level of a coefficient whose level the drawings do not say', () => {
    const { result, trace, values, cases } = closed({ design_level: null });
    expect(cases).toHaveLength(2);
    expect(cases[0]).toContain('working stress: chance 50 %');
    expect(cases[1]).toContain('strength level: chance 50 %');
    // by hand: 1.4 in the coefficient is ln 1.4 in ln C, so k ln 1.4 in ln S; f_level Ω μ stays under R of the edition here
    expect(centralOf(cases[1]!) - centralOf(cases[0]!)).toBeCloseTo(result.slope_k * Math.log(1.4), 2);
    // two alike normals of equal weight: the median lies halfway between their means
    expect(result.lnPriority).toBeCloseTo(0.5 * (centralOf(cases[0]!) + centralOf(cases[1]!)), 2);
    expect(values.some(({ name }) => name === "level of the drawings' coefficient")).toBe(true);
    expect(trace.steps).toContainEqual(
      expect.objectContaining({ kind: 'choice', question: "Level of the drawings' coefficient" }),
    );
  });

  it.each(['working', 'strength'] as const)('has one case where the drawings say it is %s level', (design_level) => {
    const { result, trace, values, cases } = closed({ design_level });
    expect(cases).toHaveLength(1);
    expect(result.lnPriority).toBeCloseTo(centralOf(cases[0]!), 2);
    expect(values.some(({ name }) => name === "level of the drawings' coefficient")).toBe(false);
    expect(trace.steps.some((step) => step.kind === 'choice' && step.question.startsWith('Level of the'))).toBe(false);
  });

  it('has chances that sum to 1 over eras and levels, and no levels where the coefficient does not count', () => {
    const { cases } = closed({ design_level: null, years: [1963] });
    expect(cases.length).toBeGreaterThan(2);
    expect(cases.reduce((sum, words) => sum + chanceOf(words), 0)).toBeCloseTo(1, 1);
    expect(closed({ design_level: null, capacity_sa_g: 0.3 }).cases).toHaveLength(1);
  });
});

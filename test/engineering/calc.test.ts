import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { calculate, methodCalled, nearestMethods } from '../../src/engineering/calc.js';
import type { AnyRecord, InputSpec } from '../../src/engineering/formula.js';
import { handSteps } from '../../src/engineering/hand.js';
import { METHODS } from '../../src/engineering/methods.js';
import { findUnit, unitsOf } from '../../src/engineering/units.js';
import { UserError } from '../../src/errors.js';

const OTHER = 'asce7-22/period/other';
const run = (id: string, ...inputs: string[]) => calculate(methodCalled(id), inputs);
const failure = (work: () => unknown): string => {
  try {
    work();
  } catch (error) {
    if (error instanceof UserError) return error.message;
    throw error;
  }
  throw new Error('nothing was thrown');
};

/** A number that a record's limits allow, else one that is sensible for anything. */
function sensible(method: AnyRecord, { name, ...spec }: InputSpec): number {
  if (typeof spec.fallback === 'number') return spec.fallback;
  if (spec.to !== undefined) return (spec.from ?? 0) > 0 ? Math.sqrt(spec.from! * spec.to) : spec.to / 8;
  const limit = method.limits.find(({ input }) => input === name);
  if (limit?.from !== undefined && limit.to !== undefined) return Math.sqrt(limit.from * limit.to);
  return limit?.to === undefined ? (limit?.from ?? 0.5) : limit.to / 2;
}

/** The second of two like quantities is larger, so that logarithms of ratios are not of one. */
function assignment(method: AnyRecord, spec: InputSpec): string {
  if (spec.kind === 'word') return `${spec.name}=${spec.words?.[0] ?? 'x'}`;
  if (spec.kind === 'list')
    return `${spec.name}=${[0.5, 1, 2, 2.5, ...Array<number>(40).fill(3)].slice(0, spec.least ?? 3).join(',')}`;
  if (spec.name === 'mode') return 'mode=1';
  return `${spec.name}=${String(sensible(method, spec) * (spec.name.includes('_2') ? 2 : 1))}`;
}

describe('calculate', () => {
  it('agrees with a hand calculation in feet: 0.02 × 93^0.75 = 0.599 s', () => {
    // 93^0.75 by square roots: √93 = 9.643651, √9.643651 = 3.105423; the product is 29.94761 (own arithmetic); ASCE 7-22 table 12.8-2 coefficients.
    expect(run(OTHER, 'height_ft=93').value).toBeCloseTo(0.02 * 29.94761, 5);
  });

  it('shows a conversion as a step', () => {
    const { trace, inputs } = run(OTHER, 'height_ft=93');
    expect(inputs['height_m']).toBeCloseTo(28.3464, 12);
    expect(handSteps(trace, 'si')[1]).toMatchObject({
      kind: 'value',
      title: 'height',
      result: '28.35 m',
      mark: 'converted',
      source: '93 ft × 0.3048',
    });
  });

  it('runs every record of the register from its own input specification', () => {
    for (const method of METHODS) {
      const { value, unit, trace } = calculate(
        method,
        method.family.inputs.map((spec) => assignment(method, spec)),
      );
      expect(Number.isFinite(value), method.id).toBe(true);
      expect(unit).toBe(method.family.unit);
      expect(trace.steps.at(-1)).toMatchObject({ kind: 'formula', value });
    }
  });

  it('takes every quantity of every record in any registered unit of it', () => {
    for (const method of METHODS) {
      const direct = calculate(
        method,
        method.family.inputs.map((spec) => assignment(method, spec)),
      ).value;
      for (const spec of method.family.inputs) {
        const base = findUnit(spec.unit ?? '');
        if (base === undefined || spec.kind !== 'number') continue;
        expect(spec.name.endsWith(`_${base.id}`), `${method.id} ${spec.name} names its unit`).toBe(true);
        for (const unit of unitsOf(base.dimension)) {
          const si = Number(assignment(method, spec).split('=')[1]);
          const name = `${spec.name.slice(0, -base.id.length)}${unit.id}`;
          const others = method.family.inputs
            .filter((other) => other !== spec)
            .map((other) => assignment(method, other));
          const { value } = calculate(method, [...others, `${name}=${String((si * base.factor) / unit.factor)}`]);
          expect(Math.abs(value / direct - 1), `${method.id} ${name}`).toBeLessThan(1e-9);
        }
      }
    }
  });

  it('gives the same period in feet and metres for any height', () => {
    fc.assert(
      fc.property(fc.double({ min: 2, max: 300, noNaN: true }), (height_m) => {
        const metres = run(OTHER, `height_m=${String(height_m)}`).value;
        const feet = run(OTHER, `height_ft=${String(height_m / 0.3048)}`).value;
        return Math.abs(metres / feet - 1) < 1e-12;
      }),
    );
  });

  it('takes lists with one unit', () => {
    const { inputs } = run(
      'mechanics/period/general-chain',
      'masses_t=200,200,180',
      'storey_stiffness_MN_per_m=90,80,80',
    );
    expect(inputs).toEqual({ masses_t: [200, 200, 180], storey_stiffness_kN_per_m: [90_000, 80_000, 80_000] });
  });

  it('fills what may be left out and marks it as a default', () => {
    const { inputs, trace } = run('asce7-22/spectrum/two-period', 'sds_g=0.8', 'sd1_g=0.4', 'period_s=1');
    expect(inputs['tl_s']).toBe(8);
    expect(trace.steps).toContainEqual(expect.objectContaining({ kind: 'value', name: 'tl_s', origin: 'default' }));
  });

  it('refuses a value beyond a limit that rejects, and says whose it is', () => {
    expect(failure(() => run('asce7-22/period/moment-frame-by-storeys', 'storeys=14'))).toContain(
      'storeys = 14 is outside the limit of ASCE/SEI 7: at most 12 storeys',
    );
    expect(failure(() => run('asce7-22/spectrum/two-period', 'sds_g=80', 'sd1_g=0.4', 'period_s=1'))).toContain(
      'sds_g: expected a number in g > 0 and <= 10, got 80',
    );
  });

  it('refuses numbers and lists outside the range of the input', () => {
    const spectrum = (...inputs: string[]): string =>
      failure(() => run('asce7-22/spectrum/multi-period', 'period_s=1', ...inputs));
    expect(spectrum('ordinates_g=1,2')).toContain(
      'ordinates_g: expected a list of 22 numbers in g > 0 and <= 10, got 2',
    );
    expect(failure(() => run('en1998-1-2004/damping/eta', 'damping_ratio=5'))).toBe(
      'en1998-1-2004/damping/eta: damping_ratio: expected a number 0.02 to 0.5, got 5',
    );
  });

  it('says in words what a spectrum flags of its parameters', () => {
    const inputs = ['ss_g=0.9', 's1_g=0.4', 'site_class=default', 'period_s=2'];
    const { flags, trace } = run('asce7-16/spectrum/two-period', ...inputs);
    expect(flags).toEqual([
      "The site class is not known; the code's rule for a default class is taken.",
      expect.stringContaining('Supplement 3'),
    ]);
    // 2/3 × 1.9 × 0.4 × 1.5 / 2 = 0.38 (own arithmetic, F_v of class D at 0.4 g)
    expect(handSteps(trace, 'si').at(-1)).toMatchObject({
      symbolic: 'S_a = 2 / 3 × F_v × S_1 × 1.5 / T',
      substituted: '= 2 / 3 × 1.900 × 0.4000 × 1.5 / 2.000',
      result: '= 0.3800 g',
    });
  });

  it('flags a value beyond a limit that only warns', () => {
    expect(run('en1998-1-2004/period/other', 'height_m=50').flags).toEqual([
      'height_m = 50 is outside the limit of EN 1998-1: buildings up to 40 m',
    ]);
    expect(run('en1998-1-2004/period/other', 'height_m=40').flags).toEqual([]);
  });

  it('checks a limit on a quantity the formula does not take when it is given, and says so when it is not', () => {
    const id = 'asce7-22/period/moment-frame-by-storeys';
    expect(run(id, 'storeys=8').flags[0]).toMatch(/^not checked, mean_storey_height_m was not given/);
    expect(run(id, 'storeys=8', 'mean_storey_height_ft=12').flags).toEqual([]);
    expect(failure(() => run(id, 'storeys=8', 'mean_storey_height_m=2.7'))).toContain('mean_storey_height_m = 2.7');
  });

  it.each([
    [['height_kN=3'], 'kN is a unit of force, and height is a length; write height_m, height_mm'],
    [['height_furlong=3'], 'unknown unit "furlong"'],
    [['height=3'], 'height has no unit; write height_m'],
    [['hight_m=3'], 'unknown input "hight_m"; it takes height_m'],
    [['height_m=1,200'], '"1,200" is not a number'],
    [['height_m=9ft'], 'the unit belongs to the name'],
    [['height_m=0x10'], 'is not a number'],
    [['height_m=Infinity'], 'is not a number'],
    [['height_m=0'], 'it must be above 0'],
    [['height_m=-3'], 'it must be above 0'],
    [['height_m'], 'expected name=value'],
    [['height_m=3', 'height_ft=9'], 'height_m is given twice'],
    [[], 'missing height_m (height from the base to the highest level)'],
  ])('refuses %j', (inputs, message) => {
    expect(failure(() => run(OTHER, ...inputs))).toContain(message);
  });

  it('refuses unknown words and lists that do not fit each other', () => {
    expect(failure(() => run('en1998-1-2004/spectrum/elastic-type-1', 'ag_g=0.2', 'ground=Z', 'period_s=1'))).toContain(
      'unknown word "Z"; known: A, B, C, D, E',
    );
    expect(
      failure(() => run('mechanics/period/general-chain', 'masses_t=2,2', 'storey_stiffness_kN_per_m=9,8,8')),
    ).toContain('as many masses as storey stiffnesses');
  });

  it('refuses inputs for which there is no finite value', () => {
    expect(failure(() => run('mechanics/period/reciprocal-of-frequency', 'frequency_hz=0'))).toContain(
      'frequency_hz = 0 is outside',
    );
    expect(
      failure(() => run('swaymark/priority/log-score', 'slope_k=3', 'sa_g=0', 'capacity_sa_g=0.1', 'people_exposed=1')),
    ).toContain('no finite value');
  });
});

describe('methodCalled', () => {
  it('names the nearest ids for an unknown one', () => {
    expect(failure(() => methodCalled('asce7-22/period/othr'))).toContain('nearest: asce7-22/period/other');
    expect(nearestMethods('steel-moment-frame').every((id) => id.endsWith('/steel-moment-frame'))).toBe(true);
    expect(nearestMethods('asce7-22/steel-moment-frame')).toContain('asce7-22/period/steel-moment-frame');
    expect(nearestMethods('zzzz')).toEqual([]);
  });
});

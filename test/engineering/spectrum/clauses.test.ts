/** The segments of each code against its clauses, written out again from the data sheet without the program's tables. */
import { describe, expect, it } from 'vitest';
import { ordinate } from '../../../src/engineering/spectrum/compiled.js';
import { compileSpectrum } from '../../../src/engineering/spectrum/definition.js';
import type { SpectrumDefinition } from '../../../src/engineering/spectrum/definition.js';

/** 20,000 periods from 1 ms to 12 s. */
const PERIODS = Array.from({ length: 20_000 }, (_, i) => 0.001 + (i * 12) / 20_000);

function agree(definition: SpectrumDefinition, direct: (t: number) => number): void {
  const { compiled } = compileSpectrum(definition);
  let worst = 0;
  for (const period of PERIODS) {
    const there = direct(period);
    worst = Math.max(worst, Math.abs(ordinate(compiled, period) - there) / there);
  }
  expect(worst, JSON.stringify(definition)).toBeLessThanOrEqual(1e-12);
}

/** Straight lines through [x, y], flat outside. */
const through =
  (...points: readonly (readonly [number, number])[]) =>
  (x: number): number => {
    const next = points.findIndex(([at]) => at > x);
    if (next === 0) return points[0]![1];
    if (next === -1) return points.at(-1)![1];
    const [[x1, y1], [x2, y2]] = [points[next - 1]!, points[next]!];
    return y1 + ((y2 - y1) * (x - x1)) / (x2 - x1);
  };

const twoPeriod =
  (sds: number, sd1: number, tl: number) =>
  (t: number): number => {
    const ts = sd1 / sds;
    if (t < 0.2 * ts) return sds * (0.4 + (0.6 * t) / (0.2 * ts));
    if (t <= ts) return sds;
    return t <= tl ? sd1 / t : (sd1 * tl) / t ** 2;
  };

describe('ASCE/SEI 7', () => {
  // 7-05 11.4.5, 7-10 11.4.5 and 7-16 11.4.6; factors read off the tables by eye for these inputs
  it.each([
    ['05', 'D', 0.625, 0.25, 1.3, 1.9],
    ['05', 'E', 1.0, 0.15, 0.9, 3.35],
    ['10', 'C', 0.8, 0.35, 1.08, 1.45],
    ['10', 'default', 0.25, 0.05, 1.6, 2.4],
    ['16', 'A', 1, 0.3, 0.8, 0.8],
    ['16', 'B', 1, 0.3, 0.9, 0.8],
    ['16', 'B-unmeasured', 1, 0.3, 1, 1],
    ['16', 'C', 0.6, 0.55, 1.26, 1.45],
    ['16', 'D', 0.9, 0.15, 1.14, 2.3],
    ['16', 'D', 0.9, 0.25, 1.14, 2.1 * 1.5],
    ['16', 'default', 1.4, 0.6, 1.2, 1.7 * 1.5],
    ['16', 'E', 0.5, 0.1, 1.7, 4.2],
    ['16', 'E', 0.5, 0.35, 1.7, 2.6 * 1.5],
  ] as const)(
    '7-%s of class %s with S_S %d g, S_1 %d g agrees with the clauses',
    (edition, site_class, ss_g, s1_g, fa, fv) => {
      const given = { code: `asce7-${edition}-two-period`, site_class, ss_g, s1_g, tl_s: 6 };
      agree(given, twoPeriod((2 / 3) * fa * ss_g, (2 / 3) * fv * s1_g, 6));
      agree({ ...given, shaking: 'maximum-considered' }, twoPeriod(fa * ss_g, fv * s1_g, 6));
    },
  );

  it('7-22 maximum considered is 1.5 times the design spectrum', () => {
    agree(
      { code: 'asce7-22-two-period-maximum', sds_g: 0.8, sd1_g: 0.5, tl_s: 8 },
      (t) => 1.5 * twoPeriod(0.8, 0.5, 8)(t),
    );
  });

  it('7-22 multi-period agrees with straight lines between 2/3 of the ordinates', () => {
    const periods = [
      0, 0.01, 0.02, 0.03, 0.05, 0.075, 0.1, 0.15, 0.2, 0.25, 0.3, 0.4, 0.5, 0.75, 1, 1.5, 2, 3, 4, 5, 7.5, 10,
    ];
    const ordinates_g = periods.map((t) => 0.5 + t / (0.1 + 2 * t * t));
    const table = through(...periods.map((t, i) => [t, (2 / 3) * ordinates_g[i]!] as const));
    for (const tl_s of [6, 11]) {
      agree({ code: 'asce7-22-multi-period', ordinates_g, tl_s }, (t) => {
        if (t <= 10) return table(t);
        const tl = Math.max(tl_s, 10);
        return t <= tl ? (table(10) * 10) / t : (table(10) * 10 * tl) / t ** 2;
      });
    }
  });

  it('refuses cells of 7-16 without a value and names the clause', () => {
    const of = (ss_g: number) => (): unknown =>
      compileSpectrum({ code: 'asce7-16-two-period', site_class: 'E', ss_g, s1_g: 0.1, tl_s: 8 });
    expect(of(0.75)).not.toThrow();
    expect(of(0.8)).toThrow('11.4.8, a site-specific study is needed');
    expect(of(2)).toThrow(RangeError);
    expect(() =>
      compileSpectrum({ code: 'asce7-16-two-period', site_class: 'F', ss_g: 1, s1_g: 0.1, tl_s: 8 }),
    ).toThrow('unknown site_class "F"; known: A, B, B-unmeasured, C, D, E, default');
  });

  it('flags the default class, unmeasured rock and starred cells, and keeps the raw factor', () => {
    const of = (site_class: string, s1_g: number, supplement_3 = 'applied') =>
      compileSpectrum({ code: 'asce7-16-two-period', site_class, ss_g: 0.5, s1_g, tl_s: 8, supplement_3 }).compiled;
    expect(of('C', 0.4).flags).toEqual([]);
    expect(of('D', 0.19).flags).toEqual([]);
    expect(of('D', 0.2).flags).toEqual(['supplement-3']);
    expect(of('D', 0.4).quantities?.['fv']).toBe(1.9);
    expect(of('E', 0.4).flags).toEqual(['supplement-3']);
    expect(of('default', 0.4).flags).toEqual(['default-site-class', 'supplement-3']);
    expect(of('B-unmeasured', 0.4).flags).toEqual(['rock-unmeasured']);
    expect(of('D', 0.4, 'not-applied').flags).toEqual(['site-specific-required']);
  });
});

describe('ASCE/SEI 41-17', () => {
  it('agrees with the clauses, B1 of (2-3) but at 5 %', () => {
    for (const damping_ratio of [0.02, 0.05, 0.1, 0.3]) {
      const b1 = damping_ratio === 0.05 ? 1 : 4 / (5.6 - Math.log(100 * damping_ratio));
      const [sxs, sx1, tl] = [1.2, 0.7, 6];
      const ts = sx1 / sxs;
      agree({ code: 'asce41-17-general', sxs_g: sxs, sx1_g: sx1, tl_s: tl, damping_ratio }, (t) => {
        if (t < 0.2 * ts) return sxs * ((5 / b1 - 2) * (t / ts) + 0.4);
        if (t <= ts) return sxs / b1;
        return t <= tl ? sx1 / (b1 * t) : (sx1 * tl) / (b1 * t ** 2);
      });
    }
  });

  it('is the two-period spectrum at 5 %', () => {
    agree({ code: 'asce41-17-general', sxs_g: 1, sx1_g: 0.6, tl_s: 8 }, twoPeriod(1, 0.6, 8));
  });
});

/** S, TB, TC, TD typed again from the sheet. */
const EN_ROWS = {
  1: {
    A: [1, 0.15, 0.4, 2],
    B: [1.2, 0.15, 0.5, 2],
    C: [1.15, 0.2, 0.6, 2],
    D: [1.35, 0.2, 0.8, 2],
    E: [1.4, 0.15, 0.5, 2],
  },
  2: {
    A: [1, 0.05, 0.25, 1.2],
    B: [1.35, 0.05, 0.25, 1.2],
    C: [1.5, 0.1, 0.25, 1.2],
    D: [1.8, 0.1, 0.3, 1.2],
    E: [1.6, 0.05, 0.25, 1.2],
  },
} as const;

describe.each([1, 2] as const)('EN 1998-1:2004 type %d', (type) => {
  it.each(['A', 'B', 'C', 'D', 'E'] as const)('agrees with (3.2) to (3.5) on ground %s at any damping', (ground) => {
    const [s, tb, tc, td] = EN_ROWS[type][ground];
    for (const damping_ratio of [0.02, 0.05, 0.1, 0.3]) {
      const eta = Math.max(Math.sqrt(10 / (5 + 100 * damping_ratio)), 0.55);
      agree({ code: `en1998-1-2004-elastic-type-${String(type)}`, ag_g: 0.27, ground, damping_ratio }, (t) => {
        const a = 0.27 * s;
        if (t <= tb) return a * (1 + (t / tb) * (2.5 * eta - 1));
        if (t <= tc) return a * 2.5 * eta;
        return t <= td ? (a * 2.5 * eta * tc) / t : (a * 2.5 * eta * tc * td) / t ** 2;
      });
    }
  });

  it.each(['A', 'B', 'C', 'D', 'E'] as const)('agrees with (3.13) to (3.16) on ground %s', (ground) => {
    const [s, tb, tc, td] = EN_ROWS[type][ground];
    const [ag, a] = [0.3, 0.3 * s];
    for (const [q, beta] of [
      [1, 0.2],
      [1.5, 0.05],
      [4, 0.2],
      [6.5, 0.3],
    ] as const) {
      const given = { ag_g: ag, ground, behaviour_factor: q, lower_bound_factor: beta };
      agree({ code: `en1998-1-2004-design-type-${String(type)}`, ...given }, (t) => {
        if (t <= tb) return a * (2 / 3 + (t / tb) * (2.5 / q - 2 / 3));
        if (t <= tc) return (a * 2.5) / q;
        if (t <= td) return Math.max(((a * 2.5) / q) * (tc / t), beta * ag);
        return Math.max(((a * 2.5) / q) * ((tc * td) / t ** 2), beta * ag);
      });
    }
  });

  it('reaches its lower bound where the sheet says, and is flagged as reduced', () => {
    if (type === 2) return;
    const { compiled } = compileSpectrum({
      code: 'en1998-1-2004-design-type-1',
      ag_g: 0.25,
      ground: 'B',
      behaviour_factor: 4,
    });
    expect(compiled.segments.at(-1)!.from_s).toBeCloseTo(1.875, 12);
    expect(compiled.flags).toEqual(['contains-reduction']);
  });
});

const near = (t: number, d: number, r: number): number => {
  if (r <= 0.75) return 1;
  const most = t <= 1.5 ? 1 : t <= 4 ? 0.24 * t + 0.64 : t <= 5 ? 0.12 * t + 1.12 : 1.72;
  if (d <= 2) return most;
  return d <= 20 ? 1 + ((most - 1) * (20 - d)) / 18 : 1;
};

describe('NZS 1170.5:2004', () => {
  const branches = {
    A: { ramp: [1, 1.35], top: 2.35, end: 0.3, still: 1.89, stillEnd: 0.4, long: [1.6, 0.5, 1.05, 3.15] },
    C: { ramp: [1.33, 1.6], top: 2.93, end: 0.3, still: 2.36, stillEnd: 0.4, long: [2, 0.5, 1.32, 3.96] },
    D: { ramp: [1.12, 1.88], top: 3, end: 0.56, still: 3, stillEnd: 0.56, long: [2.4, 0.75, 2.14, 6.42] },
    E: { ramp: [1.12, 1.88], top: 3, end: 1, still: 3, stillEnd: 1, long: [3, 1, 3.32, 9.96] },
  } as const;
  const tail = ([a, b, c, d]: readonly [number, number, number, number], t: number): number =>
    t < 1.5 ? a * (b / t) ** 0.75 : t < 3 ? c / t : d / t ** 2;

  it.each(['A', 'C', 'D', 'E'] as const)(
    'agrees with the commentary for class %s, near and far from a fault',
    (site_class) => {
      const { ramp, top, end, still, stillEnd, long } = branches[site_class];
      for (const [z, r, d] of [
        [0.13, 1, 20],
        [0.4, 1.8, 2],
        [0.3, 1.3, 9.5],
        [0.4, 0.75, 1],
      ] as const) {
        const zr = Math.min(z * r, 0.7);
        const given = { code: 'nzs1170-5-2004', site_class, zone_factor: z, return_factor: r, distance_km: d };
        agree(given, (t) => {
          const shape = t < 0.1 ? ramp[0] + ramp[1] * (t / 0.1) : t < end ? top : tail(long, t);
          return shape * zr * near(t, d, r);
        });
        agree({ ...given, form: 'equivalent-static' }, (t) => {
          const shape = t < stillEnd ? still : Math.min(still, tail(long, t));
          return shape * zr * near(t, d, r);
        });
      }
    },
  );

  it('agrees with the rule for class D between C and D', () => {
    for (const site_period_s of [0.6, 0.87, 1.2]) {
      const by = 1 + 0.5 * (site_period_s - 0.25);
      const given = {
        code: 'nzs1170-5-2004',
        form: 'equivalent-static',
        site_class: 'D',
        zone_factor: 0.3,
        return_factor: 1,
        distance_km: 20,
      };
      agree({ ...given, site_period_s }, (t) => {
        const shape = t < 0.4 ? 2.36 : Math.min(2.36, tail(branches.C.long, t));
        // below the cap of 3.0 the branch of class C is not held to the plateau of class C any more
        const scaled = 2.36 * by > 3 && t >= 0.4 ? tail(branches.C.long, t) * by : shape * by;
        return Math.min(scaled, 3) * 0.3;
      });
    }
  });

  it('agrees with straight lines through table 3.1, class C', () => {
    const table = through(
      ...([0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1, 1.5, 2, 2.5, 3, 3.5, 4, 4.5] as const).map(
        (t, i) => [t, [2.36, 2, 1.74, 1.55, 1.41, 1.29, 1.19, 0.88, 0.66, 0.53, 0.44, 0.32, 0.25, 0.2][i]!] as const,
      ),
    );
    const given = { code: 'nzs1170-5-2004', form: 'table-3-1', site_class: 'C', zone_factor: 0.4, return_factor: 1 };
    agree({ ...given, distance_km: 2 }, (t) => (t <= 4.5 ? table(t) : 0.2 * (4.5 / t) ** 2) * 0.4 * near(t, 2, 1));
  });

  it('flags the limit of Z R, and refuses a site period where it has no meaning', () => {
    const given = { code: 'nzs1170-5-2004', site_class: 'D', zone_factor: 0.4, return_factor: 1.8, distance_km: 20 };
    expect(compileSpectrum(given).compiled.flags).toEqual(['zone-return-limit']);
    expect(() => compileSpectrum({ ...given, site_period_s: 0.9 })).toThrow('equivalent static form only');
    expect(() => compileSpectrum({ ...given, form: 'equivalent-static', site_class: 'C', site_period_s: 0.9 })).toThrow(
      'belongs to class D, not C',
    );
  });
});

describe('NBC of Canada', () => {
  it('2010 agrees with 4.1.8.4(7)', () => {
    const given = { ordinates_g: [0.95, 0.64, 0.33, 0.17], fa: 0.9, fv: 1.3 };
    agree(
      { code: 'nbc-2010', ...given },
      through(
        [0.2, 0.9 * 0.95],
        [0.5, Math.min(1.3 * 0.64, 0.9 * 0.95)],
        [1, 1.3 * 0.33],
        [2, 1.3 * 0.17],
        [4, (1.3 * 0.17) / 2],
      ),
    );
  });

  // PGA 0.45 with S_a(0.2)/PGA = 1.78 < 2: PGA_ref = 0.36, so 0.6 of the way from 0.3 to 0.4
  it('2015 agrees with 4.1.8.4 for class E', () => {
    const at = (low: number, high: number): number => low + 0.6 * (high - low);
    const f = [at(1.05, 0.93), at(1.48, 1.3), at(1.74, 1.53), at(1.92, 1.72), at(2.14, 1.96), at(2.14, 1.96)];
    const s = [0.8, 0.6, 0.4, 0.2, 0.08, 0.03];
    const v = s.map((value, i) => value * f[i]!) as [number, number, number, number, number, number];
    agree(
      { code: 'nbc-2015', ordinates_g: s, pga_g: 0.45, site_class: 'E' },
      through([0.2, Math.max(v[0], v[1])], [0.5, v[1]], [1, v[2]], [2, v[3]], [5, v[4]], [10, v[5]]),
    );
  });

  it('2020 agrees with either interpolation', () => {
    const s = [0.5, 0.8, 0.4, 0.2, 0.08, 0.03] as const;
    const points = [
      [0.2, 0.8],
      [0.5, s[1]],
      [1, s[2]],
      [2, s[3]],
      [5, s[4]],
      [10, s[5]],
    ] as const;
    agree({ code: 'nbc-2020', ordinates_g: [...s] }, through(...points));
    const logs = through(...points.map(([t, value]) => [Math.log(t), Math.log(value)] as const));
    agree({ code: 'nbc-2020', ordinates_g: [...s], interpolation: 'log-log' }, (t) => Math.exp(logs(Math.log(t))));
  });
});

describe('IS 1893:2016', () => {
  it.each([
    ['rock', 0.4, 1, 0.25],
    ['medium', 0.55, 1.36, 0.34],
    ['soft', 0.67, 1.67, 0.42],
  ] as const)('agrees with 6.4.2 on %s', (soil, end, velocity, long) => {
    const tail = (t: number): number => (t < end ? 2.5 : t < 4 ? velocity / t : long);
    agree({ code: 'is1893-2016', zone_factor: 0.36, soil }, (t) => 0.18 * (t < 0.1 ? 1 + 15 * t : tail(t)));
    agree({ code: 'is1893-2016', zone_factor: 0.24, soil, form: 'equivalent-static' }, (t) => 0.12 * tail(t));
    agree(
      { code: 'is1893-2016', zone_factor: 0.24, soil, form: 'equivalent-static', shaking: 'maximum-considered' },
      (t) => 0.24 * tail(t),
    );
  });
});

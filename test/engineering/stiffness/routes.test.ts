import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { SPREADS } from '../../../src/engineering/assess/settings.js';
import type { Building, Structure, System } from '../../../src/engineering/building.js';
import { SYSTEMS } from '../../../src/engineering/building.js';
import { handSteps } from '../../../src/engineering/hand.js';
import { STIFFNESS_ROUTES, bestStiffnessRoute, stiffnessRoutes } from '../../../src/engineering/stiffness/routes.js';
import type { RouteId, StiffnessRoute } from '../../../src/engineering/stiffness/routes.js';
import { Trace } from '../../../src/engineering/trace.js';
import { building, given, inferred, structure } from '../../support/engineering-building.js';

function taken(
  one: Building,
  system: System,
  id: RouteId,
  direction: 'longitudinal' | 'transverse' = 'longitudinal',
): StiffnessRoute {
  const route = stiffnessRoutes(one, direction, system, SPREADS).find((each) => each.id === id);
  if (route === undefined || 'reason' in route)
    throw new Error(`${id}: ${route === undefined ? 'none' : route.reason}`);
  return route;
}
function refused(one: Building, system: System, id: RouteId): string {
  const route = stiffnessRoutes(one, 'longitudinal', system, SPREADS).find((each) => each.id === id);
  return route !== undefined && 'reason' in route ? route.reason : 'taken';
}

/** Columns 0.5 m square, 16 of them, beams 0.3 × 0.6 m on 6 m; plan 18 × 18 m, so that every line has four columns. */
const FRAME: Partial<Structure> = {
  column_count: 16,
  column_width_m: 0.5,
  column_depth_m: 0.5,
  beam_width_m: 0.3,
  beam_depth_m: 0.6,
  bay_length_m: 6,
  base_fixity: 'fixed',
  concrete_strength_MPa: 25,
};
const framed = (fields: Partial<Structure> = {}, more: Partial<Building> = {}): Building =>
  building({
    storeys: given(4),
    height_m: given(12.8),
    plan_length_m: 18,
    plan_width_m: 18,
    floor_area_m2: given(4 * 324),
    structure: structure({ ...FRAME, ...fields }),
    ...more,
  });

describe('stiffnessRoutes', () => {
  it('lists every route, with a reason where it does not apply', () => {
    for (const system of SYSTEMS) {
      const routes = stiffnessRoutes(building(), 'longitudinal', system, SPREADS);
      expect(routes.map(({ id }) => id)).toEqual(STIFFNESS_ROUTES.map(({ id }) => id));
      for (const route of routes) expect('reason' in route && route.reason.length > 10, route.id).toBe(true);
    }
  });

  // own arithmetic: the same numbers by hand, D-values after Muto
  it('works a frame of columns and beams', () => {
    const route = taken(framed(), 'concrete-moment-frame', 'stiffness/columns-and-beams');
    const E = 0.5 * 4700 * Math.sqrt(25) * 1000;
    const kc = (E * 0.5 ** 4) / 12 / 3.2;
    const kb = (E * 1.5 * 0.3 * 0.6 ** 3) / 12 / 6;
    const upper = (beams: number): number => {
      const k = (2 * beams * kb) / (2 * kc);
      return ((k / (2 + k)) * 12 * kc) / 3.2 ** 2;
    };
    const first = (beams: number): number => {
      const k = (beams * kb) / kc;
      return (((0.5 + k) / (2 + k)) * 12 * kc) / 3.2 ** 2;
    };
    const springs = [8 * first(1) + 8 * first(2), ...[1, 2, 3].map(() => 8 * upper(1) + 8 * upper(2))];
    // Rayleigh with the self-weight sway is under one per cent too short
    const mass = (324 * 11) / 9.80665;
    let sway = 0;
    let top = 0;
    let bottom = 0;
    springs.forEach((k, i) => {
      sway += (9.80665 * mass * (4 - i)) / k;
      top += mass * sway * sway;
      bottom += 9.80665 * mass * sway;
    });
    const rayleigh = 2 * Math.PI * Math.sqrt(top / bottom);
    expect(route.period_s / rayleigh).toBeGreaterThan(1);
    expect(route.period_s / rayleigh).toBeLessThan(1.01);
    expect(route.sigma).toBe(0.3);
    expect(route.massSigma).toBeCloseTo(0.075, 12);
    expect(route.heightSigma).toBe(0);
  });

  it('gives the band of cracking 0.3 to 0.7 and of the modulus', () => {
    const known = taken(framed(), 'concrete-moment-frame', 'stiffness/columns-and-beams');
    expect(known.low_s / known.period_s).toBeCloseTo(Math.sqrt(0.5 / 0.7 / 1.15), 10);
    expect(known.high_s / known.period_s).toBeCloseTo(Math.sqrt(0.5 / 0.3 / 0.85), 10);
    const byEra = taken(framed({ concrete_strength_MPa: NaN }), 'concrete-moment-frame', 'stiffness/columns-and-beams');
    expect(byEra.high_s / byEra.period_s).toBeCloseTo(Math.sqrt(0.5 / 0.3 / 0.8), 10);
  });

  it('is longer on a pinned base, with rigid beams shorter and flagged, and with a high first storey longer', () => {
    const plain = taken(framed(), 'concrete-moment-frame', 'stiffness/columns-and-beams').period_s;
    const of = (fields: Partial<Structure>, more: Partial<Building> = {}): StiffnessRoute =>
      taken(framed(fields, more), 'concrete-moment-frame', 'stiffness/columns-and-beams');
    expect(of({ base_fixity: 'pinned' }).period_s).toBeGreaterThan(plain);
    expect(of({ beam_depth_m: NaN }).period_s).toBeLessThan(plain);
    expect(of({ beam_depth_m: NaN }).flags.join()).toContain('taken as rigid');
    expect(of({}, { first_storey_height_m: 5 }).period_s).toBeGreaterThan(plain);
    expect(of({ base_fixity: null }).period_s).toBe(plain);
    expect(of({ base_fixity: null }).flags).toEqual(['columns taken as fixed at the base']);
  });

  it('tells the directions apart by the sides of the columns', () => {
    const one = framed({ column_width_m: 0.3, column_depth_m: 0.7 });
    const along = taken(one, 'concrete-moment-frame', 'stiffness/columns-and-beams', 'longitudinal');
    const across = taken(one, 'concrete-moment-frame', 'stiffness/columns-and-beams', 'transverse');
    expect(along.period_s).toBeLessThan(across.period_s);
  });

  it('shortens an infilled frame by its panels', () => {
    const infilled = taken(
      framed({ infill_thickness_m: 0.2, infill_length_m: { longitudinal: 22, transverse: NaN } }),
      'concrete-infilled-frame',
      'stiffness/infilled-frame',
    );
    expect(infilled.period_s).toBeLessThan(
      0.8 * taken(framed(), 'concrete-moment-frame', 'stiffness/columns-and-beams').period_s,
    );
    expect(refused(framed(), 'concrete-infilled-frame', 'stiffness/infilled-frame')).toContain('bare frame');
    expect(refused(framed(), 'concrete-infilled-frame', 'stiffness/columns-and-beams')).toContain('infill');
  });

  const walled = (fields: Partial<Structure>, more: Partial<Building> = {}): Building =>
    building({
      storeys: given(1),
      height_m: given(4),
      floor_area_m2: given(300),
      structure: structure(fields),
      ...more,
    });
  const lengths = (...longitudinal: number[]): Partial<Structure> => ({
    wall_lengths_m: { longitudinal, transverse: null },
    wall_areas_m2: { longitudinal: longitudinal.map((l) => 0.2 * l), transverse: null },
  });

  // own arithmetic: one storey, one wall: m (h³/3EI + 1.2 h/GA)
  it('works a concrete wall as a cantilever in bending and shear', () => {
    const one = walled({ ...lengths(5), concrete_strength_MPa: 25 });
    const E = 0.5 * 23_500 * 1000;
    const flexibility = 4 ** 3 / ((3 * E * 0.2 * 5 ** 3) / 12) + (1.2 * 4) / (0.4 * E * 0.2 * 5);
    const mass = (300 * 13) / 9.80665;
    const { period_s, sigma } = taken(one, 'concrete-shear-wall', 'stiffness/walls');
    expect(period_s).toBeCloseTo(2 * Math.PI * Math.sqrt(mass * flexibility), 10);
    expect(sigma).toBe(0.35);
  });

  // own arithmetic: piers between floors, h³/12EI + 1.2 h/GA, FEMA 356 fair masonry 550 × 5.378 MPa
  it('works masonry walls as piers between floors', () => {
    const one = walled(lengths(5, 5));
    const E = 0.5 * 550 * 1.3 * 600 * 0.006894757293168361 * 1000;
    const k = 2 / (4 ** 3 / ((12 * E * 0.2 * 5 ** 3) / 12) + (1.2 * 4) / (0.4 * E * 0.2 * 5));
    const mass = (300 * 12) / 9.80665;
    const { period_s } = taken(one, 'unreinforced-masonry-wall', 'stiffness/walls');
    expect(period_s).toBeCloseTo(2 * Math.PI * Math.sqrt(mass / k), 10);
  });

  it('leaves bending out where only areas are known, and says so', () => {
    const areas = walled({ wall_areas_m2: { longitudinal: [1, 1], transverse: null } });
    const both = walled(lengths(5, 5));
    const short = taken(areas, 'unreinforced-masonry-wall', 'stiffness/walls');
    expect(short.period_s).toBeLessThan(taken(both, 'unreinforced-masonry-wall', 'stiffness/walls').period_s);
    expect(short.flags.join()).toContain('bending left out');
    const tall = walled({ wall_areas_m2: { longitudinal: [1, 1], transverse: null } }, { storeys: given(3) });
    expect(refused(tall, 'concrete-shear-wall', 'stiffness/walls')).toContain('lengths of the walls');
    expect(
      refused(
        walled({ ...lengths(5, 5), wall_areas_m2: { longitudinal: [1, 1, 1], transverse: null } }),
        'concrete-shear-wall',
        'stiffness/walls',
      ),
    ).toBe('3 wall areas and 2 wall lengths: one length a wall is needed');
  });

  it('ties walls and frame together: stiffer than either', () => {
    const walls = { ...lengths(6, 6), ...FRAME };
    const both = taken(framed(walls), 'concrete-wall-frame', 'stiffness/wall-with-frame');
    const frame = taken(framed(), 'concrete-moment-frame', 'stiffness/columns-and-beams');
    const wall = taken(framed({ ...walls, column_count: NaN }), 'concrete-wall-frame', 'stiffness/walls');
    expect(both.period_s).toBeLessThan(frame.period_s);
    expect(both.period_s).toBeLessThan(wall.period_s);
    expect(wall.flags).toContain('the frame is not on record and left out');
    expect(refused(framed(walls), 'concrete-wall-frame', 'stiffness/walls')).toContain('wall with frame');
  });

  // EN 1998-1 4.3.3.2.2(5): 2 √0.09 = 0.6 s
  it('reads a sway, and braces', () => {
    const sway = building({ structure: structure({ top_displacement_m: { longitudinal: 0.09, transverse: NaN } }) });
    const route = taken(sway, 'steel-moment-frame', 'stiffness/gravity-sway');
    expect(route.period_s).toBeCloseTo(0.6, 12);
    expect([route.massSigma, route.low_s, route.high_s]).toEqual([0, route.period_s, route.period_s]);
    const braced = walled(
      { brace_area_m2: { longitudinal: 0.003, transverse: NaN }, bay_length_m: 6 },
      { height_m: given(3.5) },
    );
    // SD-32: 64,448 kN/m
    const { period_s } = taken(braced, 'steel-concentric-braced-frame', 'stiffness/braces');
    expect(period_s).toBeCloseTo(2 * Math.PI * Math.sqrt((300 * 5) / 9.80665 / 64_448), 5);
    expect(refused(braced, 'steel-eccentric-braced-frame', 'stiffness/braces')).toContain('links');
  });

  it('tells what an inferred height brings', () => {
    const sure = taken(framed(), 'concrete-moment-frame', 'stiffness/columns-and-beams');
    const route = taken(
      framed({}, { height_m: inferred(12.8, 0.1) }),
      'concrete-moment-frame',
      'stiffness/columns-and-beams',
    );
    expect(route.period_s).toBe(sure.period_s);
    // T goes with the height to a power between 1 (beams give way) and 1.5 (columns do)
    expect(route.heightSigma).toBeGreaterThan(0.1);
    expect(route.heightSigma).toBeLessThan(0.15);
  });

  it('is longer for a heavier building, shorter for thicker columns and longer walls', () => {
    const factor = fc.double({ min: 1.05, max: 3, noNaN: true });
    fc.assert(
      fc.property(factor, (by) => {
        const frame = taken(framed(), 'concrete-moment-frame', 'stiffness/columns-and-beams').period_s;
        const heavy = framed({}, { unit_weight_kN_per_m2: 11 * by });
        const thick = framed({ column_width_m: 0.5 * by, column_depth_m: 0.5 * by });
        expect(taken(heavy, 'concrete-moment-frame', 'stiffness/columns-and-beams').period_s).toBeCloseTo(
          frame * Math.sqrt(by),
          9,
        );
        expect(taken(thick, 'concrete-moment-frame', 'stiffness/columns-and-beams').period_s).toBeLessThan(frame);
        for (const system of ['concrete-shear-wall', 'unreinforced-masonry-wall', 'reinforced-masonry-wall'] as const)
          expect(taken(walled(lengths(5 * by)), system, 'stiffness/walls').period_s).toBeLessThan(
            taken(walled(lengths(5)), system, 'stiffness/walls').period_s,
          );
      }),
      { numRuns: 50, seed: 31 },
    );
  });

  it('writes every assumed value with its mark', () => {
    const trace = new Trace();
    const one = framed({ concrete_strength_MPa: NaN, beam_width_m: NaN, bay_length_m: NaN, base_fixity: null });
    stiffnessRoutes(one, 'longitudinal', 'concrete-moment-frame', SPREADS, trace);
    const steps = handSteps(trace, 'si');
    const assumed = steps.filter(({ kind, mark }) => kind === 'value' && mark === 'default');
    expect(assumed.map(({ title }) => title)).toEqual(
      expect.arrayContaining(['concrete strength', 'cracking factor', 'bay length', 'beam width', 'unit weight']),
    );
    for (const { title, source } of assumed) expect(source, title).toMatch(/judgement|practice|memory/);
    for (const { title, result, substituted } of steps)
      expect(`${result}${substituted}`, title).not.toMatch(/NaN|undefined/);
  });
});

describe('bestStiffnessRoute', () => {
  it('takes the first that applies and is not switched off', () => {
    const both = framed(
      { top_displacement_m: { longitudinal: 0.09, transverse: NaN } },
      {
        storey_stiffness_kN_per_m: { longitudinal: [1e5], transverse: null },
      },
    );
    const best = (off: readonly string[]): string | undefined =>
      bestStiffnessRoute(both, 'longitudinal', 'concrete-moment-frame', SPREADS, off)?.id;
    expect(best([])).toBe('stiffness/storey-stiffness');
    expect(best(['stiffness/storey-stiffness'])).toBe('stiffness/columns-and-beams');
    expect(best(['stiffness/storey-stiffness', 'stiffness/columns-and-beams'])).toBe('stiffness/gravity-sway');
    expect(best(STIFFNESS_ROUTES.map(({ id }) => id))).toBeUndefined();
  });

  it('is null where the row knows nothing', () => {
    expect(bestStiffnessRoute(building(), 'longitudinal', 'concrete-moment-frame', SPREADS, [])).toBeNull();
    const ground = building({ structure: structure({ vs30_mps: 200, site_period_s: 0.8 }) });
    expect(bestStiffnessRoute(ground, 'longitudinal', 'concrete-moment-frame', SPREADS, [])).toBeNull();
  });
});

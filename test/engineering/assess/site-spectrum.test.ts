import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import type { Assessment, NotRanked } from '../../../src/engineering/assess/assess.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import type { AssessSettings, NamedSpectrum } from '../../../src/engineering/assess/settings.js';
import { applyAny } from '../../../src/engineering/formula.js';
import { handSteps } from '../../../src/engineering/hand.js';
import { layGrid } from '../../../src/engineering/spectrum/grid.js';
import type { HazardGrid, HazardGrids } from '../../../src/engineering/spectrum/grid.js';
import { ordinatesAt } from '../../../src/engineering/spectrum/grid-read.js';
import { Trace } from '../../../src/engineering/trace.js';
import { building, inferred } from '../../support/engineering-building.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const PERIODS_S = [0.05, 0.2, 0.5, 1, 2, 5];
const SHAPE_G = [0.5, 1.1, 0.8, 0.45, 0.2, 0.06];

/** Four by four nodes from 13° E, 43° N on; `factor` scales the shape at a node. */
function grid(factor: (i: number, j: number) => number, hole = -1): HazardGrid {
  const nodes = Array.from({ length: 16 }, (_, k) => k).filter((k) => k !== hole);
  return layGrid({
    periods_s: PERIODS_S,
    lon: Float64Array.from(nodes, (k) => 13 + 0.1 * (k % 4)),
    lat: Float64Array.from(nodes, (k) => 43 + 0.1 * Math.floor(k / 4)),
    sa_g: Float64Array.from(nodes.flatMap((k) => SHAPE_G.map((sa_g) => sa_g * factor(k % 4, Math.floor(k / 4))))),
  });
}
const settings = (only: NamedSpectrum, name = 'only'): AssessSettings => ({
  ...SETTINGS,
  spectra: { [name]: only },
  levels: [{ title: 'one', by: null, spectra: { all: name }, otherwise: null }],
});
const gridded = (interpolation: string): NamedSpectrum => ({
  code: 'hazard-grid',
  file: 'h.csv',
  interpolation,
  grid: 'fp',
  return_period_years: 475,
});
const of = (one: HazardGrid): HazardGrids => new Map([['fp', one]]);
const reasonOf = (result: Assessment | NotRanked): string => (isRanked(result) ? 'ranked' : result.reason);

/** All that is found of a building, the numbers of its mixture copied out of their pool. */
const found = (result: Assessment | NotRanked): unknown => {
  if (!isRanked(result)) return result;
  const { mixture, ...rest } = result;
  const { weight, mean, sd, from, to } = mixture;
  return { ...rest, mixture: [weight, mean, sd].map((values) => [...values].slice(from, to)) };
};

// heights shared and not, systems given and not, a measured one: what the memories of demand know and what they do not
const BUILDINGS = [
  building(),
  building({ storeys: inferred(6, 0.2), height_m: inferred(20, 0.25) }),
  building({ system: null, years: [1935], height_m: inferred(8, 0.2) }),
  building({ measured_period_s: { longitudinal: 0.03, transverse: 0.7 }, measured_amplitude: 'ambient' }),
  building({ design_base_shear_coefficient: 0.1, system: 'steel-moment-frame' }),
  building({ capacity_sa_g: 0.5 }),
].map((one, i) => ({ ...one, id: `T-${String(i)}`, lon: 13.03 + 0.05 * i, lat: 43.01 + 0.04 * i }));

describe('a building that reads a grid', () => {
  it.each(['linear', 'log-log'])('reads the same bits as from the same table for all, %s', (interpolation) => {
    const table = {
      code: 'table',
      periods_s: PERIODS_S,
      ordinates_g: SHAPE_G,
      interpolation,
      return_period_years: 475,
    };
    for (const holdPlateau of [true, false]) {
      const plain = compileContext({ ...settings(table), holdPlateau });
      const map = compileContext({ ...settings(gridded(interpolation)), holdPlateau }, of(grid(() => 1)));
      for (const one of BUILDINGS) expect(found(assess(one, map))).toEqual(found(assess(one, plain)));
    }
  });

  it('hangs on its own place alone, whatever was read before it', () => {
    const map = (): ReturnType<typeof compileContext> =>
      compileContext(settings(gridded('log-log')), of(grid((i, j) => 1 + 0.3 * i + 0.2 * j)));
    const one = map();
    const forward = BUILDINGS.map((each) => found(assess(each, one)));
    const backward = BUILDINGS.toReversed().map((each) => found(assess(each, one)));
    expect(backward.toReversed()).toEqual(forward);
    expect(BUILDINGS.map((each) => found(assess(each, map())))).toEqual(forward);
  });

  it('writes down the four nodes, whose ordinates give the one that was read to the last bit', () => {
    const nodes = grid((i, j) => 1 + 0.3 * i + 0.2 * j);
    const map = compileContext(settings(gridded('linear')), of(nodes));
    for (const one of BUILDINGS) {
      const trace = new Trace();
      const result = assess(one, map, trace);
      if (!isRanked(result)) throw new Error(result.reason);
      const steps = trace.steps.flatMap((step) => (step.kind === 'formula' ? [step] : []));
      const read = steps.filter(({ record }) => record.id === 'grid/spectrum/bilinear');
      expect(read.length).toBeGreaterThanOrEqual(2);
      const ordinates = [...ordinatesAt(nodes, one.lon, one.lat)!];
      for (const { record, inputs, value } of read) {
        expect(ordinates).toContain(value);
        expect(applyAny(record, inputs)).toBe(value);
      }
      const table = steps.find(({ record }) => record.id === 'table/spectrum/linear')!;
      expect(table.inputs['ordinates_g']).toEqual(ordinates);
      expect(applyAny(table.record, table.inputs)).toBe(table.value);
      const shares = steps.filter(({ record }) => record.id === 'grid/place/share').map(({ value }) => value);
      // own arithmetic: lines are 0.1° apart from 13° and 43°
      const [east = NaN, north = NaN] = shares;
      expect(east).toBeCloseTo(((one.lon - 13) * 10) % 1, 9);
      expect(north).toBeCloseTo(((one.lat - 43) * 10) % 1, 9);
      expect(JSON.stringify(handSteps(trace, 'si'))).not.toContain('NaN');
    }
  });

  it('shows no missing corner where the edge of a hole is read', () => {
    const map = compileContext(settings(gridded('linear')), of(grid((i, j) => 1 + i + j, 5)));
    const trace = new Trace();
    // node 5 is missing; the edge from node 6 to node 10 belongs to the cell beside the hole too
    const result = assess(building({ lon: 13.2, lat: 43.15 }), map, trace);
    expect(reasonOf(result)).toBe('ranked');
    expect(JSON.stringify(handSteps(trace, 'si'))).not.toMatch(/NaN|undefined/);
    for (const step of trace.steps)
      if (step.kind === 'formula') expect(applyAny(step.record, step.inputs), step.record.id).toBe(step.value);
  });

  it('is not ranked outside, in a hole, or without coordinates, with the reason naming the grid', () => {
    const map = compileContext(settings(gridded('linear')), of(grid(() => 1, 5)));
    const at = (lon: number, lat: number): string => reasonOf(assess(building({ lon, lat }), map));
    expect(at(14, 43.1)).toBe('outside the hazard grid "only"');
    expect(at(13.05, 43.05)).toBe('outside the hazard grid "only"');
    expect(at(NaN, 43.1)).toBe('no coordinates on record, which the hazard grid "only" needs');
    expect(at(13.25, 43.25)).toBe('ranked');
  });

  it('takes any name of a spectrum', () => {
    const name = 'constructor';
    const map = compileContext(settings(gridded('linear'), name), of(grid(() => 1)));
    const result = assess(building({ lon: 13.1, lat: 43.1 }), map);
    expect(isRanked(result) && result.spectrum).toBe(name);
    expect(reasonOf(assess(building({ lon: 13.1, lat: 43.1 }), compileContext(settings(gridded('linear')))))).toBe(
      'spectrum "only" is not defined',
    );
  });
});

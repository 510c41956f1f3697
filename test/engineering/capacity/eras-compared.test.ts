/**
 * Buildings of one place held against each other across eras. What must come out is common practice, no source: detailing makes a building
 * no weaker, unreinforced masonry is never the strongest, a design is worth no less than none, and strengthening takes nothing away.
 */
import { describe, expect, it } from 'vitest';
import { capacityAtHeight, keptCapacity } from '../../../src/engineering/assess/capacity.js';
import type { Case } from '../../../src/engineering/assess/case-memory.js';
import { casesOf } from '../../../src/engineering/assess/cases.js';
import { detailingOf } from '../../../src/engineering/assess/code-history.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import type { AssessContext } from '../../../src/engineering/assess/context.js';
import { weakTypeOf } from '../../../src/engineering/assess/weak.js';
import type { Building, System } from '../../../src/engineering/building.js';
import { SYSTEMS } from '../../../src/engineering/building.js';
import { FAMILY_IDS } from '../../../src/engineering/capacity/families.js';
import type { CarriedFamily } from '../../../src/engineering/capacity/families.js';
import { Trace } from '../../../src/engineering/trace.js';
import { building, given } from '../../support/engineering-building.js';
import { codeHistory } from '../../support/code-histories.js';
import { SETTINGS, NO_SPREADS } from '../../support/engineering-settings.js';

const contextOf = (family: CarriedFamily): AssessContext =>
  compileContext({ ...SETTINGS, codeHistory: codeHistory(family), spreads: NO_SPREADS });

/** Twice: by the memory and written out. */
function capacityOf(one: Building, context: AssessContext): { readonly elastic: number; readonly which: Case } {
  const cases = casesOf(one, context);
  if (typeof cases === 'string') throw new Error(cases);
  const which = cases.list[0]!;
  const height_m = one.height_m.value;
  const kept = keptCapacity(one, which, 'longitudinal', height_m, context);
  const trace = new Trace();
  const { strength_coefficient, overstrength, ductility } = capacityAtHeight(
    one,
    which,
    'longitudinal',
    height_m,
    null,
    context,
    trace,
  );
  expect(kept).toEqual({ strength_coefficient, overstrength, ductility, lnStrength: kept.lnStrength });
  expect(trace.steps.length).toBeGreaterThan(0);
  return { elastic: strength_coefficient * overstrength * ductility, which };
}

const HEIGHTS = [
  [1, 4],
  [4, 14],
  [9, 30],
] as const;

describe.each(FAMILY_IDS)('capacities of %s', (family) => {
  const context = contextOf(family);
  const history = context.settings.codeHistory!;
  const ofEra = (system: System, era: (typeof context.eras)[number], storeys: number, height: number) => {
    const year = Number.isFinite(era.from) ? era.from + 1 : era.to - 5;
    const size = { storeys: given(storeys), height_m: given(height), plan_length_m: 30, plan_width_m: 15 };
    return capacityOf(building({ ...size, system, years: [year] }), context).elastic;
  };

  it('rise where detailing begins', () => {
    for (const system of SYSTEMS)
      for (const [storeys, height] of HEIGHTS) {
        const classOf = (i: number) => detailingOf(system, context.eras[i]!.edition, history);
        const first = context.eras.findIndex((_, i) => classOf(i) === 'after' || classOf(i) === 'special');
        if (first < 2) continue;
        const [before, after] = [first - 1, first].map((i) => ofEra(system, context.eras[i]!, storeys, height));
        // the coefficients of two codes fall with the period in their own ways: a twentieth
        expect(after, `${system}, ${String(height)} m`).toBeGreaterThanOrEqual(0.95 * before!);
      }
  });

  it('are no less by any edition than with no design at all', () => {
    const [none, ...eras] = context.eras;
    for (const system of SYSTEMS)
      for (const [storeys, height] of HEIGHTS)
        for (const era of eras)
          expect(ofEra(system, era, storeys, height), `${system} ${String(era.edition)}`).toBeGreaterThanOrEqual(
            ofEra(system, none!, storeys, height) * (1 - 1e-12),
          );
  });

  it('are least for unreinforced masonry', () => {
    for (const era of context.eras)
      for (const system of SYSTEMS)
        expect(ofEra('unreinforced-masonry-wall', era, 3, 10), `${system} ${String(era.edition)}`).toBeLessThanOrEqual(
          // the tables of the United States before 1961 gave all systems one coefficient: only its ductility tells it apart
          ofEra(system, era, 3, 10) * (1 + 1e-12),
        );
  });

  it('are not lowered by strengthening, whatever the year and the level, and lift unreinforced masonry below new walls', () => {
    const [newest] = context.eras.slice(-1);
    for (const system of SYSTEMS)
      for (const era of context.eras) {
        const built = Number.isFinite(era.from) ? era.from + 1 : era.to - 5;
        const plain = building({ system, years: [built], storeys: given(4), height_m: given(14) });
        for (const retrofit_level of [0.1, 0.5, 1]) {
          const year_retrofitted = Math.max(newest!.from, built) + 1;
          const strengthened = capacityOf({ ...plain, year_retrofitted, retrofit_level }, context);
          expect(strengthened.elastic, `${system} ${String(era.edition)}`).toBeGreaterThanOrEqual(
            capacityOf(plain, context).elastic * (1 - 1e-12),
          );
        }
      }
    const masonry = building({
      system: 'unreinforced-masonry-wall',
      years: [1890],
      storeys: given(3),
      height_m: given(10),
    });
    const year = newest!.from + 1;
    const strengthened = capacityOf({ ...masonry, year_retrofitted: year, retrofit_level: 0.75 }, context).elastic;
    const reinforced = capacityOf({ ...masonry, system: 'reinforced-masonry-wall', years: [year] }, context).elastic;
    expect(strengthened).toBeGreaterThan(1.5 * capacityOf(masonry, context).elastic);
    expect(strengthened).toBeLessThan(0.9 * reinforced);
  });
});

describe('a retrofit', () => {
  const context = contextOf('us-ubc-asce7');
  const history = context.settings.codeHistory;
  const frame = building({ system: 'concrete-moment-frame', years: [1965], storeys: given(5), height_m: given(18) });

  it('makes no building one of the special systems', () => {
    const { which } = capacityOf({ ...frame, year_retrofitted: 2005, retrofit_level: 1 }, context);
    const trace = new Trace();
    capacityAtHeight(frame, which, 'longitudinal', 18, null, context, trace);
    expect(JSON.stringify(trace.steps)).toContain('detailing class \\"after\\"');
  });

  it('leaves a building of a weak type where it reached less than its code', () => {
    const weak = (retrofit_level: number): string | null =>
      weakTypeOf(capacityOf({ ...frame, year_retrofitted: 2005, retrofit_level }, context).which, false, history);
    expect(weak(0.8)).toBe('concrete-frame-before-detailing');
    expect(weak(1)).toBeNull();
  });

  it('says where the code of the construction asked for more', () => {
    const late = building({ system: 'concrete-shear-wall', years: [1990], storeys: given(5), height_m: given(18) });
    const strengthened = { ...late, year_retrofitted: 1997, retrofit_level: 0.5 };
    const { which } = capacityOf(strengthened, context);
    const trace = new Trace();
    capacityAtHeight(strengthened, which, 'longitudinal', 18, null, context, trace);
    const choice = trace.steps.find((step) => step.kind === 'choice' && step.question === 'Construction or retrofit');
    expect(choice).toMatchObject({ taken: 'ubc-1988 of its construction' });
  });
});

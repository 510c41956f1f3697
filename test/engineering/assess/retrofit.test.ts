/**
 * Strengthened buildings by every way to a capacity. That strengthening takes nothing away and makes nothing special is common practice, no
 * source.
 */
import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import type { Assessment } from '../../../src/engineering/assess/assess.js';
import { ASSUMED } from '../../../src/engineering/assess/assumed.js';
import { casesOf } from '../../../src/engineering/assess/cases.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import type { AssessSettings } from '../../../src/engineering/assess/settings.js';
import type { Building } from '../../../src/engineering/building.js';
import { FAMILY_IDS } from '../../../src/engineering/capacity/families.js';
import { Trace } from '../../../src/engineering/trace.js';
import { codeHistory } from '../../support/code-histories.js';
import { building, given, structure } from '../../support/engineering-building.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const HISTORY = { ...SETTINGS, systemPrior: null };

function assessed(one: Building, settings: AssessSettings): Assessment {
  const result = assess(one, compileContext(settings));
  if (!isRanked(result)) throw new Error(result.reason);
  return result;
}

const LEVELS = [0.1, 0.5, NaN, 1];

describe.each(FAMILY_IDS)('a retrofit by the codes of %s', (family) => {
  const history = codeHistory(family);
  const settings = { ...HISTORY, codeHistory: history };
  const newest = compileContext(settings).eras.at(-1)!.from + 1;
  const frame = { system: 'concrete-moment-frame', storeys: given(6), height_m: given(20) } as const;

  it.each(['working', 'strength', null] as const)('takes nothing from what the drawings state, level %s', (level) => {
    const plain = building({ ...frame, years: [1970], design_base_shear_coefficient: 0.1, design_level: level });
    const before = assessed(plain, settings).lnPriority;
    for (const retrofit_level of LEVELS) {
      const after = assessed({ ...plain, year_retrofitted: newest, retrofit_level }, settings);
      expect(after.lnPriority, String(retrofit_level)).toBeLessThanOrEqual(before + 1e-9);
      // the share is of the code of its year, and the drawings state the coefficient itself
      expect(after.leading.capacity_g).toBe(
        assessed({ ...plain, year_retrofitted: newest, retrofit_level: 1 }, settings).leading.capacity_g,
      );
    }
  });

  it('takes nothing from a building whose year is not known, or one of many', () => {
    for (const years of [[], [1930, 1971, 1972]])
      for (const system of ['concrete-moment-frame', 'concrete-shear-wall', 'unreinforced-masonry-wall'] as const) {
        const plain = building({ ...frame, system, years });
        const before = assessed(plain, settings);
        for (const retrofit_level of LEVELS) {
          const after = assessed({ ...plain, year_retrofitted: newest, retrofit_level }, settings);
          expect(after.lnPriority, `${system} ${String(retrofit_level)}`).toBeLessThanOrEqual(before.lnPriority + 1e-9);
        }
      }
  });
});

describe('the Japanese first-level index of a strengthened frame', () => {
  const frame = building({
    system: 'concrete-moment-frame',
    years: [1970],
    seismic_weight_kN: 28_800,
    structure: structure({ column_count: 20, column_width_m: 0.5, column_depth_m: 0.5 }),
    // beyond the corner, where the reduction is the ductility
    measured_period_s: { longitudinal: 3, transverse: 3 },
    measured_amplitude: 'strong',
  });
  const settings: AssessSettings = { ...HISTORY, strengthCheck: { method: 'japan-first-level', timeIndex: 1 } };
  const capacity = (one: Building, set = settings): number => assessed(one, set).leading.capacity_g;
  const ductility = ASSUMED.ductility;

  it('goes with the detailing of the code that governs, and is never that of the special systems', () => {
    const plain = capacity(frame);
    const with_ = (retrofit_level: number): number => capacity({ ...frame, year_retrofitted: 2008, retrofit_level });
    expect(with_(0.1)).toBeCloseTo(plain, 12);
    expect(with_(1) / plain).toBeCloseTo(ductility.after / ductility.before, 12);
  });

  it('goes with the ductilities of the study, and says which class it took', () => {
    const doubled = { ...ASSUMED, ductility: { ...ductility, before: 2 * ductility.before } };
    expect(capacity(frame, { ...settings, assumed: doubled }) / capacity(frame)).toBeCloseTo(2, 12);
    const trace = new Trace();
    assess(frame, compileContext(settings), trace);
    expect(trace.steps).toContainEqual(
      expect.objectContaining({ question: 'Detailing and ductility', taken: `μ = ${String(ductility.before)}` }),
    );
  });
});

describe('casesOf a strengthened building of unknown year', () => {
  it('has a case for every edition it may have been built to, alike likely', () => {
    const context = compileContext(HISTORY);
    const cases = casesOf(building({ years: [], year_retrofitted: 2008, retrofit_level: 1 }), context);
    if (typeof cases === 'string') throw new Error(cases);
    const built = cases.list.map(({ builtTo, chance }) => [builtTo!.edition, chance]);
    expect(built.map(([edition]) => edition).sort()).toEqual(context.eras.map(({ edition }) => edition).sort());
    for (const [, chance] of built) expect(chance).toBeCloseTo(1 / context.eras.length, 12);
  });
});

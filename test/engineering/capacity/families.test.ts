import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import { capacityAtHeight, keptCapacity } from '../../../src/engineering/assess/capacity.js';
import { casesOf } from '../../../src/engineering/assess/cases.js';
import type { Case } from '../../../src/engineering/assess/case-memory.js';
import { EDITION_YEARS, detailingOf, eraChances, eras } from '../../../src/engineering/assess/code-history.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import type { AssessContext } from '../../../src/engineering/assess/context.js';
import type { CodeHistorySettings } from '../../../src/engineering/assess/settings.js';
import type { Building, System } from '../../../src/engineering/building.js';
import { SYSTEMS } from '../../../src/engineering/building.js';
import type { CodeEdition } from '../../../src/engineering/capacity/edition.js';
import { CODE_FAMILIES, EDITIONS, FAMILY_IDS } from '../../../src/engineering/capacity/families.js';
import type { CarriedId } from '../../../src/engineering/capacity/families.js';
import { GREEK_COEFFICIENTS } from '../../../src/engineering/capacity/greece.js';
import { Trace } from '../../../src/engineering/trace.js';
import { building, given } from '../../support/engineering-building.js';
import { codeHistory } from '../../support/code-histories.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const contextOf = (history: CodeHistorySettings): AssessContext =>
  compileContext({ ...SETTINGS, codeHistory: history });

/** Design of an edition as the study's place asks for it. */
function designOf(edition: CarriedId, stated: unknown, fields: Partial<Building> = {}, ductile = true) {
  const one = building(fields);
  const facts = {
    building: one,
    direction: 'longitudinal' as const,
    system: one.system!,
    height_m: one.height_m.value,
    ductile,
  };
  return (EDITIONS[edition] as CodeEdition).design(facts, stated);
}

const caseOf = (one: Building, context: AssessContext): Case => {
  const cases = casesOf(one, context);
  if (typeof cases === 'string') throw new Error(cases);
  return cases.list[0]!;
};

/** Plain, tall, low and long, so that whatever an edition reads of a building differs. */
const SHAPES: readonly Partial<Building>[] = [
  {},
  { storeys: given(14), height_m: given(14) },
  { height_m: given(44) },
  { plan_length_m: 90, plan_width_m: 40 },
];

describe.each(FAMILY_IDS)('CODE_FAMILIES: %s', (family) => {
  const history = codeHistory(family);
  const editions = Object.keys(CODE_FAMILIES[family].editions) as CarriedId[];

  it('says of every edition where it stands and how it was come by', () => {
    expect(Object.keys(history.editions).toSorted()).toEqual(editions.toSorted());
    for (const edition of editions) {
      const { title, source, verified } = EDITIONS[edition];
      expect(title.length, edition).toBeGreaterThan(5);
      expect(source.standard.length, edition).toBeGreaterThan(2);
      expect(['printed', 'restated', 'memory'], edition).toContain(verified);
    }
    const years = editions.map((edition) => EDITION_YEARS[edition]);
    expect(years).toEqual(years.toSorted((a, b) => a - b));
  });

  it('gives every year of construction chances that sum to 1', () => {
    const list = eras(history);
    expect(list).toHaveLength(editions.length + 1);
    for (let year = 1880; year < 2030; year += 1)
      expect(eraChances(list, year, 3).reduce((sum, { chance }) => sum + chance, 0)).toBeCloseTo(1, 12);
  });

  it('asks a plausible share of the weight of every system at every height', () => {
    for (const edition of editions)
      for (const system of SYSTEMS)
        for (const height of [3, 14, 60, 200]) {
          const storeys = given(Math.round(height / 3));
          for (const ductile of [true, false]) {
            const { coefficient, levelFactor, reduction } = designOf(
              edition,
              history.editions[edition],
              { system, storeys, height_m: given(height) },
              ductile,
            );
            const where = `${edition} ${system} ${String(height)} m`;
            expect(coefficient, where).toBeGreaterThan(0.001);
            // the shortest and least ductile masonry may be asked for the whole elastic force
            expect(coefficient, where).toBeLessThan(reduction <= 1.5 ? 1.2 : 0.6);
            expect(levelFactor, where).toBeGreaterThanOrEqual(1);
            expect(reduction, where).toBeGreaterThanOrEqual(1);
          }
        }
  });

  it('says truly what a coefficient depends on, so that the memory of capacities holds', () => {
    for (const edition of editions)
      for (const system of SYSTEMS) {
        const read = (fields: Partial<Building>): number =>
          designOf(edition, history.editions[edition], { ...fields, system }).coefficient;
        const plain = read({});
        const byShape = SHAPES.map(read);
        const where = `${edition} ${system}`;
        const dependsOn = EDITIONS[edition].dependsOn(system);
        if (dependsOn === 'more') continue;
        if (dependsOn !== 'storeys') expect(byShape[1], where).toBe(plain);
        if (dependsOn !== 'height') expect(byShape[2], where).toBe(plain);
        expect(byShape[3], where).toBe(plain);
      }
  });

  it('lets the reduction depend on system and detailing alone', () => {
    for (const edition of editions)
      for (const system of SYSTEMS) {
        const found = SHAPES.map((fields) => designOf(edition, history.editions[edition], { ...fields, system }));
        expect(new Set(found.map(({ reduction }) => reduction)).size, `${edition} ${system}`).toBe(1);
        expect(new Set(found.map(({ levelFactor }) => levelFactor)).size, `${edition} ${system}`).toBe(1);
      }
  });

  it('equals its formula where it has one edition, from memory and by hand', () => {
    for (const edition of editions) {
      const stated = history.editions[edition];
      const context = contextOf({ ...history, editions: { [edition]: stated } });
      for (const system of ['concrete-moment-frame', 'concrete-shear-wall', 'steel-moment-frame'] as System[])
        for (const shape of SHAPES) {
          const one = building({ ...shape, system, years: [2024] });
          const which = caseOf(one, context);
          const kept = keptCapacity(one, which, 'longitudinal', one.height_m.value, context);
          const again = capacityAtHeight(one, which, 'longitudinal', one.height_m.value, null, context);
          expect(kept, edition).toEqual(again);
          const ductile = detailingOf(system, which.edition, context.settings.codeHistory!) !== 'before';
          const { coefficient, levelFactor } = designOf(edition, stated, { ...shape, system }, ductile);
          expect(which.edition).toBe(edition);
          expect(kept.strength_coefficient, edition).toBe(Math.max(coefficient * levelFactor, 0.04));
        }
    }
  });

  it('names its edition in the hand calculation, which ends at the number that is stored', () => {
    const context = contextOf(history);
    for (const year of [1910, 1940, 1960, 1972, 1980, 1992, 2000, 2010, 2022]) {
      const one = building({ years: [year], system: 'concrete-shear-wall' });
      const trace = new Trace();
      const traced = assess(one, context, trace);
      const plain = assess(one, context);
      if (!isRanked(traced) || !isRanked(plain)) throw new Error('not ranked');
      expect(traced.lnPriority).toBe(plain.lnPriority);
      const edition = traced.leading.edition;
      const named = trace.steps.some(
        (step) => step.kind === 'choice' && edition !== null && step.taken === EDITIONS[edition as CarriedId].title,
      );
      expect(named, String(year)).toBe(edition !== null);
    }
  });
});

describe('eras', () => {
  it('read the editions of the family alone', () => {
    const mixed = { ...codeHistory('greece').editions, 'ubc-1976': { zone_factor: 1, site_factor: 1 } };
    expect(eras(codeHistory('greece', { editions: mixed })).map(({ edition }) => edition)).toEqual([
      null,
      'greece-1959',
      'greece-1985',
      'greece-1995',
    ]);
  });

  it('take settings without a family, as they were kept once, for those of the United States', () => {
    const { family: _family, ...old } = codeHistory('us-ubc-asce7');
    expect(eras(old)).toEqual(eras(codeHistory('us-ubc-asce7')));
  });
});

describe('detailingOf', () => {
  // dates of the data sheet: Japan 1981, New Zealand 1976, Greece 1985, Türkiye 1998, Italy 2003; special systems where capacity design came with a code
  it.each([
    ['japan', 'japan-1950', 'japan-1981'],
    ['new-zealand', 'nz-1965', 'nz-1976'],
    ['greece', 'greece-1959', 'greece-1985'],
    ['turkey', 'turkey-1975', 'turkey-1998'],
    ['italy', 'italy-1975', 'italy-2003'],
    ['india', 'india-1970', 'india-2002'],
    ['canada', 'canada-1953', 'canada-1975'],
  ] as const)('turns ductile in %s after %s with %s', (family, last, first) => {
    const history = codeHistory(family);
    expect(detailingOf('concrete-moment-frame', last, history)).toBe('before');
    expect(detailingOf('concrete-moment-frame', first, history)).toBe(family === 'new-zealand' ? 'special' : 'after');
    expect(detailingOf('unreinforced-masonry-wall', first, history)).toBe('before');
    const later = { ...history, detailing_from: { 'concrete-moment-frame': 2020 } };
    expect(detailingOf('concrete-moment-frame', first, later)).toBe('before');
  });
});

describe('GREEK_COEFFICIENTS', () => {
  it('are those of the data sheet', () => {
    // ε of 1959 to 1984 on firm, medium and soft ground, from memory
    expect(Object.values(GREEK_COEFFICIENTS).map((row) => [row.firm, row.medium, row.soft])).toEqual([
      [0.04, 0.06, 0.08],
      [0.06, 0.08, 0.12],
      [0.08, 0.12, 0.16],
    ]);
  });
});

describe('the tables by zone', () => {
  const read = (edition: CarriedId, stated: unknown): number =>
    designOf(edition, stated, { system: 'concrete-infilled-frame', height_m: given(3), storeys: given(1) }).coefficient;

  it('give what the data sheet gives a stiff building', () => {
    // Türkiye 1968, C_0 by zone; from memory
    expect([1, 2, 3].map((zone) => read('turkey-1968', { zone }))).toEqual([0.06, 0.04, 0.02]);
    // Türkiye 1975, C_0 by zone with K = 1; S is held at 1; from memory
    expect([1, 2, 3, 4].map((zone) => read('turkey-1975', { zone, ground_period_s: 0.9 }))).toEqual([
      0.1, 0.08, 0.06, 0.03,
    ]);
    // Italy 1935 and 1975, by category: from memory; restated
    expect([1, 2].map((category) => read('italy-1935', { category }))).toEqual([0.1, 0.07]);
    expect([1, 2, 3].map((category) => read('italy-1975', { category }))).toEqual([0.1, 0.07, 0.04]);
    // India 1970 to 1984, α_0 by zone times K = 1.6 on firm ground; from memory
    const indian = ['I', 'II', 'III', 'IV', 'V'].map((zone) => read('india-1970', { zone, soil_factor: 1 }) / 1.6);
    [0.01, 0.02, 0.04, 0.05, 0.08].forEach((expected, i) => {
      expect(indian[i]).toBeCloseTo(expected, 12);
    });
    // New Zealand 1965, zones A, B, C: 0.12 and about 5/6 and 2/3 of it; from memory
    expect(['A', 'B', 'C'].map((zone) => Number(read('nz-1965', { zone }).toFixed(6)))).toEqual([0.12, 0.1, 0.08]);
  });
});

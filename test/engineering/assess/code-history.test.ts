import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { casesOf } from '../../../src/engineering/assess/cases.js';
import type { Cases } from '../../../src/engineering/assess/case-memory.js';
import { detailingOf, ductilityOf, eraChances, eras } from '../../../src/engineering/assess/code-history.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import type { Building } from '../../../src/engineering/building.js';
import { building } from '../../support/engineering-building.js';
import { inventedPortfolio } from '../../support/engineering-portfolio.js';
import { random } from '../../support/engineering-random.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const history = SETTINGS.codeHistory!;
const context = compileContext(SETTINGS);

// The rules of the era model as agreed for this program: lag, enforcement, mixture around a change.
describe('eras', () => {
  it('begin with the lag, never before enforcement, and cover every year once', () => {
    const list = eras(history);
    expect(list.map(({ edition, from }) => [edition, from])).toEqual([
      [null, -Infinity],
      ['ubc-1949', 1952],
      ['ubc-1961', 1963],
      ['ubc-1976', 1978],
      ['ubc-1988', 1990],
      ['ubc-1997', 1999],
      ['asce7-2002', 2002],
    ]);
    list.slice(1).forEach(({ from }, i) => expect(list[i]!.to).toBe(from));
    expect(list.at(-1)!.to).toBe(Infinity);
  });

  it('start with the edition in force when enforcement begins', () => {
    expect(
      eras({ ...history, seismic_design_enforced_from: 1970 })
        .map(({ edition }) => edition)
        .slice(0, 3),
    ).toEqual([null, 'ubc-1961', 'ubc-1976']);
  });
});

describe('eraChances', () => {
  it('sum to 1 for any year, half and half at a change', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1850, max: 2030 }), fc.integer({ min: 0, max: 5 }), (year, change) => {
        expect(eraChances(context.eras, year, change).reduce((sum, { chance }) => sum + chance, 0)).toBeCloseTo(1, 12);
      }),
      { seed: 18 },
    );
    expect(eraChances(context.eras, 1978, 3).map(({ era, chance }) => [era.edition, chance])).toEqual([
      ['ubc-1961', 0.5],
      ['ubc-1976', 0.5],
    ]);
  });
});

describe('detailingOf', () => {
  it('knows no detailing without design, and the special systems from 1997 on', () => {
    expect(detailingOf('concrete-moment-frame', null, history)).toBe('none');
    expect(detailingOf('concrete-moment-frame', 'ubc-1961', history)).toBe('before');
    expect(detailingOf('concrete-moment-frame', 'ubc-1988', history)).toBe('after');
    expect(detailingOf('concrete-moment-frame', 'ubc-1997', history)).toBe('special');
    expect(detailingOf('precast-concrete-frame', 'asce7-2002', history)).toBe('after');
    expect(detailingOf('unreinforced-masonry-wall', 'asce7-2002', history)).toBe('before');
    expect(
      detailingOf('concrete-moment-frame', 'ubc-1988', {
        ...history,
        detailing_from: { 'concrete-moment-frame': 1994 },
      }),
    ).toBe('before');
  });
});

describe('ductilityOf', () => {
  it('gives the classes as agreed [judgement]', () => {
    expect(ductilityOf('unreinforced-masonry-wall', 'none')).toBe(1.5);
    expect(ductilityOf('concrete-moment-frame', 'none')).toBe(2);
    expect(ductilityOf('concrete-moment-frame', 'before')).toBe(2);
    expect(ductilityOf('concrete-moment-frame', 'after')).toBe(3);
    expect(ductilityOf('concrete-moment-frame', 'special')).toBe(4);
  });
});

describe('casesOf', () => {
  const list = (one: Building): Cases => {
    const found = casesOf(one, context);
    if (typeof found === 'string') throw new Error(found);
    return found;
  };

  it('have chances that sum to 1, the likeliest first', () => {
    for (const one of inventedPortfolio(300, random(4))) {
      const { list: cases } = list(one);
      expect(cases.reduce((sum, { chance }) => sum + chance, 0)).toBeCloseTo(1, 12);
      for (let i = 1; i < cases.length; i += 1) expect(cases[i]!.chance).toBeLessThanOrEqual(cases[i - 1]!.chance);
    }
  });

  it('set the era of a strengthened building by its retrofit, the system by its construction', () => {
    const { list: cases } = list(
      building({
        system: null,
        storeys: { value: 2, sigma: 0, origin: 'given', rule: '' },
        years: [1920],
        year_retrofitted: 1994,
      }),
    );
    expect(new Set(cases.map(({ edition }) => edition))).toEqual(new Set(['ubc-1988']));
    expect(cases.map(({ system }) => system)).toEqual(['unreinforced-masonry-wall', 'timber-light-frame']);
    expect(cases.map(({ retrofit_level }) => retrofit_level)).toEqual([0.75, 0.75]);
  });

  it('keep one answer for buildings alike, and another for those that are not', () => {
    expect(list(building({ id: 'a' }))).toBe(list(building({ id: 'b' })));
    expect(list(building({ years: [1930] })).list[0]!.edition).toBeNull();
    expect(list(building({ years: [1985] })).list[0]!.edition).toBe('ubc-1976');
    expect(list(building({ system_transverse: 'concrete-shear-wall' })).list[0]!.system_transverse).toBe(
      'concrete-shear-wall',
    );
    expect(list(building({ year_retrofitted: 1994, retrofit_level: 1 })).list[0]!.retrofit_level).toBe(1);
    expect(list(building({ year_retrofitted: 1994 })).list[0]!.retrofit_level).toBe(0.75);
  });

  it('spread a year nobody knows over every era alike', () => {
    const { list: cases } = list(building({ years: [] }));
    expect(cases).toHaveLength(7);
    for (const { chance } of cases) expect(chance).toBeCloseTo(1 / 7, 12);
  });
});

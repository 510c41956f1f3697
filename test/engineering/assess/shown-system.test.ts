import { describe, expect, it } from 'vitest';
import { compileContext } from '../../../src/engineering/assess/context.js';
import { shownSystem } from '../../../src/engineering/assess/shown-system.js';
import type { Building } from '../../../src/engineering/building.js';
import { building, given } from '../../support/engineering-building.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const context = compileContext(SETTINGS);
const shown = (fields: Partial<Building>) => shownSystem(building(fields), context);

describe('shownSystem', () => {
  it('is the system on record, both ways', () => {
    expect(shown({ years: [1977] })).toEqual({
      along: 'concrete-moment-frame',
      across: 'concrete-moment-frame',
      chance: expect.closeTo(1, 12) as number,
      onRecord: true,
    });
    expect(shown({ system_transverse: 'concrete-shear-wall' })).toMatchObject({
      along: 'concrete-moment-frame',
      across: 'concrete-shear-wall',
    });
  });

  // the invented table of chances: four storeys or more, before 1980
  it('is else the likeliest of the table, with its chance', () => {
    expect(shown({ system: null, years: [1965] })).toMatchObject({
      along: 'concrete-moment-frame',
      chance: expect.closeTo(0.4, 12) as number,
      onRecord: false,
    });
  });

  it('is the likeliest over all eras, though another case may be the likeliest one', () => {
    // year of construction one of ten: the frame has six of them in three eras, the wall four in one
    const prior = [
      { bounds: { builtTo: 1979 }, system: 'concrete-moment-frame' },
      { bounds: { builtFrom: 1980 }, system: 'concrete-shear-wall' },
    ] as const;
    const two = compileContext({
      ...SETTINGS,
      systemPrior: prior.map(({ bounds, system }) => ({
        use: null,
        storeysFrom: null,
        storeysTo: null,
        builtFrom: null,
        builtTo: null,
        label: system,
        chances: [{ system, chance: 1 }],
        ...bounds,
      })),
    });
    const years = [1920, 1925, 1957, 1958, 1970, 1971, 1994, 1994, 1994, 1994];
    expect(shownSystem(building({ system: null, years }), two)).toMatchObject({
      along: 'concrete-moment-frame',
      chance: expect.closeTo(0.6, 12) as number,
    });
  });

  it('says what is missing', () => {
    expect(shown({ height_m: given(NaN) })).toBe('neither height nor storeys are known');
    expect(shownSystem(building({ system: null }), compileContext({ ...SETTINGS, systemPrior: null }))).toContain(
      'system not known',
    );
  });
});

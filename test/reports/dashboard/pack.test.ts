import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { unpackColumn, unpackPage } from '../../../src/browser/unpack.js';
import { packColumn, packPage } from '../../../src/reports/dashboard/pack.js';
import { scriptJson } from '../../../src/reports/html.js';
import { pageData } from '../../support/page-data.js';

const cell = fc.oneof(fc.constant(null), fc.double({ noNaN: true, noDefaultInfinity: true }), fc.string(), fc.constantFrom('a', 'b'));

describe('packColumn', () => {
  it('comes back through the page as it was', () => {
    fc.assert(
      fc.property(fc.array(cell), (values) => {
        const back = unpackColumn(JSON.parse(scriptJson(packColumn(values))) as ReturnType<typeof packColumn>);
        // JSON has no negative zero.
        expect(back).toEqual(values.map((value) => (Object.is(value, -0) ? 0 : value)));
      }),
    );
  });

  it('turns unknown numbers into blanks', () => {
    expect(unpackColumn(packColumn([NaN, 1, Infinity]))).toEqual([null, 1, null]);
  });

  it('writes a constant once and repeated words as a dictionary', () => {
    expect(packColumn(['x', 'x', 'x'])).toEqual([0, 3, 'x']);
    expect(packColumn(['x', 'y', 'x', 'y', 'x', 'y'])).toEqual([1, ['x', 'y'], [0, 1, 0, 1, 0, 1]]);
  });

  it('counts values as they travel: those that round to the same are one', () => {
    expect(packColumn([1.0001, 1.0002, 1.0003], 3)).toEqual([0, 3, 1]);
    expect(packColumn([1.0001, 2, 1.0002, 2.0001, 1, 2], 3)).toEqual([1, [1, 2], [0, 1, 0, 1, 0, 1]]);
    expect(packColumn([1.0001, 2, 1.0002], 3)).toEqual([2, [1, 2, 1]]);
    expect(packColumn(['x'])).toEqual([0, 1, 'x']);
    expect(packColumn([])).toEqual([1, [], []]);
  });
});

describe('packPage', () => {
  it('hands the inputs to the page to the last bit', () => {
    const data = pageData();
    const page = unpackPage(scriptJson(packPage(data)));
    expect(page.summary).toEqual(data.summary);
    expect(page.settings).toEqual(data.settings);
    expect(page.buildings.inputs.id).toEqual(data.buildings.inputs.id);
    for (const [name, values] of Object.entries(data.buildings.inputs.numbers)) {
      expect(Array.from(page.buildings.inputs.numbers[name as 'height_m']), name).toEqual(Array.from(values));
    }
    expect(page.buildings.inputs.words).toEqual(data.buildings.inputs.words);
    expect(page.buildings.results['ln_priority']).toEqual(data.buildings.results['ln_priority']);
  });

  it('stays under 700 bytes a building', () => {
    const [small, large] = [100, 400].map((count) => scriptJson(packPage(pageData({ count }))).length);
    expect(((large ?? 0) - (small ?? 0)) / 300).toBeLessThan(700);
  });
});

import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { layGrid } from '../../../src/engineering/spectrum/grid.js';
import type { HazardGrid } from '../../../src/engineering/spectrum/grid.js';
import { carried, cropped, gridsOf, uncarried } from '../../../src/engineering/spectrum/grid-carry.js';
import { ordinatesAt } from '../../../src/engineering/spectrum/grid-read.js';

/** Ten by eight nodes from `west` on, one missing, one without ordinates. */
function grid(west: number): HazardGrid {
  const places = Array.from({ length: 80 }, (_, k) => [k % 10, Math.floor(k / 10)] as const).filter(
    ([i, j]) => i !== 4 || j !== 3,
  );
  const sa_g = places.flatMap(([i, j]) => (i === 7 && j === 6 ? [NaN, NaN] : [0.3 + 0.01 * i * j, 0.1 + 0.02 * i]));
  return layGrid({
    periods_s: [0.2, 1],
    lon: Float64Array.from(places, ([i]) => west + 0.1 * i),
    lat: Float64Array.from(places, ([, j]) => 40 + 0.1 * j),
    sa_g: Float64Array.from(sa_g),
  });
}
const read = (from: HazardGrid, lon: number, lat: number): readonly number[] | null => {
  const ordinates = ordinatesAt(from, lon, lat);
  return ordinates === null ? null : [...ordinates];
};
const between = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true });

describe('carried', () => {
  it('brings every place back to the bit, through JSON, holes too', () => {
    const whole = grid(10);
    const again = uncarried(JSON.parse(JSON.stringify(carried(whole))) as ReturnType<typeof carried>);
    fc.assert(
      fc.property(between(9.9, 11), between(39.9, 40.8), (lon, lat) => {
        expect(read(again, lon, lat)).toEqual(read(whole, lon, lat));
      }),
      { numRuns: 2000, seed: 41 },
    );
  });
});

describe('cropped', () => {
  // from 179.5 on: the grid crosses the 180th meridian, and the places are given on either side of it
  it.each([10, -40.5, 179.5])(
    'keeps what some places read to the bit, and no more nodes than they need: %s',
    (west) => {
      const whole = grid(west);
      const turn = (lon: number): number => (lon > 180 ? lon - 360 : lon);
      fc.assert(
        fc.property(
          fc.array(fc.tuple(between(west - 0.05, west + 0.95), between(39.95, 40.75)), { minLength: 1, maxLength: 6 }),
          (places) => {
            const lon = places.map(([x]) => turn(x));
            const lat = places.map(([, y]) => y);
            const part = cropped(whole, [...lon, NaN], [...lat, NaN]);
            const small = gridsOf({ one: part }).get('one')!;
            lon.forEach((x, i) => {
              expect(read(small, x, lat[i]!)).toEqual(read(whole, x, lat[i]!));
            });
            expect(part.places.length).toBeLessThanOrEqual(4 * places.length);
          },
        ),
        { numRuns: 500, seed: 42 },
      );
    },
  );

  it('is empty where no place is inside', () => {
    const part = cropped(grid(10), [50, NaN], [40, 40]);
    expect(part.places).toEqual([]);
    expect(read(gridsOf({ one: part }).get('one')!, 50, 40)).toBeNull();
  });
});

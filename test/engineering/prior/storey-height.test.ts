import { describe, expect, it } from 'vitest';
import { USES } from '../../../src/engineering/building.js';
import { storeyHeight, storeysFromHeight } from '../../../src/engineering/prior/storey-height.js';

describe('storeyHeight', () => {
  it('holds the table of the method (judgement; residential, hotel and office agree with a public sample of 17 tall buildings)', () => {
    expect(storeyHeight('residential', 4)).toMatchObject({ height_m: 3.1, sigma: 0.1 });
    expect(storeyHeight('office', 4)).toMatchObject({ height_m: 4, sigma: 0.12 });
    expect(storeyHeight('warehouse', 1)).toMatchObject({ height_m: 7, sigma: 0.3 });
    expect(storeyHeight('warehouse', 2)).toMatchObject({ height_m: 4.5, sigma: 0.2 });
    for (const use of USES) expect(storeyHeight(use, 3).height_m).toBeGreaterThan(2.3);
  });
});

describe('storeysFromHeight', () => {
  it('gives back the storeys whose height the table gives', () => {
    for (const use of USES) {
      for (const n of [3, 4, 7, 20])
        expect(storeysFromHeight(use, n * storeyHeight(use, n).height_m).storeys, use).toBe(n);
    }
  });

  it('takes a hall as one storey and never gives none', () => {
    expect(storeysFromHeight('warehouse', 9).storeys).toBe(1);
    expect(storeysFromHeight('residential', 2).storeys).toBe(1);
  });
});

import { describe, expect, it } from 'vitest';
import { usableStretches } from '../../../src/engineering/vibration/signal.js';
import { noiseOf, signalOf } from '../../support/engineering-vibration.js';

describe('usableStretches', () => {
  it('cuts at gaps, and cuts out unreadable samples and flat runs', () => {
    const values = noiseOf(200, 1);
    values[50] = NaN;
    values.fill(0.5, 100, 130);
    const cuts = usableStretches(signalOf(values, 100, [{ at: 20, missing_s: 1.5 }]));
    expect(cuts.stretches).toEqual([
      { from: 0, to: 20 },
      { from: 20, to: 50 },
      { from: 51, to: 100 },
      { from: 130, to: 200 },
    ]);
    expect(cuts).toMatchObject({ samples: 200, unreadable: 1, flat: 30, gaps: 1, gap_s: 1.5 });
  });

  it('keeps short runs of one value, which coarse instruments write', () => {
    const values = Float64Array.from({ length: 100 }, (_, i) => Math.floor(i / 19));
    expect(usableStretches(signalOf(values, 100)).stretches).toEqual([{ from: 0, to: 100 }]);
  });

  it('has nothing left of a dead channel', () => {
    expect(usableStretches(signalOf(new Float64Array(500), 100)).stretches).toEqual([]);
  });
});

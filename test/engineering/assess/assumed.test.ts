import { describe, expect, it } from 'vitest';
import { ASSUMED, assumedWith } from '../../../src/engineering/assess/assumed.js';
import type { Assumed } from '../../../src/engineering/assess/assumed.js';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import { settingsFromJson } from '../../../src/engineering/assess/settings.js';
import type { Building } from '../../../src/engineering/building.js';
import { building } from '../../support/engineering-building.js';
import { random } from '../../support/engineering-random.js';
import { inventedPortfolio } from '../../support/engineering-portfolio.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const portfolio: readonly Building[] = [
  ...inventedPortfolio(150, random(5)),
  building({ soft_storey: 'yes', torsion: 'yes', setback: 'yes', year_retrofitted: 1994, importance_factor: 1.5 }),
];

function scores(assumed: Partial<Assumed> | undefined): readonly number[] {
  const context = compileContext({ ...SETTINGS, assumed: assumed === undefined ? undefined : assumedWith(assumed) });
  return portfolio.map((one) => {
    const result = assess(one, context);
    return isRanked(result) ? result.lnPriority : NaN;
  });
}

describe('ASSUMED', () => {
  const before = scores(undefined);

  it('is what settings without it mean, to the bit', () => {
    expect(scores({})).toEqual(before);
    expect(settingsFromJson(JSON.stringify(SETTINGS)).assumed).toEqual(ASSUMED);
    const { special: _special, ...some } = ASSUMED.ductility;
    const stored = { ...SETTINGS, assumed: { overstrength: 3, ductility: some } };
    expect(settingsFromJson(JSON.stringify(stored)).assumed).toEqual({ ...ASSUMED, overstrength: 3 });
  });

  it.each<readonly [string, Partial<Assumed>]>([
    ['the least coefficient', { leastCoefficient: 0.1 }],
    ['the overstrength', { overstrength: 3 }],
    ['the ductilities', { ductility: { ...ASSUMED.ductility, none: 4 } }],
    ['the retrofit level', { retrofitLevel: 1.2 }],
    ['the uses', { uses: { ...ASSUMED.uses, office: { ...ASSUMED.uses.office, people_per_m2: 1 } } }],
    ['the weight of people', { peopleWeight: 0.5 }],
    ['the weight of importance', { importanceWeight: 0 }],
    ['the level of a spectrum', { spectrumFactor: { firm: 1.2 } }],
  ])('moves some building with %s', (_name, change) => {
    const after = scores(change);
    expect(after.some((value, i) => Math.abs(value - before[i]!) > 1e-6)).toBe(true);
  });

  it('adds k ln c to every building when all spectra are scaled by c, and leaves people out at weight 0', () => {
    const scaled = scores({ spectrumFactor: { rock: 1.2, firm: 1.2, soft: 1.2 } });
    scaled.forEach((value, i) => {
      if (!Number.isNaN(value)) expect(value - before[i]!).toBeCloseTo(2.5 * Math.log(1.2), 8);
    });
    // importance and people out: what is left is the ratio
    const ratio = compileContext({ ...SETTINGS, rankBy: 'ratio' });
    scores({ peopleWeight: 0, importanceWeight: 0 }).forEach((value, i) => {
      const result = assess(portfolio[i]!, ratio);
      if (!Number.isNaN(value) && isRanked(result)) expect(value).toBeCloseTo(result.lnPriority, 8);
    });
  });
});

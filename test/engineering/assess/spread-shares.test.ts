import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import { chooseSpectrum } from '../../../src/engineering/assess/choose-spectrum.js';
import { spreadShares } from '../../../src/engineering/assess/spread-shares.js';
import type { Building } from '../../../src/engineering/building.js';
import { Trace } from '../../../src/engineering/trace.js';
import { building, given } from '../../support/engineering-building.js';
import { inventedPortfolio } from '../../support/engineering-portfolio.js';
import { random } from '../../support/engineering-random.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const context = compileContext(SETTINGS);

function sharesOf(one: Building) {
  const choice = chooseSpectrum(context, one, 0);
  if (typeof choice === 'string') throw new Error(choice);
  return spreadShares(one, choice.spectrum, context) ?? [];
}

describe('spreadShares', () => {
  it('falls from the largest on, each between nothing and the whole, together the whole where nothing acts against another', () => {
    let seen = 0;
    for (const one of inventedPortfolio(60, random(5))) {
      const shares = sharesOf(one);
      if (shares.length === 0) continue;
      seen += 1;
      const sum = shares.reduce((all, { share }) => all + share, 0);
      expect(sum).toBeGreaterThan(0.999);
      for (const [i, { share }] of shares.entries()) {
        expect(share).toBeGreaterThanOrEqual(0);
        expect(share).toBeLessThanOrEqual(1);
        if (i > 0) expect(share).toBeLessThanOrEqual(shares[i - 1]!.share);
      }
    }
    expect(seen).toBeGreaterThan(40);
  });

  // of people counted and not, with the use unknown: by as much as knowing it, or both, takes off
  it.each([
    ['use unknown', { occupants_peak: 40 }, { use: 'other' }],
    ['use and people unknown', { occupants_peak: NaN }, { use: 'other', occupants_peak: 40 }],
    ['people not counted', { use: 'office', occupants_peak: NaN }, { occupants_peak: 40 }],
  ] as const)('blames %s by as much as knowing takes off', (what, unknown, known) => {
    const one = building({ use: 'unknown', floor_area_m2: given(500), years: [1990], ...unknown });
    const found = sharesOf(one).find((share) => share.what === what);
    const before = assess(one, context);
    const after = assess({ ...one, ...known }, context);
    if (!isRanked(before) || !isRanked(after)) throw new Error('not ranked');
    expect(found?.share).toBeCloseTo(1 - (after.lnPrioritySd / before.lnPrioritySd) ** 2, 6);
    expect(found?.learnable).toBe(true);
  });

  it('names what a finished assessment leaves open, and the people, each by its own spread', () => {
    const one = building({ capacity_sa_g: 0.4, use: 'office', occupants_peak: 100, years: [1990] });
    const result = assess(one, context);
    if (!isRanked(result)) throw new Error('not ranked');
    const shares = new Map(sharesOf(one).map(({ what, share }) => [what, share]));
    const { assessedCapacity, peopleCounted } = SETTINGS.spreads;
    // k 2.5 of the settings
    expect(shares.get('the finished assessment itself')).toBeCloseTo(
      (2.5 * assessedCapacity) ** 2 / result.lnPrioritySd ** 2,
      9,
    );
    expect(shares.get('people and their hours, however well known')).toBeCloseTo(
      peopleCounted ** 2 / result.lnPrioritySd ** 2,
      9,
    );
    expect([...shares.keys()]).toContain('the error of the period');
  });

  it('stands in the hand calculation, with what a visit could find out', () => {
    const trace = new Trace();
    assess(building({ system: null, years: [1958], use: 'office' }), context, trace);
    const choice = trace.steps.find(
      (step) => step.kind === 'choice' && step.question === 'Where the spread comes from',
    );
    expect(JSON.stringify(choice)).toContain('of the spread');
    expect(JSON.stringify(choice)).toContain('lateral system unknown');
  });
});

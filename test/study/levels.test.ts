import { describe, expect, it } from 'vitest';
import { returnPeriodYears, spectraOf, spectrumFor } from '../../src/study/levels.js';
import { studyFromText } from '../../src/study/load.js';
import { SAMPLE } from './sample.js';

const text = `${SAMPLE.replace('spectra: {C: design}, otherwise: design', 'spectra: {C: design, D: drawn}')}ranking: {k: 2.5}\n`;
const { study } = studyFromText(text);
const [byClass, single] = study.hazard.levels;

// Follows from the study file's contract; no outside source.
describe('spectraOf', () => {
  it('names each spectrum of a level once', () => {
    expect(spectraOf(byClass!)).toEqual(['design', 'drawn']);
    expect(spectraOf(single!)).toEqual(['rare']);
    expect(spectraOf(studyFromText(SAMPLE).study.hazard.levels[0]!)).toEqual(['design']);
  });
});

describe('spectrumFor', () => {
  const at = (site_class: string | null) => ({ site_class, hazard_zone: null });
  it('takes the one of the site class, else otherwise, else none', () => {
    expect(spectrumFor(byClass!, at('D'))).toBe('drawn');
    expect([at('E'), at(null), at('constructor')].map((building) => spectrumFor(byClass!, building))).toEqual([
      null,
      null,
      null,
    ]);
    expect(spectrumFor(single!, at(null))).toBe('rare');
    expect(spectrumFor(studyFromText(SAMPLE).study.hazard.levels[0]!, at('E'))).toBe('design');
  });
});

describe('returnPeriodYears', () => {
  it('is the one all spectra of the level state', () => {
    expect(returnPeriodYears(study, single!)).toBe(2475);
    expect(returnPeriodYears(study, byClass!)).toBeNull();
  });
});

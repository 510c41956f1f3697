import { describe, expect, it } from 'vitest';
import { returnPeriodYears, spectraOf } from '../../src/study/levels.js';
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

describe('returnPeriodYears', () => {
  it('is the one all spectra of the level state', () => {
    expect(returnPeriodYears(study, single!)).toBe(2475);
    expect(returnPeriodYears(study, byClass!)).toBeNull();
  });
});

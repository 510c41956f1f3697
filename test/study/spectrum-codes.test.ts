import { describe, expect, it } from 'vitest';
import { UserError, formatError } from '../../src/errors.js';
import { studyFromText } from '../../src/study/load.js';
import { studyJsonSchema } from '../../src/study/schema.js';
import { SPECTRUM_CODES } from '../../src/study/spectrum-codes.js';
import { SAMPLE } from './sample.js';

const DRAWN = /drawn: \{.*\}/;
const withSpectrum = (entry: string): string => SAMPLE.replace(DRAWN, `drawn: {${entry}}`);

function complaints(text: string): string[] {
  try {
    studyFromText(text);
    return [];
  } catch (error) {
    if (!(error instanceof UserError)) throw error;
    return formatError(error)
      .split('\n')
      .map((line) => line.replace(/^study\.yaml:\d+:\d+ /, ''));
  }
}

/** One valid entry for each code, invented. */
const ENTRIES: Readonly<Record<string, string>> = {
  'asce7-22-two-period': 'sds_g: 1, sd1_g: 0.5, tl_s: 8',
  'asce7-22-two-period-maximum': 'sds_g: 1, sd1_g: 0.5, tl_s: 6',
  'asce7-22-multi-period': `ordinates_g: [${Array(22).fill(0.4).join(', ')}], tl_s: 8`,
  'asce7-05-two-period': 'ss_g: 1, s1_g: 0.4, site_class: D, tl_s: 8',
  'asce7-10-two-period': 'ss_g: 1, s1_g: 0.4, site_class: default, shaking: maximum-considered, tl_s: 8',
  'asce7-16-two-period': 'ss_g: 1, s1_g: 0.4, site_class: D, supplement_3: not-applied, tl_s: 8',
  'asce41-17-general': 'sxs_g: 1, sx1_g: 0.5, damping_ratio: 0.1, tl_s: 8',
  'en1998-1-2004-elastic-type-1': 'ag_g: 0.2, ground: B',
  'en1998-1-2004-elastic-type-2': 'ag_g: 0.2, ground: B, damping_ratio: 0.02',
  'en1998-1-2004-design-type-1': 'ag_g: 0.2, ground: B, behaviour_factor: 3',
  'en1998-1-2004-design-type-2': 'ag_g: 0.2, ground: B, behaviour_factor: 3, lower_bound_factor: 0.1',
  'nzs1170-5-2004': 'site_class: C, zone_factor: 0.4, return_factor: 1, distance_km: 5, form: table-3-1',
  'nbc-2010': 'ordinates_g: [0.9, 0.6, 0.3, 0.2], fa: 1, fv: 1.2',
  'nbc-2015': 'ordinates_g: [0.9, 0.6, 0.3, 0.2, 0.1, 0.05], pga_g: 0.4, site_class: D',
  'nbc-2020': 'ordinates_g: [0.9, 0.6, 0.3, 0.2, 0.1, 0.05], interpolation: log-log',
  'is1893-2016': 'zone_factor: 0.24, soil: medium',
  table: 'periods_s: [0, 1], ordinates_g: [1, 0.5], interpolation: linear',
};

// Contracts of the study file: nothing outside the program to hold them against.
describe('SpectrumSchema', () => {
  it.each(Object.entries(ENTRIES))('takes %s', (code, parameters) => {
    expect(complaints(withSpectrum(`code: ${code}, ${parameters}, return_period_years: 475`))).toEqual([]);
  });

  it('fills defaults with the fallbacks of the record', () => {
    const { study } = studyFromText(
      withSpectrum('code: nzs1170-5-2004, site_class: C, zone_factor: 0.4, return_factor: 1, distance_km: 20'),
    );
    expect(study.hazard.spectra['drawn']).toEqual({
      code: 'nzs1170-5-2004',
      site_class: 'C',
      zone_factor: 0.4,
      return_factor: 1,
      distance_km: 20,
      site_period_s: 1.5,
      form: 'modal',
    });
    expect(JSON.stringify(studyJsonSchema())).toContain('"default":"modal"');
  });

  it.each([
    [
      'code: asce7-16-two-period, ss_g: 1.2, s1_g: 0.4, site_class: E, tl_s: 8',
      /^hazard\.spectra\.drawn: class E with ss_g = 1\.2 has no factor: .*11\.4\.8, a site-specific study is needed/,
    ],
    [
      'code: asce7-16-two-period, ss_g: 12, s1_g: 0.4, site_class: F, tl_s: 8',
      /^hazard\.spectra\.drawn\.ss_g: expected a number in g 0\.01 to 5, got 12$/,
    ],
    [
      'code: asce7-22-two-period, sds_g: 1, sd1_g: 0.5',
      /^hazard\.spectra\.drawn\.tl_s: missing; expected a number in s > 0 and <= 100$/,
    ],
    [
      'code: asce7-22-multi-period, tl_s: 8, ordinates_g: [1, 2]',
      /^hazard\.spectra\.drawn\.ordinates_g: expected a list of 22 numbers in g > 0 and <= 10/,
    ],
    ['code: nbc-2010, ordinates_g: [1, 2, 3, 4, 5], fa: 1, fv: 1', /expected a list of 4 numbers in g/],
    ['code: is1893-2016, zone_factor: 0.24, soil: II', /unknown word "II"; known: rock, medium, soft/],
    [
      'code: en1998-1-2004-elastic-type-1, ag_g: 0.2, ground: B, q: 3',
      /unknown key; known: code, ag_g, ground, damping_ratio, /,
    ],
    ['code: asce41-17-general, sxs_g: 1, tl_s: 8', /^hazard\.spectra\.drawn\.sx1_g: missing; expected a number in g/],
  ])('refuses {%s}', (entry, message) => {
    expect(complaints(withSpectrum(entry))[0]).toMatch(message);
  });

  it('lets no level read a spectrum that contains a behaviour factor', () => {
    const text = withSpectrum(`code: en1998-1-2004-design-type-1, ${ENTRIES['en1998-1-2004-design-type-1']!}`);
    expect(complaints(text)).toEqual([]);
    expect(complaints(text.replace('spectrum: rare', 'spectrum: drawn'))).toEqual([
      'hazard.levels.2.spectrum: en1998-1-2004-design-type-1 contains a behaviour factor and serves base shear; levels read elastic spectra',
    ]);
  });
});

describe('SPECTRUM_CODES', () => {
  it('keep the spellings of earlier studies', () => {
    for (const code of ['asce7-22-two-period', 'en1998-1-2004-elastic-type-1', 'en1998-1-2004-elastic-type-2', 'table'])
      expect(SPECTRUM_CODES).toContain(code);
  });
});

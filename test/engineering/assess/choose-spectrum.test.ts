import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import { chooseSpectrum } from '../../../src/engineering/assess/choose-spectrum.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import type { LevelSettings } from '../../../src/engineering/assess/settings.js';
import type { Building } from '../../../src/engineering/building.js';
import { Trace } from '../../../src/engineering/trace.js';
import { building, structure } from '../../support/engineering-building.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const BY_CLASS = { B: 'rock', C: 'firm', D: 'soft' };
const context = (level: Partial<LevelSettings>) =>
  compileContext({
    ...SETTINGS,
    levels: [{ title: 'one', by: 'vs30', classes: 'asce7-16', spectra: BY_CLASS, otherwise: null, ...level }],
  });
const at = (vs30_mps: number, site_class: string | null = null): Building =>
  building({ site_class, structure: structure({ vs30_mps }) });
const nameOf = (level: Partial<LevelSettings>, of: Building): string => {
  const choice = chooseSpectrum(context(level), of, 0);
  return typeof choice === 'string' ? choice : choice.spectrum.name;
};

describe('chooseSpectrum by velocity', () => {
  it('reads the class of the code named: 400 m/s is C by ASCE 7-16 table 20.3-1, B by EN 1998-1 table 3.1', () => {
    expect(nameOf({ classes: 'asce7-16' }, at(400))).toBe('firm');
    expect(nameOf({ classes: 'en1998-1-2004' }, at(400))).toBe('rock');
  });

  it('puts a velocity on a bound into the softer class, as the bounds of ASCE 7-16 table 20.3-1 read', () => {
    // C: 360 < v <= 760 m/s, D: 180 to 360 m/s
    expect([361, 360, 760, 761].map((v) => nameOf({}, at(v)))).toEqual(['firm', 'soft', 'firm', 'rock']);
  });

  it('says why, and flags a class on record that differs', () => {
    const plain = chooseSpectrum(context({}), at(400, 'C'), 0);
    expect(plain).toMatchObject({
      because:
        'shear-wave velocity 400.0 m/s, site class C of ASCE/SEI 7-16, table 20.3-1; the same bounds in 7-05 and 7-10',
      byDefault: false,
      classFlag: null,
    });
    const other = chooseSpectrum(context({}), at(400, 'D'), 0);
    expect(other).toMatchObject({ spectrum: { name: 'firm' }, classFlag: 'class-differs' });
    expect((other as { because: string }).because).toContain('; the inventory says D');
    const result = assess(at(400, 'D'), context({}));
    expect(isRanked(result) && result.flags).toContain('class-differs');
    expect(isRanked(result) && result.spectrum).toBe('firm');
  });

  it('falls back on the class on record, flagged, and has none for neither', () => {
    expect(chooseSpectrum(context({}), building({ site_class: 'D' }), 0)).toMatchObject({
      spectrum: { name: 'soft' },
      because: 'shear-wave velocity not known, site class D on record',
      classFlag: 'velocity-unknown',
    });
    expect(chooseSpectrum(context({}), building({ site_class: null }), 0)).toBe(
      'site class not known and the study names no spectrum for that',
    );
  });

  it('names the class for which the study has no spectrum, or takes its default', () => {
    expect(chooseSpectrum(context({}), at(100), 0)).toBe('no spectrum for site class "E"');
    expect(chooseSpectrum(context({ otherwise: 'soft' }), at(100), 0)).toMatchObject({
      spectrum: { name: 'soft' },
      byDefault: true,
    });
  });
});

describe('chooseSpectrum by name', () => {
  const own = { by: 'spectrum', spectra: { rock: 'rock', firm: 'firm', soft: 'soft' } } as const;

  it('reads the spectrum that the inventory names', () => {
    expect(chooseSpectrum(context(own), building({ spectrum: 'soft' }), 0)).toMatchObject({
      spectrum: { name: 'soft' },
      because: 'the inventory names "soft"',
      classFlag: null,
    });
    expect(nameOf({ ...own, spectra: { a: 'rock' } }, building({ spectrum: 'a' }))).toBe('rock');
  });

  it('names one that the study does not have', () => {
    expect(nameOf(own, building({ spectrum: 'sotf' }))).toBe('no spectrum "sotf" in the study');
    expect(nameOf(own, building({ spectrum: 'constructor' }))).toBe('no spectrum "constructor" in the study');
    expect(nameOf(own, building())).toBe('spectrum not known and the study names no spectrum for that');
  });
});

describe('the hand calculation', () => {
  it('says what the parameters of the spectrum mean', () => {
    const flagged = compileContext({
      ...SETTINGS,
      spectra: { only: { code: 'asce7-16-two-period', ss_g: 1.5, s1_g: 0.6, site_class: 'D', tl_s: 8 } },
      levels: [{ title: 'one', by: null, spectra: { all: 'only' }, otherwise: null }],
    });
    const trace = new Trace();
    assess(building(), flagged, trace);
    // ASCE 7-16 Supplement 3: class D with S_1 of 0.2 g or more
    expect(trace.steps).toContainEqual(
      expect.objectContaining({ question: 'About only', taken: expect.stringContaining('Supplement 3') as string }),
    );
  });
});

import { describe, expect, it } from 'vitest';
import type { UserError } from '../../src/errors.js';
import { settingsOf } from '../../src/screening/settings.js';
import { studyFromText } from '../../src/study/load.js';
import { SMALL_STUDY } from '../support/cli.js';

const withLevel = (level: string, columns = 'vs30_mps: Vs'): string =>
  SMALL_STUDY.replace('{title: design level, spectrum: design}', level).replace(
    'name: name,',
    `name: name, ${columns},`,
  );
function complaints(text: string): string[] {
  try {
    studyFromText(text);
    return [];
  } catch (error) {
    return (error as UserError).problems.map(({ place, message }) => `${String(place.key)}: ${message}`);
  }
}

describe('a level by vs30', () => {
  it('names the code whose classes it reads', async () => {
    const text = withLevel('{title: one, by: vs30, classes: asce7-22, spectra: {CD: design}, otherwise: table}');
    const { levels } = await settingsOf(studyFromText(text));
    expect(levels).toEqual([
      { title: 'one', by: 'vs30', classes: 'asce7-22', spectra: { CD: 'design' }, otherwise: 'table' },
    ]);
  });

  it('needs the code, one we have, and classes of it', () => {
    expect(complaints(withLevel('{title: one, by: vs30, spectra: {C: design}}'))).toEqual([
      'hazard.levels.1.classes: missing; expected one of asce7-16, asce7-22, en1998-1-2004, nbc-2020, tbdy-2018',
    ]);
    expect(complaints(withLevel('{title: one, by: vs30, classes: asce7-16, spectra: {CD: design}}'))).toEqual([
      'hazard.levels.1.spectra.CD: asce7-16 has no site class "CD" that a velocity tells; it has A, B, C, D, E',
    ]);
    expect(complaints(withLevel('{title: one, by: vs3, spectra: {C: design}}'))).toEqual([
      'hazard.levels.1.by: unknown word "vs3"; known: site_class, hazard_zone, vs30, spectrum',
    ]);
  });

  it('needs a column of velocities or classes', () => {
    const level = '{title: one, by: vs30, classes: asce7-16, spectra: {C: design}}';
    expect(complaints(withLevel(level, 'site_class: Ground'))).toEqual([]);
    expect(complaints(withLevel(level, 'group: Block'))).toEqual([
      'hazard.levels.1.by: inventory.columns names no vs30_mps, so no building would have a spectrum; name it, or say otherwise:',
    ]);
  });
});

describe('a level by spectrum', () => {
  it('reads every elastic spectrum by its own name, or by the names it is given', async () => {
    const reduced = SMALL_STUDY.replace(
      '    table:',
      '    base: {code: en1998-1-2004-design-type-1, ag_g: 0.2, ground: B, behaviour_factor: 3}\n    table:',
    );
    const of = async (level: string): Promise<unknown> =>
      (
        await settingsOf(
          studyFromText(
            reduced
              .replace('{title: design level, spectrum: design}', level)
              .replace('name: name,', 'name: name, spectrum: S,'),
          ),
        )
      ).levels[0]?.spectra;
    expect(await of('{title: one, by: spectrum}')).toEqual({ design: 'design', table: 'table' });
    expect(await of('{title: one, by: spectrum, spectra: {a: table}}')).toEqual({ a: 'table' });
  });

  it('needs the column', () => {
    expect(complaints(withLevel('{title: one, by: spectrum}'))).toEqual([
      'hazard.levels.1.by: inventory.columns names no spectrum, so no building would have a spectrum; name it, or say otherwise:',
    ]);
  });
});

import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parse } from 'yaml';
import { setAtPath, valueFromText } from '../../src/study/edit.js';
import { studyFromText } from '../../src/study/load.js';
import { SAMPLE } from './sample.js';

const commentsOf = (text: string): string[] => text.match(/# .*$/gm) ?? [];

describe('setAtPath', () => {
  it('replaces a value and nothing else', () => {
    expect(setAtPath(SAMPLE, 'hazard.spectra.design.sds_g', 1.1)).toBe(SAMPLE.replace('0.95', '1.1'));
    expect(setAtPath(SAMPLE, 'hazard.levels.2.title', 'rare, once in 2475 years')).toBe(
      SAMPLE.replace('title: rare level', 'title: "rare, once in 2475 years"'),
    );
    expect(setAtPath(SAMPLE, ['hazard', 'levels', 1, 'spectrum'], 'design')).toBe(
      SAMPLE.replace('spectrum: rare', 'spectrum: design'),
    );
    const crlf = SAMPLE.replaceAll('\n', '\r\n');
    expect(setAtPath(crlf, 'title', 'Other')).toBe(crlf.replace('Two streets (invented)', 'Other'));
  });

  it('adds keys, levels and lists and keeps the comments', () => {
    let text = setAtPath(SAMPLE, 'ranking.k', 2.5);
    text = setAtPath(text, 'hazard.levels.3', { title: 'drawn level', spectrum: 'drawn' });
    text = setAtPath(text, 'inventory.blank', ['', 'none']);
    const { study } = studyFromText(text);
    expect(study.ranking.k).toBe(2.5);
    expect(study.hazard.levels[2]).toEqual({ title: 'drawn level', spectrum: 'drawn' });
    expect(study.inventory.blank).toEqual(['', 'none']);
    expect(commentsOf(text)).toEqual(commentsOf(SAMPLE));
    expect(commentsOf(text)).toHaveLength(2);
  });

  it('writes any simple value so that it is read back, in a block and in a flow', () => {
    fc.assert(
      fc.property(
        fc.oneof(
          fc.string({ unit: 'grapheme' }),
          fc.double({ noNaN: true }),
          fc.boolean(),
          fc.constantFrom('yes', 'null', '1e3'),
        ),
        fc.constantFrom('title', 'hazard.spectra.design.note', 'hazard.levels.1.title'),
        (value, path) => {
          const base = SAMPLE.replace('{code: asce7-22-two-period', '{note: here, code: asce7-22-two-period');
          const read = parse(setAtPath(base, path, value)) as {
            title: unknown;
            hazard: { spectra: { design: { note: unknown } }; levels: { title: unknown }[] };
          };
          const { title, hazard } = read;
          const found = {
            title,
            'hazard.spectra.design.note': hazard.spectra.design.note,
            'hazard.levels.1.title': hazard.levels[0]?.title,
          };
          expect(found[path]).toEqual(value);
        },
      ),
    );
  });

  it('says when a path leads nowhere', () => {
    expect(() => setAtPath(SAMPLE, 'title.short', 1)).toThrow('title.short leads through a value that holds no keys');
    expect(() => setAtPath(SAMPLE, 'hazard.levels.0.title', 1)).toThrow(
      'hazard.levels is a list of 2: expected a position from 1, got "0"',
    );
    expect(() => setAtPath(SAMPLE, 'hazard..x', 1)).toThrow('expected a key, got "hazard..x"');
    expect(() => setAtPath('a: "', 'a', 1)).toThrow('not valid YAML');
  });
});

describe('valueFromText', () => {
  it('reads numbers, lists and words as a study file does', () => {
    expect(['0.4', '[a, b]', 'yes', '2475', '{B: x}'].map(valueFromText)).toEqual([
      0.4,
      ['a', 'b'],
      'yes',
      2475,
      { B: 'x' },
    ]);
    expect(() => valueFromText('[a')).toThrow('not a value: "[a"');
  });
});

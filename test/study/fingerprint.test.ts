import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { stringify } from 'yaml';
import { canonicalJson, studyFingerprint } from '../../src/study/fingerprint.js';
import { studyFromText } from '../../src/study/load.js';
import { SAMPLE } from './sample.js';

function reversed(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(reversed);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .reverse()
      .map(([key, inner]) => [key, reversed(inner)]),
  );
}

describe('canonicalJson', () => {
  it('does not depend on the order of keys', () => {
    fc.assert(fc.property(fc.jsonValue(), (value) => canonicalJson(reversed(value)) === canonicalJson(value)));
  });

  it('loses nothing', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        expect(JSON.parse(canonicalJson(value))).toEqual(JSON.parse(JSON.stringify(value)));
      }),
    );
  });

  it('keeps the order of lists', () => {
    expect(canonicalJson([{ b: 1, a: [2, 1] }])).toBe('[{"a":[2,1],"b":1}]');
  });
});

describe('studyFingerprint', () => {
  const { study } = studyFromText(SAMPLE);

  it('is 16 hexadecimal digits, the same whatever the order of keys, comments and defaults written out', () => {
    const print = studyFingerprint(study);
    expect(print).toMatch(/^[0-9a-f]{16}$/);
    expect(studyFingerprint(studyFromText(stringify(reversed(study))).study)).toBe(print);
    expect(studyFingerprint(studyFromText(`# more\n${SAMPLE}seed: 1\n`).study)).toBe(print);
  });

  it('changes with any value', () => {
    expect(studyFingerprint(studyFromText(SAMPLE.replace('0.95', '0.96')).study)).not.toBe(studyFingerprint(study));
  });
});

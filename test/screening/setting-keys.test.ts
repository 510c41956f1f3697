import { resolve } from 'node:path';
import { describe, expect, it } from 'vitest';
import { settingsOf } from '../../src/screening/settings.js';
import { studyKeyOf } from '../../src/screening/setting-keys.js';
import type { KeyPath } from '../../src/study/document.js';
import { loadStudy } from '../../src/study/load.js';

/** Every simple value of the settings with its path. */
function leaves(value: unknown, path: KeyPath = []): readonly { readonly path: KeyPath; readonly value: unknown }[] {
  if (typeof value !== 'object' || value === null) return [{ path, value }];
  const steps = Array.isArray(value) ? value.map((_, i) => i) : Object.keys(value);
  return steps.flatMap((step) => leaves((value as Record<string, unknown>)[step], [...path, step]));
}

const at = (study: unknown, path: KeyPath): unknown =>
  path.reduce<unknown>((node, step) => (node as Record<string, unknown> | undefined)?.[step], study);

describe('settings by the keys of the study', () => {
  it('names for each setting the key that holds the same value in the study, defaults filled in', async () => {
    const loaded = await loadStudy(resolve('data-demo/study.yaml'));
    const all = leaves(await settingsOf(loaded));
    // what is read from files or worked out has no value of its own in the study; a level is written in more than one way
    const apart = new Set(['systemPrior', 'slope', 'slopeSource', 'levels']);
    const stated = all.filter(
      ({ path, value }) => !apart.has(String(path[0])) && value !== undefined && path.at(-1) !== 'verified',
    );
    expect(stated.length).toBeGreaterThan(100);
    for (const { path, value } of stated)
      expect({ path, value: at(loaded.study, studyKeyOf(path)) }).toEqual({ path, value });
  });

  it('leaves the names that the user gave as they are', () => {
    expect(studyKeyOf(['spectra', 'softSoil', 'sds_g'])).toEqual(['hazard', 'spectra', 'softSoil', 'sds_g']);
    expect(studyKeyOf(['listSize'])).toEqual(['ranking', 'list_size']);
    expect(studyKeyOf(['seed'])).toEqual(['seed']);
  });
});

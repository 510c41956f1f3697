import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { compileSpectrum } from '../../src/engineering/spectrum/definition.js';
import { ordinate } from '../../src/engineering/spectrum/compiled.js';
import { studyFingerprint } from '../../src/study/fingerprint.js';
import { loadStudy } from '../../src/study/load.js';
import { SAMPLE } from './sample.js';

let folder = '';
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'swaymark-'));
});
afterAll(async () => {
  await rm(folder, { recursive: true });
});

const STUDY = SAMPLE.replace(
  /drawn: .*/,
  'drawn: {code: table-file, file: hazard.csv, unit: g, interpolation: log-log, return_period_years: 475}',
);

async function load(table: string, study = STUDY): ReturnType<typeof loadStudy> {
  await writeFile(join(folder, 'hazard.csv'), table);
  await writeFile(join(folder, 'study.yaml'), study);
  return loadStudy(join(folder, 'study.yaml'));
}

describe('withTableFiles', () => {
  it('puts the table in the place of the file, beside what the study says about it', async () => {
    const { study } = await load('0,1;0,9\n1;0,3\n');
    const { drawn } = study.hazard.spectra;
    expect(drawn).toEqual({
      code: 'table',
      periods_s: [0.1, 1],
      ordinates_g: [0.9, 0.3],
      interpolation: 'log-log',
      return_period_years: 475,
      note: 'read from hazard.csv: two columns, unit g as the study says, commas for decimals',
    });
    // log-log: 0.9 (T/0.1)^(-log10 3)
    expect(ordinate(compileSpectrum(drawn!).compiled, 0.4)).toBeCloseTo(0.9 * 4 ** -Math.log10(3), 12);
  });

  it('lets the fingerprint of the study follow what the file says', async () => {
    const first = studyFingerprint((await load('0.1,0.9\n1,0.3\n')).study);
    expect(studyFingerprint((await load('# the same\n0.1,0.90\n1,0.3')).study)).toBe(first);
    expect(studyFingerprint((await load('0.1,0.9\n1,0.31\n')).study)).not.toBe(first);
  });

  it('names file and line of what is wrong, and the key of what is missing', async () => {
    await expect(load('0.1,0.9\n1,x\n')).rejects.toMatchObject({
      place: { file: join(folder, 'hazard.csv'), line: 2 },
    });
    await expect(load('0.1,0.9\n', STUDY.replace('hazard.csv', 'none.csv'))).rejects.toThrow('no such file');
    await expect(load('', STUDY.replace(', interpolation: log-log', ''))).rejects.toThrow(
      'missing; expected one of linear, log-log',
    );
    await expect(load('', STUDY.replace('unit: g', 'unit: mg'))).rejects.toThrow('unknown word "mg"; known: g, m/s2');
  });
});

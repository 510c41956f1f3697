import { existsSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { SMALL_STUDY, buildCommand, scratch, swaymark, writeSmallStudy } from '../support/cli.js';

const small = scratch();
const study = join(small.folder, 'study.yaml');
const run = (...args: string[]): ReturnType<typeof swaymark> => swaymark(['refresh', ...args], { cwd: small.folder });
const commented = SMALL_STUDY.replace('hazard:\n', '# from the map of last year\nhazard:\n');

beforeAll(() => {
  buildCommand();
  writeSmallStudy(small.folder);
  writeFileSync(study, commented);
  const { code, err } = swaymark(['screen', 'study.yaml'], { cwd: small.folder });
  expect([code, err]).toEqual([0, '']);
  rmSync(join(small.folder, 'houses.csv'));
}, 120_000);
afterAll(() => {
  small.remove();
});

interface Told {
  readonly run: number;
  readonly base: number;
  readonly changes: readonly { readonly path: string; readonly from: unknown; readonly to: unknown }[];
  readonly list: { readonly overlap: number; readonly places: number };
  readonly files: readonly string[];
  readonly written: string | null;
}

describe('refresh', () => {
  it('makes a run with the inventory gone, says what changed and how the list did, within 80 columns', () => {
    const before = statSync(join(small.folder, 'out', 'dashboard.html')).mtimeMs;
    const { code, out, err } = run('--set', 'hazard.spectra.design.sds_g=1.2', '--note', 'the new map');
    expect([code, err]).toEqual([0, '']);
    expect(out).toContain('Run 2 ranks the 4 buildings kept with run 1.');
    expect(out).toMatch(/hazard\.spectra\.design\.sds_g +0\.8 +1\.2/);
    expect(out).toContain('Run 2 is kept. Written:');
    for (const line of out.split('\n')) expect(line.length, line).toBeLessThanOrEqual(80);
    expect(out).not.toContain('\u001b');
    expect(statSync(join(small.folder, 'out', 'dashboard.html')).mtimeMs).toBeGreaterThan(before);
    expect(readFileSync(study, 'utf8')).toBe(commented);
    const runs = JSON.parse(swaymark(['runs', '--json'], { cwd: small.folder }).out) as {
      note: string;
      fingerprints: Record<string, string>;
    }[];
    expect(runs.map(({ note }) => note)).toEqual(['', 'the new map']);
    expect(runs[1]?.fingerprints['inventory']).toBe(runs[0]?.fingerprints['inventory']);
    expect(runs[1]?.fingerprints['study']).not.toBe(runs[0]?.fingerprints['study']);
  });

  it('writes the study file only when asked, comments kept, and leaves the reports when told', () => {
    const page = readFileSync(join(small.folder, 'out', 'dashboard.html'), 'utf8');
    const args = ['--set', 'ranking.list_size=3', '--write', '--no-reports', '--run', '1', '--json'];
    const { code, out, err } = run(...args);
    expect([code, err]).toEqual([0, '']);
    const told = JSON.parse(out) as Told;
    expect(told).toMatchObject({ base: 1, files: [], written: 'study.yaml', list: { overlap: 2, places: 3 } });
    expect(told.changes).toEqual([{ path: 'ranking.list_size', from: 2, to: 3 }]);
    expect(readFileSync(study, 'utf8')).toBe(commented.replace('list_size: 2', 'list_size: 3'));
    expect(readFileSync(join(small.folder, 'out', 'dashboard.html'), 'utf8')).toBe(page);
    writeFileSync(study, commented);
  });

  it('takes the parameters of another file of the folder', () => {
    writeFileSync(join(small.folder, 'other.yaml'), commented.replace('sd1_g: 0.4', 'sd1_g: 0.5'));
    const { code, out, err } = run(
      '--study',
      'study.yaml',
      '--with',
      'other.yaml',
      '--run',
      '1',
      '--no-reports',
      '--json',
    );
    expect([code, err]).toEqual([0, '']);
    expect((JSON.parse(out) as Told).changes).toEqual([{ path: 'hazard.spectra.design.sd1_g', from: 0.4, to: 0.5 }]);
    rmSync(join(small.folder, 'other.yaml'));
  });

  it('shows a sweep as a table and as JSON, and keeps nothing', () => {
    const count = (): number =>
      (JSON.parse(swaymark(['runs', '--json'], { cwd: small.folder }).out) as unknown[]).length;
    const before = count();
    const sweep = ['--sweep', 'hazard.spectra.design.sd1_g=0.3:0.9:0.3', '--run', '1'];
    const { code, out, err } = run(...sweep);
    expect([code, err]).toEqual([0, '']);
    expect(out).toMatch(/Value +Overlap +Enter +Leave +Wrong +Sure/);
    expect(out).toMatch(/0\.6 +\d of 2 /);
    for (const line of out.split('\n')) expect(line.length, line).toBeLessThanOrEqual(80);
    const told = JSON.parse(run(...sweep, '--json').out) as { values: { value: number; entered: unknown[] }[] };
    expect(told.values.map(({ value }) => value)).toEqual([0.3, 0.6, 0.9]);
    expect(count()).toBe(before);
  });

  it('answers what is wrong at the argument and keeps nothing', () => {
    const told = (...args: string[]): string => {
      const { code, out, err } = run(...args);
      expect([code, out]).toEqual([2, '']);
      return err;
    };
    expect(told('--set', 'hazard.spectra.design.sds_g=-1')).toMatch(
      /^(error: )?--set hazard\.spectra\.design\.sds_g=-1: /,
    );
    expect(told('--set', 'inventory.file=new.csv')).toContain('run `swaymark screen`');
    expect(told('--set', 'seed')).toContain('expected path=value');
    expect(told('--write')).toContain('nothing to write');
    expect(told('--sweep', 'seed=1:3:1', '--write', '--note', 'x')).toContain('leave out --write and --note');
    expect(told('--sweep', 'ranking.k=4:6:1')).toContain('--sweep ranking.k=4:6:1 at 6: ');
    expect(told('--run', '99')).toContain('there is no run 99');
    expect(existsSync(join(small.folder, 'houses.csv'))).toBe(false);
  });
});

import { existsSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { buildCommand, scratch, swaymark } from '../support/cli.js';
import { ambientOf, decayOf, noiseOf, sumOf } from '../support/engineering-vibration.js';

const { folder, remove } = scratch();
const run = (...args: string[]): ReturnType<typeof swaymark> => swaymark(['measure', ...args], { cwd: folder });

beforeAll(() => {
  buildCommand();
  const lines = (values: Float64Array): string =>
    [...values].map((v, i) => `${(i / 100).toFixed(2)},${v.toFixed(5)}\n`).join('');
  const roof = ambientOf({ frequency_hz: 2, damping: 0.02 }, 100, 30_000, 1);
  writeFileSync(join(folder, 'roof.csv'), `time_s,acc_x (m/s²)\n${lines(roof)}`);
  // Clough and Penzien, Example E2-1 (restated): 1.4 s, back at 0.16 of 0.20 in, hence 3.55 % of critical
  const pull = sumOf(decayOf({ frequency_hz: 1 / 1.4, damping: 0.03549 }, 100, 4000, 2, 5.08), noiseOf(4000, 2, 0.01));
  writeFileSync(join(folder, 'pull.csv'), `t (s),sway (mm)\n${lines(pull)}`);
  writeFileSync(join(folder, 'noise.csv'), lines(noiseOf(6000, 3)));
}, 120_000);
afterAll(remove);

describe('measure', () => {
  it('prints period, damping, conditions and the row for the inventory within 80 columns', () => {
    const { code, out, err } = run('roof.csv');
    expect([code, err]).toEqual([0, '']);
    expect(out).toContain('channel acc_x (column 2 of 2, m/s²), 300.0 s at 100.0 Hz by time_s');
    expect(out).toMatch(/^Period {9}0\.(49|50)\d+ s ± 0\.00\d+ s$/m);
    expect(out).toMatch(/cycles in all windows .*more than 200 +\d+ +met/);
    expect(out).toMatch(/^ {2}id,measured_period_longitudinal_s,measured_amplitude\n {2},0\.\d+,ambient$/m);
    expect(out).toContain('the direction is taken as longitudinal');
    for (const line of out.split('\n')) expect(line.length, line).toBeLessThanOrEqual(80);
  });

  it('reads the pull test of a textbook: 1.40 s and 3.55 %', () => {
    const { code, out } = run('pull.csv', '--json', '--id', 'BH-012', '--direction', 'transverse', '--svg', 'pull.svg');
    expect(code).toBe(0);
    const found = JSON.parse(out) as Record<string, unknown> & { period_s: number; damping: { ratio: number } };
    expect(Math.abs(found.period_s / 1.4 - 1)).toBeLessThan(0.002);
    expect(Math.abs(found.damping.ratio / 0.0355 - 1)).toBeLessThan(0.02);
    expect(found).toMatchObject({
      file: 'pull.csv',
      channel: { number: 2, name: 'sway', unit: 'mm' },
      kind: 'decay',
      inventory: ['id,measured_period_transverse_s,measured_amplitude', 'BH-012,1.4,forced'],
    });
    expect(Object.keys(found)).toEqual(
      expect.arrayContaining([
        'rate_hz',
        'frequency_se_hz',
        'resolution_hz',
        'windows',
        'peaks',
        'cuts',
        'decay',
        'warnings',
        'notes',
      ]),
    );
    expect(existsSync(join(folder, 'pull.svg'))).toBe(true);
  });

  it.each([
    [['nope.csv'], 'nope.csv: there is no such file'],
    [['noise.csv'], 'noise.csv: no peak stands out of the noise'],
    [['roof.csv', '--channel', 'z'], 'roof.csv: --channel "z": there is no such column'],
    [['roof.csv', '--rate-hz', '0'], 'Expected a number over 0'],
    [['roof.csv', '--band-hz', '3:1'], 'Expected two frequencies'],
    [['roof.csv', '--kind', 'strong'], 'Allowed choices are ambient, decay'],
    [['roof.csv', '--from-s', '-1'], 'Expected seconds'],
    [[], "missing required argument 'record'"],
  ])('exits with 2 and says what to do for %j', (args, message) => {
    const { code, out, err } = run(...args);
    expect([code, out]).toEqual([2, '']);
    expect(err).toContain(message);
  });
});

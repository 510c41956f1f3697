import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import * as swaymark from '../src/index.js';
import { buildCommand, scratch, writeSmallStudy } from './support/cli.js';

const place = scratch();
const study = join(place.folder, 'study.yaml');

beforeAll(() => {
  // The page script of the dashboard is read from dist.
  buildCommand();
  writeSmallStudy(place.folder);
}, 120_000);
afterAll(() => {
  place.remove();
});

describe('the library', () => {
  it('does the whole job without a terminal', async () => {
    const { rejected, account } = await swaymark.checkStudy(study);
    expect(rejected.over).toBe(false);
    expect(account.reduce((sum, { rows }) => sum + rows, 0)).toBe(4);

    const { runId, data, files } = await swaymark.screenStudy(study, { made: new Date('2026-01-01T00:00:00Z') });
    expect([runId, data.summary.ranked, data.buildings.all]).toEqual([1, 4, 4]);
    expect(files.map((file) => file.split('/').at(-1))).toContain('dashboard.html');

    const runs = await swaymark.listStudyRuns(study);
    expect(runs.map(({ run, made }) => [run, made])).toEqual([[1, '2026-01-01T00:00:00.000Z']]);
    expect(await swaymark.withStudyDatabase(study, async (db) => (await swaymark.listRuns(db)).length)).toBe(1);

    const { steps, stored } = await swaymark.explain(study, 'A2', { units: 'us' });
    expect(steps.length).toBeGreaterThan(5);
    expect(stored['rank']).toEqual(expect.any(Number));

    const again = await swaymark.pageDataOfStudy(study);
    expect(again).toEqual(data);
    expect(swaymark.renderDashboard(again, swaymark.readPageScript())).toMatch(/^<!doctype html>/i);
  });

  it('evaluates a method by itself', () => {
    const { value, unit } = swaymark.calculate(swaymark.methodCalled('asce7-22/period/other'), ['height_ft=93']);
    // 0.02 × 93^0.75, ASCE 7-22 table 12.8-2, as in calc.test.ts.
    expect([value, unit]).toEqual([expect.closeTo(0.598952, 6), 's']);
    expect(swaymark.findMethod('asce7-22/period/other')).toBe(
      swaymark.METHODS.find(({ id }) => id === 'asce7-22/period/other'),
    );
  });

  it('reads a spectrum', async () => {
    const { ordinates } = swaymark.readSpectrum(await swaymark.loadStudy(study), 'design', [0.2, 1]);
    expect(ordinates.map(({ sa_g }) => sa_g)).toEqual([0.8, 0.4]);
  });

  it('throws errors that say where and what', async () => {
    const error: unknown = await swaymark.loadStudy('nope.yaml').catch((thrown: unknown) => thrown);
    expect(error).toBeInstanceOf(swaymark.UserError);
    expect(swaymark.exitCodeOf(error)).toBe(swaymark.EXIT.user);
    expect(swaymark.formatError(error)).toMatch(/^nope\.yaml: no such file/);
  });
});

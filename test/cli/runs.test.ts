import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { deleteStudyRuns, planStudyDeletion } from '../../src/exports/delete-runs.js';
import { screenStudy } from '../../src/exports/screen-study.js';
import { noteRun, showRun } from '../../src/runs/open.js';
import { HOSTILE, buildCommand, scratch, swaymark, writeSmallStudy } from '../support/cli.js';

const place = scratch();
const study = join(place.folder, 'study.yaml');
const run = (...args: string[]) => swaymark(args, { cwd: place.folder });
const NOTE = 'before the survey of block 4, with the storeys of the cadastre and the years of the permits as they were';
const widest = (out: string): number => Math.max(...out.split('\n').map((line) => line.length));

beforeAll(async () => {
  buildCommand();
  writeSmallStudy(place.folder);
  for (const note of ['', NOTE, HOSTILE.terminal]) await screenStudy(study, { note, outlook: false });
}, 300_000);
afterAll(() => {
  place.remove();
});

describe('swaymark runs', () => {
  it('lists fingerprints and whole notes within 80 columns, as JSON all of it', () => {
    const { code, out } = run('runs');
    expect(code).toBe(0);
    expect(widest(out)).toBeLessThanOrEqual(80);
    expect(out).toMatch(/^Run {2}Made \(UTC\) .* Ranked {2}List {2}Rank by {2}Study {5,}Inventory {2}Methods$/m);
    expect(out.replaceAll(/\s+/g, ' ')).toContain(NOTE);
    expect(out).not.toContain('\u001b');
    const kept = JSON.parse(run('runs', '--json').out) as { fingerprints: { study: string } }[];
    expect(kept).toHaveLength(3);
    expect(out.split(kept[0]!.fingerprints.study.slice(0, 8))).toHaveLength(4);
  });
});

describe('swaymark runs show', () => {
  it('prints the sheet within 80 columns; options may stand before or after', () => {
    const { code, out } = run('runs', '--study', study, 'show', '2');
    expect(code).toBe(0);
    expect(widest(out)).toBeLessThanOrEqual(80);
    for (const part of ['Run 2: Four houses (invented)', 'Seed       7', 'rows read, making 4 buildings', 'No setting'])
      expect(out).toContain(part);
    const told = JSON.parse(run('runs', 'show', '2', '--json', '--study', study).out) as Record<string, unknown>;
    expect(told).toMatchObject({ run: 2, note: NOTE, before: { run: 1 }, list: [{ rank: 1 }, { rank: 2 }] });
    expect(run('runs', 'show', '7').err).toContain('there is no run 7; kept: 1 to 3');
  });
});

describe('swaymark runs note', () => {
  it('puts another note to a run', async () => {
    expect(run('runs', 'note', '1', 'as delivered').out).toBe('Run 1 is noted "as delivered".\n');
    expect((await showRun(study, 1)).note).toBe('as delivered');
    expect((await noteRun(study, 1, '')).note).toBe('as delivered');
  });
});

describe('swaymark runs delete', () => {
  it('deletes nothing without a terminal to ask on, and says so with exit code 2', () => {
    const { code, out, err } = run('runs', 'delete', '1');
    expect([code, out]).toEqual([2, '']);
    expect(err).toContain('no terminal to ask on; with --yes it deletes without asking');
    expect(run('runs', 'delete', '1', '9', '--yes').code).toBe(2);
    expect(JSON.parse(run('runs', '--json').out)).toHaveLength(3);
  });

  it('deletes with --yes, says what goes and which reports stay', async () => {
    const { code, out } = run('runs', 'delete', '3', '1', '3', '--yes');
    expect(code).toBe(0);
    expect(out).toContain('stays: run 2 uses it');
    expect(out).toContain('out/dashboard.html');
    expect(out).toContain('Deleted: runs 1 and 3. Left: run 2.');
    expect(widest(out)).toBeLessThanOrEqual(80);
    const plan = await planStudyDeletion(study, [2]);
    const done = await deleteStudyRuns(study, [2]);
    expect(done).toEqual(plan);
    expect(done.reports).toHaveLength(5);
    expect(done.reports.every((path) => existsSync(path))).toBe(true);
    expect(run('runs').out).toBe('This study has no run; swaymark screen makes one.\n');
    expect(run('explain', 'A1').err).toContain('this study has no run yet');
  });
});

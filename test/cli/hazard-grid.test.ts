import { rmSync, writeFileSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { buildCommand, swaymark } from '../support/cli.js';
import { TWO_GRIDS, gridCopy, gridCsv, rising } from '../support/hazard-grid.js';

const path = gridCopy(TWO_GRIDS, {
  'h475.csv': gridCsv(rising(1)),
  'h2475.csv': gridCsv(rising(1.8)),
  'later.csv': gridCsv(rising(1.2)),
});
const folder = dirname(path);
const run = (...args: string[]): ReturnType<typeof swaymark> => swaymark(args, { cwd: folder });

beforeAll(() => {
  buildCommand();
  const { code, err } = run('screen', 'study.yaml');
  expect([code, err]).toEqual([0, '']);
}, 120_000);

describe('a study with hazard grids, from the terminal', () => {
  it('tells what check, screen and spectrum find', { timeout: 60_000 }, () => {
    const checked = run('check', 'study.yaml');
    expect(checked.out.replaceAll(/\s+/g, ' ')).toContain(
      'no coordinates on record, which the hazard grid "h475" needs (2)',
    );
    expect(readFileSync(join(folder, 'reports', 'rejects.csv'), 'utf8')).toContain(
      'no-coordinates,"building BH-020 has no coordinates, which are needed to read the hazard grid h475"',
    );
    expect(run('spectrum').out).toContain('h475: hazard grid h475.csv, grid of 7 by 5 lines');
    const nowhere = run('spectrum', 'h475');
    expect([nowhere.code, nowhere.err]).toEqual([2, expect.stringContaining('--lon and --lat in degrees')]);
    expect(run('spectrum', 'h475', '--lon', '-40').err).toContain('takes both --lon and --lat');
    expect(run('spectrum', 'h475', '--lon', 'x', '--lat', '35').err).toContain('Expected degrees');
    expect(run('spectrum', 'h475', '--lon', '12', '--lat', '35').err).toContain('lies outside the hazard grid "h475"');
    const there = run('spectrum', 'h475', '--lon', '-40.02', '--lat', '35.01', '--at', '0.2,1', '--json');
    const { place, ordinates } = JSON.parse(there.out) as {
      place: unknown;
      ordinates: readonly { readonly sa_g: number }[];
    };
    expect(place).toEqual({ lon: -40.02, lat: 35.01 });
    // the node itself: what the file says, but for the last bit of a straight line
    const node = [rising(1)(-40.02, 35.01, 1), rising(1)(-40.02, 35.01, 3)];
    ordinates.forEach(({ sa_g }, i) => {
      expect(sa_g).toBeCloseTo(node[i]!, 14);
    });
  });

  it('explains, refreshes and compares with the grids gone, and by another map', { timeout: 120_000 }, () => {
    for (const name of ['h475.csv', 'h2475.csv']) rmSync(join(folder, name));
    expect(run('explain', 'SC-019').out).toContain('Ordinate of a hazard grid, bilinear in ln S_a');
    expect(run('runs').code).toBe(0);
    const survey = run('survey', '--hours', '8', '--no-page', '--json');
    expect([survey.code, survey.err]).toEqual([0, '']);
    expect((JSON.parse(survey.out) as { steps: unknown[] }).steps.length).toBeGreaterThan(1);
    const gone = run('screen', 'study.yaml');
    expect([gone.code, gone.err]).toEqual([2, expect.stringContaining('h475.csv: no such file')]);
    const moved = run('refresh', '--set', 'hazard.spectra.h475.file=later.csv', '--no-reports');
    expect([moved.code, moved.err]).toEqual([0, '']);
    expect(moved.out).toMatch(/hazard\.spectra\.h475\.file +"h475\.csv" +"later\.csv"/);
    expect(moved.out).not.toContain('h2475');
    const back = run('refresh', '--run', '1', '--no-reports', '--json');
    expect([back.code, back.err]).toEqual([0, '']);
    expect(JSON.parse(back.out)).toMatchObject({ base: 1, changes: [], list: { entered: [], left: [] } });
    const compared = run('compare', '1', '2', '--json', '--no-page');
    expect([compared.code, compared.err]).toEqual([0, '']);
    const { settings } = JSON.parse(compared.out) as { settings: readonly { readonly path: string }[] };
    expect(settings.map(({ path: at }) => at)).toEqual(
      expect.arrayContaining(['hazard.spectra.h475.file', 'hazard.spectra.h475.grid']),
    );
    // grids that no run reads go with the last run that did
    expect(run('runs', 'delete', '2', '--yes').code).toBe(0);
    expect(run('explain', 'SC-019', '--run', '3').code).toBe(0);
    writeFileSync(join(folder, 'h475.csv'), 'lon,lat\n1,2\n');
    const wrong = run('refresh', '--no-reports');
    expect([wrong.code, wrong.err]).toEqual([2, expect.stringContaining('the unit of the ordinates is not known')]);
  });
});

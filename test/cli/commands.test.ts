import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { METHODS } from '../../src/engineering/methods.js';
import { COMMAND, HOSTILE, buildCommand, scratch, startSwaymark, swaymark, writeSmallStudy } from '../support/cli.js';
import { screenedDemo } from '../support/screened-demo.js';

const small = scratch();
const demo = scratch();
const study = join(small.folder, 'study.yaml');
const json = (args: readonly string[], cwd = small.folder): unknown => JSON.parse(swaymark(args, { cwd }).out);
let screened: ReturnType<typeof swaymark>;

beforeAll(async () => {
  buildCommand();
  writeSmallStudy(small.folder, ['A5,no use,99,8,1950,timber-light-frame,residential,90']);
  await screenedDemo(demo.folder);
  screened = swaymark(['screen', 'study.yaml', '--note', 'first'], { cwd: small.folder });
}, 120_000);
afterAll(() => {
  small.remove();
  demo.remove();
});

/** Whether a text holds what steers a terminal: escapes, reversal of the reading order. */
const steers = (text: string): boolean => text.includes('\u001b') || text.includes('\u202e');

describe('swaymark', () => {
  it('prints help of its own without loading the database, in less than three times the time of bare node', () => {
    const { code, out, err } = swaymark(['--help']);
    expect([code, err]).toEqual([0, '']);
    expect(out).toContain('Examples:');
    for (const line of out.split('\n')) expect(line.length).toBeLessThanOrEqual(80);
    const median = (args: string[]): number => {
      const times = Array.from({ length: 9 }, () => {
        const start = performance.now();
        spawnSync(process.execPath, args);
        return performance.now() - start;
      });
      return times.sort((a, b) => a - b)[4]!;
    };
    expect(median([COMMAND, '--help'])).toBeLessThan(3 * median(['-e', '0']));
  });

  it('prints its version', () => {
    const { version } = JSON.parse(readFileSync(join(COMMAND, '../../../package.json'), 'utf8')) as { version: string };
    expect(swaymark(['--version']).out.trim()).toBe(version);
  });

  it.each([
    [['scren'], 'Did you mean screen?'],
    [['screen'], "missing required argument 'study'"],
    [['check', 'x.yaml', '--frob'], "unknown option '--frob'"],
    [['screen', 'x.yaml', '--units', 'imperial'], 'Allowed choices are si, us'],
    [['review', '--sample', '0'], 'Expected a whole number from 1'],
    [['spectrum', 'x', '--at', '0.2,x'], 'Expected periods in seconds'],
    [['screen', 'nope.yaml'], 'nope.yaml: no such file'],
  ])('exits with 2 and says what to do for %j', (args, message) => {
    const { code, out, err } = swaymark(args, { cwd: small.folder });
    expect([code, out]).toEqual([2, '']);
    expect(err).toContain(message);
  });

  it('survives a reader that has seen enough', () => {
    const { stdout, stderr, status } = spawnSync(
      'bash',
      ['-c', `set -o pipefail; "${process.execPath}" "${COMMAND}" methods --json | head -1`],
      { encoding: 'utf8' },
    );
    expect([stdout, stderr, status]).toEqual(['[\n', '', 0]);
  });

  it('honours FORCE_COLOR, NO_COLOR and --no-color', () => {
    const help = (args: string[], env: NodeJS.ProcessEnv) =>
      swaymark(['--help', ...args], { env }).out.includes('\u001b');
    expect([
      help([], {}),
      help([], { FORCE_COLOR: '1' }),
      help([], { FORCE_COLOR: '1', NO_COLOR: '1' }),
      help(['--no-color'], { FORCE_COLOR: '1' }),
    ]).toEqual([false, true, false, false]);
  });
});

describe('swaymark check', () => {
  it('accounts for every row and keeps nothing', () => {
    const place = scratch();
    writeSmallStudy(place.folder, [',nobody,2,6,1950,,office,90']);
    const { code, out } = swaymark(['check', 'study.yaml'], { cwd: place.folder });
    expect(code).toBe(0);
    expect(out).toContain('5  rows read, making 4 buildings');
    expect(readdirSync(place.folder).sort()).toEqual(['houses.csv', 'study.yaml']);
    const told = json(['check', 'study.yaml', '--json'], place.folder) as {
      rows_in: number;
      account: { rows: number }[];
      findings: { code: string; count: number; example: string }[];
    };
    expect(told.account.reduce((sum, { rows }) => sum + rows, 0)).toBe(told.rows_in);
    expect(told.findings.map(({ code: name }) => name)).toContain('no-id');
    place.remove();
  });

  it('exits with 1 when more rows are rejected than the study allows, and writes rejects.csv where asked', () => {
    const place = scratch();
    writeSmallStudy(place.folder, [',nobody,2,6,1950,,office,90', ',nobody,3,6,1950,,office,90']);
    const { code, out } = swaymark(['check', 'study.yaml', '--output', 'found'], { cwd: place.folder });
    expect(code).toBe(1);
    expect(out.replaceAll('\n', ' ')).toContain(
      '33 % of the rows were rejected, more than the 20 % that inventory.rejects_limit allows',
    );
    expect(readFileSync(join(place.folder, 'found/rejects.csv'), 'utf8')).toContain('no-id');
    place.remove();
  });
});

describe('swaymark screen', () => {
  it('prints the account, the answer, the list and where the reports are', () => {
    expect([screened.code, screened.err]).toEqual([0, '']);
    expect(screened.out).toContain('5  rows read, making 5 buildings');
    expect(screened.out).toContain('Of the 2 buildings listed');
    expect(screened.out).toMatch(/^Rank {2}Building/m);
    expect(screened.out).toContain('out/dashboard.html');
    for (const line of screened.out.split('\n')) expect(line.length).toBeLessThanOrEqual(80);
  });

  it('writes the five reports and nothing else', () => {
    expect(readdirSync(join(small.folder, 'out')).sort()).toEqual([
      'dashboard.html',
      'ranking.csv',
      'ranking.parquet',
      'rejects.csv',
      'summary.md',
    ]);
  });

  it('lets no name do harm on the terminal or in a spreadsheet', () => {
    expect(steers(screened.out)).toBe(false);
    const { out } = swaymark(['explain', 'A3'], { cwd: small.folder });
    expect(out).toContain('A3 evil[31mname');
    expect(steers(out)).toBe(false);
    expect(readFileSync(join(small.folder, 'out/ranking.csv'), 'utf8')).toContain(`,'${HOSTILE.formula},`);
    expect(readFileSync(join(small.folder, 'out/dashboard.html'), 'utf8')).not.toContain(HOSTILE.markup);
  });

  it('prints its figures as JSON', () => {
    const told = json(['screen', 'study.yaml', '--json', '--units', 'us', '--output', 'other']) as {
      run: number;
      list: { id: string; chance: number }[];
      answer: string;
      files: string[];
      rejected: { over: boolean };
    };
    expect(told.run).toBe(2);
    expect(told.list).toHaveLength(2);
    expect(told.rejected.over).toBe(false);
    for (const file of told.files) expect(existsSync(file)).toBe(true);
  });

  it('rolls back and exits with 130 when interrupted', async () => {
    const place = scratch();
    const rows = Array.from(
      { length: 120_000 },
      (_, i) =>
        `R${String(i)},row ${String(i)},${String(1 + (i % 9))},,${String(1900 + (i % 120))},,residential,${String(100 + (i % 700))}`,
    );
    writeSmallStudy(place.folder, rows);
    writeFileSync(
      join(place.folder, 'prior.csv'),
      'use,storeys_from,storeys_to,built_from,built_to,system,chance\n,,,,,timber-light-frame,1\n',
    );
    writeFileSync(
      join(place.folder, 'study.yaml'),
      `${readFileSync(join(place.folder, 'study.yaml'), 'utf8')}system_prior: prior.csv\n`,
    );
    const running = startSwaymark(['screen', 'study.yaml'], place.folder);
    // The database is opened once the program listens for signals; a while later it is at work.
    await vi.waitUntil(() => existsSync(join(place.folder, 'study.duckdb')), { timeout: 20_000, interval: 20 });
    await new Promise((resolve) => setTimeout(resolve, 300));
    running.kill('SIGINT');
    const { code, err } = await running.ended;
    expect(err).toBe('stopped; nothing of this run is kept, earlier runs and reports are as they were\n');
    expect(code).toBe(130);
    expect(json(['runs', '--json'], place.folder)).toEqual([]);
    expect(readdirSync(join(place.folder, 'out'))).toEqual([]);
    place.remove();
  }, 60_000);
});

describe('swaymark explain', () => {
  it('shows symbols, numbers, result, clause and mark within 80 columns', () => {
    const { code, out } = swaymark(['explain', 'A2'], { cwd: small.folder });
    expect(code).toBe(0);
    expect(out).toMatch(
      /T = C_t × \(h \/ unit\)\^x\n\s+= 0\.01800 × \(16\.00 \/ 0\.3048\)\^0\.9000\n\s+= 0\.\d+ s\n\s+ASCE\/SEI 41-17, 7\.4\.1\.2\.2 \[from memory/,
    );
    for (const line of out.split('\n')) expect(line.length).toBeLessThanOrEqual(80);
  });

  it('gives the steps and stored results as JSON', () => {
    const told = json(['explain', 'A2', '--json', '--run', '1', '--study', study]) as {
      id: string;
      results: Record<string, unknown>;
      steps: { kind: string }[];
    };
    expect(told.id).toBe('A2');
    expect(told.results['rank']).toEqual(expect.any(Number));
    expect(new Set(told.steps.map(({ kind }) => kind))).toContain('formula');
  });

  it('names the nearest buildings for an unknown one, and the runs for an unknown run', () => {
    const unknown = swaymark(['explain', 'A22'], { cwd: small.folder });
    expect([unknown.code, unknown.err]).toEqual([2, expect.stringContaining('nearest: "A2"')]);
    expect(swaymark(['explain', 'A2', '--run', '99'], { cwd: small.folder }).err).toContain('there is no run 99');
  });

  it('says what to do where no study or no run is', () => {
    const place = scratch();
    expect(swaymark(['explain', 'A2'], { cwd: place.folder }).err).toContain('swaymark init');
    writeSmallStudy(place.folder);
    const { code, err } = swaymark(['explain', 'A2'], { cwd: place.folder });
    expect([code, err]).toEqual([2, expect.stringContaining('run `swaymark screen` first')]);
    place.remove();
  });
});

describe('swaymark runs', () => {
  it('lists the kept runs', () => {
    const { code, out } = swaymark(['runs'], { cwd: small.folder });
    expect(code).toBe(0);
    expect(out).toMatch(/^ +1 {2}\d{4}-\d\d-\d\d \d\d:\d\d .*\n +first$/m);
    expect(json(['runs', '--json'])).toEqual(
      expect.arrayContaining([
        expect.objectContaining({ run: 1, note: 'first', fingerprints: expect.any(Object) as object }),
      ]),
    );
  });
});

describe('swaymark methods', () => {
  it('lists every record with its clause, inputs, limits and how it was verified', () => {
    const { code, out } = swaymark(['methods']);
    expect(code).toBe(0);
    for (const { id } of METHODS) expect(out).toContain(id);
    const told = json(['methods', '--json']) as {
      id: string;
      clause: string;
      verified: string;
      inputs: unknown[];
      limits: unknown[];
    }[];
    expect(told.map(({ id }) => id)).toEqual(METHODS.map(({ id }) => id));
    for (const entry of told)
      expect(entry).toMatchObject({ clause: expect.any(String) as string, verified: expect.any(String) as string });
  });

  it('lists the records that hold every word, and says of how many', () => {
    const told = json(['methods', 'EN1998', 'period', '--json']) as { id: string }[];
    expect(told.length).toBeGreaterThan(2);
    for (const { id } of told) expect(id).toMatch(/en1998.*period/);
    expect(swaymark(['methods', 'en1998', 'period']).out).toContain(
      `${String(told.length)} methods of ${String(METHODS.length)}`,
    );
  });

  it('shows one in full', () => {
    const { out } = swaymark(['methods', 'asce7-22/period/other']);
    expect(out).toContain('period_s = coefficient × (height_m / unit_m)^exponent');
    expect(out).toContain('coefficient = 0.02');
    expect(swaymark(['methods', 'asce7-22/period/othre'])).toMatchObject({
      code: 2,
      err: expect.stringContaining('nearest: asce7-22/period/other') as string,
    });
  });
});

describe('swaymark calc', () => {
  it('prints the hand calculation, or at least id, value, unit and trace as JSON', () => {
    const { code, out } = swaymark(['calc', 'asce7-22/period/other', 'height_ft=93']);
    expect(code).toBe(0);
    expect(out).toContain('93 ft × 0.3048');
    expect(out).toContain('period: 0.5990 s');
    expect(json(['calc', 'asce7-22/period/other', 'height_ft=93', '--json'])).toMatchObject({
      id: 'asce7-22/period/other',
      value: expect.closeTo(0.598952, 6) as number,
      unit: 's',
      trace: expect.arrayContaining([expect.objectContaining({ kind: 'formula' })]) as unknown[],
    });
  });

  it('prints no false equation with US units: converted values and numbers put in keep the unit of the record', () => {
    const feet = swaymark(['calc', 'asce7-22/period/other', 'height_ft=93', '--units', 'us']).out;
    // 93 × 0.3048 = 28.3464.
    expect(feet).toContain('height = 28.35 m [converted: 93 ft × 0.3048]');
    const metres = swaymark(['calc', 'asce7-22/period/other', 'height_m=33', '--units', 'us']).out;
    // 33 / 0.3048 = 108.27.
    expect(metres).toContain('height = 108.3 ft [given');
    expect(metres).toContain('= 0.02000 × (33.00 m / 0.3048 m)^0.7500');
  });

  it('says what a method needs when no input is given', () => {
    const { code, out } = swaymark(['calc', 'mechanics/period/single-mass']);
    expect(code).toBe(0);
    expect(out).toContain('swaymark calc mechanics/period/single-mass mass_t=… stiffness_kN_per_m=…');
  });

  it('exits with 2 for what the user can mend', () => {
    for (const inputs of [['height_kN=3'], ['hight_m=3'], ['height_m=x']])
      expect(swaymark(['calc', 'asce7-22/period/other', ...inputs]).code).toBe(2);
  });
});

describe('swaymark spectrum', () => {
  it('lists the spectra and reads one at the periods asked for', () => {
    expect(swaymark(['spectrum', '--study', study]).out).toMatch(/^design +asce7-22-two-period/m);
    const { out } = swaymark(['spectrum', 'design', '--at', '0.2,1', '--study', study]);
    expect(out).toMatch(/^0\.2000 +0\.8000 .*T0 ≤ T ≤ Ts$/m);
    expect(json(['spectrum', 'design', '--at', '1', '--json'])).toMatchObject({
      name: 'design',
      ordinates: [{ period_s: 1, sa_g: 0.4 }],
    });
  });
});

describe('swaymark review', () => {
  it('writes a sheet and says how the sample was drawn', () => {
    const { code, out } = swaymark(['review', '--sample', '2', '--run', '1', '--output', 'sheets'], {
      cwd: small.folder,
    });
    expect(code).toBe(0);
    expect(out).toContain('drawn without replacement with');
    expect(readFileSync(join(small.folder, 'sheets/review.csv'), 'utf8')).toContain('independent value');
  });
});

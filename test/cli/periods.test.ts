import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { buildCommand, scratch, swaymark, writeSmallStudy } from '../support/cli.js';
import { screenedDemo } from '../support/screened-demo.js';

const demo = scratch();
const small = scratch();
const run = (...args: string[]): ReturnType<typeof swaymark> => swaymark(['periods', ...args], { cwd: demo.folder });
const inSmall = (...args: string[]): ReturnType<typeof swaymark> =>
  swaymark(['periods', ...args], { cwd: small.folder });

beforeAll(async () => {
  buildCommand();
  await screenedDemo(demo.folder);
  writeSmallStudy(small.folder, [
    'A5,no system,3,9,1950,,residential,300',
    'A6,,3,9,1950,timber-light-frame,residential,300',
  ]);
  swaymark(['screen', 'study.yaml'], { cwd: small.folder });
}, 120_000);
afterAll(() => {
  demo.remove();
  small.remove();
});

const narrow = (out: string): void => {
  for (const line of out.split('\n')) expect(line.length, line).toBeLessThanOrEqual(80);
};

interface Told {
  readonly kind: string;
  readonly id: string;
  readonly outcome:
    | { readonly applies: true; readonly period_s: number; readonly counts: boolean }
    | { readonly applies: false; readonly reason: string };
}

describe('periods', () => {
  it('lists what counts, what else could, and what cannot, within 80 columns', () => {
    // BH-019: concrete walls with their areas on record in the demo
    const { code, out, err } = run('BH-019');
    expect([code, err]).toEqual([0, '']);
    expect(out).toContain('Lateral system concrete-shear-wall, given. Run 1.');
    expect(out).toContain('formula and stiffness, combined in ln T by inverse variance');
    expect(out).toMatch(/stiffness\/walls +\d\.\d+ +\d\.\d+ to \d\.\d+ +mechanics +counts/);
    expect(out).toMatch(/asce41-17\/period\/other +\d\.\d+ +\d\.\d+ to \d\.\d+ +best-fit +counts/);
    expect(out).toContain('Formulas of other standards, for comparison');
    expect(out).toContain('Research, for comparison');
    expect(out.replaceAll(/\s+/g, ' ')).toContain('no storey stiffness on record: stiffness/storey-stiffness');
    narrow(out);
  });

  it('names both systems of a building that has another one across', () => {
    expect(run('BH-054').out.replaceAll(/\s+/g, ' ')).toContain(
      'Lateral system concrete-moment-frame along and concrete-shear-wall across, given.',
    );
  });

  it('shows the likeliest system where none is on record, and another as asked', () => {
    const { out } = run('BH-001');
    expect(out.replaceAll(/\s+/g, ' ')).toMatch(/not on record; shown for the likeliest, [a-z-]+ \(chance \d+ %\)/);
    const asked = run('BH-001', '--system', 'timber-light-frame');
    expect(asked.out).toContain('As if the lateral system were timber-light-frame.');
    expect(asked.out).not.toBe(out);
  });

  it('answers for a system as asked where the study has no table of chances', () => {
    const unknown = inSmall('A5');
    expect([unknown.code, unknown.out]).toEqual([2, '']);
    expect(unknown.err).toContain('system not known');
    const { code, out } = inSmall('A5', '--system', 'timber-light-frame');
    expect(code).toBe(0);
    // ASCE/SEI 41-17, all other systems: 0.020 h^0.75, h in feet; 9 m give 0.253 s
    expect(out).toMatch(/Period used +0\.253 /);
  });

  it('lists a class, every formula by its full id, within 80 columns', () => {
    const { code, out, err } = run('--system', 'concrete-shear-wall');
    expect([code, err]).toEqual([0, '']);
    expect(out).toMatch(
      /^concrete-shear-wall\n\d+ ranked buildings with that system on record in run 1: \d+ directions\./,
    );
    const joined = out.replaceAll(/\s+/g, ' ');
    expect(joined).toContain('asce41-17/period/other: the formula of the chosen standard');
    for (const id of ['asce7-22/period/concrete-or-masonry-walls', 'gb50009-2012/period/concrete-by-storeys-upper'])
      expect(joined).toContain(id);
    expect(joined).toContain('of the period used, in');
    expect(out).not.toContain('…/');
    narrow(out);
  });

  it('lists the part of a class that stands in a block', () => {
    interface Class {
      readonly run: number;
      readonly group: string | null;
      readonly buildings: number;
      readonly directions: number;
      readonly estimates: readonly { readonly kind: string; readonly applies: number; readonly counts: number }[];
    }
    const told = (...more: string[]): Class =>
      JSON.parse(run('--system', 'concrete-moment-frame', '--json', ...more).out) as Class;
    const every = told();
    const block = told('--block', 'Tallow Quay');
    expect([every.run, every.group, block.group]).toEqual([1, null, 'Tallow Quay']);
    expect(block.buildings).toBeLessThan(every.buildings);
    expect(block.buildings).toBeGreaterThan(0);
    const [used] = every.estimates;
    expect(used).toMatchObject({ kind: 'used', applies: every.directions });
    expect(every.estimates.reduce((sum, { kind, counts }) => sum + (kind === 'used' ? 0 : counts), 0)).toBeGreaterThan(
      every.directions - 1,
    );
    expect(run('--system', 'concrete-moment-frame', '--block', 'Tallow Quay').out).toMatch(
      /^concrete-moment-frame in Tallow Quay\n/,
    );
  });

  it('prints JSON of one building', () => {
    const told = JSON.parse(run('BH-019', '--json').out) as {
      run: number;
      id: string;
      system_from: string;
      directions: { longitudinal: readonly Told[]; transverse: readonly Told[] };
    } & Record<string, unknown>;
    expect(told).toMatchObject({
      run: 1,
      id: 'BH-019',
      system: 'concrete-shear-wall',
      system_transverse: 'concrete-shear-wall',
      system_from: 'given',
      chance: 1,
    });
    expect(Object.keys(told)).toEqual([
      'run',
      'id',
      'name',
      'system',
      'system_transverse',
      'system_from',
      'chance',
      'directions',
    ]);
    const along = told.directions.longitudinal;
    expect(along[0]).toMatchObject({ kind: 'used', id: 'used' });
    const counted = along.filter(({ outcome }) => outcome.applies && outcome.counts).map(({ id }) => id);
    expect(counted).toEqual(['used', 'stiffness/walls', 'asce41-17/period/other']);
    const explained = JSON.parse(swaymark(['explain', 'BH-019', '--json'], { cwd: demo.folder }).out) as {
      results: { period_longitudinal_s: number };
    };
    const [used] = along;
    expect(used?.outcome.applies === true && used.outcome.period_s).toBe(explained.results.period_longitudinal_s);
  });

  it.each([
    [[], 'name a building, or a class of buildings with --system'],
    [['--system', 'concrete-frame'], 'unknown system "concrete-frame"; known: steel-moment-frame'],
    [['BH-0019'], 'there is no building "BH-0019" in run 1; nearest: "BH-0'],
    [['BH-019', '--block', 'Tallow Quay'], '--block goes with a class (--system), not with one building'],
    [['--block', 'Tallow Quay'], 'name a building, or a class of buildings with --system'],
    [
      ['--system', 'concrete-shear-wall', '--block', 'Nowhere'],
      'run 1 ranks no building of system concrete-shear-wall on record in block "Nowhere"',
    ],
    [['BH-019', '--run', '9'], 'there is no run 9'],
  ])('exits with 2 and says what to do for %j', (args, message) => {
    const { code, out, err } = run(...args);
    expect([code, out]).toEqual([2, '']);
    expect(err.replaceAll(/\s+/g, ' ')).toContain(message);
  });

  it('takes the standard, the formula and the switches of the study', () => {
    const path = join(small.folder, 'study.yaml');
    const text = readFileSync(path, 'utf8');
    const PERIOD = `period:
  standard: en1998-1-2004
  formula_for: {timber-light-frame: kwon-kim-2010/period/walls-and-other}
  switched_off: [en1998-1-2004/period/concrete-or-masonry-walls, stiffness/walls]
`;
    writeFileSync(path, `${text}${PERIOD}`);
    expect(swaymark(['screen', 'study.yaml'], { cwd: small.folder }).code).toBe(0);
    const used = (id: string): string[] =>
      (
        JSON.parse(inSmall(id, '--json').out) as { directions: { longitudinal: readonly Told[] } }
      ).directions.longitudinal
        .filter(({ outcome }) => outcome.applies && outcome.counts)
        .map(({ id: of }) => of);
    expect(used('A6')).toEqual(['used', 'kwon-kim-2010/period/walls-and-other']);
    expect(used('A1')).toEqual(['used', 'en1998-1-2004/period/other']);
    // EN 1998-1 4.3.3.2.2(3): 0.075 h^0.75, 16 m
    expect(inSmall('A2').out).toMatch(/Period used +0\.600 /);
    for (const [from, to, message] of [
      ['kwon-kim-2010/period/walls-and-other}', 'asce7-22/period-limit/calculated}', 'is not a period formula'],
      ['stiffness/walls]', 'stiffness/wall]', 'unknown method "stiffness/wall"'],
      ['en1998-1-2004\n', 'en1998\n', 'unknown word "en1998"'],
      ['timber-light-frame: kwon', 'timber: kwon', 'period.formula_for.timber: unknown key'],
    ] as const) {
      expect(PERIOD).toContain(from);
      writeFileSync(path, `${text}${PERIOD.replace(from, to)}`);
      const { code, err } = swaymark(['screen', 'study.yaml'], { cwd: small.folder });
      expect([code, err.replaceAll(/\s+/g, ' ')]).toEqual([2, expect.stringContaining(message)]);
    }
    writeFileSync(path, text);
  }, 60_000);
});

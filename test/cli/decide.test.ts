import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { answersJob } from '../../src/cli/commands/survey-answers.js';
import { SMALL_STUDY, buildCommand, scratch, swaymark, writeSmallStudy } from '../support/cli.js';

const small = scratch();
const study = join(small.folder, 'study.yaml');
const run = (...args: string[]): ReturnType<typeof swaymark> => swaymark(args, { cwd: small.folder });

beforeAll(() => {
  buildCommand();
  writeSmallStudy(small.folder);
  expect(run('screen', 'study.yaml').code).toBe(0);
}, 120_000);
afterAll(() => {
  small.remove();
});

function expectPlain(out: string): void {
  for (const line of out.split('\n')) expect(line.length, line).toBeLessThanOrEqual(80);
  // a name with escapes and a character that reverses the reading order stays harmless
  expect(out).not.toContain('\u001b');
  expect(out).not.toContain('\u202e');
}

describe('budget', () => {
  it('shows the choice within 80 columns, with musts, reasons and the written table', () => {
    const section =
      'budget:\n  currency: crowns\n  include: [{id: A3, reason: "asked \u202efor", author: the owner}]\n  batches: {mobilisation: 500, least_chance: 0}\n';
    writeFileSync(study, `${SMALL_STUDY}${section}`);
    const { code, out, err } = run('budget', '--money', '25000', '--csv', 'plan.csv');
    expect([code, err]).toEqual([0, '']);
    expectPlain(out);
    expect(out).toMatch(/^\d assessments out of run 1 for [\d\u202f ]+ crowns; of/u);
    expect(out).toMatch(/in: A3 .*, rank \d, .*: asked for \(the owner\)/s);
    expect(out).toContain('Written: plan.csv');
    expect(readFileSync(join(small.folder, 'plan.csv'), 'utf8')).toContain('must include');
    const plan = JSON.parse(run('budget', '--money', '25000', '--json').out) as {
      spent: number;
      bound: number;
      value: number;
    };
    expect(plan.spent).toBeLessThanOrEqual(25_000);
    expect(plan.bound).toBeGreaterThanOrEqual(plan.value);
    writeFileSync(study, SMALL_STUDY);
  });

  it('says why no choice is worth more', () => {
    const said = (section: string, money: string): string => {
      writeFileSync(study, `${SMALL_STUDY}${section}`);
      return run('budget', '--money', money).out.replaceAll(/\s+/g, ' ');
    };
    const must = 'budget: {cost: {fixed: 1000, per_m2: 0, least: 0}, include: [{id: A3, reason: asked for}]}\n';
    expect(said(must, '1000')).toContain('What must be among them leaves no money for any other.');
    expect(said(must, '1500')).toContain('What must be among them leaves 500, too little for any other.');
    expect(said(must, '9000')).toContain('all that may be chosen is.');
    expect(said(must.replace('include', 'exclude'), '9000')).toContain('all that may be chosen is.');
    writeFileSync(study, SMALL_STUDY);
  });

  it('ends with 1 where the money buys nothing and with 2 where something is to be mended', () => {
    const nothing = run('budget', '--money', '10');
    expect([nothing.code, nothing.err]).toEqual([1, '']);
    expect(nothing.out).toContain('buys no assessment out of run 1: the cheapest assessment that counts costs');
    expectPlain(nothing.out);
    for (const money of ['0', '-5', '180,000', 'much', '1e300', ''])
      expect(run('budget', '--money', money), money).toMatchObject({ code: 2, out: '' });
    expect(run('budget').err).toContain('--money');
    writeFileSync(study, `${SMALL_STUDY}budget: {include: [{id: A9, reason: x}]}\n`);
    const unknown = run('budget', '--money', '9000');
    expect(unknown.code).toBe(2);
    expect(unknown.err).toMatch(/^study\.yaml:\d+:\d+ budget\.include\.1\.id: run 1 has no building "A9"/);
    writeFileSync(study, SMALL_STUDY);
  });
});

/** What a job on answers prints; a process of its own for each would take longer than all of them. */
async function inside(options: Parameters<typeof answersJob>[0]): Promise<string> {
  const written = vi.spyOn(process.stdout, 'write').mockReturnValue(true);
  try {
    expect(await answersJob({ ...options, study })?.()).toBe(0);
    return written.mock.calls.map(([text]) => String(text)).join('');
  } finally {
    written.mockRestore();
  }
}

describe('survey', () => {
  it('takes answers and what was not found, lists them and withdraws them', async () => {
    writeFileSync(
      join(small.folder, 'back.csv'),
      'id,visit,surveyor,system,height_m\nA1,street,"N.\u202e",timber-light-frame,?\n',
    );
    const taken = await inside({ take: join(small.folder, 'back.csv') });
    expectPlain(taken);
    expect(taken.replaceAll('\n', ' ')).toMatch(
      /1 answer for 1 building taken: system \(1\)\. 1 cell says that it could not be found out: height_m \(1\)\./,
    );
    const listed = await inside({ answers: true });
    expectPlain(listed);
    expect(listed).toMatch(/^A1 +system +timber-light-frame +street .*yes$/m);
    expect(listed).toMatch(/^A1 +height_m +not found +street .*yes$/m);
    const since =
      'At one building answers have come in that run 1 does not count yet: what they settle is not asked for; run swaymark screen to count them in.';
    expect(listed.replaceAll('\n', ' ')).toContain(since);
    const planned = run('survey', '--hours', '8', '--no-page');
    expect([planned.code, planned.err]).toEqual([0, '']);
    expectPlain(planned.out);
    expect(planned.out.replaceAll('\n', ' ')).toContain(since);
    expect(JSON.parse(run('survey', '--hours', '8', '--no-page', '--json').out)).toMatchObject({
      run: 1,
      answered_at: 1,
      withdrawn_at: 0,
    });
    const gone = run('survey', '--withdraw', 'A1', '--question', 'system');
    expect([gone.code, gone.err]).toEqual([0, '']);
    expectPlain(gone.out);
    expect(gone.out).toContain('lateral system (system): timber-light-frame, street visit');
    expect(await inside({ answers: true })).not.toContain('have come in');
    const rest = JSON.parse(await inside({ withdraw: 'A1', json: true })) as Record<string, unknown>[];
    expect(rest).toMatchObject([{ id: 'A1', question: 'height', column: 'height_m', cell: null, counts: false }]);
    const again = run('survey', '--withdraw', 'A1');
    expect([again.code, again.out]).toEqual([2, '']);
    expect(again.err).toMatch(/^--withdraw: all that is held for "A1" was withdrawn before/);
  });

  it('refuses options that do not go together', () => {
    for (const [options, message] of [
      [{ question: 'system' }, '--question says which answers for a building are withdrawn; name it: --withdraw <id>'],
      [{ withdraw: 'A1', answers: true }, '--answers lists answers and does nothing else; leave out --withdraw'],
      [
        { take: 'back.csv', hours: 4, csv: 'x.csv' },
        '--take brings answers back and does nothing else; leave out --hours, --csv',
      ],
    ] as const)
      expect(() => answersJob(options), message).toThrow(message);
    expect(answersJob({ hours: 4 })).toBe(null);
  });
});

describe('sensitivity', () => {
  it('shows every switch within 80 columns, the uniform chances among them, and keeps nothing', () => {
    const { code, out, err } = run('sensitivity', '--csv', 'switches.csv');
    expect([code, err]).toEqual([0, '']);
    expectPlain(out);
    // every id as --only takes it
    for (const { assumption } of (
      JSON.parse(run('sensitivity', '--json').out) as { switches: { assumption: string }[] }
    ).switches)
      expect(out).toMatch(new RegExp(`^${assumption}  `, 'm'));
    expect(out).toMatch(/^system-prior +none .*uniform: all alike +2 of 2 +1\.000$/m);
    expect(out).toMatch(/On the list whatever is switched|On the list, and in how many/);
    expect(out).toMatch(/^ {2}cracking: a constant/m);
    expect(existsSync(join(small.folder, 'switches.csv'))).toBe(true);
    expect(JSON.parse(run('runs', '--json').out)).toHaveLength(1);
  });

  it('takes some by their ids, in JSON too, and refuses others', () => {
    const { code, out } = run('sensitivity', '--only', 'floor, rank-by', '--json');
    expect(code).toBe(0);
    const { switches } = JSON.parse(out) as { switches: { assumption: string }[] };
    expect([...new Set(switches.map(({ assumption }) => assumption))].sort()).toEqual(['floor', 'rank-by']);
    const wrong = run('sensitivity', '--only', 'flor');
    expect([wrong.code, wrong.out]).toEqual([2, '']);
    expect(wrong.err).toContain('--only: no assumption is called "flor"; those switched are ');
    expect(run('sensitivity', '--only', 'floor,').code).toBe(2);
    expect(run('sensitivity', '--sample', '0').code).toBe(2);
  });
});

import { readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { parse } from 'csv-parse/sync';
import { beforeAll, describe, expect, it } from 'vitest';
import { refreshStudy } from '../../src/exports/refresh-study.js';
import { sensitivityStudy } from '../../src/exports/sensitivity-study.js';
import { changeStudyDatabase, explain, listStudyRuns, withStudyDatabase } from '../../src/runs/open.js';
import { readRun } from '../../src/screening/page-data.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import type { Sensitivity } from '../../src/screening/sensitivity.js';
import { loadStudy } from '../../src/study/load.js';
import { screenedDemo } from '../support/screened-demo.js';
import { MADE, demoCopy } from '../support/study-folder.js';

async function screened(change: Parameters<typeof demoCopy>[0]): Promise<string> {
  const path = demoCopy(change);
  const loaded = await loadStudy(path);
  const db = await openStudyDatabase(loaded);
  try {
    await screen(db, loaded, { made: MADE });
  } finally {
    db.close();
  }
  return path;
}

const effect = ({ switches }: Sensitivity, assumption: string, to: string): Sensitivity['switches'][number] => {
  const found = switches.find((one) => one.assumption === assumption && one.to === to);
  if (found === undefined) throw new Error(`no switch of ${assumption} to ${to}`);
  return found;
};

describe('sensitivityStudy', () => {
  let path = '';
  let found: Sensitivity;
  beforeAll(async () => {
    path = await screenedDemo();
    found = await sensitivityStudy(path, { csv: join(dirname(path), 'switches.csv') });
  }, 120_000);

  it('accounts for every entry of the register: switched, or not with a reason', async () => {
    const { summary } = await withStudyDatabase(path, (db) => readRun(db, 1));
    const register = summary.assumptions.map(({ id }) => id);
    const switched = found.switches.map(({ assumption }) => assumption);
    const left = found.not_switched.map(({ assumption }) => assumption);
    expect([...new Set([...switched, ...left])].sort()).toEqual([...register].sort());
    expect(left.filter((id) => switched.includes(id))).toEqual([]);
    for (const { why } of found.not_switched) expect(why).toMatch(/\w/);
    for (const one of found.switches) {
      expect(one.statement).not.toBe('');
      expect(one.from).not.toBe('');
      expect(one.mark).toMatch(/^(?:study|judgement|memory|restated|two levels)$/);
    }
    expect(new Set(found.switches.map(({ assumption, to }) => `${assumption} ${to}`)).size).toBe(found.rankings);
  });

  it('has the uniform chances of the system always among them, and the largest effect first', () => {
    expect(effect(found, 'system-prior', 'uniform: all alike').overlap_share).toBeGreaterThan(0);
    const shares = found.switches.map(({ overlap_share }) => overlap_share);
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
  });

  it('switches the strength checks, by which two dozen buildings of the demo are ranked', () => {
    const methods = found.switches.filter(({ assumption }) => assumption === 'strength-check').map(({ to }) => to);
    expect(methods.sort()).toEqual(['asce41-13', 'japan-first-level', 'none', 'σ × 1.5']);
    expect(effect(found, 'strength-check', 'none').tau_b).toBeLessThan(1);
    for (const { why } of found.not_switched) expect(why).not.toContain('does not depend');
  });

  it('keeps nothing and names who stays whatever is switched', async () => {
    expect(await listStudyRuns(path)).toHaveLength(1);
    expect(found.always.length + found.sometimes.length).toBe(20);
    for (const { id } of found.always)
      for (const { left } of found.switches) expect(left.map((move) => move.id)).not.toContain(id);
    for (const { id, held } of found.sometimes)
      expect(found.switches.filter(({ left }) => left.some((move) => move.id === id))).toHaveLength(
        found.rankings - held,
      );
    for (const { id, held } of found.outside)
      expect(found.switches.filter(({ entered }) => entered.some((move) => move.id === id))).toHaveLength(held);
  });

  // another way through the program: a whole refresh with the parameter in the study
  it.each([
    ['slope', '3.0 everywhere', 'ranking.k', 3],
    ['period-standard', 'japan-1793', 'period.standard', 'japan-1793'],
    ['rank-by', 'ratio', 'ranking.rank_by', 'ratio'],
    ['adoption-lag', '5', 'code_history.adoption_lag_years', 5],
    ['hold-plateau', 'no', 'hazard.hold_plateau', false],
    ['overstrength', 'Ω 3.0', 'capacity.overstrength', 3],
    ['period-spread', '0.45', 'spreads.height_formula', 0.45],
  ] as const)('finds for %s to %s the list that a refresh with %s = %s finds', async (assumption, to, key, value) => {
    const { list } = await refreshStudy(path, { run: 1, set: [{ path: key, value }], made: MADE, reports: false });
    const one = effect(found, assumption, to);
    expect(one.overlap).toBe(list.overlap);
    expect(one.entered).toEqual(list.entered);
    expect(one.left).toEqual(list.left);
  });

  it('writes the table for a spreadsheet', () => {
    const rows = parse(readFileSync(join(dirname(path), 'switches.csv')), { bom: true, columns: true });
    expect(rows).toHaveLength(found.rankings);
    expect(rows[0]).toMatchObject({ assumption: found.switches[0]!.assumption, sample_every: '1' });
  });

  it('takes only what is asked for, and says what is wrong with the rest', async () => {
    const some = await sensitivityStudy(path, { run: 1, only: ['floor', 'rank-by'] });
    expect([...new Set(some.switches.map(({ assumption }) => assumption))].sort()).toEqual(['floor', 'rank-by']);
    expect(effect(some, 'floor', '0.08')).toEqual(effect(found, 'floor', '0.08'));
    await expect(sensitivityStudy(path, { only: ['flor'] })).rejects.toThrow(/no assumption is called "flor"/);
    await expect(sensitivityStudy(path, { only: ['cracking'] })).rejects.toThrow(/cracking is not switched: /);
    await expect(sensitivityStudy(path, { only: ['floor'], sample: 1 })).rejects.toThrow(/2 buildings at least/);
  });

  it('weighs slope, people and importance together', async () => {
    const { weights } = found;
    // the demo's slopes are read from two levels
    expect(weights).toMatchObject({ draws: 1_000, people: [0, 1], importance: [0, 2], slope: null, places: 20 });
    expect(weights!.listed.map(({ rank }) => rank)).toEqual(Array.from({ length: 20 }, (_, i) => i + 1));
    const all = [...weights!.listed, ...weights!.outside];
    // every weighting has a list of as many places; buildings alike at its edge are on it together
    const sum = all.reduce((total, { share }) => total + share, 0);
    expect(sum).toBeGreaterThan(20 - 1e-6);
    expect(sum).toBeLessThan(20.5);
    expect(weights!.safe).toBe(weights!.listed.filter(({ share }) => share > 0.95 - 1e-9).length);
    expect(weights!.outside.every(({ rank, share }) => rank > 20 && share > 0)).toBe(true);
    // by demand over capacity alone there is nothing to weigh
    const ratio = await screened({ study: (text) => text.replace('rank_by: people', 'rank_by: ratio') });
    expect((await sensitivityStudy(ratio, { only: ['floor'] })).weights).toBeNull();
  }, 60_000);

  it('ranks a systematic sample and says so', async () => {
    const sampled = await sensitivityStudy(path, { run: 1, only: ['floor'], sample: 80 });
    expect(sampled.sample).toMatchObject({ every: 3, list_size: 20 });
    expect(sampled.places).toBe(Math.round((20 * sampled.sample!.buildings) / sampled.buildings));
    const whole = await sensitivityStudy(path, { run: 1, only: ['floor'], sample: 1e9 });
    expect(whole.sample).toBeNull();
    expect(whole.switches).toEqual(found.switches.filter(({ assumption }) => assumption === 'floor'));
  });

  it('reads a run kept before the assumptions were settings, as does explain', async () => {
    const before = await explain(path, 'BH-013', { run: 1 });
    await changeStudyDatabase(path, async (db) => {
      const text = String(await db.value('SELECT settings FROM run WHERE run_id = 1'));
      const { assumed: _assumed, ...old } = JSON.parse(text) as Record<string, unknown>;
      await db.run('UPDATE run SET settings = ? WHERE run_id = 1', [JSON.stringify(old)]);
    });
    expect((await explain(path, 'BH-013', { run: 1 })).steps).toEqual(before.steps);
    const again = await sensitivityStudy(path, { run: 1, only: ['overstrength'] });
    expect(again.switches).toEqual(found.switches.filter(({ assumption }) => assumption === 'overstrength'));
  });
});

describe('sensitivityStudy, identities', () => {
  it('leaves the order where the spectra are scaled under the ratio with one slope, and where a switch changes nothing', async () => {
    const study = await screened({
      study: (text) =>
        text
          .replace('rank_by: people', 'rank_by: ratio')
          .replace('k: from-levels', 'k: 2.5')
          // nobody strengthened: the retrofit level changes nothing
          .replace('    year_retrofitted: Strengthened\n', '')
          .replace('    retrofit_level: Share of code\n', ''),
    });
    const found = await sensitivityStudy(study, {
      only: ['spectrum-level', 'retrofit-level', 'slope', 'system-prior'],
    });
    for (const one of [
      effect(found, 'spectrum-level', 'all × 0.8'),
      effect(found, 'spectrum-level', 'all × 1.2'),
      effect(found, 'retrofit-level', '0.5'),
      effect(found, 'retrofit-level', '1'),
    ]) {
      expect([one.to, one.overlap_share, one.tau_b]).toEqual([one.to, 1, 1]);
      expect([one.entered, one.left]).toEqual([[], []]);
    }
    expect(effect(found, 'spectrum-level', 'D alone × 1.2').tau_b).toBeLessThan(1);
    expect(found.switches.some(({ to }) => to.startsWith('uniform'))).toBe(true);
  }, 60_000);
});

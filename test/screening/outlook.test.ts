/** What the money buys and what the list hangs on, told with a run: the same as the commands find. */
import { readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { parse } from 'csv-parse/sync';
import type { PageData } from '../../src/engineering/page-contract.js';
import { budgetStudy } from '../../src/exports/budget-study.js';
import { withStudyDatabase } from '../../src/runs/open.js';
import { budgetOutlook } from '../../src/screening/budget-outlook.js';
import { pageDataOf } from '../../src/screening/page-data.js';
import { screenStudy } from '../../src/exports/screen-study.js';
import { sensitivityStudy } from '../../src/exports/sensitivity-study.js';
import { renderSummary } from '../../src/reports/summary.js';
import { screenedDemo } from '../support/screened-demo.js';
import { MADE, demoCopy } from '../support/study-folder.js';

describe('the outlook of a run', () => {
  let path = '';
  let data: PageData;
  beforeAll(async () => {
    path = await screenedDemo();
    data = await withStudyDatabase(path, (db) => pageDataOf(db, 1, 'si'));
  }, 60_000);

  it('tells what the money of the study buys, as budget does, and what the whole list would cost', async () => {
    const { plan, list_cost, currency, cost_source } = data.summary.budget!;
    const found = await budgetStudy(path);
    expect(found.money).toBe(90_000);
    expect([currency, cost_source]).toEqual(['crowns', 'study']);
    const { money, spent, left, gap, of_list, on_list, count, excluded } = plan!;
    expect({ money, spent, left, gap, of_list, on_list }).toEqual({
      money: found.money,
      spent: found.spent,
      left: found.left,
      gap: found.gap,
      of_list: found.of_list,
      on_list: found.on_list,
    });
    expect([count, excluded]).toEqual([found.chosen.length, 1]);
    expect(plan!.chosen.map(({ id, cost }) => [id, cost])).toEqual(found.chosen.map(({ id, cost }) => [id, cost]));
    expect(plan!.chosen.filter(({ must }) => must).map(({ id }) => id)).toEqual(['BH-084']);
    // own arithmetic on the written table: money enough for all buys them all, and each costs what budget says
    const all = await budgetStudy(path, 1e9);
    const listed = all.chosen.concat(all.overrides).filter(({ rank }) => rank !== null && rank <= 20);
    const costs = new Map(listed.map(({ id, cost }) => [id, cost]));
    expect(costs.size).toBe(20);
    expect(list_cost).toBeCloseTo(
      [...costs.values()].reduce((sum, cost) => sum + cost, 0),
      6,
    );
  });

  it('tells what the list hangs on: one switch of each assumption, with the effects that sensitivity finds', async () => {
    const told = data.summary.sensitivity!;
    const found = await sensitivityStudy(path);
    expect([told.of_rankings, told.places, told.sample]).toEqual([found.rankings, 20, null]);
    expect(told.switches.length).toBeGreaterThan(8);
    for (const one of told.switches) {
      const same = found.switches.find(({ assumption, to }) => assumption === one.assumption && to === one.to);
      expect([one.overlap, one.tau_b], one.to).toEqual([same?.overlap, same?.tau_b]);
    }
    expect(new Set(told.switches.map(({ assumption }) => assumption)).size).toBe(told.switches.length);
    // who stays in all rankings stays in some of them
    for (const { id } of found.always) expect(told.always).toContain(id);
  });

  it('stands in the summary', () => {
    const text = renderSummary(data);
    expect(text).toMatch(/## What the money buys\n\nTo assess every building on the list in detail would cost about/);
    expect(text).toMatch(/## What the list hangs on\n\nWith \d+ switches of assumptions made, one at a time/);
  });

  it('says what is wrong with a budget, and ranks all the same', async () => {
    const poor = demoCopy({ study: (text) => text.replace('money: 90000', 'money: 5000') });
    const { data: page } = await screenStudy(poor, { made: MADE });
    const { problem, plan } = page.summary.budget!;
    expect(plan).toBeNull();
    expect(problem).toMatch(/must be included costs .*the money is 5000/);
    const rows = parse(readFileSync(join(dirname(poor), 'reports', 'ranking.csv'), 'utf8'), {
      columns: true,
      bom: true,
    });
    expect(rows.length).toBeGreaterThan(200);
  });

  it('asks for a sum where neither study nor command names one', async () => {
    const without = await screenedDemo();
    writeFileSync(without, readFileSync(without, 'utf8').replace('  money: 90000\n', ''));
    const told = await withStudyDatabase(without, (db, loaded) => budgetOutlook(db, loaded, 1, 227));
    expect(told).toMatchObject({ plan: null, problem: null, list_cost: data.summary.budget!.list_cost });
    await expect(budgetStudy(without)).rejects.toThrow(/no sum of money/);
  });
});

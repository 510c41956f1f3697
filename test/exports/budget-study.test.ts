import { readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { parse } from 'csv-parse/sync';

import { beforeAll, describe, expect, it } from 'vitest';
import { formatError } from '../../src/errors.js';
import { budgetStudy } from '../../src/exports/budget-study.js';
import { withStudyDatabase } from '../../src/runs/open.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import { loadStudy, studyFromText } from '../../src/study/load.js';
import { studyFingerprint } from '../../src/study/fingerprint.js';
import { HOSTILE, SMALL_STUDY } from '../support/cli.js';
import { MADE, demoCopy } from '../support/study-folder.js';

let path = '';
let text = '';

beforeAll(async () => {
  path = demoCopy({ inventory: (table) => table.replace('1 Capstan Lane', HOSTILE.formula) });
  const loaded = await loadStudy(path);
  text = loaded.text.split('\nbudget:')[0]!;
  const db = await openStudyDatabase(loaded);
  try {
    await screen(db, loaded, { made: MADE });
  } finally {
    db.close();
  }
}, 60_000);

/** The demo's study with another section budget, without a new run. */
function withBudget(section: string): string {
  writeFileSync(path, section === '' ? text : `${text}\n${section}`);
  return path;
}

interface Row {
  readonly id: string;
  readonly chance: number;
  readonly priority: number;
  readonly cost: number | null;
  readonly area: number | null;
}

describe('budgetStudy', () => {
  it('chooses by chance × priority from the run as it is kept, at the cost of the model or of the inventory', async () => {
    const section = 'budget:\n  currency: crowns\n  cost: {fixed: 3000, per_m2: 1.5, least: 5000}\n';
    const plan = await budgetStudy(withBudget(section), 100_000);
    const rows = await withStudyDatabase(path, (db) =>
      db.rows<Row & Record<string, never>>(
        `SELECT b.id, r.chance, r.priority, b.assessment_cost AS cost, b.floor_area_m2 AS area
         FROM result r JOIN building b ON b.building_index = r.building_index WHERE r.run_id = 1 AND r.rank IS NOT NULL`,
      ),
    );
    expect(rows.some(({ cost }) => cost !== null)).toBe(true);
    for (const one of plan.chosen) {
      const row = rows.find(({ id }) => id === one.id)!;
      expect(one.value).toBeCloseTo(row.chance * row.priority, 12);
      expect(one.cost).toBe(row.cost ?? Math.max(5000, Math.round(3000 + 1.5 * row.area!)));
      expect(one.cost_from).toBe(row.cost === null ? 'floor area' : 'inventory');
    }
    expect(plan.spent).toBe(plan.chosen.reduce((sum, { cost }) => sum + cost, 0));
    expect(plan.spent + plan.left).toBe(100_000);
    expect(plan.value).toBeCloseTo(
      plan.chosen.reduce((sum, { value }) => sum + value, 0),
      9,
    );
    expect(plan.bound).toBeGreaterThanOrEqual(plan.value);
    expect(plan.gap).toBeLessThan(0.02);
    expect(plan).toMatchObject({ run: 1, list_size: 20, on_list: 20, currency: 'crowns', mobilisation: null });
    expect(plan.of_list).toBe(plan.chosen.filter(({ rank }) => rank! <= 20).length);
    expect(plan.cost_model.source).toBe('study');
  });

  it('costs by judgement where the study says nothing, and an unknown floor area as the median', async () => {
    const plan = await budgetStudy(withBudget(''), 1e12);
    expect(plan.cost_model).toEqual({ fixed: 5000, per_m2: 2, least: 6000, source: 'judgement' });
    expect(plan.gap).toBe(0);
    expect(plan.unlikely).toBeGreaterThan(0);
    const costs = plan.chosen.filter(({ cost_from }) => cost_from !== 'inventory').map(({ cost }) => cost);
    expect(Math.min(...costs)).toBeGreaterThanOrEqual(6000);
  });

  it('puts in and leaves out whom the study names, with the reason, also who is not ranked', async () => {
    const section = `budget:
  include:
    - {id: BH-084, reason: the owner's promise to the quarter, author: the council}
    - {id: BH-058, reason: asked for}
  exclude:
    - {id: BH-008, reason: sold this year}
`;
    const csv = join(dirname(path), 'plan.csv');
    const plan = await budgetStudy(withBudget(section), 60_000, { run: 1, csv });
    const ids = plan.chosen.map(({ id }) => id);
    expect(ids).toEqual(expect.arrayContaining(['BH-084', 'BH-058']));
    expect(ids).not.toContain('BH-008');
    expect(plan.overrides.map(({ id, what, reason, author }) => [id, what, reason, author])).toEqual([
      ['BH-084', 'include', "the owner's promise to the quarter", 'the council'],
      ['BH-058', 'include', 'asked for', null],
      ['BH-008', 'exclude', 'sold this year', null],
    ]);
    expect(plan.overrides.at(-1)!.rank).toBe(1);
    expect(plan.overrides[1]).toMatchObject({ rank: null, chance: null, value: 0, not_ranked: 'already assessed' });
    const rows = parse<Record<string, string>>(readFileSync(csv), { bom: true, columns: true });
    expect(rows).toHaveLength(plan.chosen.length + 1);
    expect(rows.at(-1)).toMatchObject({ id: 'BH-008', decision: 'must exclude', reason: 'sold this year' });
    expect(rows.find(({ id }) => id === 'BH-084')).toMatchObject({ decision: 'must include', author: 'the council' });
    // a name that a spreadsheet would take for a formula
    expect(rows.find(({ id }) => id === 'BH-013')!['name']).toBe(`'${HOSTILE.formula}`);
  });

  it('pays a mobilisation once for each block, and takes nobody unlikely along', async () => {
    const section = 'budget:\n  batches: {mobilisation: 12000, least_chance: 0.2}\n';
    const plan = await budgetStudy(withBudget(section), 120_000);
    const blocks = new Set(plan.chosen.map(({ group }) => group));
    expect(plan.batches.map(({ group }) => group).sort()).toEqual([...blocks].sort());
    expect(plan.spent).toBe(plan.chosen.reduce((sum, { cost }) => sum + cost, 0) + 12_000 * blocks.size);
    expect(plan.batches.reduce((sum, { cost }) => sum + cost, 0)).toBe(plan.spent);
    expect(Math.min(...plan.chosen.map(({ chance }) => chance!))).toBeGreaterThanOrEqual(0.2);
    const without = await budgetStudy(withBudget(''), 120_000);
    expect(blocks.size).toBeLessThan(new Set(without.chosen.map(({ group }) => group)).size);
    expect(plan.value).toBeLessThan(without.value);
  });

  it('says what is wrong and where: unknown buildings, both lists, musts over the money, no sum', async () => {
    const unknown = withBudget('budget:\n  include: [{id: BH-08, reason: x}]\n  exclude: [{id: zzz, reason: y}]\n');
    const said = await budgetStudy(unknown, 1000).catch((error: unknown) => formatError(error));
    expect(said).toMatch(/budget\.include\.1\.id: run 1 has no building "BH-08"; did you mean "BH-\d+"\?/);
    expect(said).toMatch(/study\.yaml:\d+:\d+ budget\.exclude\.1\.id: run 1 has no building "zzz"; ids are those/);

    const both = withBudget('budget:\n  include: [{id: BH-084, reason: x}]\n  exclude: [{id: BH-084, reason: y}]\n');
    await expect(budgetStudy(both, 1000)).rejects.toThrow(/"BH-084" stands in budget\.include already/);
    await expect(budgetStudy(withBudget('budget:\n  include: [{id: BH-084}]\n'), 1000)).rejects.toThrow(/reason/);

    const over = withBudget('budget:\n  currency: crowns\n  include: [{id: BH-084, reason: x}]\n');
    await expect(budgetStudy(over, 1000)).rejects.toThrow(/must be included costs 6000 crowns; the money is 1000/);
    for (const money of [0, -1, NaN, Infinity, 1e13])
      await expect(budgetStudy(over, money), String(money)).rejects.toThrow(/expected a sum over 0/);
    await expect(budgetStudy(over, 1000, { run: 9 })).rejects.toThrow(/no run 9/);
  });

  it('buys nothing for too little and says what the cheapest costs', async () => {
    const plan = await budgetStudy(withBudget('budget:\n  exclude: [{id: BH-001, reason: x}]\n'), 0.01);
    expect(plan.chosen).toEqual([]);
    expect(plan).toMatchObject({ value: 0, spent: 0, left: 0.01, gap: 0 });
    expect(plan.cheapest).toBeGreaterThan(0);
  });
});

describe('budget of a study', () => {
  it('leaves the fingerprint of the study alone: no run depends on it', () => {
    const plain = studyFromText(SMALL_STUDY).study;
    const more = studyFromText(`${SMALL_STUDY}budget: {cost: {fixed: 1}}\n`).study;
    expect(more.budget?.cost).toEqual({ fixed: 1, per_m2: 2, least: 6000 });
    expect(studyFingerprint(more)).toBe(studyFingerprint(plain));
  });
});

/** Moves between kept runs of the demo: the printed parts against changing one input at a time. */
import { describe, expect, it } from 'vitest';
import { compareRuns } from '../../src/screening/compare-runs.js';
import type { Comparison, ExplainedMove } from '../../src/screening/compare-runs.js';
import { explainBuilding } from '../../src/screening/explain.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import type { Database } from '../../src/store/database.js';
import { loadStudy } from '../../src/study/load.js';
import { MADE, demoCopy } from '../support/study-folder.js';

type Change = Parameters<typeof demoCopy>[0];

/** Two demos, each with its change, screened into a database of its own, compared. */
async function compared<T>(
  before: Change,
  after: Change,
  work: (comparison: Comparison, a: Database, b: Database) => T | Promise<T>,
): Promise<T> {
  const [one, two] = [await loadStudy(demoCopy(before)), await loadStudy(demoCopy(after))];
  const [a, b] = [await openStudyDatabase(one), await openStudyDatabase(two)];
  try {
    await screen(a, one, { made: MADE });
    await screen(b, two, { made: MADE });
    return await work(await compareRuns({ db: a, runId: 1 }, { db: b, runId: 1 }, { most: 1000 }), a, b);
  } finally {
    a.close();
    b.close();
  }
}

/** Twenty of the moves by a fixed lot (a linear congruence, own). */
function drawn(moves: readonly ExplainedMove[]): readonly ExplainedMove[] {
  const picked = new Set<ExplainedMove>();
  for (let lot = 4; picked.size < Math.min(20, moves.length); lot = (lot * 1103515245 + 12345) % 2147483648)
    picked.add(moves[lot % moves.length]!);
  return [...picked];
}

const explained = ({ buildings }: Comparison): readonly ExplainedMove[] =>
  buildings.filter(({ parts }) => parts !== null);
const sum = (parts: object): number => (Object.values(parts) as number[]).reduce((total, part) => total + part, 0);

function expectAdding(comparison: Comparison): void {
  for (const { parts, change, move, rank, rank_before } of explained(comparison)) {
    expect(Math.abs(sum(parts!) - change!)).toBeLessThan(1e-12);
    expect(move!.own + move!.others + move!.came_and_left).toBe(rank! - rank_before!);
  }
}

/** ln S of the leading case, from the terms of the stored run, in Math's own logarithm. */
const score = (k: number, d: number, c: number, e: number, i: number): number =>
  k * Math.log(d / c) + Math.log(e) + Math.log(i);

describe('compareRuns', () => {
  it('finds nothing moved between a run and itself', async () => {
    const loaded = await loadStudy(demoCopy());
    const db = await openStudyDatabase(loaded);
    try {
      await screen(db, loaded, { made: MADE });
      const same = await compareRuns({ db, runId: 1 }, { db, runId: 1 });
      expect(same).toMatchObject({ moved: 0, tau_b: 1, common_change: 0, settings: [] });
      expect(same.list.overlap).toBe(same.list.places);
      expect(same.data).toMatchObject({ came: [], went: [], changed: 0, fields: [] });
      expect(Object.values(same.differs)).toEqual([false, false, false, false]);
      for (const { change, parts, inputs } of same.buildings) {
        expect(change).toBe(0);
        expect(Object.values(parts!)).toEqual([0, 0, 0, 0, 0, 0, 0]);
        expect(inputs).toEqual([]);
      }
    } finally {
      db.close();
    }
  });

  it('explains another spectrum by demand and capacity, recomputed for 20 buildings by changing one term at a time', async () => {
    await compared(
      {},
      { study: (text) => changed(text, /(?<=design-c: .*sd1_g: )[\d.]+/, '0.50') },
      async (comparison, a, b) => {
        expectAdding(comparison);
        expect(comparison.settings).toContainEqual({ path: 'hazard.spectra.design-c.sd1_g', before: 0.42, after: 0.5 });
        // the slope is read from two levels: it follows
        for (const { path } of comparison.settings)
          expect(path).toMatch(/^(hazard\.spectra\.design-c\.sd1_g|ranking\.k\.design-.)$/);
        expect(comparison.data.changed).toBe(0);
        expect(comparison.moved).toBeGreaterThan(20);
        const moved = explained(comparison).filter(({ rank, rank_before }) => rank !== rank_before);
        for (const move of drawn(moved)) {
          // the stored results, read by the hand calculation and not by the comparison
          const [was, now] = [await explainBuilding(a, 1, move.id, 'si'), await explainBuilding(b, 1, move.id, 'si')];
          const of = (side: typeof was, name: string): number => Number(side.stored[name]);
          const [k, e] = [of(was, 'slope_k'), of(was, 'people_exposed')];
          const i = was.building.importance_factor > 0 ? was.building.importance_factor : 1;
          const [d0, d1, c0, c1] = [of(was, 'sa_g'), of(now, 'sa_g'), of(was, 'capacity_g'), of(now, 'capacity_g')];
          const kk = (k + of(now, 'slope_k')) / 2;
          const { parts, change } = move;
          expect(parts!.demand).toBeCloseTo(score(kk, d1, c0, e, i) - score(kk, d0, c0, e, i), 11);
          expect(parts!.capacity).toBeCloseTo(score(kk, d1, c1, e, i) - score(kk, d1, c0, e, i), 11);
          expect(parts!.people).toBe(0);
          expect(parts!.importance).toBe(0);
          expect(change).toBe(of(now, 'ln_priority') - of(was, 'ln_priority'));
          expect(move.move).toMatchObject({ rank: of(now, 'rank'), rank_before: of(was, 'rank') });
        }
      },
    );
  });

  it('explains another slope by the slope alone, where the case is sure, and what is left by spread', async () => {
    await compared(
      { study: (text) => changed(text, 'k: from-levels', 'k: 2.5') },
      { study: (text) => changed(text, 'k: from-levels', 'k: 3') },
      (comparison) => {
        expectAdding(comparison);
        for (const { parts, before } of drawn(explained(comparison))) {
          expect(parts!.demand).toBe(0);
          expect(parts!.capacity).toBe(0);
          expect(parts!.slope).toBeCloseTo(0.5 * Math.log(before!.sa_g / before!.capacity_g), 11);
        }
      },
    );
  });

  it('says which input of which building went from what to what, and counts those that came and went', async () => {
    const [target, gone] = ['BH-001', 'BH-002'];
    await compared(
      {},
      {
        inventory: (text) =>
          text
            .split('\n')
            .filter((line) => !line.startsWith(`${gone},`))
            .map((line) => (line.startsWith(`${target},`) ? changed(line, ',flats,', ',inn,') : line))
            .join('\n'),
      },
      (comparison) => {
        expectAdding(comparison);
        expect(comparison.settings).toEqual([]);
        expect(comparison.data.came).toEqual([]);
        expect(comparison.data.went.map(({ id }) => id)).toEqual([gone]);
        expect(comparison.data.fields.map(({ field }) => field)).toContain('use');
        const move = comparison.buildings.find(({ id }) => id === target);
        expect(move?.inputs).toContainEqual(
          expect.objectContaining({
            field: 'use',
            before: 'residential',
            origin_before: 'given',
            after: 'hotel',
            origin: 'given',
          }),
        );
      },
    );
  });
});

function changed(text: string, what: RegExp | string, by: string): string {
  const now = text.replace(what, by);
  expect(now).not.toBe(text);
  return now;
}

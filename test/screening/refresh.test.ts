import { rmSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { RESULT_COLUMNS } from '../../src/engineering/results.js';
import { formatError } from '../../src/errors.js';
import { baseRun, refresh } from '../../src/screening/refresh.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import { sweep } from '../../src/screening/sweep.js';
import type { Database } from '../../src/store/database.js';
import { loadStudy } from '../../src/study/load.js';
import type { LoadedStudy } from '../../src/study/load.js';
import { parameterFromText, rangeFromText, withParameters } from '../../src/study/parameters.js';
import { screenedDemo } from '../support/screened-demo.js';
import { MADE, demoCopy } from '../support/study-folder.js';

const RESULTS = `SELECT building_index, ${RESULT_COLUMNS.map(({ name }) => `"${name}"`).join(', ')}
  FROM result WHERE run_id = ? ORDER BY building_index`;
// all that a run is, but its number, time, note and the text of its study
const RUN = `SELECT title, inventory_id, study_fingerprint, methods_fingerprint, settings, summary, buildings, ranked, list_size, rank_by, seed
  FROM run WHERE run_id = ?`;

async function kept(db: Database, run: number): Promise<unknown> {
  const results = await db.rows(RESULTS, [run]);
  expect(results.length).toBeGreaterThan(200);
  return { results, run: await db.rows(RUN, [run]) };
}

/** A demo screened once, as run 1, whose inventory, pairs and table of chances have then gone. */
async function screenedAndGone<T>(
  work: (db: Database, loaded: LoadedStudy) => Promise<T>,
  change?: Parameters<typeof demoCopy>[0],
): Promise<T> {
  const path = change === undefined ? await screenedDemo() : demoCopy(change);
  const loaded = await loadStudy(path);
  const db = await openStudyDatabase(loaded);
  try {
    if (change !== undefined) await screen(db, loaded, { made: MADE });
    for (const name of ['inventory.csv', 'neighbours.csv', 'system-prior.csv']) rmSync(join(dirname(path), name));
    return await work(db, loaded);
  } finally {
    db.close();
  }
}

const set = (loaded: LoadedStudy, ...texts: readonly string[]): Promise<LoadedStudy> =>
  withParameters(
    loaded,
    texts.map((text) => parameterFromText(text, `--set ${text}`)),
  );

async function refreshed(db: Database, from: number, loaded: LoadedStudy): Promise<number> {
  return (await refresh(db, await baseRun(db, loaded, from), loaded, { made: MADE })).runId;
}

const refused = async (work: Promise<unknown>): Promise<string> => {
  const error: unknown = await work.then(
    () => undefined,
    (cause: unknown) => cause,
  );
  expect(error).toBeDefined();
  return formatError(error);
};

describe('refresh', () => {
  it('equals a whole screening with the same parameters in every result, bit for bit, and comes back', async () => {
    const changes = [
      'hazard.spectra.design-c.sds_g=1.1',
      'hazard.spectra.rare-d.sd1_g=1.3',
      'period.basis=design',
      'code_history.editions.ubc-1961.zone_factor=0.75',
      'ranking.list_size=25',
    ];
    const fresh = demoCopy({
      study: (text) =>
        text
          .replace(
            'design-c: {code: asce7-22-two-period, sds_g: 0.82',
            'design-c: {code: asce7-22-two-period, sds_g: 1.1',
          )
          .replace('sds_g: 1.42, sd1_g: 1.15', 'sds_g: 1.42, sd1_g: 1.3')
          .replace('basis: best-fit', 'basis: design')
          .replace('ubc-1961: {zone_factor: 1.0}', 'ubc-1961: {zone_factor: 0.75}')
          .replace('list_size: 20', 'list_size: 25'),
    });
    const whole = await loadStudy(fresh);
    const other = await openStudyDatabase(whole);
    await screen(other, whole, { made: MADE });
    const expected = await kept(other, 1);
    other.close();
    const work = async (db: Database, loaded: LoadedStudy): Promise<void> => {
      const first = await kept(db, 1);
      expect(await refreshed(db, 1, await set(loaded, ...changes))).toBe(2);
      expect(await kept(db, 2)).toEqual(expected);
      expect(await kept(db, 2)).not.toEqual(first);
      expect(await refreshed(db, 2, loaded)).toBe(3);
      expect(await kept(db, 3)).toEqual(first);
      // one inventory stands under all three
      expect(await db.value('SELECT count(*) FROM inventory')).toBe(1);
    };
    // screened anew, without the outlook that the shared one has
    await screenedAndGone(work, {});
  }, 120_000);

  it('leaves the order of the ratio ranking when every spectral acceleration is scaled by one constant', async () => {
    // ln S grows by k ln 1.25, for all alike where k is one number; with k by spectrum it would not [own arithmetic]
    const names = ['design-b', 'design-c', 'design-d', 'rare-b', 'rare-c', 'rare-d'];
    await screenedAndGone(
      async (db, loaded) => {
        const spectra = loaded.study.hazard.spectra as Readonly<Record<string, Readonly<Record<string, unknown>>>>;
        const scaled = names.flatMap((name) =>
          ['sds_g', 'sd1_g'].map(
            (key) => `hazard.spectra.${name}.${key}=${String(Number(spectra[name]?.[key]) * 1.25)}`,
          ),
        );
        await refreshed(db, 1, await set(loaded, ...scaled));
        const order = (run: number): Promise<unknown> =>
          db.rows('SELECT building_index, "rank", demand_rank FROM result WHERE run_id = ? ORDER BY building_index', [
            run,
          ]);
        expect(await order(2)).toEqual(await order(1));
        const ratios = await db.rows<{ ratio: number }>(
          `SELECT b.sa_g / a.sa_g AS ratio FROM result a JOIN result b USING (building_index)
           WHERE a.run_id = 1 AND b.run_id = 2 AND a.sa_g IS NOT NULL`,
        );
        for (const { ratio } of ratios) expect(ratio).toBeCloseTo(1.25, 12);
      },
      { study: (text) => text.replace('rank_by: people', 'rank_by: ratio').replace('k: from-levels', 'k: 2.5') },
    );
  }, 120_000);

  it('refuses what intake reads, at the parameter, with what to do, and keeps nothing', async () => {
    await screenedAndGone(async (db, loaded) => {
      const told = async (text: string): Promise<string> => refused(refreshed(db, 1, await set(loaded, text)));
      for (const text of [
        'inventory.delimiter=;',
        'inventory.columns.height_m.column=Storeys',
        'words.use.inn=residential',
        'neighbours.file=other.csv',
      ]) {
        const message = await told(text);
        expect(message).toContain(`--set ${text}: ${text.split('=')[0] ?? ''} is not what run 1 was taken in with`);
        expect(message).toContain('run `swaymark screen`');
      }
      // how many rejects are allowed is no part of intake
      expect(await refreshed(db, 1, await set(loaded, 'inventory.rejects_limit=0.2'))).toBe(2);
      // a table of chances of another name is read, and this one is not there
      expect(await told('system_prior=other.csv')).toMatch(/other\.csv: no such file/);
      expect(await db.value('SELECT count(*) FROM run')).toBe(2);
    });
  }, 120_000);

  it('checks parameters as the study file is checked, with the same texts, placed at the argument', async () => {
    const loaded = await loadStudy(demoCopy());
    const told = (...texts: readonly string[]): Promise<string> => refused(set(loaded, ...texts));
    expect(await told('ranking.list_size=0')).toMatch(/^--set ranking\.list_size=0: expected .*, got 0$/);
    expect(await told('ranking.list_sise=3')).toBe(
      '--set ranking.list_sise=3: unknown key (did you mean "list_size"?)',
    );
    expect(await told('hazard.spectra.D.sds_g=1', 'hazard.spectra.E.sd1_g=1')).toBe(
      ['D.sds_g', 'E.sd1_g']
        .map((key) => {
          const name = key[0]!;
          const known = 'design-b, design-c, design-d, rare-b, rare-c, rare-d';
          return `--set hazard.spectra.${key}=1: the study has no spectrum "${name}"; it has ${known}. A new one needs its code as well: hazard.spectra.${name}.code=…`;
        })
        .join('\n'),
    );
    expect(await told('hazard.spectra.D.code=asce7-22-two-period', 'hazard.spectra.D.sds_g=1')).toContain('sd1_g');
    expect(await told('hazard.levels.3.title=x')).toMatch(/^--set hazard\.levels\.3\.title=x/);
    expect(await told('hazard.levels.9.title=x')).toMatch(
      /^--set hazard\.levels\.9\.title=x: hazard\.levels is a list of 2/,
    );
    // two that only together are wrong are both named
    expect(await told('ranking.k=9', 'seed=-1')).toMatch(/^--set ranking\.k=9: .*\n--set seed=-1: /);
    expect(await told('hazard.levels.1.spectra.B=none')).toContain('--set hazard.levels.1.spectra.B=none: ');
    expect(() => parameterFromText('ranking.k')).toThrow('expected path=value');
  });
});

describe('sweep', () => {
  it('says how the list changes over a range as runs would, and keeps none', async () => {
    await screenedAndGone(async (db, loaded) => {
      const base = await baseRun(db, loaded, 1);
      const { path, values } = rangeFromText('hazard.spectra.design-d.sd1_g=0.42:0.82:0.2');
      expect(values).toEqual([0.42, 0.62, 0.82]);
      const studies = [];
      for (const value of values) studies.push({ value, loaded: await withParameters(loaded, [{ path, value }]) });
      const swept = await sweep(db, base, studies);
      expect(await db.value('SELECT count(*) FROM run')).toBe(1);
      expect(await db.value('SELECT count(DISTINCT run_id) FROM result_assessed')).toBe(1);
      // 0.62 is the demo's own value
      expect(swept[1]).toMatchObject({ overlap: 20, places: 20, entered: [], left: [] });
      for (const [i, one] of swept.entries()) {
        const { summary, runId } = await refresh(db, base, studies[i]?.loaded ?? loaded, { made: MADE });
        const list = async (run: number): Promise<readonly string[]> =>
          (
            await db.rows<{ id: string }>(
              `SELECT b.id FROM result r JOIN run USING (run_id) JOIN building b USING (inventory_id, building_index)
               WHERE r.run_id = ? AND r.in_list = 'yes' ORDER BY r."rank"`,
              [run],
            )
          ).map(({ id }) => id);
        const [before, now] = [await list(1), await list(runId)];
        expect(one.entered.map(({ id }) => id)).toEqual(now.filter((id) => !before.includes(id)));
        expect(one.left.map(({ id }) => id)).toEqual(before.filter((id) => !now.includes(id)));
        expect(one.overlap).toBe(now.filter((id) => before.includes(id)).length);
        expect(one.expected_wrong_places).toBe(summary.expected_wrong_places);
        expect(one.sure_places).toBe(summary.sure_places);
      }
      expect(swept[0]?.entered.length).toBeGreaterThan(0);
    });
  }, 120_000);

  it('reads ranges with both ends, and refuses what is none', () => {
    expect(rangeFromText('a.b=0.3:0.9:0.1').values).toEqual([0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9]);
    for (const text of ['a=1:2', 'a=2:1:1', 'a=1:2:0', 'a=1:2:x', 'a', 'a=0:1:1e-6'])
      expect(() => rangeFromText(text), text).toThrow();
  });
});

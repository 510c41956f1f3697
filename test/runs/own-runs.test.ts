import { readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { budgetStudy } from '../../src/exports/budget-study.js';
import { compareStudy } from '../../src/exports/compare-study.js';
import { answersSinceRun } from '../../src/exports/held-answers.js';
import { refreshStudy } from '../../src/exports/refresh-study.js';
import { sensitivityStudy } from '../../src/exports/sensitivity-study.js';
import { surveyStudy } from '../../src/exports/survey-study.js';
import { takeAnswers } from '../../src/exports/take-answers.js';
import { latestOwnRun, latestRun, listRuns } from '../../src/runs/history.js';
import {
  changeStudyDatabase,
  explain,
  listStudyRuns,
  periods,
  showRun,
  withStudyDatabase,
} from '../../src/runs/open.js';
import { openStudyDatabase, screen } from '../../src/screening/screen.js';
import { loadStudy } from '../../src/study/load.js';
import { SMALL_STUDY, scratch, writeSmallStudy } from '../support/cli.js';

// No outside source for these checks: whose run a command takes is our own contract.
const place = scratch();
const study = join(place.folder, 'study.yaml');
const other = join(place.folder, 'other.yaml');
const copy = join(place.folder, 'copy.yaml');
const third = join(place.folder, 'third.yaml');
const OTHER = SMALL_STUDY.replace('Four houses (invented)', 'Four houses, strong (invented)').replace(
  'sds_g: 0.8, sd1_g: 0.4',
  'sds_g: 1.6, sd1_g: 0.8',
);

async function screenAlone(path: string): Promise<void> {
  const loaded = await loadStudy(path);
  const db = await openStudyDatabase(loaded);
  await screen(db, loaded, { made: new Date('2026-01-02T03:04:05Z') });
  db.close();
}

/** Run 1 of study.yaml, 2 of other.yaml, 3 of copy.yaml, which has the title of study.yaml, 4 of study.yaml after an edit, 5 of other.yaml. */
beforeAll(async () => {
  writeSmallStudy(place.folder);
  writeFileSync(other, OTHER);
  writeFileSync(copy, SMALL_STUDY.replace('list_size: 2', 'list_size: 3'));
  for (const path of [study, other, copy]) await screenAlone(path);
  writeFileSync(study, SMALL_STUDY.replace('Four houses (invented)', 'Another title').replace('seed: 7', 'seed: 8'));
  for (const path of [study, other]) await screenAlone(path);
}, 60_000);
afterAll(() => {
  place.remove();
});

describe('latestOwnRun', () => {
  it('is the newest run of the study file, whatever was edited in it since', async () => {
    for (const [path, run] of [
      [study, 4],
      [other, 5],
      [copy, 3],
    ] as const)
      expect(await withStudyDatabase(path, async (db, loaded) => (await latestOwnRun(db, loaded)).run), path).toBe(run);
    expect(await withStudyDatabase(study, async (db) => (await latestRun(db)).run)).toBe(5);
  });

  it('is what every command takes', async () => {
    expect((await surveyStudy(study, { hours: 8, page: false })).plan.run).toBe(4);
    expect((await budgetStudy(study, 1e9)).run).toBe(4);
    expect((await sensitivityStudy(study, { only: ['slope'] })).run).toBe(4);
    expect((await explain(copy, 'A1')).runId).toBe(3);
    expect((await periods(copy, 'A1')).runId).toBe(3);
    expect(await answersSinceRun(copy)).toMatchObject({ run: 3 });
    expect((await explain(study, 'A1', { run: 2 })).runId).toBe(2);
  });

  it('is compared with the one before of the same study, or with that of the other study', async () => {
    const of = async (path: string, options = {}): Promise<readonly number[]> => {
      const { before, after } = (await compareStudy(path, { page: false, ...options })).comparison;
      return [before.run, after.run];
    };
    expect(await of(study)).toEqual([1, 4]);
    expect(await of(other)).toEqual([2, 5]);
    expect(await of(study, { otherStudy: other })).toEqual([4, 5]);
    await expect(of(copy)).rejects.toThrow('this study has no run before run 3');
    expect((await showRun(other, 5)).before).toMatchObject({ run: 2, others: [] });
    expect((await showRun(other, 2)).before).toMatchObject({ run: 1, others: ['study file'] });
  });

  it('says whose runs there are where the study has none, also to answers of a survey', async () => {
    writeFileSync(third, SMALL_STUDY.replace('Four houses (invented)', 'Third'));
    const message =
      'no run was made with this study: the runs kept in its folder are of study.yaml, other.yaml, copy.yaml (the newest: run 5); ' +
      'run `swaymark screen` with this file first, or name one of them with --run';
    await expect(explain(third, 'A1')).rejects.toThrow(message);
    await expect(surveyStudy(third, { hours: 8 })).rejects.toThrow(message);
    await expect(refreshStudy(third)).rejects.toThrow(message);
    writeFileSync(join(place.folder, 'field.csv'), 'id,system\nA1,timber-light-frame\n');
    await expect(takeAnswers(third, join(place.folder, 'field.csv'), new Date(0))).rejects.toThrow(message);
    expect(await answersSinceRun(third)).toBeNull();
    expect((await explain(third, 'A1', { run: 5 })).runId).toBe(5);
  });

  it('follows a study file that was renamed, by its title', async () => {
    const renamed = join(place.folder, 'renamed.yaml');
    renameSync(other, renamed);
    expect((await explain(renamed, 'A1')).runId).toBe(5);
    renameSync(renamed, other);
  });

  it('goes by the title where an earlier program kept no name', async () => {
    const kept = await changeStudyDatabase(study, async (db) => {
      const rows = await db.rows<{ run_id: number; summary: string }>(
        'SELECT run_id, summary FROM run ORDER BY run_id',
      );
      for (const { run_id, summary } of rows) {
        const { study_file: _name, ...rest } = JSON.parse(summary) as Record<string, unknown>;
        await db.run('UPDATE run SET summary = ? WHERE run_id = ?', [JSON.stringify(rest), run_id]);
      }
      return rows;
    });
    expect((await listStudyRuns(copy)).map(({ run, own, study_file }) => [run, own, study_file])).toEqual([
      [1, true, null],
      [2, false, null],
      [3, true, null],
      [4, false, null],
      [5, false, null],
    ]);
    await expect(explain(third, 'A1')).rejects.toThrow(
      'are of a study called "Four houses (invented)", a study called "Four houses, strong (invented)", a study called "Another title" (',
    );
    await changeStudyDatabase(study, async (db) => {
      for (const { run_id, summary } of kept)
        await db.run('UPDATE run SET summary = ? WHERE run_id = ?', [summary, run_id]);
    });
  });
});

describe('listStudyRuns', () => {
  it('tells the runs of the study from the others of its folder', async () => {
    expect((await listStudyRuns(study)).map(({ run, own, study_file }) => [run, own, study_file])).toEqual([
      [1, true, 'study.yaml'],
      [2, false, 'other.yaml'],
      [3, false, 'copy.yaml'],
      [4, true, 'study.yaml'],
      [5, false, 'other.yaml'],
    ]);
  });
});

describe('refreshStudy', () => {
  it('stands on the newest run of the study, and is of the file whose parameters it has', async () => {
    const edited = readFileSync(copy, 'utf8');
    const own = await refreshStudy(copy, { set: [{ path: 'seed', value: 9 }], reports: false });
    expect([own.base, own.runId]).toEqual([3, 6]);
    const strong = await refreshStudy(copy, { with: other, reports: false });
    expect([strong.base, strong.runId]).toEqual([6, 7]);
    expect(readFileSync(copy, 'utf8')).toBe(edited);
    const files = await withStudyDatabase(copy, async (db) => (await listRuns(db)).map((run) => run.study_file));
    expect(files.slice(5)).toEqual(['copy.yaml', 'other.yaml']);
  });
});

/** A study screened in a folder of its own, its ranked buildings, and the plan of their survey. */
import { cpSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import { EDITION_LABELS } from '../../../src/engineering/assess/code-history.js';
import { zoneOf } from '../../../src/engineering/assess/shared-load.js';
import { newScratch } from '../../../src/engineering/assess/scratch.js';
import { unknownsOf } from '../../../src/engineering/assess/unknowns.js';
import { buildingReader } from '../../../src/engineering/building-columns.js';
import type { Building } from '../../../src/engineering/building.js';
import type { Visit } from '../../../src/engineering/priority/campaign.js';
import type { Mixture } from '../../../src/engineering/priority/mixture.js';
import { orderOf, rankAll, rankBasis } from '../../../src/engineering/priority/rank.js';
import { edgeOf } from '../../../src/engineering/priority/survey-value.js';
import type { Unknowns } from '../../../src/engineering/priority/learnable.js';
import type { Edge } from '../../../src/engineering/priority/survey-value.js';
import { readRun } from '../../../src/screening/page-data.js';
import { readBuildings, readPools } from '../../../src/screening/read-buildings.js';
import { openStudyDatabase, screen } from '../../../src/screening/screen.js';
import { visitsOf } from '../../../src/screening/survey-outlook.js';
import { planSurvey } from '../../../src/screening/survey.js';
import type { SurveyPlan } from '../../../src/screening/survey.js';
import { loadStudy } from '../../../src/study/load.js';
import { contextsOf } from './truth.js';
import type { Contexts } from './truth.js';

/** What the ranking needs of one building. */
export interface Scored {
  readonly median: number;
  readonly people: number;
  readonly mixture: Mixture;
  /** Spectrum it reads, with its slope. */
  readonly zone: { readonly name: string; readonly slope_k: number };
}

export interface Portfolio {
  readonly buildings: readonly Building[];
  readonly scored: readonly Scored[];
  readonly contexts: Contexts;
  readonly visits: readonly Visit[];
  readonly listSize: number;
  readonly chance: Float64Array;
  /** Indices, the first rank first. */
  readonly order: Int32Array;
  readonly edge: Edge;
  readonly expectedWrong: number;
  /** The survey that the program plans for `hours`. */
  readonly plan: SurveyPlan;
}

export const MADE = new Date('2026-06-11T09:00:00Z');

/** A copy of the folder of the study at `path`, without runs and reports; `remove` it when done. */
export function copyOf(path: string): { readonly path: string; readonly remove: () => void } {
  const folder = mkdtempSync(join(tmpdir(), 'swaymark-truth-'));
  for (const name of readdirSync(dirname(path)))
    if (/\.(?:csv|yaml)$/.test(name)) cpSync(join(dirname(path), name), join(folder, name));
  return {
    path: join(folder, 'study.yaml'),
    remove: () => {
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

/** Screens the study at `path` and plans its survey for `hours`. */
export async function portfolioOf(path: string, hours: number): Promise<Portfolio> {
  const loaded = await loadStudy(path);
  const db = await openStudyDatabase(loaded);
  try {
    const { runId, taken } = await screen(db, loaded, { made: MADE });
    const { settings, summary } = await readRun(db, runId);
    const visits = visitsOf(loaded.study);
    const plan = await planSurvey(db, runId, { visits, limits: { hours, money: Infinity } });
    const contexts = contextsOf(settings, loaded.grids);
    const pools = await readPools(db, taken.inventoryId);
    const { columns, rows, notRanked } = await readBuildings(
      db,
      taken.inventoryId,
      { from: 0, to: taken.buildings },
      { places: loaded.grids.size > 0 },
    );
    const read = buildingReader(columns, pools);
    const buildings: Building[] = [];
    const scored: Scored[] = [];
    for (let i = 0; i < rows; i += 1) {
      if (notRanked[i] != null) continue;
      const building = read(i);
      const found = score(building, contexts);
      if (found === null) continue;
      buildings.push(building);
      scored.push(found);
    }
    const input = inputOf(buildings, scored, contexts);
    const { list_size: listSize, expected_wrong_places: expectedWrong } = summary;
    const basis = rankBasis(input, listSize, loaded.study.seed);
    const { order, chance } = rankAll(input, listSize, loaded.study.seed, basis);
    return {
      buildings,
      scored,
      contexts,
      visits,
      listSize,
      chance,
      order,
      edge: edgeOf(basis, { ...input, mixtures: basis.mixtures }, listSize),
      expectedWrong,
      plan,
    };
  } finally {
    db.close();
  }
}

/** `buildings` as the ranking takes them. */
export function inputOf(buildings: readonly Building[], scored: readonly Scored[], { believed }: Contexts) {
  const zones = new Map(scored.map(({ zone: { name, slope_k } }) => [name, zoneOf(name, slope_k, believed.settings)]));
  const numbers = new Map([...zones.keys()].map((name, number) => [name, number]));
  return {
    id: buildings.map(({ id }) => id),
    mixtures: scored.map(({ mixture }) => mixture),
    median: Float64Array.from(scored, ({ median }) => median),
    people: Float64Array.from(scored, ({ people }) => people),
    shared: {
      labels: EDITION_LABELS,
      zones: [...zones.values()],
      zone: Uint16Array.from(scored, ({ zone }) => numbers.get(zone.name)!),
    },
  };
}

const scratch = newScratch();

/** The building as it is ranked; null where it cannot be. */
export function score(building: Building, { believed }: Contexts): Scored | null {
  scratch.pool.restart();
  const result = assess(building, believed, undefined, scratch);
  if (!isRanked(result)) return null;
  const { mixture: m } = result;
  const part = (values: Float64Array): Float64Array => values.slice(m.from, m.to);
  return {
    median: result.lnPriority,
    people: Number.isNaN(result.people_exposed) ? 0 : result.people_exposed,
    mixture: {
      weight: part(m.weight),
      mean: part(m.mean),
      sd: part(m.sd),
      label: m.label?.slice(m.from, m.to),
      from: 0,
      to: m.to - m.from,
    },
    zone: { name: result.spectrum, slope_k: result.slope_k },
  };
}

/** The first `listSize` buildings. */
export function listOf(
  buildings: readonly Building[],
  scored: readonly Scored[],
  listSize: number,
): ReadonlySet<number> {
  const median = scored.map((one) => one.median);
  const people = scored.map((one) => one.people);
  return new Set(orderOf({ id: buildings.map(({ id }) => id), mixtures: [], median, people }).subarray(0, listSize));
}

/** What is unknown of a building that is ranked. */
export function unknownsIn(building: Building, { believed }: Contexts): Unknowns {
  return unknownsOf(building, believed) ?? { parts: EMPTY, learnable: [] };
}

const EMPTY: Mixture = {
  weight: new Float64Array(0),
  mean: new Float64Array(0),
  sd: new Float64Array(0),
  from: 0,
  to: 0,
};

/** Slope of the hazard curve per spectrum of the ranking level, from two levels at the zone's median period. */
import { chooseSpectrum } from '../engineering/assess/choose-spectrum.js';
import { compileContext, readAt } from '../engineering/assess/context.js';
import { buildingReader } from '../engineering/building-columns.js';
import type { YearPools } from '../engineering/building-columns.js';
import type { AssessSettings } from '../engineering/assess/settings.js';
import { casesOf } from '../engineering/assess/cases.js';
import { periodAt, periodModel } from '../engineering/assess/period.js';
import { apply } from '../engineering/formula.js';
import { HAZARD_SLOPE } from '../engineering/priority/records.js';
import { indexRanges } from '../store/chunks.js';
import type { Database } from '../store/database.js';
import { readBuildings } from './read-buildings.js';

export interface SlopeFound {
  readonly spectrum: string;
  readonly k: number;
  readonly how: string;
}

/** Periods are gathered to this step before the median is taken, so that the slope does not hang on the last digit of one building. */
const STEP_S = 0.01;

/** A median of this many periods is known to far less than the step: of a larger inventory every second, third … building by id is read. */
const ENOUGH = 50_000;

/** Settings with one slope per spectrum of the ranking level where the study asks for it and two levels state return periods. */
export async function withSlopes(
  settings: AssessSettings,
  fromLevels: boolean,
  db: Database,
  inventoryId: string,
  pools: YearPools,
  count: number,
): Promise<{ readonly settings: AssessSettings; readonly slopes: readonly SlopeFound[] }> {
  const [first, second] = settings.levels;
  const stated = typeof settings.slope === 'number' ? settings.slope : NaN;
  const names =
    first === undefined
      ? []
      : [...new Set([...Object.values(first.spectra), ...(first.otherwise === null ? [] : [first.otherwise])])];
  const plain = (how: string): readonly SlopeFound[] => names.map((spectrum) => ({ spectrum, k: stated, how }));
  if (!fromLevels) return { settings, slopes: plain('stated in the study') };
  if (first === undefined || second === undefined)
    return { settings, slopes: plain('assumed: the study names one level only [judgement]') };
  const context = compileContext(settings);
  const gathered = new Map<string, { readonly partner: string; readonly counts: Map<number, number> }>();
  const every = Math.ceil(count / ENOUGH);
  for (const range of indexRanges(count, 65_536 * every)) {
    const { columns, rows } = await readBuildings(db, inventoryId, range, { every, ids: false });
    const read = buildingReader(columns, pools);
    for (let i = 0; i < rows; i += 1) {
      const building = read(i);
      if (!(building.height_m.value > 0) || !(building.storeys.value > 0)) continue;
      const low = chooseSpectrum(context, building, 0);
      const high = chooseSpectrum(context, building, 1);
      if (typeof low === 'string' || typeof high === 'string') continue;
      const cases = casesOf(building, context);
      if (typeof cases === 'string') continue;
      const model = periodModel(building, 'longitudinal', cases.list[0]!.system, context);
      if (model === null) continue;
      const step = Math.round(periodAt(model, building.height_m.value, context).period_s / STEP_S);
      const entry = gathered.get(low.spectrum.name) ?? {
        partner: high.spectrum.name,
        counts: new Map<number, number>(),
      };
      entry.counts.set(step, (entry.counts.get(step) ?? 0) + 1);
      gathered.set(low.spectrum.name, entry);
    }
  }
  const slopes = names.flatMap((spectrum): readonly SlopeFound[] => {
    const entry = gathered.get(spectrum);
    const one = context.spectra[spectrum];
    const two = entry === undefined ? undefined : context.spectra[entry.partner];
    if (
      entry === undefined ||
      one === undefined ||
      two === undefined ||
      one.return_period_years === null ||
      two.return_period_years === null
    ) {
      return [
        {
          spectrum,
          k: stated,
          how:
            entry === undefined ? 'no building reads this spectrum' : 'assumed: a return period is missing [judgement]',
        },
      ];
    }
    const period_s = medianStep(entry.counts) * STEP_S;
    const sa_1_g = readAt(one, period_s);
    const sa_2_g = readAt(two, period_s);
    const k = apply(HAZARD_SLOPE, {
      sa_1_g,
      sa_2_g,
      return_period_1_years: one.return_period_years,
      return_period_2_years: two.return_period_years,
    });
    return [
      {
        spectrum,
        k,
        how: `ln(${String(two.return_period_years)}/${String(one.return_period_years)}) / ln(${sa_2_g.toPrecision(4)}/${sa_1_g.toPrecision(4)}) at the median period ${period_s.toFixed(2)} s`,
      },
    ];
  });
  return {
    settings: {
      ...settings,
      slope: Object.fromEntries(slopes.map(({ spectrum, k }) => [spectrum, k])),
      slopeSource: 'two levels',
    },
    slopes,
  };
}

function medianStep(counts: ReadonlyMap<number, number>): number {
  const steps = [...counts.entries()].sort(([a], [b]) => a - b);
  const half = steps.reduce((sum, [, count]) => sum + count, 0) / 2;
  let seen = 0;
  for (const [step, count] of steps) {
    seen += count;
    if (seen >= half) return step;
  }
  return 0;
}

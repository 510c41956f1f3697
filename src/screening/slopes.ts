/** Slope of the hazard curve per spectrum of the ranking level, from two levels at the zone's median period. */
import { chooseSpectrum } from '../engineering/assess/choose-spectrum.js';
import { compileContext, readAt } from '../engineering/assess/context.js';
import type { AssessContext, ContextSpectrum } from '../engineering/assess/context.js';
import { siteSpectrum } from '../engineering/assess/site-spectrum.js';
import { buildingReader } from '../engineering/building-columns.js';
import type { YearPools } from '../engineering/building-columns.js';
import type { AssessSettings } from '../engineering/assess/settings.js';
import { casesOf } from '../engineering/assess/cases.js';
import { periodAt, periodModel } from '../engineering/assess/period.js';
import { apply } from '../engineering/formula.js';
import { substituted } from '../engineering/hand.js';
import { HAZARD_SLOPE } from '../engineering/priority/records.js';
import type { HazardGrids } from '../engineering/spectrum/grid.js';
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

/** Buildings that read one spectrum at the first level: how many by step of the period, and where they stand if a grid is in play. */
interface Gathered {
  /** Spectrum of the second level. */
  readonly partner: string;
  readonly counts: Map<number, number>;
  readonly lon: number[];
  readonly lat: number[];
}

/** Settings with one slope per spectrum of the ranking level where the study asks for it and two levels state return periods. */
export async function withSlopes(
  settings: AssessSettings,
  grids: HazardGrids,
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
  const context = compileContext(settings, grids);
  const places = grids.size > 0;
  const gathered = new Map<string, Gathered>();
  const every = Math.ceil(count / ENOUGH);
  for (const range of indexRanges(count, 65_536 * every)) {
    const { columns, rows } = await readBuildings(db, inventoryId, range, { every, ids: false, places });
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
      const entry: Gathered = gathered.get(low.spectrum.name) ?? {
        partner: high.spectrum.name,
        counts: new Map<number, number>(),
        lon: [],
        lat: [],
      };
      entry.counts.set(step, (entry.counts.get(step) ?? 0) + 1);
      gathered.set(low.spectrum.name, entry);
      if ((low.spectrum.site ?? high.spectrum.site) === null || high.spectrum.name !== entry.partner) continue;
      entry.lon.push(building.lon);
      entry.lat.push(building.lat);
    }
  }
  const slopes = names.flatMap((spectrum): readonly SlopeFound[] => {
    const entry = gathered.get(spectrum);
    const years = settings.spectra[spectrum]?.return_period_years;
    const partnerYears = entry === undefined ? undefined : settings.spectra[entry.partner]?.return_period_years;
    const period_s = entry === undefined ? NaN : medianStep(entry.counts) * STEP_S;
    const pair = entry === undefined ? null : pairAt(spectrum, entry, period_s, context);
    if (pair === null || years === undefined || partnerYears === undefined) {
      return [
        {
          spectrum,
          k: stated,
          how:
            entry === undefined ? 'no building reads this spectrum' : 'assumed: a return period is missing [judgement]',
        },
      ];
    }
    const inputsAt = ({ sa_1_g, sa_2_g }: Pair) => ({
      sa_1_g,
      sa_2_g,
      return_period_1_years: years,
      return_period_2_years: partnerYears,
    });
    const slopeAt = (at: Pair): number => apply(HAZARD_SLOPE, inputsAt(at));
    const k = slopeAt(pair);
    // where the rarer level ranks, the larger ratio is the larger k
    const [low, high] = (pair.spread ?? []).map(slopeAt).sort((a, b) => a - b);
    const over =
      low === undefined || high === undefined
        ? ''
        : `, where the ratio is the median one of the buildings; for the middle 90 % of them k would be ${low.toFixed(2)} to ${high.toFixed(2)}`;
    return [
      {
        spectrum,
        k,
        how: `${substituted(HAZARD_SLOPE, inputsAt(pair))} at the median period ${period_s.toFixed(2)} s${over}`,
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

interface Pair {
  readonly sa_1_g: number;
  readonly sa_2_g: number;
}

/**
 * S_a of the two levels at a period. Where one of them is a grid, the pair of the building whose ratio is the median one: a grid counts
 * as one hazard zone, with one k as every zone has; `spread` holds the pairs at either end of the middle 90 % of the buildings.
 */
function pairAt(
  spectrum: string,
  { partner, lon, lat }: Gathered,
  period_s: number,
  context: AssessContext,
): (Pair & { readonly spread: readonly [Pair, Pair] | null }) | null {
  const at = (name: string, site: number): ContextSpectrum | undefined => {
    const source = context.grids.get(name);
    if (source === undefined) return context.spectra[name];
    const found = siteSpectrum(source, lon[site] ?? NaN, lat[site] ?? NaN);
    return typeof found === 'string' ? undefined : found;
  };
  const pairOf = (site: number): Pair | null => {
    const [one, two] = [at(spectrum, site), at(partner, site)];
    return one === undefined || two === undefined
      ? null
      : { sa_1_g: readAt(one, period_s), sa_2_g: readAt(two, period_s) };
  };
  if (lon.length === 0) {
    const pair = pairOf(0);
    return pair === null ? null : { ...pair, spread: null };
  }
  const pairs = lon.flatMap((_, site) => pairOf(site) ?? []);
  pairs.sort((a, b) => b.sa_2_g / b.sa_1_g - a.sa_2_g / a.sa_1_g || a.sa_1_g - b.sa_1_g);
  const ranked = (share: number): Pair | undefined => pairs[Math.floor(share * (pairs.length - 1))];
  const [low, middle, high] = [ranked(0.05), ranked(0.5), ranked(0.95)];
  return low === undefined || middle === undefined || high === undefined ? null : { ...middle, spread: [low, high] };
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

/** An invented portfolio with mixed knowledge, and draws of its unknown inputs. */
import type { Building, System, Use } from '../../src/engineering/building.js';
import { SYSTEMS } from '../../src/engineering/building.js';
import type { AssessContext } from '../../src/engineering/assess/context.js';
import { peopleOf } from '../../src/engineering/assess/people.js';
import { periodAt, periodModel } from '../../src/engineering/assess/period.js';
import type { PeriodModel } from '../../src/engineering/assess/period.js';
import { matchPrior } from '../../src/engineering/prior/system-prior.js';
import { storeyHeight } from '../../src/engineering/prior/storey-height.js';
import { building, given, inferred } from './engineering-building.js';
import type { Random } from './engineering-random.js';
import { pickShare } from './engineering-select.js';

const USES: readonly Use[] = ['residential', 'office', 'school', 'hospital', 'retail', 'unknown'];
const CHANGE_YEARS = [1952, 1963, 1978, 1990, 1999, 2002];

/** Written out here, not taken from the program: systems of frames, and what one storey cannot have. */
const FRAMES = new Set<System>([
  'steel-moment-frame',
  'concrete-moment-frame',
  'concrete-infilled-frame',
  'precast-concrete-frame',
  'timber-post-and-beam',
]);
const FLAGS = ['soft_storey', 'weak_storey', 'torsion', 'reentrant_corner', 'setback', 'mass_irregularity'] as const;
const COMPARE = new Set<string>(['soft_storey', 'weak_storey', 'setback', 'mass_irregularity']);

/** `count` invented buildings: system, year, height, people each known or not; a few measured, with stiffness, drawings or an assessed capacity. */
export function inventedPortfolio(count: number, random: Random): readonly Building[] {
  const { uniform, normal } = random;
  const pick = <T>(list: readonly T[]): T => list[Math.floor(uniform() * list.length)]!;
  const flag = (): 'yes' | 'no' | null => (uniform() < 0.05 ? 'yes' : uniform() < 0.2 ? 'no' : null);
  const year = (): number => Math.floor(1905 + 115 * uniform());
  return Array.from({ length: count }, (_, i) => {
    const use = pick(USES);
    const storeys = Math.max(1, Math.round(Math.exp(1.1 + 0.8 * normal())));
    const storey = storeyHeight(use, storeys);
    const height = storeys * storey.height_m;
    const side = 12 + 30 * uniform();
    const area = storeys * side * side * 1.8;
    const kind = uniform();
    const years =
      kind < 0.5
        ? [year()]
        : kind < 0.75
          ? [pick(CHANGE_YEARS) + Math.round(4 * uniform() - 2)]
          : kind < 0.95
            ? Array.from({ length: 10 }, year)
            : [];
    const measured = uniform() < 0.05;
    const stiff = uniform() < 0.05;
    const T = 0.1 * storeys * Math.exp(0.2 * normal());
    const mass = (area * 10) / (9.80665 * storeys);
    const stiffness = mass * ((4 * (storeys + 0.5)) / T) ** 2;
    const drawings = uniform() < 0.04;
    const retrofitted = years.length === 1 && years[0]! < 1970 && uniform() < 0.1;
    return building({
      id: `M-${String(i)}`,
      use,
      storeys: given(storeys),
      height_m: uniform() < 0.5 ? given(height * Math.exp(0.05 * normal())) : inferred(height, storey.sigma),
      plan_length_m: side * 1.8,
      plan_width_m: side,
      floor_area_m2: uniform() < 0.7 ? given(area) : inferred(area, 0.2),
      years,
      system: uniform() < 0.5 ? pick(SYSTEMS) : null,
      system_transverse: uniform() < 0.05 ? pick(SYSTEMS) : null,
      occupants_peak: uniform() < 0.3 ? Math.ceil(area * 0.04) : NaN,
      importance_factor: use === 'hospital' ? 1.5 : NaN,
      measured_period_s: measured ? { longitudinal: T, transverse: T * 1.15 } : { longitudinal: NaN, transverse: NaN },
      measured_amplitude: measured ? pick(['ambient', 'strong'] as const) : null,
      storey_stiffness_kN_per_m: stiff
        ? { longitudinal: [stiffness], transverse: [stiffness * 0.7] }
        : { longitudinal: null, transverse: null },
      soft_storey: flag(),
      weak_storey: uniform() < 0.3 ? 'no' : null,
      torsion: flag(),
      reentrant_corner: flag(),
      setback: flag(),
      mass_irregularity: uniform() < 0.1 ? 'no' : null,
      site_class: pick(['B', 'C', 'D']),
      year_retrofitted: retrofitted ? 1985 + Math.floor(25 * uniform()) : NaN,
      design_base_shear_coefficient: drawings ? 0.05 + 0.1 * uniform() : NaN,
      design_level: drawings ? pick(['working', 'strength', null] as const) : null,
      capacity_sa_g: uniform() < 0.02 ? 0.2 + 0.5 * uniform() : NaN,
    });
  });
}

type Mutable<T> = { -readonly [K in keyof T]: T[K] };
interface DrawnBuilding extends Mutable<Omit<Building, 'height_m' | 'measured_period_s' | 'years'>> {
  height_m: { value: number; sigma: number; origin: 'given'; rule: string };
  measured_period_s: { longitudinal: number; transverse: number };
  years: number[];
}

export interface Drawer {
  /** The building whose inputs are drawn: one object, changed from draw to draw. */
  readonly drawn: Building;
  /** Draws the inputs anew; yields the factor on the capacity. `common` are this draw's errors that buildings share. */
  readonly draw: (common: CommonDraw) => number;
}

/** Standard normal errors of one draw: of the table of each era, in the order of `context.eras`, and of the site class of the building's zone. */
export interface CommonDraw {
  readonly eras: readonly number[];
  readonly site: number;
}

/** How likely each year is for a building that was not strengthened and whose system is known: as likely as that system in the year. */
function yearShares(one: Building, { settings: { systemPrior } }: AssessContext): number[] {
  const { years, system, use, storeys } = one;
  const even = years.map(() => 1);
  if (system === null || one.year_retrofitted > 0 || systemPrior === null) return even;
  const shares = years.map(
    (year) =>
      matchPrior(systemPrior, use, storeys.value, year)!.chances.find((row) => row.system === system)?.chance ?? 0,
  );
  return shares.some((share) => share > 0) ? shares : even;
}

/**
 * Draws the unknown inputs of `original` from what the study says of them: year (pool, then either side of it), system of the
 * prior row that fits, irregularities by the chances of that system, height, period by the evidence at that height and system with
 * its error, overstrength, era, people, level of the drawings. The periods are handed over as measured in strong shaking.
 */
export function drawerOf(original: Building, context: AssessContext, { uniform, normal }: Random): Drawer {
  const { spreads, systemPrior, irregularity } = context.settings;
  const { chances } = irregularity!;
  const people = peopleOf(original, context);
  if (typeof people === 'string') throw new Error(people);
  const retrofitted = original.year_retrofitted > 0;
  const height: DrawnBuilding['height_m'] = { value: original.height_m.value, sigma: 0, origin: 'given', rule: '' };
  const periods = { longitudinal: NaN, transverse: NaN };
  const years = [NaN];
  const drawn: DrawnBuilding = {
    ...original,
    height_m: height,
    measured_period_s: periods,
    measured_amplitude: 'strong',
    years,
    floor_area_m2: given(original.floor_area_m2.value),
    occupied_hours_per_week: 168,
  };
  const models = { longitudinal: new Map<System, PeriodModel>(), transverse: new Map<System, PeriodModel>() };
  const modelOf = (direction: 'longitudinal' | 'transverse', system: System): PeriodModel => {
    let model = models[direction].get(system);
    if (model === undefined) {
      const made = periodModel(original, direction, system, context);
      if (made === null) throw new Error('no period');
      model = made;
      models[direction].set(system, model);
    }
    return model;
  };
  const assessed = original.capacity_sa_g > 0;
  // in whole years: those of construction and of the editions are whole, so nothing is lost
  const change = (): number => Math.floor(spreads.editionChange_years * (2 * uniform() - 1));
  const shares = yearShares(original, context);
  const draw = (common: CommonDraw): number => {
    const built = original.years.length === 0 ? NaN : original.years[pickShare(shares, uniform())]!;
    let system = original.system;
    if (system === null) {
      const row = matchPrior(systemPrior!, original.use, original.storeys.value, built)!.chances;
      system =
        row[
          pickShare(
            row.map(({ chance }) => chance),
            uniform(),
          )
        ]!.system;
    }
    if (retrofitted) {
      years[0] = built;
      drawn.year_retrofitted = original.year_retrofitted + change();
    } else if (Number.isNaN(built)) {
      const era = context.eras[Math.floor(uniform() * context.eras.length)]!;
      years[0] = Number.isFinite(era.from) ? era.from + 0.5 : era.to - 0.5;
    } else years[0] = built + change();
    drawn.system = system;
    const across = original.system_transverse ?? system;
    const isFrame = FRAMES.has(system) || FRAMES.has(across);
    const oneStorey = original.storeys.value < 2;
    for (const name of FLAGS) {
      if (original[name] !== null) continue;
      const prior = chances[name];
      const chance =
        oneStorey && COMPARE.has(name) ? 0 : typeof prior === 'number' ? prior : isFrame ? prior.frame : prior.wall;
      drawn[name] = uniform() < chance ? 'yes' : 'no';
    }
    height.value = original.height_m.value * Math.exp(original.height_m.sigma * normal());
    const z = normal();
    const a = periodAt(modelOf('longitudinal', system), height.value, context);
    const b = periodAt(modelOf('transverse', across), height.value, context);
    periods.longitudinal = a.period_s * Math.exp(a.sigma * z);
    periods.transverse = b.period_s * Math.exp(b.sigma * z);
    drawn.occupants_peak = people.people_exposed * Math.exp(people.sigma * normal());
    if (original.design_base_shear_coefficient > 0 && original.design_level === null)
      drawn.design_level = uniform() < 0.5 ? 'working' : 'strength';
    // a demand too small is a capacity too large
    const site = -spreads.siteClass * common.site;
    if (assessed) return Math.exp(spreads.assessedCapacity * normal() + site);
    // a coefficient from the drawings does not rest on the era table
    const year = retrofitted ? drawn.year_retrofitted : years[0];
    const era = context.eras.findIndex(({ from, to }) => year >= from && year < to);
    const table = original.design_base_shear_coefficient > 0 ? 0 : spreads.eraTable * common.eras[era]!;
    return Math.exp(spreads.overstrength * normal() + spreads.era * normal() + table + site);
  };
  return { drawn, draw };
}

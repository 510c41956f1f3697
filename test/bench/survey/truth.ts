/** The true attributes of a building in a world, and its true ln S: worked out by `assess` with every spread at 0. */
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import { isDesigned } from '../../../src/engineering/assess/edition-rows.js';
import { casesOf } from '../../../src/engineering/assess/cases.js';
import { detailingOf, editionOf } from '../../../src/engineering/assess/code-history.js';
import type { EditionId } from '../../../src/engineering/assess/code-history.js';
import { chooseSpectrum } from '../../../src/engineering/assess/choose-spectrum.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import type { AssessContext } from '../../../src/engineering/assess/context.js';
import { FRAMES, NAMES, UNKNOWN, YES, find } from '../../../src/engineering/assess/irregularity-found.js';
import type { Name } from '../../../src/engineering/assess/irregularity-found.js';
import { NO_PERIOD, periodAt, periodModel } from '../../../src/engineering/assess/period.js';
import { newScratch } from '../../../src/engineering/assess/scratch.js';
import { NO_IRREGULARITY_CHANCES, SPREADS } from '../../../src/engineering/assess/settings.js';
import type { AssessSettings, Spreads } from '../../../src/engineering/assess/settings.js';
import { isChecked } from '../../../src/engineering/assess/strength-check.js';
import type {
  Building,
  DesignLevel,
  DirectionName,
  Filled,
  System,
  Use,
  YesNo,
} from '../../../src/engineering/building.js';
import type { CarriedId } from '../../../src/engineering/capacity/families.js';
import { IRREGULARITY_EDITIONS } from '../../../src/engineering/irregularity/editions.js';
import { matchPrior } from '../../../src/engineering/prior/system-prior.js';
import type { HazardGrids } from '../../../src/engineering/spectrum/grid.js';
import { pickShare } from '../../support/engineering-select.js';
import { drawsOf } from './draws.js';
import type { Draws } from './draws.js';
import type { World } from './world.js';

/** What a visit would find, and what none would. */
export interface Truth {
  readonly lnPriority: number;
  readonly system: System;
  readonly built: number;
  readonly storeys: number;
  readonly height_m: number;
  readonly flags: Readonly<Record<Name, YesNo>>;
  readonly use: Use;
  /** Where the world gives no use, what knowing it does to the people, and the hours a week that they are there. */
  readonly useFactor: number;
  readonly hours: number;
  readonly occupants_peak: number;
  /** As the drawings state it; null where nothing was designed for earthquakes. */
  readonly coefficient: { readonly value: number; readonly level: DesignLevel } | null;
}

/** The planner's context, and the same with nothing left to chance. */
export interface Contexts {
  readonly believed: AssessContext;
  readonly certain: AssessContext & { capacityFactor: number };
}

const NO_SPREADS = Object.fromEntries(Object.keys(SPREADS).map((name) => [name, 0])) as unknown as Spreads;

export function contextsOf(settings: AssessSettings, grids: HazardGrids): Contexts {
  return {
    believed: compileContext(settings, grids),
    certain: { ...compileContext({ ...settings, spreads: NO_SPREADS }, grids) },
  };
}

const given = (value: number): Filled => ({ value, sigma: 0, origin: 'given', rule: '' });
const rooted = (variance: number): number => Math.sqrt(Math.max(variance, 0));
const scratch = newScratch();

/** Draws `building`, which can be ranked, in `world`. */
export function truthOf(building: Building, world: World, { believed, certain }: Contexts): Truth {
  const draws = drawsOf(world.seed, world.number, building.id);
  const use = building.use === 'unknown' && world.uses !== null ? pick(world.uses, draws.uniform('use')) : building.use;
  const size = sizeOf(building, world, draws);
  const { built, design, strengthened } = yearsOf(building, world, believed, draws);
  const system = building.system ?? systemOf(building, use, size.storeys, built, world, believed, draws);
  const across = building.system_transverse ?? system;
  const flags = flagsOf(building, [system, across], world, believed, draws);
  const known: Building = {
    ...building,
    ...flags,
    system,
    storeys: given(size.storeys),
    height_m: given(size.height_m),
    years: [design],
    year_retrofitted: strengthened ? design : NaN,
    design_level: building.design_level ?? (draws.uniform('level') < 0.5 ? 'working' : 'strength'),
  };
  const { people_exposed, ...people } = peopleOf(building, use, size, world, believed, draws);
  const period = (direction: 'longitudinal' | 'transverse', of: System): number => {
    const model = periodModel(known, direction, of, believed);
    if (model === null) throw new Error(NO_PERIOD);
    const { period_s, sigma } = periodAt(model, size.height_m, believed);
    return period_s * Math.exp(world.spread * sigma * draws.normal('period'));
  };
  const drawn: Building = {
    ...known,
    measured_period_s: { longitudinal: period('longitudinal', system), transverse: period('transverse', across) },
    measured_amplitude: 'strong',
    floor_area_m2: given(building.floor_area_m2.value),
    use,
    occupants_peak: people_exposed,
    occupied_hours_per_week: 168,
  };
  const cases = casesOf(known, certain);
  if (typeof cases === 'string') throw new Error(cases);
  const [which] = cases.list;
  const edition = which!.edition;
  const capacity = capacityOf(building, isChecked(known, which!, certain), edition, world, believed, draws);
  certain.capacityFactor = capacity.factor;
  scratch.pool.restart();
  const result = assess(drawn, certain, undefined, scratch);
  if (!isRanked(result)) throw new Error(`${building.id}: ${result.reason}`);
  return {
    lnPriority: result.lnPriority,
    system,
    built,
    ...size,
    flags,
    use,
    ...people,
    // a code that gives the system no row leaves no coefficient in its drawings
    coefficient: isDesigned(which!, certain) ? coefficientOf(known, system, edition, capacity.table, certain) : null,
  };
}

function pick<T>(list: readonly T[], uniform: number): T {
  return list[Math.floor(uniform * list.length)]!;
}

/** Storeys, height and what the floor area is multiplied with. */
function sizeOf(
  { storeys, height_m, floor_area_m2: area }: Building,
  { spread, storeysMove }: World,
  { normal }: Draws,
): { readonly storeys: number; readonly height_m: number; readonly areaFactor: number } {
  const moved = storeysMove && storeys.sigma > 0 && height_m.sigma > 0;
  const count = moved
    ? Math.max(1, Math.round(storeys.value * Math.exp(spread * storeys.sigma * normal('storeys'))))
    : storeys.value;
  const shared = moved ? count / storeys.value : 1;
  const own = ({ sigma }: Filled): number =>
    spread * (moved ? rooted(sigma * sigma - storeys.sigma * storeys.sigma) : sigma);
  return {
    storeys: count,
    height_m: height_m.value * (height_m.sigma > 0 ? shared * Math.exp(own(height_m) * normal('height')) : 1),
    areaFactor: area.sigma > 0 ? (area.origin === 'given' ? 1 : shared) * Math.exp(own(area) * normal('area')) : 1,
  };
}

/** Year of construction, and the year whose code it was designed (or strengthened) to, a few years either side. */
function yearsOf(
  building: Building,
  world: World,
  { eras, settings }: AssessContext,
  { uniform }: Draws,
): { readonly built: number; readonly design: number; readonly strengthened: boolean } {
  const { years, year_retrofitted } = building;
  const { years: shift, spread } = world;
  const change = Math.floor(spread * settings.spreads.editionChange_years * (2 * uniform('design year') - 1));
  const known = years.length === 1;
  const shares = yearShares(building, world, settings);
  const built = years.length === 0 ? NaN : years[pickShare(shares, uniform('year'))]! + (known ? 0 : shift);
  const strengthened = year_retrofitted > 0 && (years.length === 0 || year_retrofitted >= Math.min(...years));
  if (strengthened) return { built, design: year_retrofitted + change, strengthened };
  if (years.length > 0) return { built, design: built + change, strengthened };
  // neither a year nor a pool: an era, and a year well inside it
  if (eras.length === 0) return { built: NaN, design: NaN, strengthened };
  const { from, to } = pick(eras, uniform('year'));
  const inside = Number.isFinite(from) ? (Number.isFinite(to) ? Math.floor(0.5 * (from + to)) : from + 10) : to - 20;
  return { built: inside, design: inside, strengthened };
}

/** How likely each year of a pool is for a building whose system is known: as likely as that system in the year. */
function yearShares(
  { years, system, use, storeys }: Building,
  world: World,
  { systemPrior }: AssessSettings,
): number[] {
  const even = years.map(() => 1);
  if (system === null || systemPrior === null || years.length < 2) return even;
  const shares = years.map((year) => {
    const row = matchPrior(systemPrior, use, storeys.value, year)?.chances.find((one) => one.system === system);
    return row === undefined ? 0 : world.systemShare(system, row.chance);
  });
  return shares.some((share) => share > 0) ? shares : even;
}

function systemOf(
  building: Building,
  use: Use,
  storeys: number,
  built: number,
  world: World,
  { settings }: AssessContext,
  { uniform }: Draws,
): System {
  const year = building.years.length === 0 && !world.storeysMove ? NaN : built;
  const prior = settings.systemPrior ?? [];
  const group =
    matchPrior(prior, use, storeys, year) ??
    matchPrior(prior, building.use, building.storeys.value, building.years[0] ?? NaN);
  if (group === null) throw new Error(`${building.id}: no row of the table of system chances fits`);
  const shares = group.chances.map(({ system, chance }) => world.systemShare(system, chance));
  return group.chances[pickShare(shares, uniform('system'))]!.system;
}

function flagsOf(
  building: Building,
  systems: readonly System[],
  world: World,
  { settings }: AssessContext,
  { uniform }: Draws,
): Readonly<Record<Name, YesNo>> {
  const { chances, edition } = settings.irregularity ?? NO_IRREGULARITY_CHANCES;
  const rules = settings.irregularity === undefined ? null : IRREGULARITY_EDITIONS[edition];
  const isFrame = systems.some((system) => FRAMES.has(system));
  const flag = (name: Name): YesNo => {
    const { state, ofWalls } = find(name, building, rules);
    const told = isFrame ? state : ofWalls;
    if (told !== UNKNOWN) return told === YES ? 'yes' : 'no';
    const prior = chances[name];
    const chance = typeof prior === 'number' ? prior : isFrame ? prior.frame : prior.wall;
    return uniform(name) < world.irregularityChance(name, chance) ? 'yes' : 'no';
  };
  return Object.fromEntries(NAMES.map((name) => [name, flag(name)])) as Record<Name, YesNo>;
}

function peopleOf(
  building: Building,
  use: Use,
  { areaFactor }: { readonly areaFactor: number },
  world: World,
  { settings: { spreads, rankBy }, assumed }: AssessContext,
  { normal }: Draws,
): Pick<Truth, 'useFactor' | 'hours' | 'occupants_peak'> & { readonly people_exposed: number } {
  if (rankBy !== 'people') return { useFactor: 1, hours: NaN, occupants_peak: NaN, people_exposed: 1 };
  const { people_per_m2, hours_per_week } = assumed.uses[use];
  const counted = building.occupants_peak >= 0;
  const stated = building.occupied_hours_per_week >= 0;
  const left = world.spread * normal('hours');
  const { peopleKnownUse, peopleUnknownUse, peopleCounted } = spreads;
  const useOpen = use === 'unknown';
  const ofPeak = rooted(peopleKnownUse * peopleKnownUse - peopleCounted * peopleCounted);
  // a count leaves the hours open that the use would tell, the use leaves the count open: what both tell is the rest
  const ofHours = useOpen && !stated ? ofPeak : 0;
  const usual = stated ? building.occupied_hours_per_week : hours_per_week;
  const hours = usual * Math.exp(ofHours * normal('hours of the use'));
  const least = (people: number): number => Math.max(0.1, people);
  if (counted) {
    const people_exposed = least((building.occupants_peak * hours) / 168) * Math.exp(peopleCounted * left);
    return { useFactor: 1, hours, occupants_peak: building.occupants_peak, people_exposed };
  }
  const ofUse = useOpen
    ? rooted(peopleUnknownUse * peopleUnknownUse - peopleKnownUse * peopleKnownUse - ofHours * ofHours)
    : 0;
  const useFactor = Math.exp(ofUse * normal('people of the use'));
  const density = people_per_m2 * Math.exp(world.spread * ofPeak * normal('density'));
  const occupants_peak = building.floor_area_m2.value * areaFactor * density * useFactor;
  return {
    useFactor,
    hours,
    occupants_peak,
    people_exposed: least((occupants_peak * hours) / 168) * Math.exp(peopleCounted * left),
  };
}

/** What the capacity is multiplied with, and the part of it that drawings show. */
function capacityOf(
  building: Building,
  checked: boolean,
  edition: EditionId | null,
  { number, seed, spread, wrongEdition, wrongFactor }: World,
  context: AssessContext,
  { normal }: Draws,
): { readonly factor: number; readonly table: number } {
  const { spreads } = context.settings;
  const own = normal('capacity');
  // common to all that read a spectrum; a demand too small is a capacity too large
  const choice = chooseSpectrum(context, building, 0);
  if (typeof choice === 'string') throw new Error(choice);
  const ofZone = drawsOf(seed, number, `zone ${choice.spectrum.name}`).normal('site class');
  const site = Math.exp(-spread * spreads.siteClass * ofZone);
  if (building.capacity_sa_g > 0) return { factor: site * Math.exp(spread * spreads.assessedCapacity * own), table: 1 };
  if (checked) return { factor: site * Math.exp(spread * spreads.strengthCheck * own), table: 1 };
  // common to all of an edition
  const ofEdition = drawsOf(seed, number, `edition ${String(edition)}`).normal('table');
  const table =
    building.design_base_shear_coefficient > 0
      ? 1
      : Math.exp(spread * spreads.eraTable * ofEdition) *
        (edition !== null && edition === wrongEdition ? wrongFactor : 1);
  const ownFactor = Math.exp(spread * (spreads.overstrength * own + spreads.era * normal('era')));
  return { factor: site * table * ownFactor, table };
}

/** The coefficient that the drawings of a building designed to `edition` state. */
function coefficientOf(
  known: Building,
  system: System,
  edition: EditionId | null,
  table: number,
  { settings: { codeHistory: history }, assumed }: AssessContext,
): Truth['coefficient'] {
  if (edition === null || history === null) return null;
  const detailing = detailingOf(system, edition, history);
  const ductile = detailing === 'after' || detailing === 'special';
  const facts = { building: known, system, height_m: known.height_m.value, ductile } as const;
  const stated: unknown = history.editions[edition as CarriedId];
  const code = editionOf(edition, history);
  const along = (direction: DirectionName) => code.design({ ...facts, direction }, stated as never);
  // drawings of which one coefficient is taken down give that of the weaker direction: the shorter side, where a code goes by it
  const [x, y] = [along('longitudinal'), along('transverse')];
  const { coefficient, levelFactor } = x.coefficient < y.coefficient ? x : y;
  if (!(coefficient > 0)) return null;
  // a wall of the least strength is as strong on paper
  const value = Math.max(coefficient, assumed.leastCoefficient / levelFactor) * table;
  return { value, level: levelFactor > 1 ? 'working' : 'strength' };
}

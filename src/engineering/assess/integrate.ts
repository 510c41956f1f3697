/** The integration over the cases of a building, the nodes of its height and of its period's error. */
import { exp, ln } from '../numeric/elementary.js';
import type { Building, DirectionName, PerDirection } from '../building.js';
import { HEIGHT_NODES, ONE_NODE, PERIOD_NODES } from '../numeric/nodes.js';
import type { Nodes } from '../numeric/nodes.js';
import { NO_LABEL, mixtureQuantile } from '../priority/mixture.js';
import { capacityAtHeight, governingCase, keptCapacity } from './capacity.js';
import { entryOf, newMap } from './case-memory.js';
import type { CapacityAtHeight, Case, Cases } from './case-memory.js';
import type { AssessContext, ContextSpectrum } from './context.js';
import { curveAt, curvesOf, isByHeight, reducedAt } from './curve.js';
import { MOST_HEIGHTS } from './curve-memory.js';
import type { Curve, KeptBand, PeriodBand } from './curve-memory.js';
import { REGULAR, irregularityOf, storeyChanceOf } from './irregularity.js';
import type { People } from './people.js';
import { NO_PERIOD, alikeAcross, periodModel } from './period.js';
import type { PeriodEstimate, PeriodModel } from './period.js';
import type { Scratch } from './scratch.js';
import { strengthCheck } from './strength-check.js';
import { directionsAlike, drawingsLevels, importanceOf, massFactor } from './terms.js';

export type { PeriodBand };

/** z of the 84th percentile. */
const Z84 = 0.994457883209753;

export interface Pass {
  readonly period: PerDirection<PeriodBand>;
  readonly disagreement: number;
  /** Of the most likely case. */
  readonly models: PerDirection<PeriodModel>;
}

/** One node of the height of one pair of systems. */
interface Band {
  readonly chance: number;
  readonly longitudinal: PeriodEstimate;
  readonly transverse: PeriodEstimate;
}

/**
 * Adds every node of every case to the mixture and returns the percentiles of the periods. `told` hears, after the nodes of a case at
 * a node of the height, without a soft or weak storey (0) or with one (1), are added, which they were.
 */
export function integrate(
  building: Building,
  cases: Cases,
  people: People,
  spectrum: ContextSpectrum,
  slope_k: number,
  context: AssessContext,
  scratch: Scratch,
  told?: (which: Case, heightNode: number, storey: 0 | 1) => void,
): Pass | string {
  const { rankBy, spreads } = context.settings;
  const demandOnly = rankBy === 'demand';
  const assessed = building.capacity_sa_g > 0;
  const strengthVariance = assessed
    ? spreads.assessedCapacity * spreads.assessedCapacity
    : spreads.overstrength * spreads.overstrength +
      spreads.era * spreads.era +
      // a coefficient read in the drawings does not rest on the era table
      (building.design_base_shear_coefficient > 0 ? 0 : spreads.eraTable * spreads.eraTable);
  const peopleSigma = context.assumed.peopleWeight * people.sigma;
  const irregular = demandOnly || assessed ? REGULAR : irregularityOf(building, context);
  const spread = (variance: number): number =>
    Math.sqrt(slope_k * slope_k * (variance + irregular.varianceRest) + peopleSigma * peopleSigma);
  const sd = demandOnly ? 0 : spread(strengthVariance);
  const sdChecked = spread(spreads.strengthCheck * spreads.strengthCheck);
  const offset = demandOnly ? 0 : constantTerm(building, people, spectrum, context);
  const levels = drawingsLevels(building);
  const lnFixed = ln(massFactor(building, context)) + irregular.lnRest;
  const lnIrregular = lnFixed + irregular.lnStorey;
  const lnGiven = demandOnly ? 0 : assessed ? ln(building.capacity_sa_g * context.capacityFactor) : NaN;
  const bands: Band[] = [];
  scratch.lentCount = 0;
  let disagreement = 1;
  let ofLeading: PerDirection<PeriodModel> | undefined;
  const { score } = scratch;
  const add = (
    weight: number,
    along: Curve,
    ductilityA: number,
    lnA: number,
    across: Curve,
    ductilityB: number,
    lnB: number,
    sdOfCase = sd,
    label = NO_LABEL,
  ): void => {
    const a = reducedAt(along, ductilityA, spectrum, scratch);
    const nodes = along.sigma > 0 || across.sigma > 0 ? PERIOD_NODES : ONE_NODE;
    const first = nodes === ONE_NODE ? MIDDLE : 0;
    if (across === along && ductilityA === ductilityB)
      score.addNodes(weight, nodes, a, first, lnA < lnB ? lnA : lnB, slope_k, offset, sdOfCase, label);
    else {
      const b = reducedAt(across, ductilityB, spectrum, scratch);
      const { worse } = scratch;
      for (let j = 0; j < worse.length; j += 1) {
        const x = a[j]! - lnA;
        const y = b[j]! - lnB;
        worse[j] = y > x ? y : x;
      }
      score.addNodes(weight, nodes, worse, first, 0, slope_k, offset, sdOfCase, label);
    }
  };
  for (const group of cases.groups) {
    const models = modelsOf(building, group[0]!, context);
    if (models === null) return NO_PERIOD;
    // the first group is that of the most likely case
    ofLeading ??= models;
    let groupChance = 0;
    for (const { chance } of group) groupChance += chance;
    const heights = heightNodes(building, models, demandOnly || assessed);
    const curvesAlong = curvesOf(models.longitudinal, spectrum, context);
    const oneModel = models.transverse === models.longitudinal;
    const curvesAcross = oneModel ? curvesAlong : curvesOf(models.transverse, spectrum, context);
    for (let h = 0; h < heights.z.length; h += 1) {
      const height_m =
        building.height_m.value * (heights.z[h] === 0 ? 1 : exp(building.height_m.sigma * heights.z[h]!));
      const along = curveAt(models.longitudinal, height_m, curvesAlong, context);
      const other = oneModel ? along : curveAt(models.transverse, height_m, curvesAcross, context);
      disagreement = Math.max(disagreement, along.disagreement, other.disagreement);
      bands.push({ chance: groupChance * heights.weight[h]!, longitudinal: along, transverse: other });
      const across = other.period_s === along.period_s && other.sigma === along.sigma ? along : other;
      for (const which of group) {
        const alike = directionsAlike(building, which);
        const storey = storeyChanceOf(irregular, which);
        for (const { level, chance: levelChance } of levels) {
          const weight = which.chance * heights.weight[h]! * levelChance;
          if (demandOnly || assessed) {
            add(weight, along, 1, lnGiven, across, 1, lnGiven);
            told?.(which, h, 0);
            continue;
          }
          const a = capacityOf(building, which, 'longitudinal', height_m, level, context);
          const b = alike ? a : capacityOf(building, which, 'transverse', height_m, level, context);
          const byTable = a.checked === undefined && b.checked === undefined;
          const sdOfCase = byTable ? sd : sdChecked;
          // a level known from the drawings, like a strength check, rests on no table
          const label = byTable && level === null ? labelOf(building, which, height_m, context) : NO_LABEL;
          const { ductility: mu, lnStrength: lnA } = a;
          const { ductility: muB, lnStrength: lnB } = b;
          if (storey < 1) {
            add(weight * (1 - storey), along, mu, lnA + lnFixed, across, muB, lnB + lnFixed, sdOfCase, label);
            told?.(which, h, 0);
          }
          if (storey > 0) {
            add(weight * storey, along, mu, lnA + lnIrregular, across, muB, lnB + lnIrregular, sdOfCase, label);
            told?.(which, h, 1);
          }
        }
      }
    }
  }
  return { period: periodBands(building, bands, cases, context, scratch), disagreement, models: ofLeading! };
}

const MIDDLE = (PERIOD_NODES.z.length - 1) / 2;

function capacityOf(
  building: Building,
  which: Case,
  direction: DirectionName,
  height_m: number,
  level: number | null,
  context: AssessContext,
): CapacityAtHeight {
  if (level === null && building.structure !== null) {
    const check = strengthCheck(building, which, direction, height_m, context);
    if (check !== null && typeof check !== 'string') return check;
  }
  return level === null
    ? keptCapacity(building, which, direction, height_m, context)
    : capacityAtHeight(building, which, direction, height_m, level, context);
}

/** ln E + ln I, each times its weight (1), + zone term. */
function constantTerm(building: Building, people: People, spectrum: ContextSpectrum, context: AssessContext): number {
  const zone = context.zoneTerms[spectrum.name] ?? 0;
  if (context.settings.rankBy !== 'people') return zone;
  const { peopleWeight, importanceWeight } = context.assumed;
  return zone + (peopleWeight * ln(people.people_exposed) + importanceWeight * ln(importanceOf(building)));
}

function modelsOf(building: Building, which: Case, context: AssessContext): PerDirection<PeriodModel> | null {
  const longitudinal = periodModel(building, 'longitudinal', which.system, context);
  if (longitudinal === null) return null;
  if (which.system === which.system_transverse && alikeAcross(building, longitudinal, which.system, context))
    return { longitudinal, transverse: longitudinal };
  const transverse = periodModel(building, 'transverse', which.system_transverse, context);
  return transverse === null ? null : { longitudinal, transverse };
}

/** An inferred height is integrated over unless nothing depends on it. */
function heightNodes(building: Building, models: PerDirection<PeriodModel>, capacityWithoutHeight: boolean): Nodes {
  if (!(building.height_m.sigma > 0)) return ONE_NODE;
  const heightless = ({ formula, stiffnessAt }: PeriodModel): boolean => formula === null && stiffnessAt === null;
  if (capacityWithoutHeight && heightless(models.longitudinal) && heightless(models.transverse)) return ONE_NODE;
  return HEIGHT_NODES;
}

/** Percentiles of both directions; where one formula of an inferred height speaks, out of the memory when it is there. */
function periodBands(
  building: Building,
  bands: readonly Band[],
  cases: Cases,
  context: AssessContext,
  scratch: Scratch,
): PerDirection<PeriodBand> {
  const alike = bands.every(({ longitudinal, transverse }) => longitudinal === transverse);
  if (!alike)
    return {
      longitudinal: percentiles(bands, 'longitudinal', scratch),
      transverse: percentiles(bands, 'transverse', scratch),
    };
  const { value, sigma } = building.height_m;
  const model =
    bands.length > 1 && cases.groups.length === 1
      ? periodModel(building, 'longitudinal', cases.list[0]!.system, context)
      : null;
  if (model?.formula == null || !isByHeight(model)) {
    const band = percentiles(bands, 'longitudinal', scratch);
    return { longitudinal: band, transverse: band };
  }
  const kept = entryOf(context.curveMemory.bands, model.formula, newMap<number, KeptBand>);
  const { chance } = bands[0]!;
  const old = kept.get(value);
  let band = old?.band;
  if (old === undefined || band === undefined || old.chance !== chance || old.sigma !== sigma) {
    band = percentiles(bands, 'longitudinal', scratch);
    if (kept.size >= MOST_HEIGHTS) kept.clear();
    kept.set(value, { chance, sigma, band });
  }
  return { longitudinal: band, transverse: band };
}

function percentiles(bands: readonly Band[], direction: DirectionName, scratch: Scratch): PeriodBand {
  if (bands.length === 1) {
    const { period_s, sigma } = bands[0]![direction];
    const factor = exp(Z84 * sigma);
    return { p16_s: period_s / factor, p50_s: period_s, p84_s: period_s * factor };
  }
  scratch.period.clear();
  for (const band of bands) scratch.period.add(band.chance, ln(band[direction].period_s), band[direction].sigma);
  scratch.periodPool.restart();
  const mixture = scratch.period.gather(scratch.periodPool);
  const at = (q: number, z: number): number => exp(mixtureQuantile(mixture, q, z));
  return { p16_s: at(0.16, -Z84), p50_s: at(0.5, 0), p84_s: at(0.84, Z84) };
}

/** Whose table's error a capacity shares: of a strengthened building that of the code which gives it. */
function labelOf(building: Building, which: Case, height_m: number, context: AssessContext): number {
  return which.builtTo === null ? which.label : governingCase(building, which, 'longitudinal', height_m, context).label;
}

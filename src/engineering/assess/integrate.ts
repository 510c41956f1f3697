/** The integration over the cases of a building, the nodes of its height and of its period's error. */
import { exp, ln } from '../numeric/elementary.js';
import type { Building, PerDirection } from '../building.js';
import { reductionFactor } from '../capacity/records.js';
import { HEIGHT_NODES, ONE_NODE, PERIOD_NODES } from '../numeric/nodes.js';
import type { Nodes } from '../numeric/nodes.js';
import { mixtureQuantile } from '../priority/mixture.js';
import { ordinate } from '../spectrum/compiled.js';
import { capacityAtHeight } from './capacity.js';
import type { CapacityAtHeight } from './capacity.js';
import type { Case, Cases } from './case-memory.js';
import type { AssessContext, ContextSpectrum } from './context.js';
import type { People } from './people.js';
import { periodAt, periodModel } from './period.js';
import type { PeriodEstimate, PeriodModel } from './period.js';
import type { Scratch } from './scratch.js';
import { directionsAlike, drawingsLevels, importanceOf, massFactor } from './terms.js';

export interface PeriodBand {
  readonly p16_s: number;
  readonly p50_s: number;
  readonly p84_s: number;
}

/** z of the 16th and 84th percentiles. */
const Z84 = 0.994457883209753;

export interface Pass {
  readonly period: PerDirection<PeriodBand>;
  readonly disagreement: number;
}

interface SystemModels {
  readonly longitudinal: PeriodModel;
  readonly transverse: PeriodModel;
}

/** Adds every node of every case to the mixture and returns the percentiles of the periods. */
export function integrate(
  building: Building,
  cases: Cases,
  people: People,
  spectrum: ContextSpectrum,
  slope_k: number,
  context: AssessContext,
  scratch: Scratch,
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
  const sd = demandOnly ? 0 : Math.sqrt(slope_k * slope_k * strengthVariance + people.sigma * people.sigma);
  const offset = demandOnly ? 0 : constantTerm(building, people, spectrum, context);
  const levels = drawingsLevels(building);
  const fixed = massFactor(building, context);
  const bands: { chance: number; longitudinal: PeriodEstimate; transverse: PeriodEstimate }[] = [];
  let disagreement = 1;
  for (const group of cases.groups) {
    const models = modelsOf(building, group[0]!, context);
    if (models === null) return 'every method for the period is switched off';
    const groupChance = group.reduce((sum, { chance }) => sum + chance, 0);
    const heights = heightNodes(building, models, demandOnly || assessed);
    for (let h = 0; h < heights.z.length; h += 1) {
      const height_m =
        building.height_m.value * (heights.z[h] === 0 ? 1 : exp(building.height_m.sigma * heights.z[h]!));
      const along = periodAt(models.longitudinal, height_m, context);
      const across = models.transverse === models.longitudinal ? along : periodAt(models.transverse, height_m, context);
      disagreement = Math.max(disagreement, along.disagreement, across.disagreement);
      bands.push({ chance: groupChance * heights.weight[h]!, longitudinal: along, transverse: across });
      fillNodes(scratch, 0, along, spectrum);
      const samePeriod = across === along || (across.period_s === along.period_s && across.sigma === along.sigma);
      if (!samePeriod) fillNodes(scratch, 1, across, spectrum);
      const across_i = samePeriod ? 0 : 1;
      const nodes = along.sigma > 0 || across.sigma > 0 ? PERIOD_NODES : ONE_NODE;
      const first = nodes === ONE_NODE ? (PERIOD_NODES.z.length - 1) / 2 : 0;
      for (const which of group) {
        for (const { level, chance: levelChance } of levels) {
          const weight = which.chance * heights.weight[h]! * levelChance;
          if (demandOnly || assessed) {
            for (let j = 0; j < nodes.z.length; j += 1) {
              const sa = Math.max(scratch.sa_g[0][first + j]!, scratch.sa_g[across_i][first + j]!);
              const x = demandOnly
                ? ln(sa)
                : slope_k * ln(sa / (building.capacity_sa_g * context.capacityFactor)) + offset;
              scratch.score.add(weight * nodes.weight[j]!, x, sd);
            }
            continue;
          }
          const a = capacityAtHeight(building, which, 'longitudinal', height_m, level, context);
          const b = directionsAlike(building, which)
            ? a
            : capacityAtHeight(building, which, 'transverse', height_m, level, context);
          addNodes(scratch, nodes, first, across_i, a, b, fixed, weight, slope_k, offset, sd, spectrum);
        }
      }
    }
  }
  return {
    period: {
      longitudinal: percentiles(bands, 'longitudinal', scratch),
      transverse: percentiles(bands, 'transverse', scratch),
    },
    disagreement,
  };
}

function addNodes(
  scratch: Scratch,
  nodes: Nodes,
  first: number,
  across_i: number,
  a: CapacityAtHeight,
  b: CapacityAtHeight,
  fixed: number,
  weight: number,
  slope_k: number,
  offset: number,
  sd: number,
  spectrum: ContextSpectrum,
): void {
  const corner = spectrum.compiled.plateau_to_s;
  const strengthA = a.strength_coefficient * a.overstrength * fixed;
  const strengthB = b.strength_coefficient * b.overstrength * fixed;
  const one = across_i === 0 && strengthA === strengthB && a.ductility === b.ductility;
  const periodA = scratch.period_s[0];
  const saA = scratch.sa_g[0];
  const periodB = scratch.period_s[across_i]!;
  const saB = scratch.sa_g[across_i]!;
  for (let j = 0; j < nodes.z.length; j += 1) {
    let ratio = saA[first + j]! / (strengthA * reductionFactor(a.ductility, periodA[first + j]!, corner));
    if (!one) {
      const other = saB[first + j]! / (strengthB * reductionFactor(b.ductility, periodB[first + j]!, corner));
      if (other > ratio) ratio = other;
    }
    scratch.score.add(weight * nodes.weight[j]!, slope_k * ln(ratio) + offset, sd);
  }
}

/** Period and demand at the nodes of one direction. */
function fillNodes(scratch: Scratch, d: 0 | 1, estimate: PeriodEstimate, spectrum: ContextSpectrum): void {
  const stretch = scratch.stretch[d];
  if (scratch.stretchSigma[d] !== estimate.sigma) {
    for (let j = 0; j < stretch.length; j += 1) stretch[j] = exp(estimate.sigma * PERIOD_NODES.z[j]!);
    scratch.stretchSigma[d] = estimate.sigma;
  }
  for (let j = 0; j < stretch.length; j += 1) {
    const t = estimate.period_s * stretch[j]!;
    scratch.period_s[d][j] = t;
    scratch.sa_g[d][j] = ordinate(spectrum.compiled, Math.max(t, spectrum.hold_from_s));
  }
}

/** ln E + ln I + zone term. */
function constantTerm(building: Building, people: People, spectrum: ContextSpectrum, context: AssessContext): number {
  const zone = context.zoneTerms[spectrum.name] ?? 0;
  return zone + (context.settings.rankBy === 'people' ? ln(people.people_exposed) + ln(importanceOf(building)) : 0);
}

function modelsOf(building: Building, which: Case, context: AssessContext): SystemModels | null {
  const longitudinal = periodModel(building, 'longitudinal', which.system, context);
  if (longitudinal === null) return null;
  const plain = longitudinal.evidence === 'formula' && which.system === which.system_transverse;
  const sameInput =
    plain && !(building.measured_period_s.transverse > 0) && building.storey_stiffness_kN_per_m.transverse === null;
  if (sameInput) return { longitudinal, transverse: longitudinal };
  const transverse = periodModel(building, 'transverse', which.system_transverse, context);
  return transverse === null ? null : { longitudinal, transverse };
}

/** An inferred height is integrated over unless nothing depends on it. */
function heightNodes(building: Building, models: SystemModels, capacityWithoutHeight: boolean): Nodes {
  if (!(building.height_m.sigma > 0)) return ONE_NODE;
  if (capacityWithoutHeight && models.longitudinal.formula === null && models.transverse.formula === null)
    return ONE_NODE;
  return HEIGHT_NODES;
}

function percentiles(
  bands: readonly {
    readonly chance: number;
    readonly longitudinal: PeriodEstimate;
    readonly transverse: PeriodEstimate;
  }[],
  direction: 'longitudinal' | 'transverse',
  scratch: Scratch,
): PeriodBand {
  if (bands.length === 1) {
    const { period_s, sigma } = bands[0]![direction];
    const factor = exp(Z84 * sigma);
    return { p16_s: period_s / factor, p50_s: period_s, p84_s: period_s * factor };
  }
  scratch.period.clear();
  for (const band of bands) scratch.period.add(band.chance, ln(band[direction].period_s), band[direction].sigma);
  const mixture = scratch.period.gather(scratch.periodPool);
  const at = (q: number, z: number): number => exp(mixtureQuantile(mixture, q, z));
  return { p16_s: at(0.16, -Z84), p50_s: at(0.5, 0), p84_s: at(0.84, Z84) };
}

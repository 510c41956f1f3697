/** Where the uncertainty of a building's priority comes from: shares of the variance of ln S, the largest first. */
import type { Building } from '../building.js';
import { mixtureMoments } from '../priority/mixture.js';
import { shareOf } from '../priority/survey-value.js';
import type { Unknown } from '../priority/survey-value.js';
import { casesOf } from './cases.js';
import { slopeFor } from './context.js';
import type { AssessContext, ContextSpectrum } from './context.js';
import { isChecked } from './strength-check.js';
import { designedShare, unknownsOf } from './unknowns.js';

export interface SpreadShare {
  readonly what: string;
  readonly share: number;
  /** A visit can find it out. */
  readonly learnable: boolean;
}

const WORDS: Readonly<Record<Unknown, string>> = {
  system: 'lateral system unknown',
  year: 'year of construction unknown',
  height: 'height inferred',
  irregularity: 'irregularities not on record',
  use: 'use unknown',
  occupants: 'people not counted',
  drawings: 'no drawings: the era’s table speaks',
};

/** The shares of `building`; null where it cannot be ranked or there is no spread. What the unknowns do together stands with the rest. */
export function spreadShares(
  building: Building,
  spectrum: ContextSpectrum,
  context: AssessContext,
): readonly SpreadShare[] | null {
  const unknowns = unknownsOf(building, context);
  if (unknowns === null) return null;
  const { sd } = mixtureMoments(unknowns.parts);
  if (!(sd > 0)) return null;
  const shares: SpreadShare[] = unknowns.learnable.map((one) => ({
    what: WORDS[one.unknown],
    share: shareOf(unknowns, one),
    learnable: true,
  }));
  const { spreads, rankBy } = context.settings;
  if (rankBy !== 'demand' && !(building.capacity_sa_g > 0)) {
    const k = slopeFor(context, spectrum.name);
    const cases = casesOf(building, context);
    const checked = typeof cases !== 'string' && cases.list.every((which) => isChecked(building, which, context));
    const { overstrength, era, eraTable, strengthCheck } = spreads;
    // where nothing was designed for earthquakes no drawing settles what the least strength is worth
    const undesigned =
      typeof cases === 'string' || building.design_base_shear_coefficient > 0 ? 0 : 1 - designedShare(cases, context);
    const variance = checked
      ? strengthCheck * strengthCheck
      : overstrength * overstrength + era * era + undesigned * eraTable * eraTable;
    shares.push({
      what: checked ? 'the strength check itself' : 'strength beyond what a code asks, and scatter within an era',
      share: Math.min(1, (k * k * variance) / (sd * sd)),
      learnable: false,
    });
  }
  const rest = 1 - shares.reduce((sum, { share }) => sum + share, 0);
  if (rest > 0)
    shares.push({
      what: 'the period, the people that remain uncertain, and what the unknowns do together',
      share: rest,
      learnable: false,
    });
  return shares.sort((a, b) => b.share - a.share);
}

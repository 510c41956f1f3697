/** Where the uncertainty of a building's priority comes from: shares of the variance of ln S, the largest first. */
import type { Building } from '../building.js';
import { mixtureMoments } from '../priority/mixture.js';
import { shareOf } from '../priority/learnable.js';
import type { Unknown, Unknowns } from '../priority/learnable.js';
import { casesOf } from './cases.js';
import { slopeFor } from './context.js';
import { peopleOf } from './people.js';
import type { AssessContext, ContextSpectrum } from './context.js';
import { isChecked } from './strength-check.js';
import { designedShare, unknownsOf } from './unknowns.js';

export interface SpreadShare {
  readonly what: string;
  /** The same in a word. */
  readonly word: string;
  readonly share: number;
  /** A visit can find it out. */
  readonly learnable: boolean;
}

const WORDS: Readonly<Record<Unknown, readonly [what: string, word: string]>> = {
  system: ['lateral system unknown', 'system'],
  year: ['year of construction unknown', 'year'],
  height: ['height inferred', 'height'],
  irregularity: ['irregularities not on record', 'irregularities'],
  use: ['use unknown', 'use'],
  occupants: ['people not counted', 'people'],
  drawings: ['no drawings: the era’s table speaks', 'drawings'],
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
  const shares = learnableShares(unknowns);
  const { spreads, rankBy } = context.settings;
  const add = (what: string, word: string, variance: number): void => {
    if (variance > 1e-12) shares.push({ what, word, share: Math.min(1, variance / (sd * sd)), learnable: false });
  };
  const k = slopeFor(context, spectrum.name);
  if (rankBy === 'people')
    add('people and their hours, however well known', 'people', peopleLeft(building, unknowns, context));
  if (rankBy !== 'demand' && building.capacity_sa_g > 0)
    add('the finished assessment itself', 'assessment', k * k * spreads.assessedCapacity * spreads.assessedCapacity);
  if (rankBy !== 'demand' && !(building.capacity_sa_g > 0)) {
    const cases = casesOf(building, context);
    const checked = typeof cases !== 'string' && cases.list.every((which) => isChecked(building, which, context));
    const { overstrength, era, eraTable, strengthCheck } = spreads;
    // where nothing was designed for earthquakes no drawing settles what the least strength is worth
    const undesigned =
      typeof cases === 'string' || building.design_base_shear_coefficient > 0 ? 0 : 1 - designedShare(cases, context);
    const variance = checked
      ? strengthCheck * strengthCheck
      : overstrength * overstrength + era * era + undesigned * eraTable * eraTable;
    add(
      checked ? 'the strength check itself' : 'strength as built, beyond what its code asked',
      'strength',
      k * k * variance,
    );
  }
  const rest = 1 - shares.reduce((sum, { share }) => sum + share, 0);
  const together = unknowns.learnable.filter(({ values }) => values !== null).length > 1;
  if (rest > 1e-9)
    shares.push({
      what: together ? 'the error of the period, and what the unknowns do together' : 'the error of the period',
      word: 'period',
      share: rest,
      learnable: false,
    });
  return shares.sort((a, b) => b.share - a.share);
}

/** Of each unknown; where neither use nor people are known the two tell part of the same and stand together. */
function learnableShares(unknowns: Unknowns): SpreadShare[] {
  const { learnable } = unknowns;
  const count = learnable.find(({ beside }) => beside !== undefined);
  const shareWithUse = (): number =>
    learnable
      .filter((one) => one === count || one.unknown === count?.beside?.unknown)
      .reduce((sum, one) => sum + shareOf(unknowns, one === count ? { ...one, tau: one.beside!.tau } : one), 0);
  return learnable.flatMap((one): SpreadShare[] => {
    if (count !== undefined && one.unknown === count.beside!.unknown) return [];
    return one === count
      ? [{ what: 'use and people unknown', word: 'use and people', share: shareWithUse(), learnable: true }]
      : [{ what: WORDS[one.unknown][0], word: WORDS[one.unknown][1], share: shareOf(unknowns, one), learnable: true }];
  });
}

/** Variance of ln S that is left of the people once all is found out of them that a visit can. */
function peopleLeft(building: Building, { learnable }: Unknowns, context: AssessContext): number {
  const people = peopleOf(building, context);
  if (typeof people === 'string') return 0;
  const sigma = context.assumed.peopleWeight * people.sigma;
  let left = sigma * sigma;
  for (const { unknown, tau, beside } of learnable) {
    if (unknown !== 'use' && unknown !== 'occupants') continue;
    const takes = Number(beside?.tau ?? tau);
    left -= takes * takes;
  }
  return Math.max(left, 0);
}

/** Moduli where the row does not give them: by material and era, with the ends of their ranges. */
import type { Building } from '../building.js';
import { apply } from '../formula.js';
import { CRACKED_MODULUS, CRACKING } from './cracking.js';
import { ACI_CONCRETE, FEMA_MASONRY, FEMA_MASONRY_STRENGTH } from './materials.js';
import type { Assumed, RouteContext } from './route-mass.js';

/** Concrete strength (MPa, cylinder) of ordinary buildings begun before each year; the last for later ones [judgement]. */
const CONCRETE_STRENGTH_MPA: readonly (readonly [before: number, strength: number])[] = [
  [1930, 14],
  [1960, 17],
  [1980, 21],
  [Infinity, 28],
];
/** Where the year is not known [judgement]. */
const CONCRETE_STRENGTH_UNKNOWN_YEAR_MPA = 21;

/** Modulus over that of the formula: 20 % either way by the era, 15 % where the strength is on record (documents differ by as much). */
const CONCRETE_RANGE: Readonly<Record<Assumed, readonly [byEra: number, known: number]>> = {
  usual: [1, 1],
  soft: [0.8, 0.85],
  stiff: [1.2, 1.15],
};
const MASONRY_CONDITION: Readonly<Record<Assumed, string>> = { usual: 'fair', soft: 'poor', stiff: 'good' };
/** Reinforced masonry: 1500 psi, the usual specified strength [common practice, no source]; range of the modulus [judgement]. */
const REINFORCED_MASONRY_STRENGTH_MPA = 10.3;
const REINFORCED_MASONRY_RANGE: Readonly<Record<Assumed, number>> = { usual: 1, soft: 0.6, stiff: 1.6 };
const CRACKING_BY: Readonly<Record<Assumed, number>> = {
  usual: CRACKING.default,
  soft: CRACKING.least,
  stiff: CRACKING.most,
};
/** Structural steel, MPa: 29,000 ksi, from memory. */
export const STEEL_MODULUS_MPA = 200_000;

/** What stands in for materials that are not on record, for the fingerprint of the catalogue. */
export const ASSUMED_MATERIALS = {
  CONCRETE_STRENGTH_MPA: CONCRETE_STRENGTH_MPA.map(([before, strength]) => [String(before), strength] as const),
  CONCRETE_STRENGTH_UNKNOWN_YEAR_MPA,
  CONCRETE_RANGE,
  MASONRY_CONDITION,
  REINFORCED_MASONRY_STRENGTH_MPA,
  REINFORCED_MASONRY_RANGE,
  STEEL_MODULUS_MPA,
};

/** The middle of the equally likely years; NaN when none is known. */
function yearOf(building: Building): number {
  const sorted = [...building.years].sort((a, b) => a - b);
  return sorted[(sorted.length - 1) >> 1] ?? NaN;
}

/** Modulus of gross concrete, MPa. */
export function concreteModulus({ building, assumed, trace }: RouteContext): number {
  const given = building.structure?.concrete_strength_MPa ?? NaN;
  const year = yearOf(building);
  const concrete_strength_MPa =
    given > 0
      ? given
      : Number.isNaN(year)
        ? CONCRETE_STRENGTH_UNKNOWN_YEAR_MPA
        : (CONCRETE_STRENGTH_MPA.find(([before]) => year < before)?.[1] ?? CONCRETE_STRENGTH_UNKNOWN_YEAR_MPA);
  const when = Number.isNaN(year) ? 'year not known' : `built about ${String(year)}`;
  trace?.value(
    'concrete_strength_MPa',
    concrete_strength_MPa,
    given > 0 ? 'given' : 'default',
    given > 0 ? 'from the inventory' : `ordinary concrete, ${when} [judgement]; its modulus is known to about 20 %`,
  );
  const modulus = apply(ACI_CONCRETE, { concrete_strength_MPa }, trace);
  return modulus * CONCRETE_RANGE[assumed][given > 0 ? 1 : 0];
}

/** Modulus of unreinforced clay masonry before cracking, MPa. */
export function masonryModulus({ assumed, trace }: RouteContext): number {
  const masonry_condition = MASONRY_CONDITION[assumed];
  trace?.value(
    'masonry_condition',
    masonry_condition,
    'default',
    'not surveyed; good and poor bound the range [judgement]',
  );
  const masonry_strength_MPa = apply(FEMA_MASONRY_STRENGTH, { masonry_condition }, trace);
  return apply(FEMA_MASONRY, { masonry_strength_MPa }, trace);
}

/** Modulus of reinforced masonry before cracking, MPa. */
export function reinforcedMasonryModulus({ assumed, trace }: RouteContext): number {
  const masonry_strength_MPa = REINFORCED_MASONRY_STRENGTH_MPA;
  trace?.value(
    'masonry_strength_MPa',
    masonry_strength_MPa,
    'default',
    '1500 psi, the usual specified strength [common practice, no source]; the modulus 0.6 to 1.6 times [judgement]',
  );
  return apply(FEMA_MASONRY, { masonry_strength_MPa }, trace) * REINFORCED_MASONRY_RANGE[assumed];
}

/** The modulus that cracking leaves, MPa. */
export function crackedModulus(modulus_MPa: number, { assumed, trace }: RouteContext): number {
  const cracking_factor = CRACKING_BY[assumed];
  trace?.value(
    'cracking_factor',
    cracking_factor,
    'default',
    'half of the gross stiffness (EN 1998-1 4.3.1(7)); 0.3 to 0.7 by other documents [judgement]',
  );
  return apply(CRACKED_MODULUS, { modulus_MPa, cracking_factor }, trace);
}

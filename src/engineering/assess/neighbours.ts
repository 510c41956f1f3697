/** Whether two buildings may strike each other: the gap between them against what both need. Flags for a reader, no part of the priority. */
import type { Building } from '../building.js';
import { GAP_ALIGNED, GAP_BY_HEIGHT, GAP_CORRELATION, GAP_DOUBLE_DIFFERENCE, GAP_SRSS } from '../demand/separation.js';
import { formatNumber, formatShare } from '../format.js';
import { apply } from '../formula.js';
import type { Trace } from '../trace.js';
import { casesOf } from './cases.js';
import { chooseSpectrum } from './choose-spectrum.js';
import { readAt, slopeFor } from './context.js';
import type { AssessContext } from './context.js';
import { demandsOf, swayShareAt } from './demands.js';
import type { SwayProfile } from './demands.js';
import { leadingCase } from './leading.js';

/** How far a building sways: of its two directions the larger, as the row does not say which faces the neighbour. */
export interface Sway {
  readonly id: string;
  readonly height_m: number;
  readonly period_s: number;
  readonly roof_displacement_m: number;
  /** How it grows with the height; null: evenly [judgement]. */
  readonly profile: SwayProfile | null;
  /** S_a on the plateau of its spectrum. */
  readonly plateau_g: number;
}

/** Sway of the leading case; null where the building cannot be assessed. */
export function swayOf(building: Building, context: AssessContext): Sway | null {
  if (!(building.height_m.value > 0) || !(building.storeys.value > 0)) return null;
  const choice = chooseSpectrum(context, building, 0);
  const cases = casesOf(building, context);
  if (typeof choice === 'string' || typeof cases === 'string') return null;
  const leading = leadingCase(building, cases, choice, slopeFor(context, choice.spectrum.name), context);
  if (typeof leading === 'string') return null;
  const { longitudinal: a, transverse: b } = demandsOf(building, cases, choice, leading, context);
  const { period_s, roof_displacement_m, profile } = a.roof_displacement_m >= b.roof_displacement_m ? a : b;
  const plateau_g = readAt(choice.spectrum, choice.spectrum.compiled.plateau_from_s);
  return { id: building.id, height_m: building.height_m.value, period_s, roof_displacement_m, profile, plateau_g };
}

export interface Neighbour {
  readonly gap_m: number;
  /** How the gap is known. */
  readonly how: string;
  readonly floors_aligned: 'yes' | 'no' | null;
}

/** What a gap falls short of, none of it where it is wide enough. */
export interface Closeness {
  readonly gap_m: number;
  /** By the root of the squares, of which 0.7 where floors are at one level. */
  readonly needed_m: number;
  /** By the double difference: never more than the root of the squares. */
  readonly double_difference_m: number;
  /** By height alone. */
  readonly by_height_m: number;
  readonly short: boolean;
  readonly shortByHeight: boolean;
  /** One is half as tall again as the other, or more. */
  readonly muchTaller: boolean;
  /** Reasons that make striking worse. */
  readonly worse: readonly string[];
}

/** What the needed gap is, in words. */
export function neededWords(floors_aligned: Neighbour['floors_aligned']): string {
  return floors_aligned === 'yes' ? '0.7 of the root of the squares, floors at one level' : 'root of the squares';
}

/** Whether floors are at one level, in words. */
export function floorsWords(floors_aligned: Neighbour['floors_aligned']): string {
  if (floors_aligned === null) return 'not known';
  return floors_aligned === 'yes' ? 'at one level' : 'not at one level';
}

const DAMPING = 0.05;
/** Taller by this share, or more: the shorter strikes the shaft of the other (NZ and US guidance, from memory). */
const MUCH_TALLER = 1.5;

/** Level of seismicity of ASCE/SEI 41-17 Table 2-4 by S_DS, from memory: moderate from 0.33 g, high from 0.5 g. */
function seismicity(plateau_g: number): keyof typeof GAP_BY_HEIGHT {
  return plateau_g >= 0.5 ? 'high' : plateau_g >= 0.33 ? 'moderate' : 'low';
}

/** The gap between two buildings against what they need. */
export function closenessOf(
  one: Sway,
  other: Sway,
  { gap_m, how, floors_aligned }: Neighbour,
  trace?: Trace,
): Closeness {
  const shorter_height_m = Math.min(one.height_m, other.height_m);
  const shareOf = ({ profile, height_m }: Sway): number => swayShareAt(profile, height_m, shorter_height_m);
  const at = (sway: Sway): number => sway.roof_displacement_m * shareOf(sway);
  const words = (sway: Sway): string => {
    if (sway.height_m <= shorter_height_m) return '';
    const how = sway.profile === null ? 'taken to grow evenly with the height [judgement]' : 'by the shape of its sway';
    return `: ${formatShare(shareOf(sway))} of that of its roof, ${how}`;
  };
  const both = { displacement_1_m: at(one), displacement_2_m: at(other) };
  trace?.heading(`Gap to ${other.id} (no part of the priority)`);
  trace?.value('gap_m', gap_m, how.startsWith('given') ? 'given' : 'computed', how);
  trace?.value(
    'displacement_1_m',
    both.displacement_1_m,
    'computed',
    `of ${one.id} at ${formatNumber(shorter_height_m, 3)} m, the height of the shorter${words(one)}`,
  );
  trace?.value('displacement_2_m', both.displacement_2_m, 'computed', `of ${other.id} there${words(other)}`);
  const aligned = floors_aligned === 'yes';
  const needed_m = apply(aligned ? GAP_ALIGNED : GAP_SRSS, both, trace);
  const periods = { damping_1: DAMPING, damping_2: DAMPING, period_1_s: one.period_s, period_2_s: other.period_s };
  const correlation = Math.min(1, apply(GAP_CORRELATION, periods, trace));
  const double_difference_m = apply(GAP_DOUBLE_DIFFERENCE, { ...both, correlation }, trace);
  const byHeight = apply(
    GAP_BY_HEIGHT[seismicity(Math.max(one.plateau_g, other.plateau_g))],
    { shorter_height_m },
    trace,
  );
  const muchTaller = Math.max(one.height_m, other.height_m) >= MUCH_TALLER * shorter_height_m;
  const worse = [
    ...(floors_aligned === 'no' ? ['floors not at one level: a slab may strike columns at mid-height'] : []),
    ...(muchTaller ? ['one is half as tall again as the other'] : []),
  ];
  const short = gap_m < needed_m;
  trace?.choice({
    question: `Gap to ${other.id}`,
    taken: short
      ? `short: ${formatNumber(gap_m, 3)} m where ${formatNumber(needed_m, 3)} m are needed`
      : 'wide enough by the root of the squares',
    because:
      gap_m < byHeight
        ? `short by the height rule too (${formatNumber(byHeight, 3)} m)`
        : `${short ? 'though not' : 'and'} by the height rule, which asks ${formatNumber(byHeight, 3)} m`,
    others: [],
  });
  for (const what of worse)
    trace?.value('makes striking worse', what, 'computed', 'guidance of New Zealand and the US, from memory');
  return {
    gap_m,
    needed_m,
    double_difference_m,
    by_height_m: byHeight,
    short,
    shortByHeight: gap_m < byHeight,
    muchTaller,
    worse,
  };
}

/** Things a reader must know about a result, as codes with their words. */
import type { Building } from '../building.js';
import { DIRECTIONS } from '../direction.js';
import { siteCloseness } from '../site/closeness.js';
import type { Cases } from './case-memory.js';
import type { SpectrumChoice } from './choose-spectrum.js';
import type { AssessContext } from './context.js';
import type { LeadingCase } from './leading.js';
import { isChecked } from './strength-check.js';
import { isUndesigned } from './terms.js';

export const FLAGS: Readonly<Record<string, string>> = {
  'system-unknown': 'The lateral system is not known; the table of system chances speaks.',
  'year-unknown': 'The year of construction is not known; the years of like buildings stand in.',
  'height-inferred': 'The height is inferred.',
  'storeys-inferred': 'The number of storeys is inferred.',
  'default-spectrum':
    "The site class, zone or spectrum is not known or not named; the study's default spectrum is read.",
  'class-differs': 'The site class on record is not that of the shear-wave velocity; the velocity is read.',
  'velocity-unknown': 'The shear-wave velocity is not known; the site class on record is read.',
  'estimates-differ': 'Two estimates of the period are a factor of 2 or more apart.',
  'beyond-spectrum': 'The period is longer than the publication of the spectrum covers.',
  'beyond-formula': 'The building is taller than the height formula is meant for.',
  'stiffness-assumed':
    'The stiffness behind the period rests on assumed values: modulus, cracking, or what the row does not give.',
  'at-site-period': 'The period of a direction is within 15 % of that of the ground.',
  'near-site-period': 'The period of a direction is within 25 % of that of the ground.',
  'grows-into-site-period': 'Stiffer than the ground; in strong shaking the period may grow into that of the ground.',
  'near-edition-change': 'Built within a few years of a change of code; both editions count.',
  'soft-storey-read': 'A soft storey is read from storey stiffness or the height of the first storey.',
  'torsion-read': 'Torsion is read from the wall areas: one wall has most of a direction.',
  'reentrant-corner-read': 'A re-entrant corner is read from the footprint.',
  'setback-read': 'A setback is read from floor area, storeys and footprint.',
  'strength-check': 'The capacity is that of the columns, walls or braces of the first storey, not that of a code.',
  'not-designed': 'The drawings show no design for earthquakes.',
  'design-level-unknown': 'The level of the design coefficient is not stated; both levels count.',
};

const SITE_FLAGS = {
  close: 'at-site-period',
  near: 'near-site-period',
  'grows-into': 'grows-into-site-period',
} as const;

const BY_CLOSENESS = ['close', 'near', 'grows-into'] as const;

/** The closer of the two directions to the period of the ground; null when both are apart, or the ground's is not on record. */
function closestToSite({ directions }: LeadingCase, { structure }: Building): (typeof BY_CLOSENESS)[number] | null {
  const site_period_s = structure?.site_period_s ?? NaN;
  if (!(site_period_s > 0)) return null;
  const found = DIRECTIONS.map((direction) => siteCloseness(directions[direction].period_s, site_period_s));
  return BY_CLOSENESS.find((closeness) => found.includes(closeness)) ?? null;
}

/** Codes of the flags that apply, in the order of FLAGS; `read` are the irregularities read from numbers. */
export function flagsOf(
  building: Building,
  cases: Cases,
  { spectrum, byDefault, classFlag }: SpectrumChoice,
  leading: LeadingCase,
  disagreement: number,
  read: readonly string[],
  context: AssessContext,
): readonly string[] {
  const flags: string[] = [];
  if (!cases.systemKnown) flags.push('system-unknown');
  if (building.years.length !== 1) flags.push('year-unknown');
  if (building.height_m.origin !== 'given') flags.push('height-inferred');
  if (building.storeys.origin !== 'given') flags.push('storeys-inferred');
  if (byDefault) flags.push('default-spectrum');
  if (classFlag !== null) flags.push(classFlag);
  if (disagreement >= 2) flags.push('estimates-differ');
  const { longitudinal, transverse } = leading.directions;
  if (Math.max(longitudinal.period_s, transverse.period_s) > spectrum.valid_to_s) flags.push('beyond-spectrum');
  const limit = leading.formula?.limits.find(({ input }) => input === 'height_m');
  if (limit?.to !== undefined && building.height_m.value > limit.to) flags.push('beyond-formula');
  if (leading.stiffnessAssumed) flags.push('stiffness-assumed');
  const site = closestToSite(leading, building);
  if (site !== null) flags.push(SITE_FLAGS[site]);
  if (building.years.length === 1 && cases.systemKnown && cases.list.length > 1) flags.push('near-edition-change');
  for (const name of read) flags.push(`${name.replaceAll('_', '-')}-read`);
  if (context.settings.rankBy !== 'demand' && isChecked(building, cases.list[0]!, context, leading.governing))
    flags.push('strength-check');
  if (isUndesigned(building)) flags.push('not-designed');
  const { design_base_shear_coefficient: coefficient, design_level: level } = building;
  if (coefficient > 0 && (level === null || level === 'none')) flags.push('design-level-unknown');
  return flags;
}

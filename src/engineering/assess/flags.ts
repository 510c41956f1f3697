/** Things a reader must know about a result, as codes with their words. */
import type { Building } from '../building.js';
import type { Cases } from './case-memory.js';
import type { AssessContext, ContextSpectrum } from './context.js';
import type { LeadingCase } from './leading.js';

export const FLAGS: Readonly<Record<string, string>> = {
  'system-unknown': 'The lateral system is not known; the table of system chances speaks.',
  'year-unknown': 'The year of construction is not known; the years of like buildings stand in.',
  'height-inferred': 'The height is inferred.',
  'storeys-inferred': 'The number of storeys is inferred.',
  'default-spectrum': "The site class or zone is not known or not named; the study's default spectrum is read.",
  'estimates-differ': 'Two estimates of the period are a factor of 2 or more apart.',
  'beyond-spectrum': 'The period is longer than the publication of the spectrum covers.',
  'beyond-formula': "The building is outside the height formula's published range.",
  'near-edition-change': 'Built within a few years of a change of code; both editions count.',
  'design-level-unknown': 'The level of the design coefficient is not stated; both levels count.',
};

/** Codes of the flags that apply, in the order of FLAGS. */
export function flagsOf(
  building: Building,
  cases: Cases,
  defaultSpectrum: boolean,
  leading: LeadingCase,
  disagreement: number,
  spectrum: ContextSpectrum,
  context: AssessContext,
): readonly string[] {
  const flags: string[] = [];
  if (!cases.systemKnown) flags.push('system-unknown');
  if (building.years.length !== 1) flags.push('year-unknown');
  if (building.height_m.origin !== 'given') flags.push('height-inferred');
  if (building.storeys.origin !== 'given') flags.push('storeys-inferred');
  if (defaultSpectrum) flags.push('default-spectrum');
  if (disagreement >= 2) flags.push('estimates-differ');
  const { longitudinal, transverse } = leading.directions;
  if (Math.max(longitudinal.period_s, transverse.period_s) > spectrum.compiled.valid_to_s)
    flags.push('beyond-spectrum');
  const limit = context.formulas[leading.system].limits.find(({ input }) => input === 'height_m');
  if (limit?.to !== undefined && building.height_m.value > limit.to) flags.push('beyond-formula');
  if (building.years.length === 1 && cases.systemKnown && cases.list.length > 1) flags.push('near-edition-change');
  if (building.design_base_shear_coefficient > 0 && building.design_level === null) flags.push('design-level-unknown');
  return flags;
}

/** The study's irregularities: by whose limits they are told from numbers, what they take off, how likely they are where nothing is said. */
import { IRREGULARITY } from '../engineering/assess/settings.js';
import { IRREGULARITY_EDITION_IDS } from '../engineering/irregularity/editions.js';
import { number, strict, word } from './fields.js';

const factor = (name: keyof typeof IRREGULARITY.factors, what: string) =>
  number({ above: 0, to: 1 }).default(IRREGULARITY.factors[name]).describe(`Capacity is multiplied by it: ${what}.`);
const chance = (value: number, what: string) =>
  number({ from: 0, to: 1 }).default(value).describe(`Chance of ${what} where the row does not say.`);
const bySystem = (name: 'soft_storey' | 'weak_storey', what: string) =>
  strict({
    frame: chance(IRREGULARITY.chances[name].frame, `${what}, where a frame carries sideways load`),
    wall: chance(IRREGULARITY.chances[name].wall, `${what}, where walls or braces do`),
  })
    .prefault({})
    .describe(`Chance of ${what} where the row does not say, by what carries sideways load.`);

export const IrregularitySchema = strict({
  edition: word(IRREGULARITY_EDITION_IDS)
    .default(IRREGULARITY.edition)
    .describe('The code whose limits tell irregularities from storey stiffness, heights, areas and footprint.'),
  factors: strict({
    soft_or_weak_storey: factor('soft_or_weak_storey', 'a soft or a weak storey, or both'),
    torsion: factor('torsion', 'torsion'),
    reentrant_corner: factor('reentrant_corner', 'a re-entrant corner'),
    setback: factor('setback', 'a setback'),
    mass_irregularity: factor('mass_irregularity', 'a floor far heavier than the next'),
  })
    .prefault({})
    .describe('What an irregularity leaves of the capacity [defaults judgement].'),
  chances: strict({
    soft_storey: bySystem('soft_storey', 'a soft storey'),
    weak_storey: bySystem('weak_storey', 'a weak storey'),
    torsion: chance(IRREGULARITY.chances.torsion, 'torsion'),
    reentrant_corner: chance(IRREGULARITY.chances.reentrant_corner, 'a re-entrant corner'),
    setback: chance(IRREGULARITY.chances.setback, 'a setback'),
    mass_irregularity: chance(IRREGULARITY.chances.mass_irregularity, 'a mass irregularity'),
  })
    .prefault({})
    .describe(
      'Chances where a row neither says nor shows it; 0 throughout: a blank counts as none [defaults judgement].',
    ),
});

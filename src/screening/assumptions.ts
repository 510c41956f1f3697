/** The assumptions register and the cautions that every report carries. */
import { ASSUMED, assumedWith } from '../engineering/assess/assumed.js';
import type { Assumed } from '../engineering/assess/assumed.js';
import { NO_IRREGULARITY_CHANCES, SPREADS } from '../engineering/assess/settings.js';
import type { AssessSettings, Spreads } from '../engineering/assess/settings.js';
import { IRREGULARITY_EDITIONS } from '../engineering/irregularity/editions.js';
import { standardNote, standardRead } from '../engineering/period/choose.js';
import type { Assumption } from '../engineering/page-contract.js';
import { spectrumAssumptions } from './assumptions-spectra.js';
import type { SlopeFound } from './slopes.js';

const JUDGEMENT = 'judgement';

/** What a run assumed, each with its value and source. */
export function assumptionsOf(settings: AssessSettings, slopes: readonly SlopeFound[]): readonly Assumption[] {
  const { spreads, period, codeHistory } = settings;
  const assumed = assumedWith(settings.assumed);
  const { ductility, leastCoefficient, overstrength, retrofitLevel, peopleWeight, importanceWeight } = assumed;
  const same = (a: unknown, b: unknown): boolean => JSON.stringify(a) === JSON.stringify(b);
  /** Judgement, unless the study states another value. */
  const bySpread = (...names: readonly (keyof Spreads)[]): string =>
    names.every((name) => spreads[name] === SPREADS[name]) ? JUDGEMENT : 'study';
  const byAssumed = (name: keyof Assumed): string => (same(assumed[name], ASSUMED[name]) ? JUDGEMENT : 'study');
  const either = (...sources: readonly string[]): string => (sources.includes('study') ? 'study' : JUDGEMENT);
  const read = standardRead(period.standard, period.basis);
  const list: Assumption[] = [
    {
      id: 'period-standard',
      statement: 'Height formulas read',
      value: `${read} (asked: ${period.standard}, ${period.basis})`,
      source: 'study',
    },
    ...(standardNote(read) === ''
      ? []
      : [{ id: 'period-standard-note', statement: standardNote(read), value: read, source: 'register of methods' }]),
    ...Object.entries(period.formulaFor).map(([system, id]) => ({
      id: `period-formula-${system}`,
      statement: `Formula tried first for ${system}`,
      value: id,
      source: 'study',
    })),
    ...(period.switchedOff.length === 0
      ? []
      : [
          {
            id: 'period-switched-off',
            statement: 'Methods not used',
            value: period.switchedOff.join(', '),
            source: 'study',
          },
        ]),
    {
      id: 'period-bias',
      statement: 'Known bias: walls by code formula run long, essential buildings short; not corrected',
      value: 'none',
      source: 'published comparisons, restated',
    },
    {
      id: 'period-spread',
      statement: 'Method error of a height formula, σ of ln T',
      value: String(spreads.heightFormula),
      source: bySpread('heightFormula'),
    },
    {
      id: 'period-one-error',
      statement: 'One error of the period for both directions of a building',
      value: 'shared',
      source: JUDGEMENT,
    },
    {
      id: 'stiffness-spread',
      statement: 'Method error of a period from given storey stiffness, σ of ln T',
      value: String(spreads.storeyStiffness),
      source: bySpread('storeyStiffness'),
    },
    {
      id: 'stiffness-models-spread',
      statement: 'Method error of a period from sections or braces, from walls, from sway under gravity, σ of ln T',
      value: `${String(spreads.storeySections)}, ${String(spreads.storeyWalls)}, ${String(spreads.storeySway)}`,
      source: bySpread('storeySections', 'storeyWalls', 'storeySway'),
    },
    {
      id: 'cracking',
      statement: 'Stiffness of cracked concrete and masonry over uncracked, and its band',
      value: '0.5; 0.3 to 0.7',
      source: 'EN 1998-1 4.3.1(7); the band judgement',
    },
    {
      id: 'stiffness-bias',
      statement:
        'Known bias: bare cracked frames from columns and beams run 1.2 to 1.8 times the height formula; not corrected',
      value: 'none',
      source: 'seen on the demo; infill and partitions are left out of such a model',
    },
    {
      id: 'foundation',
      statement: 'Flexible ground lengthens periods from stiffness only, where h/(Vs T) is above 0.1',
      value: 'ν 0.35, G/G₀ 0.7, density 1.8 t/m³',
      source: 'Veletsos and Meek, Pais and Kausel, from memory; the values judgement',
    },
    {
      id: 'amplitude',
      statement: 'Ambient and forced periods lengthened before they read the spectrum',
      value: '× 1.3; infilled frames and unreinforced masonry × 1.5',
      source: 'judgement within published ratios',
    },
    {
      id: 'hold-plateau',
      statement: 'Below the start of the plateau S_a is held at the plateau',
      value: settings.holdPlateau ? 'yes' : 'no',
      source: settings.holdPlateau ? 'several codes; judgement' : 'study',
    },
    {
      id: 'slope',
      statement: 'Slope k of the hazard curve',
      value: slopes.map(({ spectrum, k }) => `${k.toFixed(2)} for ${spectrum}`).join(', '),
      source: settings.slopeSource,
    },
    {
      id: 'spectrum-level',
      statement: 'Ordinates of the spectra are taken as the study gives them, without an error of their own',
      value: 'as stated',
      source: 'study',
    },
    ...spectrumAssumptions(settings),
    {
      id: 'code-history',
      statement: 'Code history of the place',
      value:
        codeHistory === null
          ? 'none: no seismic design assumed'
          : `${codeHistory.place}, enforced from ${String(codeHistory.seismic_design_enforced_from)}`,
      source: 'study',
    },
    {
      id: 'adoption-lag',
      statement: 'Years from an edition to the buildings designed to it',
      value: codeHistory === null ? 'none' : String(codeHistory.adoption_lag_years),
      source: 'study, default 2 [judgement]',
    },
    {
      id: 'edition-change',
      statement: 'Within this many years of a change both editions count',
      value: String(spreads.editionChange_years),
      source: bySpread('editionChange_years'),
    },
    {
      id: 'retrofit-level',
      statement: "Share of its year's code that a retrofit reached, where the row does not say",
      value: String(retrofitLevel),
      source: byAssumed('retrofitLevel'),
    },
    {
      id: 'reductions',
      statement: 'K, R_w, R, q and their like of the editions by system',
      value: 'registers of engineering/capacity',
      source: 'from memory of the editions',
    },
    {
      id: 'floor',
      statement: 'Least strength coefficient',
      value: String(leastCoefficient),
      source: byAssumed('leastCoefficient'),
    },
    {
      id: 'overstrength',
      statement: 'Overstrength Ω, and σ of its logarithm',
      value: `${overstrength.toFixed(1)}; ${String(spreads.overstrength)}`,
      source: either(byAssumed('overstrength'), bySpread('overstrength')),
    },
    {
      id: 'strength-check',
      statement: 'Capacity from areas of columns, walls or braces where a row has them, and σ of its logarithm',
      value: `${settings.strengthCheck?.method ?? 'none'}; ${String(spreads.strengthCheck)}`,
      source: 'study; factors from memory, spread judgement',
    },
    {
      id: 'ductility',
      statement: 'Ductility by detailing class: none, before, after, special',
      value: `${ductility.brittle.toFixed(1)} or ${ductility.none.toFixed(1)}; ${ductility.before.toFixed(1)}; ${ductility.after.toFixed(1)}; ${ductility.special.toFixed(1)}`,
      source: byAssumed('ductility'),
    },
    {
      id: 'era-spread',
      statement: 'Spread of the era table and of the building within its era, σ',
      value: `${String(spreads.eraTable)} and ${String(spreads.era)}`,
      source: bySpread('era', 'eraTable'),
    },
    {
      id: 'shared-spread',
      statement: 'Errors common to all buildings of one code edition (its table) and of one spectrum (site class), σ',
      value: `${String(spreads.eraTable)} and ${String(spreads.siteClass)}`,
      source: bySpread('eraTable', 'siteClass'),
    },
    ...irregularityAssumptions(settings),
    {
      id: 'system-prior',
      statement: 'Chances of the lateral system where it is not known',
      value:
        settings.systemPrior === null
          ? 'none named'
          : `${String(settings.systemPrior.length)} groups by use, storeys and year`,
      source: 'study',
    },
    {
      id: 'people',
      statement: 'People from floor area, density and hours of use; σ of ln E',
      value: `${String(spreads.peopleKnownUse)}, ${String(spreads.peopleUnknownUse)} with the use unknown, ${String(spreads.peopleCounted)} when counted`,
      source:
        either(byAssumed('uses'), bySpread('peopleKnownUse', 'peopleUnknownUse', 'peopleCounted')) === 'study'
          ? 'study; what it leaves out from memory or judgement'
          : 'densities from memory, hours and spreads judgement',
    },
    {
      id: 'people-weight',
      statement: 'Exponent of the people exposed in the priority',
      value: String(peopleWeight),
      source:
        byAssumed('peopleWeight') === 'study'
          ? 'policy of the study'
          : 'judgement: annual rate of demand over capacity, times people',
    },
    {
      id: 'importance',
      statement: 'Exponent of the importance factor in the priority; the factor is 1 where the row has none',
      value: String(importanceWeight),
      source: 'policy of the study',
    },
    { id: 'rank-by', statement: 'What is ranked', value: settings.rankBy, source: 'study' },
  ];
  return list;
}

/** Factors, chances and limits of irregularities. */
function irregularityAssumptions({ irregularity }: AssessSettings): readonly Assumption[] {
  const { factors, chances } = irregularity ?? NO_IRREGULARITY_CHANCES;
  const { soft_storey: soft, weak_storey: weak } = chances;
  const share = (chance: number): string => `${String(Math.round(chance * 1000) / 10)} %`;
  const set = 'study, defaults judgement';
  const factorsFound: Assumption = {
    id: 'irregularity',
    statement: 'Irregularities multiply capacity',
    value: `soft or weak storey ${String(factors.soft_or_weak_storey)}, torsion ${String(factors.torsion)}, re-entrant corner ${String(factors.reentrant_corner)}, setback ${String(factors.setback)}, mass ${String(factors.mass_irregularity)}`,
    source: set,
  };
  if (irregularity === undefined)
    return [{ ...factorsFound, value: `${factorsFound.value}; blank counts as none`, source: JUDGEMENT }];
  return [
    factorsFound,
    {
      id: 'irregularity-chances',
      statement: 'Chance of an irregularity where the row neither says nor shows it; the capacity is a mixture',
      value: `soft storey ${share(soft.frame)} of frames, ${share(soft.wall)} of others; weak storey ${share(weak.frame)}, ${share(weak.wall)}; torsion ${share(chances.torsion)}, re-entrant corner ${share(chances.reentrant_corner)}, setback ${share(chances.setback)}, mass ${share(chances.mass_irregularity)}`,
      source: set,
    },
    {
      id: 'irregularity-limits',
      statement: 'Limits that tell irregularities from storey stiffness, heights, areas and footprint',
      value: IRREGULARITY_EDITIONS[irregularity.edition].title,
      source: 'study',
    },
  ];
}

/** Of every run; what was looked at before it stands ahead of them (level-of-work.ts). */
export const CAUTIONS: readonly string[] = [
  'This is an order for further assessment, not a statement on the safety of any building.',
  'A low rank is not clearance.',
  'Ranks inside a tie group are not distinguishable.',
  'Shaking only: liquefaction, landslide, fault rupture, tsunami, fire and non-structural damage are not considered.',
  'Periods come from simplified formulas and may be off by a third or more; capacity is inferred mostly from the code of the era, not from the structure.',
  'Results hold for the inventory as supplied; inferred and defaulted values are marked.',
  'Not for decisions on occupancy, insurance, lending or valuation.',
  'Local codes govern, and a licensed engineer must review before anything is acted on.',
];

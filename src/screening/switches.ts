/** What a sensitivity run switches: every entry of the register of assumptions that can be, each to one or more other values. */
import { ASSUMED, assumedWith } from '../engineering/assess/assumed.js';
import type { Assumed } from '../engineering/assess/assumed.js';
import { RANK_BY, STRENGTH_CHECKS } from '../engineering/assess/settings.js';
import type { AssessSettings, RankBy, Spreads } from '../engineering/assess/settings.js';
import type { Assumption } from '../engineering/page-contract.js';
import type { Mark, Switch } from './switch.js';
import { irregularitySwitches } from './switches-irregularity.js';
import { periodSwitches } from './switches-period.js';
import { priorSwitches } from './switches-prior.js';

/** An entry of the register that is not switched, and why. */
export interface NotSwitched {
  readonly assumption: string;
  readonly statement: string;
  readonly why: string;
}

/** Rankings that use a part of the assessment: people count by `people` alone, capacity not by `demand`. */
const NEEDS_PEOPLE: readonly RankBy[] = ['people'];
const NEEDS_CAPACITY: readonly RankBy[] = ['people', 'ratio'];

/** All switches of a run's settings, in the order of the register; `uniform` system chances are always among them. */
export function switchesOf(settings: AssessSettings): readonly Switch[] {
  const is = (rankings: readonly RankBy[]): boolean => rankings.includes(settings.rankBy);
  return [
    ...periodSwitches(settings),
    ...slopeSwitches(settings, is(NEEDS_CAPACITY)),
    ...spectrumSwitches(settings),
    ...(is(NEEDS_CAPACITY) ? [...historySwitches(settings), ...capacitySwitches(settings)] : []),
    ...priorSwitches(settings),
    ...(is(NEEDS_PEOPLE) ? peopleSwitches(settings) : []),
    ...RANK_BY.filter((word) => word !== settings.rankBy).map((rankBy): Switch => {
      return { assumption: 'rank-by', to: rankBy, settings: { ...settings, rankBy } };
    }),
  ];
}

/** The settings with some of what is assumed taken otherwise. */
export function assuming(settings: AssessSettings, change: Partial<Assumed>): AssessSettings {
  return { ...settings, assumed: { ...assumedWith(settings.assumed), ...change } };
}

/** The settings with some spreads times `factor`. */
export function spreading(settings: AssessSettings, names: readonly (keyof Spreads)[], factor: number): AssessSettings {
  const changed = names.map((name): [string, number] => [name, settings.spreads[name] * factor]);
  return { ...settings, spreads: { ...settings.spreads, ...Object.fromEntries(changed) } };
}

/** The range that the method asks to be tested, 1.5 to 4. */
function slopeSwitches(settings: AssessSettings, counts: boolean): readonly Switch[] {
  if (!counts) return [];
  return [1.5, 2, 2.5, 3, 4]
    .filter((slope) => slope !== settings.slope)
    .map((slope) => ({
      assumption: 'slope',
      to: `${slope.toFixed(1)} everywhere`,
      settings: { ...settings, slope, slopeSource: 'stated' },
    }));
}

/** All levels of shaking together, and where places read different spectra each place alone. */
function spectrumSwitches(settings: AssessSettings): readonly Switch[] {
  const { levels } = settings;
  const scaledBy = (names: readonly string[], factor: number): AssessSettings =>
    assuming(settings, { spectrumFactor: Object.fromEntries(names.map((name) => [name, factor])) });
  const all = Object.keys(settings.spectra);
  const keys = Object.keys(levels[0]?.spectra ?? {});
  /** What the levels read for one site class or zone. */
  const readBy = (key: string): readonly string[] =>
    levels.flatMap(({ spectra }) => (spectra[key] === undefined ? [] : [spectra[key]]));
  const places = keys.length > 1 && keys.length <= MOST_PLACES ? keys : [];
  return [0.8, 1.2].flatMap((factor): readonly Switch[] => [
    { assumption: 'spectrum-level', to: `all × ${String(factor)}`, settings: scaledBy(all, factor) },
    ...places.map((key) => ({
      assumption: 'spectrum-level',
      to: `${key} alone × ${String(factor)}`,
      settings: scaledBy(readBy(key), factor),
    })),
  ]);
}

/** More places than this are not switched one by one. */
const MOST_PLACES = 8;

function historySwitches(settings: AssessSettings): readonly Switch[] {
  const history = settings.codeHistory;
  const spread = (editionChange_years: number): AssessSettings => ({
    ...settings,
    spreads: { ...settings.spreads, editionChange_years },
  });
  const ofHistory: readonly Switch[] =
    history === null
      ? []
      : [
          ...[10, -10].map((years) => ({
            assumption: 'code-history',
            to: `enforced ${String(Math.abs(years))} years ${years < 0 ? 'earlier' : 'later'}`,
            settings: {
              ...settings,
              codeHistory: {
                ...history,
                seismic_design_enforced_from: history.seismic_design_enforced_from + years,
              },
            },
          })),
          {
            assumption: 'code-history',
            to: 'no seismic design ever',
            settings: { ...settings, codeHistory: null },
          },
          ...[0, 5]
            .filter((lag) => lag !== history.adoption_lag_years)
            .map((adoption_lag_years) => ({
              assumption: 'adoption-lag',
              to: String(adoption_lag_years),
              settings: { ...settings, codeHistory: { ...history, adoption_lag_years } },
            })),
          ...[0, 6].map((years) => ({ assumption: 'edition-change', to: String(years), settings: spread(years) })),
        ];
  const { retrofitLevel } = assumedWith(settings.assumed);
  return [
    ...ofHistory,
    ...[0.5, 1]
      .filter((level) => level !== retrofitLevel)
      .map((level) => ({
        assumption: 'retrofit-level',
        to: String(level),
        settings: assuming(settings, { retrofitLevel: level }),
      })),
  ];
}

function capacitySwitches(settings: AssessSettings): readonly Switch[] {
  const { ductility } = assumedWith(settings.assumed);
  const one = (assumption: string, to: string, change: Partial<Assumed>, from?: string): Switch => {
    return { assumption, to, settings: assuming(settings, change), ...(from === undefined ? {} : { from }) };
  };
  /** μ - 1 times `factor` in every class. */
  const ductile = (factor: number): Assumed['ductility'] => ({
    brittle: 1 + factor * (ductility.brittle - 1),
    none: 1 + factor * (ductility.none - 1),
    before: 1 + factor * (ductility.before - 1),
    after: 1 + factor * (ductility.after - 1),
    special: 1 + factor * (ductility.special - 1),
  });
  return [
    ...[0.02, 0.08].map((leastCoefficient) => one('floor', String(leastCoefficient), { leastCoefficient })),
    ...[1.5, 3].map((overstrength) => one('overstrength', `Ω ${overstrength.toFixed(1)}`, { overstrength })),
    {
      assumption: 'overstrength',
      to: 'σ × 1.5',
      settings: spreading(settings, ['overstrength'], 1.5),
    },
    ...checkSwitches(settings),
    one('ductility', 'μ - 1 halved', { ductility: ductile(0.5) }),
    one('ductility', 'μ - 1 × 1.5', { ductility: ductile(1.5) }),
    one('ductility', 'μ 2.0 in every class', {
      ductility: { brittle: 2, none: 2, before: 2, after: 2, special: 2 },
    }),
    { assumption: 'era-spread', to: 'σ × 1.5', settings: spreading(settings, ['era', 'eraTable'], 1.5) },
    ...irregularitySwitches(settings),
  ];
}

/** The other methods, and none: then drawings or era give the capacities of those buildings too. */
function checkSwitches(settings: AssessSettings): readonly Switch[] {
  const { strengthCheck } = settings;
  if (strengthCheck === undefined) return [];
  return [
    ...STRENGTH_CHECKS.filter((method) => method !== strengthCheck.method).map((method): Switch => {
      return {
        assumption: 'strength-check',
        to: method,
        settings: { ...settings, strengthCheck: { ...strengthCheck, method } },
      };
    }),
    { assumption: 'strength-check', to: 'σ × 1.5', settings: spreading(settings, ['strengthCheck'], 1.5) },
  ];
}

function peopleSwitches(settings: AssessSettings): readonly Switch[] {
  const { uses, peopleWeight, importanceWeight } = assumedWith(settings.assumed);
  const withUses = (change: (values: Assumed['uses'][keyof Assumed['uses']]) => object): AssessSettings =>
    assuming(settings, {
      uses: Object.fromEntries(
        Object.entries(uses).map(([use, values]) => [use, { ...values, ...change(values) }]),
      ) as Assumed['uses'],
    });
  const marked = (mark: string, factor: number): AssessSettings =>
    withUses(({ verified, people_per_m2 }) =>
      verified === mark ? { people_per_m2: people_per_m2 * factor } : { people_per_m2 },
    );
  const { people_per_m2, hours_per_week } = ASSUMED.uses.other;
  const people = (to: string, from: string, changed: AssessSettings, mark: Mark = 'judgement'): Switch => {
    return { assumption: 'people', to, from, settings: changed, mark };
  };
  return [
    people(
      'densities all alike',
      'densities by use',
      withUses(() => ({ people_per_m2 })),
      'memory',
    ),
    people(
      'hours all alike',
      'hours by use',
      withUses(() => ({ hours_per_week })),
    ),
    ...[0.5, 2].map((factor) =>
      people(`judged densities × ${String(factor)}`, 'densities by use', marked('judgement', factor)),
    ),
    ...[0.67, 1.5].map((factor) =>
      people(`recalled densities × ${String(factor)}`, 'densities by use', marked('memory', factor), 'memory'),
    ),
    people(
      'σ × 1.5',
      'as registered',
      spreading(settings, ['peopleKnownUse', 'peopleUnknownUse', 'peopleCounted'], 1.5),
    ),
    // the milder one first: it is the one told with a run, and without people the study asks another question
    ...[0.5, 0]
      .filter((weight) => weight !== peopleWeight)
      .map((weight) => ({
        assumption: 'people-weight',
        to: String(weight),
        settings: assuming(settings, { peopleWeight: weight }),
      })),
    ...[0, 2]
      .filter((weight) => weight !== importanceWeight)
      .map((weight) => ({
        assumption: 'importance',
        to: String(weight),
        settings: assuming(settings, { importanceWeight: weight }),
      })),
  ];
}

/** The mark of a source in the register's words. */
export function markOf(source: string): Mark {
  // a slope that no second level gave
  if (source.includes('judgement') || source === 'assumed') return 'judgement';
  if (source.includes('memory')) return 'memory';
  if (source === 'two levels') return 'two levels';
  return /^study|^stated|policy/.test(source) ? 'study' : 'restated';
}

/** Why an entry of the register is not switched, by its id or the beginning of it. */
const REASONS: readonly (readonly [RegExp, string])[] = [
  [
    /^period-bias$/,
    'no publication gives the correction as a rule; the other standards and the ambient formulas stand in for it',
  ],
  [/^period-one-error$/, 'part of how the spread is put together'],
  [/^shared-spread$/, 'it moves chances and bands, not the order'],
  [/^cracking$/, 'a constant of the stiffness models; their bias is switched as a whole'],
  [/^foundation$/, 'a constant of the stiffness models; their bias is switched as a whole'],
  [/^amplitude$/, 'a constant of the records of measured periods'],
  [/^irregularity-limits$/, 'limits that tell what a row shows; the factors and the chances are switched'],
  [/^reductions$/, 'a table, not a number; overstrength and ductility are switched'],
  [/^site-class-/, 'the code is that of the spectra'],
  [/^spectrum-/, 'a remark on the spectrum; its level is switched'],
  [/^period-standard-note$/, 'a remark on the standard'],
];

/** The entries of the register that none of `switches` takes otherwise. */
export function notSwitched(register: readonly Assumption[], switches: readonly Switch[]): readonly NotSwitched[] {
  const done = new Set(switches.map(({ assumption }) => assumption));
  return register
    .filter(({ id }) => !done.has(id))
    .map(({ id, statement }) => ({
      assumption: id,
      statement,
      why: REASONS.find(([pattern]) => pattern.test(id))?.[1] ?? 'this ranking does not depend on it',
    }));
}

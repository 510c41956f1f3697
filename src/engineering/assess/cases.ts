/** The discrete unknowns of a building: system and era, each combination with its chance. */
import type { Building, System, Use } from '../building.js';
import { designOf } from './era-design.js';
import { entryOf, newMap, yearsNumber } from './case-memory.js';
import { isUndesigned } from './terms.js';
import type { Case, Cases, Design, EraChances } from './case-memory.js';
import { matchPrior, storeysClass } from '../prior/system-prior.js';
import { editionLabel, editionOf, eraChances } from './code-history.js';
import type { EditionId } from './code-history.js';
import type { AssessContext } from './context.js';

/** Lists the cases of `building`, or says why there are none. The same answer is kept for buildings alike in all it depends on. */
export function casesOf(building: Building, context: AssessContext): Cases | string {
  const { years, system } = building;
  const kept = context.caseMemory;
  const number = yearsNumber(years, kept);
  const undesigned = isUndesigned(building);
  // with both known the table of system chances says nothing
  const known = system !== null && years.length === 1;
  if (building.system_transverse === null && !(building.year_retrofitted > 0) && !undesigned) {
    const { priorClasses } = context;
    const byYears = known
      ? entryOf(kept.known, system, newMap<number, Cases | string>)
      : entryOf(
          entryOf(
            entryOf(kept.byPrior, system, newMap<Use | null, Map<number, Map<number, Cases | string>>>),
            priorClasses.uses.has(building.use) ? building.use : null,
            newMap<number, Map<number, Cases | string>>,
          ),
          storeysClass(priorClasses, building.storeys.value),
          newMap<number, Cases | string>,
        );
    let found = byYears.get(number);
    if (found === undefined) {
      found = listCases(building, context);
      if (kept.count < MOST_KEPT) {
        byYears.set(number, found);
        kept.count += 1;
      }
    }
    return found;
  }
  const strengthened =
    building.year_retrofitted > 0 ? `|${String(building.year_retrofitted)}|${String(building.retrofit_level)}` : '';
  const byPrior = known ? '' : `|${building.use}|${String(building.storeys.value)}`;
  const key = `${String(number)}|${system ?? ''}|${building.system_transverse ?? ''}|${String(undesigned)}${byPrior}${strengthened}`;
  const old = kept.cases.get(key);
  if (old !== undefined) return old;
  const made = listCases(building, context);
  if (kept.cases.size < MOST_KEPT) kept.cases.set(key, made);
  return made;
}

const MOST_KEPT = 50_000;

function listCases(building: Building, context: AssessContext): Cases | string {
  const { settings } = context;
  const retrofit = building.year_retrofitted;
  const built = building.years;
  const strengthened = retrofit > 0 && (built.length === 0 || retrofit >= Math.min(...built));
  const years = strengthened ? [retrofit] : built;
  const level = strengthened
    ? building.retrofit_level > 0
      ? building.retrofit_level
      : context.assumed.retrofitLevel
    : 1;
  const known = building.system;
  /** By system, then by edition, of a strengthened building with what it was built to. */
  const found = new Map<System, Map<string | null, Share>>();
  const priors = new Set<string>();
  // A building with neither a year nor neighbours that have one: every era of the place alike [judgement].
  const spread = years.length > 0 ? years : [NaN];
  // The system goes with the year of construction, not with the year of a retrofit.
  const systemYears = built.length > 0 ? built : [NaN];
  const { weights, prior } = yearWeights(building, spread, strengthened, context);
  if (prior !== null) priors.add(prior);
  const undesigned = isUndesigned(building) && !strengthened;
  for (const [at, year] of spread.entries()) {
    const eraList = undesigned ? UNDESIGNED : erasOf(year, context);
    for (const systemYear of strengthened ? systemYears : [year]) {
      let systems: readonly { readonly system: System; readonly chance: number }[];
      if (known !== null) systems = [{ system: known, chance: 1 }];
      else {
        if (settings.systemPrior === null) return 'system not known and the study names no table of system chances';
        const group = matchPrior(settings.systemPrior, building.use, building.storeys.value, systemYear);
        if (group === null) return 'system not known and no row of the table of system chances fits';
        priors.add(group.label);
        systems = group.chances;
      }
      const share = weights[at]! / (strengthened ? systemYears.length : 1);
      const before = strengthened ? builtEditions(systemYear, context) : NOT_STRENGTHENED;
      for (const { system, chance } of systems) {
        const byEdition = entryOf(found, system, newMap<string | null, Share>);
        for (const { era, chance: eraChance } of eraList)
          for (const { builtTo, chance: builtChance } of before) {
            const { edition } = era;
            const key = builtTo === null ? edition : `${edition ?? ''}|${builtTo.edition ?? ''}`;
            const more = share * chance * eraChance * builtChance;
            const old = byEdition.get(key);
            if (old === undefined) byEdition.set(key, { edition, builtTo, chance: more });
            else old.chance += more;
          }
      }
    }
  }
  const design = (system: System, edition: EditionId | null): Design =>
    designOf(system, edition, level, strengthened, context);
  const list: Case[] = [];
  for (const [system, byEdition] of found) {
    const system_transverse = building.system_transverse ?? system;
    for (const { edition, builtTo, chance } of byEdition.values()) {
      const longitudinal = design(system, edition);
      list.push({
        system,
        system_transverse,
        edition,
        label: editionLabel(edition),
        editionYear: edition === null ? 0 : editionOf(edition, settings.codeHistory!).year,
        retrofit_level: level,
        strengthened,
        builtTo,
        chance,
        design: {
          longitudinal,
          transverse: system_transverse === system ? longitudinal : design(system_transverse, edition),
        },
      });
    }
  }
  if (list.length > 1) list.sort((a, b) => b.chance - a.chance || (keyOf(a) < keyOf(b) ? -1 : 1));
  return {
    list,
    groups: groupBySystem(list),
    systemKnown: known !== null,
    prior: priors.size === 0 ? null : [...priors].join('; '),
  };
}

/** A case in the making. */
interface Share {
  readonly edition: EditionId | null;
  readonly builtTo: Case['builtTo'];
  chance: number;
}

function keyOf({ system, edition, builtTo }: Case): string {
  return `${system}|${edition ?? ''}${builtTo === null ? '' : `|${builtTo.edition ?? ''}`}`;
}

const NOT_STRENGTHENED = [{ builtTo: null, chance: 1 }] as const;

/** What a strengthened building was built to, by the year of its construction (NaN: not known). */
function builtEditions(
  year: number,
  context: AssessContext,
): readonly { readonly builtTo: Case['builtTo']; readonly chance: number }[] {
  return erasOf(year, context).map(({ era: { edition }, chance }) => ({
    builtTo: { edition, year: edition === null ? 0 : editionOf(edition, context.settings.codeHistory!).year },
    chance,
  }));
}

const UNDESIGNED: EraChances = [{ era: { edition: null, from: -Infinity, to: Infinity }, chance: 1 }];

/**
 * Chances of the years that a building may be of, equally likely by themselves. What is known of it speaks for some of them: its system by
 * the chance of that system in each year, drawings without a design for earthquakes by the chance of none (Bayes). What fits no year tells
 * nothing of it. `prior` names the rows of the table that were read.
 */
function yearWeights(
  building: Building,
  years: readonly number[],
  strengthened: boolean,
  context: AssessContext,
): { readonly weights: readonly number[]; readonly prior: string | null } {
  const even = years.map(() => 1 / years.length);
  if (strengthened || years.length === 1) return { weights: even, prior: null };
  const { systemPrior } = context.settings;
  const { system, use, storeys } = building;
  const read =
    system === null || systemPrior === null
      ? []
      : years.map((year) => matchPrior(systemPrior, use, storeys.value, year));
  const groups = read.filter((group) => group !== null);
  // a table with a gap among the years does not tell them apart
  const ofSystem = (at: number): number =>
    groups.length < years.length ? 1 : (groups[at]!.chances.find((one) => one.system === system)?.chance ?? 0);
  const ofNone = (year: number): number =>
    isUndesigned(building)
      ? erasOf(year, context).reduce((sum, { era, chance }) => (era.edition === null ? sum + chance : sum), 0)
      : 1;
  const weighed = years.map((year, at) => ofSystem(at) * ofNone(year));
  const total = weighed.reduce((sum, weight) => sum + weight, 0);
  if (!(total > 0)) return { weights: even, prior: null };
  const labels = new Set(groups.map(({ label }) => label));
  return { weights: weighed.map((weight) => weight / total), prior: labels.size < 2 ? null : [...labels].join('; ') };
}

/** The eras of a year with their chances; of an unknown year (NaN) all alike. */
function erasOf(year: number, { eras: all, settings, caseMemory }: AssessContext): EraChances {
  return entryOf(caseMemory.eras, year, () => {
    const eras = all.length === 0 ? [{ edition: null, from: -Infinity, to: Infinity }] : all;
    return Number.isNaN(year)
      ? eras.map((era) => ({ era, chance: 1 / eras.length }))
      : eraChances(eras, year, settings.spreads.editionChange_years);
  });
}

/** Cases of one pair of systems stand together, in order of first appearance. */
function groupBySystem(list: readonly Case[]): readonly (readonly Case[])[] {
  if (list.length === 1) return [list];
  // the system across is the same function of the other for all cases of a building
  const groups = new Map<System, Case[]>();
  for (const which of list) entryOf(groups, which.system, (): Case[] => []).push(which);
  return [...groups.values()];
}

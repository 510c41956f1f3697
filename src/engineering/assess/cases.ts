/** The discrete unknowns of a building: system and era, each combination with its chance. */
import type { Building, System } from '../building.js';
import { poolNumber } from './case-memory.js';
import type { Case, Cases } from './case-memory.js';
import { matchPrior } from '../prior/system-prior.js';
import { eraChances } from './code-history.js';
import type { AssessContext } from './context.js';

const DEFAULT_RETROFIT_LEVEL = 0.75;

/** Lists the cases of `building`, or says why there are none. The same answer is kept for buildings alike in all it depends on. */
export function casesOf(building: Building, context: AssessContext): Cases | string {
  const { years, system } = building;
  const kept = context.caseMemory;
  const common =
    system !== null && years.length === 1 && building.system_transverse === null && !(building.year_retrofitted > 0);
  if (common) {
    let byYear = kept.plain.get(system);
    if (byYear === undefined) kept.plain.set(system, (byYear = new Map<number, Cases | string>()));
    const year = years[0]!;
    let found = byYear.get(year);
    if (found === undefined) byYear.set(year, (found = listCases(building, context)));
    return found;
  }
  // a pool of years is one array for all who share it
  const pool = years.length === 1 ? String(years[0]) : years.length === 0 ? '-' : `p${String(poolNumber(years, kept))}`;
  const strengthened =
    building.year_retrofitted > 0 ? `|${String(building.year_retrofitted)}|${String(building.retrofit_level)}` : '';
  const key =
    building.system === null
      ? `${pool}||${building.system_transverse ?? ''}|${building.use}|${String(building.storeys.value)}${strengthened}`
      : `${pool}|${building.system}|${building.system_transverse ?? ''}${strengthened}`;
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
  const level = strengthened ? (building.retrofit_level > 0 ? building.retrofit_level : DEFAULT_RETROFIT_LEVEL) : 1;
  const known = building.system;
  const found = new Map<string, Case>();
  const priors = new Set<string>();
  const eras = context.eras.length === 0 ? [{ edition: null, from: -Infinity, to: Infinity }] : context.eras;
  // A building with neither a year nor neighbours that have one: every era of the place alike [judgement].
  const spread = years.length > 0 ? years : [NaN];
  // The system goes with the year of construction, not with the year of a retrofit.
  const systemYears = built.length > 0 ? built : [NaN];
  for (const year of spread) {
    const eraList = Number.isNaN(year)
      ? eras.map((era) => ({ era, chance: 1 / eras.length }))
      : eraChances(eras, year, settings.spreads.editionChange_years);
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
      const share = 1 / spread.length / (strengthened ? systemYears.length : 1);
      for (const { system, chance } of systems) {
        for (const { era, chance: eraChance } of eraList) {
          const key = `${system}|${era.edition ?? ''}`;
          const old = found.get(key);
          const more = share * chance * eraChance;
          found.set(key, {
            system,
            system_transverse: building.system_transverse ?? system,
            edition: era.edition,
            retrofit_level: level,
            strengthened,
            chance: (old?.chance ?? 0) + more,
          });
        }
      }
    }
  }
  const list = [...found.entries()]
    .sort(([ka, a], [kb, b]) => b.chance - a.chance || (ka < kb ? -1 : 1))
    .map(([, value]) => value);
  return {
    list,
    groups: groupBySystem(list),
    systemKnown: known !== null,
    prior: priors.size === 0 ? null : [...priors].join('; '),
  };
}

/** Cases of one pair of systems stand together, in order of first appearance. */
function groupBySystem(list: readonly Case[]): readonly (readonly Case[])[] {
  if (list.length === 1) return [list];
  const groups = new Map<string, Case[]>();
  for (const which of list) {
    const key = `${which.system}|${which.system_transverse}`;
    const group = groups.get(key);
    if (group === undefined) groups.set(key, [which]);
    else group.push(which);
  }
  return [...groups.values()];
}

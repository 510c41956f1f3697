/** Sites in words: main buildings with what is joined to them. */
import { formatCount, formatNumber, formatShare } from '../../engineering/format.js';
import type { PageSites, Site, SiteMember } from '../../engineering/page-contract.js';

/** Sites told in a report; the file sites.csv has all. */
export const SITES_TOLD = 50;

export const SITES_HEAD = ['Site', 'Buildings', 'Best rank', 'Chance of one in the list', 'Expected in the list', 'People on average', 'Members'] as const;

/** "SC-007 Founders House", or the identifier alone. */
export function titleOf({ id, name }: Pick<Site, 'id' | 'name'>): string {
  return name === null || name === '' || name === id ? id : `${id} ${name}`;
}

/** Place of a member: "rank 8, 62 %", or why it has none. */
export function memberPlace({ rank, chance, not_ranked }: SiteMember): string {
  return rank === null ? `not ranked: ${not_ranked ?? 'not known'}` : `rank ${formatCount(rank)}, ${formatShare(chance ?? NaN)}`;
}

/** A count that is expected, and no false nought. */
export function expectedWords(value: number): string {
  return value > 0 && value < 0.01 ? 'under 0.01' : formatNumber(value, 2);
}

/** The figures of a site, as they stand between its name and its members. */
export function figureCells(site: Site): readonly string[] {
  const shown = (value: number | null, format: (value: number) => string): string => (value === null ? '–' : format(value));
  return [
    formatCount(site.buildings),
    shown(site.best_rank, formatCount),
    shown(site.chance, formatShare),
    shown(site.expected_in_list, expectedWords),
    shown(site.people_exposed, (value) => formatNumber(value, 3)),
  ];
}

/** What is left out of the members told; empty where none is. */
export function membersLeft({ buildings, members }: Site): string {
  return buildings > members.length ? `and ${formatCount(buildings - members.length)} more in sites.csv` : '';
}

/** How many sites there are, and which is likeliest to hold a place. */
export function sitesSentence({ all, buildings, sites }: PageSites): string {
  const [first] = sites;
  const counted = all === 1 ? `One site has ${formatCount(buildings)} buildings` : `${formatCount(all)} sites have two buildings or more, ${formatCount(buildings)} in all`;
  const likeliest =
    first?.chance == null || first.best_rank === null
      ? ''
      : ` Likeliest to have one in the list is ${titleOf(first)}: chance ${formatShare(first.chance)}, best rank ${formatCount(first.best_rank)}.`;
  return `${counted}: a main building with the wings and additions that the inventory calls part of it. One visit sees them all, so they are told together; each is ranked by itself.${likeliest}`;
}

/** How the figures are meant. */
export const SITES_NOTE =
  'Chance: that at least one building of the site truly belongs to the list, what is not known of each taken as independent of the others. Buildings of one site often share it, being of one time and on one ground: then the chance is lower, down to that of the likeliest member. Expected: how many of them are expected in the list. People: present on average, as far as known.';

/** Which sites a report leaves out; empty where it tells all. */
export function sitesLeft({ all }: PageSites, told: number): string {
  return all > told ? `The first ${formatCount(told)} of ${formatCount(all)} sites; all of them are in sites.csv.` : '';
}

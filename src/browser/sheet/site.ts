/** The site a building belongs to, with its other members. */
import { formatCount, formatNumber, formatShare } from '../../engineering/format.js';
import { sheetAddress } from '../address.js';
import { el } from '../dom.js';
import type { Portfolio } from '../portfolio.js';

/** Nothing for a building that stands by itself. */
export function siteParts(p: Portfolio, i: number): readonly HTMLElement[] {
  const site = p.page.sites.sites[p.page.buildings.site[i] ?? NaN];
  if (site === undefined) return [];
  const { id, name, buildings, chance, expected_in_list, people_exposed } = site;
  const called = name === null || name === id ? id : `${id} ${name}`;
  const sentence = [
    `One of the ${formatCount(buildings)} buildings of the site of ${called}.`,
    chance === null || expected_in_list === null
      ? 'None of them is ranked.'
      : `At least one of them belongs to the list with a chance of ${formatShare(chance)}, what is not known of each taken as independent; ${expected_in_list < 0.01 ? 'under 0.01' : formatNumber(expected_in_list, 2)} of them are expected there.`,
    people_exposed === null ? '' : `People present on average in all: ${formatNumber(people_exposed, 3)}.`,
  ];
  const others = site.members.filter((member) => member.id !== p.id(i));
  const left = buildings - 1 - others.length;
  return [
    el('h3', {}, 'Site'),
    el('p', {}, sentence.filter((text) => text !== '').join(' ')),
    el(
      'ul',
      { class: 'plain', id: 'site-members' },
      ...others.map((member) =>
        el(
          'li',
          {},
          p.placeOf(member.id) === undefined ? member.id : el('a', { href: sheetAddress(member.id) }, member.id),
          `${member.name === null ? '' : ` ${member.name}`}: ${member.rank === null ? `not ranked, ${member.not_ranked ?? ''}` : `rank ${formatCount(member.rank)}, chance ${formatShare(member.chance ?? NaN)}`}`,
        ),
      ),
      left > 0 ? el('li', {}, `and ${formatCount(left)} more in sites.csv`) : null,
    ),
  ];
}

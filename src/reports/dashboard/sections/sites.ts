/** Main buildings with their wings: what one visit sees, told together. */
import { h } from 'preact';
import type { ComponentChild } from 'preact';
import type { PageData, Site } from '../../../engineering/page-contract.js';
import { SITES_HEAD, SITES_NOTE, SITES_TOLD, figureCells, memberPlace, membersLeft, sitesLeft, sitesSentence } from '../../sites/words.js';
import { Section } from '../elements.js';
import { sheetAddress } from './list.js';

function Row({ site, shown }: { readonly site: Site; readonly shown: ReadonlySet<string> }): ComponentChild {
  const link = (id: string): ComponentChild => (shown.has(id) ? h('a', { href: sheetAddress(id) }, id) : id);
  const left = membersLeft(site);
  const members = site.members.map((member) => h('li', null, link(member.id), ` ${memberPlace(member)}`));
  return h(
    'tr',
    null,
    h('th', { scope: 'row', class: 'name' }, link(site.id), site.name === null ? null : ` ${site.name}`),
    figureCells(site).map((cell) => h('td', { class: 'num' }, cell)),
    h('td', { class: 'members' }, h('ul', { class: 'bare' }, members, left === '' ? null : h('li', null, left))),
  );
}

/** Null where no building is part of another. */
export function SitesSection({ data }: { readonly data: PageData }): ComponentChild {
  const { sites, buildings } = data;
  if (sites.all === 0) return null;
  const told = sites.sites.slice(0, SITES_TOLD);
  const shown = new Set(buildings.inputs.id);
  const left = sitesLeft(sites, told.length);
  return h(
    Section,
    { id: 'sites', title: 'Sites: main buildings with their wings' },
    h('p', null, sitesSentence(sites)),
    h('p', { class: 'quiet' }, left === '' ? SITES_NOTE : `${SITES_NOTE} ${left}`),
    told.length === 0 ? null : h('p', { class: 'quiet narrow-only' }, 'The table is wider than this screen: it scrolls sideways.'),
    told.length === 0
      ? null
      : h(
          'div',
          { class: 'scroll long', role: 'region', 'aria-label': 'The sites', tabIndex: 0 },
          h(
            'table',
            { id: 'sites-table' },
            h('caption', { class: 'unseen' }, 'Sites, the likeliest to have a building in the list first'),
            h('thead', null, h('tr', null, SITES_HEAD.map((title, i) => h('th', { scope: 'col', class: i > 0 && i < SITES_HEAD.length - 1 ? 'num' : undefined }, title)))),
            h('tbody', null, told.map((site) => h(Row, { site, shown }))),
          ),
        ),
  );
}

/** The sites in the summary. */
import type { PageData } from '../../engineering/page-contract.js';
import { markdownTable, markdownText } from '../markdown.js';
import { SITES_HEAD, SITES_NOTE, SITES_TOLD, figureCells, memberPlace, membersLeft, sitesLeft, sitesSentence, titleOf } from './words.js';

/** Nothing where no building is part of another. */
export function sitesPart({ sites }: Pick<PageData, 'sites'>): readonly string[] {
  if (sites.all === 0) return [];
  const told = sites.sites.slice(0, SITES_TOLD);
  const rows = told.map((site) => [
    markdownText(titleOf(site)),
    ...figureCells(site),
    [...site.members.map((member) => `${markdownText(member.id)} (${markdownText(memberPlace(member))})`), membersLeft(site)].filter((text) => text !== '').join('; '),
  ]);
  return [
    '## Sites',
    markdownText(sitesSentence(sites)),
    ...(rows.length === 0 ? [] : [markdownTable(SITES_HEAD, rows, [1, 2, 3, 4, 5])]),
    [SITES_NOTE, sitesLeft(sites, told.length)].filter((text) => text !== '').join(' '),
  ];
}

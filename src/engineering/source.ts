/** Where a published method stands. */
export interface Source {
  readonly standard: string;
  readonly edition: string;
  readonly clause: string;
}

/** How the numbers were come by: read in the publication, read in another that restates it, recalled; or ours. */
export type Verified = 'printed' | 'restated' | 'memory' | 'judgement' | 'mechanics';

/** "ASCE/SEI 7-22, 12.8.2", "EN 1998-1:2004, 4.3.3", "Birge 1932, …": authors take no hyphen before the year. */
export function cite(source: Source): string {
  const joint = source.standard.startsWith('EN ') ? ':' : /^\d{4}$/.test(source.edition) ? ' ' : '-';
  const name = source.edition === '' ? source.standard : `${source.standard}${joint}${source.edition}`;
  return source.clause === '' ? name : `${name}, ${source.clause}`;
}

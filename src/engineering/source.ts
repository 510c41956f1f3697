/** Where a published method stands. */
export interface Source {
  readonly standard: string;
  readonly edition: string;
  readonly clause: string;
}

/** How the numbers were come by: read in the publication, read in another that restates it, recalled; or ours. */
export type Verified = 'printed' | 'restated' | 'memory' | 'judgement' | 'mechanics';

/** "ASCE/SEI 7-22, 12.8.2" */
export function cite(source: Source): string {
  const name = source.edition === '' ? source.standard : `${source.standard}-${source.edition}`;
  return source.clause === '' ? name : `${name}, ${source.clause}`;
}

/** Which errors buildings have in common. */

/** The common errors in the ln S of buildings, whose parts are labelled with the edition they stand for. */
export interface SharedErrors {
  /** Names of the editions, by label; draws are keyed by them. */
  readonly labels: readonly string[];
  readonly zones: readonly Zone[];
  /** Per building, the number of its zone. */
  readonly zone: Uint16Array;
}

/** Buildings that read one spectrum. */
export interface Zone {
  readonly name: string;
  /** Standard deviation of ln S from the table of an edition; the spread of a labelled part counts it already. */
  readonly eraLoad: number;
  /** The same from the site class; no part counts it. */
  readonly siteLoad: number;
}

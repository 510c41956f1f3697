/** Work space of an assessment, reused from building to building; holds no state between them. */
import { PERIOD_NODES } from '../numeric/nodes.js';
import { MixtureBuilder, MixturePool } from '../priority/mixture.js';

export interface Scratch {
  /** Where the mixtures of ln S are kept; a new one lets the old be collected. */
  readonly pool: MixturePool;
  readonly periodPool: MixturePool;
  readonly score: MixtureBuilder;
  readonly period: MixtureBuilder;
  /** exp(σ z) at the nodes of the period's error for the last σ. */
  readonly stretch: Float64Array;
  stretchSigma: number;
  /** The worse direction at the nodes. */
  readonly worse: Float64Array;
  /** Arrays of one value a node, lent until the next building. */
  readonly lent: Float64Array[];
  lentCount: number;
}

export function newScratch(): Scratch {
  return {
    pool: new MixturePool(),
    periodPool: new MixturePool(),
    score: new MixtureBuilder(),
    period: new MixtureBuilder(),
    stretch: new Float64Array(PERIOD_NODES.z.length),
    stretchSigma: NaN,
    worse: new Float64Array(PERIOD_NODES.z.length),
    lent: [],
    lentCount: 0,
  };
}

/** An array of one value a node, to be filled whole; it is lent again once `lentCount` is set back. */
export function lend(scratch: Scratch): Float64Array {
  const { lent, lentCount } = scratch;
  let array = lent[lentCount];
  if (array === undefined) lent.push((array = new Float64Array(PERIOD_NODES.z.length)));
  scratch.lentCount = lentCount + 1;
  return array;
}

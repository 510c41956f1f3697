/** Work space of an assessment, reused from building to building; holds no state between them. */
import { PERIOD_NODES } from '../numeric/nodes.js';
import { MixtureBuilder, MixturePool } from '../priority/mixture.js';

const N = PERIOD_NODES.z.length;

export interface Scratch {
  /** Where the mixtures of ln S are kept; a new one lets the old be collected. */
  readonly pool: MixturePool;
  readonly periodPool: MixturePool;
  readonly score: MixtureBuilder;
  readonly period: MixtureBuilder;
  /** Period and demand at the nodes, per direction. */
  readonly period_s: readonly [Float64Array, Float64Array];
  readonly sa_g: readonly [Float64Array, Float64Array];
  /** exp(σ z) at the nodes for the last σ, per direction. */
  readonly stretch: readonly [Float64Array, Float64Array];
  readonly stretchSigma: Float64Array;
}

export function newScratch(): Scratch {
  const pair = (): readonly [Float64Array, Float64Array] => [new Float64Array(N), new Float64Array(N)];
  return {
    pool: new MixturePool(),
    periodPool: new MixturePool(),
    score: new MixtureBuilder(),
    period: new MixtureBuilder(),
    period_s: pair(),
    sa_g: pair(),
    stretch: pair(),
    stretchSigma: new Float64Array([NaN, NaN]),
  };
}

/** Random numbers of a world, keyed by what they are for: the same whoever asks first, however the rows stand. */
import { normalQuantile } from '../../../src/engineering/numeric/normal.js';
import { hashText, philox } from '../../../src/engineering/numeric/philox.js';

export interface Draws {
  /** In (0, 1), for the purpose `what`. */
  readonly uniform: (what: string) => number;
  /** Standard normal. */
  readonly normal: (what: string) => number;
}

const words = new Uint32Array(4);
const hashes = new Map<string, number>();

/** Hashes of the few purposes are kept. */
function hashOf(what: string): number {
  let hash = hashes.get(what);
  if (hash === undefined) hashes.set(what, (hash = hashText(what)));
  return hash;
}

/** The draws of world `world` for what `id` names: a building, or the world itself. */
export function drawsOf(seed: number, world: number, id: string): Draws {
  const key = hashText(id);
  const uniform = (what: string): number => {
    philox(world, hashOf(what), key, 0, seed, 0x7a11e7, words);
    return (words[0]! + 0.5) / 4294967296;
  };
  return { uniform, normal: (what) => normalQuantile(uniform(what)) };
}

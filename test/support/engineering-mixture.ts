/** Mixtures for tests. */
import { MixtureBuilder, MixturePool } from '../../src/engineering/priority/mixture.js';
import type { Mixture } from '../../src/engineering/priority/mixture.js';
import type { RankInput } from '../../src/engineering/priority/rank.js';
import { mixtureQuantile } from '../../src/engineering/priority/mixture.js';
import type { Random } from './engineering-random.js';

export interface Part {
  readonly weight: number;
  readonly mean: number;
  readonly sd: number;
}

/** Exactly these parts, not gathered; means increasing, as everywhere. */
export function mixtureOf(unordered: readonly Part[]): Mixture {
  const parts = [...unordered].sort((a, b) => a.mean - b.mean);
  const of = (pick: (part: Part) => number): Float64Array => Float64Array.from(parts, pick);
  return {
    weight: of(({ weight }) => weight),
    mean: of(({ mean }) => mean),
    sd: of(({ sd }) => sd),
    from: 0,
    to: parts.length,
  };
}

export const normalOf = (mean: number, sd: number): Mixture => mixtureOf([{ weight: 1, mean, sd }]);

/** The parts gathered as the assessment gathers them. */
export function gathered(parts: readonly Part[]): Mixture {
  const builder = new MixtureBuilder();
  for (const { weight, mean, sd } of parts) builder.add(weight, mean, sd);
  return builder.gather(new MixturePool());
}

/** Mixtures of one to three normals with medians some units apart. */
export function randomMixtures(count: number, { uniform, normal }: Random): readonly Mixture[] {
  return Array.from({ length: count }, () => {
    const middle = 1.5 * normal();
    const parts = Array.from({ length: 1 + Math.floor(3 * uniform()) }, () => ({
      weight: 0.1 + uniform(),
      mean: middle + normal(),
      sd: 0.3 + uniform(),
    }));
    const total = parts.reduce((sum, { weight }) => sum + weight, 0);
    return mixtureOf(parts.map((part) => ({ ...part, weight: part.weight / total })));
  });
}

export function rankInput(mixtures: readonly Mixture[]): RankInput {
  return {
    id: mixtures.map((_, i) => `B-${String(i)}`),
    mixtures,
    median: mixtures.map((mixture) => mixtureQuantile(mixture, 0.5, 0)),
    people: mixtures.map(() => 1),
  };
}

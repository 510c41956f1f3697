/** Means over worlds with their standard errors, and the tables that are printed. */
import { STRATEGIES } from './measure.js';
import type { Miss, Strategy, Surveyed } from './measure.js';

export interface Mean {
  readonly mean: number;
  /** Standard error of the mean. */
  readonly error: number;
}

export function meanOf(values: readonly number[]): Mean {
  const n = values.length;
  const mean = values.reduce((sum, value) => sum + value, 0) / n;
  const squares = values.reduce((sum, value) => sum + (value - mean) * (value - mean), 0);
  return { mean, error: n > 1 ? Math.sqrt(squares / (n - 1) / n) : NaN };
}

const WIDTH = 16;
const cell = (text: string): string => text.padStart(WIDTH);
const withError = ({ mean, error }: Mean, digits: number, factor = 1): string =>
  `${(factor * mean).toFixed(digits)} ± ${(factor * error).toFixed(digits)}`;

/** The table of one kind of world: `promised` is what the plan says after each of `hours`. */
export function tableOf(
  worlds: readonly Surveyed[],
  hours: readonly number[],
  promised: readonly number[],
  before: number,
  least: number,
): readonly string[] {
  const first = worlds[0]!;
  const strategies = STRATEGIES.filter((strategy) => first.after[strategy].length === hours.length);
  const over = (of: (world: Surveyed) => number): Mean => meanOf(worlds.map(of));
  const at = (strategy: Strategy, h: number, of: (miss: Miss) => number): Mean =>
    over(({ after }) => of(after[strategy][h]!));
  const lines: string[] = [
    `  wrong places before   ${withError(
      over((world) => world.before.places),
      2,
    )}, the program says ${before.toFixed(2)}; of the list's S missed ${withError(
      over((world) => world.before.share),
      1,
      100,
    )} %`,
    `  everything known that a visit finds out   ${withError(
      over(({ bound }) => bound.places),
      2,
    )}, the program says ${least.toFixed(2)}; S missed ${withError(
      over(({ bound }) => bound.share),
      1,
      100,
    )} %`,
  ];
  const head = (title: string): string => `  ${title.padEnd(30)}${hours.map((h) => cell(`${String(h)} h`)).join('')}`;
  const rows = (title: string, of: (strategy: Strategy, h: number) => string): void => {
    lines.push(head(title));
    for (const strategy of strategies)
      lines.push(`    ${strategy.padEnd(28)}${hours.map((_, h) => cell(of(strategy, h))).join('')}`);
  };
  rows('wrong places after', (strategy, h) =>
    withError(
      at(strategy, h, ({ places }) => places),
      2,
    ),
  );
  lines.push(`    ${'the plan promises'.padEnd(28)}${promised.map((value) => cell(value.toFixed(2))).join('')}`);
  rows('mended an hour', (strategy, h) =>
    withError(
      over(({ before: then, after }) => (then.places - after[strategy][h]!.places) / hours[h]!),
      3,
    ),
  );
  rows("% of the list's S missed", (strategy, h) =>
    withError(
      at(strategy, h, ({ share }) => share),
      1,
      100,
    ),
  );
  return [...lines, ...verdicts(worlds, hours, promised, strategies)];
}

/** Beyond this many standard errors a difference is one. */
const SURE = 2;

/** Where the plan loses, and where it promises too much, in words. */
function verdicts(
  worlds: readonly Surveyed[],
  hours: readonly number[],
  promised: readonly number[],
  strategies: readonly Strategy[],
): readonly string[] {
  const lines: string[] = [];
  for (const [what, of, unit, digits] of [
    ['wrong places', ({ places }: Miss) => places, '', 2],
    ['S missed', ({ share }: Miss) => 100 * share, ' points of %', 1],
  ] as const)
    for (const strategy of strategies) {
      if (strategy === 'plan') continue;
      const lost = hours.flatMap((h, i) => {
        const { mean, error } = meanOf(worlds.map(({ after }) => of(after.plan[i]!) - of(after[strategy][i]!)));
        return mean > SURE * error ? [`${withError({ mean, error }, digits)}${unit} after ${String(h)} h`] : [];
      });
      const words = strategy === 'replanned' ? 'planning anew gains' : `the plan LOSES to "${strategy}" by`;
      if (lost.length > 0) lines.push(`  ${words} ${what}: ${lost.join(', ')}`);
    }
  const tooMuch = hours.flatMap((h, i) => {
    const { mean, error } = meanOf(worlds.map(({ after }) => after.plan[i]!.places - promised[i]!));
    return mean > SURE * error ? [`${withError({ mean, error }, 2)} places after ${String(h)} h`] : [];
  });
  if (tooMuch.length > 0) lines.push(`  the plan PROMISES TOO MUCH: ${tooMuch.join(', ')}`);
  if (lines.length === 0) lines.push('  the plan loses to none of them and promises no more than it keeps');
  const tooLittle = hours.flatMap((h, i) => {
    const { mean, error } = meanOf(worlds.map(({ after }) => promised[i]! - after.plan[i]!.places));
    return mean > SURE * error ? [`${withError({ mean, error }, 2)} places after ${String(h)} h`] : [];
  });
  if (tooLittle.length > 0) lines.push(`  the plan keeps more than it promises: ${tooLittle.join(', ')}`);
  return lines;
}

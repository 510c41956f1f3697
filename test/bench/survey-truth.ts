/**
 * npm run bench:survey [-- assessor-2014.csv]: a survey judged by a truth that the planner does not know. The true attributes of all buildings
 * are drawn in a world; visits find some of them out; the buildings are ranked again; the list is held against the true one. First in
 * worlds as the study believes them (there the promises must hold), then in shifted ones. On the demo, and on a real assessor's table
 * where its file is named: with the study of test/fixtures/assessor, whose hazard and code history are assumed.
 */
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { throughTheProgram } from './survey/cross-check.js';
import { tableOf } from './survey/figures.js';
import { Survey } from './survey/measure.js';
import { copyOf, portfolioOf } from './survey/portfolio.js';
import type { Portfolio } from './survey/portfolio.js';
import { choicesOf } from './survey/strategies.js';
import type { Choices } from './survey/strategies.js';
import { believedWorld, shiftedWorld } from './survey/world.js';
import type { World } from './survey/world.js';

const HOURS = [4, 8, 16, 40, 80];
const MOST_H = HOURS.at(-1)!;
const SEED = 20_260_611;
const REAL_LIST = 100;

interface Kind {
  readonly title: string;
  readonly world: (number: number, portfolio: Portfolio) => World;
}

const KINDS: readonly Kind[] = [
  { title: 'worlds as the study believes them', world: (number) => believedWorld(number, SEED) },
  {
    title: 'shifted worlds: other chances and years, spreads × 1.5, one era table × 0.6',
    world: (number, { buildings, contexts }) => shiftedWorld(number, SEED, buildings, contexts.believed),
  },
];

function say(line: string): void {
  process.stdout.write(`${line}\n`);
}

function measure(
  portfolio: Portfolio,
  choices: Choices,
  { title, world }: Kind,
  worlds: number,
  replanIn: number,
): void {
  const run = (count: number, replan: boolean) =>
    Array.from({ length: count }, (_, number) =>
      new Survey(portfolio, world(number, portfolio)).by(choices, HOURS, replan),
    );
  const { plan } = portfolio;
  const promised = HOURS.map(
    (h) => plan.steps.findLast(({ hours_so_far }) => hours_so_far <= h + 1e-9)?.expected_wrong_places ?? NaN,
  );
  const started = performance.now();
  const table = (count: number, replan: boolean) =>
    tableOf(run(count, replan), HOURS, promised, plan.expected_wrong_before, plan.expected_wrong_least);
  say(`\n ${String(worlds)} ${title}`);
  for (const line of table(worlds, false)) say(line);
  if (replanIn > 0) {
    say(`\n ${String(replanIn)} of these with the plan made anew every eight hours beside it`);
    for (const line of table(replanIn, true)) say(line);
  }
  say(`  (${((performance.now() - started) / 1000).toFixed(0)} s)`);
}

async function demo(worlds: number): Promise<void> {
  const copy = copyOf('data-demo/study.yaml');
  try {
    const portfolio = await portfolioOf(copy.path, MOST_H);
    const choices = choicesOf(portfolio, MOST_H);
    head('the demo', portfolio);
    for (const kind of KINDS) measure(portfolio, choices, kind, worlds, Math.ceil(worlds / 5));
    say(`\n ${await throughTheProgram(copy.path, portfolio, choices, KINDS[1]!.world(0, portfolio))}`);
  } finally {
    copy.remove();
  }
}

async function real(file: string, worlds: number): Promise<void> {
  const folder = mkdtempSync(join(tmpdir(), 'swaymark-truth-'));
  try {
    const fixture = 'test/fixtures/assessor';
    const study = readFileSync(join(fixture, 'study.yaml'), 'utf8')
      .replace('file: ../assessor-excerpt.csv', `file: ${JSON.stringify(resolve(file))}`)
      .replace('list_size: 5}', `list_size: ${String(REAL_LIST)}}`);
    writeFileSync(join(folder, 'study.yaml'), study);
    writeFileSync(join(folder, 'system-prior.csv'), readFileSync(join(fixture, 'system-prior.csv')));
    const portfolio = await portfolioOf(join(folder, 'study.yaml'), MOST_H);
    const choices = choicesOf(portfolio, MOST_H);
    head(`the assessor's table ${file} (hazard and code history assumed)`, portfolio);
    for (const kind of KINDS) measure(portfolio, choices, kind, worlds, 0);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

function head(title: string, { buildings, listSize, plan }: Portfolio): void {
  say(
    `${title}: ${String(buildings.length)} ranked, a list of ${String(listSize)}, ${String(plan.weighed)} weighed; plan of ${String(MOST_H)} h: ${String(plan.steps.length)} visits to ${String(plan.buildings)} buildings`,
  );
}

const named = process.argv.slice(2).filter((argument) => !argument.startsWith('--'));
const fewer = process.argv.includes('--few');
await demo(fewer ? 20 : 200);
const [file] = named;
if (file === undefined || !existsSync(file))
  say(
    `\nthe real inventory is SKIPPED: ${file === undefined ? 'name the assessor’s table, as in npm run bench:survey -- ../shared/data/assessor-2014.csv' : `there is no file ${file}`}`,
  );
else {
  say('');
  await real(file, fewer ? 4 : 100);
}

/** The built command, run as a process of its own. */
import { spawn, spawnSync } from 'node:child_process';
import { cpSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

export const ROOT = dirname(dirname(dirname(fileURLToPath(import.meta.url))));
export const COMMAND = join(ROOT, 'dist', 'cli', 'main.js');

/** Builds dist when it is older than src. */
export function buildCommand(): void {
  const built = spawnSync(process.execPath, [join(ROOT, 'scripts', 'build.mjs'), '--if-stale'], { encoding: 'utf8' });
  if (built.status !== 0) throw new Error(`the build failed:\n${built.stdout}${built.stderr}`);
}

export interface Ended {
  readonly code: number | null;
  readonly out: string;
  readonly err: string;
}

const ENV = { ...process.env, COLUMNS: '80', NO_COLOR: undefined, FORCE_COLOR: undefined };

/** Runs the command to its end. */
export function swaymark(
  args: readonly string[],
  options: { readonly cwd?: string; readonly env?: NodeJS.ProcessEnv } = {},
): Ended {
  const ended = spawnSync(process.execPath, [COMMAND, ...args], {
    encoding: 'utf8',
    cwd: options.cwd,
    env: { ...ENV, ...options.env },
    maxBuffer: 1 << 26,
  });
  return { code: ended.status, out: ended.stdout, err: ended.stderr };
}

/** Starts the command without waiting for it. */
export function startSwaymark(
  args: readonly string[],
  cwd: string,
): {
  readonly pid: number;
  readonly kill: (signal: NodeJS.Signals) => void;
  readonly ended: Promise<{ code: number | null; signal: string | null; err: string }>;
} {
  const child = spawn(process.execPath, [COMMAND, ...args], { cwd, env: ENV, stdio: ['ignore', 'ignore', 'pipe'] });
  let err = '';
  child.stderr.on('data', (data: Buffer) => {
    err += data.toString();
  });
  return {
    pid: child.pid ?? 0,
    kill: (signal) => child.kill(signal),
    ended: new Promise((resolve) => {
      child.on('close', (code, signal) => {
        resolve({ code, signal, err });
      });
    }),
  };
}

/** A folder of its own, removed by `remove`. */
export function scratch(): { readonly folder: string; readonly remove: () => void } {
  const folder = mkdtempSync(join(tmpdir(), 'swaymark-cli-'));
  return { folder, remove: () => rmSync(folder, { recursive: true, force: true }) };
}

/** The demo study copied to `folder`, without a database. */
export function copyDemo(folder: string): void {
  for (const name of ['study.yaml', 'inventory.csv', 'neighbours.csv', 'system-prior.csv'])
    cpSync(join(ROOT, 'data-demo', name), join(folder, name));
}

export const SMALL_STUDY = `title: Four houses (invented)
inventory:
  file: houses.csv
  columns: {id: id, name: name, storeys_above: storeys, height_m: height, year_built: built, system: system, use: use, floor_area_m2: area}
  rejects_limit: 0.2
hazard:
  spectra:
    design: {code: asce7-22-two-period, sds_g: 0.8, sd1_g: 0.4, tl_s: 8, return_period_years: 475}
    table: {code: table, periods_s: [0, 0.2, 1, 2], ordinates_g: [0.4, 1, 0.5, 0.25], interpolation: linear}
  levels:
    - {title: design level, spectrum: design}
code_history:
  place: Nowhere (invented)
  family: us-ubc-asce7
  seismic_design_enforced_from: 1952
  adoption_lag_years: 2
  editions: {ubc-1961: {zone_factor: 1.0}}
ranking: {list_size: 2, k: 2.5}
seed: 7
output: out
`;

/** Names that must do no harm anywhere. */
export const HOSTILE = {
  formula: '=1+1',
  markup: '</script><img src=x onerror=alert(1)>',
  terminal: 'evil\u001b[31m\u202ename',
} as const;

/** A small study with hostile names in `folder`; `rows` further rows may be added. */
export function writeSmallStudy(folder: string, rows: readonly string[] = []): void {
  const lines = [
    'id,name,storeys,height,built,system,use,area',
    `A1,${HOSTILE.formula},3,9.5,1940,unreinforced-masonry-wall,residential,600`,
    `A2,${HOSTILE.markup},5,16,1965,concrete-moment-frame,office,2500`,
    `A3,${HOSTILE.terminal},2,6.4,1990,timber-light-frame,residential,240`,
    'A4,"Söderhus, ""old""",8,27,1972,concrete-shear-wall,hospital,9000',
    ...rows,
  ];
  writeFileSync(join(folder, 'houses.csv'), `${lines.join('\n')}\n`);
  writeFileSync(join(folder, 'study.yaml'), SMALL_STUDY);
}

/** Invented hazard on a grid over the demo's town, as a CSV file and as a function of place. */
import { writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { parse } from 'csv-parse/sync';
import { demoCopy } from './study-folder.js';

export const GRID_PERIODS_S = [0.05, 0.2, 0.5, 1, 2, 4] as const;
const SHAPE_G = [0.5, 0.9, 0.62, 0.35, 0.17, 0.07] as const;

/** Ordinate at a node, g: grows to the north-east, and more so at long periods. */
export type Field = (lon: number, lat: number, p: number) => number;
export const rising =
  (scale: number): Field =>
  (lon, lat, p) =>
    scale * (SHAPE_G[p] ?? NaN) * (1 + 20 * (lon + 40.02) + (12 + 9 * p) * (lat - 35.01));
export const flat =
  (scale = 1): Field =>
  (_lon, _lat, p) =>
    scale * (SHAPE_G[p] ?? NaN);

interface Extent {
  readonly west?: number;
  readonly columns?: number;
}

/** Nodes 0.005° apart; the whole town unless it begins further east or has fewer columns. */
export function gridCsv(field: Field, { west = -40.025, columns = 7 }: Extent = {}): string {
  const rows = Array.from({ length: 5 }, (_, j) =>
    Array.from({ length: columns }, (_unused, i) => {
      const [lon, lat] = [Number((west + 0.005 * i).toFixed(3)), Number((35.005 + 0.005 * j).toFixed(3))];
      return [lon, lat, ...GRID_PERIODS_S.map((_t, p) => field(lon, lat, p))].join(',');
    }),
  );
  return `lon,lat,${GRID_PERIODS_S.map((t) => `SA(${String(t)}) [g]`).join(',')}\n${rows.flat().join('\n')}\n`;
}

/** Spectra and levels in the place of the demo's. */
export function withHazard(spectra: string, levels: string): (study: string) => string {
  return (study) =>
    study.replace(/ {2}spectra:\n {4}design-b[^]*?(?= {2}# Very stiff)/, `  spectra:\n${spectra}  levels:\n${levels}`);
}

export const ENTRY = (file: string, years: number, interpolation = 'linear'): string =>
  `{code: hazard-grid, file: ${file}, interpolation: ${interpolation}, return_period_years: ${String(years)}}`;

export const TWO_GRIDS = withHazard(
  `    h475: ${ENTRY('h475.csv', 475)}\n    h2475: ${ENTRY('h2475.csv', 2475)}\n`,
  '    - {title: design level, spectrum: h475}\n    - {title: rare level, spectrum: h2475}\n',
);

/** The demo with `files` beside it and hazard of its own; every building has coordinates where `everywhere` is true. */
export function gridCopy(
  study: (text: string) => string,
  files: Readonly<Record<string, string>>,
  everywhere = false,
): string {
  const path = demoCopy({ study, ...(everywhere ? { inventory: placed } : {}) });
  for (const [name, text] of Object.entries(files)) writeFileSync(join(dirname(path), name), text);
  return path;
}

/** The demo's inventory with the two buildings put on the map that it does not place. */
function placed(text: string): string {
  const columns = text
    .replace(/^\ufeff/u, '')
    .split(/\r?\n/, 1)[0]!
    .split(',');
  const [lon, lat] = [columns.indexOf('Lon'), columns.indexOf('Lat')];
  return text.replaceAll(/^BH-02[04],.*$/gm, (line) => {
    const [row = []] = parse(line);
    [row[lon], row[lat]] = ['-40.018', '35.012'];
    return row.map((cell) => `"${cell.replaceAll('"', '""')}"`).join(',');
  });
}

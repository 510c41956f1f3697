/** Hazard on a grid as a file: one row a node with lon, lat and ordinates at named periods, CSV or Parquet. */
import { createHash } from 'node:crypto';
import { GridError, layGrid } from '../engineering/spectrum/grid.js';
import type { HazardGrid } from '../engineering/spectrum/grid.js';
import { LARGEST_G } from '../engineering/spectrum/family.js';
import { Bug, UserError, showValue } from '../errors.js';
import type { Place, Problem } from '../errors.js';
import type { Database } from '../store/database.js';
import { readCsvNodes, readParquetNodes } from './hazard-grid-nodes.js';
import type { NodeTable } from './hazard-grid-nodes.js';
import { settleUnit, toG } from './spectrum-units.js';
import type { SpectrumUnit } from './spectrum-units.js';

export interface HazardGridOptions {
  /** Unit of the ordinates as the study says; left out, the headings must name it. */
  readonly unit?: SpectrumUnit | undefined;
  /** How a site's ordinates will be read between periods; log-log takes none at 0 s. */
  readonly interpolation?: 'linear' | 'log-log' | undefined;
  /** Reads Parquet; the file must lie in one of its folders. */
  readonly database?: Database | undefined;
}

export interface HazardGridFile {
  readonly grid: HazardGrid;
  readonly unit: SpectrumUnit;
  /** Nodes with values, and rows without any (a hole in the grid). */
  readonly nodes: number;
  readonly blank: number;
  /** First 16 hexadecimal digits of the SHA-256 of periods, coordinates and ordinates in g, whatever file they stand in. */
  readonly fingerprint: string;
  /** How the file was read, to be printed with the spectrum. */
  readonly statements: readonly string[];
}

const LONGEST_S = 100;
const MOST_PROBLEMS = 20;

/**
 * Reads a grid of hazard. Headings: lon, lat (or longitude, latitude), then one column a period, named by it: `SA(0.2)`, `sa_0.2_g`,
 * `0.2`, `PGA`; other columns are left out and named in the statements. A row whose ordinates are all blank is a hole.
 * @throws UserError with the line (CSV) or row (Parquet) of each problem, or of the node that is on no regular grid.
 */
export async function loadHazardGrid(path: string, options: HazardGridOptions = {}): Promise<HazardGridFile> {
  const parquet = /\.parquet$/i.test(path);
  if (parquet && options.database === undefined) throw new Bug('a grid in Parquet needs a database to read it');
  const table =
    parquet && options.database !== undefined
      ? await readParquetNodes(path, options.database)
      : await readCsvNodes(path);
  const placeOf = (node: number): Place =>
    parquet ? { file: path, row: table.at[node] } : { file: path, line: table.at[node] };
  const headings = table.periods.map(({ heading }) => heading);
  const { unit, from } = settleUnit(headings, options.unit, path);
  const order = periodOrder(table, options.interpolation, path);
  const periods_s = order.map((column) => table.periods[column]?.period_s ?? NaN);
  const { sa_g, blank } = ordinates(table, order, unit, placeOf);
  const nodes = { periods_s, lon: table.lon, lat: table.lat, sa_g };
  try {
    const grid = layGrid(nodes);
    const left = table.ignored.length === 0 ? [] : [`columns left out: ${table.ignored.join(', ')}`];
    const holes = blank === 0 ? [] : [`${blank} rows without ordinates`];
    return {
      grid,
      unit,
      nodes: table.lon.length - blank,
      blank,
      fingerprint: fingerprintOf(nodes),
      statements: [
        `grid of ${grid.lon.length} by ${grid.lat.length} lines`,
        `${periods_s.length} periods ${periods_s[0]} to ${periods_s.at(-1)} s`,
        `unit ${unit} as the ${from} says`,
        ...holes,
        ...left,
      ],
    };
  } catch (error) {
    if (!(error instanceof GridError)) throw error;
    throw new UserError(
      `${error.message}; a hazard grid has nodes on evenly spaced lines of longitude and latitude`,
      error.node === null ? { file: path } : placeOf(error.node),
      {
        cause: error,
      },
    );
  }
}

/** Columns of the periods, shortest period first. @throws UserError */
function periodOrder({ periods }: NodeTable, interpolation: string | undefined, file: string): number[] {
  const order = periods.map((_, column) => column);
  const at = (column: number): number => periods[column]?.period_s ?? NaN;
  order.sort((a, b) => at(a) - at(b));
  const problems: Problem[] = [];
  const complain = (column: number, message: string): void =>
    void problems.push({ place: { file, columnName: periods[column]?.heading }, message });
  if (order.length < 2)
    problems.push({
      place: { file },
      message: `at least two columns of ordinates are needed, got ${order.length}; name each by its period: PGA, SA(0.2), sa_1.0_g`,
    });
  order.forEach((column, i) => {
    if (at(column) > LONGEST_S) complain(column, `expected a period of 0 to ${LONGEST_S} s, got ${at(column)}`);
    else if (i > 0 && at(column) === at(order[i - 1] ?? -1))
      complain(column, `a second column at ${at(column)} s; keep one`);
    else if (at(column) === 0 && interpolation === 'log-log')
      complain(column, 'log-log needs periods > 0, got 0; use linear or remove the column');
  });
  if (problems.length > 0) throw UserError.of(problems);
  return order;
}

function ordinates(
  { values, lon, lat, periods }: NodeTable,
  order: readonly number[],
  unit: SpectrumUnit,
  placeOf: (node: number) => Place,
): { readonly sa_g: Float64Array; readonly blank: number } {
  const width = periods.length;
  const sa_g = new Float64Array(values.length);
  const problems: Problem[] = [];
  let blank = 0;
  for (let node = 0; node < lon.length && problems.length < MOST_PROBLEMS; node += 1) {
    const complain = (message: string): void => void problems.push({ place: placeOf(node), message });
    const [x = NaN, y = NaN] = [lon[node], lat[node]];
    if (!(x >= -180 && x <= 360)) complain(`expected a longitude of -180 to 360 degrees, got ${showNumber(x)}`);
    if (!(y >= -90 && y <= 90)) complain(`expected a latitude of -90 to 90 degrees, got ${showNumber(y)}`);
    let missing = 0;
    order.forEach((column, p) => {
      const value = values[node * width + column] ?? NaN;
      const value_g = toG(value, unit);
      sa_g[node * width + p] = value_g;
      const heading = showValue(periods[column]?.heading ?? '');
      if (Number.isNaN(value)) missing += 1;
      else if (!(value_g > 0)) complain(`${heading}: expected an ordinate > 0, got ${value}`);
      else if (value_g > LARGEST_G)
        complain(
          `${heading}: expected an ordinate of at most ${LARGEST_G} g, got ${value} ${unit}; is the unit another?`,
        );
    });
    if (missing === width) blank += 1;
    else if (missing > 0) complain(`${missing} of ${width} ordinates are blank; give all, or none for a hole`);
  }
  if (problems.length > 0) throw UserError.of(problems);
  return { sa_g, blank };
}

function showNumber(value: number): string {
  return Number.isNaN(value) ? 'nothing' : String(value);
}

function fingerprintOf(nodes: {
  readonly periods_s: readonly number[];
  readonly lon: Float64Array;
  readonly lat: Float64Array;
  readonly sa_g: Float64Array;
}): string {
  const hash = createHash('sha256');
  for (const numbers of [Float64Array.from(nodes.periods_s), nodes.lon, nodes.lat, nodes.sa_g])
    hash.update(new Uint8Array(numbers.buffer, numbers.byteOffset, numbers.byteLength));
  return hash.digest('hex').slice(0, 16);
}

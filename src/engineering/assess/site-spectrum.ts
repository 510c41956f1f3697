/** The spectrum of one building out of a hazard grid: an ordinary table of its place's ordinates. */
import { formatNumber } from '../format.js';
import { apply } from '../formula.js';
import type { AnyRecord, Inputs } from '../formula.js';
import type { CompiledSpectrum } from '../spectrum/compiled.js';
import { compileSpectrum } from '../spectrum/definition.js';
import type { SpectrumReading } from '../spectrum/definition.js';
import type { HazardGrid } from '../spectrum/grid.js';
import { cellAt, readGrid } from '../spectrum/grid-read.js';
import type { GridCell } from '../spectrum/grid-read.js';
import { GRID_BILINEAR, GRID_SHARE } from '../spectrum/grid-records.js';
import { SiteTable, definitionOfTable, plateauOfTable } from '../spectrum/grid-table.js';
import type { Trace } from '../trace.js';
import type { ContextSpectrum, GridSource } from './context.js';

/** Why a building whose coordinates are not known has no spectrum. */
export function noPlaceReason(name: string): string {
  return `no coordinates on record, which the hazard grid "${name}" needs`;
}

/** Why a building that the grid does not cover has no spectrum. */
export function outsideReason(name: string): string {
  return `outside the hazard grid "${name}"`;
}

/** Read like any other; what only a trace or a picture needs is made when it is asked for. */
export class SiteSpectrum implements ContextSpectrum {
  readonly name: string;
  readonly return_period_years: number | null;
  readonly hold_from_s: number;
  readonly corner_s: number;
  readonly valid_to_s: number;
  readonly site: SiteTable;
  readonly source: GridSource;
  readonly lon: number;
  readonly lat: number;

  constructor(source: GridSource, lon: number, lat: number, sa_g: Float64Array) {
    const { periods_s } = source.grid;
    const [from_s, to_s] = plateauOfTable(periods_s, sa_g, 0);
    this.name = source.name;
    this.return_period_years = source.return_period_years;
    this.hold_from_s = source.holdPlateau ? from_s : 0;
    this.corner_s = to_s;
    this.valid_to_s = periods_s[periods_s.length - 1]!;
    this.site = new SiteTable(periods_s, sa_g, source.interpolation);
    this.source = source;
    this.lon = lon;
    this.lat = lat;
  }

  get record(): AnyRecord {
    return this.#reading().record;
  }

  get inputs(): Inputs {
    return this.#reading().inputs;
  }

  get compiled(): CompiledSpectrum {
    return this.#reading().compiled;
  }

  #reading(): SpectrumReading {
    const { periods_s, sa_g, interpolation } = this.site;
    return compileSpectrum(definitionOfTable(periods_s, sa_g, 0, interpolation));
  }
}

/** The spectrum at a place, degrees; a reason where the grid has none there. */
export function siteSpectrum(source: GridSource, lon: number, lat: number): SiteSpectrum | string {
  if (Number.isNaN(lon) || Number.isNaN(lat)) return noPlaceReason(source.name);
  const sa_g = new Float64Array(source.grid.periods_s.length);
  if (!readGrid(source.grid, lon, lat, sa_g)) return outsideReason(source.name);
  if (source.factor !== 1) for (let i = 0; i < sa_g.length; i += 1) sa_g[i]! *= source.factor;
  return new SiteSpectrum(source, lon, lat, sa_g);
}

/** Writes down where the place lies on the grid, and its ordinates. */
export function tracePlace(spectrum: SiteSpectrum, trace: Trace): void {
  const { source, lon, lat, site } = spectrum;
  const { grid, name } = source;
  const cell = cellAt(grid, lon, lat);
  if (cell === null) return;
  const lines = [grid.lon[cell.west], grid.lon[cell.west + 1], grid.lat[cell.south], grid.lat[cell.south + 1]];
  const [west, east, south, north] = lines.map((line) => formatNumber(line!, 7));
  trace.choice({
    question: `Place on the grid ${name}`,
    taken: `longitude ${formatNumber(lon, 8)}°, latitude ${formatNumber(lat, 8)}°, in the cell from ${String(west)}° to ${String(east)}° of longitude and ${String(south)}° to ${String(north)}° of latitude`,
    because: 'coordinates of the inventory; its ordinates come from the four nodes of that cell',
    others: [],
  });
  apply(GRID_SHARE, { place_deg: cell.lon, line_1_deg: lines[0]!, line_2_deg: lines[1]! }, trace);
  apply(GRID_SHARE, { place_deg: lat, line_1_deg: lines[2]!, line_2_deg: lines[3]! }, trace);
  const ordinates = Array.from(site.sa_g, (sa_g, p) => `${formatNumber(sa_g, 4)} at ${String(site.periods_s[p])} s`);
  trace.value(
    'ordinates',
    ordinates.join('; '),
    'computed',
    'in g, each bilinear in ln S_a; the largest begins the plateau',
  );
}

/** Writes down the ordinates between which `period_s` is read, each from the four nodes. */
export function traceOrdinates(spectrum: SiteSpectrum, period_s: number, trace: Trace): void {
  const { source, lon, lat, site } = spectrum;
  const cell = cellAt(source.grid, lon, lat);
  if (cell === null) return;
  const after = site.periods_s.findIndex((period) => period > period_s);
  const last = site.periods_s.length - 1;
  for (const p of after < 0 ? [last] : after === 0 ? [0] : [after - 1, after]) {
    trace.choice({
      question: `S_a of the grid ${source.name} at ${String(site.periods_s[p])} s`,
      taken: 'from the four nodes around the place',
      because: 'a period of the grid beside the one that is read',
      others: [],
    });
    apply(GRID_BILINEAR, fourNodes(source.grid, cell, p), trace);
  }
}

function fourNodes({ sa_g, periods_s }: HazardGrid, { nodes, east, north }: GridCell, p: number) {
  const at = (node: number): number => sa_g[node * periods_s.length + p]!;
  // a corner that does not count may be missing: another stands in, times 0
  const there = at(Math.max(...nodes));
  const [sa_sw_g, sa_se_g, sa_nw_g, sa_ne_g] = nodes.map((node) => (node < 0 ? there : at(node)));
  return {
    east_share: east,
    north_share: north,
    sa_sw_g: sa_sw_g!,
    sa_se_g: sa_se_g!,
    sa_nw_g: sa_nw_g!,
    sa_ne_g: sa_ne_g!,
  };
}
